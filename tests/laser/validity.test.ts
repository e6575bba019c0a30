import { describe, expect, it } from 'vitest';
import { laserWarnings, peakExcitedShare, pumpRings, pumpSecondMomentRadius } from '../../src/laser';
import type { LaserInput } from '../../src/laser';

const good: LaserInput = {
  absorbedPower: 10,
  pumpWavelength: 808e-9,
  laserWavelength: 1064e-9,
  emissionCrossSection: 1.14e-22,
  upperLifetime: 90e-6,
  pumpQuantumEfficiency: 1,
  pump: pumpRings({ kind: 'gaussian' }, 2e-4, 1.5e-3),
  modeRadius: 1.8e-4,
  outputTransmission: 0.05,
  otherLoss: 0.01,
  rodPasses: 2,
  reabsorption: null,
};

describe('the laser model in its range', () => {
  it('says nothing about a well matched mode', () => {
    expect(laserWarnings(good, 0.02)).toEqual([]);
    expect(laserWarnings(good, null)).toEqual([]);
  });
  it('warns of higher modes and of a bleached pump', () => {
    expect(laserWarnings({ ...good, modeRadius: 1e-4 }, null)[0]!.text).toContain('higher transverse modes');
    expect(laserWarnings(good, 0.3)[0]!.text).toContain('30 % of the ions');
  });
});

describe('the radius of the absorbed pump', () => {
  it('is the edge of a flat-top', () => {
    // The face at the edge is found to 1e-12 of the share.
    expect(pumpSecondMomentRadius(pumpRings({ kind: 'flat-top' }, 2e-4, 1.5e-3))).toBeCloseTo(2e-4, 9);
  });
  it('is the 1/e2 radius of a Gaussian', () => {
    // The outermost ring (1e-5 of the light) is taken as even out to the rod surface, where r^2 is 50 times larger.
    expect(Math.abs(pumpSecondMomentRadius(good.pump) / 2e-4 - 1)).toBeLessThan(1e-3);
  });
});

describe('the excited share of the ions', () => {
  it('is lifetime times excitation rate over ion density', () => {
    // 10 W in 1 mm^3 at 808 nm: 4.07e28 photons per m^3 and s (hand calculation).
    expect(peakExcitedShare(good, 1e10, 1e26)).toBeCloseTo((4.0675e28 * 90e-6) / 1e26, 5);
  });
});
