import { describe, expect, it } from 'vitest';
import { benchOf, changed, trial } from '../trials/trial';

const garnet = changed(trial('garnet'), { 'pump.radius': '300 um' });

/** What is measured of a beam of a given shape, along its radius. */
const measured = (intensity: (r: number) => number, to: number, points: number): [string, number][] =>
  Array.from({ length: points }, (_, k) => {
    const r = (to * k) / (points - 1);
    return [`${r} um`, intensity(r)];
  });
const gaussian = (w: number) => (r: number) => 700 * Math.exp((-2 * r * r) / (w * w));

const solved = (profile: string, profileTable?: [string, number][], more: Record<string, unknown> = {}) => {
  const bench = benchOf(
    changed(garnet, { 'pump.profile': profile, 'pump.profileTable': profileTable, ...more }),
  );
  return { bench, ...bench.lasing(25) };
};

describe('A measured pump profile', () => {
  const closed = solved('gaussian');
  const table = solved('table', measured(gaussian(300), 900, 400));

  it('of a Gaussian gives the heat, lens and stress of the Gaussian, whatever the unit of its intensity', () => {
    // 400 straight pieces leave 3e-6 of the intensity; the radius of 86.5 % is found from them.
    expect(table.point.rod.peakTemperature).toBeCloseTo(closed.point.rod.peakTemperature, 2);
    expect(table.point.lens.dioptricPower / closed.point.lens.dioptricPower).toBeCloseTo(1, 4);
    expect(table.point.stress.peakTensile / closed.point.stress.peakTensile).toBeCloseTo(1, 4);
    expect(table.point.absorbedPower).toBeCloseTo(closed.point.absorbedPower, 6);
  });

  it('that is already as wide as the pump radius is taken as measured, without a remark', () => {
    const about = (at: typeof table) =>
      at.bench.prepared.resolved.warnings.filter(({ text }) => /stretched/.test(text));
    expect(about(table)).toEqual([]);
    const half = solved('table', measured(gaussian(150), 450, 400));
    expect(about(half)[0]!.text).toMatch(/within 150 um; it is stretched 2\.00 times.*Enter "150 um"/);
    expect(half.point.rod.peakTemperature).toBeCloseTo(table.point.rod.peakTemperature, 6);
  });

  it('grows with the beam away from its waist, as the Gaussian does', () => {
    const focus = { 'pump.beamQuality': 160, 'pump.waistPosition': '0 mm' };
    const [one, two] = [
      solved('gaussian', undefined, focus).point,
      solved('table', measured(gaussian(300), 900, 400), focus).point,
    ];
    expect(one.lens.dioptricPower).toBeLessThan(0.9 * closed.point.lens.dioptricPower);
    expect(two.lens.dioptricPower / one.lens.dioptricPower).toBeCloseTo(1, 3);
  });

  it('of a ring heats the axis less than a flat-top of the same edge does', () => {
    const hollow = solved(
      'table',
      measured((r) => (r < 150 ? 0.2 : 1), 300, 61),
      { 'pump.radius': '280 um' },
    );
    const flat = solved('flat-top');
    expect(hollow.point.rod.peakTemperature).toBeLessThan(flat.point.rod.peakTemperature);
    expect(hollow.point.lens.axisDioptricPower).toBeLessThan(0.6 * flat.point.lens.axisDioptricPower);
  });

  it('takes as many as 2000 points', () => {
    const many = solved('table', measured(gaussian(300), 900, 2000));
    expect(many.point.rod.peakTemperature).toBeCloseTo(closed.point.rod.peakTemperature, 3);
  });
});
