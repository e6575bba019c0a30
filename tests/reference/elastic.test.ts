import { describe, expect, it } from 'vitest';
import {
  assembleElastic,
  elasticOutputs,
  elasticPresets,
  makeElasticMesh,
  rodTemperature,
  rodTemperatureMap,
  solveElastic,
  type ElasticOutputs,
  type ElementCount,
} from '../../src/elastic';
import { solveReferenceField } from '../../src/study/reference-case';
import { readReferenceCase } from '../../src/study/reference-format';
import s1 from './elastic-s1.json';
import s2 from './elastic-s2.json';
import v1 from './elastic-v1.json';

/** The parts of a reference problem that are read here. */
interface Reference {
  inputs: {
    id: string;
    title: string;
    geometry: { a_m: number; L_doped_m: number; cap_front_m: number; cap_back_m: number };
    pump: { w0_m: number };
    elastic: { E_Pa: number; nu: number; alpha_T_1_K: number; T_ref_K: number };
  };
  outputs: ElasticOutputs;
}

/** The rod of a reference problem, its temperature from the heat room, on a mesh of the given fineness. */
function solveReference(reference: Reference, elements: ElementCount): ElasticOutputs {
  const reading = readReferenceCase(reference);
  if (!reading.ok) throw new Error(reading.reason);
  const { geometry, pump, elastic } = reference.inputs;
  const heatedTo = geometry.cap_front_m + geometry.L_doped_m;
  const mesh = makeElasticMesh({
    radius: geometry.a_m,
    length: heatedTo + geometry.cap_back_m,
    heatedFrom: geometry.cap_front_m,
    heatedTo,
    pumpRadius: pump.w0_m,
    ...elements,
  });
  const assembled = assembleElastic(
    {
      constants: { youngsModulus: elastic.E_Pa, poissonRatio: elastic.nu, expansion: elastic.alpha_T_1_K },
      referenceTemperature: elastic.T_ref_K,
      barrel: { kind: 'free' },
    },
    mesh,
  );
  const field = solveReferenceField(reading.inputs);
  const { outputs } = reference;
  return elasticOutputs(
    solveElastic(assembled, rodTemperature(rodTemperatureMap(assembled, field.conduction), field)),
    outputs.front_face_uz_minus_axis_m.map(({ r_m }) => r_m),
    outputs.probe_stresses_Pa.map(({ r_m, z_m }) => [r_m, z_m] as const),
  );
}

const faces = ['front_face_uz_minus_axis_m', 'back_face_uz_minus_axis_m'] as const;
const extremes = [
  'radial_max',
  'radial_min',
  'hoop_max',
  'hoop_min',
  'axial_max',
  'axial_min',
  'von_mises_max',
] as const;
const stresses = ['sr', 'st', 'sz', 'trz'] as const;

const difference = (got: number, expected: number, scale: number) =>
  Math.abs(got - expected) / Math.abs(scale);
const largestOf = (face: { uz_m: number }[]) => Math.max(...face.map(({ uz_m }) => Math.abs(uz_m)));

// Converged solutions of two unrelated finite-element discretisations, which agree within 0.005 % (displacements) and
// 0.15 % of the largest equivalent stress (stresses). The temperatures here are this project's own.
describe.each([s1, s2, v1] satisfies Reference[])(
  '$inputs.id, displacement and stress: $inputs.title',
  (reference) => {
    const expected = reference.outputs;
    const got = solveReference(reference, elasticPresets.report);
    const equivalent = expected.von_mises_max.value_Pa;

    it('both faces bulge as in the converged solution within 0.5 % of their largest displacement', () => {
      for (const key of faces) {
        const scale = largestOf(expected[key]);
        expected[key].forEach(({ uz_m }, k) =>
          expect(difference(got[key][k].uz_m, uz_m, scale)).toBeLessThan(0.005),
        );
      }
    });

    it('the rod lengthens and widens as in the converged solution within 0.5 %', () => {
      for (const key of ['axis_elongation_m', 'u_r_side_mid_m', 'u_r_side_front_m'] as const) {
        expect(difference(got[key], expected[key], expected[key])).toBeLessThan(0.005);
      }
    });

    it('every extremum of the stresses is met within 1 % of itself, and lies where it should', () => {
      for (const key of extremes) {
        const { value_Pa, r_m, z_m } = expected[key];
        expect(difference(got[key].value_Pa, value_Pa, value_Pa)).toBeLessThan(0.01);
        // Extrema are flat: a tenth of the radius is as well as a place can be told.
        expect(Math.abs(got[key].r_m - r_m)).toBeLessThan(0.1 * reference.inputs.geometry.a_m);
        expect(Math.abs(got[key].z_m - z_m)).toBeLessThan(0.1 * reference.inputs.geometry.a_m);
      }
    });

    it('all four stresses are met at every listed point within 0.5 % of the largest equivalent stress', () => {
      expected.probe_stresses_Pa.forEach((probe, k) => {
        for (const key of stresses) {
          expect(difference(got.probe_stresses_Pa[k][key], probe[key], equivalent)).toBeLessThan(0.005);
        }
      });
    });
  },
);

describe.each([s1, v1] satisfies Reference[])('$inputs.id on the coarse mesh of studies', (reference) => {
  const expected = reference.outputs;
  const got = solveReference(reference, elasticPresets.study);

  it('the heated face bulges right within 0.5 % and the largest tension is right within 1 %', () => {
    const [key] = faces;
    const scale = largestOf(expected[key]);
    expected[key].forEach(({ uz_m }, k) =>
      expect(difference(got[key][k].uz_m, uz_m, scale)).toBeLessThan(0.005),
    );
    const { value_Pa } = expected.hoop_max;
    expect(difference(got.hoop_max.value_Pa, value_Pa, value_Pa)).toBeLessThan(0.01);
  });
});

describe('the middle of a long rod', () => {
  it('is in the generalised plane strain of the closed form within 0.5 %', () => {
    // Timoshenko & Goodier, Theory of Elasticity, with the rod's own temperature at mid-length.
    const { sr_axis, st_axis, sz_axis, st_side, sz_side } = v1.planeStrain;
    const probes = solveReference(v1, elasticPresets.report).probe_stresses_Pa;
    const at = (r: number) => probes.find(({ r_m, z_m }) => r_m === r && z_m === 0.012)!;
    expect(difference(at(0).sr, sr_axis, sr_axis)).toBeLessThan(0.005);
    expect(difference(at(0).st, st_axis, st_axis)).toBeLessThan(0.005);
    expect(difference(at(0).sz, sz_axis, sz_axis)).toBeLessThan(0.005);
    expect(difference(at(0.0015).st, st_side, st_side)).toBeLessThan(0.005);
    expect(difference(at(0.0015).sz, sz_side, sz_side)).toBeLessThan(0.005);
  });
});
