import { designSchema } from '../../src/design/schema';
import {
  alternativesNoteOf,
  isChoiceOfShapes,
  isList,
  noteOf,
  unwrapped,
  type AnySchema,
} from '../../src/design/schema-walk';
import type { FieldNote } from '../../src/design/field-note';

/** A scalar of the schema: its path with "*" for any place of a list, and what is noted of it. */
export interface Leaf {
  path: string;
  note: FieldNote | undefined;
  /** A word that marks a shape and is no field of its own. */
  literal: boolean;
  optional: boolean;
  default: unknown;
}

const at = (path: string, key: string | number) => (path === '' ? String(key) : `${path}.${key}`);

/** Every scalar of every shape the design file can have, found without any design. */
export function schemaLeaves(
  schema = designSchema as unknown as AnySchema,
  path = '',
  optional = false,
): Leaf[] {
  const inner = unwrapped(schema);
  const mayLack = optional || schema.type === 'optional';
  if (isChoiceOfShapes(inner)) return inner.options!.flatMap((option) => schemaLeaves(option, path, mayLack));
  if (inner.entries)
    return Object.entries(inner.entries).flatMap(([key, entry]) => schemaLeaves(entry, at(path, key)));
  if (isList(inner))
    return inner.items
      ? inner.items.flatMap((item, place) => schemaLeaves(item, at(path, place), mayLack))
      : schemaLeaves(inner.item!, at(path, '*'));
  if (inner.type === 'record') return [];
  const literal = inner.type === 'literal';
  return [{ path, note: noteOf(inner), literal, optional: mayLack, default: schema.default }];
}

/** Places of the schema where one of several shapes is chosen, with what is offered there. */
export function schemaChoices(
  schema = designSchema as unknown as AnySchema,
  path = '',
): { path: string; schema: AnySchema }[] {
  const inner = unwrapped(schema);
  const here = alternativesNoteOf(inner) ? [{ path, schema: inner }] : [];
  const entries = Object.entries(inner.entries ?? {});
  return [
    ...here,
    ...(isChoiceOfShapes(inner) ? inner.options! : []).flatMap((option) => schemaChoices(option, path)),
    ...entries.flatMap(([key, entry]) => schemaChoices(entry, at(path, key))),
    ...(isList(inner) && inner.item ? schemaChoices(inner.item, at(path, '*')) : []),
  ];
}

export const pattern = (path: string): string =>
  path.replace(/^(coolers|cavity\.elements|pump\.profileTable)\.\d+/, '$1.*');
