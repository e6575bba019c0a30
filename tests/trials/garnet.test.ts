import { describe, expect, it } from 'vitest';
import { ballpark } from './ballpark';
import { benchOf, degC, edgeOfDesign, levelOf, reportOf, trial } from './trial';

// Ballparks from an independent small finite-volume script (constant properties, a thin lens in the middle of the rod),
// within 15 %.

const bulkOnly = { 'rod.values.expansion': '0 1/K' };
const freeFaces = { 'rod.values.expansion': '7.8e-6 1/K' };

describe('Garnet, flat-flat, off-centre rod, 25 W', () => {
  const { lasing, blocked } = levelOf(trial('garnet', freeFaces));
  const { point } = lasing;

  it('absorbs 24.3 W, makes 7.8 W of heat; barrel at 43 degC, peak at 111 degC', () => {
    ballpark(point.absorbedPower, 24.3);
    ballpark(point.heatLoad, 7.8);
    ballpark(point.rod.edgeTemperature - degC(20), 23);
    ballpark(point.rod.peakTemperature - degC(20), 91);
  });

  it('has a lens of 8.1 /m with dn/dT alone, of 16.4 /m if every slice bulges freely, and in between elastically', () => {
    ballpark(point.lens.thermoOptic, 8.1);
    ballpark(point.lens.estimate, 16.4);
    expect(point.lens.dioptricPower).toBeGreaterThan(point.lens.thermoOptic);
    expect(point.lens.dioptricPower).toBeLessThan(0.65 * point.lens.estimate);
  });

  it('is stable for f > 120 mm and again for 24 < f < 30 mm, with a gap between', () => {
    const { edge, zones } = edgeOfDesign(trial('garnet', bulkOnly));
    const [first, second] = zones.sagittal;
    expect(zones.sagittal).toHaveLength(2);
    ballpark(1 / first!.to, 0.12);
    ballpark(1 / second!.from, 0.03);
    ballpark(1 / second!.to, 0.024);
    ballpark(edge.pumpPower!, 25.7);
    ballpark(edge.windows[1]!.from, 103);
  });

  it('ends its first zone at 12.7 W and starts the second at 51 W with a lens of free discs', () => {
    const { edge, bench, zones } = edgeOfDesign(trial('garnet', freeFaces));
    const { estimate } = bench.lasing(25).point.lens;
    ballpark((25 * zones.sagittal[0]!.to) / estimate, 12.7);
    ballpark((25 * zones.sagittal[1]!.from) / estimate, 51);
    // Elastically the 3 mm of heated rod do not bulge freely, so both come later, but before those of dn/dT alone.
    expect(edge.pumpPower!).toBeGreaterThan(12.7);
    expect(edge.pumpPower!).toBeLessThan(25.7);
  });

  it('has no gap with the lens in the middle of the cavity, and is stable to f = 37.5 mm', () => {
    // Absorption puts the middle of the lens 2.5 mm behind the pumped face instead of 5 mm, so the rod's middle has to
    // stand (5 - 2.5) mm / n = 1.35 mm off the cavity's: with the rod itself centred a gap of 3 % stays open.
    const at = (front: string, back: string) =>
      edgeOfDesign(
        trial('garnet', { ...bulkOnly, 'cavity.elements.1.space': front, 'cavity.elements.3.space': back }),
      ).zones.sagittal;
    const gap = (zones: { from: number; to: number }[]) => zones[1]!.from - zones[0]!.to;
    const centred = at('75 mm', '75 mm');
    const balanced = at('76.35 mm', '73.65 mm');
    expect(gap(centred) / centred[1]!.from).toBeLessThan(0.04);
    expect(gap(balanced)).toBeLessThan(0.05 * gap(centred));
    ballpark(1 / balanced[1]!.to, 0.0375);
  });

  it('is never called stable without a lens: the cold flat-flat cavity is on the edge', () => {
    // A rod that does not change with heat is no lens at any power.
    const cold = benchOf(trial('garnet', { ...bulkOnly, 'rod.values.thermoOptic': '0 1/K' })).lasing(
      25,
    ).point;
    expect(cold.lens.dioptricPower).toBe(0);
    expect(cold.cavity.sagittal.stability).toBeCloseTo(1, 12);
    expect(cold.cavity.sagittal.stable).toBe(false);
    expect(cold.cavity.sagittal.modeRadiusInRod).toBeNull();
  });

  it('with a dry contact and the mount at 35 degC peaks at 170 degC, barrel at 104 degC, with the same lens', () => {
    const dry = levelOf(
      trial('garnet', {
        ...freeFaces,
        'mount.interface.conductance': '0.25 W/(cm^2 K)',
        'surroundings.ambient': '35 degC',
      }),
    ).lasing.point;
    ballpark(dry.rod.peakTemperature - degC(35), 135);
    ballpark(dry.rod.edgeTemperature - degC(35), 69);
    expect(dry.lens.dioptricPower / point.lens.dioptricPower).toBeCloseTo(1, 2.5);
  });

  it('with the beam blocked makes more heat and a stronger bulk lens, 10.7 /m', () => {
    ballpark(blocked.point.lens.thermoOptic, 10.7);
    expect(blocked.point.outputPower).toBe(0);
    expect(blocked.point.rod.peakTemperature).toBeGreaterThan(point.rod.peakTemperature);
  });

  it('with end caps of 4 mm peaks at 88 degC, loses its face bulge and keeps its bulk lens', () => {
    const capped = levelOf(trial('garnet', { ...freeFaces, 'rod.endCaps': { front: '4 mm', back: '4 mm' } }))
      .lasing.point;
    ballpark(capped.rod.peakTemperature - degC(20), 68);
    // z-mean invariant: what leaves through the faces' film is all the difference.
    expect(capped.lens.thermoOptic / point.lens.thermoOptic).toBeCloseTo(1, 2.5);
    expect(Math.abs(capped.lens.bulge)).toBeLessThan(0.02 * point.lens.bulge);
  });

  it('is answered from end to end, with both windows on the pump-power axis', () => {
    const report = reportOf(trial('garnet', bulkOnly));
    expect(report.usableWindow).toHaveLength(2);
    expect(report.operating.cavity.sagittal.stable).toBe(false);
    expect(report.options[0]!.ceiling.setBy).toBe('cavity stability');
    expect(report.cavityEdge.plane).toBe('both');
  });
});
