import { lagrangeWeights } from '../numerics/lagrange';
import { compose, interpolation, lineOperator, type LineOperator } from './line-operator';
import { quadraticSlopes, type QuadraticLine } from './quadratic-line';

/** From displacements at the nodes of a line to strains at its nodes. */
export interface SlopeOperators {
  /** d/dr of u_r, which is odd about the axis */
  acrossOdd: LineOperator;
  /** u_r / r; on the axis its limit, the slope */
  overRadius: LineOperator;
  /** d/dr of u_z, which is even about the axis */
  acrossEven: LineOperator;
  /** d/dz */
  along: LineOperator;
}

/**
 * Strains at the nodes by the cubic through the four nearest points where the derivative of a quadratic element is best:
 * one order more than the element's own derivative at its nodes, also on the axis and at the surfaces.
 */
export function slopeOperators(radialLine: QuadraticLine, axialLine: QuadraticLine): SlopeOperators {
  const across = bestSlopes(radialLine);
  const along = bestSlopes(axialLine);
  const { nodes } = radialLine;
  const smoothed = smoothedAtAxis(nodes);
  // The slope of an odd function is even, and the other way round.
  const acrossOdd = compose(interpolation(across.points, nodes, 'even'), compose(across.operator, smoothed));
  return {
    acrossOdd,
    overRadius: overRadius(nodes, acrossOdd, smoothed),
    acrossEven: compose(interpolation(across.points, nodes, 'odd'), across.operator),
    along: compose(interpolation(along.points, axialLine.nodes, 'none'), along.operator),
  };
}

/**
 * Takes u_r in the middle of the innermost element from the odd quintic through the element borders around it: borders
 * are more accurate than middles, and strain at the axis is a small displacement over a small radius.
 */
function smoothedAtAxis(nodes: Float64Array): LineOperator {
  const rows = Array.from(nodes, (_, i) => new Map([[i, 1]]));
  const borders = [2, 4, 6].filter((i) => i < nodes.length);
  // u_r / r is a polynomial in r^2.
  const squares = Float64Array.from(borders, (i) => nodes[i] ** 2);
  const weights = new Float64Array(borders.length);
  lagrangeWeights(nodes[1] ** 2, squares, 0, borders.length, weights);
  rows[1] = new Map(borders.map((i, k) => [i, (weights[k] * nodes[1]) / nodes[i]]));
  return lineOperator(rows);
}

function overRadius(nodes: Float64Array, slope: LineOperator, smoothed: LineOperator): LineOperator {
  const rowOf = (operator: LineOperator, i: number, factor: number) => {
    const row = new Map<number, number>();
    for (let s = operator.rowStart[i]; s < operator.rowStart[i + 1]; s++) {
      row.set(operator.columns[s], factor * operator.weights[s]);
    }
    return row;
  };
  return lineOperator(
    Array.from(nodes, (r, i) => (i === 0 ? rowOf(slope, 0, 1) : rowOf(smoothed, i, 1 / r))),
  );
}

/** Where the derivative of quadratic elements is most accurate (two per element), and the operator that takes it there. */
function bestSlopes(line: QuadraticLine): { points: Float64Array; operator: LineOperator } {
  const offset = 1 / Math.sqrt(3);
  const points = new Float64Array(2 * line.elements);
  const rows: Map<number, number>[] = [];
  for (let e = 0; e < line.elements; e++) {
    const half = (line.nodes[2 * e + 2] - line.nodes[2 * e]) / 2;
    for (const [k, xi] of [-offset, offset].entries()) {
      points[2 * e + k] = line.nodes[2 * e + 1] + half * xi;
      const slopes = quadraticSlopes(xi);
      rows.push(new Map(slopes.map((slope, a) => [2 * e + a, slope / half] as const)));
    }
  }
  return { points, operator: lineOperator(rows) };
}
