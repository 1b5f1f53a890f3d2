import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { problem, quote, SoluteError } from '../../src/quantities/solute-error.js';

describe('problems', () => {
  it('quote a piece with nothing invisible in it', () => {
    assert.equal(quote('NaCl'), '“NaCl”');
    assert.equal(quote('a\u202eb'), '“a[U+202E]b”');
    assert.equal(quote('a\u0000b\u200b'), '“a[U+0000]b[U+200B]”');
    assert.equal(quote('\ud800'), '“[U+D800]”');
    assert.equal(quote('<b>&'), '“<b>&”');
  });

  it('cut a long piece between whole characters', () => {
    const { piece } = problem('substance-unknown', 'text', '🧪'.repeat(200));
    assert.equal(Array.from(piece).length, 80);
    assert.ok(piece.endsWith('…') && !/\p{Cs}/u.test(piece));
  });

  it('make an error whose read-outs are those of the first', () => {
    const first = problem('unit-unknown', 'First.', 'x', { range: { start: 1, end: 2 }, solute: 0, suggestions: [{ value: 'mol/L', reason: 'unit code' }] });
    const error = new SoluteError([first, problem('empty-input', 'Second.', '')]);
    assert.equal(error.name, 'SoluteError');
    assert.equal(error.message, 'First. Second.');
    assert.deepEqual([error.code, error.piece, error.suggestions], [first.code, first.piece, first.suggestions]);
    assert.equal(error.problems.length, 2);
    assert.ok(!('range' in error.problems[1]!) && !('solute' in error.problems[1]!));
  });
});
