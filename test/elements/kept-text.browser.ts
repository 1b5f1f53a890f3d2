import { expect } from '@open-wc/testing';
import { ACIDIC, BASIC, makeCard, NEUTRAL } from './support.js';
import type { SoluteCard } from '../../src/index.js';

describe('keep-text', () => {
  it('writes the result into a child of its own and touches no other', async () => {
    const parent = document.createElement('div');
    document.body.append(parent);
    const card = document.createElement('solute-card');
    const note = Object.assign(document.createElement('em'), { textContent: 'by the author' });
    card.append(note, ' and text');
    card.setAttribute('solutes', ACIDIC);
    card.keepText = true;
    parent.append(card);
    await card.predictionComplete;
    const own = card.querySelector('[data-solute-text]')!;
    expect(own.textContent).to.equal(card.toText());
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(card.querySelector('[data-solute-text]')).to.equal(own);
    expect(own.textContent).to.contain('basic');
    expect(card.firstChild).to.equal(note);
    expect(card.childNodes).to.have.length(3);
    card.keepText = false;
    await card.updateComplete;
    expect(card.querySelector('[data-solute-text]')).to.equal(null);
    expect(card.textContent).to.equal('by the author and text');
    parent.remove();
  });

  it('survives a page saved by outerHTML, without a second node', async () => {
    const card = await makeCard({ solutes: NEUTRAL, 'keep-text': true, label: 'Saved' });
    const saved = card.outerHTML;
    expect(saved).to.contain(`pH ${card.prediction!.pH.toFixed(card.prediction!.uncertainty < 0.005 ? 3 : 2)}`);
    const opened = new DOMParser().parseFromString(saved, 'text/html').body.firstElementChild!;
    const again = document.importNode(opened, true) as SoluteCard;
    document.body.append(again);
    await again.predictionComplete;
    expect(again.querySelectorAll('[data-solute-text]')).to.have.length(1);
    expect(again.outerHTML).to.equal(saved);
    again.remove();
  });

  it('leaves the light DOM alone when it is off', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    expect(card.childNodes).to.have.length(0);
  });

  it('is not rendered while the card is defined', async () => {
    const card = await makeCard({ solutes: ACIDIC, 'keep-text': true });
    expect(card.querySelector('[data-solute-text]')!.getClientRects()).to.have.length(0);
  });
});
