import type { ResolvedDesign } from '../design/resolved';
import {
  boltzmannShare,
  fluorescenceFraction,
  heatFraction,
  laserOutput,
  quantumDefect,
  type LaserOutput,
  type PumpRings,
} from '../laser';

/** Where the absorbed power goes, as shares of it; they sum to 1. */
export interface PowerSplit {
  heat: number;
  fluorescence: number;
  /** Output and intracavity loss together. */
  stimulated: number;
}

/** Everything the laser needs to know of one state of the rod. */
export interface LaserState {
  absorbedPower: number;
  /** Diode wavelength now, m. */
  pumpWavelength: number;
  /** Mean temperature of the pumped rod, K. */
  rodTemperature: number;
  rings: PumpRings;
}

/**
 * Laser line, cavity losses and mode of one radius on a state of the rod.
 * @param modeRadius 1/e2 radius of the mode in the rod, m
 * @param extraLoss round-trip loss beyond the design's, such as that of aberration
 */
export function lase(
  resolved: ResolvedDesign,
  state: LaserState,
  modeRadius: number,
  extraLoss: number,
): LaserOutput {
  const { rod, cavity } = resolved;
  const { laser } = rod;
  const { thermal } = laser;
  const otherLoss =
    1 - (1 - cavity.passiveLoss) * (1 - cavity.otherTransmission) * (1 - Math.min(extraLoss, 1));
  return laserOutput({
    absorbedPower: state.absorbedPower,
    pumpWavelength: state.pumpWavelength,
    laserWavelength: laser.wavelength,
    emissionCrossSection: laser.emissionCrossSection,
    upperLifetime: laser.lifetime,
    pumpQuantumEfficiency: laser.pumpQuantumEfficiency,
    pump: state.rings,
    modeRadius,
    outputTransmission: cavity.outputCoupling,
    otherLoss,
    rodPasses: cavity.kind === 'linear' ? 2 : 1,
    reabsorption: thermal && {
      ionDensity: laser.ionDensity,
      lowerShare: boltzmannShare(thermal.ground, thermal.lower, state.rodTemperature),
      upperShare: boltzmannShare(thermal.upper, thermal.start, state.rodTemperature),
      length: rod.dopedLength,
    },
  });
}

/**
 * Where the absorbed power goes.
 * @param extraction share of the excitations taken by stimulated emission; 0 with the beam blocked
 */
export function splitPower(resolved: ResolvedDesign, pumpWavelength: number, extraction: number): PowerSplit {
  const { rod } = resolved;
  const { laser } = rod;
  const input = {
    pumpWavelength,
    laserWavelength: laser.wavelength,
    fluorescenceWavelength: laser.fluorescenceWavelength,
    pumpQuantumEfficiency: laser.pumpQuantumEfficiency,
    radiativeEfficiency: laser.radiativeEfficiency,
    extraction,
  };
  const stimulated = (extraction * pumpWavelength) / laser.wavelength;
  const rule = rod.heatFraction;
  if (rule.kind === 'from laser')
    return { heat: heatFraction(input), fluorescence: fluorescenceFraction(input), stimulated };
  const heat =
    rule.kind === 'quantum defect'
      ? quantumDefect(pumpWavelength, laser.wavelength)
      : extraction > 0
        ? rule.lasing
        : rule.blocked;
  // A heat fraction that was entered is taken as it is; light takes what it leaves.
  const light = Math.max(0, 1 - heat);
  const lasing = Math.min(stimulated, light);
  return { heat, fluorescence: light - lasing, stimulated: lasing };
}
