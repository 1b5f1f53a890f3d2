import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import { Ajv2020 } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { createRecord, predict, verifyRecord, type SoluteRecord } from '../../src/engine.js';
import { read } from '../data/read.js';
import { addressOf, anyMolality, anySubstance, anyTemperature, predictable, predictOne } from './support.js';

/** RFC 8785 for plain JSON: members sorted by UTF-16 code units, numbers and strings as ECMAScript writes them. */
function canonical(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const members = Object.entries(value).filter(([, member]) => member !== undefined).sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${members.map(([key, member]) => `${JSON.stringify(key)}:${canonical(member)}`).join(',')}}`;
}

function digestOf(record: SoluteRecord): string {
  const { digest: _digest, ...body } = record;
  return createHash('sha256').update(canonical(body), 'utf8').digest('hex');
}

/** The record with other content and a digest that fits it, as a record of another version would have. */
function written(record: SoluteRecord, changes: Partial<SoluteRecord>): SoluteRecord {
  const changed = { ...record, ...changes };
  return { ...changed, digest: digestOf(changed) };
}

const phosphate = '30 mmol/kg Na2HPO4; 10 mmol/kg KH2PO4';
const stored = (): SoluteRecord => JSON.parse(JSON.stringify(createRecord(predict(phosphate, { temperature: 37 }), { label: 'wash buffer', solutes: phosphate }))) as SoluteRecord;

describe('record', () => {
  const validate = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true }).compile(read<object>('record.schema.json'));

  it('follows its schema for every listed substance', () => {
    for (const row of predictable) {
      const record = JSON.parse(JSON.stringify(createRecord(predictOne(addressOf(row), '0.05 mol/kg')))) as SoluteRecord;
      assert.ok(validate(record), `${row[1]}: ${JSON.stringify(validate.errors)}`);
    }
  });

  it('follows its schema for mixtures, with and without air and label', () => {
    const mixture = fc.array(fc.record({ substance: anySubstance, molality: anyMolality }), { minLength: 1, maxLength: 4 });
    fc.assert(
      fc.property(mixture, anyTemperature, fc.constantFrom('excluded' as const, 'equilibrated' as const), fc.option(fc.string(), { nil: undefined }), (parts, temperature, air, label) => {
        const prediction = predict(parts.map(({ substance, molality }) => ({ substance, amount: `${molality} mol/kg` })), { temperature, air });
        const record = createRecord(prediction, label === undefined ? {} : { label });
        assert.ok(validate(record), JSON.stringify(validate.errors));
      }),
      { numRuns: 100 },
    );
  });

  it('is refused by its schema when something is missing or out of place', () => {
    const record = stored();
    for (const key of Object.keys(record).filter((key) => key !== 'label')) {
      const { [key as 'pH']: _left, ...rest } = record;
      assert.equal(validate(rest), false, key);
    }
    for (const wrong of [{ pH: '7' }, { digest: 'abc' }, { classification: 'alkaline' }, { format: 'solute-record/2' }, { extra: 1 }]) assert.equal(validate({ ...record, ...wrong }), false, JSON.stringify(wrong));
  });

  it('carries the digest of its canonical form (RFC 8785, FIPS 180-4)', () => {
    const record = stored();
    assert.equal(record.digest, digestOf(record));
    const shuffled = Object.fromEntries(Object.entries(record).reverse()) as unknown as SoluteRecord;
    assert.deepEqual(verifyRecord(shuffled), { verdict: 'same' });
  });

  it('is the same each time, and plain JSON', () => {
    assert.deepEqual(createRecord(predict(phosphate)), createRecord(predict(phosphate)));
    const record = createRecord(predict(phosphate));
    assert.deepEqual(JSON.parse(JSON.stringify(record)), record);
  });

  it('and the prediction behind it have the same bytes where Math.exp, Math.log and their like give other last digits', () => {
    const print = (...options: string[]): string => {
      const { stdout, stderr, status } = spawnSync(process.execPath, ['--import', 'tsx', join(import.meta.dirname, 'records-elsewhere.ts'), ...options], { encoding: 'utf8' });
      assert.equal(status, 0, stderr);
      return stdout;
    };
    const here = print();
    assert.equal(print('perturbed'), here);
    assert.equal((JSON.parse(here) as unknown[]).length, 36);
  });
});

describe('verification of a record', () => {
  it('finds an untouched record the same', () => {
    assert.deepEqual(verifyRecord(stored()), { verdict: 'same' });
    fc.assert(
      fc.property(anySubstance, anyMolality, anyTemperature, (substance, molality, temperature) => {
        const record = createRecord(predict([{ substance, amount: `${molality} mol/kg` }], { temperature }));
        assert.deepEqual(verifyRecord(JSON.parse(JSON.stringify(record)) as SoluteRecord), { verdict: 'same' }, record.solutes);
      }),
      { numRuns: 100 },
    );
  });

  it('recomputes amounts that need a volume', () => {
    assert.deepEqual(verifyRecord(createRecord(predict('1.5 g KHC8H4O4', { volume: '250 mL' }))), { verdict: 'same' });
  });

  it('notices any altered member', () => {
    const record = stored();
    const alterations: Partial<SoluteRecord>[] = [
      { pH: record.pH + 1e-6 },
      { label: 'another' },
      { solutes: `${record.solutes} ` },
      { decided: !record.decided },
      { reason: `${record.reason} ` },
      { conditions: { ...record.conditions, temperature: 38 } },
      { constants: record.constants.slice(1) },
      { data: { ...record.data, version: 'other' } },
      { digest: record.digest.replace(/^./, (first) => (first === '0' ? '1' : '0')) },
    ];
    for (const alteration of alterations) assert.deepEqual(verifyRecord({ ...record, ...alteration }), { verdict: 'tampered' }, JSON.stringify(alteration));
  });

  it('names the constants that changed, and by how much, in a record of other data', () => {
    const record = stored();
    const constants = record.constants.map((constant) => (constant.id === 'phosphoric 2' ? { ...constant, value: 7.21 } : constant));
    const verification = verifyRecord(written(record, { pH: 7.3, constants }));
    const now = record.constants.find(({ id }) => id === 'phosphoric 2')!.value;
    assert.deepEqual(verification, { verdict: 'changed', pH: { stored: 7.3, now: record.pH }, constants: [{ id: 'phosphoric 2', stored: 7.21, now }] });
  });

  it('says so when what was typed is no longer understood', () => {
    const verification = verifyRecord(written(stored(), { solutes: '1 mol/L unobtainium chloride' }));
    assert.equal(verification.verdict, 'not-computable');
  });

  it('takes anything that is no record as tampered, without an exception', () => {
    fc.assert(fc.property(fc.anything(), (value) => assert.deepEqual(verifyRecord(value as SoluteRecord), { verdict: 'tampered' })));
    assert.deepEqual(verifyRecord({ ...stored(), digest: undefined } as unknown as SoluteRecord), { verdict: 'tampered' });
  });
});
