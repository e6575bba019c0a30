import { describe, expect, it } from 'vitest';
import { gaussHermite, gaussLegendre } from '../../src/numerics/quadrature';
import {
  besselJ0,
  besselJ1,
  besselZero,
  expIntegralEin,
  gamma,
  gammaShare,
} from '../../src/numerics/special';

describe('Gauss rules', () => {
  it('five-point Legendre nodes and weights equal Abramowitz & Stegun table 25.4 (from memory)', () => {
    const { nodes, weights } = gaussLegendre(5);
    [-0.906179845938664, -0.538469310105683, 0, 0.538469310105683, 0.906179845938664].forEach((x, m) =>
      expect(nodes[m]).toBeCloseTo(x, 14),
    );
    [0.236926885056189, 0.478628670499366, 0.568888888888889].forEach((w, m) =>
      expect(weights[m]).toBeCloseTo(w, 14),
    );
  });

  it('three-point Hermite nodes are 0 and sqrt(3/2), weights 2/3 and 1/6 of sqrt(pi) (Abramowitz & Stegun table 25.10, from memory)', () => {
    const { nodes, weights } = gaussHermite(3);
    expect(nodes[1]).toBe(0);
    expect(nodes[2]).toBeCloseTo(Math.sqrt(1.5), 14);
    expect(weights[1]! / Math.sqrt(Math.PI)).toBeCloseTo(2 / 3, 14);
    expect(weights[0]! / Math.sqrt(Math.PI)).toBeCloseTo(1 / 6, 14);
  });

  it('both are exact to degree 2n - 1: moments of x^8 and of x^8 exp(-x2)', () => {
    const legendre = gaussLegendre(5);
    expect(legendre.nodes.reduce((sum, x, m) => sum + legendre.weights[m]! * x ** 8, 0)).toBeCloseTo(
      2 / 9,
      13,
    );
    const hermite = gaussHermite(5);
    const exact = (105 / 16) * Math.sqrt(Math.PI);
    expect(hermite.nodes.reduce((sum, x, m) => sum + hermite.weights[m]! * x ** 8, 0)).toBeCloseTo(exact, 11);
  });
});

describe('special functions', () => {
  it('gamma and its incomplete share take their known values', () => {
    expect(gamma(0.5)).toBeCloseTo(Math.sqrt(Math.PI), 13);
    expect(gamma(5)).toBeCloseTo(24, 11);
    expect(gamma(1 / 3)).toBeCloseTo(2.678938534707747, 12); // DLMF 5.4, from memory
    for (const x of [0.01, 0.5, 1.9, 2.1, 10]) expect(gammaShare(1, x)).toBeCloseTo(1 - Math.exp(-x), 14);
    // P(1/2, x2) is the error function: erf(1) = 0.8427007929497149, erf(2) = 0.9953222650189527 (Abramowitz & Stegun 7.1, from memory)
    expect(gammaShare(0.5, 1)).toBeCloseTo(0.8427007929497149, 13);
    expect(gammaShare(0.5, 4)).toBeCloseTo(0.9953222650189527, 13);
  });

  it('Ein(x) = E1(x) + ln x + 0.5772: E1(1) = 0.2193839343955203, E1(5) = 0.001148295591275326 (Abramowitz & Stegun table 5.1, from memory)', () => {
    const euler = 0.5772156649015329;
    expect(expIntegralEin(1)).toBeCloseTo(0.2193839343955203 + euler, 13);
    expect(expIntegralEin(5)).toBeCloseTo(0.001148295591275326 + Math.log(5) + euler, 13);
    expect(expIntegralEin(3 - 1e-13)).toBeCloseTo(expIntegralEin(3 + 1e-13), 11);
    expect(expIntegralEin(1e-6)).toBeCloseTo(1e-6, 12);
  });

  it('Bessel functions and zeros equal Abramowitz & Stegun tables 9.1 and 9.5 (from memory)', () => {
    expect(besselJ0(1)).toBeCloseTo(0.7651976865579666, 13);
    expect(besselJ1(1)).toBeCloseTo(0.4400505857449335, 13);
    expect(besselJ0(20)).toBeCloseTo(0.1670246643405832, 10);
    expect(besselJ1(20)).toBeCloseTo(0.06683312417584991, 10);
    expect(besselZero(0, 1)).toBeCloseTo(2.404825557695773, 11);
    expect(besselZero(0, 5)).toBeCloseTo(14.93091770848779, 10);
    expect(besselZero(1, 1)).toBeCloseTo(3.831705970207512, 11);
  });

  it('the two branches of the Bessel functions meet', () => {
    expect(Math.abs(besselJ0(12 - 1e-12) - besselJ0(12 + 1e-12))).toBeLessThan(1e-10);
    expect(Math.abs(besselJ1(12 - 1e-12) - besselJ1(12 + 1e-12))).toBeLessThan(1e-10);
  });
});
