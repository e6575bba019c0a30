import { describe, expect, it } from 'vitest';
import { passiveCooler } from '../../src/cooling';
import { finSpec, room } from './examples';

const base = (spec: Partial<Parameters<typeof passiveCooler>[0]>, heat = 10, air = room) =>
  passiveCooler({ ...finSpec, ...spec }).baseTemperature(heat, air);

describe('fins in still air', () => {
  it('stay at ambient without heat', () => {
    expect(base({}, 0)).toBe(room.ambient);
  });

  it('rise less than in proportion, because warmer air rises faster and radiation grows', () => {
    const rise = (heat: number) => base({}, heat) - room.ambient;
    expect(rise(40)).toBeLessThan(4 * rise(10));
    expect(rise(40)).toBeGreaterThan(2 * rise(10));
  });

  it('run warmer when level, polished, in thin air, of a poor conductor, or cut short', () => {
    const known = base({});
    expect(base({ orientation: 'horizontal' })).toBeGreaterThan(known);
    expect(base({ emissivity: 0.05 })).toBeGreaterThan(known);
    expect(base({}, 10, { ...room, airPressure: 70e3 })).toBeGreaterThan(known);
    expect(base({ conductivity: 15 })).toBeGreaterThan(known);
    expect(base({ finHeight: 0.015 })).toBeGreaterThan(known);
  });

  it('have a best number of fins', () => {
    const few = base({ finCount: 5 });
    const best = base({ finCount: 13 });
    const many = base({ finCount: 40 });
    expect(best).toBeLessThan(few);
    expect(best).toBeLessThan(many);
  });

  it('need about 2 K/W for a palm-sized sink at 10 W (common practice, no source: 1.5 to 2.5 K/W)', () => {
    const { details } = passiveCooler(finSpec).settle(10, room);
    expect(details.thermalResistance).toBeGreaterThan(1.5);
    expect(details.thermalResistance).toBeLessThan(2.5);
  });

  it('have no steady state where the base would exceed 500 K, and say so', () => {
    const state = passiveCooler(finSpec).settle(2000, room);
    expect(state).toMatchObject({ state: 'none', reason: 'base would exceed 500 K', flows: [] });
    expect(state.warnings[0]!.text).toContain('table of air');
  });

  it('carry the cost of a small footprint and of grease', () => {
    expect(base({ footprint: { side: 0.02 } })).toBeGreaterThan(base({ footprint: { side: 0.05 } }));
    expect(base({ interfaceResistance: 0.1 }) - base({})).toBeCloseTo(1, 9);
  });

  it('are refused when they leave no room for air', () => {
    expect(() => passiveCooler({ ...finSpec, finCount: 80 })).toThrow('80 fins leave');
  });
});
