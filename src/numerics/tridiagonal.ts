import { NumericalError } from '../errors';

/**
 * Solves a tridiagonal system by elimination without exchange of rows, for diagonally dominant matrices.
 *
 * Row p reads below[p] x[p-1] + diagonal[p] x[p] + above[p] x[p+1] = right[p]; below[0] and above[last] are not read.
 *
 * @returns the solution, a new array
 * @throws NumericalError when a pivot vanishes
 * @source Thomas's algorithm; Golub & Van Loan, Matrix Computations, section 4.3 (from memory)
 */
export function solveTridiagonal(
  below: Float64Array,
  diagonal: Float64Array,
  above: Float64Array,
  right: Float64Array,
): Float64Array {
  const size = diagonal.length;
  const x = Float64Array.from(right);
  const ratio = new Float64Array(size);
  let pivot = diagonal[0]!;
  for (let p = 0; ; p++) {
    if (!(Math.abs(pivot) > 0)) throw new NumericalError('tridiagonal solve: vanishing pivot', pivot, p);
    ratio[p] = above[p]! / pivot;
    x[p] = (x[p]! - (p > 0 ? below[p]! * x[p - 1]! : 0)) / pivot;
    if (p + 1 === size) break;
    pivot = diagonal[p + 1]! - below[p + 1]! * ratio[p]!;
  }
  for (let p = size - 2; p >= 0; p--) x[p] = x[p]! - ratio[p]! * x[p + 1]!;
  return x;
}

/** Eigenvalues in ascending order and orthonormal eigenvectors; vector m at m*size ... m*size + size - 1. */
export interface TridiagonalEigen {
  values: Float64Array;
  vectors: Float64Array;
}

/**
 * All eigenvalues and eigenvectors of a symmetric tridiagonal matrix, by implicit QL steps with Wilkinson's shift.
 *
 * @param diagonal main diagonal, length size
 * @param beside entries beside the diagonal, length size - 1
 * @throws NumericalError when an eigenvalue takes more than 60 steps
 * @source Golub & Van Loan, Matrix Computations, section 8.3; Wilkinson & Reinsch 1971 (from memory)
 */
export function eigenTridiagonal(diagonal: Float64Array, beside: Float64Array): TridiagonalEigen {
  const size = diagonal.length;
  const d = Float64Array.from(diagonal);
  const e = new Float64Array(size);
  e.set(beside.subarray(0, size - 1));
  const vectors = new Float64Array(size * size);
  for (let m = 0; m < size; m++) vectors[m * size + m] = 1;
  for (let low = 0; low < size; low++) {
    for (let steps = 0; ; steps++) {
      let high = low;
      while (high < size - 1 && !isNegligible(e[high]!, d[high]!, d[high + 1]!)) high++;
      if (high === low) break;
      if (steps === 60) throw new NumericalError('eigenvalues of a tridiagonal matrix', e[low]!, low);
      qlStep(d, e, vectors, low, high);
    }
  }
  return sorted(d, vectors);
}

function isNegligible(beside: number, a: number, b: number): boolean {
  return Math.abs(beside) <= Number.EPSILON * (Math.abs(a) + Math.abs(b));
}

/** One implicit QL sweep from row `high` up to row `low`; rotates the vectors along. */
function qlStep(d: Float64Array, e: Float64Array, vectors: Float64Array, low: number, high: number): void {
  const size = d.length;
  let g = (d[low + 1]! - d[low]!) / (2 * e[low]!);
  g = d[high]! - d[low]! + e[low]! / (g + (g >= 0 ? Math.hypot(g, 1) : -Math.hypot(g, 1)));
  let sine = 1;
  let cosine = 1;
  let p = 0;
  for (let i = high - 1; i >= low; i--) {
    const f = sine * e[i]!;
    const b = cosine * e[i]!;
    const r = Math.hypot(f, g);
    e[i + 1] = r;
    if (r === 0) {
      d[i + 1] = d[i + 1]! - p;
      e[high] = 0;
      return;
    }
    sine = f / r;
    cosine = g / r;
    g = d[i + 1]! - p;
    const t = (d[i]! - g) * sine + 2 * cosine * b;
    p = sine * t;
    d[i + 1] = g + p;
    g = cosine * t - b;
    for (let k = 0; k < size; k++) {
      const upper = vectors[(i + 1) * size + k]!;
      const own = vectors[i * size + k]!;
      vectors[(i + 1) * size + k] = sine * own + cosine * upper;
      vectors[i * size + k] = cosine * own - sine * upper;
    }
  }
  d[low] = d[low]! - p;
  e[low] = g;
  e[high] = 0;
}

function sorted(d: Float64Array, vectors: Float64Array): TridiagonalEigen {
  const size = d.length;
  const order = Array.from(d.keys()).sort((a, b) => d[a]! - d[b]!);
  const out = new Float64Array(size * size);
  order.forEach((from, to) => out.set(vectors.subarray(from * size, (from + 1) * size), to * size));
  return { values: Float64Array.from(order, (from) => d[from]!), vectors: out };
}
