/**
 * Weights of the Lagrange polynomial through count nodes, at one place: the value there is the sum of
 * weights[k] * value(nodes[start + k]).
 * @param weights receives count numbers
 */
export function lagrangeWeights(
  x: number,
  nodes: Float64Array,
  start: number,
  count: number,
  weights: Float64Array,
): void {
  for (let k = 0; k < count; k++) {
    let weight = 1;
    const own = nodes[start + k]!;
    for (let m = 0; m < count; m++)
      if (m !== k) weight *= (x - nodes[start + m]!) / (own - nodes[start + m]!);
    weights[k] = weight;
  }
}

/** First of `count` consecutive ascending nodes that surround x as evenly as the ends allow. */
export function lagrangeStart(x: number, nodes: Float64Array, count: number): number {
  let low = 0;
  let high = nodes.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (nodes[middle]! < x) low = middle + 1;
    else high = middle;
  }
  return Math.max(0, Math.min(nodes.length - count, low - (count >> 1)));
}
