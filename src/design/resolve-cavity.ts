import type { CavityElement } from '../cavity';
import { valueOf } from './quantity-field';
import type { ResolvedCavity } from './resolved';
import type { Design, ElementDesign } from './schema';

function elementOf(element: ElementDesign): CavityElement {
  if (element.mirror) {
    const { radius, incidence, transmission } = element.mirror;
    return {
      kind: 'mirror',
      radius: valueOf(radius, 'length', { flat: Number.POSITIVE_INFINITY }),
      incidence: valueOf(incidence, 'angle'),
      transmission: valueOf(transmission, 'dimensionless'),
    };
  }
  if (element.space !== undefined) return { kind: 'space', length: valueOf(element.space, 'length') };
  if (element.lens !== undefined) return { kind: 'lens', focalLength: valueOf(element.lens, 'length') };
  if (!element.plate) return { kind: 'rod' };
  const { thickness, index, incidence } = element.plate;
  return {
    kind: 'plate',
    thickness: valueOf(thickness, 'length'),
    refractiveIndex: index,
    incidence: valueOf(incidence, 'angle', { brewster: Math.atan(index) }),
  };
}

/** Share of the light that leaves through each mirror in a round trip; an inner mirror of a linear cavity is met twice. */
function mirrorLosses(elements: readonly CavityElement[], kind: 'linear' | 'ring'): number[] {
  const last = elements.length - 1;
  return elements.flatMap((element, place) => {
    if (element.kind !== 'mirror') return [];
    const meetings = kind === 'linear' && place > 0 && place < last ? 2 : 1;
    return [1 - (1 - element.transmission) ** meetings];
  });
}

/** The cavity of a design in SI; its output is what leaves through the mirror that lets most of it through. */
export function resolveCavity({ cavity }: Design, pumpRadius: number): ResolvedCavity {
  const { kind } = cavity;
  const elements = cavity.elements.map(elementOf);
  const losses = mirrorLosses(elements, kind);
  const outputCoupling = Math.max(...losses);
  const others = losses.filter((_, place) => place !== losses.indexOf(outputCoupling));
  return {
    kind,
    elements,
    passiveLoss: valueOf(cavity.passiveLoss, 'dimensionless'),
    outputCoupling,
    otherTransmission: 1 - others.reduce((kept, loss) => kept * (1 - loss), 1),
    lensRadius: valueOf(cavity.lensRadius, 'length', { 'pump radius': pumpRadius }),
  };
}
