/** Whatever comes in, a SoluteError with a typed problem is the only exception that leaves. */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { predict, SoluteError, type PredictionInput, type SoluteInput } from '../../src/engine.js';
import { anySubstance, notFinite } from './support.js';

function assertTyped(make: () => unknown): void {
  try {
    assert.deepEqual(notFinite(make()), []);
  } catch (error) {
    if (!(error instanceof SoluteError)) throw error;
    assert.ok(error.problems.length > 0);
    for (const { code, text, piece, suggestions } of error.problems) {
      assert.match(code, /^[a-z-]+$/);
      assert.ok(text.length > 0 && typeof piece === 'string' && Array.isArray(suggestions));
      // Nothing invisible or direction-changing in a sentence.
      assert.doesNotMatch(text, /[\p{Cc}\p{Cf}\p{Co}\p{Cs}]/u);
    }
  }
}

const tokens = fc.constantFrom(
  '0.1', '1e-3', '1e999', '-5', '0', 'NaN', 'Infinity', '1,5', '1,000', '5 ', 'mol/L', 'mM', 'g/L', '%', 'N', 'm', 'kg', 'mol/(L', ' ', ';', '\n', 'NH4Cl',
  'Na2HPO4·12H2O', 'Fe3+', '(', ')', '[', ']', '{"', '"substance":', '12125-02-9', 'of', 'sodium', 'hydrogen', 'hydrate', '½', '²⁻', '·', '<b>', '\u202e', '\u0000', '🧪', '__proto__',
);

describe('input from outside', () => {
  it('random text', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 120 }), (text) => assertTyped(() => predict(text))), { numRuns: 600 });
  });

  it('random arrangements of what solutes are written with', () => {
    fc.assert(fc.property(fc.array(tokens, { maxLength: 14 }), (parts) => assertTyped(() => predict(parts.join('')))), { numRuns: 1200 });
  });

  it('random amounts of a known substance', () => {
    const amount = fc.tuple(fc.double(), fc.constantFrom('mol/L', 'mol/kg', 'g/L', 'nmol/L', 'mol', 'g', 'L', 'mol2/L', 'furlong')).map(([number, unit]) => `${number} ${unit}`);
    fc.assert(fc.property(anySubstance, amount, (substance, amount) => assertTyped(() => predict([{ substance, amount }]))), { numRuns: 400 });
  });

  it('values of any type in place of solutes and conditions', () => {
    const value = fc.oneof(fc.jsonValue(), fc.constantFrom(undefined, [,] as unknown), fc.date(), fc.array(fc.jsonValue()));
    fc.assert(fc.property(value, (solutes) => assertTyped(() => predict(solutes as readonly SoluteInput[]))), { numRuns: 400 });
    fc.assert(fc.property(value, value, (substance, amount) => assertTyped(() => predict([{ substance, amount } as SoluteInput]))), { numRuns: 400 });
    fc.assert(fc.property(value, (conditions) => assertTyped(() => predict('0.1 mol/kg NH4Cl', conditions as PredictionInput))), { numRuns: 200 });
    for (const key of ['temperature', 'air', 'carbonDioxide', 'volume']) {
      fc.assert(fc.property(value, (setting) => assertTyped(() => predict('0.1 mol/kg NH4Cl', { [key]: setting }))), { numRuns: 200 });
    }
  });

  it('keys that belong to every object', () => {
    for (const text of ['[{"__proto__":{"substance":"NH4Cl","amount":"1 mol/L"}}]', '[{"constructor":"x","toString":"y"}]', '[{"substance":"__proto__","amount":"1 mol/L"}]', '1 mol/L constructor', '1 toString NaCl', '1 mol/L hasOwnProperty']) {
      assertTyped(() => predict(text));
      assert.throws(() => predict(text), SoluteError, text);
    }
    assert.equal(({} as Record<string, unknown>)['substance'], undefined);
  });
});
