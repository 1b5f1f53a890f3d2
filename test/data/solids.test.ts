import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { atomsOf, watersBetween } from './composition.js';
import { elements, repeated, substances } from './read.js';
import { familyByKey, metalByKey, solids, solubilities, sumOf } from './tables.js';

/** pKw of water at 25 °C, with which the published products of hydroxides were turned into acid forms. */
const PKW = 13.995;

describe('the solids', () => {
  it('have unique ids and names, and ids that begin with the formula', () => {
    assert.deepEqual(repeated(solids.map(({ id }) => id)), []);
    assert.deepEqual(repeated(solids.map(({ name }) => name)), []);
    assert.deepEqual(solids.filter(({ id, formula }) => id.replace(/\([a-z]+\)$/, '') !== formula).map(({ id }) => id), []);
  });

  it('dissolve into components without a net charge that hold their atoms and the stated water', () => {
    for (const { id, formula, gives, water } of solids) {
      const sum = sumOf(gives);
      assert.equal(sum.charge, 0, id);
      assert.equal(watersBetween(atomsOf(formula), sum.atoms), water, id);
    }
  });

  it('are the less soluble the longer they take, hydroxides and oxides of one metal compared', () => {
    const ORDER = ['readily', 'slowly', 'only-aged'];
    for (const first of solids.filter(({ gives }) => !gives.families && !gives.ions)) {
      const [metal, count] = Object.entries(first.gives.metals!)[0]!;
      for (const second of solids.filter(({ gives }) => !gives.families && !gives.ions && gives.metals![metal])) {
        if (ORDER.indexOf(first.forms) >= ORDER.indexOf(second.forms)) continue;
        assert.ok(first.logK / count > second.logK / second.gives.metals![metal]!, `${first.id} and ${second.id}`);
      }
    }
  });

  it('have constants that follow from the published reaction', () => {
    const pKa = (key: string): number[] => familyByKey.get(key)!.steps.map((step) => step.pKa);
    const acidForm = pKa('hydrogen_sulfide').reduce((sum, value) => sum + value, 0);
    /** What the reaction leaves as it is, beside hydroxide. */
    const further = new Map([
      ['CaHPO4·2H2O(brushite)', -pKa('phosphoric')[2]!],
      ['MgNH4PO4·6H2O(struvite)', -pKa('ammonium')[0]!],
      ['BiO(OH)(s)', -metalByKey.get('Bi')!.hydrolysis.find(({ id }) => id === 'Bi(OH)2+')!.logK],
    ]);
    for (const { id, reaction, publishedLogK, gives, logK } of solids) {
      if (publishedLogK === undefined) continue;
      const halved = reaction!.startsWith('0.5 ') ? 2 : 1;
      const hydroxide = /(?:(\d) )?\bOH-/.exec(reaction!);
      const hydroxides = hydroxide ? Number(hydroxide[1] ?? 1) : 0;
      const sulfide = gives.families?.['hydrogen_sulfide'] ? acidForm : 0;
      const expected = halved * publishedLogK + hydroxides * PKW - sulfide + (further.get(id) ?? 0);
      assert.ok(Math.abs(expected - logK) < 1e-6, `${id}: ${logK}, expected ${expected}`);
    }
  });

  it('include the usual ones', () => {
    const known = new Set(solids.map(({ id }) => id));
    for (const id of ['CaCO3(calcite)', 'CaSO4·2H2O(gypsum)', 'Ca(OH)2(portlandite)', 'Mg(OH)2(brucite)', 'Fe(OH)3(am)', 'BaSO4(barite)', 'AgCl(s)']) {
      assert.ok(known.has(id), id);
    }
  });
});

describe('the solubilities', () => {
  it('belong to substances', () => {
    const known = new Set(substances.flatMap(([, formula]) => [formula, formula.replace(/·.*/, '')]));
    assert.deepEqual(solubilities.filter(({ formula }) => !known.has(formula)).map(({ formula }) => formula), []);
  });

  it('stand once for each substance and below the mass of pure solute', () => {
    assert.deepEqual(repeated(solubilities.map(({ formula }) => formula)), []);
    for (const { formula, gramsPer100gWater } of solubilities) {
      const mass = [...atomsOf(formula)].reduce((sum, [element, count]) => sum + elements[element]![0] * count, 0);
      assert.ok((gramsPer100gWater * 10) / mass < 40, formula);
    }
  });
});
