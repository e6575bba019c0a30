import type { RodPicture } from '../../src/report/types';

/** Reading a rod picture between its cells: bilinear between cell centres, mirrored about the axis. */
export interface RodReader {
  radii: Float64Array;
  depths: Float64Array;
  /** Temperature at (r, z), r of either sign. */
  at: (r: number, z: number) => number;
  /** Temperatures along a line of constant r, at many depths whose places were found once. */
  row: (r: number, places: Places, out: Float64Array) => void;
}

/** Between which cells some depths lie, and how far towards the further one. */
export interface Places {
  index: Int32Array;
  share: Float64Array;
}

const centres = (faces: Float64Array) =>
  Float64Array.from({ length: faces.length - 1 }, (_, i) => (faces[i]! + faces[i + 1]!) / 2);

/** Largest index whose place is not beyond `value`, so that value lies between it and the next. */
function below(places: Float64Array, value: number): number {
  let low = 0;
  let high = places.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (places[middle]! <= value) low = middle;
    else high = middle;
  }
  return low;
}

const shareBetween = (places: Float64Array, index: number, value: number) => {
  const width = (places[index + 1] ?? places[index]!) - places[index]!;
  return width > 0 ? Math.min(1, Math.max(0, (value - places[index]!) / width)) : 0;
};

export function placesOf(centres: Float64Array, wanted: Float64Array): Places {
  const index = Int32Array.from(wanted, (value) => below(centres, value));
  return { index, share: Float64Array.from(wanted, (value, at) => shareBetween(centres, index[at]!, value)) };
}

export function readRod(picture: RodPicture): RodReader {
  const radii = centres(picture.radialFaces);
  const depths = centres(picture.axialFaces);
  const nr = radii.length;
  const value = (i: number, j: number) =>
    picture.temperatures[Math.min(j, depths.length - 1) * nr + Math.min(i, nr - 1)]!;
  const at = (r: number, z: number) => {
    const i = below(radii, Math.abs(r));
    const j = below(depths, z);
    const u = shareBetween(radii, i, Math.abs(r));
    const v = shareBetween(depths, j, z);
    const near = value(i, j) * (1 - u) + value(i + 1, j) * u;
    const far = value(i, j + 1) * (1 - u) + value(i + 1, j + 1) * u;
    return near * (1 - v) + far * v;
  };
  const row = (r: number, { index, share }: Places, out: Float64Array) => {
    const i = below(radii, Math.abs(r));
    const u = shareBetween(radii, i, Math.abs(r));
    for (let column = 0; column < out.length; column += 1) {
      const j = index[column]!;
      const v = share[column]!;
      const near = value(i, j) * (1 - u) + value(i + 1, j) * u;
      const far = value(i, j + 1) * (1 - u) + value(i + 1, j + 1) * u;
      out[column] = near * (1 - v) + far * v;
    }
  };
  return { radii, depths, at, row };
}
