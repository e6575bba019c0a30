import type { ResolvedCooler } from '../design/resolved';
import { diodeWavelength } from '../pump';
import { findRoot } from '../numerics/root';
import { sumOf } from './absorbed';
import { overlapRings, type PreparedDesign } from './prepare';
import { lase, splitPower, type LaserState, type PowerSplit } from './rod-laser';

export type Beam = 'lasing' | 'blocked';

/** What one operating point is asked for. */
export interface Question {
  /** Light from the diode, W. */
  pumpPower: number;
  cooler: ResolvedCooler;
  beam: Beam;
}

/** The chain from a base temperature to the heat that comes back to the base. */
export interface LoopState {
  baseTemperature: number;
  /** Outer surface of the mount, K: the base and the joint to it. */
  mountTemperature: number;
  caseTemperature: number;
  wavelength: number;
  deposit: Float64Array;
  enteringPower: number;
  absorbedPower: number;
  split: PowerSplit;
  heatLoad: number;
  /** Through barrel and mount, W. */
  mountHeat: number;
  /** All that the rod's cooler has to take, W. */
  baseHeat: number;
}

/** Base temperatures are found to this, K; far below what any of the models can claim. */
const tolerance = 1e-8;
/** No base hotter than this is looked for, K. */
const hottestBase = 700;
const mostSteps = 25;

export const diodeHeatOf = ({ resolved }: PreparedDesign, pumpPower: number): number =>
  pumpPower * (1 / resolved.diode.wallPlugEfficiency - 1);

function caseTemperatureAt(prepared: PreparedDesign, question: Question, baseTemperature: number): number {
  const { diode, surroundings } = prepared.resolved;
  if (diode.caseTemperature !== null) return diode.caseTemperature;
  const heat = diodeHeatOf(prepared, question.pumpPower);
  const under =
    diode.circuit === 'shared' ? baseTemperature : question.cooler.cooler.baseTemperature(heat, surroundings);
  return under + diode.caseToBase * heat;
}

/**
 * Temperature of the pumped ions for the Boltzmann shares, from the heat and the reciprocity of conduction would need
 * the field; a four-level line does not ask for it.
 */
export type RodTemperature = (deposit: Float64Array, heatLoad: number, mountTemperature: number) => number;

/** Follows the chain once, from a base temperature all the way to the heat on the base. */
export function follow(
  prepared: PreparedDesign,
  question: Question,
  baseTemperature: number,
  rodTemperature: RodTemperature,
): LoopState {
  const { resolved, deposits, baseHeat: response } = prepared;
  const { pump, surroundings, diode, mount } = resolved;
  const caseTemperature = caseTemperatureAt(prepared, question, baseTemperature);
  const wavelength = diodeWavelength(
    pump.wavelength,
    pump.drift,
    caseTemperature,
    pump.referenceCaseTemperature,
  );
  const deposit = deposits.at(wavelength);
  const arriving = question.pumpPower * pump.entranceTransmission;
  const clipped = arriving * prepared.pump.clipped;
  const enteringPower = arriving - clipped;
  const absorbedPower = enteringPower * sumOf(deposit);
  let share = 0;
  for (let j = 0; j < deposit.length; j++) share += deposit[j]! * response.sideShare[j]!;
  share *= enteringPower / (1 - prepared.pump.clipped || 1);

  const mountFrom = (heatFraction: number) => {
    const toSide = share * heatFraction - response.conductance * (baseTemperature - surroundings.ambient);
    return toSide / (1 + response.conductance * mount.baseResistance);
  };
  let split = splitPower(resolved, wavelength, 0);
  let mountHeat = mountFrom(split.heat);
  if (question.beam === 'lasing' && absorbedPower > 0) {
    const rounds = resolved.rod.laser.thermal ? 4 : 1;
    const rings = overlapRings(prepared, deposit);
    for (let round = 0; round < rounds; round++) {
      const mountTemperature = baseTemperature + mount.baseResistance * mountHeat;
      const state: LaserState = {
        absorbedPower,
        pumpWavelength: wavelength,
        rodTemperature: rodTemperature(deposit, absorbedPower * split.heat, mountTemperature),
        rings,
      };
      split = splitPower(
        resolved,
        wavelength,
        lase(resolved, state, resolved.cavity.lensRadius, 0).extraction,
      );
      mountHeat = mountFrom(split.heat);
    }
  }
  const shared = diode.circuit === 'shared' ? diodeHeatOf(prepared, question.pumpPower) : 0;
  return {
    baseTemperature,
    mountTemperature: baseTemperature + mount.baseResistance * mountHeat,
    caseTemperature,
    wavelength,
    deposit,
    enteringPower,
    absorbedPower,
    split,
    heatLoad: absorbedPower * split.heat,
    mountHeat,
    baseHeat: mountHeat + clipped + shared,
  };
}

