import { describe, expect, it } from 'vitest';
import { solvePoint } from '../../src/operating/point';
import { benchOf } from '../trials/trial';
import { randomDesign, seeded } from '../trials/random-designs';

describe('An operating point', () => {
  it('does not depend on the base temperature its search began at', () => {
    for (let k = 0; k < 8; k++) {
      const bench = benchOf(randomDesign(seeded(1299709 * k + 3)), undefined, 'coarse');
      const question = {
        pumpPower: bench.prepared.resolved.pump.power,
        cooler: bench.cooler,
        beam: 'lasing' as const,
      };
      const [cool, warm] = [260, 330].map((start) => solvePoint(bench.prepared, question, start).point);
      expect(warm!.state).toBe(cool!.state);
      // Base temperatures are found to 1e-8 K, and the rod follows its base.
      if (cool!.state === 'steady')
        expect(Math.abs(warm!.rod.peakTemperature - cool!.rod.peakTemperature)).toBeLessThan(1e-5);
    }
  });
});
