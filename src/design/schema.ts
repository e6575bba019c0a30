import * as v from 'valibot';
import { choice, plainNumber, quantity, text } from './quantity-field';

/**
 * The design file: everything a person enters. Quantities are text with a unit; the ranges here are those outside
 * which a value is surely a slip, wider than good practice. Unknown keys are refused.
 */

const mm = 1e-3;
const um = 1e-6;
const length = (label: string, from: number, to: number, hint?: string) =>
  quantity('length', label, { from: from * mm, to: to * mm }, { hint });
const share = (label: string, hint?: string, to = 1) => quantity('dimensionless', label, { from: 0, to }, { hint });
const temperature = (label: string, hint?: string) =>
  quantity('temperature', label, { from: 203.15, to: 473.15 }, { hint });

export const surroundingsSchema = v.strictObject({
  ambient: temperature('Ambient temperature now', 'Air that finally takes the heat'),
  coldestAmbient: v.optional(temperature('Coldest ambient', 'Empty: 7 K below ambient')),
  hottestAmbient: v.optional(temperature('Hottest ambient', 'Empty: 8 K above ambient')),
  relativeHumidity: v.optional(share('Relative humidity', 'At the ambient temperature'), '50 %'),
  airPressure: v.optional(quantity('pressure', 'Air pressure', { from: 3e4, to: 1.2e5 }), '101.3 kPa'),
});

const wavelength = (label: string, hint?: string) =>
  quantity('length', label, { from: 0.2 * um, to: 5 * um }, { hint, unit: 'nm' });

export const diodeSchema = v.strictObject({
  wallPlugEfficiency: v.optional(
    quantity('dimensionless', 'Wall-plug efficiency', { from: 0.01, to: 0.9 }, { hint: 'Light out over electrical power in' }),
    '48 %',
  ),
  circuit: v.optional(
    choice('Diode cooling circuit', ['shared', 'separate'], 'Shared: the diode sits on the same base as the rod'),
    'shared',
  ),
  caseToBase: v.optional(quantity('thermalResistance', 'Case to base', { from: 0, to: 100 }), '0.35 K/W'),
  caseTemperature: v.optional(
    quantity('temperature', 'Case temperature', { from: 203.15, to: 423.15 }, {
      words: { 'follows the base': Number.NaN },
      hint: 'A held temperature, or "follows the base"',
    }),
    'follows the base',
  ),
  highestCaseTemperature: v.optional(temperature('Highest case temperature'), '50 degC'),
});

export const pumpSchema = v.strictObject({
  power: quantity('power', 'Pump power', { from: 0, to: 10_000 }, { hint: 'Light from the diode, before the entrance face' }),
  powerRange: v.optional(
    v.strictTuple([
      quantity('power', 'Pump power from', { from: 0, to: 10_000 }),
      quantity('power', 'Pump power to', { above: 0, to: 10_000 }),
    ], 'wrong type|a pair of powers is needed, such as ["0 W", "30 W"]'),
  ),
  wavelength: wavelength('Wavelength', 'Vacuum, at the reference case temperature'),
  wavelengthAtCase: v.optional(temperature('Reference case temperature'), '25 degC'),
  wavelengthDrift: v.optional(
    quantity('wavelengthDrift', 'Wavelength drift', { from: -2e-9, to: 2e-9 }, { hint: 'Per kelvin of the diode case' }),
    '0.28 nm/K',
  ),
  linewidth: v.optional(
    quantity('length', 'Linewidth', { from: 0, to: 5e-8 }, { hint: 'Full width at half maximum', unit: 'nm' }),
    '3 nm',
  ),
  radius: quantity('length', 'Pump radius', { above: 0, to: 5 * mm }, {
    unit: 'um',
    hint: 'Gaussian: 1/e² radius of intensity; flat-top: radius of the edge. Not the diameter',
  }),
  profile: v.optional(choice('Profile', ['gaussian', 'flat-top', 'super-gaussian']), 'gaussian'),
  profileOrder: v.optional(plainNumber('Super-Gaussian order', { from: 1, to: 40 }, 'p of exp(-2 (r/w)^2p); 1 is the Gaussian'), 3),
  beamQuality: v.optional(
    plainNumber('Beam quality M²', { from: 1, to: 2000 }, 'Leave empty for a beam taken as collimated inside the rod'),
  ),
  waistPosition: v.optional(length('Waist position', -100, 500, 'From the pumped face into the rod'), '0 mm'),
  polarisation: v.optional(
    choice('Polarisation', ['unpolarised', 'pi', 'sigma'], 'Against the optical axis of a uniaxial crystal'),
    'unpolarised',
  ),
  passes: v.optional(plainNumber('Passes', { from: 1, to: 2, whole: true }), 1),
  returnReflectivity: v.optional(share('Return reflectivity', 'Of the mirror that sends the pump back'), '95 %'),
  entranceTransmission: v.optional(share('Entrance transmission', 'Coupling optics and entrance face'), '99 %'),
  diode: v.optional(diodeSchema, {}),
});

