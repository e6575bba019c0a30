import { NumericalError } from '../errors';
import { solveBanded } from '../numerics/banded';
import { type Links, type RodConduction, factorWith, linkConductance } from './assemble';
import { type ConductivityLaw, potentialOf, temperatureOf, temperatureSlope } from './conductivity-law';
import type { BoundaryTemperatures } from './model';

/**
 * Heat through a surface link, W: the F for which T(theta_cell - inner F) - outer F equals the temperature beyond.
 *
 * @param potential theta of the cell next to the surface, K
 * @param beyond temperature on the other side, K
 */
export function linkFlux(
  law: ConductivityLaw,
  links: Links,
  index: number,
  potential: number,
  beyond: number,
): number {
  const inner = links.inner[index]!;
  const outer = links.outer[index]!;
  if (outer === Infinity) return 0;
  if (outer === 0) return (potential - potentialOf(law, beyond)) / inner;
  if (law.exponent === 0) return (temperatureOf(law, potential) - beyond) / (inner + outer);
  // Newton from the surface that carries no heat: the function is monotonic and nearly linear over one half-cell.
  let flux = 0;
  for (let step = 0; step < 50; step++) {
    const surface = temperatureOf(law, potential - inner * flux);
    const change = (surface - beyond - outer * flux) / (inner * temperatureSlope(law, surface) + outer);
    flux += change;
    if (Math.abs(change) <= 1e-14 * Math.abs(flux)) return flux;
    if (!Number.isFinite(change)) break;
  }
  if (Number.isFinite(flux)) return flux;
  throw new NumericalError(
    'surface of a rod whose conductivity falls too fast to carry its heat',
    flux,
    index,
  );
}

/** Temperatures near 300 K carry no more digits than this, K. */
const roundingOfTemperature = 2e-12;

/** Surface slopes in use and the factor that belongs to them. */
interface Linearisation {
  factor: RodConduction['factor'];
  side: Float64Array;
  front: Float64Array;
  back: Float64Array;
}

/**
 * Conductivity k_300 (300 K/T)^m: the interior is linear in Kirchhoff's potential, only the surfaces are not. Chord
 * steps on the factored matrix; where dT/dtheta at a surface has moved by more than a fifth, the surfaces are linearised
 * anew at their present temperature (Newton) and the matrix is factored again.
 * @param start a rise to begin with, from a neighbouring solution
 * @returns rise of the potential (ring: of the temperature) above that of the base, K
 */
export function solveNonlinear(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
  start?: Float64Array,
): Float64Array {
  const { grid } = conduction;
  const base = potentialOf(conduction.law, boundary.side);
  let line: Linearisation = {
    factor: conduction.factor,
    side: new Float64Array(grid.nz).fill(1),
    front: new Float64Array(grid.nr).fill(1),
    back: new Float64Array(grid.nr).fill(1),
  };
  let rise = Float64Array.from(start ?? new Float64Array(heatPerCell.length));
  let change = Infinity;
  for (let step = 0; step < 80; step++) {
    const next = chordStep(conduction, heatPerCell, boundary, base, rise, line);
    holdBack(conduction, base, rise, next);
    change = 0;
    let largest = 0;
    for (let p = 0; p < next.length; p++) {
      change = Math.max(change, Math.abs(next[p]! - rise[p]!));
      largest = Math.max(largest, Math.abs(next[p]!));
    }
    rise = next;
    if (!(change < Infinity)) break;
    // Every further change is at least four times smaller: what is left is below 1e-12 of the rise, or of rounding size.
    if (change <= Math.max(4e-12 * largest, roundingOfTemperature)) return rise;
    const slopes = surfaceSlopes(conduction, boundary, base, rise);
    if (hasMoved(slopes, line)) {
      line = { factor: factorWith(conduction.model, grid, conduction, slopes), ...slopes };
    }
  }
  throw new NumericalError('conduction with temperature-dependent conductivity', change);
}

/** Halves a step that would make a cell next to a surface hotter than anything solid, or of no temperature at all. */
function holdBack(conduction: RodConduction, base: number, rise: Float64Array, next: Float64Array): void {
  const { grid, law } = conduction;
  const ceiling = 2e4;
  for (let halving = 0; halving < 60; halving++) {
    let hottest = 0;
    for (let j = 0; j < grid.nz; j++) {
      hottest = Math.max(hottest, temperatureOf(law, base + next[j * grid.nRadial + grid.nr - 1]!));
    }
    if (hottest <= ceiling) return;
    for (let p = 0; p < next.length; p++) next[p] = (next[p]! + rise[p]!) / 2;
  }
}

function hasMoved(slopes: Omit<Linearisation, 'factor'>, line: Linearisation): boolean {
  for (const surface of ['side', 'front', 'back'] as const)
    for (let k = 0; k < slopes[surface].length; k++) {
      const ratio = slopes[surface][k]! / line[surface][k]!;
      if (ratio > 1.2 || ratio < 0.8) return true;
    }
  return false;
}

/** Right-hand side with the difference between linearised and true surface flux, then one solve. */
function chordStep(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
  line: Linearisation,
): Float64Array<ArrayBuffer> {
  const { grid, law, side, front, back } = conduction;
  const { nr, nz, nRadial, nMount } = grid;
  const right = Float64Array.from(heatPerCell);
  for (let j = 0; j < nz; j++) {
    const p = j * nRadial + nr - 1;
    const beyond = nMount > 0 ? rise[p + 1]! : 0;
    const through = linkFlux(law, side, j, base + rise[p]!, boundary.side + beyond);
    const excess = linkConductance(side, j, line.side[j]!) * (rise[p]! - beyond) - through;
    right[p] = right[p]! + excess;
    if (nMount > 0) right[p + 1] = right[p + 1]! - excess;
  }
  const last = (nz - 1) * nRadial;
  for (let i = 0; i < nr; i++) {
    const atFront = linkFlux(law, front, i, base + rise[i]!, boundary.front);
    const atBack = linkFlux(law, back, i, base + rise[last + i]!, boundary.back);
    right[i] = right[i]! + linkConductance(front, i, line.front[i]!) * rise[i]! - atFront;
    right[last + i] = right[last + i]! + linkConductance(back, i, line.back[i]!) * rise[last + i]! - atBack;
  }
  return solveBanded(line.factor, right) as Float64Array<ArrayBuffer>;
}

/** dT/dtheta at every place of the barrel and the end faces. */
function surfaceSlopes(
  conduction: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
): Omit<Linearisation, 'factor'> {
  const { grid, law, side, front, back } = conduction;
  const { nr, nz, nRadial, nMount } = grid;
  const slopeAt = (links: Links, k: number, p: number, beyond: number) => {
    // Insulated and fixed surfaces are linear in the potential whatever their slope.
    if (links.outer[k] === Infinity || links.outer[k] === 0) return 1;
    const flux = linkFlux(law, links, k, base + rise[p]!, beyond);
    return temperatureSlope(law, temperatureOf(law, base + rise[p]! - links.inner[k]! * flux));
  };
  const last = (nz - 1) * nRadial;
  return {
    side: Float64Array.from({ length: nz }, (_, j) => {
      const p = j * nRadial + nr - 1;
      return slopeAt(side, j, p, boundary.side + (nMount > 0 ? rise[p + 1]! : 0));
    }),
    front: Float64Array.from({ length: nr }, (_, i) => slopeAt(front, i, i, boundary.front)),
    back: Float64Array.from({ length: nr }, (_, i) => slopeAt(back, i, last + i, boundary.back)),
  };
}
