export { planeStressBulge } from './bulge';
export {
  type LensPower,
  type ProfileFit,
  aberrationLoss,
  fitLens,
  fitProfile,
  opticalPathProfile,
  profileAt,
} from './fit';
export { type LensGeometry, prepareLens } from './geometry';
export { type LensWeights, weighLens } from './weights';
