import { factorBanded, type BandedFactor } from '../numerics/banded';
import type { ElasticModuli } from './assemble';
import { lineMatrix, type QuadraticLine } from './quadratic-line';

/** Unknowns held at zero; unknown 2*node is u_r, 2*node + 1 is u_z. */
export type Constraints = Int32Array;

/** The line integrals the stiffness is made of; entry (i, k) at 5*i + (k - i + 2). */
interface LineIntegrals {
  /** along r: int N'N' r, int N N / r + (N'N + N N') terms, ... named after the strains they multiply */
  slopeSlopeR: Float64Array;
  slopeShape: Float64Array;
  shapeShapeOverR: Float64Array;
  shapeShapeR: Float64Array;
  slopeShapeR: Float64Array;
  shapeShape: Float64Array;
  /** along z */
  axialShapeShape: Float64Array;
  axialSlopeShape: Float64Array;
  axialSlopeSlope: Float64Array;
}

/** Symmetric banded matrix in the layout `factorBanded` takes. */
interface BandedMatrix {
  diagonal: Float64Array;
  lower: Float64Array;
  bandwidth: number;
}

/**
 * Stiffness of the rod, int strain(v) : C : strain(u) r dr dz, factored with its constraints. On rectangles every entry
 * is a sum of products of one integral along r and one along z.
 * @returns factors, and the unknowns held at zero: u_r on the axis (and on a clamped barrel), u_z of the axis node next to
 *   the middle, which stops the rod from floating away and takes no force
 */
export function factorStiffness(
  moduli: ElasticModuli,
  radialLine: QuadraticLine,
  axialLine: QuadraticLine,
  clamped: boolean,
): { factors: BandedFactor; constraints: Constraints } {
  const across = radialLine.nodes.length;
  const along = axialLine.nodes.length;
  const matrix = emptyMatrix(2 * across * along, 2 * (2 * across + 2) + 1);
  fill(matrix, moduli, lineIntegrals(radialLine, axialLine), across, along);
  const constraints: number[] = [2 * across * Math.floor(along / 2) + 1];
  for (let j = 0; j < along; j++) {
    constraints.push(2 * j * across);
    if (clamped) constraints.push(2 * (j * across + across - 1));
  }
  for (const unknown of constraints) hold(matrix, unknown, moduli.direct);
  return {
    factors: factorBanded(matrix.diagonal, matrix.lower, matrix.bandwidth),
    constraints: Int32Array.from(constraints),
  };
}

function lineIntegrals(radialLine: QuadraticLine, axialLine: QuadraticLine): LineIntegrals {
  return {
    slopeSlopeR: lineMatrix(radialLine, 'slope', 'slope', 1),
    slopeShape: lineMatrix(radialLine, 'slope', 'shape', 0),
    shapeShapeOverR: lineMatrix(radialLine, 'shape', 'shape', -1),
    shapeShapeR: lineMatrix(radialLine, 'shape', 'shape', 1),
    slopeShapeR: lineMatrix(radialLine, 'slope', 'shape', 1),
    shapeShape: lineMatrix(radialLine, 'shape', 'shape', 0),
    axialShapeShape: lineMatrix(axialLine, 'shape', 'shape', 0),
    axialSlopeShape: lineMatrix(axialLine, 'slope', 'shape', 0),
    axialSlopeSlope: lineMatrix(axialLine, 'slope', 'slope', 0),
  };
}

/** Lower triangle of the stiffness: test node (i, j), trial node (k, l). */
function fill(
  matrix: BandedMatrix,
  moduli: ElasticModuli,
  on: LineIntegrals,
  across: number,
  along: number,
): void {
  const { direct, cross, shear } = moduli;
  for (let j = 0; j < along; j++) {
    for (let l = Math.max(0, j - 2); l <= j; l++) {
      const z = 5 * j + (l - j + 2);
      const zT = 5 * l + (j - l + 2);
      for (let i = 0; i < across; i++) {
        for (let k = Math.max(0, i - 2); k <= Math.min(across - 1, i + 2); k++) {
          const r = 5 * i + (k - i + 2);
          const rT = 5 * k + (i - k + 2);
          const rr =
            (direct * (on.slopeSlopeR[r] + on.shapeShapeOverR[r]) +
              cross * (on.slopeShape[r] + on.slopeShape[rT])) *
              on.axialShapeShape[z] +
            shear * on.shapeShapeR[r] * on.axialSlopeSlope[z];
          const zz =
            direct * on.shapeShapeR[r] * on.axialSlopeSlope[z] +
            shear * on.slopeSlopeR[r] * on.axialShapeShape[z];
          const rz =
            cross * (on.slopeShapeR[r] + on.shapeShape[r]) * on.axialSlopeShape[zT] +
            shear * on.slopeShapeR[rT] * on.axialSlopeShape[z];
          const zr =
            cross * (on.slopeShapeR[rT] + on.shapeShape[rT]) * on.axialSlopeShape[z] +
            shear * on.slopeShapeR[r] * on.axialSlopeShape[zT];
          const row = 2 * (j * across + i);
          const column = 2 * (l * across + k);
          put(matrix, row, column, rr);
          put(matrix, row, column + 1, rz);
          put(matrix, row + 1, column, zr);
          put(matrix, row + 1, column + 1, zz);
        }
      }
    }
  }
}

function emptyMatrix(size: number, bandwidth: number): BandedMatrix {
  return { diagonal: new Float64Array(size), lower: new Float64Array(size * bandwidth), bandwidth };
}

/** Sets an entry of the lower triangle; one above the diagonal is left to its mirror image. */
function put({ diagonal, lower, bandwidth }: BandedMatrix, row: number, column: number, value: number): void {
  if (column < row) lower[row * bandwidth + column - row + bandwidth] = value;
  else if (column === row) diagonal[row] = value;
}

/** Holds an unknown at zero: its row and column are emptied, its diagonal kept of the others' size. */
function hold({ diagonal, lower, bandwidth }: BandedMatrix, unknown: number, stiffness: number): void {
  lower.fill(0, unknown * bandwidth, (unknown + 1) * bandwidth);
  const last = Math.min(diagonal.length - 1, unknown + bandwidth);
  for (let row = unknown + 1; row <= last; row++) lower[row * bandwidth + unknown - row + bandwidth] = 0;
  diagonal[unknown] = stiffness;
}
