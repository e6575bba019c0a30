import { describe, expect, it } from 'vitest';
import { benchOf, changed, levelOf } from '../trials/trial';
import { randomDesign, seeded } from '../trials/random-designs';

/** Absorption and heat fraction held, so that only the power of the pump changes. */
const held = {
  'rod.absorption': { coefficient: '3 cm^-1' },
  'rod.heatFraction': { lasing: '25 %', blocked: '25 %' },
};
const insulated = { 'rod.faceFilm': '0 W/(m^2 K)' };
const designs = Array.from({ length: 8 }, (_, k) => randomDesign(seeded(104729 * k + 5)));

describe('Held absorption', () => {
  it('peak temperature, stress and lens rise with the pump power, whatever the cooler', () => {
    for (const design of designs) {
      const bench = benchOf(changed(design, held), undefined, 'coarse');
      const { searchTo } = bench.prepared.resolved.pump;
      const points = [0.1, 0.3, 0.5, 0.7, 1]
        .map((share) => bench.lasing(share * searchTo).point)
        .filter(({ state }) => state === 'steady');
      for (let k = 1; k < points.length; k++) {
        const [less, more] = [points[k - 1]!, points[k]!];
        expect(more.rod.peakTemperature).toBeGreaterThan(less.rod.peakTemperature);
        expect(Math.abs(more.lens.thermoOptic)).toBeGreaterThan(Math.abs(less.lens.thermoOptic));
        expect(more.stress.peakTensile).toBeGreaterThan(less.stress.peakTensile);
      }
    }
  });

  it('the lens of insulated faces is proportional to the pump power', () => {
    for (const design of designs.slice(0, 4)) {
      const bench = benchOf(
        changed(design, {
          ...held,
          ...insulated,
          coolers: [{ id: 'plain', kind: 'resistance', resistance: '0.1 K/W' }],
          chosenCooler: 'plain',
        }),
        undefined,
        'coarse',
      );
      const [one, two] = [1, 2].map((power) => bench.lasing(power).point.lens.dioptricPower);
      // Conduction and elasticity are linear: rounding is all that is left.
      expect(Math.abs(two! / (2 * one!) - 1)).toBeLessThan(1e-9);
    }
  });

  it('a better contact lowers the peak and leaves the lens as it is', () => {
    for (const design of designs) {
      const benchAt = (contact: string) =>
        benchOf(
          changed(design, { ...held, ...insulated, 'mount.interface.conductance': contact }),
          'water',
          'coarse',
        );
      const [dry, wet] = [benchAt('0.25 W/(cm^2 K)'), benchAt('2 W/(cm^2 K)')];
      const { pump, rod } = dry.prepared.resolved;
      const [before, after] = [dry, wet].map((bench) => bench.lasing(pump.power).point);
      expect(after!.rod.peakTemperature).toBeLessThan(before!.rod.peakTemperature);
      // The z-mean of the temperature does not know how evenly the barrel gives off its heat: rounding is all.
      expect(Math.abs(after!.lens.thermoOptic / before!.lens.thermoOptic - 1)).toBeLessThan(1e-9);
      // A face also bends as a whole when the rod's end is warmer than its middle; a pump that fills the rod sees it.
      const size = Math.abs(before!.lens.thermoOptic) + Math.abs(before!.lens.bulge);
      const allowed = pump.radius < 0.3 * rod.radius ? 0.003 : 0.02;
      expect(Math.abs(after!.lens.dioptricPower - before!.lens.dioptricPower)).toBeLessThan(allowed * size);
    }
  });

  it('the beam blocked makes the rod hotter wherever it makes more heat', () => {
    for (const design of designs) {
      const { lasing, blocked } = levelOf(
        changed(design, { ...held, 'rod.heatFraction.blocked': '35 %' }),
        'water',
        'coarse',
      );
      // Below threshold there is nothing to block.
      if (lasing.point.outputPower > 0)
        expect(blocked.point.rod.peakTemperature).toBeGreaterThan(lasing.point.rod.peakTemperature);
      expect(blocked.point.outputPower).toBe(0);
    }
  });
});
