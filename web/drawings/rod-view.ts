import type { RodPicture } from '../../src/report/types';
import { niceTicks } from '../state/pump-axis';
import { heatTable } from './colour-map';
import { isotherm } from './isotherms';
import { placesOf, readRod, type RodReader } from './rod-field';

/** What part of the rod and its mount is looked at, and how it is scaled; z runs right, r up and down from the axis. */
export interface RodView {
  reader: RodReader;
  width: number;
  height: number;
  /** Greatest r shown, m. */
  reach: number;
  length: number;
  x: (z: number) => number;
  y: (r: number) => number;
  zAt: (x: number) => number;
  rAt: (y: number) => number;
}

/** A place in the section, m; r of either sign. */
export interface Probe {
  r: number;
  z: number;
}

/** The place a key press moves the reading to, or null where the key means nothing here. */
export function movedProbe(event: KeyboardEvent, place: Probe, view: RodView): Probe | null {
  const share = event.shiftKey ? 0.1 : 0.01;
  const [across, along] = [share * view.reach, share * view.length];
  const moves: Record<string, [number, number]> = {
    ArrowRight: [0, along],
    ArrowLeft: [0, -along],
    ArrowUp: [across, 0],
    ArrowDown: [-across, 0],
  };
  const move = moves[event.key];
  if (!move) return null;
  const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));
  return {
    r: clamp(place.r + move[0], -view.reach, view.reach),
    z: clamp(place.z + move[1], 0, view.length),
  };
}

/** Where the pump light enters the section as it is drawn, front face left. */
export function pumpEntry({ backShare }: RodPicture): string {
  if (backShare === 0) return 'from the left';
  return backShare === 1 ? 'from the right' : 'from both sides';
}

/** What the section shows, in words. */
export const mountWords = ({ mount }: RodPicture): string =>
  ({
    ring: 'rod and mount',
    block: 'rod and block mount, the block as the ring it is computed as',
    none: 'the rod, which has no mount',
  })[mount.shape];

export function rodView(picture: RodPicture, width: number, height: number, wholeMount: boolean): RodView {
  const length = picture.axialFaces.at(-1) ?? 1;
  const outer = picture.radialFaces.at(-1) ?? 1;
  const reach = wholeMount ? outer : Math.min(outer, 1.3 * picture.rodRadius);
  return {
    reader: readRod(picture),
    width,
    height,
    reach,
    length,
    x: (z) => (z / length) * width,
    y: (r) => height / 2 - (r / reach) * (height / 2),
    zAt: (x) => (Math.min(width, Math.max(0, x)) / width) * length,
    rAt: (y) => (1 - Math.min(height, Math.max(0, y)) / (height / 2)) * reach,
  };
}

const table = heatTable();

/** Paints the temperatures as an image of one pixel per drawing unit. */
export function paintRod(
  context: CanvasRenderingContext2D,
  view: RodView,
  lowest: number,
  highest: number,
): void {
  const [columns, rows] = [Math.max(1, Math.round(view.width)), Math.max(2, Math.round(view.height))];
  const image = context.createImageData(columns, rows);
  const half = Math.ceil(rows / 2);
  const span = Math.max(1e-9, highest - lowest);
  const depths = Float64Array.from({ length: columns }, (_, column) => view.zAt(column + 0.5));
  const places = placesOf(view.reader.depths, depths);
  const line = new Float64Array(columns);
  for (let row = 0; row < half; row += 1) {
    view.reader.row(view.rAt(row + 0.5), places, line);
    for (let column = 0; column < columns; column += 1) {
      const share = (line[column]! - lowest) / span;
      const entry = 3 * Math.min(255, Math.max(0, Math.round(255 * share)));
      for (const mirrored of [row, rows - 1 - row]) {
        const at = 4 * (mirrored * columns + column);
        image.data[at] = table[entry]!;
        image.data[at + 1] = table[entry + 1]!;
        image.data[at + 2] = table[entry + 2]!;
        image.data[at + 3] = 255;
      }
    }
  }
  context.putImageData(image, 0, 0);
}

export interface DrawnIsotherm {
  /** degrees Celsius */
  level: number;
  path: string;
  /** Where it crosses the axis furthest from the pumped face, drawing units; null where it does not. */
  labelX: number | null;
}

const kelvin = 273.15;

/** Isotherms at round temperatures. */
export function drawIsotherms(view: RodView, lowest: number, highest: number): DrawnIsotherm[] {
  const columns = 110;
  const rows = 61;
  const values = new Float64Array(columns * rows);
  for (let j = 0; j < rows; j += 1)
    for (let i = 0; i < columns; i += 1)
      values[j * columns + i] =
        view.reader.at(view.rAt((j / (rows - 1)) * view.height), (i / (columns - 1)) * view.length) - kelvin;
  const toX = (i: number) => (i / (columns - 1)) * view.width;
  const toY = (j: number) => (j / (rows - 1)) * view.height;
  let last = Infinity;
  return niceTicks(lowest - kelvin, highest - kelvin, 8).map((level) => {
    const pieces = isotherm(columns, rows, (i, j) => values[j * columns + i]!, level);
    const path = pieces
      .map(
        ({ x1, y1, x2, y2 }) =>
          `M${toX(x1).toFixed(1)} ${toY(y1).toFixed(1)}L${toX(x2).toFixed(1)} ${toY(y2).toFixed(1)}`,
      )
      .join('');
    const middle = (rows - 1) / 2;
    const crossings = pieces
      .filter(({ y1, y2 }) => (y1 - middle) * (y2 - middle) <= 0)
      .map(({ x1 }) => toX(x1));
    const at = crossings.length > 0 ? Math.max(...crossings) : null;
    const clear = at !== null && at > 22 && at < view.width - 18 && Math.abs(last - at) > 36;
    if (clear) last = at;
    return { level, path, labelX: clear ? at : null };
  });
}
