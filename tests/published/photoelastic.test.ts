import { describe, expect, it } from 'vitest';
import {
  assembleElastic,
  curvatureWeights,
  elasticPresets,
  makeElasticMesh,
  planeStrainStress,
  solveElastic,
} from '../../src/elastic';
import { photoelasticPaths, photoelasticPower, stressAlongRod } from '../../src/lens/photoelastic';
import { uniformRodCoefficients, uniformRodPower } from '../../src/lens/uniform-rod';

// Nd:YAG as in Koechner, Appl. Opt. 9, 1429 (1970); p from Dixon, J. Appl. Phys. 38, 5149 (1967); both from memory.
const elastic = { youngsModulus: 310e9, poissonRatio: 0.25, expansion: 7.5e-6 };
const p = { p11: -0.029, p12: 0.0091, p44: -0.0615 };
const constants = { ...elastic, ...p, refractiveIndex: 1.82 };
const rod = {
  thermalConductivity: 14,
  heat: 100,
  radius: 3.15e-3,
  thermoOptic: 7.3e-6,
  expansion: elastic.expansion,
  refractiveIndex: 1.82,
};

describe('evenly heated Nd:YAG rod (Koechner, Appl. Opt. 9, 1429 (1970), from memory)', () => {
  it('has C_r = 0.017 and C_phi = -0.0025', () => {
    const { radial, tangential } = uniformRodCoefficients(0.25, p);
    // Two digits are printed.
    expect(radial).toBeCloseTo(0.017, 3);
    expect(tangential).toBeCloseTo(-0.0025, 4);
  });

  it('focuses at 0.98767 m (radial) and 1.23387 m (tangential) with stress, 1.19566 m without', () => {
    expect(1 / uniformRodPower(rod, 0.017)).toBeCloseTo(0.98767, 5);
    expect(1 / uniformRodPower(rod, -0.0025)).toBeCloseTo(1.23387, 5);
    expect(1 / uniformRodPower(rod, 0)).toBeCloseTo(1.19566, 5);
  });

  it('focuses at 0.93312 and 1.14989 m with the ends of a rod of 75 mm', () => {
    const withEnds = { ...rod, length: 75e-3 };
    expect(1 / uniformRodPower(withEnds, 0.017)).toBeCloseTo(0.93312, 5);
    expect(1 / uniformRodPower(withEnds, -0.0025)).toBeCloseTo(1.14989, 5);
  });
});

const heatDensity = rod.heat / (Math.PI * rod.radius ** 2 * 75e-3);
/** K above the barrel: Q (a^2 - r^2)/(4 k). */
const rise = (r: number) => (heatDensity / (4 * rod.thermalConductivity)) * (rod.radius ** 2 - r ** 2);
/** Dioptric power per metre of rod of a coefficient C, from Delta n = -(n^3/2)(alpha Q/k) C r^2. */
const perLength = (coefficient: number) =>
  (1.82 ** 3 * elastic.expansion * heatDensity * coefficient) / rod.thermalConductivity;

describe('the [111] tensor on the stress of a long, evenly heated rod', () => {
  const expected = uniformRodCoefficients(elastic.poissonRatio, p);

  it("gives Koechner's coefficients from the closed-form stress, with the elastic strain and not with the total one", () => {
    const radii = Float64Array.from({ length: 9 }, (_, i) => (i * rod.radius) / 8);
    const mean = rise(0) / 2;
    const sections = Array.from(radii, (r) =>
      planeStrainStress(elastic, mean, (rise(0) + rise(r)) / 2, rise(r)),
    );
    const of = (key: 'radial' | 'hoop' | 'axial') => Float64Array.from(sections, (section) => section[key]);
    const stress = { radii, radial: of('radial'), hoop: of('hoop'), axial: of('axial') };
    const paths = photoelasticPaths(stress, constants);
    const curvature = (path: Float64Array) => (-2 * (path[8]! - path[0]!)) / rod.radius ** 2;
    // Both are exact; only rounding is left.
    expect(curvature(paths.radial) / perLength(expected.radial)).toBeCloseTo(1, 10);
    expect(curvature(paths.tangential) / perLength(expected.tangential)).toBeCloseTo(1, 10);
    // Free expansion counted again would shift both by (p11 + 2 p12)/4, more than the whole tangential coefficient.
    const shift = (p.p11 + 2 * p.p12) / 4;
    expect(Math.abs(shift)).toBeGreaterThan(Math.abs(expected.tangential));
    // Against the two printed digits: half a unit of the last of them.
    expect(curvature(paths.radial) / perLength(1)).toBeCloseTo(0.017, 3);
    expect(curvature(paths.tangential) / perLength(1)).toBeCloseTo(-0.0025, 4);
  });

  it('gives them from finite elements for the stretch by which one long rod is longer than another', () => {
    // The ends of both are alike, so they drop out of the difference.
    const power = (length: number) => {
      const mesh = makeElasticMesh({
        radius: rod.radius,
        length,
        pumpRadius: rod.radius,
        ...elasticPresets.study,
        axialElements: 24,
      });
      const model = { constants: elastic, referenceTemperature: 0, barrel: { kind: 'free' } as const };
      const stress = stressAlongRod(solveElastic(assembleElastic(model, mesh), (r) => rise(r)));
      return photoelasticPower(photoelasticPaths(stress, constants), curvatureWeights(mesh, 2e-3));
    };
    const [short, long] = [power(30e-3), power(45e-3)];
    const stretch = (key: 'radial' | 'tangential') => (long[key] - short[key]) / 15e-3 / perLength(1);
    // Stress of these elements is 0.3 % off; the tangential coefficient is a small difference of terms near 0.01.
    expect(Math.abs(stretch('radial') / expected.radial - 1)).toBeLessThan(0.005);
    expect(Math.abs(stretch('tangential') - expected.tangential)).toBeLessThan(1e-4);
  });
});
