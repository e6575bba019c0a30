import type { Fault } from '../errors';
import { formatQuantity, nearestName, parseQuantity, type Dimension } from '../quantity';
import { fieldsOf, withValue, type Field } from './fields';
import type { Design } from './schema';

/** A design value the person gave a tolerance: its low and high in the field's own terms. */
export interface UncertainField {
  path: string;
  label: string;
  low: string | number;
  high: string | number;
}

const differenceOf = (dimension: Dimension): Dimension =>
  dimension === 'temperature' ? 'temperatureDifference' : dimension;

/** Plus-minus of a tolerance text in SI, for a value in SI; null when the text is neither share nor quantity. */
function halfWidth(text: string, value: number, dimension: Dimension): number | null {
  if (dimension !== 'temperature') {
    const share = parseQuantity(text, 'dimensionless');
    if (share.ok) return Math.abs(share.value * value);
  }
  const absolute = parseQuantity(text, differenceOf(dimension));
  return absolute.ok ? Math.abs(absolute.value) : null;
}

function siValue(field: Field): number | null {
  if (typeof field.value === 'number') return field.value;
  if (field.value === undefined || !field.note.dimension) return null;
  const parsed = parseQuantity(field.value, field.note.dimension);
  return parsed.ok ? parsed.value : null;
}

function resolveField(field: Field, tolerance: string): UncertainField | string {
  const dimension = field.note.dimension;
  const value = siValue(field);
  if (!dimension || value === null) return 'has no number an uncertainty could apply to';
  const width = halfWidth(tolerance, value, dimension);
  if (width === null) return `got "${tolerance}"; a share such as "5 %" or a quantity of the same kind as the value is needed`;
  const { above = -Infinity, from = -Infinity, to = Infinity, below = Infinity } = field.note.range ?? {};
  const low = Math.max(value - width, from, above === -Infinity ? above : above + 1e-9 * Math.abs(value));
  const high = Math.min(value + width, to, below === Infinity ? below : below - 1e-9 * Math.abs(value));
  const write = (bound: number) => (field.kind === 'number' ? bound : formatQuantity(bound, dimension));
  return { path: field.path, label: field.note.label, low: write(low), high: write(high) };
}

/** The tolerances of a checked design as low and high values; those that change nothing are left out. */
export function uncertainFields(design: Design): UncertainField[] {
  const fields = new Map(fieldsOf(design).map((field) => [field.path, field]));
  return Object.entries(design.uncertainty).flatMap(([path, tolerance]) => {
    const field = fields.get(path);
    const resolved = field ? resolveField(field, tolerance) : '';
    return typeof resolved === 'string' || resolved.low === resolved.high ? [] : [resolved];
  });
}

/** Faults of the `uncertainty` part: unknown paths, fields without a number, texts that are no tolerance. */
export function uncertainFaults(design: Design): Fault[] {
  const fields = new Map(fieldsOf(design).map((field) => [field.path, field]));
  return Object.entries(design.uncertainty).flatMap(([path, tolerance]): Fault[] => {
    const at = `uncertainty.${path}`;
    const field = fields.get(path);
    if (!field) {
      const near = nearestName([...fields.keys()], path);
      return [{ path: at, kind: 'unknown name', message: `${at}: no such field in this design${near ? `; did you mean "${near}"?` : ''}` }];
    }
    const resolved = resolveField(field, tolerance);
    return typeof resolved === 'string' ? [{ path: at, kind: 'not a quantity', message: `${at}: ${resolved}` }] : [];
  });
}

/** The design with one uncertain field at one end. */
export const atEnd = (design: Design, field: UncertainField, end: 'low' | 'high'): Design =>
  withValue(design, field.path, field[end]);
