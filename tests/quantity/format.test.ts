import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  convertTo,
  dimensionRecord,
  DIMENSIONS,
  formatQuantity,
  nearestName,
  parseQuantity,
  unitsOf,
} from '../../src/quantity';

const dimension = fc.constantFrom(...DIMENSIONS);
const magnitude = fc
  .tuple(fc.double({ min: 1, max: 10, noNaN: true }), fc.integer({ min: -25, max: 25 }), fc.boolean())
  .map(([mantissa, exponent, negative]) => (negative ? -1 : 1) * mantissa * 10 ** exponent);

describe('writing a quantity', () => {
  test('any value of any dimension in any listed unit reads back as itself', () => {
    fc.assert(
      fc.property(dimension, magnitude, fc.nat(), (kind, drawn, choice) => {
        const value = kind === 'temperature' ? Math.abs(drawn) : drawn;
        const units = unitsOf(kind);
        const unit = units[choice % units.length]!;
        const parsed = parseQuantity(formatQuantity(value, kind, unit), kind);
        expect(parsed).toMatchObject({ ok: true });
        // a temperature near absolute zero loses digits against the zero of its scale: 1e-12 of 273 K
        const floor = kind === 'temperature' ? 273.15 : 0;
        if (parsed.ok)
          expect(Math.abs(parsed.value - value)).toBeLessThanOrEqual(1e-12 * (Math.abs(value) + floor));
      }),
      { seed: 1, numRuns: 2000 },
    );
  });

  test('reading never throws and always answers, whatever is typed', () => {
    const typed = fc.oneof(
      fc.string({ maxLength: 60, unit: 'grapheme' }),
      fc
        .array(
          fc.constantFrom(
            '1',
            '.5',
            'e3',
            ' ',
            '/',
            '(',
            ')',
            '^',
            '-',
            'W',
            'm',
            'K',
            '°C',
            '·',
            'cm²',
            'at.%',
            '*',
            '10^',
          ),
          { maxLength: 14 },
        )
        .map((parts) => parts.join('')),
    );
    fc.assert(
      fc.property(typed, dimension, (text, kind) => {
        const parsed = parseQuantity(text, kind);
        if (parsed.ok) expect(Number.isFinite(parsed.value)).toBe(true);
        else expect(parsed.reason.length).toBeGreaterThan(10);
      }),
      { seed: 2, numRuns: 3000 },
    );
  });

  test('what is read can be written in the unit it was given in', () => {
    for (const kind of DIMENSIONS) {
      for (const unit of unitsOf(kind)) {
        const parsed = parseQuantity(`5 ${unit}`, kind);
        expect(parsed, `${kind} ${unit}`).toMatchObject({ ok: true });
        if (parsed.ok)
          expect(formatQuantity(parsed.value, kind, parsed.unit)).toBe(
            unit === '°' ? '5°' : `5 ${unit}`.trim(),
          );
      }
    }
  });

  test('a value is written in the default unit without rounding noise', () => {
    expect(formatQuantity(12, 'power')).toBe('12 W');
    expect(formatQuantity(200e-6, 'length')).toBe('0.2 mm');
    expect(formatQuantity(150e-6, 'length', 'um')).toBe('150 um');
    expect(formatQuantity(295.15, 'temperature')).toBe('22 degC');
    expect(formatQuantity(9000, 'heatTransferCoefficient')).toBe('0.9 W/(cm^2 K)');
    expect(formatQuantity(-0, 'power')).toBe('0 W');
    expect(formatQuantity(1.8, 'dimensionless')).toBe('1.8');
    expect(formatQuantity(0.5, 'dimensionless', '%')).toBe('50 %');
    expect(formatQuantity(Math.PI / 18, 'angle', '°')).toBe('10°');
  });

  test('a difference of one kelvin is 1.8 degrees Fahrenheit, without the zero of the scale', () => {
    expect(convertTo(1, 'degF', 'temperatureDifference')).toBeCloseTo(1.8, 12);
    expect(convertTo(273.15, 'degF', 'temperature')).toBeCloseTo(32, 10);
  });

  test('a unit of another dimension, or a value that is no number, is a bug of the caller', () => {
    expect(() => convertTo(1, 'mm', 'power')).toThrow(/not a power/);
    expect(() => formatQuantity(Number.NaN, 'power')).toThrow(/cannot be written/);
    expect(() => formatQuantity(1, 'temperature', 'K m/m')).toThrow(/not a temperature/);
  });
});

test('the example given for a dimension is itself a quantity of that dimension', () => {
  for (const kind of DIMENSIONS) {
    for (const example of dimensionRecord(kind).example.split(' or ')) {
      expect(parseQuantity(example, kind), example).toMatchObject({ ok: true });
    }
  }
});

test('the nearest name is suggested only when it is near', () => {
  const names = ['copper', 'aluminium 6061', 'brass'];
  expect(nearestName(names, 'cooper')).toBe('copper');
  expect(nearestName(names, 'Aluminum 6061')).toBe('aluminium 6061');
  expect(nearestName(names, 'unobtainium')).toBeUndefined();
});
