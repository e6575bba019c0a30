import { describe, expect, it } from 'vitest';
import {
  assembleRod,
  heatSource,
  makeRodGrid,
  potentialOf,
  solveRod,
  temperatureOf,
  temperatureSlope,
} from '../../src/heat';
import { evenlyPumpedRod, plainRod } from './rod';

const off = (got: number, expected: number) => Math.abs(got / expected - 1);

describe('conductivity k300 (300 K/T)^m', () => {
  it('potential and temperature undo each other, and their slope is k300/k', () => {
    for (const exponent of [0, 0.5, 1, 1.7, -0.5])
      for (const temperature of [80, 250, 300, 420, 700]) {
        const law = { exponent };
        expect(off(temperatureOf(law, potentialOf(law, temperature)), temperature)).toBeLessThan(1e-13);
        const step = 1e-3;
        const slope =
          (2 * step) / (potentialOf(law, temperature + step) - potentialOf(law, temperature - step));
        expect(off(temperatureSlope(law, temperature), slope)).toBeLessThan(1e-6);
      }
  });

  it('no temperature conducts a potential beyond 300/(m - 1) when m > 1', () => {
    expect(temperatureOf({ exponent: 2 }, 301)).toBe(Infinity);
  });

  it("m = 1, heated all over, edge held: the axis is at T_edge exp(P'/(4 pi k300 300 K)) (Kirchhoff; Carslaw & Jaeger, section 1.6, from memory)", () => {
    const rod = { ...plainRod, conductivityExponent: 1 };
    for (const heat of [1000, 10000, 40000]) {
      const field = evenlyPumpedRod(rod, { kind: 'flat-top' }, rod.radius, heat, 'standard');
      expect(off(field.peakTemperature, 273.15 * Math.exp(heat / (4 * Math.PI * 10 * 300)))).toBeLessThan(
        1e-3,
      );
    }
  });

  it("behind a contact the edge is found first: T_edge = T_base + P'/(2 pi a h), also when that makes it glow", () => {
    for (const [conductance, heat] of [
      [2e4, 3000],
      [2000, 9000],
      [1000, 9000],
    ] as const) {
      const rod = { ...plainRod, conductivityExponent: 1, side: { kind: 'contact', conductance } as const };
      const field = evenlyPumpedRod(rod, { kind: 'flat-top' }, rod.radius, heat, 'standard');
      const edge = 273.15 + heat / (2 * Math.PI * rod.radius * conductance);
      expect(off(field.edgeTemperature, edge)).toBeLessThan(1e-9);
      expect(off(field.peakTemperature, edge * Math.exp(heat / (4 * Math.PI * 10 * 300)))).toBeLessThan(1e-3);
      expect(off(field.heatOut.side, field.generated)).toBeLessThan(1e-9);
    }
  });

  it('a neighbouring solution to start from changes nothing but the effort', () => {
    const rod = {
      ...plainRod,
      conductivityExponent: 1,
      side: { kind: 'contact', conductance: 8000 } as const,
    };
    const grid = makeRodGrid(rod, { pumpRadius: 0.3e-3, absorptionCoefficient: 300, cells: 'study' });
    const conduction = assembleRod(rod, grid);
    const boundary = { side: 290, front: 290, back: 290 };
    const weak = heatSource(
      grid,
      grid.radialCentres.map(() => 1 / grid.nr),
      grid.axialCentres.map(() => 1 / grid.nz),
      20,
    );
    const strong = weak.map((heat) => 1.5 * heat);
    const cold = solveRod(conduction, strong, boundary);
    const warm = solveRod(conduction, strong, boundary, solveRod(conduction, weak, boundary));
    warm.temperatures.forEach((temperature, p) => expect(temperature).toBeCloseTo(cold.temperatures[p]!, 8));
  });
});
