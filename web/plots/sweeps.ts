import type { Report, SweepPoint } from '../../src/report/types';
import { percent, axisNumber, significant } from '../format/number';
import { lensPower, power, stability, temperature } from '../format/quantities';
import type { Dressing, Line } from './chart';

/** One of the small charts over pump power. */
interface SweepChart {
  name: string;
  summary: string;
  lines: Line[];
  yTick: (value: number) => string;
  dressing?: Partial<Dressing>;
}

export interface Sweep {
  x: number[];
  /** Place of the operating pump power. */
  rest: number;
  charts: SweepChart[];
}

const kelvin = 273.15;
const plain = axisNumber;
const finite = (value: number | null) => (value !== null && Number.isFinite(value) ? value : null);

/** Stability of both planes against pump power; far outside the curve is cut, since only the edge matters. */
export function stabilityLines(points: SweepPoint[]): Line[] {
  return [
    {
      name: 'sagittal m',
      values: points.map((point) => finite(point.sagittalStability)),
      colour: '--sagittal',
      write: stability,
    },
    {
      name: 'tangential m',
      values: points.map((point) => finite(point.tangentialStability)),
      colour: '--tangential',
      dash: [7, 4],
      write: stability,
    },
  ];
}

/** How the stability chart is dressed: the stable shelf, the edge and its band, the operating power. */
export function stabilityDressing(report: Report, place: (pumpPower: number) => number): Dressing {
  const { pumpPower, low, high } = report.cavityEdge;
  const marks = [{ x: place(report.operating.pumpPower), colour: '--pump' }];
  const edge = pumpPower === null ? [] : [{ x: place(pumpPower), colour: '--ink', dash: [2, 3] }];
  return {
    marks: [...marks, ...edge],
    span: low !== null && high !== null ? { from: place(low), to: place(high), colour: '--ink' } : undefined,
    shelf: { from: -1, to: 1, colour: '--holds' },
    yRange: [-1.6, 1.6],
  };
}

function chartsOf(points: SweepPoint[], report: Report, place: (pumpPower: number) => number): SweepChart[] {
  const line = (
    name: string,
    value: (point: SweepPoint) => number | null,
    colour: string,
    write: Line['write'],
    dash?: number[],
  ): Line => ({
    name,
    values: points.map((point) => (point.state === 'none' ? null : finite(value(point)))),
    colour,
    write,
    dash,
  });
  const celsius = (value: number | null) => temperature(value === null ? null : value + kelvin);
  return [
    {
      name: 'Peak temperature',
      summary: 'Hottest place of the rod, lasing and with the beam blocked.',
      yTick: (value) => `${plain(value)}°`,
      lines: [
        line('lasing', (point) => point.peakTemperature - kelvin, '--limit', celsius),
        line('blocked', (point) => point.blockedPeakTemperature - kelvin, '--heat', celsius, [7, 4]),
        line('base', (point) => point.baseTemperature - kelvin, '--cool', celsius, [2, 3]),
      ],
    },
    {
      name: 'Lens power',
      summary: 'Dioptric power of the rod, positive converging.',
      yTick: plain,
      lines: [
        line('seen by the mode', (point) => point.dioptricPower, '--ink', lensPower),
        line('on the axis', (point) => point.axisDioptricPower, '--soft', lensPower, [7, 4]),
      ],
    },
    {
      name: 'Round-trip stability',
      summary: 'Stable between minus one and one.',
      yTick: plain,
      lines: stabilityLines(points),
      dressing: stabilityDressing(report, place),
    },
    {
      name: 'Mode over pump radius',
      summary: 'Mode radius in the rod over the pump radius; a gap where there is no mode.',
      yTick: plain,
      lines: [
        line(
          'ratio',
          (point) => point.modeToPumpRatio,
          '--sagittal',
          (value) => (value === null ? 'no mode' : significant(value)),
        ),
      ],
    },
    {
      name: 'Laser output',
      summary: 'Output power.',
      yTick: plain,
      lines: [line('output', (point) => point.outputPower, '--holds', power)],
    },
    {
      name: 'Smallest margin',
      summary: 'Smallest margin of all limits, as a share of its room; below zero a limit is broken.',
      yTick: (value) => `${plain(100 * value)}%`,
      lines: [
        line(
          'margin',
          (point) => Math.max(-1, point.worstShare),
          '--limit',
          (value) => percent(value),
        ),
      ],
      dressing: { shelf: { from: 0, to: 1, colour: '--holds' }, yRange: [-1, 1] },
    },
  ];
}

/** Index of the value nearest to a wanted one. */
export function nearestIndex(values: ArrayLike<number>, wanted: number): number {
  let best = 0;
  for (let at = 1; at < values.length; at += 1)
    if (Math.abs(values[at]! - wanted) < Math.abs(values[best]! - wanted)) best = at;
  return best;
}

/** The sweep as charts over incident or absorbed pump power. */
export function sweepOf(report: Report, axis: 'incident' | 'absorbed'): Sweep {
  const of = (point: SweepPoint) => (axis === 'incident' ? point.pumpPower : point.absorbedPower);
  const points = report.sweep.filter((point) => Number.isFinite(of(point))).sort((a, b) => of(a) - of(b));
  const x = points.map(of);
  const incident = points.map((point) => point.pumpPower);
  // Marks are known in incident power; on the absorbed axis they stand where the sweep passes them.
  const place = (pumpPower: number) => {
    if (axis === 'incident') return pumpPower;
    const at = Math.max(
      1,
      incident.findIndex((value) => value >= pumpPower),
    );
    const [left, right] = [incident[at - 1] ?? 0, incident[at] ?? 1];
    return (x[at - 1] ?? 0) + ((x[at] ?? 0) - (x[at - 1] ?? 0)) * ((pumpPower - left) / (right - left || 1));
  };
  return {
    x,
    rest: nearestIndex(incident, report.operating.pumpPower),
    charts: chartsOf(points, report, place),
  };
}
