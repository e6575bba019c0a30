import * as v from 'valibot';
import { crystals } from '../materials';
import { length, positiveShare, share, wavelength } from './field-kinds';
import { given, type FieldNote } from './field-note';
import { catalogueName, choice, plainNumber, quantity, type AlternativesNote } from './quantity-field';

const ofCatalogue: Partial<FieldNote> = { empty: 'the value of the catalogue' };

const valuesSchema = v.strictObject({
  thermalConductivityRadial: v.optional(
    quantity('thermalConductivity', 'Conductivity across the axis', { above: 0, to: 5000 }, ofCatalogue),
  ),
  thermalConductivityAxial: v.optional(
    quantity(
      'thermalConductivity',
      'Conductivity along the axis',
      { above: 0, to: 5000 },
      { empty: 'the conductivity across the axis where that is entered, else the value of the catalogue' },
    ),
  ),
  conductivityExponent: v.optional(
    plainNumber(
      'Fall of the conductivity',
      { from: 0, to: 3 },
      'm of k(T) = k (300 K / T)^m; used where the conductivity falls with temperature',
      ofCatalogue,
    ),
  ),
  thermoOptic: v.optional(
    quantity(
      'expansion',
      'dn/dT',
      { from: -1e-3, to: 1e-3 },
      { ...ofCatalogue, hint: 'For the polarisation of the laser; may be negative', unit: 'ppm/K' },
    ),
  ),
  expansion: v.optional(
    quantity(
      'expansion',
      'Thermal expansion',
      { from: -1e-4, to: 1e-4 },
      { ...ofCatalogue, hint: 'Linear; taken along and across the axis', unit: 'ppm/K' },
    ),
  ),
  refractiveIndex: v.optional(
    plainNumber(
      'Refractive index',
      { from: 1, to: 4 },
      'At the laser line and its polarisation',
      ofCatalogue,
    ),
  ),
  youngModulus: v.optional(
    quantity('stress', "Young's modulus", { above: 1e6, to: 2e12 }, { ...ofCatalogue, unit: 'GPa' }),
  ),
  poissonRatio: v.optional(plainNumber("Poisson's ratio", { from: 0, below: 0.5 }, undefined, ofCatalogue)),
  fractureStrength: v.optional(
    quantity(
      'stress',
      'Fracture strength',
      { above: 1e5, to: 2e10 },
      { ...ofCatalogue, hint: 'For the finish of the surfaces, before the safety factor' },
    ),
  ),
  emissionCrossSection: v.optional(
    quantity(
      'area',
      'Emission cross-section',
      { above: 0, to: 1e-20 },
      { ...ofCatalogue, hint: 'At the laser line, in its polarisation' },
    ),
  ),
  lifetime: v.optional(
    quantity(
      'time',
      'Fluorescence lifetime',
      { above: 1e-9, to: 1 },
      { ...ofCatalogue, hint: 'Of the upper level at this concentration', unit: 'us' },
    ),
  ),
  radiativeEfficiency: v.optional(
    share('Radiative efficiency', 'Share of excitations that leave as light when nothing lases', ofCatalogue),
  ),
  fluorescenceWavelength: v.optional(
    wavelength('Mean fluorescence wavelength', 'Over all bands of the upper level', {
      ...ofCatalogue,
      example: '1040 nm',
    }),
  ),
});

const absorptionSchema = v.pipe(
  v.union(
    [
      v.literal('from crystal'),
      v.strictObject({
        coefficient: quantity(
          'inverseLength',
          'Absorption coefficient',
          { above: 0, to: 1e6 },
          { hint: 'Of power, as measured with this pump' },
        ),
        drift: v.optional(
          choice(
            'Drift with the diode',
            ['ignored', 'follows the line'],
            'Whether the coefficient follows the crystal line as the diode warms',
          ),
          'ignored',
        ),
      }),
    ],
    (issue) =>
      `wrong type|got ${given(issue.input)}; "from crystal" or { "coefficient": "4.5 cm^-1" } is needed`,
  ),
  v.metadata({
    alternatives: {
      label: 'Absorption',
      hint: 'From the lines of the crystal, or a coefficient of your own',
      options: [
        { name: 'from the crystal', value: 'from crystal' },
        { name: 'measured', value: { coefficient: '4.5 cm^-1', drift: 'ignored' } },
      ],
    } satisfies AlternativesNote,
  }),
);

