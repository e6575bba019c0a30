import type { ResolvedDesign } from '../design/resolved';
import { findCrystal } from '../materials';
import type { OptionReport } from './types';

const nm = (wavelength: number) => `${(wavelength * 1e9).toFixed(0)} nm`;

/** Light of these wavelengths does not trigger the blink reflex or is not seen at all, m. */
const visible = { from: 400e-9, to: 700e-9 };

function light(resolved: ResolvedDesign, outputPower: number): string {
  const { pump, rod } = resolved;
  const hidden = [pump.wavelength, rod.laser.wavelength].some(
    (value) => value < visible.from || value > visible.to,
  );
  const output =
    outputPower > 0.001
      ? ` and laser light at ${nm(rod.laser.wavelength)}, about ${outputPower.toPrecision(2)} W`
      : ` and, when it lases, light at ${nm(rod.laser.wavelength)}`;
  return `Laser light: pump light at ${nm(pump.wavelength)}, ${pump.power.toPrecision(3)} W${output}. ${hidden ? 'Part of it cannot be seen. ' : ''}Reflections of either injure eyes and skin; wear protection rated for each wavelength and enclose the beams.`;
}

/** The usual cautions for what a design holds: light, mains, water, pressure, condensation, hot parts, toxic dust. */
export function cautionsOf(
  resolved: ResolvedDesign,
  options: readonly OptionReport[],
  outputPower: number,
): string[] {
  const kinds = new Set(options.map((option) => option.kind));
  const wet = kinds.has('liquid');
  const cautions = [light(resolved, outputPower)];
  cautions.push(
    'Electricity: diode, TEC and fan drivers may be fed from the mains and carry large currents; isolate before touching, fuse each circuit.',
  );
  if (wet)
    cautions.push(
      "Water near current: keep couplings away from drivers and diode, add a leak sensor and a flow switch that stops the pump diode; pressure: use hose and fittings rated above the pump's closed-valve pressure.",
    );
  if (kinds.has('tec') || wet)
    cautions.push(
      'Condensation: any part colder than the dew point gathers water on optics and contacts; keep cold parts above it with the guard, or seal and dry the housing.',
    );
  cautions.push(
    'Heat: fins, hot sides of TECs and a blocked beam can burn; fit an over-temperature cut-off at the rod mount and at the diode that works without software.',
  );
  if (resolved.mount.caution) cautions.push(`Mount: ${resolved.mount.caution}`);
  const caution = findCrystal(resolved.rod.crystalName)?.caution;
  if (caution) cautions.push(`Crystal: ${caution}`);
  cautions.push('Follow local codes and licensed practice; this is no hazard analysis.');
  return cautions;
}
