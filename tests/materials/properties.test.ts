import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as materials from '../../src/materials';

const anyTemperature = fc.double({ min: 200, max: 420, noNaN: true });
const inTable = fc.double({ min: 273.15, max: 333.15, noNaN: true });
const coolant = fc.constantFrom(...materials.coolants);

describe('a coolant table', () => {
  test('is met at each of its rows', () => {
    for (const fluid of materials.coolants) {
      fluid.table.temperature.forEach((temperature, i) => {
        const properties = materials.coolantProperties(fluid, temperature);
        expect(properties.density).toBeCloseTo(fluid.table.density[i]!, 10);
        // one logarithm and one exponential, each to a rounding
        expect(properties.dynamicViscosity / fluid.table.dynamicViscosity[i]! - 1).toBeCloseTo(0, 13);
        expect(properties.outside).toBe(false);
      });
    }
  });

  test('gives a viscosity that falls with temperature in a liquid and rises in a gas', () => {
    fc.assert(
      fc.property(coolant, inTable, inTable, (fluid, one, other) => {
        const [cold, hot] = [Math.min(one, other), Math.max(one, other)];
        const before = materials.coolantProperties(fluid, cold).dynamicViscosity;
        const after = materials.coolantProperties(fluid, hot).dynamicViscosity;
        if (fluid.id === 'air') expect(after).toBeGreaterThanOrEqual(before);
        else expect(after).toBeLessThanOrEqual(before);
      }),
      { seed: 3 },
    );
  });

  test('is held at its ends, and says so', () => {
    fc.assert(
      fc.property(coolant, anyTemperature, (fluid, temperature) => {
        const rows = fluid.table.temperature;
        const held = Math.min(Math.max(temperature, rows[0]!), rows.at(-1)!);
        const properties = materials.coolantProperties(fluid, temperature);
        expect(properties.outside).toBe(held !== temperature);
        expect({ ...properties, outside: false }).toEqual(materials.coolantProperties(fluid, held));
      }),
      { seed: 4 },
    );
  });

  test('fills the object it is given instead of making one', () => {
    const water = materials.findCoolant('water')!;
    const out = materials.coolantProperties(water, 290);
    expect(materials.coolantProperties(water, 300, out)).toBe(out);
    expect(out).toEqual(materials.coolantProperties(water, 300));
  });
});

test('the density of air is in proportion to pressure, its viscosity is not', () => {
  const low = materials.airProperties(300, 50e3);
  const high = materials.airProperties(300, 100e3);
  expect(high.density / low.density).toBeCloseTo(2, 12);
  expect(high.dynamicViscosity).toBe(low.dynamicViscosity);
  expect(high.thermalConductivity).toBe(low.thermalConductivity);
});

test('thermoelectric properties stay positive and are held outside their range', () => {
  fc.assert(
    fc.property(fc.double({ min: 100, max: 600, noNaN: true }), (temperature) => {
      const leg = materials.thermoelectricProperties(temperature);
      expect(Math.min(leg.seebeck, leg.resistivity, leg.thermalConductivity)).toBeGreaterThan(0);
      expect(leg.outside).toBe(temperature < 200 || temperature > 420);
    }),
    { seed: 5 },
  );
});

