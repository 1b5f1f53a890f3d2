import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { atomsOf, watersBetween } from './composition.js';
import { chargeShown, families, ions, metals, repeated } from './read.js';
import { choices, complexes, familyByKey, ionById, pairOf, solids, sumOf, type Complex } from './tables.js';

const byId = new Map(complexes.map((complex) => [complex.id, complex]));
/** Rounding of published constants and of the sums made from them. */
const ROUNDING = 0.0011;
/** Debye–Hückel slope of water at 25 °C, (kg/mol)^½; Guillaumont et al. 2003, NEA Chemical Thermodynamics vol. 5, give 0.509. */
const SLOPE = 0.5098;

/** Σ pKa of the last steps of a family, taken to an ionic strength with the Debye–Hückel term. */
function acidSteps(key: string, count: number, ionicStrength = 0): number {
  const { states, steps } = familyByKey.get(key)!;
  const term = (SLOPE * Math.sqrt(ionicStrength)) / (1 + 1.5 * Math.sqrt(ionicStrength));
  return steps.slice(steps.length - count).reduce((sum, { pKa }, index) => {
    const acid = states[steps.length - count + index]!.charge;
    return sum + pKa - ((acid - 1) ** 2 + 1 - acid ** 2) * term;
  }, 0);
}

/** The complex of the same metal and ligand without protons. */
function unprotonated({ gives }: Complex): Complex {
  const { protons: _, ...rest } = gives;
  const found = complexes.find((other) => other.gives.protons === undefined && JSON.stringify(other.gives) === JSON.stringify(rest));
  assert.ok(found, JSON.stringify(gives));
  return found;
}

describe('the complexes', () => {
  it('have ids that no other species and no solid has', () => {
    const others = [
      ...families.flatMap(({ states }) => states.map(({ id }) => id)),
      ...metals.flatMap(({ ion, hydrolysis }) => [ion, ...hydrolysis.map(({ id }) => id)]),
      ...ions.filter(({ spectator }) => spectator !== undefined && spectator !== 'strong-base-cation').map(({ id }) => id),
      ...solids.map(({ id }) => id),
    ];
    assert.deepEqual(repeated([...complexes.map(({ id }) => id), ...new Set(others)]), []);
  });

  it('give what the ion of the same id gives', () => {
    for (const { id, gives } of complexes) {
      const ion = ionById.get(id);
      if (ion) assert.deepEqual(ion.gives, gives, id);
    }
  });

  it('show charge and formula in the id, and are named differently', () => {
    for (const { id, formula, charge, label } of complexes) {
      assert.equal(chargeShown(id), charge, id);
      assert.equal(/^[^+\-_]+/.exec(id)![0], formula, id);
      assert.notEqual(label, formula, id);
    }
    assert.deepEqual(repeated(complexes.map(({ name }) => name)), []);
    assert.deepEqual(repeated(complexes.map(({ formula, label, charge }) => `${label ?? formula} ${charge}`)), []);
  });

  it('have the charge and the atoms of their components, whole waters apart', () => {
    for (const { id, formula, charge, gives } of complexes) {
      const sum = sumOf(gives);
      assert.equal(sum.charge, charge, id);
      assert.ok(watersBetween(sum.atoms, atomsOf(formula)) !== undefined, id);
    }
  });

  it('stand once for each composition', () => {
    assert.deepEqual(repeated(complexes.map(({ gives }) => JSON.stringify(gives))), []);
  });

  it('hold no pair of an alkali metal or of ammonium', () => {
    for (const { id, gives } of complexes) {
      assert.deepEqual(Object.keys(gives.metals ?? {}).filter((key) => ['Li', 'Na', 'K'].includes(key)), [], id);
      assert.deepEqual(Object.keys(gives.ions ?? {}).filter((key) => ionById.get(key)!.charge > 0), [], id);
      assert.ok(gives.metals || !gives.families?.['ammonium'], id);
    }
  });

  it('repeat no acid–base state and no hydrolysis species', () => {
    for (const { id, gives } of complexes) {
      const ligands = { ...gives.families, ...gives.ions };
      assert.notDeepEqual(ligands, {}, id);
      const [[key, count]] = Object.entries(ligands) as [[string, number]];
      if (gives.metals || Object.keys(ligands).length > 1 || count > 1) continue;
      assert.ok((gives.protons ?? 0) > familyByKey.get(key)!.steps.length, id);
    }
  });

  it('leave out what an interaction coefficient contains already, and ligands of inert chromium(III)', () => {
    const pairs = new Set(complexes.map(({ gives }) => pairOf(gives)));
    for (const pair of ['Cu(II) Cl-', 'Ca NO3-', 'Sr NO3-', 'Ba NO3-', 'Ag NO3-', 'Cd NO3-', 'Pb NO3-']) {
      assert.ok(!pairs.has(pair) && pair in choices, pair);
    }
    assert.deepEqual([...pairs].filter((pair) => pair.startsWith('Cr(III)')), []);
  });

  it('have one ionic strength for each pair', () => {
    const strengths = new Map<string, Set<number>>();
    for (const { gives, ionicStrength } of complexes) {
      const pair = pairOf(gives);
      strengths.set(pair, (strengths.get(pair) ?? new Set()).add(ionicStrength));
    }
    assert.deepEqual([...strengths].filter(([, values]) => values.size > 1).map(([pair]) => pair), []);
  });

  it('have constants that follow from the published reaction', () => {
    const checked = new Set<string>();
    const near = (complex: Complex, expected: number): void => {
      assert.ok(Math.abs(complex.logBeta - expected) < ROUNDING, `${complex.id}: ${complex.logBeta}, expected ${expected}`);
      checked.add(complex.id);
    };
    /** Campi et al. 1964 measured pKa 4.35 and 5.69 of citric acid in their medium and took these. */
    const measuredCitrate = [0, 5.69, 5.69 + 4.35];
    for (const complex of complexes) {
      const { gives, reaction, publishedLogK: published, ionicStrength } = complex;
      if (published === undefined) continue;
      const protons = gives.protons ?? 0;
      const [family, count] = Object.entries(gives.families ?? {})[0]!;
      if (reaction === 'M + HL = MHL' || reaction === 'M + H2L = MH2L') {
        const own = family === 'citric' && ionicStrength > 0 ? measuredCitrate[protons]! : acidSteps(family, protons, ionicStrength);
        near(complex, published + own);
      } else if (reaction === 'ML + H = MHL') near(complex, unprotonated(complex).logBeta + published);
      else if (reaction === 'M(OH)L + H = ML + H2O' || reaction === 'MH-1L + H = ML') near(complex, unprotonated(complex).logBeta - published);
      else if (reaction === 'HL + L = HL2') near(complex, published + acidSteps(family, 1));
      else if (family === 'boric' || family === 'silicic') near(complex, published + count * acidSteps(family, familyByKey.get(family)!.steps.length, ionicStrength));
    }
    assert.deepEqual(complexes.filter(({ id, publishedLogK }) => publishedLogK !== undefined && !checked.has(id)).map(({ id }) => id), []);
  });

  it('hold the ions that dissolve into them', () => {
    for (const id of ['SiF6-2', 'AlF6-3', 'HgCl4-2', 'Fe(C2O4)3-3', 'HF2-', 'Cr2O7-2', 'Mo7O24-6', 'B4O5(OH)4-2']) assert.ok(byId.has(id), id);
  });
});
