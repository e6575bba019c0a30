import { NumericalError } from '../errors';

const lanczos = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/**
 * Natural logarithm of the gamma function for x > 0.
 * @source Lanczos, SIAM J. Numer. Anal. B 1, 86 (1964), coefficients g = 7, n = 9 (from memory); relative error about 1e-15
 */
export function logGamma(x: number): number {
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  let sum = lanczos[0]!;
  for (let k = 1; k < lanczos.length; k++) sum += lanczos[k]! / (z + k);
  const t = z + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Gamma function for x > 0. */
export function gamma(x: number): number {
  return Math.exp(logGamma(x));
}

/**
 * Regularised lower incomplete gamma function P(a, x): the share of the integral of t^(a-1) exp(-t) that lies below x.
 *
 * Series below x = a + 1, continued fraction above.
 * @param a order, > 0
 * @param x upper end, >= 0
 * @returns 0 ... 1
 * @source Abramowitz & Stegun 6.5.29 and 6.5.31 (from memory)
 */
export function gammaShare(a: number, x: number): number {
  if (x <= 0) return 0;
  const front = Math.exp(a * Math.log(x) - x - logGamma(a));
  if (x < a + 1) {
    let term = 1 / a;
    let sum = term;
    for (let k = 1; k < 1000; k++) {
      term *= x / (a + k);
      sum += term;
      if (term < sum * 1e-17) return front * sum;
    }
    throw new NumericalError('incomplete gamma series', term);
  }
  // Modified Lentz evaluation of the continued fraction for 1 - P.
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let h = d;
  for (let k = 1; k < 1000; k++) {
    const an = -k * (k - a);
    b += 2;
    d = 1 / (an * d + b);
    c = b + an / c;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) return 1 - front * h;
  }
  throw new NumericalError('incomplete gamma continued fraction', d * c - 1);
}

/**
 * Entire exponential integral Ein(x), the integral of (1 - exp(-t))/t from 0 to x = E1(x) + ln x + 0.5772...: the
 * radial temperature profile under a Gaussian pump.
 * @param x >= 0
 * @source Abramowitz & Stegun 5.1.11 and 5.1.22 (from memory)
 */
export function expIntegralEin(x: number): number {
  if (x <= 3) {
    let term = 1;
    let sum = 0;
    for (let k = 1; k < 60; k++) {
      term *= -x / k;
      sum -= term / k;
    }
    return sum;
  }
  const euler = 0.57721566490153286;
  let tail = 0;
  for (let k = 120; k > 0; k--) tail = k / (1 + k / (x + tail));
  return Math.exp(-x) / (x + tail) + Math.log(x) + euler;
}

/** Bessel function J0. */
export function besselJ0(x: number): number {
  return besselJ(0, x);
}

/** Bessel function J1. */
export function besselJ1(x: number): number {
  return besselJ(1, x);
}

/**
 * Bessel function of order 0 or 1: power series to |x| = 12, Hankel's asymptotic expansion beyond; absolute error below 1e-11.
 * @source Abramowitz & Stegun 9.1.10, 9.2.5-9.2.10 (from memory)
 */
function besselJ(order: 0 | 1, x: number): number {
  const size = Math.abs(x);
  if (size <= 12) {
    let term = order === 0 ? 1 : x / 2;
    let sum = term;
    const q = (-x * x) / 4;
    for (let k = 1; k < 60; k++) {
      term *= q / (k * (k + order));
      sum += term;
    }
    return sum;
  }
  const mu = 4 * order * order;
  let p = 1;
  let q = 0;
  let term = 1;
  for (let k = 1; k < 40; k++) {
    const next = (term * (mu - (2 * k - 1) ** 2)) / (k * 8 * size);
    if (Math.abs(next) > Math.abs(term)) break;
    term = next;
    const sign = k % 4 < 2 ? 1 : -1;
    if (k % 2 === 1) q += sign * term;
    else p += k % 4 === 2 ? -term : term;
  }
  const phase = size - (order / 2 + 0.25) * Math.PI;
  const value = Math.sqrt(2 / (Math.PI * size)) * (p * Math.cos(phase) - q * Math.sin(phase));
  return order === 1 && x < 0 ? -value : value;
}

/**
 * The nth positive zero of a Bessel function of order 0 or 1 (n = 1, 2, ...), McMahon's expansion polished by Newton steps.
 * @source Abramowitz & Stegun 9.5.12 (from memory)
 */
export function besselZero(order: 0 | 1, n: number): number {
  const beta = (n + order / 2 - 0.25) * Math.PI;
  const mu = 4 * order * order;
  let x = beta - (mu - 1) / (8 * beta);
  for (let step = 0; step < 4; step++) {
    const slope = order === 0 ? -besselJ1(x) : besselJ0(x) - besselJ1(x) / x;
    x -= besselJ(order, x) / slope;
  }
  return x;
}
