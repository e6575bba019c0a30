import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const startCommand = fileURLToPath(new URL('../../workers/terminal/start.mjs', import.meta.url));

/**
 * Serves the page for all browser tests with the command a person uses, on any free port.
 * @returns a function that ends the server
 * @throws {Error} when the command ends before it has printed its address
 */
export default async function servePage(): Promise<() => Promise<void>> {
  const server = spawn(process.execPath, [startCommand, '--port', '0', '--no-open'], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const ended = new Promise<void>((resolve) => server.once('exit', () => resolve()));
  process.env.PAGE_ADDRESS = await new Promise<string>((resolve, reject) => {
    let printed = '';
    server.stdout.on('data', (piece: Buffer) => {
      printed += piece.toString();
      const address = /http:\/\/localhost:\d+\//.exec(printed);
      if (address) resolve(address[0]);
    });
    server.once('exit', (code) =>
      reject(new Error(`npm start ended with ${String(code)} before it printed an address:\n${printed}`)),
    );
  });
  return () => {
    server.kill('SIGTERM');
    return ended;
  };
}
