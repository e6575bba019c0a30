import { solveBanded, factorBanded } from '../../src/numerics/banded';
import { lineLoad, lineMatrix, quadraticLine } from '../../src/elastic/quadratic-line';
import { applyPair } from '../../src/elastic/temperature-map';
import { makeElasticMesh } from '../../src/elastic';

/** A film or contact to a fixed temperature: outward flux h (T - T_K). */
interface Film {
  h_W_m2K: number;
  T_K: number;
}

/** A rod with heat in it; the names are those of the reference problems' definitions. */
export interface HeatedRod {
  a_m: number;
  cap_front_m: number;
  L_doped_m: number;
  cap_back_m: number;
  k_W_mK: number;
  side: Film;
  front: Film;
  back: Film;
  pumpRadius: number;
  /** W/m3 at (r, z) inside the doped part */
  heatDensity: (r: number, z: number) => number;
}

/** Temperatures on a tensor grid of nodes, (i, j) at j*radii.length + i. */
export interface NodalTemperature {
  radii: Float64Array;
  axials: Float64Array;
  values: Float64Array;
}

/**
 * Steady conduction in a rod by quadratic elements: a second way to the temperature, so that a check of displacement and
 * stress does not lean on the heat room's own discretisation.
 */
export function conduct(rod: HeatedRod, radialElements: number, axialElements: number): NodalTemperature {
  const { a_m: radius, cap_front_m: heatedFrom, k_W_mK: conductivity } = rod;
  const heatedTo = heatedFrom + rod.L_doped_m;
  const length = heatedTo + rod.cap_back_m;
  const size = { radius, length, heatedFrom, heatedTo, pumpRadius: rod.pumpRadius };
  const mesh = makeElasticMesh({ ...size, radialElements, axialElements });
  const radialLine = quadraticLine(mesh.radialNodes);
  const axialLine = quadraticLine(mesh.axialNodes);
  const across = mesh.radialNodes.length;
  const along = mesh.axialNodes.length;

  const stiffR = lineMatrix(radialLine, 'slope', 'slope', 1);
  const massR = lineMatrix(radialLine, 'shape', 'shape', 1);
  const stiffZ = lineMatrix(axialLine, 'slope', 'slope', 0);
  const massZ = lineMatrix(axialLine, 'shape', 'shape', 0);
  const bandwidth = 2 * across + 2;
  const diagonal = new Float64Array(across * along);
  const lower = new Float64Array(across * along * bandwidth);
  for (let j = 0; j < along; j++) {
    for (let l = Math.max(0, j - 2); l <= Math.min(along - 1, j + 2); l++) {
      for (let i = 0; i < across; i++) {
        for (let k = Math.max(0, i - 2); k <= Math.min(across - 1, i + 2); k++) {
          const r = 5 * i + k - i + 2;
          const z = 5 * j + l - j + 2;
          const onBarrel = i === across - 1 && k === i ? rod.side.h_W_m2K * radius * massZ[z] : 0;
          const onFront = j === 0 && l === 0 ? rod.front.h_W_m2K * massR[r] : 0;
          const onBack = j === along - 1 && l === j ? rod.back.h_W_m2K * massR[r] : 0;
          const value = conductivity * (stiffR[r] * massZ[z] + massR[r] * stiffZ[z]);
          const row = j * across + i;
          const column = l * across + k;
          const entry = value + onBarrel + onFront + onBack;
          if (column === row) diagonal[row] = entry;
          else if (column < row) lower[row * bandwidth + column - row + bandwidth] = entry;
        }
      }
    }
  }

  const sources = new Float64Array(radialLine.points.length * axialLine.points.length);
  axialLine.points.forEach((z, l) => {
    if (z < heatedFrom || z > heatedTo) return;
    radialLine.points.forEach((r, k) => (sources[l * radialLine.points.length + k] = rod.heatDensity(r, z)));
  });
  const ringLoad = lineLoad(radialLine, (r, shape) => r * shape);
  const lineOnly = lineLoad(axialLine, (_, shape) => shape);
  const heat = applyPair({ across: ringLoad, along: lineOnly }, sources, radialLine.points.length);
  const sum = (matrix: Float64Array, row: number) =>
    matrix.subarray(5 * row, 5 * row + 5).reduce((total, entry) => total + entry, 0);
  for (let j = 0; j < along; j++) {
    heat[j * across + across - 1] += rod.side.h_W_m2K * rod.side.T_K * radius * sum(massZ, j);
  }
  for (let i = 0; i < across; i++) {
    heat[i] += rod.front.h_W_m2K * rod.front.T_K * sum(massR, i);
    heat[(along - 1) * across + i] += rod.back.h_W_m2K * rod.back.T_K * sum(massR, i);
  }
  const values = solveBanded(factorBanded(diagonal, lower, bandwidth), heat);
  return { radii: mesh.radialNodes, axials: mesh.axialNodes, values };
}
