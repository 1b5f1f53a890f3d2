import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { addTo, atomsOf, watersBetween } from './composition.js';
import { chargeShown, elements, families, ions, metals, repeated, type Gives } from './read.js';

const family = new Map(families.map(({ key, states }) => [key, states.at(-1)!]));
const metal = new Map(metals.map((entry) => [entry.key, entry]));
const ion = new Map(ions.map((entry) => [entry.id, entry]));
/** Their carbon leaves as an alcohol, which takes no part in any equilibrium. */
const ALKOXIDES = new Set(['CH3O-', 'C2H5O-']);

function pieces({ families: units = {}, metals: centres = {}, ions: free = {} }: Gives) {
  return [
    ...Object.entries(units).map(([key, count]) => ({ piece: family.get(key), count, key })),
    ...Object.entries(centres).map(([key, count]) => ({ piece: metal.get(key), count, key })),
    ...Object.entries(free).map(([key, count]) => ({ piece: ion.get(key), count, key })),
  ];
}

describe('the ions', () => {
  it('have unique ids that show charge and formula', () => {
    assert.deepEqual(repeated(ions.map(({ id }) => id)), []);
    for (const { id, charge, formula } of ions) {
      assert.equal(chargeShown(id), charge, id);
      assert.equal(/^[^+\-_]+/.exec(id)![0], formula, id);
    }
  });

  it('consist of elements with an atomic weight', () => {
    for (const { id, formula } of ions) assert.ok([...atomsOf(formula).keys()].every((element) => element in elements), id);
  });

  it('answer to a name that no other ion and no neutral acid or base has', () => {
    const neutral = families.flatMap(({ states }) => states).filter(({ charge }) => charge === 0).map(({ name }) => name);
    assert.deepEqual(repeated([...ions.flatMap(({ names }) => names), ...neutral].map((name) => name.toLowerCase())), []);
  });

  it('are written with the atoms of their formula, abbreviations apart', () => {
    const abbreviations = /^(OAc|AcO|OBz|OTf|OTs|OMs|acac|BPh4|Cit|TrisH|H?[23]?(EDTA|Edta))$/;
    for (const { id, formula, written = [] } of ions) {
      for (const fragment of written.filter((text) => !abbreviations.test(text))) {
        assert.equal(watersBetween(atomsOf(fragment), atomsOf(formula)), 0, `${id}: ${fragment}`);
      }
    }
  });

  it('include every charged state of every family', () => {
    const charged = families.flatMap(({ states }) => states).filter(({ charge }) => charge !== 0);
    assert.deepEqual(charged.filter(({ id, label }) => !ion.has(id) || ion.get(id)!.label !== label).map(({ id }) => id), []);
  });

  it('give known pieces whose charges and protons add up to their own', () => {
    for (const { id, charge, gives } of ions) {
      if (!gives) continue;
      const sum = pieces(gives).reduce((total, { piece, count, key }) => {
        assert.ok(piece, `${id}: ${key}`);
        return total + piece.charge * count;
      }, gives.protons ?? 0);
      assert.equal(sum, charge, id);
    }
  });

  it('give their own atoms, whole waters apart', () => {
    for (const { id, formula, gives } of ions) {
      if (!gives || ALKOXIDES.has(id)) continue;
      const atoms = new Map([['H', gives.protons ?? 0]]);
      for (const { piece, count } of pieces(gives)) addTo(atoms, atomsOf(piece!.formula), count);
      assert.ok(watersBetween(atoms, atomsOf(formula)) !== undefined, id);
    }
  });

  it('give only spectators as free ions', () => {
    const free = ions.flatMap(({ gives }) => Object.keys(gives?.ions ?? {}));
    assert.deepEqual(free.filter((id) => ion.get(id)?.spectator === undefined), []);
  });

  it('are never spectators when a family or a metal ion stands for them', () => {
    const reacting = new Set([...families.flatMap(({ states }) => states.map(({ id }) => id)), ...metals.filter(({ key }) => !['Li', 'Na', 'K'].includes(key)).map((entry) => entry.ion)]);
    assert.deepEqual(ions.filter(({ id, gives }) => reacting.has(id) && !gives).map(({ id }) => id), []);
  });
});
