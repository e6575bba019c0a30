import type { CavityElement, Plane } from './elements';

/**
 * A ray matrix as four numbers A, B, C, D in a Float64Array at some offset, acting on (height y, reduced
 * angle n y'). With reduced angles every matrix has determinant 1, a flat face at normal incidence is the
 * identity and in air the reduced angle is the true angle.
 */
export type RayMatrix = Float64Array;

/** The identity, as a fresh matrix. */
export function identity(): RayMatrix {
  return Float64Array.of(1, 0, 0, 1);
}

/** later * earlier, written into `out` at `outAt`; `out` may be one of the factors. */
export function multiply(
  later: RayMatrix,
  laterAt: number,
  earlier: RayMatrix,
  earlierAt: number,
  out: RayMatrix,
  outAt: number,
): void {
  const a = later[laterAt]!;
  const b = later[laterAt + 1]!;
  const c = later[laterAt + 2]!;
  const d = later[laterAt + 3]!;
  const e = earlier[earlierAt]!;
  const f = earlier[earlierAt + 1]!;
  const g = earlier[earlierAt + 2]!;
  const h = earlier[earlierAt + 3]!;
  out[outAt] = a * e + b * g;
  out[outAt + 1] = a * f + b * h;
  out[outAt + 2] = c * e + d * g;
  out[outAt + 3] = c * f + d * h;
}

/** The matrix of the same optics passed the other way: A and D change places. */
export function reverse(matrix: RayMatrix): RayMatrix {
  return Float64Array.of(matrix[3]!, matrix[1]!, matrix[2]!, matrix[0]!);
}

/**
 * Focal length of a curved mirror met at an angle: f_t = (R/2) cos(theta), f_s = (R/2) / cos(theta).
 *
 * @param radius m, > 0 concave, Infinity flat
 * @param incidence rad
 * @returns m; Infinity for a flat mirror
 * @source Kogelnik, Ippen, Dienes & Shank, IEEE J. Quantum Electron. 8, 373 (1972)
 */
export function tiltedMirrorFocalLength(radius: number, incidence: number, plane: Plane): number {
  const cosine = Math.cos(incidence);
  return plane === 'tangential' ? (radius / 2) * cosine : radius / 2 / cosine;
}

/**
 * Length of air that bends nothing and spreads a ray as much as a plane-parallel plate at an angle does:
 * d_s = t / sqrt(n^2 - sin^2), d_t = t n^2 cos^2 / (n^2 - sin^2)^(3/2), with the angle of incidence outside.
 * At Brewster's angle these are t sqrt(n^2 + 1) / n^2 and t sqrt(n^2 + 1) / n^4; at normal incidence t / n.
 *
 * @param thickness m
 * @param incidence rad, in the tangential plane
 * @returns m
 * @source Kogelnik, Ippen, Dienes & Shank, IEEE J. Quantum Electron. 8, 373 (1972)
 */
export function plateReducedLength(
  thickness: number,
  refractiveIndex: number,
  incidence: number,
  plane: Plane,
): number {
  const sine = Math.sin(incidence);
  const square = refractiveIndex * refractiveIndex - sine * sine;
  const sagittal = thickness / Math.sqrt(square);
  if (plane === 'sagittal') return sagittal;
  return (sagittal * (refractiveIndex * refractiveIndex * (1 - sine * sine))) / square;
}

/**
 * Matrix of one element passed once; the rod gives the identity, since its optics arrive with each question.
 *
 * @param share of its power that a mirror gives: 1, or 1/2 for the end mirror of a linear cavity, which the
 *   one-way trip meets halfway
 */
export function elementMatrix(element: CavityElement, plane: Plane, share = 1): RayMatrix {
  switch (element.kind) {
    case 'mirror':
      return Float64Array.of(
        1,
        0,
        -share / tiltedMirrorFocalLength(element.radius, element.incidence, plane),
        1,
      );
    case 'space':
      return Float64Array.of(1, element.length, 0, 1);
    case 'lens':
      return Float64Array.of(1, 0, -1 / element.focalLength, 1);
    case 'plate':
      return Float64Array.of(
        1,
        plateReducedLength(element.thickness, element.refractiveIndex, element.incidence, plane),
        0,
        1,
      );
    case 'rod':
      return identity();
  }
}
