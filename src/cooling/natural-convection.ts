/** Acceleration of free fall, m/s2. */
const GRAVITY = 9.80665;

/** The few air properties that buoyant flow needs, at the film temperature. */
export interface FilmProperties {
  /** m2/s */
  kinematicViscosity: number;
  /** m2/s */
  diffusivity: number;
  /** 1/K; 1/T for air */
  expansion: number;
}

/**
 * Rayleigh number g beta |T_wall - T_air| l^3 / (nu alpha).
 *
 * @param film properties at the mean of wall and air temperature
 * @param difference wall minus air, K, either sign
 * @param length l, m
 */
export function rayleighNumber(film: FilmProperties, difference: number, length: number): number {
  const buoyancy = GRAVITY * film.expansion * Math.abs(difference);
  return (buoyancy * length ** 3) / (film.kinematicViscosity * film.diffusivity);
}

/**
 * Mean Nusselt number of an isothermal vertical plate, laminar and turbulent.
 *
 * Nu = (0.825 + 0.387 Ra^(1/6) / [1 + (0.492/Pr)^(9/16)]^(8/27))^2
 *
 * @param rayleigh on the height, 0.1 to 1e12
 * @param prandtl
 * @returns h height / k
 * @source Churchill & Chu 1975, Int. J. Heat Mass Transfer 18, 1323, equation 9 (from memory)
 */
export function verticalPlateNusselt(rayleigh: number, prandtl: number): number {
  const root = 0.825 + (0.387 * rayleigh ** (1 / 6)) / (1 + (0.492 / prandtl) ** (9 / 16)) ** (8 / 27);
  return root * root;
}

/**
 * Mean Nusselt number of an isothermal vertical plate in laminar flow, closer there than the one above.
 *
 * Nu = 0.68 + 0.670 Ra^(1/4) / [1 + (0.492/Pr)^(9/16)]^(4/9)
 *
 * @param rayleigh on the height, up to 1e9
 * @source Churchill & Chu 1975, Int. J. Heat Mass Transfer 18, 1323 (from memory)
 */
export function laminarPlateNusselt(rayleigh: number, prandtl: number): number {
  return 0.68 + (0.67 * rayleigh ** 0.25) / (1 + (0.492 / prandtl) ** (9 / 16)) ** (4 / 9);
}

/** Laminar up to Ra 1e9, the law of the whole range from 1e10, and in between by shares of log Ra. */
export function outerFaceNusselt(rayleigh: number, prandtl: number): number {
  if (rayleigh <= 1e9) return laminarPlateNusselt(rayleigh, prandtl);
  const share = Math.min(1, Math.log10(rayleigh) - 9);
  return (
    (1 - share) * laminarPlateNusselt(rayleigh, prandtl) + share * verticalPlateNusselt(rayleigh, prandtl)
  );
}

/**
 * Mean Nusselt number between isothermal vertical plates heated on both sides; heat per wall area and per
 * kelvin of wall above the entering air.
 *
 * Nu_s = [576 / El^2 + 2.873 / El^(1/2)]^(-1/2),  El = Ra_s s/L
 *
 * @param channelRayleigh El, Rayleigh number on the spacing s times s/L
 * @returns h s / k
 * @source Bar-Cohen & Rohsenow 1984, J. Heat Transfer 106, 116 (from memory)
 */
export function parallelPlateNusselt(channelRayleigh: number): number {
  if (channelRayleigh <= 0) return 0;
  return 1 / Math.sqrt(576 / channelRayleigh ** 2 + 2.873 / Math.sqrt(channelRayleigh));
}

/**
 * The plate spacing that sheds most heat from a given base area, plates much thinner than the spacing.
 *
 * s = 2.714 L / Ra_L^(1/4)
 *
 * @param length L of the plates along the flow, m
 * @param rayleigh Ra_L on that length
 * @returns m
 * @source Bar-Cohen & Rohsenow 1984, J. Heat Transfer 106, 116 (from memory)
 */
export function optimumFinSpacing(length: number, rayleigh: number): number {
  return (2.714 * length) / rayleigh ** 0.25;
}
