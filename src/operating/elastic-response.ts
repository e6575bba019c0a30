import type { ResolvedDesign } from '../design/resolved';
import { assembleElastic, bulgePower, curvatureWeights, makeElasticMesh, peakTensile, solveElastic, temperatureMap, type PlacedValue, type StressField } from '../elastic';
import { heatSource, solveRod, type RodConduction } from '../heat';
import { sumOf } from './absorbed';
import type { PumpSpread } from './prepare';

/** Elements across and along the rod: face bulge within 0.5 % and stress within 1 % of converged solutions. */
const elements = { radial: 9, axial: 14 };

/** Stress and bulge per watt of heat, for one way the heat lies along the rod. */
interface Column {
  stress: Float64Array[];
  front: number;
  back: number;
}

/**
 * Stress and face bulge as linear answers to the heat of each axial cell, solved once per design. Stress does not
 * depend on the level of the temperature, so base and air temperature do not enter (the few milliwatts through the
 * end faces' film are part of each cell's own answer).
 */
export interface ElasticResponse {
  mesh: StressField['mesh'];
  /** One column for each doped cell, or a single one where the heat always lies the same way along the rod. */
  columns: Column[];
  dopedFrom: number;
}

export interface ElasticState {
  peakTensile: PlacedValue;
  /** Dioptric power of the bulge of each face, 1/m. */
  front: number;
  back: number;
}

function column(resolved: ResolvedDesign, assembled: ReturnType<typeof assembleElastic>, conduction: RodConduction, pump: PumpSpread, deposit: Float64Array, map: ReturnType<typeof temperatureMap>, weights: Float64Array): Column {
  const source = heatSource(conduction.grid, pump.heatShares, deposit, 1);
  const field = solveRod(conduction, source, { side: 0, front: 0, back: 0 });
  const solution = solveElastic(assembled, { map, values: field.temperatures });
  const bulge = bulgePower(solution.displacement, resolved.rod.refractiveIndex, weights);
  return { stress: [solution.radial, solution.hoop, solution.axial, solution.shear], ...bulge };
}

/** @param steady share of the heat of each axial cell where it never changes; left out, every cell gets its own column */
export function prepareElastic(resolved: ResolvedDesign, conduction: RodConduction, pump: PumpSpread, steady?: Float64Array): ElasticResponse {
  const { rod, cavity } = resolved;
  const { grid } = conduction;
  const mesh = makeElasticMesh({
    radius: rod.radius,
    length: rod.frontCap + rod.dopedLength + rod.backCap,
    heatedFrom: rod.frontCap,
    heatedTo: rod.frontCap + rod.dopedLength,
    pumpRadius: resolved.pump.radius,
    radialElements: elements.radial,
    axialElements: elements.axial,
  });
  const constants = { youngsModulus: rod.youngModulus, poissonRatio: rod.poissonRatio, expansion: rod.expansionAcross, axialExpansion: rod.expansion };
  const assembled = assembleElastic({ constants, referenceTemperature: 0, barrel: { kind: 'free' } }, mesh);
  const map = temperatureMap(assembled, grid.radialCentres, grid.axialCentres, grid.nRadial);
  const weights = curvatureWeights(mesh, cavity.lensRadius);
  const shapes: Float64Array[] = [];
  if (steady) shapes.push(steady.map((share) => share / (sumOf(steady) || 1)));
  else
    for (let j = grid.dopedFrom; j < grid.dopedTo; j++) {
      const shape = new Float64Array(grid.nz);
      shape[j] = 1;
      shapes.push(shape);
    }
  const columns = shapes.map((shape) => column(resolved, assembled, conduction, pump, shape, map, weights));
  return { mesh, columns, dopedFrom: grid.dopedFrom };
}

/** Adds up the columns for the heat of each axial cell, W. */
export function elasticState(response: ElasticResponse, heat: Float64Array): ElasticState {
  const { columns, dopedFrom, mesh } = response;
  const single = columns.length === 1;
  const total = single ? sumOf(heat) : 0;
  const nodes = columns[0]!.stress[0]!.length;
  const sum = [0, 1, 2, 3].map(() => new Float64Array(nodes)) as [Float64Array, Float64Array, Float64Array, Float64Array];
  let front = 0;
  let back = 0;
  columns.forEach((item, k) => {
    const weight = single ? total : heat[dopedFrom + k]!;
    if (weight === 0) return;
    front += weight * item.front;
    back += weight * item.back;
    for (let c = 0; c < 4; c++) {
      const from = item.stress[c]!;
      const to = sum[c]!;
      for (let n = 0; n < nodes; n++) to[n] = to[n]! + weight * from[n]!;
    }
  });
  const [radial, hoop, axial, shear] = sum;
  return { peakTensile: peakTensile({ mesh, radial, hoop, axial, shear, surfaceResidual: 0 }), front, back };
}
