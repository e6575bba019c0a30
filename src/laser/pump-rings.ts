import { ringShares, shareWithin } from '../pump';
import type { BeamProfile } from '../pump';

/** How the absorbed pump power is spread over radius, summed along the rod. Within a ring it is taken as even per area. */
export interface PumpRings {
  /** faces of the rings from the axis outwards, m, length shares.length + 1, first 0 */
  faces: Float64Array;
  /** absorbed power per ring, any common unit */
  shares: Float64Array;
}

/** Beyond the last even step the outer share is halved until less than this is left. */
const LEAST_TAIL = 1e-5;
/** Radii are found to 2^-32 of the aperture: picometres. */
const BISECTIONS = 32;

/** Radius inside which a given share of the beam lies, by bisection of the monotonic closed form. */
function radiusOfShare(profile: BeamProfile, radius: number, share: number, largest: number): number {
  let low = 0;
  let high = largest;
  for (let i = 0; i < BISECTIONS; i++) {
    const middle = (low + high) / 2;
    if (shareWithin(profile, radius, middle) < share) low = middle;
    else high = middle;
  }
  return high;
}

function quantileRadii(
  profile: BeamProfile,
  radius: number,
  apertureRadius: number,
  count: number,
): number[] {
  const inside = shareWithin(profile, radius, apertureRadius);
  const radii: number[] = [];
  for (let k = 1; k < count; k++)
    radii.push(radiusOfShare(profile, radius, (inside * k) / count, apertureRadius));
  for (let rest = 1 / (2 * count); rest > LEAST_TAIL; rest /= 2)
    radii.push(radiusOfShare(profile, radius, inside * (1 - rest), apertureRadius));
  radii.push(radiusOfShare(profile, radius, inside * (1 - 1e-12), apertureRadius), apertureRadius);
  return radii;
}

/**
 * Radial faces on which overlap integrals are good to 1e-4: rings of even pump share, finer in the tail, at the narrowest
 * and at the widest place of the beam.
 * @param beamRadii one beam radius (m), or one per axial cell
 * @param apertureRadius rod radius, m; the last face
 * @param count rings of even share; the error falls with its square. Where the beam widens, half of them at each of the two places
 * @returns ascending, first 0
 */
export function overlapFaces(
  profile: BeamProfile,
  beamRadii: number | ArrayLike<number>,
  apertureRadius: number,
  count = 120,
): Float64Array {
  const all = typeof beamRadii === 'number' ? [beamRadii] : Array.from(beamRadii);
  const narrowest = all.reduce((a, b) => Math.min(a, b));
  const widest = all.reduce((a, b) => Math.max(a, b));
  const places = widest > narrowest ? [narrowest, widest] : [narrowest];
  const radii = places.flatMap((w) =>
    quantileRadii(profile, w, apertureRadius, Math.ceil(count / places.length)),
  );
  radii.sort((a, b) => a - b);
  const faces = [0];
  for (const r of radii) if (r > faces[faces.length - 1]! * (1 + 1e-9)) faces.push(r);
  return Float64Array.from(faces);
}

/**
 * Radial spread of the absorbed power: each axial cell's deposit times its ring shares, summed along the rod.
 * @param faces radial faces, m
 * @param shares ring shares per axial cell, ring i of cell j at j * nr + i (one row where the beam is collimated)
 * @param deposit absorbed share or power per axial cell; not needed where there is one row
 */
export function combineRings(
  faces: Float64Array,
  shares: Float64Array,
  deposit?: ArrayLike<number>,
): PumpRings {
  const rings = faces.length - 1;
  const rows = shares.length / rings;
  if (rows === 1 || deposit === undefined) return { faces, shares: shares.slice(0, rings) };
  const sum = new Float64Array(rings);
  for (let j = 0; j < rows; j++)
    for (let i = 0; i < rings; i++) sum[i]! += deposit[j]! * shares[j * rings + i]!;
  return { faces, shares: sum };
}

/**
 * Radial spread of a collimated pump on rings made for it.
 * @param radius beam radius w, m
 * @param apertureRadius rod radius, m
 */
export function pumpRings(
  profile: BeamProfile,
  radius: number,
  apertureRadius: number,
  count?: number,
): PumpRings {
  const faces = overlapFaces(profile, radius, apertureRadius, count);
  return { faces, shares: ringShares(profile, faces, radius) };
}
