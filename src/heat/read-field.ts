import { lagrangeStart, lagrangeWeights } from '../numerics/lagrange';
import { gaussLegendre } from '../numerics/quadrature';
import { temperatureOf } from './conductivity-law';
import { type RodField, axialNode, barrelFlux, faceValue } from './field';
import type { RodGrid } from './grid';

/** Ring of cells mirrored across the axis, so that interpolation there keeps the zero slope. */
const mirrored = 2;

/** Nodes in the coordinate asinh(r/scale): two mirrored cells, the nr cells, the barrel. */
function radialNodes(grid: RodGrid): Float64Array {
  const nodes = new Float64Array(grid.nr + mirrored + 1);
  for (let k = 0; k < grid.nr + mirrored; k++) nodes[k] = (k - mirrored + 0.5) * grid.radialStep;
  nodes[grid.nr + mirrored] = grid.nr * grid.radialStep;
  return nodes;
}

function axialNodes(grid: RodGrid): Float64Array {
  return Float64Array.from({ length: grid.nz + 2 }, (_, k) => axialNode(grid, k));
}

/**
 * Temperature anywhere in the rod, its surfaces and its mount ring; cubic between cells, so second order overall.
 *
 * @param r m, 0 ... barrel (beyond it: the ring)
 * @param z m from the pumped face
 * @returns K
 */
export function temperatureAt(field: RodField, r: number, z: number): number {
  const { grid } = field;
  if (r > field.conduction.model.radius * (1 + 1e-12)) return mountTemperatureAt(field, r, z);
  const radial = radialNodes(grid);
  const axial = axialNodes(grid);
  const weightR = new Float64Array(4);
  const weightZ = new Float64Array(4);
  const x = Math.asinh(r / grid.radialScale);
  const startR = lagrangeStart(x, radial, 4);
  const startZ = lagrangeStart(z, axial, 4);
  lagrangeWeights(x, radial, startR, 4, weightR);
  lagrangeWeights(z, axial, startZ, 4, weightZ);
  let rise = 0;
  for (let b = 0; b < 4; b++)
    for (let a = 0; a < 4; a++)
      rise += weightR[a]! * weightZ[b]! * nodeRise(field, startR + a - mirrored, startZ + b);
  const { law } = field.conduction;
  return law.exponent === 0 ? field.boundary.side + rise : temperatureOf(law, field.basePotential + rise);
}

/** Rise at ring i (negative: mirrored; nr: barrel) and axial position k (0 pumped face, nz + 1 far face). */
function nodeRise(field: RodField, i: number, k: number): number {
  const { conduction, boundary } = field;
  const { nz } = field.grid;
  const ring = i < 0 ? -1 - i : i;
  if (k === 0) {
    const air = boundary.front - boundary.side;
    const [a, b, c] = [cellRise(field, ring, 0), cellRise(field, ring, 1), cellRise(field, ring, 2)];
    return faceValue(conduction.frontFace, a, b, c, air);
  }
  if (k === nz + 1) {
    const air = boundary.back - boundary.side;
    const [a, b, c] = [
      cellRise(field, ring, nz - 1),
      cellRise(field, ring, nz - 2),
      cellRise(field, ring, nz - 3),
    ];
    return faceValue(conduction.backFace, a, b, c, air);
  }
  return cellRise(field, ring, k - 1);
}

function cellRise(field: RodField, ring: number, j: number): number {
  const { grid, conduction, boundary, basePotential, rise } = field;
  if (ring < grid.nr) return rise[j * grid.nRadial + ring]!;
  const flux = barrelFlux(conduction, boundary, basePotential, rise, j);
  return rise[j * grid.nRadial + grid.nr - 1]! - conduction.side.inner[j]! * flux;
}

