import { valueAt } from './fields';
import { designSchema, type Design } from './schema';
import {
  alternativesNoteOf,
  defaultOf,
  isList,
  itemAt,
  settled,
  shapePlace,
  under,
  unwrapped,
  type AnySchema,
} from './schema-walk';

/** A place of the design that holds one of several shapes: a word for a rule, or a group of values. */
export interface Alternative {
  /** Dotted path, "rod.absorption". */
  path: string;
  label: string;
  hint?: string;
  /** Name of each shape, what to set at `path` to choose it, and whether a value has it. */
  options: { name: string; value: unknown; fits: (value: unknown) => boolean }[];
}

function alternativeAt(schema: AnySchema, path: string): Alternative[] {
  const inner = unwrapped(schema);
  const note = alternativesNoteOf(inner);
  if (!note) return [];
  const { label, hint } = note;
  const options = note.options.map(({ name, value }, place) => ({
    name,
    value,
    fits: (other: unknown) => shapePlace(inner, other ?? defaultOf(schema)) === place,
  }));
  return [{ path, label, ...(hint ? { hint } : {}), options }];
}

function walk(schema: AnySchema, value: unknown, path: string): Alternative[] {
  const at = (key: string | number) => (path === '' ? String(key) : `${path}.${key}`);
  const inner = settled(schema, value);
  const keys = inner?.entries ? Object.keys(inner.entries) : [];
  const places = inner && isList(inner) && Array.isArray(value) ? [...value.keys()] : [];
  return [
    ...alternativeAt(schema, path),
    ...keys.flatMap((key) => walk(inner!.entries![key]!, under(value, key), at(key))),
    ...places.flatMap((place) => walk(itemAt(inner!, place)!, under(value, place), at(place))),
  ];
}

/** Every place of a design where one of several shapes can be chosen, in the order of the file. */
export function alternativesOf(design: Design): Alternative[] {
  return walk(designSchema as unknown as AnySchema, design, '');
}

/** Name of the shape a design has at a place; that of the first where it has none of them. */
export function shapeOf(design: Design, { path, options }: Alternative): string {
  const value = valueAt(design, path);
  return (options.find((option) => option.fits(value)) ?? options[0]!).name;
}
