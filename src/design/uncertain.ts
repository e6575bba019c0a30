import type { Fault } from '../errors';
import { formatQuantity, nearestName, parseQuantity } from '../quantity';
import { constantNote } from './constant-list';
import { faultAt } from './fault';
import { fieldsOf, withValue, type Field } from './fields';
import type { Constant } from './resolved';
import type { Design } from './schema';
import { toleratedEnds } from './tolerance';

/** A design value the person gave a tolerance: its low and high in the field's own terms. */
export interface UncertainField {
  path: string;
  label: string;
  low: string | number;
  high: string | number;
}

function siValue({ value, note }: Field): number | null {
  if (typeof value === 'number') return value;
  if (value === undefined || !note.dimension) return null;
  const parsed = parseQuantity(value, note.dimension);
  return parsed.ok ? parsed.value : null;
}

/** Ends of a field that holds a number, or in words why it has none. */
function endsOfField(field: Field, tolerance: string): UncertainField | string {
  const { path, note, kind } = field;
  const value = siValue(field);
  if (!note.dimension || value === null)
    return field.value === undefined && note.dimension
      ? 'this value is left empty, so that an uncertainty has nothing to apply to; enter the value first'
      : 'this field has no number that an uncertainty could apply to';
  const ends = toleratedEnds(value, tolerance, note.dimension, note.range ?? {});
  if (typeof ends === 'string') return ends;
  const write = (bound: number) =>
    kind === 'number' ? bound : formatQuantity(bound, note.dimension!, note.unit);
  return { path, label: note.label, low: write(ends.low), high: write(ends.high) };
}

const fieldsByPath = (design: Design) => new Map(fieldsOf(design).map((field) => [field.path, field]));

/**
 * The tolerances of a checked design that apply to values it gives, as low and high values; those that change nothing
 * are left out. Those of values left to the catalogue are in the ranges of the constants (`ResolvedDesign.constants`).
 */
export function uncertainFields(design: Design): UncertainField[] {
  const fields = fieldsByPath(design);
  return Object.entries(design.uncertainty).flatMap(([path, tolerance]) => {
    const field = fields.get(path);
    const ends = field && field.note.range?.whole !== true ? endsOfField(field, tolerance) : '';
    return typeof ends === 'string' || ends.low === ends.high ? [] : [ends];
  });
}

/** The constant a tolerance applies to: named by its own path, or by the empty field that would replace it. */
const constantOf = (path: string, constants: readonly Constant[]): Constant | undefined =>
  constants.find((constant) => constant.path === path) ??
  constants.find((constant) => constant.standing !== 'own' && constantNote(constant.path)?.own === path);

function constantReason({ path, nominal, standing }: Constant, tolerance: string): string | null {
  const note = constantNote(path)!;
  if (standing === 'own')
    return `this constant is entered in the design; give the uncertainty of "${note.own}"`;
  if (standing === 'common practice') return 'this is an assumption of the model; it takes no uncertainty';
  const ends = toleratedEnds(nominal, tolerance, note.dimension, note.range);
  return typeof ends === 'string' ? ends : null;
}

/** Why the tolerance at a path cannot be taken; null where it can. */
function reasonAgainst(
  path: string,
  tolerance: string,
  field: Field | undefined,
  constants: readonly Constant[],
) {
  if (field?.value !== undefined) {
    if (field.note.range?.whole) return 'a count has no uncertainty';
    const ends = endsOfField(field, tolerance);
    return typeof ends === 'string' ? ends : null;
  }
  const constant = constantOf(path, constants);
  if (constant) return constantReason(constant, tolerance);
  const ends = field && endsOfField(field, tolerance);
  return typeof ends === 'string' ? ends : null;
}

/**
 * Faults of the `uncertainty` part: unknown paths, fields without a number, texts that are no tolerance.
 * @param constants those the design rests on; a tolerance may name one of them
 */
export function uncertainFaults(design: Design, constants: readonly Constant[]): Fault[] {
  const fields = fieldsByPath(design);
  const known = [...fields.keys(), ...constants.map((constant) => constant.path)];
  return Object.entries(design.uncertainty).flatMap(([path, tolerance]): Fault[] => {
    const at = `uncertainty.${path}`;
    if (!known.includes(path)) {
      const near = nearestName(known, path);
      const hint = near ? `did you mean "${near}"?` : 'name a value by its path, such as "pump.radius"';
      return [faultAt(at, 'unknown name', `this design has no such value; ${hint}`)];
    }
    const reason = reasonAgainst(path, tolerance, fields.get(path), constants);
    return reason === null ? [] : [faultAt(at, 'not a quantity', reason)];
  });
}

/** The design with one uncertain field at one end. */
export const atEnd = (design: Design, field: UncertainField, end: 'low' | 'high'): Design =>
  withValue(design, field.path, field[end]);