/** Temperature in the mount ring: straight in ln r between cells and surfaces, straight in z. */
function mountTemperatureAt(field: RodField, r: number, z: number): number {
  const { grid } = field;
  if (grid.nMount === 0) return field.boundary.side;
  const centres = grid.axialCentres;
  const start = lagrangeStart(z, centres, 2);
  const weights = new Float64Array(2);
  const inside = Math.min(Math.max(z, centres[0]!), centres[grid.nz - 1]!);
  lagrangeWeights(inside, centres, start, 2, weights);
  const low = mountRowTemperature(field, r, start);
  return weights[0]! * low + weights[1]! * mountRowTemperature(field, r, start + 1);
}

function mountRowTemperature(field: RodField, r: number, j: number): number {
  const { grid, conduction, boundary, basePotential, rise } = field;
  const { nr, nRadial, nMount, mountCentres, mountFaces } = grid;
  const row = j * nRadial + nr;
  const ring = conduction.model.side;
  if (ring.kind !== 'ring') return boundary.side;
  const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
  const perLog = (heat: number) => heat / (2 * Math.PI * ring.conductivity * dz);
  if (r <= mountCentres[0]!) {
    const flux = barrelFlux(conduction, boundary, basePotential, rise, j);
    return (
      boundary.side + rise[row]! + perLog(flux) * Math.log(mountCentres[0]! / Math.max(r, mountFaces[0]!))
    );
  }
  const last = nMount - 1;
  if (r >= mountCentres[last]!) {
    const flux = conduction.mountOut![j]! * rise[row + last]!;
    const reach = Math.log(Math.min(r, mountFaces[nMount]!) / mountCentres[last]!);
    return boundary.side + rise[row + last]! - perLog(flux) * reach;
  }
  const start = lagrangeStart(r, mountCentres, 2);
  const share =
    Math.log(r / mountCentres[start]!) / Math.log(mountCentres[start + 1]! / mountCentres[start]!);
  return boundary.side + rise[row + start]! + share * (rise[row + start + 1]! - rise[row + start]!);
}

/**
 * Weights that turn the temperatures of one row of cells into the area mean within a radius: the row is interpolated
 * (cubic in asinh(r/scale), even across the axis) and integrated over r^2 by Gauss's rule from cell to cell.
 * @returns length nr, sum 1
 */
export function radialMeanWeights(grid: RodGrid, radius: number): Float64Array {
  const nodes = radialNodes(grid).subarray(0, grid.nr + mirrored);
  const total = radius * radius;
  const weights = new Float64Array(grid.nr);
  const local = new Float64Array(4);
  const rule = gaussLegendre(3);
  let from = 0;
  for (let k = 0; from < total; k++) {
    const to = k < grid.nr ? Math.min(total, grid.centreSquares[k]!) : total;
    for (let q = 0; q < 3; q++) {
      const s = from + ((to - from) * (1 + rule.nodes[q]!)) / 2;
      const x = Math.asinh(Math.sqrt(s) / grid.radialScale);
      const start = lagrangeStart(x, nodes, 4);
      lagrangeWeights(x, nodes, start, 4, local);
      for (let a = 0; a < 4; a++) {
        const i = start + a - mirrored;
        const ring = i < 0 ? -1 - i : i;
        weights[ring] = weights[ring]! + (local[a]! * rule.weights[q]! * (to - from)) / 2 / total;
      }
    }
    from = to;
  }
  return weights;
}

/**
 * Volume mean of the temperature within a radius, over the doped length, K.
 * @param radius m, at most the rod's
 */
export function meanWithin(field: RodField, radius: number): number {
  const { grid } = field;
  const weights = radialMeanWeights(grid, radius);
  let sum = 0;
  let length = 0;
  for (let j = grid.dopedFrom; j < grid.dopedTo; j++) {
    const dz = grid.axialFaces[j + 1]! - grid.axialFaces[j]!;
    let mean = 0;
    for (let i = 0; i < grid.nr; i++) mean += weights[i]! * field.temperatures[j * grid.nRadial + i]!;
    sum += mean * dz;
    length += dz;
  }
  return sum / length;
}
