/**
 * Set-up shared by `npm start` and `npm test`: right Node, locked dependencies in place, page built.
 * Only Node's own modules may be imported here, because nothing else need be installed yet.
 */
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Top folder of the project, wherever the command was started. */
export const projectRoot = fileURLToPath(new URL('../..', import.meta.url));

/** The bundler and the linter load on no earlier release of these lines; newer lines need nothing more. */
const lowestMinor = { 20: 19, 22: 13 };
/** What the built page depends on; a change in any of these makes `dist/` stale. */
const buildInputs = ['web', 'src', 'workers', 'vite.config.ts', 'tsconfig.json', 'package-lock.json'];
/** Lies inside `dist/`, so a build that empties the folder and then fails leaves none behind. */
const buildMark = '.built-from';

/** A set-up step that cannot go on; its message is one sentence for the person at the terminal. */
export class SetUpError extends Error {
  name = 'SetUpError';
}

/**
 * Makes sure this Node is new enough.
 * @throws {SetUpError} naming the version found and the one needed
 */
export function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > 22 || minor >= lowestMinor[major]) return;
  throw new SetUpError(
    `This needs Node 20.19 or newer (of the 22 line, 22.13 or newer), but the Node started here is ${process.versions.node}; install a newer one from nodejs.org or your system's packages.`,
  );
}

/**
 * Installs the locked dependencies when `node_modules` does not hold exactly what the lock file asks for.
 * @throws {SetUpError} when the installation fails
 */
export function ensureInstalled() {
  if (isInstalled()) return;
  process.stdout.write('Installing the locked dependencies (needs the network, about a minute) ...\n');
  // Started by npm itself, its own script is at hand; this spares a shell on every system.
  const npm = process.env.npm_execpath;
  const wanted = ['ci', '--include=dev', '--no-audit', '--no-fund'];
  const options = { cwd: projectRoot, stdio: 'inherit' };
  const run = npm
    ? spawnSync(process.execPath, [npm, ...wanted], options)
    : spawnSync('npm', wanted, { ...options, shell: process.platform === 'win32' });
  if (run.status !== 0) {
    throw new SetUpError(
      'The dependencies could not be installed (npm ci says why above); check the network and run the same command again.',
    );
  }
}

/**
 * Builds the page into `dist/` when the sources differ from those it was last built from.
 * @returns the folder that holds the built page
 * @throws {SetUpError} when the build fails
 */
export function ensureBuilt() {
  const site = join(projectRoot, 'dist');
  const mark = join(site, buildMark);
  const wanted = fingerprint();
  if (existsSync(join(site, 'index.html')) && existsSync(mark) && readFileSync(mark, 'utf8') === wanted) {
    return site;
  }
  process.stdout.write('Building the page ...\n');
  const vite = join(projectRoot, 'node_modules', 'vite', 'bin', 'vite.js');
  // The type check and the tests set their own mode; a page is always built for production.
  const env = { ...process.env, NODE_ENV: 'production' };
  const run = spawnSync(process.execPath, [vite, 'build', '--logLevel', 'warn'], {
    cwd: projectRoot,
    stdio: 'inherit',
    env,
  });
  if (run.status !== 0) throw new SetUpError('The page could not be built; the messages above say why.');
  writeFileSync(mark, wanted);
  return site;
}

/** Whether every package in `node_modules` is the locked one, suits this machine, and none needed is missing. */
function isInstalled() {
  const installedLock = join(projectRoot, 'node_modules', '.package-lock.json');
  if (!existsSync(installedLock)) return false;
  const locked = packagesOf(join(projectRoot, 'package-lock.json'));
  const installed = packagesOf(installedLock);
  for (const [path, entry] of Object.entries(locked)) {
    if (path === '' || entry.optional || entry.devOptional) continue;
    if (!installed[path]) return false;
  }
  return Object.entries(installed).every(
    ([path, entry]) =>
      locked[path]?.version === entry.version &&
      locked[path]?.integrity === entry.integrity &&
      suits(entry.os, process.platform) &&
      suits(entry.cpu, process.arch) &&
      existsSync(join(projectRoot, path)),
  );
}

function packagesOf(lockFile) {
  try {
    return JSON.parse(readFileSync(lockFile, 'utf8')).packages ?? {};
  } catch {
    throw new SetUpError(`${lockFile} is not readable JSON; restore it from version control.`);
  }
}

/** Whether a package's `os` or `cpu` list, "!name" meaning all but that one, takes in this machine. */
function suits(list, ours) {
  if (!list) return true;
  if (list.includes(`!${ours}`)) return false;
  return list.includes(ours) || list.every((name) => name.startsWith('!'));
}

/** One number for the contents of everything the page is built from. */
function fingerprint() {
  const hash = createHash('sha256');
  const add = (path) => {
    const entries = readdirSync(join(projectRoot, path), { withFileTypes: true });
    for (const entry of entries.sort((a, b) => (a.name < b.name ? -1 : 1))) {
      const inner = `${path}/${entry.name}`;
      if (entry.isDirectory()) add(inner);
      else if (!entry.name.endsWith('.md')) addFile(inner);
    }
  };
  const addFile = (path) =>
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(projectRoot, path)))
      .update('\0');
  for (const input of buildInputs) {
    if (!existsSync(join(projectRoot, input))) continue;
    if (/\.\w+$/.test(input)) addFile(input);
    else add(input);
  }
  return hash.digest('hex');
}
