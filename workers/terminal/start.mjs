/** `npm start`: everything from a fresh checkout to the page in a browser. Options: --port N, --no-open. */
import { spawn } from 'node:child_process';
import { SetUpError, ensureBuilt, ensureInstalled, requireNode } from './installed.mjs';
import { serveSite } from './serve.mjs';

const defaultPort = 4173;

try {
  const { port, open } = readOptions(process.argv.slice(2));
  requireNode();
  ensureInstalled();
  const served = await serve(ensureBuilt(), port);
  const address = `http://localhost:${served.port}/`;
  if (port !== 0 && served.port !== port) {
    process.stdout.write(
      `Port ${port} is in use, so the next free one, ${served.port}, is used (a browser keeps saved designs apart for each port).\n`,
    );
  }
  // Before the address is told: whoever reads it may end the server at once.
  const end = () => served.close().then(() => process.exit(0));
  process.once('SIGINT', end);
  process.once('SIGTERM', end);
  process.stdout.write(`Pump Ceiling is at ${address} (Ctrl-C ends it)\n`);
  if (open) openBrowser(address);
} catch (error) {
  if (!(error instanceof SetUpError)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = 1;
}

/** Reads the command's options; anything else is refused, so that a slip does not pass for a default. */
function readOptions(words) {
  const options = { port: defaultPort, open: true };
  for (let i = 0; i < words.length; i++) {
    const [name, joined] = words[i].split('=', 2);
    if (words[i] === '--no-open') options.open = false;
    else if (name === '--port') options.port = readPort(joined ?? words[++i]);
    else
      throw new SetUpError(
        `"${words[i]}" is not an option of this command; it takes --port N and --no-open.`,
      );
  }
  return options;
}

function readPort(text) {
  if (/^\d{1,5}$/.test(text ?? '') && Number(text) <= 65_535) return Number(text);
  throw new SetUpError(`--port needs a whole number from 0 (any free port) to 65535, not "${text ?? ''}".`);
}

async function serve(site, port) {
  try {
    return await serveSite(site, port);
  } catch (error) {
    if (error.code === 'EADDRINUSE') {
      throw new SetUpError(`Port ${port} and the ports after it are in use; choose another with --port N.`);
    }
    if (error.code === 'EACCES') {
      throw new SetUpError(`Port ${port} is not open to this user; choose one above 1023 with --port N.`);
    }
    throw error;
  }
}

/** Opens the address where there is a screen to open it on; without one the printed address is enough. */
function openBrowser(address) {
  const screen = process.env.DISPLAY || process.env.WAYLAND_DISPLAY;
  const command =
    process.platform === 'darwin'
      ? ['open', address]
      : process.platform === 'win32'
        ? ['cmd', '/c', 'start', '', address]
        : screen
          ? ['xdg-open', address]
          : undefined;
  if (!command) return;
  const opener = spawn(command[0], command.slice(1), { stdio: 'ignore', detached: true });
  opener.once('error', () =>
    process.stdout.write('No browser could be opened; open the address above by hand.\n'),
  );
  opener.unref();
}
