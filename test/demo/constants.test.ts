// The page of constants of the built package: shows all that the data hold, finds, sorts, and is accessible.
import assert from 'node:assert/strict';
import type { Server } from 'node:http';
import { createRequire } from 'node:module';
import { after, before, describe, it } from 'node:test';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { elements, families, metals, read } from '../data/read.js';
import { complexes } from '../data/tables.js';

const beside = (path: string) => import(new URL(path, import.meta.url).href) as Promise<unknown>;
const { startServer } = (await beside('../../demo/serve.mjs')) as { startServer: (port: number) => Promise<{ server: Server; address: string }> };
const { ensureChromium } = (await beside('../tools/ensure-browser.mjs')) as { ensureChromium: () => string };

const AXE = createRequire(import.meta.url).resolve('axe-core/axe.min.js');
const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const FIRST = 100;

type Group = Record<string, unknown>;
const solids = read<{ solids: unknown[]; solubilities: unknown[] }>('solids.json');
const activity = read<{ coefficients: unknown[]; estimates: Record<string, { value: number | null }> }>('activity.json');
const densities = read<{ solutes: unknown[]; volumes: unknown[] }>('densities.json');
const DESCRIPTIVE = ['uncertainty', 'source', 'obtained', 'unit', 'units', 'range', 'note', 'form'];
const parametersOf = (group: Group): number => Object.keys(group).filter((key) => !DESCRIPTIVE.includes(key)).length;
const air = read<{ carbonDioxide: Group & { solubility: Group }; waterVapour: Group }>('air.json');
const water = read<Record<'constants' | 'density' | 'permittivity' | 'ionProduct', Group>>('water.json');

/** Counted in the data files, not by what the page makes of them. */
const COUNTS: Readonly<Record<string, number>> = {
  'Acid step': families.reduce((sum, { steps }) => sum + steps.length, 0),
  Hydrolysis: metals.reduce((sum, { hydrolysis }) => sum + hydrolysis.length, 0),
  Complex: complexes.length,
  Solid: solids.solids.length,
  Solubility: solids.solubilities.length,
  'Interaction coefficient': activity.coefficients.length + Object.values(activity.estimates).filter(({ value }) => value !== null).length + 1,
  Water: Object.values(water).reduce((sum, group) => sum + parametersOf(group), 0),
  // Beside the parameters of the two equations: carbon dioxide of room air, and the pressure.
  Air: parametersOf(air.carbonDioxide.solubility) + parametersOf(air.waterVapour) + 2,
  Gas: read<{ gases: unknown[] }>('gases.json').gases.length,
  Density: densities.solutes.length + densities.volumes.length,
  'Atomic weight': Object.keys(elements).length,
};
/** What the page says of whole tables, and where the data say it. */
const STATED: Readonly<Record<string, Group>> = {
  activity: read<Group>('activity.json'),
  physicalConstants: water.constants,
  waterDensity: water.density,
  permittivity: water.permittivity,
  ionProduct: water.ionProduct,
  roomAir: { ...air.carbonDioxide, source: air.carbonDioxide['roomAirSource'], obtained: air.carbonDioxide['roomAirObtained'] },
  carbonDioxideSolubility: air.carbonDioxide.solubility,
  waterVapour: air.waterVapour,
  apparentDensities: read<Group>('densities.json'),
  ionVolumes: { source: read<Group>('densities.json')['volumesSource'], obtained: read<Group>('densities.json')['volumesObtained'], form: read<Group>('densities.json')['volumesForm'] },
  atomicWeights: read<Group>('elements.json'),
};
const ALL = Object.values(COUNTS).reduce((sum, count) => sum + count, 0);

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

/** Opens the page in a profile of its own; errors of the page and breaches of its policy fail the visit. */
async function visit(steps: (page: Page) => Promise<void>, prepare?: (context: BrowserContext) => Promise<unknown>): Promise<void> {
  const context = await browser.newContext();
  const faults: string[] = [];
  await prepare?.(context);
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  page.on('pageerror', (error) => faults.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error') faults.push(message.text());
  });
  try {
    await page.goto(`${address}constants.html`, { waitUntil: 'networkidle' });
    await steps(page);
  } finally {
    await context.close();
  }
  assert.deepEqual(faults, []);
}

const lines = (page: Page) => page.getByRole('table', { name: 'Constants' }).locator('tbody').getByRole('row');
const count = (page: Page, text: string | RegExp) => page.getByRole('status').filter({ hasText: text }).waitFor();
const search = (page: Page, text: string) => page.getByRole('searchbox', { name: 'Search the constants' }).fill(text);

