/** Elastic constants of the rod: stiffness isotropic, expansion isotropic or different along the axis. */
export interface ElasticConstants {
  /** Pa, > 0 */
  youngsModulus: number;
  /** -1 < nu < 0.5 */
  poissonRatio: number;
  /** 1/K, linear thermal expansion across the axis (and along it, unless `axialExpansion` is given) */
  expansion: number;
  /** 1/K, linear thermal expansion along the rod axis; left out: the same as `expansion` */
  axialExpansion?: number;
}

/**
 * Hoop stress on the barrel of a thin disk, or close to a free end: plane stress.
 * sigma = alpha E (T_mean - T_surface), exact for any axisymmetric temperature that does not vary along the axis.
 * @param meanTemperature K, area mean over the section
 * @param surfaceTemperature K, at the barrel
 * @returns Pa, tension positive: a rod hot inside has its barrel in tension
 * @source Timoshenko & Goodier, Theory of Elasticity, thermal stress in the thin circular disk
 */
export function planeStressSurfaceHoop(
  constants: ElasticConstants,
  meanTemperature: number,
  surfaceTemperature: number,
): number {
  return constants.expansion * constants.youngsModulus * (meanTemperature - surfaceTemperature);
}

/**
 * Hoop stress on the barrel far from the ends of a long rod free to lengthen: generalised plane strain.
 * sigma = E (alpha_r + nu alpha_z) / (1 - nu^2) (T_mean - T_surface), for equal expansions
 * alpha E / (1 - nu) (T_mean - T_surface); exact for any axisymmetric temperature that does not vary along the axis.
 * For equal expansions the axial stress at the barrel has the same value.
 * @param meanTemperature K, area mean over the section
 * @param surfaceTemperature K, at the barrel
 * @returns Pa, tension positive
 * @source Timoshenko & Goodier, Theory of Elasticity, thermal stress in the long circular cylinder
 */
export function planeStrainSurfaceHoop(
  constants: ElasticConstants,
  meanTemperature: number,
  surfaceTemperature: number,
): number {
  return planeStrainModulus(constants) * (meanTemperature - surfaceTemperature);
}

/** Principal stresses at one radius, Pa, tension positive. */
interface SectionStress {
  radial: number;
  hoop: number;
  axial: number;
}

/**
 * Stresses across the section of a long rod with free ends and barrel (generalised plane strain), from integrals
 * of its temperature. With M = E (alpha_r + nu alpha_z)/(1 - nu^2) and m(r) = (2/r^2) int_0^r T r dr:
 * radial = M/2 (m(a) - m(r)), hoop = M/2 (m(a) + m(r)) - M T(r),
 * axial = (nu M + E alpha_z) (m(a) - T(r)), whose resultant over the section vanishes.
 * @param meanTemperature K, m(a), area mean over the whole section
 * @param meanInside K, m(r), area mean inside the radius; on the axis the axis temperature
 * @param temperature K, T(r)
 * @source Timoshenko & Goodier, Theory of Elasticity, thermal stress in the long circular cylinder
 */
export function planeStrainStress(
  constants: ElasticConstants,
  meanTemperature: number,
  meanInside: number,
  temperature: number,
): SectionStress {
  const modulus = planeStrainModulus(constants);
  const axialModulus = constants.poissonRatio * modulus + constants.youngsModulus * axialExpansion(constants);
  return {
    radial: (modulus / 2) * (meanTemperature - meanInside),
    hoop: (modulus / 2) * (meanTemperature + meanInside) - modulus * temperature,
    axial: axialModulus * (meanTemperature - temperature),
  };
}

/**
 * Thermal shock parameter: what a material stands per its shape. R_T = k (1 - nu) sigma_f / (alpha E).
 * @param thermalConductivity W/(m K)
 * @param fractureStrength Pa, > 0, for the surface finish in question
 * @returns W/m; larger is stronger
 * @source Koechner, Solid-State Laser Engineering, thermal stress limit of a rod (from memory)
 */
export function thermalShockParameter(
  constants: ElasticConstants,
  thermalConductivity: number,
  fractureStrength: number,
): number {
  const { youngsModulus, poissonRatio, expansion } = constants;
  return (thermalConductivity * (1 - poissonRatio) * fractureStrength) / (expansion * youngsModulus);
}

/**
 * Heat per length at which the barrel of a long, uniformly heated rod reaches its strength: 8 pi R_T.
 * @param shockParameter W/m
 * @returns W/m; an end-pumped rod breaks at less, down to half of it for a pump much narrower than the rod
 * @source Koechner, Solid-State Laser Engineering, thermal stress limit of a rod (from memory)
 */
export function uniformRodHeatLimit(shockParameter: number): number {
  return 8 * Math.PI * shockParameter;
}

/** 1/K, expansion along the axis. */
export function axialExpansion(constants: ElasticConstants): number {
  return constants.axialExpansion ?? constants.expansion;
}

/** Pa/K, M of `planeStrainStress`; alpha E / (1 - nu) for equal expansions. */
function planeStrainModulus(constants: ElasticConstants): number {
  const { youngsModulus, poissonRatio, expansion } = constants;
  return (youngsModulus * (expansion + poissonRatio * axialExpansion(constants))) / (1 - poissonRatio ** 2);
}
