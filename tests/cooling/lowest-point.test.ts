import { describe, expect, it } from 'vitest';
import { lowestPoint } from '../../src/cooling/lowest-point';

describe('the lowest point', () => {
  it('of a parabola is its vertex', () => {
    expect(lowestPoint((x) => (x - 1.3) ** 2, 0, 5, 1e-6).x).toBeCloseTo(1.3, 5);
  });
  it('of a lopsided valley is found too', () => {
    expect(lowestPoint((x) => x - Math.log(x), 0.01, 50, 1e-6).x).toBeCloseTo(1, 5);
  });
  it('of a falling function is its far end, of a rising one its near end', () => {
    expect(lowestPoint((x) => -x, 0, 5, 1e-6)).toEqual({ x: 5, value: -5 });
    expect(lowestPoint((x) => x, 0, 5, 1e-6).x).toBeLessThan(1e-5);
  });
  it('is found beside a region without an answer', () => {
    expect(lowestPoint((x) => (x > 3 ? Infinity : (x - 2) ** 2), 0, 5, 1e-6).x).toBeCloseTo(2, 5);
    expect(lowestPoint((x) => (x > 0.3 ? Infinity : (x - 0.2) ** 2), 0, 50, 1e-6).x).toBeCloseTo(0.2, 5);
    expect(lowestPoint((x) => (x > 0.3 ? Infinity : -x), 0, 50, 1e-6).x).toBeCloseTo(0.3, 5);
  });
});
