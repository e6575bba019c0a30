import { describe, expect, it } from 'vitest';
import { absorbedShare, axialDeposit, unabsorbedShares } from '../../src/pump';
import type { PumpChannel } from '../../src/pump';

const channel = (share: number, absorptionCoefficient: number): PumpChannel => ({
  share,
  absorptionCoefficient,
  wavelength: 808e-9,
  polarisation: 'none',
});
const mix = [channel(0.5, 900), channel(0.3, 120), channel(0.15, 0), channel(0.05, 2e5)];
const faces = Float64Array.from({ length: 41 }, (_, j) => 2e-3 + 10e-3 * (j / 40) ** 1.7);
const total = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0);

describe('light absorbed along the rod', () => {
  for (const passes of [1, 2] as const)
    for (const back of [0, 0.4, 1])
      it(`adds up over the cells to the absorbed share, ${passes} pass(es), ${back} of it from the back`, () => {
        const deposit = axialDeposit(mix, faces, passes, 0.97, undefined, back);
        // 1e-14: rounding of forty additions.
        expect(Math.abs(total(deposit) - absorbedShare(mix, 10e-3, passes, 0.97))).toBeLessThan(1e-14);
        expect(Math.min(...deposit)).toBeGreaterThanOrEqual(0);
      });

  it('is exact in every cell, however the rod is cut', () => {
    const coarse = axialDeposit(mix, Float64Array.from([faces[0]!, faces[20]!, faces[40]!]), 2, 0.9);
    const fine = axialDeposit(mix, faces, 2, 0.9);
    expect(total(fine.subarray(0, 20))).toBeCloseTo(coarse[0]!, 14);
  });

  it('mirrors when pumped from the other end', () => {
    const even = Float64Array.from({ length: 21 }, (_, j) => j * 5e-4);
    const front = axialDeposit(mix, even, 2, 0.9);
    const back = axialDeposit(mix, even, 2, 0.9, undefined, 1);
    back.reverse().forEach((value, j) => expect(value).toBeCloseTo(front[j]!, 14));
  });

  it('leaves the rod where it is not absorbed: every share is accounted for', () => {
    for (const passes of [1, 2] as const) {
      const { farEnd, entrance } = unabsorbedShares(mix, 10e-3, passes, 0.9);
      expect(farEnd + entrance + absorbedShare(mix, 10e-3, passes, 0.9)).toBeCloseTo(1, 14);
    }
  });

  it('grows with length, coefficient and a second pass', () => {
    const share = (alpha: number, length: number, passes: 1 | 2) =>
      absorbedShare([channel(1, alpha)], length, passes, 0.9);
    expect(share(300, 0.01, 1)).toBeLessThan(share(310, 0.01, 1));
    expect(share(300, 0.01, 1)).toBeLessThan(share(300, 0.011, 1));
    expect(share(300, 0.01, 1)).toBeLessThan(share(300, 0.01, 2));
  });

  it('reuses the array it is given', () => {
    const out = new Float64Array(40).fill(7);
    expect(axialDeposit(mix, faces, 1, 0, out)).toBe(out);
    expect(total(out)).toBeCloseTo(absorbedShare(mix, 10e-3, 1, 0), 13);
  });
});
