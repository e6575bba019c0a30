import { describe, expect, it } from 'vitest';
import {
  assembleElastic,
  elasticPresets,
  type ElasticModel,
  makeElasticMesh,
  peakTensile,
  planeStrainStress,
  planeStrainSurfaceHoop,
  planeStressSurfaceHoop,
  solveElastic,
  thermalShockParameter,
  uniformRodHeatLimit,
  valueAt,
} from '../../src/elastic';

const yag = { youngsModulus: 310e9, poissonRatio: 0.25, expansion: 7.5e-6 };
const heatPerLength = 1000;
const conductivity = 10;

// Steady conduction in a long rod heated evenly inside the radius w: T_mean - T_surface = P'/(4 pi k) (1 - w^2/(2 a^2)).
const meanAboveSurface = (share: number) =>
  (heatPerLength / (4 * Math.PI * conductivity)) * (1 - share ** 2 / 2);

describe('stress of a rod against published relations', () => {
  // Timoshenko & Goodier, Theory of Elasticity; the published figures have six digits.
  it('a rod heated evenly with 1000 W/m has 12.3345 MPa of hoop stress at its barrel when long', () => {
    expect(planeStrainSurfaceHoop(yag, meanAboveSurface(1), 0) / 1e6).toBeCloseTo(12.3345, 3);
  });

  // Timoshenko & Goodier, Theory of Elasticity.
  it('the same rod cut to a thin disk has 9.2509 MPa', () => {
    expect(planeStressSurfaceHoop(yag, meanAboveSurface(1), 0) / 1e6).toBeCloseTo(9.2509, 3);
  });

  // Timoshenko & Goodier, Theory of Elasticity.
  it('a top-hat of a fifth of the rod radius gives 24.1756 MPa long and 18.1317 MPa thin', () => {
    expect(planeStrainSurfaceHoop(yag, meanAboveSurface(0.2), 0) / 1e6).toBeCloseTo(24.1756, 3);
    expect(planeStressSurfaceHoop(yag, meanAboveSurface(0.2), 0) / 1e6).toBeCloseTo(18.1317, 3);
  });

  // Timoshenko & Goodier, Theory of Elasticity.
  it('the axis of the evenly heated long rod is under 6.1673 MPa across and 12.3345 MPa along', () => {
    const axisTemperature = 2 * meanAboveSurface(1);
    const axis = planeStrainStress(yag, meanAboveSurface(1), axisTemperature, axisTemperature);
    expect(axis.radial / 1e6).toBeCloseTo(-6.1673, 3);
    expect(axis.hoop / 1e6).toBeCloseTo(-6.1673, 3);
    expect(axis.axial / 1e6).toBeCloseTo(-12.3345, 3);
  });

  // Koechner, Solid-State Laser Engineering (from memory): 198.5 W/cm, four digits, so half a unit of the last one.
  it('a thermal shock parameter of 790 W/m stands 198.5 W/cm', () => {
    expect(uniformRodHeatLimit(790) / 100).toBeCloseTo(198.5, 1);
  });

  // Koechner, Solid-State Laser Engineering (from memory): the limit is the heat at which the barrel reaches sigma_f.
  it('at 8 pi R_T per length the barrel of the evenly heated rod is just at its strength', () => {
    const strength = 130e6;
    const limit = uniformRodHeatLimit(thermalShockParameter(yag, conductivity, strength));
    const hoop = planeStrainSurfaceHoop(yag, (meanAboveSurface(1) * limit) / heatPerLength, 0);
    expect(hoop / strength).toBeCloseTo(1, 12);
  });

  // Timoshenko & Goodier, Theory of Elasticity; the elements meet the closed form within their own 0.3 %.
  it('finite elements find 12.3345 MPa at the barrel and on the axis of a rod of ten diameters', () => {
    const { solution, mesh } = evenlyHeated(20 * radius);
    const at = (field: Float64Array, r: number) => valueAt(mesh, field, r, 10 * radius) / 1e6;
    expect(Math.abs(at(solution.hoop, radius) / 12.3345 - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.axial, radius) / 12.3345 - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.axial, 0) / -12.3345 - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.radial, 0) / -6.1673 - 1)).toBeLessThan(0.003);
  });

  // Timoshenko & Goodier, Theory of Elasticity, with the expansion along the axis kept apart in the derivation.
  it('unequal expansions give a long rod the barrel and axis stresses of the closed form', () => {
    const uniaxial = { ...yag, axialExpansion: 12e-6 };
    const { solution, mesh } = evenlyHeated(20 * radius, uniaxial);
    const barrel = planeStrainStress(uniaxial, meanAboveSurface(1), meanAboveSurface(1), 0);
    const axisRise = 2 * meanAboveSurface(1);
    const axis = planeStrainStress(uniaxial, meanAboveSurface(1), axisRise, axisRise);
    const at = (field: Float64Array, r: number) => valueAt(mesh, field, r, 10 * radius);
    expect(barrel.hoop).toBeCloseTo(planeStrainSurfaceHoop(uniaxial, meanAboveSurface(1), 0), 3);
    expect(Math.abs(at(solution.hoop, radius) / barrel.hoop - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.axial, radius) / barrel.axial - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.radial, 0) / axis.radial - 1)).toBeLessThan(0.003);
    expect(Math.abs(at(solution.axial, 0) / axis.axial - 1)).toBeLessThan(0.003);
  });

  // Timoshenko & Goodier, Theory of Elasticity; a disk of a twentieth of its diameter is thin to (1/10)^2 / 6.
  it('finite elements find 9.2509 MPa at the rim of a thin disk', () => {
    const { solution, mesh } = evenlyHeated(0.1 * radius);
    const rim = valueAt(mesh, solution.hoop, radius, 0.05 * radius) / 1e6;
    expect(Math.abs(rim / 9.2509 - 1)).toBeLessThan(0.005);
    expect(peakTensile(solution).r).toBe(radius);
  });
});

const radius = 1.5e-3;

/** A rod heated evenly: T falls by P'/(4 pi k) from axis to barrel. */
function evenlyHeated(length: number, constants: ElasticModel['constants'] = yag) {
  const mesh = makeElasticMesh({ radius, length, pumpRadius: radius, ...elasticPresets.study });
  const model = { constants, referenceTemperature: 300, barrel: { kind: 'free' } as const };
  const drop = heatPerLength / (4 * Math.PI * conductivity);
  const solution = solveElastic(assembleElastic(model, mesh), (r) => 300 + drop * (1 - (r / radius) ** 2));
  return { solution, mesh };
}
