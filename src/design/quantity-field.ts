import * as v from 'valibot';
import { formatQuantity, parseQuantity, type Dimension } from '../quantity';

/** What a screen needs to show a field; carried in the schema so that field, check and JSON Schema cannot differ. */
export interface FieldNote {
  label: string;
  /** Convention or meaning, one short sentence: radius or diameter, 1/e2 or flat-top, sign. */
  hint?: string;
  /** Word that may stand instead of a number, with its meaning in SI ("flat" is an infinite radius). */
  words?: Record<string, number>;
  dimension?: Dimension;
  /** Unit the range is shown in; the dimension's first where it is left out. */
  unit?: string;
  /** Allowed SI range; `above` and `below` exclude their end. */
  range?: Range;
  choices?: readonly string[];
}

export interface Range {
  above?: number;
  from?: number;
  to?: number;
  below?: number;
}

function rangeFault(value: number, range: Range, dimension: Dimension, unit?: string): string | null {
  const show = (bound: number) => formatQuantity(bound, dimension, unit);
  if (range.above !== undefined && value <= range.above) return `more than ${show(range.above)}`;
  if (range.from !== undefined && value < range.from) return `at least ${show(range.from)}`;
  if (range.below !== undefined && value >= range.below) return `less than ${show(range.below)}`;
  if (range.to !== undefined && value > range.to) return `at most ${show(range.to)}`;
  return null;
}

/** "2 W to 5 W", for a hint or a message. */
export function describeRange(range: Range, dimension: Dimension, unit?: string): string {
  const low = range.above ?? range.from;
  const high = range.below ?? range.to;
  const show = (bound: number) => formatQuantity(bound, dimension, unit);
  if (low !== undefined && high !== undefined)
    return `${range.above !== undefined ? 'more than ' : ''}${show(low)} to ${show(high)}`;
  if (low !== undefined) return `${range.above !== undefined ? 'more than' : 'at least'} ${show(low)}`;
  return high !== undefined ? `at most ${show(high)}` : 'any value';
}

const given = (input: unknown) => {
  const text = typeof input === 'string' ? `"${input}"` : JSON.stringify(input);
  return text !== undefined && text.length > 60 ? `${text.slice(0, 57)}...` : (text ?? 'nothing');
};

/**
 * Fault of one quantity text, or null. The sentence leaves out the field's name, which the caller puts before it.
 * Kind and sentence are packed as "kind|sentence", since a schema library carries one string.
 */
export function quantityFault(input: unknown, note: FieldNote): string | null {
  const dimension = note.dimension!;
  const range = note.range ?? {};
  if (typeof input === 'string' && note.words && input.trim().toLowerCase() in note.words) return null;
  const words = note.words ? `, or ${Object.keys(note.words).map((word) => `"${word}"`).join(' or ')}` : '';
  if (typeof input !== 'string') {
    const example = formatQuantity(range.from || range.to || 1, dimension, note.unit);
    return `wrong type|got ${given(input)}; a quantity is text with its unit, such as "${example}"${words}`;
  }
  const parsed = parseQuantity(input, dimension);
  if (!parsed.ok) return `${parsed.kind}|got ${given(input)}; ${parsed.reason}${words}`;
  const fault = rangeFault(parsed.value, range, dimension, note.unit);
  return fault === null ? null : `out of range|got ${given(input)}; it must be ${fault}${words}`;
}

/** A schema for one quantity given as text with its unit. */
export function quantity(dimension: Dimension, label: string, range: Range = {}, more: Partial<FieldNote> = {}) {
  const note: FieldNote = { label, dimension, range, ...more };
  return v.pipe(
    v.custom<string>((input) => quantityFault(input, note) === null, (issue) => quantityFault(issue.input, note)!),
    v.metadata({ note }),
  );
}

/** SI value of a field whose text has passed `quantityFault`; words give their own value. */
export function valueOf(text: string, dimension: Dimension, words?: Record<string, number>): number {
  const word = words?.[text.trim().toLowerCase()];
  if (word !== undefined) return word;
  const parsed = parseQuantity(text, dimension);
  if (!parsed.ok) throw new Error(`unchecked quantity "${text}": ${parsed.reason}`);
  return parsed.value;
}

/** A field with a closed list of values. */
export function choice<const T extends readonly string[]>(label: string, choices: T, hint?: string) {
  const note: FieldNote = { label, choices, hint };
  return v.pipe(
    v.picklist(choices, (issue) => {
      const list = choices.map((item) => `"${item}"`).join(', ');
      return `unknown name|got ${given(issue.input)}; allowed are ${list}`;
    }),
    v.metadata({ note }),
  );
}

/** A number without a unit: a count, an order, a ratio. */
export function plainNumber(label: string, range: Range & { whole?: boolean }, hint?: string) {
  const note: FieldNote = { label, range, dimension: 'dimensionless', hint };
  const fault = (input: unknown): string | null => {
    if (typeof input !== 'number' || !Number.isFinite(input))
      return `wrong type|got ${given(input)}; a plain number is needed, such as ${range.from ?? 1}`;
    if (range.whole && !Number.isInteger(input)) return `out of range|got ${input}; a whole number is needed`;
    const out = rangeFault(input, range, 'dimensionless');
    return out === null ? null : `out of range|got ${input}; it must be ${out}`;
  };
  return v.pipe(
    v.custom<number>((input) => fault(input) === null, (issue) => fault(issue.input)!),
    v.metadata({ note }),
  );
}

/** Free text with a length limit; `look` finds it in a catalogue and says what is near where it is not there. */
export function text(label: string, hint?: string, most = 2000) {
  return v.pipe(
    v.string((issue) => `wrong type|got ${given(issue.input)}; text is needed`),
    v.maxLength(most, (issue) => `out of range|got ${issue.input.length} characters; at most ${most} are allowed`),
    v.metadata({ note: { label, hint } satisfies FieldNote }),
  );
}
