/** A piece of an isotherm: from one place to another, in the coordinates of the sampled field. */
export interface Segment {
  x1: number;
  y1: number;
  x2: number;
  y2: number;
}

/**
 * Isotherm of a field sampled on an even grid, by marching squares (linear along the edges of each square).
 * @param sample value at column i, row j
 * @returns segments in units of columns and rows
 */
export function isotherm(
  columns: number,
  rows: number,
  sample: (i: number, j: number) => number,
  level: number,
): Segment[] {
  const segments: Segment[] = [];
  const cut = (a: number, b: number) => (level - a) / (b - a);
  for (let j = 0; j + 1 < rows; j += 1)
    for (let i = 0; i + 1 < columns; i += 1) {
      const [a, b, c, d] = [sample(i, j), sample(i + 1, j), sample(i + 1, j + 1), sample(i, j + 1)];
      const crossings: [number, number][] = [];
      if (a < level !== b < level) crossings.push([i + cut(a, b), j]);
      if (b < level !== c < level) crossings.push([i + 1, j + cut(b, c)]);
      if (d < level !== c < level) crossings.push([i + cut(d, c), j + 1]);
      if (a < level !== d < level) crossings.push([i, j + cut(a, d)]);
      for (let k = 0; k + 1 < crossings.length; k += 2) {
        const [[x1, y1], [x2, y2]] = [crossings[k]!, crossings[k + 1]!];
        segments.push({ x1, y1, x2, y2 });
      }
    }
  return segments;
}
