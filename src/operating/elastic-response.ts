import type { ResolvedDesign } from '../design/resolved';
import {
  bulgePower,
  peakTensile,
  rodTemperature,
  solveElastic,
  type PlacedValue,
  type StressField,
} from '../elastic';
import { heatSource, solveRod, type RodConduction, type RodField, type RodGrid } from '../heat';
import { stressAlongRod, type StressAlongRod } from '../lens';
import { sumOf } from './absorbed';
import { elasticBase, keyOf, type ElasticBase } from './elastic-base';
import { answerTo, heldBy, type Column, type HeldColumn } from './elastic-column';
import type { PumpSpread } from './pump-spread';

/** Stretches of the doped part whose heat is answered one by one, where its spread along the rod can change. */
const mostStretches = 8;

/**
 * Stress and face bulge as linear answers to the heat of each stretch of the rod, solved once per design. Inside a
 * stretch the heat keeps the spread it has at the diode's nominal wavelength. Stress does not depend on the level of
 * the temperature, so base and air temperature do not enter; what the faces lose to the air is part of each answer.
 * A clamped barrel does feel the level: it was free of force at the temperature of the air, so the answer to a base one kelvin
 * above the air is added as often as the base is warmer.
 */
export interface ElasticResponse {
  base: ElasticBase;
  mesh: StressField['mesh'];
  columns: Column[];
  /** What the mount adds whatever the heat: its pressure, or a base warmer than the rod was clamped at. */
  held: HeldColumn[];
  /** First axial cell of each stretch, and the end of the last. */
  starts: number[];
}

export interface ElasticState {
  peakTensile: PlacedValue;
  /** Greatest radial stress on the barrel, Pa; > 0 where a clamping bore would have to pull. */
  barrelTension: number;
  /** Integrated along the rod, for the photoelastic path. */
  along: StressAlongRod;
  /** Dioptric power of the bulge of each face, 1/m. */
  front: number;
  back: number;
}

function stretches(grid: RodGrid, held: boolean): number[] {
  const cells = grid.dopedTo - grid.dopedFrom;
  const count = held ? 1 : Math.min(mostStretches, cells);
  return Array.from({ length: count + 1 }, (_, k) => grid.dopedFrom + Math.round((cells * k) / count));
}

function columnOf(
  base: ElasticBase,
  index: number,
  conduction: RodConduction,
  pump: PumpSpread,
  deposit: Float64Array,
): Column {
  const source = heatSource(conduction.grid, pump.heatShares, deposit, 1);
  const field = solveRod(conduction, source, { side: 0, front: 0, back: 0 });
  return answerTo(base, base.assembled, index, field);
}

/**
 * @param nominal share of the light that each axial cell absorbs at the diode's nominal wavelength
 * @param held whether the heat always lies along the rod as it does there
 * @param like a response whose stiffness may be used again where the rod is the same
 */
export function prepareElastic(
  resolved: ResolvedDesign,
  conduction: RodConduction,
  pump: PumpSpread,
  nominal: Float64Array,
  held: boolean,
  like?: ElasticResponse,
): ElasticResponse {
  const { grid } = conduction;
  const base =
    like && like.base.key === keyOf(resolved, grid) ? like.base : elasticBase(resolved, conduction);
  // Answers add up only where conduction is linear; otherwise every point is solved by itself.
  const linear = conduction.law.exponent === 0;
  const starts = linear ? stretches(grid, held) : [];
  const columns = starts.slice(1).map((end, k) => {
    const part = new Float64Array(grid.nz);
    const from = starts[k]!;
    const total = sumOf(nominal.subarray(from, end));
    for (let j = from; j < end; j++) part[j] = total > 0 ? nominal[j]! / total : 1 / (end - from);
    return columnOf(base, resolved.rod.refractiveIndex, conduction, pump, part);
  });
  return {
    base,
    mesh: base.assembled.mesh,
    columns,
    held: linear ? heldBy(base, resolved, conduction) : [],
    starts,
  };
}

const emptyAlong = ({ radii }: StressAlongRod): StressAlongRod => ({
  radii,
  radial: new Float64Array(radii.length),
  hoop: new Float64Array(radii.length),
  axial: new Float64Array(radii.length),
});

function addAlong(sum: StressAlongRod, weight: number, part: StressAlongRod): void {
  for (let i = 0; i < sum.radii.length; i++) {
    sum.radial[i] = sum.radial[i]! + weight * part.radial[i]!;
    sum.hoop[i] = sum.hoop[i]! + weight * part.hoop[i]!;
    sum.axial[i] = sum.axial[i]! + weight * part.axial[i]!;
  }
}

function barrelTension({ mesh, radial }: StressField): number {
  const across = mesh.radialNodes.length;
  let most = -Infinity;
  for (let node = across - 1; node < radial.length; node += across) most = Math.max(most, radial[node]!);
  return most;
}

/** Stress and bulge of a field solved by itself. */
function solvedState(base: ElasticBase, index: number, field: RodField): ElasticState {
  const solution = solveElastic(base.assembled, rodTemperature(base.map, field));
  return {
    peakTensile: peakTensile(solution),
    barrelTension: barrelTension(solution),
    along: stressAlongRod(solution),
    ...bulgePower(solution.displacement, index, base.weights),
  };
}

/**
 * Adds up the answers for the heat of each axial cell; where conduction is not linear, solves the field itself.
 * @param heat W in each axial cell
 */
export function elasticState(
  response: ElasticResponse,
  index: number,
  field: RodField,
  heat: Float64Array,
): ElasticState {
  const { base, columns, held, starts, mesh } = response;
  if (columns.length === 0) return solvedState(base, index, field);
  const size = columns[0]!.stress.length;
  const sum = new Float64Array(size);
  const along = emptyAlong(columns[0]!.along);
  let front = 0;
  let back = 0;
  const add = (weight: number, { stress, front: ofFront, back: ofBack, along: part }: Column) => {
    front += weight * ofFront;
    back += weight * ofBack;
    addAlong(along, weight, part);
    for (let n = 0; n < size; n++) sum[n] = sum[n]! + weight * stress[n]!;
  };
  for (let k = 0; k < columns.length; k++) {
    let weight = 0;
    for (let j = starts[k]!; j < starts[k + 1]!; j++) weight += heat[j]!;
    add(weight, columns[k]!);
  }
  for (const { column, weight } of held) add(weight(field), column);
  const nodes = size / 4;
  const pick = (offset: number) => {
    const values = new Float64Array(nodes);
    for (let n = 0; n < nodes; n++) values[n] = sum[4 * n + offset]!;
    return values;
  };
  const stress = { mesh, radial: pick(0), hoop: pick(1), axial: pick(2), shear: pick(3), surfaceResidual: 0 };
  return { peakTensile: peakTensile(stress), barrelTension: barrelTension(stress), along, front, back };
}
