import { gammaShare } from '../numerics/special';

/**
 * How the pump's intensity falls with radius. The beam radius w means: 1/e2 intensity radius for a Gaussian and a
 * super-Gaussian exp(-2 (r^2/w^2)^order) (order 1 is the Gaussian), the edge for a flat-top.
 */
export type BeamProfile =
  | { kind: 'gaussian' }
  | { kind: 'flat-top' }
  | { kind: 'super-gaussian'; order: number }
  /**
   * measured: radii (m, ascending, from 0 or more) and intensities (any unit), linear in between, level inside the first
   * radius, zero beyond the last. With `measuredRadius` (m) the table was taken where the beam radius was that, and it
   * stretches with the beam radius; without it the radii hold everywhere.
   */
  | { kind: 'table'; radii: ArrayLike<number>; intensities: ArrayLike<number>; measuredRadius?: number };

/** Where a super-Gaussian (order 1/2 or more) has fallen to exp(-40) less than 2e-16 of its power is left outside. */
const DARK_EXPONENT = 40;

/** Power of the linear piece I = i0 + slope (x - r0) between r0 and r, over 2 pi: int I x dx. */
function pieceIntegral(r0: number, i0: number, slope: number, r: number): number {
  return ((i0 - slope * r0) * (r * r - r0 * r0)) / 2 + (slope * (r * r * r - r0 * r0 * r0)) / 3;
}

/** Power over 2 pi inside each radius of a table, in its own units; summed once, since a design asks thousands of times. */
const sums = new WeakMap<object, Float64Array>();

function powerAtPoints(profile: BeamProfile & { kind: 'table' }): Float64Array {
  const known = sums.get(profile);
  if (known) return known;
  const { radii, intensities } = profile;
  const power = new Float64Array(radii.length);
  power[0] = (intensities[0]! * radii[0]! * radii[0]!) / 2;
  for (let k = 1; k < power.length; k++) power[k] = power[k - 1]! + beyondPoint(profile, k - 1, radii[k]!);
  sums.set(profile, power);
  return power;
}

/** Power over 2 pi between point k and a radius of the piece behind it. */
function beyondPoint({ radii, intensities }: BeamProfile & { kind: 'table' }, k: number, r: number): number {
  const r0 = radii[k]!;
  const width = radii[k + 1]! - r0;
  if (!(width > 0)) return 0;
  return pieceIntegral(r0, intensities[k]!, (intensities[k + 1]! - intensities[k]!) / width, r);
}

function tableShare(profile: BeamProfile & { kind: 'table' }, radius: number, r: number): number {
  const { radii, intensities, measuredRadius } = profile;
  const last = radii.length - 1;
  const scaled = measuredRadius === undefined ? r : (r * measuredRadius) / radius;
  const power = powerAtPoints(profile);
  const total = power[last]!;
  if (scaled >= radii[last]! || !(total > 0)) return 1;
  if (scaled <= radii[0]!) return (intensities[0]! * scaled * scaled) / 2 / total;
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (radii[middle]! <= scaled) low = middle;
    else high = middle;
  }
  return (power[low]! + beyondPoint(profile, low, scaled)) / total;
}

/**
 * Share of the beam's power inside radius r, in closed form, so that a ring's share (a difference) is exact.
 * gaussian 1 - exp(-2 r^2/w^2); flat-top r^2/w^2; super-gaussian P(1/p, 2 (r/w)^(2p)); table: exact for linear pieces.
 * @param radius beam radius w at this place, m
 * @param r m, Infinity gives 1
 * @returns 0..1
 * @source Koechner, Solid-State Laser Engineering (Gaussian, flat-top; from memory); super-Gaussian by substitution t = 2 (r/w)^(2p)
 */
export function shareWithin(profile: BeamProfile, radius: number, r: number): number {
  if (!(r > 0)) return 0;
  if (r === Infinity) return 1;
  const x = (r * r) / (radius * radius);
  switch (profile.kind) {
    case 'gaussian':
      return -Math.expm1(-2 * x);
    case 'flat-top':
      return Math.min(1, x);
    case 'super-gaussian': {
      const exponent = 2 * x ** profile.order;
      return exponent > DARK_EXPONENT ? 1 : gammaShare(1 / profile.order, exponent);
    }
    case 'table':
      return tableShare(profile, radius, r);
  }
}

/**
 * Share of the beam that misses the rod: it lies outside the aperture, is not absorbed and must be reported.
 * @param radius beam radius at the rod, m (take the widest)
 * @param apertureRadius radius of the rod's clear face, m
 * @returns 0..1
 */
export function clippedShare(profile: BeamProfile, radius: number, apertureRadius: number): number {
  return 1 - shareWithin(profile, radius, apertureRadius);
}

/**
 * Share of the beam's power in each ring between neighbouring radial faces.
 * @param radialFaces faces of the rings from the axis outwards, m, first 0
 * @param beamRadii one beam radius (m), or one per axial cell
 * @returns one radius: length nr. Per axial cell: length nr * nz, ring i of cell j at j * nr + i. Each row sums to the share
 *   inside the last face; the rest is clipped, not put back.
 */
export function ringShares(
  profile: BeamProfile,
  radialFaces: Float64Array,
  beamRadii: number | ArrayLike<number>,
): Float64Array {
  const radii = typeof beamRadii === 'number' ? [beamRadii] : beamRadii;
  const rings = radialFaces.length - 1;
  const shares = new Float64Array(rings * radii.length);
  for (let j = 0; j < radii.length; j++) {
    if (j > 0 && radii[j] === radii[j - 1]) {
      shares.copyWithin(j * rings, (j - 1) * rings, j * rings);
      continue;
    }
    let inside = shareWithin(profile, radii[j]!, radialFaces[0]!);
    for (let i = 0; i < rings; i++) {
      const next = shareWithin(profile, radii[j]!, radialFaces[i + 1]!);
      shares[j * rings + i] = next - inside;
      inside = next;
    }
  }
  return shares;
}
