import { html, nothing, svg, type TemplateResult } from 'lit';
import type { Prediction, UnderstoodSolute } from '../engine.js';
import { renderClassShape } from './class-shapes.js';
import { renderFormula } from './chemical.js';
import { renderAmount } from './amount.js';
import { renderAssumptions, renderSharedAssumptions, sharedAssumptions } from './assumptions.js';
import { renderCautions } from './cautions.js';
import type { Numbers } from './numbers.js';
import { renderScale } from './scale.js';
import { renderSentence } from './sentence.js';
import { english as strings } from './strings/english.js';
import { conditionsText, otherAirText } from './written-result.js';

/** The compact result: what was understood, the pH with its class on the scale, why, and what to beware of. */
export function renderPrediction(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { understood, reason } = prediction;
  const other = otherAirText(prediction, numbers);
  const shared = sharedAssumptions(understood);
  return html`
    <ul class="understood" part="understood" aria-label=${strings.understood}>
      ${understood.map((solute) => renderSolute(solute, numbers, shared))}
    </ul>
    ${renderSharedAssumptions(shared)}
    <div class="reading">
      ${renderValue(prediction, numbers)}
      <div class="beside">
        ${renderScale(prediction, numbers)}
        <p class="conditions" part="conditions"><span>${conditionsText(prediction.conditions, numbers)}</span> <span class="neutral-text">${strings.neutralAt(numbers.fixed(prediction.neutralPH, 2))}</span></p>
      </div>
    </div>
    <p class="reason sentence" part="reason">${renderSentence(reason.text, prediction)}</p>
    ${other === undefined ? nothing : html`<p class="other-air-text" part="other-air">
          <svg class="other-air" viewBox="-5 -5 10 10" width="10" height="10" aria-hidden="true" focusable="false"><circle r="3"></circle></svg>
          <span class="sentence">${other}</span>
        </p>`}
    ${renderCautions(prediction)}
  `;
}

function renderValue(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { pH, uncertainty, classification, decided } = prediction;
  const value = numbers.pH(pH, uncertainty);
  const doubt = numbers.uncertainty(uncertainty);
  return html`
    <div class="value-block">
      <p class="value" part="value">
        <span class="visually-hidden">${strings.resultSpoken(value, doubt)}</span>
        <bdi dir="ltr" aria-hidden="true"><span class="symbol">${strings.pH}</span> <span class="pH" part="ph">${value}</span>
          <span class="uncertainty" part="uncertainty" title=${strings.uncertaintyKind}>${strings.plusMinus} ${doubt}</span></bdi>
      </p>
      <p class="classification" part="classification">
        <svg viewBox="-7 -7 14 14" width="14" height="14" aria-hidden="true" focusable="false">${renderClassShape(classification)}</svg>
        <span><strong>${strings.classification[classification]}</strong>${decided ? nothing : html`, <span class="undecided">${strings.undecided}</span>`}</span>
      </p>
    </div>
  `;
}

function renderSolute(solute: UnderstoodSolute, numbers: Numbers, shared: ReadonlySet<string>): TemplateResult {
  const { amount, formula, name, cas, molarMass, molarity, molality, assumptions } = solute;
  return html`
    <li part="solute">
      <span class="solute-name"><bdi class="amount">${amount}</bdi> ${renderFormula(formula)}${name ? html` <span class="sentence-part">${name}</span>` : nothing}</span>
      <span class="solute-facts">
        <span>${renderAmount(molarity, numbers, 4)} mol/L</span>
        <span>${renderAmount(molality, numbers, 4)} mol/kg</span>
        <span>${strings.molarMass(numbers.plain(Number(molarMass.toFixed(3))))}</span>
        ${cas ? html`<span>${strings.cas(cas)}</span>` : nothing}
      </span>
      ${renderAssumptions(assumptions, shared)}
    </li>
  `;
}

/** What a card without input says. */
export function renderEmpty(): TemplateResult {
  const words = strings.empty;
  return html`
    <div class="empty" part="empty">
      <p class="state-title">
        <svg class="icon outline" viewBox="0 0 16 16" width="16" height="16" aria-hidden="true" focusable="false">${svg`<circle cx="8" cy="8" r="6.5"></circle>`}</svg>
        <strong>${words.title}</strong>
      </p>
      <p class="sentence">${words.instruction}</p>
      <p class="sentence origin">${words.example('')}<bdi class="typed">${words.exampleSolutes}</bdi></p>
    </div>
  `;
}

/** Settings that were not understood and what was used instead. */
export function renderNotes(notes: readonly string[]): TemplateResult | typeof nothing {
  if (notes.length === 0) return nothing;
  return html`<ul class="notes" part="notes" aria-label=${strings.notes.heading}>
    ${notes.map((note) => html`<li class="sentence">${note}</li>`)}
  </ul>`;
}
