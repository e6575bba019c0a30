import { parseQuantity, type Dimension } from '../quantity';
import { given, type Range } from './field-note';

/** A value must be left above zero by its uncertainty; more than this share of it is no longer an uncertainty. */
const widestShare = 0.95;
/** Of the value: how near to an end that is itself not allowed an uncertain value is tried. */
const closeTo = 1e-9;

const differenceOf = (dimension: Dimension): Dimension =>
  dimension === 'temperature' ? 'temperatureDifference' : dimension;

/** Plus-minus of a tolerance text in SI, for a value in SI; null when the text is neither share nor quantity. */
function halfWidth(text: string, value: number, dimension: Dimension): number | null {
  // A share of a temperature would depend on the zero of its scale.
  if (dimension !== 'temperature') {
    const share = parseQuantity(text, 'dimensionless');
    if (share.ok) return share.value < 0 ? null : share.value * Math.abs(value);
  }
  const absolute = parseQuantity(text, differenceOf(dimension));
  return absolute.ok && absolute.value >= 0 ? absolute.value : null;
}

/**
 * Ends of an uncertain value in SI, held within what the value can be at all.
 * A plain number ("0.05") is read as a share, also of a value that is itself a share.
 * @returns the ends, or in words what is wrong with the tolerance
 */
export function toleratedEnds(
  value: number,
  text: string,
  dimension: Dimension,
  range: Range,
): { low: number; high: number } | string {
  const width = halfWidth(text, value, dimension);
  const wanted =
    dimension === 'temperature'
      ? 'a temperature difference such as "2 K"'
      : 'a share such as "5 %" or a quantity of the same kind as the value';
  if (width === null) return `got ${given(text)}; ${wanted} is needed`;
  if (range.above !== undefined && value - width < (1 - widestShare) * (value - range.above) + range.above)
    return `got ${given(text)}; at most ${100 * widestShare} % of the value is allowed`;
  const { from = -Infinity, to = Infinity, below = Infinity } = range;
  const highest = below === Infinity ? below : below - closeTo * Math.abs(below);
  return { low: Math.max(value - width, from), high: Math.min(value + width, to, highest) };
}
