import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { numberLength, readAmount, type Amount, type AmountFailure } from '../../src/quantities/amount.js';
import { Decimal } from '../../src/quantities/decimal.js';

function amount(number: string, unit = 'mol/L'): Amount {
  const read = readAmount(number, unit);
  assert.ok(!('failure' in read), `${number} ${unit}: ${JSON.stringify(read)}`);
  return read;
}

function failure(number: string, unit: string): AmountFailure {
  const read = readAmount(number, unit);
  assert.ok('failure' in read, `${number} ${unit}`);
  return read;
}

describe('numbers', () => {
  it('stay exactly as typed', () => {
    for (const [typed, value, halfDigit] of [
      ['0.1', '0.1', '0.05'],
      ['0.10', '0.1', '0.005'],
      ['.5', '0.5', '0.05'],
      ['5.', '5', '0.5'],
      ['5', '5', '0.5'],
      ['+2.50', '2.5', '0.005'],
      ['100', '100', '0.5'],
      ['1e-3', '0.001', '0.0005'],
      ['1.0e-3', '0.001', '0.00005'],
      ['1E3', '1000', '500'],
      ['1×10⁻³', '0.001', '0.0005'],
      ['1.5 × 10⁻³', '0.0015', '0.00005'],
      ['1×10^-3', '0.001', '0.0005'],
      ['1x10-3', '0.001', '0.0005'],
      ['1·10−3', '0.001', '0.0005'],
      ['2.5*10^-3', '0.0025', '0.00005'],
      ['1,5', '1.5', '0.05'],
      ['0,10', '0.1', '0.005'],
      ['0,125', '0.125', '0.0005'],
      ['0.1234567890123456789', '0.1234567890123456789', '5e-20'],
      ['0.30000000000000004', '0.30000000000000004', '5e-18'],
    ] as const) {
      const read = amount(typed);
      assert.equal(read.value.toString(), new Decimal(value).toString(), typed);
      assert.ok(Math.abs(read.value.times(read.relativeHalfDigit).div(halfDigit).toNumber() - 1) < 1e-12, `half digit of ${typed}`);
      assert.equal(read.decimalComma, typed.includes(','), typed);
      assert.equal(read.number, typed);
    }
  });

  it('take no-break and narrow spaces around the times sign', () => {
    for (const space of [' ', '\u00a0', '\u2009', '\u202f']) assert.equal(amount(`2.0${space}×${space}10⁻³`).value.toString(), '0.002');
  });

  it('with a comma that may group thousands are refused', () => {
    for (const typed of ['1,000', '12,500', '999,999', '+1,234']) assert.deepEqual(failure(typed, 'mol/L'), { failure: 'grouped-number' }, typed);
    for (const typed of ['0,125', '1,5', '1,25', '1,0000']) assert.equal(amount(typed).decimalComma, true, typed);
  });

  it('are refused when they are none', () => {
    for (const typed of ['', '-1', '−1', 'abc', '1.2.3', '1,2,3', '1.000,5', '1e', 'e5', '.', ',', '1/2', '0x10', 'NaN', 'Infinity', '1 000', '٣', '１']) {
      assert.equal(failure(typed, 'mol/L').failure, 'not-a-number', typed);
    }
  });

  it('are measured in length where text follows', () => {
    for (const [text, length] of [['0.10 mol/L', 4], ['1×10⁻³ mol/L', 6], ['5g', 1], ['NaCl', 0], ['', 0], ['-1', 0], ['2,5 g', 3]] as const) assert.equal(numberLength(text), length, text);
  });

  it('come back from any plain decimal as they went in', () => {
    const digits = fc.stringMatching(/^\d{1,12}$/);
    fc.assert(
      fc.property(digits, digits, fc.integer({ min: -12, max: 12 }), (whole, decimals, exponent) => {
        const typed = `${whole}.${decimals}e${exponent}`;
        const read = amount(typed);
        assert.ok(read.value.eq(new Decimal(typed)), typed);
        const halfDigit = new Decimal(10).pow(exponent - decimals.length).div(2);
        if (!read.value.isZero()) assert.ok(Math.abs(read.value.times(read.relativeHalfDigit).div(halfDigit).toNumber() - 1) < 1e-12, typed);
      }),
      { seed: Number(process.env['SEED'] ?? 1) },
    );
  });
});

