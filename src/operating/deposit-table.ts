import type { ResolvedDesign } from '../design/resolved';
import type { RodGrid } from '../heat';
import type { PreparedAbsorption } from '../pump';
import { depositAt } from './absorbed';

/** Entries per width of the narrowest structure (line or diode): cubic interpolation is then good to 1e-7 of the deposit. */
const perWidth = 40;

/**
 * Absorbed share of each axial cell against the diode's wavelength, computed where it is asked for and interpolated in
 * between: the closed loop asks thousands of times within a few nanometres.
 */
export class DepositTable {
  private readonly entries = new Map<number, Float64Array>();
  private readonly step: number;

  constructor(
    private readonly resolved: ResolvedDesign,
    private readonly grid: RodGrid,
    private readonly absorption: PreparedAbsorption,
  ) {
    const { rod, pump } = resolved;
    const lines = rod.absorption.kind === 'coefficient' ? [] : rod.absorption.lines;
    const narrowest = lines.reduce((least, line) => Math.min(least, line.fwhm), Infinity);
    this.step = lines.length === 0 ? Infinity : Math.hypot(narrowest, pump.linewidth) / perWidth;
  }

  private entry(index: number): Float64Array {
    const known = this.entries.get(index);
    if (known) return known;
    const wavelength = this.step === Infinity ? this.resolved.pump.wavelength : index * this.step;
    const made = depositAt(this.resolved, this.grid, this.absorption, wavelength);
    this.entries.set(index, made);
    return made;
  }

  /** @param wavelength of the diode, m @returns length nz; not to be changed */
  at(wavelength: number): Float64Array {
    if (this.step === Infinity) return this.entry(0);
    const place = wavelength / this.step;
    const first = Math.floor(place) - 1;
    const t = place - first - 1;
    const [a, b, c, d] = [
      this.entry(first),
      this.entry(first + 1),
      this.entry(first + 2),
      this.entry(first + 3),
    ];
    const wa = (-t * (t - 1) * (t - 2)) / 6;
    const wb = ((t + 1) * (t - 1) * (t - 2)) / 2;
    const wc = (-(t + 1) * t * (t - 2)) / 2;
    const wd = ((t + 1) * t * (t - 1)) / 6;
    const out = new Float64Array(a.length);
    for (let j = 0; j < out.length; j++) out[j] = wa * a[j]! + wb * b[j]! + wc * c[j]! + wd * d[j]!;
    return out;
  }
}
