import { significant } from './number';

/** Numbers of the report (SI, kelvin) as a person reads them. A space that does not break stands before the unit. */
type Given = number | null | undefined;

const gap = '\u00a0';
const finite = (value: Given): value is number => typeof value === 'number' && Number.isFinite(value);

function prefixed(value: Given, unit: string, steps: [number, string][], digits: number): string {
  if (!finite(value)) return 'none';
  const size = Math.abs(value);
  const [factor, prefix] = steps.find(([from]) => size >= from * 0.9995) ?? steps.at(-1)!;
  return `${significant(value / factor, digits)}${gap}${size === 0 ? '' : prefix}${unit}`;
}

export function power(value: Given, digits = 3): string {
  return prefixed(
    value,
    'W',
    [
      [1e3, 'k'],
      [1, ''],
      [1e-3, 'm'],
      [1e-6, 'µ'],
    ].map(asStep),
    digits,
  );
}

export function length(value: Given, digits = 3): string {
  if (value === 0) return `0${gap}mm`;
  return prefixed(
    value,
    'm',
    [
      [1, ''],
      [1e-3, 'm'],
      [1e-6, 'µ'],
      [1e-9, 'n'],
    ].map(asStep),
    digits,
  );
}

export function stress(value: Given, digits = 3): string {
  return prefixed(
    value,
    'Pa',
    [
      [1e9, 'G'],
      [1e6, 'M'],
      [1e3, 'k'],
      [1, ''],
    ].map(asStep),
    digits,
  );
}

const asStep = ([factor, prefix]: (string | number)[]): [number, string] => [
  factor as number,
  prefix as string,
];

/** Kelvin in, degrees Celsius out, to a tenth below 200 °C. */
export function temperature(kelvin: Given): string {
  if (!finite(kelvin)) return 'none';
  const celsius = kelvin - 273.15;
  return `${celsius.toFixed(Math.abs(celsius) < 199.95 ? 1 : 0).replace('-', '−')}${gap}°C`;
}

export function rise(kelvin: Given): string {
  return finite(kelvin) ? `${significant(kelvin)}${gap}K` : 'none';
}

/** Dioptric power, positive converging. */
export function lensPower(value: Given): string {
  return finite(value) ? `${significant(value)}${gap}/m` : 'none';
}

export function wavelength(value: Given): string {
  return finite(value) ? `${(value * 1e9).toFixed(2)}${gap}nm` : 'none';
}

export function mass(kilograms: Given): string {
  return prefixed(
    kilograms === null || kilograms === undefined ? kilograms : kilograms * 1e3,
    'g',
    [
      [1e3, 'k'],
      [1, ''],
      [1e-3, 'm'],
    ].map(asStep),
    3,
  );
}

/** Round-trip stability m; the sign counts. */
export function stability(value: Given): string {
  return finite(value) ? value.toFixed(3).replace('-', '−') : 'none';
}

/** A value whose unit comes with it as text. */
export function withUnit(value: Given, unit: string, digits = 3): string {
  if (!finite(value)) return 'none';
  if (unit === 'W') return power(value, digits);
  if (unit === 'm') return length(value, digits);
  if (unit === 'Pa') return stress(value, digits);
  if (unit === '' || unit === '1') return significant(value, digits);
  return `${significant(value, digits)}${gap}${unit}`;
}

/** Value of a limit: temperatures are shown in degrees Celsius, everything else in its own unit. */
export function limitValue(limit: string, value: Given, unit: string): string {
  if (limit === 'steady state') return value === 1 ? 'exists' : 'none';
  const isTemperature = unit === 'K' && /temperature|dew point|case window/.test(limit);
  return isTemperature ? temperature(value) : withUnit(value, unit);
}

/** "5.8 to 19 W", or null while the band is not known. */
export function band(low: Given, high: Given): string | null {
  return finite(low) && finite(high) ? `${significant(low)} to ${power(high)}` : null;
}

/** Distance from a bound: a temperature difference where the limit is a temperature. */
export function marginValue(margin: number, unit: string): string {
  return unit === 'K' ? rise(margin) : withUnit(margin, unit);
}
