import { describe, expect, test } from 'vitest';
import { checkDesign } from '../../src/design/check';
import { constantNote } from '../../src/design/constant-list';
import { demoDesign } from '../../src/design/demo';
import { withValue } from '../../src/design/fields';
import { resolve } from '../../src/design/resolve';
import { uncertainFields } from '../../src/design/uncertain';
import { absorptionLines, crystals, findCrystal } from '../../src/materials';
import { checked, faultsOf, inputs, vanadate, vanadateWith } from './designs';

/** Every line and cut of every crystal that the check lets through, absorbing in its own lines. */
const everyLaser = crystals.flatMap((crystal) =>
  crystal.lines.flatMap((line) =>
    (['a', 'c'] as const).flatMap((cut) => {
      const pump = absorptionLines(crystal).find((absorption) => absorption.centre < line.wavelength)!;
      const changes: [string, unknown][] = [
        ['rod.crystal', crystal.name],
        ['rod.laserLine', `${line.wavelength * 1e9} nm`],
        ['rod.cut', cut],
        ['rod.absorption', 'from crystal'],
        ['pump.wavelength', `${pump.centre * 1e9} nm`],
        ['rod.dopantConcentration', undefined],
      ];
      const input = changes.reduce<unknown>((at, [path, value]) => withValue(at, path, value), vanadate);
      return [[`${crystal.name} at ${(line.wavelength * 1e9).toFixed(0)} nm, ${cut}-cut`, input] as const];
    }),
  ),
);

describe('the constants an answer rests on', () => {
  test.each([...inputs, ...everyLaser])(
    'of %s each have a value in SI, a range around it and a source in words',
    (_, input) => {
      const found = checkDesign(input);
      if (!found.ok) {
        // The only things a catalogue may lack: a line along the axis of the rod, or a value it does not trust.
        expect(found.faults.every(({ path, kind }) => path === 'rod.cut' || kind === 'missing')).toBe(true);
        return;
      }
      const { constants } = resolve(found.design);
      expect(constants.length).toBeGreaterThan(14);
      expect(new Set(constants.map((constant) => constant.path)).size).toBe(constants.length);
      for (const { path, label, nominal, low, high, unit, source, standing } of constants) {
        expect(Number.isFinite(nominal), path).toBe(true);
        if (low !== null && high !== null)
          expect(low <= nominal && nominal <= high, `${path}: ${low} ${nominal} ${high}`).toBe(true);
        expect(unit, path).toBe(constantNote(path)!.unit);
        expect(label, path).toMatch(/^\S.{2,60}$/);
        // A source is cited in words: an author and year, a data sheet, practice, or the design itself.
        expect(source, path).toMatch(/\S{3,}.*\s\S+|memory/);
        expect(['read', 'from memory', 'own', 'common practice']).toContain(standing);
      }
    },
  );

  test('are what the person entered, where they did', () => {
    const own = resolve(
      vanadateWith({
        'rod.values.thermoOptic': '4 ppm/K',
        'rod.values.poissonRatio': 0.3,
        'rod.values.youngModulus': '100 GPa',
      }),
    );
    expect(own.rod).toMatchObject({
      thermoOptic: expect.closeTo(4e-6, 15),
      poissonRatio: 0.3,
      youngModulus: 100e9,
    });
    const constant = own.constants.find(({ path }) => path === 'material.youngModulus');
    expect(constant).toMatchObject({
      standing: 'own',
      unit: 'Pa',
      low: null,
      source: 'entered in the design',
    });
  });

  test('take the conductivity across for that along, where only the first is entered', () => {
    const own = resolve(vanadateWith({ 'rod.values.thermalConductivityRadial': '6 W/(m K)' })).rod;
    expect([own.conductivityRadial, own.conductivityAxial]).toEqual([6, 6]);
  });

  test.each([
    ['ground', 'low', /^low end of the range, for a ground surface/],
    ['polished', 'nominal', /^(?!.*end of the range)/],
    ['etched', 'high', /^high end of the range, for an? etched surface/],
  ] as const)(
    'take the %s strength at the %s value of its range, and keep the range',
    (finish, end, note) => {
      const { limits, constants } = resolve(
        vanadateWith({
          'rod.surfaceFinish': finish,
          'rod.crystal': 'Nd:YAG',
          'rod.dopantConcentration': '1 %',
        }),
      );
      const sourced = findCrystal('Nd:YAG')!.values.fractureStrength!;
      expect(limits.fractureStrength).toBe(sourced[end]);
      const constant = constants.find(({ path }) => path === 'material.fractureStrength')!;
      expect(constant).toMatchObject({ nominal: sourced[end], low: sourced.low, high: sourced.high });
      expect(constant.note ?? '').toMatch(note);
      // The published span of one garnet, 133 MPa ground to 530 MPa etched, holds every one of them; its lower end to 3 %.
      expect(limits.fractureStrength).toBeGreaterThan(133e6 * 0.97);
      expect(limits.fractureStrength).toBeLessThan(530e6);
    },
  );

  test("take a strength of one's own whatever the finish", () => {
    const own = resolve(
      vanadateWith({ 'rod.surfaceFinish': 'ground', 'rod.values.fractureStrength': '90 MPa' }),
    );
    expect(own.limits.fractureStrength).toBeCloseTo(90e6, 3);
  });

  test('stand at another value where the band asks, and nothing else changes', () => {
    const design = checked(demoDesign);
    const high = resolve(design, { 'material.thermoOptic': 9e-6 });
    expect(high.rod).toEqual({ ...resolve(design).rod, thermoOptic: 9e-6 });
  });
});

