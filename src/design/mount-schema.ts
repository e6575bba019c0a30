import * as v from 'valibot';
import { interfaces, mountMaterials } from '../materials';
import { length } from './field-kinds';
import { given } from './field-note';
import { catalogueName, choice, quantity, type AlternativesNote } from './quantity-field';

const ring = v.strictObject({
  kind: v.optional(v.literal('ring'), 'ring'),
  outerRadius: length('Outer radius', 0.1, 1000, 'Where the mount meets the base; not the diameter', {
    example: '12 mm',
  }),
});

const block = v.strictObject({
  kind: v.literal('block'),
  width: length('Block width', 0.2, 2000, 'Across the rod, which lies in the middle', { example: '30 mm' }),
  depth: length('Axis to base', 0.1, 1000, 'From the axis of the rod down to the face that is cooled', {
    example: '12 mm',
  }),
  cover: length('Axis to top', 0.1, 1000, 'From the axis of the rod up to the top, which is not cooled', {
    example: '12 mm',
  }),
});

const none = v.strictObject({ kind: v.literal('none') });

const shapeSchema = v.pipe(
  v.variant(
    'kind',
    [ring, block, none],
    (issue) => `unknown name|got ${given(issue.input)}; a mount's kind is "ring", "block" or "none"`,
  ),
  v.metadata({
    alternatives: {
      label: 'Mount shape',
      hint: 'A ring is cooled all around, a block on its base; none: what cools the barrel touches it directly',
      options: [
        { name: 'ring', value: { kind: 'ring', outerRadius: '12 mm' } },
        { name: 'block', value: { kind: 'block', width: '30 mm', depth: '12 mm', cover: '12 mm' } },
        { name: 'none', value: { kind: 'none' } },
      ],
    } satisfies AlternativesNote,
  }),
);

export const mountSchema = v.strictObject({
  material: catalogueName('Mount material', mountMaterials, 'From the catalogue'),
  shape: v.optional(shapeSchema, { kind: 'ring', outerRadius: '12 mm' }),
  interface: v.optional(
    v.strictObject({
      kind: catalogueName('Interface', interfaces, 'Between rod and mount, from the catalogue'),
      conductance: v.optional(
        quantity(
          'heatTransferCoefficient',
          'Contact conductance',
          { above: 0, to: 1e7 },
          {
            hint: 'Per area of the barrel, both contact faces together',
            empty: 'the value of the catalogue',
          },
        ),
      ),
    }),
    { kind: 'indium foil' },
  ),
  grip: v.optional(
    choice(
      'Grip on the barrel',
      ['free', 'clamped'],
      'Free: the barrel can widen; clamped: a rigid, slippery bore that fitted without force at ambient temperature',
    ),
    'free',
  ),
  clampingPressure: v.optional(
    quantity(
      'stress',
      'Clamping pressure',
      { from: 0, to: 1e9 },
      { hint: 'Even over a free barrel; without effect on a clamped one', unit: 'MPa', example: '5 MPa' },
    ),
    '0 MPa',
  ),
  baseResistance: v.optional(
    quantity(
      'thermalResistance',
      'Mount to base',
      { from: 0, to: 100 },
      { hint: 'Joint between the mount and the cooler' },
    ),
    '0 K/W',
  ),
});
