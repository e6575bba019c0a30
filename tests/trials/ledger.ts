import type { Flow } from '../../src/operating/types';

/** Where power enters and where it ends; every other node has to give what it takes. */
const ends = new Set(['wall plug', 'surroundings']);

/** Greatest difference between what a node takes and what it gives, over all nodes that do both, W. */
export function imbalanceOf(ledger: readonly Flow[]): number {
  const net = new Map<string, { taken: number; given: number }>();
  const at = (node: string) => net.get(node) ?? net.set(node, { taken: 0, given: 0 }).get(node)!;
  for (const { from, to, power } of ledger) {
    at(from).given += power;
    at(to).taken += power;
  }
  let worst = 0;
  for (const [node, { taken, given }] of net)
    if (!ends.has(node) && taken > 0 && given > 0) worst = Math.max(worst, Math.abs(taken - given));
  return worst;
}
