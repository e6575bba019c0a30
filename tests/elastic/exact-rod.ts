import { besselJ0, besselJ1 } from '../../src/numerics/special';

/** First zero of J1 above 0 (Abramowitz & Stegun, table 9.5). */
const firstZero = 3.8317059702075;

export interface ExactRod {
  temperatureRise: (r: number, z: number) => number;
  radial: (r: number, z: number) => number;
  axial: (r: number, z: number) => number;
  hoopStress: (r: number, z: number) => number;
}

/**
 * An exact solution for a rod in a rigid, slippery bore with free ends, made for testing: temperature
 * J0(k r) cosh(q zeta), zeta from the middle, k a the first zero of J1. The displacement is that of Goodier's
 * thermoelastic potential, of a harmonic potential and of an axial Papkovich-Neuber potential, the last two in the
 * amounts that clear the ends of stress; J1(k a) = 0 clears the barrel. (Timoshenko & Goodier, Theory of Elasticity,
 * for the potentials.)
 */
export function exactRod(
  {
    youngsModulus,
    poissonRatio: nu,
    expansion,
  }: { youngsModulus: number; poissonRatio: number; expansion: number },
  radius: number,
  length: number,
  q: number,
): ExactRod {
  const k = firstZero / radius;
  const h = length / 2;
  const m = ((1 + nu) / (1 - nu)) * expansion;
  const potential = (x: number) => (m * Math.cosh(q * x)) / (q * q - k * k);
  const potentialSlope = (x: number) => (m * q * Math.sinh(q * x)) / (q * q - k * k);
  const C = Math.cosh(k * h);
  const S = Math.sinh(k * h);
  // Rows: axial stress and shear stress at the end, over 2 mu J0 and 2 mu k J1.
  const [a11, a12, b1] = [k * k * C, (2 - 2 * nu) * k * C - h * k * k * S, -k * k * potential(h)];
  const [a21, a22, b2] = [-k * S, (2 * nu - 1) * S + h * k * C, potentialSlope(h)];
  const determinant = a11 * a22 - a12 * a21;
  const A = (b1 * a22 - b2 * a12) / determinant;
  const B = (a11 * b2 - a21 * b1) / determinant;
  const mu = youngsModulus / (2 * (1 + nu));
  const lambda = (2 * mu * nu) / (1 - 2 * nu);
  const temperatureRise = (r: number, z: number) => besselJ0(k * r) * Math.cosh(q * (z - h));
  const overJ1 = (z: number) => {
    const x = z - h;
    return -k * (potential(x) + A * Math.cosh(k * x)) + B * x * k * Math.sinh(k * x);
  };
  return {
    temperatureRise,
    radial: (r, z) => besselJ1(k * r) * overJ1(z),
    axial: (r, z) => {
      const x = z - h;
      const harmonic = A * k * Math.sinh(k * x);
      const axialPart = B * ((3 - 4 * nu) * Math.sinh(k * x) - x * k * Math.cosh(k * x));
      return besselJ0(k * r) * (potentialSlope(x) + harmonic + axialPart);
    },
    hoopStress: (r, z) => {
      const rise = temperatureRise(r, z);
      const volume = m * rise + B * (2 - 4 * nu) * k * besselJ0(k * r) * Math.cosh(k * (z - h));
      const strain = r === 0 ? (k / 2) * overJ1(z) : (besselJ1(k * r) / r) * overJ1(z);
      return lambda * volume + 2 * mu * strain - ((youngsModulus * expansion) / (1 - 2 * nu)) * rise;
    },
  };
}
