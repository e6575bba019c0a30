import type { Fault } from '../errors';
import { sources, type Sourced } from '../materials';
import { constantList, type ConstantNote, type ConstantPath } from './constant-list';
import { faultAt } from './fault';
import { valueAt } from './fields';
import { valueOf } from './quantity-field';
import type { Constant } from './resolved';
import type { Design } from './schema';
import { toleratedEnds } from './tolerance';

/** Values to take instead of the nominal ones, by constant path: how the ends of an uncertain constant are tried. */
export type Overrides = Readonly<Record<string, number>>;

const practice = 'common practice, no source';

/**
 * Chooses every constant of a design and remembers which value was taken, its range and its source. A value the person
 * entered goes before the catalogue's; an uncertainty the person stated replaces the catalogue's range.
 * Missing values are gathered, so that a person learns of all of them at once.
 */
export class ConstantBook {
  readonly used: Constant[] = [];
  readonly missing: Fault[] = [];

  constructor(
    private readonly design: Design,
    private readonly overrides: Overrides,
  ) {}

  /**
   * @param path key of the constant, "material.thermoOptic"
   * @param sourced the catalogue's value, if there is one
   * @param own the person's value, SI; without it the field named in `constantList` is read
   * @param label where it says more than that of `constantList`
   * @returns the value to compute with, SI; 1 where there is none (see `missing`)
   */
  take(path: ConstantPath, sourced: Sourced | undefined, own = this.entered(path), label?: string): number {
    const note: ConstantNote = constantList[path];
    return this.choose(path, label ? { ...note, label } : note, sourced, own);
  }

  /** As `take`, for a constant that has no entry in `constantList`. */
  choose(path: string, note: ConstantNote, sourced: Sourced | undefined, own?: number): number {
    const { label, unit } = note;
    if (own !== undefined) {
      const source = 'entered in the design';
      this.used.push({ path, label, nominal: own, low: null, high: null, unit, source, standing: 'own' });
      return own;
    }
    if (!sourced) {
      this.lack(note);
      return 1;
    }
    this.used.push(this.quoted(path, note, sourced));
    return this.overrides[path] ?? sourced.nominal;
  }

  /** A value of the trade that has no source; carried so that a person sees it. */
  assume(path: ConstantPath, nominal: number): number {
    const { label, unit } = constantList[path];
    this.used.push({
      path,
      label,
      nominal,
      low: null,
      high: null,
      unit,
      source: practice,
      standing: 'common practice',
    });
    return nominal;
  }

  private quoted(path: string, note: ConstantNote, sourced: Sourced): Constant {
    const { nominal, low, high, source, seen } = sourced;
    const base: Constant = {
      path,
      label: note.label,
      nominal,
      low,
      high,
      unit: note.unit,
      source: sources[source]?.cite ?? source,
      standing: seen ? 'read' : 'from memory',
      ...(sourced.note ? { note: sourced.note } : {}),
    };
    const text = this.design.uncertainty[path] ?? (note.own && this.design.uncertainty[note.own]);
    const ends = text === undefined ? '' : toleratedEnds(nominal, text, note.dimension, note.range);
    return typeof ends === 'string'
      ? base
      : { ...base, ...ends, note: `range as stated in the design: ${text}` };
  }

  /** The person's own value for a constant, SI. */
  private entered(path: ConstantPath): number | undefined {
    const { own, dimension }: ConstantNote = constantList[path];
    const value = own === undefined ? undefined : valueAt(this.design, own);
    if (typeof value === 'number') return value;
    return typeof value === 'string' ? valueOf(value, dimension) : undefined;
  }

  private lack({ label, own }: ConstantNote): void {
    const { crystal } = this.design.rod;
    const remedy = own ? 'enter a value of your own' : 'choose another crystal';
    const sentence = `the catalogue has no value it trusts for "${label}" of ${crystal}; ${remedy}`;
    this.missing.push(faultAt(own ?? 'rod.crystal', 'missing', sentence));
  }
}

/**
 * Mean of two sourced values along two axes, ends taken together. Across an anisotropic rod heat spreads as with the
 * geometric mean of the two conductivities; two expansions widen it by their arithmetic mean.
 */
export function acrossMean(
  first: Sourced | undefined,
  second: Sourced | undefined,
  mean: 'geometric' | 'arithmetic',
): Sourced | undefined {
  if (!first || !second) return undefined;
  if (first === second) return first;
  const join = (a: number, b: number) => (mean === 'geometric' ? Math.sqrt(a * b) : (a + b) / 2);
  const ends = (a: number | null, b: number | null) => (a === null || b === null ? null : join(a, b));
  return {
    ...first,
    nominal: join(first.nominal, second.nominal),
    low: ends(first.low, second.low),
    high: ends(first.high, second.high),
    seen: first.seen && second.seen,
    note: `${mean} mean of the two axes across the rod${first.note ? `; ${first.note}` : ''}`,
  };
}
