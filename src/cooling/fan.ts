import type { Warning } from '../errors';
import { airProperties, type FluidProperties } from '../materials';
import { finChannelNusselt, gnielinskiNusselt, turbulentShare } from './channel-flow';
import {
  type Attachment,
  completeState,
  type Cooler,
  type CoolerState,
  flow,
  type Surroundings,
} from './cooler';
import { type FanSpec, hydraulicDiameter, type OperatingPoint, operatingPoint } from './fan-curve';
import { finEfficiency, finGeometry, type FinGeometry, type PlateFinSink } from './plate-fins';
import { attachmentResistance } from './spreading';

/** Finned sink with a fan that drives all its air between the fins. */
export interface FanCoolerSpec extends PlateFinSink, Attachment {
  fan: FanSpec;
}

/** Range of the Teertstra correlation in its own Reynolds number. */
const LOWEST_REYNOLDS = 0.1;
const HIGHEST_REYNOLDS = 100;
/** Air warmer than this above the entrance (K) makes properties at the ambient a poor choice. */
const LARGEST_AIR_RISE = 30;

/** Everything about the air side that does not depend on the heat. */
interface AirSide extends OperatingPoint {
  /** Entering air above ambient from the fan's own power, K. */
  entryRise: number;
  /** rho V c, W/K */
  capacityRate: number;
  /** Plate to entering air, K/W. */
  sinkResistance: number;
  attachment: number;
  efficiency: number;
  coefficient: number;
  channelReynolds: number;
}

/**
 * A finned sink under a fan: operating point of fan curve and fin channels, developing channel flow with the
 * warming of the air, fin efficiency. Air properties at the ambient, so the base rises in proportion to the
 * heat; the fan's electrical power warms the entering air. Radiation is left out (cautious).
 *
 * @source README of this room
 */
export function fanCooler(spec: FanCoolerSpec): Cooler {
  const geometry = finGeometry(spec);
  let key: Surroundings | undefined;
  let known: AirSide | undefined;
  // The air side is a pure function of the surroundings: remembering the last one changes no answer.
  const airSide = (surroundings: Surroundings): AirSide => {
    if (!known || key?.ambient !== surroundings.ambient || key.airPressure !== surroundings.airPressure) {
      known = solveAirSide(spec, geometry, surroundings);
      key = { ...surroundings };
    }
    return known;
  };
  return {
    kind: 'fan',
    settle: (heat, surroundings) => settleFan(spec, airSide(surroundings), heat, surroundings),
    baseTemperature: (heat, surroundings) => {
      const air = airSide(surroundings);
      return surroundings.ambient + air.entryRise + heat * (air.sinkResistance + air.attachment);
    },
  };
}

function solveAirSide(
  spec: FanCoolerSpec,
  geometry: FinGeometry,
  { ambient, airPressure }: Surroundings,
): AirSide {
  const air = airProperties(ambient, airPressure);
  const point = operatingPoint(spec.fan, spec, geometry, air);
  const capacityRate = point.volumeFlow * air.density * air.specificHeat;
  const coefficient = channelCoefficient(spec, geometry, air, point, capacityRate);
  const efficiency = finEfficiency(coefficient, spec);
  const area = efficiency * geometry.channelFinArea + geometry.channelBaseArea;
  const sinkResistance = 1 / (coefficient * area);
  return {
    ...point,
    entryRise: spec.fan.power / capacityRate,
    capacityRate,
    sinkResistance,
    attachment: attachmentResistance(spec, geometry.plate, sinkResistance),
    efficiency,
    coefficient,
    channelReynolds: channelReynolds(spec, geometry, air, point.velocity),
  };
}

function channelReynolds(
  sink: PlateFinSink,
  geometry: FinGeometry,
  air: FluidProperties,
  velocity: number,
): number {
  return (velocity * geometry.spacing ** 2 * air.density) / (air.dynamicViscosity * sink.height);
}

/**
 * Heat per fin area and per kelvin above the entering air, W/(m2 K): Teertstra et al. while laminar; in
 * turbulent flow Gnielinski's local value with its entrance factor, turned to the same reference by the air's warming, 1 - exp(-NTU).
 */
function channelCoefficient(
  sink: PlateFinSink,
  geometry: FinGeometry,
  air: FluidProperties,
  point: OperatingPoint,
  capacityRate: number,
): number {
  const prandtl = (air.dynamicViscosity * air.specificHeat) / air.thermalConductivity;
  const reynolds = channelReynolds(sink, geometry, air, point.velocity);
  const laminar = (finChannelNusselt(reynolds, prandtl) * air.thermalConductivity) / geometry.spacing;
  const share = turbulentShare(point.reynolds);
  if (share === 0) return laminar;
  const diameter = hydraulicDiameter(sink, geometry);
  const entrance = 1 + (diameter / sink.height) ** (2 / 3);
  const nusselt = gnielinskiNusselt(point.reynolds, prandtl) * entrance;
  const local = (nusselt * air.thermalConductivity) / diameter;
  const area = geometry.channelFinArea + geometry.channelBaseArea;
  const turbulent = (-Math.expm1((-local * area) / capacityRate) * capacityRate) / area;
  // Short channels shed more in their laminar entrance than Gnielinski's law has near its lower end.
  return (1 - share) * laminar + share * Math.max(laminar, turbulent);
}

function settleFan(spec: FanCoolerSpec, air: AirSide, heat: number, { ambient }: Surroundings): CoolerState {
  const { power } = spec.fan;
  const entry = ambient + air.entryRise;
  const sinkTemperature = entry + heat * air.sinkResistance;
  const baseTemperature = entry + heat * (air.sinkResistance + air.attachment);
  const airRise = heat / air.capacityRate;
  return completeState({
    heat,
    baseTemperature,
    electricalPower: power,
    coldestTemperature: Math.min(baseTemperature, sinkTemperature),
    limits: [],
    details: {
      sinkTemperature,
      airFlow: air.volumeFlow,
      pressureDrop: air.pressureDrop,
      airVelocity: air.velocity,
      airRise: airRise + air.entryRise,
      finEfficiency: air.efficiency,
      heatTransferCoefficient: air.coefficient,
      thermalResistance: air.sinkResistance + air.attachment,
      attachmentResistance: air.attachment,
    },
    flows: [
      flow('base', 'fan sink', heat),
      flow('wall plug', 'fan', power),
      flow('fan', 'air stream', power),
      flow('fan sink', 'air stream', heat),
      flow('air stream', 'surroundings', heat + power),
    ],
    warnings: fanWarnings(air, airRise),
  });
}

function fanWarnings(air: AirSide, airRise: number): Warning[] {
  const warnings: Warning[] = [];
  const warn = (text: string) => warnings.push({ where: 'cooling.fan', text });
  const { channelReynolds } = air;
  if (air.reynolds < 2300 && (channelReynolds < LOWEST_REYNOLDS || channelReynolds > HIGHEST_REYNOLDS)) {
    warn(
      `Channel Reynolds number ${channelReynolds.toPrecision(3)} between the fins is outside ${LOWEST_REYNOLDS} to ${HIGHEST_REYNOLDS}, where the correlation was fitted.`,
    );
  }
  if (airRise > LARGEST_AIR_RISE) {
    warn(
      `The air warms by ${airRise.toFixed(0)} K between the fins; its properties were taken at the ambient.`,
    );
  }
  return warnings;
}
