import type { AssembledElastic } from './assemble';
import {
  applyAcross,
  applyAlong,
  compose,
  interpolation,
  lineOperator,
  type LineOperator,
} from './line-operator';

/**
 * The fixed linear way from temperatures on someone else's tensor grid to the load and to temperatures at the nodes.
 * Made once for a grid; using it runs no interpolation code and calls no functions of (r, z).
 */
export interface TemperatureMap {
  assembled: AssembledElastic;
  grid: TemperatureGrid;
  /** integrals of the radial and of the axial load, and interpolation to the nodes */
  radialLoad: OperatorPair;
  axialLoad: OperatorPair;
  nodes: OperatorPair;
}

/** An operator per direction; `along` has two more columns than the grid has planes: the air at front and back. */
export interface OperatorPair {
  across: LineOperator;
  along: LineOperator;
}

/** Where temperatures are known: a tensor grid inside the rod. */
interface TemperatureGrid {
  radii: Float64Array;
  axials: Float64Array;
  stride: number;
}

/** How the temperature of each face follows from the planes behind it. */
export interface FaceTemperatures {
  front: FaceTemperature;
  back: FaceTemperature;
}

/** Temperature of a face = sum of cells[k] times the plane k behind it (nearest first) + air times the air's. */
interface FaceTemperature {
  cells: ArrayLike<number>;
  air: number;
}

/**
 * Map from a grid of temperatures, for `solveElastic`. Between grid points the temperature is cubic along the axis
 * and in asinh(r/scale) across it, even about the axis; from the outermost ones it goes on to the surfaces.
 * @param radii m, ascending, inside the rod (cell centres will do), at least 2
 * @param axials m, ascending from the pumped face, at least 2
 * @param stride distance in the values between (i, j) and (i, j + 1); larger than radii.length where a mount follows
 * @param faces what is known of the faces; left out: they are extrapolated from the planes, poorly where these are few
 */
export function temperatureMap(
  assembled: AssembledElastic,
  radii: Float64Array,
  axials: Float64Array,
  stride = radii.length,
  faces?: FaceTemperatures,
): TemperatureMap {
  const { loads, radialLine, axialLine, mesh } = assembled;
  // Inside the pumped part the temperature falls with r^2, outside with ln r: asinh(r/scale) is close to both.
  const scale = radii[Math.min(2, radii.length - 1)];
  const stretched = (places: Float64Array) => places.map((r) => Math.asinh(r / scale));
  const acrossTo = (targets: Float64Array) => interpolation(stretched(radii), stretched(targets), 'even');
  const acrossPoints = acrossTo(radialLine.points);
  const planes = planesWithFaces(axials, mesh.axialNodes[mesh.axialNodes.length - 1], faces);
  const alongTo = (targets: Float64Array) =>
    compose(interpolation(planes.places, targets, 'none'), planes.operator);
  const alongPoints = alongTo(axialLine.points);
  return {
    assembled,
    grid: { radii, axials, stride },
    radialLoad: {
      across: compose(loads.acrossRadial, acrossPoints),
      along: compose(loads.alongRadial, alongPoints),
    },
    axialLoad: {
      across: compose(loads.acrossAxial, acrossPoints),
      along: compose(loads.alongAxial, alongPoints),
    },
    nodes: {
      across: acrossTo(mesh.radialNodes),
      along: alongTo(mesh.axialNodes),
    },
  };
}

/** The grid's planes and the faces whose temperature is known through them, and the operator that gives them. */
function planesWithFaces(
  axials: Float64Array,
  length: number,
  faces: FaceTemperatures | undefined,
): { places: Float64Array; operator: LineOperator } {
  const count = axials.length;
  const rows = Array.from(axials, (_, j) => new Map([[j, 1]]));
  const places = Array.from(axials);
  const faceRow = ({ cells, air }: FaceTemperature, planeBehind: (k: number) => number, airColumn: number) =>
    new Map([...Array.from(cells, (weight, k) => [planeBehind(k), weight] as const), [airColumn, air]]);
  if (faces) {
    rows.unshift(faceRow(faces.front, (k) => k, count));
    places.unshift(0);
    rows.push(faceRow(faces.back, (k) => count - 1 - k, count + 1));
    places.push(length);
  }
  return { places: Float64Array.from(places), operator: lineOperator(rows) };
}

/** Temperatures known as values on a mapped grid: (i, j) at j*stride + i, K. */
export interface MappedTemperature {
  map: TemperatureMap;
  values: Float64Array;
  /** K, of the air at both ends; needed where the map's faces lean on it */
  air?: { front: number; back: number };
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

/** K, T - T_reference of the grid's own points, closely packed, and after them a plane of each air temperature. */
export function riseOf({ map, values, air }: MappedTemperature): Float64Array {
  const { radii, axials, stride } = map.grid;
  const reference = map.assembled.model.referenceTemperature;
  const width = radii.length;
  const rise = new Float64Array(width * (axials.length + 2));
  for (let j = 0; j < axials.length; j++) {
    for (let i = 0; i < width; i++) rise[j * width + i] = values[j * stride + i] - reference;
  }
  const frontAir = width * axials.length;
  rise.fill((air?.front ?? reference) - reference, frontAir, frontAir + width);
  rise.fill((air?.back ?? reference) - reference, frontAir + width);
  return rise;
}

/**
 * Applies both operators of a pair to a field of `width` columns.
 * @returns value (i, j) at j*across.rows + i
 */
export function applyPair({ across, along }: OperatorPair, field: Float64Array, width: number): Float64Array {
  const lines = field.length / width;
  const partial = applyAcross(across, field, width, lines, new Float64Array(across.rows * lines));
  return applyAlong(along, partial, across.rows, new Float64Array(across.rows * along.rows));
}

function merged(a: Float64Array, b: Float64Array): Float64Array {
  return Float64Array.from(new Set([...a, ...b])).sort();
}
