import { describe, expect, it } from 'vitest';
import { absorbedShare, caseWindow, pumpChannels } from '../../src/pump';
import type { CaseWindowInput, PumpLine } from '../../src/pump';

const nm = 1e-9;
const lines: PumpLine[] = [
  { polarisation: 'pi', centre: 808.7 * nm, fwhm: 1.8 * nm, shape: 'lorentzian', crossSection: 2.5e-23 },
  { polarisation: 'sigma', centre: 808.7 * nm, fwhm: 2.5 * nm, shape: 'lorentzian', crossSection: 7e-24 },
  { polarisation: 'none', centre: 888 * nm, fwhm: 3.5 * nm, shape: 'lorentzian', crossSection: 2e-24 },
];
const input: CaseWindowInput = {
  wavelength: 806.1 * nm,
  referenceTemperature: 298.15,
  drift: 0.28 * nm,
  linewidth: 2 * nm,
  polarisationShares: { pi: 0.5, sigma: 0.5 },
  absorption: { kind: 'lines', lines, ionDensity: 3.7e25 },
  length: 8e-3,
  passes: 1,
  returnReflectivity: 0,
  shareOfBest: 0.9,
  search: { from: 253, to: 373 },
};
const absorbedAtCase = (t: number, of: CaseWindowInput = input) =>
  absorbedShare(
    pumpChannels(
      { centre: of.wavelength + of.drift * (t - of.referenceTemperature), linewidth: of.linewidth },
      of.polarisationShares,
      of.absorption,
    ),
    of.length,
    of.passes,
    of.returnReflectivity,
  );

describe('the case temperatures that suit a diode', () => {
  it('centre on the one that brings the diode onto the line', () => {
    const { best, low, high } = caseWindow(input);
    expect(best).toBeCloseTo(298.15 + 2.6 / 0.28, 1);
    expect(best! - low!).toBeCloseTo(high! - best!, 1);
  });

  it('end where the absorption has fallen to the stated share of its best', () => {
    const { low, high, bestShare } = caseWindow(input);
    // Ends are found to 1e-3 K, where absorption changes by some 2e-5.
    expect(absorbedAtCase(low!)).toBeCloseTo(0.9 * bestShare, 4);
    expect(absorbedAtCase(high!)).toBeCloseTo(0.9 * bestShare, 4);
  });

  it('are colder for a bin of longer wavelength', () => {
    const longer = caseWindow({ ...input, wavelength: 811 * nm });
    expect(longer.best!).toBeCloseTo(298.15 - 2.3 / 0.28, 1);
  });

  it('have no bound where the range ends before the absorption falls', () => {
    const slow = caseWindow({ ...input, drift: 0.0005 * nm });
    expect(slow.low).toBeNull();
    expect(slow.high).toBeNull();
    expect(slow.best).toBe(373);
  });

  it('find the line even when the diode starts far off it', () => {
    const off = caseWindow({ ...input, wavelength: 790 * nm, search: { from: 253, to: 373 } });
    expect(off.best!).toBeCloseTo(298.15 + 18.7 / 0.28, 1);
  });

  it('do not exist where the absorption is one entered coefficient or the diode does not drift', () => {
    const none = { low: null, high: null, best: null };
    expect(caseWindow({ ...input, absorption: { kind: 'coefficient', coefficient: 450 } })).toMatchObject(
      none,
    );
    expect(caseWindow({ ...input, drift: 0 })).toMatchObject(none);
  });

  it('widen with a longer rod and with a second pass', () => {
    const width = (of: CaseWindowInput) => {
      const { low, high } = caseWindow(of);
      return high! - low!;
    };
    expect(width({ ...input, length: 12e-3 })).toBeGreaterThan(width(input));
    expect(width({ ...input, passes: 2, returnReflectivity: 0.98 })).toBeGreaterThan(width(input));
  });
});
