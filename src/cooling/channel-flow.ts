/** Flow is taken as laminar below, and as fully turbulent above; between them shares are linear in Re. */
const LAMINAR_END = 2300;
const TURBULENT_START = 4000;

/** Darcy friction factor of a smooth tube in turbulent flow, f = (0.790 ln Re - 1.64)^-2; Re 3000 to 5e6. */
function turbulentFriction(reynolds: number): number {
  return (0.79 * Math.log(reynolds) - 1.64) ** -2;
}

/**
 * Turbulent Nusselt number of a tube.
 *
 * Nu = (f/8)(Re - 1000) Pr / [1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)]
 *
 * @param reynolds on the diameter, 3000 to 5e6
 * @param prandtl 0.5 to 2000
 * @source Gnielinski 1976, Int. Chem. Eng. 16, 359, with Petukhov's friction factor (from memory)
 */
export function gnielinskiNusselt(reynolds: number, prandtl: number): number {
  const eighth = turbulentFriction(reynolds) / 8;
  return (eighth * (reynolds - 1000) * prandtl) / (1 + 12.7 * Math.sqrt(eighth) * (prandtl ** (2 / 3) - 1));
}

/**
 * Mean laminar Nusselt number of a tube whose flow is developed and whose temperature develops from the
 * entrance; wall of one temperature.
 *
 * Nu = 3.66 + 0.0668 Gz / (1 + 0.04 Gz^(2/3)),  Gz = Re Pr D/L
 *
 * @param graetz Gz; 0 (a long tube) gives 3.66
 * @source Hausen 1943, in Incropera, Fundamentals of Heat and Mass Transfer, equation 8.57 (from memory)
 */
export function hausenNusselt(graetz: number): number {
  return 3.66 + (0.0668 * graetz) / (1 + 0.04 * graetz ** (2 / 3));
}

/** Share of the turbulent law at a Reynolds number: 0 up to 2300, 1 from 4000. Gnielinski 1995 (from memory). */
export function turbulentShare(reynolds: number): number {
  return Math.min(1, Math.max(0, (reynolds - LAMINAR_END) / (TURBULENT_START - LAMINAR_END)));
}

/**
 * Mean Nusselt number of a tube in a given regime; between laminar and turbulent the share mixes the laws at
 * Re 2300 and 4000.
 *
 * @param share of the turbulent law, 0 to 1, see turbulentShare
 * @param diameterByLength D/L
 * @source Gnielinski 1995, Forsch. Ingenieurwes. 61, 240 (from memory)
 */
export function tubeNusselt(
  share: number,
  reynolds: number,
  prandtl: number,
  diameterByLength: number,
): number {
  const laminarReynolds = share > 0 ? LAMINAR_END : reynolds;
  const laminar = share < 1 ? hausenNusselt(laminarReynolds * prandtl * diameterByLength) : 0;
  const turbulentReynolds = share < 1 ? TURBULENT_START : Math.max(reynolds, TURBULENT_START);
  const turbulent = share > 0 ? gnielinskiNusselt(turbulentReynolds, prandtl) : 0;
  return (1 - share) * laminar + share * turbulent;
}

/** Darcy friction factor of a smooth tube: 64/Re, turbulent, and between them as turbulentShare says. */
export function tubeFriction(share: number, reynolds: number): number {
  const laminar = share < 1 ? 64 / reynolds : 0;
  const turbulent = share > 0 ? turbulentFriction(Math.max(reynolds, LAMINAR_END)) : 0;
  return (1 - share) * laminar + share * turbulent;
}

/**
 * f Re of developed laminar flow in a rectangular duct, Fanning factor on the hydraulic diameter.
 *
 * @param aspect short side / long side, 0 (24, parallel plates) to 1 (14.23, square)
 * @source Shah & London 1978, Laminar Flow Forced Convection in Ducts, equation 341 (from memory)
 */
export function rectangularDuctFriction(aspect: number): number {
  const a = aspect;
  return 24 * (1 - a * (1.3553 - a * (1.9467 - a * (1.7012 - a * (0.9564 - a * 0.2537)))));
}

/**
 * Apparent Darcy friction factor of a rectangular duct over its length, the developing entrance included.
 *
 * f Re = sqrt[(3.44 / sqrt(L+))^2 + (f Re)_developed^2],  L+ = L/(D_h Re); turbulent flow as in a tube.
 *
 * @param reynolds on the hydraulic diameter, above 0
 * @param lengthByDiameter L/D_h
 * @param aspect short side / long side
 * @source Muzychka & Yovanovich 1998 in Culham & Muzychka 2001, IEEE Trans. CPT 24, 159 (from memory)
 */
export function ductFriction(reynolds: number, lengthByDiameter: number, aspect: number): number {
  const share = turbulentShare(reynolds);
  const developed = rectangularDuctFriction(aspect);
  const entrance = 3.44 * Math.sqrt(reynolds / lengthByDiameter);
  const laminar = (4 * Math.sqrt(entrance * entrance + developed * developed)) / reynolds;
  if (share === 0) return laminar;
  return (1 - share) * laminar + share * turbulentFriction(reynolds);
}

/**
 * Mean Nusselt number of laminar air between fins, heat per fin area and per kelvin of fin above the entering
 * air, so that the warming of the air is inside.
 *
 * Nu = [(Re* Pr/2)^-3 + (0.664 Re*^(1/2) Pr^(1/3) (1 + 3.65/Re*^(1/2))^(1/2))^-3]^(-1/3),  Re* = Re_s s/L
 *
 * @param channelReynolds Re* on the fin spacing s; 0.1 to 100
 * @returns h s / k
 * @source Teertstra, Yovanovich & Culham 2000, J. Electronics Manufacturing 10, 253 (from memory)
 */
export function finChannelNusselt(channelReynolds: number, prandtl: number): number {
  const developed = 0.5 * channelReynolds * prandtl;
  const root = Math.sqrt(channelReynolds);
  const developing = 0.664 * root * Math.cbrt(prandtl) * Math.sqrt(1 + 3.65 / root);
  return (developed ** -3 + developing ** -3) ** (-1 / 3);
}
