/**
 * A sequential colour map whose lightness rises evenly, so that equal steps of temperature look equal and the map survives
 * grey printing and colour blindness: the cube helix (Green 2011, Bull. Astr. Soc. India 39, 289) from deep blue through red to pale yellow.
 * @param share 0 coldest to 1 hottest
 * @returns red, green, blue 0..255
 */
export function heatColour(share: number): [number, number, number] {
  const t = Math.min(1, Math.max(0, share));
  const light = 0.1 + 0.86 * t;
  const angle = 2 * Math.PI * (0.02 + 0.43 * t);
  const depth = 0.8 * light * (1 - light);
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const channel = (a: number, b: number) =>
    Math.round(255 * Math.min(1, Math.max(0, light + depth * (a * c + b * s))));
  return [channel(-0.14861, 1.78277), channel(-0.29227, -0.90649), channel(1.97294, 0)];
}

/** The map as 256 entries of RGB, for drawing many cells. */
export function heatTable(): Uint8ClampedArray {
  const table = new Uint8ClampedArray(256 * 3);
  for (let entry = 0; entry < 256; entry += 1) table.set(heatColour(entry / 255), entry * 3);
  return table;
}
