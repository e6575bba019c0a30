import { describe, expect, it } from 'vitest';
import { assembleElastic, sampleTemperature, solveElastic, valueAt } from '../../src/elastic';
import { thermalForces } from '../../src/elastic/solve';
import { riseOf } from '../../src/elastic/temperature-map';
import { freeRod, largestSize, oxide, pumped, studyMesh } from './rods';

const assembled = assembleElastic(freeRod, studyMesh);
const pumpedRod = solveElastic(assembled, pumped);
const largestStress = Math.max(...[pumpedRod.radial, pumpedRod.hoop, pumpedRod.axial].map(largestSize));
// Rounding of a solve with 1200 unknowns and a condition number of about 1e6.
const rounding = 1e-9;
const { radialNodes, axialNodes } = studyMesh;
const across = radialNodes.length;

describe('stress and displacement of a free rod', () => {
  it('a rod evenly warmer only grows, and stays free of stress', () => {
    const even = solveElastic(assembled, () => 400);
    for (const stress of [even.radial, even.hoop, even.axial, even.shear]) {
      expect(largestSize(stress) / largestStress).toBeLessThan(rounding);
    }
    const growth = oxide.expansion * 100;
    expect(even.displacement.radial[across - 1] / (growth * 2e-3)).toBeCloseTo(1, 9);
    const length = even.displacement.axial[(axialNodes.length - 1) * across] - even.displacement.axial[0];
    expect(length / (growth * 10e-3)).toBeCloseTo(1, 9);
  });

  it('a temperature that rises evenly along the axis bends the faces and makes no stress', () => {
    const slope = 5000;
    const straight = solveElastic(assembled, (_, z) => 300 + slope * z);
    for (const stress of [straight.radial, straight.hoop, straight.axial, straight.shear]) {
      expect(largestSize(stress) / largestStress).toBeLessThan(rounding);
    }
    const bend = straight.displacement.axial[across - 1] - straight.displacement.axial[0];
    expect(bend / ((-oxide.expansion * slope * 2e-3 ** 2) / 2)).toBeCloseTo(1, 9);
  });

  it('a crystal that expands differently along and across its axis is free of stress at any even temperature', () => {
    const constants = { ...oxide, axialExpansion: 11e-6 };
    const even = solveElastic(assembleElastic({ ...freeRod, constants }, studyMesh), () => 400);
    expect(largestSize(even.hoop) / largestStress).toBeLessThan(rounding);
    expect(largestSize(even.axial) / largestStress).toBeLessThan(rounding);
    expect(valueAt(studyMesh, even.displacement.radial, 1e-3, 5e-3)).toBeCloseTo(7.5e-6 * 100 * 1e-3, 15);
  });

  it('warming the whole rod evenly changes no stress', () => {
    const warmer = solveElastic(assembled, (r, z) => pumped(r, z) + 55);
    const change = warmer.hoop.map((stress, node) => stress - pumpedRod.hoop[node]);
    expect(largestSize(change) / largestStress).toBeLessThan(rounding);
  });

  it('stress and bulge are proportional to the expansion', () => {
    const constants = { ...oxide, expansion: 3 * oxide.expansion };
    const tripled = solveElastic(assembleElastic({ ...freeRod, constants }, studyMesh), pumped);
    const excess = tripled.hoop.map((stress, node) => stress - 3 * pumpedRod.hoop[node]);
    expect(largestSize(excess) / largestStress).toBeLessThan(rounding);
    const bulge = (axial: Float64Array) => axial[across - 1] - axial[0];
    const ratio = bulge(tripled.displacement.axial) / bulge(pumpedRod.displacement.axial);
    expect(ratio).toBeCloseTo(3, 9);
  });

  it('two temperature fields together give the sum of their stresses', () => {
    const other = (r: number, z: number) => 300 + 2e6 * r * r - 900 * z;
    const both = solveElastic(assembled, (r, z) => pumped(r, z) + other(r, z) - 300);
    const alone = solveElastic(assembled, other);
    const excess = both.axial.map((stress, node) => stress - pumpedRod.axial[node] - alone.axial[node]);
    expect(largestSize(excess) / largestStress).toBeLessThan(rounding);
  });

  it('the forces of one field do the same work on the displacement of another as the other way round', () => {
    // Betti's reciprocal theorem (Timoshenko & Goodier, Theory of Elasticity).
    const other = (r: number, z: number) => 300 + 40 * Math.cos(800 * r) * Math.exp(-300 * z);
    const forces = [pumped, other].map((temperature) => {
      const mapped = sampleTemperature(assembled, temperature);
      return thermalForces(mapped.map, riseOf(mapped));
    });
    const moved = [pumpedRod, solveElastic(assembled, other)].map(({ displacement }) => displacement);
    const work = (force: Float64Array, { radial, axial }: (typeof moved)[0]) =>
      radial.reduce((sum, u, node) => sum + force[2 * node] * u + force[2 * node + 1] * axial[node], 0);
    expect(work(forces[0], moved[1]) / work(forces[1], moved[0])).toBeCloseTo(1, 9);
    expect(work(forces[0], moved[0])).toBeGreaterThan(0);
  });

  it('no section of a free rod carries an axial force', () => {
    for (const j of [4, 10, 14, 20]) {
      let force = 0;
      let size = 0;
      for (let i = 0; i + 2 < across; i += 2) {
        const third = (radialNodes[i + 2] - radialNodes[i]) / 6;
        [1, 4, 1].forEach((weight, a) => {
          const part = weight * third * radialNodes[i + a] * pumpedRod.axial[j * across + i + a];
          force += part;
          size += Math.abs(part);
        });
      }
      // The stress of this mesh is good to 0.3 % of the largest; the resultant averages over it.
      expect(Math.abs(force) / size).toBeLessThan(0.01);
    }
  });

  it('what is left of the stress across the free surfaces is small and falls with the elements', () => {
    const finer = assembleElastic(freeRod, {
      radialNodes: halved(radialNodes),
      axialNodes: halved(axialNodes),
    });
    const residual = solveElastic(finer, pumped).surfaceResidual;
    // Under a heated face the axial stress starts as z^2 within a tenth of the pump radius: the hardest place.
    expect(pumpedRod.surfaceResidual / largestStress).toBeLessThan(0.05);
    expect(residual).toBeLessThan(pumpedRod.surfaceResidual / 2);
  });

  it('free surfaces carry neither normal nor shear stress', () => {
    for (let i = 0; i < across; i++) {
      expect(Math.abs(pumpedRod.axial[i]) / largestStress).toBeLessThan(rounding);
      expect(pumpedRod.shear[i]).toBe(0);
    }
    for (let j = 0; j < axialNodes.length; j++) {
      expect(Math.abs(pumpedRod.radial[j * across + across - 1]) / largestStress).toBeLessThan(rounding);
    }
  });
});

