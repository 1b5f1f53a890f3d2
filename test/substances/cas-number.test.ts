import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { casCheckDigit, hasValidCheckDigit, readCasNumber } from '../../src/substances/cas-number.js';
import { substances } from '../data/read.js';

describe('CAS Registry Number', () => {
  // The rule and its example 107-07-3, (1·7 + 2·0 + 3·7 + 4·0 + 5·1) mod 10 = 3: CAS, Check Digit Verification of CAS Registry Numbers.
  it('has the check digit of the published rule', () => {
    assert.equal(casCheckDigit('107-07-3'), 3);
    assert.equal(casCheckDigit('7732-18-5'), 5);
    assert.ok(hasValidCheckDigit('107-07-3') && !hasValidCheckDigit('107-07-4'));
  });

  it('is valid for every listed substance, and no single wrong digit passes', () => {
    for (const [, , cas] of substances) {
      if (cas === null) continue;
      assert.ok(hasValidCheckDigit(cas), cas);
      const last = Number(cas.at(-1));
      for (let digit = 0; digit <= 9; digit++) assert.equal(hasValidCheckDigit(`${cas.slice(0, -1)}${digit}`), digit === last);
    }
  });

  it('is read in every usual typing', () => {
    for (const text of ['7647-14-5', ' 7647-14-5 ', 'CAS 7647-14-5', 'cas: 7647-14-5', 'CAS RN 7647-14-5', 'CAS-No. 7647-14-5', 'CAS No. 7647-14-5', '7647‑14‑5', '7647–14–5', '7647−14−5']) assert.equal(readCasNumber(text), '7647-14-5', text);
    for (const text of ['7647-145', '7647145', '1-14-5', '7647-14-55', '12345678-14-5', 'NaCl', '', '7647-14-5 7647-14-5']) assert.equal(readCasNumber(text), undefined, text);
  });
});
