import type { Fault, FaultKind } from '../errors';
import { coolants, crystals, findCoolant, findCrystal, findInterface, findMountMaterial, interfaces, mountMaterials } from '../materials';
import { nearestName } from '../quantity';
import { valueOf } from './quantity-field';
import type { CoolerDesign, Design, ElementDesign } from './schema';
import { uncertainFaults } from './uncertain';

const fault = (path: string, kind: FaultKind, sentence: string): Fault => ({ path, kind, message: `${path}: ${sentence}` });

function nameFault(path: string, given: string, found: unknown, all: readonly { name: string }[]): Fault[] {
  if (found) return [];
  const names = all.map((item) => item.name);
  const near = nearestName(names, given);
  const hint = near ? `did you mean "${near}"? ` : '';
  return [fault(path, 'unknown name', `"${given.slice(0, 60)}" is not in the catalogue; ${hint}known are ${names.join(', ')}`)];
}

const lengthOf = (text: string) => valueOf(text, 'length');

function sectionFaults(design: Design): Fault[] {
  const { section } = design.rod;
  const key = section.shape === 'round' ? 'diameter' : 'side';
  const size = section[key];
  if (size === undefined)
    return [fault(`rod.section.${key}`, 'missing', `a ${section.shape} section needs its ${key}, such as "3 mm"`)];
  const faults: Fault[] = [];
  const half = lengthOf(size) / 2;
  if (lengthOf(design.pump.radius) >= half)
    faults.push(fault('pump.radius', 'inconsistent', `got "${design.pump.radius}", which does not fit into the rod; it must be less than half its ${key} of "${size}"`));
  const reach = section.shape === 'round' ? half : half * Math.SQRT2;
  if (lengthOf(design.mount.shape.outerRadius) <= reach)
    faults.push(fault('mount.shape.outerRadius', 'inconsistent', `got "${design.mount.shape.outerRadius}", which does not enclose the rod; it must be more than ${(reach * 1e3).toPrecision(4)} mm`));
  return faults;
}

function rodFaults(design: Design): Fault[] {
  const crystal = findCrystal(design.rod.crystal);
  if (!crystal) return nameFault('rod.crystal', design.rod.crystal, crystal, crystals);
  const faults = sectionFaults(design);
  const wanted = lengthOf(design.rod.laserLine);
  const near = crystal.lines.some((line) => Math.abs(line.wavelength - wanted) < 0.004 * wanted);
  if (!near) {
    const known = crystal.lines.map((line) => `${(line.wavelength * 1e9).toFixed(1)} nm`);
    faults.push(fault('rod.laserLine', 'unknown name', `got "${design.rod.laserLine}"; ${crystal.name} is known to lase at ${[...new Set(known)].join(', ')}`));
  }
  if (wanted <= lengthOf(design.pump.wavelength))
    faults.push(fault('rod.laserLine', 'inconsistent', `got "${design.rod.laserLine}", which is not longer than the pump wavelength "${design.pump.wavelength}"`));
  return faults;
}

