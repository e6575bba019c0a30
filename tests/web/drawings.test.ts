import { describe, expect, test } from 'vitest';
import { heatColour } from '../../web/drawings/colour-map';
import { layOutFlows } from '../../web/drawings/flow-layout';
import { isotherm } from '../../web/drawings/isotherms';
import { readRod } from '../../web/drawings/rod-field';
import type { RodPicture } from '../../src/report/types';

describe('the heat map', () => {
  test('lightness rises with temperature all the way, so grey print and colour blindness keep the order', () => {
    // Relative luminance by the sRGB primaries, IEC 61966-2-1.
    const luminance = (share: number) => {
      const [r, g, b] = heatColour(share).map((value) => {
        const level = value / 255;
        return level <= 0.04045 ? level / 12.92 : ((level + 0.055) / 1.055) ** 2.4;
      }) as [number, number, number];
      return 0.2126 * r + 0.7152 * g + 0.0722 * b;
    };
    for (let step = 1; step <= 100; step += 1)
      expect(luminance(step / 100)).toBeGreaterThan(luminance((step - 1) / 100));
  });

  test('a field linear in r and z is read exactly between cell centres, on both sides of the axis', () => {
    const radialFaces = Float64Array.of(0, 1, 2, 4);
    const axialFaces = Float64Array.of(0, 1, 3, 4);
    const [r, z] = [
      [0.5, 1.5, 3],
      [0.5, 2, 3.5],
    ];
    const temperatures = Float64Array.from(
      z.flatMap((depth) => r.map((radius) => 300 + 10 * radius - 4 * depth)),
    );
    const reader = readRod({ radialFaces, axialFaces, temperatures } as RodPicture);
    expect(reader.at(2.2, 1.3)).toBeCloseTo(300 + 22 - 5.2, 9);
    expect(reader.at(-2.2, 1.3)).toBeCloseTo(reader.at(2.2, 1.3), 12);
  });

  test('the isotherm of a slope is a straight line where the slope has that value', () => {
    const pieces = isotherm(5, 4, (i) => i * 10, 25);
    expect(pieces).toHaveLength(3);
    for (const piece of pieces) expect([piece.x1, piece.x2]).toEqual([2.5, 2.5]);
  });

  test('the isotherm of a cone closes around its top', () => {
    const pieces = isotherm(41, 41, (i, j) => 100 - Math.hypot(i - 20, j - 20), 90);
    for (const { x1, y1 } of pieces) expect(Math.hypot(x1 - 20, y1 - 20)).toBeCloseTo(10, 1);
    const length = pieces.reduce((sum, { x1, y1, x2, y2 }) => sum + Math.hypot(x2 - x1, y2 - y1), 0);
    // A polygon inscribed in squares of a twentieth of the circle: within 1 %.
    expect(length / (2 * Math.PI * 10)).toBeCloseTo(1, 2);
  });
});

describe('the flow picture', () => {
  const ledger = [
    { from: 'wall plug', to: 'diode', power: 10 },
    { from: 'diode', to: 'rod', power: 4 },
    { from: 'diode', to: 'base', power: 6 },
    { from: 'rod', to: 'base', power: 4 },
  ];

  test('every ribbon is as wide as its power, and none leaves its node', () => {
    const { ribbons } = layOutFlows(ledger, 200, 20);
    const scale = ribbons[0]!.width / ribbons[0]!.power;
    for (const ribbon of ribbons) {
      expect(ribbon.width).toBeCloseTo(ribbon.power * scale, 9);
      expect(ribbon.sourceAt + ribbon.width).toBeLessThanOrEqual(ribbon.source.to + 1e-9);
      expect(ribbon.targetAt + ribbon.width).toBeLessThanOrEqual(ribbon.target.to + 1e-9);
    }
  });

  test('a node stands after all that flow into it, and a loop does not hang the picture', () => {
    const { nodes } = layOutFlows(ledger, 200, 20);
    expect(nodes.find(({ name }) => name === 'base')!.column).toBe(3);
    expect(layOutFlows([...ledger, { from: 'base', to: 'wall plug', power: 1 }], 200, 20).nodes).toHaveLength(
      4,
    );
  });

  test('an empty ledger gives an empty picture', () => expect(layOutFlows([], 200, 20).ribbons).toEqual([]));
});
