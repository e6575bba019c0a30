import { toJsonSchema } from '@valibot/to-json-schema';
import { describeRange, type FieldNote } from './quantity-field';
import { designSchema } from './schema';

interface Note {
  note?: FieldNote;
}

const noteIn = (value: unknown): FieldNote | undefined => (value as { metadata?: Note }).metadata?.note;

/**
 * JSON Schema (draft 2020-12) of the design file, made from the schema the program itself checks with.
 * Quantities appear as strings whose description states meaning, dimension and allowed range.
 */
export function designJsonSchema(): Record<string, unknown> {
  return toJsonSchema(designSchema, {
    typeMode: 'input',
    target: 'draft-2020-12',
    errorMode: 'ignore',
    overrideSchema: ({ valibotSchema, jsonSchema }) => {
      const steps = 'pipe' in valibotSchema ? (valibotSchema.pipe as readonly unknown[]) : [];
      const note = steps.map(noteIn).find((found) => found !== undefined);
      if (!note) return undefined;
      const allowed = note.dimension && note.range ? `Allowed: ${describeRange(note.range, note.dimension, note.unit)}.` : '';
      const words = note.words ? `Or ${Object.keys(note.words).map((word) => `"${word}"`).join(', ')}.` : '';
      const description = [note.hint, allowed, words].filter(Boolean).join(' ');
      const custom = (valibotSchema as { type: string }).type === 'custom';
      const isNumber = custom && note.dimension === 'dimensionless' && !('unit' in note) && jsonSchema.type === undefined && note.words === undefined;
      return {
        ...jsonSchema,
        ...(custom ? { type: isNumber ? ['number', 'string'] : 'string' } : {}),
        title: note.label,
        ...(description ? { description } : {}),
      };
    },
  }) as Record<string, unknown>;
}
