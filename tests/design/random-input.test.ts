import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkDesign, readDesign } from '../../src/design/check';
import { fieldsOf, valueAt, withValue } from '../../src/design/fields';
import { resolve } from '../../src/design/resolve';
import type { Design } from '../../src/design/schema';
import { DesignError } from '../../src/errors';
import { alternativesOf } from '../../src/design/alternatives';
import { inputs } from './designs';
import { sentenceFaults } from './sentences';

/** Every path of a value, groups and lists too. */
function pathsOf(value: unknown, path = ''): string[] {
  if (typeof value !== 'object' || value === null) return [path];
  const below = Object.entries(value).flatMap(([key, item]) =>
    pathsOf(item, path === '' ? key : `${path}.${key}`),
  );
  return path === '' ? below : [path, ...below];
}

const words = fc.constantFrom<unknown>(
  '12 W',
  '5 %',
  '3 mm',
  '22 degC',
  '0.3 K/W',
  'NaN W',
  '1e308 W',
  '-3 W',
  '5 W/m K',
  'flat',
  'Brewster',
  'pi',
  'from crystal',
  'quantum defect',
  'constructor',
  '__proto__',
  '',
  0,
  1,
  -1,
  2,
  0.5,
  1e308,
  Number.NaN,
  null,
  true,
  false,
  undefined,
  [],
  {},
  [[]],
  { kind: 'air' },
  { coefficient: '3 cm^-1' },
  { mirror: {} },
  { rod: true },
  { kind: 'fan' },
);
const anything = fc.oneof(
  words,
  fc.anything({ maxDepth: 3, withNullPrototype: true }),
  fc.json().map((text) => JSON.parse(text) as unknown),
  fc.string({ unit: 'binary' }),
);
const keys = fc.oneof(
  fc.constantFrom('powr', 'kind', 'length', '__proto__', 'constructor', '0', 'uncertainty'),
  fc.string(),
);

/** One change: a value replaced, or a key added beside it. */
const change = fc.record({
  design: fc.nat(inputs.length - 1),
  place: fc.nat(),
  key: fc.option(keys),
  value: anything,
});

function mutated(
  design: unknown,
  { place, key, value }: { place: number; key: string | null; value: unknown },
): unknown {
  const paths = pathsOf(design);
  const path = paths[place % Math.max(1, paths.length)] ?? 'pump';
  return withValue(
    design,
    key === null ? path : `${path.split('.').slice(0, -1).join('.') || 'pump'}.${key}`,
    value,
  );
}

const mutation = fc
  .tuple(fc.nat(inputs.length - 1), fc.array(change, { minLength: 1, maxLength: 4 }))
  .map(([which, changes]) => changes.reduce<unknown>(mutated, inputs[which]![1]));

describe('a design with anything in any place', () => {
  test('is either a design that resolves to numbers, or refused in sentences that name the fields', () => {
    fc.assert(
      fc.property(mutation, (input) => {
        const found = checkDesign(input);
        if (found.ok) expect(Number.isFinite(resolve(found.design).rod.radius)).toBe(true);
        else expect(found.faults.length).toBeGreaterThan(0);
        expect(found.ok ? [] : found.faults.flatMap(sentenceFaults)).toEqual([]);
      }),
      { numRuns: 1500, seed: 20_241 },
    );
  });

  test('has faults only where there is something, or where something is missing', () => {
    fc.assert(
      fc.property(mutation, (input) => {
        const found = checkDesign(input);
        for (const { path, kind } of found.ok ? [] : found.faults) {
          const keys = path.split('.');
          const group = keys.slice(0, -1).join('.');
          const inUncertainty = path.startsWith('uncertainty.');
          const there = path === '' || group === '' || inUncertainty || valueAt(input, group) !== undefined;
          // A key that nobody knows may itself hold dots.
          const dotted = keys.some((_, n) => {
            const holder = valueAt(input, keys.slice(0, n).join('.'));
            return typeof holder === 'object' && holder && Object.hasOwn(holder, keys.slice(n).join('.'));
          });
          expect(there || (kind === 'unknown key' && dotted) || kind === 'missing', path).toBe(true);
        }
      }),
      { numRuns: 500, seed: 7 },
    );
  });

  test('still has its fields and alternatives listed while it is being typed', () => {
    fc.assert(
      fc.property(mutation, (input) => {
        for (const field of fieldsOf(input as Design)) expect(valueAt(input, field.path)).toBe(field.value);
        alternativesOf(input as Design);
      }),
      { numRuns: 500, seed: 11 },
    );
  });
});

test('any text is read as a design or refused, and nothing else happens', () => {
  const example = JSON.stringify(inputs[1]![1]);
  const cut = fc
    .tuple(fc.nat(example.length), fc.nat(20), fc.string())
    .map(([at, length, put]) => example.slice(0, at) + put + example.slice(at + length));
  fc.assert(
    fc.property(fc.oneof(fc.string({ unit: 'binary' }), fc.json(), cut), (text) => {
      try {
        readDesign(text);
      } catch (reason) {
        expect(reason).toBeInstanceOf(DesignError);
        expect((reason as DesignError).faults.flatMap(sentenceFaults)).toEqual([]);
      }
    }),
    { numRuns: 500, seed: 3 },
  );
});
