/**
 * Takes the pictures of this folder from the built package:
 *
 *   npm run build && node demo/pictures/take.mjs [name ...]      name: of a picture without .png; all by default
 *
 * Exits 1 when a picture is larger than a page of text should carry.
 */
import { statSync } from 'node:fs';
import { join } from 'node:path';
import { chromium } from 'playwright-core';
import { ensureChromium } from '../../test/tools/ensure-browser.mjs';
import { startServer } from '../serve.mjs';

const LARGEST = 120_000;
const SCALE = 1.5;

/** Cards alone: their attributes, the width they get, and what the reader prefers. */
const CARDS = {
  'card-expanded': { width: 640, attributes: { label: 'Feed line, tank 4', solutes: '0.10 mol/L NH4Cl', expanded: 'equations' } },
  'card-compact': { width: 640, attributes: { label: 'P-rinse', solutes: '9.0 g/L Na2HPO4·12H2O; 1.9 g/L KH2PO4' } },
  'card-problem': { width: 640, attributes: { label: 'Trace stock', solutes: '0.022 g/L ZnSO4·7H2O; 0.2 % MnCl2·4H2O' } },
  'card-dark': { width: 640, media: { colorScheme: 'dark' }, attributes: { label: 'Feed line, tank 4', solutes: '0.10 mol/L NH4Cl', expanded: 'equations' } },
  'card-narrow': { width: 280, attributes: { label: 'Copper dip', solutes: '4.5 g/L CuSO4·5H2O' } },
  'card-metal': { width: 640, attributes: { label: 'Flocculant', solutes: '0.05 mol/L AlCl3', expanded: 'equations composition' } },
  'card-neutral': { width: 640, attributes: { label: 'N-stock', solutes: '37.5 g/L NaNO3' } },
  'card-basic': { width: 640, attributes: { label: 'Formate wash', solutes: '0.35 mol/L sodium formate' } },
  'card-print': { width: 640, media: { media: 'print' }, attributes: { label: 'Ammonia probe check', solutes: '60 mmol/L NH4Cl; 45 mmol/L NH3' } },
};

const FRAME = `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="color-scheme" content="light dark"><title>Card</title>
<style>body { margin: 0 } main { padding: 12px; inline-size: max-content; background: light-dark(#fff, #0d1012) }
solute-card { margin: 0; max-inline-size: none; content-visibility: visible } @media print { main { background: #fff } }</style>
<script type="module" src="/dist/solute-card.min.js"></script><main><solute-card></solute-card></main></html>`;

const wanted = process.argv.slice(2);
const isWanted = (name) => wanted.length === 0 || wanted.includes(name);
const pathOf = (name) => join(import.meta.dirname, `${name}.png`);
const taken = [];

const { server, address } = await startServer(0);
const browser = await chromium.launch({ executablePath: ensureChromium(), args: process.getuid?.() === 0 ? ['--no-sandbox'] : [] });

async function openPage(media, url, viewport) {
  const page = await browser.newPage({ viewport, deviceScaleFactor: SCALE });
  await page.emulateMedia({ colorScheme: 'light', ...media });
  await page.route(`${address}frame`, (route) => route.fulfill({ contentType: 'text/html', body: FRAME }));
  await page.goto(`${address}${url}`, { waitUntil: 'networkidle' });
  return page;
}

async function takeCard(name, { width, media, attributes }) {
  const page = await openPage(media, 'frame', { width: width + 200, height: 900 });
  await page.evaluate(async ([size, given]) => {
    const card = document.querySelector('solute-card');
    card.style.inlineSize = `${size}px`;
    for (const [attribute, value] of Object.entries(given)) card.setAttribute(attribute, value);
    await card.predictionComplete;
  }, [width, attributes]);
  await page.waitForTimeout(500);
  await page.locator('main').screenshot({ path: pathOf(name) });
  await page.close();
  taken.push(name);
}

/** The intake page as it stands after a sample was stored and the next one was typed. */
async function takeIntake() {
  const page = await openPage({}, 'intake.html', { width: 1120, height: 900 });
  const enter = async (sample, solutes) => {
    await page.getByLabel('Sample number').fill(sample);
    await page.getByLabel('What was dissolved').fill(solutes);
    await page.waitForFunction(([label, typed]) => {
      const { record } = document.querySelector('solute-card');
      return record?.label === label && record.solutes === typed;
    }, [sample, solutes]);
    await page.locator('solute-card').getByRole('button', { name: 'Store result' }).click();
    await page.locator('#status', { hasText: `${sample} stored as` }).waitFor();
  };
  await enter('SD-0411', '3.2 g/L FeCl3·6H2O');
  await enter('SD-0412', '0.10 mol/L NH4Cl');
  await page.evaluate(() => document.activeElement.blur());
  await page.mouse.move(0, 0);
  await page.waitForTimeout(500);
  await page.screenshot({ path: pathOf('intake'), fullPage: true });
  await page.close();
  taken.push('intake');
}

try {
  for (const [name, card] of Object.entries(CARDS)) if (isWanted(name)) await takeCard(name, card);
  if (isWanted('intake')) await takeIntake();
} finally {
  await browser.close();
  server.close();
}
for (const name of taken) {
  const { size } = statSync(pathOf(name));
  console.log(`${name}.png ${Math.round(size / 1000)} kB`);
  if (size > LARGEST) {
    console.error(`${name}.png is larger than ${LARGEST / 1000} kB`);
    process.exitCode = 1;
  }
}
