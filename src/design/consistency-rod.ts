import type { Fault } from '../errors';
import { crystals, findCrystal, nearestName, type Crystal } from '../materials';
import { convertTo } from '../quantity';
import { faultAt, unknownName } from './fault';
import { listed } from './field-note';
import { linesNear, linesOfCut } from './laser-line';
import { valueOf } from './quantity-field';
import type { Design } from './schema';

const lengthOf = (text: string) => valueOf(text, 'length');

/** What of a mount does not enclose a rod that reaches so far from its axis, m. */
function mountFaults(shape: Design['mount']['shape'], reach: number): Fault[] {
  if (shape.kind === 'none') return [];
  const { kind, ...sizes } = shape;
  return Object.entries(sizes).flatMap(([key, size]) => {
    const needed = key === 'width' ? 2 * reach : reach;
    if (lengthOf(size) > needed) return [];
    const least = `${Number(convertTo(needed, 'mm', 'length').toPrecision(4))} mm`;
    const sentence = `got "${size}", so that the ${kind} does not enclose the rod; it must be more than ${least}`;
    return [faultAt(`mount.shape.${key}`, 'inconsistent', sentence)];
  });
}

/** What must lie inside what: the pump in the rod, the rod in the mount. */
function sectionFaults({ rod, pump, mount }: Design): Fault[] {
  const { section } = rod;
  const key = section.shape === 'round' ? 'diameter' : 'side';
  const size = section[key];
  if (size === undefined) {
    const sentence = `missing; a ${section.shape} section needs its ${key}, such as "3 mm"`;
    return [faultAt(`rod.section.${key}`, 'missing', sentence)];
  }
  const half = lengthOf(size) / 2;
  const faults = mountFaults(mount.shape, section.shape === 'round' ? half : half * Math.SQRT2);
  if (lengthOf(pump.radius) >= half) {
    const sentence = `got "${pump.radius}", which does not fit into the rod; it must be less than half its ${key} of "${size}"`;
    faults.unshift(faultAt('pump.radius', 'inconsistent', sentence));
  }
  return faults;
}

function lineFaults({ rod, pump }: Design, crystal: Crystal): Fault[] {
  const got = `got "${rod.laserLine}"`;
  const near = linesNear(crystal, lengthOf(rod.laserLine));
  if (near.length === 0) {
    const known = new Set(crystal.lines.map((line) => `${(line.wavelength * 1e9).toFixed(1)} nm`));
    const sentence = `${got}; ${crystal.name} is known to lase at ${listed([...known])}`;
    return [faultAt('rod.laserLine', 'unknown name', sentence)];
  }
  if (linesOfCut(crystal, near, rod.cut).length === 0) {
    const sentence = `got "c", but ${crystal.name} is known to emit "${rod.laserLine}" only along its optic axis, which then lies along the rod; use "a" or another laser line`;
    return [faultAt('rod.cut', 'inconsistent', sentence)];
  }
  if (lengthOf(rod.laserLine) > lengthOf(pump.wavelength)) return [];
  const sentence = `${got}, which is not longer than the pump wavelength "${pump.wavelength}"`;
  return [faultAt('rod.laserLine', 'inconsistent', sentence)];
}

/** Faults of crystal, laser line and section. */
export function rodFaults(design: Design): Fault[] {
  const { crystal: name } = design.rod;
  const crystal = findCrystal(name);
  if (crystal) return [...sectionFaults(design), ...lineFaults(design, crystal)];
  const known = crystals.map((item) => item.name);
  return [unknownName('rod.crystal', name, known, nearestName(crystals, name))];
}
