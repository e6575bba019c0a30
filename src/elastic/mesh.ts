import { findRoot } from '../numerics/root';

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

/** What a mesh is fitted to. */
export interface ElasticMeshModel {
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
  /** elements from axis to barrel, at least 2 */
  radialElements: number;
  /** elements from face to face, at least 2 in each part */
  axialElements: number;
}

/** A plane (or the axis) that elements crowd towards, and the distance within which they stay small. */
interface Crowding {
  position: number;
  scale: number;
}

/**
 * Mesh for a rod, fine at the axis, at both faces and at the planes between doped part and caps; these planes are
 * element borders. Element sizes grow in proportion to (distance + scale), so doubling both counts halves every
 * element. Two ends of the same proportions have mirror-symmetric elements.
 */
export function makeElasticMesh(model: ElasticMeshModel): ElasticMesh {
  const { radius, length, pumpRadius } = model;
  const heatedFrom = model.heatedFrom ?? 0;
  const heatedTo = model.heatedTo ?? length;
  const near = Math.min(pumpRadius, radius);
  const far = Math.max(radius / 2, near);
  const planes: Crowding[] = [
    { position: 0, scale: heatedFrom > 0 ? far : near },
    { position: length, scale: heatedTo < length ? far : near },
  ];
  if (heatedFrom > 0) planes.push({ position: heatedFrom, scale: near });
  if (heatedTo < length) planes.push({ position: heatedTo, scale: far });
  const borders = [...new Set([0, heatedFrom, heatedTo, length])].sort((a, b) => a - b);
  return {
    radialNodes: withMiddles(
      crowdedPoints([0, radius], [{ position: 0, scale: 1.5 * near }], model.radialElements),
    ),
    axialNodes: withMiddles(crowdedPoints(borders, planes, model.axialElements)),
  };
}

/**
 * Points from the first border to the last, all borders among them, with a density that is the sum of
 * 1/(distance + scale) over the crowding planes.
 */
function crowdedPoints(borders: number[], planes: Crowding[], count: number): number[] {
  const first = borders[0];
  const cumulative = (x: number) =>
    planes.reduce((sum, { position, scale }) => {
      const distance = Math.abs(x - position);
      return sum + Math.sign(x - position) * Math.log1p(distance / scale);
    }, 0);
  const total = cumulative(borders[borders.length - 1]) - cumulative(first);
  const points = [first];
  let left = count;
  for (let s = 1; s < borders.length; s++) {
    const from = borders[s - 1];
    const to = borders[s];
    const start = cumulative(from);
    const share = cumulative(to) - start;
    const stillToServe = 2 * (borders.length - 1 - s);
    const wanted = s === borders.length - 1 ? left : Math.round((count * share) / total);
    const cells = Math.max(2, Math.min(wanted, left - stillToServe));
    left -= cells;
    for (let k = 1; k < cells; k++) {
      const target = start + (share * k) / cells;
      points.push(findRoot((x) => cumulative(x) - target, from, to, { tolerance: 1e-9 * (to - from) }));
    }
    points.push(to);
  }
  return points;
}

/** Node coordinates: element borders and the middle of each element. */
function withMiddles(borders: number[]): Float64Array {
  const nodes = new Float64Array(2 * borders.length - 1);
  for (let e = 0; e < borders.length; e++) {
    nodes[2 * e] = borders[e];
    if (e > 0) nodes[2 * e - 1] = (borders[e - 1] + borders[e]) / 2;
  }
  return nodes;
}
