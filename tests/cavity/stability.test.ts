import { describe, expect, test } from 'vitest';
import type { Plane, RodOptics } from '../../src/cavity';
import {
  EDGE_GUARD,
  equivalentThinLens,
  gStar,
  mirrorRadii,
  planeMode,
  prepareCavity,
  roundTripMatrix,
  scaleRod,
  stability,
  stabilityAtPower,
  totalPower,
  uniformRod,
} from '../../src/cavity';
import {
  anyCavity,
  anyRadius,
  anyRod,
  mirror,
  rodElement,
  seeded,
  space,
  thinLens,
  twoMirrors,
} from './seeded';

const planes: Plane[] = ['sagittal', 'tangential'];

describe('a thin lens between two mirrors', () => {
  test('10 000 random cavities have the m = 2 g1* g2* - 1 and the mirror radii of the closed form', () => {
    const random = seeded(1);
    let stable = 0;
    for (let i = 0; i < 10_000; i++) {
      const [radius1, radius2] = [anyRadius(random), anyRadius(random)];
      const [length1, length2] = [0.005 + 0.3 * random(), 0.005 + 0.3 * random()];
      const lensPower = -10 + 40 * random();
      const lensCavity = { radius1, radius2, length1, length2, lensPower };
      const { g1, g2 } = gStar(lensCavity);
      const prepared = prepareCavity(twoMirrors(radius1, length1, length2, radius2));
      const mode = planeMode(prepared, thinLens(lensPower), 'sagittal', 1e-6);
      const m = 2 * g1 * g2 - 1;
      // Rounding of a handful of products: 1e-9 of the size of m leaves six digits to spare.
      expect(Math.abs(mode.stability - m)).toBeLessThan(1e-9 * Math.max(1, Math.abs(m)));
      const radii = mirrorRadii(lensCavity, 1e-6);
      if (Math.abs(Math.abs(m) - 1) < 1e-6) continue;
      expect(mode.stable).toBe(radii !== null);
      if (radii === null) continue;
      stable++;
      // Within 1e-6 of the edge the radius carries m's rounding magnified up to 1e6 times.
      expect(Math.abs(mode.elementRadii![0]! / radii.mirror1 - 1)).toBeLessThan(1e-9);
      expect(Math.abs(mode.elementRadii![5]! / radii.mirror2 - 1)).toBeLessThan(1e-9);
    }
    expect(stable).toBeGreaterThan(1000);
  });

  test('a cavity closer to its edge than the guard is not called stable', () => {
    const prepared = prepareCavity(twoMirrors(Infinity, 0.1, 0.1, Infinity));
    const modeAt = (power: number) => planeMode(prepared, thinLens(power), 'sagittal', 1e-6);
    for (const power of [0, 10, 20]) expect(modeAt(power).stable).toBe(false);
    for (const power of [1e-9, 10 - 1e-5, 10 + 1e-5, 20 - 1e-9]) expect(modeAt(power).stable).toBe(true);
    expect(EDGE_GUARD).toBeLessThan(1e-11);
  });
});

