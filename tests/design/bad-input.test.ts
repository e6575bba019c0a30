import { describe, expect, test } from 'vitest';
import { checkDesign, longestDesign, readDesign } from '../../src/design/check';
import { demoDesign } from '../../src/design/demo';
import { fieldsOf, valueAt, withValue } from '../../src/design/fields';
import { formatQuantity } from '../../src/quantity';
import { DesignError } from '../../src/errors';
import { checked, faultsOf, inputs, vanadate } from './designs';
import { sentenceFaults } from './sentences';

const fields = inputs.flatMap(([name, input]) =>
  fieldsOf(checked(input)).map((field) => [`${field.path} of ${name}`, field, input] as const),
);
const quantities = fields.filter(([, field]) => field.kind === 'quantity');
const numbers = fields.filter(([, field]) => field.kind === 'number');

/** Faults of a design with one value replaced. */
const after = (input: unknown, path: string, value: unknown) => faultsOf(withValue(input, path, value));

/** The one fault that a single wrong value must give, at its own field. */
function onlyFault(input: unknown, path: string, value: unknown) {
  const faults = after(input, path, value);
  expect(faults.map((fault) => fault.path)).toEqual([path]);
  expect(sentenceFaults(faults[0]!)).toEqual([]);
  return faults[0]!;
}

describe('a quantity field refuses, in one sentence that names it,', () => {
  test.each(quantities)(
    '%s: another dimension, no unit, an unknown unit, no number, nothing at all',
    (_, field, input) => {
      const { path, note } = field;
      const other = note.dimension === 'current' ? '5 K' : '5 A';
      expect(onlyFault(input, path, other).kind).toBe('wrong dimension');
      if (note.dimension !== 'dimensionless')
        expect(onlyFault(input, path, '12').message).toMatch(/without a unit/);
      expect(onlyFault(input, path, '12 flurb').kind).toBe('unknown unit');
      for (const text of [
        'NaN W',
        'Infinity',
        '1e308 W',
        '-1e308 m',
        '',
        ' ',
        '1e9999 K',
        '\n\t"',
        'constructor',
        '__proto__',
      ])
        onlyFault(input, path, text);
      for (const value of [12, Number.NaN, 1e308, true, null, {}, [], [['12 W']]])
        expect(onlyFault(input, path, value).kind).toBe('wrong type');
    },
  );

  test.each(quantities.filter(([, field]) => field.note.range))(
    '%s: values beyond either end of its range',
    (_, field, input) => {
      const { path, note } = field;
      const { above, from, to, below } = note.range!;
      const low = above ?? from!;
      const high = below ?? to!;
      const step = 0.01 * (high - low);
      const beyond = [
        low - step,
        high + step,
        ...(above === undefined ? [] : [above]),
        ...(below === undefined ? [] : [below]),
      ];
      for (const value of beyond.filter((bound) => note.dimension !== 'temperature' || bound > 0)) {
        const fault = onlyFault(input, path, formatQuantity(value, note.dimension!, note.unit));
        expect(fault.kind).toBe('out of range');
        expect(fault.message).toMatch(/it must be (more than|at least) .* and (less than|at most) /);
      }
    },
  );
});

describe('a number field refuses, in one sentence that names it,', () => {
  test.each(numbers)(
    '%s: text, fractions of a count, what is no number, and values beyond its range',
    (_, field, input) => {
      const { path, note } = field;
      for (const value of ['3', '3 W', Number.NaN, Infinity, null, true, {}, []])
        expect(onlyFault(input, path, value).kind).toBe('wrong type');
      for (const value of [-1e308, -1, 1e308])
        expect(onlyFault(input, path, value).kind).toBe('out of range');
      if (note.range?.whole) expect(onlyFault(input, path, 2.5).message).toMatch(/whole number/);
    },
  );
});

