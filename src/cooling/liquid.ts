import type { Warning } from '../errors';
import { type Coolant, coolantProperties } from '../materials';
import { tubeFriction, tubeNusselt, turbulentShare } from './channel-flow';
import { type Attachment, completeState, type Cooler, type CoolerLimit, flow, type Flow } from './cooler';
import type { CoolerState, Surroundings } from './cooler';
import { attachmentResistance, type BasePlate } from './spreading';

/** Where the coolant gives its heat away. */
export type CoolantSupply =
  /** Coolant enters at `setPoint` (K) whatever the load; `capacity` (W) is a limit, not enforced. */
  | { kind: 'chiller'; setPoint: number; capacity: number; coefficientOfPerformance?: number }
  /** Entering coolant above ambient per watt of load, K/W; `power` of its fans, W. */
  | { kind: 'air'; resistance: number; power?: number };

/** Channels in a cold plate with coolant pumped through. */
export interface LiquidSpec extends Attachment {
  coolant: Coolant;
  /** Round channels; lengths in m, `parallel` of them side by side. */
  channel: { diameter: number; length: number; parallel: number };
  /** All channels together, m3/s. */
  flow: number;
  supply: CoolantSupply;
  /** Share of the pump's electrical power that moves the coolant; 0.3 when left out. */
  pumpEfficiency?: number;
  /** Of hoses, filter and exchanger beside the channel, Pa; 0 when left out. */
  extraPressureDrop?: number;
  /** Needed for spreading only; m, W/(m K). */
  plate?: { width: number; height: number; thickness: number; conductivity: number };
}

/** Small recirculating chillers, cooling per electrical watt (common practice, no source). */
const USUAL_CHILLER_PERFORMANCE = 2;
/** Small centrifugal pumps (common practice, no source). */
const USUAL_PUMP_EFFICIENCY = 0.3;
/** One sharp entrance (0.5) and one exit (1), in velocity heads. */
const ENTRANCE_AND_EXIT = 1.5;

/** Water-based coolants boil near here at room pressure, K. */
const HIGHEST_WALL = 373;

/** Things about the flow that do not depend on the heat. */
interface Loop {
  plate: BasePlate | undefined;
  /** At no load, K. */
  supplyTemperature: number;
  /** Supply above its no-load temperature per watt of load, K/W. */
  supplyResistance: number;
  massFlow: number;
  specificHeat: number;
  turbulent: number;
  pressureDrop: number;
  pumpPower: number;
}

/** What a heat does to the loop. */
interface Loaded {
  load: number;
  entry: number;
  outlet: number;
  reynolds: number;
  coefficient: number;
  wallResistance: number;
  attachment: number;
  wall: number;
  base: number;
  /** The mean coolant temperature is outside the table of the coolant, whose end was used. */
  outside: boolean;
}

/**
 * Coolant through channels in the mount base: laminar with developing temperature (Hausen 1943), transitional
 * (Gnielinski 1995), turbulent (Gnielinski 1976); the coolant warms along a wall of one temperature.
 *
 * Properties are those at the mean coolant temperature; regime, mass flow and pressure drop are fixed at the
 * supply temperature without load (cautious: warm coolant turns turbulent earlier), which also keeps the base
 * temperature rising with the heat. The pump's whole power ends in the coolant.
 *
 * @source README of this room
 */
export function liquidCooler(spec: LiquidSpec): Cooler {
  let key = Number.NaN;
  let known: Loop | undefined;
  const loop = ({ ambient }: Surroundings): Loop => {
    if (!known || key !== ambient) {
      known = describeLoop(spec, ambient);
      key = ambient;
    }
    return known;
  };
  return {
    kind: 'liquid',
    settle: (heat, surroundings) => settleLiquid(spec, loop(surroundings), heat),
    baseTemperature: (heat, surroundings) => loadLoop(spec, loop(surroundings), heat).base,
  };
}

function describeLoop(spec: LiquidSpec, ambient: number): Loop {
  const { channel, supply, plate } = spec;
  const supplyTemperature = supply.kind === 'chiller' ? supply.setPoint : ambient;
  const fluid = coolantProperties(spec.coolant, supplyTemperature);
  const area = (channel.parallel * Math.PI * channel.diameter ** 2) / 4;
  const velocity = spec.flow / area;
  const reynolds = (fluid.density * velocity * channel.diameter) / fluid.dynamicViscosity;
  const turbulent = turbulentShare(reynolds);
  const heads = (tubeFriction(turbulent, reynolds) * channel.length) / channel.diameter + ENTRANCE_AND_EXIT;
  const pressureDrop = 0.5 * fluid.density * velocity * velocity * heads + (spec.extraPressureDrop ?? 0);
  return {
    plate: plate && {
      radius: Math.sqrt((plate.width * plate.height) / Math.PI),
      thickness: plate.thickness,
      conductivity: plate.conductivity,
    },
    supplyTemperature,
    supplyResistance: supply.kind === 'air' ? supply.resistance : 0,
    massFlow: spec.flow * fluid.density,
    specificHeat: fluid.specificHeat,
    turbulent,
    pressureDrop,
    pumpPower: (pressureDrop * spec.flow) / (spec.pumpEfficiency ?? USUAL_PUMP_EFFICIENCY),
  };
}

