import { type RodField, type RodGrid, barrelFlux, temperatureOf, temperatureSlope } from '../heat';
import type { LensGeometry } from './geometry';

/**
 * G = -dT/d(r^2) at the outer face of every ring, from the fluxes between cells.
 * @param out receives the result if given
 * @returns K/m^2, length nr*nz, ring f of axial cell j at j*nr + f; the last of a row is the barrel
 */
export function faceGradients(
  field: RodField,
  geometry: LensGeometry,
  out: Float64Array = new Float64Array(field.grid.nr * field.grid.nz),
): Float64Array {
  const { grid, rise, conduction, boundary, basePotential } = field;
  const { nr, nz, nRadial } = grid;
  const { inverseGaps } = geometry;
  const { radius, conductivityRadial } = conduction.model;
  for (let j = 0; j < nz; j++) {
    const row = j * nRadial;
    const target = j * nr;
    for (let f = 0; f + 1 < nr; f++)
      out[target + f] = (rise[row + f]! - rise[row + f + 1]!) * inverseGaps[f]!;
    const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
    const flux = barrelFlux(conduction, boundary, basePotential, rise, j);
    out[target + nr - 1] = flux / (4 * Math.PI * conductivityRadial * radius ** 2 * dz);
  }
  if (conduction.law.exponent !== 0) toTemperature(field, out);
  return out;
}

/** Turns gradients of the potential into gradients of the temperature: times dT/dtheta at the face. */
function toTemperature(field: RodField, gradients: Float64Array): void {
  const { grid, rise, conduction, basePotential } = field;
  const { law } = conduction;
  for (let j = 0; j < grid.nz; j++)
    for (let f = 0; f < grid.nr; f++) {
      const potential = basePotential + faceRise(grid, rise, j, f);
      const slope = temperatureSlope(law, temperatureOf(law, potential));
      gradients[j * grid.nr + f] = gradients[j * grid.nr + f]! * slope;
    }
}

/** Rise half-way between cells f and f + 1, by the cubic through four cells; mirrored at the axis, straight at the barrel. */
function faceRise(grid: RodGrid, rise: Float64Array, j: number, f: number): number {
  const row = j * grid.nRadial;
  const { nr } = grid;
  if (f >= nr - 2) {
    const last = rise[row + nr - 1]!;
    const slope = last - rise[row + nr - 2]!;
    return f === nr - 2 ? last - slope / 2 : last + slope / 2;
  }
  const below = rise[row + Math.max(0, f - 1)]!;
  return (9 * (rise[row + f]! + rise[row + f + 1]!) - below - rise[row + f + 2]!) / 16;
}