export interface LoopResult {
  state: LoopState;
  converged: boolean;
}

/** Base temperature that the cooler would settle at for the heat of a state, above the state's own, K. */
const imbalance = (prepared: PreparedDesign, question: Question, state: LoopState): number =>
  Math.min(
    question.cooler.cooler.baseTemperature(state.baseHeat, prepared.resolved.surroundings),
    4 * hottestBase,
  ) - state.baseTemperature;

/**
 * Steady state of the whole chain: the base temperature at which the cooler takes just the heat that arrives.
 * Secant steps from a starting guess; where these leave the range or fail, a bracketed root.
 * @param start base temperature to begin at, K; the last one of a sweep saves steps
 * @returns the state; not converged means that no base below 700 K takes the heat: there is no steady state
 */
export function closeLoop(
  prepared: PreparedDesign,
  question: Question,
  start: number,
  rodTemperature: RodTemperature,
): LoopResult {
  const at = (base: number) => follow(prepared, question, base, rodTemperature);
  let state = at(start);
  let gap = imbalance(prepared, question, state);
  let slope = -1;
  for (let step = 0; step < mostSteps; step++) {
    if (Math.abs(gap) < tolerance) return { state, converged: true };
    const next = state.baseTemperature - gap / slope;
    if (!(next > 100 && next < hottestBase)) break;
    const nextState = at(next);
    const nextGap = imbalance(prepared, question, nextState);
    const change = next - state.baseTemperature;
    if (change !== 0) slope = Math.min(-0.2, Math.max(-20, (nextGap - gap) / change));
    if (step > 8 && Math.abs(nextGap) > 0.5 * Math.abs(gap)) break;
    [state, gap] = [nextState, nextGap];
  }
  return bracket(at, (item) => imbalance(prepared, question, item));
}

function bracket(at: (base: number) => LoopState, gapOf: (state: LoopState) => number): LoopResult {
  const gap = (base: number) => gapOf(at(base));
  const coldest = 120;
  const atCold = gap(coldest);
  const atHot = gap(hottestBase);
  if (!(atCold > 0 && atHot < 0)) return { state: at(hottestBase), converged: false };
  const base = findRoot(gap, coldest, hottestBase, { tolerance, fa: atCold, fb: atHot });
  return { state: at(base), converged: true };
}

/** Base temperatures looked at for further steady states, between the coldest and the hottest possible. */
const stateSamples = 48;

/**
 * Base temperatures of all stable steady states: where the base would be driven back from both sides. Two of them mean
 * hysteresis: which one the laser settles in depends on where it comes from.
 * @returns ascending, K; empty where the cooler finds no balance below 700 K
 */
export function stableBases(
  prepared: PreparedDesign,
  question: Question,
  rodTemperature: RodTemperature,
): number[] {
  const { cooler } = question.cooler;
  const { surroundings } = prepared.resolved;
  const gap = (base: number) =>
    imbalance(prepared, question, follow(prepared, question, base, rodTemperature));
  const low = Math.min(cooler.baseTemperature(0, surroundings), surroundings.ambient) - 5;
  const most = 2 * (diodeHeatOf(prepared, question.pumpPower) + question.pumpPower);
  const high = Math.min(hottestBase, Math.max(cooler.baseTemperature(most, surroundings), low + 20) + 5);
  const found: number[] = [];
  let before = gap(low);
  for (let k = 1; k <= stateSamples; k++) {
    const base = low + ((high - low) * k) / stateSamples;
    const after = gap(base);
    if (before > 0 && after <= 0)
      found.push(
        findRoot(gap, low + ((high - low) * (k - 1)) / stateSamples, base, {
          tolerance: 1e-4,
          fa: before,
          fb: after,
        }),
      );
    before = after;
  }
  return found;
}
