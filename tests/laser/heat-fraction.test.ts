import { describe, expect, it } from 'vitest';
import { boltzmannShare, heatFraction, quantumDefect } from '../../src/laser';

const base = {
  pumpWavelength: 808e-9,
  laserWavelength: 1064e-9,
  fluorescenceWavelength: 1038e-9,
  pumpQuantumEfficiency: 0.95,
  radiativeEfficiency: 0.9,
  extraction: 0.6,
};

describe('heat fraction', () => {
  it('is the quantum defect when every excitation is extracted', () => {
    const all = { ...base, pumpQuantumEfficiency: 1, extraction: 1 };
    expect(heatFraction(all)).toBeCloseTo(quantumDefect(808e-9, 1064e-9), 14);
  });
  it('is everything when nothing is excited', () => {
    expect(heatFraction({ ...base, pumpQuantumEfficiency: 0 })).toBe(1);
  });
  it('is higher with the beam blocked where the fluorescence is quenched', () => {
    const quenched = { ...base, radiativeEfficiency: 0.7 };
    expect(heatFraction({ ...quenched, extraction: 0 })).toBeGreaterThan(heatFraction(quenched));
  });
  it('is lower with the beam blocked where all radiate at shorter wavelengths than the laser', () => {
    const bright = { ...base, radiativeEfficiency: 1 };
    expect(heatFraction({ ...bright, extraction: 0 })).toBeLessThan(heatFraction(bright));
  });
});

describe('thermal populations', () => {
  const levels = [0, 13000, 19900, 30800, 85700];
  it('add up to one at any temperature', () => {
    for (const temperature of [4, 77, 300, 900])
      expect(levels.reduce((sum, _, i) => sum + boltzmannShare(levels, i, temperature), 0)).toBeCloseTo(
        1,
        13,
      );
  });
  it('move up as the crystal warms', () => {
    expect(boltzmannShare(levels, 4, 350)).toBeGreaterThan(boltzmannShare(levels, 4, 300));
    expect(boltzmannShare(levels, 0, 350)).toBeLessThan(boltzmannShare(levels, 0, 300));
  });
  it('do not depend on where energies are counted from', () => {
    const shifted = levels.map((level) => level + 1.14e6);
    expect(boltzmannShare(shifted, 2, 300)).toBeCloseTo(boltzmannShare(levels, 2, 300), 12);
  });
});