describe('the messages', () => {
  test.each([
    ['pump.radius', '20 mm', 'pump.radius: got "20 mm"; it must be more than 0 um and at most 5000 um'],
    ['pump.power', 12, 'pump.power: got 12; a power is written as text, such as "12 W"'],
    ['pump.power', '12', 'pump.power: "12" is a number without a unit; a power is needed, such as 12 W'],
    [
      'surroundings.ambient',
      '-90 degC',
      'surroundings.ambient: got "-90 degC"; it must be at least -70 degC and at most 200 degC',
    ],
    [
      'rod.absorption',
      { coefficient: '4.5' },
      'rod.absorption.coefficient: "4.5" is a number without a unit; a coefficient per length (absorption, dioptre) is needed, such as 4.5 cm^-1',
    ],
    [
      'rod.absorption',
      {},
      'rod.absorption.coefficient: missing; needed: a coefficient per length (absorption, dioptre), such as "4.5 cm^-1"',
    ],
    [
      'rod.absorption',
      'from crystall',
      'rod.absorption: got "from crystall"; "from crystal" or { "coefficient": "4.5 cm^-1" } is needed',
    ],
    [
      'rod.heatFraction',
      { lasing: '120 %' },
      'rod.heatFraction.lasing: got "120 %"; it must be more than 0 % and at most 100 %',
    ],
    [
      'coolers.0.kind',
      undefined,
      'coolers.0.kind: got nothing; a cooler\'s kind is "passive", "fan", "liquid", "tec" or "resistance"',
    ],
    [
      'coolers.0.kind',
      'fanny',
      'coolers.0.kind: got "fanny"; a cooler\'s kind is "passive", "fan", "liquid", "tec" or "resistance"',
    ],
    [
      'coolers.1.supply.kind',
      undefined,
      'coolers.1.supply.kind: got nothing; a supply\'s kind is "chiller" or "air"',
    ],
    [
      'cavity.elements.0.mirror.incidence',
      '5 deg',
      'cavity.elements.0.mirror.incidence: got "5 deg"; an end mirror of a linear cavity is met at 0 deg',
    ],
    [
      'mount.shape.kind',
      'cube',
      'mount.shape.kind: got "cube"; a mount\'s kind is "ring", "block" or "none"',
    ],
    ['chosenCooler', 'fun', 'chosenCooler: got "fun"; did you mean "fan"? known are fan, loop, tec, plain'],
    [
      'coolers.2.hotSide',
      'tec',
      'coolers.2.hotSide: got "tec", which is itself a TEC; it can be fan, loop, plain',
    ],
    [
      'coolers.1.coolant',
      'air',
      'coolers.1.coolant: got "air"; known are water, propylene glycol 25 %, propylene glycol 50 %, ethylene glycol 50 %',
    ],
    ['pump.polarization', 'pi', 'pump.polarization: this key is not known; did you mean "polarisation"?'],
    ['limits', [], /^limits: got an empty list; a group in \{ \} with rodPeakTemperature, .* is needed$/],
    ['version', 2, 'version: got 2; version 1 is read; a later program wrote this file'],
    ['format', undefined, 'format: got nothing; "pump-ceiling/design" is needed'],
    ['rod.length', undefined, 'rod.length: missing; needed: a length, such as "10 mm"'],
    [
      'rod.section.side',
      undefined,
      'rod.section.side: missing; a square section needs its side, such as "3 mm"',
    ],
    ['pump', undefined, /^pump: missing; needed: a group in \{ \} with power, powerRange, wavelength/],
    ['coolers', undefined, 'coolers: missing; needed: a list'],
  ])('of %s = %j say what was given and what is allowed', (path, value, message) => {
    const faults = after(vanadate, path, value);
    expect(faults).toHaveLength(1);
    if (typeof message === 'string') expect(faults[0]!.message).toBe(message);
    else expect(faults[0]!.message).toMatch(message);
    expect(sentenceFaults(faults[0]!)).toEqual([]);
  });

  test('suggest a catalogue name by its alias too, and list no more names than a person reads', () => {
    const [fault] = after(vanadate, 'mount.material', 'aluminum 6061');
    expect(fault?.message ?? '').toMatch(/^$|did you mean "aluminium 6061"\?/);
    expect(after(vanadate, 'rod.crystal', 'NdYVO')[0]!.message).toMatch(/did you mean "Nd:YVO4"\?/);
  });

  test.each([
    ['rod.absorption', '4.5 cm^-1', { coefficient: '4.5 cm^-1', drift: 'ignored' }],
    ['rod.heatFraction', '27 %', { lasing: '27 %' }],
    ['mount.interface', 'indium foil', { kind: 'indium foil' }],
  ])('of %s = "%s" are none: one text stands for the group', (path, text, group) => {
    expect(valueAt(checked(withValue(vanadate, path, text)), path)).toEqual(group);
  });

  test.each([
    ['rod.absorption', '4.5 W', 'rod.absorption.coefficient'],
    ['rod.heatFraction', '120 %', 'rod.heatFraction.lasing'],
    ['rod.heatFraction', 'quantum deffect', 'rod.heatFraction'],
    ['mount.interface', 'glue', 'mount.interface.kind'],
  ])('of %s = "%s" name %s', (path, text, at) => {
    expect(after(vanadate, path, text).map((fault) => fault.path)).toEqual([at]);
  });

  test('name every unknown key, not the first alone', () => {
    const paths = after(withValue(vanadate, 'pump.powr', '1 W'), 'pump.lenght', '1 mm').map(
      (fault) => fault.path,
    );
    expect(paths).toEqual(['pump.powr', 'pump.lenght']);
  });

  test('are one for a file of a later version, however its shape has changed', () => {
    expect(faultsOf({ format: 'pump-ceiling/design', version: 7, light: {}, crystal: [] })).toHaveLength(1);
  });
});

