import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict, SoluteError, type Problem, type ProblemCode } from '../../src/engine.js';
import type { SoluteInput } from '../../src/substances/solutes-text.js';
import { readSolutes } from '../../src/substances/solutes-text.js';

type Input = string | readonly SoluteInput[];

function problemsOf(make: () => unknown): readonly Problem[] {
  try {
    make();
  } catch (error) {
    assert.ok(error instanceof SoluteError, String(error));
    return error.problems;
  }
  throw new assert.AssertionError({ message: 'no problem was found' });
}

const formulasOf = (input: Input): string[] => readSolutes(input).map(({ substance, amount }) => `${amount.value.toString()} ${amount.kind} ${substance.formula}`);

describe('text of solutes', () => {
  it('has the amount before or after the substance', () => {
    const expected = ['0.1 amount-concentration NH4Cl'];
    for (const text of ['0.10 mol/L NH4Cl', 'NH4Cl 0.10 mol/L', 'NH4Cl, 0.10 mol/L', 'NH4Cl: 0.10 mol/L', 'NH4Cl = 0.10 mol/L', '0.10 M NH4Cl', '0.10M NH4Cl', '100 mM NH4Cl', '100mM of NH4Cl', '  0.10\u00a0mol/L\tNH4Cl  ', '1.0×10⁻¹ mol/L ammonium chloride', 'ammonium chloride 0.10 mol/L', '0.10 mol/L 12125-02-9', '0.10 mol·L⁻¹ NH₄Cl']) {
      assert.deepEqual(formulasOf(text), expected, text);
    }
  });

  it('splits at semicolons and line breaks and leaves empty pieces out', () => {
    const expected = ['0.1 amount-concentration NaCl', '2 mass-concentration KCl', '0.003 molality KI'];
    for (const text of ['0.1 M NaCl; 2 g/L KCl; 3 mmol/kg KI', '0.1 M NaCl\n2 g/L KCl\r\n3 mmol/kg KI', ';0.1 M NaCl;;2 g/L KCl;\n;3 mmol/kg KI;', '0.1 M NaCl\u20282 g/L KCl\u20293 mmol/kg KI']) assert.deepEqual(formulasOf(text), expected, JSON.stringify(text));
  });

  it('means the same as JSON and as an array', () => {
    const list = [{ substance: 'NaCl', amount: '0.1 M' }, { substance: 'sodium carbonate decahydrate', amount: '2.5 g/L' }];
    const expected = formulasOf('0.1 M NaCl; 2.5 g/L sodium carbonate decahydrate');
    assert.deepEqual(formulasOf(list), expected);
    assert.deepEqual(formulasOf(JSON.stringify(list)), expected);
    assert.deepEqual(formulasOf(`\n ${JSON.stringify(list, null, 2)} \n`), expected);
    assert.deepEqual(formulasOf('[Co(NH3)6]Cl3 1 mM'), ['0.001 amount-concentration [Co(NH3)6]Cl3']);
  });

  it('gives ranges that cut out exactly the piece', () => {
    const pieces = ['0.1 M NaCl', 'KCl 2 g/L', '3 mmol/kg  sodium acetate'];
    for (const [before, between] of [['', ';'], ['  \n', ' ;\n\t '], [' ; ', ';;']] as const) {
      const text = before + pieces.join(between) + before;
      for (const [index, { typed, range }] of readSolutes(text).entries()) {
        assert.equal(typed, pieces[index]);
        assert.equal(text.slice(range!.start, range!.end), pieces[index]);
      }
    }
  });

  it('gives ranges of problems that cut out what is at fault', () => {
    for (const [text, code, slice] of [
      ['0.1 M NaCl; 0.2 M unobtainium', 'substance-unknown', 'unobtainium'],
      ['🧪; 0.1 M NaCl', 'missing-amount', '🧪'],
      ['0.1 M NaCl;  5 % KCl', 'unit-ambiguous', '5 %'],
      ['0.1 M NaXqO3', 'element-unknown', 'Xq'],
      ['  1,000 mM NaCl', 'number-unreadable', '1,000 mM'],
      ['KCl 0 M', 'amount-out-of-range', '0 M'],
    ] as const) {
      const problem = problemsOf(() => readSolutes(text)).find((found) => found.code === code);
      assert.ok(problem, `${text}: ${problemsOf(() => readSolutes(text)).map((found) => found.code).join()}`);
      assert.equal(text.slice(problem.range!.start, problem.range!.end), slice, text);
    }
  });

  it('reports every piece that is wrong, in order, with its index', () => {
    const problems = problemsOf(() => readSolutes('0.1 M foo; 0.1 M NaCl; bar; 3 N HCl'));
    assert.deepEqual(problems.map(({ code, solute }) => [code, solute]), [['substance-unknown', 0], ['missing-amount', 2], ['unit-ambiguous', 3]]);
  });

  it('reads the decimal comma and says so', () => {
    assert.equal(predict('0,10 mol/L NaCl').understood[0]!.assumptions.some(({ code }) => code === 'decimal-comma'), true);
  });
});

