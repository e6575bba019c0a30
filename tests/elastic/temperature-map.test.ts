import { describe, expect, it } from 'vitest';
import { assembleElastic, solveElastic, temperatureMap } from '../../src/elastic';
import { freeRod, largestSize, pumped, studyMesh } from './rods';

const assembled = assembleElastic(freeRod, studyMesh);
const direct = solveElastic(assembled, pumped);
const largestStress = largestSize(direct.axial);

/** Cell centres as a conduction grid has them: none on the axis or a surface, finer at the axis and the front face. */
function centres(count: number, size: number, fineness: number): Float64Array {
  return Float64Array.from(
    { length: count },
    (_, k) => (size * Math.sinh((fineness * (k + 0.5)) / count)) / Math.sinh(fineness),
  );
}

describe('temperatures of another grid', () => {
  it('thirty by forty cells stand in for the temperature itself within 0.2 % of the largest stress', () => {
    const radii = centres(30, 2e-3, 2.5);
    const axials = centres(40, 10e-3, 2.5);
    const map = temperatureMap(assembled, radii, axials);
    const values = Float64Array.from({ length: 1200 }, (_, p) =>
      pumped(radii[p % 30], axials[Math.floor(p / 30)]),
    );
    const mapped = solveElastic(assembled, { map, values });
    const excess = mapped.hoop.map((stress, node) => stress - direct.hoop[node]);
    // Cubic interpolation of cells a sixth of the pump radius: (1/6)^4 is 0.08 %.
    expect(largestSize(excess) / largestStress).toBeLessThan(2e-3);
  });

  it('the mount that follows the rod in memory is not read', () => {
    const radii = centres(12, 2e-3, 2);
    const axials = centres(16, 10e-3, 2);
    const packed = Float64Array.from({ length: 12 * 16 }, (_, p) => 300 + p);
    const wide = new Float64Array(15 * 16).fill(Number.NaN);
    for (let j = 0; j < 16; j++) wide.set(packed.subarray(12 * j, 12 * j + 12), 15 * j);
    const tight = solveElastic(assembled, { map: temperatureMap(assembled, radii, axials), values: packed });
    const loose = solveElastic(assembled, {
      map: temperatureMap(assembled, radii, axials, 15),
      values: wide,
    });
    expect(loose.hoop).toEqual(tight.hoop);
  });

  it('a face that takes the temperature of its air does so', () => {
    const radii = centres(12, 2e-3, 2);
    const axials = centres(16, 10e-3, 2);
    const even = { cells: [0, 0, 0], air: 1 };
    const map = temperatureMap(assembled, radii, axials, 12, { front: even, back: even });
    const values = new Float64Array(12 * 16).fill(350);
    const warm = solveElastic(assembled, { map, values, air: { front: 350, back: 350 } });
    expect(largestSize(warm.hoop) / largestStress).toBeLessThan(1e-9);
    const chilled = solveElastic(assembled, { map, values, air: { front: 340, back: 350 } });
    expect(chilled.hoop[0]).toBeGreaterThan(0);
  });

  it('a temperature that is not a number is refused', () => {
    expect(() => solveElastic(assembled, () => Number.NaN)).toThrow('elastic');
  });
});