const heatFractionSchema = v.pipe(
  v.union(
    [
      v.literal('from laser'),
      v.literal('quantum defect'),
      v.strictObject({
        lasing: positiveShare('Heat fraction, lasing', 'Heat over absorbed pump power'),
        blocked: v.optional(
          positiveShare('Heat fraction, beam blocked', 'Heat over absorbed pump power', {
            empty: 'from the radiative efficiency, but no less than when lasing',
          }),
        ),
      }),
    ],
    (issue) =>
      `wrong type|got ${given(issue.input)}; "from laser", "quantum defect" or { "lasing": "27 %" } is needed`,
  ),
  v.metadata({
    alternatives: {
      label: 'Heat fraction',
      hint: 'Heat over absorbed pump power',
      options: [
        { name: 'from the laser', value: 'from laser' },
        { name: 'quantum defect', value: 'quantum defect' },
        { name: 'given', value: { lasing: '27 %', blocked: '38 %' } },
      ],
    } satisfies AlternativesNote,
  }),
);

export const rodSchema = v.strictObject({
  crystal: catalogueName('Crystal', crystals, 'Host and dopant, from the catalogue'),
  dopantConcentration: v.optional(
    quantity(
      'dimensionless',
      'Dopant concentration',
      { above: 0, to: 0.5 },
      {
        hint: 'Share of the sites the dopant may take (atomic per cent); of mass for glass and sapphire',
        unit: '%',
        example: '1 %',
        empty: 'the usual concentration of the catalogue',
      },
    ),
  ),
  cut: v.optional(
    choice('Cut', ['a', 'c'], 'Crystal axis that lies along the rod; no matter for isotropic crystals'),
    'a',
  ),
  section: v.strictObject({
    shape: choice('Section', ['round', 'square'], 'Across the rod'),
    diameter: v.optional(
      length('Diameter', 0.05, 100, 'Of a round rod; not its radius', { empty: 'only for square rods' }),
    ),
    side: v.optional(
      length('Side', 0.05, 100, 'Of a square rod, edge to edge', { empty: 'only for round rods' }),
    ),
  }),
  length: length('Doped length', 0.01, 500, 'Without the undoped end caps', { example: '10 mm' }),
  endCaps: v.optional(
    v.strictObject({
      front: v.optional(length('Front end cap', 0, 100, 'Undoped length before the doped part'), '0 mm'),
      back: v.optional(length('Back end cap', 0, 100, 'Undoped length behind the doped part'), '0 mm'),
    }),
    {},
  ),
  laserLine: wavelength('Laser line', 'The nearest line of the crystal is taken', { example: '1064 nm' }),
  absorption: v.optional(absorptionSchema, 'from crystal'),
  heatFraction: v.optional(heatFractionSchema, 'from laser'),
  conductivityLaw: v.optional(
    choice(
      'Conductivity law',
      ['constant', 'falls with temperature'],
      'Constant: the value near 300 K throughout. Falling: k (300 K / T)^m; every answer then takes several times longer',
    ),
    'constant',
  ),
  faceFilm: v.optional(
    quantity(
      'heatTransferCoefficient',
      'Film on the end faces',
      { from: 0, to: 1e5 },
      {
        hint: 'Convection and radiation to the air; 0 is insulated',
        unit: 'W/(m^2 K)',
        example: '10 W/(m^2 K)',
      },
    ),
    '10 W/(m^2 K)',
  ),
  surfaceFinish: v.optional(
    choice(
      'Surface finish',
      ['polished', 'ground', 'etched'],
      'Rules the strength: ground takes the low end of its published range, etched the high end',
    ),
    'polished',
  ),
  values: v.optional(valuesSchema, {}),
});
