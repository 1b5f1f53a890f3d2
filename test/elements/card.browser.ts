import { expect } from '@open-wc/testing';
import { SoluteCard } from '../../src/index.js';
import { ACIDIC, BASIC, makeCard, NEUTRAL, part, shownText, UNKNOWN } from './support.js';

describe('solute-card', () => {
  it('says what to write when nothing is stated', async () => {
    const card = await makeCard();
    expect(card.state).to.equal('empty');
    expect(card.matches(':state(empty)')).to.equal(true);
    expect(shownText(card)).to.contain('Nothing to predict yet').and.to.contain('For example: 20 mmol/L NaHCO3');
    expect(card.toText()).to.equal('');
    expect(card.toHTML()).to.equal('');
    expect(card.toJSON()).to.equal(null);
  });

  for (const [solutes, classification] of [[ACIDIC, 'acidic'], [NEUTRAL, 'neutral'], [BASIC, 'basic']] as const) {
    it(`shows ${solutes} as ${classification} by word, shape and state`, async () => {
      const card = await makeCard({ solutes, label: 'Basin 7' });
      expect(card.state).to.equal('predicted');
      expect(card.prediction!.classification).to.equal(classification);
      expect(card.matches(`:state(${classification}):state(predicted)`)).to.equal(true);
      expect(part(card, 'classification')!.textContent).to.contain(classification);
      expect(card.shadowRoot!.querySelectorAll('[part~="scale"] .marker .shape').length).to.equal(1);
      expect(card.record!.pH).to.be.closeTo(card.prediction!.pH, 1e-6);
      expect(shownText(card)).to.contain('Basin 7').and.to.contain(`pH ${card.prediction!.pH.toFixed(card.prediction!.uncertainty < 0.005 ? 3 : 2)}`);
      expect(JSON.parse(JSON.stringify(card))).to.deep.equal(card.record);
    });
  }

  it('gives the three classes three silhouettes', async () => {
    const paths = new Set<string | null>();
    for (const solutes of [ACIDIC, NEUTRAL, BASIC]) paths.add((await makeCard({ solutes })).shadowRoot!.querySelector('.classification .shape')!.getAttribute('d'));
    expect(paths.size).to.equal(3);
  });

  it('shows what was understood: amount, formula, name, molar mass, mol/L and mol/kg', async () => {
    const card = await makeCard({ solutes: '5 g/L Na2HPO4·12H2O' });
    const [solute] = card.prediction!.understood;
    const shown = part(card, 'solute')!;
    expect(shown.textContent).to.contain('5 g/L').and.to.contain(solute!.name).and.to.contain('g/mol').and.to.contain('mol/L').and.to.contain('mol/kg');
    expect([...shown.querySelectorAll('.solute-name sub')].map((sub) => sub.textContent)).to.deep.equal(['2', '4', '2']);
  });

  it('states the other condition of air only when it differs by more than the uncertainty', async () => {
    const open = await makeCard({ solutes: NEUTRAL });
    expect(part(open, 'other-air')!.textContent).to.contain('In equilibrium with room air');
    const buffered = await makeCard({ solutes: '0.1 mol/L CH3COONa; 0.1 mol/L CH3COOH' });
    expect(part(buffered, 'other-air')).to.equal(null);
    const aired = await makeCard({ solutes: NEUTRAL, air: 'equilibrated' });
    expect(part(aired, 'other-air')!.textContent).to.contain('With air kept out');
  });

  it('shows each problem, marks the piece and leaves what was typed intact', async () => {
    const card = await makeCard({ solutes: `0.2 mol/L KCl; ${UNKNOWN}` });
    expect(card.state).to.equal('problem');
    expect(card.matches(':state(problem)')).to.equal(true);
    expect(card.problems).to.have.length(1);
    expect(card.prediction).to.equal(undefined);
    expect(card.record).to.equal(undefined);
    expect(card.solutes).to.equal(`0.2 mol/L KCl; ${UNKNOWN}`);
    const mark = card.shadowRoot!.querySelector('mark')!;
    expect(mark.textContent).to.contain(card.problems[0]!.piece);
    expect(part(card, 'suggestions')!.textContent).to.contain(card.problems[0]!.suggestions[0]!.value);
    expect(card.toText()).to.contain('No prediction.');
  });

  it('takes an array, JSON in the attribute, and whatever a framework hands over', async () => {
    const card = await makeCard();
    card.solutes = [{ substance: 'NH4Br', amount: '0.12 mol/L' }];
    await card.predictionComplete;
    const pH = card.prediction!.pH;
    card.setAttribute('solutes', '[{"substance":"NH4Br","amount":"0.12 mol/L"}]');
    await card.predictionComplete;
    expect(card.prediction!.pH).to.equal(pH);
    for (const odd of ['[object Object]', { substance: 'KCl' }, 7, true, null, undefined, [null], [7], '[', '\u0000']) {
      card.solutes = odd as unknown as string;
      await card.predictionComplete;
      expect(['problem', 'empty'], JSON.stringify(odd)).to.include(card.state);
    }
  });

  it('falls back on unknown settings with a visible note', async () => {
    const card = await makeCard({ solutes: ACIDIC, temperature: 'lukewarm', air: 'some', solids: 'fluffy', expanded: 'equations nonsense' });
    expect(card.state).to.equal('predicted');
    expect(card.prediction!.conditions.temperature).to.equal(25);
    expect(card.prediction!.conditions.air).to.equal('excluded');
    expect(card.prediction!.conditions.solids).to.equal('watched');
    const notes = part(card, 'notes')!.textContent;
    expect(notes).to.contain('lukewarm').and.to.contain('some').and.to.contain('fluffy').and.to.contain('nonsense');
    expect(part(card, 'section-open')).to.equal(part(card, 'section-equations'));
  });

  it('reads temperatures as number and text, and refuses impossible ones', async () => {
    const card = await makeCard({ solutes: NEUTRAL, temperature: '37 °C' });
    expect(card.prediction!.conditions.temperature).to.equal(37);
    card.temperature = 5;
    await card.predictionComplete;
    expect(card.prediction!.conditions.temperature).to.equal(5);
    card.temperature = 140;
    await card.predictionComplete;
    expect(card.problems[0]!.code).to.equal('temperature-out-of-range');
  });

  it('asks for a look at the bottle where a formula or a name fits more than one', async () => {
    const card = await makeCard({ solutes: '5 g/L calcium chloride; 2 mmol/L C4H8O2' });
    const doubts = [...card.shadowRoot!.querySelectorAll('[part~="assumption-doubt"]')].map(({ textContent }) => textContent);
    expect(doubts).to.have.length(2);
    expect(doubts[0]).to.contain('Check the bottle. Taken as anhydrous');
    expect(doubts[1]).to.contain('isobutyric acid');
    for (const text of doubts) expect(card.toText()).to.contain(text.trim());
    expect(card.toHTML()).to.contain('<strong>Check the bottle.</strong> Taken as anhydrous');
  });

  it('passes the volume on', async () => {
    const card = await makeCard({ solutes: '5 g NaCl', volume: '500 mL' });
    expect(card.prediction!.understood[0]!.molarity).to.be.closeTo(0.1711, 0.0005);
  });

  it('says predicting between a change and its result', async () => {
    const card = await makeCard({ solutes: ACIDIC });
    card.solutes = BASIC;
    expect(card.state).to.equal('predicting');
    expect(card.prediction).to.equal(undefined);
    expect(card.toJSON()).to.equal(null);
    await card.predictionComplete;
    expect(card.state).to.equal('predicted');
    expect(card.prediction!.classification).to.equal('basic');
  });

  it('writes semantic HTML without styles', async () => {
    const card = await makeCard({ solutes: ACIDIC, label: 'A & B' });
    const markup = card.toHTML();
    expect(markup).to.contain('A &amp; B').and.to.contain('NH<sub>4</sub><sup>+</sup>').and.to.contain('<strong>pH ');
    expect(markup).not.to.match(/style|class=|<script/);
    expect(card.toText()).to.contain('A & B.').and.to.match(/pH \d\.\d\d ± \d\.\d\d \(acidic\), 25 °C, air kept out\./);
  });

  it('formats numbers in the language stated nearest', async () => {
    const card = await makeCard({ solutes: ACIDIC, lang: 'de' });
    expect(part(card, 'ph')!.textContent).to.match(/^\d,\d\d$/);
    const plain = await makeCard({ solutes: ACIDIC, lang: 'not a language' });
    expect(part(plain, 'ph')!.textContent).to.match(/^\d\.\d\d$/);
  });
});

