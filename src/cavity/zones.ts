import type { Plane, RodOptics } from './elements';
import { stabilityAtPower } from './mode';
import type { PreparedCavity } from './prepare';
import { tripMatrix } from './prepare';
import { identity } from './ray-matrix';
import { realRoots } from './real-roots';

/** One range of lens power in which the cavity is stable in one plane. */
export interface StabilityZone {
  /** Dioptric power of the whole rod, 1/m. */
  from: number;
  to: number;
  /** m at that end: 1 or -1; null when it is the end of the search and no edge of the zone. */
  fromEdge: 1 | -1 | null;
  toEdge: 1 | -1 | null;
}

/**
 * Zones closer together than this share of their power are one: the edge between them is a single point, as
 * in a cavity with equal halves, and rounding decides on which side of it each falls.
 */
const JOIN = 1e-7;
/** How far beyond the range edges are searched, as a share of it, so that one at its very end is seen. */
const BEYOND = 1e-6;
/** Rounding of A and D, which are near 1; B (m) and C (1/m) are ten times smaller and larger on a bench. */
const ROUNDING = 1e-13;

interface Edge {
  power: number;
  m: 1 | -1;
}

/**
 * Every range of lens power in which the cavity is stable, for a rod whose power keeps its shape. m is an
 * entire function of the power. Linear cavity: with A, B, C, D of the one-way trip, 1 + m = 2 A D and
 * 1 - m = -2 B C, so the edges are the simple roots of four entire functions, even where two zones touch.
 * Ring: the roots of m - 1 and m + 1. {@link realRoots} brackets them all.
 *
 * @param rodShape powers scaled so that their sum is 1 /m
 * @param fromPower lowest lens power searched, 1/m, may be negative
 * @param toPower highest
 * @returns ascending, apart from each other; empty when the cavity is stable nowhere in the range
 * @source Magni, J. Opt. Soc. Am. A 4, 1962 (1987) for the two zones of one thin lens
 */
export function stabilityZones(
  prepared: PreparedCavity,
  rodShape: RodOptics,
  plane: Plane,
  fromPower: number,
  toPower: number,
): StabilityZone[] {
  const edges = findEdges(prepared, rodShape, plane, fromPower, toPower);
  const limits: { power: number; m: 1 | -1 | null }[] = [
    { power: fromPower, m: null },
    ...edges.filter((edge) => edge.power > fromPower && edge.power < toPower),
    { power: toPower, m: null },
  ];
  const span = toPower - fromPower;
  const edgeAt = (end: { power: number; m: 1 | -1 | null }) =>
    end.m ?? edges.find((edge) => Math.abs(edge.power - end.power) < 1e-9 * span)?.m ?? null;
  const zones: StabilityZone[] = [];
  for (let i = 0; i + 1 < limits.length; i++) {
    const from = limits[i]!;
    const to = limits[i + 1]!;
    const thinnest = JOIN * Math.max(Math.abs(from.power), Math.abs(to.power));
    if (to.power - from.power <= thinnest) continue;
    const middle = stabilityAtPower(prepared, rodShape, plane, (from.power + to.power) / 2);
    if (!(Math.abs(middle) < 1)) continue;
    const last = zones[zones.length - 1];
    if (last && from.power - last.to <= thinnest) {
      last.to = to.power;
      last.toEdge = edgeAt(to);
    } else {
      zones.push({ from: from.power, to: to.power, fromEdge: edgeAt(from), toEdge: edgeAt(to) });
    }
  }
  return zones;
}

/** All edges in the range and a little beyond, ascending. */
function findEdges(
  prepared: PreparedCavity,
  rodShape: RodOptics,
  plane: Plane,
  fromPower: number,
  toPower: number,
): Edge[] {
  const trip = identity();
  const beyond = BEYOND * (toPower - fromPower);
  const roots = (f: () => number, m: 1 | -1, rounding: number): Edge[] =>
    realRoots(
      (power) => {
        tripMatrix(prepared, rodShape, plane, power, trip);
        return f();
      },
      fromPower - beyond,
      toPower + beyond,
      rounding,
    ).map((power) => ({ power, m }));
  const edges =
    prepared.cavity.kind === 'linear'
      ? [
          ...roots(() => trip[0]!, -1, ROUNDING),
          ...roots(() => trip[3]!, -1, ROUNDING),
          ...roots(() => trip[1]!, 1, ROUNDING * 0.1),
          ...roots(() => trip[2]!, 1, ROUNDING * 10),
        ]
      : [
          ...roots(() => (trip[0]! + trip[3]!) / 2 - 1, 1, ROUNDING),
          ...roots(() => (trip[0]! + trip[3]!) / 2 + 1, -1, ROUNDING),
        ];
  return edges.sort((one, other) => one.power - other.power);
}

/** Where a lens power lies among the zones. */
interface WorkingPoint {
  stable: boolean;
  /** Distance to the nearest edge, 1/m: > 0 inside a zone, < 0 outside; Infinity when no edge was found. */
  toNearestEdge: number;
  /** Power at that edge, 1/m; null when none was found. */
  nearestEdge: number | null;
}

/**
 * How far a lens power is from the nearest edge, in dioptres.
 *
 * @param zones from {@link stabilityZones}; the ends of the search are no edges
 * @param power lens power, 1/m
 */
export function workingPoint(zones: readonly StabilityZone[], power: number): WorkingPoint {
  let nearestEdge: number | null = null;
  const consider = (edge: number, m: 1 | -1 | null) => {
    if (m === null) return;
    if (nearestEdge === null || Math.abs(edge - power) < Math.abs(nearestEdge - power)) nearestEdge = edge;
  };
  let stable = false;
  for (const zone of zones) {
    consider(zone.from, zone.fromEdge);
    consider(zone.to, zone.toEdge);
    const above = zone.fromEdge === null ? power >= zone.from : power > zone.from;
    const below = zone.toEdge === null ? power <= zone.to : power < zone.to;
    stable ||= above && below;
  }
  const distance = nearestEdge === null ? Infinity : Math.abs(nearestEdge - power);
  return { stable, toNearestEdge: stable ? distance : -distance, nearestEdge };
}
