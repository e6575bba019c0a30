import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const terminal = fileURLToPath(new URL('../../workers/terminal', import.meta.url));

/** Stands in for the bundler: copies `web/` to `dist/` and adds a worker, unless the page says it is broken. */
const bundler = `
import { cpSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
rmSync('dist', { recursive: true, force: true });
if (readFileSync('web/index.html', 'utf8').includes('broken')) process.exit(1);
cpSync('web', 'dist', { recursive: true });
mkdirSync('dist/assets');
writeFileSync('dist/assets/solver.worker-Ab1_-x.js', 'postMessage(1)');
`;

/** What a command printed and how it ended. */
export interface Ended {
  code: number | null;
  said: string;
}

/** A command that serves and goes on doing so. */
export interface Serving {
  address: string;
  said: string;
  /** Sends a signal, as Ctrl-C does, and waits for the end. */
  end(signal: NodeJS.Signals): Promise<Ended>;
}

/** A project as small as can be with the real start command in it, whose installation needs no network. */
export class FreshProject {
  readonly folder = mkdtempSync(join(tmpdir(), 'fresh-project-'));

  constructor() {
    const lock = {
      name: 'fresh',
      version: '1.0.0',
      lockfileVersion: 3,
      requires: true,
      packages: {
        '': { name: 'fresh', version: '1.0.0', dependencies: { vite: 'file:bundler' } },
        bundler: { name: 'vite', version: '1.0.0' },
        'node_modules/vite': { resolved: 'bundler', link: true },
      },
    };
    cpSync(terminal, join(this.folder, 'workers/terminal'), { recursive: true });
    this.write('package.json', JSON.stringify({ type: 'module', ...lock.packages[''] }));
    this.write('package-lock.json', JSON.stringify(lock));
    this.write('bundler/package.json', '{"name":"vite","version":"1.0.0","type":"module"}');
    this.write('bundler/bin/vite.js', bundler);
    this.write('web/index.html', '<title>first</title>');
    this.write('web/favicon.svg', '<svg xmlns="http://www.w3.org/2000/svg"/>');
  }

  write(path: string, text: string): void {
    mkdirSync(dirname(join(this.folder, path)), { recursive: true });
    writeFileSync(join(this.folder, path), text);
  }

  remove(path = ''): void {
    rmSync(join(this.folder, path), { recursive: true, force: true });
  }

  /**
   * Runs the start command until it serves.
   * @param words its options; it never opens a browser
   * @throws {Error} with what it printed, when it ends instead
   */
  async serve(...words: string[]): Promise<Serving> {
    const run = this.run(words);
    const address = await Promise.race([run.address, run.ended.then(() => undefined)]);
    if (address === undefined) throw new Error((await run.ended).said);
    const end = (signal: NodeJS.Signals) => {
      run.child.kill(signal);
      return run.ended;
    };
    return { address, said: run.said(), end };
  }

  /** Runs the start command to its end. */
  fail(words: string[], nodeOptions: string[] = []): Promise<Ended> {
    return this.run(words, nodeOptions).ended;
  }

  private run(words: string[], nodeOptions: string[] = []) {
    const start = join(this.folder, 'workers/terminal/start.mjs');
    const child = spawn(process.execPath, [...nodeOptions, start, '--no-open', ...words], {
      cwd: tmpdir(),
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let said = '';
    const address = new Promise<string>((resolve) => {
      const hear = (piece: Buffer) => {
        said += piece.toString();
        const found = /is at (http:\S+)/.exec(said);
        if (found) resolve(found[1]!);
      };
      child.stdout.on('data', hear);
      child.stderr.on('data', hear);
    });
    const ended = new Promise<Ended>((resolve) => child.once('close', (code) => resolve({ code, said })));
    return { child, address, ended, said: () => said };
  }
}
