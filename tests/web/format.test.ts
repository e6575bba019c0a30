import { describe, expect, test } from 'vitest';
import { axisNumber, percent, significant } from '../../web/format/number';
import { band, length, limitValue, power, temperature } from '../../web/format/quantities';
import { shortRange } from '../../web/format/range';

describe('numbers on the screen', () => {
  test('nothing that is not a number is ever written as one', () => {
    for (const value of [NaN, Infinity, -Infinity, null, undefined]) {
      expect(significant(value)).toBe('none');
      expect(percent(value)).toBe('none');
      expect(power(value)).toBe('none');
      expect(temperature(value)).toBe('none');
    }
  });

  test('three digits are kept, small and large numbers get a power of ten', () => {
    expect(significant(12.345)).toBe('12.3');
    expect(significant(0.0123456)).toBe('0.0123');
    expect(significant(9.999)).toBe('10.0');
    expect(significant(-7.3e-6)).toBe('−7.30 × 10⁻⁶');
    expect(significant(0)).toBe('0');
  });

  test('an axis carries no trailing zeros', () => {
    expect(axisNumber(20)).toBe('20');
    expect(axisNumber(2.5)).toBe('2.5');
    expect(axisNumber(0)).toBe('0');
  });

  test('a unit is chosen so that the number stays readable', () => {
    expect(power(0.0042)).toBe('4.20\u00a0mW');
    expect(length(2.6e-4)).toBe('260\u00a0µm');
    expect(length(0.085)).toBe('85.0\u00a0mm');
    expect(temperature(273.15)).toBe('0.0\u00a0°C');
  });

  test('a limit on a temperature is read in degrees Celsius, its band says the unit once', () => {
    expect(limitValue('rod peak temperature', 383.15, 'K')).toBe('110.0\u00a0°C');
    expect(limitValue('TEC current', 3.5, 'A')).toBe('3.50\u00a0A');
    expect(band(5.8, 19)).toBe('5.80 to 19.0\u00a0W');
    expect(band(5.8, null)).toBeNull();
  });

  test('a range says its unit once', () => {
    expect(shortRange('-70 degC to 200 degC')).toBe('−70 to 200 °C');
    expect(shortRange('more than 0 um to 5000 um')).toBe('above 0 to 5000 µm');
    expect(shortRange('at least 1')).toBe('at least 1');
  });
});
