import * as v from 'valibot';

const positive = v.pipe(v.number(), v.finite(), v.gtValue(0));
const notNegative = v.pipe(v.number(), v.finite(), v.minValue(0));
const temperature = v.pipe(v.number(), v.finite(), v.gtValue(0), v.maxValue(5000));

const fixed = v.object({ type: v.literal('fixedT'), T_K: temperature });
const conductance = v.object({ type: v.literal('conductance'), T_K: temperature, h_W_m2K: positive });
const contact = v.variant('type', [fixed, conductance]);
const holder = v.object({
  type: v.literal('holder'),
  b_m: positive,
  k_h_W_mK: positive,
  h_c_W_m2K: positive,
  outer: contact,
});
const end = v.variant('type', [
  v.object({ type: v.literal('insulated') }),
  v.object({ type: v.literal('film'), h_W_m2K: notNegative, T_K: temperature }),
]);

const inputs = v.object({
  geometry: v.object({
    a_m: positive,
    L_doped_m: positive,
    cap_front_m: v.optional(notNegative, 0),
    cap_back_m: v.optional(notNegative, 0),
  }),
  material: v.object({
    k_r_W_mK: positive,
    k_z_W_mK: positive,
    k_exponent: v.optional(v.pipe(v.number(), v.minValue(-3), v.maxValue(3)), 0),
    k_Tref_K: v.optional(temperature, 300),
    dn_dT_1_K: v.pipe(v.number(), v.finite()),
    n: v.pipe(v.number(), v.minValue(1), v.maxValue(10)),
    rho_kg_m3: v.optional(positive),
    cp_J_kgK: v.optional(positive),
  }),
  pump: v.object({
    P0_W: notNegative,
    eta_h: v.pipe(notNegative, v.maxValue(1)),
    alpha_1_m: positive,
    w0_m: positive,
    profile: v.picklist(['gaussian', 'supergaussian', 'tophat']),
    order: v.optional(v.pipe(v.number(), v.minValue(0.5), v.maxValue(100))),
    M2: v.nullish(positive),
    lambda_m: v.optional(positive),
    z_waist_m: v.optional(v.pipe(v.number(), v.finite())),
  }),
  boundary: v.object({ side: v.variant('type', [fixed, conductance, holder]), front: end, back: end }),
  lens: v.object({ w_m_m: positive }),
  elastic: v.optional(
    v.object({
      E_Pa: positive,
      nu: v.pipe(v.number(), v.minValue(0), v.maxValue(0.49)),
      alpha_T_1_K: v.pipe(v.number(), v.finite()),
      T_ref_K: temperature,
    }),
  ),
  time: v.optional(
    v.object({
      mode: v.picklist(['step', 'square']),
      T_initial_K: temperature,
      output_times_s: v.pipe(v.array(positive), v.minLength(1)),
      period_s: v.optional(positive),
      duty: v.optional(v.pipe(v.number(), v.gtValue(0), v.ltValue(1))),
    }),
  ),
  outputs: v.optional(
    v.object({
      sample_points_m: v.optional(v.array(v.tuple([notNegative, notNegative])), []),
      I_radii_m: v.optional(v.array(notNegative), []),
    }),
    {},
  ),
});

/** The `inputs` of a reference problem: a cylindrical rod, its pump, its cooling; SI, names carry the unit. */
export type ReferenceInputs = v.InferOutput<typeof inputs>;

/** A reference problem read, or one sentence saying what is wrong with it. */
export type ReferenceReading = { ok: true; inputs: ReferenceInputs } | { ok: false; reason: string };

/**
 * Reads a reference problem from parsed JSON: either its inputs alone, or a result file that holds them under `inputs`.
 * Keys that the rod problem does not use are passed over.
 */
export function readReferenceCase(json: unknown): ReferenceReading {
  if (typeof json !== 'object' || json === null || Array.isArray(json))
    return refuse('The case must be a JSON object.');
  const parsed = v.safeParse(inputs, 'inputs' in json ? json.inputs : json);
  if (!parsed.success) {
    const issue = parsed.issues[0];
    return refuse(`${v.getDotPath(issue) ?? 'The case'}: ${issue.message}.`);
  }
  return consistent(parsed.output);
}

function refuse(reason: string): ReferenceReading {
  return { ok: false, reason };
}

/** What one field cannot say by itself. */
function consistent(problem: ReferenceInputs): ReferenceReading {
  const { geometry, pump, boundary, outputs } = problem;
  const length = geometry.cap_front_m + geometry.L_doped_m + geometry.cap_back_m;
  const { side } = boundary;
  if (pump.profile === 'supergaussian' && pump.order === undefined)
    return refuse('pump.order: a super-Gaussian profile needs its order.');
  if (typeof pump.M2 === 'number' && (pump.lambda_m === undefined || pump.z_waist_m === undefined))
    return refuse('pump.M2: a diverging beam needs lambda_m and z_waist_m as well.');
  if (side.type === 'holder' && side.b_m <= geometry.a_m)
    return refuse(`boundary.side.b_m: the holder's outer radius must exceed the rod's, ${geometry.a_m} m.`);
  const outside = outputs.sample_points_m.find(([r, z]) => r > geometry.a_m || z > length);
  if (outside)
    return refuse(`outputs.sample_points_m: the point (${outside.join(', ')}) m lies outside the rod.`);
  const wide = outputs.I_radii_m.find((r) => r > geometry.a_m);
  if (wide !== undefined) return refuse(`outputs.I_radii_m: ${wide} m lies outside the rod.`);
  return consistentTime(problem);
}

function consistentTime(problem: ReferenceInputs): ReferenceReading {
  const { time, material, boundary } = problem;
  if (time === undefined) return { ok: true, inputs: problem };
  if (material.rho_kg_m3 === undefined || material.cp_J_kgK === undefined)
    return refuse('material: a problem in time needs rho_kg_m3 and cp_J_kgK.');
  if (material.k_exponent !== 0)
    return refuse('material.k_exponent: a problem in time needs a constant conductivity, 0.');
  if (boundary.side.type === 'holder') return refuse('boundary.side: a problem in time takes no holder.');
  if (time.mode === 'square' && (time.period_s === undefined || time.duty === undefined))
    return refuse('time: a square wave needs period_s and duty.');
  return { ok: true, inputs: problem };
}
