import type { Plane } from '../cavity';
import { findRoot } from '../numerics/root';
import type { OperatingPoint } from '../operating/types';
import type { Interval } from './ceiling';

export interface CavityEdge {
  /** Pump power at which the first usable window ends; null where it does not end inside the searched range. */
  pumpPower: number | null;
  plane: Plane | 'both' | null;
  /** Lens power of the whole rod at the edge; where the edge lies beyond the range, the nearest edge above. */
  dioptricPower: number | null;
  /** Pump powers over which both planes hold a mode. */
  windows: Interval[];
  /** Every pump power in the range at which a plane gains or loses stability, ascending. */
  crossings: number[];
}

type Zones = Record<Plane, readonly Interval[]>;
type PointAt = (pumpPower: number) => OperatingPoint;

const planes: readonly Plane[] = ['sagittal', 'tangential'];
const levels = 10;
/** Edges are found to this share of the searched range. */
const precision = 1e-7;

const room = (point: OperatingPoint, plane: Plane) => 1 - Math.abs(point.cavity[plane].stability);

/** Pump powers at which the rod's lens has the given power. */
function powersOfLens(lens: number, powers: readonly number[], at: PointAt, to: number): number[] {
  const excess = (power: number) => at(power).lens.dioptricPower - lens;
  const found: number[] = [];
  for (let k = 1; k < powers.length; k++) {
    const [a, b] = [powers[k - 1]!, powers[k]!];
    if (excess(a) >= 0 !== excess(b) >= 0) found.push(findRoot(excess, a, b, { tolerance: precision * to }));
  }
  return found;
}

/** Shares of an edge's power within which the round trip itself is searched for it, one after the other. */
const reaches = [0.02, 0.05, 0.12];

/**
 * Sharpens an edge on the round trip itself, since along the pump-power axis the lens also changes its shape a little,
 * most where the diode drifts. Where two zones touch, |m| does not change sides and the lens's own power stands.
 */
function sharpen(power: number, plane: Plane, at: PointAt, to: number): number {
  const inside = (p: number) => room(at(p), plane);
  for (const reach of reaches) {
    const a = power * (1 - reach);
    const b = Math.min(power * (1 + reach), to);
    const [fa, fb] = [inside(a), inside(b)];
    if (fa * fb < 0) return findRoot(inside, a, b, { tolerance: precision * to, fa, fb });
  }
  return power;
}

function windowsBetween(marks: readonly number[], at: PointAt, to: number): Interval[] {
  const ends = [0, ...marks, to];
  const windows: Interval[] = [];
  for (let k = 1; k < ends.length; k++) {
    const [from, end] = [ends[k - 1]!, ends[k]!];
    if (end - from < 2 * precision * to) continue;
    const middle = at((from + end) / 2);
    if (!planes.every((plane) => middle.cavity[plane].stable)) continue;
    const last = windows.at(-1);
    if (last && last.to === from) last.to = end;
    else windows.push({ from, to: end });
  }
  return windows;
}

function planeOfEdge(power: number, at: PointAt): Plane | 'both' {
  const close = planes.filter((plane) => Math.abs(room(at(power), plane)) < 1e-3);
  return close.length === 1
    ? close[0]!
    : close.length === 2
      ? 'both'
      : room(at(power), 'sagittal') < room(at(power), 'tangential')
        ? 'sagittal'
        : 'tangential';
}

/** The zone edge next above a lens power in either plane; null where the zones reach on. */
function nextEdge(lens: number, zones: Zones): number | null {
  const above = planes.flatMap((plane) => zones[plane].map((zone) => zone.to)).filter((edge) => edge > lens);
  return above.length > 0 ? Math.min(...above) : null;
}

/**
 * Where along the pump-power axis the thermal lens carries the cavity out of stability, and over which powers a mode
 * exists at all. Every zone edge in lens power is followed to the pump powers that make this lens, so a narrow gap
 * between two zones is not stepped over.
 *
 * @param at lasing operating point at a pump power
 * @param zones lens powers for which each plane is stable, 1/m
 * @param to end of the searched range, W
 */
export function cavityEdgeOf(at: PointAt, zones: Zones, to: number): CavityEdge {
  const powers = Array.from({ length: levels + 1 }, (_, k) => to * Math.max(k / levels, 1e-4));
  const crossings = planes
    .flatMap((plane) =>
      zones[plane]
        .flatMap((zone) => [zone.from, zone.to])
        .filter((lens) => Number.isFinite(lens))
        .flatMap((lens) => powersOfLens(lens, powers, at, to).map((power) => sharpen(power, plane, at, to))),
    )
    .sort((a, b) => a - b);
  const windows = windowsBetween(crossings, at, to);
  const end = windows[0]?.to;
  if (end === undefined || end >= to)
    return {
      pumpPower: null,
      plane: null,
      dioptricPower: nextEdge(at(to).lens.dioptricPower, zones),
      windows,
      crossings,
    };
  return {
    pumpPower: end,
    plane: planeOfEdge(end, at),
    dioptricPower: at(end).lens.dioptricPower,
    windows,
    crossings,
  };
}
