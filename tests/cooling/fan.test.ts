import { describe, expect, it } from 'vitest';
import { fanCooler } from '../../src/cooling';
import { fanPressure } from '../../src/cooling/fan-curve';
import { airProperties } from '../../src/materials';
import { fanSpec, room } from './examples';

describe('fins under a fan', () => {
  const { details } = fanCooler(fanSpec).settle(20, room);

  it('work where the fan curve meets the loss between the fins', () => {
    const { density } = airProperties(room.ambient, room.airPressure);
    expect(fanPressure(fanSpec.fan, details.airFlow!, density)).toBeCloseTo(details.pressureDrop!, 8);
    expect(details.airFlow).toBeGreaterThan(0);
    expect(details.airFlow).toBeLessThan(fanSpec.fan.freeFlow);
  });

  it('need 0.15 to 0.5 K/W for a sink of this size (common practice, no source)', () => {
    expect(details.thermalResistance).toBeGreaterThan(0.15);
    expect(details.thermalResistance).toBeLessThan(0.5);
  });

  it('never run colder than the leaving air', () => {
    const air = room.ambient + details.airRise!;
    expect(fanCooler(fanSpec).baseTemperature(20, room)).toBeGreaterThan(air);
  });

  it('rise in proportion to the heat above air that the fan itself has warmed', () => {
    const cooler = fanCooler(fanSpec);
    const idle = cooler.baseTemperature(0, room);
    expect(idle).toBeGreaterThan(room.ambient);
    const rise = (heat: number) => cooler.baseTemperature(heat, room) - idle;
    expect(rise(40)).toBeCloseTo(4 * rise(10), 9);
  });

  it('gain from a stronger fan and from a fuller fan curve, lose in thin air', () => {
    const base = (fan: object, air = room) =>
      fanCooler({ ...fanSpec, fan: { ...fanSpec.fan, ...fan } }).baseTemperature(20, air);
    expect(base({ shutOffPressure: 90 })).toBeLessThan(base({}));
    expect(base({ curve: 'quadratic' })).toBeLessThan(base({}));
    expect(base({}, { ...room, airPressure: 70e3 })).toBeGreaterThan(base({}));
  });

  it('pass smoothly from laminar to turbulent air', () => {
    const wide = { ...fanSpec, finCount: 5, finHeight: 0.03 };
    const resistance = (freeFlow: number) =>
      fanCooler({ ...wide, fan: { freeFlow, shutOffPressure: 200, power: 3 } }).settle(20, room).details
        .thermalResistance!;
    let last = resistance(0.005);
    for (let flow = 0.0055; flow < 0.06; flow *= 1.1) {
      const next = resistance(flow);
      expect(next).toBeLessThan(last);
      expect(next).toBeGreaterThan(0.7 * last);
      last = next;
    }
  });

  it('warn when the air warms a lot', () => {
    expect(fanCooler(fanSpec).settle(400, room).warnings[0]!.text).toContain('The air warms by');
  });
});
