import type { LensWeights } from './weights';

/**
 * The r^4 term c4 of the best fit c0 + c2 r^2 + c4 r^4 of an optical path profile over the mode's intensity: how far a
 * lens is from a parabola, and the first spherical aberration. Found as the projection on the quartic that is orthogonal
 * to the parabola.
 * @param profile m at the points of the geometry
 * @returns 1/m^3; 0 where the points cannot tell it from a parabola
 */
export function quarticTerm(
  { geometry, intensity, meanSquare, meanFourth }: LensWeights,
  profile: Float64Array,
): number {
  const { squares } = geometry;
  let meanSixth = 0;
  for (let q = 0; q < profile.length; q++) meanSixth += intensity[q]! * squares[q]! ** 3;
  const slope = (meanSixth - meanFourth * meanSquare) / (meanFourth - meanSquare ** 2);
  let norm = 0;
  let sum = 0;
  for (let q = 0; q < profile.length; q++) {
    const s = squares[q]!;
    const quartic = s * s - meanFourth - slope * (s - meanSquare);
    norm += intensity[q]! * quartic * quartic;
    sum += intensity[q]! * quartic * profile[q]!;
  }
  return norm > 0 ? sum / norm : 0;
}
