import type { Dimension } from '../quantity';
import type { Range } from './field-note';

/** What is said of a constant wherever it is shown, and where a person can enter a value of their own. */
export interface ConstantNote {
  label: string;
  dimension: Dimension;
  /** SI unit in which the constant is held. */
  unit: string;
  /** Design field whose value goes before the catalogue's; where there is none, the field that chooses the record. */
  own?: string;
  /** What the ends of its range can be at all. */
  range: Range;
}

const positive: Range = { above: 0 };
const shareOfOne: Range = { above: 0, to: 1 };
const anySign: Range = {};

/** Every constant of the catalogue that an answer rests on, by path; absorption lines are numbered, see `lineNote`. */
export const constantList = {
  'material.dopantShare': {
    label: 'Dopant concentration',
    dimension: 'dimensionless',
    unit: '1',
    own: 'rod.dopantConcentration',
    range: shareOfOne,
  },
  'material.ionDensity': {
    label: 'Ion density',
    dimension: 'numberDensity',
    unit: '1/m^3',
    range: positive,
  },
  'material.emissionCrossSection': {
    label: 'Emission cross-section',
    dimension: 'area',
    unit: 'm^2',
    own: 'rod.values.emissionCrossSection',
    range: positive,
  },
  'material.lifetime': {
    label: 'Fluorescence lifetime',
    dimension: 'time',
    unit: 's',
    own: 'rod.values.lifetime',
    range: positive,
  },
  'material.radiativeEfficiency': {
    label: 'Radiative efficiency',
    dimension: 'dimensionless',
    unit: '1',
    own: 'rod.values.radiativeEfficiency',
    range: { from: 0, to: 1 },
  },
  'material.fluorescenceWavelength': {
    label: 'Mean fluorescence wavelength',
    dimension: 'length',
    unit: 'm',
    own: 'rod.values.fluorescenceWavelength',
    range: positive,
  },
  'material.pumpQuantumYield': {
    label: 'Excitations per pump photon',
    dimension: 'dimensionless',
    unit: '1',
    range: positive,
  },
  'material.thermalConductivityRadial': {
    label: 'Conductivity across the rod',
    dimension: 'thermalConductivity',
    unit: 'W/(m K)',
    own: 'rod.values.thermalConductivityRadial',
    range: positive,
  },
  'material.thermalConductivityAxial': {
    label: 'Conductivity along the rod',
    dimension: 'thermalConductivity',
    unit: 'W/(m K)',
    own: 'rod.values.thermalConductivityAxial',
    range: positive,
  },
  'material.conductivityExponent': {
    label: 'Fall of the conductivity, m of (300 K / T)^m',
    dimension: 'dimensionless',
    unit: '1',
    own: 'rod.values.conductivityExponent',
    range: { from: 0, to: 3 },
  },
  'material.photoelastic11': {
    label: 'Photoelastic p11',
    dimension: 'dimensionless',
    unit: '1',
    range: anySign,
  },
  'material.photoelastic12': {
    label: 'Photoelastic p12',
    dimension: 'dimensionless',
    unit: '1',
    range: anySign,
  },
  'material.photoelastic44': {
    label: 'Photoelastic p44',
    dimension: 'dimensionless',
    unit: '1',
    range: anySign,
  },
  'material.refractiveIndex': {
    label: 'Refractive index',
    dimension: 'dimensionless',
    unit: '1',
    own: 'rod.values.refractiveIndex',
    range: { from: 1 },
  },
  'material.thermoOptic': {
    label: 'dn/dT',
    dimension: 'expansion',
    unit: '1/K',
    own: 'rod.values.thermoOptic',
    range: anySign,
  },
  'material.expansionAlong': {
    label: 'Expansion along the rod',
    dimension: 'expansion',
    unit: '1/K',
    own: 'rod.values.expansion',
    range: anySign,
  },
  'material.expansionAcross': {
    label: 'Expansion across the rod',
    dimension: 'expansion',
    unit: '1/K',
    own: 'rod.values.expansion',
    range: anySign,
  },
  'material.youngModulus': {
    label: "Young's modulus",
    dimension: 'stress',
    unit: 'Pa',
    own: 'rod.values.youngModulus',
    range: positive,
  },
  'material.poissonRatio': {
    label: "Poisson's ratio",
    dimension: 'dimensionless',
    unit: '1',
    own: 'rod.values.poissonRatio',
    range: { from: 0, below: 0.5 },
  },
  'material.fractureStrength': {
    label: 'Fracture strength',
    dimension: 'stress',
    unit: 'Pa',
    own: 'rod.values.fractureStrength',
    range: positive,
  },
  'mount.thermalConductivity': {
    label: 'Conductivity of the mount',
    dimension: 'thermalConductivity',
    unit: 'W/(m K)',
    range: positive,
  },
  'mount.interface.conductance': {
    label: 'Contact conductance',
    dimension: 'heatTransferCoefficient',
    unit: 'W/(m^2 K)',
    own: 'mount.interface.conductance',
    range: positive,
  },
} as const satisfies Record<string, ConstantNote>;

export type ConstantPath = keyof typeof constantList;

/** Peak cross-section of one absorption line of the crystal. */
export const lineNote = (label: string): ConstantNote => ({
  label,
  dimension: 'area',
  unit: 'm^2',
  range: positive,
});

/** What is said of the constant at a path; undefined where there is no such constant. */
export function constantNote(path: string): ConstantNote | undefined {
  if (/^material\.absorption\.\d+\.crossSection$/.test(path)) return lineNote('Absorption cross-section');
  return Object.hasOwn(constantList, path) ? constantList[path as ConstantPath] : undefined;
}
