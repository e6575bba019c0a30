import { describe, expect, it } from 'vitest';
import { fluorescenceFraction, heatFraction, laserOutput, pumpRings } from '../../src/laser';
import type { LaserInput } from '../../src/laser';
import type { BeamProfile } from '../../src/pump';

const photon = (wavelength: number) => (6.62607015e-34 * 299792458) / wavelength;

const vanadate: LaserInput = {
  absorbedPower: 11.9,
  pumpWavelength: 808e-9,
  laserWavelength: 1064e-9,
  emissionCrossSection: 1.14e-22,
  upperLifetime: 90e-6,
  pumpQuantumEfficiency: 0.97,
  pump: pumpRings({ kind: 'flat-top' }, 200e-6, 1.6e-3),
  modeRadius: 180e-6,
  outputTransmission: 0.05,
  otherLoss: 0.012,
  rodPasses: 2,
  reabsorption: null,
};
const ytterbium: LaserInput = {
  ...vanadate,
  absorbedPower: 11.7,
  pumpWavelength: 940e-9,
  laserWavelength: 1030e-9,
  emissionCrossSection: 2.1e-24,
  upperLifetime: 950e-6,
  pump: pumpRings({ kind: 'gaussian' }, 150e-6, 2e-3),
  modeRadius: 140e-6,
  outputTransmission: 0.1,
  reabsorption: { ionDensity: 7e26, lowerShare: 0.0465, upperShare: 0.7, length: 3e-3 },
};
const lasers = [
  { name: 'four-level', laser: vanadate },
  { name: 'quasi-three-level', laser: ytterbium },
];

/** Share of the excitations that stay in the ions, from the rate equation on a fine radial sum: 1 - int n / (tau R). */
function extractionByPopulation(
  laser: LaserInput,
  density: (r: number) => number,
  circulating: number,
): number {
  const f = laser.reabsorption === null ? 0 : laser.reabsorption.lowerShare / laser.reabsorption.upperShare;
  const rate = (laser.pumpQuantumEfficiency * laser.absorbedPower) / photon(laser.pumpWavelength);
  const ions = laser.reabsorption === null ? 0 : laser.reabsorption.ionDensity * laser.reabsorption.length;
  const w = laser.modeRadius;
  const n = 60_000;
  const step = 2e-3 / n;
  let excited = 0;
  for (let i = 0; i < n; i++) {
    const r = (i + 0.5) * step;
    const intensity =
      ((laser.rodPasses * circulating * 2) / (Math.PI * w * w)) * Math.exp((-2 * r * r) / (w * w));
    const perIon =
      (laser.emissionCrossSection * laser.upperLifetime * intensity) / photon(laser.laserWavelength);
    const population = (rate * laser.upperLifetime * density(r) + f * perIon * ions) / (1 + (1 + f) * perIon);
    excited += population * 2 * Math.PI * r * step;
  }
  return 1 - excited / (laser.upperLifetime * rate);
}

describe.each(lasers)('a $name laser', ({ laser }) => {
  const at = (change: Partial<LaserInput>) => laserOutput({ ...laser, ...change });
  const threshold = laserOutput(laser).thresholdAbsorbedPower!;

  it('closes its energy: absorbed = heat + fluorescence + output + intracavity loss', () => {
    for (const times of [0.5, 1.01, 3, 30]) {
      const absorbedPower = times * threshold;
      const { stimulatedPower, extraction } = at({ absorbedPower });
      const heat = { ...laser, fluorescenceWavelength: 1000e-9, radiativeEfficiency: 0.9, extraction };
      const sum = heatFraction(heat) + fluorescenceFraction(heat) + stimulatedPower / absorbedPower;
      // Rounding only.
      expect(Math.abs(sum - 1)).toBeLessThan(1e-12);
    }
  });

  it('splits stimulated power between coupler and loss in the ratio of their exponents', () => {
    const { outputPower, stimulatedPower } = at({});
    const [coupler, other] = [-Math.log(1 - laser.outputTransmission), -Math.log(1 - laser.otherLoss)];
    expect(outputPower / stimulatedPower).toBeCloseTo(coupler / (coupler + other), 12);
  });

  it('is dark up to threshold and rises steadily above', () => {
    expect(at({ absorbedPower: 0.999 * threshold })).toMatchObject({ outputPower: 0, extraction: 0 });
    let before = at({ absorbedPower: threshold });
    expect(before.outputPower).toBe(0);
    for (let times = 1.0001; times < 60; times *= 1.3) {
      const now = at({ absorbedPower: times * threshold });
      expect(now.outputPower).toBeGreaterThan(before.outputPower);
      expect(now.extraction).toBeGreaterThan(before.extraction);
      expect(now.extraction).toBeLessThan(1);
      before = now;
    }
  });

  it('states as slope efficiency the derivative of its output', () => {
    for (const times of [1.5, 4, 20]) {
      const power = times * threshold;
      const step = 1e-4 * power;
      const difference =
        (at({ absorbedPower: power + step }).outputPower - at({ absorbedPower: power - step }).outputPower) /
        (2 * step);
      // Central difference over 2e-4 of the power.
      expect(Math.abs(at({ absorbedPower: power }).slopeEfficiency / difference - 1)).toBeLessThan(1e-6);
    }
  });

  it('approaches the largest slope: Stokes ratio, pump quantum efficiency and coupler share', () => {
    const largest =
      ((laser.pumpQuantumEfficiency * laser.pumpWavelength) / laser.laserWavelength) *
      (Math.log(1 - laser.outputTransmission) /
        (Math.log(1 - laser.outputTransmission) + Math.log(1 - laser.otherLoss)));
    const slope = at({ absorbedPower: 3000 * threshold }).slopeEfficiency;
    expect(slope).toBeLessThan(largest);
    expect(slope).toBeGreaterThan(0.97 * largest);
  });

  it('needs more pump for a larger mode, more loss, a shorter lifetime', () => {
    expect(at({ modeRadius: 1.1 * laser.modeRadius }).thresholdAbsorbedPower).toBeGreaterThan(threshold);
    expect(at({ otherLoss: 0.03 }).thresholdAbsorbedPower).toBeGreaterThan(threshold);
    expect(at({ upperLifetime: 0.5 * laser.upperLifetime }).thresholdAbsorbedPower).toBeCloseTo(
      2 * threshold,
      9,
    );
  });

  it('has no threshold, and no bad number, without gain or when everything is lost', () => {
    const cases: Partial<LaserInput>[] = [
      { emissionCrossSection: 0 },
      { upperLifetime: 0 },
      { pumpQuantumEfficiency: 0 },
      { otherLoss: 1 },
      { outputTransmission: 1 },
      { pump: { faces: Float64Array.from([0, 1e-3]), shares: new Float64Array(1) } },
    ];
    for (const change of cases) {
      const output = at(change);
      expect(output.thresholdAbsorbedPower).toBeNull();
      expect(output).toMatchObject({ outputPower: 0, extraction: 0, slopeEfficiency: 0 });
      expect(Object.values(output).every((value) => value === null || Number.isFinite(value))).toBe(true);
    }
  });

  it('gives finite numbers without loss, without pump and far above threshold', () => {
    for (const change of [
      { outputTransmission: 0, otherLoss: 0 },
      { absorbedPower: 0 },
      { absorbedPower: 1e6 },
    ])
      expect(Object.values(at(change)).every((value) => Number.isFinite(value))).toBe(true);
  });

  it('does the same in a one-way ring with twice the rod', () => {
    const doubled = laser.reabsorption && { ...laser.reabsorption, length: 2 * laser.reabsorption.length };
    const linear = at({});
    const ring = at({ rodPasses: 1, reabsorption: doubled, otherLoss: laser.otherLoss });
    expect(ring.thresholdAbsorbedPower).toBeGreaterThan(linear.thresholdAbsorbedPower!);
    expect(ring.extraction).toBeLessThan(linear.extraction);
  });
});

