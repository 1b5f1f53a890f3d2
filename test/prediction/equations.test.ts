import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { formatEquation, predict, type Equation } from '../../src/engine.js';
import { addTo, atomsOf } from '../data/composition.js';
import { families, metals } from '../data/read.js';
import { addressOf, FORMULAS, predictable, predictOne } from './support.js';

/** Atoms and charge of products less reactants; what is not zero. */
function imbalance(equation: Equation): string {
  const difference = new Map<string, number>();
  let charge = 0;
  for (const [terms, sign] of [[equation.reactants, -1], [equation.products, 1]] as const) {
    for (const { coefficient, chemical } of terms) {
      charge += sign * coefficient * chemical.charge;
      // Aqua ions are shown with their water; other labels may abbreviate, so the formula counts.
      const formula = chemical.label.includes('(H2O)') ? chemical.label : (FORMULAS.get(chemical.id) ?? chemical.label);
      addTo(difference, atomsOf(formula), sign * coefficient);
    }
  }
  const atoms = [...difference].filter(([, count]) => Math.abs(count) > 1e-9).map(([element, count]) => `${element} ${count}`);
  return [...atoms, ...(charge === 0 ? [] : [`charge ${charge}`])].join(', ');
}

describe('equations', () => {
  it('balance in elements and charge for every listed substance', (t) => {
    const wrong = new Set<string>();
    const written = new Set<string>();
    for (const row of predictable) {
      for (const amount of ['1 mmol/kg', '1 mol/kg']) {
        const { dissociation, hydrolysis } = predictOne(addressOf(row), amount);
        for (const equation of [...dissociation, ...hydrolysis]) {
          written.add(formatEquation(equation));
          const off = imbalance(equation);
          if (off !== '') wrong.add(`${row[1]}: ${formatEquation(equation)} (${off})`);
        }
      }
    }
    t.diagnostic(`${written.size} different equations of ${predictable.length} substances`);
    assert.deepEqual([...wrong], []);
  });

  it('have whole or half coefficients that are positive', () => {
    for (const row of predictable) {
      const { dissociation, hydrolysis } = predictOne(addressOf(row), '0.05 mol/kg');
      for (const { reactants, products } of [...dissociation, ...hydrolysis]) {
        assert.ok(reactants.length > 0 && products.length > 0, row[1]);
        for (const { coefficient } of [...reactants, ...products]) assert.ok(coefficient > 0 && Number.isInteger(2 * coefficient), `${row[1]} ${coefficient}`);
      }
    }
  });

  // Ka of an acid times Kb of its conjugate base is Kw (Brønsted 1923).
  it('give Ka · Kb = Kw for every conjugate pair at 5, 25 and 50 °C', (t) => {
    let pairs = 0;
    for (const temperature of [5, 25, 50]) {
      const donations = new Map<string, number>();
      const acceptances = new Map<string, number>();
      let pKw = 0;
      for (const row of predictable) {
        const { hydrolysis, constants } = predictOne(addressOf(row), '0.01 mol/kg', temperature);
        pKw = constants[0]!.valueHere;
        for (const { kind, reactants, products, pK } of hydrolysis) {
          const [from, to] = [reactants[0]!.chemical.id, products[0]!.chemical.id];
          if (kind === 'proton-donation') donations.set(`${from} ${to}`, pK!);
          if (kind === 'proton-acceptance') acceptances.set(`${to} ${from}`, pK!);
        }
      }
      for (const [pair, pKa] of donations) {
        const pKb = acceptances.get(pair);
        if (pKb === undefined) continue;
        pairs++;
        assert.ok(Math.abs(pKa + pKb - pKw) < 1e-9, `${pair} at ${temperature} °C: ${pKa} + ${pKb}, pKw ${pKw}`);
      }
    }
    t.diagnostic(`${pairs} pairs`);
    assert.ok(pairs >= 60);
  });

  it('carry the constants of the data at 25 °C and zero ionic strength', () => {
    const steps = new Map(families.flatMap((family) => family.steps.map((step, index): [string, typeof step] => [`${family.key} ${index + 1}`, step])));
    const species = new Map(metals.flatMap((metal) => metal.hydrolysis.map((hydrolysis): [string, typeof hydrolysis] => [`${metal.key} ${hydrolysis.id}`, hydrolysis])));
    for (const row of predictable) {
      for (const { id, quantity, value, source } of predictOne(addressOf(row), '0.01 mol/kg').constants) {
        if (quantity === 'pKa') assert.deepEqual([value, source], [steps.get(id)!.pKa, steps.get(id)!.source], id);
        if (quantity === 'log10 *β') assert.deepEqual([value, source], [species.get(id)!.logK, species.get(id)!.source], id);
      }
    }
  });

  it('mark at most one as decisive, and the share reacted lies between 0 and 1', () => {
    for (const row of predictable) {
      const { hydrolysis } = predictOne(addressOf(row), '0.05 mol/kg');
      assert.ok(hydrolysis.filter(({ decides }) => decides === true).length <= 1, row[1]);
      for (const { extent } of hydrolysis) assert.ok(extent === undefined || (extent >= 0 && extent <= 1 + 1e-9), `${row[1]} ${extent}`);
    }
  });

  it('are written as a chemist writes them', () => {
    const { dissociation, hydrolysis } = predict('0.04 mol/kg methylammonium chloride');
    assert.equal(formatEquation(dissociation[0]!), 'CH₃NH₃Cl → CH₃NH₃⁺ + Cl⁻');
    assert.equal(formatEquation(hydrolysis[0]!), 'CH₃NH₃⁺ + H₂O ⇌ CH₃NH₂ + H₃O⁺');
  });
});
