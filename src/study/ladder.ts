import type { Interval } from './ceiling';

export interface Rung {
  id: string;
  /** 0 is the least demanding way of cooling. */
  demand: number;
  windows: readonly Interval[];
}

export interface LadderStep extends Interval {
  option: string | null;
}

/**
 * The cooling ladder: along the pump-power axis, the least demanding way of cooling that keeps every limit.
 * @param rungs options with the powers over which each holds, W
 * @param to end of the axis, W
 * @returns steps from 0 to `to` without gaps; `option` is null where none holds
 */
export function ladderOf(rungs: readonly Rung[], to: number): LadderStep[] {
  const marks = new Set([0, to]);
  for (const { windows } of rungs)
    for (const window of windows) {
      if (window.from < to) marks.add(window.from);
      if (window.to < to) marks.add(window.to);
    }
  const edges = [...marks].sort((a, b) => a - b);
  const ranked = [...rungs].sort((a, b) => a.demand - b.demand);
  const steps: LadderStep[] = [];
  for (let k = 1; k < edges.length; k++) {
    const [from, end] = [edges[k - 1]!, edges[k]!];
    const middle = (from + end) / 2;
    const option =
      ranked.find(({ windows }) => windows.some((w) => w.from <= middle && middle <= w.to))?.id ?? null;
    const last = steps.at(-1);
    if (last && last.option === option) last.to = end;
    else steps.push({ from, to: end, option });
  }
  return steps;
}
