import { NumericalError } from '../errors';
import {
  type CellCount,
  type ContactModel,
  type RodField,
  type RodGrid,
  type RodHeatModel,
  type SideModel,
  assembleRod,
  heatSource,
  makeRodGrid,
  meanWithin,
  solveRod,
  temperatureAt,
} from '../heat';
import {
  type LensGeometry,
  fitProfile,
  opticalPathProfile,
  prepareLens,
  profileAt,
  weighLens,
} from '../lens';
import { type BeamProfile, axialDeposit, beamRadii, ringShares } from '../pump';
import type { ReferenceInputs } from './reference-format';

/** Cells fine enough for every output within 0.05 % of the peak rise; measured in tests/reference. */
const referenceCells: CellCount = { nr: 48, nz: 80 };

/** Answers of a reference problem; names carry the unit. */
export interface ReferenceOutputs {
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
 * Solves a reference problem: steady temperatures, thermo-optic lens, heat balance.
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
  };
}

/** Temperature field of a reference problem, for whatever else is to be read from it. */
export function solveReferenceField(inputs: ReferenceInputs, cells: CellCount = referenceCells): RodField {
  const { pump, boundary } = inputs;
  const model = referenceModel(inputs);
  const grid = makeRodGrid(model, { pumpRadius: pump.w0_m, absorptionCoefficient: pump.alpha_1_m, cells });
  const base = boundary.side.type === 'holder' ? boundary.side.outer.T_K : boundary.side.T_K;
  return solveRod(assembleRod(model, grid), referenceSource(inputs, grid), {
    side: base,
    front: boundary.front.type === 'film' ? boundary.front.T_K : base,
    back: boundary.back.type === 'film' ? boundary.back.T_K : base,
  });
}

/** The rod of a reference problem in this project's terms. */
export function referenceModel({ geometry, material, boundary }: ReferenceInputs): RodHeatModel {
  // Conductivities are given at k_Tref_K, the model wants them at 300 K.
  const at300 = Math.pow(material.k_Tref_K / 300, material.k_exponent);
  const end = (face: ReferenceInputs['boundary']['front']): RodHeatModel['front'] =>
    face.type === 'film' ? { kind: 'film', coefficient: face.h_W_m2K } : { kind: 'insulated' };
  return {
    radius: geometry.a_m,
    frontCap: geometry.cap_front_m,
    dopedLength: geometry.L_doped_m,
    backCap: geometry.cap_back_m,
    conductivityRadial: material.k_r_W_mK * at300,
    conductivityAxial: material.k_z_W_mK * at300,
    conductivityExponent: material.k_exponent,
    side: sideModel(boundary.side),
    front: end(boundary.front),
    back: end(boundary.back),
  };
}

type ReferenceSide = ReferenceInputs['boundary']['side'];

function sideModel(side: ReferenceSide): SideModel {
  if (side.type !== 'holder') return contactModel(side);
  return {
    kind: 'ring',
    contactConductance: side.h_c_W_m2K,
    conductivity: side.k_h_W_mK,
    outerRadius: side.b_m,
    outer: contactModel(side.outer),
  };
}

function contactModel(contact: Exclude<ReferenceSide, { type: 'holder' }>): ContactModel {
  return contact.type === 'fixedT' ? { kind: 'fixed' } : { kind: 'contact', conductance: contact.h_W_m2K };
}

/** Heat in every cell, W: exponential absorption, profile normalised over the infinite plane, width following the beam. */
function referenceSource({ pump, material }: ReferenceInputs, grid: RodGrid): Float64Array {
  const doped = grid.axialFaces.slice(grid.dopedFrom, grid.dopedTo + 1);
  const wavelength = pump.lambda_m ?? 1e-6;
  const channel = {
    share: 1,
    absorptionCoefficient: pump.alpha_1_m,
    wavelength,
    polarisation: 'none' as const,
  };
  const deposit = new Float64Array(grid.nz);
  deposit.set(axialDeposit([channel], doped, 1, 0), grid.dopedFrom);
  const radii = beamRadii(grid.axialFaces, {
    waistRadius: pump.w0_m,
    waistPosition: pump.z_waist_m ?? 0,
    beamQuality: pump.M2 ?? null,
    wavelength,
    refractiveIndex: material.n,
  });
  const shares = ringShares(beamProfile(pump), grid.radialFaces, radii);
  return heatSource(grid, shares, deposit, pump.eta_h * pump.P0_W);
}

function beamProfile(pump: ReferenceInputs['pump']): BeamProfile {
  if (pump.profile === 'tophat') return { kind: 'flat-top' };
  return pump.profile === 'gaussian'
    ? { kind: 'gaussian' }
    : { kind: 'super-gaussian', order: pump.order ?? 1 };
}

function lensOutputs(inputs: ReferenceInputs, field: RodField): Pick<ReferenceOutputs, 'I_of_r' | 'lens'> {
  const { pump, material, lens, outputs } = inputs;
  const geometry: LensGeometry = prepareLens(field.grid, pump.profile === 'tophat' ? pump.w0_m : undefined);
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
