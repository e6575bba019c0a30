import { readUnit } from './unit-expression';
import type { Exponents } from './units';

/** What a person is told about a dimension: its name with article, an example, and units, the first for display. */
interface DimensionRecord {
  label: string;
  example: string;
  units: readonly string[];
}

const RECORDS = {
  dimensionless: {
    label: 'a plain number or share',
    example: '0.5 or 50 %',
    units: ['', '%', 'ppm', 'at.%'],
  },
  length: { label: 'a length', example: '3 mm', units: ['mm', 'um', 'nm', 'cm', 'm', 'in'] },
  area: {
    label: 'an area or cross-section',
    example: '2.8e-19 cm^2',
    units: ['cm^2', 'mm^2', 'm^2', 'um^2', 'in^2'],
  },
  volume: { label: 'a volume', example: '10 mL', units: ['mL', 'L', 'mm^3', 'cm^3', 'm^3'] },
  time: { label: 'a time', example: '90 us', units: ['s', 'ms', 'us', 'ns', 'min', 'h'] },
  frequency: { label: 'a frequency', example: '1 kHz', units: ['Hz', 'kHz', 'MHz', '1/s'] },
  speed: { label: 'a speed', example: '2 m/s', units: ['m/s', 'mm/s', 'ft/min'] },
  mass: { label: 'a mass', example: '50 g', units: ['g', 'mg', 'kg', 'lb'] },
  angle: { label: 'an angle', example: '10 deg', units: ['deg', 'mrad', 'rad', 'urad', '°'] },
  power: { label: 'a power', example: '12 W', units: ['W', 'mW', 'kW'] },
  energy: { label: 'an energy', example: '5 J', units: ['J', 'mJ', 'kJ', 'Wh', 'eV'] },
  temperature: { label: 'a temperature', example: '22 degC', units: ['degC', 'K', 'degF', '°C', '°F'] },
  temperatureDifference: {
    label: 'a temperature difference',
    example: '3 K',
    units: ['K', 'mK', 'degC', 'degF', '°C', '°F'],
  },
  pressure: {
    label: 'a pressure',
    example: '101.3 kPa',
    units: ['kPa', 'Pa', 'hPa', 'mbar', 'bar', 'atm', 'psi', 'mmH2O', 'inH2O', 'torr', 'mmHg'],
  },
  stress: { label: 'a stress', example: '130 MPa', units: ['MPa', 'GPa', 'Pa', 'N/mm^2', 'psi'] },
  force: { label: 'a force', example: '5 N', units: ['N', 'mN', 'kN'] },
  current: { label: 'a current', example: '5 A', units: ['A', 'mA'] },
  voltage: { label: 'a voltage', example: '12 V', units: ['V', 'mV'] },
  resistance: {
    label: 'an electrical resistance',
    example: '2 ohm',
    units: ['ohm', 'mohm', 'kohm', 'Ω', 'mΩ'],
  },
  electricalResistivity: {
    label: 'an electrical resistivity',
    example: '1e-5 ohm m',
    units: ['ohm m', 'uohm m', 'ohm cm'],
  },
  seebeck: { label: 'a Seebeck coefficient', example: '200 uV/K', units: ['uV/K', 'mV/K', 'V/K'] },
  inverseLength: {
    label: 'a coefficient per length (absorption, dioptre)',
    example: '4.5 cm^-1',
    units: ['cm^-1', '1/m', '/m', '/cm', 'm^-1', 'mm^-1', 'dpt', '%/cm'],
  },
  numberDensity: { label: 'a number density', example: '1.2e20 cm^-3', units: ['cm^-3', 'm^-3', '1/cm^3'] },
  expansion: {
    label: 'a coefficient per temperature (expansion, dn/dT)',
    example: '7.3e-6 /K',
    units: ['1/K', '/K', 'K^-1', 'ppm/K', '1/degC'],
  },
  wavelengthDrift: {
    label: 'a wavelength drift',
    example: '0.28 nm/K',
    units: ['nm/K', 'nm/degC', 'pm/K', 'm/K'],
  },
  wavelengthCurrent: {
    label: 'a wavelength change per current',
    example: '0.5 nm/A',
    units: ['nm/A', 'pm/mA', 'm/A'],
  },
  thermalResistance: {
    label: 'a thermal resistance',
    example: '0.35 K/W',
    units: ['K/W', 'degC/W', 'mK/W', 'K/kW'],
  },
  thermalConductance: {
    label: 'a thermal conductance',
    example: '0.5 W/K',
    units: ['W/K', 'mW/K', 'W/degC'],
  },
  thermalConductivity: {
    label: 'a thermal conductivity',
    example: '5.2 W/(m K)',
    units: ['W/(m K)', 'W/(cm K)', 'W m^-1 K^-1', 'mW/(m K)'],
  },
  heatTransferCoefficient: {
    label: 'a conductance per area (film or contact)',
    example: '0.9 W/(cm^2 K)',
    units: ['W/(cm^2 K)', 'W/(m^2 K)', 'W cm^-2 K^-1', 'kW/(m^2 K)', 'W/(m^2 degC)'],
  },
  areaThermalResistance: {
    label: 'a contact resistance of unit area',
    example: '1e-4 m^2 K/W',
    units: ['m^2 K/W', 'cm^2 K/W', 'mm^2 K/W'],
  },
  heatCapacity: { label: 'a heat capacity', example: '50 J/K', units: ['J/K', 'kJ/K'] },
  specificHeat: {
    label: 'a specific heat',
    example: '590 J/(kg K)',
    units: ['J/(kg K)', 'J/(g K)', 'kJ/(kg K)'],
  },
  density: { label: 'a density', example: '4.56 g/cm^3', units: ['kg/m^3', 'g/cm^3', 'g/mL'] },
  volumeFlow: {
    label: 'a volume flow',
    example: '1 L/min',
    units: ['L/min', 'm^3/h', 'L/h', 'mL/min', 'm^3/s', 'cfm', 'lpm', 'ft^3/min'],
  },
  massFlow: { label: 'a mass flow', example: '1 g/s', units: ['g/s', 'kg/s', 'kg/h'] },
  dynamicViscosity: { label: 'a viscosity', example: '0.89 mPa s', units: ['mPa s', 'Pa s', 'uPa s'] },
  thermalDiffusivity: { label: 'a diffusivity', example: '4 mm^2/s', units: ['mm^2/s', 'cm^2/s', 'm^2/s'] },
  powerPerLength: { label: 'a power per length', example: '200 W/cm', units: ['W/cm', 'W/m', 'W/mm'] },
  powerPerArea: {
    label: 'a power per area',
    example: '10 kW/cm^2',
    units: ['W/cm^2', 'kW/cm^2', 'W/m^2', 'mW/mm^2'],
  },
  powerPerVolume: {
    label: 'a power per volume',
    example: '5 kW/cm^3',
    units: ['W/cm^3', 'kW/cm^3', 'W/m^3'],
  },
  inverseStress: {
    label: 'a coefficient per stress',
    example: '1e-12 1/Pa',
    units: ['1/Pa', '1/MPa', 'm^2/N'],
  },
} as const satisfies Record<string, DimensionRecord>;

