import type { ResolvedDesign } from '../design/resolved';
import { cellPresets, estimateGridError } from '../heat';
import { prepareDesign } from '../operating/prepare';
import { solvePoint, type SolvedPoint } from '../operating/point';
import type { OptionBench } from '../study/option-bench';
import type { Report } from './types';

/**
 * How far the grid may have moved lens, peak temperature and stress at the design's operating point: the same point on
 * grids with fewer cells across and along, after Richardson. Says nothing of the constants, which err far more.
 */
export function accuracyOf(
  resolved: ResolvedDesign,
  bench: OptionBench,
  { point }: SolvedPoint,
): NonNullable<Report['accuracy']> {
  const question = { pumpPower: point.pumpPower, cooler: bench.cooler, beam: 'lasing' as const };
  const [power, peak, stress] = estimateGridError((cells) => {
    const solved = solvePoint(prepareDesign(resolved, cells), question, point.rod.baseTemperature).point;
    return [solved.lens.dioptricPower, solved.rod.peakTemperature, solved.stress.peakTensile];
  }, cellPresets.standard);
  return { dioptricPower: power!.error, peakTemperature: peak!.error, peakTensile: stress!.error };
}
