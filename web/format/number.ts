const superscript: Record<string, string> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

const minus = (text: string) => text.replace('-', '−');

/**
 * A number with so many significant digits, in the way people write it: "0.0123", "4 560", "8.5 × 10⁻⁶".
 * @returns "none" for anything that is not a finite number, so that no screen ever shows the words of the machine
 */
export function significant(value: number | null | undefined, digits = 3): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return 'none';
  if (value === 0) return '0';
  const exponent = Math.floor(Math.log10(Math.abs(Number(value.toPrecision(digits)))));
  if (exponent < -3 || exponent > 6) {
    const mantissa = (value / 10 ** exponent).toPrecision(digits);
    const power = [...String(exponent)].map((sign) => superscript[sign]).join('');
    return minus(`${mantissa} × 10${power}`);
  }
  const places = Math.max(0, digits - 1 - exponent);
  return minus(value.toFixed(places));
}

/** A share of one as per cent. */
export function percent(value: number | null | undefined, digits = 3): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return 'none';
  return `${significant(value * 100, digits)} %`;
}

/** A number on an axis: three significant digits at most, no trailing zeros. */
export function axisNumber(value: number): string {
  const text = significant(value, 3);
  return text.includes('.') && !text.includes('×') ? text.replace(/0+$/, '').replace(/\.$/, '') : text;
}
