import type { CavityElement, Plane, RodOptics } from './elements';
import type { PreparedCavity } from './prepare';
import { halfTrace, tripMatrix } from './prepare';
import type { RayMatrix } from './ray-matrix';
import { identity } from './ray-matrix';
import { passRod, passRodTo, powerCentroid } from './rod-matrix';

/**
 * A cavity whose |m| comes closer to 1 than this counts as on its edge, which is not stable. Rounding of the
 * matrix products is a few 1e-16 times their entries; the guard costs less than 1e-12 of lens power.
 */
export const EDGE_GUARD = 1e-12;

/** Written and read within one call, so that thousands of stabilities allocate nothing. */
const trip = identity();

/**
 * Stability of the cavity in one plane: m = (A + D) / 2 of the round trip. |m| < 1 is stable, |m| = 1 is on
 * the edge, which is not stable; a flat-flat cavity without lens has m = 1 exactly.
 *
 * @returns m, without unit
 * @source Kogelnik & Li, Appl. Opt. 5, 1550 (1966); Magni, J. Opt. Soc. Am. A 4, 1962 (1987)
 */
export function stability(prepared: PreparedCavity, rod: RodOptics, plane: Plane): number {
  return stabilityAtPower(prepared, rod, plane, 1);
}

/**
 * The same m with every power of the rod multiplied by `power`: with a shape of unit power, the stability at
 * that many dioptres. For maps and curves.
 */
export function stabilityAtPower(
  prepared: PreparedCavity,
  rodShape: RodOptics,
  plane: Plane,
  power: number,
): number {
  tripMatrix(prepared, rodShape, plane, power, trip);
  return halfTrace(prepared.cavity.kind, trip);
}

/** Whether m is inside the stable range and not within rounding of its edge. */
export function isStable(m: number): boolean {
  return Math.abs(m) < 1 - EDGE_GUARD;
}

export interface PlaneMode {
  /** m = (A + D) / 2 of the round trip. */
  stability: number;
  stable: boolean;
  /** 1/e2 intensity radius at the power centroid of the first rod, m; null when unstable or without a rod. */
  modeRadiusInRod: number | null;
  /**
   * 1/e2 radius in air at the entrance of each element and, last, at the exit of the last one, m; length
   * elements + 1; null when unstable.
   */
  elementRadii: Float64Array | null;
}

/**
 * Second moments of the mode in units of wavelength / pi, the Twiss parameters of a ray bundle: beta gives the
 * radius w^2 = beta lambda / pi, alpha = -beta' / 2 its convergence, gamma the divergence; beta gamma - alpha^2 = 1.
 */
export type Beam = Float64Array;

/**
 * The mode at the start of the cavity: at the first mirror, before its second half, for a linear cavity
 * (beta^2 = -B D / (A C) of the one-way trip, flat wavefront there); at the first element's entrance for a
 * ring (cos = m, A - D = 2 alpha sin, B = beta sin).
 *
 * @param matrix of the trip
 * @param out receives beta, alpha, gamma; left alone when there is no mode
 * @returns whether there is one
 * @source Siegman, Lasers (1986), chapters 20 and 21
 */
export function startingBeam(kind: 'linear' | 'ring', matrix: RayMatrix, out: Beam): boolean {
  const a = matrix[0]!;
  const b = matrix[1]!;
  const c = matrix[2]!;
  const d = matrix[3]!;
  if (kind === 'linear') {
    if (!(a * d > EDGE_GUARD / 2 && b * c < -EDGE_GUARD / 2)) return false;
    out[0] = Math.sqrt((b * d) / (-a * c));
    out[1] = 0;
    out[2] = 1 / out[0];
    return true;
  }
  const m = (a + d) / 2;
  if (!isStable(m)) return false;
  const sine = Math.sign(b) * Math.sqrt((1 - m) * (1 + m));
  out[0] = b / sine;
  out[1] = (a - d) / 2 / sine;
  out[2] = -c / sine;
  return true;
}

/** beta behind the optics at `at`, without moving the beam. */
export function betaBehind(beam: Beam, matrix: RayMatrix, at = 0): number {
  const a = matrix[at]!;
  const b = matrix[at + 1]!;
  return a * a * beam[0]! - 2 * a * b * beam[1]! + b * b * beam[2]!;
}

/** Carries the beam through the optics at `at`, in place. */
export function passBeam(beam: Beam, matrix: RayMatrix, at = 0): void {
  const a = matrix[at]!;
  const b = matrix[at + 1]!;
  const c = matrix[at + 2]!;
  const d = matrix[at + 3]!;
  const beta = beam[0]!;
  const alpha = beam[1]!;
  const gamma = beam[2]!;
  beam[0] = a * a * beta - 2 * a * b * alpha + b * b * gamma;
  beam[1] = -a * c * beta + (a * d + b * c) * alpha - b * d * gamma;
  beam[2] = c * c * beta - 2 * c * d * alpha + d * d * gamma;
}

/** Matrix of element i as the light passes it once, with the rod's optics filled in. */
export function stepMatrix(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  index: number,
  out: RayMatrix,
): void {
  const element = prepared.cavity.elements[index]!;
  if (element.kind !== 'rod') {
    const { steps } = prepared.planes[plane];
    for (let i = 0; i < 4; i++) out[i] = steps[4 * index + i]!;
    return;
  }
  out[0] = out[3] = 1;
  out[1] = out[2] = 0;
  passRod(out, rod, plane, 1);
  if (!element.reversed) return;
  const a = out[0]!;
  out[0] = out[3]!;
  out[3] = a;
}

/** Depth of the rod's reference plane from the face that is met first, m. */
export function centroidDepth(element: CavityElement, rod: RodOptics, plane: Plane): number {
  const depth = powerCentroid(rod, plane);
  if (element.kind !== 'rod' || !element.reversed) return depth;
  return rod.sliceLengths.reduce((sum, length) => sum + length, 0) - depth;
}

const beamScratch: Beam = new Float64Array(3);
const step = identity();

/**
 * The fundamental mode of the cavity in one plane.
 *
 * Left out: apertures, gain guiding and the rod's aberration; a real beam of quality M2 is larger.
 *
 * @param wavelength in vacuum, m
 * @returns an unstable cavity is an answer: its radii are null
 */
export function planeMode(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  wavelength: number,
): PlaneMode {
  const { kind, elements } = prepared.cavity;
  tripMatrix(prepared, rod, plane, 1, trip);
  const m = halfTrace(kind, trip);
  if (!isStable(m) || !startingBeam(kind, trip, beamScratch)) {
    return { stability: m, stable: false, modeRadiusInRod: null, elementRadii: null };
  }
  const unit = wavelength / Math.PI;
  const elementRadii = new Float64Array(elements.length + 1);
  let modeRadiusInRod: number | null = null;
  for (let i = 0; i < elements.length; i++) {
    elementRadii[i] = Math.sqrt(beamScratch[0]! * unit);
    if (i === prepared.rods[0]) {
      step[0] = step[3] = 1;
      step[1] = step[2] = 0;
      passRodTo(step, rod, plane, centroidDepth(elements[i]!, rod, plane), prepared.reversed[0]!);
      modeRadiusInRod = Math.sqrt(betaBehind(beamScratch, step) * unit);
    }
    stepMatrix(prepared, rod, plane, i, step);
    passBeam(beamScratch, step);
  }
  elementRadii[elements.length] = Math.sqrt(beamScratch[0]! * unit);
  return { stability: m, stable: true, modeRadiusInRod, elementRadii };
}
