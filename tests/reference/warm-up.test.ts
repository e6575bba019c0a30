import { describe, expect, it } from 'vitest';
import { readReferenceCase } from '../../src/study/reference-format';
import { solveReferenceWarmUp } from '../../src/study/reference-warm-up';
import t1 from './T1.json';
import t2 from './T2.json';

for (const reference of [t1, t2])
  describe(`${reference.inputs.id}: ${reference.inputs.title}`, () => {
    const reading = readReferenceCase(reference);
    if (!reading.ok) throw new Error(reading.reason);
    const outputs = solveReferenceWarmUp(reading.inputs);
    const rise = Math.max(...reference.outputs.map(({ T00_K }) => T00_K)) - 293.15;

    it('pumped face, middle and pumped mean follow the converged solution within 0.1 % of the largest rise', () => {
      reference.outputs.forEach((expected, k) => {
        expect(outputs[k]!.t_s).toBe(expected.t_s);
        for (const key of ['T00_K', 'T0mid_K', 'Tmean_K'] as const)
          expect(Math.abs(outputs[k]![key] - expected[key]) / rise).toBeLessThan(1e-3);
      });
    });

    it('so does the dioptric power, within 0.1 % of its largest', () => {
      const strongest = Math.max(...reference.outputs.map(({ f_m }) => 1 / f_m));
      reference.outputs.forEach(({ f_m }, k) =>
        expect(Math.abs(1 / outputs[k]!.f_m - 1 / f_m) / strongest).toBeLessThan(1e-3),
      );
    });
  });

describe('reading a problem in time', () => {
  const read = (change: (inputs: typeof t2.inputs) => unknown) => {
    const inputs = structuredClone(t2.inputs);
    change(inputs);
    const reading = readReferenceCase(inputs);
    return reading.ok ? '' : reading.reason;
  };
  it("refuses what it can't follow, naming the place", () => {
    expect(read((i) => Object.assign(i.material, { rho_kg_m3: undefined }))).toMatch(/rho_kg_m3/);
    expect(read((i) => (i.material.k_exponent = 1))).toMatch(/k_exponent/);
    expect(read((i) => Object.assign(i.time, { duty: undefined }))).toMatch(/duty/);
    expect(read(() => undefined)).toBe('');
  });

  it('has nothing to follow without a time block', () => {
    const reading = readReferenceCase({ ...t1.inputs, time: undefined });
    if (!reading.ok) throw new Error(reading.reason);
    expect(() => solveReferenceWarmUp(reading.inputs)).toThrow(/time block/);
  });
});
