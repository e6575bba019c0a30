/**
 * Kirchhoff's transform of a conductivity that varies as k(T) = k_300 (300 K / T)^m.
 *
 * The potential theta = integral from 300 K to T of k(T')/k_300 dT' obeys div(k_300 grad theta) + q = 0, a linear
 * equation, when radial and axial conductivity vary alike. For m = 0 it is T - 300 K.
 * @source Carslaw & Jaeger, Conduction of Heat in Solids, section 1.6 (from memory)
 */
export interface ConductivityLaw {
  exponent: number;
}

const reference = 300;

/** Potential of a temperature, K. */
export function potentialOf(law: ConductivityLaw, temperature: number): number {
  const m = law.exponent;
  if (m === 0) return temperature - reference;
  if (m === 1) return reference * Math.log(temperature / reference);
  return (reference / (1 - m)) * (Math.pow(temperature / reference, 1 - m) - 1);
}

/** Temperature of a potential, K; Infinity where no temperature conducts that much heat (possible for m > 1). */
export function temperatureOf(law: ConductivityLaw, potential: number): number {
  const m = law.exponent;
  if (m === 0) return potential + reference;
  if (m === 1) return reference * Math.exp(potential / reference);
  const power = 1 + ((1 - m) * potential) / reference;
  if (power <= 0) return m > 1 ? Infinity : 0;
  return reference * Math.pow(power, 1 / (1 - m));
}

/** dT/dtheta = k_300 / k(T) = (T / 300 K)^m. */
export function temperatureSlope(law: ConductivityLaw, temperature: number): number {
  return law.exponent === 0 ? 1 : Math.pow(temperature / reference, law.exponent);
}
