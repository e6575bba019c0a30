import { describe, expect, it } from 'vitest';
import { benchOf, changed, trial } from '../trials/trial';

/** A rod that is the same seen from either end, its base held so that only the way of pumping differs. */
const garnet = changed(trial('garnet'), { 'pump.passes': 1 });
const at = (backShare: string, changes: Record<string, unknown> = {}) => {
  const bench = benchOf(changed(garnet, { 'pump.backShare': backShare, ...changes }));
  return { bench, ...bench.lasing(25) };
};

describe('Pumping from both ends', () => {
  const [front, both, back] = ['0 %', '50 %', '100 %'].map((share) => at(share)) as [
    ReturnType<typeof at>,
    ReturnType<typeof at>,
    ReturnType<typeof at>,
  ];

  it('absorbs as much as from one end, at the same best case temperature', () => {
    for (const { point } of [both, back]) {
      expect(point.absorbedPower).toBeCloseTo(front.point.absorbedPower, 9);
      expect(point.diode.caseWindow).toEqual(front.point.diode.caseWindow);
    }
  });

  it('from the back alone is the mirror image: same peak, lens and stress, at the other end', () => {
    // The grid of a rod pumped from the front is coarser behind: a tenth of a per cent of the rise of 90 K.
    expect(Math.abs(back.point.rod.peakTemperature - front.point.rod.peakTemperature)).toBeLessThan(0.1);
    expect(back.point.lens.dioptricPower / front.point.lens.dioptricPower).toBeCloseTo(1, 3);
    expect(back.point.stress.peakTensile / front.point.stress.peakTensile).toBeCloseTo(1, 2);
    expect(back.point.stress.position.z).toBeCloseTo(10e-3 - front.point.stress.position.z, 9);
  });

  it('of a diverging beam is the mirror image too: its waist lies as far inside the back face', () => {
    const focus = { 'pump.beamQuality': 120, 'pump.waistPosition': '1 mm' };
    const [one, other] = ['0 %', '100 %'].map((share) => at(share, focus).point) as [
      typeof front.point,
      typeof front.point,
    ];
    expect(other.lens.dioptricPower / one.lens.dioptricPower).toBeCloseTo(1, 3);
    // Grids that are finer at either end: a tenth of a per cent of a rise of 90 K.
    expect(Math.abs(other.rod.peakTemperature - one.rod.peakTemperature)).toBeLessThan(0.1);
    // Half and half: the lens is the mean of the two, which are alike.
    const both = at('50 %', focus).point;
    expect(both.lens.thermoOptic / one.lens.thermoOptic).toBeCloseTo(1, 3);
  });

  it('halves the heat at each face: with faces that far apart the peak rise is the mean of near and far end', () => {
    const axis = (solved: typeof front, z: number) => {
      const { grid, temperatures } = solved.field;
      const row = grid.axialCentres.findIndex((centre) => centre > z);
      const [low, high] = [grid.axialCentres[row - 1]!, grid.axialCentres[row]!];
      const value = (j: number) => temperatures[j * grid.nRadial]!;
      return value(row - 1) + ((z - low) / (high - low)) * (value(row) - value(row - 1));
    };
    // Conduction is linear and the base the same to a millikelvin: half of either field makes the field of both.
    for (const z of [2e-3, 5e-3, 8e-3]) {
      const mean = (axis(front, z) + axis(back, z)) / 2;
      // Cubic fields read along straight lines between cells of three grids.
      expect(Math.abs(axis(both, z) - mean)).toBeLessThan(0.15);
    }
    expect(both.point.rod.peakTemperature).toBeLessThan(front.point.rod.peakTemperature - 20);
    expect(both.point.stress.peakTensile).toBeLessThan(0.6 * front.point.stress.peakTensile);
  });

  it('asks of the faces what coatings hardly give, where the light passes twice', () => {
    const warned = (passes: number, share: string) =>
      at(share, { 'pump.passes': passes }).bench.prepared.resolved.warnings.map(({ where }) => where);
    expect(warned(2, '50 %')).toContain('pump.backShare');
    expect(warned(1, '50 %')).not.toContain('pump.backShare');
    expect(warned(2, '0 %')).not.toContain('pump.backShare');
  });

  it('leaves the lens as it is: it asks for the heat, not where along the rod it lies', () => {
    const insulated = { 'rod.faceFilm': '0 W/(m^2 K)', 'rod.values.expansion': '0 1/K' };
    const [one, two] = ['0 %', '50 %'].map((share) => at(share, insulated).point.lens.dioptricPower);
    expect(two! / one!).toBeCloseTo(1, 3);
  });
});
