import type { PumpChannel } from './channels';

/**
 * Share of the entering pump light that the doped length absorbs: sum_i w_i (1 - E_i)(1 + R E_i), E_i = exp(-alpha_i L).
 * It is the same from whichever end the light enters.
 * @param length doped length, m
 * @param passes 1, or 2 where a mirror behind the rod sends the rest back
 * @param returnReflectivity R, share of the light leaving the first pass that comes back into the rod
 * @returns 0..1
 */
export function absorbedShare(
  channels: readonly PumpChannel[],
  length: number,
  passes: 1 | 2,
  returnReflectivity: number,
): number {
  const returned = passes === 2 ? returnReflectivity : 0;
  let absorbed = 0;
  for (const { share, absorptionCoefficient } of channels) {
    const rest = Math.exp(-absorptionCoefficient * length);
    absorbed += share * (1 - rest) * (1 + returned * rest);
  }
  return absorbed;
}

/**
 * Where the light that is not absorbed goes; with absorbedShare it sums to 1.
 * @returns `farEnd` leaves at the end opposite the entrance (one pass: transmitted; two passes: lost at the mirror),
 *   `entrance` comes back out of the end it entered (two passes only)
 */
export function unabsorbedShares(
  channels: readonly PumpChannel[],
  length: number,
  passes: 1 | 2,
  returnReflectivity: number,
): { farEnd: number; entrance: number } {
  const returned = passes === 2 ? returnReflectivity : 0;
  let farEnd = 0;
  let entrance = 0;
  for (const { share, absorptionCoefficient } of channels) {
    const rest = Math.exp(-absorptionCoefficient * length);
    farEnd += share * (1 - returned) * rest;
    entrance += share * returned * rest * rest;
  }
  return { farEnd, entrance };
}

/**
 * Share of the entering pump light absorbed in each axial cell, exact for exponential absorption:
 * A (exp(-alpha z_j) - exp(-alpha z_j+1)) for light travelling to the back plus the mirrored term for light travelling to the front.
 * @param zFaces faces of the cells from the front to the back of the doped part, m, ascending; the first need not be 0
 * @param passes 1, or 2 where a mirror opposite the entrance sends the rest back
 * @param returnReflectivity reflectivity of that mirror
 * @param out receives the result, length zFaces.length - 1
 * @param backShare share of the light that enters at the back (pumping from both ends), 0..1
 * @returns length zFaces.length - 1, cell j between faces j and j + 1; sums to absorbedShare
 */
export function axialDeposit(
  channels: readonly PumpChannel[],
  zFaces: Float64Array,
  passes: 1 | 2,
  returnReflectivity: number,
  out: Float64Array = new Float64Array(zFaces.length - 1),
  backShare = 0,
): Float64Array {
  const cells = zFaces.length - 1;
  const front = zFaces[0]!;
  const back = zFaces[cells]!;
  const returned = passes === 2 ? returnReflectivity : 0;
  out.fill(0);
  for (const { share, absorptionCoefficient: alpha } of channels) {
    const rest = Math.exp(-alpha * (back - front));
    const toBack = share * (1 - backShare + backShare * returned * rest);
    const toFront = share * (backShare + (1 - backShare) * returned * rest);
    let before = 1;
    for (let j = 0; j < cells; j++) {
      const after = Math.exp(-alpha * (zFaces[j + 1]! - front));
      out[j]! += toBack * (before - after);
      before = after;
    }
    if (toFront === 0) continue;
    let behind = 1;
    for (let j = cells - 1; j >= 0; j--) {
      const ahead = Math.exp(-alpha * (back - zFaces[j]!));
      out[j]! += toFront * (behind - ahead);
      behind = ahead;
    }
  }
  return out;
}
