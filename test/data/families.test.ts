import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { atomsOf, watersBetween } from './composition.js';
import { chargeShown, families, repeated } from './read.js';

describe('the acid–base families', () => {
  it('have unique keys and unique states', () => {
    assert.deepEqual(repeated(families.map(({ key }) => key)), []);
    assert.deepEqual(repeated(families.flatMap(({ states }) => states.map(({ id }) => id))), []);
  });

  it('have one step between every two neighbouring states', () => {
    assert.deepEqual(families.filter(({ states, steps }) => states.length !== steps.length + 1).map(({ key }) => key), []);
  });

  it('lose one charge and one hydrogen per step, whole waters apart', () => {
    for (const { key, states } of families) {
      states.slice(1).forEach((base, index) => {
        const acid = states[index]!;
        assert.equal(acid.charge - base.charge, 1, key);
        const lost = new Map(atomsOf(acid.formula));
        lost.set('H', (lost.get('H') ?? 0) - 1);
        assert.ok(watersBetween(lost, atomsOf(base.formula)) !== undefined, `${key}: ${acid.id} and ${base.id}`);
      });
    }
  });

  it('show their charge and formula in the id', () => {
    for (const { id, formula, charge } of families.flatMap(({ states }) => states)) {
      assert.equal(chargeShown(id), charge, id);
      assert.equal(/^[^+\-_]+/.exec(id)![0], formula, id);
    }
  });

  it('never label two states of one charge alike, and label none that its formula names', () => {
    for (const { key, states } of families) {
      assert.deepEqual(repeated(states.map(({ label, formula, charge }) => `${label ?? formula} ${charge}`)), [], key);
      assert.deepEqual(states.filter(({ label, formula }) => label === formula), [], key);
    }
  });

  it('name every state differently', () => {
    assert.deepEqual(repeated(families.flatMap(({ states }) => states.map(({ name }) => name))), []);
  });

  it('weaken from step to step', () => {
    for (const { key, steps } of families) {
      steps.slice(1).forEach((step, index) => assert.ok(step.pKa > steps[index]!.pKa, `${key}, step ${index + 2}`));
    }
  });
});
