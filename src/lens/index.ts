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
export { quarticTerm } from './quartic';
export {
  photoelasticPaths,
  photoelasticPower,
  stressAlongRod,
  type StressAlongRod,
  unknownPhotoelasticPower,
} from './photoelastic';
export { depolarisedShare, type ModeSection, modeSection } from './polarised-mode';
