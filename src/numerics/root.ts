import { NumericalError } from '../errors';

/** How close to go, and values at the ends of the bracket that are already known. */
export interface RootOptions {
  /** Width of the final bracket, in the unit of the unknown; rounding of the root is added to it. */
  tolerance?: number;
  /** Largest number of steps. */
  maxIterations?: number;
  /** f(a), if it is already known. */
  fa?: number;
  /** f(b), if it is already known. */
  fb?: number;
}

/**
 * The x between a and b at which f(x) = 0: inverse quadratic interpolation and secant steps, kept inside a
 * bracket that halves whenever they would be slow.
 *
 * @param f continuous function with values of opposite sign at a and b
 * @param a one end of the bracket
 * @param b other end of the bracket, on either side of a
 * @returns the root; exactly a or b when f vanishes there
 * @throws NumericalError when the ends do not bracket a root, when f is not a number, or after too many steps
 * @source Brent 1973, Algorithms for Minimization without Derivatives, chapter 4 (from memory)
 */
export function findRoot(f: (x: number) => number, a: number, b: number, options: RootOptions = {}): number {
  const { tolerance = 1e-12 * Math.max(Math.abs(a), Math.abs(b)), maxIterations = 100 } = options;
  // best: the end with the smaller |f|; other: the opposite end of the bracket; last: the previous best.
  let best = b;
  let fBest = options.fb ?? f(b);
  let other = a;
  let fOther = options.fa ?? f(a);
  if (fOther === 0) return a;
  if (fBest === 0) return b;
  if (!(fOther * fBest < 0)) throw new NumericalError('root: the ends do not bracket a root', fBest);
  let last = other;
  let fLast = fOther;
  let step = best - other;
  let stepBefore = step;
  for (let iteration = 0; iteration < maxIterations; iteration++) {
    if (fBest * fOther > 0) {
      other = last;
      fOther = fLast;
      step = stepBefore = best - last;
    }
    if (Math.abs(fOther) < Math.abs(fBest)) {
      last = best;
      best = other;
      other = last;
      fLast = fBest;
      fBest = fOther;
      fOther = fLast;
    }
    const smallest = 2 * Number.EPSILON * Math.abs(best) + 0.5 * tolerance;
    const half = 0.5 * (other - best);
    if (Math.abs(half) <= smallest || fBest === 0) return best;
    const trial = interpolatedStep(best, fBest, last, fLast, other, fOther);
    if (Math.abs(stepBefore) >= smallest && isAcceptable(trial, half, smallest, stepBefore)) {
      stepBefore = step;
      step = trial;
    } else {
      step = stepBefore = half;
    }
    last = best;
    fLast = fBest;
    best += Math.abs(step) > smallest ? step : Math.sign(half) * smallest;
    fBest = f(best);
    if (Number.isNaN(fBest)) throw new NumericalError('root: the function is not a number', fBest);
  }
  throw new NumericalError('root: too many steps', fBest);
}

/** Step from `best` by inverse quadratic interpolation, or by the secant when only two points differ. */
function interpolatedStep(
  best: number,
  fBest: number,
  last: number,
  fLast: number,
  other: number,
  fOther: number,
): number {
  if (Math.abs(fLast) <= Math.abs(fBest)) return Number.NaN;
  const s = fBest / fLast;
  if (last === other) return ((other - best) * s) / (s - 1);
  const q = fLast / fOther;
  const t = fBest / fOther;
  const numerator = s * ((other - best) * q * (q - t) - (best - last) * (t - 1));
  return -numerator / ((q - 1) * (t - 1) * (s - 1));
}

/** A trial step is taken only when it stays well inside the bracket and halves the step before the last. */
function isAcceptable(trial: number, half: number, smallest: number, stepBefore: number): boolean {
  if (Number.isNaN(trial) || trial * half < 0) return false;
  return (
    Math.abs(trial) < 1.5 * Math.abs(half) - 0.5 * smallest && Math.abs(trial) < 0.5 * Math.abs(stepBefore)
  );
}
