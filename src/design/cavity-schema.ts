import * as v from 'valibot';
import { length, share } from './field-kinds';
import { given } from './field-note';
import { choice, plainNumber, quantity } from './quantity-field';

/** Beyond 85 degrees of incidence a mirror or plate is surely a slip. */
const steepest = (85 * Math.PI) / 180;

const mirror = v.strictObject({
  radius: quantity(
    'length',
    'Mirror radius',
    { from: -100, to: 100 },
    {
      words: { flat: Number.POSITIVE_INFINITY },
      hint: 'Of curvature; positive is concave towards the light; or "flat"',
      unit: 'm',
      example: '200 mm',
    },
  ),
  transmission: v.optional(share('Transmission', 'Of power at the laser line', { example: '5 %' }), '0.1 %'),
  incidence: v.optional(
    quantity(
      'angle',
      'Angle of incidence',
      { from: 0, to: steepest },
      { hint: 'From the normal; half the fold angle' },
    ),
    '0 deg',
  ),
});

const plate = v.strictObject({
  thickness: length('Plate thickness', 0.01, 500, 'Along its normal'),
  index: plainNumber('Plate index', { from: 1, to: 4 }, 'At the laser line', { example: '1.45' }),
  incidence: v.optional(
    quantity(
      'angle',
      'Plate angle',
      { from: 0, to: steepest },
      { words: { brewster: Number.NaN }, hint: 'Of incidence from the normal, or "Brewster"' },
    ),
    '0 deg',
  ),
});

const elementSchema = v.strictObject({
  mirror: v.optional(mirror),
  rod: v.optional(v.literal(true, (issue) => `wrong type|got ${given(issue.input)}; only true is allowed`)),
  space: v.optional(length('Space', 0, 1e5, 'Geometric length, in air', { example: '60 mm' })),
  lens: v.optional(
    quantity(
      'length',
      'Focal length',
      { from: -1000, to: 1000 },
      { hint: 'Thin lens; positive converges', unit: 'm', example: '200 mm' },
    ),
  ),
  plate: v.optional(plate),
});

export const cavitySchema = v.strictObject({
  kind: v.optional(
    choice(
      'Cavity',
      ['linear', 'ring'],
      'Linear: from end mirror to end mirror, folded at will; ring: once around',
    ),
    'linear',
  ),
  passiveLoss: v.optional(
    share('Passive loss', 'Of a round trip, without the mirrors', { example: '1 %' }),
    '1 %',
  ),
  lensRadius: v.optional(
    quantity(
      'length',
      'Lens seen over',
      { above: 0, to: 10e-3 },
      {
        words: { 'pump radius': Number.NaN },
        hint: '1/e² radius of the mode that weighs the lens, or "pump radius"',
        unit: 'um',
        example: '200 um',
      },
    ),
    'pump radius',
  ),
  elements: v.pipe(
    v.array(
      elementSchema,
      (issue) =>
        `wrong type|got ${given(issue.input)}; a list of elements is needed: mirrors, spaces, the rod`,
    ),
    v.minLength(
      3,
      (issue) => `inconsistent|got ${given(issue.input)}; at least two mirrors and the rod are needed`,
    ),
    v.maxLength(200, (issue) => `out of range|got ${given(issue.input)}; at most 200 elements are allowed`),
  ),
});
