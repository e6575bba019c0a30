import { createServer, type Server } from 'node:net';
import { request } from 'node:http';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { FreshProject, type Serving } from './fresh-project';

const project = new FreshProject();
let serving: Serving;

beforeAll(async () => {
  serving = await project.serve('--port', '0');
});
afterAll(async () => {
  await serving.end('SIGTERM');
  project.remove();
});

/** Sends the path as it stands; `fetch` would tidy "/../" away before it reached the server. */
function status(address: string, path: string, method = 'GET'): Promise<number | undefined> {
  const { hostname, port } = new URL(address);
  return new Promise((resolve, reject) => {
    const sent = request({ hostname, port, path, method }, (response) => {
      response.resume();
      resolve(response.statusCode);
    });
    sent.once('error', reject).end();
  });
}

/** Holds a free port, as another program would; 0 on a machine without that kind of address. */
function occupy(host: string): Promise<{ server: Server; port: number }> {
  const server = createServer();
  return new Promise((resolve) => {
    server.once('error', () => resolve({ server, port: 0 }));
    server.listen({ host, port: 0 }, () => {
      const address = server.address();
      resolve({ server, port: address !== null && typeof address === 'object' ? address.port : 0 });
    });
  });
}

describe('npm start on a fresh checkout', () => {
  test('installs, builds, serves and prints where', () => {
    const said = serving.said.split('\n');
    expect(said[0]).toMatch(/^Installing the locked dependencies/);
    expect(serving.said).toMatch(/^Building the page/m);
    expect(serving.said).toMatch(/^Pump Ceiling is at http:\/\/localhost:\d+\/ \(Ctrl-C ends it\)$/m);
  });

  test('goes straight to serving the second time, and ends cleanly on Ctrl-C', async () => {
    const again = await project.serve('--port', '0');
    expect(again.said).not.toMatch(/Installing|Building/);
    expect((await again.end('SIGINT')).code).toBe(0);
  });

  test('takes the next free port and says so in one sentence when the wanted one is in use', async () => {
    for (const host of ['127.0.0.1', '::1']) {
      const { server, port } = await occupy(host);
      if (port === 0) continue;
      const beside = await project.serve('--port', String(port));
      const used = Number(new URL(beside.address).port);
      expect(used).toBeGreaterThan(port);
      const sentences = beside.said.split('\n').filter((line) => line.includes('in use'));
      expect(sentences).toHaveLength(1);
      expect(sentences[0]).toContain(`Port ${port} is in use, so the next free one, ${used}, is used`);
      expect((await fetch(beside.address)).status).toBe(200);
      await beside.end('SIGTERM');
      server.close();
    }
  });

  test('builds again after a source changed, and not after a note did', async () => {
    project.write('web/index.html', '<title>second</title>');
    const changed = await project.serve('--port', '0');
    expect(changed.said).toMatch(/Building/);
    expect(await (await fetch(changed.address)).text()).toContain('second');
    await changed.end('SIGTERM');

    project.write('web/README.md', '# A note');
    const noted = await project.serve('--port', '0');
    expect(noted.said).not.toMatch(/Building/);
    await noted.end('SIGTERM');
  });

  test('installs again when a package is gone', async () => {
    project.remove('node_modules/vite');
    const mended = await project.serve('--port', '0');
    expect(mended.said).toMatch(/^Installing/);
    await mended.end('SIGTERM');
  });
});

describe('npm start when it cannot go on', () => {
  test('a build that fails is one sentence and leaves nothing that passes for built', async () => {
    const other = new FreshProject();
    other.write('web/index.html', 'broken');
    for (const attempt of [1, 2]) {
      const { code, said } = await other.fail(['--port', '0']);
      expect({ attempt, code }).toEqual({ attempt, code: 1 });
      expect(said).toMatch(/The page could not be built; the messages above say why\.\n$/);
    }
    other.remove();
  });

  test.each(['18.20.4', '20.18.3', '21.7.3', '22.12.0'])(
    'Node %s is refused, naming the one needed',
    async (version) => {
      const older = `Object.defineProperty(process, "versions", { value: { ...process.versions, node: "${version}" } })`;
      const { code, said } = await project.fail([], ['--import', `data:text/javascript,${older}`]);
      expect(code).toBe(1);
      expect(said).toContain(`This needs Node 20.19 or newer (of the 22 line, 22.13 or newer)`);
      expect(said).toContain(`but the Node started here is ${version};`);
      expect(said.trimEnd().split('\n')).toHaveLength(1);
    },
  );

  test.each([
    [['--port', 'eighty'], '--port needs a whole number from 0 (any free port) to 65535, not "eighty".\n'],
    [['--port'], '--port needs a whole number from 0 (any free port) to 65535, not "".\n'],
    [['--port=70000'], '--port needs a whole number from 0 (any free port) to 65535, not "70000".\n'],
    [['--prot', '1'], '"--prot" is not an option of this command; it takes --port N and --no-open.\n'],
  ])('the options %j are refused in one sentence', async (words, sentence) => {
    expect(await project.fail(words)).toEqual({ code: 1, said: sentence });
  });
});

describe('the served page', () => {
  test('may run only its own scripts and styles', async () => {
    const { headers } = await fetch(serving.address);
    const policy = headers.get('content-security-policy')!.split('; ');
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("script-src 'self'");
    expect(policy).toContain("style-src 'self'");
    expect(policy).toContain("worker-src 'self' blob:");
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('content-type')).toBe('text/html; charset=utf-8');
    expect(headers.get('cache-control')).toBe('no-cache');
  });

  test('gives leave to build code at run time to a worker only', async () => {
    const worker = await fetch(`${serving.address}assets/solver.worker-Ab1_-x.js`);
    expect(worker.headers.get('content-security-policy')).toContain("script-src 'self' 'unsafe-eval';");
    expect(worker.headers.get('content-type')).toBe('text/javascript; charset=utf-8');
    const icon = await fetch(`${serving.address}favicon.svg?v=1`);
    expect(icon.headers.get('content-security-policy')).not.toContain('unsafe');
    expect(icon.headers.get('content-type')).toBe('image/svg+xml');
  });

  test.each([
    '/../package.json',
    '/assets/../../package.json',
    '/%2e%2e/package.json',
    '/..%2fpackage.json',
    '/..%5cpackage.json',
    '//etc/passwd',
    '/.built-from',
    '/%00',
    '/%zz',
    '/assets',
    '/assets/',
    '/nothing-here.js',
  ])('holds nothing at %s', async (path) => {
    expect(await status(serving.address, path)).toBe(404);
  });

  test('is read and never written', async () => {
    expect(await status(serving.address, '/', 'HEAD')).toBe(200);
    expect(await status(serving.address, '/', 'POST')).toBe(405);
    expect(await status(serving.address, '/', 'DELETE')).toBe(405);
  });
});
