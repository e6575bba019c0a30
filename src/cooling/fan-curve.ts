import type { FluidProperties } from '../materials';
import { findRoot } from '../numerics/root';
import { ductFriction } from './channel-flow';
import type { FinGeometry, PlateFinSink } from './plate-fins';

/** A fan by the two ends of its curve, as data sheets give them at 1.2 kg/m3. */
export interface FanSpec {
  /** Flow against no pressure, m3/s. */
  freeFlow: number;
  /** Pressure at no flow, Pa. */
  shutOffPressure: number;
  /** Electrical, W; taken as constant along the curve. */
  power: number;
  /** Shape between the ends; 'linear' when left out, the cautious one: p0 (1 - V/V0). 'quadratic': p0 (1 - (V/V0)^2). */
  curve?: 'linear' | 'quadratic';
}

const RATED_DENSITY = 1.2;

/** Where the fan curve meets the sink. */
export interface OperatingPoint {
  /** m3/s */
  volumeFlow: number;
  /** Pa */
  pressureDrop: number;
  /** Between the fins, m/s. */
  velocity: number;
  /** On the hydraulic diameter of a channel. */
  reynolds: number;
}

/** Pressure of the fan at a flow, Pa; goes with air density (fan laws). */
export function fanPressure(fan: FanSpec, volumeFlow: number, density: number): number {
  const share = volumeFlow / fan.freeFlow;
  const shape = fan.curve === 'quadratic' ? 1 - share * share : 1 - share;
  return ((fan.shutOffPressure * density) / RATED_DENSITY) * shape;
}

/**
 * Pressure lost between the fins when all the air passes there.
 *
 * dp = (rho v^2 / 2) (f L/D_h + K_c + K_e),  K_c = 0.42 (1 - sigma^2),  K_e = (1 - sigma^2)^2,
 * sigma the open share of the front.
 *
 * @param velocity between the fins, m/s, above 0
 * @returns Pa
 * @source Culham & Muzychka 2001, IEEE Trans. CPT 24, 159 (from memory)
 */
function finPressureDrop(
  sink: PlateFinSink,
  geometry: FinGeometry,
  air: FluidProperties,
  velocity: number,
): number {
  const diameter = hydraulicDiameter(sink, geometry);
  const reynolds = (velocity * diameter * air.density) / air.dynamicViscosity;
  const { spacing } = geometry;
  const aspect = Math.min(spacing, sink.finHeight) / Math.max(spacing, sink.finHeight);
  const open = (geometry.channels * spacing) / sink.width;
  const blocked = 1 - open * open;
  const friction = (ductFriction(reynolds, sink.height / diameter, aspect) * sink.height) / diameter;
  return 0.5 * air.density * velocity * velocity * (friction + 0.42 * blocked + blocked * blocked);
}

/** 4 x open area / wetted edge of one channel closed all round, m. */
export function hydraulicDiameter(sink: PlateFinSink, geometry: FinGeometry): number {
  return (2 * geometry.spacing * sink.finHeight) / (geometry.spacing + sink.finHeight);
}

/** Flow at which the fan's pressure equals the loss between the fins. */
export function operatingPoint(
  fan: FanSpec,
  sink: PlateFinSink,
  geometry: FinGeometry,
  air: FluidProperties,
): OperatingPoint {
  const openArea = geometry.channels * geometry.spacing * sink.finHeight;
  const drop = (flow: number) => (flow > 0 ? finPressureDrop(sink, geometry, air, flow / openArea) : 0);
  const excess = (flow: number) => fanPressure(fan, flow, air.density) - drop(flow);
  const volumeFlow = findRoot(excess, 0, fan.freeFlow);
  const velocity = volumeFlow / openArea;
  return {
    volumeFlow,
    pressureDrop: drop(volumeFlow),
    velocity,
    reynolds: (velocity * hydraulicDiameter(sink, geometry) * air.density) / air.dynamicViscosity,
  };
}
