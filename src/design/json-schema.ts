import { toJsonSchema, type JsonSchema } from '@valibot/to-json-schema';
import { describeRange, exampleOf, type FieldNote } from './field-note';
import { designSchema } from './schema';
import type { MetadataStep } from './schema-walk';

/** Meaning, allowed range, words and what holds where nothing is given, in a row. */
function descriptionOf(note: FieldNote): string {
  const { dimension, range, unit, words, empty } = note;
  const allowed = dimension && range ? `Allowed: ${describeRange(range, dimension, unit)}.` : '';
  const word = words
    ? `Or ${Object.keys(words)
        .map((item) => `"${item}"`)
        .join(', ')}.`
    : '';
  const left = empty ? `Left out: ${empty}.` : '';
  const sentences = [note.hint && `${note.hint}.`, allowed, word, left].filter(Boolean);
  return sentences.length > 0 ? sentences.join(' ') : `${note.label}.`;
}

/** Bounds of a plain number, as JSON Schema names them. */
function boundsOf({ range = {} }: FieldNote): Record<string, unknown> {
  const { above, from, to, below, whole } = range;
  return {
    type: whole ? 'integer' : 'number',
    ...(from === undefined ? {} : { minimum: from }),
    ...(above === undefined ? {} : { exclusiveMinimum: above }),
    ...(to === undefined ? {} : { maximum: to }),
    ...(below === undefined ? {} : { exclusiveMaximum: below }),
  };
}

function typeOf(note: FieldNote): Record<string, unknown> {
  if (!note.dimension) return {};
  const isNumber = note.dimension === 'dimensionless' && note.unit === undefined;
  if (isNumber) return { ...boundsOf(note), examples: [Number(exampleOf(note))] };
  return { type: 'string', examples: [exampleOf(note), ...Object.keys(note.words ?? {})] };
}

/** What the metadata of a field or choice of shapes says, as JSON Schema says it. */
function noted(action: unknown, jsonSchema: JsonSchema): JsonSchema | undefined {
  const { note, alternatives } = (action as Partial<MetadataStep>).metadata ?? {};
  const kept = Object.fromEntries(
    Object.entries(jsonSchema).filter(([key]) => key !== 'note' && key !== 'alternatives'),
  );
  if (alternatives)
    return { ...kept, title: alternatives.label, description: `${alternatives.hint ?? alternatives.label}.` };
  if (!note) return undefined;
  const examples = note.catalogue ? { examples: [...note.catalogue] } : {};
  return { ...kept, ...typeOf(note), ...examples, title: note.label, description: descriptionOf(note) };
}

/**
 * JSON Schema (draft 2020-12) of the design file, made from the schema the program itself checks with.
 * Quantities appear as strings whose description states meaning, dimension and allowed range; names of a catalogue as
 * examples, since other spellings of them are read too. What must fit together is beyond it.
 */
export function designJsonSchema(): Record<string, unknown> {
  const schema = toJsonSchema(designSchema, {
    typeMode: 'input',
    target: 'draft-2020-12',
    errorMode: 'ignore',
    overrideAction: ({ valibotAction, jsonSchema }) => noted(valibotAction, jsonSchema),
  });
  return {
    ...schema,
    title: 'Design file',
    description: 'Everything a person enters. A quantity is text with its unit, such as "150 um" or "12 W".',
  };
}
