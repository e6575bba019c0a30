import type { Polynomial, ThermoelectricMaterial } from './types';

/** Material properties of a thermoelectric leg at one mean temperature. */
export interface ThermoelectricProperties {
  /** V/K per leg */
  seebeck: number;
  /** ohm m */
  resistivity: number;
  /** W/(m K) */
  thermalConductivity: number;
  /** True when the polynomials were held at the end of their range. */
  outside: boolean;
}

function evaluate({ coefficients }: Polynomial, temperature: number): number {
  let sum = 0;
  for (let i = coefficients.length - 1; i >= 0; i--) sum = sum * temperature + coefficients[i]!;
  return sum;
}

/**
 * Seebeck coefficient, resistivity and conductivity of a leg at its mean temperature.
 * @param temperature K; held at the ends of the material's range, then `outside` is set
 * @param out reused when given
 */
export function legProperties(
  material: ThermoelectricMaterial,
  temperature: number,
  out: ThermoelectricProperties = { seebeck: 0, resistivity: 0, thermalConductivity: 0, outside: false },
): ThermoelectricProperties {
  const held = Math.min(Math.max(temperature, material.lowestTemperature), material.highestTemperature);
  out.seebeck = evaluate(material.polynomials.seebeck, held);
  out.resistivity = evaluate(material.polynomials.resistivity, held);
  out.thermalConductivity = evaluate(material.polynomials.thermalConductivity, held);
  out.outside = held !== temperature;
  return out;
}
