import { DesignError } from '../errors';
import { sources, type Sourced } from '../materials';
import type { Constant } from './resolved';

/** Values to take instead of the nominal ones, by constant path: how the ends of an uncertain constant are tried. */
export type Overrides = Readonly<Record<string, number>>;

/** What a person entered instead of the catalogue, in SI. */
export type OwnValue = number | undefined;

/**
 * Chooses every constant of a design and remembers which value was taken, its range and its source.
 * Missing values are gathered, so that a person learns of all of them at once.
 */
export class ConstantBook {
  readonly used: Constant[] = [];
  private readonly missing: { path: string; label: string; enter: string }[] = [];

  constructor(private readonly overrides: Overrides) {}

  /**
   * @param path key of the constant, "material.thermoOptic"
   * @param sourced the catalogue's value, if there is one
   * @param own the person's value, which goes before the catalogue's
   * @param enter design field where a missing value can be entered
   * @returns the value to compute with; 1 where it is missing (see `refuseMissing`)
   */
  take(path: string, label: string, sourced: Sourced | undefined, own: OwnValue, enter: string): number {
    if (own !== undefined) {
      this.used.push({ path, label, nominal: own, low: null, high: null, unit: sourced?.unit ?? '', source: 'entered in the design', standing: 'own' });
      return own;
    }
    if (!sourced) {
      this.missing.push({ path, label, enter });
      return 1;
    }
    const { nominal, low, high, unit, source, seen, note } = sourced;
    const cite = sources[source]?.cite ?? source;
    this.used.push({ path, label, nominal, low, high, unit, source: cite, standing: seen ? 'read' : 'from memory', ...(note ? { note } : {}) });
    return this.overrides[path] ?? nominal;
  }

  /** A value of the trade that has no source; carried so that a person sees it. */
  practice(path: string, label: string, nominal: number, low: number, high: number, unit: string): number {
    this.used.push({ path, label, nominal, low, high, unit, source: 'common practice, no source', standing: 'common practice' });
    return this.overrides[path] ?? nominal;
  }

  /** @throws DesignError naming every constant that the catalogue lacks and where it can be entered */
  refuseMissing(crystal: string): void {
    if (this.missing.length === 0) return;
    throw new DesignError(
      this.missing.map(({ label, enter }) => ({
        path: enter,
        kind: 'missing' as const,
        message: `${enter}: the catalogue has no ${label.toLowerCase()} of ${crystal} that it trusts; enter a value of your own`,
      })),
    );
  }
}

/** Geometric mean of two sourced values along two axes, ends taken together: what conducts across an anisotropic rod. */
export function acrossMean(first: Sourced | undefined, second: Sourced | undefined, mean: 'geometric' | 'arithmetic'): Sourced | undefined {
  if (!first || !second) return undefined;
  if (first === second) return first;
  const join = (a: number, b: number) => (mean === 'geometric' ? Math.sqrt(a * b) : (a + b) / 2);
  const ends = (a: number | null, b: number | null) => (a === null || b === null ? null : join(a, b));
  return {
    ...first,
    nominal: join(first.nominal, second.nominal),
    low: ends(first.low, second.low),
    high: ends(first.high, second.high),
    note: `${mean} mean of the two axes across the rod${first.note ? `; ${first.note}` : ''}`,
  };
}
