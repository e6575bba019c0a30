import { describe, expect, it } from 'vitest';
import { readReferenceCase } from '../../src/study/reference-format';
import a1 from './A1.json';

const changed = (change: (inputs: typeof a1.inputs) => unknown) => {
  const inputs = structuredClone(a1.inputs);
  change(inputs);
  return readReferenceCase(inputs);
};

describe('reading a reference problem', () => {
  it('takes the inputs alone or a result file around them', () => {
    expect(readReferenceCase(a1)).toEqual(readReferenceCase(a1.inputs));
    expect(readReferenceCase(a1).ok).toBe(true);
  });

  it.each([
    ['a negative radius', (i: typeof a1.inputs) => (i.geometry.a_m = -1), /geometry\.a_m/],
    ['text for a number', (i: typeof a1.inputs) => Object.assign(i.pump, { P0_W: '20' }), /pump\.P0_W/],
    ['an unknown boundary', (i: typeof a1.inputs) => (i.boundary.side.type = 'sticky'), /boundary\.side/],
    ['a missing part', (i: typeof a1.inputs) => Object.assign(i, { material: undefined }), /material/],
    ['a super-Gaussian without order', (i: typeof a1.inputs) => (i.pump.profile = 'supergaussian'), /order/],
    [
      'a diverging beam without wavelength',
      (i: typeof a1.inputs) => Object.assign(i.pump, { M2: 2 }),
      /lambda_m/,
    ],
    [
      'a point outside the rod',
      (i: typeof a1.inputs) => (i.outputs.sample_points_m[0] = [1, 0]),
      /outside the rod/,
    ],
    ['a radius outside the rod', (i: typeof a1.inputs) => (i.outputs.I_radii_m[0] = 1), /outside the rod/],
  ])('refuses %s with one sentence that names the place', (_, change, place) => {
    const reading = changed(change);
    expect(reading.ok).toBe(false);
    if (!reading.ok) {
      expect(reading.reason).toMatch(place);
      expect(reading.reason).not.toMatch(/\n/);
    }
  });

  it('refuses what is no object at all', () => {
    for (const json of [null, 3, 'rod', []]) expect(readReferenceCase(json).ok).toBe(false);
  });

  it('refuses a holder thinner than the rod', () => {
    const reading = changed((i) =>
      Object.assign(i.boundary, {
        side: {
          type: 'holder',
          b_m: 1e-3,
          k_h_W_mK: 390,
          h_c_W_m2K: 1e4,
          outer: { type: 'fixedT', T_K: 290 },
        },
      }),
    );
    expect(reading.ok).toBe(false);
  });
});
