import { withValue } from '../../src/design/fields';
import type { Design } from '../../src/design/schema';
import { convertTo, parseQuantity } from '../../src/quantity';
import { kindOfElement, type ElementKind } from './parts';

/** Where an element stands along the axis, metres from the first mirror. */
export interface Placed {
  place: number;
  kind: ElementKind;
  from: number;
  to: number;
}

const lengthOf = (text: string | undefined): number => {
  const read = text === undefined ? undefined : parseQuantity(text, 'length');
  return read?.ok ? read.value : 0;
};

/** Geometric layout of the cavity as entered; a length that cannot be read counts as none. */
export function layOut(design: Design): Placed[] {
  const { rod } = design;
  const rodLength = lengthOf(rod.length) + lengthOf(rod.endCaps.front) + lengthOf(rod.endCaps.back);
  let at = 0;
  return design.cavity.elements.map((element, place) => {
    const kind = kindOfElement(element);
    const from = at;
    if (kind === 'rod') at += rodLength;
    else if (kind === 'space') at += lengthOf(element.space);
    else if (kind === 'plate') at += lengthOf(element.plate?.thickness);
    return { place, kind, from, to: at };
  });
}

/** The spaces an element's movement changes: that before it grows, that after it (where it has both) shrinks. */
function spacesBeside(design: Design, place: number): { grows?: number; shrinks?: number } {
  const { elements } = design.cavity;
  const isSpace = (at: number) => elements[at]?.space !== undefined;
  const before = isSpace(place - 1) ? place - 1 : undefined;
  const after = isSpace(place + 1) ? place + 1 : undefined;
  return { grows: before, shrinks: after };
}

export function canMove(design: Design, place: number): boolean {
  const { grows, shrinks } = spacesBeside(design, place);
  return grows !== undefined || shrinks !== undefined;
}

function resized(design: Design, place: number, change: number): Design {
  const text = design.cavity.elements[place]!.space!;
  const read = parseQuantity(text, 'length');
  if (!read.ok) return design;
  const length = Math.max(0, read.value + change);
  const inUnit = convertTo(length, read.unit, 'length');
  const places = Math.max(0, Math.ceil(Math.log10(convertTo(1e-3, read.unit, 'length') ** -1)) + 1);
  return withValue(
    design,
    `cavity.elements.${place}.space`,
    `${Number(inUnit.toFixed(places))} ${read.unit}`,
  );
}

/**
 * The design with an element moved along the axis.
 * @param shift metres, positive away from the first mirror; no space becomes shorter than nothing
 */
export function withMoved(design: Design, place: number, shift: number): Design {
  const { grows, shrinks } = spacesBeside(design, place);
  const room = (at: number | undefined) =>
    at === undefined ? Infinity : lengthOf(design.cavity.elements[at]?.space);
  const allowed = Math.min(Math.max(shift, -room(grows)), room(shrinks));
  let next = design;
  if (grows !== undefined) next = resized(next, grows, allowed);
  if (shrinks !== undefined) next = resized(next, shrinks, -allowed);
  return next;
}
