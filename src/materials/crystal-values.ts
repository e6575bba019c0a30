import type { AbsorptionLine, Crystal, CrystalAxis, CrystalProperty, Polarisation, Sourced } from './types';

function alongPolarisation(
  crystal: Crystal,
  property: 'refractiveIndex' | 'thermoOptic',
  polarisation: Polarisation,
): Sourced | undefined {
  if (crystal.polarisationAxes === undefined) return crystal.values[property];
  if (polarisation === 'none') return undefined;
  return crystal.values[`${property}${crystal.polarisationAxes[polarisation]}`];
}

function alongAxis(
  crystal: Crystal,
  property: 'thermalConductivity' | 'expansion',
  axis: CrystalAxis,
): Sourced | undefined {
  const letter = axis === 'a' ? 'A' : axis === 'b' ? 'B' : 'C';
  const own = crystal.values[`${property}${letter}`];
  if (own !== undefined) return own;
  if (axis === 'b' && crystal.symmetry === 'uniaxial') return crystal.values[`${property}A`];
  return crystal.values[property];
}

/**
 * Refractive index near the laser line for light of this polarisation.
 * @returns undefined when it is not known, or when an anisotropic crystal is asked for no polarisation
 */
export function refractiveIndex(crystal: Crystal, polarisation: Polarisation): Sourced | undefined {
  return alongPolarisation(crystal, 'refractiveIndex', polarisation);
}

/**
 * dn/dT for light of this polarisation, 1/K, signed.
 * @returns undefined when it is not known, or when an anisotropic crystal is asked for no polarisation
 */
export function thermoOptic(crystal: Crystal, polarisation: Polarisation): Sourced | undefined {
  return alongPolarisation(crystal, 'thermoOptic', polarisation);
}

/** Thermal conductivity along a crystal axis near 300 K, W/(m K); the b axis of a uniaxial crystal is its a axis. */
export function conductivity(crystal: Crystal, axis: CrystalAxis): Sourced | undefined {
  return alongAxis(crystal, 'thermalConductivity', axis);
}

/** Linear expansion along a crystal axis near 300 K, 1/K; may be negative. */
export function expansion(crystal: Crystal, axis: CrystalAxis): Sourced | undefined {
  return alongAxis(crystal, 'expansion', axis);
}

/**
 * The exponent m of k(T) = k(300 K) (300 K / T)^m near 300 K.
 * @returns undefined when no conductivity against temperature is known for this crystal
 */
export function conductivityExponent(crystal: Crystal): Sourced | undefined {
  return crystal.values.conductivityExponent;
}

function scaled(value: Sourced, factor: number, unit: string): Sourced {
  const times = (number: number | null): number | null => (number === null ? null : number * factor);
  const result = {
    ...value,
    nominal: value.nominal * factor,
    low: times(value.low),
    high: times(value.high),
    unit,
  };
  delete result.alternatives;
  return result;
}

/**
 * Active ions per volume, 1/m^3: sites (or mass) per volume times the dopant share.
 * @param dopantShare share of 1 ("0.3 at.%" is 0.003), of atoms or of mass as the crystal's `dopantBasis` says; not
 *   used where the ion density is stated directly
 */
export function ionDensity(crystal: Crystal, dopantShare: number): Sourced | undefined {
  if (crystal.dopantBasis === 'none') return crystal.values.ionDensity;
  const perShare = crystal.values.ionDensityPerShare;
  return perShare === undefined ? undefined : scaled(perShare, dopantShare, '1/m^3');
}

/**
 * The absorption lines that may be added up to one spectrum: averages over a diode spectrum and further points of a
 * band already described are left out, since they would be counted twice.
 */
export function absorptionLines(crystal: Crystal, polarisation?: Polarisation): AbsorptionLine[] {
  return crystal.absorption.filter(
    (line) =>
      line.averaged !== true &&
      line.bandPoint !== true &&
      (polarisation === undefined || line.polarisation === polarisation || line.polarisation === 'none'),
  );
}

/** The value a crystal holds under this name, if it is known. */
export function crystalValue(crystal: Crystal, property: CrystalProperty): Sourced | undefined {
  return crystal.values[property];
}
