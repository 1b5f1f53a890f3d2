import assert from 'node:assert/strict';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { describe, it } from 'node:test';

const root = join(import.meta.dirname, '..', '..');
const MADE = ['node_modules', 'dist', 'coverage'];
const LISTED = [
  'README.md', 'DEVELOPERS.md', 'LICENSE', 'package.json', 'package-lock.json', 'rollup.config.mjs', 'tsconfig.json',
  'tsconfig.build.json', 'tsconfig.engine.json', 'eslint.config.mjs', 'web-test-runner.config.mjs',
  'custom-elements-manifest.config.mjs', 'src', 'data', 'test', 'demo',
];
const SOURCE = ['quantities', 'substances', 'equilibrium', 'prediction', 'elements', 'embed', 'engine.ts', 'index.ts', 'define.ts'];

const entries = (folder: string) => readdirSync(join(root, folder)).filter((name) => !name.startsWith('.'));

describe('the layout of the project', () => {
  it('has the listed entries at the top and no others', () => {
    assert.deepEqual(entries('.').filter((name) => !MADE.includes(name)).sort(), [...LISTED].sort());
  });

  it('has nothing in src/ but the layers and the three entries', () => {
    assert.deepEqual(entries('src').filter((name) => !SOURCE.includes(name)), []);
  });

  it('keeps every source file below 400 lines', () => {
    const long = readdirSync(join(root, 'src'), { recursive: true, encoding: 'utf8' })
      .map((name) => join(root, 'src', name))
      .filter((path) => statSync(path).isFile() && readFileSync(path, 'utf8').split('\n').length > 400);
    assert.deepEqual(long, []);
  });

  it('locks packages by version and hash, not by the address of a registry', () => {
    const lock = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')) as {
      packages: Record<string, { resolved?: string; integrity?: string }>;
    };
    const packages = Object.entries(lock.packages).filter(([path]) => path !== '');
    assert.deepEqual(packages.filter(([, { resolved }]) => resolved !== undefined).map(([path]) => path), []);
    assert.deepEqual(packages.filter(([, { integrity }]) => integrity === undefined).map(([path]) => path), []);
  });
});
