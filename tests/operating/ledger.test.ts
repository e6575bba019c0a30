import { describe, expect, it } from 'vitest';
import { resolve } from '../../src/design/resolve';
import { prepareDesign } from '../../src/operating/prepare';
import { OptionBench } from '../../src/study/option-bench';
import { imbalanceOf } from '../trials/ledger';
import { randomDesign, seeded } from '../trials/random-designs';

const designs = Array.from({ length: 16 }, (_, k) => randomDesign(seeded(7919 * k + 11)));

/** Every design with every one of its coolers, at a tenth and at all of its searched power, lasing and blocked. */
function* everyPoint() {
  for (const design of designs) {
    const prepared = prepareDesign(resolve(design), 'coarse');
    for (const cooler of prepared.resolved.coolers) {
      const bench = new OptionBench(prepared, cooler);
      for (const share of [0.1, 1]) {
        const { lasing, blocked } = bench.at(share * prepared.resolved.pump.searchTo);
        yield* [lasing, blocked];
      }
    }
  }
}

describe('The heat ledger of any design, cooler and power', () => {
  const solved = [...everyPoint()];
  const steady = solved.filter(({ point }) => point.state === 'steady');

  it('closes at every node to 1e-9 of what the wall plug gives, and no arrow points backwards', () => {
    expect(steady.length).toBeGreaterThan(200);
    for (const { point } of steady) {
      expect(imbalanceOf(point.ledger), point.cooler.id).toBeLessThan(1e-9 * point.electricalPower);
      expect(point.ledger.every((flow) => flow.power >= 0)).toBe(true);
    }
  });

  it('takes from the wall plug just the electrical power, and gives everything but light and warm air to the surroundings', () => {
    for (const { point } of steady) {
      const sum = (wanted: (from: string, to: string) => boolean) =>
        point.ledger.reduce((total, { from, to, power }) => total + (wanted(from, to) ? power : 0), 0);
      const drawn = sum((from) => from === 'wall plug');
      expect(Math.abs(drawn - point.electricalPower)).toBeLessThan(1e-9 * point.electricalPower);
      expect(sum((_, to) => to === 'laser output')).toBeCloseTo(point.outputPower, 9);
    }
  });

  it('agrees with the temperature field: heat made in the rod leaves through barrel and faces', () => {
    for (const { point, field } of steady) {
      const { side, front, back } = field.heatOut;
      // A direct solver leaves rounding only.
      expect(Math.abs(side + front + back - field.generated)).toBeLessThan(
        1e-9 * Math.max(field.generated, 1e-3),
      );
      expect(Math.abs(field.generated - point.heatLoad)).toBeLessThan(1e-9 * Math.max(point.heatLoad, 1e-3));
    }
  });

  it('splits the absorbed power into heat, fluorescence, output and cavity loss, none of them negative', () => {
    for (const { point } of steady) {
      expect(point.heatFraction).toBeGreaterThan(0);
      expect(point.heatFraction).toBeLessThanOrEqual(1);
      expect(point.outputPower).toBeGreaterThanOrEqual(0);
      expect(point.outputPower + point.heatLoad).toBeLessThanOrEqual(point.absorbedPower * (1 + 1e-12));
    }
  });
});
