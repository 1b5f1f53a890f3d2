/**
 * Serves the demo pages as a careful host would: this machine only, and under a strict content security policy.
 * PORT names the first port to try; a busy one moves on to the next.
 */
import { createReadStream } from 'node:fs';
import { realpath, stat } from 'node:fs/promises';
import { createServer } from 'node:http';
import { extname, join, sep } from 'node:path';
import { pathToFileURL } from 'node:url';

const HOST = '127.0.0.1';
const DEFAULT_PORT = 4173;
const PORTS_TO_TRY = 20;

const project = join(import.meta.dirname, '..');
const MOUNTS = [
  { prefix: '/dist/', folder: join(project, 'dist') },
  { prefix: '/vendor/idb.js', file: join(project, 'node_modules', 'idb', 'build', 'index.js') },
  { prefix: '/', folder: import.meta.dirname },
];

const TYPES = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.map': 'application/json; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
};

const HEADERS = {
  'Content-Security-Policy': [
    "default-src 'none'", "script-src 'self'", "style-src 'self'", "img-src 'self'", "connect-src 'self'", "frame-src 'self'",
    "frame-ancestors 'self'", "form-action 'self'", "base-uri 'none'",
    "require-trusted-types-for 'script'", 'trusted-types solute-card lit-html',
  ].join('; '),
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Cache-Control': 'no-store',
};

/** The file that a request names, or undefined; a link that leads out of its folder counts as absent. */
async function fileOf(url) {
  let path;
  try {
    path = decodeURIComponent(new URL(url, 'http://localhost').pathname);
  } catch {
    return undefined;
  }
  const { prefix, folder, file } = MOUNTS.find((mount) => path.startsWith(mount.prefix));
  if (path.includes('\0') || !(extname(path) in TYPES || path === '/')) return undefined;
  try {
    if (file) return path === prefix ? file : undefined;
    const real = await realpath(join(folder, path.slice(prefix.length) || 'index.html'));
    const inside = real.startsWith((await realpath(folder)) + sep);
    return inside && (await stat(real)).isFile() ? real : undefined;
  } catch {
    return undefined;
  }
}

async function answer(request, response) {
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    response.writeHead(405, { ...HEADERS, Allow: 'GET, HEAD' }).end();
    return;
  }
  const file = await fileOf(request.url);
  if (!file) {
    response.writeHead(404, { ...HEADERS, 'Content-Type': 'text/plain; charset=utf-8' }).end('Not found\n');
    return;
  }
  response.writeHead(200, { ...HEADERS, 'Content-Type': TYPES[extname(file)] });
  if (request.method === 'HEAD') response.end();
  else createReadStream(file).on('error', () => response.destroy()).pipe(response);
}

function listen(port) {
  return new Promise((resolve, reject) => {
    const server = createServer((request, response) => void answer(request, response));
    server.once('error', reject).listen(port, HOST, () => resolve(server));
  });
}

/**
 * Starts the server on the first free port from `first` on (0 lets the system choose); gives it with its address.
 * @param {number} first
 * @returns {Promise<{ server: import('node:http').Server, address: string }>}
 */
export async function startServer(first) {
  for (let port = first; ; port++) {
    try {
      const server = await listen(port);
      return { server, address: `http://${HOST}:${server.address().port}/` };
    } catch (error) {
      if (error.code !== 'EADDRINUSE' || port >= first + PORTS_TO_TRY) throw error;
    }
  }
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const { address } = await startServer(Number(process.env.PORT ?? DEFAULT_PORT));
  console.log(`Solute Card demo: ${address}  (Ctrl+C ends it)`);
}
