/** A small static server for the built page: right types, strict policies, nothing outside its folder. */
import { createReadStream } from 'node:fs';
import { realpath, stat } from 'node:fs/promises';
import { createServer } from 'node:http';
import { extname, join, sep } from 'node:path';

const types = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.map': 'application/json; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.ico': 'image/x-icon',
  '.woff2': 'font/woff2',
  '.txt': 'text/plain; charset=utf-8',
  '.webmanifest': 'application/manifest+json',
};

const policy = (scripts) =>
  [
    "default-src 'self'",
    `script-src ${scripts}`,
    "style-src 'self'",
    "img-src 'self' data: blob:",
    "connect-src 'self'",
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'none'",
    "frame-ancestors 'none'",
  ].join('; ');

const pagePolicy = policy("'self'");
/** A worker obeys the policy its own script came with; its array views are compiled when they are first used. */
const workerPolicy = policy("'self' 'unsafe-eval'");
const workerScript = /\.worker-[\w-]+\.js$/;
/** Vite puts a hash of the contents in these names, so a browser may keep them. */
const hashedName = /[\\/]assets[\\/]/;

/**
 * Serves a folder to this machine only, on the first free port from the wanted one on.
 * @param site folder that holds `index.html`
 * @param port wanted port; 0 takes any free one
 * @returns the port used and a function that stops serving
 * @throws {Error} with `code` EADDRINUSE when the next 50 ports are in use too, EACCES when the port is not allowed
 */
export async function serveSite(site, port) {
  const root = await realpath(site);
  const answer = (request, response) => {
    reply(root, request, response).catch(() => refuse(response, 500, 'The page could not be read.'));
  };
  for (let tried = port; ; tried++) {
    try {
      const servers = await listen(answer, tried);
      return { port: servers[0].address().port, close: () => closeAll(servers) };
    } catch (error) {
      if (error.code !== 'EADDRINUSE' || tried >= Math.min(port + 50, 65_535)) throw error;
    }
  }
}

/** Browsers read "localhost" as either loopback address, so a port counts as free only when both are ours. */
async function listen(answer, port) {
  const first = await listenAt('127.0.0.1', port, answer);
  try {
    return [first, await listenAt('::1', first.address().port, answer)];
  } catch (error) {
    if (error.code === 'EADDRNOTAVAIL' || error.code === 'EAFNOSUPPORT') return [first];
    await closeAll([first]);
    throw error;
  }
}

function listenAt(host, port, answer) {
  return new Promise((resolve, reject) => {
    const server = createServer(answer);
    server.once('error', reject);
    server.listen({ host, port, ipv6Only: host === '::1' }, () => resolve(server));
  });
}

async function closeAll(servers) {
  await Promise.all(
    servers.map((server) => {
      const closed = new Promise((resolve) => server.close(resolve));
      server.closeAllConnections();
      return closed;
    }),
  );
}

async function reply(root, request, response) {
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    response.setHeader('Allow', 'GET, HEAD');
    return refuse(response, 405, 'Only GET and HEAD are answered here.');
  }
  const file = await fileFor(root, request.url);
  if (!file) return refuse(response, 404, 'There is no such page here.');
  const { size } = await stat(file);
  response.writeHead(200, {
    ...guards(workerScript.test(file) ? workerPolicy : pagePolicy),
    'Content-Type': types[extname(file)] ?? 'application/octet-stream',
    'Content-Length': size,
    'Cache-Control': hashedName.test(file.slice(root.length)) ? 'max-age=31536000, immutable' : 'no-cache',
  });
  if (request.method === 'HEAD') return response.end();
  createReadStream(file)
    .on('error', () => response.destroy())
    .pipe(response);
}

/** The file a request names, or undefined when it names none, a hidden one, or one outside the folder. */
async function fileFor(root, url) {
  try {
    // Not through URL, which would quietly mend "/../" before it can be refused.
    const path = decodeURIComponent(url.split(/[?#]/, 1)[0]);
    if (path.includes('\0') || path.split(/[\\/]/).some((part) => part.startsWith('.'))) return undefined;
    const file = await realpath(join(root, path.endsWith('/') ? `${path}index.html` : path));
    return file.startsWith(root + sep) && (await stat(file)).isFile() ? file : undefined;
  } catch {
    return undefined;
  }
}

function refuse(response, status, sentence) {
  if (response.headersSent) return response.destroy();
  response.writeHead(status, { ...guards(pagePolicy), 'Content-Type': types['.txt'] });
  response.end(`${sentence}\n`);
}

function guards(contentPolicy) {
  return {
    'Content-Security-Policy': contentPolicy,
    'X-Content-Type-Options': 'nosniff',
    'Referrer-Policy': 'no-referrer',
    'Cross-Origin-Resource-Policy': 'same-origin',
  };
}
