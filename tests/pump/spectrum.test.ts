import { describe, expect, it } from 'vitest';
import { absorbedShare, lineCrossSection, pumpChannels, spectralNodes } from '../../src/pump';
import type { AbsorptionModel, PumpLine } from '../../src/pump';

const nm = 1e-9;

/** Absorbed share by Simpson's rule on a fine, even wavelength grid: an independent integral over the spectrum. */
function fineShare(
  centre: number,
  linewidth: number,
  lines: PumpLine[],
  ionDensity: number,
  length: number,
): number {
  const sigma = linewidth / (2 * Math.sqrt(2 * Math.LN2));
  const steps = 60_000;
  let absorbed = 0;
  let light = 0;
  for (let i = 0; i <= steps; i++) {
    const offset = sigma * (-7 + (14 * i) / steps);
    const weight =
      (i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2) * Math.exp((-offset * offset) / (2 * sigma * sigma));
    light += weight;
    absorbed += weight * -Math.expm1(-ionDensity * lineCrossSection(lines, centre + offset) * length);
  }
  return absorbed / light;
}

const line = (
  centre: number,
  fwhm: number,
  crossSection: number,
  shape: PumpLine['shape'] = 'lorentzian',
): PumpLine => ({
  polarisation: 'none',
  centre: centre * nm,
  fwhm: fwhm * nm,
  crossSection,
  shape,
});

describe('light of a finite spectrum in a rod with lines', () => {
  const cases: { name: string; centre: number; linewidth: number; lines: PumpLine[]; depth: number }[] = [];
  for (const linewidth of [0.3, 1, 3, 5, 10])
    for (const depth of [0.3, 4, 40])
      for (const shape of ['lorentzian', 'gaussian'] as const)
        for (const centre of [808.7, 806.1])
          cases.push({
            name: `${shape} 1.8 nm line, diode ${linewidth} nm at ${centre} nm, peak depth ${depth}`,
            centre,
            linewidth,
            lines: [line(808.7, 1.8, 1, shape)],
            depth,
          });
  cases.push({
    name: 'a 0.1 nm line under a 20 nm diode',
    centre: 808,
    linewidth: 20,
    lines: [line(808.2, 0.1, 1)],
    depth: 10,
  });
  cases.push({
    name: 'a narrow line on a broad one and a third far away',
    centre: 807,
    linewidth: 3,
    lines: [line(808.6, 0.9, 1), line(805, 3, 0.4), line(885, 2.5, 0.3, 'gaussian')],
    depth: 6,
  });

  it.each(cases)('is absorbed as the fine integral over the spectrum says, to 1e-6: $name', (c) => {
    const absorption: AbsorptionModel = { kind: 'lines', lines: c.lines, ionDensity: c.depth / 0.01 };
    const spectrum = { centre: c.centre * nm, linewidth: c.linewidth * nm };
    const channels = pumpChannels(spectrum, { pi: 1, sigma: 0 }, absorption);
    const exact = fineShare(spectrum.centre, spectrum.linewidth, c.lines, c.depth / 0.01, 0.01);
    // 1e-6 of the light: a hundredth of a milliwatt in ten watts, far below any power meter.
    expect(Math.abs(absorbedShare(channels, 0.01, 1, 0) - exact)).toBeLessThan(1e-6);
  });

  it('needs more nodes the narrower the line is against the diode, and one where the diode is monochromatic', () => {
    const nodes = (linewidth: number) =>
      spectralNodes(linewidth * nm, [line(808, 1, 1)], 808 * nm).weights.length;
    expect(nodes(0)).toBe(1);
    expect(nodes(0.5)).toBeLessThan(20);
    expect(nodes(3)).toBeGreaterThan(nodes(1));
    expect(nodes(1000)).toBeLessThanOrEqual(3001);
  });

  it('carries all its light in channels, whichever the polarisation', () => {
    const lines: PumpLine[] = [
      { ...line(808.7, 1.8, 2.5e-23), polarisation: 'pi' },
      { ...line(808.7, 2.5, 7e-24), polarisation: 'sigma' },
    ];
    const absorption: AbsorptionModel = { kind: 'lines', lines, ionDensity: 3.7e25 };
    const channels = pumpChannels({ centre: 808 * nm, linewidth: 3 * nm }, { pi: 2, sigma: 1 }, absorption);
    const light = (polarisation: string) =>
      channels.reduce((sum, c) => sum + (c.polarisation === polarisation ? c.share : 0), 0);
    expect(light('pi')).toBeCloseTo(2 / 3, 14);
    expect(light('sigma')).toBeCloseTo(1 / 3, 14);
  });

  it('is absorbed more when polarised along the stronger line', () => {
    const lines: PumpLine[] = [
      { ...line(444, 1.8, 9e-24), polarisation: 'pi' },
      { ...line(441.5, 3, 4e-24), polarisation: 'sigma' },
    ];
    const share = (pi: number) =>
      absorbedShare(
        pumpChannels(
          { centre: 444 * nm, linewidth: 1.5 * nm },
          { pi, sigma: 1 - pi },
          { kind: 'lines', lines, ionDensity: 7e25 },
        ),
        5e-3,
        1,
        0,
      );
    expect(share(1)).toBeGreaterThan(share(0.5));
    expect(share(0.5)).toBeCloseTo((share(1) + share(0)) / 2, 12);
  });
});

describe('an entered coefficient that follows the line shape', () => {
  const lines = [line(808.7, 1.8, 2.5e-23)];
  const absorption: AbsorptionModel = {
    kind: 'scaled-coefficient',
    coefficient: 450,
    referenceWavelength: 808 * nm,
    referenceLinewidth: 3 * nm,
    lines,
  };
  const coefficientAt = (centre: number) =>
    pumpChannels({ centre: centre * nm, linewidth: 3 * nm }, { pi: 0.5, sigma: 0.5 }, absorption)[0]!
      .absorptionCoefficient;

  it('holds at the reference wavelength', () => {
    expect(coefficientAt(808)).toBeCloseTo(450, 9);
  });
  it('rises as the diode drifts onto the line and falls beyond it', () => {
    expect(coefficientAt(808.7)).toBeGreaterThan(450);
    expect(coefficientAt(806)).toBeLessThan(450);
    expect(coefficientAt(809.4)).toBeCloseTo(450, 6);
  });
  it('stays as entered where no listed line lies near the reference', () => {
    const far: AbsorptionModel = { ...absorption, lines: [line(885, 2, 1e-24)] };
    const channels = pumpChannels({ centre: 800 * nm, linewidth: 3 * nm }, { pi: 1, sigma: 0 }, far);
    expect(channels).toHaveLength(1);
    expect(channels[0]!.absorptionCoefficient).toBe(450);
  });
});
