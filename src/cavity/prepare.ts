import type { Cavity, Plane, RodOptics } from './elements';
import type { RayMatrix } from './ray-matrix';
import { elementMatrix, identity, multiply } from './ray-matrix';
import { passRod } from './rod-matrix';

/** What one plane needs to be asked again and again. */
interface PreparedPlane {
  /** Matrix of each element passed once, element i at 4 i; end mirrors of a linear cavity with half their power. */
  steps: RayMatrix;
  /** Everything before, between and after the rods multiplied up, segment i at 4 i; one more than there are rods. */
  segments: RayMatrix;
}

/** A cavity with all matrices that do not depend on the rod's optics multiplied once. */
export interface PreparedCavity {
  cavity: Cavity;
  /** Index of each rod among the elements. */
  rods: number[];
  /** Whether the back face of each rod is met first. */
  reversed: boolean[];
  planes: Record<Plane, PreparedPlane>;
}

/**
 * Multiplies up everything that does not change with the rod, so that one stability costs one pass through
 * the rod's slices and a handful of products.
 *
 * @throws Error when a linear cavity does not stand between two end mirrors at normal incidence
 */
export function prepareCavity(cavity: Cavity): PreparedCavity {
  const { elements } = cavity;
  if (cavity.kind === 'linear') {
    const ends = [elements[0], elements[elements.length - 1]];
    if (elements.length < 2 || !ends.every((end) => end?.kind === 'mirror' && end.incidence === 0)) {
      throw new Error('prepareCavity: a linear cavity stands between two mirrors at normal incidence');
    }
  }
  const rods: number[] = [];
  const reversed: boolean[] = [];
  elements.forEach((element, index) => {
    if (element.kind !== 'rod') return;
    rods.push(index);
    reversed.push(element.reversed === true);
  });
  const planes = {
    sagittal: preparePlane(cavity, 'sagittal'),
    tangential: preparePlane(cavity, 'tangential'),
  };
  return { cavity, rods, reversed, planes };
}

function preparePlane(cavity: Cavity, plane: Plane): PreparedPlane {
  const { elements, kind } = cavity;
  const last = elements.length - 1;
  const steps = new Float64Array(4 * elements.length);
  const rodCount = elements.filter((element) => element.kind === 'rod').length;
  const segments = new Float64Array(4 * (rodCount + 1));
  const running = identity();
  let segment = 0;
  elements.forEach((element, index) => {
    const atEnd = kind === 'linear' && (index === 0 || index === last);
    const step = elementMatrix(element, plane, atEnd ? 0.5 : 1);
    steps.set(step, 4 * index);
    if (element.kind === 'rod') {
      segments.set(running, 4 * segment++);
      running.set(identity());
    } else {
      multiply(step, 0, running, 0, running, 0);
    }
  });
  segments.set(running, 4 * segment);
  return { steps, segments };
}

/** Written and read within one call of {@link tripMatrix}, so that the hot path allocates nothing. */
const rodScratch = identity();

/**
 * Matrix of the trip through the elements in their order. Ring: the round trip. Linear: from the middle of
 * the first mirror to the middle of the last, each giving half its power; with A, B, C, D of this one-way trip
 * the round trip has m = A D + B C, so 1 + m = 2 A D and 1 - m = -2 B C.
 *
 * @param scale factor on the rod's powers
 * @param out receives A, B, C, D
 * @source Siegman, Lasers (1986), section 21 (half-trip of a standing-wave cavity); Magni, J. Opt. Soc. Am. A 4, 1962 (1987)
 */
export function tripMatrix(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  scale: number,
  out: RayMatrix,
): void {
  const { segments } = prepared.planes[plane];
  const count = prepared.rods.length;
  for (let i = 0; i < 4; i++) out[i] = segments[i]!;
  if (count === 0) return;
  if (count === 1 && !prepared.reversed[0]) {
    passRod(out, rod, plane, scale);
    multiply(segments, 4, out, 0, out, 0);
    return;
  }
  rodScratch[0] = rodScratch[3] = 1;
  rodScratch[1] = rodScratch[2] = 0;
  passRod(rodScratch, rod, plane, scale);
  for (let k = 0; k < count; k++) {
    if (prepared.reversed[k]) swapEnds(rodScratch);
    multiply(rodScratch, 0, out, 0, out, 0);
    if (prepared.reversed[k]) swapEnds(rodScratch);
    multiply(segments, 4 * (k + 1), out, 0, out, 0);
  }
}

/** Turns a matrix into that of the same optics passed the other way, in place. */
function swapEnds(matrix: RayMatrix): void {
  const a = matrix[0]!;
  matrix[0] = matrix[3]!;
  matrix[3] = a;
}

/** Half the trace of the round trip from the trip's matrix. */
export function halfTrace(kind: Cavity['kind'], trip: RayMatrix): number {
  if (kind === 'linear') return trip[0]! * trip[3]! + trip[1]! * trip[2]!;
  return (trip[0]! + trip[3]!) / 2;
}