describe('what must fit together', () => {
  const ring = [
    { mirror: { radius: 'flat' } },
    { rod: true },
    { space: '50 mm' },
    { mirror: { radius: '1 m' } },
  ];
  test.each([
    ['pump.radius', '1.5 mm', 'pump.radius'],
    ['mount.shape.outerRadius', '2.1 mm', 'mount.shape.outerRadius'],
    ['mount.shape', { kind: 'block', width: '4.2 mm', depth: '9 mm', cover: '9 mm' }, 'mount.shape.width'],
    ['mount.shape', { kind: 'block', width: '9 mm', depth: '2 mm', cover: '9 mm' }, 'mount.shape.depth'],
    ['mount.shape', { kind: 'block', width: '9 mm', depth: '9 mm', cover: '2 mm' }, 'mount.shape.cover'],
    ['pump.powerRange', ['5 W', '5 W'], 'pump.powerRange'],
    ['pump.profile', 'table', 'pump.profileTable'],
    [
      'pump.profileTable',
      [
        ['10 um', 1],
        ['20 um', 1],
        ['30 um', 0],
      ],
      'pump.profileTable.0.0',
    ],
    [
      'pump.profileTable',
      [
        ['0 um', 1],
        ['30 um', 1],
        ['30 um', 0],
      ],
      'pump.profileTable.2.0',
    ],
    [
      'pump.profileTable',
      [
        ['0 um', 0],
        ['20 um', 0],
        ['30 um', 0],
      ],
      'pump.profileTable',
    ],
    [
      'pump.profileTable',
      [
        ['0 um', 1],
        ['20 um', 0],
      ],
      'pump.profileTable',
    ],
    [
      'pump.profileTable',
      [
        ['0 um', 1],
        ['20 um', -1],
        ['30 um', 0],
      ],
      'pump.profileTable.1.1',
    ],
    [
      'pump.profileTable',
      [
        ['0 um', 1],
        ['20 um', 1, 2],
        ['30 um', 0],
      ],
      'pump.profileTable.1.2',
    ],
    ['pump.profileTable', 'profile.csv', 'pump.profileTable'],
    ['pump.profileTable', Array.from({ length: 2001 }, (_, k) => [`${k} um`, 1]), 'pump.profileTable'],
    ['coolers.0.sink.finCount', 100, 'coolers.0.sink.finCount'],
    ['coolers.1.id', 'fan', 'coolers.1.id'],
    ['cavity.elements.1', { space: '1 mm' }, 'cavity.elements'],
    ['cavity.elements.3', { lens: '0 mm' }, 'cavity.elements.3.lens'],
    ['cavity.elements.3', { lens: '1 m', space: '1 m' }, 'cavity.elements.3'],
    ['cavity.elements.0', { mirror: { radius: '0 mm' } }, 'cavity.elements.0.mirror.radius'],
    ['cavity.elements.6', { space: '1 mm' }, 'cavity.elements.6'],
    ['cavity', { kind: 'ring', elements: ring }, 'cavity.elements'],
    ['rod.laserLine', '1500 nm', 'rod.laserLine'],
    ['pump.wavelength', '1100 nm', 'rod.laserLine'],
  ])('%s = %j is refused', (path, value, at) => {
    const faults = after(vanadate, path, value);
    expect(faults.map((fault) => fault.path)).toEqual([at]);
    expect(sentenceFaults(faults[0]!)).toEqual([]);
  });

  test('a rod cut along its optic axis cannot emit a line polarised along that axis', () => {
    const c = withValue(withValue(vanadate, 'rod.cut', 'c'), 'rod.laserLine', '1342 nm');
    expect(faultsOf(c).map((fault) => fault.path)).toEqual(['rod.cut']);
  });

  test('polarised pump light has no meaning in an isotropic crystal', () => {
    expect(after(demoDesign, 'pump.polarisation', 'pi').map((fault) => fault.path)).toEqual([
      'pump.polarisation',
    ]);
  });

  test("limits that surely fail are a person's right", () => {
    expect(after(vanadate, 'limits.rodPeakTemperature', '0 degC')).toEqual([]);
    expect(after(vanadate, 'pump.power', '90 W')).toEqual([]);
  });
});

