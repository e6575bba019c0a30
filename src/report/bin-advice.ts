import type { ResolvedDesign } from '../design/resolved';
import type { OptionReport } from './types';

/** A diode whose wavelength suits the temperature that a plain way of cooling gives it anyway. */
export interface BinAdvice {
  /** Bin of the diode at its reference case temperature, m. */
  wavelength: number;
  referenceCaseTemperature: number;
  /** The way of cooling it suits, and where the case settles with it, K. */
  label: string;
  caseTemperature: number;
}

/**
 * Whether another wavelength bin of the diode would do away with a TEC: every cooler without one keeps the diode off its
 * case window, though the least demanding of them that has a steady state holds all limits of its own.
 * Left out: that the case warms by a degree or so more once the rod absorbs as it should.
 *
 * @param options all ways of cooling, with the margins at the design's pump power
 * @param best case temperature of greatest absorption, K
 */
export function binAdvice(
  { pump, diode, coolers }: ResolvedDesign,
  options: readonly OptionReport[],
  best: number | null,
): BinAdvice | null {
  if (best === null || pump.power === 0 || pump.drift === 0 || diode.caseTemperature !== null) return null;
  const marginOf = (option: OptionReport, limit: string) =>
    option.margins.find((margin) => margin.limit === limit);
  const demandOf = (option: OptionReport) =>
    coolers.find((cooler) => cooler.id === option.id)?.demand ?? Infinity;
  const plain = options
    .filter((option) => option.kind !== 'tec' && option.state !== 'none')
    .sort((a, b) => demandOf(a) - demandOf(b));
  if (plain.some((option) => marginOf(option, 'diode case window')?.holds !== false)) return null;
  const sound = plain.find((option) =>
    ['diode case temperature', 'dew point', 'cooler capacity'].every(
      (limit) => marginOf(option, limit)?.holds !== false,
    ),
  );
  if (!sound) return null;
  const caseTemperature = marginOf(sound, 'diode case window')!.value;
  return {
    wavelength: pump.wavelength + pump.drift * (best - caseTemperature),
    referenceCaseTemperature: pump.referenceCaseTemperature,
    label: sound.label,
    caseTemperature,
  };
}

/** The advice in a sentence. */
export function binSentence({
  wavelength,
  referenceCaseTemperature,
  label,
  caseTemperature,
}: BinAdvice): string {
  const celsius = (temperature: number) => `${(temperature - 273.15).toFixed(0)} degC`;
  return `Choose the diode before a TEC: a bin of about ${(wavelength * 1e9).toFixed(1)} nm at ${celsius(referenceCaseTemperature)} absorbs best at the ${celsius(caseTemperature)} that its case reaches with ${label}.`;
}
