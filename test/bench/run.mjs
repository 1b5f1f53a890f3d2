/**
 * Measures the built package: predictions a second in Node beside the same equations in a general-purpose solver, and a
 * page of many cards in Chromium. Nothing is built and nothing is asserted, since times depend on the machine; ratios
 * within one run can be compared.
 *
 *   npm run build && npm run bench
 */
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { chromium } from 'playwright-core';
import { findChromium } from '../tools/ensure-browser.mjs';
import { measureCards } from './cards.mjs';
import { generalSolver } from './general-solver.mjs';

const dist = join(dirname(fileURLToPath(import.meta.url)), '..', '..', 'dist');
const engineFile = join(dist, 'engine.min.js');
const cardFile = join(dist, 'solute-card.min.js');

const ROOTS = 1e6;
const ROUNDS = 5;
const SECONDS = 1.5;
const CARDS = 1000;

/** Amounts differ from call to call, so that no answer is one already known. */
const SUBJECTS = {
  'one salt': (k) => `${(0.01 + (k % 997) / 10000).toFixed(4)} mol/kg NH4Cl`,
  'six solutes with metals': (k) =>
    `${(0.001 + (k % 997) / 1e6).toFixed(6)} mol/kg FeCl3; 2 mmol/kg CuSO4·5H2O; 3 mmol/kg ZnCl2; 0.01 mol/kg CH3COONa; 0.02 mol/kg NH4NO3; 5 mmol/kg MgCl2·6H2O`,
};

/** Milliseconds of wall clock and of processor time that a piece of work takes. */
function timed(work) {
  const cpu = process.cpuUsage();
  const start = performance.now();
  work();
  const wall = performance.now() - start;
  const { user, system } = process.cpuUsage(cpu);
  return { wall, cpu: (user + system) / 1000 };
}

/** The yardstick: a million square roots one after the other. */
function squareRoots() {
  let sum = 0;
  for (let k = 1; k <= ROOTS; k++) sum += Math.sqrt(k);
  if (!(sum > 0)) throw new Error('the loop was left out');
}

const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];

function printTable(rows) {
  const widths = rows[0].map((_, column) => Math.max(...rows.map((row) => String(row[column]).length)));
  for (const row of rows) console.log(row.map((cell, column) => (column === 0 ? String(cell).padEnd(widths[0]) : String(cell).padStart(widths[column]))).join('  '));
}

/** Milliseconds of processor time that one call takes: the median of several rounds, after one that warms up. */
function timeOfOne(call) {
  let calls = 0;
  const perform = (seconds) => {
    const end = performance.now() + seconds * 1000;
    let done = 0;
    do {
      call(calls++);
      done++;
    } while (performance.now() < end);
    return done;
  };
  perform(SECONDS);
  return median(Array.from({ length: ROUNDS }, () => {
    let done = 0;
    const { cpu } = timed(() => (done = perform(SECONDS / ROUNDS)));
    return cpu / done;
  }));
}

async function measureEngine() {
  const { predict, createRecord } = await import(pathToFileURL(engineFile).href);
  const solver = await generalSolver(dist);
  for (let k = 0; k < 20; k++) squareRoots();
  const yardstick = median(Array.from({ length: ROUNDS * 3 }, () => timed(squareRoots).cpu));
  const rows = [['in Node', 'per CPU second', '1e6 square roots each', 'of predict + pH']];
  for (const [name, solutes] of Object.entries(SUBJECTS)) {
    const pH = timeOfOne((k) => predict(solutes(k)).pH);
    const whole = timeOfOne((k) => createRecord(predict(solutes(k))));
    const row = (label, time) => rows.push([`${name}: ${label}`, Math.round(1000 / time), (time / yardstick).toFixed(3), (time / pH).toFixed(1)]);
    row('predict + pH', pH);
    row('predict + whole record', whole);
    if (!solver) continue;
    const problems = Array.from({ length: 32 }, (_, k) => solver.problem(solutes(31 * k)));
    const missed = problems.filter((problem) => !(Math.abs(solver.solve(problem).pH - problem.pH) < 1e-6)).length;
    row(`general-purpose solver${missed > 0 ? ` (${missed} of ${problems.length} not solved)` : ''}`, timeOfOne((k) => solver.solve(problems[k % problems.length])));
  }
  printTable(rows);
  console.log(`yardstick: ${yardstick.toFixed(2)} ms for ${ROOTS} square roots`);
  console.log(solver ? solver.description : 'ml-levenberg-marquardt is not installed, so there is no general-purpose solver beside the engine.');
}

async function measurePage() {
  const executablePath = findChromium();
  if (!executablePath) {
    console.log('No Chromium was found, so no page was measured (CHROME_PATH names one).');
    return;
  }
  const browser = await chromium.launch({ executablePath, args: process.getuid?.() === 0 ? ['--no-sandbox'] : [] });
  try {
    const rounds = [];
    for (let round = 0; round < ROUNDS; round++) {
      const page = await browser.newPage({ viewport: { width: 1280, height: 800 } });
      await page.setContent('<!doctype html><title>Cards</title><main></main>');
      await page.addScriptTag({ path: cardFile, type: 'module' });
      await page.waitForFunction(() => customElements.get('solute-card') !== undefined);
      rounds.push(await page.evaluate(measureCards, CARDS));
      await page.close();
    }
    const of = (key) => median(rounds.map((round) => round[key]));
    printTable([
      [`${CARDS} on a page in Chromium ${browser.version()}`, 'ms', 'longest task, ms'],
      ['<solute-card>', Math.round(of('cards')), Math.round(of('longestCardTask'))],
      ['inert copies of the same DOM', Math.round(of('copies')), Math.round(of('longestCopyTask'))],
      ['ratio', (of('cards') / of('copies')).toFixed(2), ''],
    ]);
    console.log('Tasks below 50 ms are not reported by the browser and count as 0.');
  } finally {
    await browser.close();
  }
}

for (const file of [engineFile, cardFile]) {
  if (!existsSync(file)) {
    console.error(`${file} is missing: run npm run build first.`);
    process.exit(1);
  }
}
await measureEngine();
console.log();
await measurePage();
