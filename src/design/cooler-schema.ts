import * as v from 'valibot';
import { coolants, findCoolant, mountMaterials, type Coolant } from '../materials';
import { length, temperature } from './field-kinds';
import { given } from './field-note';
import { catalogueName, choice, plainNumber, quantity, text, type AlternativesNote } from './quantity-field';

/** Coolants a liquid loop may hold; the catalogue's air is for fins. */
export const liquids = coolants.filter((coolant) => coolant.id !== 'air');

const longestId = 40;

const coolerId = v.pipe(
  v.string((issue) => `wrong type|got ${given(issue.input)}; a short name is needed, such as "fan"`),
  v.regex(
    /^[\p{L}\p{N}_ .+-]{1,40}$/u,
    (issue) =>
      `wrong type|got ${given(issue.input)}; a name has 1 to ${longestId} letters, digits, dashes or spaces`,
  ),
  v.metadata({ note: { label: 'Name', hint: 'By which the chosen cooler and hot sides refer to it' } }),
);

const sink = v.strictObject({
  width: length('Sink width', 5, 2000, 'Across the fins', { example: '80 mm' }),
  height: length('Sink height', 5, 2000, 'Along the fins, the way the air goes', { example: '80 mm' }),
  finHeight: length('Fin height', 1, 500, 'From the base plate to the tip', { example: '25 mm' }),
  finCount: plainNumber('Fins', { from: 2, to: 500, whole: true }, 'On the whole width', { example: '20' }),
  finThickness: length('Fin thickness', 0.05, 50, 'Of one fin', { example: '1 mm' }),
  material: v.optional(
    catalogueName('Sink material', mountMaterials, 'From the catalogue'),
    'aluminium 6061',
  ),
  emissivity: v.optional(plainNumber('Emissivity', { from: 0, to: 1 }, 'Black anodised about 0.85'), 0.85),
  orientation: v.optional(
    choice('Orientation', ['vertical', 'horizontal'], 'Of the fin channels; air rises in vertical ones'),
    'vertical',
  ),
});

const chiller = v.strictObject({
  kind: v.literal('chiller'),
  setPoint: temperature('Chiller set point', 'Of the coolant it sends out'),
  capacity: quantity(
    'power',
    'Chiller capacity',
    { above: 0, to: 1e5 },
    { hint: 'Heat it can take at the set point' },
  ),
});

const airExchanger = v.strictObject({
  kind: v.literal('air'),
  resistance: quantity(
    'thermalResistance',
    'Coolant to air',
    { above: 0, to: 100 },
    { hint: 'Of the heat exchanger; it cannot go below ambient' },
  ),
});

const supplySchema = v.pipe(
  v.variant(
    'kind',
    [chiller, airExchanger],
    (issue) => `unknown name|got ${given(issue.input)}; a supply's kind is "chiller" or "air"`,
  ),
  v.metadata({
    alternatives: {
      label: 'Coolant supply',
      hint: 'A chiller holds a set point; an exchanger to air follows the room',
      options: [
        { name: 'chiller', value: { kind: 'chiller', setPoint: '20 degC', capacity: '300 W' } },
        { name: 'heat exchanger to air', value: { kind: 'air', resistance: '0.02 K/W' } },
      ],
    } satisfies AlternativesNote,
  }),
);

const passive = v.strictObject({ id: coolerId, kind: v.literal('passive'), sink });

const fan = v.strictObject({
  id: coolerId,
  kind: v.literal('fan'),
  sink,
  fan: v.strictObject({
    freeFlow: quantity(
      'volumeFlow',
      'Fan free flow',
      { above: 0, to: 10 },
      { hint: 'Against no pressure', unit: 'm^3/h', example: '60 m^3/h' },
    ),
    shutOffPressure: quantity(
      'pressure',
      'Fan shut-off pressure',
      { above: 0, to: 1e5 },
      { hint: 'At no flow', unit: 'Pa', example: '45 Pa' },
    ),
    power: quantity('power', 'Fan power', { from: 0, to: 1e4 }, { hint: 'Electrical' }),
  }),
});

const liquid = v.strictObject({
  id: coolerId,
  kind: v.literal('liquid'),
  coolant: v.optional(catalogueName('Coolant', liquids, 'From the catalogue'), 'water'),
  channel: v.strictObject({
    diameter: length('Channel diameter', 0.1, 100, 'Inside; not the radius', { example: '4 mm' }),
    length: length('Channel length', 1, 1e5, 'Of one channel', { example: '160 mm' }),
    parallel: v.optional(
      plainNumber('Parallel channels', { from: 1, to: 1000, whole: true }, 'That share the flow'),
      1,
    ),
  }),
  flow: quantity('volumeFlow', 'Flow', { above: 0, to: 0.1 }, { hint: 'Through all channels together' }),
  supply: supplySchema,
});

const tec = v.strictObject({
  id: coolerId,
  kind: v.literal('tec'),
  module: v.strictObject({
    couples: plainNumber('Couples', { from: 1, to: 2000, whole: true }, 'Pairs of legs of one module', {
      example: '127',
    }),
    legSide: length('Leg side', 0.05, 20, 'Of the square section of a leg', { example: '1.4 mm' }),
    legHeight: length('Leg height', 0.05, 20, 'Along the heat flow', { example: '1.6 mm' }),
    count: v.optional(plainNumber('Modules', { from: 1, to: 100, whole: true }, 'Side by side'), 1),
  }),
  setTemperature: temperature('Set temperature', 'Of the base'),
  highestCurrent: quantity(
    'current',
    'Highest current',
    { above: 0, to: 200 },
    { hint: 'Through each module' },
  ),
  hotSide: text('Hot side', longestId, { hint: 'Name of the cooler that takes the hot side' }),
});

const resistance = v.strictObject({
  id: coolerId,
  kind: v.literal('resistance'),
  resistance: quantity(
    'thermalResistance',
    'Sink to air',
    { above: 0, to: 1000 },
    { hint: 'From base to ambient' },
  ),
});

export const coolerSchema = v.variant(
  'kind',
  [passive, fan, liquid, tec, resistance],
  (issue) =>
    `unknown name|got ${given(issue.input)}; a cooler's kind is "passive", "fan", "liquid", "tec" or "resistance"`,
);

/** The liquid of this name; undefined where the catalogue has none. */
export function findLiquid(name: string): Coolant | undefined {
  const found = findCoolant(name);
  return found && liquids.includes(found) ? found : undefined;
}
