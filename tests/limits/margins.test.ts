import { describe, expect, it } from 'vitest';
import { marginsOf, worstOf, type PointWithLimits } from '../../src/limits/margins';
import type { LimitName } from '../../src/limits/types';
import type { OperatingPoint } from '../../src/operating/types';
import { levelOf, trial, type Changes } from '../trials/trial';

const level = levelOf(trial('quarter-watt'));
const limits = {
  rodPeakTemperature: 373.15,
  fractureSafetyFactor: 3,
  stabilityMargin: 0.02,
  absorptionShare: 0.9,
  dewPointGuard: 3,
  tecCurrentShare: 0.7,
  aberrationLoss: 0.03,
  highestCaseTemperature: 323.15,
  fractureStrength: 90e6,
  ambient: 293.15,
};

/** A solved point of a real design with some of its numbers replaced. */
function pointWith(
  changes: (point: OperatingPoint) => void,
  coolerLimits: PointWithLimits['coolerLimits'] = [],
): PointWithLimits {
  const point = structuredClone(level.lasing.point);
  changes(point);
  return { point, coolerLimits };
}
const asIs = () => undefined;
const named = (limit: LimitName, lasing: PointWithLimits, blocked: PointWithLimits) =>
  marginsOf(lasing, blocked, limits).find((margin) => margin.limit === limit);

describe('Margins', () => {
  it('are those of the worse of lasing and blocked beam, and say which', () => {
    const hot = pointWith((point) => (point.rod.peakTemperature = 363.15));
    const cool = pointWith((point) => (point.rod.peakTemperature = 333.15));
    const inBlocked = named('rod peak temperature', cool, hot)!;
    expect(inBlocked).toMatchObject({ beam: 'blocked', holds: true, unit: 'K' });
    expect(inBlocked.margin).toBeCloseTo(10, 9);
    // The room is from the ambient, 20 degC, to the bound, 100 degC.
    expect(inBlocked.share).toBeCloseTo(10 / 80, 9);
    expect(named('rod peak temperature', hot, cool)).toMatchObject({ beam: 'lasing' });
  });

  it('are zero on the bound, which still holds, and negative beyond', () => {
    const on = pointWith((point) => (point.rod.peakTemperature = limits.rodPeakTemperature));
    const beyond = pointWith((point) => (point.rod.peakTemperature = limits.rodPeakTemperature + 1));
    expect(named('rod peak temperature', on, on)).toMatchObject({ holds: true, margin: 0 });
    expect(named('rod peak temperature', beyond, on)).toMatchObject({ holds: false, margin: -1 });
  });

  it('allow a tensile stress of the fracture strength over the safety factor', () => {
    const strained = pointWith((point) => (point.stress.peakTensile = 36e6));
    expect(named('fracture stress', strained, strained)).toMatchObject({
      bound: 30e6,
      margin: -6e6,
      holds: false,
    });
  });

  it('ask for a stable cavity in the worse plane, and only of the lasing beam', () => {
    const unstable = pointWith((point) => (point.cavity.tangential.stability = -1.1));
    const fine = pointWith((point) => {
      point.cavity.sagittal.stability = 0.3;
      point.cavity.tangential.stability = -0.5;
    });
    expect(named('cavity stability', unstable, fine)!.holds).toBe(false);
    const margin = named('cavity stability', fine, unstable)!;
    expect(margin.holds).toBe(true);
    expect(margin.value).toBeCloseTo(0.5, 12);
  });

  it('bound the diode case on the nearer side of its window, and not at all where absorption does not drift', () => {
    const at = (
      caseTemperature: number,
      window: { low: number | null; high: number | null; best: number | null },
    ) => pointWith((point) => (point.diode = { ...point.diode, caseTemperature, caseWindow: window }));
    const window = { low: 300, high: 310, best: 305 };
    const cold = at(298, window);
    expect(named('diode case window', cold, cold)).toMatchObject({ bound: 300, holds: false });
    const warm = at(309, window);
    expect(named('diode case window', warm, warm)).toMatchObject({ bound: 310, holds: true });
    expect(named('diode case window', warm, warm)!.share).toBeCloseTo(0.2, 9);
    const half = at(320, { low: 300, high: null, best: 305 });
    expect(named('diode case window', half, half)!.holds).toBe(true);
    const none = at(320, { low: null, high: null, best: null });
    expect(named('diode case window', none, none)).toBeUndefined();
  });

  it('keep the coldest part that air can reach above the dew point and its guard', () => {
    const damp = pointWith((point) => {
      point.cooler.dewPoint = 287;
      point.cooler.coldestTemperature = 289;
    });
    // 289 K is above the dew point but inside its guard of 3 K.
    expect(named('dew point', damp, damp)).toMatchObject({ holds: false, value: 289, bound: 290 });
  });

  it('pass on the limits of the cooler itself', () => {
    const overloaded = pointWith(asIs, [{ limit: 'cooler capacity', value: 120, bound: 100, unit: 'W' }]);
    expect(named('cooler capacity', overloaded, pointWith(asIs))).toMatchObject({
      margin: -20,
      share: -0.2,
      holds: false,
    });
  });

  it('without a steady state in either beam are that fault alone', () => {
    const none = pointWith((point) => (point.state = 'none'));
    for (const pair of [
      [none, pointWith(asIs)],
      [pointWith(asIs), none],
    ] as const) {
      const margins = marginsOf(pair[0], pair[1], limits);
      expect(margins).toHaveLength(1);
      expect(margins[0]).toMatchObject({ limit: 'steady state', holds: false });
    }
  });

  it('have a worst one: the least share of its room', () => {
    const margins = marginsOf(level.lasing, level.blocked, limits);
    expect(worstOf(margins).share).toBe(Math.min(...margins.map((margin) => margin.share)));
  });
});

describe('Every limit of a design can be the one that is broken', () => {
  const cases: [limit: LimitName, name: string, changes: Changes, cooler?: string][] = [
    ['rod peak temperature', 'vanadate', { 'limits.rodPeakTemperature': '80 degC' }],
    ['fracture stress', 'vanadate', { 'rod.values.fractureStrength': '10 MPa' }],
    ['cavity stability', 'vanadate', {}],
    ['aberration loss', 'vanadate', { 'pump.profile': 'gaussian', 'limits.aberrationLoss': '0.1 %' }],
    ['diode case window', 'bin-decides', { 'pump.wavelength': '811 nm' }],
    ['diode case temperature', 'bin-decides', { 'pump.diode.caseToBase': '1 K/W' }],
    ['cooler capacity', 'bin-decides', {}, 'TEC on poor sink'],
    ['TEC current', 'bin-decides', { 'limits.tecCurrentShare': '20 %' }, 'TEC on good sink'],
    ['dew point', 'bin-decides', { 'surroundings.relativeHumidity': '95 %' }, 'TEC on good sink'],
  ];
  it.each(cases)('%s, in the %s trial', (limit, name, changes, cooler) => {
    const { margins } = levelOf(trial(name, changes), cooler, 'coarse');
    expect(margins.find((margin) => margin.limit === limit)!.holds).toBe(false);
  });
});