/** What a quantity is a measure of. */
export type Dimension = keyof typeof RECORDS;

export const DIMENSIONS = Object.keys(RECORDS) as Dimension[];

const exponentsByDimension = new Map<Dimension, Exponents>(
  DIMENSIONS.map((dimension) => {
    const unit = RECORDS[dimension].units[0];
    return [dimension, unit === '' ? [0, 0, 0, 0, 0, 0] : readUnit(unit).exponents];
  }),
);

/** The name of a dimension with its article ("a power"), an example ("12 W") and its listed units, for messages. */
export function dimensionRecord(dimension: Dimension): DimensionRecord {
  return RECORDS[dimension];
}

export function sameDimension(exponents: Exponents, dimension: Dimension): boolean {
  return exponentsByDimension.get(dimension)!.every((exponent, i) => exponent === exponents[i]);
}

/** In words what a set of exponents measures: the first dimension that has them, else base units. */
export function describeExponents(exponents: Exponents): string {
  const known = DIMENSIONS.find((dimension) => sameDimension(exponents, dimension));
  if (known !== undefined) return RECORDS[known].label;
  const base = ['m', 'kg', 's', 'K', 'A', 'rad'];
  const parts = base.flatMap((unit, i) => {
    const exponent = exponents[i]!;
    return exponent === 0 ? [] : [exponent === 1 ? unit : `${unit}^${exponent}`];
  });
  return `a quantity in ${parts.join(' ')}`;
}

/**
 * The units listed for a dimension. Any other unit of the same dimension is accepted too.
 * @returns the first is the default for display; '' stands for a plain number
 */
export function unitsOf(dimension: Dimension): string[] {
  return [...RECORDS[dimension].units];
}
