/**
 * Runs the project's checks and closes with one plain line, "N passed, N failed".
 *
 *   node test/tools/run-tests.mjs                    everything: lint, types, build, node and browser tests
 *   node test/tools/run-tests.mjs node [path ...]    tests in Node, of these files or folders
 *   node test/tools/run-tests.mjs browser [path ...] tests in browsers
 *
 * A step that is no test run (lint, types, build) counts as one failure when it fails.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import { dirname, join, relative, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const [kind = 'all', ...rest] = process.argv.slice(2);
const coverage = rest.includes('--coverage');
const paths = rest.filter((argument) => argument !== '--coverage');

const run = (program, args, env = {}) =>
  spawnSync(program, args, { cwd: root, stdio: 'inherit', env: { ...process.env, ...env } }).status === 0;

function filesEndingWith(ending) {
  const places = paths.length > 0 ? paths.map((path) => resolve(path)) : [join(root, 'test')];
  return places
    .flatMap((place) => (statSync(place).isDirectory() ? readdirSync(place, { recursive: true }).map((name) => join(place, name)) : [place]))
    .filter((file) => file.endsWith(ending))
    .map((file) => relative(root, file))
    .sort();
}

/** Runs a test process that leaves its counts in a file; one that leaves none has failed as a whole. */
function counted(start) {
  const folder = mkdtempSync(join(tmpdir(), 'solute-card-'));
  const file = join(folder, 'counts.json');
  const ok = start(file);
  let counts = { passed: 0, failed: 0 };
  try {
    counts = JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    counts.failed = 1;
  }
  rmSync(folder, { recursive: true, force: true });
  if (!ok && counts.failed === 0) counts.failed = 1;
  return counts;
}

const step = (name, script) => () => {
  const ok = run('npm', ['run', '--silent', script]);
  if (!ok) console.log(`${name} failed`);
  return { passed: 0, failed: ok ? 0 : 1 };
};

const nodeTests = () => counted((file) => run(process.execPath, [
  '--import', 'tsx', '--test', `--test-concurrency=${availableParallelism()}`,
  ...(coverage ? ['--experimental-test-coverage'] : []),
  '--test-reporter=spec', '--test-reporter-destination=stdout',
  '--test-reporter=./test/tools/count-reporters.mjs', `--test-reporter-destination=${file}`,
  ...filesEndingWith('.test.ts'),
]));

const browserTests = () => counted((file) => run(process.execPath, [
  'node_modules/@web/test-runner/dist/bin.js', ...filesEndingWith('.browser.ts'), ...(coverage ? ['--coverage'] : []),
], { COUNTS_FILE: file, ...(coverage ? { BROWSERS: 'chromium' } : {}) }));

const plans = {
  all: [step('Lint', 'lint'), step('Type check', 'types'), step('Build', 'build'), nodeTests, browserTests],
  node: [nodeTests],
  browser: [browserTests],
};
if (!(kind in plans)) throw new Error(`unknown kind of run "${kind}"; known are ${Object.keys(plans).join(', ')}`);

const total = { passed: 0, failed: 0 };
for (const start of plans[kind]) {
  const { passed, failed } = start();
  total.passed += passed;
  total.failed += failed;
}
if (total.passed === 0 || total.failed > 0) process.exitCode = 1;
console.log(`${total.passed} passed, ${total.failed} failed`);
