import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { classify, NEUTRAL_BAND } from '../../src/prediction/classification.js';
import { predict } from '../../src/engine.js';
import { ions } from '../data/read.js';

/** Cations and anions of strong bases and acids, each with one charge, from the data. */
const strong = (charge: number, reason: string): string[] => ions.filter((ion) => ion.charge === charge && ion.spectator === reason && ion.refused === undefined).map(({ names }) => names[0]!);
const cations = strong(1, 'strong-base-cation');
const anions = strong(-1, 'strong-acid-anion');

describe('classification', () => {
  // A salt of a strong acid and a strong base leaves water as it is: common practice, no source.
  it('calls every salt of strong acid and strong base neutral at 5, 25 and 50 °C', (t) => {
    t.diagnostic(`${cations.length} cations × ${anions.length} anions: ${cations.join(', ')}; ${anions.join(', ')}`);
    assert.ok(cations.length >= 5 && anions.length >= 5);
    for (const temperature of [5, 25, 50]) {
      for (const cation of cations) {
        for (const anion of anions) {
          const { pH, neutralPH, classification } = predict(`0.01 mol/kg ${cation} ${anion}`, { temperature });
          assert.equal(classification, 'neutral', `${cation} ${anion} ${temperature} °C`);
          assert.ok(Math.abs(pH - neutralPH) < 0.005, `${cation} ${anion} ${temperature} °C: ${pH} ${neutralPH}`);
        }
      }
    }
  });

  it('measures from half of pKw at the temperature, never from 7', () => {
    for (const temperature of [0, 5, 25, 50, 60]) {
      const { pH, neutralPH, constants, classification } = predict('1 mmol/kg NaCl', { temperature });
      assert.equal(neutralPH, constants[0]!.valueHere / 2);
      assert.equal(classification, 'neutral');
      assert.ok(temperature === 25 || Math.abs(pH - 7) > 0.1);
    }
  });

  it('is undecided exactly where the uncertainty reaches across the boundary', () => {
    const neutral = 7;
    fc.assert(
      fc.property(fc.double({ min: -3, max: 3, noNaN: true }), fc.double({ min: 1e-6, max: 1, noNaN: true }), (distance, uncertainty) => {
        const { classification, decided } = classify(neutral + distance, neutral, uncertainty);
        const classes = new Set([-uncertainty, 0, uncertainty].map((step) => classify(neutral + distance + step, neutral, uncertainty).classification));
        if (decided) assert.deepEqual([...classes], [classification]);
        assert.equal(classification, Math.abs(neutral + distance - neutral) <= NEUTRAL_BAND ? 'neutral' : distance < 0 ? 'acidic' : 'basic');
      }),
    );
  });

  it('tells the acid from the basic side', () => {
    assert.equal(predict('0.02 mol/kg pyridine hydrochloride').classification, 'acidic');
    assert.equal(predict('0.02 mol/kg potassium fluoride').classification, 'basic');
    assert.equal(predict('0.02 mol/kg ammonium acetate').classification, 'neutral');
  });
});
