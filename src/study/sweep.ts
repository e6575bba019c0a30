import { worstOf } from '../limits/margins';
import type { OptionBench } from './option-bench';
import type { SweepPoint } from './types';

/**
 * Everything that changes along the pump-power axis, level by level, for one way of cooling. A generator, so that a
 * caller can show progress and stop.
 * @param levels number of powers, evenly spaced up to `to`, W
 */
export function* sweepOf(bench: OptionBench, to: number, levels: number): Generator<SweepPoint> {
  for (let k = 1; k <= levels; k++) {
    const { lasing, blocked, margins } = bench.at((to * k) / levels);
    const { point } = lasing;
    const { sagittal, tangential } = point.cavity;
    const radii = [sagittal.modeRadiusInRod, tangential.modeRadiusInRod];
    const modeRadius = radii.every((radius) => radius !== null) ? Math.sqrt(radii[0]! * radii[1]!) : null;
    yield {
      pumpPower: point.pumpPower,
      absorbedPower: point.absorbedPower,
      state: point.state,
      peakTemperature: point.rod.peakTemperature,
      blockedPeakTemperature: blocked.point.rod.peakTemperature,
      edgeTemperature: point.rod.edgeTemperature,
      dioptricPower: point.lens.dioptricPower,
      axisDioptricPower: point.lens.axisDioptricPower,
      sagittalStability: sagittal.stability,
      tangentialStability: tangential.stability,
      modeRadius,
      modeToPumpRatio: modeRadius === null ? null : modeRadius / bench.prepared.resolved.pump.radius,
      outputPower: point.outputPower,
      heatLoad: point.heatLoad,
      caseTemperature: point.diode.caseTemperature,
      baseTemperature: point.rod.baseTemperature,
      wavelength: point.diode.wavelength,
      electricalPower: point.electricalPower,
      fractureShare: point.stress.fractureShare,
      aberrationLoss: point.lens.aberrationLoss,
      worstShare: worstOf(margins).share,
    };
  }
}
