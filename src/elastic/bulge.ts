import { gaussLegendre } from '../numerics/quadrature';
import type { ElasticMesh } from './mesh';
import { quadraticShapes } from './quadratic-line';
import type { Displacement } from './solve';

/** Shape of an end face, at the nodes of the mesh along the radius, m. */
export interface FaceShape {
  radii: Float64Array;
  /** u_z relative to the axis, + into the rod seen from the pumped face: rises outwards on a front face that bulges out */
  relativeDisplacement: Float64Array;
}

/** Dioptric power of both faces' bulge, 1/m, > 0 converging. */
export interface BulgePower {
  front: number;
  back: number;
}

/** Shape of both end faces: u_z(r) - u_z(0). */
export function faceShapes({ mesh, axial }: Displacement): { front: FaceShape; back: FaceShape } {
  const across = mesh.radialNodes.length;
  const face = (first: number): FaceShape => ({
    radii: mesh.radialNodes,
    relativeDisplacement: Float64Array.from(mesh.radialNodes, (_, i) => axial[first + i] - axial[first]),
  });
  return { front: face(0), back: face((mesh.axialNodes.length - 1) * across) };
}

/**
 * Weights that turn the values of a face at the mesh's radial nodes into c2 of the fit c0 + c2 r^2 that a Gaussian mode
 * sees: least squares with weight exp(-2 r^2/w^2) over the area of the face.
 * @param modeRadius m, 1/e2 radius w of the intensity
 * @returns length of mesh.radialNodes; their sum is zero, since an even displacement bends nothing
 */
export function curvatureWeights(mesh: ElasticMesh, modeRadius: number): Float64Array {
  const { radialNodes } = mesh;
  const rule = gaussLegendre(6);
  // Moments int W r^2k r dr of the weight, and int W r^2k N_i r dr of the shape functions.
  const moments = [0, 0, 0];
  const shapeMoments = [new Float64Array(radialNodes.length), new Float64Array(radialNodes.length)];
  for (let node = 0; node + 2 < radialNodes.length; node += 2) {
    const from = radialNodes[node];
    const size = radialNodes[node + 2] - from;
    // Six points serve a stretch of one mode radius to 1e-9.
    const parts = Math.ceil(size / modeRadius);
    for (let part = 0; part < parts; part++) {
      for (let p = 0; p < rule.nodes.length; p++) {
        const share = (part + (1 + rule.nodes[p]) / 2) / parts;
        const square = (from + share * size) ** 2;
        const weight =
          Math.exp((-2 * square) / modeRadius ** 2) *
          Math.sqrt(square) *
          ((rule.weights[p] * size) / (2 * parts));
        for (let k = 0; k < 3; k++) moments[k] += weight * square ** k;
        quadraticShapes(2 * share - 1).forEach((shape, a) => {
          shapeMoments[0][node + a] += weight * shape;
          shapeMoments[1][node + a] += weight * square * shape;
        });
      }
    }
  }
  const determinant = moments[0] * moments[2] - moments[1] ** 2;
  return shapeMoments[1].map(
    (withSquare, i) => (moments[0] * withSquare - moments[1] * shapeMoments[0][i]) / determinant,
  );
}

/**
 * Dioptric power that a Gaussian mode sees in the bulge of each face. A face that has moved outwards by h(r) adds the path
 * (n - 1) h(r); with h fitted by c0 + c2 r^2 the power is D = -2 (n - 1) c2, > 0 (converging) where the face bulges out at
 * the axis.
 * @param refractiveIndex n of the rod, in air
 * @param modeRadius m, 1/e2 radius of the mode's intensity at the rod, or weights of `curvatureWeights` made before
 */
export function bulgePower(
  displacement: Displacement,
  refractiveIndex: number,
  modeRadius: number | Float64Array,
): BulgePower {
  const { mesh, axial } = displacement;
  const weights = typeof modeRadius === 'number' ? curvatureWeights(mesh, modeRadius) : modeRadius;
  const back = (mesh.axialNodes.length - 1) * weights.length;
  let frontCurvature = 0;
  let backCurvature = 0;
  for (let i = 0; i < weights.length; i++) {
    frontCurvature -= weights[i] * axial[i];
    backCurvature += weights[i] * axial[back + i];
  }
  const perCurvature = -2 * (refractiveIndex - 1);
  return { front: perCurvature * frontCurvature, back: perCurvature * backCurvature };
}
