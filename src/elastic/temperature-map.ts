import type { AssembledElastic } from './assemble';
import { applyAcross, applyAlong, compose, interpolation, type LineOperator } from './line-operator';

/**
 * The fixed linear way from temperatures on someone else's tensor grid to the load and to temperatures at the nodes.
 * Made once for a grid; using it runs no interpolation code and calls no functions of (r, z).
 */
export interface TemperatureMap {
  assembled: AssembledElastic;
  /** radii of the grid inside the rod, and the distance in memory from one (j) to the next (j + 1) */
  radialCount: number;
  stride: number;
  axialCount: number;
  /** integrals of the radial and of the axial load, and interpolation to the nodes: an operator per direction */
  radialLoad: { across: LineOperator; along: LineOperator };
  axialLoad: { across: LineOperator; along: LineOperator };
  nodes: { across: LineOperator; along: LineOperator };
}

/**
 * Map from a grid of temperatures, for `solveElastic`. Between grid points the temperature is cubic in each direction
 * and even about the axis; from the outermost points it goes on to the surfaces.
 * @param radii m, ascending, inside the rod (cell centres will do), at least 2
 * @param axials m, ascending from the pumped face
 * @param stride distance between (i, j) and (i, j + 1) in the values; larger than radii.length where a mount follows
 */
export function temperatureMap(
  assembled: AssembledElastic,
  radii: Float64Array,
  axials: Float64Array,
  stride = radii.length,
): TemperatureMap {
  const { loads, radialLine, axialLine, mesh } = assembled;
  const acrossPoints = interpolation(radii, radialLine.points, 'even');
  const alongPoints = interpolation(axials, axialLine.points, 'none');
  return {
    assembled,
    radialCount: radii.length,
    stride,
    axialCount: axials.length,
    radialLoad: {
      across: compose(loads.acrossRadial, acrossPoints),
      along: compose(loads.alongRadial, alongPoints),
    },
    axialLoad: {
      across: compose(loads.acrossAxial, acrossPoints),
      along: compose(loads.alongAxial, alongPoints),
    },
    nodes: {
      across: interpolation(radii, mesh.radialNodes, 'even'),
      along: interpolation(axials, mesh.axialNodes, 'none'),
    },
  };
}

/** Temperatures known as values on a mapped grid: (i, j) at j*stride + i, K. */
export interface MappedTemperature {
  map: TemperatureMap;
  values: Float64Array;
}

/**
 * Samples a function exactly where the solution needs it: at integration points and nodes.
 * @param temperature K at (r, z) in m
 */
export function sampleTemperature(
  assembled: AssembledElastic,
  temperature: (r: number, z: number) => number,
): MappedTemperature {
  const radii = merged(assembled.radialLine.points, assembled.mesh.radialNodes);
  const axials = merged(assembled.axialLine.points, assembled.mesh.axialNodes);
  const values = new Float64Array(radii.length * axials.length);
  axials.forEach((z, j) => radii.forEach((r, i) => (values[j * radii.length + i] = temperature(r, z))));
  return { map: temperatureMap(assembled, radii, axials), values };
}

/** Applies both operators of a pair; result (i, j) at j*across.rows + i. */
export function applyPair(
  pair: { across: LineOperator; along: LineOperator },
  values: Float64Array,
  stride: number,
  lines: number,
): Float64Array {
  const width = pair.across.rows;
  const partial = applyAcross(pair.across, values, stride, lines, new Float64Array(width * lines));
  return applyAlong(pair.along, partial, width, new Float64Array(width * pair.along.rows));
}

function merged(a: Float64Array, b: Float64Array): Float64Array {
  return Float64Array.from(new Set([...a, ...b])).sort();
}
