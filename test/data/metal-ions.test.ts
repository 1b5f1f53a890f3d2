import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { addTo, atomsOf, watersBetween } from './composition.js';
import { chargeShown, ions, metals, repeated } from './read.js';

describe('the metal ions', () => {
  it('have unique keys and unique species', () => {
    assert.deepEqual(repeated(metals.map(({ key }) => key)), []);
    assert.deepEqual(repeated(metals.flatMap(({ ion, hydrolysis }) => [ion, ...hydrolysis.map(({ id }) => id)])), []);
  });

  it('stand in the list of ions', () => {
    const known = new Map(ions.map((ion) => [ion.id, ion.charge]));
    assert.deepEqual(metals.filter(({ ion, charge }) => known.get(ion) !== charge).map(({ key }) => key), []);
  });

  it('hydrolyse to species whose charge and atoms follow from the reaction', () => {
    for (const { key, formula, charge, hydrolysis } of metals) {
      for (const species of hydrolysis) {
        const { metal, hydroxide, id } = species;
        assert.equal(species.charge, metal * charge - hydroxide, id);
        assert.equal(chargeShown(id), species.charge, id);
        const expected = new Map<string, number>();
        addTo(expected, atomsOf(formula), metal);
        addTo(expected, atomsOf('OH'), hydroxide);
        const waters = watersBetween(expected, atomsOf(species.formula));
        assert.ok(waters !== undefined && waters >= 0, `${key}: ${id}`);
      }
    }
  });

  it('take all their constants from one source', () => {
    assert.deepEqual(metals.filter(({ hydrolysis }) => new Set(hydrolysis.map(({ source }) => source)).size > 1).map(({ key }) => key), []);
  });

  it('lose protons less and less readily as mononuclear species', () => {
    for (const { key, hydrolysis } of metals) {
      const logK = hydrolysis.filter(({ metal }) => metal === 1).map((species) => species.logK);
      logK.slice(1).forEach((value, index) => assert.ok(value < logK[index]!, key));
    }
  });
});
