import { describe, expect, it } from 'vitest';
import { assembleElastic, solveElastic, type ElasticMesh } from '../../src/elastic';
import { exactRod } from './exact-rod';
import { evenMesh, oxide } from './rods';

const radius = 2e-3;
const length = 3e-3;
const exact = exactRod(oxide, radius, length, 900);

function solveOn(elements: number) {
  const mesh = evenMesh(radius, length, elements);
  const model = { constants: oxide, referenceTemperature: 0, barrel: { kind: 'clamped' } as const };
  const solution = solveElastic(assembleElastic(model, mesh), exact.temperatureRise);
  return { mesh, solution };
}

/** Difference from the exact values over the nodes, as a share of the largest exact value. */
function difference(
  mesh: ElasticMesh,
  field: Float64Array,
  wanted: (r: number, z: number) => number,
): { largest: number; rms: number } {
  let largest = 0;
  let squares = 0;
  let size = 0;
  mesh.axialNodes.forEach((z, j) =>
    mesh.radialNodes.forEach((r, i) => {
      const value = wanted(r, z);
      const error = Math.abs(field[j * mesh.radialNodes.length + i] - value);
      largest = Math.max(largest, error);
      squares += error * error;
      size = Math.max(size, Math.abs(value));
    }),
  );
  return { largest: largest / size, rms: Math.sqrt(squares / field.length) / size };
}

/** Order between the coarser and the finer of two meshes that differ by a halving. */
const order = (coarse: number, fine: number) => Math.log2(coarse / fine);

// Timoshenko & Goodier, Theory of Elasticity: the potentials of which the exact solution is made.
describe('a rod against an exact solution of thermo-elasticity', () => {
  const [coarse, fine] = [12, 24].map((elements) => {
    const { mesh, solution } = solveOn(elements);
    return {
      radial: difference(mesh, solution.displacement.radial, exact.radial),
      axial: difference(mesh, solution.displacement.axial, exact.axial),
      hoop: difference(mesh, solution.hoop, exact.hoopStress),
    };
  });

  it('halving the elements cuts the largest error of the displacement about eightfold or more', () => {
    // Quadratic elements are of third order; 2.9 leaves room for elements that are not yet small.
    expect(order(coarse.radial.largest, fine.radial.largest)).toBeGreaterThan(2.9);
    expect(order(coarse.axial.largest, fine.axial.largest)).toBeGreaterThan(2.9);
  });

  it('halving the elements cuts the largest error of the stress fourfold and the mean one more than fivefold', () => {
    // Derivatives of quadratic elements are of second order; recovery gains on it everywhere but at the surfaces.
    expect(order(coarse.hoop.largest, fine.hoop.largest)).toBeGreaterThan(1.9);
    expect(order(coarse.hoop.rms, fine.hoop.rms)).toBeGreaterThan(Math.log2(5));
  });

  it('24 elements a side give displacement within 5e-5 and stress within 5e-4 of the largest', () => {
    // Measured 2.6e-5 and 3.4e-4; the margins are there so that a regression shows and rounding does not.
    expect(fine.radial.largest).toBeLessThan(5e-5);
    expect(fine.axial.largest).toBeLessThan(5e-5);
    expect(fine.hoop.largest).toBeLessThan(5e-4);
  });
});
