import { findRoot } from '../numerics/root';
import { photonEnergy } from './constants';
import { ringOverlap } from './overlap';
import type { PumpRings } from './pump-rings';
import {
  gainPerWatt,
  levelRatio,
  reabsorptionLoss,
  roundTripLoss,
  thresholdAbsorbedPower,
} from './threshold';
import type { Reabsorption } from './threshold';

/** A laser line, its pump and its cavity's losses. */
export interface LaserInput {
  /** W absorbed in the doped rod */
  absorbedPower: number;
  /** m */
  pumpWavelength: number;
  /** m */
  laserWavelength: number;
  /** effective emission cross-section: gain per ion of the upper manifold, m^2 */
  emissionCrossSection: number;
  /** s */
  upperLifetime: number;
  /** excitations of the upper level per absorbed pump photon, 0..1 */
  pumpQuantumEfficiency: number;
  /** radial spread of the absorbed power */
  pump: PumpRings;
  /** 1/e2 intensity radius of the mode in the rod, m; the geometric mean of both planes */
  modeRadius: number;
  /** transmission of the output coupler, 0..1 */
  outputTransmission: number;
  /** share lost in one round trip to everything but output and re-absorption, 0..1 */
  otherLoss: number;
  /** 2 in a linear cavity, 1 in a ring that runs one way */
  rodPasses: 1 | 2;
  /** null for a four-level line */
  reabsorption: Reabsorption | null;
}

/** What the laser does at one absorbed power. */
export interface LaserOutput {
  /** W; null where no pump power reaches threshold */
  thresholdAbsorbedPower: number | null;
  /** W through the output coupler */
  outputPower: number;
  /** net stimulated emission, W: output and intracavity loss together */
  stimulatedPower: number;
  /** share of the excitations taken by net stimulated emission, 0..1 */
  extraction: number;
  /** d(output) / d(absorbed) at this power; below threshold that just above it; 0 without a threshold */
  slopeEfficiency: number;
  /** re-absorption of one round trip before any ion is excited, loss exponent */
  reabsorptionLoss: number;
  /** W travelling one way inside the cavity, mean over the round trip */
  circulatingPower: number;
}

/** Below this saturation the integrals are replaced by their limit: relative error equals the saturation. */
const SMALL_SATURATION = 1e-6;
const NEWTON_STEPS = 40;
/** Relative accuracy of the saturation. */
const TOLERANCE = 1e-12;

/**
 * Gain overlap with saturation, on rings. The mode has t = exp(-2 r^2/w^2), and the rod's total intensity is S t times the
 * saturation intensity. pump(S) = sum_i c_i ln[(1 + S t_i)/(1 + S t_i+1)] / S is int s_p s_l / (1 + S t) dA,
 * plane(S) = ln(1 + S) / S the same for a medium that fills the plane evenly.
 */
class SaturatedOverlap {
  private readonly inner: Float64Array;
  private readonly density: Float64Array;
  pump = 0;
  pumpSlope = 0;
  plane = 1;
  planeSlope = -0.5;

  constructor(rings: PumpRings, modeRadius: number) {
    const count = rings.shares.length;
    this.inner = new Float64Array(count + 1);
    this.density = new Float64Array(count);
    const perArea = -2 / (modeRadius * modeRadius);
    let total = 0;
    for (let i = 0; i < count; i++) total += rings.shares[i]!;
    for (let i = 0; i <= count; i++) this.inner[i] = Math.exp(perArea * rings.faces[i]! * rings.faces[i]!);
    for (let i = 0; i < count; i++) {
      const area = Math.PI * (rings.faces[i + 1]! ** 2 - rings.faces[i]! ** 2);
      this.density[i] = rings.shares[i]! / (total * area);
    }
  }

  /** Sets pump, plane and their derivatives with respect to S. */
  evaluate(saturation: number): void {
    const { inner, density } = this;
    const small = saturation < SMALL_SATURATION;
    let sum = 0;
    let slope = 0;
    for (let i = 0; i < density.length; i++) {
      const a = inner[i]!;
      const b = inner[i + 1]!;
      if (small) {
        sum += density[i]! * (a - b);
        slope -= (density[i]! * (a * a - b * b)) / 2;
        continue;
      }
      const below = 1 + saturation * b;
      sum += density[i]! * Math.log1p((saturation * (a - b)) / below);
      slope += (density[i]! * (a - b)) / ((1 + saturation * a) * below);
    }
    this.pump = small ? sum : sum / saturation;
    this.pumpSlope = small ? slope : (slope - this.pump) / saturation;
    this.plane = small ? 1 : Math.log1p(saturation) / saturation;
    this.planeSlope = small ? -0.5 : (1 / (1 + saturation) - this.plane) / saturation;
  }
}

