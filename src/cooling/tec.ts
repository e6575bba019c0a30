import type { Warning } from '../errors';
import { thermoelectric } from '../materials';
import { type Cooler, type CoolerState, completeState, flow, type Flow, type Surroundings } from './cooler';
import {
  type Balance,
  coldestBase,
  floatAt,
  greatestPumping,
  hold,
  type Stack,
  warmestBase,
} from './tec-balance';
import { bestPerformance, dataSheetOf, moduleOfDataSheet, moduleVoltage } from './thermoelectric';
import { type DataSheetSpec, type LegSpec, makeThermopile } from './thermopile';

/** Thermoelectric modules that hold the mount base at a temperature. */
export interface TecSpec {
  module: LegSpec | DataSheetSpec;
  /** Of the mount base, K. */
  setTemperature: number;
  /** What the driver can give, A. */
  highestCurrent: number;
  /** Largest allowed share of Imax; 0.7 when left out (common practice, no source). */
  currentShare?: number;
  /** Ceramic of one face of one module, K/W; 0 when left out. */
  ceramicResistance?: number;
  /** Grease between base and modules, and between modules and hot side, all modules together, K/W. */
  coldInterfaceResistance?: number;
  hotInterfaceResistance?: number;
  /** Room air to everything at base temperature, W/K; 0 when left out. */
  leakConductance?: number;
  /** Current source, output over wall plug; 0.9 when left out (common practice, no source). */
  driverEfficiency?: number;
}

const USUAL_CURRENT_SHARE = 0.7;
const USUAL_DRIVER_EFFICIENCY = 0.9;
/** Ordinary modules are soldered for hot junctions up to here, K (common practice, no source). */
const HIGHEST_JUNCTION = 373;

/** A TEC in given surroundings. */
interface Prepared {
  stack: Stack;
  /** Greatest heat at the set temperature, and its current. */
  capacity: { heat: number; current: number };
}

/**
 * Thermoelectric modules on another cooler. Within its capacity the base sits at the set temperature, by
 * cooling or heating; beyond it the base floats as cold as currents up to the highest can make it. Junctions,
 * properties at their mean temperature and the hot side are solved together.
 *
 * @source README of this room
 */
export function tecCooler(spec: TecSpec, hotSide: Cooler): Cooler {
  const pile = makeThermopile(spec.module);
  const ceramic = (spec.ceramicResistance ?? 0) / spec.module.count;
  let key: Surroundings | undefined;
  let known: Prepared | undefined;
  // The capacity is a pure function of the surroundings: remembering the last one changes no answer.
  const prepare = (surroundings: Surroundings): Prepared => {
    if (known && key?.ambient === surroundings.ambient && key.airPressure === surroundings.airPressure) {
      return known;
    }
    const kept = { ...surroundings };
    const stack: Stack = {
      pile,
      coldResistance: ceramic + (spec.coldInterfaceResistance ?? 0),
      hotResistance: ceramic + (spec.hotInterfaceResistance ?? 0),
      leakConductance: spec.leakConductance ?? 0,
      ambient: surroundings.ambient,
      hotSide: (heat) => hotSide.baseTemperature(heat, kept),
    };
    key = kept;
    known = { stack, capacity: greatestPumping(stack, spec.setTemperature, spec.highestCurrent) };
    return known;
  };
  return {
    kind: 'tec',
    settle: (heat, surroundings) => describe(spec, hotSide, prepare(surroundings), heat, surroundings),
    baseTemperature: (heat, surroundings) => balanceOf(spec, prepare(surroundings), heat).base,
  };
}

function balanceOf(spec: TecSpec, { stack, capacity }: Prepared, heat: number): Balance {
  const { setTemperature, highestCurrent } = spec;
  if (heat > capacity.heat) return coldestBase(stack, heat, highestCurrent);
  return (
    hold(stack, heat, setTemperature, capacity.current, highestCurrent) ??
    warmestBase(stack, heat, setTemperature, highestCurrent)
  );
}

