import { type CellCount, advance, meanWithin, startWarmUp, temperatureAt } from '../heat';
import { fitLens, prepareLens, weighLens } from '../lens';
import type { ReferenceInputs } from './reference-format';
import { referenceEdge, referenceRod } from './reference-rod';

/** Hundreds of time steps ask for fewer cells; these keep 0.1 % of the rise, measured in tests/reference. */
const warmUpCells: CellCount = { nr: 32, nz: 44 };

/** Temperatures and lens at one instant; names carry the unit. */
export interface ReferenceInstant {
  t_s: number;
  /** On the axis at the pumped face and at half length. */
  T00_K: number;
  T0mid_K: number;
  /** Mean over the pumped cylinder. */
  Tmean_K: number;
  f_m: number;
}

type ReferenceTime = NonNullable<ReferenceInputs['time']>;

/**
 * Follows a reference problem in time from a uniform temperature, pump switched on or on and off.
 * @param inputs from readReferenceCase, with a `time` block
 * @throws Error when the inputs have no time block
 */
export function solveReferenceWarmUp(
  inputs: ReferenceInputs,
  cells: CellCount = warmUpCells,
): ReferenceInstant[] {
  const { time, material, pump, lens, geometry } = inputs;
  if (time === undefined) throw new Error('The reference problem has no time block.');
  const { conduction, heat, boundary } = referenceRod(inputs, cells);
  const capacity = { rod: (material.rho_kg_m3 ?? NaN) * (material.cp_J_kgK ?? NaN) };
  const warmUp = startWarmUp(conduction, capacity, boundary, time.T_initial_K);
  const weights = weighLens(prepareLens(conduction.grid, referenceEdge(inputs)), lens.w_m_m);
  const middle = (geometry.cap_front_m + geometry.L_doped_m + geometry.cap_back_m) / 2;
  const dark = new Float64Array(heat.length);
  const instants: ReferenceInstant[] = [];
  for (const end of [...time.output_times_s].sort((a, b) => a - b)) {
    let field = advance(warmUp, dark, 0);
    for (const { until, on, changed } of stretches(time, warmUp.time, end))
      field = advance(warmUp, on ? heat : dark, until - warmUp.time, changed);
    instants.push({
      t_s: end,
      T00_K: temperatureAt(field, 0, 0),
      T0mid_K: temperatureAt(field, 0, middle),
      Tmean_K: meanWithin(field, Math.min(pump.w0_m, geometry.a_m)),
      f_m: 1 / (fitLens(field, weights).power * material.dn_dT_1_K),
    });
  }
  return instants;
}

/** Cuts a span of time where the pump switches. */
function stretches(
  time: ReferenceTime,
  from: number,
  to: number,
): { until: number; on: boolean; changed: boolean }[] {
  const period = time.period_s;
  if (time.mode === 'step' || period === undefined) return [{ until: to, on: true, changed: false }];
  const duty = time.duty ?? 0.5;
  const parts: { until: number; on: boolean; changed: boolean }[] = [];
  // A switching instant met within rounding counts as passed.
  const slack = period * 1e-9;
  for (let start = from; start < to - slack;) {
    const cycle = Math.floor((start + slack) / period);
    const switchOff = (cycle + duty) * period;
    const on = start < switchOff - slack;
    const began = on ? cycle * period : switchOff;
    const until = Math.min(to, on ? switchOff : (cycle + 1) * period);
    parts.push({ until, on, changed: Math.abs(start - began) <= slack });
    start = until;
  }
  return parts;
}
