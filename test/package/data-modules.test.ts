import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { dataModule, withoutDocumentation } from '../tools/data-modules.mjs';

const folder = join(import.meta.dirname, '..', '..', 'data');

/** What a module exports, run as the module that the build makes. */
async function exported(code: string): Promise<unknown> {
  const module = await import(`data:text/javascript;base64,${Buffer.from(code).toString('base64')}`) as { default: unknown };
  return module.default;
}

describe('the modules made of the data files', () => {
  for (const name of readdirSync(folder).filter((file) => file.endsWith('.json'))) {
    it(`${name} comes back as written, less what documents it`, async () => {
      const text = readFileSync(join(folder, name), 'utf8');
      assert.deepEqual(await exported(dataModule(text)), withoutDocumentation(text));
    });
  }

  it('drops notes, choices and checks at every depth', () => {
    assert.deepEqual(withoutDocumentation('{"a":[{"note":"x","b":1}],"choice":{"c":2},"d":{"check":[3],"e":null}}'), { a: [{ b: 1 }], d: { e: null } });
  });

  it('brings back any table', async () => {
    const cell = fc.oneof(fc.constant(null), fc.boolean(), fc.integer(), fc.string(), fc.array(fc.integer(), { maxLength: 3 }));
    const row = fc.dictionary(fc.constantFrom('a', 'b', 'c'), fc.oneof(cell, fc.array(fc.dictionary(fc.constantFrom('d', 'e'), cell), { maxLength: 6 })));
    const table = fc.oneof(fc.array(row, { maxLength: 8 }), fc.array(fc.tuple(cell, cell), { maxLength: 8 }));
    await fc.assert(fc.asyncProperty(table, async (value) => {
      const plain: unknown = JSON.parse(JSON.stringify(value));
      assert.deepEqual(await exported(dataModule(JSON.stringify(plain))), plain);
    }), { numRuns: 200 });
  });
});
