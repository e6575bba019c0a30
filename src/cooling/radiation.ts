/** Stefan-Boltzmann constant, W/(m2 K4) (CODATA 2018). */
const STEFAN_BOLTZMANN = 5.670374419e-8;

/**
 * Heat per area and per kelvin that a black surface radiates into a large room: sigma (T^2 + Ta^2)(T + Ta).
 *
 * Multiply by emissivity, area and (T - Ta) for the exact difference of fourth powers.
 *
 * @param temperature of the surface, K
 * @param ambient of the room's walls, K
 * @returns W/(m2 K)
 */
export function blackRadiationCoefficient(temperature: number, ambient: number): number {
  return STEFAN_BOLTZMANN * (temperature * temperature + ambient * ambient) * (temperature + ambient);
}

/**
 * Apparent emissivity of the opening of a grey cavity of one temperature: deep channels look blacker than
 * their walls.
 *
 * eps_a = 1 / [1 + (A_opening / A_wall)(1/eps - 1)]: two-surface enclosure, the openings black at room
 * temperature. Left out: the little that the openings see of one another.
 *
 * @param emissivity of the walls, above 0 to 1; 0 gives 0
 * @param openingShare A_opening / A_wall, 0 to 1
 * @source Incropera, Fundamentals of Heat and Mass Transfer, section 13.3 (from memory)
 */
export function cavityEmissivity(emissivity: number, openingShare: number): number {
  return emissivity / (emissivity + openingShare * (1 - emissivity));
}
