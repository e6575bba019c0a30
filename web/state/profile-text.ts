type Points = readonly (readonly [string, number])[];

/** A measured profile as lines of text, one point each: "50 um, 0.9". */
export const profileText = (points: Points | undefined): string =>
  (points ?? []).map(([radius, intensity]) => `${radius}, ${intensity}`).join('\n');

/**
 * Reads lines of radius and intensity, set apart by a comma, semicolon, tab or the last space; a line without a unit is
 * in micrometres. What is no number stays as it was typed, so that the check can name it.
 * @returns undefined where nothing is typed
 */
export function readProfile(text: string): [string, unknown][] | undefined {
  const lines = text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
  if (lines.length === 0) return undefined;
  return lines.map((line) => {
    const [, radius = line, intensity = ''] =
      /^(.*?)\s*[,;\t]\s*(\S*)$/.exec(line) ?? /^(.*)\s+(\S+)$/.exec(line) ?? [];
    const bare = radius !== '' && Number.isFinite(Number(radius));
    const number = intensity === '' ? Number.NaN : Number(intensity);
    return [bare ? `${radius} um` : radius, Number.isNaN(number) ? intensity : number];
  });
}
