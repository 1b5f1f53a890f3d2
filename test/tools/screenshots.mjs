/**
 * Takes pictures of the demo pages, light, dark, 320 px wide and in print:
 *
 *   node test/tools/screenshots.mjs <folder> [page ...]      page: the name of a demo page without .html
 *
 * Exits 1 when a page breaks its content security policy, logs an error, or scrolls sideways at 320 px.
 */
import { mkdirSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { chromium } from 'playwright-core';
import { startServer } from '../../demo/serve.mjs';
import { ensureChromium } from './ensure-browser.mjs';

const [folder, ...named] = process.argv.slice(2);
if (!folder) {
  console.error('usage: node test/tools/screenshots.mjs <folder> [page ...]');
  process.exit(1);
}
const demo = join(import.meta.dirname, '..', '..', 'demo');
const pages = named.length > 0 ? named : readdirSync(demo).filter((name) => name.endsWith('.html')).map((name) => name.slice(0, -5));

const WIDE = { width: 1280, height: 900 };
const STATES = {
  light: { viewport: WIDE, media: { colorScheme: 'light' } },
  dark: { viewport: WIDE, media: { colorScheme: 'dark' } },
  narrow: { viewport: { width: 320, height: 800 }, media: { colorScheme: 'light' } },
  print: { viewport: WIDE, media: { media: 'print', colorScheme: 'light' } },
};

mkdirSync(folder, { recursive: true });
const { server, address } = await startServer(0);
const browser = await chromium.launch({
  executablePath: ensureChromium(),
  args: process.getuid?.() === 0 ? ['--no-sandbox'] : [],
});
const faults = [];
try {
  for (const name of pages) {
    for (const [state, { viewport, media }] of Object.entries(STATES)) {
      const page = await browser.newPage({ viewport });
      const fault = (text) => faults.push(`${name}, ${state}: ${text}`);
      page.on('pageerror', (error) => fault(error.message));
      page.on('console', (message) => {
        if (message.type() === 'error') fault(message.text());
      });
      await page.emulateMedia(media);
      await page.goto(`${address}${name}.html`, { waitUntil: 'networkidle' });
      const width = await page.evaluate(() => document.documentElement.scrollWidth);
      if (width > viewport.width) fault(`the page is ${width} px wide in a window of ${viewport.width} px`);
      // Cards far from the window are not drawn unless they are told to.
      await page.evaluate(() => {
        for (const card of document.querySelectorAll('solute-card')) card.style.contentVisibility = 'visible';
      });
      await page.waitForTimeout(300);
      const path = join(folder, `${name}-${state}.png`);
      await page.screenshot({ path, fullPage: true });
      console.log(path);
      await page.close();
    }
  }
} finally {
  await browser.close();
  server.close();
}
for (const text of faults) console.error(text);
if (faults.length > 0) process.exitCode = 1;
