import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { before, describe, it } from 'node:test';
import { BUNDLES, bundleSizes } from '../tools/bundle-sizes.mjs';

/** Versions of the brotli library may differ by a few bytes; the raw size is exact everywhere. */
const BROTLI_ALLOWANCE = 64;
/** Brotli bytes to come down to; how far the bundle is from it is reported, not asserted. */
const AIMS: Record<string, number> = { 'solute-card.min.js': 60_000, 'engine.min.js': 40_000 };

const recorded = JSON.parse(readFileSync(join(import.meta.dirname, 'sizes.json'), 'utf8')) as Record<string, { raw: number; brotli: number }>;

describe('the sizes of the bundles', () => {
  let sizes: ReturnType<typeof bundleSizes> = {};
  before(() => { sizes = bundleSizes(); });

  for (const name of BUNDLES) {
    it(`${name} has the recorded bytes`, (test) => {
      const { raw, brotli } = sizes[name]!;
      test.diagnostic(`${name}: ${raw} bytes, ${brotli} by brotli; the aim is ${AIMS[name]}`);
      const expected = recorded[name]!;
      const changed = `${name} is ${raw} bytes, ${brotli} by brotli; recorded are ${expected.raw} and ${expected.brotli}. If the change is `
        + 'meant, run "npm run build && node test/tools/print-sizes.mjs" and put the figures into test/package/sizes.json.';
      assert.equal(raw, expected.raw, changed);
      assert.ok(Math.abs(brotli - expected.brotli) <= BROTLI_ALLOWANCE, changed);
    });
  }
});
