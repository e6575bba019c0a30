import * as v from 'valibot';
import { length, share, temperature, wavelength } from './field-kinds';
import { given } from './field-note';
import { choice, plainNumber, quantity } from './quantity-field';

export const surroundingsSchema = v.strictObject({
  ambient: temperature('Ambient temperature now', 'Air that finally takes the heat'),
  coldestAmbient: v.optional(
    temperature('Coldest ambient', 'The cold end of the room or season', { empty: '7 K below ambient' }),
  ),
  hottestAmbient: v.optional(
    temperature('Hottest ambient', 'The hot end of the room or season', { empty: '8 K above ambient' }),
  ),
  relativeHumidity: v.optional(share('Relative humidity', 'At the ambient temperature'), '50 %'),
  airPressure: v.optional(
    quantity(
      'pressure',
      'Air pressure',
      { from: 3e4, to: 1.2e5 },
      { hint: 'At the place, not at sea level' },
    ),
    '101.3 kPa',
  ),
});

const diodeSchema = v.strictObject({
  wallPlugEfficiency: v.optional(
    quantity(
      'dimensionless',
      'Wall-plug efficiency',
      { from: 0.01, to: 0.9 },
      { hint: 'Light out over electrical power in', unit: '%', example: '48 %' },
    ),
    '48 %',
  ),
  circuit: v.optional(
    choice(
      'Diode cooling circuit',
      ['shared', 'separate'],
      'Shared: the diode sits on the same base as the rod',
    ),
    'shared',
  ),
  caseToBase: v.optional(
    quantity('thermalResistance', 'Case to base', { from: 0, to: 100 }, { hint: 'Per watt of diode heat' }),
    '0.35 K/W',
  ),
  caseTemperature: v.optional(
    quantity(
      'temperature',
      'Case temperature',
      { from: 203.15, to: 423.15 },
      { words: { 'follows the base': Number.NaN }, hint: 'A held temperature, or "follows the base"' },
    ),
    'follows the base',
  ),
  highestCaseTemperature: v.optional(
    temperature('Highest case temperature', 'From the diode data sheet'),
    '50 degC',
  ),
});

const power = (label: string, above: boolean, hint?: string) =>
  quantity('power', label, above ? { above: 0, to: 10_000 } : { from: 0, to: 10_000 }, { hint });

const lightSchema = {
  wavelength: wavelength('Wavelength', 'Vacuum, at the reference case temperature'),
  wavelengthAtCase: v.optional(
    temperature('Reference case temperature', 'At which the diode has the stated wavelength'),
    '25 degC',
  ),
  wavelengthDrift: v.optional(
    quantity(
      'wavelengthDrift',
      'Wavelength drift',
      { from: -2e-9, to: 2e-9 },
      { hint: 'Per kelvin of the diode case' },
    ),
    '0.28 nm/K',
  ),
  linewidth: v.optional(
    quantity(
      'length',
      'Linewidth',
      { from: 0, to: 50e-9 },
      { hint: 'Full width at half maximum', unit: 'nm', example: '3 nm' },
    ),
    '3 nm',
  ),
  polarisation: v.optional(
    choice(
      'Polarisation',
      ['unpolarised', 'pi', 'sigma'],
      'pi: field along the optic axis of the crystal; sigma: across it',
    ),
    'unpolarised',
  ),
};

const notATable = (got: unknown) =>
  `wrong type|got ${given(got)}; a list of pairs is needed, such as [["0 um", 1], ["50 um", 0.9]]`;
const fewestPoints = 3;
const mostPoints = 2000;

/** A measured radial profile: pairs of radius and intensity. */
const profileTable = v.pipe(
  v.array(
    v.strictTuple(
      [
        length('Radius of a point', 0, 50, 'From the axis of the beam; rising from 0', {
          unit: 'um',
          example: '50 um',
        }),
        plainNumber(
          'Intensity at that radius',
          { from: 0, to: 1e12 },
          'In any unit; straight between points, none beyond the last',
        ),
      ],
      (issue) => notATable(issue.input),
    ),
    (issue) => notATable(issue.input),
  ),
  v.minLength(
    fewestPoints,
    (issue) => `inconsistent|got ${given(issue.input)}; at least ${fewestPoints} points are needed`,
  ),
  v.maxLength(
    mostPoints,
    (issue) => `out of range|got ${given(issue.input)}; at most ${mostPoints} points are allowed`,
  ),
);

const beamSchema = {
  radius: quantity(
    'length',
    'Pump radius',
    { above: 0, to: 5e-3 },
    {
      unit: 'um',
      example: '200 um',
      hint: 'Gaussian: 1/e² radius of intensity; flat-top: radius of the edge; table: holds 86.5 % of the power. Not the diameter',
    },
  ),
  profile: v.optional(
    choice('Profile', ['gaussian', 'flat-top', 'super-gaussian', 'table'], 'Of intensity across the beam'),
    'gaussian',
  ),
  profileTable: v.optional(profileTable),
  profileOrder: v.optional(
    plainNumber('Super-Gaussian order', { from: 1, to: 40 }, 'p of exp(-2 (r/w)^2p); 1 is the Gaussian'),
    3,
  ),
  beamQuality: v.optional(
    plainNumber('Beam quality M²', { from: 1, to: 2000 }, 'How fast the pump spreads away from its waist', {
      empty: 'the beam is taken as collimated inside the rod',
    }),
  ),
  waistPosition: v.optional(
    length('Waist position', -100, 500, 'From the face the light enters by; positive lies inside the rod'),
    '0 mm',
  ),
};

export const pumpSchema = v.strictObject({
  power: power('Pump power', false, 'Light from the diode, before the entrance face'),
  powerRange: v.optional(
    v.strictTuple(
      [
        power('Pump power from', false, 'Where the range shown begins; ceilings are searched from zero'),
        power('Pump power to', true, 'How far ceilings are searched'),
      ],
      (issue) => `wrong type|got ${given(issue.input)}; a pair of powers is needed, such as ["0 W", "30 W"]`,
    ),
  ),
  ...lightSchema,
  ...beamSchema,
  passes: v.optional(
    plainNumber('Passes', { from: 1, to: 2, whole: true }, '2: a mirror behind the rod sends the pump back'),
    1,
  ),
  returnReflectivity: v.optional(
    share('Return reflectivity', 'Of the mirror that sends the pump back'),
    '95 %',
  ),
  backShare: v.optional(
    share('Share from the back', 'Of the light, that enters at the far face: 50 % pumps both ends alike', {
      example: '50 %',
    }),
    '0 %',
  ),
  entranceTransmission: v.optional(
    share('Entrance transmission', 'Of coupling optics and entrance face together'),
    '99 %',
  ),
  diode: v.optional(diodeSchema, {}),
});
