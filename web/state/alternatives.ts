import { valueAt } from '../../src/design/fields';
import type { Design } from '../../src/design/schema';

/** A value that may be written in one of several shapes; the person chooses the shape first. */
export interface Alternative {
  path: string;
  label: string;
  hint?: string;
  options: { name: string; value: unknown; fits: (value: unknown) => boolean }[];
}

const isWord = (word: string) => (value: unknown) => value === word;
const hasKey = (key: string) => (value: unknown) => typeof value === 'object' && value !== null && key in value;

const absorption: Alternative = {
  path: 'rod.absorption',
  label: 'Absorption',
  hint: 'From the crystal lines, or a coefficient of your own',
  options: [
    { name: 'from the crystal', value: 'from crystal', fits: isWord('from crystal') },
    { name: 'measured', value: { coefficient: '4.5 cm^-1' }, fits: hasKey('coefficient') },
  ],
};

const heatFraction: Alternative = {
  path: 'rod.heatFraction',
  label: 'Heat fraction',
  hint: 'Heat over absorbed pump power',
  options: [
    { name: 'from the laser', value: 'from laser', fits: isWord('from laser') },
    { name: 'quantum defect', value: 'quantum defect', fits: isWord('quantum defect') },
    { name: 'given', value: { lasing: '27 %', blocked: '38 %' }, fits: hasKey('lasing') },
  ],
};

const supply = (place: number): Alternative => ({
  path: `coolers.${place}.supply`,
  label: 'Coolant supply',
  options: [
    {
      name: 'chiller',
      value: { kind: 'chiller', setPoint: '20 degC', capacity: '300 W' },
      fits: (value) => hasKey('kind')(value) && (value as { kind: string }).kind === 'chiller',
    },
    {
      name: 'heat exchanger to air',
      value: { kind: 'air', resistance: '0.02 K/W' },
      fits: (value) => hasKey('kind')(value) && (value as { kind: string }).kind === 'air',
    },
  ],
});

/** Every place of the design where one of several shapes can be chosen. */
export function alternativesOf(design: Design): Alternative[] {
  const supplies = design.coolers.flatMap((cooler, place) => (cooler.kind === 'liquid' ? [supply(place)] : []));
  return [absorption, heatFraction, ...supplies];
}

/** Name of the shape the design has there. */
export function shapeOf(design: Design, { path, options }: Alternative): string {
  const value = valueAt(design, path);
  return options.find((option) => option.fits(value))?.name ?? options[0]!.name;
}
