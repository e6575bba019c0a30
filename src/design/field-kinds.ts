import type { FieldNote } from './field-note';
import { quantity } from './quantity-field';

/**
 * The kinds of field that several parts of the design share. Their ranges are those outside which a value is surely a
 * slip, wider than good practice.
 */

type More = Partial<FieldNote>;

const MILLI = 1e-3;

/** A length with its range in millimetres. */
export const length = (label: string, from: number, to: number, hint?: string, more: More = {}) =>
  quantity('length', label, { from: from * MILLI, to: to * MILLI }, { hint, ...more });

/** A share from 0 to 100 %. */
export const share = (label: string, hint?: string, more: More = {}) =>
  quantity('dimensionless', label, { from: 0, to: 1 }, { hint, unit: '%', example: '50 %', ...more });

/** A share of which nothing at all makes no sense. */
export const positiveShare = (label: string, hint?: string, more: More = {}) =>
  quantity('dimensionless', label, { above: 0, to: 1 }, { hint, unit: '%', example: '50 %', ...more });

/** -70 degC to 200 degC: the temperatures at which a laser and its surroundings may stand. */
export const temperature = (label: string, hint?: string, more: More = {}) =>
  quantity('temperature', label, { from: 203.15, to: 473.15 }, { hint, ...more });

/** A vacuum wavelength, from ultraviolet to mid-infrared. */
export const wavelength = (label: string, hint?: string, more: More = {}) =>
  quantity('length', label, { from: 200e-9, to: 5000e-9 }, { hint, unit: 'nm', example: '808 nm', ...more });
