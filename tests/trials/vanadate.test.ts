import { describe, expect, it } from 'vitest';
import type { SolvedPoint } from '../../src/operating/point';
import { ballpark } from './ballpark';
import { benchOf, degC, edgeOfDesign, levelOf, reportOf, trial } from './trial';

// Ballparks from an independent small finite-volume script (constant properties, square bars as equal-area rods), within
// 15 %: its bar is 4 % wider and its barrel 13 % smaller than the conduction-equivalent rod computed here.

const freeFaces = { 'rod.values.expansion': '4.43e-6 1/K' };
const bulkOnly = { 'rod.values.expansion': '0 1/K' };
const conductive = { 'rod.values.thermalConductivityRadial': '9 W/(m K)' };

/** Pump power at which the free-disc lens (every slice free to bulge) reaches the lens power of the edge. */
const freeDiscEdge = ({ point }: SolvedPoint, lensAtEdge: number) =>
  (point.pumpPower * lensAtEdge) / point.lens.estimate;

describe('Vanadate, short plano-concave, 12 W', () => {
  const { lasing } = levelOf(trial('vanadate'));

  it('absorbs 11.9 W, makes 3.2 W of heat, and the barrel reaches about 30 degC at its hot end', () => {
    ballpark(lasing.point.absorbedPower, 11.9);
    ballpark(lasing.point.heatLoad, 3.2);
    ballpark(lasing.point.rod.edgeTemperature - degC(20), 10);
    // The light enters at z = 0 and falls off over 2 mm, so that is where it is hottest.
    expect(lasing.point.rod.peakPosition.z).toBeLessThan(0.5e-3);
  });

  it('peaks at about 127 degC with a conductivity of 5.2 W/(m K), at about 85 degC with 9', () => {
    ballpark(lasing.point.rod.peakTemperature - degC(20), 107);
    ballpark(levelOf(trial('vanadate', conductive)).lasing.point.rod.peakTemperature - degC(20), 65);
  });

  it('has a bulk lens of 18 /m under a flat-top and of 21 /m under a Gaussian, as the mode sees it', () => {
    ballpark(lasing.point.lens.thermoOptic, 18);
    ballpark(levelOf(trial('vanadate', { 'pump.profile': 'gaussian' })).lasing.point.lens.thermoOptic, 21);
  });

  it('loses its cavity at about 15.7 /m: at 10.5 W with dn/dT alone', () => {
    const { edge } = edgeOfDesign(trial('vanadate', bulkOnly));
    ballpark(edge.dioptricPower!, 15.7);
    ballpark(edge.pumpPower!, 10.5);
    expect(edge.windows[0]!.from).toBe(0);
  });

  it('loses it at 5.8 W if every slice could bulge freely, and later in the elastic solution, where the cold rod behind holds the faces', () => {
    const { bench, edge } = edgeOfDesign(trial('vanadate', freeFaces));
    const at12 = bench.lasing(12);
    ballpark(freeDiscEdge(at12, edge.dioptricPower!), 5.8);
    // The heated 2 mm sit on 8 mm of cold rod: the elastic bulge is a seventh of the free-disc one. The script had no
    // elasticity; the edge of the fuller model lies between its two numbers, near the one with dn/dT alone.
    const { bulge, thermoOptic, estimate } = at12.point.lens;
    expect(bulge / (estimate - thermoOptic)).toBeGreaterThan(0.1);
    expect(bulge / (estimate - thermoOptic)).toBeLessThan(0.2);
    expect(edge.pumpPower!).toBeGreaterThan(5.8);
    expect(edge.pumpPower!).toBeLessThan(10.5);
  });

  it('loses it at 14 to 19 W with newer constants', () => {
    const { bench, edge } = edgeOfDesign(trial('vanadate', conductive));
    expect(edge.pumpPower!).toBeGreaterThan(14);
    expect(edge.pumpPower!).toBeLessThan(19);
    ballpark(freeDiscEdge(bench.lasing(12), edge.dioptricPower!), 14);
    ballpark(edgeOfDesign(trial('vanadate', { ...conductive, ...bulkOnly })).edge.pumpPower!, 19);
  });

  it('gets cooler with a better contact, 147, 127 and 122 degC, and keeps its lens', () => {
    const at = (contact: string) =>
      levelOf(trial('vanadate', { 'mount.interface.conductance': contact })).lasing.point;
    const [bare, indium, grease] = ['0.25', '0.9', '2.0'].map((value) => at(`${value} W/(cm^2 K)`));
    ballpark(bare!.rod.peakTemperature - degC(20), 127);
    ballpark(indium!.rod.peakTemperature - degC(20), 107);
    ballpark(grease!.rod.peakTemperature - degC(20), 102);
    // The few milliwatts through the end faces' film are all that tells the lenses apart.
    for (const point of [bare!, grease!])
      expect(point.lens.dioptricPower / indium!.lens.dioptricPower).toBeCloseTo(1, 2.5);
  });

  it('is helped by a larger pump radius or a shorter arm, not by any cooler', () => {
    const at12 = (changes: Record<string, unknown>) =>
      benchOf(trial('vanadate', { ...freeFaces, ...changes })).lasing(12).point.cavity.sagittal.stable;
    expect(at12({})).toBe(false);
    expect(at12({ 'surroundings.ambient': '0 degC' })).toBe(false);
    expect(at12({ 'pump.radius': '250 um' })).toBe(true);
    expect(at12({ 'cavity.elements.2.space': '35 mm' })).toBe(true);
  });

  it('cannot be assured at 12 W with the constants in print: the answer says so, gives the band and what would help', () => {
    const report = reportOf(trial('vanadate', { 'rod.values': {} }), 'final');
    expect(report.verdict.holds).toBe(false);
    expect(report.verdict.text).toContain('cannot be assured');
    expect(report.verdict.text).toContain('larger pump radius');
    const { pumpPower, low, high } = report.cavityEdge;
    expect(low!).toBeLessThan(pumpPower!);
    expect(high!).toBeGreaterThan(14);
    expect(report.options[0]!.ceiling.setBy).toBe('cavity stability');
    expect(report.contributors.cavityEdge[0]!.path).toMatch(/thermoOptic|thermalConductivity/);
    const radius = report.levers.find((lever) => lever.path === 'pump.radius')!;
    expect(radius.effect).toBeGreaterThan(0.15);
  });
});

