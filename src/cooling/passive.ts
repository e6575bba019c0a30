import { NumericalError, type Warning } from '../errors';
import { airProperties } from '../materials';
import { type Attachment, completeState, type Cooler, flow, HIGHEST_BASE, LOWEST_BASE } from './cooler';
import type { CoolerState, Surroundings } from './cooler';
import {
  optimumFinSpacing,
  parallelPlateNusselt,
  rayleighNumber,
  outerFaceNusselt,
} from './natural-convection';
import { finEfficiency, finGeometry, type FinGeometry, type PlateFinSink } from './plate-fins';
import { blackRadiationCoefficient, cavityEmissivity } from './radiation';
import { attachmentResistance } from './spreading';

/** Finned sink in still air. */
export interface PassiveSpec extends PlateFinSink, Attachment {
  emissivity: number;
  /** 'vertical': the fins stand upright, air rises along them. 'horizontal': base level, fins up. */
  orientation: 'vertical' | 'horizontal';
}

/** Convection of level fins as a share of upright ones (common practice, no source: 0.7 to 0.85). */
const HORIZONTAL_SHARE = 0.75;

/** Rises above ambient at which the heat is worked out once per surroundings, K. */
const SEED_RISES = [1, 4, 10, 20, 35, 60, 100, 200];

/** Areas fixed by the sink: what radiates and convects where. m2 and 1. */
interface PassiveSink {
  spec: PassiveSpec;
  geometry: FinGeometry;
  /** Outer faces that follow the fins' temperature: end fins, tips. */
  outerFinArea: number;
  /** Edges of the base plate. */
  edgeArea: number;
  /** Radiating area of the channels' openings times their apparent emissivity. */
  channelRadiation: number;
  convectionShare: number;
  /** Heats at SEED_RISES in the last surroundings asked for, W. */
  seeds: { ambient: number; airPressure: number; heats: number[] };
}

/** What a sink sheds with its plate at a given temperature. */
interface Shed {
  heat: number;
  radiation: number;
  efficiency: number;
  channelCoefficient: number;
  optimumSpacing: number;
  /** The film is outside the table of air, whose end was used. */
  outsideAir: boolean;
}

/**
 * A finned sink in still air: natural convection in the channels (Bar-Cohen & Rohsenow 1984) and on the outer
 * faces (Churchill & Chu 1975), radiation, fin efficiency. The face that carries the mount sheds nothing.
 *
 * @source README of this room
 */
export function passiveCooler(spec: PassiveSpec): Cooler {
  const sink = describeSink(spec);
  return {
    kind: 'passive',
    settle: (heat, surroundings) => settlePassive(sink, heat, surroundings),
    baseTemperature: (heat, surroundings) => {
      const rise = sinkRise(sink, heat, surroundings);
      return surroundings.ambient + rise + heat * jointResistance(sink, heat, rise);
    },
  };
}

function describeSink(spec: PassiveSpec): PassiveSink {
  const geometry = finGeometry(spec);
  const { height, finHeight, finCount, finThickness, width } = spec;
  const opening = geometry.channels * geometry.spacing * (height + 2 * finHeight);
  const wall = geometry.channelFinArea + geometry.channelBaseArea;
  return {
    spec,
    geometry,
    outerFinArea: 2 * finHeight * height + finCount * finThickness * height,
    edgeArea: 2 * (width + height) * geometry.baseThickness,
    // A channel wider than deep has more opening than wall; then nothing is gained by its depth.
    channelRadiation: opening * cavityEmissivity(spec.emissivity, Math.min(1, opening / wall)),
    convectionShare: spec.orientation === 'horizontal' ? HORIZONTAL_SHARE : 1,
    seeds: { ambient: Number.NaN, airPressure: Number.NaN, heats: [] },
  };
}

/** Heat shed with the plate `difference` above (or below) the ambient; same sign. */
function shed(sink: PassiveSink, difference: number, { ambient, airPressure }: Surroundings): Shed {
  const { spec, geometry } = sink;
  const temperature = ambient + difference;
  const film = 0.5 * (temperature + ambient);
  const air = airProperties(film, airPressure);
  const kinematicViscosity = air.dynamicViscosity / air.density;
  const diffusivity = air.thermalConductivity / (air.density * air.specificHeat);
  const properties = { kinematicViscosity, diffusivity, expansion: 1 / film };
  const spacing = geometry.spacing;
  const onHeight = rayleighNumber(properties, difference, spec.height);
  const onSpacing = onHeight * (spacing / spec.height) ** 4;
  const perLength = sink.convectionShare * air.thermalConductivity;
  const channelConvection = (perLength * parallelPlateNusselt(onSpacing)) / spacing;
  const outerConvection =
    (perLength * outerFaceNusselt(onHeight, kinematicViscosity / diffusivity)) / spec.height;
  const black = blackRadiationCoefficient(temperature, ambient);
  const wall = geometry.channelFinArea + geometry.channelBaseArea;
  const channelCoefficient = channelConvection + (black * sink.channelRadiation) / wall;
  const efficiency = finEfficiency(channelCoefficient, spec);
  const finned = (efficiency * geometry.channelFinArea + geometry.channelBaseArea) / wall;
  const outer = efficiency * sink.outerFinArea + sink.edgeArea;
  const convection = channelConvection * wall * finned + outerConvection * outer;
  const radiation = black * (sink.channelRadiation * finned + spec.emissivity * outer);
  return {
    heat: (convection + radiation) * difference,
    radiation: radiation * difference,
    efficiency,
    channelCoefficient,
    outsideAir: air.outside,
    optimumSpacing: onHeight > 0 ? optimumFinSpacing(spec.height, onHeight) : spacing,
  };
}

