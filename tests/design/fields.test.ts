import { describe, expect, test } from 'vitest';
import { alternativesOf, shapeOf } from '../../src/design/alternatives';
import { exampleOf, rangeFault } from '../../src/design/field-note';
import { fieldsOf, valueAt, withValue } from '../../src/design/fields';
import { quantityFault } from '../../src/design/quantity-field';
import { checked, faultsOf, inputs, vanadate, vanadateWith } from './designs';
import { pattern, schemaChoices, schemaLeaves } from './schema-leaves';
import { demoDesign } from '../../src/design/demo';

const leaves = schemaLeaves();

describe('the fields of a design', () => {
  test.each(inputs)('of %s are every scalar of the schema that its shapes have', (_, input) => {
    const design = checked(input);
    const found = new Set(fieldsOf(design).map((field) => pattern(field.path)));
    const shapes = (path: string) => {
      // Of these a design has what its lists and shapes have.
      if (/^(coolers\.\*|cavity\.elements\.\*|pump\.profileTable\.\*|mount\.shape)\./.test(path))
        return found.has(path);
      const choice = alternativesOf(design).find((place) => path.startsWith(`${place.path}.`));
      return !choice || typeof valueAt(design, choice.path) === 'object';
    };
    const wanted = leaves.filter((leaf) => !leaf.literal && shapes(leaf.path)).map((leaf) => leaf.path);
    expect([...found].sort()).toEqual([...new Set(wanted)].sort());
  });

  test('together have every scalar of every shape, apart from the words that mark a shape', () => {
    const found = new Set(
      inputs.flatMap(([, input]) => fieldsOf(checked(input)).map((field) => pattern(field.path))),
    );
    const lacking = leaves.filter((leaf) => !leaf.literal && !found.has(leaf.path)).map((leaf) => leaf.path);
    expect(lacking).toEqual([]);
  });

  test('left empty are shown without a value, with what then holds', () => {
    const fields = fieldsOf(checked(vanadate));
    const beamQuality = fieldsOf(vanadateWith({ 'pump.beamQuality': undefined })).find(
      ({ path }) => path === 'pump.beamQuality',
    )!;
    expect(beamQuality.value).toBeUndefined();
    expect(beamQuality.note.empty).toMatch(/collimated/);
    const thermoOptic = fields.find(({ path }) => path === 'rod.values.thermoOptic')!;
    expect(thermoOptic).toMatchObject({
      value: undefined,
      optional: true,
      allowed: '-1000 ppm/K to 1000 ppm/K',
    });
  });

  test('stand in an unchecked design too, with the default that will be taken', () => {
    const fields = fieldsOf(vanadate as Parameters<typeof fieldsOf>[0]);
    const field = fields.find(({ path }) => path === 'pump.diode.wallPlugEfficiency')!;
    expect(field).toMatchObject({ value: undefined, default: '48 %', optional: true });
  });

  test('say the pump radius range in micrometres and temperatures in degrees Celsius', () => {
    const allowed = new Map(fieldsOf(checked(demoDesign)).map((field) => [field.path, field.allowed]));
    expect(allowed.get('pump.radius')).toBe('more than 0 um to 5000 um');
    expect(allowed.get('pump.wavelength')).toBe('200 nm to 5000 nm');
    expect(allowed.get('surroundings.ambient')).toBe('-70 degC to 200 degC');
    expect(allowed.get('surroundings.relativeHumidity')).toBe('0 % to 100 %');
  });
});

