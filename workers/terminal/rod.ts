import { readFileSync } from 'node:fs';
import { solveReferenceCase } from '../../src/study/reference-case';
import { readReferenceCase } from '../../src/study/reference-format';
import { solveReferenceWarmUp } from '../../src/study/reference-warm-up';

/** Prints the temperatures and lens of one rod as JSON, steady or, when the case has a time block, instant by instant. Exit code 2: the case is refused, 3: the numbers failed. */
function main(path: string | undefined): number {
  if (path === undefined) return fail('Name a case file: npm run --silent rod -- CASE.json', 2);
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch {
    return fail(`The file "${path}" can't be read.`, 2);
  }
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    return fail(`The file "${path}" is not JSON.`, 2);
  }
  const reading = readReferenceCase(json);
  if (!reading.ok) return fail(reading.reason, 2);
  try {
    const { inputs } = reading;
    const outputs = inputs.time === undefined ? solveReferenceCase(inputs) : solveReferenceWarmUp(inputs);
    process.stdout.write(`${JSON.stringify(outputs, null, 2)}\n`);
    return 0;
  } catch (error) {
    return fail(error instanceof Error ? error.message : String(error), 3);
  }
}

function fail(sentence: string, code: number): number {
  process.stderr.write(`${sentence}\n`);
  return code;
}

process.exitCode = main(process.argv[2]);
