import { expect, waitUntil } from '@open-wc/testing';
import { ACIDIC, addCard, BASIC, makeCard, part } from '../elements/support.js';

async function makeFrame(): Promise<HTMLIFrameElement> {
  const frame = document.createElement('iframe');
  document.body.append(frame);
  await new Promise((resolve) => setTimeout(resolve, 50));
  return frame;
}

const isStyled = (card: Element) => {
  const view = card.ownerDocument.defaultView!;
  return view.getComputedStyle(part(card, 'card')!).display === 'grid' && view.getComputedStyle(card).display === 'block';
};

describe('solute-card and documents', () => {
  it('keeps its styles when it moves into a frame and back', async () => {
    const frame = await makeFrame();
    const card = await makeCard({ solutes: ACIDIC });
    const home = card.parentElement!;
    frame.contentDocument!.body.append(card);
    await card.updateComplete;
    expect(isStyled(card)).to.equal(true);
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(part(card, 'classification')!.textContent).to.contain('basic');
    home.append(card);
    await card.updateComplete;
    expect(isStyled(card)).to.equal(true);
    frame.remove();
  });

  it('can be first connected in a frame', async () => {
    const frame = await makeFrame();
    const card = await addCard(frame.contentDocument!.body, { solutes: ACIDIC });
    expect(card.state).to.equal('predicted');
    expect(isStyled(card)).to.equal(true);
    frame.remove();
  });

  it('waits in a document without a window and shows its result when adopted', async () => {
    const inert = document.implementation.createHTMLDocument('');
    const card = document.createElement('solute-card');
    card.setAttribute('solutes', ACIDIC);
    inert.body.append(card);
    await card.predictionComplete;
    document.body.append(card);
    await card.predictionComplete;
    expect(isStyled(card)).to.equal(true);
    expect(card.state).to.equal('predicted');
    card.remove();
  });
});

describe('solute-card and hosts that rewrite the page', () => {
  it('survives that all attributes are stripped and put back', async () => {
    const card = await makeCard({ solutes: ACIDIC, label: 'Morphed', expanded: 'equations', name: 'result', required: true });
    const kept = [...card.attributes].map(({ name, value }) => [name, value] as const);
    for (const [name] of kept) card.removeAttribute(name);
    await card.predictionComplete;
    expect(card.state).to.equal('empty');
    for (const [name, value] of kept) card.setAttribute(name, value);
    await card.predictionComplete;
    expect(card.state).to.equal('predicted');
    expect([...card.attributes].map(({ name, value }) => [name, value])).to.deep.equal(kept);
  });

  it('adds no attribute of its own', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    expect(card.getAttributeNames()).to.deep.equal(['solutes']);
  });

  it('is serialized with its content, which is rendered anew when parsed', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    if (!('getHTML' in card)) return;
    const markup = card.parentElement!.getHTML({ serializableShadowRoots: true });
    expect(markup).to.contain('acidic');
    const parent = document.createElement('div');
    document.body.append(parent);
    parent.setHTMLUnsafe(markup);
    const again = parent.querySelector('solute-card')!;
    // Firefox upgrades what was parsed a moment later.
    await waitUntil(() => again.hasUpdated);
    expect(again.shadowRoot!.querySelectorAll('[part~="card"]')).to.have.length(1);
    parent.remove();
  });

  it('renders inside another shadow root', async () => {
    const host = document.createElement('section');
    document.body.append(host);
    const card = await addCard(host.attachShadow({ mode: 'closed' }), { solutes: ACIDIC });
    expect(isStyled(card)).to.equal(true);
    host.remove();
  });
});
