import assert from 'node:assert/strict';
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import { read } from './read.js';

const sources = read<{ sources: Record<string, { citation: string }> }>('sources.json').sources;
const files = readdirSync(join(import.meta.dirname, '..', '..', 'data'))
  .filter((name) => name.endsWith('.json') && !name.endsWith('.schema.json') && name !== 'sources.json');

/** Every text under a field whose name speaks of a source, with the file it stands in. */
function cited(): { key: string; file: string }[] {
  const found: { key: string; file: string }[] = [];
  const walk = (value: unknown, field: string, file: string): void => {
    if (typeof value === 'string') {
      if (/source/i.test(field)) found.push({ key: value, file });
    } else if (Array.isArray(value)) value.forEach((item) => walk(item, field, file));
    else if (value !== null && typeof value === 'object') {
      for (const [name, item] of Object.entries(value)) walk(item, name, file);
    }
  };
  for (const file of files) walk(read(file), '', file);
  return found;
}

describe('the bibliography', () => {
  it('holds every source that a data file cites', () => {
    assert.deepEqual(cited().filter(({ key }) => !(key in sources)), []);
  });

  it('holds no source that no data file cites', () => {
    const used = new Set(cited().map(({ key }) => key));
    assert.deepEqual(Object.keys(sources).filter((key) => !used.has(key)), []);
  });

  it('gives no citation twice', () => {
    const citations = Object.values(sources).map(({ citation }) => citation);
    assert.equal(new Set(citations).size, citations.length);
  });
});
