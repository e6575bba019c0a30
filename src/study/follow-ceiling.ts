import { findRoot } from '../numerics/root';
import { worstOf } from '../limits/margins';
import type { MarginsAt } from './ceiling';

/** Steps away from a known ceiling, as factors on it, until the limits change from holding to broken. */
const upwards = [1.08, 1.25, 1.6, 2.2, 3.2, 5, 8, 13, 21, 34];
const downwards = [0.93, 0.82, 0.67, 0.5, 0.34, 0.2, 0.1, 0.04, 0.01];

/**
 * The ceiling of a design that differs a little from one whose ceiling is known: walks from the known one to where the
 * limits change from holding to broken, and closes in on the root of the smallest margin.
 * @param known ceiling of the like design, W, > 0
 * @param to end of the searched range, W; a ceiling beyond it counts as `to`
 * @param precision relative; what one uncertain value does to a ceiling is not known better than the usual one
 * @returns W; null where the limits hold nowhere down to a hundredth of the known ceiling
 */
export function followCeiling(at: MarginsAt, known: number, to: number, precision = 1e-3): number | null {
  const share = (power: number) => {
    const worst = worstOf(at(power));
    return worst.holds ? Math.max(worst.share, 1e-12) : Math.min(worst.share, -1e-12);
  };
  const start = Math.min(known, to);
  let inner = start;
  let innerShare = share(start);
  const rising = innerShare > 0;
  for (const factor of rising ? upwards : downwards) {
    const power = Math.min(known * factor, to);
    const next = share(power);
    if (next > 0 !== rising)
      return findRoot(share, inner, power, { tolerance: precision * known, fa: innerShare, fb: next });
    if (power >= to) return to;
    [inner, innerShare] = [power, next];
  }
  return rising ? to : null;
}
