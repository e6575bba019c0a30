import type { CavityPicture } from '../../src/report/types';
import { niceTicks } from '../state/pump-axis';

/** The cavity in drawing units (pixels): true to scale along the axis, stretched across it. */
export interface CavityScale {
  x: (position: number) => number;
  /** Half height of the beam. */
  y: (radius: number) => number;
  /** How many times wider the beam is drawn than to scale. */
  stretch: number;
  ticks: number[];
}

/** A number a person can say: 1, 2 or 5 times a power of ten, not above the value. */
function roundDown(value: number): number {
  const decade = 10 ** Math.floor(Math.log10(value));
  return decade * ([5, 2, 1].find((step) => step * decade <= value) ?? 1);
}

/**
 * @param length of the cavity, m
 * @param width of the drawing, pixels; `side` is left free at both ends, `half` is the greatest half height of the beam
 */
export function cavityScale(
  length: number,
  picture: CavityPicture,
  width: number,
  side: number,
  half: number,
): CavityScale {
  const perMetre = Math.max(10, width - 2 * side) / Math.max(length, 1e-6);
  const { sagittal, tangential } = picture.envelopes;
  const widest = Math.max(
    1e-5,
    ...[...sagittal, ...tangential].map((point) => (Number.isFinite(point.radius) ? point.radius : 0)),
  );
  const stretch = roundDown(half / (widest * perMetre));
  return {
    x: (position) => side + position * perMetre,
    y: (radius) => Math.min(half * 1.4, radius * perMetre * stretch),
    stretch,
    ticks: niceTicks(0, length, Math.max(3, width / 130)),
  };
}

/** Outline of an envelope, both edges, as a closed path. */
export function envelopePath(
  points: { position: number; radius: number }[],
  { x, y }: CavityScale,
  shrink: number,
  middle: number,
): string {
  const real = points.filter((point) => Number.isFinite(point.radius));
  if (real.length < 2) return '';
  const upper = real.map(
    (point) => `${x(point.position * shrink).toFixed(1)},${(middle - y(point.radius)).toFixed(1)}`,
  );
  const lower = [...real]
    .reverse()
    .map((point) => `${x(point.position * shrink).toFixed(1)},${(middle + y(point.radius)).toFixed(1)}`);
  return `M${upper.join('L')}L${lower.join('L')}Z`;
}
