import { findRoot } from '../numerics/root';

/** Degree of the interpolant; 16 resolves a few oscillations, and the interval is halved until it does. */
const DEGREE = 16;
/** Coefficients left over, relative to the largest, below which the interpolant counts as the function. */
const RESOLVED = 1e-13;
/** Intervals are not halved below this share of the range: a root without change of sign there is a touch. */
const NARROWEST = 1e-9;

/** cos(pi j / DEGREE), the points from 1 down to -1. */
const points = Float64Array.from({ length: DEGREE + 1 }, (_, j) => Math.cos((Math.PI * j) / DEGREE));
/** cos(pi j k / DEGREE) at k * (DEGREE + 1) + j. */
const cosines = Float64Array.from({ length: (DEGREE + 1) ** 2 }, (_, i) => {
  const k = Math.floor(i / (DEGREE + 1));
  const j = i % (DEGREE + 1);
  return Math.cos((Math.PI * ((j * k) % (2 * DEGREE))) / DEGREE);
});

/**
 * Every real root at which an analytic function changes sign in an interval. The function is interpolated in
 * Chebyshev points and the interval halved until the interpolant has converged; its coefficients then show
 * whether it can vanish (|c0| against the sum of the others) and whether it is monotonic (the same for the
 * derivative). An interval is closed when it holds no root, or is monotonic and holds at most one, which is
 * bracketed and found by Brent's method. A root where the function only touches zero is not given.
 *
 * @param f analytic on the interval; sampled a few tens of times per root
 * @param rounding size below which values of f are rounding: an interval that holds nothing larger is not
 *   halved again, and coefficients below it count as none; it spares halving a place where f touches zero
 * @returns ascending
 * @source Boyd, Solving Transcendental Equations (2014), chapter 3; Trefethen, Approximation Theory and Approximation Practice (2013), chapter 18
 */
export function realRoots(f: (x: number) => number, from: number, to: number, rounding: number): number[] {
  const roots: number[] = [];
  const add = (root: number) => {
    const last = roots[roots.length - 1];
    if (last === undefined || root > last) roots.push(root);
  };
  const narrowest = NARROWEST * (to - from);
  const tolerance = Number.EPSILON * (to - from);
  const coefficients = new Float64Array(DEGREE + 1);
  const values = new Float64Array(DEGREE + 1);
  const search = (a: number, b: number) => {
    for (let j = 0; j <= DEGREE; j++) values[j] = f((a + b) / 2 + (points[j]! * (b - a)) / 2);
    interpolate(values, coefficients);
    const fa = values[DEGREE]!;
    const fb = values[0]!;
    const shape = shapeOf(coefficients, rounding);
    if (shape === 'no root') return;
    if (shape === 'monotonic' || shape === 'rounding' || b - a <= narrowest) {
      if (fa === 0) add(a);
      if (fa * fb < 0) add(findRoot(f, a, b, { tolerance, fa, fb }));
      if (fb === 0) add(b);
      return;
    }
    const middle = (a + b) / 2;
    search(a, middle);
    search(middle, b);
  };
  search(from, to);
  return roots;
}

/** Chebyshev coefficients of the interpolant through `values` at the points. */
function interpolate(values: Float64Array, coefficients: Float64Array): void {
  for (let k = 0; k <= DEGREE; k++) {
    const row = k * (DEGREE + 1);
    let sum = (values[0]! * cosines[row]! + values[DEGREE]! * cosines[row + DEGREE]!) / 2;
    for (let j = 1; j < DEGREE; j++) sum += values[j]! * cosines[row + j]!;
    coefficients[k] = ((k === 0 || k === DEGREE ? 1 : 2) * sum) / DEGREE;
  }
}

/** What the coefficients say of the function on its interval. */
function shapeOf(c: Float64Array, rounding: number): 'no root' | 'monotonic' | 'rounding' | 'unclear' {
  let others = 0;
  for (let k = 1; k <= DEGREE; k++) others += Math.abs(c[k]!);
  const largest = Math.abs(c[0]!) + others;
  if (largest === 0) return 'no root';
  if (largest < rounding) return 'rounding';
  const blur = RESOLVED * largest + rounding;
  if (Math.abs(c[DEGREE]!) + Math.abs(c[DEGREE - 1]!) + Math.abs(c[DEGREE - 2]!) > blur) return 'unclear';
  if (Math.abs(c[0]!) > others + blur) return 'no root';
  // Coefficients d of the derivative by the backward recurrence d[k-1] = d[k+1] + 2 k c[k].
  let later = 0;
  let current = 0;
  let slopes = 0;
  for (let k = DEGREE; k >= 1; k--) {
    const earlier = later + 2 * k * c[k]!;
    if (k > 1) slopes += Math.abs(earlier);
    later = current;
    current = earlier;
  }
  return Math.abs(current / 2) > slopes + blur * DEGREE ** 2 ? 'monotonic' : 'unclear';
}
