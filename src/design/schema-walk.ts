import type * as v from 'valibot';
import type { FieldNote } from './field-note';
import type { AlternativesNote } from './quantity-field';

/** A step of a schema that carries what a screen shows. */
export interface MetadataStep {
  type: string;
  metadata?: { note?: FieldNote; alternatives?: AlternativesNote };
}

/** The parts of a schema that walking it needs; a schema library does not type them for unknown schemas. */
export type AnySchema = v.GenericSchema & {
  wrapped?: AnySchema;
  default?: unknown;
  entries?: Record<string, AnySchema>;
  items?: AnySchema[];
  item?: AnySchema;
  options?: AnySchema[];
  literal?: unknown;
  pipe?: MetadataStep[];
};

const metadataOf = (schema: AnySchema) =>
  schema.pipe?.find((step) => step.type === 'metadata')?.metadata ?? {};

export const noteOf = (schema: AnySchema): FieldNote | undefined => metadataOf(schema).note;
export const alternativesNoteOf = (schema: AnySchema): AlternativesNote | undefined =>
  metadataOf(schema).alternatives;

/** Whether a value is a group as JSON writes it in { }, and no list or other object. */
export function isGroup(value: unknown): value is Record<string, unknown> {
  return Object.prototype.toString.call(value) === '[object Object]';
}

/** The value under a key of a group or list, and of nothing else: not of its prototype, not of a text. */
export function under(value: unknown, key: string | number): unknown {
  if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
  return (value as Record<string | number, unknown>)[key];
}

/** The schema inside "may be left out". */
export function unwrapped(schema: AnySchema): AnySchema {
  return schema.wrapped ? unwrapped(schema.wrapped) : schema;
}

/** Default of a field that may be left out; undefined where there is none. */
export const defaultOf = (schema: AnySchema): unknown =>
  schema.type === 'optional' ? schema.default : undefined;

export const isChoiceOfShapes = (schema: AnySchema): boolean =>
  schema.type === 'variant' || schema.type === 'union';

/** Whether a group has the kind of a shape of a variant; one whose kind may be left out has it when none is given. */
function isOfKind({ entries }: AnySchema, value: Record<string, unknown>): boolean {
  const kind = entries!.kind!;
  return unwrapped(kind).literal === (under(value, 'kind') ?? defaultOf(kind));
}

/**
 * Place of the shape a value has among the options of a union or variant: the same word, or a group of the same kind.
 * @returns -1 where the value has none of the shapes
 */
export function shapePlace(schema: AnySchema, value: unknown): number {
  return schema.options!.findIndex((option) => {
    if (!option.entries) return option.literal === value;
    if (!isGroup(value)) return false;
    return schema.type !== 'variant' || isOfKind(option, value);
  });
}

/**
 * The schema that says what a value may hold: under what may be left out (whose default stands for nothing given), and
 * of several shapes the one the value has.
 * @returns undefined where the value has none of the allowed shapes
 */
export function settled(schema: AnySchema, value: unknown): AnySchema | undefined {
  const inner = unwrapped(schema);
  if (!isChoiceOfShapes(inner)) return inner;
  const option = inner.options![shapePlace(inner, value ?? defaultOf(schema))];
  return option && settled(option, value);
}

/** Schema of the part of a list at one place: each its own, or one for all. */
export const itemAt = (schema: AnySchema, place: number): AnySchema | undefined =>
  schema.items ? schema.items[place] : schema.item;

export const isList = (schema: AnySchema): boolean =>
  schema.type === 'array' || schema.type === 'strict_tuple';
