import ndarray, { type NdArray } from 'ndarray';
import { lagrangeWeights } from '../numerics/lagrange';
import type { RodConduction } from './assemble';
import { temperatureOf } from './conductivity-law';
import type { EndExtrapolation } from './extrapolation';
import type { RodGrid } from './grid';
import type { BoundaryTemperatures } from './model';
import { linkFlux } from './solve-nonlinear';

/** Steady temperatures of a rod and its mount, with what is read from them most often. */
export interface RodField {
  conduction: RodConduction;
  grid: RodGrid;
  boundary: BoundaryTemperatures;
  /** K at the cell centres, length nRadial*nz, cell (i, j) at j*nRadial + i; the mount's cells are i >= nr. */
  temperatures: Float64Array;
  /** The same numbers as a two-dimensional array, view.get(i, j); shape [nRadial, nz]. */
  view: NdArray<Float64Array>;
  /** Rise of the potential (constant conductivity, and in the mount: of the temperature) above the base, K. */
  rise: Float64Array;
  /** Potential of the base temperature, K. */
  basePotential: number;
  /** Hottest point of the rod; always on the axis. */
  peakTemperature: number;
  peakPosition: { r: number; z: number };
  /** Hottest point of the barrel surface of the rod, K. */
  edgeTemperature: number;
  /** W; positive = leaving. `side` is the outer surface of the ring where there is one. */
  heatOut: { side: number; front: number; back: number };
  /** W set free in the rod. */
  generated: number;
}

/** Completes a solution to a field: temperatures, peak, barrel, heat through every surface. */
export function makeField(
  conduction: RodConduction,
  heatPerCell: Float64Array,
  boundary: BoundaryTemperatures,
  basePotential: number,
  rise: Float64Array,
): RodField {
  const { grid } = conduction;
  const temperatures = temperaturesOf(conduction, boundary, basePotential, rise);
  const { edge, side } = barrel(conduction, boundary, basePotential, rise);
  const peak = axisPeak(conduction, boundary, basePotential, rise);
  let generated = 0;
  for (let p = 0; p < heatPerCell.length; p++) generated += heatPerCell[p]!;
  return {
    conduction,
    grid,
    boundary,
    temperatures,
    view: ndarray(temperatures, [grid.nRadial, grid.nz], [1, grid.nRadial]),
    rise,
    basePotential,
    peakTemperature: peak.temperature,
    peakPosition: { r: 0, z: peak.z },
    edgeTemperature: edge,
    heatOut: {
      side,
      front: endHeat(conduction, boundary, basePotential, rise, 'front'),
      back: endHeat(conduction, boundary, basePotential, rise, 'back'),
    },
    generated,
  };
}

function temperaturesOf(
  { grid, law }: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
): Float64Array {
  const { nr, nRadial } = grid;
  const temperatures = new Float64Array(rise.length);
  for (let p = 0; p < rise.length; p++) temperatures[p] = boundary.side + rise[p]!;
  if (law.exponent === 0) return temperatures;
  for (let j = 0; j < grid.nz; j++)
    for (let i = 0; i < nr; i++) {
      const p = j * nRadial + i;
      temperatures[p] = temperatureOf(law, base + rise[p]!);
    }
  return temperatures;
}

/** Heat through the barrel of axial cell j, W. */
export function barrelFlux(
  { grid, law, side }: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
  j: number,
): number {
  const p = j * grid.nRadial + grid.nr - 1;
  const beyond = grid.nMount > 0 ? rise[p + 1]! : 0;
  if (law.exponent === 0) return (rise[p]! - beyond) / (side.inner[j]! + side.outer[j]!);
  return linkFlux(law, side, j, base + rise[p]!, boundary.side + beyond);
}

/** Hottest barrel surface and the heat that reaches the base. */
function barrel(
  conduction: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
): { edge: number; side: number } {
  const { grid, side, mountOut, law } = conduction;
  let hottest = -Infinity;
  let heat = 0;
  for (let j = 0; j < grid.nz; j++) {
    const flux = barrelFlux(conduction, boundary, base, rise, j);
    const last = j * grid.nRadial + grid.nRadial - 1;
    heat += mountOut === null ? flux : mountOut[j]! * rise[last]!;
    hottest = Math.max(hottest, rise[j * grid.nRadial + grid.nr - 1]! - side.inner[j]! * flux);
  }
  return {
    edge: law.exponent === 0 ? boundary.side + hottest : temperatureOf(law, base + hottest),
    side: heat,
  };
}

