import type { BasePlate } from './spreading';

/** A plate-fin sink. Fins stand on a base of width x height and run along the height; lengths in m. */
export interface PlateFinSink {
  /** Across the fins. */
  width: number;
  /** Along the fins, the way the air goes. */
  height: number;
  finHeight: number;
  /** At least 2. */
  finCount: number;
  finThickness: number;
  /** Of the plate under the fins; 5 mm when left out (common practice, no source). */
  baseThickness?: number;
  /** W/(m K) */
  conductivity: number;
}

const USUAL_BASE_THICKNESS = 5e-3;

/** Lengths and areas that follow from a sink. */
export interface FinGeometry {
  /** Clear space between two fins, m. */
  spacing: number;
  channels: number;
  /** Both fin sides of all channels, m2. */
  channelFinArea: number;
  /** Base strips between the fins, m2. */
  channelBaseArea: number;
  baseThickness: number;
  plate: BasePlate;
}

/** Clear space between fins, m; not above 0 when the fins do not fit. */
export function finSpacing(sink: Pick<PlateFinSink, 'width' | 'finCount' | 'finThickness'>): number {
  return (sink.width - sink.finCount * sink.finThickness) / (sink.finCount - 1);
}

/** @throws Error when there is no room between the fins: the design check should have refused it */
export function finGeometry(sink: PlateFinSink): FinGeometry {
  const spacing = finSpacing(sink);
  if (!(sink.finCount >= 2) || !(spacing > 0)) {
    throw new Error(`plate-fin sink: ${sink.finCount} fins leave ${spacing} m between them`);
  }
  const channels = sink.finCount - 1;
  const baseThickness = sink.baseThickness ?? USUAL_BASE_THICKNESS;
  return {
    spacing,
    channels,
    channelFinArea: 2 * channels * sink.finHeight * sink.height,
    channelBaseArea: channels * spacing * sink.height,
    baseThickness,
    plate: {
      radius: Math.sqrt((sink.width * sink.height) / Math.PI),
      thickness: baseThickness,
      conductivity: sink.conductivity,
    },
  };
}

/**
 * Share of its heat that a straight fin sheds compared with one that is as hot as its root everywhere.
 *
 * eta = tanh(m l) / (m l),  m = sqrt(2 h / (k t)); tip insulated.
 *
 * @param filmCoefficient h on both sides, W/(m2 K), 0 or more
 * @param sink l finHeight, t finThickness, k conductivity
 * @returns 0 to 1
 * @source Incropera, Fundamentals of Heat and Mass Transfer, equation 3.94 (from memory)
 */
export function finEfficiency(
  filmCoefficient: number,
  sink: Pick<PlateFinSink, 'finHeight' | 'finThickness' | 'conductivity'>,
): number {
  const product = sink.finHeight * Math.sqrt((2 * filmCoefficient) / (sink.conductivity * sink.finThickness));
  return product < 1e-6 ? 1 : Math.tanh(product) / product;
}
