import * as v from 'valibot';
import { cavitySchema } from './cavity-schema';
import { coolerSchema } from './cooler-schema';
import { positiveShare } from './field-kinds';
import { given } from './field-note';
import { mountSchema } from './mount-schema';
import { pumpSchema, surroundingsSchema } from './pump-schema';
import { plainNumber, quantity, text } from './quantity-field';
import { rodSchema } from './rod-schema';

/**
 * The design file: everything a person enters. Quantities are text with a unit; the ranges are those outside which a
 * value is surely a slip, wider than good practice. Unknown keys are refused.
 */

const limitsSchema = v.strictObject({
  rodPeakTemperature: v.optional(
    quantity(
      'temperature',
      'Rod peak temperature',
      { from: 203.15, to: 1473.15 },
      { hint: 'Hottest place of the rod, lasing or blocked' },
    ),
    '100 degC',
  ),
  fractureSafetyFactor: v.optional(
    plainNumber(
      'Fracture safety factor',
      { from: 1, to: 100 },
      'Fracture strength over the greatest stress allowed',
    ),
    3,
  ),
  stabilityMargin: v.optional(
    plainNumber('Stability margin', { from: 0, below: 1 }, '1 - |m| that must remain; m is half the trace', {
      example: '0.02',
    }),
    0.02,
  ),
  absorptionShare: v.optional(
    quantity(
      'dimensionless',
      'Absorption share',
      { above: 0, below: 1 },
      { hint: 'Of the best absorption; bounds the diode case window', unit: '%', example: '90 %' },
    ),
    '90 %',
  ),
  dewPointGuard: v.optional(
    quantity(
      'temperatureDifference',
      'Dew point guard',
      { from: 0, to: 30 },
      { hint: 'By which cold parts stay above the dew point' },
    ),
    '3 K',
  ),
  tecCurrentShare: v.optional(
    positiveShare('TEC current share', 'Of the current of greatest temperature difference'),
    '70 %',
  ),
  aberrationLoss: v.optional(
    positiveShare('Aberration loss', 'Of one pass of the rod', { example: '3 %' }),
    '3 %',
  ),
});

export const designSchema = v.strictObject({
  format: v.literal('pump-ceiling/design'),
  version: v.literal(1),
  title: v.optional(text('Title', 200, { hint: 'Shown above the answer' }), 'Untitled design'),
  notes: v.optional(text('Notes', 10_000, { hint: 'For yourself; nothing is read from them' }), ''),
  surroundings: surroundingsSchema,
  pump: pumpSchema,
  rod: rodSchema,
  mount: mountSchema,
  coolers: v.pipe(
    v.array(coolerSchema, (issue) => `wrong type|got ${given(issue.input)}; a list of coolers is needed`),
    v.minLength(1, (issue) => `inconsistent|got ${given(issue.input)}; at least one cooler is needed`),
    v.maxLength(24, (issue) => `out of range|got ${given(issue.input)}; at most 24 coolers are allowed`),
  ),
  chosenCooler: v.optional(
    text('Chosen cooler', 40, { hint: 'Name of one of the coolers', empty: 'the first of the coolers' }),
  ),
  cavity: cavitySchema,
  limits: v.optional(limitsSchema, {}),
  uncertainty: v.optional(
    v.record(
      v.string(),
      text('Uncertainty', 60, {
        hint: 'Plus or minus: a share such as "5 %", or a quantity of the same kind',
      }),
    ),
    {},
  ),
});

/** A checked design, defaults filled in, quantities still as text. */
export type Design = v.InferOutput<typeof designSchema>;
/** A design as a person may write it. */
export type DesignInput = v.InferInput<typeof designSchema>;
export type CoolerDesign = Design['coolers'][number];
export type ElementDesign = Design['cavity']['elements'][number];
