/** Conservation laws: they need no outside source. */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { predict } from '../../src/engine.js';
import { addressOf, anyMolality, anySubstance, anyTemperature, imbalances, notFinite, predictable, predictionOrRefusal, predictOne } from './support.js';

const LARGEST_IMBALANCE = 1e-9;

function assertBalanced(prediction: ReturnType<typeof predict>, air: string): void {
  for (const [of, size] of imbalances(prediction)) {
    if (air === 'equilibrated' && of !== 'charge') continue;
    assert.ok(size <= LARGEST_IMBALANCE, `${of}: ${size}`);
  }
  assert.ok(prediction.residual <= 1e-10, `residual ${prediction.residual}`);
  assert.deepEqual(notFinite(prediction), []);
  assert.ok(prediction.species.every(({ molality }) => molality >= 0));
}

describe('balances of a prediction', () => {
  it('hold for every listed substance, dilute and concentrated, cold and warm', (t) => {
    const unsettled: string[] = [];
    for (const row of predictable) {
      for (const [amount, temperature] of [['1 nmol/kg', 60], ['0.01 mol/kg', 25], ['2 mol/kg', 5]] as const) {
        const prediction = predictionOrRefusal(() => predictOne(addressOf(row), amount, temperature));
        if (prediction) assertBalanced(prediction, 'excluded');
        else unsettled.push(`${amount} ${row[1]}`);
      }
    }
    t.diagnostic(`${predictable.length} substances at three amounts`);
    assert.deepEqual(unsettled, []);
  });

  it('hold for random mixtures of up to six substances', () => {
    const solute = fc.record({ substance: anySubstance, molality: anyMolality });
    fc.assert(
      fc.property(fc.array(solute, { minLength: 1, maxLength: 6 }), anyTemperature, fc.constantFrom('excluded' as const, 'equilibrated' as const), (mixture, temperature, air) => {
        const solutes = mixture.map(({ substance, molality }) => ({ substance, amount: `${molality} mol/kg` }));
        assertBalanced(predict(solutes, { temperature, air }), air);
      }),
      { numRuns: 400 },
    );
  });
});

describe('a prediction does not depend on how the same thing is written', () => {
  const few = fc.array(fc.record({ substance: anySubstance, molality: anyMolality }), { minLength: 2, maxLength: 4 });

  it('gives the same pH in any order of the solutes', () => {
    fc.assert(
      fc.property(few, (mixture) => {
        const solutes = mixture.map(({ substance, molality }) => ({ substance, amount: `${molality} mol/kg` }));
        const forwards = predict(solutes).pH;
        const backwards = predict([...solutes].reverse()).pH;
        assert.ok(Math.abs(forwards - backwards) <= 1e-9, `${forwards} ${backwards}`);
      }),
      { numRuns: 150 },
    );
  });

  it('gives exactly the same pH in mol/L, mmol/L and µmol/L', () => {
    fc.assert(
      fc.property(anySubstance, fc.integer({ min: 1, max: 999 }), (substance, micromoles) => {
        const [micro, milli, whole] = [`${micromoles} µmol/L`, `${micromoles}e-3 mmol/L`, `${micromoles}e-6 mol/L`].map((amount) => predictOne(substance, amount));
        assert.equal(milli!.pH, micro!.pH);
        assert.equal(whole!.pH, micro!.pH);
        assert.equal(whole!.uncertainty, micro!.uncertainty);
      }),
      { numRuns: 150 },
    );
  });

  it('gives the same pH for one solute and for its two halves', () => {
    fc.assert(
      fc.property(anySubstance, fc.integer({ min: 1, max: 500 }), (substance, millimoles) => {
        const whole = predictOne(substance, `${2 * millimoles} mmol/kg`).pH;
        const halves = predict([0, 1].map(() => ({ substance, amount: `${millimoles} mmol/kg` }))).pH;
        assert.ok(Math.abs(whole - halves) <= 1e-9, `${whole} ${halves}`);
      }),
      { numRuns: 150 },
    );
  });
});
