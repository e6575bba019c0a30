import { prepareCavity, type PreparedCavity } from '../cavity';
import type { ResolvedDesign, ResolvedMount } from '../design/resolved';
import {
  assembleRod,
  makeRodGrid,
  solveRod,
  type ContactModel,
  type GridWish,
  type RodConduction,
  type RodGrid,
  type RodHeatModel,
  type SideModel,
} from '../heat';
import { combineRings } from '../laser';
import {
  beamRadius,
  caseWindow,
  channelsAt,
  prepareAbsorption,
  type CaseWindow,
  type FocusedBeam,
} from '../pump';
import { DepositTable } from './deposit-table';
import { prepareElastic, type ElasticResponse } from './elastic-response';
import { spreadOf, type PumpSpread } from './pump-spread';
import { prepareLens, type PreparedLens } from './rod-lens';

/** Case temperatures over which the diode's window is sought, K. */
const caseSearch = { from: 253.15, to: 373.15 };

/** Heat that reaches the base, by reciprocity: share of the heat of each axial cell, and base-to-air conductance. */
export interface BaseHeat {
  /** Length nz. */
  sideShare: Float64Array;
  /** W/K from the base through rod and faces to the air. */
  conductance: number;
}

/** Everything of a design that does not change from one operating point to the next, factored and summed once. */
export interface PreparedDesign {
  resolved: ResolvedDesign;
  model: RodHeatModel;
  grid: RodGrid;
  conduction: RodConduction;
  /** The same with the conductivity it has at 300 K; the same object where the conductivity is constant. */
  linear: RodConduction;
  pump: PumpSpread;
  deposits: DepositTable;
  /** Whether absorption depends on the diode's wavelength at all. */
  drifts: boolean;
  caseWindow: CaseWindow;
  baseHeat: BaseHeat;
  elastic: ElasticResponse;
  lens: PreparedLens;
  cavity: PreparedCavity;
}

/** The barrel's way to the base: through the mount, or directly where there is none. */
function sideOf({ body, contactConductance }: ResolvedMount): SideModel {
  if (!body) return { kind: 'contact', conductance: contactConductance };
  const { conductivity, outerRadius, beyondRing } = body;
  const outer: ContactModel =
    beyondRing > 0
      ? { kind: 'contact', conductance: conductivity / (outerRadius * beyondRing) }
      : { kind: 'fixed' };
  return { kind: 'ring', contactConductance, conductivity, outerRadius, outer };
}

function heatModel({ rod, mount }: ResolvedDesign): RodHeatModel {
  const end =
    rod.faceFilm > 0 ? { kind: 'film' as const, coefficient: rod.faceFilm } : { kind: 'insulated' as const };
  return {
    radius: rod.radius,
    frontCap: rod.frontCap,
    dopedLength: rod.dopedLength,
    backCap: rod.backCap,
    conductivityRadial: rod.conductivityRadial,
    conductivityAxial: rod.conductivityAxial,
    conductivityExponent: rod.conductivityExponent,
    side: sideOf(mount),
    front: end,
    back: end,
  };
}

/** Reads the heat share from the field that a base one kelvin above the air makes: conduction is reciprocal. */
function baseHeatOf(conduction: RodConduction, pump: PumpSpread): BaseHeat {
  const { grid } = conduction;
  const { nr, nz, nRadial } = grid;
  const unit = solveRod(conduction, new Float64Array(nRadial * nz), { side: 1, front: 0, back: 0 });
  const sideShare = new Float64Array(nz);
  const stride = pump.heatShares.length > nr ? nr : 0;
  for (let j = 0; j < nz; j++)
    for (let i = 0; i < nr; i++)
      sideShare[j] = sideShare[j]! + pump.heatShares[j * stride + i]! * unit.temperatures[j * nRadial + i]!;
  return { sideShare, conductance: Math.max(0, unit.heatOut.front + unit.heatOut.back) };
}

function wavelengthRange({ pump }: ResolvedDesign): { from: number; to: number } {
  const ends = [caseSearch.from - 60, caseSearch.to + 200].map(
    (temperature) => pump.wavelength + pump.drift * (temperature - pump.referenceCaseTemperature),
  );
  return { from: Math.min(...ends), to: Math.max(...ends) };
}

function windowOf(resolved: ResolvedDesign): CaseWindow {
  const { pump, rod, limits } = resolved;
  return caseWindow({
    wavelength: pump.wavelength,
    referenceTemperature: pump.referenceCaseTemperature,
    drift: pump.drift,
    linewidth: pump.linewidth,
    polarisationShares: pump.polarisationShares,
    absorption: rod.absorption,
    length: rod.dopedLength,
    passes: pump.passes,
    returnReflectivity: pump.returnReflectivity,
    shareOfBest: limits.absorptionShare,
    search: caseSearch,
  });
}

/**
 * Factors conduction and elasticity, multiplies up the cavity and spreads the pump, once for a design.
 * @param cells grid of the rod; 'standard' serves every study
 * @param like a prepared design whose stiffness is used again where the rod is the same
 */
export function prepareDesign(
  resolved: ResolvedDesign,
  cells: GridWish['cells'] = 'standard',
  like?: PreparedDesign,
): PreparedDesign {
  const { pump, rod } = resolved;
  const model = heatModel(resolved);
  const range = wavelengthRange(resolved);
  const absorption = prepareAbsorption(
    pump.linewidth,
    pump.polarisationShares,
    rod.absorption,
    range.from,
    range.to,
  );
  const strongest = channelsAt(absorption, pump.wavelength).reduce(
    (most, channel) => Math.max(most, channel.absorptionCoefficient),
    0,
  );
  const beam: FocusedBeam = {
    waistRadius: pump.radius,
    waistPosition: pump.waistPosition,
    beamQuality: pump.beamQuality,
    wavelength: pump.wavelength,
    refractiveIndex: rod.refractiveIndex,
  };
  const narrowest = Math.min(
    ...[rod.frontCap, rod.frontCap + rod.dopedLength].map((z) => beamRadius(z, beam)),
    pump.radius,
  );
  const grid = makeRodGrid(model, {
    pumpRadius: Math.min(narrowest, 0.9 * rod.radius),
    absorptionCoefficient: strongest,
    cells,
    bothEnds: pump.passes === 2 || pump.backShare > 0,
  });
  const linear = assembleRod({ ...model, conductivityExponent: 0 }, grid);
  const conduction = rod.conductivityExponent === 0 ? linear : assembleRod(model, grid);
  const spread = spreadOf(resolved, grid, beam, absorption);
  const drifts = rod.absorption.kind !== 'coefficient';
  const deposits = new DepositTable(resolved, grid, absorption);
  return {
    resolved,
    model,
    grid,
    conduction,
    linear,
    pump: spread,
    deposits,
    drifts,
    caseWindow: windowOf(resolved),
    baseHeat: baseHeatOf(linear, spread),
    elastic: prepareElastic(
      resolved,
      conduction,
      spread,
      deposits.at(pump.wavelength),
      !drifts,
      like?.elastic,
    ),
    lens: prepareLens(resolved, grid),
    cavity: prepareCavity(resolved.cavity),
  };
}

/** Radial spread of the absorbed power for a given deposit along the rod. */
export const overlapRings = (prepared: PreparedDesign, deposit: Float64Array) =>
  combineRings(prepared.pump.overlapFaces, prepared.pump.overlapShares, deposit);
