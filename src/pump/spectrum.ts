import type { PumpLine } from './absorption';

/** Discrete stand-in for a Gaussian spectrum: wavelength offsets from its centre (m), and weights that sum to 1. */
export interface SpectralNodes {
  offsets: Float64Array;
  weights: Float64Array;
}

/** Natural logarithm of the share error aimed at, with room below the 1e-6 the tests ask for. */
const ERROR_EXPONENT = 17;
/** Spectrum kept out to this many (sqrt2 standard deviations): erfc(3.9) = 3.5e-8 of the light lies beyond. */
const REACH = 3.9;
/** A line further than this (same unit) from the spectrum's centre meets no light worth resolving. */
const FAR = 6;
/** Upper bound of the node count on one side of the centre; reached when a line is about 200 times narrower than the diode. */
const MOST_NODES = 1500;

/** sqrt(2) standard deviations of a Gaussian, from its full width at half maximum (same unit). */
function scaleOfFwhm(fwhm: number): number {
  return fwhm / (2 * Math.sqrt(Math.LN2));
}

/**
 * How far from the real wavelength axis exp(-alpha L) stays bounded: the half width of a Lorentzian line (its pole),
 * about a quarter of the full width of a Gaussian line (where its real part turns negative).
 */
function narrowestStrip(lines: readonly PumpLine[], from: number, to: number, scale: number): number {
  let strip = Infinity;
  for (const line of lines) {
    if (line.centre < from - FAR * scale - line.fwhm || line.centre > to + FAR * scale + line.fwhm) continue;
    strip = Math.min(strip, line.shape === 'lorentzian' ? line.fwhm / 2 : line.fwhm / 4);
  }
  return strip;
}

/**
 * Nodes that stand for a diode's Gaussian spectrum when it meets given absorption lines.
 * The mean over the spectrum is (1/sqrt(pi)) int exp(-x^2) F(centre + s x) dx, s = fwhm / (2 sqrt(ln2)). Equally spaced
 * nodes of step h err by exp(-2 pi y/h + y^2), y = the smaller of pi/h and d, d = strip / s the distance of the nearest
 * singularity of F from the axis. So h = 2 pi d / (c + d^2), at most pi / sqrt(c), for an error near exp(-c). For lines narrower than the diode this
 * needs several times fewer nodes than Gauss-Hermite, whose error falls only as exp(-2 d sqrt(2 n)).
 * @param linewidth full width at half maximum of the diode's spectrum, m; 0 gives one node
 * @param lines lines the light will meet (empty: smooth absorption)
 * @param from,to range of centre wavelengths the nodes shall serve, m
 * @source Trefethen & Weideman, "The exponentially convergent trapezoidal rule", SIAM Review 56, 385 (2014) (from memory)
 */
export function spectralNodes(
  linewidth: number,
  lines: readonly PumpLine[],
  from: number,
  to: number = from,
): SpectralNodes {
  if (!(linewidth > 0) || lines.length === 0)
    return { offsets: new Float64Array(1), weights: new Float64Array([1]) };
  const scale = scaleOfFwhm(linewidth);
  const d = Math.min(narrowestStrip(lines, from, to, scale) / scale, Math.sqrt(ERROR_EXPONENT));
  const step = Math.max((2 * Math.PI * d) / (ERROR_EXPONENT + d * d), REACH / MOST_NODES);
  const half = Math.ceil(REACH / step);
  const offsets = new Float64Array(2 * half + 1);
  const weights = new Float64Array(2 * half + 1);
  let sum = 0;
  for (let i = -half; i <= half; i++) {
    const x = i * step;
    offsets[i + half] = scale * x;
    sum += weights[i + half] = Math.exp(-x * x);
  }
  for (let i = 0; i < weights.length; i++) weights[i]! /= sum;
  return { offsets, weights };
}

/**
 * Wavelength of a diode at a case temperature: wavelength + drift (case - reference).
 * Left out: the jump between longitudinal modes and the shift with current at fixed case temperature.
 * @param wavelength centre wavelength at the reference case temperature, m
 * @param drift m/K
 * @param caseTemperature K
 * @param referenceTemperature case temperature at which `wavelength` holds, K
 * @returns m
 * @source common practice, no source
 */
export function diodeWavelength(
  wavelength: number,
  drift: number,
  caseTemperature: number,
  referenceTemperature: number,
): number {
  return wavelength + drift * (caseTemperature - referenceTemperature);
}
