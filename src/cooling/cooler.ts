import type { Warning } from '../errors';

/** Air around the laser: temperature in K, relative humidity 0 to 1, pressure in Pa. */
export interface Surroundings {
  ambient: number;
  relativeHumidity: number;
  airPressure: number;
}

/** Power in W that passes from one named node of the heat ledger to another; never negative. */
export interface Flow {
  from: string;
  to: string;
  power: number;
}

/** A bound that belongs to the cooler itself: it holds while value <= bound. */
export interface CoolerLimit {
  limit: 'cooler capacity' | 'TEC current';
  value: number;
  bound: number;
  unit: string;
}

/** What a cooler does with a given heat. All numbers finite, SI, in either state. */
export interface CoolerState {
  state: 'steady' | 'none';
  /** Why there is no steady state. */
  reason?: string;
  /** Temperature of the mount base, K; with state 'none' a finite continuation that still rises with the heat. */
  baseTemperature: number;
  /** Power drawn from the wall plug, W. */
  electricalPower: number;
  /** Coldest surface that room air can reach, K: to be compared with the dew point. */
  coldestTemperature: number;
  limits: CoolerLimit[];
  /** Named by-products for a person to see; SI. */
  details: Record<string, number>;
  /** Everything handed to the surroundings, W: the heat and the electrical power. */
  heatToAmbient: number;
  /** From 'base' and 'wall plug' to 'surroundings'; every other node gives what it takes. Empty with 'none'. */
  flows: Flow[];
  warnings: Warning[];
}

/** One way of taking heat from the mount base to the surroundings. */
export interface Cooler {
  kind: 'passive' | 'fan' | 'liquid' | 'tec' | 'resistance';
  /** @param heat W handed over at the base; may be negative (heat drawn from the surroundings) */
  settle(heat: number, surroundings: Surroundings): CoolerState;
  /** The base temperature (K) of `settle` alone: much cheaper, for root searches. */
  baseTemperature(heat: number, surroundings: Surroundings): number;
}

/** Area through which the laser, or a TEC, hands its heat to a base plate; side of a square or radius, m. */
export type Footprint = { side: number } | { radius: number };

/** How the load sits on a base plate; each part left out costs nothing. */
export interface Attachment {
  footprint?: Footprint;
  /** Grease or foil under the whole footprint, K/W. */
  interfaceResistance?: number;
}

/** No sink is believed above this base temperature (K): anodised aluminium, grease and solder are past use. */
export const HIGHEST_BASE = 500;
/** Nor below this one (K): air and coolant tables end well above it. */
export const LOWEST_BASE = 150;

/** The words for a base outside what is believed, or undefined when it is inside. */
function beyondBelief(baseTemperature: number): string | undefined {
  if (baseTemperature > HIGHEST_BASE) return `base would exceed ${HIGHEST_BASE} K`;
  if (baseTemperature < LOWEST_BASE) return `base would fall below ${LOWEST_BASE} K`;
  return undefined;
}

/** A flow whose power may come out negative, written in the direction in which it is positive. */
export function flow(from: string, to: string, power: number): Flow {
  return power < 0 ? { from: to, to: from, power: -power } : { from, to, power };
}

/** A state as its cooler knows it before it is asked whether the base temperature can be believed. */
export type Settled = Omit<CoolerState, 'state' | 'heatToAmbient'> & { heat: number };

/** Completes a state: heat to the surroundings, and 'none' with its reason where the base is beyond belief. */
export function completeState(settled: Settled): CoolerState {
  const { heat, reason: known, ...rest } = settled;
  const reason = known ?? beyondBelief(settled.baseTemperature);
  const heatToAmbient = heat + settled.electricalPower;
  if (reason === undefined) return { state: 'steady', heatToAmbient, ...rest };
  return { state: 'none', reason, heatToAmbient, ...rest, flows: [] };
}
