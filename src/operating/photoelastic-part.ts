import type { ResolvedDesign } from '../design/resolved';
import {
  depolarisedShare,
  photoelasticPaths,
  photoelasticPower,
  unknownPhotoelasticPower,
  type ModeSection,
  type StressAlongRod,
} from '../lens';

/** What stress adds to the lens, 1/m, > 0 converging. */
export interface PhotoelasticPart {
  /** What an unpolarised mode sees; 0 where the coefficients are not known. */
  mean: number;
  radial: number;
  tangential: number;
  /** Share of a linearly polarised mode in the crossed polarisation after one pass; null where not known. */
  depolarisedShare: number | null;
  /** Where the coefficients are not known: how far the part may lie from zero, >= 0, an order of magnitude. */
  unknown: number;
}

/**
 * The photoelastic part of the lens.
 * @param along stress integrated along the rod
 * @param weights turn a path at the mesh's radii into its curvature over the mode
 * @param section the mode over the mesh's radii
 */
export function photoelasticPart(
  { rod }: ResolvedDesign,
  along: StressAlongRod,
  weights: Float64Array,
  section: ModeSection,
): PhotoelasticPart {
  const stressed = {
    youngsModulus: rod.youngModulus,
    poissonRatio: rod.poissonRatio,
    refractiveIndex: rod.refractiveIndex,
  };
  if (rod.photoelastic === null) {
    const unknown = unknownPhotoelasticPower(along, stressed, weights).mean;
    return { mean: 0, radial: 0, tangential: 0, depolarisedShare: null, unknown };
  }
  const paths = photoelasticPaths(along, { ...stressed, ...rod.photoelastic });
  const crossed = depolarisedShare(paths, section, rod.laser.wavelength);
  return { ...photoelasticPower(paths, weights), depolarisedShare: crossed, unknown: 0 };
}
