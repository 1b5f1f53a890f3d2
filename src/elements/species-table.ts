import { html, nothing, type TemplateResult } from 'lit';
import type { Prediction } from '../engine.js';
import { renderAmount } from './amount.js';
import { renderNamedChemical } from './chemical.js';
import type { Numbers } from './numbers.js';
import { renderSolids } from './solids-table.js';
import { english as strings } from './strings/english.js';

const words = strings.composition;

/** What the solved solution holds, with the figures that describe it as a whole. */
export function renderComposition(prediction: Prediction, numbers: Numbers): TemplateResult {
  const species = [...prediction.species].sort((one, other) => other.molality - one.molality);
  return html`
    <dl class="figures">
      ${figure(words.ionicStrength, html`${renderAmount(prediction.ionicStrength, numbers)} mol/kg`)}
      ${figure(words.bufferCapacity, html`${renderAmount(prediction.bufferCapacity, numbers, 2)} ${words.bufferCapacityUnit}`)}
      ${figure(words.waterActivity, numbers.fixed(prediction.waterActivity, 4))}
      ${figure(words.neutralPoint, html`pH ${numbers.fixed(prediction.neutralPH, 2)}`)}
      ${figure(words.residual, renderAmount(prediction.residual, numbers, 1))}
    </dl>
    <table part="composition-table">
      <caption class="visually-hidden">${words.caption}</caption>
      <thead>
        <tr>
          <th scope="col">${words.species}</th>
          <th scope="col" class="number">${words.molality}<span class="visually-hidden">, ${words.molalityLong}</span></th>
          <th scope="col" class="number"><span aria-hidden="true">${words.activityCoefficient}</span><span class="visually-hidden">${words.activityCoefficientLong}</span></th>
          <th scope="col" class="number"><span aria-hidden="true">${words.share}</span><span class="visually-hidden">${words.shareLong}</span></th>
        </tr>
      </thead>
      <tbody>
        ${species.map(
          ({ chemical, molality, activityCoefficient, share }) => html`<tr>
            <th scope="row">${renderNamedChemical(chemical)}</th>
            <td class="number">${renderAmount(molality, numbers)}</td>
            <td class="number">${activityCoefficient < 0.1 ? renderAmount(activityCoefficient, numbers, 2) : numbers.fixed(activityCoefficient, 3)}</td>
            <td class="number">${share === undefined ? nothing : numbers.percent(share)}</td>
          </tr>`,
        )}
      </tbody>
    </table>
    ${renderSolids(prediction, numbers)}
  `;
}

function figure(term: string, value: TemplateResult | string): TemplateResult {
  return html`<div><dt>${term}</dt><dd>${value}</dd></div>`;
}
