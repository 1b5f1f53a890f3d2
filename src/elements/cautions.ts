import { html, nothing, svg, type SVGTemplateResult, type TemplateResult } from 'lit';
import type { Caution, Prediction } from '../engine.js';
import { renderSentence } from './sentence.js';
import { english as strings } from './strings/english.js';

const words = strings.cautions;
const ORDER: readonly Caution['gravity'][] = ['danger', 'warning', 'note'];

/** Octagon, triangle and circle: the gravity is told by shape and word, not by colour alone. */
const OUTLINES: Readonly<Record<Caution['gravity'], SVGTemplateResult>> = {
  danger: svg`<path d="M5 1H11L15 5V11L11 15H5L1 11V5Z"></path>`,
  warning: svg`<path d="M8 1.5L15.2 14.5H0.8Z"></path>`,
  note: svg`<circle cx="8" cy="8" r="7"></circle>`,
};
const SIGNS: Readonly<Record<Caution['gravity'], SVGTemplateResult>> = {
  danger: svg`<path class="sign" d="M8 4V9M8 11V12.5"></path>`,
  warning: svg`<path class="sign" d="M8 6V10M8 11.7V13"></path>`,
  note: svg`<path class="sign" d="M8 7V12M8 3.8V5.3"></path>`,
};

/** Cautions, the gravest first, each with what it rests on. */
export function renderCautions(prediction: Prediction): TemplateResult | typeof nothing {
  const { cautions } = prediction;
  if (cautions.length === 0) return nothing;
  return html`<ul class="cautions" part="cautions" aria-label=${words.heading}>
    ${sorted(cautions).map(
      ({ gravity, text, basis }) => html`<li class=${`caution ${gravity}`} part=${`caution caution-${gravity}`}>
        ${renderGravity(gravity)}
        <div>
          <p class="sentence"><strong>${words.gravity[gravity]}.</strong> ${renderSentence(text, prediction)}</p>
          ${basis ? html`<p class="sentence origin">${words.basis(basis)}</p>` : nothing}
        </div>
      </li>`,
    )}
  </ul>`;
}

export function sorted(cautions: readonly Caution[]): readonly Caution[] {
  return [...cautions].sort((one, other) => ORDER.indexOf(one.gravity) - ORDER.indexOf(other.gravity));
}

export function renderGravity(gravity: Caution['gravity']): TemplateResult {
  return html`<svg class="icon" viewBox="0 0 16 16" width="16" height="16" aria-hidden="true" focusable="false">${OUTLINES[gravity]}${SIGNS[gravity]}</svg>`;
}
