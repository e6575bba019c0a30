import { findRoot } from '../numerics/root';
import { lowestPoint } from './lowest-point';
import { heatPumped, moduleVoltage, type ThermoelectricModule } from './thermoelectric';
import type { Thermopile } from './thermopile';

/** How finely the best current is sought, as a share of the range; the base, flat there, is then good to 1e-6 K. */
const CURRENT_SHARE = 3e-5;

/** Modules between the mount base and a hot side, all that a balance needs. Resistances in K/W. */
export interface Stack {
  pile: Thermopile;
  /** Base to cold junction: grease and ceramic. */
  coldResistance: number;
  /** Hot junction to the hot side's base. */
  hotResistance: number;
  /** Room air to base, W/K. */
  leakConductance: number;
  ambient: number;
  /** Base temperature of the hot-side cooler at a heat, K. */
  hotSide: (heat: number) => number;
}

/** A TEC in balance. */
export interface Balance {
  current: number;
  base: number;
  cold: number;
  hot: number;
  /** Taken at the cold junction: load and leak, W. */
  pumped: number;
  module: ThermoelectricModule;
  /** Electrical, W; negative when the module generates. */
  power: number;
}

/** Heat from the room into a base at a temperature, W. */
function leakInto(stack: Stack, base: number): number {
  return stack.leakConductance * (stack.ambient - base);
}

/** Hot junction temperature that the hot side gives to the heat of a balance, above the balance's own, K. */
function hotSideExcess(stack: Stack, { pumped, power, hot }: Balance): number {
  const rejected = pumped + power;
  return stack.hotSide(rejected) + rejected * stack.hotResistance - hot;
}

/** Repeats a balance with properties at its own mean junction temperature until that no longer moves. */
function withProperties(
  stack: Stack,
  start: number,
  solve: (module: ThermoelectricModule) => Balance,
): Balance {
  let mean = start;
  for (let round = 0; ; round++) {
    const balance = solve(stack.pile.at(mean));
    const next = 0.5 * (balance.cold + balance.hot);
    // Properties move by less than 1 % per kelvin, so 1e-9 K here is far below every other tolerance.
    if (Math.abs(next - mean) < 1e-9 || round === 30) return balance;
    mean = next;
  }
}

/** The hot junction temperature at which a current pumps `pumped` from a cold junction held at `cold`. */
function heldBalance(stack: Stack, current: number, base: number, pumped: number): Balance {
  const cold = base - pumped * stack.coldResistance;
  return withProperties(stack, cold, (module) => {
    const hot = cold + (heatPumped(module, current, cold, cold) - pumped) / module.conductance;
    const power = current * moduleVoltage(module, current, cold, hot);
    return { current, base, cold, hot, pumped, module, power };
  });
}

/** Where a search for the hot junction temperature begins; kept from one search to the next of a series. */
interface Start {
  hot: number;
  /** Change of the hot side's excess per kelvin of hot junction. */
  slope: number;
}

/** A start for the first search of a series: nothing fed back, so the excess falls as the junction rises. */
function firstStart(stack: Stack): Start {
  return { hot: stack.ambient, slope: -1 };
}

/**
 * Finds the hot junction temperature that hot side and modules agree on, by secant steps. Without a steady one
 * (the hot side warms faster than the heat it sheds: runaway) the answer is undefined.
 *
 * @param start where to begin; moved to the answer
 * @param balanceAt the modules' side of the balance at a given hot junction temperature
 */
function matchHotSide(stack: Stack, start: Start, balanceAt: (hot: number) => Balance): Balance | undefined {
  let { hot, slope } = start;
  let excess = hotSideExcess(stack, balanceAt(hot));
  for (let step = 0; step < 60; step++) {
    const last = hot;
    const lastExcess = excess;
    hot -= excess / slope;
    const balance = balanceAt(hot);
    excess = hotSideExcess(stack, balance);
    const move = hot - last;
    // Over a shorter move the rounding of two temperatures of some 300 K would spoil the slope.
    if (Math.abs(move) > 1e-6) slope = (excess - lastExcess) / move;
    if (!(slope < 0)) return undefined;
    if (Math.abs(excess) < 1e-5) {
      // The last step needs no check: it leaves its own square.
      start.hot = hot - excess / slope;
      start.slope = slope;
      return Math.abs(excess) < 1e-10 ? balance : balanceAt(start.hot);
    }
  }
  return undefined;
}

/** At a given current, the heat the modules take from a base at `base`. */
function pumpingAt(stack: Stack, current: number, base: number, start: Start): Balance | undefined {
  const { coldResistance } = stack;
  return matchHotSide(stack, start, (hot) =>
    withProperties(stack, hot, (module) => {
      const { seebeck, conductance } = module;
      const drop = 1 + coldResistance * (seebeck * current + conductance);
      const pumped = heatPumped(module, current, base, hot) / drop;
      const cold = base - pumped * coldResistance;
      return {
        current,
        base,
        cold,
        hot,
        pumped,
        module,
        power: current * moduleVoltage(module, current, cold, hot),
      };
    }),
  );
}

