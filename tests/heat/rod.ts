import type { cellPresets } from '../../src/heat';
import {
  type BoundaryTemperatures,
  type CellCount,
  type RodField,
  type RodHeatModel,
  assembleRod,
  heatSource,
  makeRodGrid,
  solveRod,
} from '../../src/heat';
import { type BeamProfile, axialDeposit, ringShares } from '../../src/pump';

/** A rod for tests: insulated ends, fixed barrel, k = 10, radius 1.5 mm, length 10 mm. */
export const plainRod: RodHeatModel = {
  radius: 1.5e-3,
  frontCap: 0,
  dopedLength: 10e-3,
  backCap: 0,
  conductivityRadial: 10,
  conductivityAxial: 10,
  side: { kind: 'fixed' },
  front: { kind: 'insulated' },
  back: { kind: 'insulated' },
};

/** Pump of a test rod. */
export interface TestPump {
  profile: BeamProfile;
  radius: number;
  absorptionCoefficient: number;
  /** W of heat if all that enters were absorbed. */
  heat: number;
}

/** Field of a pumped rod; the barrel or base at 0 degC unless other boundary temperatures are given. */
export function pumpedRod(
  model: RodHeatModel,
  pump: TestPump,
  cells: keyof typeof cellPresets | CellCount = 'fine',
  boundary: BoundaryTemperatures = { side: 273.15, front: 273.15, back: 273.15 },
): RodField {
  const grid = makeRodGrid(model, {
    pumpRadius: pump.radius,
    absorptionCoefficient: pump.absorptionCoefficient,
    cells,
  });
  const doped = grid.axialFaces.slice(grid.dopedFrom, grid.dopedTo + 1);
  const channel = {
    share: 1,
    absorptionCoefficient: pump.absorptionCoefficient,
    wavelength: 808e-9,
    polarisation: 'none' as const,
  };
  const deposit = new Float64Array(grid.nz);
  deposit.set(axialDeposit([channel], doped, 1, 0), grid.dopedFrom);
  const shares = ringShares(pump.profile, grid.radialFaces, pump.radius);
  return solveRod(assembleRod(model, grid), heatSource(grid, shares, deposit, pump.heat), boundary);
}

/** The same with the heat spread evenly along the doped part, W/m. */
export function evenlyPumpedRod(
  model: RodHeatModel,
  profile: BeamProfile,
  radius: number,
  heatPerLength: number,
  cells: keyof typeof cellPresets | CellCount = 'fine',
): RodField {
  const grid = makeRodGrid(model, { pumpRadius: radius, absorptionCoefficient: 0, cells });
  const deposit = new Float64Array(grid.nz);
  for (let j = grid.dopedFrom; j < grid.dopedTo; j++)
    deposit[j] = (grid.axialFaces[j + 1]! - grid.axialFaces[j]!) / model.dopedLength;
  const shares = ringShares(profile, grid.radialFaces, radius);
  const heat = heatSource(grid, shares, deposit, heatPerLength * model.dopedLength);
  return solveRod(assembleRod(model, grid), heat, { side: 273.15, front: 273.15, back: 273.15 });
}
