import type { Design } from '../../src/design/schema';
import { parseQuantity } from '../../src/quantity';
import type { Placed } from '../state/cavity-layout';
import type { CavityScale } from './cavity-scale';

export interface PartShape {
  path: string;
  /** Name with what it is, for a title. */
  label: string;
  name: string;
  /** What is written under it. */
  short: string;
  textX: number;
  anchor: 'start' | 'middle' | 'end';
  /** How far below the axis the words stand, drawing units; lenses have theirs above. */
  textY: number;
}

const half = 68;

const siOf = (text: string) => {
  const read = parseQuantity(text, 'length');
  return read.ok ? read.value : 0;
};

/** Which way a mirror bulges: concave towards the inside of the cavity for a positive radius. */
function mirrorPath(x: number, middle: number, sag: number): string {
  return `M${x} ${middle - half}Q${x + 2 * sag} ${middle} ${x} ${middle + half}`;
}

function lensPath(x: number, middle: number, converging: boolean): string {
  const bulge = converging ? 10 : -5;
  const edge = converging ? 1 : 7;
  const [top, bottom] = [middle - half, middle + half];
  return `M${x - edge} ${top}Q${x - edge - bulge} ${middle} ${x - edge} ${bottom}L${x + edge} ${bottom}Q${x + edge + bulge} ${middle} ${x + edge} ${top}Z`;
}

const boxPath = (from: number, to: number, middle: number, high: number) =>
  `M${from} ${middle - high}H${to}V${middle + high}H${from}Z`;

/**
 * How an element is drawn: curvature by its sense only (at this scale it could not be seen), heights not to scale.
 */
export function partShape(design: Design, part: Placed, scale: CavityScale, middle: number): PartShape {
  const element = design.cavity.elements[part.place]!;
  const [from, to] = [scale.x(part.from), scale.x(part.to)];
  const count = design.cavity.elements.length;
  const first = part.place === 0;
  const last = part.place === count - 1;
  const anchor = first ? 'start' : last ? 'end' : 'middle';
  const textX = first ? from - 20 : last ? from + 20 : (from + to) / 2;
  const at = { textX, anchor, textY: half + 28 } as const;
  if (element.mirror) {
    const { radius } = element.mirror;
    const flat = radius.trim().toLowerCase() === 'flat';
    const inwards = last ? 1 : -1;
    const sag = flat ? 0 : inwards * 9 * Math.sign(siOf(radius));
    const number = design.cavity.elements.slice(0, part.place + 1).filter((other) => other.mirror).length;
    const words = flat ? 'flat' : `R ${radius}`;
    return {
      ...at,
      path: mirrorPath(from, middle, sag),
      name: `mirror ${number}`,
      label: `Mirror ${number}, ${words}`,
      short: words,
    };
  }
  if (element.lens !== undefined)
    return {
      ...at,
      path: lensPath(from, middle, siOf(element.lens) > 0),
      name: 'lens',
      label: `Lens, focal length ${element.lens}`,
      short: `f ${element.lens}`,
      textY: -half - 8,
    };
  if (element.plate)
    return {
      ...at,
      path: boxPath(from, Math.max(to, from + 3), middle, half - 8),
      name: 'plate',
      label: `Plate, ${element.plate.thickness}`,
      short: 'plate',
      textY: half + 42,
    };
  return {
    ...at,
    path: boxPath(from, Math.max(to, from + 4), middle, half - 22),
    name: 'rod',
    label: `Rod, ${design.rod.crystal}, ${design.rod.length}`,
    short: design.rod.crystal,
    textY: first ? half + 28 : half + 42,
  };
}
