import assert from 'node:assert/strict';
import { test } from 'node:test';
import { launch, servePages } from './bundled-page.js';

const FRAME = `<!doctype html><html lang="en"><title>Sandboxed</title><body>
  <solute-card label="Framed" solutes="0.12 mol/L NH4Br"></solute-card>
  <script type="module" src="/elements.js"></script>
  <script type="module">
    const card = document.querySelector('solute-card');
    await card.predictionComplete;
    parent.postMessage({ state: card.state, text: card.toText(), display: getComputedStyle(card.shadowRoot.querySelector('[part~=card]')).display, origin: self.origin }, '*');
  </script>`;
const PAGE = `<!doctype html><html lang="en"><title>Host</title><body>
  <script>addEventListener('message', ({ data }) => { globalThis.answer = data; });</script>
  <iframe sandbox="allow-scripts" src="/frame"></iframe>`;

test('a card predicts and is styled in a sandboxed frame without origin or storage', { timeout: 120_000 }, async () => {
  const { server, address } = await servePages({ '/': PAGE, '/frame': FRAME });
  const browser = await launch();
  try {
    const page = await browser.newPage();
    const faults: string[] = [];
    page.on('pageerror', ({ message }) => faults.push(message));
    await page.goto(address);
    await page.waitForFunction('globalThis.answer !== undefined', undefined, { timeout: 60_000 });
    const answer = await page.evaluate<{ state: string; text: string; display: string; origin: string }>('globalThis.answer');
    assert.equal(answer.origin, 'null');
    assert.equal(answer.state, 'predicted');
    assert.equal(answer.display, 'grid');
    assert.match(answer.text, /^Framed\.\npH \d\.\d\d ± /);
    assert.deepEqual(faults, []);
  } finally {
    await browser.close();
    server.close();
  }
});

test('what a screen reader finds in a card', { timeout: 120_000 }, async () => {
  const { server, address } = await servePages({
    '/': `<!doctype html><html lang="en"><title>Tree</title><body><solute-card label="Bath 3" solutes="0.12 mol/L NH4Br" expanded="equations"></solute-card><script type="module" src="/elements.js"></script>`,
  });
  const browser = await launch();
  try {
    const page = await browser.newPage();
    await page.goto(address);
    await page.locator('solute-card').getByRole('button').first().waitFor();
    const tree = await page.locator('solute-card').ariaSnapshot();
    for (const expected of [
      /group "Bath 3"/,
      /list "Understood as"/,
      /p H \d\.\d\d, plus or minus 0\.\d\d/,
      /img "Scale from 0 to 14\. Prediction at/,
      /button "Store result"/,
      /ammonium plus water is in equilibrium with ammonia plus .*; decides the pH\./,
      /status/,
    ]) assert.match(tree, expected, tree);
    assert.doesNotMatch(tree, /⇌|₄/, 'formulas are said as words');
  } finally {
    await browser.close();
    server.close();
  }
});
