import {
  type BoundaryTemperatures,
  type CellCount,
  type ContactModel,
  type RodConduction,
  type RodGrid,
  type RodHeatModel,
  type SideModel,
  assembleRod,
  heatSource,
  makeRodGrid,
} from '../heat';
import { type BeamProfile, axialDeposit, beamRadii, ringShares } from '../pump';
import type { ReferenceInputs } from './reference-format';

/** Cells fine enough for every output within 0.05 % of the peak rise; measured in tests/reference. */
export const referenceCells: CellCount = { nr: 48, nz: 80 };

/** A reference problem ready to solve. */
export interface ReferenceRod {
  conduction: RodConduction;
  /** W per cell. */
  heat: Float64Array;
  boundary: BoundaryTemperatures;
}

/** Lays the grid of a reference problem, assembles it and finds the heat in every cell. */
export function referenceRod(inputs: ReferenceInputs, cells: CellCount): ReferenceRod {
  const { pump, boundary } = inputs;
  const model = referenceModel(inputs);
  const grid = makeRodGrid(model, { pumpRadius: pump.w0_m, absorptionCoefficient: pump.alpha_1_m, cells });
  const base = boundary.side.type === 'holder' ? boundary.side.outer.T_K : boundary.side.T_K;
  return {
    conduction: assembleRod(model, grid),
    heat: referenceSource(inputs, grid),
    boundary: {
      side: base,
      front: boundary.front.type === 'film' ? boundary.front.T_K : base,
      back: boundary.back.type === 'film' ? boundary.back.T_K : base,
    },
  };
}

/** Radius at which the pump ends abruptly, m; undefined for profiles without an edge. */
export function referenceEdge({ pump }: ReferenceInputs): number | undefined {
  return pump.profile === 'tophat' ? pump.w0_m : undefined;
}

/** The rod of a reference problem in this project's terms. */
function referenceModel({ geometry, material, boundary }: ReferenceInputs): RodHeatModel {
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
