import { describe, expect, it } from 'vitest';
import { beamRadii, beamRadius, clippedShare, ringShares, shareWithin } from '../../src/pump';
import type { BeamProfile } from '../../src/pump';

const w = 200e-6;
const table: BeamProfile = { kind: 'table', radii: [0, 1e-4, 2e-4, 3e-4], intensities: [5, 4, 1, 0] };
const profiles: BeamProfile[] = [
  { kind: 'gaussian' },
  { kind: 'flat-top' },
  { kind: 'super-gaussian', order: 3 },
  table,
];

describe('power inside a radius', () => {
  it.each(profiles)('rises from none on the axis to all of it far out: $kind', (profile) => {
    let before = 0;
    for (let r = 0; r <= 2e-3; r += 1e-5) {
      const inside = shareWithin(profile, w, r);
      expect(inside).toBeGreaterThanOrEqual(before);
      before = inside;
    }
    expect(before).toBeCloseTo(1, 12);
    expect(shareWithin(profile, w, Infinity)).toBe(1);
  });

  it('of a super-Gaussian of order 1 is that of the Gaussian', () => {
    for (const r of [1e-6, 5e-5, 1e-4, 2e-4, 4e-4])
      expect(shareWithin({ kind: 'super-gaussian', order: 1 }, w, r)).toBeCloseTo(
        shareWithin({ kind: 'gaussian' }, w, r),
        13,
      );
  });

  it('of a super-Gaussian of order 2 is the error function of sqrt 2 x^2 (Abramowitz & Stegun 6.5.16, table 7.1)', () => {
    // 2 (r/w)^4 = 1: erf(1).
    const r = w * 0.5 ** 0.25;
    expect(shareWithin({ kind: 'super-gaussian', order: 2 }, w, r)).toBeCloseTo(0.8427007929, 10);
  });

  it('of a super-Gaussian is a number between 0 and 1 at any order and radius', () => {
    for (const order of [0.5, 1, 2.5, 5, 7, 20, 100])
      for (let r = 1e-6; r < 4e-3; r += 1e-6) {
        const inside = shareWithin({ kind: 'super-gaussian', order }, w, r);
        if (!(inside >= 0 && inside <= 1)) expect.fail(`order ${order}, r ${r}: ${inside}`);
      }
  });

  it('of a very high order super-Gaussian is that of a flat-top', () => {
    expect(shareWithin({ kind: 'super-gaussian', order: 400 }, w, 1e-4)).toBeCloseTo(0.25, 2);
  });

  it('of a super-Gaussian is the integral of exp(-2 (r/w)^2p)', () => {
    const order = 2.5;
    const power = (to: number) => {
      const n = 20_000;
      let sum = 0;
      for (let i = 0; i < n; i++) {
        const r = ((i + 0.5) * to) / n;
        sum += Math.exp(-2 * (r / w) ** (2 * order)) * r * (to / n);
      }
      return sum;
    };
    // The midpoint sum itself is good to 1e-9.
    expect(shareWithin({ kind: 'super-gaussian', order }, w, 1.5e-4)).toBeCloseTo(
      power(1.5e-4) / power(6e-4),
      8,
    );
  });

  it('of a finely sampled table is that of the shape sampled', () => {
    const radii = Array.from({ length: 801 }, (_, i) => i * 1e-6);
    const intensities = radii.map((r) => Math.exp((-2 * r * r) / (w * w)));
    // Linear pieces of 1 um on a 200 um Gaussian err by (h/w)^2, 2.5e-5.
    expect(shareWithin({ kind: 'table', radii, intensities }, w, w)).toBeCloseTo(1 - Math.exp(-2), 5);
  });

  it('of a table stretches with the beam where the measured radius is given', () => {
    const stretched: BeamProfile = { ...table, measuredRadius: w };
    expect(shareWithin(stretched, 2 * w, 2e-4)).toBeCloseTo(shareWithin(table, w, 1e-4), 14);
  });

  it('splits over rings without loss, and what misses the rod is reported', () => {
    const faces = Float64Array.from([0, 5e-5, 1.2e-4, 2.5e-4]);
    for (const profile of profiles) {
      const shares = ringShares(profile, faces, [w, 1.3 * w]);
      expect(shares).toHaveLength(6);
      const second = shares.subarray(3).reduce((sum, share) => sum + share, 0);
      expect(second + clippedShare(profile, 1.3 * w, 2.5e-4)).toBeCloseTo(1, 13);
    }
  });
});

describe('a focused pump beam', () => {
  const beam = {
    waistRadius: w,
    waistPosition: 1e-3,
    beamQuality: 40,
    wavelength: 808e-9,
    refractiveIndex: 1.82,
  };
  it('is narrowest at its waist and widens alike on both sides', () => {
    expect(beamRadius(1e-3, beam)).toBe(w);
    expect(beamRadius(3e-3, beam)).toBeCloseTo(beamRadius(-1e-3, beam), 15);
  });
  it('is sqrt 2 wider one Rayleigh length from the waist', () => {
    const rayleigh = (Math.PI * 1.82 * w * w) / (40 * 808e-9);
    expect(beamRadius(1e-3 + rayleigh, beam)).toBeCloseTo(w * Math.SQRT2, 12);
  });
  it('keeps its radius when collimated', () => {
    const radii = beamRadii(Float64Array.from([0, 1e-3, 5e-3]), { ...beam, beamQuality: null });
    expect([...radii]).toEqual([w, w]);
  });
});
