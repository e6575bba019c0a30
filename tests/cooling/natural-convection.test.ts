import { describe, expect, it } from 'vitest';
import { outerFaceNusselt, parallelPlateNusselt } from '../../src/cooling/natural-convection';

describe('natural convection', () => {
  it('on outer faces grows without a step from laminar to turbulent flow', () => {
    let last = outerFaceNusselt(1, 0.71);
    for (let rayleigh = 1.1; rayleigh < 1e12; rayleigh *= 1.1) {
      const next = outerFaceNusselt(rayleigh, 0.71);
      expect(next).toBeGreaterThan(last);
      expect(next).toBeLessThan(1.08 * last);
      last = next;
    }
  });

  it('in narrow channels goes with El/24, in wide ones as on a single plate', () => {
    expect(parallelPlateNusselt(0)).toBe(0);
    expect(parallelPlateNusselt(0.01)).toBeCloseTo(0.01 / 24, 6);
    expect(parallelPlateNusselt(1e6) / 1e6 ** 0.25).toBeCloseTo(1 / Math.sqrt(2.873), 4);
  });
});
