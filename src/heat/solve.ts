import { solveBanded } from '../numerics/banded';
import type { RodConduction } from './assemble';
import { potentialOf } from './conductivity-law';
import { type RodField, makeField } from './field';
import type { BoundaryTemperatures } from './model';
import { solveNonlinear } from './solve-nonlinear';

/**
 * Steady temperatures of rod and mount for one heat source.
 *
 * @param heatPerCell W, length nRadial*nz, cell (i, j) at j*nRadial + i; not changed
 * @param start a neighbouring solution on the same grid; saves steps where the conductivity depends on temperature
 * @throws NumericalError when a temperature-dependent conductivity does not converge
 */
export function solveRod(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
  start?: RodField,
): RodField {
  const law = conduction.law;
  const base = potentialOf(law, boundary.side);
  // Unknown: potential (ring: temperature) above that of the base, so that rounding is relative to the rise.
  const rise =
    law.exponent === 0
      ? solveLinear(conduction, heatPerCell, boundary)
      : solveNonlinear(conduction, heatPerCell, boundary, start?.rise);
  return makeField(conduction, heatPerCell, boundary, base, rise);
}

function solveLinear(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
): Float64Array {
  const right = drive(conduction, heatPerCell, boundary);
  const rise = solveBanded(conduction.factor, Float64Array.from(right));
  return closeBalance(conduction, right, rise);
}

/**
 * One correction of the level of all temperatures alike, by what rounding leaves between heat set free and heat let out.
 * It matters where a body conducts well and its cooling is weak: then the level is what a direct solve knows least well.
 */
function closeBalance(conduction: RodConduction, right: Float64Array, rise: Float64Array): Float64Array {
  const { grid, side, front, back, mountOut } = conduction;
  const { nr, nz, nRadial } = grid;
  const last = (nz - 1) * nRadial;
  let missing = 0;
  let conductance = 0;
  for (let p = 0; p < right.length; p++) missing += right[p]!;
  for (let j = 0; j < nz; j++) {
    const out = mountOut === null ? 1 / (side.inner[j]! + side.outer[j]!) : mountOut[j]!;
    missing -= out * rise[j * nRadial + nRadial - 1]!;
    conductance += out;
  }
  for (let i = 0; i < nr; i++) {
    const ahead = 1 / (front.inner[i]! + front.outer[i]!);
    const behind = 1 / (back.inner[i]! + back.outer[i]!);
    missing -= ahead * rise[i]! + behind * rise[last + i]!;
    conductance += ahead + behind;
  }
  const level = missing / conductance;
  for (let p = 0; p < rise.length; p++) rise[p] = rise[p]! + level;
  return rise;
}

/** Right-hand side for the rise above the base: heat, and what the air at the ends brings in, W, length nRadial*nz. */
export function drive(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
): Float64Array {
  const { grid, front, back } = conduction;
  const { nr, nz, nRadial } = grid;
  const right = Float64Array.from(heatPerCell);
  const frontRise = boundary.front - boundary.side;
  const backRise = boundary.back - boundary.side;
  const last = (nz - 1) * nRadial;
  for (let i = 0; i < nr; i++) {
    right[i] = right[i]! + frontRise / (front.inner[i]! + front.outer[i]!);
    right[last + i] = right[last + i]! + backRise / (back.inner[i]! + back.outer[i]!);
  }
  return right;
}
