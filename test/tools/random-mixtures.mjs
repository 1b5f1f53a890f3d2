/**
 * Predicts random mixtures of listed substances and looks for any that fails:
 *
 *   node --import tsx test/tools/random-mixtures.mjs COUNT [SEED]
 *
 * One to eight substances, twelve decades of amount, 0 to 60 °C, with air and without; every tenth with solids in
 * equilibrium, every fifth read whole. Prints the inputs that did not converge, kept a residual above 1e-10, gave a
 * number that is not finite, or threw; exits 1 when there are any.
 */
import { readFileSync } from 'node:fs';
import { predict } from '../../src/engine.ts';

const count = Number(process.argv[2] ?? 1000);
const seed = Number(process.argv[3] ?? 1);
if (!Number.isInteger(count) || count < 1 || !Number.isInteger(seed)) {
  console.error('usage: node --import tsx test/tools/random-mixtures.mjs COUNT [SEED]');
  process.exit(1);
}

const MOST_SUBSTANCES = 8;
/** mol/kg, as powers of ten. */
const SMALLEST = -11;
const LARGEST = 1;
const HOTTEST = 60;
const LARGEST_RESIDUAL = 1e-10;
const FAILURES_SHOWN = 50;

/** Equal numbers from equal seeds: G. Marsaglia, J. Stat. Softw. 8 (2003) 14, the 32-bit generator with shifts 13, 17, 5. */
function generator(start) {
  let state = (Math.imul(start, 2654435761) ^ 0x9e3779b9) | 0 || 1;
  const next = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
  for (let skipped = 0; skipped < 16; skipped++) next();
  return next;
}

const random = generator(seed);
const below = (limit) => Math.floor(random() * limit);

/** Listed substances for which a prediction is made at all. */
const { rows } = JSON.parse(readFileSync(new URL('../../data/substances.json', import.meta.url), 'utf8'));
const substances = rows.map(([names, , cas]) => cas ?? names[0]).filter((substance) => {
  try {
    return predict([{ substance, amount: '0.01 mol/kg' }]).pH > -10;
  } catch {
    return false;
  }
});

function anyMixture(index) {
  const solutes = Array.from({ length: 1 + below(MOST_SUBSTANCES) }, () => ({
    substance: substances[below(substances.length)],
    amount: `${(10 ** (SMALLEST + random() * (LARGEST - SMALLEST))).toPrecision(4)} mol/kg`,
  }));
  return {
    solutes,
    conditions: {
      temperature: below(HOTTEST + 1),
      air: random() < 0.5 ? 'excluded' : 'equilibrated',
      solids: index % 10 === 0 ? 'equilibrated' : 'watched',
    },
  };
}

function notFinite(value, path) {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => notFinite(inner, `${path}.${key}`));
}

/** What is wrong with a prediction, or nothing. */
function faultOf({ solutes, conditions }, index, found) {
  try {
    const prediction = predict(solutes, conditions);
    const { pH, ionicStrength, waterActivity, residual, species } = prediction;
    found.residual = Math.max(found.residual, residual);
    const strange = notFinite(index % 5 === 0 ? prediction : { pH, ionicStrength, waterActivity, residual, species }, '');
    if (strange.length > 0) return { kind: 'not finite', detail: strange.slice(0, 3).join(' ') };
    return residual <= LARGEST_RESIDUAL ? undefined : { kind: 'residual', detail: residual.toExponential(1) };
  } catch (error) {
    const code = error.problems?.[0]?.code;
    return { kind: code ?? 'exception', detail: code === undefined ? error.stack.split('\n').slice(0, 2).join(' ') : error.message };
  }
}

const found = { residual: 0 };
const failures = [];
let slowest = { time: 0, input: undefined };
const start = performance.now();
for (let index = 0; index < count; index++) {
  const mixture = anyMixture(index);
  const before = performance.now();
  const fault = faultOf(mixture, index, found);
  const time = performance.now() - before;
  if (time > slowest.time) slowest = { time, input: mixture };
  if (!fault) continue;
  failures.push(fault.kind);
  if (failures.length <= FAILURES_SHOWN) console.log(`${index} ${fault.kind}: ${fault.detail}\n  ${JSON.stringify(mixture)}`);
}
const seconds = (performance.now() - start) / 1000;
const kinds = [...new Set(failures)].map((kind) => `${failures.filter((other) => other === kind).length} ${kind}`);
console.log(`${substances.length} substances, seed ${seed}: ${count - failures.length} of ${count} converged in ${seconds.toFixed(1)} s${failures.length > 0 ? ` (${kinds.join(', ')})` : ''}`);
console.log(`largest residual ${found.residual.toExponential(1)}; slowest ${slowest.time.toFixed(0)} ms: ${JSON.stringify(slowest.input)}`);
if (failures.length > 0) process.exitCode = 1;
