import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, describe, expect, it } from 'vitest';
import { demoDesign } from '../../src/design/demo';
import { longestDesign } from '../../src/design/check';

const root = fileURLToPath(new URL('../..', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'budget-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function budget(...args: string[]) {
  const command = ['--import', 'tsx', join(root, 'workers/terminal/budget.ts'), ...args];
  const { status, stdout, stderr } = spawnSync(process.execPath, command, {
    encoding: 'utf8',
    cwd: root,
    maxBuffer: 1 << 27,
  });
  return { status, stdout, stderr };
}

function file(name: string, text: string): string {
  const path = join(folder, name);
  writeFileSync(path, text);
  return path;
}

/** Without a second cooler and without uncertainty an answer takes a second less. */
const small = {
  ...demoDesign,
  coolers: demoDesign.coolers.slice(0, 2),
  chosenCooler: 'fan',
  uncertainty: {},
};

const numbersIn = (value: unknown): number[] =>
  typeof value === 'number'
    ? [value]
    : typeof value === 'object' && value !== null
      ? Object.values(value).flatMap(numbersIn)
      : [];

describe('the terminal entry', () => {
  it('prints the report as JSON with finite numbers and answers with 0', () => {
    const { status, stdout, stderr } = budget(file('good.json', JSON.stringify(small)), '--json');
    expect(stderr).toBe('');
    expect(status).toBe(0);
    const report = JSON.parse(stdout) as {
      format: string;
      options: { ceiling: { low: number; pumpPower: number; high: number } }[];
    };
    expect(report.format).toBe('pump-ceiling/report');
    for (const { ceiling } of report.options) {
      expect(ceiling.low).toBeLessThanOrEqual(ceiling.pumpPower);
      expect(ceiling.high).toBeGreaterThanOrEqual(ceiling.pumpPower);
    }
    expect(numbersIn(report).every(Number.isFinite)).toBe(true);
  });

  it('prints verdict, ceilings, edge and mounts as text', () => {
    const { status, stdout } = budget(file('text.json', JSON.stringify(small)));
    expect(status).toBe(0);
    for (const part of [
      'the pump ceiling is',
      'least demanding cooling',
      'Cavity edge',
      'copper (this design)',
      'Follow local codes',
    ])
      expect(stdout).toContain(part);
  });

  it.each([
    ['a file that is not there', () => join(folder, 'none.json'), /no such file/],
    ['a folder', () => folder, /not a file/],
    ['an empty file', () => file('empty.json', ''), /empty/],
    ['broken JSON', () => file('broken.json', '{"format": '), /not valid JSON/],
    ['a list', () => file('list.json', '[]'), /a design is a JSON object/],
    ['a file far too large', () => file('large.json', ' '.repeat(4 * longestDesign + 1)), /at most/],
    [
      'a power of 1e308 W',
      () => file('huge.json', JSON.stringify({ ...small, pump: { ...small.pump, power: '1e308 W' } })),
      /pump\.power/,
    ],
  ])('refuses %s in one sentence with 2', (_what, path, sentence) => {
    const { status, stdout, stderr } = budget(path());
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr).toMatch(sentence);
    expect(stderr.trim().split('\n')).toHaveLength(1);
    expect(stderr).not.toMatch(/\n\s+at |undefined|\[object/);
  });

  it('refuses an option it does not know', () => {
    const { status, stderr } = budget('--jsn');
    expect(status).toBe(2);
    expect(stderr).toContain('--jsn');
  });
});
