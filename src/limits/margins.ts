import type { Limits } from '../design/bounds';
import type { OperatingPoint } from '../operating/types';
import type { LimitName, Margin } from './types';

/** A limit of the cooler itself, from the cooling room. */
export interface CoolerLimit {
  limit: 'cooler capacity' | 'TEC current';
  value: number;
  bound: number;
  unit: string;
}

type Beam = Margin['beam'];

/** A value that must stay below its bound; `room` is the distance from an untroubled state to the bound. */
function below(
  limit: LimitName,
  beam: Beam,
  value: number,
  bound: number,
  unit: string,
  room: number,
): Margin {
  const margin = bound - value;
  return { limit, beam, value, bound, unit, margin, share: margin / room, holds: margin >= 0 };
}

function above(
  limit: LimitName,
  beam: Beam,
  value: number,
  bound: number,
  unit: string,
  room: number,
): Margin {
  const margin = value - bound;
  return { limit, beam, value, bound, unit, margin, share: margin / room, holds: margin >= 0 };
}

/** A temperature difference below this says nothing as a share. */
const leastRoom = 1;

function caseWindow(point: OperatingPoint, beam: Beam): Margin[] {
  const { caseTemperature, caseWindow: window } = point.diode;
  if (window.low === null && window.high === null) return [];
  const toLow = window.low === null ? Infinity : caseTemperature - window.low;
  const toHigh = window.high === null ? Infinity : window.high - caseTemperature;
  const half = window.low === null || window.high === null ? 10 : (window.high - window.low) / 2;
  const limit = 'diode case window';
  return toLow < toHigh
    ? [above(limit, beam, caseTemperature, window.low!, 'K', Math.max(half, leastRoom))]
    : [below(limit, beam, caseTemperature, window.high!, 'K', Math.max(half, leastRoom))];
}

function pointMargins(
  point: OperatingPoint,
  beam: Beam,
  limits: Limits,
  cooler: readonly CoolerLimit[],
): Margin[] {
  const room = (bound: number) => Math.max(Math.abs(bound - limits.ambient), leastRoom);
  const allowedStress = limits.fractureStrength / limits.fractureSafetyFactor;
  const { rod, stress, diode } = point;
  const coldest = Math.min(point.cooler.coldestTemperature, rod.baseTemperature, diode.caseTemperature);
  const dew = point.cooler.dewPoint + limits.dewPointGuard;
  const margins = [
    below(
      'rod peak temperature',
      beam,
      rod.peakTemperature,
      limits.rodPeakTemperature,
      'K',
      room(limits.rodPeakTemperature),
    ),
    below('fracture stress', beam, stress.peakTensile, allowedStress, 'Pa', allowedStress),
    ...caseWindow(point, beam),
    below(
      'diode case temperature',
      beam,
      diode.caseTemperature,
      limits.highestCaseTemperature,
      'K',
      room(limits.highestCaseTemperature),
    ),
    above('dew point', beam, coldest, dew, 'K', room(dew)),
    ...cooler.map((item) =>
      below(item.limit, beam, item.value, item.bound, item.unit, Math.abs(item.bound) || 1),
    ),
  ];
  if (beam === 'lasing') {
    const worst = Math.max(
      Math.abs(point.cavity.sagittal.stability),
      Math.abs(point.cavity.tangential.stability),
    );
    const bound = 1 - limits.stabilityMargin;
    margins.push(below('cavity stability', beam, worst, bound, '1', bound));
    margins.push(
      below(
        'aberration loss',
        beam,
        point.lens.aberrationLoss,
        limits.aberrationLoss,
        '1',
        limits.aberrationLoss,
      ),
    );
  }
  return margins;
}

/** A point with its cooler's limits. */
export interface PointWithLimits {
  point: OperatingPoint;
  coolerLimits: readonly CoolerLimit[];
}

/**
 * Margins of every limit at one pump power, each in the worse of the lasing and the blocked-beam state; stability and
 * aberration need a lasing mode and hold in the lasing state only.
 * @returns one margin per limit, "steady state" first
 */
export function marginsOf(lasing: PointWithLimits, blocked: PointWithLimits, limits: Limits): Margin[] {
  const steady = [lasing, blocked].map(({ point }) => (point.state === 'none' ? 0 : 1));
  const exists = Math.min(...steady);
  const beam: Beam = steady[0] === 0 ? 'lasing' : 'blocked';
  const state: Margin = {
    limit: 'steady state',
    beam,
    value: exists,
    bound: 1,
    unit: '1',
    margin: exists - 1 + (exists === 1 ? 1 : 0),
    share: exists === 1 ? 1 : -1,
    holds: exists === 1,
  };
  if (exists === 0) return [state];
  const worst = new Map<LimitName, Margin>();
  for (const margin of [
    ...pointMargins(lasing.point, 'lasing', limits, lasing.coolerLimits),
    ...pointMargins(blocked.point, 'blocked', limits, blocked.coolerLimits),
  ]) {
    const known = worst.get(margin.limit);
    if (!known || margin.share < known.share) worst.set(margin.limit, margin);
  }
  return [state, ...worst.values()];
}

/** The margin with the smallest share. */
export const worstOf = (margins: readonly Margin[]): Margin =>
  margins.reduce((worst, margin) => (margin.share < worst.share ? margin : worst));
