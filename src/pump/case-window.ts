import { findRoot } from '../numerics/root';
import type { AbsorptionModel } from './absorption';
import { absorbedAt, dependsOnWavelength, prepareAbsorption } from './channels';
import { diodeWavelength } from './spectrum';

/** What is needed to say at which case temperature a diode suits the rod. */
export interface CaseWindowInput {
  /** centre wavelength at the reference case temperature, m */
  wavelength: number;
  /** case temperature at which that wavelength holds, K */
  referenceTemperature: number;
  /** m/K */
  drift: number;
  /** full width at half maximum of the diode's spectrum, m */
  linewidth: number;
  polarisationShares: { pi: number; sigma: number };
  absorption: AbsorptionModel;
  /** doped length, m */
  length: number;
  passes: 1 | 2;
  returnReflectivity: number;
  /** share of the best absorption that must be kept, for example 0.9 */
  shareOfBest: number;
  /** case temperatures that can be reached at all, K */
  search: { from: number; to: number };
}

/** Case temperatures (K) that keep the absorption; null where there is no such bound inside the searched range. */
export interface CaseWindow {
  low: number | null;
  high: number | null;
  best: number | null;
  /** absorbed share at the best case temperature */
  bestShare: number;
}

/** Samples per width of the combined line and diode: enough that no second maximum hides between two samples. */
const SAMPLES_PER_WIDTH = 4;
const FEWEST_SAMPLES = 24;
const MOST_SAMPLES = 400;
/** Bounds and best are found to this, K: far below what a diode's case can be held to. */
const TEMPERATURE_TOLERANCE = 1e-3;

function sampleCount(input: CaseWindowInput): number {
  if (input.absorption.kind === 'coefficient') return FEWEST_SAMPLES;
  const narrowest = input.absorption.lines.reduce((least, line) => Math.min(least, line.fwhm), Infinity);
  const travel = Math.abs(input.drift) * (input.search.to - input.search.from);
  const wanted = (SAMPLES_PER_WIDTH * travel) / Math.hypot(narrowest, input.linewidth);
  return Math.min(MOST_SAMPLES, Math.max(FEWEST_SAMPLES, Math.ceil(wanted)));
}

/** Highest point of f between a and b by golden section, for one maximum in between. */
function highest(f: (x: number) => number, a: number, b: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [a, b];
  let left = high - ratio * (high - low);
  let right = low + ratio * (high - low);
  let [atLeft, atRight] = [f(left), f(right)];
  while (high - low > TEMPERATURE_TOLERANCE) {
    if (atLeft >= atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - ratio * (high - low);
      atLeft = f(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + ratio * (high - low);
      atRight = f(right);
    }
  }
  return (low + high) / 2;
}

/**
 * The case temperatures at which the rod absorbs at least a given share of the best it can, and the best of them.
 * The best is sought over the stated range of case temperatures; the window is the stretch around it.
 * Left out: change of the rod's own lines with rod temperature.
 * @returns all null where the absorption does not depend on the diode's wavelength or the diode does not drift
 * @throws NumericalError if a bound that was bracketed is not found
 */
export function caseWindow(input: CaseWindowInput): CaseWindow {
  const { search, length, shareOfBest } = input;
  const centre = (t: number) => diodeWavelength(input.wavelength, input.drift, t, input.referenceTemperature);
  const [shortest, longest] = [centre(search.from), centre(search.to)].sort((a, b) => a - b) as [
    number,
    number,
  ];
  const prepared = prepareAbsorption(
    input.linewidth,
    input.polarisationShares,
    input.absorption,
    shortest,
    longest,
  );
  const returned = input.passes === 2 ? input.returnReflectivity : 0;
  const absorbed = (t: number) => absorbedAt(prepared, centre(t), length, returned);
  if (input.drift === 0 || !dependsOnWavelength(prepared))
    return { low: null, high: null, best: null, bestShare: absorbed(input.referenceTemperature) };

  const intervals = sampleCount(input);
  const at = (k: number) => search.from + ((search.to - search.from) * k) / intervals;
  const samples = Float64Array.from({ length: intervals + 1 }, (_, k) => absorbed(at(k)));
  const top = samples.indexOf(Math.max(...samples));
  const peak = highest(absorbed, at(Math.max(0, top - 1)), at(Math.min(intervals, top + 1)));
  // At an end of the range the best is the end itself, which the search only nears.
  const best = absorbed(peak) > samples[top]! ? peak : at(top);
  const bestShare = absorbed(best);
  const short = (t: number) => absorbed(t) - shareOfBest * bestShare;
  const bound = (direction: 1 | -1): number | null => {
    let near = best;
    for (let k = top + direction; k >= 0 && k <= intervals; k += direction) {
      if (samples[k]! < shareOfBest * bestShare)
        return findRoot(short, Math.min(near, at(k)), Math.max(near, at(k)), {
          tolerance: TEMPERATURE_TOLERANCE,
        });
      near = at(k);
    }
    return null;
  };
  return { low: bound(-1), high: bound(1), best, bestShare };
}
