import {
  type ElasticOutputs,
  assembleElastic,
  elasticOutputs,
  elasticPresets,
  makeElasticMesh,
  rodTemperature,
  rodTemperatureMap,
  solveElastic,
} from '../elastic';
import type { RodField } from '../heat';
import type { ReferenceInputs } from './reference-format';

/**
 * Displacement and stress of a reference problem on its steady temperature field, traction-free all over; undefined when
 * the problem gives no elastic constants. Faces are read at I_radii_m; stresses on the axis at the front face and, at
 * radii 0, a/2 and a, at half and a quarter of the length.
 */
export function referenceElastic(inputs: ReferenceInputs, field: RodField): ElasticOutputs | undefined {
  const { elastic, geometry, pump, outputs } = inputs;
  if (elastic === undefined) return undefined;
  const { a_m: radius, cap_front_m: heatedFrom } = geometry;
  const heatedTo = heatedFrom + geometry.L_doped_m;
  const length = heatedTo + geometry.cap_back_m;
  const mesh = makeElasticMesh({
    radius,
    length,
    heatedFrom,
    heatedTo,
    pumpRadius: pump.w0_m,
    ...elasticPresets.report,
  });
  const constants = {
    youngsModulus: elastic.E_Pa,
    poissonRatio: elastic.nu,
    expansion: elastic.alpha_T_1_K,
  };
  const assembled = assembleElastic(
    { constants, referenceTemperature: elastic.T_ref_K, barrel: { kind: 'free' } },
    mesh,
  );
  const temperature = rodTemperature(rodTemperatureMap(assembled, field.conduction), field);
  return elasticOutputs(solveElastic(assembled, temperature), outputs.I_radii_m, [
    [0, 0],
    [0, length / 2],
    [radius / 2, length / 2],
    [radius, length / 2],
    [radius, length / 4],
    [radius / 2, length / 4],
  ]);
}
