const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function plainSuperscripts(run: string): string {
  const digits = [...run].map((sign) => {
    if (sign === '⁻') return '-';
    return sign === '⁺' ? '+' : String(SUPERSCRIPTS.indexOf(sign));
  });
  return `^${digits.join('')}`;
}

/**
 * One spelling for the many ways of typing the same sign: both micro signs, both ohm signs, the true minus, the
 * degree-Celsius sign, product dots, superscripts, no-break and thin spaces.
 */
export function normalise(text: string): string {
  return text
    .replace(/[\u2070\u00b9\u00b2\u00b3\u2074-\u2079\u207a\u207b]+/g, plainSuperscripts)
    .replace(/\u03bc/g, 'µ')
    .replace(/\u2126/g, 'Ω')
    .replace(/\u212b/g, 'Å')
    .replace(/[\u2212\u2010\u2011\u2013]/g, '-')
    .replace(/\u2103/g, '°C')
    .replace(/\u2109/g, '°F')
    .replace(/\u00ba/g, '°')
    .replace(/\u00d7/g, 'x')
    .replace(/\*\*/g, '^')
    .replace(/[\u00b7\u22c5\u2219]/g, '*')
    .replace(/\s+/g, ' ')
    .replace(/° (?=[CF]\b)/g, '°')
    .replace(/\bat\. %/g, 'at.%')
    .trim();
}
