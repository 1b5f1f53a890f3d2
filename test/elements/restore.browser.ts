import { expect } from '@open-wc/testing';
import { digestOf } from '../../src/prediction/record.js';
import type { SoluteCard, SoluteRecord } from '../../src/index.js';
import { ACIDIC, BASIC, makeCard, part } from './support.js';

/** A record as an older version of the data would have left it. */
function altered(record: SoluteRecord, changes: Partial<SoluteRecord>): SoluteRecord {
  const body = Object.fromEntries(Object.entries({ ...record, ...changes }).filter(([key]) => key !== 'digest')) as unknown as SoluteRecord;
  return { ...body, digest: digestOf(body) };
}

async function restored(record: unknown): Promise<SoluteCard> {
  const card = await makeCard({ solutes: BASIC });
  card.restore(record as SoluteRecord);
  await card.predictionComplete;
  return card;
}

const noteOf = (card: SoluteCard) => part(card, 'restored')?.textContent.replace(/\s+/g, ' ').trim();
const heard = (card: SoluteCard) => card.shadowRoot!.querySelector('.card > [role="status"]')!.textContent;

describe('a restored record', () => {
  it('brings back label, solutes and every condition, and says nothing when it is the same', async () => {
    const record = (await makeCard({ solutes: '40 g Ca(OH)2', volume: '500 mL', label: 'Lime', temperature: '18', air: 'equilibrated', solids: 'equilibrated' })).record!;
    const card = await restored(JSON.parse(JSON.stringify(record)));
    expect(card.record).to.deep.equal(record);
    expect([card.volume, card.solids, card.air, card.temperature]).to.deep.equal(['500 mL', 'equilibrated', 'equilibrated', 18]);
    expect(noteOf(card)).to.equal(undefined);
    card.restore((await makeCard({ solutes: ACIDIC })).record!);
    await card.predictionComplete;
    expect([card.volume, card.solids, card.label]).to.deep.equal(['', 'watched', '']);
  });

  it('says what was stored and which constants changed', async () => {
    const record = (await makeCard({ solutes: ACIDIC })).record!;
    const [water, ...others] = record.constants;
    const card = await restored(altered(record, { pH: record.pH - 0.5, constants: [{ ...water!, value: 13.5 }, ...others] }));
    expect(noteOf(card)).to.contain(`Stored as pH ${(record.pH - 0.5).toFixed(2)} ±`).and.to.contain(`Computed now: pH ${record.pH.toFixed(2)} ±`);
    expect(noteOf(card)).to.match(/pKw ion product of water: 13\.5, now 1\d\.\d+/);
    expect(heard(card)).to.contain('Stored as pH');
    card.solutes = BASIC;
    await card.predictionComplete;
    expect(noteOf(card)).to.equal(undefined);
  });

  it('says that it differs below the digits shown', async () => {
    const record = (await makeCard({ solutes: ACIDIC })).record!;
    const card = await restored(altered(record, { pH: record.pH + 0.00001 }));
    expect(noteOf(card)).to.contain('the same to the digits shown');
  });

  it('says what was stored when its input is no longer understood', async () => {
    const record = (await makeCard({ solutes: ACIDIC })).record!;
    const card = await restored(altered(record, { solutes: '1 mol/L unobtainium' }));
    expect(card.state).to.equal('problem');
    expect(noteOf(card)).to.contain(`Stored as pH ${record.pH.toFixed(2)}`).and.to.contain('no longer understood');
  });

  it('warns of one that was altered, or is none', async () => {
    const record = (await makeCard({ solutes: ACIDIC })).record!;
    for (const odd of [{ ...record, pH: 9 }, { solutes: ACIDIC }, altered(record, { constants: null as never }), altered(record, { pH: 'seven' as never })]) {
      const card = await restored(odd);
      expect(card.state).to.equal('predicted');
      expect(noteOf(card)).to.match(/^Warning\. This is not what was stored/);
      expect(heard(card)).to.contain('not what was stored');
    }
    for (const odd of [null, undefined, 7, 'record', [], {}]) expect(noteOf(await restored(odd))).to.contain('not what was stored');
  });

  it('is compared also when the card shows its input already', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    card.restore({ ...card.record!, pH: 1 });
    await card.predictionComplete;
    expect(noteOf(card)).to.contain('not what was stored');
  });
});
