import { html, nothing, type TemplateResult } from 'lit';
import type { Prediction } from '../engine.js';
import type { Section } from './card-settings.js';
import { renderConstants } from './constants-table.js';
import { renderEquations } from './equation.js';
import type { Numbers } from './numbers.js';
import { renderComposition } from './species-table.js';
import { english as strings } from './strings/english.js';

export interface SectionsView {
  readonly prediction: Prediction;
  readonly numbers: Numbers;
  isOpen(section: Section): boolean;
  /** A section that was opened once keeps its content, so that opening it again costs nothing. */
  hasContent(section: Section): boolean;
  /** Comes before the section opens, so that it opens with its content. */
  onPrepare(section: Section): void;
  onToggle(section: Section, open: boolean): void;
}

/** Equations, composition and constants, each behind a heading that opens it in place, downwards. */
export function renderSections(view: SectionsView): TemplateResult {
  const { prediction, numbers } = view;
  const { dissociation, hydrolysis, species, constants } = prediction;
  const count = (value: number) => numbers.fixed(value, 0);
  return html`
    <div class="sections" part="sections">
      ${section(view, 'equations', strings.counts.equations(count(dissociation.length + hydrolysis.length)), renderEquations)}
      ${section(view, 'composition', strings.counts.species(count(species.length)), renderComposition)}
      ${section(view, 'constants', strings.counts.constants(count(constants.length)), renderConstants)}
    </div>
  `;
}

function section(
  view: SectionsView,
  name: Section,
  count: string,
  content: (prediction: Prediction, numbers: Numbers) => TemplateResult,
): TemplateResult {
  const onToggle = ({ currentTarget }: Event) => view.onToggle(name, (currentTarget as HTMLDetailsElement).open);
  return html`
    <details part=${`section section-${name}`} ?open=${view.isOpen(name)} @toggle=${onToggle}>
      <summary part="summary" @click=${() => view.onPrepare(name)}><span class="chevron" aria-hidden="true"></span>${strings.sections[name]}<span class="count">${count}</span></summary>
      <div class="section-content">${view.hasContent(name) ? content(view.prediction, view.numbers) : nothing}</div>
    </details>
  `;
}
