import { photonEnergy } from './constants';

/** Ions that absorb at the laser wavelength because they sit in the lower laser level. */
export interface Reabsorption {
  /** dopant ions, 1/m^3 */
  ionDensity: number;
  /** share of the ground manifold in the lower laser level, 0..1 */
  lowerShare: number;
  /** share of the upper manifold in the upper laser level, 0..1 */
  upperShare: number;
  /** doped length, m */
  length: number;
}

/** What lets one laser line start. */
export interface ThresholdInput {
  /** m */
  pumpWavelength: number;
  /** effective emission cross-section: gain per ion of the upper manifold, m^2 */
  emissionCrossSection: number;
  /** lifetime of the upper manifold, s */
  upperLifetime: number;
  /** excitations of the upper level per absorbed pump photon, 0..1 */
  pumpQuantumEfficiency: number;
  /** overlap of pump and mode, 1/m^2 */
  overlap: number;
  /** loss exponent of one round trip without re-absorption: minus the logarithm of what is left */
  roundTripLoss: number;
  /** passes of the mode through the rod in one round trip: 2 in a linear cavity, 1 in a ring */
  rodPasses: 1 | 2;
  /** null for a four-level line */
  reabsorption: Reabsorption | null;
}

/**
 * Loss exponent of a round trip: -ln(1 - T) - ln(1 - other).
 * @param outputTransmission transmission of the output coupler, 0..1
 * @param otherLoss share lost to everything else in one round trip, 0..1
 * @returns 0 or more; Infinity where everything is lost
 */
export function roundTripLoss(outputTransmission: number, otherLoss: number): number {
  return -Math.log1p(-Math.min(1, outputTransmission)) - Math.log1p(-Math.min(1, otherLoss));
}

/** Ratio f = f_lower / f_upper of absorption to emission cross-section; 0 for a four-level line. */
export function levelRatio(reabsorption: Reabsorption | null): number {
  return reabsorption === null || !(reabsorption.upperShare > 0)
    ? 0
    : reabsorption.lowerShare / reabsorption.upperShare;
}

/**
 * Re-absorption of one round trip before any ion is excited: passes N f sigma_e L, f = f_lower / f_upper, sigma_e the
 * effective emission cross-section; with the spectroscopic one (sigma_e = f_upper sigma) it is the usual 2 N f_lower sigma L.
 * @returns loss exponent, 0 for a four-level line
 * @source Risk, J. Opt. Soc. Am. B 5, 1412 (1988) (from memory)
 */
export function reabsorptionLoss(
  emissionCrossSection: number,
  reabsorption: Reabsorption | null,
  rodPasses: 1 | 2,
): number {
  if (reabsorption === null) return 0;
  return (
    rodPasses *
    levelRatio(reabsorption) *
    emissionCrossSection *
    reabsorption.ionDensity *
    reabsorption.length
  );
}

/**
 * Small-signal gain exponent of one round trip per watt absorbed, times area: passes sigma_e (1 + f) tau eta_p / (h nu_p).
 * @returns m^2/W
 */
export function gainPerWatt(input: Omit<ThresholdInput, 'overlap' | 'roundTripLoss'>): number {
  return (
    (input.rodPasses *
      input.emissionCrossSection *
      (1 + levelRatio(input.reabsorption)) *
      input.upperLifetime *
      input.pumpQuantumEfficiency) /
    photonEnergy(input.pumpWavelength)
  );
}

/**
 * Absorbed pump power at which the round-trip gain meets the loss:
 * P = (h nu_p / eta_p) (delta + delta_re) / (passes sigma_e (1 + f) tau J), J the overlap of pump and mode. With Gaussian
 * pump and mode, four-level, this is (h c / lambda_p) pi (w_p^2 + w_l^2) delta / (4 sigma tau eta_p).
 * Left out: depletion of the ground state by the pump, upconversion, spatial hole burning.
 * @returns W; null where no power suffices (no gain, or everything lost)
 * @source Kubodera & Otsuka, J. Appl. Phys. 50, 653 (1979); Risk, J. Opt. Soc. Am. B 5, 1412 (1988);
 *   Laporta & Brussard, IEEE J. Quantum Electron. 27, 2319 (1991) (from memory)
 */
export function thresholdAbsorbedPower(input: ThresholdInput): number | null {
  const gain = gainPerWatt(input) * input.overlap;
  const loss =
    input.roundTripLoss + reabsorptionLoss(input.emissionCrossSection, input.reabsorption, input.rodPasses);
  const power = loss / gain;
  return gain > 0 && Number.isFinite(power) ? power : null;
}
