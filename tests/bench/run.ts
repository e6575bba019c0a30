import { readFileSync } from 'node:fs';
import { Bench } from 'tinybench';
import { checkDesign } from '../../src/design/check';
import { demoDesign } from '../../src/design/demo';
import { resolve } from '../../src/design/resolve';
import type { Design } from '../../src/design/schema';
import { prepareDesign } from '../../src/operating/prepare';
import { solvePoint } from '../../src/operating/point';
import { answerSteps } from '../../src/report/answer';
import { cellPresets } from '../../src/heat';
import { solveReferenceCase } from '../../src/study/reference-case';
import { readReferenceCase } from '../../src/study/reference-format';

/** Times of what a person waits for, beside the error that the same grid makes on a converged reference solution. */

const checked = checkDesign(demoDesign);
if (!checked.ok) throw new Error('the demo design is refused');
const { design } = checked;
const held = checkDesign({
  ...demoDesign,
  rod: { ...demoDesign.rod, absorption: { coefficient: '3.5 cm^-1' } },
});
if (!held.ok) throw new Error('the demo design with a held absorption is refused');

function untilAnswer(asked: Design, final: boolean): void {
  for (const step of answerSteps(asked)) if (step.kind === 'answer' && step.final === final) return;
}

const resolved = resolve(design);
const prepared = prepareDesign(resolved);
const cooler = resolved.coolers.find(({ id }) => id === resolved.chosenCooler)!;
let power = resolved.pump.power;
// A slightly different power each time, so that nothing remembered is counted.
const nextPower = () => (power = power > 20 ? 10 : power + 0.0137);

const bench = new Bench({ time: 1500, warmupTime: 400 });
bench
  .add('one operating point, closed loop (aim 5 ms)', () => {
    solvePoint(prepared, { pumpPower: nextPower(), cooler, beam: 'lasing' });
  })
  .add('preparing a design', () => {
    prepareDesign(resolved);
  })
  .add('full answer, diode drifting over the line (aim 300 ms)', () => untilAnswer(design, false))
  .add('full answer, absorption held (aim 300 ms)', () => untilAnswer(held.design, false));
await bench.run();

const rows = bench.tasks.map((task) => {
  if (task.result.state !== 'completed') return `${task.name.padEnd(58)} failed`;
  const { p50, min } = task.result.latency;
  return `${task.name.padEnd(58)} ${p50.toFixed(2).padStart(9)} ms   (least ${min.toFixed(2)} ms)`;
});
const started = performance.now();
untilAnswer(design, true);
rows.push(
  `${'answer with band, levers and grid error, once'.padEnd(58)} ${(performance.now() - started).toFixed(0).padStart(9)} ms`,
);

interface Reference {
  inputs: unknown;
  outputs: { T_max_K: number; lens: { f_m: number } };
}
const reference = JSON.parse(
  readFileSync(new URL('../reference/A1.json', import.meta.url), 'utf8'),
) as Reference;
const reading = readReferenceCase(reference);
if (!reading.ok) throw new Error(reading.reason);
const base = 293.15;
for (const cells of ['study', 'standard', 'fine'] as const) {
  const outputs = solveReferenceCase(reading.inputs, cellPresets[cells]);
  const lens = outputs.lens.f_m / reference.outputs.lens.f_m - 1;
  const peak = (outputs.T_max_K - reference.outputs.T_max_K) / (reference.outputs.T_max_K - base);
  rows.push(
    `error against reference A1 on the ${cells} grid: lens ${(100 * lens).toFixed(3)} %, peak rise ${(100 * peak).toFixed(3)} %`,
  );
}
console.log(rows.join('\n'));