describe('extraction', () => {
  const gaussian = (w: number) => (r: number) => (2 / (Math.PI * w * w)) * Math.exp((-2 * r * r) / (w * w));
  const cases: { name: string; laser: LaserInput; density: (r: number) => number }[] = [
    {
      name: 'four-level, Gaussian',
      laser: { ...vanadate, pump: pumpRings({ kind: 'gaussian' }, 200e-6, 2e-3) },
      density: gaussian(200e-6),
    },
    { name: 'quasi-three-level, Gaussian', laser: ytterbium, density: gaussian(150e-6) },
    {
      name: 'four-level, flat-top',
      laser: vanadate,
      density: (r) => (r < 200e-6 ? 1 / (Math.PI * 200e-6 ** 2) : 0),
    },
  ];
  it.each(cases)('is what the populations of the rate equation leave over: $name', ({ laser, density }) => {
    for (const absorbedPower of [0.5, 3, 12]) {
      const { extraction, circulatingPower, thresholdAbsorbedPower } = laserOutput({
        ...laser,
        absorbedPower,
      });
      if (absorbedPower < thresholdAbsorbedPower!) continue;
      const expected = extractionByPopulation({ ...laser, absorbedPower }, density, circulatingPower);
      // Even density per ring: 1e-4. The fine sum crosses the flat-top's edge in steps of 33 nm: 2e-4.
      expect(Math.abs(extraction - expected)).toBeLessThan(3e-4);
    }
  });
});

describe('re-absorption', () => {
  it('raises the threshold as the lower level fills with rod temperature', () => {
    const at = (lowerShare: number) =>
      laserOutput({ ...ytterbium, reabsorption: { ...ytterbium.reabsorption!, lowerShare } });
    expect(at(0.06).thresholdAbsorbedPower).toBeGreaterThan(at(0.0465).thresholdAbsorbedPower!);
    expect(at(0.06).outputPower).toBeLessThan(at(0.0465).outputPower);
    // 2 N f sigma L: hand calculation.
    expect(at(0.0465).reabsorptionLoss).toBeCloseTo(2 * 7e26 * (0.0465 / 0.7) * 2.1e-24 * 3e-3, 12);
  });
  it('of no ion is a four-level laser', () => {
    const without = laserOutput({ ...ytterbium, reabsorption: null });
    const empty = laserOutput({ ...ytterbium, reabsorption: { ...ytterbium.reabsorption!, lowerShare: 0 } });
    expect(empty).toEqual(without);
  });
});

describe('a measured pump profile with a hole in the middle', () => {
  it('is answered too', () => {
    const profile: BeamProfile = { kind: 'table', radii: [0, 1e-4, 2e-4, 3e-4], intensities: [0, 0, 1, 0] };
    const pump = pumpRings(profile, 2e-4, 1.6e-3);
    for (const laser of [vanadate, ytterbium]) {
      const { thresholdAbsorbedPower } = laserOutput({ ...laser, pump });
      for (const times of [1.001, 1.5, 5, 50]) {
        const { extraction } = laserOutput({
          ...laser,
          pump,
          absorbedPower: times * thresholdAbsorbedPower!,
        });
        expect(extraction).toBeGreaterThan(0);
        expect(extraction).toBeLessThan(1);
      }
    }
  });
});
