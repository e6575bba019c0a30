import type { Cavity, CavityElement, RodOptics } from '../../src/cavity';
import { uniformRod } from '../../src/cavity';

/** Repeatable numbers in [0, 1) (mulberry32), so that a failing random cavity is found again. */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export const mirror = (radius = Infinity, incidence = 0): CavityElement => ({
  kind: 'mirror',
  radius,
  incidence,
  transmission: 0,
});
export const space = (length: number): CavityElement => ({ kind: 'space', length });
export const rodElement: CavityElement = { kind: 'rod' };

/** Two mirrors with the rod between two spaces; m. */
export function twoMirrors(radius1: number, length1: number, length2: number, radius2: number): Cavity {
  return {
    kind: 'linear',
    elements: [mirror(radius1), space(length1), rodElement, space(length2), mirror(radius2)],
  };
}

/** A rod of no length: a thin lens. */
export const thinLens = (power: number): RodOptics => uniformRod(0, 1, power);

/** A mirror radius between strongly convex and strongly concave, now and then flat. */
export function anyRadius(random: () => number): number {
  if (random() < 0.15) return Infinity;
  const size = 0.03 * 10 ** (2 * random());
  return random() < 0.3 ? -size : size;
}

/** Slices of random length and power of one sign, bulging faces, different in the two planes. */
export function anyRod(random: () => number, total: number): RodOptics {
  const count = 1 + Math.floor(12 * random());
  const lengths = Float64Array.from({ length: count }, () => 2e-4 + 2e-3 * random());
  const powers = () => {
    const raw = Float64Array.from({ length: count + 2 }, () => random());
    const sum = raw.reduce((all, one) => all + one, 0);
    return raw.map((one) => (one * total) / sum);
  };
  const [s, t] = [powers(), powers()];
  return {
    refractiveIndex: 1.4 + 0.9 * random(),
    sliceLengths: lengths,
    slicePowers: { sagittal: s.slice(2), tangential: t.slice(2) },
    frontPower: { sagittal: s[0]!, tangential: t[0]! },
    backPower: { sagittal: s[1]!, tangential: t[1]! },
  };
}

/** A folded cavity or a ring with lenses, plates and one or two rods. */
export function anyCavity(random: () => number, kind: 'linear' | 'ring'): Cavity {
  const inner: CavityElement[] = [];
  const count = 3 + Math.floor(5 * random());
  for (let i = 0; i < count; i++) {
    inner.push(space(0.01 + 0.2 * random()));
    const pick = random();
    if (pick < 0.35) inner.push(mirror(anyRadius(random), 0.4 * random()));
    else if (pick < 0.55)
      inner.push({ kind: 'lens', focalLength: (random() < 0.4 ? -1 : 1) * (0.05 + random()) });
    else if (pick < 0.75) {
      const refractiveIndex = 1.3 + random();
      inner.push({
        kind: 'plate',
        thickness: 0.01 * random(),
        refractiveIndex,
        incidence: Math.atan(refractiveIndex),
      });
    }
  }
  inner.splice(Math.floor(inner.length * random()), 0, { kind: 'rod', reversed: random() < 0.3 });
  if (random() < 0.25) inner.push(rodElement, space(0.05 * random()));
  if (kind === 'ring') return { kind, elements: [mirror(anyRadius(random), 0.3 * random()), ...inner] };
  return { kind, elements: [mirror(anyRadius(random)), ...inner, mirror(anyRadius(random))] };
}
