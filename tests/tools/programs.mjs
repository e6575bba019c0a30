/** Runs the installed tools by their scripts, which spares a shell and works alike on every system. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { projectRoot } from '../../workers/terminal/installed.mjs';

/** Longer than any step takes on a slow machine; a step that hangs must still come to a verdict. */
const patience = 20 * 60_000;

const scripts = {
  tsc: 'typescript/bin/tsc',
  'svelte-check': 'svelte-check/bin/svelte-check',
  eslint: 'eslint/bin/eslint.js',
  prettier: 'prettier/bin/prettier.cjs',
  knip: 'knip/bin/knip.js',
  vitest: 'vitest/vitest.mjs',
  playwright: '@playwright/test/cli.js',
};

/**
 * @param {keyof typeof scripts} name
 * @param {string[]} words arguments
 * @param {{ quiet?: boolean, env?: Record<string, string> }} how quiet keeps the output back and returns it
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runProgram(name, words, { quiet = false, env = {} } = {}) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [join(projectRoot, 'node_modules', scripts[name]), ...words], {
      cwd: projectRoot,
      env: { ...process.env, ...env },
      stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit'],
      timeout: patience,
    });
    const output = [];
    child.stdout?.on('data', (piece) => output.push(piece));
    child.stderr?.on('data', (piece) => output.push(piece));
    child.once('error', (error) => resolve({ code: 1, output: error.message }));
    child.once('close', (code) => resolve({ code: code ?? 1, output: Buffer.concat(output).toString() }));
  });
}
