import type { PhotoelasticCoefficients } from './photoelastic-111';

/**
 * Photoelastic coefficients of a long [111] rod heated evenly over its section, far from its ends and free to lengthen:
 * Delta n = -(n^3/2)(alpha Q/k) C r^2, Q the heat per volume.
 *
 * C_r = [(17 nu - 7) p11 + (31 nu - 17) p12 + 8 (nu + 1) p44] / (48 (nu - 1)),
 * C_t = [(10 nu - 6) p11 + 2 (11 nu - 5) p12] / (32 (nu - 1)).
 *
 * These are what the elastic strain of plane strain gives; with the total strain both would be (p11 + 2 p12)/4 smaller.
 * @returns dimensionless; Nd:YAG 0.017 and -0.0025
 * @source Koechner, Appl. Opt. 9, 1429 (1970) and Solid-State Laser Engineering, ch. 7 (from memory)
 */
export function uniformRodCoefficients(
  poissonRatio: number,
  { p11, p12, p44 }: PhotoelasticCoefficients,
): { radial: number; tangential: number } {
  const nu = poissonRatio;
  return {
    radial: ((17 * nu - 7) * p11 + (31 * nu - 17) * p12 + 8 * (nu + 1) * p44) / (48 * (nu - 1)),
    tangential: ((10 * nu - 6) * p11 + 2 * (11 * nu - 5) * p12) / (32 * (nu - 1)),
  };
}

/** A long rod heated evenly. */
export interface UniformRod {
  /** W/(m K) */
  thermalConductivity: number;
  /** W of heat in the whole rod */
  heat: number;
  /** m */
  radius: number;
  /** 1/K */
  thermoOptic: number;
  /** 1/K */
  expansion: number;
  refractiveIndex: number;
  /** m; left out: no bulge of the faces */
  length?: number;
}

/**
 * Dioptric power of an evenly heated rod for one polarisation, the closed form beside which the computed lens stands:
 * D = P_h/(k A) [dn/dT / 2 + alpha C n^3 + alpha r0 (n - 1)/L].
 * @param coefficient C of the polarisation, see `uniformRodCoefficients`; 0 leaves stress out
 * @returns 1/m, > 0 converging; the bulge is an estimate, as if a layer of the depth of the radius bulged freely at each face
 * @source Koechner, Appl. Opt. 9, 1429 (1970) (from memory)
 */
export function uniformRodPower(rod: UniformRod, coefficient: number): number {
  const { thermalConductivity, heat, radius, thermoOptic, expansion, refractiveIndex, length } = rod;
  const bulge = length === undefined ? 0 : (expansion * radius * (refractiveIndex - 1)) / length;
  const bracket = thermoOptic / 2 + expansion * coefficient * refractiveIndex ** 3 + bulge;
  return (heat / (thermalConductivity * Math.PI * radius ** 2)) * bracket;
}
