import type { ResolvedDesign } from '../design/resolved';
import type { RodGrid } from '../heat';
import { axialDeposit, channelsAt, type PreparedAbsorption } from '../pump';

/**
 * Share of the light entering the doped part that each axial cell absorbs.
 * @param wavelength of the diode, m
 * @returns length nz, zero in the end caps; its sum is the absorbed share
 */
export function depositAt(
  resolved: ResolvedDesign,
  grid: RodGrid,
  absorption: PreparedAbsorption,
  wavelength: number,
): Float64Array {
  const { pump } = resolved;
  const deposit = new Float64Array(grid.nz);
  const doped = deposit.subarray(grid.dopedFrom, grid.dopedTo);
  const faces = grid.axialFaces.subarray(grid.dopedFrom, grid.dopedTo + 1);
  const channels = channelsAt(absorption, wavelength);
  axialDeposit(channels, faces, pump.passes, pump.returnReflectivity, doped, pump.backShare);
  return deposit;
}

export const sumOf = (values: Float64Array): number => {
  let sum = 0;
  for (const value of values) sum += value;
  return sum;
};
