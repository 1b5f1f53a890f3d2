// Walks through the demo pages of the built package as a visitor would, under the strict policy of the demo server.
import assert from 'node:assert/strict';
import { readFile } from 'node:fs/promises';
import type { Server } from 'node:http';
import { createRequire } from 'node:module';
import { after, before, describe, it } from 'node:test';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import type { SoluteRecord } from '../../src/prediction/record-format.js';

const beside = (path: string) => import(new URL(path, import.meta.url).href) as Promise<unknown>;
const { startServer } = (await beside('../../demo/serve.mjs')) as { startServer: (port: number) => Promise<{ server: Server; address: string }> };
const { ensureChromium } = (await beside('../tools/ensure-browser.mjs')) as { ensureChromium: () => string };

const AXE = createRequire(import.meta.url).resolve('axe-core/axe.min.js');
const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const PAGES = ['index', 'intake', 'notebook', 'gallery'];

let server: Server;
let address: string;
let browser: Browser;

before(async () => {
  ({ server, address } = await startServer(0));
  browser = await chromium.launch({ executablePath: ensureChromium(), args: process.getuid?.() === 0 ? ['--no-sandbox'] : [] });
});

after(async () => {
  await browser?.close();
  server?.close();
});

/** Runs a walk in a profile of its own; errors of the page and breaches of its policy fail the walk. */
async function walk(steps: (page: Page, context: BrowserContext) => Promise<void>, prepare?: (context: BrowserContext) => Promise<unknown>) {
  const context = await browser.newContext({ acceptDownloads: true });
  const faults: string[] = [];
  await prepare?.(context);
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  page.on('pageerror', (error) => faults.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error') faults.push(message.text());
  });
  try {
    await steps(page, context);
  } finally {
    await context.close();
  }
  assert.deepEqual(faults, []);
}

/** Opens a page and waits until every card on it has come to a result. */
async function open(page: Page, name: string): Promise<void> {
  await page.goto(`${address}${name}.html`, { waitUntil: 'networkidle' });
  await page.evaluate(async () => {
    for (const card of document.querySelectorAll<Element & { predictionComplete?: Promise<void> }>('solute-card')) await card.predictionComplete;
  });
}

/** The record of the first card once it stands for this sample and these solutes. */
async function recordFor(page: Page, sample: string, solutes: string): Promise<SoluteRecord> {
  const handle = await page.waitForFunction(([label, wanted]) => {
    const { record } = document.querySelector('solute-card') as Element & { record?: { label?: string; solutes: string } };
    return (record?.label ?? '') === label && record?.solutes === wanted ? record : undefined;
  }, [sample, solutes] as const);
  return (await handle.jsonValue()) as unknown as SoluteRecord;
}

async function enter(page: Page, sample: string, solutes: string): Promise<SoluteRecord> {
  await page.getByLabel('Sample number').fill(sample);
  await page.getByLabel('What was dissolved').pressSequentially(solutes);
  return recordFor(page, sample, solutes);
}

const store = (page: Page) => page.locator('solute-card').getByRole('button', { name: /^(store|try|retry)/i }).click();
const status = (page: Page, text: string | RegExp) => page.locator('#status', { hasText: text }).waitFor();
const rows = (page: Page) => page.locator('#samples tbody tr');

