import { html, nothing, type TemplateResult } from 'lit';
import type { Prediction, Remark, UnderstoodSolute } from '../engine.js';
import { renderGravity } from './cautions.js';
import { english as strings } from './strings/english.js';

/** Assumptions that would stand for the wrong bottle if they did not hold. */
const DOUBTFUL = new Set(['isomer', 'hydrate-anhydrous']);

const isDoubtful = ({ code }: Remark) => DOUBTFUL.has(code);

/** The sentences that ask for a look at the bottle. */
export function doubts({ understood }: Pick<Prediction, 'understood'>): readonly string[] {
  return understood.flatMap(({ assumptions }) => assumptions.filter(isDoubtful).map(({ text }) => text));
}

/** What was taken for granted of every solute is said once, below all of them. */
export function sharedAssumptions(understood: readonly UnderstoodSolute[]): ReadonlySet<string> {
  const [first, ...others] = understood.map(({ assumptions }) => assumptions.filter((assumption) => !isDoubtful(assumption)).map(({ text }) => text));
  return new Set((first ?? []).filter((text) => others.every((texts) => texts.includes(text))));
}

export function renderSharedAssumptions(shared: ReadonlySet<string>): TemplateResult | typeof nothing {
  return shared.size === 0 ? nothing : html`<p class="assumption sentence" part="assumption">${[...shared].join(' ')}</p>`;
}

/** What was taken for granted of one solute, the doubtful with a sign. */
export function renderAssumptions(assumptions: readonly Remark[], shared: ReadonlySet<string>): readonly (TemplateResult | typeof nothing)[] {
  return assumptions.map((assumption) => {
    const { text } = assumption;
    if (isDoubtful(assumption)) {
      return html`<span class="doubt" part="assumption assumption-doubt">${renderGravity('warning')}<span class="sentence"><strong>${strings.checkBottle}</strong> ${text}</span></span>`;
    }
    return shared.has(text) ? nothing : html`<span class="assumption sentence" part="assumption">${text}</span>`;
  });
}