/** Absorbed power that sustains a saturation S, P(S) = (delta + A plane(S)) / (g pump(S)), and dP/dS. */
class SustainingPower {
  power = 0;
  slope = 0;
  constructor(
    private readonly overlap: SaturatedOverlap,
    private readonly loss: number,
    private readonly reabsorption: number,
    private readonly gain: number,
  ) {}
  at(saturation: number): number {
    this.overlap.evaluate(saturation);
    const { pump, pumpSlope, plane, planeSlope } = this.overlap;
    const needed = this.loss + this.reabsorption * plane;
    this.power = needed / (this.gain * pump);
    this.slope = (this.reabsorption * planeSlope - (needed * pumpSlope) / pump) / (this.gain * pump);
    return this.power;
  }
}

/**
 * Saturation at which P(S) equals the absorbed power. P(S) rises and bends down for a pump that falls with radius, so Newton
 * from 0 climbs to the root without passing it; where a measured profile spoils that, the bracket 0..most is searched.
 */
function findSaturation(sustaining: SustainingPower, absorbedPower: number, most: number): number {
  let saturation = 0;
  for (let step = 0; step < NEWTON_STEPS; step++) {
    const short = absorbedPower - sustaining.at(saturation);
    const change = short / sustaining.slope;
    if (!(sustaining.slope > 0) || !(saturation + change <= most) || !(saturation + change >= 0)) break;
    saturation += change;
    if (Math.abs(change) <= TOLERANCE * saturation) return saturation;
  }
  return findRoot((s) => sustaining.at(s) - absorbedPower, 0, most, { tolerance: TOLERANCE * most });
}

/**
 * Output of a continuous laser: the circulating power at which the saturated gain, weighted with the mode, equals the loss.
 * passes int [sigma_e (1 + f) n_0(r) - f sigma_e N] s_l(r) / (1 + I(r)/I_sat) dV = delta, I_sat = h nu_l / (sigma_e (1 + f) tau).
 * The share that leaves as output is ln(1/(1-T)) / delta. Everything the laser takes from the excited ions leaves through
 * coupler or loss, so stimulatedPower = eta_p extraction (lambda_p/lambda_l) absorbedPower.
 * Logarithms of T and loss make it exact for a plane wave with all loss at one mirror, and good to 1 % up
 * to T = 0.9 with a tenth lost at the other (Rigrod, J. Appl. Phys. 36, 2487 (1965)).
 * Left out: standing-wave hole burning, higher transverse modes, depletion of the ground state by the pump, upconversion.
 * @throws NumericalError if the bracketed saturation is not found
 * @source Kubodera & Otsuka, J. Appl. Phys. 50, 653 (1979); Risk, J. Opt. Soc. Am. B 5, 1412 (1988);
 *   Laporta & Brussard, IEEE J. Quantum Electron. 27, 2319 (1991) (from memory)
 */
export function laserOutput(input: LaserInput): LaserOutput {
  const loss = roundTripLoss(input.outputTransmission, input.otherLoss);
  const reabsorbed = reabsorptionLoss(input.emissionCrossSection, input.reabsorption, input.rodPasses);
  const threshold = thresholdAbsorbedPower({
    ...input,
    overlap: ringOverlap(input.pump, input.modeRadius),
    roundTripLoss: loss,
  });
  const dark = { outputPower: 0, stimulatedPower: 0, extraction: 0, circulatingPower: 0 };
  if (threshold === null)
    return { thresholdAbsorbedPower: null, ...dark, slopeEfficiency: 0, reabsorptionLoss: reabsorbed };

  const overlap = new SaturatedOverlap(input.pump, input.modeRadius);
  const sustaining = new SustainingPower(overlap, loss, reabsorbed, gainPerWatt(input));
  const effective = input.emissionCrossSection * (1 + levelRatio(input.reabsorption));
  const saturationIntensity = photonEnergy(input.laserWavelength) / (effective * input.upperLifetime);
  const circulatingPerSaturation =
    (saturationIntensity * Math.PI * input.modeRadius ** 2) / (2 * input.rodPasses);
  const outputLoss = roundTripLoss(input.outputTransmission, 0);
  const convertible =
    (input.pumpQuantumEfficiency * input.absorbedPower * input.pumpWavelength) / input.laserWavelength;

  const lasing = input.absorbedPower > threshold && loss > 0;
  const most = convertible / (loss * circulatingPerSaturation);
  const saturation = lasing ? findSaturation(sustaining, input.absorbedPower, most) : 0;
  sustaining.at(saturation);
  const slopeEfficiency =
    sustaining.slope > 0 ? (outputLoss * circulatingPerSaturation) / sustaining.slope : 0;
  const circulatingPower = saturation * circulatingPerSaturation;
  const lit = {
    outputPower: outputLoss * circulatingPower,
    stimulatedPower: loss * circulatingPower,
    extraction: lasing ? (loss * circulatingPower) / convertible : 0,
    circulatingPower,
  };
  return { thresholdAbsorbedPower: threshold, ...lit, slopeEfficiency, reabsorptionLoss: reabsorbed };
}
