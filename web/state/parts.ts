import type { CoolerDesign, Design, ElementDesign } from '../../src/design/schema';
import { convertTo, parseQuantity } from '../../src/quantity';

/** Parts of a design that can be added and taken away: cavity elements and coolers. */
export type ElementKind = 'space' | 'mirror' | 'lens' | 'plate' | 'rod';

const newElement: Record<ElementKind, ElementDesign> = {
  space: { space: '50 mm' },
  mirror: { mirror: { radius: '200 mm', transmission: '0.1 %', incidence: '10 deg' } },
  lens: { lens: '200 mm' },
  plate: { plate: { thickness: '3 mm', index: 1.45, incidence: 'Brewster' } },
  rod: { rod: true },
};

export function kindOfElement(element: ElementDesign): ElementKind {
  if (element.rod) return 'rod';
  if (element.space !== undefined) return 'space';
  if (element.lens !== undefined) return 'lens';
  return element.plate ? 'plate' : 'mirror';
}

const withElements = (design: Design, elements: ElementDesign[]): Design => ({
  ...design,
  cavity: { ...design.cavity, elements },
});

/** An element before the one at `place`: a new one of a kind, or one that is given. */
export function withNewElement(
  design: Design,
  place: number,
  kind: ElementKind,
  element = newElement[kind],
): Design {
  const { elements } = design.cavity;
  return withElements(design, [...elements.slice(0, place), element, ...elements.slice(place)]);
}

/** Half of a space, in the unit it was written in. */
function halved(space: string): string {
  const read = parseQuantity(space, 'length');
  return read.ok
    ? `${Number((convertTo(read.value, read.unit, 'length') / 2).toPrecision(6))} ${read.unit}`
    : space;
}

/**
 * A new element where there is room for it: in the middle of the space before `place`, or just before `place` where
 * there is none.
 */
export function withElementInside(design: Design, place: number, kind: ElementKind): Design {
  const { elements } = design.cavity;
  const space = elements[place - 1]?.space;
  if (space === undefined || kind === 'space') return withNewElement(design, place, kind);
  const half = { space: halved(space) };
  return withElements(design, [
    ...elements.slice(0, place - 1),
    half,
    newElement[kind],
    half,
    ...elements.slice(place),
  ]);
}

export function withoutElement(design: Design, place: number): Design {
  return withElements(
    design,
    design.cavity.elements.filter((_, other) => other !== place),
  );
}

const sink = {
  width: '80 mm',
  height: '80 mm',
  finHeight: '25 mm',
  finCount: 20,
  finThickness: '1 mm',
  material: 'aluminium 6061',
  emissivity: 0.85,
  orientation: 'vertical' as const,
};

function newCooler(kind: CoolerDesign['kind'], id: string, hotSide: string): CoolerDesign {
  switch (kind) {
    case 'passive':
      return { id, kind, sink };
    case 'fan':
      return { id, kind, sink, fan: { freeFlow: '60 m^3/h', shutOffPressure: '45 Pa', power: '3 W' } };
    case 'liquid':
      return {
        id,
        kind,
        coolant: 'water',
        channel: { diameter: '4 mm', length: '160 mm', parallel: 1 },
        flow: '1 L/min',
        supply: { kind: 'chiller', setPoint: '20 degC', capacity: '300 W' },
      };
    case 'tec':
      return {
        id,
        kind,
        module: { couples: 127, legSide: '1.4 mm', legHeight: '1.6 mm', count: 1 },
        setTemperature: '20 degC',
        highestCurrent: '5 A',
        hotSide,
      };
    case 'resistance':
      return { id, kind, resistance: '0.5 K/W' };
  }
}

/** A design with one more cooler of a kind, under a name not yet taken. */
export function withNewCooler(design: Design, kind: CoolerDesign['kind']): Design {
  const taken = new Set(design.coolers.map((cooler) => cooler.id));
  let id: string = kind;
  for (let count = 2; taken.has(id); count += 1) id = `${kind} ${count}`;
  const hotSide = design.coolers.find((cooler) => cooler.kind !== 'tec')?.id ?? '';
  return { ...design, coolers: [...design.coolers, newCooler(kind, id, hotSide)] };
}

export function withoutCooler(design: Design, place: number): Design {
  const coolers = design.coolers.filter((_, other) => other !== place);
  const gone = design.coolers[place]!.id;
  return {
    ...design,
    coolers,
    chosenCooler: design.chosenCooler === gone ? coolers[0]?.id : design.chosenCooler,
  };
}
