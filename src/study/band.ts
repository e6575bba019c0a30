import type { Contributor } from './types';

/** Answers below this share of the nominal one count as this share, and a band that reaches down to it ends at zero. */
const leastShare = 1e-2;

/** What one uncertain value does to an answer when it stands at its low and at its high end. */
export interface Effect {
  path: string;
  label: string;
  /** The answer at either end; null where there is none (no power at which every limit holds). */
  low: number | null;
  high: number | null;
}

export interface Band {
  low: number;
  high: number;
  contributors: Contributor[];
}

const ratio = (value: number | null, nominal: number) => Math.max((value ?? 0) / nominal, leastShare);

/**
 * The band of an answer: the effects of all uncertain values, tried one at a time, combined as the root sum of squares
 * of their logarithms, upwards and downwards apart. It is the spread of independent causes of like weight; two values
 * that err together make it wider, values with a narrow peak inside their printed range make it narrower.
 * @param nominal the answer with every value at its nominal, > 0
 */
export function bandOf(nominal: number, effects: readonly Effect[]): Band {
  let up = 0;
  let down = 0;
  const contributors = effects.map(({ path, label, low, high }): Contributor => {
    const atLow = ratio(low, nominal);
    const atHigh = ratio(high, nominal);
    up += Math.max(0, Math.log(atLow), Math.log(atHigh)) ** 2;
    down += Math.min(0, Math.log(atLow), Math.log(atHigh)) ** 2;
    return { path, label, atLow, atHigh };
  });
  const size = (item: Contributor) =>
    Math.max(Math.abs(Math.log(item.atLow)), Math.abs(Math.log(item.atHigh)));
  const lowShare = Math.exp(-Math.sqrt(down));
  return {
    low: lowShare > 1.001 * leastShare ? nominal * lowShare : 0,
    high: nominal * Math.exp(Math.sqrt(up)),
    contributors: contributors.filter((item) => size(item) > 1e-4).sort((a, b) => size(b) - size(a)),
  };
}
