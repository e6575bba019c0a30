import { BOLTZMANN, LIGHT_SPEED, PLANCK } from './constants';

/**
 * Share of a manifold's ions in one of its Stark levels in thermal equilibrium:
 * exp(-h c E_i / k T) / sum_j exp(-h c E_j / k T). Levels are taken as equally degenerate (Kramers doublets);
 * a level of other degeneracy is listed as often as it is degenerate.
 * @param levels energies as wavenumbers, 1/m (100 per 1/cm); only their differences matter
 * @param index which level
 * @param temperature K
 * @returns 0..1
 * @source Risk, J. Opt. Soc. Am. B 5, 1412 (1988) (from memory)
 */
export function boltzmannShare(levels: ArrayLike<number>, index: number, temperature: number): number {
  const perKelvin = (PLANCK * LIGHT_SPEED) / (BOLTZMANN * temperature);
  const own = levels[index]!;
  let sum = 0;
  for (let j = 0; j < levels.length; j++) sum += Math.exp((own - levels[j]!) * perKelvin);
  return 1 / sum;
}
