import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { compositionKey, compositionOf, molarMass, parseFormula } from '../../src/substances/formula.js';
import { identifySubstance, type IdentifiedSubstance } from '../../src/substances/identify.js';
import { particleOf, type Particle } from '../../src/substances/ion-library.js';
import { formulaOfParts } from '../../src/substances/salt-names.js';
import { partsOf } from '../../src/substances/substance-library.js';
import { ions, substances, type Ion } from '../data/read.js';

function identified(text: string): IdentifiedSubstance {
  const result = identifySubstance(text);
  assert.ok(!('code' in result), `${text}: ${'code' in result ? `${result.code}, ${result.text}` : ''}`);
  return result;
}

/** Ions or molecules with their numbers, in one order. */
function partsText(parts: IdentifiedSubstance['parts']): string {
  return parts.map(({ particle, count }) => `${count} ${particle.id}`).sort().join(' + ');
}

describe('every listed substance', () => {
  it('is found by its CAS Registry Number', () => {
    for (const [, formula, cas] of substances) if (cas !== null) assert.deepEqual([identified(cas).formula, identified(cas).cas], [formula, cas]);
  });

  it('is found by each of its names, in capitals and with other spacing too', () => {
    const wrong: string[] = [];
    for (const [names, formula] of substances) {
      for (const name of names) {
        for (const typed of [name, name.toUpperCase(), name.replaceAll(' ', '  '), name.replaceAll('-', '‑')]) {
          // What reads as a formula exactly as typed is one ("HYPO").
          if (typed !== name && !('failure' in parseFormula(typed))) continue;
          const result = identifySubstance(typed);
          if ('code' in result || result.formula !== formula) wrong.push(`${typed}: ${'code' in result ? result.code : result.formula} instead of ${formula}`);
        }
      }
    }
    assert.deepEqual(wrong, []);
  });

  it('is found by its formula, or the formula raises a question that names it', (t) => {
    const wrong: string[] = [];
    let questions = 0;
    for (const [names, formula, , parts] of substances) {
      const result = identifySubstance(formula);
      if ('code' in result) {
        questions++;
        if (result.code !== 'substance-ambiguous') wrong.push(`${formula}: ${result.code}`);
        else if (!result.suggestions.some(({ value }) => { const answer = identifySubstance(value); return !('code' in answer) && partsText(answer.parts) === partsText(partsOf(parts)); })) wrong.push(`${formula}: ${names[0]} not offered`);
      } else if (result.formula !== formula) wrong.push(`${formula}: read as ${result.formula}`);
    }
    t.diagnostic(`${substances.length - questions} formulas found, ${questions} raise a question`);
    assert.deepEqual(wrong, []);
  });

  it('has the atoms of its ions and its water of crystallisation', () => {
    for (const [names, formula, cas] of substances) {
      const { composition, molarMass: mass } = identified(cas ?? names[0]!);
      assert.equal(compositionKey(composition), compositionKey(compositionOf(formula)), formula);
      assert.equal(mass, molarMass(composition));
    }
  });

  it('is found by its formula with subscripts and other dots', () => {
    for (const [, formula] of substances) {
      const plain = identifySubstance(formula);
      const lowered = formula.replace(/(?<=[A-Za-z)\]])\d+/g, (digits) => digits.replace(/\d/g, (digit) => '₀₁₂₃₄₅₆₇₈₉'[Number(digit)]!));
      for (const typed of [lowered, formula.replaceAll('·', '*'), formula.replaceAll('·', ' • '), formula.replace(/·(?!\d*\.)/g, '.')]) {
        const result = identifySubstance(typed);
        assert.equal('code' in result ? result.code : result.formula, 'code' in plain ? plain.code : plain.formula, typed);
      }
    }
  });
});

