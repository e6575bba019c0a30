/**
 * Optical path that both free end faces add by bulging, per kelvin-metre of the integral of T - T_axis along the rod,
 * ESTIMATED as if every slice were a thin disc free to expand along the axis (plane stress):
 * (n - 1)(1 + nu) alpha. Both faces together; the elastic room computes the real bulge, which is smaller for long rods
 * heated near one face only by what the cold surroundings hold back.
 *
 * @param refractiveIndex n
 * @param poissonRatio nu
 * @param expansion alpha along the axis, 1/K
 * @returns 1/K; use it like dn/dT
 * @source Koechner, Solid-State Laser Engineering, ch. 7; Chenais et al., Prog. Quantum Electron. 30, 89 (2006) (from memory)
 */
export function planeStressBulge(refractiveIndex: number, poissonRatio: number, expansion: number): number {
  return (refractiveIndex - 1) * (1 + poissonRatio) * expansion;
}
