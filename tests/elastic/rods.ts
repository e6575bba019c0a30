import { elasticPresets, makeElasticMesh, type ElasticMesh, type ElasticModel } from '../../src/elastic';

/** Constants of an oxide crystal, for checks whose outcome does not hang on them. */
export const oxide = { youngsModulus: 282e9, poissonRatio: 0.28, expansion: 7.5e-6 };

export const freeRod: ElasticModel = {
  constants: oxide,
  referenceTemperature: 300,
  barrel: { kind: 'free' },
};

/** A rod of 2 mm radius and 10 mm length on the mesh studies use. */
export const studyMesh = makeElasticMesh({
  radius: 2e-3,
  length: 10e-3,
  pumpRadius: 4e-4,
  ...elasticPresets.study,
});

/** Equal elements, so that halving them is exact. */
export function evenMesh(radius: number, length: number, elements: number): ElasticMesh {
  const nodes = (size: number) =>
    Float64Array.from({ length: 2 * elements + 1 }, (_, k) => (size * k) / (2 * elements));
  return { radialNodes: nodes(radius), axialNodes: nodes(length) };
}

/** A pumped rod: hot on the axis near the front face. */
export function pumped(r: number, z: number): number {
  return 300 + 80 * Math.exp(-2 * (r / 5e-4) ** 2) * Math.cosh(250 * (0.01 - z)) * Math.exp(-2.5);
}

export function largestSize(values: Float64Array): number {
  return values.reduce((largest, value) => Math.max(largest, Math.abs(value)), 0);
}
