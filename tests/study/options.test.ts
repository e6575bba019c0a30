import { describe, expect, it } from 'vitest';
import { checkDesign } from '../../src/design/check';
import { demoDesign } from '../../src/design/demo';
import { resolve } from '../../src/design/resolve';
import { prepareDesign } from '../../src/operating/prepare';
import { edgeOf } from '../../src/report/answer';
import { ladderOf } from '../../src/study/ladder';
import { OptionBench } from '../../src/study/option-bench';
import { randomDesign, seeded } from '../trials/random-designs';

const scan = 100;
/** Edges are found to 2e-5 of the range and better; what lies closer to one than this is not judged. */
const guard = 1e-4;

function answered(seed: number) {
  const prepared = prepareDesign(resolve(randomDesign(seeded(seed))), 'coarse');
  const to = prepared.resolved.pump.searchTo;
  const benches = prepared.resolved.coolers.map((cooler) => new OptionBench(prepared, cooler));
  const chosen = benches.find((bench) => bench.cooler.id === prepared.resolved.chosenCooler)!;
  const { edge, zones } = edgeOf(prepared, chosen);
  const tried = [chosen, benches.find((bench) => bench !== chosen)!];
  const options = tried.map((bench) => ({ bench, result: bench.ceiling(edge.crossings) }));
  return { prepared, to, chosen, edge, zones, options };
}

// Seeds 32 to 57 of an earlier hunt: limits broken briefly, and a cavity edge where the lens changes shape.
const seeds = [3, 32 * 7919 + 1, 39 * 7919 + 1, 57 * 7919 + 1, 777, 90001];
const designs = seeds.map((seed) => ({ seed, ...answered(seed) }));
const between = (marks: readonly number[], power: number, to: number) =>
  marks.every((mark) => Math.abs(mark - power) > guard * to);
const powersUpTo = (to: number) => Array.from({ length: scan }, (_, k) => (to * (k + 1)) / scan - 1e-9 * to);

describe.each(designs)('The ceilings of random design $seed', ({ to, options }) => {
  it('have every limit hold just below and the named one broken just above', () => {
    for (const { bench, result } of options) {
      if (result.pumpPower === null || result.reachesRange) continue;
      const step = Math.max(1e-3 * result.pumpPower, 4e-5 * to);
      expect(bench.at(result.pumpPower - step).margins.filter((margin) => !margin.holds)).toEqual([]);
      const broken = bench
        .at(Math.min(result.pumpPower + step, to))
        .margins.filter((margin) => !margin.holds);
      expect(broken.map((margin) => margin.limit)).toContain(result.setBy);
    }
  });

  it('have windows that a plain scan of the powers finds too', () => {
    for (const { bench, result } of options) {
      const marks = result.windows.flatMap((window) => [window.from, window.to]);
      for (const power of powersUpTo(to)) {
        if (!between(marks, power, to)) continue;
        const holds = bench.at(power).margins.every((margin) => margin.holds);
        expect(
          result.windows.some((window) => window.from <= power && power <= window.to),
          `${power} W`,
        ).toBe(holds);
      }
    }
  });

  it('make a ladder without gaps whose steps hold with the option they name', () => {
    const rungs = options.map(({ bench, result }) => ({
      id: bench.cooler.id,
      demand: bench.cooler.demand,
      windows: result.windows,
    }));
    const ladder = ladderOf(rungs, to);
    expect(ladder[0]!.from).toBe(0);
    expect(ladder.at(-1)!.to).toBe(to);
    for (let k = 1; k < ladder.length; k++) expect(ladder[k]!.from).toBe(ladder[k - 1]!.to);
    for (const { from, to: end, option } of ladder) {
      const middle = (from + end) / 2;
      const holding = options
        .filter(({ bench }) => bench.at(middle).margins.every((margin) => margin.holds))
        .map(({ bench }) => bench.cooler);
      const least = Math.min(...holding.map((cooler) => cooler.demand));
      expect(
        option === null
          ? holding
          : holding.filter((cooler) => cooler.id === option && cooler.demand === least),
      ).toHaveLength(option === null ? 0 : 1);
    }
  });
});

describe.each(designs)('The cavity edge of random design $seed', ({ to, chosen, edge }) => {
  it('has both planes stable just below and the named one unstable just above', () => {
    if (edge.pumpPower === null) return;
    const [below, above] = [1 - 2e-4, 1 + 2e-4].map(
      (factor) => chosen.lasing(edge.pumpPower! * factor).point.cavity,
    );
    expect(below!.sagittal.stable && below!.tangential.stable).toBe(true);
    for (const plane of edge.plane === 'both' ? (['sagittal', 'tangential'] as const) : [edge.plane!])
      expect(above![plane].stable).toBe(false);
  });

  it('has usable windows that a plain scan of the powers finds too', () => {
    for (const power of powersUpTo(to)) {
      if (!between(edge.crossings, power, to)) continue;
      const { sagittal, tangential } = chosen.lasing(power).point.cavity;
      const inside = edge.windows.some((window) => window.from <= power && power <= window.to);
      expect(inside, `${power} W`).toBe(sagittal.stable && tangential.stable);
    }
  });
});

describe('The ladder', () => {
  it('takes the least demanding option wherever several hold, and says where none does', () => {
    const rungs = [
      { id: 'TEC', demand: 4, windows: [{ from: 0, to: 30 }] },
      { id: 'fins', demand: 0, windows: [{ from: 2, to: 10 }] },
      { id: 'fan', demand: 1, windows: [{ from: 1, to: 20 }] },
    ];
    expect(ladderOf(rungs, 40)).toEqual([
      { from: 0, to: 1, option: 'TEC' },
      { from: 1, to: 2, option: 'fan' },
      { from: 2, to: 10, option: 'fins' },
      { from: 10, to: 20, option: 'fan' },
      { from: 20, to: 30, option: 'TEC' },
      { from: 30, to: 40, option: null },
    ]);
  });

  it('ranks fins before a fan, a fan before water, and each of them before a TEC on it', () => {
    const checked = checkDesign(demoDesign);
    if (!checked.ok) throw new Error('the demo design is refused');
    const demands = new Map(resolve(checked.design).coolers.map(({ id, demand }) => [id, demand]));
    const ranked = ['fins', 'fan', 'water', 'TEC on fins', 'TEC on fan', 'TEC on water'].map((id) =>
      demands.get(id)!,
    );
    expect([...ranked].sort((a, b) => a - b)).toEqual(ranked);
    expect(new Set(ranked).size).toBe(ranked.length);
  });
});
