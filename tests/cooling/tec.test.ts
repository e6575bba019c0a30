import { describe, expect, it } from 'vitest';
import { fanCooler, passiveCooler, resistanceCooler, tecCooler } from '../../src/cooling';
import { makeThermopile } from '../../src/cooling/thermopile';
import { heatPumped, heatRejected } from '../../src/cooling/thermoelectric';
import { fanSpec, finSpec, legs, room, tecSpec } from './examples';

const onFan = tecCooler(tecSpec, fanCooler(fanSpec));

describe('a TEC', () => {
  it('holds the base at the set temperature up to its capacity', () => {
    const capacity = onFan.settle(0, room).details.capacity!;
    expect(onFan.baseTemperature(0.5 * capacity, room)).toBe(293.15);
    expect(onFan.baseTemperature(0.999 * capacity, room)).toBe(293.15);
    expect(onFan.baseTemperature(1.001 * capacity, room)).toBeGreaterThan(293.15);
    expect(onFan.baseTemperature(1.001 * capacity, room)).toBeLessThan(293.3);
  });

  it('agrees with its modules and with its hot side at once', () => {
    const { details } = onFan.settle(15, room);
    const { current, coldJunctionTemperature: cold, hotJunctionTemperature: hot } = details;
    const module = makeThermopile(legs).at(0.5 * (cold! + hot!));
    expect(heatPumped(module, current!, cold!, hot!)).toBeCloseTo(15, 7);
    const rejected = heatRejected(module, current!, cold!, hot!);
    expect(fanCooler(fanSpec).baseTemperature(rejected, room)).toBeCloseTo(hot!, 6);
  });

  it('draws no less current for more heat, while it holds', () => {
    let last = -Infinity;
    for (let heat = 0; heat < 25; heat += 1) {
      const { current } = onFan.settle(heat, room).details;
      expect(current).toBeGreaterThan(last);
      last = current!;
    }
  });

  it('heats with reversed current in a cold room', () => {
    const { details, baseTemperature } = onFan.settle(0, { ...room, ambient: 278.15 });
    expect(baseTemperature).toBe(293.15);
    expect(details.current).toBeLessThan(0);
  });

  it('floats as cold as any current can make it when the heat is too much', () => {
    const strong = tecCooler({ ...tecSpec, highestCurrent: 8 }, fanCooler(fanSpec));
    const { baseTemperature, details, limits, warnings } = strong.settle(40, room);
    const chosen = details.current!;
    for (const highestCurrent of [0.8 * chosen, 0.97 * chosen]) {
      const weaker = tecCooler({ ...tecSpec, highestCurrent }, fanCooler(fanSpec));
      expect(weaker.baseTemperature(40, room)).toBeGreaterThan(baseTemperature);
    }
    const stronger = tecCooler({ ...tecSpec, highestCurrent: 12 }, fanCooler(fanSpec));
    expect(stronger.baseTemperature(40, room)).toBeCloseTo(baseTemperature, 6);
    expect(limits[0]!.value).toBeGreaterThan(limits[0]!.bound);
    expect(warnings[0]!.text).toContain('cannot hold');
  });

  it('needs no more current than helps, whatever the driver could give', () => {
    for (const resistance of [0.2, 4, 20]) {
      const base = (highestCurrent: number) =>
        tecCooler({ ...tecSpec, highestCurrent }, resistanceCooler({ resistance })).baseTemperature(30, room);
      // 1e-5 K: the best current is found to a share of the highest.
      expect(Math.abs(base(100) - base(12))).toBeLessThan(1e-5);
    }
  });

  it('has a capacity that a poor hot side takes away', () => {
    const capacity = (resistance: number) =>
      tecCooler(tecSpec, resistanceCooler({ resistance })).settle(0, room).details.capacity!;
    expect(capacity(1)).toBeLessThan(capacity(0.5));
    expect(capacity(0.5)).toBeLessThan(capacity(0.1));
  });

  it('says that a controller would run away when more current only heats', () => {
    const poor = tecCooler({ ...tecSpec, highestCurrent: 8 }, resistanceCooler({ resistance: 4 }));
    const texts = poor.settle(20, room).warnings.map(({ text }) => text);
    expect(texts.some((text) => text.includes('run away'))).toBe(true);
  });

  it('has no steady state when its hot side has none, and names the runaway', () => {
    const state = tecCooler(tecSpec, passiveCooler(finSpec)).settle(400, room);
    expect(state.state).toBe('none');
    expect(state.reason).toContain('thermal runaway, no steady hot side');
  });

  it('bounds its current by the smaller of a share of Imax and what the driver gives', () => {
    const bound = (change: object) =>
      tecCooler({ ...tecSpec, ...change }, fanCooler(fanSpec)).settle(15, room).limits[1]!.bound;
    const { imax } = onFan.settle(15, room).details;
    expect(bound({})).toBeCloseTo(0.7 * imax!, 9);
    expect(bound({ currentShare: 0.5 })).toBeCloseTo(0.5 * imax!, 9);
    expect(bound({ highestCurrent: 2 })).toBe(2);
  });

  it('pays for ceramic, grease, solder and air leak with current', () => {
    const current = (change: object) =>
      tecCooler({ ...tecSpec, setTemperature: 283.15, ...change }, fanCooler(fanSpec)).settle(10, room)
        .details.current!;
    const ideal = current({});
    expect(current({ ceramicResistance: 0.1 })).toBeGreaterThan(ideal);
    expect(current({ coldInterfaceResistance: 0.1 })).toBeGreaterThan(ideal);
    expect(current({ hotInterfaceResistance: 0.1 })).toBeGreaterThan(ideal);
    expect(current({ leakConductance: 0.1 })).toBeGreaterThan(ideal);
    expect(current({ module: { ...legs, contactResistivity: 1e-9 } })).toBeGreaterThan(ideal);
  });

  it('shows its junctions as the coldest surface and carries the limits of its hot side', () => {
    const state = tecCooler({ ...tecSpec, ceramicResistance: 0.1 }, fanCooler(fanSpec)).settle(10, room);
    expect(state.coldestTemperature).toBeCloseTo(292.15, 9);
    expect(state.details['hotSide.airFlow']).toBeGreaterThan(0);
  });

  it('as warm as full heating makes it stays below the set temperature and says so', () => {
    const weak = tecCooler(
      { ...tecSpec, setTemperature: 303.15, highestCurrent: 1, leakConductance: 2 },
      fanCooler(fanSpec),
    );
    const state = weak.settle(0, { ...room, ambient: 260 });
    expect(state.baseTemperature).toBeLessThan(303.15);
    expect(state.baseTemperature).toBeGreaterThan(260);
    expect(state.warnings[0]!.text).toContain('cannot heat');
  });

  it('warns when a data sheet contradicts itself', () => {
    const sheet = {
      kind: 'data sheet' as const,
      count: 1,
      greatestCurrent: 6.1,
      greatestVoltage: 15.3,
      greatestDifference: 65.7,
      hotSideTemperature: 300,
    };
    const texts = (greatestHeat: number) =>
      tecCooler({ ...tecSpec, module: { ...sheet, greatestHeat } }, fanCooler(fanSpec))
        .settle(5, room)
        .warnings.map(({ text }) => text);
    expect(texts(57)).toEqual([]);
    expect(texts(90)[0]).toContain('does not follow');
  });

  it('by data sheet answers like the same module by its legs', () => {
    // The sheet of 127 couples, 1.4 x 1.4 x 1.6 mm, worked out from the same property polynomials by brute force.
    const module = {
      kind: 'data sheet' as const,
      count: 1,
      greatestCurrent: 6.139,
      greatestVoltage: 15.251,
      greatestDifference: 65.66,
      hotSideTemperature: 300,
    };
    const bySheet = tecCooler({ ...tecSpec, module }, fanCooler(fanSpec)).settle(15, room).details;
    expect(bySheet.current! / onFan.settle(15, room).details.current!).toBeCloseTo(1, 2);
  });
});

describe('the two-module scenario of a diode bin that wants 17 degC', () => {
  // 45 W on the plate, ambient 27 degC; figures of an independent script: 31 W at 0.1 K/W, impossible at 0.3 K/W.
  const air = { ...room, ambient: 300.15, relativeHumidity: 0.6 };
  const module = { ...legs, legHeight: 1.15e-3, count: 2 };
  const at = (resistance: number) =>
    tecCooler(
      { module, setTemperature: 290.15, highestCurrent: 6, driverEfficiency: 1 },
      resistanceCooler({ resistance }),
    ).settle(45, air);

  it('takes about 31 W on a good hot side', () => {
    const { baseTemperature, electricalPower } = at(0.1);
    expect(baseTemperature).toBe(290.15);
    // 15 %: the script had other module constants.
    expect(Math.abs(electricalPower / 31 - 1)).toBeLessThan(0.15);
  });

  it('cannot be held on a poor one', () => {
    expect(at(0.3).baseTemperature).toBeGreaterThan(291);
  });
});
