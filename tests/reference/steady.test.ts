import { describe, expect, it } from 'vitest';
import { solveReferenceCase } from '../../src/study/reference-case';
import { readReferenceCase } from '../../src/study/reference-format';
import a1 from './A1.json';
import a2 from './A2.json';
import a3 from './A3.json';
import a4 from './A4.json';
import a5 from './A5.json';
import a6 from './A6.json';

/** Difference over a scale, as a share. */
const share = (got: number, expected: number, scale: number) => Math.abs(got - expected) / scale;

// Everything is asked for within 0.1 %: of the peak rise (temperatures), of the value (lens), of the total heat (flows).
// The converged solutions themselves agree within 0.002 %.
const permitted = 1e-3;

for (const reference of [a1, a2, a3, a4, a5, a6]) {
  const { title } = reference.inputs;
  describe(`${reference.inputs.id}: ${title}`, () => {
    const reading = readReferenceCase(reference);
    if (!reading.ok) throw new Error(reading.reason);
    const { inputs } = reading;
    const outputs = solveReferenceCase(inputs);
    const expected = reference.outputs;
    const side = inputs.boundary.side;
    const rise = expected.T_max_K - (side.type === 'holder' ? side.outer.T_K : side.T_K);
    const heat = expected.balance.Q_generated_W;

    it('peak, pumped mean, barrel and face temperatures agree with the converged solution', () => {
      expect(share(outputs.T_max_K, expected.T_max_K, rise)).toBeLessThan(permitted);
      // The maximum is flat, so its place is known to a few micrometres only; a hundredth of the pump radius is asked for.
      expect(share(outputs.T_max_z_m, expected.T_max_z_m, inputs.pump.w0_m)).toBeLessThan(0.05);
      expect(share(outputs.T_mean_pumped_cylinder_K, expected.T_mean_pumped_cylinder_K, rise)).toBeLessThan(
        permitted,
      );
      for (const key of ['T_surface_side_mid_K', 'T_front_center_K', 'T_back_center_K'] as const)
        expect(share(outputs[key], expected[key], rise)).toBeLessThan(permitted);
    });

    it('temperatures agree at every listed point, on the axis, on the faces and on the barrel', () => {
      expected.samples_T_K.forEach((sample, k) =>
        expect(share(outputs.samples_T_K[k]!.T_K, sample.T_K, rise)).toBeLessThan(permitted),
      );
    });

    it('the thermo-optic lens agrees: focal length, what the parabola leaves, and the integral of temperature along the rod', () => {
      expect(share(outputs.lens.f_m, expected.lens.f_m, Math.abs(expected.lens.f_m))).toBeLessThan(permitted);
      const residual = expected.lens.opd_rms_residual_m;
      expect(share(outputs.lens.opd_rms_residual_m, residual, residual)).toBeLessThan(permitted);
      const drop = Math.abs(expected.I_of_r[expected.I_of_r.length - 1]!.I_K_m);
      expected.I_of_r.forEach((sample, k) =>
        expect(share(outputs.I_of_r[k]!.I_K_m, sample.I_K_m, drop)).toBeLessThan(permitted),
      );
    });

    it('the heat leaves through the same surfaces, and none is lost', () => {
      for (const key of ['Q_generated_W', 'Q_out_side_W', 'Q_out_front_W', 'Q_out_back_W'] as const)
        expect(share(outputs.balance[key], expected.balance[key], heat)).toBeLessThan(permitted);
      // A direct solver leaves rounding only.
      expect(Math.abs(outputs.balance.residual_W) / heat).toBeLessThan(1e-9);
    });
  });
}

describe('A6: the ring', () => {
  it('has the converged temperatures on both its surfaces', () => {
    const reading = readReferenceCase(a6.inputs);
    if (!reading.ok) throw new Error(reading.reason);
    const outputs = solveReferenceCase(reading.inputs);
    const rise = a6.outputs.T_max_K - 288.15;
    expect(share(outputs.T_holder_inner_mid_K!, a6.outputs.T_holder_inner_mid_K, rise)).toBeLessThan(
      permitted,
    );
    expect(share(outputs.T_holder_outer_mid_K!, a6.outputs.T_holder_outer_mid_K, rise)).toBeLessThan(
      permitted,
    );
  });
});