describe('a file that is no design', () => {
  const refused = (text: string): string => {
    try {
      readDesign(text);
    } catch (reason) {
      if (reason instanceof DesignError) return reason.message;
      throw reason;
    }
    return '';
  };

  test.each([
    ['', /empty/],
    ['  \n', /empty/],
    [
      '{"format": "pump-ceiling/design", ',
      /^The file is not valid JSON \(.*\); a design is a JSON object\.$/,
    ],
    ['[]', /^Got an empty list; a design is a JSON object with "format"/],
    ['null', /^Got null/],
    ['12', /^Got 12/],
    ['"text"', /^Got "text"/],
    ['x'.repeat(300), /not valid JSON/],
    [`{"a": "${'\\u0000'.repeat(100)}`, /not valid JSON/],
  ])('%j gives one sentence', (text, sentence) => {
    expect(refused(text)).toMatch(sentence);
    expect(refused(text)).not.toMatch(/\n|undefined|\[object/);
    expect(refused(text).length).toBeLessThan(300);
  });

  test('a byte order mark before the design is no fault', () => {
    expect(readDesign(`\uFEFF${JSON.stringify(vanadate)}`)).toEqual(checked(vanadate));
  });

  // 200 ms: a person does not notice it; the machine that runs the tests may be busy.
  const quick = 200;
  const deep = (levels: number) => JSON.parse('['.repeat(levels) + ']'.repeat(levels)) as unknown;
  const circle: Record<string, unknown> = { ...vanadate };
  circle.notes = circle;
  test.each<[string, () => unknown]>([
    ['10 000 levels deep', () => withValue(vanadate, 'notes', deep(10_000))],
    [
      '10 000 groups deep',
      () => withValue(vanadate, 'rod', JSON.parse('{"rod":'.repeat(10_000) + '1' + '}'.repeat(10_000))),
    ],
    ['a million coolers', () => withValue(vanadate, 'coolers', new Array(1e6).fill(vanadate.coolers[0]))],
    ['a list with a billion empty places', () => ({ ...vanadate, coolers: new Array(1e9) })],
    ['a title of ten million letters', () => withValue(vanadate, 'title', 'x'.repeat(1e7))],
    ['a power of ten million digits', () => withValue(vanadate, 'pump.power', '9'.repeat(1e7))],
    ['a key of a million letters', () => ({ ...vanadate, ['k'.repeat(1e6)]: 1 })],
    [
      'ten thousand unknown keys',
      () => ({ ...vanadate, ...Object.fromEntries(Array.from({ length: 1e4 }, (_, n) => [`k${n}`, n])) }),
    ],
    ['a design that holds itself', () => circle],
  ])('%s is refused quickly', (_, make) => {
    const input = make();
    const begun = performance.now();
    const faults = faultsOf(input);
    expect(performance.now() - begun).toBeLessThan(quick);
    expect(faults).toHaveLength(1);
    expect(sentenceFaults(faults[0]!)).toEqual([]);
  });

  test('a text longer than any design is refused before it is read', () => {
    expect(refused(`{"a": "${'x'.repeat(longestDesign)}"}`)).toMatch(
      /characters; a design has at most 250000\.$/,
    );
    expect(refused('['.repeat(longestDesign))).toMatch(/not valid JSON/);
  });

  test.each(['__proto__', 'constructor', 'prototype', 'toString', 'hasOwnProperty'])(
    'the key %s is no field anywhere',
    (key) => {
      const text = JSON.stringify(vanadate);
      const placed = [
        text.replace('{', `{"${key}":{"power":"1 W"},`),
        text.replace('"pump":{', `"pump":{"${key}":"12 W",`),
        text.replace('"uncertainty":{', `"uncertainty":{"${key}":"5 %",`),
      ];
      for (const one of placed) {
        const message = refused(one);
        expect(message).toMatch(new RegExp(`^[\\w.]*${key}: `));
        expect(message).not.toMatch(/\n|undefined|\[object|function/);
      }
      expect(({} as Record<string, unknown>).power).toBeUndefined();
    },
  );
});

test('what is refused names the faults by field, at most forty of them', () => {
  const many = Object.fromEntries(Array.from({ length: 500 }, (_, n) => [`key${n}`, n]));
  const found = checkDesign({ ...vanadate, ...many });
  expect(found.ok ? 0 : found.faults.length).toBe(40);
});
