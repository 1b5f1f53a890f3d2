import { html, nothing, type TemplateResult } from 'lit';
import type { Equation, EquationTerm, Prediction } from '../engine.js';
import { renderNamedChemical, renderTerm } from './chemical.js';
import type { Numbers } from './numbers.js';
import { renderSentence } from './sentence.js';
import { english as strings } from './strings/english.js';

const words = strings.equations;

/** The equations of a prediction: dissolution, reactions with water, and what takes no part. */
export function renderEquations(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { dissociation, hydrolysis, spectators } = prediction;
  return html`
    ${group(words.dissolution, dissociation, numbers)}
    ${hydrolysis.length === 0 ? html`<p class="group-title">${words.none}</p>` : group(words.hydrolysis, hydrolysis, numbers)}
    ${spectators.length === 0
      ? nothing
      : html`<p class="group-title">${words.spectators}</p>
          <ul class="spectators" part="spectators">
            ${spectators.map(({ chemical, reason }) => html`<li>${renderNamedChemical(chemical)}<span class="sentence">${renderSentence(reason.text, prediction)}</span></li>`)}
          </ul>`}
  `;
}

function group(title: string, equations: readonly Equation[], numbers: Numbers): TemplateResult | typeof nothing {
  if (equations.length === 0) return nothing;
  return html`<p class="group-title">${title}</p>
    <ul class="equations">
      ${equations.map((equation) => renderEquation(equation, numbers))}
    </ul>`;
}

/** One equation: formulas for the eye, a sentence of names for the ear. */
function renderEquation(equation: Equation, numbers: Numbers): TemplateResult {
  const { reactants, products, arrow, decides } = equation;
  return html`
    <li class=${decides ? 'equation decides' : 'equation'} part=${decides ? 'equation equation-decides' : 'equation'}>
      <span class="visually-hidden">${spokenEquation(equation, numbers)}</span>
      <span class="reaction" dir="ltr" aria-hidden="true">
        ${side(reactants)} <span class="arrow">${arrow === 'complete' ? '\u2192' : '\u21cc'}</span> ${side(products)}
      </span>
      <span class="reaction-facts" aria-hidden="true">
        ${renderConstant(equation, numbers)}
        ${equation.extent === undefined ? nothing : html`<span class="fact">${words.reacted(numbers.percent(equation.extent))}</span>`}
        ${decides ? html`<span class="fact decides-mark">${words.decides}</span>` : nothing}
      </span>
    </li>
  `;
}

function side(terms: readonly EquationTerm[]): TemplateResult[] {
  return terms.map((term, index) => (index === 0 ? renderTerm(term) : html` + ${renderTerm(term)}`));
}

function renderConstant({ symbol, K, pK }: Equation, numbers: Numbers): TemplateResult | typeof nothing {
  if (!symbol || K === undefined) return nothing;
  const { mantissa, exponent } = numbers.powerOfTen(K);
  const logarithm = pK === undefined ? nothing : html` <span class="logarithm">(${renderLogarithm(symbol, pK, numbers)})</span>`;
  return html`<span class="fact constant" dir="ltr">${renderSymbol(symbol)} = ${mantissa} × 10<sup>${exponent}</sup>${logarithm}</span>`;
}

/** A constant of proton transfer is quoted as pK, a cumulative one of a metal as its logarithm. */
function renderLogarithm(symbol: string, pK: number, numbers: Numbers): TemplateResult {
  return isCumulative(symbol)
    ? html`log<sub>10</sub> ${renderSymbol(symbol)} ${numbers.fixed(-pK, 2)}`
    : html`p${renderSymbol(symbol)} ${numbers.fixed(pK, 2)}`;
}

function isCumulative(symbol: string): boolean {
  return symbol.includes('β');
}

/** "Ka" with the letter as a subscript; the star of "*β" stays. */
function renderSymbol(symbol: string): TemplateResult {
  const match = /^(\*?\p{L})(.*)$/u.exec(symbol);
  if (!match) return html`<i>${symbol}</i>`;
  return html`<i>${match[1]}</i>${match[2] ? html`<sub>${match[2]}</sub>` : nothing}`;
}

/** The equation as a sentence built from names. */
export function spokenEquation(equation: Equation, numbers: Numbers): string {
  const { reactants, products, arrow, symbol, K, pK, extent, decides } = equation;
  const facts = [`${spokenSide(reactants)} ${arrow === 'complete' ? words.complete : words.equilibrium} ${spokenSide(products)}`];
  if (symbol && pK !== undefined) {
    facts.push(
      isCumulative(symbol)
        ? words.spokenConstant(words.logarithm(symbol), words.spokenPower(numbers.fixed(-pK, 2)))
        : words.spokenConstant(words.negativeLogarithm(symbol), words.spokenPower(numbers.fixed(pK, 2))),
    );
  } else if (symbol && K !== undefined) {
    const { mantissa, exponent } = numbers.powerOfTen(K);
    facts.push(words.spokenConstant(symbol, words.timesTenTo(mantissa, words.spokenPower(exponent))));
  }
  if (extent !== undefined) facts.push(words.reacted(numbers.percent(extent)));
  if (decides) facts.push(words.decides);
  return `${facts.join('; ')}.`;
}

function spokenSide(terms: readonly EquationTerm[]): string {
  return terms.map(({ coefficient, chemical }) => (coefficient === 1 ? chemical.name : `${coefficient} ${chemical.name}`)).join(` ${words.plus} `);
}
