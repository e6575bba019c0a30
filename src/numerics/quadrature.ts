import { eigenTridiagonal } from './tridiagonal';

/** Abscissae in ascending order and their weights. */
export interface Quadrature {
  nodes: Float64Array;
  weights: Float64Array;
}

/**
 * Gauss-Hermite rule: the integral of f(x) exp(-x^2) over all x is the sum of weight * f(node), exact for
 * polynomials up to degree 2*count - 1. The weights sum to the square root of pi.
 *
 * @source Golub & Welsch, Math. Comp. 23, 221 (1969): nodes are the eigenvalues of the recurrence matrix (from memory)
 */
export function gaussHermite(count: number): Quadrature {
  return golubWelsch(count, (k) => Math.sqrt(k / 2), Math.sqrt(Math.PI));
}

/**
 * Gauss-Legendre rule on -1 ... 1: the integral of f(x) is the sum of weight * f(node), exact for polynomials up to
 * degree 2*count - 1. The weights sum to 2.
 *
 * @source Golub & Welsch, Math. Comp. 23, 221 (1969) (from memory)
 */
export function gaussLegendre(count: number): Quadrature {
  return golubWelsch(count, (k) => k / Math.sqrt(4 * k * k - 1), 2);
}

/** Nodes and weights for a symmetric weight function whose recurrence has the given off-diagonal and total weight. */
function golubWelsch(count: number, beside: (k: number) => number, total: number): Quadrature {
  const offDiagonal = Float64Array.from({ length: Math.max(0, count - 1) }, (_, k) => beside(k + 1));
  const { values, vectors } = eigenTridiagonal(new Float64Array(count), offDiagonal);
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let m = 0; m < count; m++) {
    // The rule is symmetric about zero; averaging the two halves keeps it so to the last digit.
    const twin = count - 1 - m;
    nodes[m] = (values[m]! - values[twin]!) / 2;
    weights[m] = (total * (vectors[m * count]! ** 2 + vectors[twin * count]! ** 2)) / 2;
  }
  return { nodes, weights };
}
