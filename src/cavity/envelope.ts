import type { CavityElement, Plane, RodOptics } from './elements';
import { rodLength } from './elements';
import type { Beam } from './mode';
import { betaBehind, isStable, passBeam, startingBeam, stepMatrix } from './mode';
import type { PreparedCavity } from './prepare';
import { halfTrace, tripMatrix } from './prepare';
import { identity, plateReducedLength } from './ray-matrix';
import { passRodTo } from './rod-matrix';

export interface EnvelopePoint {
  /** Along the axis from the first element, geometric, m. */
  position: number;
  /** 1/e2 intensity radius normal to the axis, m. */
  radius: number;
  /** Index of the element the point lies in. */
  element: number;
}

/**
 * The mode along the axis, for drawing: through spaces, plates and the slices of the rod; a mirror or a lens
 * gives one point. Inside a plate at an angle the tangential radius is larger by cos(inside) / cos(outside),
 * as refraction at a tilted face has it, so the envelope steps there. A linear cavity is drawn one way.
 *
 * @param wavelength in vacuum, m
 * @param pointsPerElement at least 2, both ends of the element among them
 * @returns points in the order the light meets them; empty when the cavity is unstable in this plane
 */
export function modeEnvelope(
  prepared: PreparedCavity,
  rod: RodOptics,
  plane: Plane,
  wavelength: number,
  pointsPerElement: number,
): EnvelopePoint[] {
  const { kind, elements } = prepared.cavity;
  const trip = identity();
  tripMatrix(prepared, rod, plane, 1, trip);
  const beam: Beam = new Float64Array(3);
  if (!isStable(halfTrace(kind, trip)) || !startingBeam(kind, trip, beam)) return [];
  const unit = wavelength / Math.PI;
  const points: EnvelopePoint[] = [];
  const matrix = identity();
  let position = 0;
  elements.forEach((element, index) => {
    const length = axialLength(element, rod);
    const count = element.kind === 'mirror' || element.kind === 'lens' ? 1 : pointsPerElement;
    const widening = element.kind === 'plate' ? plateWidening(element, plane) : 1;
    for (let i = 0; i < count; i++) {
      const share = count > 1 ? i / (count - 1) : 0;
      passPartly(matrix, element, rod, plane, share);
      const radius = widening * Math.sqrt(betaBehind(beam, matrix) * unit);
      points.push({ position: position + share * length, radius, element: index });
    }
    stepMatrix(prepared, rod, plane, index, matrix);
    passBeam(beam, matrix);
    position += length;
  });
  return points;
}

/**
 * Length of an element along the axis, m: zero for a mirror or a lens, the oblique path for a plate.
 */
export function axialLength(element: CavityElement, rod: RodOptics): number {
  switch (element.kind) {
    case 'space':
      return element.length;
    case 'plate':
      return element.thickness / insideCosine(element.refractiveIndex, element.incidence);
    case 'rod':
      return rodLength(rod);
    case 'mirror':
    case 'lens':
      return 0;
  }
}

function insideCosine(refractiveIndex: number, incidence: number): number {
  return Math.sqrt(1 - (Math.sin(incidence) / refractiveIndex) ** 2);
}

function plateWidening(element: { refractiveIndex: number; incidence: number }, plane: Plane): number {
  if (plane === 'sagittal') return 1;
  return insideCosine(element.refractiveIndex, element.incidence) / Math.cos(element.incidence);
}

/** Sets `matrix` to the first `share` of an element, in terms of the beam outside it. */
function passPartly(
  matrix: Float64Array,
  element: CavityElement,
  rod: RodOptics,
  plane: Plane,
  share: number,
): void {
  matrix.set([1, 0, 0, 1]);
  if (element.kind === 'space') {
    matrix[1] = share * element.length;
  } else if (element.kind === 'plate') {
    const { thickness, refractiveIndex, incidence } = element;
    matrix[1] = share * plateReducedLength(thickness, refractiveIndex, incidence, plane);
  } else if (element.kind === 'rod') {
    passRodTo(matrix, rod, plane, share * rodLength(rod), element.reversed === true);
  }
}
