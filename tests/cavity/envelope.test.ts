import { describe, expect, test } from 'vitest';
import type { Cavity, Plane } from '../../src/cavity';
import {
  axialLength,
  foldCompensationAngle,
  modeEnvelope,
  planeMode,
  plateReducedLength,
  powerCentroid,
  prepareCavity,
  rodLength,
  stability,
  tiltedMirrorFocalLength,
  uniformRod,
  waist,
} from '../../src/cavity';
import { anyCavity, anyRod, mirror, rodElement, seeded, space, thinLens, twoMirrors } from './seeded';

describe('the mode along the axis', () => {
  test('follows w0 sqrt(1 + (z/zR)^2) through an empty cavity (Kogelnik & Li 1966)', () => {
    const [r1, r2, length, wavelength] = [0.3, 0.5, 0.2, 1064e-9];
    const prepared = prepareCavity({ kind: 'linear', elements: [mirror(r1), space(length), mirror(r2)] });
    const narrowest = waist(r1, r2, length, wavelength)!;
    const rayleigh = (Math.PI * narrowest.radius ** 2) / wavelength;
    const points = modeEnvelope(prepared, thinLens(0), 'sagittal', wavelength, 21);
    expect(points).toHaveLength(23);
    for (const { position, radius } of points) {
      const expected = narrowest.radius * Math.hypot(1, (position - narrowest.position) / rayleigh);
      expect(radius / expected).toBeCloseTo(1, 12);
    }
  });

  test('is continuous from element to element and agrees with the radii of the mode', () => {
    const random = seeded(21);
    let drawn = 0;
    for (let i = 0; i < 300; i++) {
      const cavity = anyCavity(random, i % 2 ? 'ring' : 'linear');
      const prepared = prepareCavity(cavity);
      const rod = anyRod(random, 10 * random());
      const points = modeEnvelope(prepared, rod, 'sagittal', 1e-6, 5);
      const mode = planeMode(prepared, rod, 'sagittal', 1e-6);
      expect(points.length > 0).toBe(mode.stable);
      if (Math.abs(mode.stability) > 0.999) continue;
      drawn++;
      let position = 0;
      cavity.elements.forEach((element, index) => {
        const own = points.filter((point) => point.element === index);
        expect(own[0]!.position).toBeCloseTo(position, 12);
        expect(own[0]!.radius / mode.elementRadii![index]!).toBeCloseTo(1, 8);
        expect(own[own.length - 1]!.radius / mode.elementRadii![index + 1]!).toBeCloseTo(1, 8);
        position += axialLength(element, rod);
      });
    }
    expect(drawn).toBeGreaterThan(20);
  });

  test('inside a hot rod it runs through the radius quoted for the rod', () => {
    const rod = uniformRod(0.02, 1.82, 8, 10);
    const prepared = prepareCavity(twoMirrors(0.3, 0.04, 0.07, Infinity));
    expect(powerCentroid(rod, 'sagittal')).toBeCloseTo(0.01, 12);
    const points = modeEnvelope(prepared, rod, 'sagittal', 1064e-9, 3).filter((point) => point.element === 2);
    expect(points[1]!.position - points[0]!.position).toBeCloseTo(rodLength(rod) / 2, 12);
    expect(points[1]!.radius).toBeCloseTo(planeMode(prepared, rod, 'sagittal', 1064e-9).modeRadiusInRod!, 12);
  });

  test('a duct matched to its mode keeps one radius: w^2 = lambda / (pi n0 gamma) (Siegman 1986, from memory)', () => {
    const [length, n0, power, wavelength] = [0.05, 1.82, 10, 1064e-9];
    const gamma = Math.sqrt(power / (length * n0));
    const prepared = prepareCavity({ kind: 'linear', elements: [mirror(), rodElement, mirror()] });
    const matched = Math.sqrt(wavelength / (Math.PI * n0 * gamma));
    for (const point of modeEnvelope(
      prepared,
      uniformRod(length, n0, power, 7),
      'tangential',
      wavelength,
      9,
    )) {
      expect(point.radius / matched).toBeCloseTo(1, 10);
    }
  });

  test('inside a Brewster plate the tangential radius is n times as large, the sagittal the same', () => {
    const n = 1.76;
    const cavity: Cavity = {
      kind: 'linear',
      elements: [
        mirror(),
        space(0.05),
        { kind: 'plate', thickness: 0.005, refractiveIndex: n, incidence: Math.atan(n) },
        space(0.05),
        mirror(0.2),
      ],
    };
    const at = (plane: 'sagittal' | 'tangential') =>
      modeEnvelope(prepareCavity(cavity), thinLens(0), plane, 1e-6, 2);
    const step = (plane: 'sagittal' | 'tangential') => at(plane)[3]!.radius / at(plane)[2]!.radius;
    // cos(inside) / cos(outside) at Brewster's angle is n.
    expect(step('tangential')).toBeCloseTo(n, 10);
    expect(step('sagittal')).toBeCloseTo(1, 10);
    expect(at('sagittal')[5]!.position).toBeCloseTo(0.05 + 0.005 * Math.sqrt(1 + 1 / n ** 2), 12);
  });

  test('an unstable cavity has none', () => {
    expect(
      modeEnvelope(prepareCavity(twoMirrors(Infinity, 0.1, 0.1, -1)), thinLens(0), 'sagittal', 1e-6, 5),
    ).toEqual([]);
  });
});

test('a fold mirror at the compensating angle lets both planes of a Brewster plate reach the edge together', () => {
  const [n, thickness, radius] = [1.76, 0.005, 0.1];
  const incidence = foldCompensationAngle(radius, thickness, n);
  const brewster = Math.atan(n);
  const airFor = (plane: Plane) =>
    tiltedMirrorFocalLength(radius, incidence, plane) - plateReducedLength(thickness, n, brewster, plane);
  expect(airFor('tangential')).toBeCloseTo(airFor('sagittal'), 14);
  // The short arm as long as the focal length is the edge m = -1 of that plane.
  const prepared = prepareCavity({
    kind: 'linear',
    elements: [
      mirror(),
      space(0.4),
      mirror(radius, incidence),
      space(airFor('sagittal')),
      { kind: 'plate', thickness, refractiveIndex: n, incidence: brewster },
      mirror(),
    ],
  });
  expect(stability(prepared, thinLens(0), 'sagittal')).toBeCloseTo(-1, 12);
  expect(stability(prepared, thinLens(0), 'tangential')).toBeCloseTo(-1, 12);
});