const rodValues = v.strictObject({
  thermalConductivityRadial: v.optional(quantity('thermalConductivity', 'Conductivity across the axis', { above: 0, to: 5000 })),
  thermalConductivityAxial: v.optional(quantity('thermalConductivity', 'Conductivity along the axis', { above: 0, to: 5000 })),
  thermoOptic: v.optional(quantity('expansion', 'dn/dT', { from: -1e-3, to: 1e-3 })),
  expansion: v.optional(quantity('expansion', 'Expansion along the axis', { from: -1e-4, to: 1e-4 })),
  refractiveIndex: v.optional(plainNumber('Refractive index', { from: 1, to: 4 })),
  youngModulus: v.optional(quantity('pressure', "Young's modulus", { above: 1e6, to: 2e12 })),
  poissonRatio: v.optional(plainNumber("Poisson's ratio", { from: 0, below: 0.5 })),
  fractureStrength: v.optional(quantity('pressure', 'Fracture strength', { above: 1e5, to: 2e10 })),
  emissionCrossSection: v.optional(quantity('area', 'Emission cross-section', { above: 0, to: 1e-20 })),
  lifetime: v.optional(quantity('time', 'Fluorescence lifetime', { above: 1e-9, to: 1 })),
  radiativeEfficiency: v.optional(share('Radiative efficiency')),
  fluorescenceWavelength: v.optional(wavelength('Mean fluorescence wavelength')),
});

export const rodSchema = v.strictObject({
  crystal: text('Crystal', 'Host and dopant, from the catalogue', 100),
  dopantConcentration: v.optional(
    quantity('dimensionless', 'Dopant concentration', { above: 0, to: 0.5 }, { hint: 'Share of the sites, atomic per cent' }),
  ),
  cut: v.optional(choice('Cut', ['a', 'c'], 'Crystal axis along the rod; no matter for isotropic crystals'), 'a'),
  section: v.strictObject({
    shape: choice('Section', ['round', 'square']),
    diameter: v.optional(length('Diameter', 0.05, 100)),
    side: v.optional(length('Side', 0.05, 100)),
  }),
  length: length('Doped length', 0.01, 500, 'Without the undoped end caps'),
  endCaps: v.optional(
    v.strictObject({
      front: v.optional(length('Front end cap', 0, 100), '0 mm'),
      back: v.optional(length('Back end cap', 0, 100), '0 mm'),
    }),
    {},
  ),
  laserLine: wavelength('Laser line', 'Nearest line of the crystal is taken'),
  absorption: v.optional(
    v.union(
      [
        v.strictObject({
          coefficient: quantity('inverseLength', 'Absorption coefficient', { above: 0, to: 1e6 }, {
            hint: 'As measured with this pump, intensity',
          }),
          drift: v.optional(
            choice('Drift with the diode', ['ignored', 'follows the line'], 'Whether the coefficient follows the crystal line as the diode warms'),
            'ignored',
          ),
        }),
        v.pipe(v.literal('from crystal'), v.metadata({ note: { label: 'Absorption' } })),
      ],
      'wrong type|"from crystal" or { "coefficient": "4.5 cm^-1" } is needed',
    ),
    'from crystal',
  ),
  heatFraction: v.optional(
    v.union(
      [
        v.picklist(['from laser', 'quantum defect']),
        v.strictObject({
          lasing: quantity('dimensionless', 'Heat fraction, lasing', { above: 0, to: 1 }, { hint: 'Heat over absorbed pump power' }),
          blocked: v.optional(quantity('dimensionless', 'Heat fraction, beam blocked', { above: 0, to: 1 })),
        }),
      ],
      'wrong type|"from laser", "quantum defect" or { "lasing": "27 %", "blocked": "38 %" } is needed',
    ),
    'from laser',
  ),
  faceFilm: v.optional(
    quantity('heatTransferCoefficient', 'Film on the end faces', { from: 0, to: 1e5 }, {
      hint: 'Convection and radiation to the air; 0 is insulated',
    }),
    '10 W/(m^2 K)',
  ),
  values: v.optional(rodValues, {}),
});

