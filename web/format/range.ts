const pretty = (text: string) =>
  text
    .replace(/deg([CF])/g, '°$1')
    .replace(/\bum\b/g, 'µm')
    .replace(/(^|\s)-(?=\d)/g, '$1−');

/** An allowed range with its unit said once: "-70 degC to 200 degC" becomes "−70 to 200 °C". */
export function shortRange(allowed: string): string {
  const both = /^(more than )?(\S+) (.+) to (\S+) (.+)$/.exec(allowed);
  if (!both || both[3] !== both[5]) return pretty(allowed);
  const [, above, low, unit, high] = both;
  return pretty(`${above ? 'above ' : ''}${low} to ${high} ${unit}`);
}