describe('what holds the barrel', () => {
  it('a pressure all round squeezes the rod evenly and lengthens it', () => {
    const pressure = 5e6;
    const pressed = assembleElastic({ ...freeRod, barrel: { kind: 'free', pressure } }, studyMesh);
    const { radial, hoop, axial, displacement } = solveElastic(pressed, () => 300);
    radial.forEach((stress) => expect(stress / pressure).toBeCloseTo(-1, 7));
    hoop.forEach((stress) => expect(stress / pressure).toBeCloseTo(-1, 7));
    expect(largestSize(axial) / pressure).toBeLessThan(1e-7);
    const shrinkage = (-(1 - oxide.poissonRatio) * pressure * 2e-3) / oxide.youngsModulus;
    expect(displacement.radial[across - 1] / shrinkage).toBeCloseTo(1, 9);
  });

  it('a rigid slippery bore turns even warming into a pressure of E alpha dT / (1 - nu)', () => {
    // Timoshenko & Goodier, Theory of Elasticity: plane state with both in-plane strains prevented.
    const clamped = assembleElastic({ ...freeRod, barrel: { kind: 'clamped' } }, studyMesh);
    const { radial, hoop, axial, displacement } = solveElastic(clamped, () => 320);
    const expected = (-oxide.youngsModulus * oxide.expansion * 20) / (1 - oxide.poissonRatio);
    radial.forEach((stress) => expect(stress / expected).toBeCloseTo(1, 7));
    hoop.forEach((stress) => expect(stress / expected).toBeCloseTo(1, 7));
    expect(largestSize(axial) / Math.abs(expected)).toBeLessThan(1e-7);
    for (let j = 0; j < axialNodes.length; j++) expect(displacement.radial[j * across + across - 1]).toBe(0);
  });
});

function halved(nodes: Float64Array): Float64Array {
  return Float64Array.from({ length: 2 * nodes.length - 1 }, (_, k) =>
    k % 2 === 0 ? nodes[k / 2] : (nodes[(k - 1) / 2] + nodes[(k + 1) / 2]) / 2,
  );
}
