import { largest, smallest, valueAt, vonMises, type PlacedValue } from './extremes';
import type { ElasticSolution } from './solve';

/** An extremum as reference problems print it: SI, tension positive. */
interface PrintedExtreme {
  value_Pa: number;
  r_m: number;
  z_m: number;
}

/** Displacement and stress of a rod as reference problems print them; a file format, so its keys carry their units. */
export interface ElasticOutputs {
  front_face_uz_minus_axis_m: { r_m: number; uz_m: number }[];
  back_face_uz_minus_axis_m: { r_m: number; uz_m: number }[];
  axis_elongation_m: number;
  u_r_side_mid_m: number;
  u_r_side_front_m: number;
  radial_max: PrintedExtreme;
  radial_min: PrintedExtreme;
  hoop_max: PrintedExtreme;
  hoop_min: PrintedExtreme;
  axial_max: PrintedExtreme;
  axial_min: PrintedExtreme;
  von_mises_max: PrintedExtreme;
  probe_stresses_Pa: { r_m: number; z_m: number; sr: number; st: number; sz: number; trz: number }[];
}

/**
 * Everything a reference problem prints of a solution.
 * @param faceRadii m, where the faces are read
 * @param probes m, (r, z) pairs where the stresses are read
 */
export function elasticOutputs(
  solution: ElasticSolution,
  faceRadii: readonly number[],
  probes: readonly (readonly [number, number])[],
): ElasticOutputs {
  const { mesh, displacement, radial, hoop, axial, shear } = solution;
  const radius = mesh.radialNodes[mesh.radialNodes.length - 1];
  const length = mesh.axialNodes[mesh.axialNodes.length - 1];
  const uz = (r: number, z: number) => valueAt(mesh, displacement.axial, r, z);
  const face = (z: number) => faceRadii.map((r) => ({ r_m: r, uz_m: uz(r, z) - uz(0, z) }));
  return {
    front_face_uz_minus_axis_m: face(0),
    back_face_uz_minus_axis_m: face(length),
    axis_elongation_m: uz(0, length) - uz(0, 0),
    u_r_side_mid_m: valueAt(mesh, displacement.radial, radius, length / 2),
    u_r_side_front_m: valueAt(mesh, displacement.radial, radius, 0),
    radial_max: printed(largest(mesh, radial)),
    radial_min: printed(smallest(mesh, radial)),
    hoop_max: printed(largest(mesh, hoop)),
    hoop_min: printed(smallest(mesh, hoop)),
    axial_max: printed(largest(mesh, axial)),
    axial_min: printed(smallest(mesh, axial)),
    von_mises_max: printed(largest(mesh, vonMises(solution))),
    probe_stresses_Pa: probes.map(([r, z]) => ({
      r_m: r,
      z_m: z,
      sr: valueAt(mesh, radial, r, z),
      st: valueAt(mesh, hoop, r, z),
      sz: valueAt(mesh, axial, r, z),
      trz: valueAt(mesh, shear, r, z),
    })),
  };
}

function printed({ value, r, z }: PlacedValue): PrintedExtreme {
  return { value_Pa: value, r_m: r, z_m: z };
}
