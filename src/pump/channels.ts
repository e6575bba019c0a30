import { lineCrossSection, linesByPolarisation } from './absorption';
import type { AbsorptionModel, Polarisation, PumpLine } from './absorption';
import { spectralNodes } from './spectrum';
import type { SpectralNodes } from './spectrum';

/** A part of the pump light that is absorbed with one coefficient. */
export interface PumpChannel {
  /** share of the light entering the rod; all shares sum to 1 */
  share: number;
  /** 1/m */
  absorptionCoefficient: number;
  /** m */
  wavelength: number;
  polarisation: Polarisation;
}

/** One polarisation of the pump, ready to be evaluated at any centre wavelength. */
interface PreparedPolarisation {
  polarisation: Polarisation;
  share: number;
  lines: PumpLine[];
  nodes: SpectralNodes;
  /** coefficient per cross-section, 1/m per m^2 */
  density: number;
  /** true: one coefficient from the diode-averaged cross-section; false: every node its own */
  averaged: boolean;
}

/** The pump's spectrum and the rod's absorption, ready to be evaluated at any centre wavelength of a stated range. */
export type PreparedAbsorption = PreparedPolarisation[];

/** Cross-section averaged over the spectrum centred at `centre`, m^2. */
function meanCrossSection(lines: readonly PumpLine[], nodes: SpectralNodes, centre: number): number {
  let sum = 0;
  for (let k = 0; k < nodes.weights.length; k++)
    sum += nodes.weights[k]! * lineCrossSection(lines, centre + nodes.offsets[k]!);
  return sum;
}

/** A reference wavelength where the lines give less than this share of their peak says nothing about the drift. */
const LEAST_REFERENCE_SHARE = 0.01;

/** Coefficient per cross-section that makes the averaged coefficient equal the entered one at the reference, or null. */
function referenceDensity(
  lines: readonly PumpLine[],
  absorption: AbsorptionModel & { kind: 'scaled-coefficient' },
): number | null {
  const nodes = spectralNodes(absorption.referenceLinewidth, lines, absorption.referenceWavelength);
  const reference = meanCrossSection(lines, nodes, absorption.referenceWavelength);
  const peak = lines.reduce((most, line) => Math.max(most, line.crossSection), 0);
  return reference > LEAST_REFERENCE_SHARE * peak ? absorption.coefficient / reference : null;
}

function constantCoefficient(
  polarisation: Polarisation,
  share: number,
  coefficient: number,
): PreparedPolarisation {
  return {
    polarisation,
    share,
    lines: [],
    nodes: spectralNodes(0, [], 0),
    density: coefficient,
    averaged: true,
  };
}

/**
 * Prepares the absorption of one pump for centre wavelengths between `from` and `to`.
 * @param linewidth full width at half maximum of the Gaussian diode spectrum, m
 * @param polarisationShares shares of the light polarised along and across the optic axis (normalised here)
 * @param from,to centre wavelengths to be served, m
 */
export function prepareAbsorption(
  linewidth: number,
  polarisationShares: { pi: number; sigma: number },
  absorption: AbsorptionModel,
  from: number,
  to: number = from,
): PreparedAbsorption {
  if (absorption.kind === 'coefficient') return [constantCoefficient('none', 1, absorption.coefficient)];
  return linesByPolarisation(absorption.lines, polarisationShares).map(({ polarisation, share, lines }) => {
    const averaged = absorption.kind === 'scaled-coefficient';
    const density = averaged ? referenceDensity(lines, absorption) : absorption.ionDensity;
    if (density === null)
      return constantCoefficient(polarisation, share, averaged ? absorption.coefficient : 0);
    return {
      polarisation,
      share,
      lines,
      nodes: spectralNodes(linewidth, lines, from, to),
      density,
      averaged,
    };
  });
}

/** Whether the absorption changes at all when the diode drifts. */
export function dependsOnWavelength(prepared: PreparedAbsorption): boolean {
  return prepared.some((part) => part.lines.length > 0 && part.density > 0);
}

function averagedCoefficient(part: PreparedPolarisation, centre: number): number {
  return part.density * (part.lines.length === 0 ? 1 : meanCrossSection(part.lines, part.nodes, centre));
}

/** The channels of a prepared pump at one centre wavelength (m). */
export function channelsAt(prepared: PreparedAbsorption, centre: number): PumpChannel[] {
  const channels: PumpChannel[] = [];
  for (const part of prepared) {
    const { polarisation, share, lines, nodes, density } = part;
    if (part.averaged) {
      const absorptionCoefficient = averagedCoefficient(part, centre);
      channels.push({ share, absorptionCoefficient, wavelength: centre, polarisation });
      continue;
    }
    for (let k = 0; k < nodes.weights.length; k++) {
      const wavelength = centre + nodes.offsets[k]!;
      const absorptionCoefficient = density * lineCrossSection(lines, wavelength);
      channels.push({ share: share * nodes.weights[k]!, absorptionCoefficient, wavelength, polarisation });
    }
  }
  return channels;
}

/** Share of light with one coefficient absorbed over the doped length, with the light that a mirror sends back. */
function shareTaken(coefficient: number, length: number, returned: number): number {
  const rest = Math.exp(-coefficient * length);
  return (1 - rest) * (1 + returned * rest);
}

/**
 * Absorbed share of a prepared pump at one centre wavelength (m); equals absorbedShare(channelsAt(...)) without making channels.
 * @param returned reflectivity of the second-pass mirror, 0 for one pass
 */
export function absorbedAt(
  prepared: PreparedAbsorption,
  centre: number,
  length: number,
  returned: number,
): number {
  let absorbed = 0;
  for (const part of prepared) {
    const { lines, nodes, density, share } = part;
    if (part.averaged) {
      absorbed += share * shareTaken(averagedCoefficient(part, centre), length, returned);
      continue;
    }
    for (let k = 0; k < nodes.weights.length; k++) {
      const coefficient = density * lineCrossSection(lines, centre + nodes.offsets[k]!);
      absorbed += share * nodes.weights[k]! * shareTaken(coefficient, length, returned);
    }
  }
  return absorbed;
}

/**
 * Splits the pump into channels, each absorbed by Beer's law with one coefficient: (spectral node) x (polarisation).
 * Left out: saturation of the absorption, and the change of line width and height with rod temperature.
 * @param spectrum centre wavelength (m) and full width at half maximum (m) of the Gaussian diode spectrum
 * @param polarisationShares shares of light along and across the optic axis; unpolarised: 0.5 and 0.5
 * @returns channels whose shares sum to 1; within a polarisation they ascend in wavelength
 */
export function pumpChannels(
  spectrum: { centre: number; linewidth: number },
  polarisationShares: { pi: number; sigma: number },
  absorption: AbsorptionModel,
): PumpChannel[] {
  const prepared = prepareAbsorption(spectrum.linewidth, polarisationShares, absorption, spectrum.centre);
  return channelsAt(prepared, spectrum.centre);
}
