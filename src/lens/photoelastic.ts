import type { ElasticMesh, StressField } from '../elastic';
import { axialResponse, type PhotoelasticCoefficients } from './photoelastic-111';

/** What the optical path under stress depends on, besides the stress. */
export interface StressedRod {
  /** Pa */
  youngsModulus: number;
  poissonRatio: number;
  /** n of the free crystal, in air */
  refractiveIndex: number;
}

/** The same with the photoelastic coefficients of a cubic crystal whose [111] axis is the rod axis. */
export interface PhotoelasticConstants extends StressedRod, PhotoelasticCoefficients {}

/** Stress integrated from the pumped face to the back face, Pa m, at radii of the elastic mesh; tension positive. */
export interface StressAlongRod {
  /** m, from the axis to the barrel: two neighbouring quadratic elements share a node, each has one in its middle */
  radii: Float64Array;
  radial: Float64Array;
  hoop: Float64Array;
  axial: Float64Array;
}

/** Optical path that stress adds in one pass, m, for light polarised along r and across it; > 0 is a longer path. */
export interface PhotoelasticPaths {
  radii: Float64Array;
  radial: Float64Array;
  tangential: Float64Array;
}

/** Dioptric power, 1/m, > 0 converging. */
export interface PhotoelasticPower {
  radial: number;
  tangential: number;
  /** Of both: what an unpolarised mode sees, and a polarised one on the mean of its two planes. */
  mean: number;
}

/**
 * Stress integrated along the rod, Simpson's rule in every quadratic element: exact for the stress between its nodes.
 * Linear in the stress, and all that the photoelastic lens needs of it.
 */
export function stressAlongRod({ mesh, radial, hoop, axial }: StressField): StressAlongRod {
  const weights = simpsonWeights(mesh);
  return {
    radii: mesh.radialNodes,
    radial: alongRod(mesh, weights, radial),
    hoop: alongRod(mesh, weights, hoop),
    axial: alongRod(mesh, weights, axial),
  };
}

/**
 * Optical path that the stress of a rod adds for its two polarisations, Delta n = -(n^3/2) Delta B(elastic strain).
 *
 * The strain is the elastic one, e = ((1 + nu) s - nu (s_r + s_t + s_z))/E = total strain - alpha (T - T_ref): dn/dT is
 * measured on a crystal free of stress and already holds what free expansion does to the index, so taking the total strain
 * would count it twice. The literature disagrees on which strain goes with which dn/dT (README of this room).
 * The lengthening of the rod is no part of it: the bulge of the faces holds it.
 *
 * Left out: crystals that are not cubic, other cuts than [111], the dependence of the coefficients on wavelength and
 * temperature, strain of second order, anisotropic stiffness.
 * @param stress from `stressAlongRod`; the paths are linear in it
 * @source Nye, Physical Properties of Crystals (p_ijkl); Koechner, Appl. Opt. 9, 1429 (1970); both from memory
 */
export function photoelasticPaths(
  stress: StressAlongRod,
  constants: PhotoelasticConstants,
): PhotoelasticPaths {
  const { youngsModulus, poissonRatio, refractiveIndex } = constants;
  const { own, other, along } = axialResponse(constants);
  const perStrain = -(refractiveIndex ** 3) / 2 / youngsModulus;
  // From strain to stress: e_r own + e_t other + e_z along, each strain by Hooke's law.
  const sum = poissonRatio * (own + other + along);
  const [fromOwn, fromOther, fromAxial] = [own, other, along].map(
    (response) => perStrain * ((1 + poissonRatio) * response - sum),
  );
  const { radii, radial, hoop, axial } = stress;
  const paths = {
    radii,
    radial: new Float64Array(radii.length),
    tangential: new Float64Array(radii.length),
  };
  for (let i = 0; i < radii.length; i++) {
    paths.radial[i] = fromOwn * radial[i] + fromOther * hoop[i] + fromAxial * axial[i];
    paths.tangential[i] = fromOwn * hoop[i] + fromOther * radial[i] + fromAxial * axial[i];
  }
  return paths;
}

/**
 * Dioptric power of both polarisations, D = -2 c2 of the parabola a mode sees.
 * @param weights c2 of values at the mesh's radial nodes, from `curvatureWeights` of the elastic room
 */
export function photoelasticPower(paths: PhotoelasticPaths, weights: Float64Array): PhotoelasticPower {
  let radial = 0;
  let tangential = 0;
  for (let i = 0; i < weights.length; i++) {
    radial -= 2 * weights[i] * paths.radial[i];
    tangential -= 2 * weights[i] * paths.tangential[i];
  }
  return { radial, tangential, mean: (radial + tangential) / 2 };
}

/**
 * Size of a photoelastic coefficient nobody has measured, for a band around zero. Coefficients of oxides and fluorides lie
 * between nearly 0 and 0.25, a few above (common practice, no source); garnets are unusually low.
 */
export const typicalCoefficient = 0.15;

/**
 * How far the photoelastic lens of a crystal of unknown coefficients may lie from zero, 1/m, >= 0: the lens of each of the
 * three coefficients alone, `size` large, added as independent (root of the sum of squares). An order of magnitude, no
 * confidence interval; for crystals that are not cubic too.
 * @param size of one coefficient
 */
export function unknownPhotoelasticPower(
  stress: StressAlongRod,
  rod: StressedRod,
  weights: Float64Array,
  size: number = typicalCoefficient,
): PhotoelasticPower {
  const none = { p11: 0, p12: 0, p44: 0 };
  const parts = [{ p11: size }, { p12: size }, { p44: size }].map((one) =>
    photoelasticPower(photoelasticPaths(stress, { ...rod, ...none, ...one }), weights),
  );
  const together = (of: keyof PhotoelasticPower) => Math.hypot(...parts.map((part) => part[of]));
  return { radial: together('radial'), tangential: together('tangential'), mean: together('mean') };
}

function simpsonWeights({ axialNodes }: ElasticMesh): Float64Array {
  const weights = new Float64Array(axialNodes.length);
  for (let j = 0; j + 2 < axialNodes.length; j += 2) {
    const sixth = (axialNodes[j + 2] - axialNodes[j]) / 6;
    weights[j] += sixth;
    weights[j + 1] += 4 * sixth;
    weights[j + 2] += sixth;
  }
  return weights;
}

function alongRod({ radialNodes }: ElasticMesh, weights: Float64Array, field: Float64Array): Float64Array {
  const across = radialNodes.length;
  const integral = new Float64Array(across);
  for (let j = 0; j < weights.length; j++)
    for (let i = 0; i < across; i++) integral[i] += weights[j] * field[j * across + i];
  return integral;
}
