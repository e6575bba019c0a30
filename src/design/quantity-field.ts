import * as v from 'valibot';
import { dimensionRecord, parseQuantity, type Dimension } from '../quantity';
import { exampleOf, given, rangeFault, wordsOf, type FieldNote, type Range } from './field-note';

const wordIn = (text: string, words: FieldNote['words']): number | undefined => {
  const word = text.trim().toLowerCase();
  return words && Object.hasOwn(words, word) ? words[word] : undefined;
};

/** A reason on one line: what a person wrote may hold line breaks. */
const oneLine = (reason: string) => reason.replace(/\p{Cc}+/gu, ' ');

/**
 * Fault of one quantity text, or null. The sentence leaves out the field's name, which the caller puts before it.
 * Kind and sentence are packed as "kind|sentence", since a schema library carries one string.
 */
export function quantityFault(input: unknown, note: FieldNote): string | null {
  const dimension = note.dimension!;
  const words = wordsOf(note);
  if (typeof input !== 'string') {
    const { label } = dimensionRecord(dimension);
    return `wrong type|got ${given(input)}; ${label} is written as text, such as "${exampleOf(note)}"${words}`;
  }
  if (wordIn(input, note.words) !== undefined) return null;
  const parsed = parseQuantity(input, dimension);
  if (!parsed.ok) {
    // Most reasons quote what was written themselves.
    const got = parsed.reason.startsWith('"') ? '' : `got ${given(input)}; `;
    return `${parsed.kind}|${got}${oneLine(parsed.reason)}${words}`;
  }
  const fault = rangeFault(parsed.value, note);
  return fault === null ? null : `out of range|got ${given(input)}; ${fault}${words}`;
}

/** A schema for one quantity given as text with its unit. */
export function quantity(
  dimension: Dimension,
  label: string,
  range: Range = {},
  more: Partial<FieldNote> = {},
) {
  const note: FieldNote = { label, dimension, range, ...more };
  return v.pipe(
    v.custom<string>(
      (input) => quantityFault(input, note) === null,
      (issue) => quantityFault(issue.input, note)!,
    ),
    v.metadata({ note }),
  );
}

/** SI value of a field whose text has passed `quantityFault`; words give their own value. */
export function valueOf(text: string, dimension: Dimension, words?: FieldNote['words']): number {
  const word = wordIn(text, words);
  if (word !== undefined) return word;
  const parsed = parseQuantity(text, dimension);
  if (!parsed.ok) throw new Error(`unchecked quantity "${text}": ${parsed.reason}`);
  return parsed.value;
}

/** SI value of an optional field, undefined where it is left empty. */
export function ownValue(text: string | undefined, dimension: Dimension): number | undefined {
  return text === undefined ? undefined : valueOf(text, dimension);
}

/** A field with a closed list of values. */
export function choice<const T extends readonly string[]>(label: string, choices: T, hint?: string) {
  const note: FieldNote = { label, choices, hint };
  const allowed = choices.map((item) => `"${item}"`).join(', ');
  return v.pipe(
    v.picklist(choices, (issue) => `unknown name|got ${given(issue.input)}; allowed: ${allowed}`),
    v.metadata({ note }),
  );
}

/** A number without a unit: a count, an order, a ratio. */
export function plainNumber(label: string, range: Range, hint?: string, more: Partial<FieldNote> = {}) {
  const note: FieldNote = { label, range, dimension: 'dimensionless', hint, ...more };
  const kind = range.whole ? 'a whole number' : 'a plain number';
  const fault = (input: unknown): string | null => {
    if (typeof input !== 'number' || !Number.isFinite(input))
      return `wrong type|got ${given(input)}; ${kind} without quotes is needed, such as ${exampleOf(note)}`;
    if (range.whole && !Number.isInteger(input)) return `out of range|got ${input}; a whole number is needed`;
    const out = rangeFault(input, note);
    return out === null ? null : `out of range|got ${input}; ${out}`;
  };
  return v.pipe(
    v.custom<number>(
      (input) => fault(input) === null,
      (issue) => fault(issue.input)!,
    ),
    v.metadata({ note }),
  );
}

/** Free text with a length limit. */
export function text(label: string, most: number, more: Partial<FieldNote> = {}) {
  const note: FieldNote = { label, ...more };
  return v.pipe(
    v.string((issue) => `wrong type|got ${given(issue.input)}; text in quotes is needed`),
    v.maxLength(
      most,
      (issue) => `out of range|got ${issue.input.length} characters; at most ${most} are allowed`,
    ),
    v.metadata({ note }),
  );
}

/** A name looked up in a catalogue; whether it is there is checked with what else must fit together. */
export function catalogueName(label: string, names: readonly { name: string }[], hint: string) {
  const catalogue = names.map((item) => item.name);
  return text(label, 100, { hint, catalogue, example: catalogue[0] });
}

/** Metadata of a union or variant whose shapes a screen can offer as a choice. The options stand in the order of the schema's own. */
export interface AlternativesNote {
  label: string;
  hint?: string;
  options: readonly { name: string; value: unknown }[];
}
