import { describe, expect, it } from 'vitest';
import { absorptionWarnings, clippingWarnings } from '../../src/pump';
import type { AbsorptionModel } from '../../src/pump';

const absorption: AbsorptionModel = {
  kind: 'lines',
  ionDensity: 1e26,
  lines: [{ polarisation: 'none', centre: 808e-9, fwhm: 2e-9, shape: 'lorentzian', crossSection: 1e-23 }],
};

describe('the pump model in its range', () => {
  it('says nothing while the diode is on a line or the coefficient is entered', () => {
    expect(absorptionWarnings({ centre: 805e-9, linewidth: 2e-9 }, absorption)).toEqual([]);
    expect(
      absorptionWarnings({ centre: 700e-9, linewidth: 2e-9 }, { kind: 'coefficient', coefficient: 400 }),
    ).toEqual([]);
  });
  it('warns when the diode is far in the wings of every line', () => {
    expect(absorptionWarnings({ centre: 780e-9, linewidth: 2e-9 }, absorption)[0]!.text).toContain(
      '780.0 nm',
    );
  });
  it('warns when light misses the rod', () => {
    expect(clippingWarnings({ kind: 'gaussian' }, 2e-4, 1.5e-3)).toEqual([]);
    // 1 - exp(-2 x 1) = 13.5 % outside the 1/e2 radius.
    expect(clippingWarnings({ kind: 'gaussian' }, 1e-3, 1e-3)[0]!.text).toContain('13.5 %');
  });
});
