import type { OptionReport } from '../../src/report/types';
import { band, power } from '../format/quantities';
import type { PumpAxis } from '../state/pump-axis';

/** A word on the text lane of a bar: where its tick stands and where the word starts, pixels. */
export interface LaneLabel {
  text: string;
  tick: number;
  start: number;
  /** Wide enough only for the tick; the name is then told by its title. */
  shown: boolean;
  main: boolean;
}

const characterWidth = 6.1;

/** What is written at the end of a bar. */
function ceilingWords(option: OptionReport): string {
  const { ceiling } = option;
  if (ceiling.pumpPower === null)
    return `none at any power: ${ceiling.setBy ?? option.reason ?? 'no steady state'}`;
  if (ceiling.reachesRange) return `at least ${power(ceiling.pumpPower)}: no limit found`;
  const range = band(ceiling.low, ceiling.high);
  return `${power(ceiling.pumpPower)} ${ceiling.setBy ?? ''}${range ? ` (${range})` : ''}`;
}

/**
 * Words for one bar: its ceiling first, then the limits further out where there is room.
 * @param x pixels of a pump power
 * @param width of the track, pixels
 */
export function laneLabels(
  option: OptionReport,
  x: (pumpPower: number) => number,
  axisEnd: number,
  width: number,
): LaneLabel[] {
  const labels: LaneLabel[] = [];
  const place = (text: string, tick: number, main: boolean) => {
    const long = text.length * characterWidth;
    const start = Math.max(0, Math.min(tick, width - long));
    const clear = labels.every(
      (other) =>
        !other.shown ||
        start > other.start + other.text.length * characterWidth + 10 ||
        start + long + 10 < other.start,
    );
    labels.push({ text, tick, start, shown: main || clear, main });
  };
  place(ceilingWords(option), x(option.ceiling.pumpPower ?? 0), true);
  for (const { limit, pumpPower } of option.limits)
    if (pumpPower !== null && pumpPower <= axisEnd && limit !== option.ceiling.setBy)
      place(limit, x(pumpPower), false);
  return labels;
}

/**
 * Where the bar is solid, in per cent of the axis: every limit holds, up to the low end of the band. The rest of the way
 * to the ceiling is drawn as a thin line, since a limit may fail at low power and hold above.
 */
export function solidSpans(option: OptionReport, axis: PumpAxis): { from: number; to: number }[] {
  const ceiling = option.ceiling.pumpPower ?? 0;
  const low = option.ceiling.low ?? ceiling;
  return option.windows
    .map(({ fromPumpPower, toPumpPower }) => ({
      from: axis.at(fromPumpPower),
      to: axis.at(toPumpPower <= ceiling * 1.001 ? Math.min(toPumpPower, low) : toPumpPower),
    }))
    .filter((span) => span.to > span.from);
}