function endHeat(
  conduction: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
  which: 'front' | 'back',
): number {
  const { grid, law, model } = conduction;
  if (model[which].kind === 'insulated') return 0;
  const links = conduction[which];
  const row = which === 'front' ? 0 : (grid.nz - 1) * grid.nRadial;
  // Differences of rises, not of temperatures, keep the digits of a small heat.
  const air = boundary[which] - boundary.side;
  let heat = 0;
  for (let i = 0; i < grid.nr; i++) {
    if (law.exponent !== 0) heat += linkFlux(law, links, i, base + rise[row + i]!, boundary[which]);
    else heat += (rise[row + i]! - air) / (links.inner[i]! + links.outer[i]!);
  }
  return heat;
}

/** Rise of the potential on the axis in the row of axial cell j, K. */
export function axisRise({ grid, axis }: RodConduction, rise: Float64Array, j: number): number {
  const p = j * grid.nRadial;
  return axis[0]! * rise[p]! + axis[1]! * rise[p + 1]! + axis[2]! * rise[p + 2]!;
}

/** Value on an end face from the three cells behind it, nearest first. */
export function faceValue(face: EndExtrapolation, a: number, b: number, c: number, air: number): number {
  return face.cells[0]! * a + face.cells[1]! * b + face.cells[2]! * c + face.air * air;
}

/** Hottest point of the axis: a face, or the vertex of the parabola through the hottest cell and its neighbours. */
function axisPeak(
  conduction: RodConduction,
  boundary: BoundaryTemperatures,
  base: number,
  rise: Float64Array,
): { temperature: number; z: number } {
  const { grid, law } = conduction;
  const { nz } = grid;
  const at = new Float64Array(nz + 2);
  for (let j = 0; j < nz; j++) at[j + 1] = axisRise(conduction, rise, j);
  at[0] = faceValue(conduction.frontFace, at[1]!, at[2]!, at[3]!, boundary.front - boundary.side);
  at[nz + 1] = faceValue(
    conduction.backFace,
    at[nz]!,
    at[nz - 1]!,
    at[nz - 2]!,
    boundary.back - boundary.side,
  );
  let best = 0;
  for (let k = 1; k < nz + 2; k++) if (at[k]! > at[best]!) best = k;
  let z = axialNode(grid, best);
  let top = at[best]!;
  if (best > 0 && best < nz + 1) [z, top] = summit(grid, at, best);
  return { temperature: law.exponent === 0 ? boundary.side + top : temperatureOf(law, base + top), z };
}

/** Place and height of the maximum of the quartic through the hottest node and its neighbours. */
function summit(grid: RodGrid, at: Float64Array, best: number): [number, number] {
  const count = Math.min(5, at.length);
  const start = Math.max(0, Math.min(at.length - count, best - 2));
  const nodes = new Float64Array(count);
  for (let k = 0; k < count; k++) nodes[k] = axialNode(grid, start + k);
  const weights = new Float64Array(count);
  const height = (z: number) => {
    lagrangeWeights(z, nodes, 0, count, weights);
    let sum = 0;
    for (let k = 0; k < count; k++) sum += weights[k]! * at[start + k]!;
    return sum;
  };
  const below = nodes[best - start - 1]!;
  const above = nodes[best - start + 1]!;
  let z = nodes[best - start]!;
  let top = at[best]!;
  // Parabolas through ever closer triples; three steps place the summit to a hundredth of a cell.
  for (let reach = (above - below) / 4, step = 0; step < 3; step++, reach /= 4) {
    const left = height(z - reach);
    const right = height(z + reach);
    const bend = left - 2 * top + right;
    if (!(bend < 0)) break;
    const move = (0.5 * (left - right)) / bend;
    z = Math.min(above, Math.max(below, z + move * reach));
    top = Math.max(top, height(z));
  }
  return [z, top];
}

/** Axial position k = 0 pumped face, 1 ... nz cell centres, nz + 1 far face. */
export function axialNode(grid: RodGrid, k: number): number {
  if (k === 0) return 0;
  return k > grid.nz ? grid.axialFaces[grid.nz]! : grid.axialCentres[k - 1]!;
}
