import { expect } from '@open-wc/testing';
import { ACIDIC, makeCard, part, shownText } from './support.js';

const SLURRY = '1 mol/kg Ca(OH)2';
const rows = (card: Element) => [...part(card, 'solids-table')!.querySelectorAll('tbody tr')].map(({ textContent }) => textContent.replace(/\s+/g, ' ').trim());

describe('solids', () => {
  it('only watched by default, are listed with their saturation index and how they form', async () => {
    const card = await makeCard({ solutes: SLURRY, expanded: 'composition' });
    expect(card.prediction!.conditions.solids).to.equal('watched');
    expect(rows(card)[0]).to.match(/^Ca\(OH\)2 calcium hydroxide.*, forms readily \+\d\.\d+ ?± \d\.\d+$/);
    expect(part(card, 'section-composition')!.querySelector('.count')!.textContent).to.match(/^\d+ species, \d+ solids?$/);
    expect(shownText(card)).not.to.contain('lies as solid');
  });

  it('lie in the vessel when they may form', async () => {
    const card = await makeCard({ solutes: SLURRY, solids: 'equilibrated', expanded: 'composition' });
    const amount = card.prediction!.solids[0]!.amount!;
    expect(rows(card)[0]).to.contain(`lies as solid: ${amount.toPrecision(3)} mol/kg`);
    expect(part(card, 'conditions')!.textContent).to.contain('solids let form');
    expect(card.toText()).to.contain('solids let form').and.to.contain(`Ca(OH)₂ (${card.prediction!.solids[0]!.name}) lies as solid: ${amount.toPrecision(3)} mol/kg.`);
    expect(card.toHTML()).to.contain('lies as solid');
  });

  it('have no table where none is near', async () => {
    const card = await makeCard({ solutes: ACIDIC, expanded: 'composition' });
    expect(part(card, 'solids-table')).to.equal(null);
  });

  it('name only those that are near', async () => {
    const card = await makeCard({ solutes: '50 mmol/L AlCl3', expanded: 'composition' });
    const near = card.prediction!.solids.filter(({ saturationIndex }) => saturationIndex > -1);
    expect(near.length).to.be.lessThan(card.prediction!.solids.length);
    expect(rows(card)).to.have.length(near.length);
    expect(rows(card).join()).to.match(/−0\.\d/).and.to.contain('only on ageing');
  });
});