describe('solute-card as a class', () => {
  it('can be registered under a second tag', async () => {
    SoluteCard.define('second-card');
    const card = document.createElement('second-card') as SoluteCard;
    card.solutes = ACIDIC;
    document.body.append(card);
    await card.predictionComplete;
    expect(card).to.be.instanceOf(SoluteCard);
    expect(card.state).to.equal('predicted');
    card.remove();
  });

  it('stays silent when it is registered twice and warns once when another version is there', () => {
    const { warn } = console;
    const warnings: unknown[] = [];
    console.warn = (text: unknown) => warnings.push(text);
    try {
      SoluteCard.define();
      SoluteCard.define();
      expect(warnings).to.have.length(0);
      customElements.define('older-card', class extends HTMLElement { static readonly version = '0.0.1'; });
      SoluteCard.define('older-card');
      SoluteCard.define('older-card');
      expect(warnings).to.have.length(1);
      expect(warnings[0]).to.contain('0.0.1').and.to.contain(SoluteCard.version);
    } finally {
      console.warn = warn;
    }
  });

  it('rethrows what is wrong with a tag', () => {
    expect(() => SoluteCard.define('nodash')).to.throw();
  });

  it('carries the version of the package', async () => {
    const { version } = (await (await fetch('/package.json')).json()) as { version: string };
    expect(SoluteCard.version).to.equal(version);
  });

  it('keeps properties that were set before the element was defined', async () => {
    const early = document.createElement('late-card') as SoluteCard;
    early.solutes = BASIC;
    early.label = 'Early';
    document.body.append(early);
    customElements.define('late-card', class extends SoluteCard {});
    await early.predictionComplete;
    expect(early.prediction!.classification).to.equal('basic');
    expect(shownText(early)).to.contain('Early');
    early.remove();
  });
});
