import { nearestName } from './nearest';
import { UNITS } from './units';

/** Symbols offered in "did you mean": every plain unit and the prefixed ones people write. */
const SUGGESTIONS = [
  ...Object.keys(UNITS),
  ...[
    'nm',
    'um',
    'µm',
    'mm',
    'cm',
    'km',
    'mW',
    'kW',
    'mJ',
    'kJ',
    'mL',
    'ml',
    'ms',
    'us',
    'kg',
    'mbar',
    'kPa',
  ],
  ...['MPa', 'GPa', 'hPa', 'mA', 'mV', 'mrad', 'urad', 'mK', 'kN', 'kHz', 'MHz'],
];
const OTHER_NAMES: Readonly<Record<string, string>> = {
  C: 'degC',
  F: 'degF',
  celsius: 'degC',
  kelvin: 'K',
  watt: 'W',
  watts: 'W',
  metre: 'm',
  meter: 'm',
  micrometre: 'um',
  sec: 's',
  hr: 'h',
  hour: 'h',
  inch: 'in',
  degree: 'deg',
  degrees: 'deg',
  diopter: 'dpt',
  dioptre: 'dpt',
  diopters: 'dpt',
  dioptres: 'dpt',
  D: 'dpt',
  amp: 'A',
  litre: 'L',
  liter: 'L',
};

/** The known unit a person most likely meant by a symbol that is not one; undefined when none is near. */
export function likelyUnit(symbol: string): string | undefined {
  const folded = symbol.toLowerCase();
  if (Object.hasOwn(OTHER_NAMES, symbol)) return OTHER_NAMES[symbol];
  if (Object.hasOwn(OTHER_NAMES, folded)) return OTHER_NAMES[folded];
  return nearestName(SUGGESTIONS, symbol);
}
