import { findRoot } from './root';

/**
 * Radii b sinh((i + 1/2) h), i = 0 ... count - 1, that are equidistant near the axis, grow geometrically far from it,
 * reach `outer` at b sinh(count h), and of which one lies exactly at a given radius.
 */
export interface AnchoredRadii {
  /** b, m. */
  scale: number;
  /** h. */
  step: number;
  radii: Float64Array;
}

/**
 * Grades radii so that the innermost `inside` cells and half the next lie within `anchor`.
 *
 * @param count number of radii
 * @param outer end of the range, m
 * @param anchor radius that one of the radii shall hit, m; an anchor too near `outer` to be hit gives equal spacing
 * @param inside wanted number of radii below the anchor; raised where the spacing would otherwise shrink outwards
 */
export function anchoredRadii(count: number, outer: number, anchor: number, inside: number): AnchoredRadii {
  const smallestStep = 1e-3;
  const ratio = anchor / outer;
  const index = Math.max(inside, Math.floor(ratio * count + 0.5));
  let step = smallestStep;
  const excess = (h: number) => Math.sinh((index + 0.5) * h) / Math.sinh(count * h) - ratio;
  if (index < count && excess(smallestStep) > 0) {
    // sinh(x)/sinh(y) falls below exp(x - y), so this step is beyond the root.
    const largest = Math.max(1, -Math.log(ratio) / (count - index - 0.5)) * 1.01 + smallestStep;
    step = findRoot(excess, smallestStep, largest, { tolerance: 1e-14 });
  }
  const scale = outer / Math.sinh(count * step);
  const radii = Float64Array.from({ length: count }, (_, i) => scale * Math.sinh((i + 0.5) * step));
  if (step > smallestStep) radii[index] = anchor;
  return { scale, step, radii };
}

/** A place towards which a grid is graded: cell size proportional to sqrt(size^2 + distance^2). */
export interface Attractor {
  at: number;
  /** Distance within which the cells stay equal, m. */
  size: number;
}

/** Number of cells, on an arbitrary scale, that the attractors ask for between two places. */
export function cellDemand(from: number, to: number, attractors: readonly Attractor[]): number {
  let demand = 0;
  for (const { at, size } of attractors)
    demand += Math.asinh((to - at) / size) - Math.asinh((from - at) / size);
  return demand;
}

/**
 * Faces of `count` cells from `from` to `to`, each of equal demand, written into `faces` from `offset` on.
 * @param faces receives count + 1 numbers, the first `from`, the last `to`
 */
export function gradeFaces(
  faces: Float64Array,
  offset: number,
  count: number,
  from: number,
  to: number,
  attractors: readonly Attractor[],
): void {
  const total = cellDemand(from, to, attractors);
  faces[offset] = from;
  for (let k = 1; k < count; k++) {
    const wanted = (total * k) / count;
    const start = faces[offset + k - 1]!;
    faces[offset + k] = findRoot((z) => cellDemand(from, z, attractors) - wanted, start, to, {
      tolerance: 1e-9 * (to - from),
    });
  }
  faces[offset + count] = to;
}

/** The mean at which a two-point difference is exact for 1, s and ln s alike: (b - a) / ln(b / a). */
export function logarithmicMean(a: number, b: number): number {
  const x = (b - a) / a;
  // Series of x / ln(1 + x) where the quotient would lose digits.
  return Math.abs(x) < 1e-4 ? a * (1 + x / 2 - (x * x) / 12) : (b - a) / Math.log1p(x);
}
