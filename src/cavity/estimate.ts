import { thinLensZones } from './closed-forms';
import type { Plane, RodOptics } from './elements';
import type { PreparedCavity } from './prepare';
import { identity, multiply, reverse } from './ray-matrix';
import type { RayMatrix } from './ray-matrix';

/**
 * The estimate beside the computed zones: the rod as one thin lens at the centroid of its power (its principal
 * plane while the lens is weak), the rest of the cavity as it is, edges in closed form. What it leaves out is
 * that a long strong rod moves its own principal planes.
 *
 * @param rodShape only where its power lies matters
 * @returns the two zones in dioptric power, 1/m; null for a ring or when there is not exactly one rod with power
 * @source Magni, J. Opt. Soc. Am. A 4, 1962 (1987)
 */
export function estimateZones(
  prepared: PreparedCavity,
  rodShape: RodOptics,
  plane: Plane,
): [{ from: number; to: number }, { from: number; to: number }] | null {
  if (prepared.cavity.kind !== 'linear' || prepared.rods.length !== 1) return null;
  const depths = reducedDepths(rodShape, plane);
  if (depths === null) return null;
  const [entrance, exit] = prepared.reversed[0] ? [depths.back, depths.front] : [depths.front, depths.back];
  const { segments } = prepared.planes[plane];
  const left = vergences(segments.slice(0, 4), entrance);
  const right = vergences(reverse(segments.slice(4, 8)), exit);
  return thinLensZones(left, right);
}

/**
 * Vergence at a plane `distance` behind the optics of the rays from the mirror's centre of curvature (flat at
 * the middle of the mirror: C/A) and from its vertex (D/B).
 */
function vergences(fromMirror: RayMatrix, distance: number): [number, number] {
  const matrix = identity();
  multiply(Float64Array.of(1, distance, 0, 1), 0, fromMirror, 0, matrix, 0);
  return [matrix[2]! / matrix[0]!, matrix[3]! / matrix[1]!];
}

/** Reduced distance of the power's centroid from the front and the back face, m; null without power. */
function reducedDepths(rod: RodOptics, plane: Plane): { front: number; back: number } | null {
  const powers = rod.slicePowers[plane];
  let power = rod.frontPower[plane];
  let moment = 0;
  let depth = 0;
  for (let i = 0; i < powers.length; i++) {
    const reduced = rod.sliceLengths[i]! / rod.refractiveIndex;
    power += powers[i]!;
    moment += powers[i]! * (depth + reduced / 2);
    depth += reduced;
  }
  power += rod.backPower[plane];
  moment += rod.backPower[plane] * depth;
  if (power === 0) return null;
  return { front: moment / power, back: depth - moment / power };
}
