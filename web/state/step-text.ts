const leading = /^(\s*)([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)(.*)$/s;

const decimalsOf = (text: string) => text.split(/[eE]/)[0]!.split('.')[1]?.length ?? 0;

/** One step of a number: a tenth of its leading decade, one for counts and temperatures. */
function stepOf(size: number, rest: string, whole: boolean): number {
  if (whole || /°|deg/.test(rest)) return 1;
  if (size === 0) return 0.1;
  return 10 ** (Math.floor(Math.log10(size) + 1e-9) - 1);
}

/**
 * The text of a quantity with its leading number moved by some steps, unit and spelling kept.
 * @param text as typed, such as "12 W" or "0.28 nm/K"
 * @param steps signed number of steps; ten with shift held
 * @param whole counts move by one
 * @returns the new text, or null where the text does not start with a number
 */
export function steppedText(text: string, steps: number, whole = false): string | null {
  const match = leading.exec(text);
  if (!match) return null;
  const [, before, digits, rest] = match as unknown as [string, string, string, string];
  const value = Number(digits);
  if (!Number.isFinite(value) || /[eE]/.test(digits)) return null;
  const step = stepOf(Math.abs(value), rest, whole);
  const places = Math.max(decimalsOf(digits), Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
  const moved = (value + steps * step).toFixed(Math.min(places, 12));
  return `${before}${places > 0 ? String(Number(moved)) : moved}${rest}`;
}
