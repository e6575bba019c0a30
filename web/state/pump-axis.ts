import type { Report } from '../../src/report/types';

/** A linear axis from zero, in per cent of its width. */
export interface PumpAxis {
  to: number;
  ticks: number[];
  at: (pumpPower: number) => number;
}

const niceSteps = [1, 2, 2.5, 5, 10];

/** Round ticks over 0..to, about `count` of them. */
export function niceTicks(from: number, to: number, count: number): number[] {
  const raw = (to - from) / Math.max(1, count);
  if (!(raw > 0) || !Number.isFinite(raw)) return [];
  const decade = 10 ** Math.floor(Math.log10(raw));
  const step = decade * niceSteps.find((size) => size * decade >= raw * 0.999)!;
  const ticks: number[] = [];
  for (let tick = Math.ceil(from / step - 1e-9); tick * step <= to + 1e-9 * step; tick += 1)
    ticks.push(tick * step + 0);
  return ticks;
}

export function pumpAxis(to: number): PumpAxis {
  return { to, ticks: niceTicks(0, to, 8), at: (power) => Math.min(100, Math.max(0, (100 * power) / to)) };
}

/**
 * How far the common pump-power axis of the ceiling board must reach: past the operating point, every ceiling with its
 * band and the cavity edge, but no further than was searched, so that small ceilings are not squeezed into a corner.
 */
export function axisEnd(report: Report, pumpPower: number): number {
  const ceilings = report.options.flatMap(({ ceiling }) =>
    ceiling.reachesRange ? [] : [ceiling.high ?? ceiling.pumpPower ?? 0],
  );
  const edge = report.cavityEdge.high ?? report.cavityEdge.pumpPower ?? 0;
  const wanted = Math.max(
    1.25 * pumpPower,
    ...ceilings.map((power) => 1.12 * power),
    Math.min(1.1 * edge, 3 * pumpPower),
  );
  const reach = Math.max(Math.min(wanted, 1.05 * report.searchedTo), 1.1 * pumpPower, 1e-3);
  const step = niceTicks(0, reach, 8);
  const size = (step[1] ?? reach) - (step[0] ?? 0);
  return size > 0 ? Math.ceil(reach / (size / 2)) * (size / 2) : reach;
}
