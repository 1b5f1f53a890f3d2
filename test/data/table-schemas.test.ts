import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { read } from './read.js';

const FILES = ['complexes', 'solids', 'gases', 'densities'];

describe('the schemas of the equilibrium and density tables', () => {
  for (const file of FILES) {
    it(`hold for ${file}.json`, () => {
      const ajv = new Ajv2020({ strict: true, strictRequired: false, allowUnionTypes: true });
      const validate = ajv.compile(read<object>(`schemas/${file}.schema.json`));
      assert.ok(validate(read(`${file}.json`)), ajv.errorsText((validate.errors ?? []).slice(0, 5), { separator: '\n' }));
    });

    it(`refuse a field that ${file}.json does not know`, () => {
      const validate = new Ajv2020({ strict: false }).compile(read<object>(`schemas/${file}.schema.json`));
      assert.equal(validate({ ...read<object>(`${file}.json`), unknown: 1 }), false);
    });
  }
});
