import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { request } from 'node:http';
import { join } from 'node:path';
import { after, before, describe, it } from 'node:test';
import { startServer } from '../../demo/serve.mjs';

interface Answer {
  status: number | undefined;
  headers: Record<string, string | string[] | undefined>;
  body: string;
}

describe('the demo server', () => {
  let started: Awaited<ReturnType<typeof startServer>>;
  before(async () => { started = await startServer(0); });
  after(() => { started.server.close(); });

  /** Sends the path as it stands: fetch and URL would tidy it up first. */
  const get = (path: string, method = 'GET') => new Promise<Answer>((resolve, reject) => {
    const { port } = new URL(started.address);
    request({ host: '127.0.0.1', port, path, method }, (response) => {
      let body = '';
      response.setEncoding('utf8').on('data', (piece: string) => { body += piece; })
        .on('end', () => { resolve({ status: response.statusCode, headers: response.headers, body }); });
    }).on('error', reject).end();
  });

  it('serves the vendored module under a strict content security policy', async () => {
    const { status, headers, body } = await get('/vendor/idb.js');
    assert.equal(status, 200);
    assert.equal(headers['content-type'], 'text/javascript; charset=utf-8');
    assert.equal(body, readFileSync(join(import.meta.dirname, '../../node_modules/idb/build/index.js'), 'utf8'));
    const policy = String(headers['content-security-policy']);
    for (const part of ["default-src 'none'", "script-src 'self'", "style-src 'self'", "require-trusted-types-for 'script'", 'trusted-types solute-card lit-html']) {
      assert.ok(policy.includes(part), part);
    }
    assert.ok(!policy.includes('unsafe'));
  });

  for (const path of [
    '/../package.json', '/%2e%2e/package.json', '/dist/../../package.json', '/dist/..%2fpackage.json', '/..%5cpackage.json',
    '/serve.mjs', '/dist/', '/vendor/idb.js/../../package.json', '/%00.html', '/%', '//', '/absent.html',
  ]) {
    it(`answers ${path} with 404`, async () => {
      assert.equal((await get(path)).status, 404);
    });
  }

  it('refuses what is no reading', async () => {
    assert.equal((await get('/index.html', 'POST')).status, 405);
  });

  it('moves on from a busy port', async () => {
    const busy = Number(new URL(started.address).port);
    const second = await startServer(busy);
    assert.notEqual(second.address, started.address);
    second.server.close();
  });

  it('listens on this machine only', () => {
    assert.equal((started.server.address() as { address: string }).address, '127.0.0.1');
  });
});
