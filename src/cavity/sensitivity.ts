import type { CavityElement, Plane, RodOptics } from './elements';
import { centroidDepth, stepMatrix } from './mode';
import type { PreparedCavity } from './prepare';
import { tripMatrix } from './prepare';
import { identity } from './ray-matrix';
import { passRodTo } from './rod-matrix';

interface MirrorSensitivity {
  /** Index of the mirror among the elements. */
  element: number;
  /**
   * How far the cavity's axis moves in the rod per angle of tilt, m/rad, as a magnitude; Infinity on the edge
   * where the tilted cavity has no axis.
   */
  axisShift: number;
}

/**
 * What tilting each mirror does to the axis in the rod. A mirror tilted by an angle turns the light by twice
 * that angle in the tangential plane and by 2 cos(incidence) of it in the sagittal plane, each time it is met;
 * the new axis is the ray that closes on itself. Linear cavity: on the one-way trip, half a turn at each end,
 * y = -(turns carried to the far end) / C, so the shift grows without bound at the edge C = 0 and stays finite
 * at the others: of the two zones of a lens the one that ends there cannot be aligned near that edge. Ring: (1 - M) y = turns.
 *
 * @returns one entry per mirror, taken at the rod's power centroid (first rod); at the first element without a rod
 * @source Magni, J. Opt. Soc. Am. A 4, 1962 (1987); De Silvestri, Laporta & Magni, Opt. Commun. 59, 43 (1986) (both from memory)
 */
export function misalignmentSensitivity(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
): MirrorSensitivity[] {
  const sensitivities: MirrorSensitivity[] = [];
  prepared.cavity.elements.forEach((element, index) => {
    if (element.kind !== 'mirror') return;
    const turn = turnOf(element, prepared, index, plane);
    const start = closedRay(prepared, rod, plane, index, turn);
    sensitivities.push({
      element: index,
      axisShift: Math.abs(heightInRod(prepared, rod, plane, index, turn, start)),
    });
  });
  return sensitivities;
}

/** Turn of the light per tilt on the trip; the end mirrors of a linear cavity are met halfway. */
function turnOf(
  mirror: CavityElement & { kind: 'mirror' },
  prepared: PreparedCavity,
  index: number,
  plane: Plane,
): number {
  const { kind, elements } = prepared.cavity;
  const whole = plane === 'tangential' ? 2 : 2 * Math.cos(mirror.incidence);
  return kind === 'linear' && (index === 0 || index === elements.length - 1) ? whole / 2 : whole;
}

/** A ray as height and reduced angle. */
type Ray = [height: number, angle: number];

/** The ray at the start of the trip that closes on itself when mirror `tilted` turns the light. */
function closedRay(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  tilted: number,
  turn: number,
): Ray {
  const [height, angle] = trace(prepared, rod, plane, tilted, turn, [0, 0], prepared.cavity.elements.length);
  const trip = identity();
  tripMatrix(prepared, rod, plane, 1, trip);
  const [a, b, c, d] = [trip[0]!, trip[1]!, trip[2]!, trip[3]!];
  if (prepared.cavity.kind === 'linear') return [-angle / c, 0];
  const determinant = 2 - a - d;
  return [((1 - d) * height + b * angle) / determinant, (c * height + (1 - a) * angle) / determinant];
}

/** Carries a ray from the start to the entrance of element `until`, turned at mirror `tilted`. */
function trace(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  tilted: number,
  turn: number,
  start: Ray,
  until: number,
): Ray {
  const matrix = identity();
  let [height, angle] = start;
  for (let i = 0; i < until; i++) {
    stepMatrix(prepared, rod, plane, i, matrix);
    const bent = matrix[2]! * height + matrix[3]! * angle;
    height = matrix[0]! * height + matrix[1]! * angle;
    angle = bent + (i === tilted ? turn : 0);
  }
  return [height, angle];
}

/** Height of the closed ray at the rod's power centroid, or at the start when there is no rod. */
function heightInRod(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  tilted: number,
  turn: number,
  start: Ray,
): number {
  if (!Number.isFinite(start[0])) return Infinity;
  const index = prepared.rods[0];
  if (index === undefined) return start[0];
  const [height, angle] = trace(prepared, rod, plane, tilted, turn, start, index);
  const matrix = identity();
  const element = prepared.cavity.elements[index]!;
  passRodTo(matrix, rod, plane, centroidDepth(element, rod, plane), prepared.reversed[0]!);
  return matrix[0]! * height + matrix[1]! * angle;
}
