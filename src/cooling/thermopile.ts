import { thermoelectricProperties } from '../materials';
import { type DataSheet, dataSheetOf, moduleOfDataSheet, type ThermoelectricModule } from './thermoelectric';

/** Modules by what is inside them; `count` of them side by side, in series for the current. Lengths in m. */
export interface LegSpec {
  kind: 'legs';
  /** Of one module. */
  couples: number;
  legSide: number;
  legHeight: number;
  count: number;
  /** Per solder joint, ohm m2; 0 when left out. About 1e-9 in practice (from memory). */
  contactResistivity?: number;
}

/** Modules by their data sheet. */
export interface DataSheetSpec extends DataSheet {
  kind: 'data sheet';
  count: number;
}

/** All modules of a TEC as one, at any mean temperature of its junctions. */
export interface Thermopile {
  at(meanTemperature: number): ThermoelectricModule;
  /** Imax of the modules with their hot junctions at a temperature, A. */
  greatestCurrent(hot: number): number;
}

/** Builds the thermopile; properties go with the mean junction temperature as those of bismuth telluride do. */
export function makeThermopile(spec: LegSpec | DataSheetSpec): Thermopile {
  const at = spec.kind === 'legs' ? legsAt(spec) : dataSheetAt(spec);
  return { at, greatestCurrent: (hot) => greatestCurrent(at, hot) };
}

/** S = 2 N alpha, R = 2 N rho l/A + 4 N r_c/A, K = 2 N k A/l, N couples of all modules. */
function legsAt(spec: LegSpec): Thermopile['at'] {
  const legs = 2 * spec.couples * spec.count;
  const area = spec.legSide * spec.legSide;
  const contact = (2 * legs * (spec.contactResistivity ?? 0)) / area;
  return (meanTemperature) => {
    const { seebeck, resistivity, thermalConductivity } = thermoelectricProperties(meanTemperature);
    return {
      seebeck: legs * seebeck,
      resistance: (legs * resistivity * spec.legHeight) / area + contact,
      conductance: (legs * thermalConductivity * area) / spec.legHeight,
    };
  };
}

/** The sheet's constants hold at its own mean temperature, Th - dTmax/2, and follow the material from there. */
function dataSheetAt(spec: DataSheetSpec): Thermopile['at'] {
  const one = moduleOfDataSheet(spec);
  const known = thermoelectricProperties(spec.hotSideTemperature - 0.5 * spec.greatestDifference);
  const { count } = spec;
  return (meanTemperature) => {
    const now = thermoelectricProperties(meanTemperature);
    return {
      seebeck: (count * one.seebeck * now.seebeck) / known.seebeck,
      resistance: (count * one.resistance * now.resistivity) / known.resistivity,
      conductance: (count * one.conductance * now.thermalConductivity) / known.thermalConductivity,
    };
  };
}

/** Imax with properties at the mean of hot and coldest junction; three rounds settle it to 1e-3 or better. */
function greatestCurrent(at: Thermopile['at'], hot: number): number {
  let sheet = dataSheetOf(at(hot), hot);
  for (let round = 0; round < 3; round++) sheet = dataSheetOf(at(hot - 0.5 * sheet.greatestDifference), hot);
  return sheet.greatestCurrent;
}
