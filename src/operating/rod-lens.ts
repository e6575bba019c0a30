import type { RodOptics } from '../cavity';
import type { ResolvedDesign } from '../design/resolved';
import type { RodField, RodGrid } from '../heat';
import {
  aberrationLoss,
  fitLens,
  fitProfile,
  opticalPathProfile,
  planeStressBulge,
  prepareLens as prepareGeometry,
  quarticTerm,
  weighLens,
  type LensGeometry,
  type LensWeights,
} from '../lens';

import type { PhotoelasticPart } from './photoelastic-part';

/** Slices of the rod that the cavity gets; each is an exact graded-index duct, so few are enough. */
const mostSlices = 12;

/** Points and mode weights for the lens of a design's rod, and which axial cells make up which slice. */
export interface PreparedLens {
  geometry: LensGeometry;
  weights: LensWeights;
  /** First axial cell of each slice, and the number of cells at the end. */
  sliceStarts: number[];
  sliceLengths: Float64Array;
}

export function prepareLens(resolved: ResolvedDesign, grid: RodGrid): PreparedLens {
  const { pump, cavity } = resolved;
  const geometry = prepareGeometry(grid, pump.profile.kind === 'flat-top' ? pump.radius : undefined);
  const sliceStarts = [0];
  const step = Math.ceil(grid.nz / mostSlices);
  for (let j = step; j < grid.nz; j += step) sliceStarts.push(j);
  sliceStarts.push(grid.nz);
  const sliceLengths = new Float64Array(sliceStarts.length - 1);
  for (let k = 0; k < sliceLengths.length; k++)
    sliceLengths[k] = grid.axialFaces[sliceStarts[k + 1]!]! - grid.axialFaces[sliceStarts[k]!]!;
  return { geometry, weights: weighLens(geometry, cavity.lensRadius), sliceStarts, sliceLengths };
}

/** The rod's lens in 1/m, > 0 converging, fitted with the mode's weight, part by part. */
export interface RodLens {
  /** All parts together, weighted with the mode. */
  power: number;
  axisPower: number;
  thermoOptic: number;
  /** Both faces. */
  bulge: number;
  photoelastic: PhotoelasticPart;
  aberrationLoss: number;
  /** Root mean square over the mode of what the parabola leaves of the optical path, m. */
  residualPath: number;
  /** The r4 term of the optical path, 1/m3. */
  quarticTerm: number;
  optics: RodOptics;
  /** Both parts from closed forms on the same temperatures: plane-stress bulge. */
  estimate: number;
}

/**
 * The lens of a temperature field, of the bulge of its faces and of its stress. Bulge and stress follow the temperature
 * over the mode, so their share of the path is given the shape of the thermo-optic one.
 * @param bulge dioptric power of the front and the back face, 1/m
 */
export function rodLens(
  resolved: ResolvedDesign,
  prepared: PreparedLens,
  field: RodField,
  bulge: { front: number; back: number },
  photoelastic: PhotoelasticPart,
): RodLens {
  const { rod } = resolved;
  const { geometry, weights, sliceStarts, sliceLengths } = prepared;
  const fit = fitLens(field, weights);
  const thermoOptic = rod.thermoOptic * fit.power;
  const faces = bulge.front + bulge.back;
  const slices = new Float64Array(sliceLengths.length);
  const perKelvin = (power: number) => (fit.power === 0 ? 0 : power / fit.power);
  const inside = rod.thermoOptic + perKelvin(photoelastic.mean);
  for (let k = 0; k < slices.length; k++)
    for (let j = sliceStarts[k]!; j < sliceStarts[k + 1]!; j++)
      slices[k] = slices[k]! + inside * fit.slicePowers[j]!;
  const both = { sagittal: slices, tangential: slices };
  const front = { sagittal: bulge.front, tangential: bulge.front };
  const back = { sagittal: bulge.back, tangential: bulge.back };
  const rate = inside + perKelvin(faces);
  const profile = opticalPathProfile(field, geometry);
  for (let q = 0; q < profile.length; q++) profile[q] = profile[q]! * rate;
  const parabola = fitProfile(weights, profile);
  return {
    power: thermoOptic + faces + photoelastic.mean,
    axisPower: rate * fit.axisPower,
    thermoOptic,
    bulge: faces,
    photoelastic,
    aberrationLoss: aberrationLoss(weights, profile, parabola, rod.laser.wavelength),
    residualPath: parabola.residualRms,
    quarticTerm: quarticTerm(weights, profile),
    optics: {
      refractiveIndex: rod.refractiveIndex,
      sliceLengths,
      slicePowers: both,
      frontPower: front,
      backPower: back,
    },
    estimate:
      (rod.thermoOptic + planeStressBulge(rod.refractiveIndex, rod.poissonRatio, rod.expansion)) * fit.power,
  };
}
