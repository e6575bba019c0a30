import { describe, expect, it } from 'vitest';
import { NumericalError } from '../../src/errors';
import { findRoot } from '../../src/numerics/root';

describe('bracketed root', () => {
  it('finds the real root of x3 - 2x - 5, 2.0945514815423265 (Wallis 1685, Algebra, the classical example; from memory)', () => {
    // the default bracket width is 1e-12 of the larger end
    expect(findRoot((x) => x * x * x - 2 * x - 5, 2, 3)).toBeCloseTo(2.0945514815423265, 11);
  });

  it('finds the Dottie number cos x = x whichever way round the bracket is given (0.7390851332151607, OEIS A003957)', () => {
    const f = (x: number) => Math.cos(x) - x;
    expect(findRoot(f, 0, 1)).toBeCloseTo(0.7390851332151607, 11);
    expect(findRoot(f, 1, 0)).toBeCloseTo(0.7390851332151607, 11);
  });

  it('needs few evaluations on smooth functions and survives flat and jumping ones', () => {
    let count = 0;
    findRoot((x) => (count++, Math.exp(x) - 2), 0, 5);
    expect(count).toBeLessThan(16);
    expect(findRoot((x) => (x < 0.3 ? -1 : 1), 0, 1)).toBeCloseTo(0.3, 10);
    expect(Math.abs(findRoot((x) => x ** 9, -1, 1.7, { tolerance: 1e-3 }))).toBeLessThan(1e-3);
  });

  it('uses end values that are already known', () => {
    let count = 0;
    const root = findRoot((x) => (count++, x * x - 2), 1, 2, { fa: -1, fb: 2 });
    expect(root).toBeCloseTo(Math.SQRT2, 11);
    expect(count).toBeLessThan(10);
  });

  it('returns an end exactly when the function vanishes there', () => {
    expect(findRoot((x) => x, 0, 1)).toBe(0);
    expect(findRoot((x) => x - 1, 0, 1)).toBe(1);
  });

  it('refuses ends that bracket nothing, and functions that are not numbers, instead of answering', () => {
    expect(() => findRoot((x) => x * x + 1, -1, 1)).toThrow(NumericalError);
    expect(() => findRoot((x) => (x > 0.4 && x < 0.6 ? Number.NaN : x - 0.5), 0, 1)).toThrow(NumericalError);
    expect(() => findRoot((x) => x - 0.123, 0, 1e9, { maxIterations: 1 })).toThrow(NumericalError);
  });
});
