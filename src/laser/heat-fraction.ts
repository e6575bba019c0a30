/** What the share of absorbed pump power that becomes heat depends on. */
export interface HeatFractionInput {
  /** m */
  pumpWavelength: number;
  /** m */
  laserWavelength: number;
  /** mean wavelength of the fluorescence, m */
  fluorescenceWavelength: number;
  /** eta_p: excitations of the upper level per absorbed pump photon, 0..1 */
  pumpQuantumEfficiency: number;
  /** eta_r: share of the excitations that radiate when there is no stimulated emission, 0..1 */
  radiativeEfficiency: number;
  /** eta_l: share of the excitations taken by stimulated emission, 0..1; 0 with the beam blocked */
  extraction: number;
}

/**
 * Share of a pump photon's energy that a laser photon leaves behind: 1 - lambda_p / lambda_l.
 * @param pumpWavelength m
 * @param laserWavelength m
 * @returns 0..1 for a laser wavelength longer than the pump's
 * @source energy conservation; Koechner, Solid-State Laser Engineering (from memory)
 */
export function quantumDefect(pumpWavelength: number, laserWavelength: number): number {
  return 1 - pumpWavelength / laserWavelength;
}

/**
 * Share of the absorbed pump power that becomes heat in the rod:
 * 1 - eta_p [(1 - eta_l) eta_r lambda_p/lambda_f + eta_l lambda_p/lambda_l].
 * Left out: fluorescence trapped in the rod or absorbed by the mount, upconversion and excited-state absorption
 * (a smaller eta_r can stand for them). Negative where fluorescence is shorter than the pump (radiative cooling).
 * @returns share, dimensionless
 * @source Fan, IEEE J. Quantum Electron. 29, 1457 (1993); Chenais et al., Prog. Quantum Electron. 30, 89 (2006) (from memory)
 */
export function heatFraction(input: HeatFractionInput): number {
  const { pumpWavelength, extraction } = input;
  const fluorescence =
    ((1 - extraction) * input.radiativeEfficiency * pumpWavelength) / input.fluorescenceWavelength;
  const stimulated = (extraction * pumpWavelength) / input.laserWavelength;
  return 1 - input.pumpQuantumEfficiency * (fluorescence + stimulated);
}

/**
 * Share of the absorbed pump power that leaves as fluorescence: eta_p (1 - eta_l) eta_r lambda_p/lambda_f.
 * With heatFraction and stimulated power over absorbed power it sums to 1.
 */
export function fluorescenceFraction(input: HeatFractionInput): number {
  return (
    (input.pumpQuantumEfficiency *
      (1 - input.extraction) *
      input.radiativeEfficiency *
      input.pumpWavelength) /
    input.fluorescenceWavelength
  );
}
