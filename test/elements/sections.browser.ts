import { aTimeout, expect } from '@open-wc/testing';
import { emulateMedia } from '@web/test-runner-commands';
import type { SoluteCard } from '../../src/index.js';
import { ACIDIC, BASIC, isChromium, makeCard, part } from './support.js';

const SECTIONS = ['equations', 'composition', 'constants'] as const;
const section = (card: SoluteCard, name: string) => part(card, `section-${name}`)!;
const summary = (card: SoluteCard, name: string) => section(card, name).querySelector<HTMLButtonElement>('[part~="summary"]')!;
const openSections = (card: SoluteCard) => SECTIONS.filter((name) => {
  const { height } = section(card, name).querySelector('.section-content')!.getBoundingClientRect();
  expect(summary(card, name).getAttribute('aria-expanded')).to.equal(String(height > 0));
  return height > 0;
});

async function toggle(card: SoluteCard, name: string): Promise<void> {
  summary(card, name).click();
  await card.updateComplete;
}

describe('sections of solute-card', () => {
  it('start closed, or open as the attribute says', async () => {
    expect(openSections(await makeCard({ solutes: ACIDIC }))).to.deep.equal([]);
    const card = await makeCard({ solutes: ACIDIC, expanded: 'constants equations' });
    expect(openSections(card)).to.deep.equal(['equations', 'constants']);
    card.expanded = 'composition';
    await card.updateComplete;
    expect(openSections(card)).to.deep.equal(['composition']);
  });

  it('open with their content, keep what is above in place, and stay open for the next result', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    const before = part(card, 'value')!.getBoundingClientRect().top;
    await toggle(card, 'composition');
    expect(openSections(card)).to.deep.equal(['composition']);
    expect(section(card, 'composition').querySelectorAll('tbody tr').length).to.equal(card.prediction!.species.length);
    expect(part(card, 'value')!.getBoundingClientRect().top).to.equal(before);
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(openSections(card)).to.deep.equal(['composition']);
    expect(section(card, 'composition').querySelectorAll('tbody tr').length).to.equal(card.prediction!.species.length);
    await toggle(card, 'composition');
    expect(openSections(card)).to.deep.equal([]);
  });

  it('set equations with subscripts for the eye and names for the ear', async () => {
    const card = await makeCard({ solutes: '20 mmol/L Al2(SO4)3', expanded: 'equations' });
    const decisive = part(card, 'equation-decides')!;
    expect(decisive.querySelector('.visually-hidden')!.textContent).to.match(/is in equilibrium with .*; decides the pH\.$/);
    expect(decisive.querySelectorAll('sub').length).to.be.greaterThan(0);
    expect(decisive.querySelector('.reaction')!.getAttribute('aria-hidden')).to.equal('true');
    expect(decisive.querySelector('.constant')!.textContent).to.match(/^log10 \*β = −\d\.\d\d$/);
    expect(decisive.querySelector('.visually-hidden')!.textContent).to.contain('log10 *β is minus ');
    const dissolution = part(card, 'equation')!.querySelector('.reaction')!;
    expect(dissolution.textContent.replace(/\s+/g, ' ').trim()).to.equal('Al2(SO4)3 → 2 Al3+ + 3 SO42−');
  });

  it('quote a proton transfer with K and pK, and complexes under a heading of their own by their logarithm', async () => {
    const card = await makeCard({ solutes: '8 mmol/L CuSO4; 0.15 mol/L NH3', expanded: 'equations' });
    const shown = section(card, 'equations');
    const titles = [...shown.querySelectorAll('.group-title')].map(({ textContent }) => textContent);
    expect(titles).to.include.members(['On dissolving', 'With water', 'Complexes']);
    const complexes = [...shown.querySelectorAll('.equations')][titles.indexOf('Complexes')]!;
    expect(complexes.querySelector('.constant')!.textContent).to.match(/^log10 β = \d+\.\d\d$/);
    const facts = [...shown.querySelectorAll('.constant')].map(({ textContent }) => textContent.replace(/\s+/g, ' ').trim());
    expect(facts.some((fact) => /^Kb = \d\.\d × 10−\d \(pKb \d\.\d\d\)$/.test(fact)), facts.join('; ')).to.equal(true);
    expect(card.toHTML()).to.match(/\(log10 β \d+\.\d\d\)/);
  });

  it('show the source of each constant and what the uncertainty is made of', async () => {
    const card = await makeCard({ solutes: ACIDIC, expanded: 'constants' });
    const text = section(card, 'constants').textContent;
    for (const { citation } of card.prediction!.constants) expect(text).to.contain(citation);
    expect(part(card, 'budget-table')!.querySelectorAll('tbody tr').length).to.equal(Math.min(8, card.prediction!.uncertaintyBudget.length));
  });

  it('are all open on paper and as before afterwards', async () => {
    const card = await makeCard({ solutes: ACIDIC, expanded: 'equations' });
    window.dispatchEvent(new Event('beforeprint'));
    expect(openSections(card)).to.deep.equal([...SECTIONS]);
    expect(section(card, 'composition').querySelectorAll('tbody tr').length).to.be.greaterThan(0);
    await aTimeout(20);
    window.dispatchEvent(new Event('afterprint'));
    await aTimeout(20);
    expect(openSections(card)).to.deep.equal(['equations']);
  });

  it('print black on white without a button', async function () {
    if (!isChromium) this.skip();
    const card = await makeCard({ solutes: ACIDIC, label: 'Paper' });
    await emulateMedia({ media: 'print' });
    try {
      await aTimeout(50);
      expect(openSections(card)).to.deep.equal([...SECTIONS]);
      const style = getComputedStyle(part(card, 'card')!);
      expect([style.color, style.backgroundColor, style.breakInside]).to.deep.equal(['rgb(0, 0, 0)', 'rgb(255, 255, 255)', 'avoid']);
      expect(getComputedStyle(part(card, 'store')!).display).to.equal('none');
    } finally {
      await emulateMedia({ media: 'screen' });
    }
    await aTimeout(50);
    expect(openSections(card)).to.deep.equal([]);
  });

  it('leave no listener behind when the last card goes', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    card.remove();
    window.dispatchEvent(new Event('beforeprint'));
    expect(openSections(card)).to.deep.equal([]);
    window.dispatchEvent(new Event('afterprint'));
  });
});