describe('Vanadate: how to cool it', () => {
  const coolers = [
    { id: 'fan sink', kind: 'resistance', resistance: '0.6 K/W' },
    { id: 'small sink', kind: 'resistance', resistance: '1.0 K/W' },
    {
      id: 'TEC',
      kind: 'tec',
      module: { couples: 127, legSide: '1.4 mm', legHeight: '1.6 mm' },
      setTemperature: '20 degC',
      highestCurrent: '5 A',
      hotSide: 'small sink',
    },
  ];
  const design = trial('vanadate', {
    ...conductive,
    coolers,
    'surroundings.ambient': '22 degC',
    'pump.diode.circuit': 'shared',
    'pump.wavelengthAtCase': '35 degC',
    'rod.absorption.drift': 'follows the line',
  });

  it('a fan sink of 0.6 K/W is enough for rod and diode together if the diode suits about 35 degC', () => {
    const { margins, lasing } = levelOf(design, 'fan sink');
    ballpark(lasing.point.heatLoad + lasing.point.diode.heat, 16.2);
    expect(margins.filter((margin) => !margin.holds)).toEqual([]);
    expect(lasing.point.diode.caseTemperature).toBeCloseTo(degC(36), -0.7);
  });

  it('a TEC on a 1.0 K/W sink is flagged as failing: it cannot pump that heat against its own', () => {
    const { margins, lasing } = levelOf(design, 'TEC');
    expect(margins.filter((margin) => !margin.holds).map((margin) => margin.limit)).toContain(
      'cooler capacity',
    );
    expect(lasing.cooler.warnings.map((warning) => warning.text).join()).toContain('cannot hold');
    // It takes more power than the laser diode gives light.
    expect(lasing.cooler.electricalPower).toBeGreaterThan(12);
  });
});