describe('the rod as a stack of graded slices', () => {
  /** Kogelnik & Li 1966: a duct of gamma^2 = n2 / n0 has cos, sin / (n0 gamma), -n0 gamma sin. */
  // 4.54 and 4.56 dioptres lie on either side of the change from series to sine, (gamma dz)^2 = 0.05.
  test.each([12, -12, 400, -400, 4.54, 4.56, -4.54, -4.56])(
    'cut into 1, 4, 16 or 64 it is the analytic duct, %d dioptres',
    (power) => {
      const [length, n0] = [0.02, 1.82];
      const gamma = Math.sqrt(Math.abs(power) / (length * n0));
      const [cosine, sine] =
        power > 0
          ? [Math.cos(gamma * length), Math.sin(gamma * length)]
          : [Math.cosh(gamma * length), Math.sinh(gamma * length)];
      const [l1, l2] = [0.04, 0.07];
      const prepared = prepareCavity(twoMirrors(0.3, l1, l2, Infinity));
      // One way from the middle of mirror 1 (R = 0.3 m) to mirror 2, written out.
      const duct = [cosine, sine / (n0 * gamma), -Math.sign(power) * n0 * gamma * sine, cosine] as const;
      const [y, v] = [1 - l1 / 0.3, -1 / 0.3];
      const afterY = [duct[0] * y + duct[1] * v, duct[0] * l1 + duct[1]] as const;
      const afterV = [duct[2] * y + duct[3] * v, duct[2] * l1 + duct[3]] as const;
      const m = (afterY[0] + l2 * afterV[0]) * afterV[1] + (afterY[1] + l2 * afterV[1]) * afterV[0];
      for (const slices of [1, 4, 16, 64]) {
        const rod = uniformRod(length, n0, power, slices);
        // Equal slices of one duct multiply to it exactly; only rounding of 64 products remains.
        expect(Math.abs(stability(prepared, rod, 'sagittal') - m)).toBeLessThan(
          1e-12 * Math.max(1, Math.abs(m)),
        );
      }
    },
  );

  test('a smooth distribution of power converges as the square of the slice length', () => {
    const prepared = prepareCavity(twoMirrors(0.3, 0.04, 0.07, Infinity));
    const at = (slices: number) => {
      const rod = uniformRod(0.02, 1.82, 0, slices);
      const powers = Float64Array.from({ length: slices }, (_, i) => {
        const power = (z: number) => 30 * Math.exp(-200 * z);
        return (power((i * 0.02) / slices) - power(((i + 1) * 0.02) / slices)) / (1 - Math.exp(-4));
      });
      return stability(
        prepared,
        { ...rod, slicePowers: { sagittal: powers, tangential: powers } },
        'sagittal',
      );
    };
    const exact = at(2048);
    const error = (slices: number) => Math.abs(at(slices) - exact);
    expect(error(16)).toBeLessThan(error(4) / 12);
    expect(error(64)).toBeLessThan(error(16) / 12);
  });

  test('a cold rod is its length over its index of air', () => {
    const cold = prepareCavity(twoMirrors(0.4, 0.04, 0.07, 0.9));
    const air = prepareCavity({
      kind: 'linear',
      elements: [mirror(0.4), space(0.11 + 0.02 / 1.82), mirror(0.9)],
    });
    expect(stability(cold, uniformRod(0.02, 1.82, 0, 10), 'sagittal')).toBeCloseTo(
      stability(air, thinLens(0), 'sagittal'),
      14,
    );
  });

  test('its equivalent thin lens at the principal planes gives the same cavity', () => {
    const random = seeded(3);
    for (let i = 0; i < 200; i++) {
      const rod = anyRod(random, 1 + 20 * random());
      const lens = equivalentThinLens(rod, 'tangential');
      const thick = prepareCavity(twoMirrors(0.5, 0.1, 0.2, Infinity));
      const thin = prepareCavity(twoMirrors(0.5, 0.1 + lens.frontDepth, 0.2 + lens.backDepth, Infinity));
      const m = stability(thick, rod, 'tangential');
      // Depths of millimetres beside arms of 100 mm: rounding only.
      expect(Math.abs(stability(thin, thinLens(lens.power), 'tangential') - m)).toBeLessThan(
        1e-12 * (1 + Math.abs(m)),
      );
      expect(totalPower(rod, 'tangential') / lens.power).toBeGreaterThan(1);
    }
  });
});

