import { describe, expect, test } from 'vitest';
import { demoDesign } from '../../src/design/demo';
import type { Design } from '../../src/design/schema';
import { layOut, withMoved } from '../../web/state/cavity-layout';
import { withNewElement, withoutElement } from '../../web/state/parts';

const base = demoDesign as Design;
const design: Design = {
  ...base,
  rod: { ...base.rod, length: '10 mm', endCaps: { front: '0 mm', back: '0 mm' } },
  cavity: {
    ...base.cavity,
    elements: [
      { mirror: { radius: 'flat', transmission: '0.1 %', incidence: '0 deg' } },
      { space: '4 mm' },
      { rod: true },
      { space: '8.5 cm' },
      { mirror: { radius: '300 mm', transmission: '8 %', incidence: '0 deg' } },
    ],
  },
};
const lengthOf = (other: Design) => layOut(other).at(-1)!.to;
const spaces = (other: Design) => other.cavity.elements.flatMap(({ space }) => space ?? []);

describe('moving parts of the cavity', () => {
  test('the layout adds spaces and the rod', () => expect(lengthOf(design)).toBeCloseTo(0.099, 9));

  test('moving the rod keeps the length of the cavity', () => {
    const moved = withMoved(design, 2, 0.01);
    expect(spaces(moved)).toEqual(['14 mm', '7.5 cm']);
    expect(lengthOf(moved)).toBeCloseTo(0.099, 9);
  });

  test('moving the end mirror changes the length, in the unit the person wrote', () => {
    expect(spaces(withMoved(design, 4, 0.02))).toEqual(['4 mm', '10.5 cm']);
  });

  test('no space becomes shorter than nothing', () => {
    expect(spaces(withMoved(design, 2, -1))).toEqual(['0 mm', '8.9 cm']);
    expect(spaces(withMoved(design, 4, -1))).toEqual(['4 mm', '0 cm']);
  });

  test('an element put in and taken out again leaves the design as it was', () => {
    expect(withoutElement(withNewElement(design, 3, 'lens'), 3).cavity).toEqual(design.cavity);
  });
});
