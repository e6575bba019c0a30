import type { ResolvedRod } from '../design/resolved';
import { planeStrainSurfaceHoop } from '../elastic';
import type { RodField } from '../heat';

/**
 * Hoop stress on the barrel in the plane of the hottest point, as if the rod were long and evenly heated there: the
 * closed form that stands beside the elastic solution as a check of its size.
 * @returns Pa, tension positive
 */
export function sectionStressEstimate(rod: ResolvedRod, field: RodField): number {
  const { grid, temperatures, peakPosition } = field;
  const { nr, nRadial, faceSquares } = grid;
  let row = 0;
  while (row + 1 < grid.nz && grid.axialFaces[row + 1]! < peakPosition.z) row++;
  let mean = 0;
  for (let i = 0; i < nr; i++)
    mean += temperatures[row * nRadial + i]! * (faceSquares[i + 1]! - faceSquares[i]!);
  mean /= faceSquares[nr]!;
  const constants = {
    youngsModulus: rod.youngModulus,
    poissonRatio: rod.poissonRatio,
    expansion: rod.expansionAcross,
    axialExpansion: rod.expansion,
  };
  // The barrel is hottest in this plane too, to within the spread of heat along the rod.
  return planeStrainSurfaceHoop(constants, mean, Math.min(mean, field.edgeTemperature));
}
