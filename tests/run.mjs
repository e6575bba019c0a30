/**
 * `npm test`: everything from a fresh checkout to one closing line, "N passed, N failed".
 * `npm test -- --only check|unit|browser [words]` runs one part; the words choose files of that part.
 */
import { mkdirSync, rmSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import {
  SetUpError,
  ensureBuilt,
  ensureInstalled,
  projectRoot,
  requireNode,
} from '../workers/terminal/installed.mjs';
import { ensureChromium } from './tools/chromium.mjs';
import { atLeastOneVerdict, countBrowser, countUnit, sum } from './tools/counts.mjs';
import { runProgram } from './tools/programs.mjs';

const results = join(projectRoot, 'test-results');
const parts = { check, unit, browser };
const checks = [
  ['types in src', 'tsc', '-p', 'src'],
  ['types in workers', 'tsc', '-p', 'workers'],
  ['types in workers/terminal', 'tsc', '-p', 'workers/terminal'],
  ['types in web', 'svelte-check', '--tsconfig', 'web/tsconfig.json', '--fail-on-warnings'],
  ['types in tests', 'tsc', '-p', 'tests'],
  ['lint', 'eslint', '--config', '.ci/eslint.config.mjs', '--max-warnings', '0', '.'],
  ['format', 'prettier', '--check', '.'],
  ['unused code', 'knip'],
];

let total = { passed: 0, failed: 0 };
try {
  const { chosen, words } = readOptions(process.argv.slice(2));
  requireNode();
  ensureInstalled();
  mkdirSync(results, { recursive: true });
  for (const part of chosen) total = sum([total, await part(words)]);
} catch (error) {
  say(error instanceof SetUpError ? error.message : error.stack);
  total.failed += 1;
}
process.exitCode = total.failed > 0 || total.passed === 0 ? 1 : 0;
say(`\n${total.passed} passed, ${total.failed} failed`);

function readOptions([option, name, ...words]) {
  if (option === undefined) return { chosen: Object.values(parts), words: [] };
  if (option === '--only' && Object.hasOwn(parts, name ?? '')) return { chosen: [parts[name]], words };
  throw new SetUpError(`The only option is --only with one of ${Object.keys(parts).join(', ')}.`);
}

/** Types, lint, format, unused code: each is one test; as many run at once as there are cores, four at most. */
async function check() {
  const waiting = [...checks];
  const verdicts = [];
  const work = async () => {
    for (let next = waiting.shift(); next; next = waiting.shift()) {
      const [title, program, ...words] = next;
      const { code, output } = await runProgram(program, words, { quiet: true });
      say(`${code === 0 ? 'passed' : 'FAILED'}  ${title}`);
      if (code !== 0) say(output);
      verdicts.push({ passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 });
    }
  };
  await Promise.all(Array.from({ length: Math.min(4, availableParallelism()) }, work));
  return sum(verdicts);
}

/** Everything that needs no browser, published checks and reference solutions among it. */
async function unit(words) {
  const report = join(results, 'unit.json');
  rmSync(report, { force: true });
  const { code } = await runProgram('vitest', [
    'run',
    '--allowOnly=false',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
    `--maxWorkers=${availableParallelism()}`,
    ...words,
  ]);
  const counted = countUnit(report);
  for (const [folder, { passed, failed }] of counted.folders)
    say(`${folder}: ${passed} passed, ${failed} failed`);
  return atLeastOneVerdict(counted, code);
}

/** The built page in a real Chromium; the build is a test of its own. */
async function browser(words) {
  ensureBuilt();
  const built = { passed: 1, failed: 0 };
  const chromium = ensureChromium();
  if (!chromium.path) {
    say(chromium.reason);
    return sum([built, { passed: 0, failed: 1 }]);
  }
  const report = join(results, 'browser.json');
  rmSync(report, { force: true });
  const env = { CHROMIUM: chromium.path, PLAYWRIGHT_JSON_OUTPUT_FILE: report };
  const { code } = await runProgram(
    'playwright',
    ['test', '--config', 'tests/browser/playwright.config.ts', ...words],
    { env },
  );
  return sum([built, atLeastOneVerdict(countBrowser(report), code)]);
}

function say(text) {
  process.stdout.write(`${text}\n`);
}
