import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { build } from 'esbuild';
import { chromium, type Browser } from 'playwright-core';
import { ensureChromium } from '../tools/ensure-browser.mjs';

/** The elements as one script, as a page of a host would load them. */
async function bundle(): Promise<string> {
  const result = await build({
    entryPoints: ['src/define.ts'], bundle: true, format: 'esm', target: 'es2022', tsconfig: 'tsconfig.json', write: false, minify: true,
  });
  return result.outputFiles[0]!.text;
}

/** Serves pages by their path; the script is at /elements.js, open to any origin, since a sandboxed frame has none. */
export async function servePages(pages: Record<string, string>): Promise<{ server: Server; address: string }> {
  const script = await bundle();
  const server = createServer(({ url = '/' }, response) => {
    response.setHeader('access-control-allow-origin', '*');
    const page = pages[url];
    if (url === '/elements.js') response.setHeader('content-type', 'text/javascript; charset=utf-8').end(script);
    else if (page !== undefined) response.setHeader('content-type', 'text/html; charset=utf-8').end(page);
    else response.writeHead(404).end();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return { server, address: `http://127.0.0.1:${(server.address() as AddressInfo).port}` };
}

export function launch(): Promise<Browser> {
  return chromium.launch({ executablePath: ensureChromium(), args: process.getuid?.() === 0 ? ['--no-sandbox'] : [] });
}
