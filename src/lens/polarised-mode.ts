import { quadraticShapes } from '../elastic/quadratic-line';
import { gaussLegendre } from '../numerics/quadrature';
import type { PhotoelasticPaths, PhotoelasticPower } from './photoelastic';

/** Beyond this many mode radii the intensity is below 2e-14 of its peak. */
const reach = 4;
/** Points in each third of a mode radius. */
const pointsPerPart = 8;

/** A Gaussian mode over the section of a rod, prepared once for a mesh and a mode radius. */
export interface ModeSection {
  /** First node of the element each point lies in, its three shape functions, and its share of the mode's power. */
  node: Int32Array;
  shapes: Float64Array;
  share: Float64Array;
  /** Turns H(r) at the nodes into h of h r^2 cos(2 phi), fitted to H(r) cos(2 phi) over the mode's intensity, per m^2. */
  astigmatic: Float64Array;
}

/**
 * Points over the section with the share of the mode's power at each; what lies outside the barrel is left out, the shares
 * sum to 1.
 * @param radii m, radial nodes of the elastic mesh
 * @param modeRadius m, 1/e2 radius of the intensity
 */
export function modeSection(radii: Float64Array, modeRadius: number): ModeSection {
  const rule = gaussLegendre(pointsPerPart);
  const node: number[] = [];
  const shapes: number[] = [];
  const share: number[] = [];
  const squareShapes = new Float64Array(radii.length);
  let total = 0;
  let fourth = 0;
  for (let first = 0; first + 2 < radii.length; first += 2) {
    const from = radii[first];
    const size = radii[first + 2] - from;
    const used = Math.min(size, reach * modeRadius - from);
    if (used <= 0) break;
    const parts = Math.ceil((3 * used) / modeRadius);
    for (let p = 0; p < parts * pointsPerPart; p++) {
      const inPart = (1 + rule.nodes[p % pointsPerPart]) / 2;
      const step = (used * (Math.floor(p / pointsPerPart) + inPart)) / parts;
      const radius = from + step;
      const weight =
        (Math.exp(-2 * (radius / modeRadius) ** 2) * radius * rule.weights[p % pointsPerPart] * used) / parts;
      const shape = quadraticShapes((2 * step) / size - 1);
      node.push(first);
      shapes.push(...shape);
      share.push(weight);
      shape.forEach((value, a) => (squareShapes[first + a] += weight * radius ** 2 * value));
      total += weight;
      fourth += weight * radius ** 4;
    }
  }
  return {
    node: Int32Array.from(node),
    shapes: Float64Array.from(shapes),
    share: Float64Array.from(share, (weight) => weight / total),
    astigmatic: squareShapes.map((value) => value / fourth),
  };
}

/** Dioptric powers that a linearly polarised mode sees, 1/m, > 0 converging. */
export interface PolarisedPower {
  /** In the plane of its polarisation. */
  along: number;
  /** In the plane across it. */
  across: number;
}

/**
 * Lens of a stressed rod for light polarised along x: at azimuth phi it sees radial cos^2 phi + tangential sin^2 phi, so
 * the rod is astigmatic, radial-like along x and tangential-like across.
 * Fit of c0 + c2 r^2 + h r^2 cos(2 phi) over the mode's intensity: D = -2 (c2 + h) along, -2 (c2 - h) across.
 * @param power of the same paths and mode, from `photoelasticPower`
 */
export function polarisedPower(
  { radial, tangential }: PhotoelasticPaths,
  power: PhotoelasticPower,
  { astigmatic }: ModeSection,
): PolarisedPower {
  let half = 0;
  for (let i = 0; i < astigmatic.length; i++) half -= astigmatic[i] * (radial[i] - tangential[i]);
  return { along: power.mean + half, across: power.mean - half };
}

/**
 * Share of a linearly polarised Gaussian mode's power found in the crossed polarisation after one pass:
 * < sin^2(2 phi) sin^2(delta/2) > = 1/4 < 1 - cos delta >, delta = 2 pi (radial - tangential path)/wavelength.
 * 0 without stress; 1/4 where delta runs through many turns over the mode.
 * @param mode 1/e2 radius of the intensity, m, or a section from `modeSection` made before
 * @param wavelength in vacuum, m
 * @returns 0 ... 1/2
 * @source Koechner & Rice, IEEE JQE 6, 557 (1970) (from memory)
 */
export function depolarisedShare(
  { radii, radial, tangential }: PhotoelasticPaths,
  mode: number | ModeSection,
  wavelength: number,
): number {
  const { node, shapes, share } = typeof mode === 'number' ? modeSection(radii, mode) : mode;
  let crossed = 0;
  for (let p = 0; p < node.length; p++) {
    let difference = 0;
    for (let a = 0; a < 3; a++) {
      const i = node[p] + a;
      difference += shapes[3 * p + a] * (radial[i] - tangential[i]);
    }
    crossed += share[p] * Math.sin((Math.PI * difference) / wavelength) ** 2;
  }
  return crossed / 2;
}
