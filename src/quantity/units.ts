/** Exponents of metre, kilogram, second, kelvin, ampere, radian. The angle is kept so that "12 deg" is no plain number. */
export type Exponents = readonly [number, number, number, number, number, number];

/** One unit: SI value = number x factor (+ offset, only where a temperature on a scale is meant). */
export interface Unit {
  exponents: Exponents;
  factor: number;
  /** Kelvin at the zero of the scale; used for an absolute temperature, never for a difference or inside a product. */
  offset?: number;
  /** Whether SI prefixes may stand before it. */
  prefixed?: boolean;
}

const NONE: Exponents = [0, 0, 0, 0, 0, 0];
const LENGTH: Exponents = [1, 0, 0, 0, 0, 0];
const VOLUME: Exponents = [3, 0, 0, 0, 0, 0];
const MASS: Exponents = [0, 1, 0, 0, 0, 0];
const TIME: Exponents = [0, 0, 1, 0, 0, 0];
const TEMPERATURE: Exponents = [0, 0, 0, 1, 0, 0];
const PRESSURE: Exponents = [-1, 1, -2, 0, 0, 0];
const ENERGY: Exponents = [2, 1, -2, 0, 0, 0];
const RESISTANCE: Exponents = [2, 1, -3, 0, -2, 0];
const ANGLE: Exponents = [0, 0, 0, 0, 0, 1];
const FLOW: Exponents = [3, 0, -1, 0, 0, 0];

const FOOT = 0.3048;
const INCH = 0.0254;
const POUND_FORCE_PER_SQUARE_INCH = 6894.757293168361;

/**
 * Every unit a person may write, before prefixes. A name found here is never read as prefix + unit, so "min" is
 * the minute and not a milli-inch. Factors are exact by definition (BIPM SI Brochure, 9th ed.; NIST SP 811), apart
 * from psi and the conventional water column (4 degC, NIST SP 811), which are rounded to double precision.
 */
export const UNITS: Readonly<Record<string, Unit>> = {
  m: { exponents: LENGTH, factor: 1, prefixed: true },
  in: { exponents: LENGTH, factor: INCH },
  ft: { exponents: LENGTH, factor: FOOT },
  Å: { exponents: LENGTH, factor: 1e-10 },
  micron: { exponents: LENGTH, factor: 1e-6 },
  L: { exponents: VOLUME, factor: 1e-3, prefixed: true },
  l: { exponents: VOLUME, factor: 1e-3, prefixed: true },
  g: { exponents: MASS, factor: 1e-3, prefixed: true },
  lb: { exponents: MASS, factor: 0.45359237 },
  s: { exponents: TIME, factor: 1, prefixed: true },
  min: { exponents: TIME, factor: 60 },
  h: { exponents: TIME, factor: 3600 },
  Hz: { exponents: [0, 0, -1, 0, 0, 0], factor: 1, prefixed: true },
  K: { exponents: TEMPERATURE, factor: 1, offset: 0, prefixed: true },
  degC: { exponents: TEMPERATURE, factor: 1, offset: 273.15 },
  '°C': { exponents: TEMPERATURE, factor: 1, offset: 273.15 },
  degF: { exponents: TEMPERATURE, factor: 5 / 9, offset: 459.67 * (5 / 9) },
  '°F': { exponents: TEMPERATURE, factor: 5 / 9, offset: 459.67 * (5 / 9) },
  W: { exponents: [2, 1, -3, 0, 0, 0], factor: 1, prefixed: true },
  J: { exponents: ENERGY, factor: 1, prefixed: true },
  Wh: { exponents: ENERGY, factor: 3600, prefixed: true },
  eV: { exponents: ENERGY, factor: 1.602176634e-19, prefixed: true },
  N: { exponents: [1, 1, -2, 0, 0, 0], factor: 1, prefixed: true },
  Pa: { exponents: PRESSURE, factor: 1, prefixed: true },
  bar: { exponents: PRESSURE, factor: 1e5, prefixed: true },
  atm: { exponents: PRESSURE, factor: 101325 },
  torr: { exponents: PRESSURE, factor: 101325 / 760, prefixed: true },
  Torr: { exponents: PRESSURE, factor: 101325 / 760, prefixed: true },
  mmHg: { exponents: PRESSURE, factor: 133.322387415 },
  psi: { exponents: PRESSURE, factor: POUND_FORCE_PER_SQUARE_INCH },
  mmH2O: { exponents: PRESSURE, factor: 9.80638 },
  inH2O: { exponents: PRESSURE, factor: 249.082 },
  A: { exponents: [0, 0, 0, 0, 1, 0], factor: 1, prefixed: true },
  V: { exponents: [2, 1, -3, 0, -1, 0], factor: 1, prefixed: true },
  ohm: { exponents: RESISTANCE, factor: 1, prefixed: true },
  Ω: { exponents: RESISTANCE, factor: 1, prefixed: true },
  S: { exponents: [-2, -1, 3, 0, 2, 0], factor: 1, prefixed: true },
  rad: { exponents: ANGLE, factor: 1, prefixed: true },
  deg: { exponents: ANGLE, factor: Math.PI / 180 },
  '°': { exponents: ANGLE, factor: Math.PI / 180 },
  dpt: { exponents: [-1, 0, 0, 0, 0, 0], factor: 1, prefixed: true },
  cfm: { exponents: FLOW, factor: FOOT ** 3 / 60 },
  CFM: { exponents: FLOW, factor: FOOT ** 3 / 60 },
  lpm: { exponents: FLOW, factor: 1e-3 / 60 },
  '%': { exponents: NONE, factor: 0.01 },
  percent: { exponents: NONE, factor: 0.01 },
  'at.%': { exponents: NONE, factor: 0.01 },
  'at%': { exponents: NONE, factor: 0.01 },
  '‰': { exponents: NONE, factor: 1e-3 },
  ppm: { exponents: NONE, factor: 1e-6 },
  ppb: { exponents: NONE, factor: 1e-9 },
};

const PREFIXES: Readonly<Record<string, number>> = {
  f: 1e-15,
  p: 1e-12,
  n: 1e-9,
  u: 1e-6,
  µ: 1e-6,
  m: 1e-3,
  c: 1e-2,
  d: 1e-1,
  h: 1e2,
  k: 1e3,
  M: 1e6,
  G: 1e9,
  T: 1e12,
};

/**
 * The unit a symbol stands for, with or without an SI prefix.
 * @param symbol one unit symbol, already normalised ("mm", "kW", "°C")
 * @returns undefined when the symbol is not known
 */
export function findUnit(symbol: string): Unit | undefined {
  if (Object.hasOwn(UNITS, symbol)) return UNITS[symbol];
  const prefix = symbol.slice(0, 1);
  const name = symbol.slice(1);
  if (!Object.hasOwn(PREFIXES, prefix) || !Object.hasOwn(UNITS, name)) return undefined;
  const unit = UNITS[name]!;
  return unit.prefixed ? { ...unit, factor: unit.factor * PREFIXES[prefix]! } : undefined;
}
