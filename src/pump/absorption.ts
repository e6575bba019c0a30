/** Polarisation of light relative to the optic axis of the crystal; 'none' where the crystal does not tell them apart. */
export type Polarisation = 'pi' | 'sigma' | 'none';

/** One absorption line of the crystal. A line with polarisation 'none' acts on every polarisation. */
export interface PumpLine {
  polarisation: Polarisation;
  /** centre wavelength, m */
  centre: number;
  /** full width at half maximum, m */
  fwhm: number;
  shape: 'lorentzian' | 'gaussian';
  /** peak absorption cross-section, m^2 */
  crossSection: number;
}

/** How strongly the doped rod absorbs the pump. */
export type AbsorptionModel =
  /** one entered coefficient (1/m), whatever the wavelength */
  | { kind: 'coefficient'; coefficient: number }
  /** spectroscopic lines times the density of dopant ions (1/m^3) */
  | { kind: 'lines'; lines: PumpLine[]; ionDensity: number }
  /**
   * an entered coefficient (1/m) that holds at a reference wavelength (m) for a diode of a reference linewidth (FWHM, m);
   * as the diode drifts it follows the diode-averaged line shape
   */
  | {
      kind: 'scaled-coefficient';
      coefficient: number;
      referenceWavelength: number;
      referenceLinewidth: number;
      lines: PumpLine[];
    };

/**
 * Absorption cross-section at one wavelength: the sum of all lines,
 * Lorentzian sigma0 / (1 + x^2) or Gaussian sigma0 exp(-ln2 x^2), x = 2 (wavelength - centre) / fwhm.
 * Left out: the pedestal of unlisted lines and the broadening of lines with temperature.
 * @param lines lines acting on one polarisation
 * @param wavelength m
 * @returns m^2
 * @source Siegman, Lasers (1986), ch. 2 and 3, line shapes (from memory)
 */
export function lineCrossSection(lines: readonly PumpLine[], wavelength: number): number {
  let sum = 0;
  for (const line of lines) {
    const x = (2 * (wavelength - line.centre)) / line.fwhm;
    sum += line.crossSection * (line.shape === 'lorentzian' ? 1 / (1 + x * x) : Math.exp(-Math.LN2 * x * x));
  }
  return sum;
}

/**
 * The lines that act on each polarisation of the light.
 * @returns one entry with polarisation 'none' when no line tells polarisations apart, otherwise one for pi and one for sigma;
 *   a polarisation that carries no light is left out. Shares sum to 1.
 */
export function linesByPolarisation(
  lines: readonly PumpLine[],
  shares: { pi: number; sigma: number },
): { polarisation: Polarisation; share: number; lines: PumpLine[] }[] {
  if (lines.every((line) => line.polarisation === 'none'))
    return [{ polarisation: 'none', share: 1, lines: [...lines] }];
  const total = shares.pi + shares.sigma;
  return (['pi', 'sigma'] as const)
    .filter((polarisation) => shares[polarisation] > 0)
    .map((polarisation) => ({
      polarisation,
      share: shares[polarisation] / total,
      lines: lines.filter((line) => line.polarisation === polarisation || line.polarisation === 'none'),
    }));
}
