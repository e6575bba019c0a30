import type { RodGrid } from './grid';

/**
 * Heat set free in every cell: heat power x share of the axial cell x share of the ring.
 *
 * @param ringShares share of the pump light inside each ring, length nr, or nr*nz (ring i of axial cell j at j*nr + i)
 * @param deposit share of the entering light absorbed in each axial cell, length nz (0 in caps)
 * @param heatPower W set free if all the light that enters were absorbed
 * @param out receives the result; a new array if left out
 * @returns W, length nRadial*nz; the cells of the mount get none
 */
export function heatSource(
  grid: RodGrid,
  ringShares: Float64Array,
  deposit: Float64Array,
  heatPower: number,
  out: Float64Array = new Float64Array(grid.nRadial * grid.nz),
): Float64Array {
  const { nr, nz, nRadial } = grid;
  const stride = ringShares.length > nr ? nr : 0;
  for (let j = 0; j < nz; j++) {
    const power = heatPower * deposit[j]!;
    const row = j * nRadial;
    for (let i = 0; i < nr; i++) out[row + i] = power * ringShares[j * stride + i]!;
  }
  return out;
}
