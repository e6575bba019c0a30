import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CoolerState } from '../../src/cooling';
import { everyCooler, room } from './examples';

const heat = fc.oneof(
  fc.double({ min: 0, max: 2000, noNaN: true }),
  fc.double({ min: 0, max: 40, noNaN: true }),
);
const surroundings = fc.record({
  ambient: fc.double({ min: 263.15, max: 318.15, noNaN: true }),
  relativeHumidity: fc.double({ min: 0.05, max: 1, noNaN: true }),
  airPressure: fc.double({ min: 60e3, max: 105e3, noNaN: true }),
});

function numbersOf(state: CoolerState): number[] {
  const { baseTemperature, electricalPower, coldestTemperature, heatToAmbient, details, limits, flows } =
    state;
  return [
    baseTemperature,
    electricalPower,
    coldestTemperature,
    heatToAmbient,
    ...Object.values(details),
    ...limits.flatMap(({ value, bound }) => [value, bound]),
    ...flows.map(({ power }) => power),
  ];
}

/** Given minus taken, per node. */
function balance(state: CoolerState): Map<string, number> {
  const nodes = new Map<string, number>();
  for (const { from, to, power } of state.flows) {
    nodes.set(from, (nodes.get(from) ?? 0) + power);
    nodes.set(to, (nodes.get(to) ?? 0) - power);
  }
  return nodes;
}

describe.each(Object.entries(everyCooler))('%s', (_, cooler) => {
  it('has finite numbers for any heat up to 2 kW in any room', () => {
    fc.assert(
      fc.property(heat, surroundings, (watts, air) => {
        const state = cooler.settle(watts, air);
        expect(numbersOf(state).every(Number.isFinite)).toBe(true);
        expect(state.reason === undefined).toBe(state.state === 'steady');
      }),
      { numRuns: 60 },
    );
  });

  it('gets warmer at the base with more heat', () => {
    fc.assert(
      fc.property(heat, heat, surroundings, (a, b, air) => {
        const cooler1 = cooler.baseTemperature(Math.min(a, b), air);
        const cooler2 = cooler.baseTemperature(Math.max(a, b), air);
        // The coldest base of a TEC is found to 1e-6 K.
        expect(cooler2).toBeGreaterThanOrEqual(cooler1 - 1e-6);
      }),
      { numRuns: 100 },
    );
  });

  it('gives at every node what it takes, and all of it to the surroundings', () => {
    fc.assert(
      fc.property(heat, surroundings, (watts, air) => {
        const state = cooler.settle(watts, air);
        if (state.state === 'none') return;
        const nodes = balance(state);
        const scale = 1e-9 * (1 + watts + state.electricalPower);
        expect(Math.abs(nodes.get('base')! - watts)).toBeLessThan(scale);
        expect(Math.abs((nodes.get('wall plug') ?? 0) - state.electricalPower)).toBeLessThan(scale);
        expect(Math.abs(nodes.get('surroundings')! + state.heatToAmbient)).toBeLessThan(scale);
        for (const [node, excess] of nodes) {
          if (!['base', 'wall plug', 'surroundings'].includes(node))
            expect(Math.abs(excess)).toBeLessThan(scale);
        }
        expect(state.flows.every(({ power }) => power >= 0)).toBe(true);
      }),
      { numRuns: 60 },
    );
  });

  it('answers the base temperature alone as it does within the whole state', () => {
    for (const watts of [0, 3, 30, 300]) {
      expect(cooler.baseTemperature(watts, room)).toBe(cooler.settle(watts, room).baseTemperature);
    }
  });

  it('gives the same answer whatever it was asked before', () => {
    const first = cooler.settle(12, room);
    cooler.settle(700, { ...room, ambient: 280 });
    expect(cooler.settle(12, room)).toEqual(first);
  });
});
