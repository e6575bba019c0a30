import { describe, expect, test } from 'vitest';
import type { RodOptics, StabilityZone } from '../../src/cavity';
import {
  armVergences,
  estimateZones,
  leastModeRadius,
  planeMode,
  prepareCavity,
  stabilityAtPower,
  stabilityZones,
  thinLensZones,
  uniformRod,
  workingPoint,
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

const width = (zone: { from: number; to: number }) => zone.to - zone.from;

describe('the zones of one thin lens', () => {
  test('3000 random cavities have the zones of the closed form, none missed', () => {
    const random = seeded(11);
    for (let i = 0; i < 3000; i++) {
      const [r1, r2, l1, l2] = [
        anyRadius(random),
        anyRadius(random),
        0.01 + 0.3 * random(),
        0.01 + 0.3 * random(),
      ];
      const closed = thinLensZones(armVergences(l1, r1), armVergences(l2, r2));
      const [low, high] = [closed[0].from - 1, closed[1].to + 1];
      const found = stabilityZones(
        prepareCavity(twoMirrors(r1, l1, l2, r2)),
        thinLens(1),
        'sagittal',
        low,
        high,
      );
      expect(found).toHaveLength(closed[1].from - closed[0].to > 1e-6 ? 2 : 1);
      // Edges are linear in the power up to rounding of the range, which can be wide when an arm nears R.
      const tolerance = 1e-11 * (high - low);
      expect(Math.abs(found[0]!.from - closed[0].from)).toBeLessThan(tolerance);
      expect(Math.abs(found[found.length - 1]!.to - closed[1].to)).toBeLessThan(tolerance);
      if (found.length < 2) continue;
      expect(Math.abs(found[0]!.to - closed[0].to)).toBeLessThan(tolerance);
      expect(Math.abs(found[1]!.from - closed[1].from)).toBeLessThan(tolerance);
    }
  });

  test('both zones are equally wide and have the same least mode radius at the lens, w^2 = 2 lambda / (pi width): 1000 random cavities (Magni 1987, from memory)', () => {
    const random = seeded(12);
    const wavelength = 1064e-9;
    for (let i = 0; i < 1000; i++) {
      const [r1, r2, l1, l2] = [
        anyRadius(random),
        anyRadius(random),
        0.01 + 0.3 * random(),
        0.01 + 0.3 * random(),
      ];
      const prepared = prepareCavity(twoMirrors(r1, l1, l2, r2));
      const closed = thinLensZones(armVergences(l1, r1), armVergences(l2, r2));
      if (closed[1].from - closed[0].to < 1e-4 * width(closed[0])) continue;
      const zones = stabilityZones(prepared, thinLens(1), 'sagittal', closed[0].from - 1, closed[1].to + 1);
      // Differences of edges up to 1e4 /m apart: rounding of 1e-16 of them over the width.
      expect(Math.abs(width(zones[0]!) / width(zones[1]!) - 1)).toBeLessThan(1e-8);
      const least = zones.map((zone) =>
        leastRadius(
          zone,
          (power) => planeMode(prepared, thinLens(power), 'sagittal', wavelength).modeRadiusInRod!,
        ),
      );
      for (const radius of least) {
        // At a minimum the radius errs as the square of the golden section's 1e-6 of the zone.
        expect(Math.abs(radius / leastModeRadius(width(zones[0]!), wavelength) - 1)).toBeLessThan(1e-9);
      }
    }
  });

  /** Least radius over a zone by golden section; the radius has a single minimum there. */
  function leastRadius(zone: StabilityZone, radiusAt: (power: number) => number): number {
    const golden = (Math.sqrt(5) - 1) / 2;
    let [low, high] = [zone.from, zone.to];
    for (let i = 0; i < 30; i++) {
      const [one, other] = [high - golden * (high - low), low + golden * (high - low)];
      if (radiusAt(one) < radiusAt(other)) high = other;
      else low = one;
    }
    return radiusAt((low + high) / 2);
  }
});

describe('the zones of any rod', () => {
  test.each(['linear', 'ring'] as const)('%s: a fine walk over the range finds nothing else', (kind) => {
    const random = seeded(kind === 'ring' ? 14 : 13);
    let count = 0;
    for (let i = 0; i < 120; i++) {
      const cavity = anyCavity(random, kind);
      const prepared = prepareCavity(cavity);
      const shape = anyRod(random, 1);
      const [from, to] = [-60, 200];
      const zones = stabilityZones(prepared, shape, 'tangential', from, to);
      count += zones.length;
      const inside = (power: number) => workingPoint(zones, power).stable;
      const m = (power: number) => Math.abs(stabilityAtPower(prepared, shape, 'tangential', power));
      const missed: number[] = [];
      for (let step = 0; step <= 4000; step++) {
        const power = from + ((to - from) * step) / 4000;
        // Nearer to the edge than this the sides are rounding's choice.
        if (Math.abs(m(power) - 1) > 1e-7 && inside(power) !== m(power) < 1) missed.push(power);
      }
      expect(missed).toEqual([]);
      for (const zone of zones) {
        for (const [edge, at] of [
          [zone.fromEdge, zone.from],
          [zone.toEdge, zone.to],
        ] as const) {
          if (edge === null) expect(at === from || at === to).toBe(true);
          else {
            // The root lies within rounding of the edge: |m| is 1 there as closely as m is steep.
            const slope = (m(at + 1e-6) - m(at - 1e-6)) / 2e-6;
            expect(Math.abs(m(at) - 1)).toBeLessThan(1e-10 * (1 + Math.abs(slope)));
          }
        }
      }
    }
    expect(count).toBeGreaterThan(120);
  });

  test('bulk and faces of opposite sign (a fluoride) are searched as surely', () => {
    const random = seeded(15);
    for (let i = 0; i < 60; i++) {
      const shape: RodOptics = anyRod(random, 1);
      for (const plane of ['sagittal', 'tangential'] as const) {
        shape.slicePowers[plane].forEach((power, k) => (shape.slicePowers[plane][k] = -6 * power));
      }
      const prepared = prepareCavity(
        twoMirrors(anyRadius(random), 0.05, 0.1 + 0.1 * random(), anyRadius(random)),
      );
      const zones = stabilityZones(prepared, shape, 'sagittal', -100, 100);
      const missed: number[] = [];
      for (let step = 0; step <= 4000; step++) {
        const power = -100 + step / 20;
        const m = Math.abs(stabilityAtPower(prepared, shape, 'sagittal', power));
        if (Math.abs(m - 1) > 1e-7 && workingPoint(zones, power).stable !== m < 1) missed.push(power);
      }
      expect(missed).toEqual([]);
    }
  });

  test('a long rod between flat mirrors at its faces is stable at every positive power, with zones that only touch', () => {
    // m = cos(2 gamma L): touches +-1 whenever gamma L is a multiple of pi / 2, never leaves.
    const prepared = prepareCavity({ kind: 'linear', elements: [mirror(), rodElement, mirror()] });
    const zones = stabilityZones(prepared, uniformRod(0.1, 1.8, 1, 8), 'sagittal', -100, 2000);
    expect(zones).toHaveLength(1);
    expect(Math.abs(zones[0]!.from)).toBeLessThan(1e-9);
    expect(zones[0]!.to).toBe(2000);
    expect(zones[0]!.fromEdge).toBe(1);
    expect(zones[0]!.toEdge).toBeNull();
  });

  test('a ring of two equal lenses joins its zones where m touches -1', () => {
    const prepared = prepareCavity({
      kind: 'ring',
      elements: [rodElement, space(0.2), rodElement, space(0.2)],
    });
    // m = 2 (1 - L D / 2)^2 - 1 touches -1 at D = 2 / L = 10 and ends at 4 / L = 20 (Kogelnik & Li 1966, lens sequence).
    const zones = stabilityZones(prepared, thinLens(1), 'sagittal', -5, 50);
    expect(zones).toHaveLength(1);
    expect(Math.abs(zones[0]!.from)).toBeLessThan(1e-12);
    expect(Math.abs(zones[0]!.to - 20)).toBeLessThan(1e-12);
  });

  test('arms that differ by a micrometre leave a gap, and it is found', () => {
    const prepared = prepareCavity(twoMirrors(Infinity, 0.075, 0.075001, Infinity));
    const zones = stabilityZones(prepared, thinLens(1), 'sagittal', 0, 100);
    expect(zones).toHaveLength(2);
    expect(zones[1]!.from - zones[0]!.to).toBeCloseTo(1 / 0.075 - 1 / 0.075001, 10);
  });

  test('a cavity without a rod is stable at every power or at none', () => {
    const zonesOf = (radius: number) =>
      stabilityZones(
        prepareCavity({ kind: 'linear', elements: [mirror(), space(0.1), mirror(radius)] }),
        thinLens(1),
        'sagittal',
        0,
        10,
      );
    expect(zonesOf(0.2)).toEqual([{ from: 0, to: 10, fromEdge: null, toEdge: null }]);
    expect(zonesOf(0.05)).toEqual([]);
    expect(zonesOf(Infinity)).toEqual([]);
  });

  test('the estimate in closed form is the zone of a thin rod and near that of a long one, folds and lenses included', () => {
    const random = seeded(16);
    for (let i = 0; i < 300; i++) {
      const cavity = anyCavity(random, 'linear');
      const prepared = prepareCavity(cavity);
      const estimate = estimateZones(prepared, thinLens(1), 'tangential');
      // A lens at a mirror has edges at infinity, and two rods have no closed form.
      if (estimate === null || !Number.isFinite(estimate[1].to)) continue;
      const [low, high] = [estimate[0].from - 1, estimate[1].to + 1];
      const zones = stabilityZones(prepared, thinLens(1), 'tangential', low, high);
      expect(Math.abs(zones[0]!.from - estimate[0].from)).toBeLessThan(1e-9 * (high - low));
      expect(Math.abs(zones[zones.length - 1]!.to - estimate[1].to)).toBeLessThan(1e-9 * (high - low));
    }
    expect(
      estimateZones(
        prepareCavity({ kind: 'ring', elements: [rodElement, space(1)] }),
        thinLens(1),
        'sagittal',
      ),
    ).toBeNull();
    expect(estimateZones(prepareCavity(twoMirrors(1, 1, 1, 1)), thinLens(0), 'sagittal')).toBeNull();
  });
});

describe('the working point', () => {
  const zones = stabilityZones(
    prepareCavity(twoMirrors(Infinity, 0.05, 0.15, Infinity)),
    thinLens(1),
    'sagittal',
    0,
    25,
  );

  test('is as many dioptres inside a zone as the nearest edge is away', () => {
    const inside = workingPoint(zones, 5);
    expect(inside.stable).toBe(true);
    expect(inside.toNearestEdge).toBeCloseTo(20 / 3 - 5, 12);
    expect(inside.nearestEdge).toBeCloseTo(20 / 3, 12);
  });

  test('outside it is negative, and on the edge it is not stable', () => {
    expect(workingPoint(zones, 8).toNearestEdge).toBeCloseTo(20 / 3 - 8, 12);
    expect(workingPoint(zones, 0).stable).toBe(false);
  });

  test('the end of the search is no edge', () => {
    expect(workingPoint(zones, 24.9).nearestEdge).toBeCloseTo(20, 12);
    expect(workingPoint([], 3)).toEqual({ stable: false, toNearestEdge: -Infinity, nearestEdge: null });
  });
});
