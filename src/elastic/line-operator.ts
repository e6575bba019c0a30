import { lagrangeStart, lagrangeWeights } from '../numerics/lagrange';

/** Sparse matrix along one direction of a tensor grid (compressed rows). */
export interface LineOperator {
  rows: number;
  /** length rows + 1; entries of row i are from rowStart[i] to rowStart[i + 1] */
  rowStart: Int32Array;
  columns: Int32Array;
  weights: Float64Array;
}

/** How a function of the radius goes on beyond the axis; 'none' where there is no mirror. */
export type Parity = 'none' | 'even' | 'odd';

/** Operator from its rows, each a list of [column, weight]; equal columns are added. */
export function lineOperator(rows: ReadonlyMap<number, number>[]): LineOperator {
  const rowStart = new Int32Array(rows.length + 1);
  rows.forEach((row, i) => (rowStart[i + 1] = rowStart[i] + row.size));
  const columns = new Int32Array(rowStart[rows.length]);
  const weights = new Float64Array(columns.length);
  rows.forEach((row, i) => {
    let at = rowStart[i];
    for (const [column, weight] of [...row].sort((a, b) => a[0] - b[0])) {
      columns[at] = column;
      weights[at++] = weight;
    }
  });
  return { rows: rows.length, rowStart, columns, weights };
}

/** The operator that applies `first` and then `second`. */
export function compose(second: LineOperator, first: LineOperator): LineOperator {
  const rows: Map<number, number>[] = [];
  for (let i = 0; i < second.rows; i++) {
    const row = new Map<number, number>();
    for (let s = second.rowStart[i]; s < second.rowStart[i + 1]; s++) {
      const middle = second.columns[s];
      for (let f = first.rowStart[middle]; f < first.rowStart[middle + 1]; f++) {
        const column = first.columns[f];
        row.set(column, (row.get(column) ?? 0) + second.weights[s] * first.weights[f]);
      }
    }
    rows.push(row);
  }
  return lineOperator(rows);
}

/**
 * Interpolation by the cubic through the four samples around each target (the four nearest at an end, where a target
 * may lie outside). A target on a sample takes exactly its value.
 * @param samples ascending coordinates; fewer than four give a lower order
 * @param parity continuation of the function to negative coordinates
 * @returns targets.length rows, samples.length columns
 */
export function interpolation(samples: Float64Array, targets: Float64Array, parity: Parity): LineOperator {
  const mirrored = parity === 'none' ? [] : [1, 0].filter((k) => k < samples.length && samples[k] > 0);
  const places = Float64Array.from([...mirrored.map((k) => -samples[k]), ...samples]);
  const width = Math.min(4, places.length);
  const weights = new Float64Array(width);
  const rows = Array.from(targets, (target) => {
    const start = lagrangeStart(target, places, width);
    lagrangeWeights(target, places, start, width, weights);
    const row = new Map<number, number>();
    weights.forEach((weight, k) => {
      const behind = start + k - mirrored.length;
      const column = behind < 0 ? mirrored[start + k] : behind;
      const signed = behind < 0 && parity === 'odd' ? -weight : weight;
      if (weight !== 0) row.set(column, (row.get(column) ?? 0) + signed);
    });
    return row;
  });
  return lineOperator(rows);
}

/**
 * Applies an operator along the radius: out (i, j) = sum over k of weight (i, k) times field (k, j).
 * @param field value (k, j) at j*stride + k
 * @param lines number of j
 * @returns out, value (i, j) at j*operator.rows + i
 */
export function applyAcross(
  operator: LineOperator,
  field: Float64Array,
  stride: number,
  lines: number,
  out: Float64Array,
): Float64Array {
  const { rows, rowStart, columns, weights } = operator;
  for (let j = 0; j < lines; j++) {
    const base = j * stride;
    const outBase = j * rows;
    for (let i = 0; i < rows; i++) {
      let sum = 0;
      for (let s = rowStart[i]; s < rowStart[i + 1]; s++) sum += weights[s] * field[base + columns[s]];
      out[outBase + i] = sum;
    }
  }
  return out;
}

/**
 * Applies an operator along the axis: out (i, j) = sum over l of weight (j, l) times field (i, l).
 * @param field value (i, l) at l*width + i
 * @returns out, value (i, j) at j*width + i
 */
export function applyAlong(
  operator: LineOperator,
  field: Float64Array,
  width: number,
  out: Float64Array,
): Float64Array {
  const { rows, rowStart, columns, weights } = operator;
  for (let j = 0; j < rows; j++) {
    const outBase = j * width;
    out.fill(0, outBase, outBase + width);
    for (let s = rowStart[j]; s < rowStart[j + 1]; s++) {
      const weight = weights[s];
      const base = columns[s] * width;
      for (let i = 0; i < width; i++) out[outBase + i] += weight * field[base + i];
    }
  }
  return out;
}
