import type { Plane, RodOptics } from './elements';
import type { RayMatrix } from './ray-matrix';

/** Below this (gamma dz)^2 the sine and cosine are summed as series; six terms leave less than 1e-16. */
const SERIES_BELOW = 0.05;

/** cos(sqrt x), and cosh(sqrt -x) for x < 0: one entire function of x. */
function cosineOfRoot(x: number): number {
  if (Math.abs(x) < SERIES_BELOW) {
    return 1 + x * (-1 / 2 + x * (1 / 24 + x * (-1 / 720 + x * (1 / 40320 - x / 3628800))));
  }
  return x > 0 ? Math.cos(Math.sqrt(x)) : Math.cosh(Math.sqrt(-x));
}

/** sin(sqrt x) / sqrt x, and sinh(sqrt -x) / sqrt -x for x < 0. */
function sineOverRoot(x: number): number {
  if (Math.abs(x) < SERIES_BELOW) {
    return 1 + x * (-1 / 6 + x * (1 / 120 + x * (-1 / 5040 + x * (1 / 362880 - x / 39916800))));
  }
  const root = Math.sqrt(Math.abs(x));
  return x > 0 ? Math.sin(root) / root : Math.sinh(root) / root;
}

/**
 * Applies one graded-index slice to a matrix in place. Index n(r) = n0 - n2 r^2 / 2 with n2 dz = D, so
 * gamma^2 = n2 / n0 = D / (dz n0) and, with reduced angles and x = (gamma dz)^2 = D dz / n0,
 *   [ cos,  (dz / n0) sin(gamma dz) / (gamma dz) ;  -D sin(gamma dz) / (gamma dz),  cos ].
 * D < 0 turns cos and sin into cosh and sinh; D = 0 is plain space of reduced length dz / n0; dz = 0 is a
 * thin lens.
 *
 * @param power D, 1/m
 * @param reducedLength dz / n0, m
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966), table I; Siegman, Lasers (1986), section 15.2
 */
function passSlice(matrix: RayMatrix, power: number, reducedLength: number): void {
  const x = power * reducedLength;
  const cosine = cosineOfRoot(x);
  const sine = sineOverRoot(x);
  const spread = reducedLength * sine;
  const bend = -power * sine;
  const a = matrix[0]!;
  const b = matrix[1]!;
  const c = matrix[2]!;
  const d = matrix[3]!;
  matrix[0] = cosine * a + spread * c;
  matrix[1] = cosine * b + spread * d;
  matrix[2] = bend * a + cosine * c;
  matrix[3] = bend * b + cosine * d;
}

function passLens(matrix: RayMatrix, power: number): void {
  matrix[2] = matrix[2]! - power * matrix[0]!;
  matrix[3] = matrix[3]! - power * matrix[1]!;
}

/**
 * Applies the whole rod, front face first, to a matrix in place; from and to the air outside.
 *
 * @param scale factor on every power of the rod: 1 as it stands, p for a shape of unit power at p dioptres
 */
export function passRod(matrix: RayMatrix, rod: RodOptics, plane: Plane, scale: number): void {
  const powers = rod.slicePowers[plane];
  const lengths = rod.sliceLengths;
  passLens(matrix, scale * rod.frontPower[plane]);
  for (let i = 0; i < lengths.length; i++) {
    passSlice(matrix, scale * powers[i]!, lengths[i]! / rod.refractiveIndex);
  }
  passLens(matrix, scale * rod.backPower[plane]);
}

/**
 * Applies the rod from the face that is met first to a plane inside, to a matrix in place. The face met last
 * is never included.
 *
 * @param depth from the face met first, m, between 0 and the rod's length
 * @param reversed the back face is met first
 */
export function passRodTo(
  matrix: RayMatrix,
  rod: RodOptics,
  plane: Plane,
  depth: number,
  reversed: boolean,
): void {
  const powers = rod.slicePowers[plane];
  const lengths = rod.sliceLengths;
  passLens(matrix, reversed ? rod.backPower[plane] : rod.frontPower[plane]);
  let left = depth;
  for (let step = 0; step < lengths.length && left > 0; step++) {
    const i = reversed ? lengths.length - 1 - step : step;
    const length = lengths[i]!;
    const share = left >= length ? 1 : left / length;
    passSlice(matrix, powers[i]! * share, (length * share) / rod.refractiveIndex);
    left -= length;
  }
}

/**
 * Depth of the plane where the mode radius "in the rod" is taken: the centroid of the slices weighted by the
 * magnitude of their power, so where the heat is; the middle of the rod when it is cold.
 *
 * @returns m from the front face
 */
export function powerCentroid(rod: RodOptics, plane: Plane): number {
  const powers = rod.slicePowers[plane];
  let weight = 0;
  let moment = 0;
  let front = 0;
  for (let i = 0; i < rod.sliceLengths.length; i++) {
    const length = rod.sliceLengths[i]!;
    weight += Math.abs(powers[i]!);
    moment += Math.abs(powers[i]!) * (front + length / 2);
    front += length;
  }
  return weight > 0 ? moment / weight : front / 2;
}

/**
 * The thin lens that does what the rod does, and where it stands: power P = -C of the rod's matrix and its
 * principal planes at (D - 1)/C inside the front face and (A - 1)/C inside the back face, lengths as in air.
 * For a weak lens these are the reduced distances of the power's own centroid.
 *
 * @returns power 1/m; depths m of air, NaN when the rod has no power
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966), section on lens systems
 */
export function equivalentThinLens(
  rod: RodOptics,
  plane: Plane,
): { power: number; frontDepth: number; backDepth: number } {
  const matrix = Float64Array.of(1, 0, 0, 1);
  passRod(matrix, rod, plane, 1);
  const c = matrix[2]!;
  if (c === 0) return { power: 0, frontDepth: NaN, backDepth: NaN };
  return { power: -c, frontDepth: (matrix[3]! - 1) / c, backDepth: (matrix[0]! - 1) / c };
}

/** Dioptric power of the whole rod as the sum of its parts, 1/m: the number a stability zone is told in. */
export function totalPower(rod: RodOptics, plane: Plane): number {
  let power = rod.frontPower[plane] + rod.backPower[plane];
  for (const slice of rod.slicePowers[plane]) power += slice;
  return power;
}
