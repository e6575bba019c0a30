import { describe, expect, it } from 'vitest';
import { axialResponse } from '../../src/lens/photoelastic-111';
import { frame001, frame111, impermeability, type Matrix } from './cubic-tensor';

// Dixon, J. Appl. Phys. 38, 5149 (1967) (from memory).
const yag = { p11: -0.029, p12: 0.0091, p44: -0.0615 };
/** p11 - p12 = 2 p44: a material with no axes, such as glass. */
const isotropic = { p11: 0.2, p12: 0.12, p44: 0.04 };
const [radial, hoop, axial, shear] = [1.3, -0.7, 0.4, 0.9];
const strainOf = (e_rz: number): Matrix => [
  [radial, 0, e_rz],
  [0, hoop, 0],
  [e_rz, 0, axial],
];
const azimuths = [0, 0.3, 1.1, 2.5, 4];
// Sums of 81 products of numbers near one.
const digits = 14;

describe('photoelastic tensor of a rod along [111]', () => {
  const { own, other, along } = axialResponse(yag);

  it('is the cubic tensor turned into the frame of the rod, the same at every azimuth', () => {
    for (const azimuth of azimuths) {
      const turned = impermeability(yag, frame111(azimuth), strainOf(0));
      expect(turned[0]![0]).toBeCloseTo(own * radial + other * hoop + along * axial, digits);
      expect(turned[1]![1]).toBeCloseTo(own * hoop + other * radial + along * axial, digits);
      // The directions r and hoop stay the principal ones.
      expect(turned[0]![1]).toBeCloseTo(0, digits);
    }
  });

  it('leaves out of a shear e_rz a part that turns three times around the axis and whose mean is zero', () => {
    const cubic = (yag.p11 - yag.p12 - 2 * yag.p44) / 3;
    // Azimuths count from [11-2], opposite to a cube axis.
    for (const azimuth of azimuths) {
      const turned = impermeability(yag, frame111(azimuth), strainOf(shear));
      const plain = impermeability(yag, frame111(azimuth), strainOf(0));
      const size = -Math.SQRT2 * cubic * shear;
      expect(turned[0]![0]! - plain[0]![0]!).toBeCloseTo(size * Math.cos(3 * azimuth), digits);
      expect(turned[0]![1]).toBeCloseTo(-size * Math.sin(3 * azimuth), digits);
    }
    const count = 12;
    let mean = 0;
    for (let k = 0; k < count; k++)
      mean += impermeability(yag, frame111((2 * Math.PI * k) / count), strainOf(shear))[0]![0]! / count;
    expect(mean).toBeCloseTo(own * radial + other * hoop + along * axial, digits);
  });

  it('has the birefringence (p11 - p12 + 4 p44)/3 of the transverse strain (Koechner & Rice 1970, from memory)', () => {
    expect(own - other).toBeCloseTo((yag.p11 - yag.p12 + 4 * yag.p44) / 3, digits);
  });

  it('does not care for the cut where p11 - p12 = 2 p44, and does for a garnet', () => {
    const of = axialResponse(isotropic);
    for (const frame of [frame001(0), frame001(0.4), frame111(0.7)]) {
      const turned = impermeability(isotropic, frame, strainOf(shear));
      expect(turned[0]![0]).toBeCloseTo(of.own * radial + of.other * hoop + of.along * axial, digits);
      expect(turned[1]![1]).toBeCloseTo(of.own * hoop + of.other * radial + of.along * axial, digits);
    }
    expect(of.own).toBeCloseTo(isotropic.p11, digits);
    expect(of.other).toBeCloseTo(isotropic.p12, digits);
    const garnet = impermeability(yag, frame001(0), strainOf(0))[0]![0]!;
    expect(Math.abs(garnet - (own * radial + other * hoop + along * axial))).toBeGreaterThan(0.01);
  });
});
