import type { Crystal, LaserLine, Polarisation } from '../materials';

/** Share of the wavelength by which a line may differ from the one asked for: "1064 nm" means 1064.1 nm. */
const nearEnough = 0.004;
/** Lines closer together than this are one line in two polarisations, m. */
const sameLine = 0.2e-9;

/** Lines of a crystal that a wavelength can mean. @param wavelength m */
export function linesNear(crystal: Crystal, wavelength: number): LaserLine[] {
  return crystal.lines.filter((line) => Math.abs(line.wavelength - wavelength) < nearEnough * wavelength);
}

/** Those of some lines that a rod of this cut can emit: light along the optic axis has no field along that axis. */
export function linesOfCut(crystal: Crystal, lines: readonly LaserLine[], cut: 'a' | 'c'): LaserLine[] {
  const alongOpticAxis = crystal.symmetry === 'uniaxial' && cut === 'c';
  return lines.filter((line) => !(alongOpticAxis && line.polarisation === 'pi'));
}

/**
 * The line a laser of this crystal and cut emits: nearest to what is asked for, of two polarisations the stronger.
 * @param wavelength m; `linesNear` must hold one that the cut can emit
 */
export function laserLine(crystal: Crystal, wavelength: number, cut: 'a' | 'c'): LaserLine {
  const possible = linesOfCut(crystal, linesNear(crystal, wavelength), cut);
  const distance = (line: LaserLine) => Math.abs(line.wavelength - wavelength);
  const nearest = Math.min(...possible.map(distance));
  return possible
    .filter((line) => distance(line) < nearest + sameLine)
    .reduce((best, line) =>
      line.emissionCrossSection.nominal > best.emissionCrossSection.nominal ? line : best,
    );
}

/** Polarisation of the laser's light against the crystal; "none" where the crystal is isotropic. */
export function laserPolarisation(crystal: Crystal, line: LaserLine, cut: 'a' | 'c'): Polarisation {
  if (!crystal.polarisationAxes) return 'none';
  if (line.polarisation !== 'none') return line.polarisation;
  return cut === 'c' ? 'sigma' : 'pi';
}
