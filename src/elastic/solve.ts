import { NumericalError } from '../errors';
import { solveBanded } from '../numerics/banded';
import type { AssembledElastic } from './assemble';
import type { ElasticMesh } from './mesh';
import { recoverStress, type StressField } from './stress';
import {
  applyPair,
  riseOf,
  sampleTemperature,
  type MappedTemperature,
  type TemperatureMap,
} from './temperature-map';

/** Displacement at the nodes, m; node (i, j) at j*mesh.radialNodes.length + i. */
export interface Displacement {
  mesh: ElasticMesh;
  /** u_r, outwards */
  radial: Float64Array;
  /** u_z, into the rod seen from the pumped face; zero at the axis node next to the middle */
  axial: Float64Array;
}

/** Displacement and stress of a rod at one temperature field. */
export interface ElasticSolution extends StressField {
  displacement: Displacement;
}

/**
 * Displacement and stress of a rod: div sigma = 0, sigma = C : (strain - expansion (T - T_reference)), all surfaces free
 * but for what the model says of the barrel. Linear in the temperature.
 * @param temperature K, as a function of (r, z) in m or as values on a mapped grid
 */
export function solveElastic(
  assembled: AssembledElastic,
  temperature: MappedTemperature | ((r: number, z: number) => number),
): ElasticSolution {
  const mapped = typeof temperature === 'function' ? sampleTemperature(assembled, temperature) : temperature;
  const rise = riseOf(mapped);
  const displacement = displacementOf(assembled, mapped, rise);
  const { map } = mapped;
  const nodalRise = applyPair(map.nodes, rise, map.grid.radii.length);
  return { ...recoverStress(assembled, displacement, nodalRise), displacement };
}

/**
 * Displacement alone, for a closed loop that needs the faces and not the stress; about half the work of `solveElastic`.
 * @throws NumericalError when the temperatures are not finite
 */
export function solveDisplacement(assembled: AssembledElastic, temperature: MappedTemperature): Displacement {
  return displacementOf(assembled, temperature, riseOf(temperature));
}

function displacementOf(
  assembled: AssembledElastic,
  { map }: MappedTemperature,
  rise: Float64Array,
): Displacement {
  const { mesh, factors, constraints, model } = assembled;
  const forces = thermalForces(map, rise);
  const pressure = model.barrel.kind === 'free' ? (model.barrel.pressure ?? 0) : 0;
  if (pressure !== 0) pressBarrel(forces, mesh, pressure);
  for (const unknown of constraints) forces[unknown] = 0;
  const unknowns = solveBanded(factors, forces);
  const count = unknowns.length / 2;
  const radial = new Float64Array(count);
  const axial = new Float64Array(count);
  for (let node = 0; node < count; node++) {
    radial[node] = unknowns[2 * node];
    axial[node] = unknowns[2 * node + 1];
  }
  // Every value of the solution depends on every temperature, so the first one not held tells.
  if (!Number.isFinite(axial[0])) throw new NumericalError('elastic: temperatures are not finite', NaN);
  return { mesh, radial, axial };
}

/**
 * Nodal forces per radian of the prevented expansion: int strain(v) : C : expansion (T - T_reference) r dr dz.
 * @param rise K, as `riseOf` packs it
 * @returns N/rad; 2*node is the radial, 2*node + 1 the axial force
 */
export function thermalForces(map: TemperatureMap, rise: Float64Array): Float64Array {
  const { moduli } = map.assembled;
  const width = map.grid.radii.length;
  const radialLoad = applyPair(map.radialLoad, rise, width);
  const axialLoad = applyPair(map.axialLoad, rise, width);
  const forces = new Float64Array(2 * radialLoad.length);
  for (let node = 0; node < radialLoad.length; node++) {
    forces[2 * node] = moduli.thermalAcross * radialLoad[node];
    forces[2 * node + 1] = moduli.thermalAlong * axialLoad[node];
  }
  return forces;
}

/** Adds an even pressure on the barrel: -p a int N_j dz (Simpson, exact for quadratic shape functions). */
function pressBarrel(forces: Float64Array, mesh: ElasticMesh, pressure: number): void {
  const { radialNodes, axialNodes } = mesh;
  const across = radialNodes.length;
  const perLength = pressure * radialNodes[across - 1];
  for (let j = 0; j + 2 < axialNodes.length; j += 2) {
    const length = axialNodes[j + 2] - axialNodes[j];
    [1 / 6, 4 / 6, 1 / 6].forEach((share, a) => {
      forces[2 * ((j + a) * across + across - 1)] -= perLength * length * share;
    });
  }
}
