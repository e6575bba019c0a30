import type { RodField } from '../heat';
import { lagrangeStart, lagrangeWeights } from '../numerics/lagrange';
import { type LensGeometry, partialWeights, stageWeights, stages } from './geometry';
import { faceGradients } from './gradients';
import type { LensWeights } from './weights';

/** Dioptric powers of a temperature field for dn/dT = 1 /K, 1/m per 1/K; multiply by dn/dT. Positive: converging. */
export interface LensPower {
  /** What the mode sees: -2 c2 of the parabola fitted over the mode's intensity. */
  power: number;
  /** Curvature on the axis. */
  axisPower: number;
  /** The same for each axial cell, length nz, sums `power` and `axisPower`. */
  slicePowers: Float64Array;
  axisSlicePowers: Float64Array;
}

/**
 * Thermal lens of a field, as the mode sees it and on the axis, in total and slice by slice.
 *
 * OPD(r) = dn/dT * integral of (T(r,z) - T(0,z)) dz; D = -2 c2. Left out: bulge of the faces and stress, which add to it.
 * @param weights mode intensity, from weighLens
 * @source Innocenzi et al., Appl. Phys. Lett. 56, 1831 (1990) (from memory) for the axis; Koechner, Solid-State Laser Engineering, ch. 7
 */
export function fitLens(field: RodField, weights: LensWeights): LensPower {
  const { geometry, faceWeights } = weights;
  const { nr, nz, axialFaces } = field.grid;
  const gradients = faceGradients(field, geometry);
  const slicePowers = new Float64Array(nz);
  const axisSlicePowers = new Float64Array(nz);
  const [a0, a1, a2] = [geometry.axis[0]!, geometry.axis[1]!, geometry.axis[2]!];
  let power = 0;
  let axisPower = 0;
  for (let j = 0; j < nz; j++) {
    const dz = axialFaces[j + 1]! - axialFaces[j]!;
    const row = j * nr;
    let fitted = 0;
    for (let f = 0; f < nr; f++) fitted += faceWeights[f]! * gradients[row + f]!;
    slicePowers[j] = fitted * dz;
    axisSlicePowers[j] =
      2 * dz * (a0 * gradients[row]! + a1 * gradients[row + 1]! + a2 * gradients[row + 2]!);
    power += slicePowers[j]!;
    axisPower += axisSlicePowers[j]!;
  }
  return { power, axisPower, slicePowers, axisSlicePowers };
}

/**
 * I(r) = integral over the rod of (T(r,z) - T(0,z)) dz at the points of the geometry, K m; OPD = dn/dT * I.
 * @returns length of geometry.squares; negative where it is colder than on the axis
 */
export function opticalPathProfile(field: RodField, geometry: LensGeometry): Float64Array {
  const { nr, nz, axialFaces } = field.grid;
  const gradients = faceGradients(field, geometry);
  const sums = new Float64Array(nr);
  for (let j = 0; j < nz; j++) {
    const dz = axialFaces[j + 1]! - axialFaces[j]!;
    for (let f = 0; f < nr; f++) sums[f] = sums[f]! + gradients[j * nr + f]! * dz;
  }
  return integrateFromAxis(geometry, sums);
}

/** Minus the integral from the axis of a quantity known at the faces, at the points of the geometry. */
export function integrateFromAxis(geometry: LensGeometry, faces: Float64Array): Float64Array {
  const { widths, faceIndex, faceShare } = geometry;
  const profile = new Float64Array(widths.length * stages);
  const here = new Float64Array(stages);
  let before = 0;
  for (let k = 0; k < widths.length; k++) {
    const width = widths[k]!;
    for (let stage = 0; stage < stages; stage++) {
      const base = 4 * (k * stages + stage);
      here[stage] =
        faceShare[base]! * faces[faceIndex[base]!]! +
        faceShare[base + 1]! * faces[faceIndex[base + 1]!]! +
        faceShare[base + 2]! * faces[faceIndex[base + 2]!]! +
        faceShare[base + 3]! * faces[faceIndex[base + 3]!]!;
    }
    for (let stage = 0; stage < stages; stage++) {
      const row = partialWeights[stage]!;
      profile[k * stages + stage] =
        before - width * (row[0] * here[0]! + row[1] * here[1]! + row[2] * here[2]!);
    }
    before -= width * (stageWeights[0] * here[0]! + stageWeights[1] * here[1]! + stageWeights[2] * here[2]!);
  }
  return profile;
}

