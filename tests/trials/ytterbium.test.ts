import { describe, expect, it } from 'vitest';
import { ballpark } from './ballpark';
import { degC, edgeOfDesign, levelOf, reportOf, trial } from './trial';

// Ballparks from an independent small finite-volume script (constant properties, square bar as an equal-area rod),
// within 15 %.

const freeFaces = { 'rod.values.expansion': '7.8e-6 1/K' };
const dry = { 'mount.interface.conductance': '0.25 W/(cm^2 K)', 'surroundings.ambient': '45 degC' };
const coldWater = {
  'surroundings.ambient': '25 degC',
  coolers: [
    {
      id: 'water',
      kind: 'liquid',
      channel: { diameter: '5 mm', length: '180 mm', parallel: 2 },
      flow: '1.5 L/min',
      supply: { kind: 'chiller', setPoint: '5 degC', capacity: '300 W' },
    },
  ],
};

describe('Ytterbium, quasi-three-level, 15 W', () => {
  const indium = levelOf(trial('ytterbium', freeFaces)).lasing.point;
  const warm = levelOf(trial('ytterbium', { ...freeFaces, ...dry })).lasing.point;
  const cold = levelOf(trial('ytterbium', { ...freeFaces, ...coldWater }));

  it('absorbs 11.7 W, makes 1.17 W of heat', () => {
    ballpark(indium.absorbedPower, 11.7);
    ballpark(indium.heatLoad, 1.17);
  });

  it('peaks at 67 degC on indium at 20 degC, at 100 degC dry at 45 degC, at 52 degC on a mount at 5 degC', () => {
    ballpark(indium.rod.peakTemperature - degC(20), 47);
    ballpark(warm.rod.peakTemperature - degC(45), 55);
    ballpark(cold.lasing.point.rod.peakTemperature - degC(5), 47);
  });

  it('has the same lens on all three mounts, but not the same output: re-absorption grows with temperature', () => {
    // The film on the faces carries some milliwatts that depend on the mount's temperature; nothing else differs.
    for (const { lens } of [warm, cold.lasing.point])
      expect(lens.dioptricPower / indium.lens.dioptricPower).toBeCloseTo(1, 2.5);
    expect(cold.lasing.point.outputPower).toBeGreaterThan(1.05 * indium.outputPower);
    expect(indium.outputPower).toBeGreaterThan(1.15 * warm.outputPower);
    expect(warm.thresholdPumpPower!).toBeGreaterThan(1.1 * indium.thresholdPumpPower!);
  });

  it('has a lens between 8.8 /m (dn/dT alone) and 17.6 /m (free discs)', () => {
    ballpark(indium.lens.thermoOptic, 8.8);
    ballpark(indium.lens.estimate, 17.6);
    expect(indium.lens.dioptricPower).toBeGreaterThan(indium.lens.thermoOptic);
    expect(indium.lens.dioptricPower).toBeLessThan(indium.lens.estimate);
  });

  it('loses its cavity at 10.75 /m: at 18.3 W with dn/dT alone, at 9.2 W with free discs, in between elastically', () => {
    const bulk = edgeOfDesign(trial('ytterbium', { 'rod.values.expansion': '0 1/K' })).edge;
    ballpark(bulk.dioptricPower!, 10.75);
    ballpark(bulk.pumpPower!, 18.3);
    const { edge } = edgeOfDesign(trial('ytterbium', freeFaces));
    ballpark((15 * edge.dioptricPower!) / indium.lens.estimate, 9.2);
    expect(edge.pumpPower!).toBeGreaterThan(9.2);
    expect(edge.pumpPower!).toBeLessThan(18.3);
  });

  it('on a mount at 5 degC in a room of 25 degC and 50 % raises the dew-point alarm at 13.9 degC', () => {
    expect(cold.lasing.point.cooler.dewPoint).toBeCloseTo(degC(13.9), 1);
    const dew = cold.margins.find((margin) => margin.limit === 'dew point')!;
    expect(dew.holds).toBe(false);
    const report = reportOf(trial('ytterbium', coldWater));
    expect(report.verdict.text).toContain('dew point');
    expect(report.cautions.join(' ')).toContain('Condensation');
  });
});
