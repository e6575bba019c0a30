import coolantRecords from './coolants.json';
import crystalRecords from './crystals.json';
import emissivityRecords from './emissivities.json';
import { gasProperties, type FluidProperties } from './fluids';
import interfaceRecords from './interfaces.json';
import { findNamed } from './lookup';
import mountRecords from './mount-materials.json';
import diodeRecords from './pump-diodes.json';
import sourceRecords from './sources.json';
import thermoelectricRecord from './thermoelectric.json';
import { legProperties, type ThermoelectricProperties } from './thermoelectrics';
import type {
  Coolant,
  Crystal,
  Emissivity,
  Interface,
  MountMaterial,
  PumpDiode,
  Source,
  ThermoelectricMaterial,
} from './types';

export {
  absorptionLines,
  conductivity,
  conductivityExponent,
  crystalValue,
  expansion,
  ionDensity,
  refractiveIndex,
  thermoOptic,
} from './crystal-values';
export { coolantProperties } from './fluids';
export type { FluidProperties } from './fluids';
export { nearestName } from './lookup';
export type { ThermoelectricProperties } from './thermoelectrics';
export type * from './types';

// A JSON import widens every word to `string`; tests/materials/records.test.ts checks each record against its type.
export const crystals = crystalRecords as unknown as Crystal[];
export const mountMaterials: MountMaterial[] = mountRecords;
export const interfaces: Interface[] = interfaceRecords;
export const coolants: Coolant[] = coolantRecords;
export const emissivities: Emissivity[] = emissivityRecords;
export const pumpDiodes: PumpDiode[] = diodeRecords;
export const thermoelectric: ThermoelectricMaterial = thermoelectricRecord;
export const sources: Record<string, Source> = sourceRecords.sources;

export function findCrystal(name: string): Crystal | undefined {
  return findNamed(crystals, name);
}
export function findMountMaterial(name: string): MountMaterial | undefined {
  return findNamed(mountMaterials, name);
}
export function findInterface(name: string): Interface | undefined {
  return findNamed(interfaces, name);
}
export function findCoolant(name: string): Coolant | undefined {
  return findNamed(coolants, name);
}
/** The emissivity of a surface by its listed name, "copper, polished", or id. */
export function findEmissivity(surface: string): Emissivity | undefined {
  const named = emissivities.map((record) => ({ id: record.id, name: record.surface, aliases: [], record }));
  return findNamed(named, surface)?.record;
}

/** The class of pump diode whose wavelength is nearest, for defaults. @param wavelength m */
export function nearestPumpDiode(wavelength: number): PumpDiode {
  return pumpDiodes.reduce((best, diode) =>
    Math.abs(diode.wavelength - wavelength) < Math.abs(best.wavelength - wavelength) ? diode : best,
  );
}

const air = coolants.find((coolant) => coolant.id === 'air')!;

/**
 * Dry air at a temperature and pressure; see `gasProperties`.
 * @param temperature K
 * @param pressure Pa
 */
export function airProperties(
  temperature: number,
  pressure = 101325,
  out?: FluidProperties,
): FluidProperties {
  return gasProperties(air, temperature, pressure, out);
}

/**
 * Bismuth telluride leg, mean of p and n, at a mean temperature; see `legProperties`.
 * @param temperature K, 200 to 420
 */
export function thermoelectricProperties(
  temperature: number,
  out?: ThermoelectricProperties,
): ThermoelectricProperties {
  return legProperties(thermoelectric, temperature, out);
}
