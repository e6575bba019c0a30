import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, expect, test } from 'vitest';

const fromTop = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'test-command-'));
const tools = {
  tsc: 'typescript/bin/tsc',
  svelteCheck: 'svelte-check/bin/svelte-check',
  eslint: 'eslint/bin/eslint.js',
  prettier: 'prettier/bin/prettier.cjs',
  knip: 'knip/bin/knip.js',
  vite: 'vite/bin/vite.js',
  vitest: 'vitest/vitest.mjs',
  playwright: '@playwright/test/cli.js',
};
const unitReport = (...statuses: string[][]) => ({
  testResults: statuses.map((file, i) => ({
    name: `/project/tests/${i === 0 ? 'heat' : 'published'}/a.test.ts`,
    status: file.every((status) => status === 'passed') && file.length > 0 ? 'passed' : 'failed',
    assertionResults: file.map((status) => ({ status })),
  })),
});
const browserReport = (expected: number, unexpected = 0, flaky = 0, skipped = 0) => ({
  stats: { expected, unexpected, flaky, skipped },
  errors: [],
});

afterEach(() => rmSync(folder, { recursive: true, force: true }));

/** A project whose tools only pretend: each prints its name, leaves the report it is given, ends with its code. */
function pretend(
  reports: { unit?: object; browser?: object },
  codes: Partial<Record<keyof typeof tools, number>> = {},
) {
  const write = (path: string, text: string) => {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  };
  const reportOf: Record<string, object | undefined> = { vitest: reports.unit, playwright: reports.browser };
  write('package.json', '{"type":"module"}');
  write('package-lock.json', '{"packages":{"":{}}}');
  write('node_modules/.package-lock.json', '{"packages":{}}');
  for (const [name, script] of Object.entries(tools)) {
    write(
      `node_modules/${script}`,
      `import('node:fs').then((fs) => {
         console.log('this is ${name}');
         const joined = process.argv.find((word) => word.startsWith('--outputFile.json='))?.slice(18);
         const report = ${JSON.stringify(reportOf[name]) ?? 'undefined'};
         if (report) fs.writeFileSync(joined ?? process.env.PLAYWRIGHT_JSON_OUTPUT_FILE, JSON.stringify(report));
         if ('${name}' === 'vite') fs.mkdirSync('dist', { recursive: true });
         if ('${name}' === 'vite') fs.writeFileSync('dist/index.html', '');
         process.exitCode = ${codes[name as keyof typeof tools] ?? 0};
       });`,
    );
  }
  cpSync(fromTop('workers/terminal'), join(folder, 'workers/terminal'), { recursive: true });
  cpSync(fromTop('tests/run.mjs'), join(folder, 'tests/run.mjs'));
  for (const name of readdirSync(fromTop('tests/tools')).filter((file) => file.endsWith('.mjs'))) {
    cpSync(fromTop(`tests/tools/${name}`), join(folder, 'tests/tools', name));
  }
}

function run(
  words: string[] = [],
  chromium = process.execPath,
): Promise<{ code: number | null; said: string; last?: string }> {
  const child = spawn(process.execPath, [join(folder, 'tests/run.mjs'), ...words], {
    cwd: tmpdir(),
    env: { ...process.env, CHROMIUM: chromium },
  });
  let said = '';
  child.stdout.on('data', (piece: Buffer) => (said += piece.toString()));
  child.stderr.on('data', (piece: Buffer) => (said += piece.toString()));
  return new Promise((resolve) => {
    child.once('close', (code) => resolve({ code, said, last: said.trimEnd().split('\n').pop() }));
  });
}

test('the closing line counts every check, every test and the build', async () => {
  pretend({ unit: unitReport(['passed', 'passed'], ['passed']), browser: browserReport(4) });
  const { code, said, last } = await run();
  expect(last).toBe('16 passed, 0 failed');
  expect(code).toBe(0);
  expect(said).toContain('heat: 2 passed, 0 failed\npublished: 1 passed, 0 failed\n');
  expect(said).not.toContain('this is tsc');
});

test('a failing check shows what it printed and fails the whole', async () => {
  pretend({ unit: unitReport(['passed']), browser: browserReport(1) }, { eslint: 1 });
  const { code, said, last } = await run();
  expect(last).toBe('10 passed, 1 failed');
  expect(code).toBe(1);
  expect(said).toContain('FAILED  lint\nthis is eslint\n');
});

test.each([
  ['a failing test', unitReport(['passed', 'failed']), 1, '1 passed, 1 failed'],
  ['a skipped test', unitReport(['passed', 'skipped']), 0, '1 passed, 1 failed'],
  ['a test file that does not load', unitReport(['passed'], []), 1, '1 passed, 1 failed'],
  ['an error outside every test', unitReport(['passed']), 1, '1 passed, 1 failed'],
  ['a runner that finds no test', unitReport(), 0, '0 passed, 1 failed'],
  ['a runner that leaves no report', undefined, 1, '0 passed, 1 failed'],
])('%s is a failure of the unit part', async (_, unit, vitest, closing) => {
  pretend({ unit }, { vitest });
  expect(await run(['--only', 'unit'])).toMatchObject({ code: 1, last: closing });
});

test.each([
  ['a failing test', browserReport(2, 1), '3 passed, 1 failed'],
  ['a flaky test', browserReport(2, 0, 1), '3 passed, 1 failed'],
  ['a skipped test', browserReport(2, 0, 0, 1), '3 passed, 1 failed'],
  [
    'an error outside every test',
    { ...browserReport(0), errors: [{ message: 'set-up' }] },
    '1 passed, 1 failed',
  ],
])('%s is a failure of the browser part', async (_, browser, closing) => {
  pretend({ browser });
  expect(await run(['--only', 'browser'])).toMatchObject({ code: 1, last: closing });
});

test('a page that cannot be built is a failure with one sentence', async () => {
  pretend({ browser: browserReport(1) }, { vite: 1 });
  const { code, said, last } = await run(['--only', 'browser']);
  expect({ code, last }).toEqual({ code: 1, last: '0 passed, 1 failed' });
  expect(said).toContain('The page could not be built; the messages above say why.\n');
});

test('a browser that is not there is a failure with one sentence', async () => {
  pretend({ browser: browserReport(1) });
  const { code, said, last } = await run(['--only', 'browser'], join(folder, 'no-browser'));
  expect({ code, last }).toEqual({ code: 1, last: '1 passed, 1 failed' });
  expect(said).toMatch(/^CHROMIUM names .*no-browser, which is no program here; .*\.$/m);
});

test('an unknown part is refused in one sentence', async () => {
  pretend({});
  const { code, said, last } = await run(['--only', 'units']);
  expect({ code, last }).toEqual({ code: 1, last: '0 passed, 1 failed' });
  expect(said).toContain('The only option is --only with one of check, unit, browser.\n');
});
