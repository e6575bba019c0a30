import { describe, expect, test } from 'vitest';
import { designJsonSchema } from '../../src/design/json-schema';
import { crystals, mountMaterials } from '../../src/materials';
import { withValue } from '../../src/design/fields';
import { checked, inputs, vanadate } from './designs';
import { fitFaults, type JsonSchema } from './json-schema-fit';

const schema = designJsonSchema() as JsonSchema;

/** Every schema of a single value, with its path. */
function leavesOf(at: JsonSchema, path = ''): [string, JsonSchema][] {
  const below = [
    ...Object.entries(at.properties ?? {}).map(([key, inner]) => [`${path}.${key}`, inner] as const),
    ...(at.items ? [[`${path}.*`, at.items] as const] : []),
    ...(at.prefixItems ?? []).map((inner, place) => [`${path}.${place}`, inner] as const),
    ...[...(at.anyOf ?? []), ...(at.oneOf ?? [])].map((inner) => [path, inner] as const),
  ];
  return below.length > 0 ? below.flatMap(([deeper, inner]) => leavesOf(inner, deeper)) : [[path, at]];
}

describe('the JSON Schema of the design file', () => {
  test.each(inputs)('takes %s, as written and with its defaults filled in', (_, input) => {
    expect(fitFaults(schema, input)).toEqual([]);
    expect(fitFaults(schema, checked(input))).toEqual([]);
  });

  test.each([
    ['pump.power', 12],
    ['pump.power', undefined],
    ['pump.powr', '12 W'],
    ['coolers', []],
    ['coolers.0.kind', 'fanny'],
    ['rod.absorption', 'from crystall'],
    ['pump.passes', 1.5],
    ['limits', { stabilityMargin: 1 }],
    ['format', 'other'],
  ])('refuses %s = %j as the check does', (path, value) => {
    expect(fitFaults(schema, withValue<unknown>(vanadate, path, value) ?? [])).not.toEqual([]);
  });

  test('says of every field what it is: a title and a description, or the one word it may be', () => {
    const bare = leavesOf(schema).filter(([, at]) => at.const === undefined && !(at.title && at.description));
    expect(bare.map(([path]) => path).filter((path) => path !== '.uncertainty')).toEqual([]);
  });

  test('states range and convention of a quantity, and gives an example', () => {
    const radius = schema.properties!.pump!.properties!.radius!;
    expect(radius).toMatchObject({ type: 'string', title: 'Pump radius', examples: ['200 um'] });
    expect(radius.description).toMatch(/1\/e².*Not the diameter.*Allowed: more than 0 um to 5000 um\./);
  });

  test('names the catalogue', () => {
    expect(schema.properties!.rod!.properties!.crystal!.examples).toEqual(
      crystals.map((crystal) => crystal.name),
    );
    expect(schema.properties!.mount!.properties!.material!.examples).toEqual(
      mountMaterials.map((material) => material.name),
    );
  });

  test('is plain JSON', () => {
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
  });
});