describe('salts of known ions', () => {
  const common = (charge: 1 | -1, count: number): Particle[] =>
    ions.filter((ion) => Math.sign(ion.charge) === charge && ion.id !== 'H+' && ion.id !== 'OH-').slice(0, count).map(({ id }) => particleOf(id)!);
  const cations = common(1, 40);
  const anions = common(-1, 60);

  const divisor = (a: number, b: number): number => (b === 0 ? a : divisor(b, a % b));
  function salt(cation: Particle, anion: Particle): IdentifiedSubstance['parts'] {
    const common = divisor(cation.charge, -anion.charge);
    return [{ particle: cation, count: -anion.charge / common }, { particle: anion, count: cation.charge / common }];
  }

  /** Anions whose formula is read only beside certain cations, since it reads as oxide or sulfide elsewhere. */
  const onlyWith = new Map((ions as (Ion & { onlyWith?: string[] })[]).map((ion) => [ion.id, ion.onlyWith]));

  it('are found by the formula written from their ions, or raise a question', (t) => {
    const counts = { same: 0, otherReading: 0, question: 0, refused: 0 };
    const wrong: string[] = [];
    const others: string[] = [];
    for (const cation of cations) {
      for (const anion of anions) {
        const parts = salt(cation, anion);
        const formula = formulaOfParts(parts);
        const result = identifySubstance(formula);
        const restricted = onlyWith.get(anion.id);
        if ('code' in result) {
          if (restricted !== undefined && !restricted.includes(cation.id)) counts.refused++;
          else if (result.code === 'substance-ambiguous') counts.question++;
          else wrong.push(`${formula} (${partsText(parts)}): ${result.code}`);
        } else if (partsText(result.parts) === partsText(parts)) counts.same++;
        else {
          // A listed substance may stand for the same salt with ions written in another way.
          const reading = `${formula} (${partsText(parts)}): ${partsText(result.parts)}`;
          if (compositionKey(result.composition) !== compositionKey(compositionOf(formula))) wrong.push(reading);
          counts.otherReading++;
          others.push(reading);
        }
      }
    }
    t.diagnostic(`${cations.length} cations × ${anions.length} anions: ${counts.same} the same pair, ${counts.question} a question, ${counts.refused} refused as peroxides and polysulfides known with few cations, ${counts.otherReading} another reading of the same atoms`);
    for (const other of others.slice(0, 60)) t.diagnostic(other);
    assert.deepEqual(wrong, []);
  });

  it('are found by the name of cation and anion, isomers included', (t) => {
    const wrong: string[] = [];
    const listedNames = new Set(substances.flatMap(([names]) => names));
    const everyIon = (charge: 1 | -1): Particle[] => common(charge, Infinity);
    const chosen = (ids: readonly string[]): Particle[] => ids.map((id) => particleOf(id)!);
    const pairs = [
      ...cations.flatMap((cation) => anions.map((anion) => [cation, anion] as const)),
      ...chosen(['Na+', 'K+', 'Ca+2', 'NH4+']).flatMap((cation) => everyIon(-1).map((anion) => [cation, anion] as const)),
      ...chosen(['Cl-', 'Br-', 'NO3-', 'SO4-2']).flatMap((anion) => everyIon(1).map((cation) => [cation, anion] as const)),
    ];
    for (const [cation, anion] of pairs) {
      const parts = salt(cation, anion);
      const name = `${cation.names[0]} ${anion.names[0]}`;
      // A name of the list stands for what is listed, such as the mineral of that name.
      if (listedNames.has(name)) continue;
      const result = identifySubstance(name);
      if ('code' in result) wrong.push(`${name}: ${result.code}`);
      else if (partsText(result.parts) !== partsText(parts)) wrong.push(`${name}: ${partsText(result.parts)} instead of ${partsText(parts)}`);
    }
    t.diagnostic(`${pairs.length} names`);
    assert.deepEqual(wrong, []);
  });

  it('take any hydrate, in the formula and in the name', () => {
    for (const [typed, formula] of [
      ['LiClO4·3H2O', 'LiClO4·3H2O'],
      ['rubidium sulfate dihydrate', 'Rb2SO4·2H2O'],
      ['Rb2SO4.7H2O', 'Rb2SO4·7H2O'],
      ['magnesium nitrate nonahydrate', 'Mg(NO3)2·9H2O'],
      ['calcium sulfate hemihydrate', 'CaSO4·0.5H2O'],
    ] as const) assert.equal(identified(typed).formula, formula, typed);
  });
});

