import type { ResolvedDesign } from '../design/resolved';
import type { RodGrid } from '../heat';
import { overlapFaces } from '../laser';
import { beamRadii, ringShares, type FocusedBeam, type PreparedAbsorption } from '../pump';
import { depositAt } from './absorbed';

/** How the absorbed heat spreads over radius, on rings of the heat grid and on finer ones for the overlap with the mode. */
export interface PumpSpread {
  /** Ring i of axial cell j at j * nr + i (one row where the beam is collimated). */
  heatShares: Float64Array;
  overlapFaces: Float64Array;
  overlapShares: Float64Array;
  /** Share of the light that passes outside the rod. */
  clipped: number;
}

/** Scales the shares of one plane to a given sum. */
function evenOut(row: Float64Array, total: number): void {
  const sum = row.reduce((all, share) => all + share, 0);
  if (sum > 0 && sum !== total) for (let i = 0; i < row.length; i++) row[i] = (row[i]! * total) / sum;
}

/** Beam radius in each axial cell, m, for light that enters at the front or at the back; one number where it is collimated. */
function radiiAlong({ pump }: ResolvedDesign, grid: RodGrid, beam: FocusedBeam, from: 'front' | 'back') {
  if (pump.beamQuality === null) return pump.radius;
  if (from === 'front') return beamRadii(grid.axialFaces, beam);
  // Either beam has its waist as far inside the face by which it enters.
  const end = grid.axialFaces[grid.nz]!;
  return beamRadii(grid.axialFaces, { ...beam, waistPosition: end - beam.waistPosition });
}

/** Share of the heat of each axial cell that comes from light which entered at the back, at the diode's nominal wavelength. */
function backOrigin(resolved: ResolvedDesign, grid: RodGrid, absorption: PreparedAbsorption): Float64Array {
  const { pump } = resolved;
  const entering = (backShare: number) =>
    depositAt({ ...resolved, pump: { ...pump, backShare } }, grid, absorption, pump.wavelength);
  const [front, back] = [entering(0), entering(1)];
  const share = pump.backShare;
  return front.map((fromFront, j) => {
    const all = (1 - share) * fromFront + share * back[j]!;
    return all > 0 ? (share * back[j]!) / all : share;
  });
}

/** Shares of every ring and axial cell where light enters at both faces and neither beam is collimated. */
function mixRings(front: Float64Array, back: Float64Array, fromBack: Float64Array): Float64Array {
  const rings = front.length / fromBack.length;
  return front.map((share, k) => {
    const part = fromBack[Math.floor(k / rings)]!;
    return (1 - part) * share + part * back[k]!;
  });
}

/** Spreads the pump light over the rings of the heat grid, and over finer ones, in every axial cell where it diverges. */
export function spreadOf(
  resolved: ResolvedDesign,
  grid: RodGrid,
  beam: FocusedBeam,
  absorption: PreparedAbsorption,
): PumpSpread {
  const { pump, rod } = resolved;
  const radii = radiiAlong(resolved, grid, beam, 'front');
  const mixed = pump.backShare > 0 && pump.beamQuality !== null;
  const fromBack = mixed ? backOrigin(resolved, grid, absorption) : null;
  const sharesOn = (faces: Float64Array) => {
    const front = ringShares(pump.profile, faces, radii);
    if (!fromBack) return front;
    const back = ringShares(pump.profile, faces, radiiAlong(resolved, grid, beam, 'back'));
    return mixRings(front, back, fromBack);
  };
  const finer = overlapFaces(pump.profile, radii, rod.radius, 16);
  const heatShares = sharesOn(grid.radialFaces);
  const middle = (grid.dopedFrom + grid.dopedTo) >> 1;
  const row =
    heatShares.length > grid.nr ? heatShares.subarray(middle * grid.nr, (middle + 1) * grid.nr) : heatShares;
  const inside = row.reduce((sum, share) => sum + share, 0);
  // A diverging beam is clipped once, not anew in every plane: all rows carry the light of the middle one.
  for (let from = 0; from < heatShares.length; from += grid.nr)
    evenOut(heatShares.subarray(from, from + grid.nr), inside);
  return {
    heatShares,
    overlapFaces: finer,
    overlapShares: sharesOn(finer),
    clipped: 1 - inside,
  };
}
