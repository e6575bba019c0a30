import { describe, expect, it } from 'vitest';
import { ballpark } from './ballpark';
import { degC, levelOf, reportOf, trial } from './trial';

// Ballparks from an independent small finite-volume script, within 15 %. Its heat, 2.1 / 1.8 / 1.1 W, is 98 % of the
// pump power times the quantum defect where 3.5 per cm over 6 mm absorb 88 %; so its peaks are up to 10 % higher.
// dn/dT of this fluoride is printed from -0.7e-6 to -4.6e-6 per kelvin; the script's lens is that of -4.6e-6.
const steep = {
  'rod.heatFraction': 'from laser',
  'rod.values': { thermoOptic: '-4.6e-6 1/K', thermalConductivityRadial: '5.3 W/(m K)' },
};

const lines = [
  { line: '640 nm', heat: 2.1, peak: 106, bulk: -79, free: 49 },
  { line: '607 nm', heat: 1.8, peak: 95, bulk: -68, free: 43 },
  { line: '523 nm', heat: 1.1, peak: 66, bulk: -42, free: 26 },
];

describe('Visible praseodymium, sign trap', () => {
  for (const { line, heat, peak, bulk, free } of lines)
    it(`at ${line} makes ${heat} W of heat, peaks at ${peak} degC, has ${bulk} /m of bulk lens and a bulge that turns it round`, () => {
      const { point } = levelOf(trial('praseodymium', { ...steep, 'rod.laserLine': line })).lasing;
      ballpark(point.heatLoad, heat);
      ballpark(point.rod.peakTemperature - degC(20), peak - 20);
      ballpark(point.lens.thermoOptic, bulk);
      // The sum of two large terms of unlike sign: the bulge itself is what can be compared.
      ballpark(point.lens.estimate - point.lens.thermoOptic, free - bulk);
      expect(point.lens.estimate).toBeGreaterThan(0);
      expect(point.lens.dioptricPower).toBeLessThan(0);
    });

  it('says that the sign of its lens is not settled, and gives lens and stability for both', () => {
    const { warnings, operating } = reportOf(trial('praseodymium', steep));
    const sign = warnings.find((warning) => warning.where === 'lens')!;
    expect(sign.text).toContain('sign of the lens is not settled');
    for (const value of [operating.lens.thermoOptic, operating.lens.estimate])
      expect(sign.text).toContain(`${Number(value.toPrecision(3))} /m`);
    expect(sign.text.match(/stable/g)!.length).toBeGreaterThanOrEqual(2);
  });

  it('absorbs its two diodes differently, and says how much of each polarisation', () => {
    const absorbed = (polarisation: string) =>
      levelOf(trial('praseodymium', { 'rod.absorption': 'from crystal', 'pump.polarisation': polarisation }))
        .lasing.point.absorbedPower;
    const [pi, sigma, both] = ['pi', 'sigma', 'unpolarised'].map(absorbed);
    expect(pi!).toBeGreaterThan(1.5 * sigma!);
    expect(both!).toBeCloseTo((pi! + sigma!) / 2, 2);
    const { warnings } = reportOf(trial('praseodymium', { 'rod.absorption': 'from crystal' }));
    const remark = warnings.find((warning) => warning.where === 'pump.polarisation')!;
    expect(remark.text).toContain(`${((100 * pi!) / 7).toFixed(0)} %`);
    expect(remark.text).toContain(`${((100 * sigma!) / 7).toFixed(0)} %`);
  });

  it('has 16 W of heat at the diodes, far more than in the rod', () => {
    const { point } = levelOf(trial('praseodymium')).lasing;
    ballpark(point.diode.heat, 16);
    expect(point.diode.heat).toBeGreaterThan(5 * point.heatLoad);
  });

  it('is governed by the bin: 0.06 nm/K against a 2 nm line is little, three nanometres of bin are much', () => {
    const base = { 'rod.absorption': 'from crystal', 'pump.polarisation': 'pi' };
    const at = (changes: Record<string, unknown>) =>
      levelOf(trial('praseodymium', { ...base, ...changes })).lasing.point;
    const nominal = at({});
    const warm = at({ 'surroundings.ambient': '30 degC' });
    const bin = at({ 'pump.wavelength': '447 nm' });
    expect((warm.diode.wavelength - nominal.diode.wavelength) * 1e9).toBeCloseTo(0.6, 2);
    expect(warm.absorbedPower / nominal.absorbedPower).toBeGreaterThan(0.9);
    expect(bin.absorbedPower / nominal.absorbedPower).toBeLessThan(0.5);
  });
});

describe('A quarter watt in a cold room', () => {
  // Common practice, no source: a few hundred mW of blue pump in a cool room rarely needs active cooling.
  it('is cooled passively with a wide margin on every limit, and the ladder says so', () => {
    const report = reportOf(trial('quarter-watt'));
    const fins = report.options.find((option) => option.id === 'fins')!;
    expect(fins.passes).toBe(true);
    for (const margin of fins.margins) expect(margin.share, margin.limit).toBeGreaterThan(0.2);
    const step = report.ladder.find((item) => item.fromPumpPower <= 0.25 && 0.25 <= item.toPumpPower)!;
    expect(step.option).toBe('fins');
    expect(report.verdict.holds).toBe(true);
    expect(report.verdict.text).toContain('Nothing less demanding holds');
  });
});
