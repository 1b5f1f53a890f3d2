import { expect, fixture, html } from '@open-wc/testing';
import type { SoluteCard } from '../../src/index.js';
import { ACIDIC, BASIC, UNKNOWN } from './support.js';

async function makeForm(attributes: Record<string, string>): Promise<{ form: HTMLFormElement; card: SoluteCard }> {
  const form = await fixture<HTMLFormElement>(html`<form><fieldset></fieldset></form>`);
  const card = document.createElement('solute-card');
  for (const [name, value] of Object.entries(attributes)) card.setAttribute(name, value);
  form.querySelector('fieldset')!.append(card);
  await card.predictionComplete;
  return { form, card };
}

describe('solute-card in a form', () => {
  it('submits the record as JSON', async () => {
    const { form, card } = await makeForm({ name: 'expected', solutes: ACIDIC });
    expect(card.form).to.equal(form);
    expect(card.type).to.equal('solute-card');
    expect(JSON.parse(new FormData(form).get('expected') as string)).to.deep.equal(card.record);
    expect(form.checkValidity()).to.equal(true);
  });

  it('submits nothing while a changed input is not predicted yet', async () => {
    const { form, card } = await makeForm({ name: 'expected', solutes: ACIDIC, required: '' });
    card.solutes = BASIC;
    await Promise.resolve();
    await Promise.resolve();
    if (card.state === 'predicting') expect(new FormData(form).get('expected')).to.equal(null);
    await card.predictionComplete;
    expect((JSON.parse(new FormData(form).get('expected') as string) as { classification: string }).classification).to.equal('basic');
  });

  it('is invalid when required and empty, and when there is a problem', async () => {
    const { form, card } = await makeForm({ name: 'expected', required: '' });
    expect(card.validity.valueMissing).to.equal(true);
    expect(card.validationMessage).to.contain('required');
    expect(card.willValidate).to.equal(true);
    expect(form.checkValidity()).to.equal(false);
    card.solutes = UNKNOWN;
    await card.predictionComplete;
    expect(card.validity.customError).to.equal(true);
    expect(card.validationMessage).to.equal(card.problems[0]!.text);
    expect(card.checkValidity()).to.equal(false);
    expect(card.reportValidity()).to.equal(false);
    card.solutes = ACIDIC;
    await card.predictionComplete;
    expect(card.validity.valid).to.equal(true);
  });

  it('goes back to its attribute when the form is reset', async () => {
    const { form, card } = await makeForm({ name: 'expected', solutes: ACIDIC });
    card.solutes = BASIC;
    await card.predictionComplete;
    form.reset();
    await card.predictionComplete;
    expect(card.solutes).to.equal(ACIDIC);
    expect(card.prediction!.classification).to.equal('acidic');
  });

  it('is left out when disabled, also by a fieldset', async () => {
    const { form, card } = await makeForm({ name: 'expected', solutes: ACIDIC });
    card.disabled = true;
    await card.updateComplete;
    expect(new FormData(form).has('expected')).to.equal(false);
    card.disabled = false;
    form.querySelector('fieldset')!.disabled = true;
    await card.updateComplete;
    expect(new FormData(form).has('expected')).to.equal(false);
    expect(card.shadowRoot!.querySelector<HTMLButtonElement>('button')!.disabled).to.equal(true);
  });
});
