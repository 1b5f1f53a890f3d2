import { html, nothing, type TemplateResult } from 'lit';
import type { Prediction } from '../engine.js';
import type { Section } from './card-settings.js';
import { renderConstants } from './constants-table.js';
import { renderEquations } from './equation.js';
import type { Numbers } from './numbers.js';
import { nearSolids } from './solids-table.js';
import { renderComposition } from './species-table.js';
import { english as strings } from './strings/english.js';

export interface SectionsView {
  readonly prediction: Prediction;
  readonly numbers: Numbers;
  isOpen(section: Section): boolean;
  /** A section that was opened once keeps its content, so that opening it again costs nothing. */
  hasContent(section: Section): boolean;
  onToggle(section: Section): void;
}

/** Equations, composition and constants, each behind a button that opens it in place, downwards. */
export function renderSections(view: SectionsView): TemplateResult {
  const { prediction, numbers } = view;
  const { dissociation, hydrolysis, species, constants } = prediction;
  const solids = nearSolids(prediction).length;
  const count = (value: number) => numbers.fixed(value, 0);
  return html`
    <div class="sections" part="sections">
      ${section(view, 'equations', strings.counts.equations(count(dissociation.length + hydrolysis.length)), renderEquations)}
      ${section(view, 'composition', solids === 0 ? strings.counts.species(count(species.length)) : strings.counts.speciesAndSolids(count(species.length), count(solids), solids === 1), renderComposition)}
      ${section(view, 'constants', strings.counts.constants(count(constants.length)), renderConstants)}
    </div>
  `;
}

/** A button and what it opens: a page of many `<details>` makes browsers collect the styles of all cards at every frame. */
function section(
  view: SectionsView,
  name: Section,
  count: string,
  content: (prediction: Prediction, numbers: Numbers) => TemplateResult,
): TemplateResult {
  const open = view.isOpen(name);
  return html`
    <div class=${open ? 'section open' : 'section'} part=${open ? `section section-${name} section-open` : `section section-${name}`}>
      <button type="button" class="summary" part="summary" id=${`${name}-summary`} aria-expanded=${open ? 'true' : 'false'} aria-controls=${name} @click=${() => view.onToggle(name)}>
        <span class="chevron" aria-hidden="true"></span><span>${strings.sections[name]}</span><span class="count">${count}</span>
      </button>
      <div class="section-content" id=${name} role="group" aria-labelledby=${`${name}-summary`} ?hidden=${!open}>${view.hasContent(name) ? content(view.prediction, view.numbers) : nothing}</div>
    </div>
  `;
}
