import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { editDistance, nearest } from '../../src/substances/similar-text.js';

/** Optimal string alignment, written out from its definition (Boytsov, ACM J. Exp. Algorithmics 16 (2011) 1.1). */
function byDefinition(a: string, b: string, i = a.length, j = b.length): number {
  if (i === 0 || j === 0) return i + j;
  let least = Math.min(byDefinition(a, b, i - 1, j) + 1, byDefinition(a, b, i, j - 1) + 1, byDefinition(a, b, i - 1, j - 1) + (a[i - 1] === b[j - 1] ? 0 : 1));
  if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) least = Math.min(least, byDefinition(a, b, i - 2, j - 2) + 1);
  return least;
}

describe('edit distance', () => {
  it('is that of its definition, or more than the limit', () => {
    const word = fc.stringMatching(/^[abc]{0,6}$/);
    fc.assert(
      fc.property(word, word, fc.integer({ min: 0, max: 6 }), (a, b, limit) => {
        const exact = byDefinition(a, b);
        const distance = editDistance(a, b, limit);
        assert.ok(exact <= limit ? distance === exact : distance > limit, `${a} ${b}: ${distance}, exact ${exact}`);
      }),
      { numRuns: 300, seed: Number(process.env['SEED'] ?? 1) },
    );
  });

  it('ranks the nearest first, ties in the order given', () => {
    assert.deepEqual(nearest('abcd', ['abxd', 'abcd', 'xxxx', 'abdc'], 3), ['abcd', 'abxd', 'abdc']);
    assert.deepEqual(nearest('abcd', [], 3), []);
  });
});
