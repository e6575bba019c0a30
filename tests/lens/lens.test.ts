import { describe, expect, it } from 'vitest';
import type { cellPresets } from '../../src/heat';
import {
  aberrationLoss,
  fitLens,
  fitProfile,
  opticalPathProfile,
  prepareLens,
  profileAt,
  weighLens,
} from '../../src/lens';
import type { BeamProfile } from '../../src/pump';
import { evenlyPumpedRod, plainRod, pumpedRod } from '../heat/rod';

const gaussian: BeamProfile = { kind: 'gaussian' };
const pump = { profile: gaussian, radius: 0.25e-3, absorptionCoefficient: 350, heat: 4 };
const off = (got: number, expected: number) => Math.abs(got / expected - 1);

function lens(field: ReturnType<typeof pumpedRod>, modeRadius: number, edge?: number) {
  return fitLens(field, weighLens(prepareLens(field.grid, edge), modeRadius));
}

describe('thermal lens of a temperature field', () => {
  it('halving the heat doubles the focal length', () => {
    const full = lens(pumpedRod(plainRod, pump, 'study'), 0.2e-3);
    const half = lens(pumpedRod(plainRod, { ...pump, heat: 2 }, 'study'), 0.2e-3);
    expect(full.power).toBeCloseTo(2 * half.power, 6);
  });

  it('does not depend on the absorption coefficient, the mount or the base temperature (insulated ends, constant conductivity)', () => {
    const share = (alpha: number) => 1 - Math.exp(-alpha * plainRod.dopedLength);
    const of = (alpha: number, side: typeof plainRod.side, base: number) => {
      const field = pumpedRod(
        { ...plainRod, side },
        { ...pump, absorptionCoefficient: alpha, heat: 4 / share(alpha) },
        'study',
        {
          side: base,
          front: base,
          back: base,
        },
      );
      return lens(field, 0.2e-3).power;
    };
    const first = of(100, { kind: 'fixed' }, 280);
    // Only rounding differs: the flux between cells is fixed by the heat inside them.
    expect(off(of(3000, { kind: 'fixed' }, 280), first)).toBeLessThan(1e-9);
    expect(off(of(100, { kind: 'contact', conductance: 2500 }, 330), first)).toBeLessThan(1e-9);
  });

  it('slices add up to the whole, and lie where the heat is', () => {
    const { power, slicePowers, axisPower, axisSlicePowers } = lens(
      pumpedRod(plainRod, pump, 'study'),
      0.2e-3,
    );
    expect(
      off(
        slicePowers.reduce((a, b) => a + b),
        power,
      ),
    ).toBeLessThan(1e-12);
    expect(
      off(
        axisSlicePowers.reduce((a, b) => a + b),
        axisPower,
      ),
    ).toBeLessThan(1e-12);
    expect(slicePowers.every((slice) => slice > 0)).toBe(true);
  });

  it('the fit of the profile gives the same power as the face fluxes', () => {
    const field = pumpedRod(plainRod, pump, 'study');
    const geometry = prepareLens(field.grid);
    for (const modeRadius of [0.05e-3, 0.2e-3, 0.9e-3]) {
      const weights = weighLens(geometry, modeRadius);
      const fitted = fitProfile(weights, opticalPathProfile(field, geometry));
      // The same quadrature read forwards and backwards; cancellation in the widest fit costs digits.
      expect(off(fitted.power, fitLens(field, weights).power)).toBeLessThan(1e-9);
    }
  });

  it('is the same on every grid: study and standard agree with fine within 0.05 % for wide and tight pumps', () => {
    for (const radius of [0.05e-3, 0.25e-3, 1e-3])
      for (const profile of [gaussian, { kind: 'flat-top' } as const]) {
        const edge = profile.kind === 'flat-top' ? radius : undefined;
        const power = (cells: keyof typeof cellPresets) =>
          lens(pumpedRod(plainRod, { ...pump, profile, radius }, cells), radius, edge).power;
        const fine = power('fine');
        expect(off(power('standard'), fine)).toBeLessThan(5e-4);
        expect(off(power('study'), fine)).toBeLessThan(5e-4);
      }
  });

  it('end caps leave the lens unchanged (caps conduct but are not heated, ends insulated)', () => {
    const capped = { ...plainRod, frontCap: 3e-3, backCap: 2e-3 };
    const plain = lens(pumpedRod(plainRod, pump, 'standard'), 0.2e-3).power;
    expect(off(lens(pumpedRod(capped, pump, 'standard'), 0.2e-3).power, plain)).toBeLessThan(1e-9);
  });

  it('conductivity falling with temperature strengthens the lens', () => {
    const falling = pumpedRod({ ...plainRod, conductivityExponent: 1 }, pump, 'study', {
      side: 300,
      front: 300,
      back: 300,
    });
    expect(lens(falling, 0.2e-3).power).toBeGreaterThan(
      1.05 * lens(pumpedRod(plainRod, pump, 'study'), 0.2e-3).power,
    );
  });
});