describe('page of constants', () => {
  it('says of whole tables what the data say', async () => {
    const { provenance } = (await beside('../../demo/constants-provenance.js')) as { provenance: Record<string, Group> };
    assert.deepEqual(Object.keys(provenance), Object.keys(STATED));
    for (const [table, said] of Object.entries(provenance)) {
      for (const [key, text] of Object.entries(said)) assert.equal(text, STATED[table]![key], `${table}.${key}`);
    }
  });

  it('shows as many constants as the data hold, of every kind', () => visit(async (page) => {
    await count(page, `${ALL} constants, the first ${FIRST} shown.`);
    assert.equal(await lines(page).count(), FIRST);
    await page.getByRole('button', { name: `Show all ${ALL}` }).click();
    assert.equal(await lines(page).count(), ALL);
    const kinds = await page.locator('tbody small').allInnerTexts();
    assert.deepEqual(Object.fromEntries(Object.keys(COUNTS).map((kind) => [kind, kinds.filter((found) => found === kind).length])), COUNTS);
    const cells = await page.locator('tbody td').allInnerTexts();
    assert.deepEqual([...new Set(cells.filter((text) => text === '' || /undefined|\bNaN\b|\[object/.test(text)))], []);
  }));

  it('finds constants as is typed and announces how many', () => visit(async (page) => {
    const phosphoric = families.find(({ key }) => key === 'phosphoric')!;
    await search(page, 'phosphoric acid: pKa');
    await count(page, `of ${ALL} constants match`);
    const found = await lines(page).allInnerTexts();
    for (const { pKa } of phosphoric.steps) assert.ok(found.some((text) => text.includes(String(pKa))), String(pKa));
    assert.ok(found.every((text) => text.includes('phosphoric acid: ')));

    const aluminium = metals.find(({ key }) => key === 'Al')!.hydrolysis.find(({ id }) => id === 'AlOH+2')!;
    for (const typed of [String(aluminium.logK), String(aluminium.logK).replace('-', '−')]) {
      await search(page, `hydrolysis ${typed}`);
      await count(page, /^\d+ of/);
      assert.ok((await lines(page).allInnerTexts()).some((text) => text.includes('AlOH')));
    }

    await search(page, 'no such constant');
    await count(page, `0 of ${ALL} constants match.`);
    await search(page, '');
    await count(page, `${ALL} constants, the first ${FIRST} shown.`);
  }));

  it('sorts by plain buttons, from the keyboard', () => visit(async (page) => {
    await search(page, 'Acid step');
    const head = page.getByRole('columnheader', { name: 'Value' });
    const values = async (): Promise<number[]> => (await page.locator('tbody td:nth-child(3)').allInnerTexts()).map((text) => Number(text.replace('−', '-')));
    await head.getByRole('button').focus();
    await page.keyboard.press('Enter');
    await count(page, 'Sorted by value, ascending.');
    assert.equal(await head.getAttribute('aria-sort'), 'ascending');
    const ascending = await values();
    assert.deepEqual(ascending, [...ascending].sort((a, b) => a - b));
    await page.keyboard.press('Space');
    await count(page, 'Sorted by value, descending.');
    const descending = await values();
    assert.deepEqual(descending, [...descending].sort((a, b) => b - a));
    assert.equal(await page.locator('[aria-sort]').count(), 1);
  }));

  it('fits 320 px and passes the accessibility rules, light and dark, wide and narrow', () => visit(
    async (page) => {
      for (const width of [320, 1000, 1280]) {
        await page.setViewportSize({ width, height: 800 });
        assert.equal(await page.evaluate(() => document.documentElement.scrollWidth), width);
        assert.equal(await page.evaluate(() => { const { left, right } = document.querySelector('#constants')!.getBoundingClientRect(); return left >= 0 && right <= innerWidth; }), true, `the table in ${width} px`);
        for (const colorScheme of ['light', 'dark'] as const) {
          await page.emulateMedia({ colorScheme });
          const violations = await page.evaluate(async (tags) => {
            const { axe } = globalThis as unknown as { axe: { run(context: Document, options: object): Promise<{ violations: { id: string; nodes: { target: unknown }[] }[] }> } };
            const result = await axe.run(document, { runOnly: tags });
            return result.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => JSON.stringify(target)).join(' ')}`);
          }, WCAG);
          assert.deepEqual(violations, [], `${width} px, ${colorScheme}`);
        }
      }
      assert.equal(await lines(page).count(), FIRST, 'laid out as blocks, the rows keep their roles');
    },
    (context) => context.addInitScript({ path: AXE }),
  ));
});
