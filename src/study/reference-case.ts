import {
  type CellCount,
  type ContactModel,
  type EndModel,
  type RodField,
  type RodHeatModel,
  type SideModel,
  assembleRod,
  heatSource,
  makeRodGrid,
  meanWithin,
  solveRod,
  temperatureAt,
} from '../heat';
import { axialDeposit, beamRadii, ringShares } from '../pump';
import type { BeamProfile } from '../pump';
import type { ReferenceInputs, ReferenceSide } from './reference-format';

function contact(side: { type: string; h_W_m2K?: number }): ContactModel {
  return side.type === 'fixedT' ? { kind: 'fixed' } : { kind: 'contact', conductance: side.h_W_m2K! };
}
function sideModel(side: ReferenceSide): SideModel {
  if (side.type !== 'holder') return contact(side);
  return { kind: 'ring', contactConductance: side.h_c_W_m2K, conductivity: side.k_h_W_mK, outerRadius: side.b_m, outer: contact(side.outer) };
}
function endModel(end: { type: string; h_W_m2K?: number }): EndModel {
  return end.type === 'insulated' ? { kind: 'insulated' } : { kind: 'film', coefficient: end.h_W_m2K! };
}
export function heatModel(inputs: ReferenceInputs): RodHeatModel {
  const { geometry: g, material: m, boundary: b } = inputs;
  return {
    radius: g.a_m, frontCap: g.cap_front_m, dopedLength: g.L_doped_m, backCap: g.cap_back_m,
    conductivityRadial: m.k_r_W_mK, conductivityAxial: m.k_z_W_mK, conductivityExponent: m.k_exponent,
    side: sideModel(b.side), front: endModel(b.front), back: endModel(b.back),
  };
}
export function profileOf(inputs: ReferenceInputs): BeamProfile {
  const { profile, order } = inputs.pump;
  return profile === 'tophat' ? { kind: 'flat-top' } : profile === 'supergaussian' ? { kind: 'super-gaussian', order: order! } : { kind: 'gaussian' };
}
export function solveField(inputs: ReferenceInputs, cells: CellCount): RodField {
  const { geometry: g, pump } = inputs;
  const model = heatModel(inputs);
  const grid = makeRodGrid(model, { pumpRadius: pump.w0_m, absorptionCoefficient: pump.alpha_1_m, cells });
  const conduction = assembleRod(model, grid);
  const doped = grid.axialFaces.slice(grid.dopedFrom, grid.dopedTo + 1);
  const channel = { share: 1, absorptionCoefficient: pump.alpha_1_m, wavelength: pump.lambda_m ?? 1e-6, polarisation: 'none' as const };
  const deposit = new Float64Array(grid.nz);
  deposit.set(axialDeposit([channel], doped, 1, 0), grid.dopedFrom);
  const radii = beamRadii(grid.axialFaces, { waistRadius: pump.w0_m, waistPosition: pump.z_waist_m ?? 0, beamQuality: pump.M2 ?? null, wavelength: pump.lambda_m ?? 1e-6, refractiveIndex: inputs.material.n });
  void g;
  const shares = ringShares(profileOf(inputs), grid.radialFaces, radii);
  const b = inputs.boundary;
  const sideT = b.side.type === 'holder' ? b.side.outer.T_K : b.side.T_K;
  const air = (end: { T_K?: number }) => end.T_K ?? sideT;
  return solveRod(conduction, heatSource(grid, shares, deposit, pump.eta_h * pump.P0_W), { side: sideT, front: air(b.front), back: air(b.back) });
}
export { meanWithin, temperatureAt };
