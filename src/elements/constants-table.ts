import { html, nothing, type TemplateResult } from 'lit';
import type { ConstantUsed, Prediction, UncertaintyContribution } from '../engine.js';
import type { Numbers } from './numbers.js';
import { renderSentence } from './sentence.js';
import { english as strings } from './strings/english.js';

const words = strings.constants;
const REFERENCE_TEMPERATURE = 25;
/** Lines of the budget that are listed one by one. */
const LONGEST_BUDGET = 8;

/** The constants behind the result with their sources, and what the uncertainty is made of. */
export function renderConstants(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { constants, uncertaintyBudget } = prediction;
  return html`
    <table part="constants-table">
      <caption class="visually-hidden">${words.caption}</caption>
      <thead>
        <tr>
          <th scope="col">${words.constant}</th>
          <th scope="col" class="number">${words.value}</th>
          <th scope="col" class="number"><span aria-hidden="true">${words.here}</span><span class="visually-hidden">${words.hereLong}</span></th>
        </tr>
      </thead>
      <tbody>${constants.map((constant) => renderConstant(constant, prediction, numbers))}</tbody>
    </table>
    ${uncertaintyBudget.length === 0 ? nothing : renderBudget(uncertaintyBudget, prediction, numbers)}
  `;
}

function renderConstant(constant: ConstantUsed, prediction: Prediction, numbers: Numbers): TemplateResult {
  const { description, quantity, value, uncertainty, temperature, ionicStrength, valueHere, citation, obtained } = constant;
  const elsewhere = temperature !== REFERENCE_TEMPERATURE || ionicStrength !== 0;
  return html`<tr>
    <th scope="row">
      <span class="sentence">${renderSentence(description, prediction)}</span>
      <span class="sentence origin">${citation} · ${words.obtained[obtained]}</span>
    </th>
    <td class="number">
      <span class="quantity">${quantity}</span> ${numbers.plain(value, 4)}
      ${uncertainty === null
        ? html`<span class="origin">${words.uncertaintyUnknown}</span>`
        : html`<span class="origin">± ${numbers.plain(uncertainty, 4)}</span>`}
      ${elsewhere
        ? html`<span class="origin">${words.at(numbers.plain(temperature), ionicStrength === 0 ? undefined : numbers.plain(ionicStrength))}</span>`
        : nothing}
    </td>
    <td class="number">${numbers.fixed(valueHere, 3)}</td>
  </tr>`;
}

function renderBudget(budget: readonly UncertaintyContribution[], prediction: Prediction, numbers: Numbers): TemplateResult {
  const smaller = budget.length - LONGEST_BUDGET;
  return html`
    <table part="budget-table">
      <caption>${words.budgetCaption}</caption>
      <thead>
        <tr>
          <th scope="col">${words.contribution}</th>
          <th scope="col" class="number">± ${words.pHUnits}</th>
          <th scope="col" class="number">${words.share}</th>
        </tr>
      </thead>
      <tbody>
        ${budget.slice(0, LONGEST_BUDGET).map(
          ({ of, contribution, share, basis }) => html`<tr>
            <th scope="row"><span class="sentence">${renderSentence(of, prediction)}</span><span class="sentence origin">${words.basis[basis]}</span></th>
            <td class="number">${contribution < 0.0001 ? `< ${numbers.fixed(0.0001, 4)}` : numbers.fixed(contribution, 4)}</td>
            <td class="number">${numbers.percent(share)}</td>
          </tr>`,
        )}
      </tbody>
    </table>
    ${smaller > 0 ? html`<p class="origin">${words.smaller(numbers.fixed(smaller, 0))}</p>` : nothing}
  `;
}
