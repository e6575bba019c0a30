import { cellDemand, gradeFaces, type Attractor } from '../numerics/graded-grid';

/**
 * Tensor mesh of nine-node (biquadratic) rectangles. Along each direction two neighbouring elements share a node and
 * every element has one in its middle: 2 n + 1 nodes for n elements. Node (i, j) is at j*radialNodes.length + i;
 * i out from the axis, j in from the pumped face.
 */
export interface ElasticMesh {
  /** m, from 0 to the barrel */
  radialNodes: Float64Array;
  /** m, from 0 (pumped face) to the back face */
  axialNodes: Float64Array;
}

/** Number of elements from axis to barrel (at least 2) and from face to face (at least 2 in each part). */
export interface ElementCount {
  radialElements: number;
  axialElements: number;
}

/** Ready-made element counts; their measured errors are in the README of this room. */
export const elasticPresets = {
  study: { radialElements: 10, axialElements: 14 },
  report: { radialElements: 20, axialElements: 32 },
} as const satisfies Record<string, ElementCount>;

/** What a mesh is fitted to. */
export interface ElasticMeshModel extends ElementCount {
  /** m */
  radius: number;
  /** m, caps included */
  length: number;
  /** m, plane where the heated part begins (thickness of the front cap); left out: 0 */
  heatedFrom?: number;
  /** m, plane where it ends; left out: the back face */
  heatedTo?: number;
  /** m, radius over which the heat falls off */
  pumpRadius: number;
}

/**
 * Mesh for a rod, fine at the axis, at both faces and at the planes between doped part and caps; these planes are
 * element borders. Doubling both counts about halves every element.
 */
export function makeElasticMesh(model: ElasticMeshModel): ElasticMesh {
  const { radius, length } = model;
  const from = model.heatedFrom ?? 0;
  const to = model.heatedTo ?? length;
  const near = Math.min(model.pumpRadius, radius);
  // Just under a heated face the stress turns from tension to compression within a fraction of the pump radius.
  const fine = 0.4 * near;
  const coarse = Math.max(0.5 * radius, near);
  const planes: Attractor[] = [
    { at: 0, size: from > 0 ? coarse : fine },
    { at: length, size: to < length ? coarse : fine },
  ];
  if (from > 0) planes.push({ at: from, size: fine });
  if (to < length) planes.push({ at: to, size: coarse });
  return {
    radialNodes: withMiddles(gradedBorders([0, radius], [{ at: 0, size: near }], model.radialElements)),
    axialNodes: withMiddles(
      gradedBorders(
        [...new Set([0, from, to, length])].sort((x, y) => x - y),
        planes,
        model.axialElements,
      ),
    ),
  };
}

/** Element borders with all the planes among them; every part gets its share of the elements, and at least two. */
function gradedBorders(planes: number[], attractors: Attractor[], count: number): Float64Array {
  const parts = planes.slice(1).map((end, s) => ({ start: planes[s], end }));
  const total = cellDemand(planes[0], planes[planes.length - 1], attractors);
  const counts = parts.map(({ start, end }) =>
    Math.max(2, Math.round((count * cellDemand(start, end, attractors)) / total)),
  );
  // Rounding is made up where it matters least, in the part with most elements.
  const largest = counts.indexOf(Math.max(...counts));
  counts[largest] = Math.max(
    2,
    count - counts.reduce((sum, part, s) => (s === largest ? sum : sum + part), 0),
  );
  const borders = new Float64Array(counts.reduce((sum, part) => sum + part, 1));
  let offset = 0;
  parts.forEach(({ start, end }, s) => {
    gradeFaces(borders, offset, counts[s], start, end, attractors);
    offset += counts[s];
  });
  return borders;
}

/** Node coordinates: element borders and the middle of each element. */
function withMiddles(borders: Float64Array): Float64Array {
  const nodes = new Float64Array(2 * borders.length - 1);
  for (let e = 0; e < borders.length; e++) {
    nodes[2 * e] = borders[e];
    if (e > 0) nodes[2 * e - 1] = (borders[e - 1] + borders[e]) / 2;
  }
  return nodes;
}