export const mountSchema = v.strictObject({
  material: text('Mount material', 'From the catalogue', 100),
  shape: v.optional(
    v.strictObject({
      kind: v.optional(choice('Mount shape', ['ring']), 'ring'),
      outerRadius: length('Outer radius', 0.1, 1000, 'Where the mount meets the base'),
    }),
    { kind: 'ring' as const, outerRadius: '12 mm' },
  ),
  interface: v.optional(
    v.strictObject({
      kind: text('Interface', 'Between rod and mount, from the catalogue', 100),
      conductance: v.optional(
        quantity('heatTransferCoefficient', 'Contact conductance', { above: 0, to: 1e7 }, { hint: 'Empty: the catalogue value' }),
      ),
    }),
    { kind: 'indium foil' },
  ),
  baseResistance: v.optional(
    quantity('thermalResistance', 'Mount to base', { from: 0, to: 100 }, { hint: 'Joint between the mount and the cooler' }),
    '0 K/W',
  ),
});

const coolerId = v.pipe(
  v.string((issue) => `wrong type|got ${JSON.stringify(issue.input)}; a short name is needed, such as "fan"`),
  v.regex(/^[\w .+-]{1,40}$/, 'wrong type|a name of 1 to 40 letters, digits, dashes or spaces is needed'),
  v.metadata({ note: { label: 'Name' } }),
);

const sink = v.strictObject({
  width: length('Sink width', 5, 2000, 'Across the fins'),
  height: length('Sink height', 5, 2000, 'Along the fins, the way the air goes'),
  finHeight: length('Fin height', 1, 500),
  finCount: plainNumber('Fins', { from: 2, to: 500, whole: true }),
  finThickness: length('Fin thickness', 0.05, 50),
  material: v.optional(text('Sink material', 'From the catalogue', 100), 'aluminium 6061'),
  emissivity: v.optional(plainNumber('Emissivity', { from: 0, to: 1 }, 'Black anodised about 0.85'), 0.85),
  orientation: v.optional(choice('Orientation', ['vertical', 'horizontal'], 'Of the fin channels'), 'vertical'),
});

const chillerOrAir = v.variant('kind', [
  v.strictObject({
    kind: v.literal('chiller'),
    setPoint: temperature('Chiller set point'),
    capacity: quantity('power', 'Chiller capacity', { above: 0, to: 1e5 }),
  }),
  v.strictObject({
    kind: v.literal('air'),
    resistance: quantity('thermalResistance', 'Coolant to air', { above: 0, to: 100 }, { hint: 'Heat exchanger; cannot go below ambient' }),
  }),
], 'unknown name|"chiller" or "air" is needed');

export const coolerSchema = v.variant(
  'kind',
  [
    v.strictObject({ id: coolerId, kind: v.literal('passive'), sink }),
    v.strictObject({
      id: coolerId,
      kind: v.literal('fan'),
      sink,
      fan: v.strictObject({
        freeFlow: quantity('volumeFlow', 'Fan free flow', { above: 0, to: 10 }, { hint: 'Against no pressure' }),
        shutOffPressure: quantity('pressure', 'Fan shut-off pressure', { above: 0, to: 1e5 }, { hint: 'At no flow' }),
        power: quantity('power', 'Fan power', { from: 0, to: 1e4 }),
      }),
    }),
    v.strictObject({
      id: coolerId,
      kind: v.literal('liquid'),
      coolant: v.optional(text('Coolant', 'From the catalogue', 100), 'water'),
      channel: v.strictObject({
        diameter: length('Channel diameter', 0.1, 100),
        length: length('Channel length', 1, 1e5),
        parallel: v.optional(plainNumber('Parallel channels', { from: 1, to: 1000, whole: true }), 1),
      }),
      flow: quantity('volumeFlow', 'Flow', { above: 0, to: 0.1 }, { hint: 'Through all channels together' }),
      supply: chillerOrAir,
    }),
    v.strictObject({
      id: coolerId,
      kind: v.literal('tec'),
      module: v.strictObject({
        couples: plainNumber('Couples', { from: 1, to: 2000, whole: true }),
        legSide: length('Leg side', 0.05, 20),
        legHeight: length('Leg height', 0.05, 20),
        count: v.optional(plainNumber('Modules', { from: 1, to: 100, whole: true }, 'Side by side'), 1),
      }),
      setTemperature: temperature('Set temperature', 'Of the base'),
      highestCurrent: quantity('current', 'Highest current', { above: 0, to: 200 }, { hint: 'Through each module' }),
      hotSide: text('Hot side', 'Name of the cooler that takes the hot side', 40),
    }),
    v.strictObject({
      id: coolerId,
      kind: v.literal('resistance'),
      resistance: quantity('thermalResistance', 'Sink to air', { above: 0, to: 1000 }),
    }),
  ],
  (issue) => `unknown name|got ${issue.received}; a cooler's kind is "passive", "fan", "liquid", "tec" or "resistance"`,
);

