import { convertTo, dimensionRecord, formatQuantity, parseQuantity, type Dimension } from '../quantity';

/** Allowed SI range; `above` and `below` exclude their end. */
export interface Range {
  above?: number;
  from?: number;
  to?: number;
  below?: number;
  /** Only whole numbers. */
  whole?: boolean;
}

/** What a screen needs to show a field; carried in the schema so that field, check and JSON Schema cannot differ. */
export interface FieldNote {
  label: string;
  /** Convention or meaning, one short sentence: radius or diameter, 1/e2 or flat-top, sign. */
  hint?: string;
  /** Word that may stand instead of a number, with its meaning in SI ("flat" is an infinite radius). */
  words?: Readonly<Record<string, number>>;
  dimension?: Dimension;
  /** Unit the range is shown in; the dimension's first where it is left out. */
  unit?: string;
  range?: Range;
  /** A value as a person might write it, for messages. */
  example?: string;
  choices?: readonly string[];
  /** Names of the catalogue the field is looked up in; aliases of them are accepted too. */
  catalogue?: readonly string[];
  /** What holds where the field is left empty and has no default: "7 K below ambient". */
  empty?: string;
}

const longestShown = 60;

/** What a person wrote, for a message: short, on one line, whatever it is. */
export function given(input: unknown): string {
  if (typeof input === 'string') {
    const cut = input.length > longestShown ? `${input.slice(0, longestShown - 3)}...` : input;
    return JSON.stringify(cut);
  }
  if (input === undefined) return 'nothing';
  if (Array.isArray(input)) return input.length === 0 ? 'an empty list' : `a list of ${input.length}`;
  if (typeof input === 'object' && input !== null) return 'a group in { }';
  return typeof input === 'number' || typeof input === 'boolean' || input === null
    ? String(input)
    : `a ${typeof input}`;
}

/** Names in a row, cut where the row gets longer than a person reads. */
export function listed(names: readonly string[], longest = 150): string {
  const shown: string[] = [];
  let length = 0;
  for (const name of names) {
    length += name.length + 2;
    if (length > longest && shown.length > 0) break;
    shown.push(name);
  }
  const rest = names.length - shown.length;
  return rest > 0 ? `${shown.join(', ')} and ${rest} more` : shown.join(', ');
}

const shownIn = (dimension: Dimension, unit?: string) => (bound: number) => {
  // Bounds are round in their own unit; the SI number may not be ("5 mm" is 5000.000000000001 um).
  const round = Number(
    convertTo(bound, unit ?? dimensionRecord(dimension).units[0]!, dimension).toPrecision(10),
  );
  const written = formatQuantity(bound, dimension, unit);
  return written.replace(/^\S+?(?=$| |°$)/, String(round === 0 ? 0 : round));
};

/** "2 W to 5 W", "more than 0 um to 5000 um", "at least 1": an allowed range, for a hint. */
export function describeRange(range: Range, dimension: Dimension, unit?: string): string {
  const show = shownIn(dimension, unit);
  const low = range.above ?? range.from;
  const high = range.below ?? range.to;
  const more = range.above === undefined ? '' : 'more than ';
  const less = range.below === undefined ? '' : 'less than ';
  if (low !== undefined && high !== undefined) return `${more}${show(low)} to ${less}${show(high)}`;
  if (low !== undefined) return `${more || 'at least '}${show(low)}`;
  return high === undefined ? 'any value' : `${less || 'at most '}${show(high)}`;
}

/** "more than 0 um and at most 5000 um": what a value must be, for a message. */
function demand(range: Range, dimension: Dimension, unit?: string): string {
  const show = shownIn(dimension, unit);
  const parts: string[] = [];
  if (range.above !== undefined) parts.push(`more than ${show(range.above)}`);
  if (range.from !== undefined) parts.push(`at least ${show(range.from)}`);
  if (range.below !== undefined) parts.push(`less than ${show(range.below)}`);
  if (range.to !== undefined) parts.push(`at most ${show(range.to)}`);
  return parts.join(' and ');
}

const within = (
  value: number,
  { above = -Infinity, from = -Infinity, to = Infinity, below = Infinity }: Range,
) => value > above && value >= from && value <= to && value < below;

/** What is wrong with an SI value against the range of its field; null when it lies in it. */
export function rangeFault(value: number, note: FieldNote): string | null {
  const { range = {}, dimension = 'dimensionless', unit } = note;
  return within(value, range) ? null : `it must be ${demand(range, dimension, unit)}`;
}

/** "12 W": a value this field would take, for a message. */
export function exampleOf(note: FieldNote): string {
  if (note.example !== undefined) return note.example;
  const { range = {}, dimension = 'dimensionless', unit } = note;
  const usual = parseQuantity(dimensionRecord(dimension).example, dimension);
  if (usual.ok && within(usual.value, range)) return dimensionRecord(dimension).example;
  const end = range.from || range.to || range.below || range.above || 1;
  return shownIn(dimension, unit)(within(end, range) ? end : end / 2);
}

/** `, or "flat"`: the words a field takes instead of a number. */
export function wordsOf(note: FieldNote): string {
  return note.words
    ? `, or ${Object.keys(note.words)
        .map((word) => `"${word}"`)
        .join(' or ')}`
    : '';
}
