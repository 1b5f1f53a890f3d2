/**
 * The formula reader against mf-parser (molecular formulas, MIT licence), which computes masses from the isotopes and
 * their abundances, so that its atomic masses differ in the last digit from the abridged standard atomic weights.
 */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { MF } from 'mf-parser';
import { compositionKey, compositionOf, molarMass, parseFormula, plainFormula, type Formula } from '../../src/substances/formula.js';
import { elements, substances } from '../data/read.js';

const WITHIN = 0.01;

function parsed(text: string): Formula {
  const formula = parseFormula(text);
  assert.ok(!('failure' in formula), `${text}: ${JSON.stringify(formula)}`);
  return formula;
}

/** The formula in mf-parser's writing: no square brackets (isotopes there) and hydrate water as a group. */
function inReferenceWriting(formula: string): string {
  const [first, ...rest] = formula.replaceAll('[', '(').replaceAll(']', ')').split('·');
  return first! + rest.map((part) => part.replace(/^([\d.]*)(.*)$/, (_, count: string, group: string) => `(${group})${count}`)).join('');
}

interface Info {
  readonly mass: number;
  readonly atoms: Record<string, number>;
}
const referenceInfo = (formula: string): Info => new MF(inReferenceWriting(formula)).getInfo();
const formulas = [...new Set(substances.map(([, formula]) => formula))];

describe('formula reader against mf-parser', () => {
  it('finds the same atoms in every formula of the list', (t) => {
    for (const formula of formulas) {
      assert.deepEqual(new Map([...compositionOf(formula)].sort()), new Map(Object.entries(referenceInfo(formula).atoms).sort()), formula);
    }
    t.diagnostic(`${formulas.length} formulas`);
  });

  it('gives the same molar mass within 0.01 g/mol wherever the atomic masses agree', (t) => {
    const off = new Map<string, number>();
    for (const [symbol, [weight]] of Object.entries(elements)) {
      // No abundances, and so no mass there: technetium and radium.
      const mass = referenceInfo(symbol).mass;
      if (mass > 0) off.set(symbol, mass - weight);
    }
    let compared = 0;
    for (const formula of formulas) {
      const composition = compositionOf(formula);
      const expectedDifference = [...composition].reduce((sum, [symbol, count]) => sum + count * (off.get(symbol) ?? Infinity), 0);
      if (!(Math.abs(expectedDifference) < WITHIN / 2)) continue;
      compared++;
      assert.ok(Math.abs(molarMass(composition) - referenceInfo(formula).mass) <= WITHIN, formula);
    }
    t.diagnostic(`${compared} formulas compared`);
    t.diagnostic(`atomic masses that differ by more than 0.003: ${[...off].filter(([, difference]) => Math.abs(difference) > 0.003).map(([symbol, difference]) => `${symbol} ${difference.toFixed(3)}`).join(', ')}`);
    assert.ok(compared >= 300);
  });

  it('has atomic weights that agree with the isotopic ones within their stated uncertainty', () => {
    for (const [symbol, [weight, uncertainty]] of Object.entries(elements)) {
      const mass = referenceInfo(symbol).mass;
      if (mass > 0 && uncertainty !== null) assert.ok(Math.abs(mass - weight) <= uncertainty + 0.005, `${symbol} ${mass} ${weight}`);
    }
  });
});