export const elementSchema = v.strictObject({
  mirror: v.optional(
    v.strictObject({
      radius: quantity('length', 'Mirror radius', { from: -100, to: 100 }, {
        words: { flat: Number.POSITIVE_INFINITY },
        hint: 'Of curvature; positive is concave towards the light; or "flat"',
      }),
      transmission: v.optional(share('Transmission'), '0.1 %'),
      incidence: v.optional(quantity('angle', 'Angle of incidence', { from: 0, to: 1.5 }), '0 deg'),
    }),
  ),
  rod: v.optional(v.pipe(v.literal(true, 'wrong type|only true is allowed'), v.metadata({ note: { label: 'Rod' } }))),
  space: v.optional(length('Space', 0, 1e5, 'Geometric length, in air')),
  lens: v.optional(
    quantity('length', 'Focal length', { from: -1000, to: 1000 }, { hint: 'Thin lens; positive converges' }),
  ),
  plate: v.optional(
    v.strictObject({
      thickness: length('Plate thickness', 0.01, 500),
      index: plainNumber('Plate index', { from: 1, to: 4 }),
      incidence: v.optional(
        quantity('angle', 'Plate angle', { from: 0, to: 1.5 }, { words: { brewster: Number.NaN }, hint: 'Of incidence, or "Brewster"' }),
        '0 deg',
      ),
    }),
  ),
});

export const cavitySchema = v.strictObject({
  kind: v.optional(choice('Cavity', ['linear', 'ring']), 'linear'),
  passiveLoss: v.optional(share('Passive loss', 'Round trip, without the mirrors'), '1 %'),
  lensRadius: v.optional(
    quantity('length', 'Lens seen over', { above: 0, to: 10 * mm }, {
      words: { 'pump radius': Number.NaN },
      hint: '1/e² radius of the mode that weighs the lens, or "pump radius"',
    }),
    'pump radius',
  ),
  elements: v.pipe(
    v.array(elementSchema, 'wrong type|a list of elements is needed: mirrors, spaces, the rod'),
    v.minLength(3, 'inconsistent|at least two mirrors and the rod are needed'),
    v.maxLength(200, 'out of range|at most 200 elements are allowed'),
  ),
});

export const limitsSchema = v.strictObject({
  rodPeakTemperature: v.optional(
    quantity('temperature', 'Rod peak temperature', { from: 203.15, to: 1500 }), '100 degC'),
  fractureSafetyFactor: v.optional(plainNumber('Fracture safety factor', { from: 1, to: 100 }), 3),
  stabilityMargin: v.optional(plainNumber('Stability margin', { from: 0, below: 1 }, '1 - |m| that must remain'), 0.02),
  absorptionShare: v.optional(
    quantity('dimensionless', 'Absorption share', { above: 0, below: 1 }, { hint: 'Of the best absorption; bounds the diode case window' }),
    '90 %',
  ),
  dewPointGuard: v.optional(quantity('temperatureDifference', 'Dew point guard', { from: 0, to: 30 }), '3 K'),
  tecCurrentShare: v.optional(
    quantity('dimensionless', 'TEC current share', { above: 0, to: 1 }, { hint: 'Of the current of greatest temperature difference' }),
    '70 %',
  ),
  aberrationLoss: v.optional(quantity('dimensionless', 'Aberration loss', { above: 0, to: 1 }, { hint: 'Per pass of the rod' }), '3 %'),
});

export const designSchema = v.strictObject({
  format: v.literal('pump-ceiling/design', (issue) => `not a design|got ${issue.received}; "pump-ceiling/design" is needed`),
  version: v.literal(1, (issue) => `unsupported version|got ${issue.received}; version 1 is read`),
  title: v.optional(text('Title', undefined, 200), 'Untitled design'),
  notes: v.optional(text('Notes', undefined, 20_000), ''),
  surroundings: surroundingsSchema,
  pump: pumpSchema,
  rod: rodSchema,
  mount: mountSchema,
  coolers: v.pipe(
    v.array(coolerSchema, 'wrong type|a list of coolers is needed'),
    v.minLength(1, 'inconsistent|at least one cooler is needed'),
    v.maxLength(24, 'out of range|at most 24 coolers are allowed'),
  ),
  chosenCooler: v.optional(text('Chosen cooler', 'Name of one of the coolers', 40)),
  cavity: cavitySchema,
  limits: v.optional(limitsSchema, {}),
  uncertainty: v.optional(
    v.record(v.string(), text('Uncertainty', 'Plus or minus: a share such as "5 %", or a quantity of the same kind', 60)), {}),
});

/** A checked design, defaults filled in, quantities still as text. */
export type Design = v.InferOutput<typeof designSchema>;
/** A design as a person may write it. */
export type DesignInput = v.InferInput<typeof designSchema>;
export type CoolerDesign = Design['coolers'][number];
export type ElementDesign = Design['cavity']['elements'][number];
