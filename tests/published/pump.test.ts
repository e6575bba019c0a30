import { describe, expect, it } from 'vitest';
import { caseWindow, diodeWavelength, shareWithin } from '../../src/pump';
import type { CaseWindowInput } from '../../src/pump';

const nm = 1e-9;

describe('diodes against values from memory', () => {
  // Drift 0.28 nm/K (808 nm type) and 0.05 nm/K (blue gallium nitride): from memory.
  it.each([
    { drift: 0.05, halfWidth: 20 },
    { drift: 0.28, halfWidth: 3.571 },
  ])('a window of +-1 nm is +-$halfWidth K at $drift nm/K', ({ drift, halfWidth }) => {
    // A thin absorber under a Lorentzian line of 6 nm keeps 1 / (1 + (2/6)^2) = 90 % at +-1 nm.
    const input: CaseWindowInput = {
      wavelength: 808 * nm,
      referenceTemperature: 298.15,
      drift: drift * nm,
      linewidth: 0,
      polarisationShares: { pi: 1, sigma: 0 },
      absorption: {
        kind: 'lines',
        ionDensity: 1e25,
        lines: [
          { polarisation: 'none', centre: 808 * nm, fwhm: 6 * nm, shape: 'lorentzian', crossSection: 1e-28 },
        ],
      },
      length: 5e-3,
      passes: 1,
      returnReflectivity: 0,
      shareOfBest: 0.9,
      search: { from: 253, to: 373 },
    };
    const { low, high, best } = caseWindow(input);
    // The maximum is flat, so the best is found to some 0.01 K; the ends are steep, 1e-3 K.
    expect(best!).toBeCloseTo(298.15, 1);
    expect(high! - 298.15).toBeCloseTo(halfWidth, 2);
    expect(298.15 - low!).toBeCloseTo(halfWidth, 2);
    expect(diodeWavelength(808 * nm, drift * nm, 298.15 + halfWidth, 298.15)).toBeCloseTo(809 * nm, 12);
  });
});

describe('beam radii against textbook definitions', () => {
  // ISO 11146 and Siegman, Lasers (1986): from memory.
  it('a Gaussian beam carries 86.47 % of its power inside its 1/e2 radius', () => {
    expect(shareWithin({ kind: 'gaussian' }, 1, 1)).toBeCloseTo(0.8646647, 7);
  });
  it('and half of it inside 0.5887 w', () => {
    expect(shareWithin({ kind: 'gaussian' }, 1, 0.588705)).toBeCloseTo(0.5, 6);
  });
});
