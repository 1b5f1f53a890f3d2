import { aTimeout, expect } from '@open-wc/testing';
import type { SoluteCard, SoluteStoreEvent } from '../../src/index.js';
import { ACIDIC, BASIC, makeCard, part, UNKNOWN } from './support.js';

const press = async (card: SoluteCard) => {
  part(card, 'store-button')!.click();
  await card.updateComplete;
};
const stateText = (card: SoluteCard) => part(card, 'store-state')!.textContent.trim();

/** Lets the card follow a promise that has settled. */
const settle = async (card: SoluteCard) => {
  await aTimeout(0);
  await card.updateComplete;
};

describe('storing', () => {
  it('announces to the page when nobody takes charge', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    let detail: SoluteStoreEvent['detail'] | undefined;
    card.addEventListener('solute-store', (event) => (detail = event.detail));
    await press(card);
    expect(detail!.record).to.equal(card.record);
    expect(detail!.source).to.equal('user');
    expect(stateText(card)).to.equal('Handed to the page, which has not confirmed it');
  });

  it('shows storing, then the reference of the page', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    let finish: (reference: string) => void = () => undefined;
    card.addEventListener('solute-store', ({ detail }) => detail.waitUntil(new Promise<string>((resolve) => (finish = resolve))));
    await press(card);
    expect(stateText(card)).to.equal('Storing…');
    let again = 0;
    card.addEventListener('solute-store', () => again++);
    await press(card);
    expect(again).to.equal(0);
    finish('RW-0311');
    await settle(card);
    expect(stateText(card)).to.equal('Stored as RW-0311');
  });

  it('shows the reason of a failure and tries again', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    let attempts = 0;
    card.addEventListener('solute-store', ({ detail }) =>
      detail.waitUntil(++attempts === 1 ? Promise.reject(new Error('the disk is full')) : Promise.resolve({ id: 4 })),
    );
    await press(card);
    await settle(card);
    expect(stateText(card)).to.equal('Not stored: the disk is full');
    expect(part(card, 'store-button')!.textContent.trim()).to.equal('Try again');
    await press(card);
    await settle(card);
    expect(stateText(card)).to.equal('Stored');
    expect(attempts).to.equal(2);
  });

  it('waits for every listener', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    card.addEventListener('solute-store', ({ detail }) => detail.waitUntil(Promise.resolve('first')));
    card.addEventListener('solute-store', ({ detail }) => detail.waitUntil(aTimeout(200)));
    await press(card);
    await settle(card);
    expect(stateText(card)).to.equal('Storing…');
    await aTimeout(300);
    await card.updateComplete;
    expect(stateText(card)).to.equal('Stored as first');
  });

  it('forgets the reference when another result stands', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    card.addEventListener('solute-store', ({ detail }) => detail.waitUntil(Promise.resolve('A1')));
    await press(card);
    await settle(card);
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(stateText(card)).to.equal('');
  });

  it('waits for a result that is being made, and stores that one once', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    const stored: unknown[] = [];
    card.addEventListener('solute-store', ({ detail }) => stored.push(detail.record.solutes));
    card.solutes = BASIC;
    part(card, 'store-button')!.click();
    part(card, 'store-button')!.click();
    expect(stored).to.have.length(0);
    await card.predictionComplete;
    await settle(card);
    expect(stored).to.deep.equal([BASIC]);
    expect(stateText(card)).not.to.equal('');
    card.solutes = UNKNOWN;
    part(card, 'store-button')!.click();
    await card.predictionComplete;
    await settle(card);
    expect(stored).to.have.length(1);
  });

  it('does nothing while disabled', async () => {
    const card = await makeCard({ solutes: ACIDIC, disabled: true });
    let heard = 0;
    card.addEventListener('solute-store', () => heard++);
    await press(card);
    expect(heard).to.equal(0);
  });
});
