import { expect, fixture, html } from '@open-wc/testing';
import type { SoluteCard, SoluteConditions } from '../../src/index.js';
import { NEUTRAL, part } from './support.js';

async function makePage(): Promise<{ outer: SoluteConditions; inner: SoluteConditions; cards: SoluteCard[] }> {
  const outer = await fixture<SoluteConditions>(html`
    <solute-conditions temperature="18" air="equilibrated">
      <solute-card solutes=${NEUTRAL}></solute-card>
      <solute-conditions temperature="40">
        <p><solute-card solutes=${NEUTRAL}></solute-card></p>
        <solute-card solutes=${NEUTRAL} temperature="5" air="excluded"></solute-card>
      </solute-conditions>
    </solute-conditions>
  `);
  const cards = [...outer.querySelectorAll('solute-card')];
  await Promise.all(cards.map((card) => card.predictionComplete));
  return { outer, inner: outer.querySelector('solute-conditions')!, cards };
}

const stated = (card: SoluteCard) => [card.prediction!.conditions.temperature, card.prediction!.conditions.air];

describe('solute-conditions', () => {
  it('holds for the cards below, inner over outer, the card over both', async () => {
    const { cards } = await makePage();
    expect(cards.map(stated)).to.deep.equal([[18, 'equilibrated'], [40, 'equilibrated'], [5, 'excluded']]);
  });

  it('can be changed at run time', async () => {
    const { outer, inner, cards } = await makePage();
    outer.air = 'excluded';
    inner.setAttribute('temperature', '37 °C');
    await Promise.all([outer.updateComplete, inner.updateComplete]);
    await Promise.all(cards.map((card) => card.predictionComplete));
    expect(cards.map(stated)).to.deep.equal([[18, 'excluded'], [37, 'excluded'], [5, 'excluded']]);
    inner.removeAttribute('temperature');
    await inner.updateComplete;
    await cards[1]!.predictionComplete;
    expect(stated(cards[1]!)).to.deep.equal([18, 'excluded']);
  });

  it('provides whether solids may form', async () => {
    const outer = await fixture<SoluteConditions>(html`<solute-conditions solids="equilibrated"><solute-card solutes="1 mol/kg Ca(OH)2"></solute-card></solute-conditions>`);
    const card = outer.querySelector('solute-card')!;
    await card.predictionComplete;
    expect(card.prediction!.conditions.solids).to.equal('equilibrated');
    outer.solids = 'perhaps';
    await outer.updateComplete;
    await card.predictionComplete;
    expect(card.prediction!.conditions.solids).to.equal('watched');
    expect(part(outer, 'notes')!.textContent).to.contain('perhaps').and.to.contain('watched, equilibrated');
  });

  it('lets go of a card that is moved out', async () => {
    const { outer, cards } = await makePage();
    outer.after(cards[0]!);
    await cards[0]!.predictionComplete;
    expect(stated(cards[0]!)).to.deep.equal([25, 'excluded']);
    outer.append(cards[0]!);
    await cards[0]!.predictionComplete;
    expect(stated(cards[0]!)).to.deep.equal([18, 'equilibrated']);
  });

  it('notes a setting that is not understood and goes on with the outer one', async () => {
    const { inner, cards } = await makePage();
    inner.temperature = 'tepid';
    await inner.updateComplete;
    await cards[1]!.predictionComplete;
    expect(part(inner, 'notes')!.textContent).to.contain('tepid');
    expect(stated(cards[1]!)).to.deep.equal([18, 'equilibrated']);
  });
});
