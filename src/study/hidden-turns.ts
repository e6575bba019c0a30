/** Golden section: share of a bracket that each step keeps. */
const kept = (Math.sqrt(5) - 1) / 2;
/** Eight steps leave a fiftieth of the bracket; a turn narrower than that is not looked for. */
const mostSteps = 8;

/**
 * Where a margin that keeps its sign on three neighbouring samples turns through zero and back between them: a limit
 * broken only while the diode drifts through the absorption line, or one that holds only there.
 * Golden-section search of the extreme, given up as soon as the sign has changed.
 *
 * @param share margin as a share, at a pump power; >= 0 holds
 * @param powers three ascending powers, W
 * @param shares the shares there, of like sign, the middle one nearest to zero
 * @returns a power at which the sign is the other one, or null
 */
function turnBetween(
  share: (power: number) => number,
  powers: readonly [number, number, number],
  shares: readonly [number, number, number],
): number | null {
  const holds = shares[1] >= 0;
  let [from, best, to] = powers;
  let least = Math.abs(shares[1]);
  for (let step = 0; step < mostSteps; step++) {
    const above = to - best > best - from;
    const tried = above ? best + (1 - kept) * (to - best) : best - (1 - kept) * (best - from);
    const value = share(tried);
    if (value >= 0 !== holds) return tried;
    const nearer = Math.abs(value) < least;
    // The point farther from zero becomes an end of the bracket.
    const end = nearer ? best : tried;
    if (above === nearer) from = end;
    else to = end;
    if (nearer) [best, least] = [tried, Math.abs(value)];
  }
  return null;
}

/**
 * Powers at which a limit has the other sign than at the samples around them.
 * @param share margin as a share, at a pump power
 * @param powers ascending, W
 * @param shares of the margin at these powers
 */
export function hiddenTurns(
  share: (power: number) => number,
  powers: readonly number[],
  shares: readonly number[],
): number[] {
  const found: number[] = [];
  for (let k = 1; k + 1 < powers.length; k++) {
    const [a, b, c] = [shares[k - 1]!, shares[k]!, shares[k + 1]!];
    if (a >= 0 !== b >= 0 || b >= 0 !== c >= 0) continue;
    const size = Math.abs(b);
    const spread = Math.max(Math.abs(a) - size, Math.abs(c) - size);
    const turns = size < Math.abs(a) && size <= Math.abs(c);
    // What varies by less than its distance from zero does not get there between two samples.
    if (!turns || size > spread) continue;
    const at = turnBetween(share, [powers[k - 1]!, powers[k]!, powers[k + 1]!], [a, b, c]);
    if (at !== null) found.push(at);
  }
  return found;
}
