import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import { dataDigest, recordedRelease } from '../tools/data-release.mjs';
import { referenceTables, withTables } from '../tools/readme-tables.mjs';

const root = join(import.meta.dirname, '..', '..');
const read = (name: string): string => readFileSync(join(root, name), 'utf8');

describe('what is made from something else', () => {
  it('is the reference part of README.md, made from the manifest', () => {
    const tables: string = referenceTables(JSON.parse(read('dist/custom-elements.json')) as object);
    assert.equal(read('README.md'), withTables(read('README.md'), tables), 'run npm run build && npm run readme');
  });

  it('is the digest of the data that every record carries', () => {
    assert.equal(recordedRelease().digest, dataDigest(), 'run node test/tools/data-release.mjs, and raise the data version');
  });

  it('is the engine version of a record, which is that of the package', () => {
    assert.equal(recordedRelease().engine, (JSON.parse(read('package.json')) as { version: string }).version);
  });
});
