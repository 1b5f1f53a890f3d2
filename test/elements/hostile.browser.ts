import { expect } from '@open-wc/testing';
import { makeCard, part } from './support.js';

const MARKUP = '<img src=x onerror="globalThis.soluteBroken = true"><script>globalThis.soluteBroken = true</script>';

describe('text from outside', () => {
  it('is never markup, in label, solutes and settings', async () => {
    for (const attributes of [
      { label: MARKUP, solutes: '0.1 mol/L KCl', 'keep-text': true },
      { label: MARKUP, solutes: `0.1 mol/L ${MARKUP}`, 'keep-text': true },
      { solutes: '0.1 mol/L KCl', temperature: MARKUP, air: MARKUP, expanded: MARKUP },
      { solutes: JSON.stringify([{ substance: MARKUP, amount: MARKUP }]) },
    ]) {
      const card = await makeCard(attributes);
      expect(card.shadowRoot!.querySelector('img, script')).to.equal(null);
      expect(card.querySelector('img, script')).to.equal(null);
      const written = document.createElement('template');
      written.innerHTML = card.toHTML();
      expect(written.content.querySelector('img, script')).to.equal(null);
      expect(written.content.textContent).not.to.contain('undefined');
    }
    expect('soluteBroken' in globalThis).to.equal(false);
  });

  it('cannot turn the direction of the page or break the layout', async () => {
    const card = await makeCard({ label: `\u202e${'x'.repeat(5000)}`, solutes: `0.1 mol/L \u202e${'Na'.repeat(2000)}` });
    expect(card.state).to.equal('problem');
    expect(card.scrollWidth).to.be.at.most(card.clientWidth);
  });

  it('of a stored record is input like any other', async () => {
    const card = await makeCard();
    const forged = JSON.parse(`{"format":"solute-record/1","solutes":${JSON.stringify(MARKUP)},"label":${JSON.stringify(MARKUP)},"conditions":{"temperature":"${'x'.repeat(100)}","air":{"a":1}},"pH":99}`) as never;
    card.restore(forged);
    await card.predictionComplete;
    expect(card.state).to.equal('problem');
    expect(part(card, 'notes')).not.to.equal(null);
    card.restore({} as never);
    await card.predictionComplete;
    expect(card.state).to.equal('empty');
  });
});