/** At a given current, the base temperature at which the modules take a given heat and the leak. */
export function floatAt(
  stack: Stack,
  current: number,
  heat: number,
  start = firstStart(stack),
): Balance | undefined {
  const { coldResistance, leakConductance, ambient } = stack;
  // Heat into the cold junction is at0 - slope Tc once the base is written by the junction.
  const share = 1 / (1 + leakConductance * coldResistance);
  const atZero = (heat + leakConductance * ambient) * share;
  const slope = leakConductance * share;
  return matchHotSide(stack, start, (hot) =>
    withProperties(stack, hot, (module) => {
      const { seebeck, resistance, conductance } = module;
      const joule = 0.5 * current * current * resistance;
      const cold = (atZero + joule + conductance * hot) / (seebeck * current + conductance + slope);
      const pumped = atZero - slope * cold;
      const base = cold + pumped * coldResistance;
      return {
        current,
        base,
        cold,
        hot,
        pumped,
        module,
        power: current * moduleVoltage(module, current, cold, hot),
      };
    }),
  );
}

/**
 * No search for the best current goes beyond this. At fixed junction temperatures Qc peaks at S Tc/R, and a hot
 * side only lowers that; half as much again leaves room for properties at other temperatures.
 */
function searchEnd(stack: Stack, highestCurrent: number): number {
  const { seebeck, resistance } = stack.pile.at(stack.ambient);
  return Math.min(highestCurrent, (1.5 * seebeck * stack.ambient) / resistance);
}

/**
 * The greatest heat that can be taken from a base at `base` with currents from 0 to `highestCurrent`, and the
 * current that does it. Negative when the base would need heat to stay that cold.
 */
export function greatestPumping(
  stack: Stack,
  base: number,
  highestCurrent: number,
): { heat: number; current: number } {
  const start = firstStart(stack);
  const negative = (current: number) => -(pumpingAt(stack, current, base, start)?.pumped ?? -Infinity);
  const end = searchEnd(stack, highestCurrent);
  const { x, value } = lowestPoint(negative, 0, end, CURRENT_SHARE * end);
  return { heat: -value - leakInto(stack, base), current: x };
}

/** The base held at `base`: the current between -highestCurrent and `strongest` that takes the heat. */
export function hold(
  stack: Stack,
  heat: number,
  base: number,
  strongest: number,
  highestCurrent: number,
): Balance | undefined {
  const pumped = heat + leakInto(stack, base);
  const excess = (current: number) => hotSideExcess(stack, heldBalance(stack, current, base, pumped));
  const atZero = excess(0);
  const tolerance = 1e-11 * highestCurrent;
  if (atZero === 0) return heldBalance(stack, 0, base, pumped);
  if (atZero > 0) {
    const atStrongest = excess(strongest);
    const current =
      atStrongest < 0
        ? findRoot(excess, 0, strongest, { tolerance, fa: atZero, fb: atStrongest })
        : strongest;
    return heldBalance(stack, current, base, pumped);
  }
  const atHeating = excess(-highestCurrent);
  if (atHeating <= 0) return undefined;
  const current = findRoot(excess, -highestCurrent, 0, { tolerance, fa: atHeating, fb: atZero });
  return heldBalance(stack, current, base, pumped);
}

/** The base as cold as currents from 0 to `highestCurrent` can make it under a heat. */
export function coldestBase(stack: Stack, heat: number, highestCurrent: number): Balance {
  const start = firstStart(stack);
  const base = (current: number) => floatAt(stack, current, heat, start)?.base ?? Infinity;
  const end = searchEnd(stack, highestCurrent);
  const { x } = lowestPoint(base, 0, end, CURRENT_SHARE * end);
  const balance = floatAt(stack, x, heat, start) ?? floatAt(stack, 0, heat);
  // Without current the modules only conduct, and that always has a steady state.
  if (!balance) throw new Error('a TEC without current has no steady state');
  return balance;
}

/** The base as warm as full heating current makes it, when even that leaves it below `base`. */
export function warmestBase(stack: Stack, heat: number, base: number, highestCurrent: number): Balance {
  const idle = floatAt(stack, 0, heat);
  if (!idle) throw new Error('a TEC without current has no steady state');
  const at = (temperature: number) =>
    heldBalance(stack, -highestCurrent, temperature, heat + leakInto(stack, temperature));
  const temperature = findRoot((t) => hotSideExcess(stack, at(t)), idle.base, base);
  return at(temperature);
}