describe('an uncertainty', () => {
  const constantOf = (uncertainty: Record<string, string>, path: string) =>
    resolve(vanadateWith({ uncertainty, 'mount.interface.conductance': undefined })).constants.find(
      (constant) => constant.path === path,
    )!;

  test('of a value that is given has its ends in the terms of the field', () => {
    const design = vanadateWith({
      uncertainty: { 'pump.radius': '5 %', 'surroundings.ambient': '2 K', 'pump.beamQuality': '10 %' },
    });
    expect(uncertainFields(design).map(({ path, low, high }) => [path, low, high])).toEqual([
      ['pump.radius', '190 um', '210 um'],
      ['surroundings.ambient', '20 degC', '24 degC'],
      ['pump.beamQuality', 36, 44],
    ]);
  });

  test.each([
    ['mount.interface.conductance', 'mount.interface.conductance'],
    ['material.thermoOptic', 'material.thermoOptic'],
    ['rod.values.thermoOptic', 'material.thermoOptic'],
    ['material.absorption.0.crossSection', 'material.absorption.0.crossSection'],
    ['mount.thermalConductivity', 'mount.thermalConductivity'],
  ])('of %s, left to the catalogue, becomes the range of the constant %s', (path, constant) => {
    const design = {
      uncertainty: { [path]: '10 %' },
      'mount.interface.conductance': undefined,
      'rod.absorption': 'from crystal',
    };
    const { nominal, low, high } = resolve(vanadateWith(design)).constants.find(
      (one) => one.path === constant,
    )!;
    expect(low! / nominal).toBeCloseTo(nominal > 0 ? 0.9 : 1.1, 10);
    expect(high! / nominal).toBeCloseTo(nominal > 0 ? 1.1 : 0.9, 10);
  });

  test('may be a quantity of the same kind', () => {
    const { nominal, low, high } = constantOf({ 'material.lifetime': '5 us' }, 'material.lifetime');
    expect([low! - nominal, high! - nominal]).toEqual([expect.closeTo(-5e-6, 12), expect.closeTo(5e-6, 12)]);
  });

  test('keeps within what the value can be at all', () => {
    expect(
      constantOf({ 'material.radiativeEfficiency': '90 %' }, 'material.radiativeEfficiency').high,
    ).toBeLessThanOrEqual(1);
    const humid = uncertainFields(
      vanadateWith({ uncertainty: { 'surroundings.relativeHumidity': '200 %' } }),
    );
    expect(humid.map(({ low, high }) => [low, high])).toEqual([['0 %', '100 %']]);
  });

  test.each([
    ['pump.radius', 'lots', /a share such as "5 %" or a quantity of the same kind/],
    ['pump.radius', '-5 %', /a share such as "5 %"/],
    ['pump.radius', '200 %', /at most 95 % of the value/],
    ['surroundings.ambient', '5 %', /a temperature difference such as "2 K"/],
    ['pump.raduis', '5 %', /no such value; did you mean "pump\.radius"\?/],
    ['material.thermooptic', '5 %', /did you mean "material\.thermoOptic"\?/],
    ['rod.crystal', '5 %', /no number that an uncertainty could apply to/],
    ['pump.passes', '5 %', /a count has no uncertainty/],
    ['surroundings.coldestAmbient', '1 K', /left empty.*enter the value first/],
    ['material.pumpQuantumYield', '5 %', /an assumption of the model/],
    ['cavity.elements.0.mirror.radius', '5 %', /no number/],
  ])('of %s = "%s" is refused in a sentence', (path, text, reason) => {
    const faults = faultsOf({ ...vanadate, uncertainty: { [path]: text } });
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatchObject({ path: `uncertainty.${path}`, message: expect.stringMatching(reason) });
  });

  test('of a constant that the design gives itself is sent to the field', () => {
    const faults = faultsOf({ ...vanadate, uncertainty: { 'mount.interface.conductance': '5 %' } });
    expect(faults).toEqual([]);
    const own = withValue({ ...vanadate, uncertainty: { 'material.lifetime': '5 %' } }, 'rod.values', {
      lifetime: '90 us',
    });
    expect(faultsOf(own).map((fault) => fault.message)).toEqual([
      'uncertainty.material.lifetime: this constant is entered in the design; give the uncertainty of "rod.values.lifetime"',
    ]);
  });
});
