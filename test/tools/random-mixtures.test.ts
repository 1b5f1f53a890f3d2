import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { it } from 'node:test';

const MIXTURES = 2000;
const script = join(import.meta.dirname, 'random-mixtures.mjs');

it(`${MIXTURES} random mixtures of one to eight substances all converge`, (t) => {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['--import', 'tsx', script, String(MIXTURES), process.env['SEED'] ?? '1'], { encoding: 'utf8' });
  for (const line of stdout.trim().split('\n').slice(-2)) t.diagnostic(line);
  assert.equal(status, 0, stdout + stderr);
});