describe('aberration', () => {
  it('is nothing for a parabola, and grows as the square of a small residual phase', () => {
    const field = pumpedRod(plainRod, pump, 'standard');
    const geometry = prepareLens(field.grid);
    const weights = weighLens(geometry, 0.3e-3);
    const parabola = geometry.squares.map((s) => 3e-8 - 4 * s);
    expect(aberrationLoss(weights, parabola, fitProfile(weights, parabola), 1e-6)).toBeLessThan(1e-20);
    const path = opticalPathProfile(field, geometry).map((value) => value * 1e-7);
    const loss = (scale: number) => {
      const scaled = path.map((value) => value * scale);
      return aberrationLoss(weights, scaled, fitProfile(weights, scaled), 1064e-9);
    };
    const fit = fitProfile(weights, path);
    const phase = (2 * Math.PI * fit.residualRms) / 1064e-9;
    // Small phases: 1 - |<exp(i phi)>|^2 = <phi^2> (Marechal's relation; Born & Wolf, section 9.1, from memory).
    expect(off(loss(1), phase ** 2)).toBeLessThan(1e-3);
    expect(off(loss(2), 4 * loss(1))).toBeLessThan(1e-2);
    expect(loss(1e5)).toBeLessThanOrEqual(1);
  });

  it('Gaussian pump and equal mode: the residual equals that of the closed form Ein, integrated directly', () => {
    // OPD = -(dn/dT) P/(4 pi k) Ein(2 r2/w2) (Innocenzi et al. 1990, from memory). With x = 2 r2/w2 and weight exp(-x)
    // what the best line leaves of Ein is sqrt(<Ein^2> - <Ein>^2 - <(x - 1) Ein>^2).
    const field = evenlyPumpedRod(plainRod, gaussian, 80e-6, 200, 'standard');
    const geometry = prepareLens(field.grid);
    const fit = fitProfile(weighLens(geometry, 80e-6), opticalPathProfile(field, geometry));
    const unit = (200 * 10e-3) / (4 * Math.PI * 10);
    expect(fit.residualRms / unit).toBeCloseTo(directResidual(), 3);
  });
});

/** Residual of Ein(x) over exp(-x) after its best line, by Simpson's rule on 0 ... 40. */
function directResidual(): number {
  const n = 40000;
  const h = 40 / n;
  let ein = 0;
  const sums = [0, 0, 0];
  let slopeBefore = 1;
  for (let k = 0; k <= n; k++) {
    const x = k * h;
    const slope = x === 0 ? 1 : (1 - Math.exp(-x)) / x;
    if (k > 0) ein += (h * (slope + slopeBefore)) / 2;
    slopeBefore = slope;
    const weight = (Math.exp(-x) * h * (k === 0 || k === n ? 1 : k % 2 === 0 ? 2 : 4)) / 3;
    sums[0] = sums[0]! + weight * ein;
    sums[1] = sums[1]! + weight * ein * ein;
    sums[2] = sums[2]! + weight * ein * (x - 1);
  }
  return Math.sqrt(sums[1]! - sums[0]! ** 2 - sums[2]! ** 2);
}

describe('reading a profile', () => {
  it('is zero on the axis and falls outwards to the barrel', () => {
    const field = pumpedRod(plainRod, pump, 'standard');
    const geometry = prepareLens(field.grid);
    const profile = opticalPathProfile(field, geometry);
    expect(profileAt(geometry, profile, 0)).toBeCloseTo(0, 12);
    let before = 0;
    for (let r = 0.05e-3; r <= plainRod.radius; r += 0.05e-3) {
      const here = profileAt(geometry, profile, r);
      expect(here).toBeLessThan(before);
      before = here;
    }
  });
});