describe('a crystal', () => {
  const vanadate = materials.findCrystal('Nd:YVO4')!;
  const garnet = materials.findCrystal('Nd:YAG')!;

  test('that is uniaxial shows its extraordinary index to pi light and its ordinary index to sigma light', () => {
    expect(materials.refractiveIndex(vanadate, 'pi')).toBe(vanadate.values.refractiveIndexExtraordinary);
    expect(materials.refractiveIndex(vanadate, 'sigma')).toBe(vanadate.values.refractiveIndexOrdinary);
    expect(materials.refractiveIndex(vanadate, 'none')).toBeUndefined();
    expect(materials.thermoOptic(vanadate, 'pi')).toBe(vanadate.values.thermoOpticExtraordinary);
  });

  test('that is isotropic has one index, conductivity and expansion in every direction', () => {
    for (const polarisation of ['pi', 'sigma', 'none'] as const) {
      expect(materials.refractiveIndex(garnet, polarisation)).toBe(garnet.values.refractiveIndex);
    }
    for (const axis of ['a', 'b', 'c'] as const) {
      expect(materials.conductivity(garnet, axis)).toBe(garnet.values.thermalConductivity);
    }
  });

  test('that is uniaxial conducts along b as along a', () => {
    expect(materials.conductivity(vanadate, 'b')).toBe(materials.conductivity(vanadate, 'a'));
    expect(materials.expansion(vanadate, 'b')).toBe(materials.expansion(vanadate, 'a'));
    expect(materials.expansion(vanadate, 'c')).not.toBe(materials.expansion(vanadate, 'a'));
  });

  test('holds ions in proportion to its dopant share, spread included', () => {
    const one = materials.ionDensity(garnet, 0.01)!;
    const two = materials.ionDensity(garnet, 0.02)!;
    expect(one.nominal).toBeCloseTo(1.38e26, -20);
    expect(two.nominal / one.nominal).toBeCloseTo(2, 12);
    expect(two.high! / one.high!).toBeCloseTo(2, 12);
    expect(materials.ionDensity(materials.findCrystal('Cr:ZnSe')!, 0.5)?.nominal).toBe(5e24);
  });

  test('does not count a diode-averaged band beside its narrow lines', () => {
    const centres = materials.absorptionLines(garnet).map((line) => line.centre);
    expect(centres).toContain(808.6e-9);
    expect(centres).not.toContain(808e-9);
    expect(garnet.absorption.find((line) => line.averaged)?.centre).toBe(808e-9);
  });

  test('gives a band once: the sum of its lines at the peak of the sapphire band is the printed peak', () => {
    const sapphire = materials.findCrystal('Ti:sapphire')!;
    expect(materials.absorptionLines(sapphire, 'pi').map((line) => line.centre)).toEqual([490e-9]);
  });

  test('keeps a line of no polarisation for both polarisations', () => {
    const lines = materials.absorptionLines(vanadate, 'sigma');
    expect(lines.map((line) => line.centre)).toEqual([808.7e-9, 888e-9]);
  });

  test('has the exponent of its conductivity law from its table', () => {
    // ln(5.2/3.9)/ln(400/300) = 1.00, rounded to two digits in the record
    expect(materials.conductivityExponent(vanadate)?.nominal).toBeCloseTo(
      Math.log(5.2 / 3.9) / Math.log(4 / 3),
      2,
    );
    expect(materials.conductivityExponent(materials.findCrystal('Yb:CaF2')!)).toBeUndefined();
  });
});

describe('looking a material up', () => {
  test('letter case, spaces and hyphens do not matter', () => {
    expect(materials.findCrystal('nd:yvo4')?.id).toBe('nd_yvo4');
    expect(materials.findCrystal(' ND-YVO4 ')?.id).toBe('nd_yvo4');
    expect(materials.findMountMaterial('Aluminium-6061')?.id).toBe('al6061');
    expect(materials.findMountMaterial('aluminum 6061')?.name).toBe('aluminium 6061');
    expect(materials.findInterface('Indium Foil')?.id).toBe('indium_foil');
    expect(materials.findCoolant('propylene glycol 25%')?.id).toBe('pg25');
    expect(materials.findEmissivity('black paint')?.emissivity.nominal).toBe(0.9);
  });

  test('an unknown or empty name finds nothing', () => {
    expect(materials.findCrystal('kryptonite')).toBeUndefined();
    expect(materials.findMountMaterial('')).toBeUndefined();
    expect(materials.findCoolant(' : ')).toBeUndefined();
  });

  test('a misspelt name suggests the one that was meant', () => {
    expect(materials.nearestName(materials.crystals, 'Nd:YVO5')).toBe('Nd:YVO4');
    expect(materials.nearestName(materials.mountMaterials, 'alumnium 6061')).toBe('aluminium 6061');
    expect(materials.nearestName(materials.interfaces, 'indum foil')).toBe('indium foil');
    expect(materials.nearestName(materials.coolants, 'watre')).toBe('water');
    expect(materials.nearestName(materials.crystals, 'unobtainium phosphide')).toBeUndefined();
  });

  test('the nearest class of diode serves a pump wavelength', () => {
    expect(materials.nearestPumpDiode(806.1e-9).wavelength).toBe(808e-9);
    expect(materials.nearestPumpDiode(443e-9).technology).toBe('InGaN');
  });
});
