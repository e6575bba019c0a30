/** A thermoelectric module, or several as one, at one mean temperature. */
export interface ThermoelectricModule {
  /** S of all couples in series, V/K. */
  seebeck: number;
  /** R, ohm. */
  resistance: number;
  /** K, W/K. */
  conductance: number;
}

/**
 * Heat taken at the cold junction, W.
 *
 * Qc = S I Tc - I^2 R / 2 - K (Th - Tc); negative current heats.
 *
 * @param current I, A
 * @param cold Tc, K
 * @param hot Th, K
 * @source Goldsmid, Introduction to Thermoelectricity; standard relations (from memory)
 */
export function heatPumped(module: ThermoelectricModule, current: number, cold: number, hot: number): number {
  const { seebeck, resistance, conductance } = module;
  return seebeck * current * cold - 0.5 * current * current * resistance - conductance * (hot - cold);
}

/** V = S (Th - Tc) + I R, volt. Times I: power drawn, W; negative when the module generates. */
export function moduleVoltage(
  module: ThermoelectricModule,
  current: number,
  cold: number,
  hot: number,
): number {
  return module.seebeck * (hot - cold) + current * module.resistance;
}

/** Heat given at the hot junction, W: Qh = Qc + V I. */
export function heatRejected(
  module: ThermoelectricModule,
  current: number,
  cold: number,
  hot: number,
): number {
  return heatPumped(module, current, cold, hot) + current * moduleVoltage(module, current, cold, hot);
}

/** Z = S^2 / (R K), 1/K. */
function figureOfMerit({ seebeck, resistance, conductance }: ThermoelectricModule): number {
  return (seebeck * seebeck) / (resistance * conductance);
}

/**
 * The current with the best coefficient of performance between two junction temperatures, and that
 * coefficient.
 *
 * I = S dT / [R (m - 1)],  COP = (Tc/dT)(m - Th/Tc)/(m + 1),  m = sqrt(1 + Z (Th + Tc)/2)
 *
 * @returns A and 1; current 0 and an infinite coefficient where the hot side is not hotter
 * @source da Rosa, Fundamentals of Renewable Energy Processes (from memory)
 */
export function bestPerformance(
  module: ThermoelectricModule,
  cold: number,
  hot: number,
): { current: number; coefficient: number } {
  const difference = hot - cold;
  if (difference <= 0) return { current: 0, coefficient: Infinity };
  const m = Math.sqrt(1 + 0.5 * figureOfMerit(module) * (hot + cold));
  return {
    current: (module.seebeck * difference) / (module.resistance * (m - 1)),
    coefficient: ((cold / difference) * (m - hot / cold)) / (m + 1),
  };
}

/** The four numbers of a module's data sheet, at one hot-side temperature. */
export interface DataSheet {
  /** Qmax at no temperature difference and the greatest current, W; only checked against the others. */
  greatestHeat?: number;
  /** Imax, the current of the greatest difference, A. */
  greatestCurrent: number;
  /** Vmax at that point, V. */
  greatestVoltage: number;
  /** dTmax without heat, K. */
  greatestDifference: number;
  /** Th, K. */
  hotSideTemperature: number;
}

/**
 * Data-sheet numbers of a module of constant properties.
 *
 * Tc,min = (sqrt(1 + 2 Z Th) - 1)/Z,  dTmax = Th - Tc,min,  Imax = S Tc,min/R,  Vmax = S Th,
 * Qmax = S Th Imax - Imax^2 R/2
 *
 * @param hot Th, K
 */
export function dataSheetOf(module: ThermoelectricModule, hot: number): Required<DataSheet> {
  const z = figureOfMerit(module);
  const coldest = (Math.sqrt(1 + 2 * z * hot) - 1) / z;
  const greatestCurrent = (module.seebeck * coldest) / module.resistance;
  const greatestVoltage = module.seebeck * hot;
  return {
    greatestHeat: greatestCurrent * (greatestVoltage - 0.5 * greatestCurrent * module.resistance),
    greatestCurrent,
    greatestVoltage,
    greatestDifference: hot - coldest,
    hotSideTemperature: hot,
  };
}

/**
 * The module behind a data sheet, inverse of dataSheetOf.
 *
 * S = Vmax/Th,  R = Vmax (Th - dTmax)/(Imax Th),  K = Vmax Imax (Th - dTmax)/(2 Th dTmax)
 */
export function moduleOfDataSheet(sheet: DataSheet): ThermoelectricModule {
  const { greatestCurrent, greatestVoltage, greatestDifference, hotSideTemperature } = sheet;
  const coldShare = (hotSideTemperature - greatestDifference) / hotSideTemperature;
  return {
    seebeck: greatestVoltage / hotSideTemperature,
    resistance: (greatestVoltage / greatestCurrent) * coldShare,
    conductance: (0.5 * greatestVoltage * greatestCurrent * coldShare) / greatestDifference,
  };
}
