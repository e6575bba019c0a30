import type { Field } from '../../src/design/fields';

/** Where on the page a field stands: beside the drawing it changes, or in a named tray below it. */
export type FieldPlace =
  | 'title'
  | 'pump'
  | 'pump light'
  | 'measured profile'
  | 'diode'
  | 'surroundings'
  | 'rod'
  | 'constants'
  | 'mount'
  | 'grip'
  | 'cooler'
  | 'cavity'
  | 'element'
  | 'limits';

const rules: [RegExp, FieldPlace][] = [
  [/^(title|notes|chosenCooler)$/, 'title'],
  [/^pump\.(power|powerRange.*)$/, 'pump'],
  [/^pump\.diode\./, 'diode'],
  [/^pump\.profileTable/, 'measured profile'],
  [/^pump\./, 'pump light'],
  [/^surroundings\./, 'surroundings'],
  [/^rod\.values\./, 'constants'],
  [/^rod\./, 'rod'],
  [/^mount\.(grip|clampingPressure)$/, 'grip'],
  [/^mount\./, 'mount'],
  [/^coolers\./, 'cooler'],
  [/^cavity\.elements\./, 'element'],
  [/^cavity\./, 'cavity'],
  [/^limits\./, 'limits'],
];

export function placeOf(path: string): FieldPlace {
  return rules.find(([pattern]) => pattern.test(path))?.[1] ?? 'limits';
}

/** A field that has no meaning in the design as it stands, such as the side of a round rod. */
export function isIdle(field: Field, value: (path: string) => unknown): boolean {
  const shape = value('rod.section.shape');
  if (field.path === 'rod.section.diameter') return shape !== 'round';
  if (field.path === 'rod.section.side') return shape !== 'square';
  if (field.path === 'mount.clampingPressure') return value('mount.grip') === 'clamped';
  if (field.path === 'mount.material' || field.path === 'mount.grip')
    return value('mount.shape.kind') === 'none';
  if (field.path === 'pump.profileOrder') return value('pump.profile') !== 'super-gaussian';
  if (field.path === 'pump.returnReflectivity') return value('pump.passes') === 1;
  return false;
}
