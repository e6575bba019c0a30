import { valueAt, withValue } from '../design/fields';
import { formatQuantity, parseQuantity, type Dimension } from '../quantity';
import { checkDesign } from '../design/check';
import { resolve } from '../design/resolve';
import type { ResolvedDesign } from '../design/resolved';
import type { Design } from '../design/schema';

/** A design value a person may turn, and the change that is tried. */
export interface Lever {
  path: string;
  label: string;
  change: string;
  design: ResolvedDesign;
}

interface Turn {
  path: string;
  label: string;
  dimension: Dimension;
  factor?: number;
  /** SI, instead of a factor. */
  step?: number;
  change: string;
}

/** Spaces and radii are found in the design itself; the rest is the same for every laser. */
function turnsOf(design: Design): Turn[] {
  const turns: Turn[] = [
    { path: 'pump.radius', label: 'Pump radius', dimension: 'length', factor: 1.1, change: '+10 %' },
    {
      path: 'surroundings.ambient',
      label: 'Ambient temperature',
      dimension: 'temperature',
      step: -5,
      change: '-5 K',
    },
    { path: 'rod.length', label: 'Doped length', dimension: 'length', factor: 1.2, change: '+20 %' },
    { path: 'pump.wavelength', label: 'Diode wavelength', dimension: 'length', step: 1e-9, change: '+1 nm' },
    { path: 'pump.wavelength', label: 'Diode wavelength', dimension: 'length', step: -1e-9, change: '-1 nm' },
    {
      path: 'pump.diode.caseToBase',
      label: 'Diode case to base',
      dimension: 'thermalResistance',
      factor: 0.5,
      change: 'halved',
    },
    {
      path: 'mount.interface.conductance',
      label: 'Contact conductance',
      dimension: 'heatTransferCoefficient',
      factor: 2,
      change: 'doubled',
    },
    { path: 'rod.endCaps.front', label: 'Front end cap', dimension: 'length', step: 2e-3, change: '+2 mm' },
  ];
  if (design.rod.absorption !== 'from crystal')
    turns.push({
      path: 'rod.absorption.coefficient',
      label: 'Absorption coefficient',
      dimension: 'inverseLength',
      factor: 0.8,
      change: '-20 %',
    });
  else
    turns.push({
      path: 'rod.dopantConcentration',
      label: 'Dopant concentration',
      dimension: 'dimensionless',
      factor: 0.8,
      change: '-20 %',
    });
  design.cavity.elements.forEach((element, place) => {
    if (element.space !== undefined)
      turns.push({
        path: `cavity.elements.${place}.space`,
        label: `Space ${place + 1} of the cavity`,
        dimension: 'length',
        factor: 0.9,
        change: '-10 %',
      });
    if (element.mirror && element.mirror.radius.trim().toLowerCase() !== 'flat')
      turns.push({
        path: `cavity.elements.${place}.mirror.radius`,
        label: `Radius of mirror ${place + 1}`,
        dimension: 'length',
        factor: 1.2,
        change: '+20 %',
      });
  });
  return turns;
}

/**
 * The levers of a design: each design value changed by a step a builder would take, the design resolved with it.
 * Steps that would leave the allowed ranges are left out.
 */
export function leversOf(design: Design): Lever[] {
  return turnsOf(design).flatMap(({ path, label, dimension, factor, step, change }) => {
    const text = valueAt(design, path);
    if (typeof text !== 'string') return [];
    const parsed = parseQuantity(text, dimension);
    if (!parsed.ok) return [];
    const value = factor === undefined ? parsed.value + step! : parsed.value * factor;
    const checked = checkDesign(withValue(design, path, formatQuantity(value, dimension)));
    return checked.ok ? [{ path, label, change, design: resolve(checked.design) }] : [];
  });
}
