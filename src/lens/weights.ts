import { type LensGeometry, partialWeights, stageWeights, stages } from './geometry';

/** The mode's intensity over the cross-section, prepared once for a mode radius. */
export interface LensWeights {
  geometry: LensGeometry;
  /** 1/e2 intensity radius of the mode, m. */
  weightRadius: number;
  /** Intensity times area at each point, scaled so that the sum is 1. */
  intensity: Float64Array;
  /** Mean of r^2 and of r^4 over the intensity, m^2 and m^4. */
  meanSquare: number;
  meanFourth: number;
  /** Fitted dioptric power = sum over faces of faceWeights[f] * (-dT/d(r^2) at the outer face of ring f), per dn/dT and length; length nr. */
  faceWeights: Float64Array;
}

/**
 * Weights of the least-squares parabola c0 + c2 r^2 over the intensity W = exp(-2 r^2/w^2), up to the barrel.
 *
 * With s = r^2 and I(s) = -integral of G from 0 to s: -2 c2 = 2 / (M0 M2 - M1^2) * integral of G(s) Q(s) ds, where
 * Q(s) = integral from s to the barrel of W (M0 s' - M1) ds'. G are the face fluxes, so no cell value is differenced.
 *
 * @param weightRadius 1/e2 intensity radius of the mode, m. A mode narrower than the innermost ring sees the axis: its
 *   radius counts as that of the ring.
 */
export function weighLens(geometry: LensGeometry, weightRadius: number): LensWeights {
  const { grid, squares, widths, faceIndex, faceShare } = geometry;
  const { nr } = grid;
  const count = squares.length;
  const beta = 2 / Math.max(weightRadius ** 2, grid.faceSquares[1]!);
  const intensity = new Float64Array(count);
  let total = 0;
  for (let q = 0; q < count; q++) {
    const area = widths[(q / stages) | 0]! * stageWeights[q % stages]!;
    intensity[q] = Math.exp(-beta * squares[q]!) * area;
    total += intensity[q]!;
  }
  let meanSquare = 0;
  let meanFourth = 0;
  for (let q = 0; q < count; q++) {
    intensity[q] = intensity[q]! / total;
    meanSquare += intensity[q]! * squares[q]!;
    meanFourth += intensity[q]! * squares[q]! ** 2;
  }
  const scale = 2 / (meanFourth - meanSquare ** 2);
  const faceWeights = new Float64Array(nr);
  // Q at the outer face of the interval; it grows inwards from 0 at the barrel and returns to 0 on the axis.
  let outside = 0;
  for (let k = widths.length - 1; k >= 0; k--) {
    const first = k * stages;
    const p0 = intensity[first]! * (squares[first]! - meanSquare);
    const p1 = intensity[first + 1]! * (squares[first + 1]! - meanSquare);
    const p2 = intensity[first + 2]! * (squares[first + 2]! - meanSquare);
    outside += p0 + p1 + p2;
    for (let stage = 0; stage < stages; stage++) {
      const row = partialWeights[stage]!;
      const passed =
        (row[0] * p0) / stageWeights[0] + (row[1] * p1) / stageWeights[1] + (row[2] * p2) / stageWeights[2];
      const weight = scale * (outside - passed) * widths[k]! * stageWeights[stage]!;
      const base = 4 * (first + stage);
      for (let a = base; a < base + 4; a++) {
        const face = faceIndex[a]!;
        faceWeights[face] = faceWeights[face]! + weight * faceShare[a]!;
      }
    }
  }
  return { geometry, weightRadius, intensity, meanSquare, meanFourth, faceWeights };
}
