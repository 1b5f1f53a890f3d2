import { expect } from '@open-wc/testing';
import { SolutePredictionEvent, SoluteProblemEvent, type SoluteCard } from '../../src/index.js';
import { ACIDIC, addCard, BASIC, listen, makeCard, UNKNOWN } from './support.js';

describe('events of solute-card', () => {
  it('announces each distinct result once, with the state already set', async () => {
    const states: string[] = [];
    const heard = listen();
    const onPrediction = (event: Event) => {
      const card = event.target as SoluteCard;
      states.push(card.state);
      expect(card.record).to.equal((event as SolutePredictionEvent).detail.record);
    };
    document.addEventListener('solute-prediction', onPrediction);
    const card = await makeCard({ solutes: ACIDIC });
    card.solutes = BASIC;
    await card.predictionComplete;
    card.setAttribute('solutes', BASIC);
    await card.predictionComplete;
    card.expanded = 'equations';
    await card.updateComplete;
    const parent = card.parentElement!;
    card.remove();
    parent.append(card);
    await card.updateComplete;
    heard.stop();
    document.removeEventListener('solute-prediction', onPrediction);
    expect(heard.events.map(({ type }) => type)).to.deep.equal(['solute-prediction', 'solute-prediction']);
    expect(states).to.deep.equal(['predicted', 'predicted']);
    expect(heard.events[0]).to.be.instanceOf(SolutePredictionEvent).and.to.be.instanceOf(CustomEvent);
    expect(heard.events[0]!.detail).to.include({ source: 'programmatic' });
  });

  it('announces problems once and says which', async () => {
    const heard = listen();
    const card = await makeCard({ solutes: UNKNOWN });
    card.label = 'Renamed';
    await card.predictionComplete;
    heard.stop();
    expect(heard.events).to.have.length(1);
    expect(heard.events[0]).to.be.instanceOf(SoluteProblemEvent);
    expect((heard.events[0] as SoluteProblemEvent).detail.problems[0]!.code).to.equal('substance-unknown');
    expect(card.problems).to.deep.equal((heard.events[0] as SoluteProblemEvent).detail.problems);
  });

  it('fires nothing for an empty card', async () => {
    const heard = listen();
    await makeCard();
    heard.stop();
    expect(heard.events).to.have.length(0);
  });

  it('is heard at the document from inside another shadow root', async () => {
    const host = document.createElement('div');
    host.attachShadow({ mode: 'open' });
    document.body.append(host);
    const heard = listen();
    await addCard(host.shadowRoot!, { solutes: ACIDIC });
    heard.stop();
    expect(heard.events).to.have.length(1);
    expect(heard.events[0]!.bubbles && heard.events[0]!.composed).to.equal(true);
    host.remove();
  });

  it('restores a stored record: input shown, predicted anew, source restore, nothing to store again', async () => {
    const stored = (await makeCard({ solutes: BASIC, label: 'Stored', temperature: '18', air: 'equilibrated' })).record!;
    const card = await makeCard({ solutes: ACIDIC });
    const heard = listen();
    card.restore(JSON.parse(JSON.stringify(stored)) as typeof stored);
    await card.predictionComplete;
    expect(card.record).to.deep.equal(stored);
    card.restore(stored);
    await card.predictionComplete;
    card.solutes = ACIDIC;
    await card.predictionComplete;
    heard.stop();
    expect(heard.events.map(({ type, detail }) => [type, (detail as { source: string }).source])).to.deep.equal([
      ['solute-prediction', 'restore'],
      ['solute-prediction', 'programmatic'],
    ]);
  });
});
