import { describe, expect, it } from 'vitest';
import type { OperatingPoint } from '../../src/operating/types';
import { benchOf, levelOf, trial, type Changes } from './trial';
import { imbalanceOf } from './ledger';

const scenarios: [name: string, changes: Changes][] = [
  ['vanadate', {}],
  ['garnet', { 'rod.endCaps': { front: '2 mm', back: '0 mm' } }],
  ['ytterbium', {}],
  ['praseodymium', { 'rod.absorption': 'from crystal' }],
  ['quarter-watt', {}],
  ['bin-decides', {}],
];

const bulkOnly = { 'rod.faceFilm': '0 W/(m^2 K)', 'rod.values.expansion': '0 1/K' };

/** P_h (dn/dT) / (pi k w2) of a Gaussian, half of it for a flat-top (Innocenzi et al. 1990, from memory). */
function axisClosedForm(
  heat: number,
  rod: { thermoOptic: number; conductivityRadial: number },
  radius: number,
  profile: string,
): number {
  const gaussian = (heat * rod.thermoOptic) / (Math.PI * rod.conductivityRadial * radius ** 2);
  return profile === 'gaussian' ? gaussian : gaussian / 2;
}

describe('Audit of every scenario', () => {
  for (const [name, changes] of scenarios) {
    it(`${name}: the flows through the boundaries sum to the heat, and the ledger closes`, () => {
      const { lasing, blocked } = levelOf(trial(name, changes));
      for (const { point, field } of [lasing, blocked]) {
        const { side, front, back } = field.heatOut;
        expect(Math.abs(side + front + back - point.heatLoad)).toBeLessThan(1e-9 * point.heatLoad);
        expect(imbalanceOf(point.ledger)).toBeLessThan(1e-9 * point.electricalPower);
      }
    });

    it(`${name}: cells of half the size move the lens by less than 1 %`, () => {
      const design = trial(name, changes);
      const standard = benchOf(design);
      const { nr, nz } = standard.prepared.grid;
      const { power } = standard.prepared.resolved.pump;
      const lensOf = ({ lens }: OperatingPoint) => lens;
      const coarse = lensOf(standard.lasing(power).point);
      const fine = lensOf(benchOf(design, undefined, { nr: 2 * nr, nz: 2 * nz }).lasing(power).point);
      expect(Math.abs(fine.thermoOptic / coarse.thermoOptic - 1)).toBeLessThan(0.01);
      expect(Math.abs(fine.dioptricPower / coarse.dioptricPower - 1)).toBeLessThan(0.01);
    });

    it(`${name}: with insulated faces the lens on the axis is that of the closed form within 1 %`, () => {
      const bench = benchOf(trial(name, { ...changes, ...bulkOnly }));
      const { rod, pump } = bench.prepared.resolved;
      const { point } = bench.lasing(pump.power);
      const expected = axisClosedForm(point.heatLoad, rod, pump.radius, pump.profile.kind);
      expect(Math.abs(point.lens.axisDioptricPower / expected - 1)).toBeLessThan(0.01);
    });
  }
});
