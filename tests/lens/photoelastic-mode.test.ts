import { describe, expect, it } from 'vitest';
import { curvatureWeights, elasticPresets, makeElasticMesh } from '../../src/elastic';
import { photoelasticPower } from '../../src/lens/photoelastic';
import { depolarisedShare, modeSection, polarisedPower } from '../../src/lens/polarised-mode';

const mesh = makeElasticMesh({
  radius: 1.5e-3,
  length: 10e-3,
  pumpRadius: 3e-4,
  ...elasticPresets.study,
});
const radii = mesh.radialNodes;
const wavelength = 1064e-9;
const modeRadius = 2.5e-4;
/** Paths whose difference is `turns` wavelengths at the mode radius and grows as r^2. */
function parabolic(turns: number) {
  const radial = radii.map((r) => turns * wavelength * (r / modeRadius) ** 2);
  return { radii, radial, tangential: new Float64Array(radii.length) };
}

describe('depolarised share of a Gaussian mode', () => {
  it('of a difference that grows as r^2 is b^2/(1 + b^2)/4, b half the phase at the mode radius', () => {
    // With x = 2 r^2/w^2 the mean of cos(b x) over exp(-x) is 1/(1 + b^2): Abramowitz & Stegun 29.3 (from memory), the same
    // as the closed form of Karny, Lavi & Kafri, Opt. Lett. 8, 409 (1983) (from memory).
    for (const turns of [1e-4, 0.01, 0.1, 0.5]) {
      const b = Math.PI * turns;
      const expected = b ** 2 / (1 + b ** 2) / 4;
      // Eight Gauss points in a third of a mode radius; a quadratic element holds r^2 exactly.
      expect(depolarisedShare(parabolic(turns), modeRadius, wavelength) / expected).toBeCloseTo(1, 6);
    }
  });

  it('is nothing without stress, grows as the square of a small one and tends to 1/4 for a large one', () => {
    const of = (turns: number) => depolarisedShare(parabolic(turns), modeRadius, wavelength);
    expect(of(0)).toBe(0);
    expect(of(2e-4) / of(1e-4)).toBeCloseTo(4, 5);
    expect(of(-0.1)).toBeCloseTo(of(0.1), 15);
    // b = 9.4: 0.2472.
    expect(of(3)).toBeCloseTo(0.25 * (1 - 1 / (1 + (3 * Math.PI) ** 2)), 5);
  });

  it('never leaves 0 ... 1/2, however large the stress', () => {
    for (const turns of [10, 100, 1e4, 1e8]) {
      const share = depolarisedShare(parabolic(turns), modeRadius, wavelength);
      expect(share).toBeGreaterThan(0);
      expect(share).toBeLessThan(0.5);
    }
  });

  it('is the same whether the section of the mode was prepared before or not', () => {
    const section = modeSection(radii, modeRadius);
    expect(depolarisedShare(parabolic(0.2), section, wavelength)).toBe(
      depolarisedShare(parabolic(0.2), modeRadius, wavelength),
    );
  });

  it('counts the light inside the barrel, for modes from a tenth of an element to wider than the rod', () => {
    for (const radius of [2e-5, 2.5e-4, 2e-3]) {
      const { share } = modeSection(radii, radius);
      expect(share.reduce((a, b) => a + b)).toBeCloseTo(1, 12);
    }
  });
});

describe('lens of a polarised mode in a stressed rod', () => {
  const section = modeSection(radii, modeRadius);
  const weights = curvatureWeights(mesh, modeRadius);

  it('has the radial power along its polarisation and the tangential one across, where both paths are parabolas', () => {
    const paths = {
      radii,
      radial: radii.map((r) => 2e-7 - 0.8 * r * r),
      tangential: radii.map((r) => 2e-7 + 0.1 * r * r),
    };
    const power = photoelasticPower(paths, weights);
    expect(power.radial).toBeCloseTo(1.6, 9);
    expect(power.tangential).toBeCloseTo(-0.2, 9);
    const { along, across } = polarisedPower(paths, power, section);
    // The reach of the section, four mode radii, costs 1e-11.
    expect(along).toBeCloseTo(1.6, 8);
    expect(across).toBeCloseTo(-0.2, 8);
  });

  it('has the mean power on average of its two planes, whatever the paths', () => {
    const paths = { radii, radial: radii.map((r) => Math.cos(3000 * r)), tangential: radii.map((r) => r) };
    const power = photoelasticPower(paths, weights);
    const { along, across } = polarisedPower(paths, power, section);
    expect((along + across) / 2).toBeCloseTo(power.mean, 9);
  });
});
