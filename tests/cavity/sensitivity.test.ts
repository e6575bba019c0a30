import { describe, expect, test } from 'vitest';
import { misalignmentSensitivity, prepareCavity, uniformRod } from '../../src/cavity';
import { anyRadius, mirror, rodElement, seeded, space, thinLens, twoMirrors } from './seeded';

describe('tilting a mirror', () => {
  const prepared = prepareCavity(twoMirrors(Infinity, 0.05, 0.15, Infinity));
  const shifts = (power: number) =>
    misalignmentSensitivity(prepared, thinLens(power), 'sagittal').map(
      (mirrorShift) => mirrorShift.axisShift,
    );

  test('of a flat-flat cavity moves the axis at the lens by 1 / D, its focal length, on either side (De Silvestri, Laporta & Magni 1986, from memory)', () => {
    // A tilted flat mirror sends the axis through the lens at f times the tilt, so that it comes back normal.
    for (const power of [1, 5, 22, 26])
      shifts(power).forEach((shift) => expect(shift * power).toBeCloseTo(1, 12));
  });

  test('the shift grows without bound at the edge C = 0 and stays finite at the other edges', () => {
    expect(shifts(0)).toEqual([Infinity, Infinity]);
    for (const edge of [20 / 3, 20, 80 / 3]) shifts(edge).forEach((shift) => expect(shift).toBeLessThan(0.2));
  });

  test('a random cavity with a lens follows the geometry of centres of curvature', () => {
    const random = seeded(31);
    for (let i = 0; i < 500; i++) {
      const [r1, r2, l1, l2, power] = [
        anyRadius(random),
        anyRadius(random),
        0.2 * random(),
        0.2 * random(),
        20 * random(),
      ];
      const [a, b] = misalignmentSensitivity(
        prepareCavity(twoMirrors(r1, l1, l2, r2)),
        thinLens(power),
        'sagittal',
      );
      // The axis runs through both centres; tilting mirror 1 moves its centre by R1: with vergences from the
      // centres c = 1 / (L - R) the ray at the lens is at height R1 c1 / (c1 + c2 - D), and without R for flat.
      const [c1, c2] = [1 / (l1 - r1), 1 / (l2 - r2)];
      const reach = (radius: number, length: number) =>
        radius === Infinity ? 1 : Math.abs(radius / (length - radius));
      expect((a!.axisShift * Math.abs(c1 + c2 - power)) / reach(r1, l1)).toBeCloseTo(1, 7);
      expect((b!.axisShift * Math.abs(c1 + c2 - power)) / reach(r2, l2)).toBeCloseTo(1, 7);
    }
  });

  test('of a fold acts on both passes, less in the sagittal plane by the cosine of incidence', () => {
    const cavity = (incidence: number) =>
      prepareCavity({
        kind: 'linear',
        elements: [
          mirror(0.5),
          space(0.1),
          mirror(Infinity, incidence),
          space(0.1),
          rodElement,
          space(0.05),
          mirror(0.4),
        ],
      });
    const fold = (incidence: number, plane: 'sagittal' | 'tangential') =>
      misalignmentSensitivity(cavity(incidence), uniformRod(0.01, 1.8, 2), plane)[1]!.axisShift;
    expect(fold(0.6, 'sagittal') / fold(0.6, 'tangential')).toBeCloseTo(Math.cos(0.6), 12);
    expect(fold(0, 'sagittal')).toBeCloseTo(fold(0, 'tangential'), 14);
  });

  test('a ring and the linear cavity it unfolds shift alike when the twin mirrors tilt together', () => {
    const rod = thinLens(4);
    const elements = [mirror(0.5), space(0.1), rodElement, space(0.2), mirror(0.4)];
    const linear = misalignmentSensitivity(prepareCavity({ kind: 'linear', elements }), rod, 'sagittal');
    const ring = misalignmentSensitivity(
      prepareCavity({ kind: 'ring', elements: [...elements, space(0.2), rodElement, space(0.1)] }),
      rod,
      'sagittal',
    );
    // The unfolded ring meets each end mirror once, as the linear cavity does per round trip.
    expect(ring[0]!.axisShift).toBeCloseTo(linear[0]!.axisShift, 12);
    expect(ring[1]!.axisShift).toBeCloseTo(linear[1]!.axisShift, 12);
  });

  test('without a rod the shift is told at the first element', () => {
    const [, second] = misalignmentSensitivity(
      prepareCavity({ kind: 'linear', elements: [mirror(), space(0.1), mirror(0.25)] }),
      thinLens(0),
      'sagittal',
    );
    // Flat first mirror: the axis is its normal through the second mirror's centre, R from the pivot.
    expect(second!.axisShift).toBeCloseTo(0.25, 12);
  });
});
