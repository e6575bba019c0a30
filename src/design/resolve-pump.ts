import type { Warning } from '../errors';
import type { Crystal } from '../materials';
import type { BeamProfile } from '../pump';
import { measuredProfile, stretchWarning } from './measured-profile';
import { valueOf } from './quantity-field';
import type { ResolvedDiode, ResolvedPump } from './resolved';
import type { Design } from './schema';

/** Without a range of its own a design is searched up to this multiple of its pump power. */
const usualSearch = 3;
/** The operating power must lie inside what is searched, with a little room beyond it. */
const beyondOperating = 1.02;

/** Greatest power searched, W; 1 W for a design whose pump is off. */
function searchTo({ pump }: Design, power: number): number {
  const top = pump.powerRange ? valueOf(pump.powerRange[1], 'power') : usualSearch * power || 1;
  return Math.max(top, beyondOperating * power);
}

/**
 * Shares of the pump light with its field along the optic axis (pi) and across it (sigma), as the rod's cut lets it.
 * In a rod cut along c all light has its field across the optic axis; a biaxial crystal is treated alike.
 */
export function polarisationShares(crystal: Crystal, { rod, pump }: Design): { pi: number; sigma: number } {
  if (crystal.symmetry !== 'isotropic' && rod.cut === 'c') return { pi: 0, sigma: 1 };
  if (pump.polarisation === 'unpolarised') return { pi: 0.5, sigma: 0.5 };
  return pump.polarisation === 'pi' ? { pi: 1, sigma: 0 } : { pi: 0, sigma: 1 };
}

function profileOf({ pump: { profile, profileOrder, profileTable } }: Design): BeamProfile {
  if (profile === 'table') return measuredProfile(profileTable!);
  return profile === 'super-gaussian' ? { kind: profile, order: profileOrder } : { kind: profile };
}

/** The pump light of a design in SI. */
export function resolvePump(design: Design, crystal: Crystal): ResolvedPump {
  const { pump } = design;
  const power = valueOf(pump.power, 'power');
  return {
    power,
    searchTo: searchTo(design, power),
    wavelength: valueOf(pump.wavelength, 'length'),
    referenceCaseTemperature: valueOf(pump.wavelengthAtCase, 'temperature'),
    drift: valueOf(pump.wavelengthDrift, 'wavelengthDrift'),
    linewidth: valueOf(pump.linewidth, 'length'),
    radius: valueOf(pump.radius, 'length'),
    profile: profileOf(design),
    beamQuality: pump.beamQuality ?? null,
    waistPosition: valueOf(pump.waistPosition, 'length'),
    polarisationShares: polarisationShares(crystal, design),
    passes: pump.passes === 2 ? 2 : 1,
    backShare: valueOf(pump.backShare, 'dimensionless'),
    returnReflectivity: valueOf(pump.returnReflectivity, 'dimensionless'),
    entranceTransmission: valueOf(pump.entranceTransmission, 'dimensionless'),
  };
}

/** What a person should know of the way the light enters. */
export function pumpWarnings(design: Design, { profile, passes, backShare }: ResolvedPump): Warning[] {
  const text =
    'A second pass in a rod pumped from both ends asks of each face that it lets one beam in and sends the other back, as only beams of two polarisations or wavelengths allow; both are computed as sent back.';
  return [
    ...stretchWarning(design, profile),
    ...(passes === 2 && backShare > 0 && backShare < 1 ? [{ where: 'pump.backShare', text }] : []),
  ];
}

/** The diode of a design in SI. */
export function resolveDiode({ pump: { diode } }: Design): ResolvedDiode {
  const temperature = valueOf(diode.caseTemperature, 'temperature', { 'follows the base': Number.NaN });
  return {
    wallPlugEfficiency: valueOf(diode.wallPlugEfficiency, 'dimensionless'),
    circuit: diode.circuit,
    caseToBase: valueOf(diode.caseToBase, 'thermalResistance'),
    caseTemperature: Number.isNaN(temperature) ? null : temperature,
  };
}
