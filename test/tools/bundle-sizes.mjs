import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { brotliCompressSync, constants } from 'node:zlib';

const dist = join(import.meta.dirname, '..', '..', 'dist');

/** The files whose weight a page carries. */
export const BUNDLES = ['solute-card.min.js', 'engine.min.js'];

/** Bytes of every bundle as built: raw, and by brotli at its highest quality. */
export function bundleSizes() {
  return Object.fromEntries(BUNDLES.map((name) => {
    const code = readFileSync(join(dist, name));
    const params = { [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY, [constants.BROTLI_PARAM_SIZE_HINT]: code.length };
    return [name, { raw: code.length, brotli: brotliCompressSync(code, { params }).length }];
  }));
}
