import type { PhotoelasticCoefficients } from '../../src/lens/photoelastic-111';

type Vector = readonly [number, number, number];
/** Rows are the directions of a frame, written in the cube axes. */
export type Frame = readonly [Vector, Vector, Vector];
export type Matrix = number[][];

const axes = [0, 1, 2] as const;

/**
 * p_ijkl of a cubic crystal in its cube axes, entry by entry from the contracted table (Nye, Physical Properties of
 * Crystals, table of the class m3m, from memory): iiii p11, iijj p12, ijij and ijji p44, all others zero.
 */
function cubicEntry({ p11, p12, p44 }: PhotoelasticCoefficients, indices: readonly number[]): number {
  const [i, j, k, l] = indices;
  if (i === j && k === l) return i === k ? p11 : p12;
  return (i === k && j === l) || (i === l && j === k) ? p44 : 0;
}

/** Delta B_ij = p_ijkl e_kl with p rotated into a frame by its four indices, strain and result in that frame. */
export function impermeability(p: PhotoelasticCoefficients, frame: Frame, strain: Matrix): Matrix {
  const entry = (i: number, j: number, k: number, l: number) => {
    let sum = 0;
    for (const a of axes)
      for (const b of axes)
        for (const c of axes)
          for (const d of axes)
            sum +=
              frame[i]![a]! * frame[j]![b]! * frame[k]![c]! * frame[l]![d]! * cubicEntry(p, [a, b, c, d]);
    return sum;
  };
  return axes.map((i) =>
    axes.map((j) => {
      let sum = 0;
      for (const k of axes) for (const l of axes) sum += entry(i, j, k, l) * strain[k]![l]!;
      return sum;
    }),
  );
}

/** Frame (r, hoop, z) of a rod along [111] at an azimuth; the azimuth counts from [11-2]. */
export function frame111(azimuth: number): Frame {
  const first = scaled([1, 1, -2], 1 / Math.sqrt(6));
  const second = scaled([-1, 1, 0], 1 / Math.sqrt(2));
  return turned(first, second, scaled([1, 1, 1], 1 / Math.sqrt(3)), azimuth);
}

/** The same for a rod along [001]; the azimuth counts from [100]. */
export const frame001 = (azimuth: number): Frame => turned([1, 0, 0], [0, 1, 0], [0, 0, 1], azimuth);

function turned(first: Vector, second: Vector, along: Vector, azimuth: number): Frame {
  const [c, s] = [Math.cos(azimuth), Math.sin(azimuth)];
  return [sum(scaled(first, c), scaled(second, s)), sum(scaled(first, -s), scaled(second, c)), along];
}

const scaled = ([x, y, z]: Vector, by: number): Vector => [x * by, y * by, z * by];
const sum = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
