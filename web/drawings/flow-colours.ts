import type { Flow } from '../../src/report/types';

/** What can flow, with its colour on the page. */
export const flowKinds = [
  { name: 'electricity', colour: '--soft' },
  { name: 'pump light', colour: '--pump' },
  { name: 'laser light', colour: '--holds' },
  { name: 'heat', colour: '--heat' },
  { name: 'heat in the cooling', colour: '--cool' },
];

/** Colour of a flow by what flows in it. */
export function flowColour({ from, to }: Flow): string {
  if (/laser|output/.test(to)) return '--holds';
  if (/rod|pump|light|entrance/.test(to)) return '--pump';
  if (/wall|mains|supply/.test(from)) return '--soft';
  return /surroundings|air stream|ambient|room|sink|coolant|chiller|exchanger/.test(to) ? '--cool' : '--heat';
}
