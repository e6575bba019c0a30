import { withValue } from '../design/fields';
import { resolve } from '../design/resolve';
import type { Design } from '../design/schema';
import { DesignError, type Warning } from '../errors';
import { prepareDesign } from '../operating/prepare';
import { solvePoint, type SolvedPoint } from '../operating/point';
import type { OptionBench } from '../study/option-bench';

/** Differences below this share are not worth a remark. */
const leastShare = 0.03;

const law = 'rod.conductivityLaw';

/** The design with a conductivity that falls with temperature, or null where no fall is known. */
function falling(design: Design) {
  if (design.rod.conductivityLaw !== 'constant') return null;
  try {
    return resolve(withValue(design, law, 'falls with temperature'));
  } catch (reason) {
    if (reason instanceof DesignError) return null;
    throw reason;
  }
}

/**
 * What the held conductivity hides: peak temperature and lens at the same pump power if the conductivity falls with
 * temperature as the catalogue has it.
 */
export function conductivityRemark(design: Design, bench: OptionBench, held: SolvedPoint): Warning[] {
  const resolved = falling(design);
  if (!resolved || held.point.state === 'none') return [];
  const exponent = resolved.rod.conductivityExponent;
  const cooler = resolved.coolers.find(({ id }) => id === bench.cooler.id)!;
  const question = { pumpPower: held.point.pumpPower, cooler, beam: 'lasing' as const };
  const { point } = solvePoint(prepareDesign(resolved, 'study'), question, held.point.rod.baseTemperature);
  const start = `Conductivity is held at its value near 300 K. If it falls as (300 K / T)^${exponent.toPrecision(2)}, as the catalogue has it, `;
  const advice = ' Choose "falls with temperature" to compute with it.';
  if (point.state === 'none')
    return [{ where: law, text: `${start}the rod finds no steady temperature at this power.${advice}` }];
  const rise = (item: SolvedPoint['point']) => item.rod.peakTemperature - item.rod.baseTemperature;
  if (Math.abs(rise(point) / rise(held.point) - 1) < leastShare) return [];
  const celsius = (temperature: number) => `${(temperature - 273.15).toFixed(0)} degC`;
  const perMetre = (power: number) => `${Number(power.toPrecision(3))} /m`;
  const peak = `the peak is ${celsius(point.rod.peakTemperature)} instead of ${celsius(held.point.rod.peakTemperature)}`;
  const lens = `the lens ${perMetre(point.lens.dioptricPower)} instead of ${perMetre(held.point.lens.dioptricPower)}`;
  return [{ where: law, text: `${start}${peak} and ${lens} at this power.${advice}` }];
}
