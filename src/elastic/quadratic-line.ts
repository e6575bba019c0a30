import { gaussLegendre } from '../numerics/quadrature';
import { lineOperator, type LineOperator } from './line-operator';

/** Integration points in each element of a line: exact for polynomials up to degree 7. */
const POINTS = 4;

/** Quadratic elements on one coordinate, with everything known at their integration points. */
export interface QuadraticLine {
  /** length 2 n + 1 */
  nodes: Float64Array;
  /** number of elements n */
  elements: number;
  /** integration points, POINTS in each element, ascending; length POINTS n */
  points: Float64Array;
  /** their weights, in the unit of the coordinate */
  pointWeights: Float64Array;
  /** the three shape functions at each point; length 3 POINTS n */
  shapes: Float64Array;
  /** their derivatives, 1 / unit of the coordinate */
  slopes: Float64Array;
}

/** Shape functions of one element at xi in -1..1, for the nodes at -1, 0, 1. */
export function quadraticShapes(xi: number): [number, number, number] {
  return [(xi * (xi - 1)) / 2, 1 - xi * xi, (xi * (xi + 1)) / 2];
}

/** Their derivatives with respect to xi. */
export function quadraticSlopes(xi: number): [number, number, number] {
  return [xi - 0.5, -2 * xi, xi + 0.5];
}

/** Tabulates shape functions at the integration points of every element. */
export function quadraticLine(nodes: Float64Array): QuadraticLine {
  const elements = (nodes.length - 1) / 2;
  const rule = gaussLegendre(POINTS);
  const count = elements * POINTS;
  const line: QuadraticLine = {
    nodes,
    elements,
    points: new Float64Array(count),
    pointWeights: new Float64Array(count),
    shapes: new Float64Array(3 * count),
    slopes: new Float64Array(3 * count),
  };
  for (let e = 0; e < elements; e++) {
    const half = (nodes[2 * e + 2] - nodes[2 * e]) / 2;
    for (let p = 0; p < POINTS; p++) {
      const g = e * POINTS + p;
      const xi = rule.nodes[p];
      line.points[g] = nodes[2 * e + 1] + half * xi;
      line.pointWeights[g] = half * rule.weights[p];
      const shapes = quadraticShapes(xi);
      const slopes = quadraticSlopes(xi);
      for (let a = 0; a < 3; a++) {
        line.shapes[3 * g + a] = shapes[a];
        line.slopes[3 * g + a] = slopes[a] / half;
      }
    }
  }
  return line;
}

/**
 * Matrix of integrals over a line, int A_i(x) B_k(x) x^power dx, with A and B shape functions or their derivatives.
 * Entry (i, k), |i - k| <= 2, is at 5*i + (k - i + 2).
 * @param power of the coordinate: 1 for an integral over rings, -1 for (u/r)(u/r) r
 */
export function lineMatrix(
  line: QuadraticLine,
  first: 'shape' | 'slope',
  second: 'shape' | 'slope',
  power: -1 | 0 | 1,
): Float64Array {
  const matrix = new Float64Array(5 * line.nodes.length);
  const A = first === 'shape' ? line.shapes : line.slopes;
  const B = second === 'shape' ? line.shapes : line.slopes;
  for (let g = 0; g < line.points.length; g++) {
    const node = 2 * Math.floor(g / POINTS);
    const weight = line.pointWeights[g] * line.points[g] ** power;
    for (let a = 0; a < 3; a++) {
      for (let b = 0; b < 3; b++) {
        matrix[5 * (node + a) + (b - a + 2)] += weight * A[3 * g + a] * B[3 * g + b];
      }
    }
  }
  return matrix;
}

/**
 * Operator from a field at the integration points to its integrals against every node's shape function or slope.
 * @param weightOf what the field is multiplied with, from coordinate, shape and slope of the node in question
 * @returns a row per node, a column per integration point
 */
export function lineLoad(
  line: QuadraticLine,
  weightOf: (x: number, shape: number, slope: number) => number,
): LineOperator {
  const rows = Array.from(line.nodes, () => new Map<number, number>());
  for (let g = 0; g < line.points.length; g++) {
    const node = 2 * Math.floor(g / POINTS);
    for (let a = 0; a < 3; a++) {
      const density = weightOf(line.points[g], line.shapes[3 * g + a], line.slopes[3 * g + a]);
      rows[node + a].set(g, line.pointWeights[g] * density);
    }
  }
  return lineOperator(rows);
}