describe('the notes of the schema', () => {
  const noted = leaves.filter((leaf) => !leaf.literal);

  test.each(noted.map((leaf) => [leaf.path, leaf] as const))(
    '%s has a label and, where it may be empty, a default or what then holds',
    (_, leaf) => {
      expect(leaf.note?.label).toMatch(/^\S.{1,40}$/);
      if (
        leaf.optional &&
        leaf.default === undefined &&
        !leaf.path.startsWith('pump.powerRange') &&
        !leaf.path.startsWith('cavity.elements')
      )
        expect(leaf.note?.empty).toMatch(/\S/);
    },
  );

  test.each(noted.filter((leaf) => leaf.note?.dimension).map((leaf) => [leaf.path, leaf.note!] as const))(
    '%s gives an example that it would take',
    (_, note) => {
      const example = exampleOf(note);
      const plain = note.dimension === 'dimensionless' && note.unit === undefined;
      expect(plain ? rangeFault(Number(example), note) : quantityFault(example, note)).toBeNull();
    },
  );

  test.each([
    ['pump.radius', /1\/e².*edge.*86\.5 %.*not the diameter/i],
    ['pump.profileTable.*.1', /straight between points/],
    ['rod.dopantConcentration', /atomic per cent/],
    ['cavity.elements.*.mirror.radius', /positive is concave/],
    ['cavity.elements.*.lens', /positive converges/],
    ['cavity.elements.*.space', /geometric/i],
    ['rod.section.diameter', /not its radius/],
    ['mount.shape.outerRadius', /not the diameter/],
    ['mount.shape.depth', /from the axis/i],
    ['mount.shape.cover', /not cooled/],
    ['pump.linewidth', /full width at half maximum/i],
    ['pump.wavelength', /vacuum/i],
    ['rod.length', /without the undoped/i],
  ])('%s states its convention', (path, convention) => {
    expect(leaves.find((leaf) => leaf.path === path)?.note?.hint).toMatch(convention);
  });
});

describe('a value replaced', () => {
  test('leaves the original as it is', () => {
    const before = structuredClone(vanadate);
    withValue(vanadate, 'coolers.0.sink.width', '1 m');
    withValue(vanadate, 'pump.beamQuality', undefined);
    expect(vanadate).toEqual(before);
  });

  test('can be the first end of a pump range that was not there, and the last end removed takes the range away', () => {
    const without = withValue(vanadate, 'pump.powerRange', undefined);
    const begun = withValue(without, 'pump.powerRange.0', '1 W');
    expect(begun.pump.powerRange).toEqual(['1 W']);
    expect(faultsOf(begun).map((fault) => fault.path)).toEqual(['pump.powerRange.1']);
    expect(withValue(begun, 'pump.powerRange.0', undefined)).toEqual(without);
  });

  test('can make a group of what was a word', () => {
    const design = withValue(demoDesign, 'rod.absorption.coefficient', '2 cm^-1');
    expect(design.rod.absorption).toEqual({ coefficient: '2 cm^-1' });
  });

  test('is never put on, nor read from, what every object inherits', () => {
    expect(valueAt(vanadate, 'constructor.name')).toBeUndefined();
    expect(valueAt(vanadate, 'pump.power.length')).toBeUndefined();
    const strange = withValue(vanadate, '__proto__.polluted', 'yes');
    expect(Object.getPrototypeOf(strange)).toBe(Object.prototype);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});

describe('alternatives', () => {
  test('are offered wherever the schema has several shapes, and name one option for each', () => {
    for (const { path, schema } of schemaChoices()) {
      const designs = inputs.map(([, input]) => checked(input));
      const found = designs.flatMap(alternativesOf).find((place) => pattern(place.path) === path);
      expect(found?.options.length, path).toBe(schema.options!.length);
    }
  });

  test.each(inputs)(
    'of %s each have a value that the design takes and that is then recognised',
    (_, input) => {
      const design = checked(input);
      for (const place of alternativesOf(design))
        for (const option of place.options) {
          const changed = checked(withValue(design, place.path, option.value));
          expect(shapeOf(changed, place)).toBe(option.name);
          expect(place.options.filter((other) => other.fits(valueAt(changed, place.path)))).toHaveLength(1);
        }
    },
  );

  test('name the shape that a design has', () => {
    const shapes = alternativesOf(checked(vanadate)).map((place) => [
      place.path,
      shapeOf(checked(vanadate), place),
    ]);
    expect(shapes).toEqual([
      ['rod.absorption', 'measured'],
      ['rod.heatFraction', 'given'],
      ['mount.shape', 'ring'],
      ['coolers.1.supply', 'heat exchanger to air'],
    ]);
  });
});
