import type { Fault } from '../errors';
import { faultAt } from './fault';
import { valueOf } from './quantity-field';
import type { Design, ElementDesign } from './schema';

type Cavity = Design['cavity'];

function elementFaults(element: ElementDesign, place: number): Fault[] {
  const path = `cavity.elements.${place}`;
  const given = Object.entries(element).filter(([, value]) => value !== undefined);
  if (given.length !== 1) {
    const holds = given.length === 0 ? 'nothing' : given.map(([key]) => key).join(' and ');
    const sentence = `got ${holds}; an element is exactly one of mirror, space, rod, lens, plate`;
    return [faultAt(path, 'inconsistent', sentence)];
  }
  if (element.lens !== undefined && valueOf(element.lens, 'length') === 0) {
    const sentence = `got "${element.lens}"; a focal length is not zero, negative diverges`;
    return [faultAt(`${path}.lens`, 'out of range', sentence)];
  }
  if (element.mirror && valueOf(element.mirror.radius, 'length', { flat: Infinity }) === 0) {
    const sentence = `got "${element.mirror.radius}"; a flat mirror is "flat"`;
    return [faultAt(`${path}.mirror.radius`, 'out of range', sentence)];
  }
  return [];
}

/** The light of a linear cavity comes back on itself at both ends, so that they stand square to it. */
function endFaults({ elements }: Cavity): Fault[] {
  return [0, elements.length - 1].flatMap((place) => {
    const path = `cavity.elements.${place}`;
    const { mirror } = elements[place]!;
    if (!mirror)
      return [faultAt(path, 'inconsistent', 'a linear cavity begins and ends with a mirror; this is none')];
    if (valueOf(mirror.incidence, 'angle') === 0) return [];
    const sentence = `got "${mirror.incidence}"; an end mirror of a linear cavity is met at 0 deg`;
    return [faultAt(`${path}.mirror.incidence`, 'inconsistent', sentence)];
  });
}

/** Faults of the cavity's elements and of their order. */
export function cavityFaults({ cavity }: Design): Fault[] {
  const { elements, kind } = cavity;
  const faults = elements.flatMap(elementFaults);
  if (faults.length > 0) return faults;
  const rods = elements.filter((element) => element.rod).length;
  if (rods !== 1) {
    const sentence = `got ${rods} rods; exactly one element { "rod": true } is needed`;
    faults.push(faultAt('cavity.elements', 'inconsistent', sentence));
  }
  const mirrors = elements.filter((element) => element.mirror).length;
  if (kind === 'linear') faults.push(...endFaults(cavity));
  else if (mirrors < 3) {
    const sentence = `got ${mirrors} mirrors; a ring needs at least three to close`;
    faults.push(faultAt('cavity.elements', 'inconsistent', sentence));
  }
  return faults;
}