describe('amounts', () => {
  it('are of the kind that their unit says, in mol/L, g/L, mol/kg, mol or g', () => {
    for (const [number, unit, kind, value] of [
      ['0.10', 'mol/L', 'amount-concentration', '0.1'],
      ['250', 'umol/L', 'amount-concentration', '0.00025'],
      ['7', 'mM', 'amount-concentration', '0.007'],
      ['2.5', 'mg/mL', 'mass-concentration', '2.5'],
      ['0.9', 'g/(100.mL)', 'mass-concentration', '9'],
      ['3', 'mmol/kg', 'molality', '0.003'],
      ['2', 'mmol/g', 'molality', '2'],
      ['5', 'mmol', 'amount', '0.005'],
      ['1.2', 'kg', 'mass', '1200'],
    ] as const) {
      const read = amount(number, unit);
      assert.deepEqual([read.kind, read.value.toString()], [kind, new Decimal(value).toString()], `${number} ${unit}`);
    }
  });

  it('scale exactly: 0.1 mol/L is 100 mmol/L is 100000 µmol/L', () => {
    assert.ok(amount('0.1', 'mol/L').value.eq(amount('100', 'mmol/L').value));
    assert.ok(amount('0.1', 'mol/L').value.eq(amount('100000', 'µmol/L').value));
    assert.ok(amount('0.7', 'mol/L').value.eq(amount('7e8', 'nmol/L').value));
  });

  it('with an ambiguous unit come with the question that settles it', () => {
    for (const unit of ['%', 'N', 'm', 'ppm', 'ppb', 'eq', 'eq/L', 'meq/L']) {
      const { failure: code, question, instead } = failure('5', unit);
      assert.equal(code, 'unit-ambiguous', unit);
      assert.ok(question!.length > 10 && instead!.length > 0, unit);
      assert.ok(instead!.every((other) => !('failure' in readAmount('5', other))), unit);
    }
  });

  it('without a unit of an amount are refused', () => {
    for (const [unit, code] of [['', 'unit-missing'], ['furlong', 'unit-unknown'], ['mL', 'unit-not-an-amount'], ['mol2/L', 'unit-not-an-amount'], ['L/mol', 'unit-not-an-amount'], ['__proto__', 'unit-unknown'], ['toString', 'unit-unknown']] as const) {
      assert.equal(failure('5', unit).failure, code, unit);
    }
  });
});

describe('percentages', () => {
  // Meaning of w/v and w/w: Ph. Eur. 1.4 and IUPAC Green Book 2.10 (mass concentration, mass fraction).
  for (const unit of ['% w/v', '%w/v', '% (w/v)', '% m/V']) {
    it(`${unit} is gram in 100 mL`, () => {
      const amount = readAmount('5.0', unit);
      assert.ok(!('failure' in amount) && amount.kind === 'mass-concentration' && amount.value.eq(50), unit);
    });
  }
  for (const unit of ['% w/w', '%(w/w)', '% m/m', 'wt%', 'wt.-%']) {
    it(`${unit} is gram in 100 g of solution`, () => {
      const amount = readAmount('5.0', unit);
      assert.ok(!('failure' in amount) && amount.kind === 'mass-fraction' && amount.value.eq('0.05'), unit);
    });
  }
  it('a bare % stays a question', () => {
    const amount = readAmount('5', '%');
    assert.ok('failure' in amount && amount.failure === 'unit-ambiguous' && amount.instead?.length === 2);
  });
});
