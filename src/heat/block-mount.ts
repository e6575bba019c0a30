/** A block that holds the rod in a bore and stands on its base; its sides and top are in still air, taken as insulated. */
export interface BlockMount {
  /** m */
  boreRadius: number;
  /** Across the rod, bore in the middle, m. */
  width: number;
  /** From the bore's centre down to the base, m. */
  depth: number;
  /** From the bore's centre up to the top, m. */
  cover: number;
  /** W/(m K) */
  conductivity: number;
}

/**
 * Thermal resistance of a block from the mean of its bore to its base, per length of rod: two-dimensional conduction with
 * the heat spread evenly round the bore, exact by images. Left out: heat running along the block, and its base's own spreading.
 *
 * R' = 1/(2 pi k) { ln[W/(pi a) sinh(2 pi d/W)] + alternating images in the top }; the first term alone is a row of
 * pipes at depth d.
 * @returns K m/W, bore above base
 * @throws Error when the bore does not fit into the block
 * @source Carslaw & Jaeger, Conduction of Heat in Solids, section 16.2 (images); Incropera, Table 4.1 (row of pipes) (from memory)
 */
export function blockResistance(block: BlockMount): number {
  const { boreRadius: a, width, depth, cover, conductivity } = block;
  if (!(a < Math.min(width / 2, depth, cover))) throw new Error('The bore does not fit into the block.');
  const height = depth + cover;
  // -ln(2 sinh(pi y/W)) is the potential of a row of sources at distance y; logarithms of sinh would overflow.
  const row = (y: number) => -((Math.PI * y) / width + Math.log1p(-Math.exp((-2 * Math.PI * y) / width)));
  let sum = -Math.log((2 * Math.PI * a) / width) - row(2 * depth);
  for (let n = 1; n < 10_000; n++) {
    const far = 2 * n * height;
    const images = 2 * row(far) - row(far - 2 * depth) - row(far + 2 * depth);
    sum += n % 2 === 0 ? images : -images;
    if (Math.abs(images) < 1e-13) break;
  }
  return sum / (2 * Math.PI * conductivity);
}

/**
 * The ring a block is computed as: no larger than the block's own cross-section, so that it carries no more heat along
 * the rod than the block does; what it lacks in resistance lies between it and the base.
 * @returns `outerRadius` in m; `beyondRing`: 2 pi k times the resistance per length from the ring to the base, 0 or more
 */
export function ringOfBlock(block: Omit<BlockMount, 'conductivity'>): {
  outerRadius: number;
  beyondRing: number;
} {
  const { boreRadius, width, depth, cover } = block;
  const whole = 2 * Math.PI * blockResistance({ ...block, conductivity: 1 });
  const inRing = Math.log(Math.sqrt((width * (depth + cover)) / Math.PI) / boreRadius);
  return {
    outerRadius: boreRadius * Math.exp(Math.min(inRing, whole)),
    beyondRing: Math.max(0, whole - inRing),
  };
}

/**
 * Outer radius of the ring that resists as much as the block, so that a block can be computed as a ring with a fixed
 * outer surface: b = a exp(2 pi k R').
 * @returns m
 */
export function equivalentRingRadius(block: BlockMount): number {
  return block.boreRadius * Math.exp(2 * Math.PI * block.conductivity * blockResistance(block));
}
