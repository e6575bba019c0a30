import type { FaultKind } from '../errors';
import { describeExponents, dimensionRecord, sameDimension, type Dimension } from './dimensions';
import { normalise } from './normalise';
import { readUnit, UnitFault, type UnitValue } from './unit-expression';

/** A quantity read, or what was wrong with it in words that a field name can be put before. */
export type ParsedQuantity =
  { ok: true; value: number; unit: string } | { ok: false; kind: FaultKind; reason: string };

const LONGEST_TEXT = 200;
const LARGEST_NUMBER = 1e300;
const NUMBER = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)(?: ?[*x] ?10\^ ?([+-]?\d+))?/;
const POWER_OF_TEN = /^([+-]?)10\^ ?([+-]?\d+)/;

function refuse(kind: FaultKind, reason: string): ParsedQuantity {
  return { ok: false, kind, reason };
}

function quoted(text: string): string {
  return `"${text.length > 40 ? `${text.slice(0, 40)}…` : text}"`;
}

function readNumber(text: string): { number: number; digits: string; rest: string } | undefined {
  const power = POWER_OF_TEN.exec(text);
  if (power !== null) {
    return { number: Number(`${power[1]}1e${power[2]}`), digits: '1', rest: text.slice(power[0].length) };
  }
  const match = NUMBER.exec(text);
  if (match === null) return undefined;
  const [mantissa = '', exponent = '0'] = match[1]!.split(/[eE]/);
  const shift = Number(exponent) + Number(match[2] ?? 0);
  return { number: Number(`${mantissa}e${shift}`), digits: mantissa, rest: text.slice(match[0].length) };
}

function faultOfText(text: string, dimension: Dimension): ParsedQuantity | undefined {
  const { label, example } = dimensionRecord(dimension);
  if (text.length > LONGEST_TEXT) {
    return refuse(
      'not a quantity',
      `the text is ${text.length} characters long; at most ${LONGEST_TEXT} are read`,
    );
  }
  if (text.trim() === '')
    return refuse('not a quantity', `nothing is given; ${label} is needed, such as ${example}`);
  if (/\d,\d/.test(text)) {
    return refuse('not a quantity', `${quoted(text)} has a comma in the number; use a point, as in 1.5`);
  }
  return undefined;
}

function toSi(number: number, unit: UnitValue, dimension: Dimension): number {
  return dimension === 'temperature' ? number * unit.factor + unit.offset! : number * unit.factor;
}

/**
 * Reads text such as "0.9 W/(cm^2 K)", "22 degC" or "1.2·10^-3 m" as an SI number of the wanted dimension.
 * A temperature takes the zero of its scale; a temperature difference, and degC or degF inside a product, do not.
 * "W/m K" is refused because print uses it for both W/(m K) and (W/m) K.
 *
 * @param text number, optional space, unit expression; at most 200 characters
 * @param dimension what the quantity must measure
 * @returns the SI value with the unit as written (normalised signs), or the kind of fault with a reason that names
 *   what was given, what is wanted and an example
 */
export function parseQuantity(text: string, dimension: Dimension): ParsedQuantity {
  const fault = faultOfText(text, dimension);
  if (fault !== undefined) return fault;
  const { label, example } = dimensionRecord(dimension);
  const read = readNumber(normalise(text));
  if (read === undefined) {
    return refuse(
      'not a quantity',
      `${quoted(text)} does not start with a number; ${label} is needed, such as ${example}`,
    );
  }
  if (Math.abs(read.number) > LARGEST_NUMBER) {
    return refuse('not a quantity', `the number in ${quoted(text)} is too large; at most 1e300 is read`);
  }
  if (read.number === 0 && /[1-9]/.test(read.digits)) {
    return refuse('not a quantity', `the number in ${quoted(text)} is too small to be told from zero`);
  }
  const unit = tidyUnit(read.rest);
  if (unit === '' && dimension !== 'dimensionless') {
    return refuse(
      'not a quantity',
      `${quoted(text)} is a number without a unit; ${label} is needed, such as ${example}`,
    );
  }
  return withUnit(text, read.number, unit, dimension);
}

function withUnit(text: string, number: number, unit: string, dimension: Dimension): ParsedQuantity {
  const { label, example } = dimensionRecord(dimension);
  let size: UnitValue;
  try {
    size = unit === '' ? { exponents: [0, 0, 0, 0, 0, 0], factor: 1 } : readUnit(unit);
  } catch (thrown) {
    if (!(thrown instanceof UnitFault)) throw thrown;
    if (thrown.kind === 'ambiguous unit') return refuse(thrown.kind, thrown.reason);
    return refuse(thrown.kind, `${thrown.reason}; ${label} is needed, such as ${example}`);
  }
  if (!sameDimension(size.exponents, dimension)) {
    const given = describeExponents(size.exponents);
    return refuse('wrong dimension', `${quoted(text)} is ${given}; ${label} is needed, such as ${example}`);
  }
  if (dimension === 'temperature' && size.offset === undefined) {
    return refuse(
      'wrong dimension',
      `${quoted(text)} is not on a temperature scale; write degC, K or degF alone`,
    );
  }
  const value = toSi(number, size, dimension);
  if (!(Math.abs(value) <= LARGEST_NUMBER)) {
    return refuse('not a quantity', `the number in ${quoted(text)} is too large; at most 1e300 is read`);
  }
  if (value === 0 && number !== 0 && dimension !== 'temperature') {
    return refuse('not a quantity', `the number in ${quoted(text)} is too small to be told from zero`);
  }
  if (dimension === 'temperature' && value < 0) {
    return refuse('out of range', `${quoted(text)} is below absolute zero; the lowest temperature is 0 K`);
  }
  return { ok: true, value: value === 0 ? 0 : value, unit };
}

/** The unit as written, with one spelling of its product sign. */
function tidyUnit(rest: string): string {
  return rest
    .trim()
    .replace(/ ?\* ?/g, '*')
    .replace(/ ?\/ ?/g, '/')
    .replace(/\( /g, '(')
    .replace(/ \)/g, ')');
}