function describe(
  spec: TecSpec,
  hotSide: Cooler,
  prepared: Prepared,
  heat: number,
  surroundings: Surroundings,
): CoolerState {
  const balance = balanceOf(spec, prepared, heat);
  const { current, base, cold, hot, module, power, pumped } = balance;
  const below = hotSide.settle(pumped + power, surroundings);
  const greatestCurrent = prepared.stack.pile.greatestCurrent(hot);
  const driven = Math.max(power, 0) / (spec.driverEfficiency ?? USUAL_DRIVER_EFFICIENCY);
  const leak = pumped - heat;
  const details: Record<string, number> = {
    current,
    voltage: moduleVoltage(module, current, cold, hot),
    tecPower: power,
    heatPumped: pumped,
    leak,
    coldJunctionTemperature: cold,
    hotJunctionTemperature: hot,
    hotSideTemperature: below.baseTemperature,
    hotSideHeat: pumped + power,
    bestCurrent: bestPerformance(module, cold, hot).current,
    strongestCurrent: prepared.capacity.current,
    imax: greatestCurrent,
    capacity: prepared.capacity.heat,
  };
  if (power > 0) details.cop = pumped / power;
  for (const name in below.details) details[`hotSide.${name}`] = below.details[name]!;
  const bound = Math.min((spec.currentShare ?? USUAL_CURRENT_SHARE) * greatestCurrent, spec.highestCurrent);
  return completeState({
    heat,
    reason: below.state === 'none' ? `thermal runaway, no steady hot side: ${below.reason}` : undefined,
    baseTemperature: base,
    electricalPower: driven + below.electricalPower,
    coldestTemperature: Math.min(cold, base, below.coldestTemperature),
    limits: [
      { limit: 'cooler capacity', value: heat, bound: prepared.capacity.heat, unit: 'W' },
      { limit: 'TEC current', value: Math.abs(current), bound, unit: 'A' },
      ...below.limits,
    ],
    details,
    flows: tecFlows(heat, leak, power, driven, below.flows, hotSide.kind === 'tec'),
    warnings: [...tecWarnings(spec, prepared, balance, heat), ...below.warnings],
  });
}

/** The TEC's own flows, then the hot side's with its 'base' named 'TEC'. */
function tecFlows(
  heat: number,
  leak: number,
  power: number,
  driven: number,
  below: Flow[],
  cascade: boolean,
): Flow[] {
  const flows = [flow('base', 'TEC', heat), flow('TEC driver', 'TEC', power)];
  if (leak !== 0) flows.push(flow('surroundings', 'TEC', leak));
  if (driven > 0) flows.push(flow('wall plug', 'TEC driver', driven));
  // What a generating module gives is burnt in the driver, like the driver's own loss.
  flows.push(flow('TEC driver', 'surroundings', driven - power));
  const rename = (node: string) => {
    if (node === 'base') return 'TEC';
    return cascade && node.startsWith('TEC') ? `second ${node}` : node;
  };
  for (const { from, to, power: passed } of below) {
    flows.push({ from: rename(from), to: rename(to), power: passed });
  }
  return flows;
}

function tecWarnings(spec: TecSpec, prepared: Prepared, balance: Balance, heat: number): Warning[] {
  const warnings: Warning[] = [];
  const warn = (text: string) => warnings.push({ where: 'cooling.tec', text });
  const { stack, capacity } = prepared;
  if (heat > capacity.heat) {
    warn(
      `The TEC cannot hold ${spec.setTemperature.toFixed(1)} K under ${heat.toPrecision(3)} W: the base floats at ${balance.base.toFixed(1)} K, the coldest that ${balance.current.toFixed(2)} A gives.`,
    );
    if (balance.current < spec.highestCurrent && !floatAt(stack, spec.highestCurrent, heat)) {
      warn(`A controller that drives ${spec.highestCurrent} A after the set temperature would run away.`);
    }
  } else if (balance.base < spec.setTemperature) {
    warn(
      `The TEC cannot heat the base to ${spec.setTemperature.toFixed(1)} K with ${spec.highestCurrent} A.`,
    );
  }
  const { lowestTemperature, highestTemperature } = thermoelectric;
  const mean = 0.5 * (balance.cold + balance.hot);
  if (mean < lowestTemperature || mean > highestTemperature) {
    warn(`Thermoelectric properties are known from ${lowestTemperature} to ${highestTemperature} K.`);
  }
  if (balance.hot > HIGHEST_JUNCTION) {
    warn(
      `Hot junctions at ${balance.hot.toFixed(0)} K: solder of ordinary modules is rated to ${HIGHEST_JUNCTION} K.`,
    );
  }
  const sheet = spec.module;
  if (sheet.kind === 'data sheet' && sheet.greatestHeat !== undefined) {
    const own = dataSheetOf(moduleOfDataSheet(sheet), sheet.hotSideTemperature).greatestHeat;
    if (Math.abs(own / sheet.greatestHeat - 1) > 0.15) {
      warn(
        `The data sheet's greatest heat, ${sheet.greatestHeat} W, does not follow from its other numbers (${own.toPrecision(3)} W).`,
      );
    }
  }
  return warnings;
}
