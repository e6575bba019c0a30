/** Photoelastic (Pockels, strain-optic) coefficients of a cubic crystal, contracted notation: Delta B_4 = p44 * 2 e_23. */
export interface PhotoelasticCoefficients {
  p11: number;
  p12: number;
  p44: number;
}

/**
 * What stretching does to the two polarisations of light along the axis of a rod cut along [111].
 * Delta n = -(n^3/2) Delta B with, for light polarised along r,
 * Delta B_r = own e_r + other e_t + along e_z, and for the hoop direction e_r and e_t change places.
 */
export interface AxialResponse {
  own: number;
  other: number;
  along: number;
}

/**
 * The cubic tensor p_ijkl = p12 d_ij d_kl + p44 (d_ik d_jl + d_il d_jk) + (p11 - p12 - 2 p44) sum_m c_m c_m c_m c_m, with the
 * cube axes c_m at azimuths 120 degrees apart and at acos(1/sqrt 3) to the rod axis. Summed over the three:
 *
 *   mean of Delta B_r and Delta B_t = (p12 + q)(e_r + e_t + e_z) + p44 (e_r + e_t),   q = (p11 - p12 - 2 p44)/3
 *   half their difference           = (2 p44 + q)(e_r - e_t)/2 = (p11 - p12 + 4 p44)/3 (e_r - e_t)/2
 *
 * The same at every azimuth. Only the shear e_rz adds a part that turns three times around the axis,
 * sqrt(2) q e_rz (cos 3 phi, -sin 3 phi); its mean over the azimuth is zero, and so is its integral from one free face to
 * the other, because no axial force crosses a cylinder of a free rod. It is left out.
 *
 * Derived here; the difference agrees with the (p11 - p12 + 4 p44)/3 of Koechner & Rice, IEEE JQE 6, 557 (1970) (from memory).
 */
export function axialResponse({ p11, p12, p44 }: PhotoelasticCoefficients): AxialResponse {
  const cubic = (p11 - p12 - 2 * p44) / 3;
  const volume = p12 + cubic;
  const difference = (2 * p44 + cubic) / 2;
  return { own: volume + p44 + difference, other: volume + p44 - difference, along: volume };
}
