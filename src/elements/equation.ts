import { html, nothing, type TemplateResult } from 'lit';
import type { Equation, EquationTerm, Prediction } from '../engine.js';
import { renderNamedChemical, renderTerm } from './chemical.js';
import type { Numbers } from './numbers.js';
import { renderSentence } from './sentence.js';
import { english as strings } from './strings/english.js';

const words = strings.equations;

/** The equations of a prediction: dissolution, reactions with water, complexes, and what takes no part. */
export function renderEquations(prediction: Prediction, numbers: Numbers): TemplateResult {
  const { dissociation, hydrolysis, spectators } = prediction;
  const complexes = hydrolysis.filter(({ kind }) => kind === 'complex-formation');
  const withWater = hydrolysis.filter(({ kind }) => kind !== 'complex-formation');
  return html`
    ${group(words.dissolution, dissociation, numbers)}
    ${hydrolysis.length === 0 ? html`<p class="group-title">${words.none}</p>` : group(words.hydrolysis, withWater, numbers)}
    ${group(words.complexes, complexes, numbers)}
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

/** A constant of proton transfer stands as itself and as pK, a cumulative one of a metal as its logarithm. */
function renderConstant({ symbol, K, pK }: Equation, numbers: Numbers): TemplateResult | typeof nothing {
  if (!symbol || K === undefined || pK === undefined) return nothing;
  if (isCumulative(symbol)) return html`<span class="fact constant" dir="ltr">log<sub>10</sub> ${renderSymbol(symbol)} = ${numbers.fixed(-pK, 2)}</span>`;
  const { mantissa, exponent } = numbers.powerOfTen(K);
  return html`<span class="fact constant" dir="ltr">${renderSymbol(symbol)} = ${mantissa} × 10<sup>${exponent}</sup> <span class="logarithm">(p${renderSymbol(symbol)} ${numbers.fixed(pK, 2)})</span></span>`;
}

function isCumulative(symbol: string): boolean {
  return symbol.includes('β');
}

/** The constant as plain text: "pKa 9.25", "log10 β 12.75"; empty where there is none. */
export function constantText({ symbol, pK }: Equation, numbers: Numbers): string {
  if (!symbol || pK === undefined) return '';
  return isCumulative(symbol) ? `${words.logarithm(symbol)} ${numbers.fixed(-pK, 2)}` : `${words.negativeLogarithm(symbol)} ${numbers.fixed(pK, 2)}`;
}

/** "Ka" with the letter as a subscript; the star of "*β" stays. */
function renderSymbol(symbol: string): TemplateResult {
  const match = /^(\*?\p{L})(.*)$/u.exec(symbol);
  if (!match) return html`<i>${symbol}</i>`;
  return html`<i>${match[1]}</i>${match[2] ? html`<sub>${match[2]}</sub>` : nothing}`;
}

/** The equation as a sentence built from names. */
export function spokenEquation(equation: Equation, numbers: Numbers): string {
  const { reactants, products, arrow, symbol, pK, extent, decides } = equation;
  const facts = [`${spokenSide(reactants)} ${arrow === 'complete' ? words.complete : words.equilibrium} ${spokenSide(products)}`];
  if (symbol && pK !== undefined) {
    facts.push(
      isCumulative(symbol)
        ? words.spokenConstant(words.logarithm(symbol), words.spokenSign(numbers.fixed(-pK, 2)))
        : words.spokenConstant(words.negativeLogarithm(symbol), words.spokenSign(numbers.fixed(pK, 2))),
    );
  }
  if (extent !== undefined) facts.push(words.reacted(numbers.percent(extent)));
  if (decides) facts.push(words.decides);
  return `${facts.join('; ')}.`;
}

function spokenSide(terms: readonly EquationTerm[]): string {
  return terms.map(({ coefficient, chemical }) => (coefficient === 1 ? chemical.name : `${coefficient} ${chemical.name}`)).join(` ${words.plus} `);
}
