import { readFileSync } from 'node:fs';
import { checkDesign } from '../../src/design/check';
import { withValue } from '../../src/design/fields';
import { resolve } from '../../src/design/resolve';
import type { Design } from '../../src/design/schema';
import { DesignError } from '../../src/errors';
import type { GridWish } from '../../src/heat';
import { prepareDesign } from '../../src/operating/prepare';
import { answerSteps, edgeOf } from '../../src/report/answer';
import type { Report } from '../../src/report/types';
import { OptionBench } from '../../src/study/option-bench';

export type Changes = Readonly<Record<string, unknown>>;

/** Changes some fields of a design, by dotted path, and checks it as any design is checked. */
export function changed(design: unknown, changes: Changes = {}): Design {
  const input = Object.entries(changes).reduce((at, [path, value]) => withValue(at, path, value), design);
  const checked = checkDesign(input);
  if (!checked.ok) throw new DesignError(checked.faults);
  return checked.design;
}

/** A trial's design file with some fields changed. */
export const trial = (name: string, changes: Changes = {}): Design =>
  changed(JSON.parse(readFileSync(new URL(`${name}.json`, import.meta.url), 'utf8')), changes);

/** One design with one of its coolers, ready to be asked at any pump power. */
export function benchOf(design: Design, coolerId?: string, cells?: GridWish['cells']): OptionBench {
  const resolved = resolve(design);
  const id = coolerId ?? resolved.chosenCooler;
  return new OptionBench(
    prepareDesign(resolved, cells),
    resolved.coolers.find((cooler) => cooler.id === id)!,
  );
}

/** Lasing and blocked point at the design's own pump power. */
export const levelOf = (design: Design, coolerId?: string, cells?: GridWish['cells']) => {
  const bench = benchOf(design, coolerId, cells);
  return bench.at(bench.prepared.resolved.pump.power);
};

/** Cavity edge and usable windows with the chosen cooler. */
export const edgeOfDesign = (design: Design) => {
  const bench = benchOf(design);
  return { bench, ...edgeOf(bench.prepared, bench) };
};

/** The first answer, at nominal values, or the final one with the band. */
export function reportOf(design: Design, which: 'first' | 'final' = 'first'): Report {
  for (const step of answerSteps(design))
    if (step.kind === 'answer' && (which === 'first' || step.final)) return step.answer.report;
  throw new Error('the answer ended without a report');
}

export const degC = (celsius: number) => celsius + 273.15;
