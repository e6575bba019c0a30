import { describe, expect, it } from 'vitest';
import { steadyBases } from '../../src/operating/point';
import { benchOf, levelOf, reportOf, trial } from '../trials/trial';

const sinkOf = (resistance: string) => [{ id: 'sink', kind: 'resistance', resistance }];

describe('No steady state', () => {
  const shared = { 'pump.diode.circuit': 'shared' };

  it('is a result with a reason where a tiny sink gets a big pump, and breaks that limit alone', () => {
    const { lasing, margins } = levelOf(trial('vanadate', { ...shared, coolers: sinkOf('1000 K/W') }));
    expect(lasing.point.state).toBe('none');
    expect(lasing.point.reason).toBeTruthy();
    expect(margins.map((margin) => margin.limit)).toEqual(['steady state']);
    expect(margins[0]!.holds).toBe(false);
    expect(Number.isFinite(lasing.point.rod.peakTemperature)).toBe(true);
  });

  it('is where a TEC heats its own hot side beyond belief', () => {
    const tec = {
      id: 'TEC',
      kind: 'tec',
      module: { couples: 127, legSide: '1.4 mm', legHeight: '1.6 mm' },
      setTemperature: '20 degC',
      highestCurrent: '5 A',
      hotSide: 'sink',
    };
    const { lasing, margins } = levelOf(
      trial('vanadate', { ...shared, coolers: [...sinkOf('20 K/W'), tec] }),
      'TEC',
    );
    expect(lasing.point.state).toBe('none');
    expect(lasing.point.reason).toMatch(/base|runaway|hot side/);
    expect(margins[0]!.limit).toBe('steady state');
  });

  it('is said in the report, whose ceiling lies below', () => {
    const report = reportOf(trial('vanadate', { ...shared, coolers: sinkOf('20 K/W') }));
    expect(report.operating.state).toBe('none');
    expect(report.warnings.map((warning) => warning.text).join()).toContain('no steady state');
    expect(report.options[0]!.passes).toBe(false);
    expect(report.options[0]!.ceiling.pumpPower!).toBeLessThan(12);
  });
});

describe('Two steady states', () => {
  // A narrow diode far below a narrow line: little light is absorbed and the base stays cool; or much of it is, which
  // keeps the base, and so the diode, warm enough for that.
  const design = trial('bin-decides', {
    'pump.power': '20 W',
    'pump.wavelength': '798 nm',
    'pump.linewidth': '0.5 nm',
    'pump.diode.wallPlugEfficiency': '90 %',
    'rod.heatFraction': { lasing: '40 %' },
    'surroundings.ambient': '20 degC',
    coolers: sinkOf('4 K/W'),
  });
  const bench = benchOf(design);
  const question = { pumpPower: 20, cooler: bench.cooler, beam: 'lasing' as const };

  it('are both found, and each of them is a balance of heat and cooling', () => {
    const bases = steadyBases(bench.prepared, question);
    expect(bases).toHaveLength(2);
    expect(bases[1]! - bases[0]!).toBeGreaterThan(10);
  });

  it('are reported as "two" with both base temperatures in the reason', () => {
    const { operating, options } = reportOf(design);
    expect(operating.state).toBe('two');
    expect(operating.reason).toMatch(/degC and .* degC/);
    expect(options[0]!.state).toBe('two');
  });

  it('are one where absorption does not know the wavelength', () => {
    expect(reportOf(trial('vanadate')).operating.state).toBe('steady');
  });
});
