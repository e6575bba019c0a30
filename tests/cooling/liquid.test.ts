import { describe, expect, it } from 'vitest';
import { liquidCooler } from '../../src/cooling';
import { findCoolant } from '../../src/materials';
import { room, waterSpec } from './examples';

describe('coolant through the base', () => {
  it('leaves warmer by heat over mass flow and specific heat', () => {
    const { details } = liquidCooler(waterSpec).settle(100, room);
    expect(details.outletTemperature! - details.supplyTemperature!).toBeCloseTo(1.4373, 3);
  });

  it('keeps the wall above the leaving coolant', () => {
    const slow = liquidCooler({ ...waterSpec, flow: 0.02e-3 / 60 }).settle(20, room);
    expect(slow.baseTemperature).toBeGreaterThan(slow.details.outletTemperature!);
  });

  it('heats the coolant with the pump, to the watt', () => {
    const { limits, details } = liquidCooler({ ...waterSpec, extraPressureDrop: 50e3 }).settle(100, room);
    expect(limits[0]).toMatchObject({ limit: 'cooler capacity', bound: 300 });
    expect(limits[0]!.value).toBeCloseTo(100 + details.pumpPower!, 10);
    expect(details.pumpPower).toBeCloseTo((details.pressureDrop! * waterSpec.flow) / 0.3, 10);
  });

  it('shows the supply as the coldest surface', () => {
    const state = liquidCooler(waterSpec).settle(100, room);
    expect(state.coldestTemperature).toBe(293.15);
  });

  it('stands above the air that cools it by load times resistance', () => {
    const supply = { kind: 'air' as const, resistance: 0.1 };
    const { details } = liquidCooler({ ...waterSpec, supply }).settle(100, room);
    expect(details.supplyTemperature! - room.ambient).toBeCloseTo(0.1 * (100 + details.pumpPower!), 9);
  });

  it('is better with more flow, through laminar, mixed and turbulent flow', () => {
    let last = Infinity;
    for (let flow = 0.05e-3 / 60; flow < 4e-3 / 60; flow *= 1.15) {
      const base = liquidCooler({ ...waterSpec, flow }).baseTemperature(50, room);
      expect(base).toBeLessThan(last);
      last = base;
    }
  });

  it('warns between laminar and turbulent flow, of frost, of boiling and outside its table', () => {
    const texts = (change: object, heat = 50) =>
      liquidCooler({ ...waterSpec, ...change })
        .settle(heat, room)
        .warnings.map(({ text }) => text)
        .join(' ');
    expect(texts({ flow: 0.55e-3 / 60 })).toContain('between laminar and turbulent');
    expect(texts({ supply: { ...waterSpec.supply, setPoint: 270 } })).toContain('freezing point');
    expect(texts({}, 1500)).toContain('boil');
    expect(
      texts({ coolant: findCoolant('pg50')!, supply: { ...waterSpec.supply, setPoint: 350 } }),
    ).toContain('table');
    expect(texts({})).toBe('');
  });

  it('spreads through a plate when its size is known', () => {
    const plate = { width: 0.08, height: 0.08, thickness: 0.006, conductivity: 390 };
    const spread = liquidCooler({ ...waterSpec, plate, footprint: { side: 0.02 } });
    const { details } = spread.settle(50, room);
    expect(details.attachmentResistance).toBeGreaterThan(0.01);
    expect(details.attachmentResistance).toBeLessThan(0.1);
  });
});
