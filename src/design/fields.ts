import * as v from 'valibot';
import { describeRange, type FieldNote } from './quantity-field';
import { designSchema, type Design } from './schema';

/** One thing a person can enter, as a screen or a table needs it. */
export interface Field {
  /** Dotted path into the design, list places as numbers: "cavity.elements.2.space". */
  path: string;
  kind: 'quantity' | 'number' | 'choice' | 'text';
  note: FieldNote;
  /** As it stands in the design; undefined where it is left to a catalogue or a rule. */
  value: string | number | undefined;
  optional: boolean;
  /** Allowed range in words, for a hint. */
  allowed?: string;
}

type AnySchema = v.GenericSchema & {
  wrapped?: AnySchema;
  entries?: Record<string, AnySchema>;
  items?: AnySchema[];
  item?: AnySchema;
  options?: AnySchema[];
  pipe?: { kind: string; type: string; metadata?: { note?: FieldNote } }[];
};

function noteOf(schema: AnySchema): FieldNote | undefined {
  return schema.pipe?.find((step) => step.type === 'metadata')?.metadata?.note;
}

/** The schema under wrappers, and for a variant or union the option that fits the value. */
function settle(schema: AnySchema, value: unknown): AnySchema {
  if (schema.wrapped) return settle(schema.wrapped, value);
  if (schema.type === 'variant' || schema.type === 'union') {
    const options = schema.options!;
    return settle(options.find((option) => v.is(option, value)) ?? nearestOption(options, value), value);
  }
  return schema;
}

function nearestOption(options: AnySchema[], value: unknown): AnySchema {
  const kind = (value as { kind?: unknown } | null)?.kind;
  const sameKind = options.find(
    (option) => option.entries?.kind && v.is(option.entries.kind, kind) && kind !== undefined,
  );
  if (sameKind) return sameKind;
  return options.find((option) => (typeof value === 'object') === (option.entries !== undefined)) ?? options[0]!;
}

const kindOf = (note: FieldNote, value: unknown, schema: AnySchema): Field['kind'] => {
  if (note.choices) return 'choice';
  if (schema.type === 'custom' && note.dimension && !note.words && typeof value === 'number') return 'number';
  if (note.dimension === 'dimensionless' && note.range && typeof value === 'number') return 'number';
  return note.dimension ? 'quantity' : 'text';
};

function walk(schema: AnySchema, value: unknown, path: string, optional: boolean, out: Field[]): void {
  const isOptional = optional || schema.type === 'optional';
  const inner = settle(schema, value);
  const note = noteOf(inner);
  if (inner.entries) {
    for (const [key, entry] of Object.entries(inner.entries)) {
      const below = (value as Record<string, unknown> | undefined)?.[key];
      const alternative = path.startsWith('cavity.elements.') && path.split('.').length === 3;
      if (alternative && below === undefined) continue;
      walk(entry, below, path ? `${path}.${key}` : key, false, out);
    }
    return;
  }
  if (inner.type === 'array') {
    (value as unknown[] | undefined)?.forEach((item, place) =>
      walk(inner.item!, item, `${path}.${place}`, false, out),
    );
    return;
  }
  if (inner.items) {
    inner.items.forEach((item, place) =>
      walk(item, (value as unknown[] | undefined)?.[place], `${path}.${place}`, isOptional, out),
    );
    return;
  }
  if (!note || inner.type === 'literal') return;
  if (value !== undefined && typeof value !== 'string' && typeof value !== 'number') return;
  out.push({
    path,
    kind: kindOf(note, value, inner),
    note,
    value,
    optional: isOptional,
    allowed: note.dimension && note.range ? describeRange(note.range, note.dimension, note.unit) : undefined,
  });
}

/**
 * Every field of a design in the order of the file, with label, hint and allowed range.
 * @param design a checked design, or one still being typed
 */
export function fieldsOf(design: Design): Field[] {
  const out: Field[] = [];
  walk(designSchema as unknown as AnySchema, design, '', false, out);
  return out;
}

/** Value at a dotted path of a design, or undefined. */
export function valueAt(design: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((at, key) => (at as Record<string, unknown> | undefined)?.[key], design);
}

/** A copy of a design with one value replaced (or removed, where `value` is undefined); the original is kept. */
export function withValue<T>(design: T, path: string, value: unknown): T {
  const keys = path.split('.');
  const place = (at: unknown, depth: number): unknown => {
    const key = keys[depth]!;
    const copy: Record<string, unknown> | unknown[] = Array.isArray(at)
      ? [...(at as unknown[])]
      : { ...(at as Record<string, unknown> | undefined) };
    const slot = copy as Record<string, unknown>;
    if (depth < keys.length - 1) slot[key] = place(slot[key], depth + 1);
    else if (value === undefined && !Array.isArray(copy)) Reflect.deleteProperty(slot, key);
    else slot[key] = value;
    return copy;
  };
  return place(design, 0) as T;
}
