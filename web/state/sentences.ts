import type { MountComparison, Report } from '../../src/report/types';
import { band, lensPower, length, power, rise, temperature } from '../format/quantities';
import { percent } from '../format/number';

/** The answer to each section's question, in one or two plain sentences. */

export function cavitySentence(report: Report): string {
  const { pumpPower, plane, low, high, dioptricPower } = report.cavityEdge;
  const now = report.operating.cavity;
  const stableNow = now.sagittal.stable && now.tangential.stable;
  const state = `At ${power(report.operating.pumpPower)} the cavity is ${stableNow ? 'stable' : 'not stable'}`;
  if (report.usableWindow.length === 0) return `${state}.`;
  if (pumpPower === null) return `${state}; no edge was found up to ${power(report.searchedTo)}.`;
  const range = band(low, high);
  const where = plane === 'both' || plane === null ? 'both planes' : `the ${plane} plane`;
  const lens = dioptricPower === null ? '' : `, where the rod is a lens of ${lensPower(dioptricPower)}`;
  return `${state}; ${where} ${plane === 'both' ? 'leave' : 'leaves'} stability at ${power(pumpPower)}${range ? ` (${range})` : ''}${lens}.`;
}

export function windowSentence(report: Report): string {
  if (report.usableWindow.length === 0)
    return 'No usable window: the cavity is stable at no pump power that was searched.';
  const spans = report.usableWindow.map(
    ({ fromPumpPower, toPumpPower }) => `${power(fromPumpPower)} to ${power(toPumpPower)}`,
  );
  return `Usable window: ${spans.join(', and ')}.`;
}

/** Said before everything else where the numbers are not those of a steady state. */
function unsteady({ state, reason, pumpPower }: Report['operating']): string {
  if (state === 'steady') return '';
  const why = reason ? `: ${reason}` : '';
  if (state === 'two') return `Two steady states at ${power(pumpPower)}${why}. `;
  return `No steady state at ${power(pumpPower)}${why}; the numbers are those of the last point tried. `;
}

export function rodSentence(report: Report): string {
  const { rod, heatLoad } = report.operating;
  const deep = rod.peakPosition.z > 5e-5;
  const place = deep ? `${length(rod.peakPosition.z)} behind the front face` : 'at the front face';
  const hotter = report.blocked.rod.peakTemperature - rod.peakTemperature;
  const blocked =
    Math.abs(hotter) < 0.05
      ? 'Blocking the beam changes that by less than 0.1 K.'
      : `With the beam blocked it is ${rise(Math.abs(hotter))} ${hotter > 0 ? 'hotter' : 'cooler'}.`;
  return `${unsteady(report.operating)}${power(heatLoad)} of heat make ${temperature(rod.peakTemperature)} at the hottest place, ${place}. ${blocked}`;
}

const spreadOf = (values: number[]) => Math.max(...values) - Math.min(...values);

export function mountSentence(mounts: MountComparison[]): string {
  if (mounts.length === 1 && mounts[0]!.thermalConductivity === null)
    return 'None conducts here: the barrel itself is cooled, and the contact to it is all that lies between rod and base.';
  if (mounts.length < 2) return 'No other material was compared.';
  const lens = mounts.map((mount) => mount.dioptricPower);
  const middle = Math.abs(lens.reduce((sum, value) => sum + value, 0) / lens.length);
  const share = middle > 0 ? spreadOf(lens) / middle : 0;
  const peak = spreadOf(mounts.map((mount) => mount.peakTemperature));
  const verdict =
    share < 0.05 ? 'the lens hardly changes with the mount' : 'here the mount moves the lens too';
  return `From the best to the worst of these ${mounts.length} materials the peak temperature moves by ${rise(peak)}, the lens by ${percent(share, 2)}: ${verdict}.`;
}

export function ledgerSentence(report: Report): string {
  const { electricalPower, outputPower, diode, heatLoad } = report.operating;
  const ratio =
    heatLoad > 0 ? ` The diode makes ${(diode.heat / heatLoad).toFixed(1)} times the heat of the rod.` : '';
  return `${unsteady(report.operating)}${power(electricalPower)} from the wall give ${power(outputPower)} of laser light; ${power(diode.heat)} of heat come from the diode and ${power(heatLoad)} from the rod.${ratio}`;
}
