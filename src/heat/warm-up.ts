import { type BandedFactor, solveBanded } from '../numerics/banded';
import { type RodConduction, factorWith, ringArea } from './assemble';
import { potentialOf } from './conductivity-law';
import { type RodField, makeField } from './field';
import type { RodGrid } from './grid';
import type { BoundaryTemperatures } from './model';
import { drive } from './solve';

/** Density times specific heat, J/(m^3 K). */
export interface HeatCapacity {
  rod: number;
  /** Of the ring; needed only where there is one. */
  mount?: number;
}

/** A rod on its way to the steady state. */
export interface WarmUp {
  conduction: RodConduction;
  boundary: BoundaryTemperatures;
  /** J/K of every cell, length nRadial*nz. */
  storage: Float64Array;
  /** Rise above the base, K, length nRadial*nz. */
  rise: Float64Array;
  /** s since the start, and since heat or surroundings last changed. */
  time: number;
  sinceChange: number;
  /** Length of the first stretch after a change, s; below it the field has hardly begun to spread. */
  firstStretch: number;
}

/** Steps in each doubling of the time since the last change. */
const stepsPerDoubling = 10;

/** Diagonal coefficient of the time steps, 1 - 1/sqrt(2). */
const gamma = 1 - Math.SQRT1_2;

/**
 * Begins a warm-up (or a cool-down) from a uniform temperature or from a field on the same grid.
 * Constant conductivity only: with one that varies, give the model its value at the working temperature.
 * @param initial K, or a field
 */
export function startWarmUp(
  conduction: RodConduction,
  capacity: HeatCapacity,
  boundary: BoundaryTemperatures,
  initial: number | RodField,
): WarmUp {
  const { grid, law, model } = conduction;
  if (law.exponent !== 0) throw new Error('A warm-up needs a constant conductivity.');
  const temperatures = typeof initial === 'number' ? undefined : initial.temperatures;
  const uniform = typeof initial === 'number' ? initial : 0;
  const rise = Float64Array.from(
    { length: grid.nRadial * grid.nz },
    (_, p) => (temperatures?.[p] ?? uniform) - boundary.side,
  );
  // About the size of the pump; equally spaced radii have a scale far beyond the rod.
  const spot = Math.min(grid.radialScale, model.radius / 7);
  return {
    conduction,
    boundary,
    storage: cellStorage(grid, capacity),
    rise,
    time: 0,
    sinceChange: 0,
    firstStretch: (0.5 * spot ** 2 * capacity.rod) / model.conductivityRadial,
  };
}

/** J/K of every cell. */
function cellStorage(grid: RodGrid, capacity: HeatCapacity): Float64Array {
  const { nr, nz, nRadial, nMount, mountFaces, axialFaces } = grid;
  const perLength = Float64Array.from({ length: nRadial }, (_, i) => {
    if (i < nr) return capacity.rod * ringArea(grid, i);
    const k = i - nr;
    return (capacity.mount ?? 0) * Math.PI * (mountFaces[k + 1]! ** 2 - mountFaces[k]! ** 2);
  });
  if (nMount > 0 && !((capacity.mount ?? 0) > 0)) throw new Error('A ring needs its heat capacity.');
  const storage = new Float64Array(nRadial * nz);
  for (let j = 0; j < nz; j++)
    for (let i = 0; i < nRadial; i++)
      storage[j * nRadial + i] = perLength[i]! * (axialFaces[j + 1]! - axialFaces[j]!);
  return storage;
}

/**
 * Follows the temperatures for a while under steady heat and surroundings. Time steps grow with the time since the last
 * change: a fixed number in each doubling of it.
 *
 * Each step is second order and damps fast modes: (C/(gamma dt) + K) u1 = C u0/(gamma dt) + b, then the same matrix with
 * u0 + (1 - gamma)(u1 - u0)/gamma.
 * @param heatPerCell W, length nRadial*nz
 * @param duration s
 * @param changed heat or surroundings differ from those of the call before, so small steps are needed again
 * @returns the field at the end; `heatOut` and `generated` are momentary and differ by what is stored
 * @source Alexander, SIAM J. Numer. Anal. 14, 1006 (1977), two-stage method (from memory)
 */
export function advance(
  warmUp: WarmUp,
  heatPerCell: Float64Array,
  duration: number,
  changed = false,
  boundary: BoundaryTemperatures = warmUp.boundary,
): RodField {
  const { conduction } = warmUp;
  if (changed) warmUp.sinceChange = 0;
  const shift = warmUp.boundary.side - boundary.side;
  if (shift !== 0) warmUp.rise = warmUp.rise.map((value) => value + shift);
  warmUp.boundary = boundary;
  const source = drive(conduction, heatPerCell, boundary);
  let rest = duration;
  while (rest > duration * 1e-12) {
    const doubling = Math.max(warmUp.firstStretch, warmUp.sinceChange);
    const stretch = Math.min(rest, doubling);
    const steps = Math.max(1, Math.ceil((stepsPerDoubling * stretch) / doubling - 1e-9));
    stepThrough(warmUp, source, stretch / steps, steps);
    warmUp.time += stretch;
    warmUp.sinceChange += stretch;
    rest -= stretch;
  }
  const base = potentialOf(conduction.law, boundary.side);
  return makeField(conduction, heatPerCell, boundary, base, Float64Array.from(warmUp.rise));
}

function stepThrough(warmUp: WarmUp, source: Float64Array, dt: number, steps: number): void {
  const { conduction, storage } = warmUp;
  const perStep = storage.map((capacity) => capacity / (gamma * dt));
  const slopes = { side: 1, front: 1, back: 1 };
  const factor = factorWith(conduction.model, conduction.grid, conduction, slopes, perStep);
  for (let step = 0; step < steps; step++) warmUp.rise = oneStep(factor, perStep, source, warmUp.rise);
}

function oneStep(
  factor: BandedFactor,
  perStep: Float64Array,
  source: Float64Array,
  rise: Float64Array,
): Float64Array {
  const stage = new Float64Array(rise.length);
  for (let p = 0; p < rise.length; p++) stage[p] = perStep[p]! * rise[p]! + source[p]!;
  solveBanded(factor, stage);
  const ahead = (1 - gamma) / gamma;
  for (let p = 0; p < rise.length; p++) {
    stage[p] = perStep[p]! * (rise[p]! + ahead * (stage[p]! - rise[p]!)) + source[p]!;
  }
  return solveBanded(factor, stage);
}
