import { NumericalError } from '../errors';
import type { ElasticOutputs } from '../elastic';
import { type CellCount, type RodField, meanWithin, solveRod, temperatureAt } from '../heat';
import { fitProfile, opticalPathProfile, prepareLens, profileAt, weighLens } from '../lens';
import { referenceElastic } from './reference-elastic';
import type { ReferenceInputs } from './reference-format';
import { referenceCells, referenceEdge, referenceRod } from './reference-rod';

/** Answers of a reference problem; names carry the unit. */
export interface ReferenceOutputs extends Partial<ElasticOutputs> {
  T_max_K: number;
  T_max_z_m: number;
  T_max_r_m: number;
  T_mean_pumped_cylinder_K: number;
  samples_T_K: { r_m: number; z_m: number; T_K: number }[];
  I_of_r: { r_m: number; I_K_m: number }[];
  T_surface_side_mid_K: number;
  T_front_center_K: number;
  T_back_center_K: number;
  T_holder_inner_mid_K?: number;
  T_holder_outer_mid_K?: number;
  lens: { c0_m: number; c2_1_m: number; f_m: number; opd_rms_residual_m: number };
  balance: {
    Q_generated_W: number;
    Q_out_front_W: number;
    Q_out_back_W: number;
    Q_out_side_W: number;
    residual_W: number;
  };
}

/**
 * Solves a reference problem: steady temperatures, thermo-optic lens, heat balance; displacement and stress where elastic
 * constants are given.
 * @param inputs from readReferenceCase
 * @param cells finer or coarser than the default, to see the order of convergence
 * @throws NumericalError when no steady temperature exists or the solution does not converge
 */
export function solveReferenceCase(
  inputs: ReferenceInputs,
  cells: CellCount = referenceCells,
): ReferenceOutputs {
  const field = solveReferenceField(inputs, cells);
  if (!Number.isFinite(field.peakTemperature))
    throw new NumericalError('steady temperature of the rod: no temperature conducts this heat', NaN);
  const { a_m } = inputs.geometry;
  const length = field.grid.axialFaces[field.grid.nz]!;
  const { heatOut, generated } = field;
  return {
    T_max_K: field.peakTemperature,
    T_max_z_m: field.peakPosition.z,
    T_max_r_m: 0,
    T_mean_pumped_cylinder_K: meanWithin(field, Math.min(inputs.pump.w0_m, a_m)),
    samples_T_K: inputs.outputs.sample_points_m.map(([r, z]) => ({
      r_m: r,
      z_m: z,
      T_K: temperatureAt(field, r, z),
    })),
    ...lensOutputs(inputs, field),
    T_surface_side_mid_K: temperatureAt(field, a_m, length / 2),
    T_front_center_K: temperatureAt(field, 0, 0),
    T_back_center_K: temperatureAt(field, 0, length),
    ...holderOutputs(inputs, field, length / 2),
    balance: {
      Q_generated_W: generated,
      Q_out_front_W: heatOut.front,
      Q_out_back_W: heatOut.back,
      Q_out_side_W: heatOut.side,
      residual_W: generated - heatOut.front - heatOut.back - heatOut.side,
    },
    ...referenceElastic(inputs, field),
  };
}

/** Temperature field of a reference problem, for whatever else is to be read from it. */
export function solveReferenceField(inputs: ReferenceInputs, cells: CellCount = referenceCells): RodField {
  const { conduction, heat, boundary } = referenceRod(inputs, cells);
  return solveRod(conduction, heat, boundary);
}

function lensOutputs(inputs: ReferenceInputs, field: RodField): Pick<ReferenceOutputs, 'I_of_r' | 'lens'> {
  const { material, lens, outputs } = inputs;
  const geometry = prepareLens(field.grid, referenceEdge(inputs));
  const integral = opticalPathProfile(field, geometry);
  const path = integral.map((value) => value * material.dn_dT_1_K);
  const fit = fitProfile(weighLens(geometry, lens.w_m_m), path);
  return {
    I_of_r: outputs.I_radii_m.map((r) => ({ r_m: r, I_K_m: profileAt(geometry, integral, r) })),
    lens: { c0_m: fit.c0, c2_1_m: fit.c2, f_m: 1 / fit.power, opd_rms_residual_m: fit.residualRms },
  };
}

/** Temperatures on both surfaces of the ring at half length. */
function holderOutputs(
  { geometry, boundary }: ReferenceInputs,
  field: RodField,
  z: number,
): Pick<ReferenceOutputs, 'T_holder_inner_mid_K' | 'T_holder_outer_mid_K'> {
  if (boundary.side.type !== 'holder') return {};
  return {
    T_holder_inner_mid_K: temperatureAt(field, geometry.a_m * (1 + 1e-9), z),
    T_holder_outer_mid_K: temperatureAt(field, boundary.side.b_m, z),
  };
}
