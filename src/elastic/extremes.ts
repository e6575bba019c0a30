import { quadraticShapes } from './quadratic-line';
import type { ElasticMesh } from './mesh';
import type { StressField } from './stress';

/** A value and where it is, m. */
export interface PlacedValue {
  value: number;
  r: number;
  z: number;
}

/** Value of a nodal field at a point of the rod (biquadratic in its element). */
export function valueAt(mesh: ElasticMesh, field: Float64Array, r: number, z: number): number {
  const across = mesh.radialNodes.length;
  const radial = elementOf(mesh.radialNodes, r);
  const axial = elementOf(mesh.axialNodes, z);
  let value = 0;
  for (let b = 0; b < 3; b++) {
    for (let a = 0; a < 3; a++) {
      value += radial.shapes[a] * axial.shapes[b] * field[(axial.node + b) * across + radial.node + a];
    }
  }
  return value;
}

/**
 * Peak tensile stress: the largest principal stress, which is what opens a crack in a brittle crystal; the hoop stress is
 * a principal one, the other two are those of the (r, z) plane. On a surface one of these two is zero or the pressure.
 * @returns Pa > 0 where anything is in tension, and its place
 */
export function peakTensile(stress: StressField): PlacedValue {
  const { radial, hoop, axial, shear } = stress;
  const principal = Float64Array.from(radial, (sr, node) => {
    const middle = (sr + axial[node]) / 2;
    return Math.max(hoop[node], middle + Math.hypot((sr - axial[node]) / 2, shear[node]));
  });
  return largest(stress.mesh, principal);
}

/** Equivalent stress of von Mises at every node, Pa. */
export function vonMises({ radial, hoop, axial, shear }: StressField): Float64Array {
  return Float64Array.from(radial, (sr, node) =>
    Math.sqrt(
      ((sr - hoop[node]) ** 2 + (hoop[node] - axial[node]) ** 2 + (axial[node] - sr) ** 2) / 2 +
        3 * shear[node] ** 2,
    ),
  );
}

/** Largest value of a nodal field; between nodes from a parabola through the three nodes in each direction. */
export function largest(mesh: ElasticMesh, field: Float64Array): PlacedValue {
  let top = 0;
  for (let node = 1; node < field.length; node++) if (field[node] > field[top]) top = node;
  const across = mesh.radialNodes.length;
  const i = top % across;
  const j = (top - i) / across;
  const radial = vertex(mesh.radialNodes, i, (k) => field[j * across + k]);
  const axial = vertex(mesh.axialNodes, j, (l) => field[l * across + i]);
  return { value: field[top] + radial.gain + axial.gain, r: radial.place, z: axial.place };
}

/** Smallest value of a nodal field, see `largest`. */
export function smallest(mesh: ElasticMesh, field: Float64Array): PlacedValue {
  const { value, r, z } = largest(
    mesh,
    field.map((entry) => -entry),
  );
  return { value: -value, r, z };
}

/** Top of the parabola through a node that is larger than its two neighbours, above that node's value. */
function vertex(
  nodes: Float64Array,
  k: number,
  value: (k: number) => number,
): { place: number; gain: number } {
  const place = nodes[k];
  if (k === 0 || k === nodes.length - 1) return { place, gain: 0 };
  const before = (value(k) - value(k - 1)) / (place - nodes[k - 1]);
  const after = (value(k + 1) - value(k)) / (nodes[k + 1] - place);
  const curvature = (after - before) / (nodes[k + 1] - nodes[k - 1]);
  if (!(curvature < 0)) return { place, gain: 0 };
  const slope = before + curvature * (place - nodes[k - 1]);
  const step = -slope / (2 * curvature);
  return { place: place + step, gain: (slope * step) / 2 };
}

function elementOf(nodes: Float64Array, x: number): { node: number; shapes: [number, number, number] } {
  let element = 0;
  while (2 * element + 4 < nodes.length && x > nodes[2 * element + 2]) element++;
  const node = 2 * element;
  const half = (nodes[node + 2] - nodes[node]) / 2;
  return { node, shapes: quadraticShapes((x - nodes[node + 1]) / half) };
}