/**
 * Rise of the plate above the ambient at which the sink sheds `heat`: secant steps on logarithms, where the
 * law is almost a straight line. Beyond the believed range the answer is continued in proportion to the heat.
 */
function sinkRise(sink: PassiveSink, heat: number, surroundings: Surroundings): number {
  if (heat === 0) return 0;
  const { ambient } = surroundings;
  const sign = Math.sign(heat);
  const furthest = sign > 0 ? HIGHEST_BASE - ambient : ambient - LOWEST_BASE;
  const start = firstGuess(sink, Math.abs(heat), surroundings);
  let rise = Math.min(start.rise, furthest);
  let power = start.power;
  let lastRise = 0;
  let lastShare = 0;
  for (let step = 0; step < 40; step++) {
    const share = shed(sink, sign * rise, surroundings).heat / heat;
    if (share < 1 && rise === furthest) return (sign * rise) / share;
    if (lastShare > 0) {
      const measured = Math.log(share / lastShare) / Math.log(rise / lastRise);
      // Rounding spoils the slope of points that nearly coincide.
      if (measured > 0.8 && measured < 3) power = measured;
    }
    lastRise = rise;
    lastShare = share;
    rise = Math.min(rise * share ** (-1 / power), furthest);
    // What is left after a step this short is its square, far below a nanokelvin.
    if (Math.abs(share - 1) < 1e-7) return sign * rise;
  }
  throw new NumericalError('rise of the passive sink', lastShare - 1);
}

/**
 * Where to begin: the power law through the two nearest of a few rises at which the heat has been worked out.
 * They depend on the surroundings alone, so remembering them changes no answer.
 */
function firstGuess(
  sink: PassiveSink,
  heat: number,
  surroundings: Surroundings,
): { rise: number; power: number } {
  const { seeds } = sink;
  if (seeds.ambient !== surroundings.ambient || seeds.airPressure !== surroundings.airPressure) {
    seeds.ambient = surroundings.ambient;
    seeds.airPressure = surroundings.airPressure;
    SEED_RISES.forEach((rise, i) => (seeds.heats[i] = shed(sink, rise, surroundings).heat));
  }
  let i = 0;
  while (i < SEED_RISES.length - 2 && heat > seeds.heats[i + 1]!) i++;
  const span = Math.log(SEED_RISES[i + 1]! / SEED_RISES[i]!);
  const power = Math.log(seeds.heats[i + 1]! / seeds.heats[i]!) / span;
  return { rise: SEED_RISES[i]! * (heat / seeds.heats[i]!) ** (1 / power), power };
}

/** Interface and spreading above the plate's mean, K/W. */
function jointResistance(sink: PassiveSink, heat: number, rise: number): number {
  if (heat === 0) return 0;
  return attachmentResistance(sink.spec, sink.geometry.plate, rise / heat);
}

function settlePassive(sink: PassiveSink, heat: number, surroundings: Surroundings): CoolerState {
  const rise = sinkRise(sink, heat, surroundings);
  const temperature = surroundings.ambient + rise;
  const joint = jointResistance(sink, heat, rise);
  const baseTemperature = temperature + heat * joint;
  const parts = shed(sink, Math.min(rise, HIGHEST_BASE - surroundings.ambient), surroundings);
  const details: Record<string, number> = {
    sinkTemperature: temperature,
    finEfficiency: parts.efficiency,
    heatTransferCoefficient: parts.channelCoefficient,
    radiatedHeat: parts.radiation,
    finSpacing: sink.geometry.spacing,
    optimumFinSpacing: parts.optimumSpacing,
    attachmentResistance: joint,
  };
  if (heat !== 0) details.thermalResistance = (baseTemperature - surroundings.ambient) / heat;
  return completeState({
    heat,
    baseTemperature,
    electricalPower: 0,
    coldestTemperature: Math.min(baseTemperature, temperature),
    limits: [],
    details,
    flows: [flow('base', 'finned sink', heat), flow('finned sink', 'surroundings', heat)],
    warnings: passiveWarnings(parts, surroundings.ambient + 0.5 * rise),
  });
}

function passiveWarnings({ outsideAir }: Shed, film: number): Warning[] {
  if (!outsideAir) return [];
  const text = `The air film beside the finned sink, ${film.toFixed(0)} K, is outside the table of air: viscosity and conductivity were held at its end.`;
  return [{ where: 'cooling.passive', text }];
}
