import { describe, expect, it } from 'vitest';
import { axialDeposit, beamRadii, pumpChannels, ringShares } from '../../src/pump';
import type { BeamProfile } from '../../src/pump';
import {
  combineRings,
  flatTopOverlap,
  gaussianOverlap,
  overlapFaces,
  pumpRings,
  ringOverlap,
} from '../../src/laser';

describe('overlap of pump and mode', () => {
  it.each([0.3, 0.7, 1, 1.5, 4])(
    'of two Gaussians on rings is the closed form, mode %d times the pump',
    (ratio) => {
      const rings = pumpRings({ kind: 'gaussian' }, 2e-4, 1.5e-3);
      // Even density per ring errs with the square of the ring's share, a hundred of them.
      expect(
        Math.abs(ringOverlap(rings, ratio * 2e-4) / gaussianOverlap(2e-4, ratio * 2e-4) - 1),
      ).toBeLessThan(3e-4);
    },
  );

  it.each([0.3, 0.7, 1, 1.5, 4])(
    'of a flat-top on rings is the closed form, mode %d times the pump',
    (ratio) => {
      const rings = pumpRings({ kind: 'flat-top' }, 2e-4, 1.5e-3);
      // A flat-top is even in every ring: only the edge, found to 1e-12 of the share, and rounding remain.
      expect(
        Math.abs(ringOverlap(rings, ratio * 2e-4) / flatTopOverlap(2e-4, ratio * 2e-4) - 1),
      ).toBeLessThan(1e-8);
    },
  );

  it('falls fourfold where the rings are twice as many', () => {
    const error = (count: number) =>
      Math.abs(
        ringOverlap(pumpRings({ kind: 'gaussian' }, 2e-4, 1.5e-3, count), 2e-4) /
          gaussianOverlap(2e-4, 2e-4) -
          1,
      );
    expect(error(25) / error(50)).toBeGreaterThan(3);
    expect(error(25) / error(50)).toBeLessThan(5);
  });

  it('of a diverging beam is the deposit-weighted mean along the rod', () => {
    const profile: BeamProfile = { kind: 'gaussian' };
    const axial = Float64Array.from({ length: 31 }, (_, j) => (j * 1e-2) / 30);
    const beam = {
      waistRadius: 2e-4,
      waistPosition: 1e-3,
      beamQuality: 40,
      wavelength: 808e-9,
      refractiveIndex: 1.82,
    };
    const radii = beamRadii(axial, beam);
    const channels = pumpChannels(
      { centre: 808e-9, linewidth: 0 },
      { pi: 1, sigma: 0 },
      { kind: 'coefficient', coefficient: 300 },
    );
    const deposit = axialDeposit(channels, axial, 1, 0);
    const faces = overlapFaces(profile, radii, 1.5e-3);
    const rings = combineRings(faces, ringShares(profile, faces, radii), deposit);
    let expected = 0;
    let total = 0;
    radii.forEach((w, j) => {
      expected += deposit[j]! * gaussianOverlap(w, 2e-4);
      total += deposit[j]!;
    });
    expect(Math.abs(ringOverlap(rings, 2e-4) / (expected / total) - 1)).toBeLessThan(3e-4);
  });

  it('has faces that ascend from the axis to the rod surface', () => {
    for (const profile of [
      { kind: 'gaussian' },
      { kind: 'flat-top' },
      { kind: 'super-gaussian', order: 4 },
    ] as const) {
      const faces = overlapFaces(profile, [1e-4, 2e-4], 1.5e-3);
      expect(faces[0]).toBe(0);
      expect(faces[faces.length - 1]).toBe(1.5e-3);
      for (let i = 1; i < faces.length; i++) expect(faces[i]!).toBeGreaterThan(faces[i - 1]!);
    }
  });
});
