import { describe, expect, test } from 'vitest';
import * as materials from '../../src/materials';
import type { Crystal } from '../../src/materials';

const crystal = (name: string): Crystal => materials.findCrystal(name)!;

/** h c / k, m K (CODATA 2018, exact) */
const SECOND_RADIATION_CONSTANT = 0.014387768775;

function boltzmannShare(levels: readonly number[], index: number, temperature: number): number {
  const weight = (level: number): number => Math.exp((-SECOND_RADIATION_CONSTANT * level) / temperature);
  return weight(levels[index]!) / levels.reduce((sum, level) => sum + weight(level), 0);
}

describe('quantum defects of the listed lines', () => {
  // 1 - pump wavelength / laser wavelength: energy conservation, photon by photon
  test.each([
    ['Nd:YVO4', 808, 1064, 0.2406],
    ['Nd:YVO4', 888, 1064, 0.1654],
    ['Nd:YAG', 808, 946, 0.1459],
    ['Nd:YVO4', 808, 1342, 0.3979],
    ['Pr:YLF', 444, 640, 0.3063],
    ['Pr:YLF', 444, 607, 0.2685],
    ['Pr:YLF', 444, 523, 0.1511],
    ['Yb:YAG', 940, 1030, 0.0874],
    ['Nd:YLF', 797, 1047, 0.2388],
    ['Alexandrite', 638, 755, 0.155],
  ])('%s pumped at %d nm and lasing at %d nm', (name, pump, laser, published) => {
    const { absorption, lines } = crystal(name);
    const nearest = (values: number[], to: number): number =>
      values.reduce((best, value) => (Math.abs(value - to) < Math.abs(best - to) ? value : best));
    const from = nearest(
      absorption.map((line) => line.centre),
      pump * 1e-9,
    );
    const to = nearest(
      lines.map((line) => line.wavelength),
      laser * 1e-9,
    );
    // the published wavelengths are rounded to whole nanometres: half a nanometre on either is 0.5/444 at worst
    expect(Math.abs(1 - from / to - published)).toBeLessThan(0.5 / pump + 0.5 / laser);
  });
});

describe('refractive index of LiYF4 (Barnes & Gettemy, J. Opt. Soc. Am. 70, 1244 (1980), open index data)', () => {
  test.each([
    ['Pr:YLF', 1.45261, 1.47518],
    ['Nd:YLF', 1.44812, 1.47027],
  ])('%s at its main line', (name, ordinary, extraordinary) => {
    // the record keeps four decimals, and the published value is at 639.9 nm against a line at 639.5 nm (1e-5)
    expect(Math.abs(materials.refractiveIndex(crystal(name), 'sigma')!.nominal - ordinary)).toBeLessThan(
      8e-5,
    );
    expect(Math.abs(materials.refractiveIndex(crystal(name), 'pi')!.nominal - extraordinary)).toBeLessThan(
      8e-5,
    );
  });
});

test('water at 298.15 K has the viscosity of the IAPWS formulation (IAPWS R12-08: 889.735 uPa s)', () => {
  const { dynamicViscosity } = materials.coolantProperties(materials.findCoolant('water')!, 298.15);
  // the table has three digits (0.06 % of 0.798 mPa s) and the cubic between rows adds about as much
  expect(Math.abs(dynamicViscosity / 889.735e-6 - 1)).toBeLessThan(0.0015);
});

test('water takes 1.4376 K from 100 W at 1 L/min (energy balance)', () => {
  const water = materials.coolantProperties(materials.findCoolant('water')!, 298.15);
  const rise = 100 / (water.density * water.specificHeat * (1e-3 / 60));
  // 998 kg/m^3 and 4182 J/(kg K) in the published number, 20 degC; here 25 degC: 0.2 % less heat capacity per volume
  expect(Math.abs(rise / 1.4376 - 1)).toBeLessThan(0.003);
});

test('dry air is an ideal gas of 28.9652 g/mol (US Standard Atmosphere 1976 molar mass, from memory)', () => {
  for (const temperature of [275, 293.15, 310, 330]) {
    const ideal = (101325 * 0.0289652) / (8.314462618 * temperature);
    // four digits in the table, and straight lines between rows of a hyperbola: 0.03 % each
    expect(Math.abs(materials.airProperties(temperature).density / ideal - 1)).toBeLessThan(8e-4);
  }
});

