import { readFileSync, statSync } from 'node:fs';
import { longestDesign, readDesign } from '../../src/design/check';
import { designJsonSchema } from '../../src/design/json-schema';
import { DesignError, NumericalError } from '../../src/errors';
import { reportText } from '../../src/report/text';
import { answerSteps } from '../../src/report/answer';

/** Exit codes: 0 answered, 2 refused input, 3 numerical failure. */
const usage = 'Usage: npm run --silent budget -- FILE [--json]   or   npm run --silent budget -- --schema';

class Refused extends Error {}

function readText(file: string): string {
  let size: number;
  try {
    const found = statSync(file);
    if (!found.isFile()) throw new Refused(`${file}: this is not a file; give the path of a design file.`);
    size = found.size;
  } catch (reason) {
    if (reason instanceof Refused) throw reason;
    throw new Refused(
      `${file}: there is no such file, or it cannot be read; give the path of a design file.`,
    );
  }
  if (size > 4 * longestDesign)
    throw new Refused(
      `${file}: the file has ${(size / 1e6).toFixed(0)} MB; a design has at most ${longestDesign / 1e6} million characters.`,
    );
  return readFileSync(file, 'utf8');
}

function run(args: string[]): void {
  if (args.includes('--schema')) {
    process.stdout.write(`${JSON.stringify(designJsonSchema(), null, 2)}\n`);
    return;
  }
  const unknown = args.find((arg) => arg.startsWith('-') && arg !== '--json');
  if (unknown) throw new Refused(`${unknown}: this option is not known. ${usage}`);
  const files = args.filter((arg) => !arg.startsWith('-'));
  if (files.length !== 1) throw new Refused(`${files.length} files given, one is needed. ${usage}`);
  const design = readDesign(readText(files[0]!));
  let text = '';
  for (const step of answerSteps(design))
    if (step.kind === 'answer' && step.final)
      text = args.includes('--json')
        ? `${JSON.stringify(step.answer.report, null, 1)}\n`
        : reportText(step.answer.report);
  process.stdout.write(text);
}

try {
  run(process.argv.slice(2));
} catch (reason) {
  if (reason instanceof DesignError || reason instanceof Refused) {
    process.stderr.write(`${reason.message}\n`);
    process.exitCode = 2;
  } else if (reason instanceof NumericalError) {
    process.stderr.write(`The numbers failed: ${reason.message}\n`);
    process.exitCode = 3;
  } else throw reason;
}
