import type { Warning } from '../errors';
import { photonEnergy } from './constants';
import type { LaserInput } from './output';
import type { PumpRings } from './pump-rings';

/** Below this ratio of mode to pump radius higher transverse modes find gain that the lowest leaves over. */
const LEAST_MODE_TO_PUMP = 0.7;
/** Above this excited share the pump bleaches its own absorption noticeably. */
const MOST_EXCITED = 0.1;

/**
 * Second-moment radius of the absorbed pump, sqrt(2 <r^2>): the 1/e2 radius of a Gaussian and the edge of a flat-top.
 * @returns m; 0 where nothing is absorbed
 */
export function pumpSecondMomentRadius(pump: PumpRings): number {
  let moment = 0;
  let total = 0;
  for (let i = 0; i < pump.shares.length; i++) {
    moment += (pump.shares[i]! * (pump.faces[i]! ** 2 + pump.faces[i + 1]! ** 2)) / 2;
    total += pump.shares[i]!;
  }
  return total > 0 ? Math.sqrt((2 * moment) / total) : 0;
}

/**
 * Largest share of the ions lifted to the upper manifold with the beam blocked: tau eta_p q / (h nu_p N).
 * The model leaves out bleaching of the pump absorption, so this must stay small against 1.
 * @param peakAbsorbedDensity highest absorbed pump power per volume, W/m^3
 * @param ionDensity dopant ions, 1/m^3
 * @returns 0 or more
 */
export function peakExcitedShare(
  laser: { pumpWavelength: number; upperLifetime: number; pumpQuantumEfficiency: number },
  peakAbsorbedDensity: number,
  ionDensity: number,
): number {
  const rate = (laser.pumpQuantumEfficiency * peakAbsorbedDensity) / photonEnergy(laser.pumpWavelength);
  return (rate * laser.upperLifetime) / ionDensity;
}

/**
 * Where the laser model leaves its range, in words for the person.
 * @param excitedShare see peakExcitedShare; null where the ion density is not known
 */
export function laserWarnings(input: LaserInput, excitedShare: number | null): Warning[] {
  const warnings: Warning[] = [];
  const ratio = input.modeRadius / pumpSecondMomentRadius(input.pump);
  if (ratio < LEAST_MODE_TO_PUMP)
    warnings.push({
      where: 'cavity',
      text:
        `The mode in the rod is ${ratio.toFixed(2)} of the pump radius: higher transverse modes will also lase. ` +
        'Output is computed for the lowest mode alone, so it may be higher and of poorer beam quality.',
    });
  if (excitedShare !== null && excitedShare > MOST_EXCITED)
    warnings.push({
      where: 'pump',
      text:
        `Up to ${(100 * excitedShare).toFixed(0)} % of the ions are excited with the beam blocked: the pump bleaches ` +
        'its own absorption, which is left out, so less is absorbed than computed.',
    });
  return warnings;
}
