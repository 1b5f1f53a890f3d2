import { aTimeout, expect } from '@open-wc/testing';
import { emulateMedia, sendKeys } from '@web/test-runner-commands';
import { ACIDIC, BASIC, isChromium, makeCard, NEUTRAL, part, UNKNOWN } from './support.js';

const status = (card: Element) => [...card.shadowRoot!.querySelectorAll('[role="status"]')].at(-1)!.textContent.trim();

describe('accessibility of solute-card', () => {
  const states: Record<string, Record<string, string | boolean>> = {
    empty: {},
    problem: { solutes: `5 % KCl; ${UNKNOWN}`, label: 'Not to be predicted' },
    acidic: { solutes: '40 mmol/L AlCl3', label: 'Flocculant', expanded: 'equations composition constants' },
    neutral: { solutes: NEUTRAL },
    'basic with cautions': { solutes: '0.2 mol/L Na2S', label: 'Precipitant', expanded: 'equations' },
    'settings not understood': { solutes: BASIC, temperature: 'warm', air: 'stale' },
    disabled: { solutes: BASIC, disabled: true },
  };
  for (const [state, attributes] of Object.entries(states)) {
    it(`has no fault that axe finds: ${state}`, async () => {
      await expect(await makeCard(attributes)).to.be.accessible();
    });
  }

  it('has none in dark either', async function () {
    if (!isChromium) this.skip();
    await emulateMedia({ colorScheme: 'dark' });
    document.documentElement.style.colorScheme = 'dark';
    try {
      for (const solutes of [ACIDIC, NEUTRAL, '0.2 mol/L Na2S', UNKNOWN]) {
        await expect(await makeCard({ solutes, expanded: 'equations composition constants' })).to.be.accessible();
      }
    } finally {
      document.documentElement.style.colorScheme = '';
      await emulateMedia({ colorScheme: 'light' });
    }
  });

  it('is a group named by its label', async () => {
    const card = await makeCard({ solutes: ACIDIC, label: 'Named' });
    const group = part(card, 'card')!;
    expect(group.getAttribute('role')).to.equal('group');
    expect(card.shadowRoot!.getElementById(group.getAttribute('aria-labelledby')!)!.textContent).to.equal('Named');
    expect(card.hasAttribute('role') || card.hasAttribute('tabindex') || card.hasAttribute('aria-label')).to.equal(false);
  });

  it('announces new results, never the first', async () => {
    const card = await makeCard({ solutes: ACIDIC, label: 'Bath' });
    expect(status(card)).to.equal('');
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(status(card)).to.match(/^Bath: p H \d+\.\d+, plus or minus 0\.\d+, basic\./);
    card.solutes = UNKNOWN;
    await card.predictionComplete;
    expect(status(card)).to.contain('Bath: no prediction.');
  });

  it('describes the scale in words', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    expect(part(card, 'scale')!.querySelector('svg')!.getAttribute('aria-label')).to.match(
      /^Scale from 0 to 14\. Prediction at \d\.\d+, plus or minus 0\.\d+, \d\.\d+ below the neutral point 7\.00\./,
    );
  });

  it('widens the scale for a pH beyond it', async () => {
    const card = await makeCard({ solutes: '6 mol/L HCl' });
    expect(part(card, 'scale')!.querySelector('svg')!.getAttribute('aria-label')).to.match(/^Scale from −\d to 14/);
  });

  it('is worked by keyboard alone', async function () {
    if (!isChromium) this.skip();
    const card = await makeCard({ solutes: ACIDIC });
    card.shadowRoot!.querySelector('button')!.focus();
    await sendKeys({ press: 'Tab' });
    await sendKeys({ press: 'Enter' });
    await aTimeout(20);
    expect(part(card, 'section-open')).to.equal(part(card, 'section-equations'));
  });
});