function loadLoop(spec: LiquidSpec, loop: Loop, heat: number): Loaded {
  const { diameter, length, parallel } = spec.channel;
  const load = heat + loop.pumpPower;
  const entry = loop.supplyTemperature + load * loop.supplyResistance;
  const capacityRate = loop.massFlow * loop.specificHeat;
  const outlet = entry + heat / capacityRate;
  const fluid = coolantProperties(spec.coolant, 0.5 * (entry + outlet));
  const reynolds = (4 * loop.massFlow) / (parallel * Math.PI * diameter * fluid.dynamicViscosity);
  const prandtl = (fluid.dynamicViscosity * fluid.specificHeat) / fluid.thermalConductivity;
  const nusselt = tubeNusselt(loop.turbulent, reynolds, prandtl, diameter / length);
  const coefficient = (nusselt * fluid.thermalConductivity) / diameter;
  const transfer = coefficient * parallel * Math.PI * diameter * length;
  const wallResistance = -1 / (capacityRate * Math.expm1(-transfer / capacityRate));
  const attachment = attachmentResistance(spec, loop.plate, wallResistance);
  return {
    load,
    entry,
    outlet,
    reynolds,
    coefficient,
    wallResistance,
    attachment,
    wall: entry + heat * wallResistance,
    base: entry + heat * (wallResistance + attachment),
    outside: fluid.outside,
  };
}

function settleLiquid(spec: LiquidSpec, loop: Loop, heat: number): CoolerState {
  const loaded = loadLoop(spec, loop, heat);
  const supplyPower = powerOfSupply(spec.supply, loaded.load);
  const { pumpPower } = loop;
  const details: Record<string, number> = {
    supplyTemperature: loaded.entry,
    outletTemperature: loaded.outlet,
    reynolds: loaded.reynolds,
    heatTransferCoefficient: loaded.coefficient,
    thermalResistance: loaded.wallResistance + loaded.attachment,
    attachmentResistance: loaded.attachment,
    pressureDrop: loop.pressureDrop,
    pumpPower,
    supplyPower,
  };
  const limits: CoolerLimit[] = [];
  if (spec.supply.kind === 'chiller') {
    limits.push({ limit: 'cooler capacity', value: loaded.load, bound: spec.supply.capacity, unit: 'W' });
  }
  return completeState({
    heat,
    baseTemperature: loaded.base,
    electricalPower: pumpPower + supplyPower,
    coldestTemperature: Math.min(loaded.entry, loaded.outlet, loaded.base),
    limits,
    details,
    flows: liquidFlows(spec.supply, heat, pumpPower, supplyPower),
    warnings: liquidWarnings(spec, loop, loaded),
  });
}

/** Electrical power of chiller or fans, W. A chiller that would have to heat is counted as idle. */
function powerOfSupply(supply: CoolantSupply, load: number): number {
  if (supply.kind === 'air') return supply.power ?? 0;
  return Math.max(0, load) / (supply.coefficientOfPerformance ?? USUAL_CHILLER_PERFORMANCE);
}

function liquidFlows(supply: CoolantSupply, heat: number, pumpPower: number, supplyPower: number): Flow[] {
  const exchanger = supply.kind === 'chiller' ? 'chiller' : 'air heat exchanger';
  return [
    flow('base', 'coolant', heat),
    flow('wall plug', 'coolant pump', pumpPower),
    flow('coolant pump', 'coolant', pumpPower),
    flow('coolant', exchanger, heat + pumpPower),
    flow('wall plug', exchanger, supplyPower),
    flow(exchanger, 'surroundings', heat + pumpPower + supplyPower),
  ];
}

function liquidWarnings(spec: LiquidSpec, loop: Loop, loaded: Loaded): Warning[] {
  const warnings: Warning[] = [];
  const warn = (text: string) => warnings.push({ where: 'cooling.liquid', text });
  if (loop.turbulent > 0 && loop.turbulent < 1) {
    warn(
      `Reynolds number ${loaded.reynolds.toFixed(0)} is between laminar and turbulent flow: the wall temperature is uncertain there; change the flow or the channel.`,
    );
  }
  if (loop.turbulent === 1 && spec.channel.length < 10 * spec.channel.diameter) {
    warn('The channel is shorter than ten diameters: heat transfer is better than computed.');
  }
  if (loaded.outside) {
    warn('The coolant is outside the temperatures of its table: properties were held at the end.');
  }
  const { name, freezingTemperature } = spec.coolant;
  if (freezingTemperature !== undefined && loaded.entry < freezingTemperature) {
    warn(`The coolant, ${name}, enters below its freezing point of ${freezingTemperature.toFixed(1)} K.`);
  }
  if (loaded.wall > HIGHEST_WALL) {
    warn(`The channel wall is above ${HIGHEST_WALL} K: the coolant may boil there at room pressure.`);
  }
  return warnings;
}
