import { expect } from '@open-wc/testing';
import { addCard, BASIC, makeCard, part, UNKNOWN } from './support.js';

const LONG = '40 mmol/L Al2(SO4)3·18H2O; 12 g/L trisodium citrate dihydrate; 0.1 mol/L (NH4)2Fe(SO4)2·6H2O';

describe('layout of solute-card', () => {
  for (const width of [240, 280, 480, 900]) {
    it(`fits ${width} px in every state`, async () => {
      const parent = document.createElement('div');
      parent.style.inlineSize = `${width}px`;
      document.body.append(parent);
      for (const attributes of [
        {}, { solutes: UNKNOWN }, { solutes: BASIC, label: 'Wide', temperature: 'warm' }, { solutes: LONG, expanded: 'equations composition constants' },
      ]) {
        const card = await addCard(parent, attributes);
        const right = card.getBoundingClientRect().right;
        for (const node of card.shadowRoot!.querySelectorAll('*:not(.visually-hidden)')) {
          if (node.closest('.visually-hidden, svg')) continue;
          expect(node.getBoundingClientRect().right, `${node.tagName} ${node.className} ${node.textContent.slice(0, 40)}`).to.be.at.most(right + 0.5);
        }
      }
      parent.remove();
    });
  }

  it('is hidden by the hidden attribute', async () => {
    const card = await makeCard({ solutes: BASIC, hidden: true });
    expect(card.getClientRects()).to.have.length(0);
  });

  it('keeps a width in a flex row', async () => {
    const row = document.createElement('div');
    row.style.display = 'flex';
    document.body.append(row);
    const card = await addCard(row, { solutes: BASIC });
    expect(card.getBoundingClientRect().width).to.be.greaterThan(200);
    row.remove();
  });

  it('mirrors in a page written from right to left, formulas and scale excepted', async () => {
    const card = await makeCard({ solutes: BASIC, dir: 'rtl', expanded: 'equations' });
    const frame = part(card, 'card')!.getBoundingClientRect();
    expect(frame.right - part(card, 'store-button')!.getBoundingClientRect().right).to.be.lessThan(40);
    expect(getComputedStyle(part(card, 'scale')!).direction).to.equal('ltr');
    expect(getComputedStyle(card.shadowRoot!.querySelector('.reaction')!).direction).to.equal('ltr');
  });

  it('follows public custom properties', async () => {
    const card = await makeCard({ solutes: BASIC });
    card.style.setProperty('--solute-surface', 'rgb(1, 2, 3)');
    card.style.setProperty('--solute-basic', 'rgb(4, 5, 6)');
    expect(getComputedStyle(part(card, 'card')!).backgroundColor).to.equal('rgb(1, 2, 3)');
    expect(getComputedStyle(part(card, 'classification')!).color).to.equal('rgb(4, 5, 6)');
  });

  it('follows the colour scheme of the page', async () => {
    const card = await makeCard({ solutes: BASIC });
    const background = () => getComputedStyle(part(card, 'card')!).backgroundColor;
    const light = background();
    card.style.colorScheme = 'dark';
    expect(background()).not.to.equal(light);
  });
});
