import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type RodHeatModel, type SideModel, meanWithin, temperatureAt } from '../../src/heat';
import { plainRod, pumpedRod } from './rod';

const pump = { profile: { kind: 'gaussian' } as const, radius: 0.25e-3, absorptionCoefficient: 350, heat: 4 };
const off = (got: number, expected: number) => Math.abs(got / expected - 1);

const contactSide = fc
  .double({ min: 3, max: 5.5, noNaN: true })
  .map((exponent): SideModel => ({ kind: 'contact', conductance: 10 ** exponent }));
const ringSide = fc.record({
  kind: fc.constant('ring' as const),
  contactConductance: fc.double({ min: 1e3, max: 1e5, noNaN: true }),
  conductivity: fc.double({ min: 20, max: 400, noNaN: true }),
  outerRadius: fc.double({ min: 5e-3, max: 20e-3, noNaN: true }),
  outer: fc.constantFrom({ kind: 'fixed' as const }, { kind: 'contact' as const, conductance: 3000 }),
});
const end = fc.constantFrom(
  { kind: 'insulated' as const },
  { kind: 'film' as const, coefficient: 20 },
  { kind: 'film' as const, coefficient: 5000 },
);
const rods: fc.Arbitrary<RodHeatModel> = fc.record({
  radius: fc.double({ min: 0.5e-3, max: 4e-3, noNaN: true }),
  frontCap: fc.constantFrom(0, 2e-3),
  dopedLength: fc.double({ min: 1e-3, max: 30e-3, noNaN: true }),
  backCap: fc.constantFrom(0, 4e-3),
  conductivityRadial: fc.double({ min: 2, max: 14, noNaN: true }),
  conductivityAxial: fc.double({ min: 2, max: 14, noNaN: true }),
  conductivityExponent: fc.constantFrom(0, 0, 0.7, 1),
  side: fc.oneof(fc.constant({ kind: 'fixed' as const }), contactSide, ringSide),
  front: end,
  back: end,
});
const pumps = fc.record({
  profile: fc.constantFrom({ kind: 'gaussian' as const }, { kind: 'flat-top' as const }),
  /** Share of the rod's radius. */
  fill: fc.double({ min: 0.02, max: 0.8, noNaN: true }),
  absorptionCoefficient: fc.double({ min: 30, max: 3000, noNaN: true }),
  heat: fc.double({ min: 0.01, max: 3, noNaN: true }),
});
const boundaries = fc.record({
  side: fc.double({ min: 250, max: 330, noNaN: true }),
  front: fc.double({ min: 250, max: 330, noNaN: true }),
  back: fc.double({ min: 250, max: 330, noNaN: true }),
});

describe('any pumped rod', () => {
  it('loses as much heat as is set free, lies between its coldest surroundings and its peak, and is hottest where it says', () => {
    fc.assert(
      fc.property(rods, pumps, boundaries, (rod, { fill, ...light }, boundary) => {
        const field = pumpedRod(rod, { ...light, radius: fill * rod.radius }, 'study', boundary);
        const { heatOut, generated, temperatures, grid } = field;
        const turnover = Math.abs(heatOut.side) + Math.abs(heatOut.front) + Math.abs(heatOut.back);
        expect(Math.abs(heatOut.side + heatOut.front + heatOut.back - generated) / turnover).toBeLessThan(
          1e-9,
        );
        const coldest = Math.min(boundary.side, boundary.front, boundary.back);
        for (const temperature of temperatures) expect(temperature).toBeGreaterThan(coldest - 1e-9);
        for (let j = 0; j < grid.nz; j++)
          expect(temperatures[j * grid.nRadial]!).toBeLessThan(
            field.peakTemperature + 1e-3 * (field.peakTemperature - coldest),
          );
        // Two interpolations, cubic and quartic, between the cells of the coarse grid that studies use.
        expect(off(temperatureAt(field, 0, field.peakPosition.z), field.peakTemperature)).toBeLessThan(3e-3);
      }),
      { numRuns: 200, seed: 7, endOnFailure: true },
    );
  });
});