/**
 * Value of a profile at any radius up to the barrel; zero on the axis, cubic between points, even across the axis.
 * @param profile at the points of the geometry, measured from the axis
 * @param radius m
 */
export function profileAt(geometry: LensGeometry, profile: Float64Array, radius: number): number {
  const { radii, grid } = geometry;
  const stretch = (r: number) => Math.asinh(r / grid.radialScale);
  const inner = [stretch(radii[0]!), stretch(radii[1]!)] as const;
  const nodes = Float64Array.from([-inner[1], -inner[0], 0, ...radii.map(stretch)]);
  const weights = new Float64Array(4);
  const start = lagrangeStart(stretch(radius), nodes, 4);
  lagrangeWeights(stretch(radius), nodes, start, 4, weights);
  let value = 0;
  for (let k = 0; k < 4; k++) {
    const node = start + k;
    if (node !== 2) value += weights[k]! * profile[node > 2 ? node - 3 : 1 - node]!;
  }
  return value;
}

/** Parabola fitted to a profile over the mode's intensity. */
export interface ProfileFit {
  c0: number;
  /** Per m^2. */
  c2: number;
  /** -2 c2, 1/m; positive: converging. */
  power: number;
  /** Root mean square over the mode's intensity of what the parabola leaves, m. */
  residualRms: number;
}

/**
 * Fits c0 + c2 r^2 to any optical path profile (thermo-optic, bulge, stress, or their sum).
 * @param profile m at the points of the geometry
 */
export function fitProfile(weights: LensWeights, profile: Float64Array): ProfileFit {
  const { geometry, intensity, meanSquare, meanFourth } = weights;
  const { squares } = geometry;
  let mean = 0;
  let tilt = 0;
  for (let q = 0; q < profile.length; q++) {
    mean += intensity[q]! * profile[q]!;
    tilt += intensity[q]! * (squares[q]! - meanSquare) * profile[q]!;
  }
  const c2 = tilt / (meanFourth - meanSquare ** 2);
  const c0 = mean - c2 * meanSquare;
  let rest = 0;
  for (let q = 0; q < profile.length; q++) {
    rest += intensity[q]! * (profile[q]! - c0 - c2 * squares[q]!) ** 2;
  }
  return { c0, c2, power: -2 * c2, residualRms: Math.sqrt(rest) };
}

/**
 * Share of the mode's power that the aberrated part of an optical path profile scatters out of the mode in one pass:
 * 1 - |<exp(i k (OPD - parabola))>|^2, the mean taken over the mode's intensity.
 * @param profile m at the points of the geometry
 * @param wavelength vacuum wavelength, m
 * @returns 0 ... 1
 * @source overlap of a mode with its aberrated self; Siegman, Lasers (1986) (from memory)
 */
export function aberrationLoss(
  weights: LensWeights,
  profile: Float64Array,
  fit: ProfileFit,
  wavelength: number,
): number {
  const { geometry, intensity } = weights;
  const { squares } = geometry;
  const waveNumber = (2 * Math.PI) / wavelength;
  // cos and sin of the phase are taken as departures from 1 and 0, so that small losses keep their digits.
  let lostReal = 0;
  let imaginary = 0;
  for (let q = 0; q < profile.length; q++) {
    const phase = waveNumber * (profile[q]! - fit.c0 - fit.c2 * squares[q]!);
    const half = Math.sin(phase / 2);
    lostReal += intensity[q]! * 2 * half * half;
    imaginary += intensity[q]! * Math.sin(phase);
  }
  return Math.max(0, lostReal * (2 - lostReal) - imaginary * imaginary);
}