function coolerFaults(design: Design): Fault[] {
  const faults: Fault[] = [];
  const seen = new Map<string, CoolerDesign>();
  const ids = design.coolers.map((cooler) => cooler.id);
  design.coolers.forEach((cooler, place) => {
    const path = `coolers.${place}`;
    if (seen.has(cooler.id)) faults.push(fault(`${path}.id`, 'inconsistent', `"${cooler.id}" is used twice; each cooler needs a name of its own`));
    seen.set(cooler.id, cooler);
    if ('sink' in cooler) {
      faults.push(...nameFault(`${path}.sink.material`, cooler.sink.material, findMountMaterial(cooler.sink.material), mountMaterials));
      const { sink } = cooler;
      if (sink.finCount * lengthOf(sink.finThickness) >= lengthOf(sink.width))
        faults.push(fault(`${path}.sink.finCount`, 'inconsistent', `${sink.finCount} fins of "${sink.finThickness}" leave no air in a width of "${sink.width}"`));
    }
    if (cooler.kind === 'liquid') faults.push(...nameFault(`${path}.coolant`, cooler.coolant, findCoolant(cooler.coolant), coolants));
  });
  design.coolers.forEach((cooler, place) => {
    if (cooler.kind !== 'tec') return;
    const path = `coolers.${place}.hotSide`;
    const hot = seen.get(cooler.hotSide);
    if (!hot) faults.push(fault(path, 'unknown name', `"${cooler.hotSide}" is not one of the coolers; there are ${ids.join(', ')}`));
    else if (hot.kind === 'tec') faults.push(fault(path, 'inconsistent', `"${cooler.hotSide}" is itself a TEC; a hot side needs fins, a fan, liquid or a plain K/W`));
  });
  const { chosenCooler } = design;
  if (chosenCooler !== undefined && !seen.has(chosenCooler)) {
    const near = nearestName(ids, chosenCooler);
    faults.push(fault('chosenCooler', 'unknown name', `"${chosenCooler}" is not one of the coolers; ${near ? `did you mean "${near}"? ` : ''}there are ${ids.join(', ')}`));
  }
  return faults;
}

function elementFaults(element: ElementDesign, place: number): Fault[] {
  const path = `cavity.elements.${place}`;
  const given = Object.entries(element).filter(([, value]) => value !== undefined);
  if (given.length !== 1)
    return [fault(path, 'inconsistent', `has ${given.length === 0 ? 'nothing' : given.map(([key]) => key).join(' and ')}; each element is one of mirror, space, rod, lens, plate`)];
  if (element.lens !== undefined && lengthOf(element.lens) === 0)
    return [fault(`${path}.lens`, 'out of range', 'a focal length of zero does not exist')];
  if (element.mirror && valueOf(element.mirror.radius, 'length', { flat: 1 }) === 0)
    return [fault(`${path}.mirror.radius`, 'out of range', 'got a radius of zero; a flat mirror is "flat"')];
  return [];
}

function cavityFaults(design: Design): Fault[] {
  const { elements, kind } = design.cavity;
  const faults = elements.flatMap(elementFaults);
  if (faults.length > 0) return faults;
  const rods = elements.filter((element) => element.rod).length;
  if (rods !== 1) faults.push(fault('cavity.elements', 'inconsistent', `there are ${rods} rods; exactly one { "rod": true } is needed`));
  const mirrors = elements.filter((element) => element.mirror).length;
  if (kind === 'linear' && (!elements[0]!.mirror || !elements.at(-1)!.mirror))
    faults.push(fault('cavity.elements', 'inconsistent', 'a linear cavity begins and ends with a mirror'));
  if (kind === 'ring' && mirrors < 3) faults.push(fault('cavity.elements', 'inconsistent', `a ring needs at least three mirrors; there are ${mirrors}`));
  return faults;
}

function pumpFaults(design: Design): Fault[] {
  const { powerRange, polarisation } = design.pump;
  const faults: Fault[] = [];
  if (powerRange && valueOf(powerRange[0], 'power') >= valueOf(powerRange[1], 'power'))
    faults.push(fault('pump.powerRange', 'inconsistent', `"${powerRange[0]}" to "${powerRange[1]}" is no range; the first must be less than the second`));
  if (polarisation !== 'unpolarised' && findCrystal(design.rod.crystal)?.symmetry === 'isotropic')
    faults.push(fault('pump.polarisation', 'inconsistent', `"${polarisation}" has no meaning in the isotropic ${design.rod.crystal}; use "unpolarised"`));
  return faults;
}

/** Faults of what must fit together in a design whose single fields are all in order; empty when there are none. */
export function consistencyFaults(design: Design): Fault[] {
  return [
    ...rodFaults(design),
    ...nameFault('mount.material', design.mount.material, findMountMaterial(design.mount.material), mountMaterials),
    ...nameFault('mount.interface.kind', design.mount.interface.kind, findInterface(design.mount.interface.kind), interfaces),
    ...pumpFaults(design),
    ...coolerFaults(design),
    ...cavityFaults(design),
    ...uncertainFaults(design),
  ];
}
