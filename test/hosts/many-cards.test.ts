import assert from 'node:assert/strict';
import { test } from 'node:test';
import { launch, servePages } from './bundled-page.js';

interface TraceEvent {
  readonly name: string;
  readonly pid: number;
  readonly tid: number;
  /** Microseconds. */
  readonly ts: number;
  /** Microseconds the thread was at work, waiting for a busy machine left out. */
  readonly tdur?: number;
}

const LONGEST_TASK = 50;
const COUNT = 1000;
const solutes = ['0.1 mol/L NH4Br', '20 mmol/L Na2CO3', '50 mmol/L KNO3', '5 g/L Na2HPO4·12H2O', '10 mmol/L AlCl3'];
const cards = Array.from({ length: COUNT }, (_, index) => `<solute-card label="Sample ${index}" solutes="${solutes[index % solutes.length]}"></solute-card>`);

/** Inserts cards, fifty a task as a parser would, and notes when all of them are predicted. */
const SCRIPT = `
import '/elements.js';
const { content } = document.querySelector('template');
globalThis.addCards = async (count) => {
  performance.mark('cards-begin');
  const added = [];
  while (added.length < count) {
    for (const card of [...content.children].slice(added.length, Math.min(count, added.length + 50))) {
      const copy = document.importNode(card, true);
      document.body.append(copy);
      added.push(copy);
    }
    await new Promise((resolve) => setTimeout(resolve));
  }
  await Promise.all(added.map((card) => card.predictionComplete));
  performance.mark('cards-end');
  globalThis.predicted = added.filter(({ state }) => state === 'predicted').length;
};`;
const PAGE = `<!doctype html><html lang="en"><title>Many cards</title><body><template>${cards.join('')}</template><script type="module">${SCRIPT}</script>`;

test('1,000 cards never block the page for 50 ms', { timeout: 300_000 }, async () => {
  const { server, address } = await servePages({ '/': PAGE });
  const browser = await launch();
  try {
    const page = await browser.newPage();
    await page.goto(address);
    const predict = async (count: number) => {
      await page.evaluate(`void setTimeout(() => addCards(${count}))`);
      await page.waitForFunction(`globalThis.predicted === ${count}`, undefined, { polling: 300, timeout: 240_000 });
    };
    await predict(20);
    const session = await page.context().newCDPSession(page);
    const events: TraceEvent[] = [];
    session.on('Tracing.dataCollected', ({ value }) => events.push(...(value as unknown as TraceEvent[])));
    await session.send('Tracing.start', { traceConfig: { includedCategories: ['toplevel', 'blink.user_timing'] } });
    await predict(COUNT);
    const complete = new Promise((resolve) => session.once('Tracing.tracingComplete', resolve));
    await session.send('Tracing.end');
    await complete;
    const begin = events.find(({ name }) => name === 'cards-begin')!;
    const end = events.find(({ name }) => name === 'cards-end')!;
    const tasks = events
      .filter(({ name, pid, tid, ts }) => name.endsWith('RunTask') && pid === begin.pid && tid === begin.tid && ts > begin.ts && ts < end.ts)
      .map(({ tdur = 0 }) => tdur / 1000)
      .sort((one, other) => other - one);
    console.log(`1,000 cards: ${Math.round((end.ts - begin.ts) / 1000)} ms in all, longest tasks ${tasks.slice(0, 5).map((task) => task.toFixed(1)).join(', ')} ms of processor time`);
    assert.ok(tasks.length > 50, 'the work is cut into tasks');
    // A machine shared with other work stretches single tasks, also in processor time: two may be longer.
    assert.ok(tasks[2]! <= LONGEST_TASK);
  } finally {
    await browser.close();
    server.close();
  }
});
