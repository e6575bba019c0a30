import { describe, expect, it } from 'vitest';
import { blockResistance, equivalentRingRadius } from '../../src/heat';

const block = { boreRadius: 1.5e-3, width: 20e-3, depth: 8e-3, cover: 8e-3, conductivity: 390 };
const perConductivity = (changes: Partial<typeof block>) =>
  blockResistance({ ...block, ...changes, conductivity: 1 }) * 2 * Math.PI;

describe('block mount, bore to base', () => {
  it('very wide and tall: ln of twice the depth over the radius, a pipe under a plane, acosh(d/a) (Incropera, Table 4.1, from memory)', () => {
    const [boreRadius, depth] = [1e-3, 20e-3];
    const wide = perConductivity({ boreRadius, depth, width: 500, cover: 500 });
    // acosh is for a bore of one temperature, the images for even heat: they differ by (a/2d)^2.
    expect(wide).toBeCloseTo(Math.acosh(depth / boreRadius), 2);
    expect(wide).toBeCloseTo(Math.log((2 * depth) / boreRadius), 3);
  });

  it('tall: a row of pipes at equal depth, ln[W/(pi a) sinh(2 pi d/W)] (Incropera, Table 4.1, from memory)', () => {
    for (const width of [8e-3, 20e-3, 60e-3]) {
      const [a, d] = [block.boreRadius, block.depth];
      const handbook = Math.log((width / (Math.PI * a)) * Math.sinh((2 * Math.PI * d) / width));
      expect(perConductivity({ width, cover: 1 })).toBeCloseTo(handbook, 9);
    }
  });

  it('narrow: every millimetre of depth adds its slab, 1/(k W)', () => {
    const width = 4e-3;
    const deeper =
      blockResistance({ ...block, width, depth: 31e-3 }) - blockResistance({ ...block, width, depth: 30e-3 });
    expect(deeper).toBeCloseTo(1e-3 / (390 * width), 9);
  });

  it('resists more with less metal above the bore, beside it, and more below', () => {
    const plain = perConductivity({});
    expect(perConductivity({ cover: 2e-3 })).toBeGreaterThan(plain);
    expect(perConductivity({ width: 8e-3 })).toBeGreaterThan(plain);
    expect(perConductivity({ depth: 12e-3 })).toBeGreaterThan(plain);
  });

  it('agrees with finite differences on the cross-section', () => {
    const fine = finiteDifferences(32);
    const finer = finiteDifferences(64);
    // Second order in the spacing, so two grids give the limit; 0.5 % is left for the bore's staircase.
    const limit = finer + (finer - fine) / 3;
    const images = blockResistance({
      boreRadius: 4e-3,
      width: 20e-3,
      depth: 10e-3,
      cover: 10e-3,
      conductivity: 1,
    });
    expect(Math.abs(limit / images - 1)).toBeLessThan(5e-3);
  });

  it('equals a ring of its equivalent radius, whatever it is made of', () => {
    const outer = equivalentRingRadius(block);
    expect(Math.log(outer / block.boreRadius) / (2 * Math.PI * 390)).toBeCloseTo(blockResistance(block), 12);
    expect(equivalentRingRadius({ ...block, conductivity: 150 })).toBeCloseTo(outer, 12);
  });

  it('refuses a bore that does not fit', () => {
    expect(() => blockResistance({ ...block, boreRadius: 9e-3 })).toThrow(/does not fit/);
  });
});

/**
 * Mean temperature over the circle of radius 4 mm round a line source of 1 W/m in the middle of a 20 mm square, base cold,
 * by a five-point scheme solved with relaxation; k = 1. By the mean-value property it equals that of the bore.
 */
function finiteDifferences(n: number): number {
  const h = 20e-3 / n;
  const t = new Float64Array((n + 1) * n);
  const relax = 2 / (1 + Math.sin(Math.PI / (2 * n)));
  const centre = n / 2;
  // Nodes: column i at x = i h (insulated at both ends), row j at y = (j + 1) h above the cold base, top insulated.
  const at = (i: number, j: number) =>
    j < 0 ? 0 : t[Math.min(j, 2 * (n - 1) - j) * (n + 1) + Math.min(Math.abs(i), 2 * n - i)]!;
  for (let sweep = 0; sweep < 12 * n; sweep++)
    for (let j = 0; j < n; j++)
      for (let i = 0; i <= n; i++) {
        const source = i === centre && j === centre - 1 ? 1 : 0;
        const mean = (at(i - 1, j) + at(i + 1, j) + at(i, j - 1) + at(i, j + 1) + source) / 4;
        const p = j * (n + 1) + i;
        t[p] = t[p]! + relax * (mean - t[p]!);
      }
  let sum = 0;
  const points = 360;
  for (let k = 0; k < points; k++) {
    const x = 10e-3 + 4e-3 * Math.cos((2 * Math.PI * k) / points);
    const y = 10e-3 + 4e-3 * Math.sin((2 * Math.PI * k) / points);
    const [i, j] = [Math.floor(x / h), Math.floor(y / h) - 1];
    const [u, v] = [x / h - i, y / h - 1 - j];
    sum +=
      (1 - u) * (1 - v) * at(i, j) +
      u * (1 - v) * at(i + 1, j) +
      (1 - u) * v * at(i, j + 1) +
      u * v * at(i + 1, j + 1);
  }
  return sum / points;
}