describe('a rod of constant conductivity', () => {
  it('doubles its rise when the heat doubles, and shifts as a whole with its surroundings', () => {
    const rod = { ...plainRod, front: { kind: 'film', coefficient: 100 } as const };
    const at = (heat: number, shift: number) => {
      const outside = 290 + shift;
      return pumpedRod(rod, { ...pump, heat }, 'study', { side: outside, front: outside, back: outside })
        .temperatures;
    };
    const [once, twice, warmer] = [at(4, 0), at(8, 0), at(4, 17)];
    once.forEach((temperature, p) => {
      expect(twice[p]! - 290).toBeCloseTo(2 * (temperature - 290), 9);
      expect(warmer[p]!).toBeCloseTo(temperature + 17, 9);
    });
  });

  it('that conducts very well has one temperature, at which the films carry the heat away', () => {
    const rod: RodHeatModel = {
      ...plainRod,
      conductivityRadial: 1e7,
      conductivityAxial: 1e7,
      side: { kind: 'contact', conductance: 800 },
      front: { kind: 'film', coefficient: 300 },
      back: { kind: 'film', coefficient: 300 },
    };
    const field = pumpedRod(rod, pump, 'study', { side: 300, front: 290, back: 290 });
    const barrel = 800 * 2 * Math.PI * 1.5e-3 * 10e-3;
    const faces = 2 * 300 * Math.PI * 1.5e-3 ** 2;
    const lumped = (field.generated + barrel * 300 + faces * 290) / (barrel + faces);
    expect(field.peakTemperature).toBeCloseTo(lumped, 2);
    expect(field.edgeTemperature).toBeCloseTo(lumped, 2);
  });

  it('is cooler at its peak with end caps, the same in the mean along the axis, and hottest inside', () => {
    const capped = pumpedRod({ ...plainRod, frontCap: 3e-3, backCap: 2e-3 }, pump);
    const bare = pumpedRod(plainRod, pump);
    expect(capped.peakTemperature).toBeLessThan(bare.peakTemperature - 5);
    expect(capped.peakPosition.z).toBeGreaterThan(3e-3);
    expect(bare.peakPosition.z).toBe(0);
  });
});

describe('mount ring', () => {
  const even = { ...pump, absorptionCoefficient: 1e-3, heat: 4e5, radius: 0.25e-3 };
  it("adds P'/(2 pi a h) at the interface and P' ln(b/a)/(2 pi k) inside (heat even along the rod; Carslaw & Jaeger)", () => {
    const side: SideModel = {
      kind: 'ring',
      contactConductance: 9000,
      conductivity: 150,
      outerRadius: 8e-3,
      outer: { kind: 'fixed' },
    };
    const field = pumpedRod({ ...plainRod, side }, even, 'study');
    const perLength = field.generated / 10e-3;
    const inRing = (perLength * Math.log(8 / 1.5)) / (2 * Math.PI * 150);
    const contact = perLength / (2 * Math.PI * 1.5e-3 * 9000);
    // The absorption of 0.001 /m leaves the heat even to 1e-5.
    expect(off(field.edgeTemperature - 273.15, inRing + contact)).toBeLessThan(2e-5);
    expect(off(temperatureAt(field, 1.5e-3 * (1 + 1e-9), 5e-3) - 273.15, inRing)).toBeLessThan(2e-5);
    const half = (perLength * Math.log(8 / 4)) / (2 * Math.PI * 150);
    expect(off(temperatureAt(field, 4e-3, 5e-3) - 273.15, half)).toBeLessThan(2e-5);
  });

  it('of a very good conductor is no different from its base', () => {
    const ring: SideModel = {
      kind: 'ring',
      contactConductance: 9000,
      conductivity: 1e8,
      outerRadius: 8e-3,
      outer: { kind: 'fixed' },
    };
    const inRing = pumpedRod({ ...plainRod, side: ring }, pump, 'study');
    const direct = pumpedRod({ ...plainRod, side: { kind: 'contact', conductance: 9000 } }, pump, 'study');
    expect(inRing.peakTemperature).toBeCloseTo(direct.peakTemperature, 4);
    expect(temperatureAt(inRing, 5e-3, 1e-3)).toBeCloseTo(273.15, 4);
  });
});

describe('reading a field', () => {
  it('the mean within a radius lies between the barrel and the peak, and grows as the radius shrinks', () => {
    const field = pumpedRod(plainRod, pump, 'standard');
    let before = Infinity;
    for (const radius of [0.05e-3, 0.2e-3, 0.6e-3, 1.5e-3]) {
      const mean = meanWithin(field, radius);
      expect(mean).toBeLessThan(before);
      expect(mean).toBeGreaterThan(field.edgeTemperature);
      before = mean;
    }
  });

  it('the two-dimensional view holds the same numbers as the flat array', () => {
    const { view, temperatures, grid } = pumpedRod(plainRod, pump, 'coarse');
    expect(view.shape).toEqual([grid.nRadial, grid.nz]);
    for (let j = 0; j < grid.nz; j++)
      for (let i = 0; i < grid.nRadial; i++) expect(view.get(i, j)).toBe(temperatures[j * grid.nRadial + i]);
  });

  it('interpolation returns the cell values at the cell centres', () => {
    const field = pumpedRod(plainRod, pump, 'coarse');
    const { grid, temperatures } = field;
    for (const [i, j] of [
      [0, 0],
      [3, 5],
      [11, 13],
    ] as const)
      expect(temperatureAt(field, grid.radialCentres[i]!, grid.axialCentres[j]!)).toBeCloseTo(
        temperatures[j * grid.nRadial + i]!,
        8,
      );
  });
});