describe('formula reader', () => {
  it('reads brackets of every kind, nested', () => {
    for (const [text, key] of [
      ['Ca(OH)2', 'Ca1 H2 O2'],
      ['K4[Fe(CN)6]', 'C6 Fe1 K4 N6'],
      ['[Co(NH3)6]Cl3', 'Cl3 Co1 H18 N6'],
      ['{[(CH3)4N]2}SO4', 'C8 H24 N2 O4 S1'],
      ['((((NaCl))))', 'Cl1 Na1'],
      ['Fe2(SO4)3', 'Fe2 O12 S3'],
      ['CH3COOCH3', 'C3 H6 O2'],
    ] as const) assert.equal(compositionKey(parsed(text).composition), key, text);
  });

  it('reads hydrate dots in every typing', () => {
    for (const dot of ['·', '⋅', '∙', '•', '*', '.', ' · ', ' . ', ' * ', '· ']) {
      const { hydrateWater, canonical, anhydrous } = parsed(`Na2HPO4${dot}12H2O`);
      assert.deepEqual([hydrateWater, canonical, anhydrous], [12, 'Na2HPO4·12H2O', 'Na2HPO4'], dot);
    }
    assert.equal(parsed('CuSO4·H2O').hydrateWater, 1);
    assert.equal(parsed('Na2CO3·NaHCO3·2H2O').hydrateWater, 2);
    assert.equal(parsed('Na2CO3.NaHCO3.2H2O').canonical, 'Na2CO3·NaHCO3·2H2O');
  });

  it('reads half hydrates', () => {
    for (const text of ['CaSO4·0.5H2O', 'CaSO4·½H2O', 'CaSO4·1/2H2O', 'CaSO4.0.5H2O', 'CaSO4·0,5H2O', 'CaSO4 · ½ H2O', 'CaSO4·.5H2O']) {
      const { hydrateWater, canonical, composition } = parsed(text);
      assert.deepEqual([hydrateWater, canonical, composition.get('O'), composition.get('H')], [0.5, 'CaSO4·0.5H2O', 4.5, 1], text);
    }
    assert.equal(parsed('ZnSO4·1.5H2O').hydrateWater, 1.5);
    assert.equal(parsed('ZnSO4.1.5H2O').hydrateWater, 1.5);
  });

  it('reads lowered and raised digits', () => {
    assert.equal(parsed('Na₂HPO₄·12H₂O').canonical, 'Na2HPO4·12H2O');
    assert.equal(parsed('(NH₄)₂SO₄').canonical, '(NH4)2SO4');
    assert.equal(plainFormula('SO₄²⁻'), 'SO4^2-');
  });

  it('reads charges', () => {
    for (const [text, charge, key] of [
      ['Na+', 1, 'Na1'], ['Cl-', -1, 'Cl1'], ['Fe3+', 3, 'Fe1'], ['Fe+3', 3, 'Fe1'], ['Fe^3+', 3, 'Fe1'], ['Fe³⁺', 3, 'Fe1'], ['SO42-', -2, 'O4 S1'], ['SO4^2-', -2, 'O4 S1'],
      ['SO4-2', -2, 'O4 S1'], ['SO₄²⁻', -2, 'O4 S1'], ['SO4--', -2, 'O4 S1'], ['NH4+', 1, 'H4 N1'], ['NO3-', -1, 'N1 O3'], ['NO3−', -1, 'N1 O3'], ['[Fe(CN)6]4-', -4, 'C6 Fe1 N6'],
      ['HCO3⁻', -1, 'C1 H1 O3'], ['N3-', -1, 'N3'], ['I3-', -1, 'I3'], ['Cu++', 2, 'Cu1'], ['NaCl', 0, 'Cl1 Na1'],
    ] as const) {
      const formula = parsed(text);
      assert.deepEqual([formula.charge, compositionKey(formula.composition)], [charge, key], text);
    }
  });

  it('says where a text stops being a formula', () => {
    for (const [text, failure, at] of [
      ['Na2Xq', 'element-unknown', 3], ['NaCl)', 'unreadable', 4], ['Na(Cl', 'unreadable', 5], ['nacl', 'unreadable', 0], ['NaCl2$', 'unreadable', 5],
    ] as const) {
      const result = parseFormula(text);
      assert.ok('failure' in result, text);
      assert.deepEqual([result.failure, result.at], [failure, at], text);
      assert.ok(result.length >= 1);
    }
    for (const text of ['', ' ', '·', 'NaCl·', '·H2O', '2NaCl', 'Na()', 'Na0Cl', 'H99999O', '<b>', '__proto__', 'Na\u0000Cl', '(('.repeat(500), 'Q'.repeat(5000)]) assert.ok('failure' in parseFormula(text), text);
  });

  it('throws for data that are no formula', () => assert.throws(() => compositionOf('Xx'), RangeError));
});
