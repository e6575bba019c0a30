export { planeStressBulge } from './bulge';
export {
  type LensPower,
  type ProfileFit,
  aberrationLoss,
  fitLens,
  fitProfile,
  opticalPathProfile,
} from './fit';
export { type LensGeometry, prepareLens } from './geometry';
export { type LensWeights, weighLens } from './weights';
