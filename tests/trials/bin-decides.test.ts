import { describe, expect, it } from 'vitest';
import { ballpark } from './ballpark';
import { degC, levelOf, reportOf, trial } from './trial';

const low = trial('bin-decides', { 'pump.wavelength': '806.1 nm' });
const high = trial('bin-decides', { 'pump.wavelength': '811 nm' });
const brokenOf = (design: typeof low, cooler: string) =>
  levelOf(design, cooler)
    .margins.filter((margin) => !margin.holds)
    .map((margin) => margin.limit);

describe('The bin decides: a 30 W module on one plate with its rod', () => {
  it('has 37 W of diode heat and 8 W of rod heat at a dew point of 18.6 degC', () => {
    const { point } = levelOf(low, 'plate').lasing;
    ballpark(point.diode.heat, 37);
    ballpark(point.heatLoad, 8);
    expect(point.cooler.dewPoint).toBeCloseTo(degC(18.6), 1);
  });

  it('wants 33 degC with a bin of 806.1 nm, and a plate of 0.13 K/W gives it without a TEC', () => {
    const { point } = levelOf(low, 'plate').lasing;
    expect(point.diode.caseWindow.best!).toBeCloseTo(degC(33), -0.3);
    expect(point.diode.wavelength * 1e9).toBeCloseTo(808.5, 0);
    expect(brokenOf(low, 'plate')).not.toContain('diode case window');
    expect(brokenOf(low, 'poor sink')).toContain('diode case window');
  });

  it('wants 17 degC with a bin of 811 nm: two modules with about 31 W on a hot side of 0.1 K/W, below the dew point', () => {
    const { lasing } = levelOf(high, 'TEC on good sink');
    expect(lasing.point.diode.caseWindow.best!).toBeCloseTo(degC(17), -0.3);
    ballpark(lasing.cooler.details.tecPower!, 31);
    expect(brokenOf(high, 'TEC on good sink')).toContain('dew point');
    expect(brokenOf(high, 'TEC on good sink')).not.toContain('cooler capacity');
    expect(brokenOf(high, 'plate')).toContain('diode case window');
  });

  it('cannot be held there on a hot side of 0.3 K/W', () => {
    expect(brokenOf(high, 'TEC on poor sink')).toContain('cooler capacity');
  });

  it('is answered with another bin rather than with the TEC, and that bin does away with the fault', () => {
    const { text } = reportOf(high).verdict;
    const named = /bin of about ([\d.]+) nm/.exec(text);
    expect(named, text).not.toBeNull();
    const wavelength = Number(named![1]);
    expect(Math.abs(wavelength - 806.5)).toBeLessThan(0.6);
    const other = trial('bin-decides', { 'pump.wavelength': `${wavelength} nm` });
    expect(brokenOf(other, 'plate')).not.toContain('diode case window');
    expect(reportOf(low).verdict.text).not.toContain('bin of about');
  });
});
