/** Lanczos coefficients (g = 7, 9 terms) of the gamma function. */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/** ln Gamma(x), x > 0, Lanczos approximation, relative error near 1e-15. */
function logGamma(x: number): number {
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  let sum = LANCZOS[0]!;
  for (let i = 1; i < LANCZOS.length; i++) sum += LANCZOS[i]! / (x - 1 + i);
  const t = x + 6.5;
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Series P = x^a e^-x / Gamma(a+1) (1 + x/(a+1) + ...), quick for x < a + 1. */
function lowerSeries(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < 300; n++) {
    term *= x / (a + n);
    sum += term;
    if (term < 1e-16 * sum) break;
  }
  return sum * Math.exp(-x + a * Math.log(x) - logGamma(a));
}

/** Continued fraction of Q = 1 - P (modified Lentz), quick for x > a + 1. */
function upperFraction(a: number, x: number): number {
  const tiny = 1e-300;
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let h = d;
  for (let i = 1; i < 300; i++) {
    const an = -i * (i - a);
    b += 2;
    d = an * d + b;
    d = 1 / (Math.abs(d) < tiny ? tiny : d);
    c = b + an / c;
    if (Math.abs(c) < tiny) c = tiny;
    const delta = d * c;
    h *= delta;
    if (Math.abs(delta - 1) < 1e-16) break;
  }
  return Math.exp(-x + a * Math.log(x) - logGamma(a)) * h;
}

/**
 * Regularised lower incomplete gamma function P(a, x) = (1/Gamma(a)) int_0^x t^(a-1) e^-t dt.
 * @param a > 0
 * @param x >= 0
 * @returns 0..1, absolute error below 1e-14
 * @source Abramowitz & Stegun, Handbook of Mathematical Functions, 6.5.29 and 6.5.31
 */
export function regularisedLowerGamma(a: number, x: number): number {
  if (!(x > 0)) return 0;
  if (x === Infinity) return 1;
  return x < a + 1 ? lowerSeries(a, x) : 1 - upperFraction(a, x);
}
