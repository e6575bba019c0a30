import { findRoot } from '../numerics/root';
import type { LimitName, Margin } from '../limits/types';
import { hiddenTurns } from './hidden-turns';

/** Margins of every limit at one pump power, for one way of cooling. */
export type MarginsAt = (pumpPower: number) => Margin[];

export interface Interval {
  from: number;
  to: number;
}

export interface CeilingResult {
  /** End of the first interval of pump power over which every limit holds; null where there is none. */
  pumpPower: number | null;
  setBy: LimitName | null;
  /** No limit was broken up to the end of the searched range. */
  reachesRange: boolean;
  windows: Interval[];
  /** Where each limit is first broken as the power rises; null where it holds from there on. */
  limits: { limit: LimitName; pumpPower: number | null }[];
}

/** Levels of the first look in sixtieths of the searched range, denser at low power; a sweep over sixty levels meets them all. */
const usualLevels = [1, 2, 4, 6, 9, 12, 16, 20, 25, 30, 36, 43, 51, 60];
/** Crossings are found to this share of the searched range. */
const precision = 2e-5;

/** Further levels below the first, looked at only where the usual ones find no power that keeps every limit. */
const lowLevels = [0.005, 0.02, 0.11, 0.33];

function scanPowers(to: number, extra: readonly number[], levels: readonly number[]): number[] {
  const even = levels.map((level) => (to * level) / 60);
  const near = extra.flatMap((power) => [power * 0.997, power * 1.003]);
  const all = [to * 1e-3, ...even, ...near].filter((power) => power > 0 && power <= to * (1 + 1e-12));
  return all.sort((a, b) => a - b).filter((power, k, list) => k === 0 || power > list[k - 1]! * (1 + 1e-9));
}

/**
 * A limit that is not listed at a power has nothing to bound there, and so holds; without a steady state that limit
 * alone is broken, since the others have no value.
 */
const shareOf = (margins: readonly Margin[], limit: LimitName): number => {
  const found = margins.find((margin) => margin.limit === limit);
  if (!found) return 1;
  return found.holds ? Math.max(found.share, 0) : Math.min(found.share, -1e-12);
};

interface Crossing {
  power: number;
  limit: LimitName;
  breaks: boolean;
}

function crossingsOf(limit: LimitName, powers: number[], at: MarginsAt, seen: Margin[][]): Crossing[] {
  const found: Crossing[] = [];
  for (let k = 1; k < powers.length; k++) {
    const before = shareOf(seen[k - 1]!, limit);
    const after = shareOf(seen[k]!, limit);
    if (before >= 0 === after >= 0) continue;
    const span = { tolerance: precision * powers.at(-1)!, fa: before || 1e-15, fb: after };
    const power = findRoot((p) => shareOf(at(p), limit) || 1e-15, powers[k - 1]!, powers[k]!, span);
    found.push({ power, limit, breaks: after < 0 });
  }
  return found;
}

/** The powers of the first look, and those where a limit turns through zero and back between two of them. */
function withTurns(powers: number[], at: MarginsAt): number[] {
  const seen = powers.map(at);
  const names = new Set(seen.flatMap((margins) => margins.map((margin) => margin.limit)));
  const turns = [...names].flatMap((limit) =>
    hiddenTurns(
      (power) => shareOf(at(power), limit),
      powers,
      seen.map((margins) => shareOf(margins, limit)),
    ),
  );
  return [...new Set([...powers, ...turns])].sort((a, b) => a - b);
}

function windowsOf(names: LimitName[], first: Margin[], crossings: Crossing[], to: number) {
  const broken = new Set(names.filter((limit) => shareOf(first, limit) < 0));
  const windows: (Interval & { setBy: LimitName | null })[] = [];
  let from: number | null = broken.size === 0 ? 0 : null;
  for (const { power, limit, breaks } of crossings) {
    if (breaks) broken.add(limit);
    else broken.delete(limit);
    if (broken.size > 0 && from !== null) {
      windows.push({ from, to: power, setBy: limit });
      from = null;
    } else if (broken.size === 0 && from === null) from = power;
  }
  if (from !== null) windows.push({ from, to, setBy: null });
  return windows.filter((window) => window.to - window.from > 2 * precision * to);
}

/** The limit that leaves no room anywhere: it fails at the lowest power and recovers last. */
function blockerOf(names: LimitName[], seen: Margin[][]): LimitName | null {
  let worst: LimitName | null = null;
  let most = 0;
  for (const limit of names) {
    const failing = seen.reduce((count, margins) => count + (shareOf(margins, limit) < 0 ? 1 : 0), 0);
    if (failing > most) [worst, most] = [limit, failing];
  }
  return worst;
}

interface Look {
  names: LimitName[];
  seen: Margin[][];
  crossings: Crossing[];
  windows: ReturnType<typeof windowsOf>;
}

/** Everything that is found from one set of levels. */
function look(at: MarginsAt, to: number, extra: readonly number[], levels: readonly number[]): Look {
  const powers = withTurns(scanPowers(to, extra, levels), at);
  const seen = powers.map(at);
  const names = [...new Set(seen.flatMap((margins) => margins.map((margin) => margin.limit)))];
  const crossings = names
    .flatMap((limit) => crossingsOf(limit, powers, at, seen))
    .sort((a, b) => a.power - b.power);
  return { names, seen, crossings, windows: windowsOf(names, seen[0]!, crossings, to) };
}

/**
 * The pump ceiling of one way of cooling: looks along the pump-power axis, brackets every place where a limit is
 * broken or regained, and joins them to the intervals over which all hold. The ceiling is the end of the first.
 *
 * @param at margins at a pump power, W
 * @param to end of the searched range, W
 * @param extra powers near which a limit may be broken only briefly (cavity zones), W
 * @param levels of the first look, in sixtieths of the range
 * @returns ceiling, the limit that sets it, all intervals, and where each limit is first broken
 */
export function ceilingOf(
  at: MarginsAt,
  to: number,
  extra: readonly number[] = [],
  levels: readonly number[] = usualLevels,
): CeilingResult {
  let found = look(at, to, extra, levels);
  if (found.windows.length === 0) found = look(at, to, extra, [...lowLevels, ...levels]);
  const { names, seen, crossings, windows } = found;
  const first = windows[0];
  const limits = names.map((limit) => {
    const cross = crossings.find((item) => item.limit === limit && item.breaks);
    const atStart =
      shareOf(seen[0]!, limit) < 0 && !crossings.some((item) => item.limit === limit && !item.breaks);
    return { limit, pumpPower: atStart ? 0 : (cross?.power ?? null) };
  });
  return {
    pumpPower: first?.to ?? null,
    setBy: first ? first.setBy : blockerOf(names, seen),
    reachesRange: first !== undefined && first.setBy === null,
    windows: windows.map(({ from, to: end }) => ({ from, to: end })),
    limits: limits.sort((a, b) => (a.pumpPower ?? Infinity) - (b.pumpPower ?? Infinity)),
  };
}
