import type { Coolant } from './types';

/** Properties of a fluid at one temperature; `outside` when the table had to be held at its end. */
export interface FluidProperties {
  /** kg/m^3 */
  density: number;
  /** J/(kg K) */
  specificHeat: number;
  /** W/(m K) */
  thermalConductivity: number;
  /** Pa s */
  dynamicViscosity: number;
  outside: boolean;
}

const logarithms = new WeakMap<Coolant, Float64Array>();

function viscosityLogarithms(coolant: Coolant): Float64Array {
  let known = logarithms.get(coolant);
  if (known === undefined) {
    known = Float64Array.from(coolant.table.dynamicViscosity, Math.log);
    logarithms.set(coolant, known);
  }
  return known;
}

/** Cubic through the four table points around the interval; the viscosity of water bends too much for a straight line. */
function cubic(x: readonly number[], y: Float64Array, interval: number, at: number): number {
  const first = Math.min(Math.max(interval - 1, 0), x.length - 4);
  let sum = 0;
  for (let i = first; i < first + 4; i++) {
    let weight = y[i]!;
    for (let j = first; j < first + 4; j++) if (j !== i) weight *= (at - x[j]!) / (x[i]! - x[j]!);
    sum += weight;
  }
  return sum;
}

/**
 * Density, specific heat, conductivity and viscosity of a coolant from its table.
 * Straight lines between rows; the logarithm of viscosity by a cubic through four rows. Outside the table the
 * nearest end holds and `outside` is set.
 *
 * @param temperature K
 * @param out reused when given, so that a solver need not allocate
 * @source the coolant record
 */
export function coolantProperties(
  coolant: Coolant,
  temperature: number,
  out: FluidProperties = {
    density: 0,
    specificHeat: 0,
    thermalConductivity: 0,
    dynamicViscosity: 0,
    outside: false,
  },
): FluidProperties {
  const { table } = coolant;
  const rows = table.temperature;
  const last = rows.length - 1;
  const clamped = Math.min(Math.max(temperature, rows[0]!), rows[last]!);
  let i = 0;
  while (i < last - 1 && clamped > rows[i + 1]!) i++;
  const share = (clamped - rows[i]!) / (rows[i + 1]! - rows[i]!);
  out.density = table.density[i]! + share * (table.density[i + 1]! - table.density[i]!);
  out.specificHeat = table.specificHeat[i]! + share * (table.specificHeat[i + 1]! - table.specificHeat[i]!);
  out.thermalConductivity =
    table.thermalConductivity[i]! +
    share * (table.thermalConductivity[i + 1]! - table.thermalConductivity[i]!);
  out.dynamicViscosity = Math.exp(cubic(rows, viscosityLogarithms(coolant), i, clamped));
  out.outside = clamped !== temperature;
  return out;
}

/**
 * Properties of dry air: the table at its own pressure, with the density of an ideal gas in proportion to the pressure
 * (and, beyond the table, in inverse proportion to the temperature).
 *
 * @param air the coolant record of air
 * @param temperature K
 * @param pressure Pa; conductivity, heat capacity and viscosity do not depend on it near one atmosphere
 */
export function gasProperties(
  air: Coolant,
  temperature: number,
  pressure: number,
  out?: FluidProperties,
): FluidProperties {
  const properties = coolantProperties(air, temperature, out);
  const rows = air.table.temperature;
  const clamped = Math.min(Math.max(temperature, rows[0]!), rows[rows.length - 1]!);
  properties.density *= (pressure / air.pressure) * (clamped / temperature);
  return properties;
}
