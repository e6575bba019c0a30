import { describe, expect, it } from 'vitest';
import {
  type RodHeatModel,
  advance,
  assembleRod,
  heatSource,
  makeRodGrid,
  solveRod,
  startWarmUp,
} from '../../src/heat';
import { ringShares } from '../../src/pump';
import { plainRod } from './rod';

const boundary = { side: 290, front: 295, back: 285 };
const capacity = { rod: 2.7e6, mount: 3.4e6 };

function prepare(model: RodHeatModel) {
  const grid = makeRodGrid(model, { pumpRadius: 0.3e-3, absorptionCoefficient: 300, cells: 'study' });
  const shares = ringShares({ kind: 'gaussian' }, grid.radialFaces, 0.3e-3);
  const deposit = grid.axialCentres.map((z) => Math.exp(-300 * z) / 10);
  return { conduction: assembleRod(model, grid), heat: heatSource(grid, shares, deposit, 5) };
}

const filmed: RodHeatModel = {
  ...plainRod,
  side: { kind: 'contact', conductance: 8000 },
  front: { kind: 'film', coefficient: 300 },
  back: { kind: 'film', coefficient: 50 },
};
const inRing: RodHeatModel = {
  ...filmed,
  side: {
    kind: 'ring',
    contactConductance: 8000,
    conductivity: 390,
    outerRadius: 8e-3,
    outer: { kind: 'contact', conductance: 3000 },
  },
};

describe('warm-up of a rod', () => {
  it.each([
    ['in a contact', filmed],
    ['in a ring', inRing],
  ])('%s ends at the steady state, from cold and from hot', (_, model) => {
    const { conduction, heat } = prepare(model);
    const steady = solveRod(conduction, heat, boundary);
    for (const initial of [280, 450]) {
      const end = advance(startWarmUp(conduction, capacity, boundary, initial), heat, 2000);
      end.temperatures.forEach((temperature, p) =>
        expect(temperature).toBeCloseTo(steady.temperatures[p]!, 6),
      );
    }
  });

  it('a steady field under unchanged heat stays as it is', () => {
    const { conduction, heat } = prepare(filmed);
    const steady = solveRod(conduction, heat, boundary);
    const later = advance(startWarmUp(conduction, capacity, boundary, steady), heat, 0.3);
    later.temperatures.forEach((temperature, p) =>
      expect(temperature).toBeCloseTo(steady.temperatures[p]!, 8),
    );
  });

  it('in its first instants an insulated-like rod stores all its heat: mean rise = heat x time / capacity', () => {
    const { conduction, heat } = prepare({ ...plainRod, side: { kind: 'contact', conductance: 1e-3 } });
    const warmUp = startWarmUp(conduction, capacity, { side: 300, front: 300, back: 300 }, 300);
    const field = advance(warmUp, heat, 0.5);
    let stored = 0;
    field.temperatures.forEach((temperature, p) => (stored += warmUp.storage[p]! * (temperature - 300)));
    // The tiny conductance that keeps the steady problem solvable leaks about 1e-6 of the heat.
    expect(stored / (field.generated * 0.5)).toBeCloseTo(1, 5);
  });

  it('going in one call or in several gives the same temperatures', () => {
    const { conduction, heat } = prepare(filmed);
    const once = advance(startWarmUp(conduction, capacity, boundary, 290), heat, 0.4);
    const parts = startWarmUp(conduction, capacity, boundary, 290);
    let field = advance(parts, heat, 0.03);
    for (const span of [0.07, 0.1, 0.2]) field = advance(parts, heat, span);
    expect(parts.time).toBeCloseTo(0.4, 12);
    // Other steps, so only their error (about 1e-4 of the rise) differs.
    expect(Math.abs(field.peakTemperature - once.peakTemperature)).toBeLessThan(
      3e-4 * (once.peakTemperature - 290),
    );
  });

  it('when the base warms, the whole rod follows in the end', () => {
    const { conduction, heat } = prepare(filmed);
    const warmUp = startWarmUp(conduction, capacity, boundary, solveRod(conduction, heat, boundary));
    const warmer = { side: 310, front: 295, back: 285 };
    const end = advance(warmUp, heat, 1000, true, warmer);
    expect(end.peakTemperature).toBeCloseTo(solveRod(conduction, heat, warmer).peakTemperature, 6);
  });

  it('refuses a conductivity that varies and a ring without heat capacity', () => {
    const varying = prepare({ ...filmed, conductivityExponent: 1 });
    expect(() => startWarmUp(varying.conduction, capacity, boundary, 290)).toThrow(/constant conductivity/);
    expect(() => startWarmUp(prepare(inRing).conduction, { rod: 2.7e6 }, boundary, 290)).toThrow(
      /heat capacity/,
    );
  });
});
