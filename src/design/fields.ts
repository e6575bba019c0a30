import { describeRange, type FieldNote } from './field-note';
import { designSchema, type Design } from './schema';
import { defaultOf, isGroup, isList, itemAt, noteOf, settled, under, type AnySchema } from './schema-walk';

/** One thing a person can enter, as a screen or a table needs it. */
export interface Field {
  /** Dotted path into the design, list places as numbers: "cavity.elements.2.space". */
  path: string;
  kind: 'quantity' | 'number' | 'choice' | 'text';
  note: FieldNote;
  /** As it stands in the design; undefined where it is left empty. */
  value: string | number | undefined;
  /** Whether it may be left empty. */
  optional: boolean;
  /** What stands for it where it is left empty; without one `note.empty` says what holds. */
  default?: string | number;
  /** Allowed range in words, for a hint. */
  allowed?: string;
}

function kindOf(note: FieldNote): Field['kind'] {
  if (note.choices) return 'choice';
  if (!note.dimension) return 'text';
  // A share is text with its "%"; a number that is no share has no unit at all.
  return note.dimension === 'dimensionless' && note.unit === undefined ? 'number' : 'quantity';
}

/** Ranges in words, made once: they are the same for every design, and a page asks at every key stroke. */
const rangesInWords = new WeakMap<FieldNote, string>();

function allowedBy(note: FieldNote): string | undefined {
  if (!note.dimension || !note.range) return undefined;
  const known = rangesInWords.get(note) ?? describeRange(note.range, note.dimension, note.unit);
  rangesInWords.set(note, known);
  return known;
}

const isEntry = (value: unknown): value is string | number =>
  typeof value === 'string' || typeof value === 'number';

function fieldOf(
  schema: AnySchema,
  inner: AnySchema,
  value: unknown,
  path: string,
  optional: boolean,
): Field[] {
  const note = noteOf(inner);
  if (!note || (value !== undefined && !isEntry(value))) return [];
  const usual = defaultOf(schema);
  return [
    {
      path,
      kind: kindOf(note),
      note,
      value,
      optional,
      ...(isEntry(usual) ? { default: usual } : {}),
      allowed: allowedBy(note),
    },
  ];
}

/** An element of the cavity is one of several things; those it is not are no fields of it. */
const isElement = (path: string) => /^cavity\.elements\.\d+$/.test(path);

function walk(schema: AnySchema, value: unknown, path: string, mayLack: boolean): Field[] {
  const optional = mayLack || schema.type === 'optional';
  const inner = settled(schema, value);
  if (!inner) return [];
  const at = (key: string | number) => (path === '' ? String(key) : `${path}.${key}`);
  if (inner.entries)
    return Object.entries(inner.entries).flatMap(([key, entry]) => {
      const below = under(value, key);
      return isElement(path) && below === undefined ? [] : walk(entry, below, at(key), false);
    });
  if (inner.type === 'array')
    return Array.isArray(value)
      ? value.flatMap((item, place) => walk(inner.item!, item, at(place), false))
      : [];
  if (isList(inner))
    return inner.items!.flatMap((_, place) =>
      walk(itemAt(inner, place)!, under(value, place), at(place), optional),
    );
  return fieldOf(schema, inner, value, path, optional);
}

/**
 * Every field of a design in the order of the file, with label, hint and allowed range: those left empty too. Places
 * where one of several shapes is chosen are in `alternativesOf`.
 * @param design a checked design, or one still being typed
 */
export function fieldsOf(design: Design): Field[] {
  return walk(designSchema as unknown as AnySchema, design, '', false);
}

/** Value at a dotted path of a design, or undefined. */
export function valueAt(design: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>(under, design);
}

/** A list none of whose places holds anything is as good as none. */
const isHollow = (value: unknown) =>
  Array.isArray(value) && value.length > 0 && value.every((item) => item === undefined);

function placed(at: unknown, [key, ...further]: readonly string[], value: unknown): unknown {
  if (key === undefined) return value;
  const next = placed(under(at, key), further, value);
  if (Array.isArray(at) || (at === undefined && /^\d+$/.test(key))) {
    const list = [...((at as unknown[] | undefined) ?? [])];
    list[Number(key)] = next;
    return list;
  }
  const kept = isGroup(at) ? Object.entries(at) : [];
  if (next === undefined || isHollow(next))
    return Object.fromEntries(kept.filter(([other]) => other !== key));
  return { ...Object.fromEntries(kept), [key]: next };
}

/** A copy of a design with one value replaced (or removed, where `value` is undefined); the original is kept. */
export function withValue<T>(design: T, path: string, value: unknown): T {
  return placed(design, path.split('.'), value) as T;
}