describe('Boltzmann shares at 300 K (level energies from memory)', () => {
  test('Yb:YAG lower laser level at 612 cm^-1 holds 0.046485', () => {
    const { levels, lines } = crystal('Yb:YAG');
    const share = boltzmannShare(levels!.ground, levels!.ground.indexOf(61200), 300);
    expect(share).toBeCloseTo(0.046485, 6);
    // printed to two digits
    expect(lines.find((line) => line.lowerLevel === 61200)!.lowerShare!.nominal).toBeCloseTo(share, 3);
  });

  test('Nd:YAG at 946 nm: 0.007575 with a level at 857 cm^-1, more with the 848 cm^-1 held here', () => {
    const { levels } = crystal('Nd:YAG');
    const share = boltzmannShare(levels!.ground, levels!.ground.indexOf(84800), 300);
    const shift = Math.exp((SECOND_RADIATION_CONSTANT * 900) / 300);
    // the partition sum hardly moves with so thin a level: 0.04 % of 0.8 %
    expect(Math.abs(share / (0.007575 * shift) - 1)).toBeLessThan(1e-3);
  });

  test.each(
    materials.crystals.flatMap(({ name, levels, lines }) => (levels ? [[name, levels, lines] as const] : [])),
  )('%s: each listed share of the lower level follows from the level energies', (_, levels, lines) => {
    for (const { lowerLevel, lowerShare } of lines) {
      if (lowerLevel === undefined || lowerShare === undefined) continue;
      const index = levels.ground.indexOf(lowerLevel);
      expect(index).toBeGreaterThan(0);
      // shares are printed to one or two digits and some with a neighbouring level energy: 15 %
      expect(Math.abs(boltzmannShare(levels.ground, index, 300) / lowerShare.nominal - 1)).toBeLessThan(0.15);
    }
  });
});

describe('constants on which print disagrees carry every value', () => {
  test('dn/dT of YAG from 7.3e-6 to 12.1e-6 (Koechner, from memory; Sato & Taira 2014, abstract)', () => {
    const value = materials.thermoOptic(crystal('Nd:YAG'), 'none')!;
    expect([value.low, value.high]).toEqual([7.3e-6, 12.1e-6]);
    expect(value.alternatives!.map((other) => other.value)).toEqual([7.3e-6, 12.1e-6]);
  });

  test('dn/dT of YVO4 15.5e-6 and 8.41e-6 (Sato & Taira, Opt. Mater. Express 4, 876 (2014), abstract)', () => {
    expect(materials.thermoOptic(crystal('Nd:YVO4'), 'sigma')!.nominal).toBe(15.5e-6);
    expect(materials.thermoOptic(crystal('Nd:YVO4'), 'pi')!.nominal).toBe(8.41e-6);
  });

  test('heat fraction of Nd:YVO4: 16.9 % to 24.9 % pumped at 888 nm, 0.40 at 3 at.% and 808 nm', () => {
    // Opt. Express 21, 18068 (2013), abstract; Appl. Opt. 38, 3253 (1999), abstract
    const { heatFractionLasing888, heatFractionLasing } = crystal('Nd:YVO4').values;
    expect(heatFractionLasing888!.nominal).toBe(0.169);
    expect(heatFractionLasing888!.high).toBe(0.249);
    expect(heatFractionLasing!.alternatives![0]!.value).toBe(0.4);
    expect(heatFractionLasing!.high).toBeGreaterThan(0.4);
  });
});

test('thermal shock resistance of YAG: 790 W/m in print, and k(1-nu) sigma/(alpha E) of the record is in its band', () => {
  // Koechner, Solid-State Laser Engineering, from memory
  const {
    thermalShockResistance,
    thermalConductivity,
    poissonRatio,
    fractureStrength,
    expansion,
    youngModulus,
  } = crystal('Nd:YAG').values;
  expect(thermalShockResistance!.nominal).toBe(790);
  const formula =
    (thermalConductivity!.nominal * (1 - poissonRatio!.nominal) * fractureStrength!.nominal) /
    (expansion!.nominal * youngModulus!.nominal);
  expect(formula).toBeGreaterThan(thermalShockResistance!.low!);
  expect(formula).toBeLessThan(thermalShockResistance!.high!);
});

test('contact conductances measured on Yb:YAG (Chenais et al., Appl. Phys. B, abstract; unit from memory)', () => {
  const measured = { 'dry contact': 0.25, 'graphite foil': 0.28, 'indium foil': 0.9, 'thermal grease': 2.0 };
  for (const [name, value] of Object.entries(measured)) {
    expect(materials.findInterface(name)!.conductance.nominal).toBeCloseTo(value * 1e4, 8);
  }
});

test('pump diodes drift by 0.25 to 0.3 nm/K near 808 nm, 0.04 to 0.07 in the blue, 0.3 to 0.35 at 940 to 980', () => {
  // common ranges, from memory
  for (const [wavelength, low, high] of [
    [808e-9, 0.25e-9, 0.3e-9],
    [444e-9, 0.04e-9, 0.07e-9],
    [940e-9, 0.3e-9, 0.35e-9],
    [976e-9, 0.3e-9, 0.35e-9],
  ] as const) {
    const drift = materials.nearestPumpDiode(wavelength).wavelengthDrift.nominal;
    expect(drift).toBeGreaterThanOrEqual(low);
    expect(drift).toBeLessThanOrEqual(high);
  }
});

test('the bismuth telluride polynomials give a figure of merit of 2.47e-3 /K at 300 K (textbook, from memory)', () => {
  const { seebeck, resistivity, thermalConductivity } = materials.thermoelectricProperties(300);
  // the polynomial coefficients are exact; four printed digits of the product
  expect(seebeck ** 2 / (resistivity * thermalConductivity)).toBeCloseTo(2.4718e-3, 7);
});
