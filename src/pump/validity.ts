import type { Warning } from '../errors';
import type { AbsorptionModel } from './absorption';
import { clippedShare } from './profile';
import type { BeamProfile } from './profile';

/** Further from every line than this many widths (line and diode together) the wings of the line shape decide. */
const WING_WIDTHS = 3;
/** Light that misses the rod heats the mount's front, which the model does not see; below this it does not matter. */
const HARMLESS_CLIPPING = 0.005;

/**
 * Whether the diode's light still lies on the listed absorption lines; far in their wings the line shape is a guess.
 * @param spectrum centre wavelength and full width at half maximum, m
 */
export function absorptionWarnings(
  spectrum: { centre: number; linewidth: number },
  absorption: AbsorptionModel,
): Warning[] {
  if (absorption.kind === 'coefficient') return [];
  const near = absorption.lines.some(
    (line) =>
      Math.abs(line.centre - spectrum.centre) <= WING_WIDTHS * Math.hypot(line.fwhm, spectrum.linewidth),
  );
  if (near) return [];
  const text =
    `The diode at ${(spectrum.centre * 1e9).toFixed(1)} nm is more than ${WING_WIDTHS} line widths from every listed ` +
    'absorption line: its absorption there rests on the wings of an assumed line shape. Enter a measured coefficient.';
  return [{ where: 'pump.wavelength', text }];
}

/**
 * Light that misses the rod.
 * @param widestRadius widest beam radius at the rod, m
 * @param apertureRadius rod radius, m
 */
export function clippingWarnings(
  profile: BeamProfile,
  widestRadius: number,
  apertureRadius: number,
): Warning[] {
  const clipped = clippedShare(profile, widestRadius, apertureRadius);
  if (clipped <= HARMLESS_CLIPPING) return [];
  const text =
    `${(100 * clipped).toFixed(1)} % of the pump light misses the rod's face. It is not absorbed, ` +
    'and it heats what stands behind: the mount and the holder.';
  return [{ where: 'pump.radius', text }];
}
