import type { AssembledElastic } from './assemble';
import { applyAcross, applyAlong } from './line-operator';
import type { ElasticMesh } from './mesh';
import type { Displacement } from './solve';

/** Stresses at the nodes, Pa, tension positive; node (i, j) at j*mesh.radialNodes.length + i. */
export interface StressField {
  mesh: ElasticMesh;
  radial: Float64Array;
  hoop: Float64Array;
  axial: Float64Array;
  /** sigma_rz */
  shear: Float64Array;
  /**
   * Pa, largest normal stress that the recovered strains left on a surface where it is known, before it was put right:
   * a measure of how far the mesh is from resolving the field.
   */
  surfaceResidual: number;
}

/** Strains at the nodes while they are turned into stresses. */
interface StrainField {
  radial: Float64Array;
  hoop: Float64Array;
  axial: Float64Array;
  /** twice the tensor component rz */
  shear: Float64Array;
}

/**
 * Stresses at the nodes from displacement and temperature there. Strains are the recovered derivatives (see
 * `slopeOperators`). On a free surface the strain across it follows from
 * the normal stress that is known there, which is better than any one-sided derivative, and the shear is zero.
 * @param rise K, T - T_reference at the nodes
 */
export function recoverStress(
  assembled: AssembledElastic,
  displacement: Displacement,
  rise: Float64Array,
): StressField {
  const { mesh, moduli } = assembled;
  const strain = recoverStrain(assembled, displacement);
  const surfaceResidual = imposeSurfaces(assembled, strain, rise);
  const { cross, shear, thermalAcross, thermalAlong } = moduli;
  const { radial, hoop, axial } = strain;
  for (let node = 0; node < rise.length; node++) {
    const volume = cross * (radial[node] + hoop[node] + axial[node]);
    radial[node] = volume + 2 * shear * radial[node] - thermalAcross * rise[node];
    hoop[node] = volume + 2 * shear * hoop[node] - thermalAcross * rise[node];
    axial[node] = volume + 2 * shear * axial[node] - thermalAlong * rise[node];
    strain.shear[node] *= shear;
  }
  return { mesh, radial, hoop, axial, shear: strain.shear, surfaceResidual };
}

function recoverStrain({ mesh, slopes }: AssembledElastic, displacement: Displacement): StrainField {
  const across = mesh.radialNodes.length;
  const along = mesh.axialNodes.length;
  const empty = () => new Float64Array(across * along);
  const radial = applyAcross(slopes.acrossOdd, displacement.radial, across, along, empty());
  const axial = applyAlong(slopes.along, displacement.axial, across, empty());
  const shear = applyAcross(slopes.acrossEven, displacement.axial, across, along, empty());
  const turning = applyAlong(slopes.along, displacement.radial, across, empty());
  const hoop = applyAcross(slopes.overRadius, displacement.radial, across, along, empty());
  for (let node = 0; node < shear.length; node++) shear[node] += turning[node];
  return { radial, hoop, axial, shear };
}

/** Puts the strain across every free surface right. @returns Pa, the largest normal stress put right */
function imposeSurfaces(assembled: AssembledElastic, strain: StrainField, rise: Float64Array): number {
  const { mesh, model, moduli } = assembled;
  const { direct, cross, thermalAcross, thermalAlong } = moduli;
  const { radial, hoop, axial, shear } = strain;
  const across = mesh.radialNodes.length;
  const along = mesh.axialNodes.length;
  const { barrel } = model;
  const pressure = barrel.kind === 'free' ? (barrel.pressure ?? 0) : 0;
  let largest = 0;
  for (let j = 0; j < along; j++) {
    const onFace = j === 0 || j === along - 1;
    for (let i = onFace ? 0 : across - 1; i < across; i++) {
      const onBarrel = i === across - 1;
      const node = j * across + i;
      shear[node] = 0;
      // direct*radial + cross*axial = fromBarrel on the barrel, cross*radial + direct*axial = fromFace on a face.
      const fromBarrel = thermalAcross * rise[node] - pressure - cross * hoop[node];
      const fromFace = thermalAlong * rise[node] - cross * hoop[node];
      const barrelIsFree = onBarrel && barrel.kind === 'free';
      if (barrelIsFree) {
        largest = Math.max(largest, Math.abs(direct * radial[node] + cross * axial[node] - fromBarrel));
      }
      if (onFace) {
        largest = Math.max(largest, Math.abs(cross * radial[node] + direct * axial[node] - fromFace));
      }
      if (barrelIsFree && onFace) {
        radial[node] = (direct * fromBarrel - cross * fromFace) / (direct ** 2 - cross ** 2);
      } else if (barrelIsFree) {
        radial[node] = (fromBarrel - cross * axial[node]) / direct;
      }
      if (onFace) axial[node] = (fromFace - cross * radial[node]) / direct;
    }
  }
  return largest;
}
