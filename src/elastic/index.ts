export {
  planeStrainStress,
  planeStrainSurfaceHoop,
  planeStressSurfaceHoop,
  thermalShockParameter,
  uniformRodHeatLimit,
} from './closed-forms';
export { assembleElastic, type ElasticModel } from './assemble';
export { bulgePower, curvatureWeights, faceShapes } from './bulge';
export { peakTensile, type PlacedValue, valueAt } from './extremes';
export { elasticPresets, type ElasticMesh, type ElementCount, makeElasticMesh } from './mesh';
export { type ElasticOutputs, elasticOutputs } from './outputs';
export { rodTemperature, rodTemperatureMap } from './rod-temperature';
export { solveDisplacement, solveElastic } from './solve';
export type { StressField } from './stress';
export { sampleTemperature, temperatureMap } from './temperature-map';
