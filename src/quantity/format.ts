import { dimensionRecord, sameDimension, type Dimension } from './dimensions';
import { normalise } from './normalise';
import { readUnit, type UnitValue } from './unit-expression';

function sizeOf(unit: string, dimension: Dimension): UnitValue {
  const size: UnitValue =
    unit === '' ? { exponents: [0, 0, 0, 0, 0, 0], factor: 1 } : readUnit(normalise(unit));
  const onScale = dimension !== 'temperature' || size.offset !== undefined;
  if (!sameDimension(size.exponents, dimension) || !onScale) {
    throw new Error(`the unit "${unit}" is not ${dimensionRecord(dimension).label}`);
  }
  return size;
}

/**
 * An SI number in another unit.
 * @param value SI
 * @param unit any unit of the dimension; '' for a plain number
 * @throws Error when the unit does not measure the dimension (a bug in the caller, not a person's input)
 */
export function convertTo(value: number, unit: string, dimension: Dimension): number {
  const size = sizeOf(unit, dimension);
  return (dimension === 'temperature' ? value - size.offset! : value) / size.factor;
}

/**
 * Text for an SI number, such that reading it back gives the same number to 1e-12.
 * Fourteen digits are kept and trailing zeros dropped, so that 0.0002 m is "0.2 mm" and not "0.20000000000000001 mm".
 * @param value SI, finite
 * @param unit the unit wanted; without one the first of `unitsOf(dimension)`
 * @returns for example "12 W"; a plain number has no unit
 * @throws Error when the value is not finite or the unit does not measure the dimension
 */
export function formatQuantity(value: number, dimension: Dimension, unit?: string): string {
  if (!Number.isFinite(value)) throw new Error(`${value} cannot be written as a quantity`);
  const written = unit ?? dimensionRecord(dimension).units[0]!;
  const number = Number(convertTo(value, written, dimension).toPrecision(14));
  const digits = String(number === 0 ? 0 : number);
  if (written === '') return digits;
  return written === '°' ? `${digits}°` : `${digits} ${written}`;
}
