import type { RodGrid } from '../heat';
import { lagrangeStart, lagrangeWeights } from '../numerics/lagrange';

/** Points in each interval between neighbouring radial faces. */
export const stages = 3;

const root15 = Math.sqrt(15);

/** Weights of the three-point Gauss rule on 0 ... 1. */
export const stageWeights = [5 / 18, 4 / 9, 5 / 18] as const;

const stageNodes = [0.5 - root15 / 10, 0.5, 0.5 + root15 / 10] as const;

/**
 * Row q: integral from 0 to node q of the parabola through the three nodes, as weights of its values.
 * @source Butcher's table of the three-stage Gauss method; Hairer, Norsett & Wanner, Solving ODE I (from memory)
 */
export const partialWeights = [
  [5 / 36, 2 / 9 - root15 / 15, 5 / 36 - root15 / 30],
  [5 / 36 + root15 / 24, 2 / 9, 5 / 36 - root15 / 24],
  [5 / 36 + root15 / 30, 2 / 9 + root15 / 15, 5 / 36],
] as const;

/** Points over the cross-section at which optical path differences are known, prepared once for a grid. */
export interface LensGeometry {
  grid: RodGrid;
  /** r^2 of the points, m^2, ascending; three in each interval between radial faces. */
  squares: Float64Array;
  radii: Float64Array;
  /** Width of each interval in r^2, m^2. */
  widths: Float64Array;
  /** Face values to point values: point q uses faces faceIndex[4q + a] with weight faceShare[4q + a]; face f is the outer face of ring f. */
  faceIndex: Int32Array;
  faceShare: Float64Array;
  /** 1 / (difference of r^2) between the centres of rings f and f + 1, length nr - 1. */
  inverseGaps: Float64Array;
  /** Weights of the three innermost faces that give the value on the axis. */
  axis: Float64Array;
}

/**
 * Prepares the points: Gauss points in r^2 between faces, cubic interpolation in asinh(r/scale), even across the axis.
 * @param edge radius of a flat-top pump, m: the gradient has a kink there, so nothing is interpolated across it
 */
export function prepareLens(grid: RodGrid, edge?: number): LensGeometry {
  const { nr, faceSquares, centreSquares } = grid;
  const nodes = new Float64Array(nr + 2);
  for (let f = 0; f < nr; f++) nodes[f + 2] = Math.asinh(grid.radialFaces[f + 1]! / grid.radialScale);
  nodes[0] = -nodes[3]!;
  nodes[1] = -nodes[2]!;
  // First node outside the edge; four are needed on either side to interpolate, else the edge is ignored.
  const split = edge === undefined ? -1 : lagrangeStart(Math.asinh(edge / grid.radialScale), nodes, 0);
  const kink = edge !== undefined && split >= 4 && split <= nodes.length - 4 ? edge * edge : undefined;
  const knots = knotSquares(grid, kink);
  const count = (knots.length - 1) * stages;
  const squares = new Float64Array(count);
  const faceIndex = new Int32Array(4 * count);
  const faceShare = new Float64Array(4 * count);
  const widths = new Float64Array(knots.length - 1);
  const local = new Float64Array(4);
  for (let q = 0; q < count; q++) {
    const k = Math.floor(q / stages);
    widths[k] = knots[k + 1]! - knots[k]!;
    squares[q] = knots[k]! + widths[k]! * stageNodes[q % stages]!;
    const x = Math.asinh(Math.sqrt(squares[q]!) / grid.radialScale);
    let start = lagrangeStart(x, nodes, 4);
    if (kink !== undefined) start = squares[q]! < kink ? Math.min(start, split - 4) : Math.max(start, split);
    lagrangeWeights(x, nodes, start, 4, local);
    // Outside the edge the gradient falls as 1/r^2: there r^2 + scale^2 = (scale cosh x)^2 times it is interpolated.
    const outside = kink !== undefined && squares[q]! > kink;
    for (let a = 0; a < 4; a++) {
      const node = start + a - 2;
      const fall = outside ? (Math.cosh(nodes[start + a]!) / Math.cosh(x)) ** 2 : 1;
      faceIndex[4 * q + a] = node < 0 ? -1 - node : node;
      faceShare[4 * q + a] = local[a]! * fall;
    }
  }
  const inverseGaps = new Float64Array(nr - 1);
  for (let f = 0; f + 1 < nr; f++) inverseGaps[f] = 1 / (centreSquares[f + 1]! - centreSquares[f]!);
  const axis = new Float64Array(3);
  lagrangeWeights(0, faceSquares.subarray(1), 0, 3, axis);
  return { grid, squares, radii: squares.map(Math.sqrt), widths, faceIndex, faceShare, inverseGaps, axis };
}

/** The faces' r^2 and, among them, that of the edge. */
function knotSquares(grid: RodGrid, edgeSquare: number | undefined): Float64Array {
  if (edgeSquare === undefined) return grid.faceSquares;
  return Float64Array.from([...grid.faceSquares, edgeSquare]).sort();
}