describe('names', () => {
  it('are read in the spellings in use', () => {
    // Usual variants of systematic names: common practice, no source.
    for (const [typed, formula] of [
      ['Sodium Hydrogencarbonate', 'NaHCO3'], ['sodium hydrogen carbonate', 'NaHCO3'], ['sodium bicarbonate', 'NaHCO3'], ['sodium sulphate', 'Na2SO4'], ['aluminum chloride', 'AlCl3'],
      ['iron (III) chloride', 'FeCl3'], ['iron(iii) chloride', 'FeCl3'], ['cesium chloride', 'CsCl'], ['disodium hydrogen phosphate', 'Na2HPO4'], ['  potassium   iodide ', 'KI'],
    ] as const) assert.equal(identified(typed).formula, formula, typed);
  });

  it('without a word about water say that they are taken as anhydrous where hydrates exist', () => {
    assert.ok(identified('sodium carbonate').assumed.includes('hydrate-anhydrous'));
    assert.ok(!identified('sodium carbonate decahydrate').assumed.includes('hydrate-anhydrous'));
    assert.ok(!identified('potassium chloride').assumed.includes('hydrate-anhydrous'));
  });

  it('with a multiplier that contradicts the charges are not read', () => {
    assert.ok('code' in identifySubstance('trisodium sulfate'));
    assert.ok('code' in identifySubstance('dipotassium chloride'));
  });
});

describe('suggestions', () => {
  it('name the nearest known thing', () => {
    for (const [typed, code, nearest] of [
      ['sodium chlorde', 'substance-unknown', 'sodium chloride'],
      ['amonium chloride', 'substance-unknown', 'ammonium chloride'],
      ['nacl', 'substance-unknown', 'NaCl'],
      ['potasium dihydrogen phosphate', 'substance-unknown', 'potassium dihydrogen phosphate'],
      ['7647-14-6', 'cas-check-digit', '7647-14-5'],
    ] as const) {
      const result = identifySubstance(typed);
      assert.ok('code' in result, typed);
      assert.equal(result.code, code, typed);
      assert.ok(result.suggestions.some(({ value }) => value === nearest), `${typed}: ${JSON.stringify(result.suggestions)}`);
      assert.ok(result.suggestions.every(({ value, reason }) => !('code' in identifySubstance(value)) && reason.length > 0), typed);
    }
  });

  it('can each be put in place of what was typed', () => {
    for (const typed of ['sodum acetate', 'calcium cloride', 'NaSO4', 'NaHCO33', 'Fe3+', 'SO4-2', 'NH4Clo', 'sodium bicarbonat', '12125-02-8']) {
      const result = identifySubstance(typed);
      assert.ok('code' in result, typed);
      for (const { value } of result.suggestions) {
        const answer = identifySubstance(value);
        assert.ok(!('code' in answer) || answer.code === 'substance-ambiguous', `${typed}: ${value}`);
      }
    }
  });

  it('come for the longest text that is read', () => {
    for (const text of ['a'.repeat(400), 'C'.repeat(400), 'C99H99O99N99', '('.repeat(400), 'Na'.repeat(200)]) assert.ok('code' in identifySubstance(text), text);
  });
});

describe('what is typed like a formula', () => {
  it('is refused with the reason', () => {
    for (const [typed, code] of [['Fe3+', 'charge-unbalanced'], ['SO42-', 'charge-unbalanced'], ['H2O', 'not-aqueous'], ['NaXe3Q', 'element-unknown'], ['NaCl(2', 'formula-unreadable'], ['C8H18', 'substance-unknown'], ['9999-99-9', 'cas-unknown']] as const) {
      const result = identifySubstance(typed);
      assert.equal('code' in result ? result.code : 'found', code, typed);
    }
    assert.ok('failure' in parseFormula('NaCl(2'));
  });
});
