/** Finds the browser the page is tested in, and on Debian installs it when there is none. */
import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';

const names = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome'];
const usualPlaces = {
  darwin: [
    '/Applications/Chromium.app/Contents/MacOS/Chromium',
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  ],
  win32: [process.env.PROGRAMFILES, process.env['PROGRAMFILES(X86)'], process.env.LOCALAPPDATA]
    .filter(Boolean)
    .flatMap((folder) => [
      join(folder, 'Chromium', 'Application', 'chrome.exe'),
      join(folder, 'Google', 'Chrome', 'Application', 'chrome.exe'),
    ]),
};

/**
 * @returns {{ path: string } | { reason: string }} where Chromium is, or one sentence on what to install
 */
export function ensureChromium() {
  const asked = process.env.CHROMIUM;
  if (asked) {
    return isExecutable(asked)
      ? { path: asked }
      : { reason: `CHROMIUM names ${asked}, which is no program here; correct it or unset it.` };
  }
  const found = findChromium();
  if (found) return { path: found };
  if (mayInstall()) {
    const installed = install() && findChromium();
    if (installed) return { path: installed };
    return { reason: 'The chromium package could not be installed; what apt-get printed above says why.' };
  }
  return {
    reason: `The browser tests need Chromium: ${advice()}, or set CHROMIUM to the path of its program.`,
  };
}

function findChromium() {
  const onPath = (process.env.PATH ?? '')
    .split(delimiter)
    .filter(Boolean)
    .flatMap((folder) => names.map((name) => join(folder, name)));
  return [...onPath, ...(usualPlaces[process.platform] ?? [])].find(isExecutable);
}

function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** Ubuntu counts Debian among its ancestors, but its package is only a pointer to a snap. */
function isDebian() {
  if (!existsSync('/etc/os-release')) return false;
  const release = readFileSync('/etc/os-release', 'utf8');
  return /^ID(_LIKE)?="?[^\n]*\bdebian\b/m.test(release) && !/\bubuntu\b/i.test(release);
}

function mayInstall() {
  return isDebian() && process.getuid?.() === 0;
}

function install() {
  process.stdout.write('Installing the chromium package for the browser tests ...\n');
  const options = { stdio: 'inherit', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } };
  const ran = (...words) => spawnSync('apt-get', words, options).status === 0;
  // The package lists of a fresh image are empty; a failing update can still leave usable ones.
  ran('update', '--quiet');
  return ran('install', '--quiet', '--yes', '--no-install-recommends', 'chromium');
}

function advice() {
  if (isDebian()) return 'run "apt-get install chromium" as root';
  if (process.platform === 'darwin') return 'run "brew install --cask chromium" or install Google Chrome';
  if (process.platform === 'win32') return 'install Chromium or Google Chrome';
  return "install Chromium from your system's packages";
}
