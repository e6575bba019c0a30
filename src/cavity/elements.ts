/** The two planes of an astigmatic cavity: tangential is the plane of the folds, sagittal is normal to it. */
export type Plane = 'sagittal' | 'tangential';

export type CavityElement =
  | {
      kind: 'mirror';
      /** Radius of curvature, m; Infinity is flat, > 0 concave as the light sees it, < 0 convex. */
      radius: number;
      /** Angle of incidence, rad; 0 at the end mirrors of a linear cavity. */
      incidence: number;
      /** Share of the power that leaves here, 0 to 1; the rays do not feel it. */
      transmission: number;
    }
  /** Free space in air; the length is geometric, m. */
  | { kind: 'space'; length: number }
  /** Thin lens; focal length m, > 0 converging, the same in both planes. */
  | { kind: 'lens'; focalLength: number }
  /** Plane-parallel plate, thickness m, incidence rad in the tangential plane (Brewster: atan n). */
  | { kind: 'plate'; thickness: number; refractiveIndex: number; incidence: number }
  /** The pumped rod, met front (pumped) face first; `reversed` when the pumped face is met last. */
  | { kind: 'rod'; reversed?: boolean };

/**
 * Elements in the order the light meets them. Linear: the first and the last are the end mirrors and the
 * light comes back the same way, folded at will between them. Ring: the last leads back to the first.
 */
export interface Cavity {
  kind: 'linear' | 'ring';
  elements: CavityElement[];
}

/** The rod as rays feel it: a stack of graded-index slices from the front face to the back face. */
export interface RodOptics {
  /** Refractive index on the axis. */
  refractiveIndex: number;
  /** Geometric length of each slice, m, front to back. */
  sliceLengths: Float64Array;
  /** Dioptric power of each slice from its index profile alone, 1/m, > 0 converging. */
  slicePowers: Record<Plane, Float64Array>;
  /** Thin lens at the front face (its bulge), 1/m, > 0 converging. */
  frontPower: Record<Plane, number>;
  /** Thin lens at the back face, 1/m. */
  backPower: Record<Plane, number>;
}

/**
 * A rod whose power is spread evenly over its length and is the same in both planes: a first guess, and a
 * shape to search stability zones with.
 *
 * @param length m
 * @param refractiveIndex on the axis
 * @param power dioptric power of the whole stack, 1/m, > 0 converging; 1 gives a shape for {@link stabilityZones}
 * @param slices how many; one is exact, because a slice is itself a graded-index duct
 */
export function uniformRod(length: number, refractiveIndex: number, power: number, slices = 1): RodOptics {
  const slicePowers = new Float64Array(slices).fill(power / slices);
  return {
    refractiveIndex,
    sliceLengths: new Float64Array(slices).fill(length / slices),
    slicePowers: { sagittal: slicePowers, tangential: slicePowers },
    frontPower: { sagittal: 0, tangential: 0 },
    backPower: { sagittal: 0, tangential: 0 },
  };
}

/**
 * The rod of the same shape with every power multiplied: with a shape of unit power, the rod at so many dioptres.
 *
 * @param power 1/m
 */
export function scaleRod(shape: RodOptics, power: number): RodOptics {
  const times = (powers: Float64Array) => powers.map((one) => one * power);
  const { slicePowers, frontPower, backPower } = shape;
  return {
    ...shape,
    slicePowers: { sagittal: times(slicePowers.sagittal), tangential: times(slicePowers.tangential) },
    frontPower: { sagittal: frontPower.sagittal * power, tangential: frontPower.tangential * power },
    backPower: { sagittal: backPower.sagittal * power, tangential: backPower.tangential * power },
  };
}

/** Geometric length of the rod, m. */
export function rodLength(rod: RodOptics): number {
  let length = 0;
  for (const slice of rod.sliceLengths) length += slice;
  return length;
}
