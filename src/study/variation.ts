import type { Design } from '../design/schema';
import { resolve } from '../design/resolve';
import type { ResolvedDesign } from '../design/resolved';
import { atEnd, uncertainFields } from '../design/uncertain';

/** One uncertain value, with the design as it is when the value stands at either end of its range. */
export interface Variation {
  path: string;
  label: string;
  low: () => ResolvedDesign;
  high: () => ResolvedDesign;
}

/**
 * Every uncertain value of a design: constants of the catalogue that carry a range, and the tolerances the person gave.
 * @param resolved the design at its nominal values
 */
export function variationsOf(design: Design, resolved: ResolvedDesign): Variation[] {
  const constants = resolved.constants
    .filter(({ low, high, standing }) => standing !== 'own' && low !== null && high !== null && low < high)
    .map(({ path, label, low, high }) => ({
      path,
      label,
      low: () => resolve(design, { [path]: low! }),
      high: () => resolve(design, { [path]: high! }),
    }));
  const fields = uncertainFields(design).map((field) => ({
    path: field.path,
    label: field.label,
    low: () => resolve(atEnd(design, field, 'low')),
    high: () => resolve(atEnd(design, field, 'high')),
  }));
  return [...constants, ...fields];
}
