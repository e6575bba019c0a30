import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dewPoint, saturationPressure } from '../../src/cooling';

const temperature = fc.double({ min: 240, max: 330, noNaN: true });
const humidity = fc.double({ min: 0, max: 1, noNaN: true });

describe('the dew point', () => {
  it('is never above the air and is the air itself when saturated', () => {
    fc.assert(fc.property(temperature, humidity, (t, rh) => dewPoint(t, rh) <= t));
    // 0.01 K: water and ice formulas do not meet exactly at 0 degC.
    fc.assert(fc.property(temperature, (t) => Math.abs(dewPoint(t, 1) - t) < 0.01));
  });

  it('rises with humidity', () => {
    fc.assert(
      fc.property(
        temperature,
        humidity,
        humidity,
        (t, a, b) => dewPoint(t, Math.min(a, b)) <= dewPoint(t, Math.max(a, b)),
      ),
    );
  });

  it('is finite in perfectly dry air', () => {
    expect(dewPoint(295, 0)).toBeGreaterThan(0);
    expect(dewPoint(295, 1e-300)).toBeGreaterThan(0);
  });

  it('has the vapour pressure of the air', () => {
    expect(saturationPressure(dewPoint(298.15, 0.5))).toBeCloseTo(0.5 * saturationPressure(298.15), 6);
  });
});
