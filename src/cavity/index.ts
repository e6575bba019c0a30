export type { Cavity, CavityElement, Plane, RodOptics } from './elements';
export { rodLength, scaleRod, uniformRod } from './elements';
export type { PreparedCavity } from './prepare';
export { prepareCavity } from './prepare';
export type { PlaneMode } from './mode';
export { EDGE_GUARD, planeMode, stability, stabilityAtPower } from './mode';
export type { EnvelopePoint } from './envelope';
export { axialLength, modeEnvelope } from './envelope';
export type { StabilityZone } from './zones';
export { stabilityZones, workingPoint } from './zones';
export { misalignmentSensitivity } from './sensitivity';
export { equivalentThinLens, powerCentroid, totalPower } from './rod-matrix';
export { roundTripMatrix } from './round-trip';
export { estimateZones } from './estimate';
export { plateReducedLength, tiltedMirrorFocalLength } from './ray-matrix';
export {
  armVergences,
  foldCompensationAngle,
  gStar,
  leastModeRadius,
  mirrorRadii,
  thinLensZones,
  waist,
} from './closed-forms';
