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
  weighLens,
  type LensGeometry,
  type LensWeights,
} from '../lens';

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
  aberrationLoss: number;
  optics: RodOptics;
  /** Both parts from closed forms on the same temperatures: plane-stress bulge. */
  estimate: number;
}

/**
 * The lens of a temperature field and of the bulge of its faces.
 * @param bulge dioptric power of the front and the back face, 1/m
 */
export function rodLens(
  resolved: ResolvedDesign,
  prepared: PreparedLens,
  field: RodField,
  bulge: { front: number; back: number },
): RodLens {
  const { rod } = resolved;
  const { geometry, weights, sliceStarts, sliceLengths } = prepared;
  const fit = fitLens(field, weights);
  const thermoOptic = rod.thermoOptic * fit.power;
  const faces = bulge.front + bulge.back;
  const slices = new Float64Array(sliceLengths.length);
  for (let k = 0; k < slices.length; k++)
    for (let j = sliceStarts[k]!; j < sliceStarts[k + 1]!; j++)
      slices[k] = slices[k]! + rod.thermoOptic * fit.slicePowers[j]!;
  const both = { sagittal: slices, tangential: slices };
  const front = { sagittal: bulge.front, tangential: bulge.front };
  const back = { sagittal: bulge.back, tangential: bulge.back };
  // The bulge follows the temperature over the mode, so its share of the path has the shape of the thermo-optic one.
  const bulgeRate = fit.power === 0 ? 0 : faces / fit.power;
  const rate = rod.thermoOptic + bulgeRate;
  const profile = opticalPathProfile(field, geometry);
  for (let q = 0; q < profile.length; q++) profile[q] = profile[q]! * rate;
  return {
    power: thermoOptic + faces,
    axisPower: rate * fit.axisPower,
    thermoOptic,
    bulge: faces,
    aberrationLoss: aberrationLoss(weights, profile, fitProfile(weights, profile), rod.laser.wavelength),
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
