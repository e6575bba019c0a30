import type { OptionReport } from '../../src/report/types';

/** How a way of cooling stands at the operating pump power: for sure, with the nominal constants only, or not. */
export interface Standing {
  /** Shape that says the same as the words. */
  shape: '●' | '◐' | '✕';
  words: string;
  holds: boolean;
}

/**
 * @param pumpPower operating pump power, W
 * @returns "not assured" where the low end of the band lies below the operating pump power
 */
export function standingOf(option: OptionReport, pumpPower: number): Standing {
  if (!option.passes) return { shape: '✕', words: 'fails', holds: false };
  const { low, reachesRange } = option.ceiling;
  const assured = low === null || reachesRange || low >= pumpPower;
  return assured
    ? { shape: '●', words: 'holds', holds: true }
    : { shape: '◐', words: 'not assured', holds: true };
}
