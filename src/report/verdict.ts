import { binSentence, type BinAdvice } from './bin-advice';
import type { OptionReport, Report } from './types';

const watts = (value: number) => `${Number(value.toPrecision(3))} W`;

type Parts = Pick<
  Report,
  'options' | 'chosenCooler' | 'cavityEdge' | 'ladder' | 'usableWindow' | 'bandComplete'
> & {
  pumpPower: number;
  /** Another bin of the diode, where that would do away with a TEC. */
  bin: BinAdvice | null;
};

function ceilingWords({ ceiling, label, windows }: OptionReport): string {
  if (ceiling.pumpPower === null)
    return `With ${label} no pump power keeps every limit; broken over most of the range is the ${ceiling.setBy ?? 'steady state'}.`;
  const band =
    ceiling.low !== null && ceiling.high !== null
      ? ` (${watts(ceiling.low)} to ${watts(ceiling.high)} with the constants found in print)`
      : '';
  const from = windows[0] && windows[0].fromPumpPower > 0 ? `from ${watts(windows[0].fromPumpPower)} ` : '';
  if (ceiling.reachesRange)
    return `With ${label} every limit holds ${from}up to at least ${watts(ceiling.pumpPower)}, the end of the searched range${band}.`;
  return `With ${label} the pump ceiling is ${watts(ceiling.pumpPower)}${band}, set by ${ceiling.setBy}${from ? `; the limits hold ${from}on` : ''}.`;
}

function standing(option: OptionReport, pumpPower: number): string {
  if (pumpPower === 0) return 'The design asks for no pump power yet.';
  const power = watts(pumpPower);
  const broken = option.margins.filter((margin) => !margin.holds).map((margin) => margin.limit);
  const { low, high } = option.ceiling;
  if (option.passes)
    return low !== null && pumpPower > low
      ? `${power} holds with the nominal constants but cannot be assured.`
      : low === null
        ? `${power} holds.`
        : `${power} holds across the band.`;
  const chance =
    high !== null &&
    option.ceiling.pumpPower !== null &&
    pumpPower <= high &&
    pumpPower > option.ceiling.pumpPower
      ? ' with the nominal constants; it lies within the band and cannot be assured'
      : '';
  return `${power} breaks ${broken.join(', ')}${chance}.`;
}

function remedy({ options, ladder, usableWindow, pumpPower, chosenCooler }: Parts): string {
  if (usableWindow.length === 0)
    return 'The cavity holds no mode at any pump power in the range: its mirrors or spaces have to change first.';
  const step = ladder.find((item) => item.fromPumpPower <= pumpPower && pumpPower <= item.toPumpPower);
  const best = step?.option ?? null;
  if (best !== null) {
    const label = options.find((option) => option.id === best)!.label;
    return best === chosenCooler
      ? 'Nothing less demanding holds.'
      : `The least demanding cooling that holds there is ${label}.`;
  }
  const broken = options.map((option) =>
    option.margins.filter((margin) => !margin.holds).map((margin) => margin.limit),
  );
  const common = broken[0]?.filter((limit) => broken.every((list) => list.includes(limit))) ?? [];
  if (common.includes('cavity stability') || common.includes('aberration loss'))
    return 'No cooler listed cures it: the lens hardly depends on cooling. A larger pump radius, or a cavity that bears a stronger lens, does.';
  if (common.includes('rod peak temperature'))
    return 'No cooler listed brings the rod below its limit; a larger pump radius, end caps or a better contact would.';
  return 'No cooler listed holds every limit at this power.';
}

/**
 * The answer in a few sentences: the ceiling with the chosen cooler, its band and limit; whether the design's pump power
 * holds; which cooling is the least that does; and whether another bin of the diode would serve better.
 */
export function verdictOf(parts: Parts): Report['verdict'] {
  const option = parts.options.find((item) => item.id === parts.chosenCooler)!;
  const words = [ceilingWords(option), standing(option, parts.pumpPower)];
  if (parts.pumpPower > 0) words.push(remedy(parts));
  if (parts.bin) words.push(binSentence(parts.bin));
  const text = words.join(' ');
  return { text, holds: option.passes };
}