describe('problem codes', () => {
  /** An input that reaches the code, and the piece that its sentence must show. */
  const CASES: Readonly<Record<Exclude<ProblemCode, 'not-converged'>, readonly [make: () => unknown, piece: string]>> = {
    'empty-input': [() => predict(' ;\n; '), ''],
    'input-too-long': [() => predict('x'.repeat(100_001)), '100001'],
    'too-many-solutes': [() => predict('1 mM NaCl;'.repeat(61)), '61'],
    'missing-amount': [() => predict('NaCl'), 'NaCl'],
    'missing-substance': [() => predict('0.1 mol/L'), '0.1 mol/L'],
    'number-unreadable': [() => predict('1,000 mM NaCl'), '1,000'],
    'amount-out-of-range': [() => predict('1e6 mol/L NaCl'), '1e6 mol/L'],
    'unit-unknown': [() => predict('5 furlong NaCl'), 'furlong'],
    'unit-ambiguous': [() => predict('0.1 N HCl'), 'N'],
    'formula-unreadable': [() => predict('0.1 M Na2(SO4'), 'Na2(SO4'],
    'element-unknown': [() => predict('0.1 M NaXqO3'), 'Xq'],
    'substance-unknown': [() => predict('0.1 M unobtainium'), 'unobtainium'],
    'substance-ambiguous': [() => predict('0.1 M C4H4O4'), 'C4H4O4'],
    'charge-unbalanced': [() => predict('0.1 M SO42-'), 'SO42-'],
    'cas-check-digit': [() => predict('0.1 M 7647-14-6'), '7647-14-6'],
    'cas-unknown': [() => predict('0.1 M 9999-99-9'), '9999-99-9'],
    'ion-without-constant': [() => predict('0.1 M (NH4)2GeF6'), '(NH4)2GeF6'],
    'not-aqueous': [() => predict('1 M H2O'), 'H2O'],
    'json-unreadable': [() => predict('[{"substance": "NaCl"'), 'JSON'],
    'temperature-unreadable': [() => predict('1 mM NaCl', { temperature: 'warm' }), 'warm'],
    'temperature-out-of-range': [() => predict('1 mM NaCl', { temperature: '150 °C' }), '150 °C'],
    'condition-unknown': [() => predict('1 mM NaCl', { air: 'argon' as 'excluded' }), 'argon'],
  };

  for (const [code, [make, piece]] of Object.entries(CASES)) {
    it(code, () => {
      const problem = problemsOf(make).find((found) => found.code === code);
      assert.ok(problem, problemsOf(make).map((found) => found.code).join());
      assert.ok(problem.text.includes(piece), problem.text);
      assert.match(problem.text, /[.?!]$/);
      assert.ok(Array.from(problem.piece).length <= 80);
    });
  }
});

describe('hostile text', () => {
  it('stays text: markup comes back as typed, quoted, never changed into anything else', () => {
    const [problem] = problemsOf(() => predict('0.1 M <img src=x onerror=alert(1)>'));
    assert.ok(problem!.text.includes('<img src=x onerror=alert(1)>'));
    assert.equal(problem!.piece, '<img src=x onerror=alert(1)>');
  });

  it('shows what cannot be seen', () => {
    for (const [typed, shown] of [['0.1 M Na\u202eCl', '[U+202E]'], ['0.1 M Na\u0000Cl', '[U+0000]'], ['0.1 M Na\u0007Cl', '[U+0007]'], ['\u202eNaCl', '[U+202E]']] as const) {
      const [problem] = problemsOf(() => predict(typed));
      assert.ok(problem!.text.includes(shown), problem!.text);
      assert.doesNotMatch(problem!.text, /[\p{Cc}\p{Cf}]/u);
    }
  });

  it('of 100 kB is answered', () => {
    for (const text of ['('.repeat(100_000), ';'.repeat(100_000), '[{'.repeat(50_000), 'a'.repeat(100_000), '1'.repeat(100_000), '1 '.repeat(50_000), `${'1 mM NaCl;'.repeat(10_000)}`, '·'.repeat(99_999), '{"a":'.repeat(20_000)]) {
      const problems = problemsOf(() => predict(text));
      assert.ok(problems.length >= 1 && problems.every((problem) => problem.text.length < 2000), text.slice(0, 10));
    }
  });

  it('with keys of every object leaves objects alone', () => {
    for (const text of ['[{"__proto__":{"polluted":1},"substance":"NaCl","amount":"1 mM"}]', '[{"constructor":{"prototype":{"polluted":1}},"substance":"NaCl","amount":"1 mM"}]']) {
      assert.equal(readSolutes(text).length, 1);
      assert.equal(({} as Record<string, unknown>)['polluted'], undefined);
    }
    for (const name of ['__proto__', 'constructor', 'toString', 'hasOwnProperty', 'valueOf']) problemsOf(() => predict(`1 mM ${name}`));
  });
});