describe('sample intake', () => {
  it('predicts what is typed, stores it, finds it after a reload, opens, exports and deletes it', () => walk(async (page) => {
    const typed = '0.10 mol/L NH4Cl';
    await open(page, 'intake');
    const record = await enter(page, 'SD-0412', typed);
    assert.equal(record.classification, 'acidic');
    await page.locator('solute-card').getByText(record.pH.toFixed(2)).first().waitFor();

    await store(page);
    await status(page, 'SD-0412 stored as IN-0001');
    await page.locator('solute-card').getByText('IN-0001').first().waitFor();
    const row = rows(page).first();
    for (const text of ['IN-0001', 'SD-0412', typed, record.pH.toFixed(2), 'acidic']) assert.ok((await row.innerText()).includes(text), text);

    await page.reload();
    await rows(page).first().waitFor();
    assert.equal(await rows(page).count(), 1);

    await page.getByRole('button', { name: 'Clear the form' }).click();
    await page.waitForFunction(() => (document.querySelector('solute-card') as Element & { state?: string }).state === 'empty');
    await page.getByRole('button', { name: 'Open IN-0001' }).click();
    assert.equal((await recordFor(page, 'SD-0412', typed)).digest, record.digest);
    assert.equal(await page.getByLabel('What was dissolved').inputValue(), typed);
    assert.equal(await page.getByLabel('Sample number').inputValue(), 'SD-0412');

    const [file] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Export IN-0001' }).click()]);
    const exported = JSON.parse(await readFile(await file.path(), 'utf8')) as { reference: string; record: SoluteRecord };
    assert.equal(file.suggestedFilename(), 'IN-0001.json');
    assert.equal(exported.reference, 'IN-0001');
    assert.deepEqual(exported.record, record);

    const remove = page.getByRole('button', { name: 'Delete IN-0001' });
    await remove.click();
    await page.getByRole('dialog').getByRole('button', { name: 'Keep it' }).click();
    assert.equal(await rows(page).count(), 1);
    await remove.click();
    await page.keyboard.press('Escape');
    assert.equal(await rows(page).count(), 1);
    await remove.click();
    await page.getByRole('dialog').getByRole('button', { name: 'Delete' }).click();
    await status(page, 'IN-0001 deleted');
    assert.equal(await rows(page).count(), 0);
    await page.reload();
    await page.getByText('Nothing stored yet').waitFor();
  }));

  it('asks for the sample number, keeps one sample once, and never gives a reference twice', () => walk(async (page) => {
    await open(page, 'intake');
    await page.getByLabel('What was dissolved').fill('85 mmol/L NaCl');
    await recordFor(page, '', '85 mmol/L NaCl');
    await store(page);
    await page.getByText('Give the sample a number').waitFor();
    assert.equal(await page.getByLabel('Sample number').getAttribute('aria-invalid'), 'true');
    assert.equal(await rows(page).count(), 0);

    await page.getByLabel('Sample number').fill('SD-7');
    await recordFor(page, 'SD-7', '85 mmol/L NaCl');
    await store(page);
    await status(page, 'stored as IN-0001');
    await page.reload();
    await page.getByRole('button', { name: 'Open IN-0001' }).click();
    await recordFor(page, 'SD-7', '85 mmol/L NaCl');
    await store(page);
    await status(page, 'already stored as IN-0001');
    await page.getByRole('button', { name: 'Delete IN-0001' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Delete' }).click();
    await status(page, 'IN-0001 deleted');
    await page.getByRole('button', { name: 'Clear the form' }).click();
    await enter(page, 'SD-8', '0.2 mol/L KCl');
    await store(page);
    await status(page, 'stored as IN-0002');
  }));

  it('says that the browser refused to store, and stores on the second try', () => walk(
    async (page) => {
      await open(page, 'intake');
      await status(page, 'cannot be read');
      await enter(page, 'SD-0413', '30 mmol/L NH4Cl');
      await store(page);
      await status(page, 'SD-0413 was not stored');
      await page.locator('solute-card').getByText('Storage is switched off').first().waitFor();
      await page.evaluate(() => Object.assign(globalThis, { storageRefused: false }));
      await store(page);
      await status(page, 'SD-0413 stored as IN-0001');
    },
    (context) => context.addInitScript(() => {
      Object.assign(globalThis, { storageRefused: true });
      const factory = Object.getPrototypeOf(indexedDB) as IDBFactory;
      const original = Object.getOwnPropertyDescriptor(factory, 'open')!.value as (this: IDBFactory, ...given: unknown[]) => IDBOpenDBRequest;
      factory.open = function (this: IDBFactory, ...given: unknown[]) {
        if ((globalThis as { storageRefused?: boolean }).storageRefused) throw new DOMException('Storage is switched off.', 'SecurityError');
        return original.apply(this, given);
      };
    }),
  ));

  it('shows a problem as it is typed and leaves the text alone', () => walk(async (page) => {
    await open(page, 'intake');
    const typed = '0.2 % MnCl2·4H2O';
    await page.getByLabel('What was dissolved').fill(typed);
    await page.waitForFunction(() => (document.querySelector('solute-card') as Element & { state?: string }).state === 'problem');
    assert.equal(await page.getByLabel('What was dissolved').inputValue(), typed);
    assert.equal(await page.evaluate(() => new FormData(document.querySelector('form')!).get('prediction')), null);
  }));
});

describe('notebook page', () => {
  it('keeps its results and readings, and brings them back', () => walk(async (page) => {
    await open(page, 'notebook');
    await page.getByLabel('pH read in N-stock').fill('6.1');
    await page.getByRole('button', { name: 'Save page' }).click();
    await status(page, 'Saved with 6 results');
    await page.reload();
    await status(page, 'As saved on');
    assert.equal(await page.getByLabel('pH read in N-stock').inputValue(), '6.1');
  }));

  it('holds every result as text in the downloaded page', () => walk(async (page) => {
    await open(page, 'notebook');
    const shown = await page.locator('#readings [data-card="iron"]').innerText();
    const [file] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Download as HTML' }).click()]);
    const saved = await readFile(await file.path(), 'utf8');
    const card = /<solute-card id="iron"[\s\S]*?<\/solute-card>/.exec(saved)?.[0] ?? '';
    assert.match(card, new RegExp(`pH ${shown.split(' ')[0]!.replace('.', '\\.')}`));
  }));
});

describe('every page', () => {
  for (const name of PAGES) {
    it(`${name}: fits 320 px and passes the accessibility rules, light and dark`, () => walk(
      async (page) => {
        await page.setViewportSize({ width: 320, height: 800 });
        await open(page, name);
        assert.equal(await page.evaluate(() => document.documentElement.scrollWidth), 320);
        for (const colorScheme of ['light', 'dark'] as const) {
          await page.emulateMedia({ colorScheme });
          const violations = await page.evaluate(async (tags) => {
            const { axe } = globalThis as unknown as { axe: { run(context: Document, options: object): Promise<{ violations: { id: string; nodes: { target: unknown }[] }[] }> } };
            const result = await axe.run(document, { runOnly: tags });
            return result.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => JSON.stringify(target)).join(' ')}`);
          }, WCAG);
          assert.deepEqual(violations, [], colorScheme);
        }
      },
      (context) => context.addInitScript({ path: AXE }),
    ));
  }
});
