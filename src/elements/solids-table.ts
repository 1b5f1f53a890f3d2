import { html, nothing, type TemplateResult } from 'lit';
import { formatChemical, type Prediction, type SolidStatus } from '../engine.js';
import { amountText, renderAmount } from './amount.js';
import { renderFormula } from './chemical.js';
import { decimalsFor, type Numbers } from './numbers.js';
import { english as strings } from './strings/english.js';

const words = strings.solids;
/** Saturation index above which a solid is near enough to be named. */
const NEAR = -1;

/** The solids that lie in the vessel or are near to forming. */
export function nearSolids({ solids }: Prediction): readonly SolidStatus[] {
  return solids.filter(({ saturationIndex, amount }) => amount !== undefined || saturationIndex > NEAR);
}

/** Near solids with how far the solution is from them; nothing where there is none. */
export function renderSolids(prediction: Prediction, numbers: Numbers): TemplateResult | typeof nothing {
  const solids = nearSolids(prediction);
  if (solids.length === 0) return nothing;
  return html`
    <table part="solids-table">
      <caption>${words.caption}</caption>
      <thead>
        <tr>
          <th scope="col">${words.solid}</th>
          <th scope="col" class="number">${words.saturationIndex}</th>
        </tr>
      </thead>
      <tbody>
        ${solids.map(
          ({ formula, name, saturationIndex, uncertainty, forms, amount }) => html`<tr>
            <th scope="row">
              ${renderFormula(formula)}
              <span class="sentence origin">${name}, ${words.forms[forms]}</span>
              ${amount === undefined ? nothing : html`<span class="sentence">${words.lies} <strong>${renderAmount(amount, numbers)} mol/kg</strong></span>`}
            </th>
            <td class="number">
              ${amount === undefined
                ? html`${numbers.signed(saturationIndex, decimalsOf(uncertainty))}<span class="origin">± ${numbers.fixed(uncertainty, decimalsOf(uncertainty))}</span>`
                : numbers.fixed(0, 0)}
            </td>
          </tr>`,
        )}
      </tbody>
    </table>
  `;
}

const decimalsOf = (uncertainty: number) => Math.min(2, decimalsFor(uncertainty));

/** A solid that lies in the vessel, as plain text. */
export function solidText({ formula, name, amount = 0 }: SolidStatus, numbers: Numbers): string {
  return words.liesAs(formatChemical({ label: formula, charge: 0 }), name, amountText(amount, numbers));
}
