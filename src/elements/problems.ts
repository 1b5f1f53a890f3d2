import { html, nothing, type TemplateResult } from 'lit';
import type { Problem, TextRange } from '../engine.js';
import { renderGravity } from './cautions.js';
import type { Numbers } from './numbers.js';
import { english as strings } from './strings/english.js';

const words = strings.problems;
/** Characters of a long input that are shown with the marks. */
const LONGEST_TYPED = 2000;

/** Why there is no prediction: each problem, where it stands in what was typed, and what would be valid instead. */
export function renderProblems(problems: readonly Problem[], typed: string | undefined, numbers: Numbers): TemplateResult {
  const title = problems.length > 1 ? words.titleSeveral(numbers.fixed(problems.length, 0)) : words.title;
  return html`
    <div class="problems" part="problems">
      <p class="state-title">${renderGravity('warning')} <strong>${title}</strong></p>
      ${typed ? renderTyped(typed, problems) : nothing}
      <ul>
        ${problems.map(
          ({ text, suggestions }) => html`<li part="problem">
            <p class="sentence">${text}</p>
            ${suggestions.length === 0
              ? nothing
              : html`<p class="suggestions-title">${words.suggestions}</p>
                  <ul class="suggestions" part="suggestions">
                    ${suggestions.map(({ value, reason }) => html`<li><bdi class="typed">${value}</bdi>${reason ? html` <span class="origin">${reason}</span>` : nothing}</li>`)}
                  </ul>`}
          </li>`,
        )}
      </ul>
    </div>
  `;
}

function renderTyped(typed: string, problems: readonly Problem[]): TemplateResult {
  const shown = typed.length > LONGEST_TYPED ? `${typed.slice(0, LONGEST_TYPED)}…` : typed;
  return html`<p class="as-typed" part="typed">
    <span class="origin">${words.typed}</span>
    <bdi class="typed">${pieces(shown, problems).map(({ text, marked }) =>
      marked ? html`<mark><span class="visually-hidden">${words.here} </span>${text}</mark>` : text,
    )}</bdi>
  </p>`;
}

/** The text cut at the borders of the offending pieces; overlapping ones become one. */
function pieces(typed: string, problems: readonly Problem[]): { text: string; marked: boolean }[] {
  const ranges = problems
    .map(({ range }) => range)
    .filter((range): range is TextRange => range !== undefined && range.start >= 0 && range.end > range.start && range.end <= typed.length)
    .sort((one, other) => one.start - other.start);
  const parts: { text: string; marked: boolean }[] = [];
  let done = 0;
  for (const { start, end } of ranges) {
    if (end <= done) continue;
    if (start > done) parts.push({ text: typed.slice(done, start), marked: false });
    parts.push({ text: typed.slice(Math.max(start, done), end), marked: true });
    done = end;
  }
  if (done < typed.length) parts.push({ text: typed.slice(done), marked: false });
  return parts;
}
