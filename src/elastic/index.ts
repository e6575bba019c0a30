export * from './closed-forms';
export { assembleElastic, type AssembledElastic, type Barrel, type ElasticModel } from './assemble';
export { makeElasticMesh, type ElasticMesh, type ElasticMeshModel } from './mesh';
export { solveDisplacement, solveElastic, type Displacement, type ElasticSolution } from './solve';
export type { StressField } from './stress';
export {
  sampleTemperature,
  temperatureMap,
  type MappedTemperature,
  type TemperatureMap,
} from './temperature-map';
export { bulgePower, curvatureWeights, faceShapes, type BulgePower, type FaceShape } from './bulge';
export { largest, peakTensile, smallest, valueAt, vonMises, type PlacedValue } from './extremes';
export { elasticOutputs, type ElasticOutputs } from './outputs';