describe('any cavity', () => {
  /** A second cavity passed the other way round, mirror by mirror. */
  function reversed(cavity: ReturnType<typeof anyCavity>): ReturnType<typeof anyCavity> {
    const elements = [...cavity.elements]
      .reverse()
      .map((element) =>
        element.kind === 'rod' ? { kind: 'rod' as const, reversed: !element.reversed } : element,
      );
    return { ...cavity, elements };
  }

  test.each(['linear', 'ring'] as const)(
    '%s: m is the same from every starting point and determinants are 1',
    (kind) => {
      const random = seeded(kind === 'ring' ? 5 : 4);
      for (let i = 0; i < 300; i++) {
        const cavity = anyCavity(random, kind);
        const prepared = prepareCavity(cavity);
        const rod = anyRod(random, -5 + 20 * random());
        for (const plane of planes) {
          const m = stability(prepared, rod, plane);
          for (let start = 0; start < cavity.elements.length; start++) {
            const [a, b, c, d] = roundTripMatrix(prepared, rod, plane, start);
            // Entries may be large while m is small: rounding goes with the products of the entries.
            const size = 1 + Math.abs(a! * d!) + Math.abs(b! * c!);
            expect(Math.abs(a! * d! - b! * c! - 1)).toBeLessThan(1e-12 * size);
            expect(Math.abs((a! + d!) / 2 - m)).toBeLessThan(1e-12 * size);
          }
        }
      }
    },
  );

  test.each(['linear', 'ring'] as const)(
    '%s: passed the other way it has the same m and the same mode',
    (kind) => {
      const random = seeded(kind === 'ring' ? 7 : 6);
      let stable = 0;
      for (let i = 0; i < 500; i++) {
        const cavity = anyCavity(random, kind);
        const rod = anyRod(random, 10 * random());
        const there = planeMode(prepareCavity(cavity), rod, 'tangential', 1e-6);
        const back = planeMode(prepareCavity(reversed(cavity)), rod, 'tangential', 1e-6);
        expect(Math.abs(there.stability - back.stability)).toBeLessThan(
          1e-10 * (1 + Math.abs(there.stability)),
        );
        if (!there.stable || Math.abs(there.stability) > 0.999) continue;
        const single = cavity.elements.filter((element) => element.kind === 'rod').length === 1;
        if (single) expect(there.modeRadiusInRod! / back.modeRadiusInRod!).toBeCloseTo(1, 8);
        const mirrored = back.elementRadii!.slice().reverse();
        there.elementRadii!.forEach((radius, k) => expect(radius / mirrored[k]!).toBeCloseTo(1, 8));
        stable++;
      }
      expect(stable).toBeGreaterThan(20);
    },
  );

  test('the mode repeats itself after a round trip, whichever element one starts at', () => {
    const random = seeded(8);
    for (let i = 0; i < 300; i++) {
      const cavity = anyCavity(random, i % 2 ? 'ring' : 'linear');
      const prepared = prepareCavity(cavity);
      const rod = anyRod(random, 10 * random());
      const mode = planeMode(prepared, rod, 'sagittal', Math.PI * 1e-6);
      if (!mode.stable || Math.abs(mode.stability) > 0.999) continue;
      for (let start = 1; start < cavity.elements.length; start++) {
        const b = roundTripMatrix(prepared, rod, 'sagittal', start)[1]!;
        // w^2 = lambda |B| / (pi sin), Kogelnik & Li 1966, with lambda / pi = 1e-6 m here.
        const radius = Math.sqrt((1e-6 * Math.abs(b)) / Math.sqrt(1 - mode.stability ** 2));
        expect(mode.elementRadii![start]! / radius).toBeCloseTo(1, 7);
      }
    }
  });

  test('scaling every length by two halves every power and leaves m alone', () => {
    const random = seeded(9);
    for (let i = 0; i < 100; i++) {
      const [r1, l1, l2, r2] = [anyRadius(random), random(), random(), anyRadius(random)];
      const rod = uniformRod(0.01, 1.8, 8 * random(), 5);
      const twice = uniformRod(0.02, 1.8, totalPower(rod, 'sagittal') / 2, 5);
      const m = stability(prepareCavity(twoMirrors(r1, l1, l2, r2)), rod, 'sagittal');
      const scaled = stability(prepareCavity(twoMirrors(2 * r1, 2 * l1, 2 * l2, 2 * r2)), twice, 'sagittal');
      expect(Math.abs(scaled - m)).toBeLessThan(1e-12 * (1 + m * m));
    }
  });

  test('the stability at a power is that of the rod scaled to it', () => {
    const random = seeded(10);
    for (let i = 0; i < 100; i++) {
      const prepared = prepareCavity(anyCavity(random, i % 2 ? 'ring' : 'linear'));
      const [shape, power] = [anyRod(random, 1), -10 + 40 * random()];
      for (const plane of planes) {
        const m = stability(prepared, scaleRod(shape, power), plane);
        expect(stabilityAtPower(prepared, shape, plane, power)).toBe(m);
        expect(totalPower(scaleRod(shape, power), plane)).toBeCloseTo(power, 10);
      }
    }
  });

  test('two half rods face to face are one rod', () => {
    const half: RodOptics = uniformRod(0.005, 1.82, 6, 3);
    const whole = prepareCavity(twoMirrors(0.3, 0.05, 0.08, Infinity));
    const halves = prepareCavity({
      kind: 'linear',
      elements: [
        mirror(0.3),
        space(0.05),
        rodElement,
        { kind: 'rod', reversed: true },
        space(0.08),
        mirror(),
      ],
    });
    expect(stability(halves, half, 'sagittal')).toBeCloseTo(
      stability(whole, uniformRod(0.01, 1.82, 12), 'sagittal'),
      13,
    );
    expect(stabilityAtPower(halves, half, 'sagittal', 0)).toBeCloseTo(
      stability(whole, uniformRod(0.01, 1.82, 0), 'sagittal'),
      13,
    );
  });

  test('a linear cavity that does not stand between two mirrors is refused', () => {
    expect(() => prepareCavity({ kind: 'linear', elements: [mirror(), space(0.1)] })).toThrow('two mirrors');
    expect(() =>
      prepareCavity({ kind: 'linear', elements: [mirror(0.1, 0.2), space(0.1), mirror()] }),
    ).toThrow('normal incidence');
  });
});
