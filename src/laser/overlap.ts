import type { PumpRings } from './pump-rings';

/**
 * Overlap of a Gaussian pump and a Gaussian mode, both of unit power: int s_p s_l dA = 2 / (pi (w_p^2 + w_l^2)).
 * @param pumpRadius 1/e2 intensity radius of the pump, m
 * @param modeRadius 1/e2 intensity radius of the mode, m
 * @returns 1/m^2
 * @source Kubodera & Otsuka, J. Appl. Phys. 50, 653 (1979) (from memory)
 */
export function gaussianOverlap(pumpRadius: number, modeRadius: number): number {
  return 2 / (Math.PI * (pumpRadius * pumpRadius + modeRadius * modeRadius));
}

/**
 * Overlap of a flat-top pump and a Gaussian mode: (1 - exp(-2 w_p^2/w_l^2)) / (pi w_p^2).
 * @param pumpRadius edge of the flat-top, m
 * @param modeRadius 1/e2 intensity radius of the mode, m
 * @returns 1/m^2
 * @source integral of the mode over the pumped disc
 */
export function flatTopOverlap(pumpRadius: number, modeRadius: number): number {
  const area = pumpRadius * pumpRadius;
  return -Math.expm1((-2 * area) / (modeRadius * modeRadius)) / (Math.PI * area);
}

/**
 * Overlap of any pump, given on rings, with a Gaussian mode; the mode is integrated exactly over each ring.
 * @returns 1/m^2
 */
export function ringOverlap(rings: PumpRings, modeRadius: number): number {
  const { faces, shares } = rings;
  const perArea = -2 / (modeRadius * modeRadius);
  let total = 0;
  let overlap = 0;
  let inner = 1;
  for (let i = 0; i < shares.length; i++) {
    const square = faces[i + 1]! * faces[i + 1]!;
    const outer = Math.exp(perArea * square);
    overlap += (shares[i]! * (inner - outer)) / (Math.PI * (square - faces[i]! * faces[i]!));
    total += shares[i]!;
    inner = outer;
  }
  return total > 0 ? overlap / total : 0;
}

/**
 * Share of the absorbed power's slope that reaches the mode just above threshold, four-level, Gaussian pump and mode:
 * w_l^2 (2 w_p^2 + w_l^2) / (w_l^2 + w_p^2)^2.
 * @returns 0..1
 * @source Kubodera & Otsuka, J. Appl. Phys. 50, 653 (1979); Laporta & Brussard, IEEE J. Quantum Electron. 27, 2319 (1991) (from memory)
 */
export function slopeOverlapAtThreshold(pumpRadius: number, modeRadius: number): number {
  const p = pumpRadius * pumpRadius;
  const l = modeRadius * modeRadius;
  return (l * (2 * p + l)) / ((l + p) * (l + p));
}
