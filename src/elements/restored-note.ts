import { html, nothing, type TemplateResult } from 'lit';
import { verifyRecord, type Caution, type Prediction, type SoluteRecord, type Verification } from '../engine.js';
import { classificationText } from './announcements.js';
import { renderGravity } from './cautions.js';
import type { Numbers } from './numbers.js';
import type { Outcome } from './outcome.js';
import { english as strings } from './strings/english.js';

const words = strings.restored;
/** Changed constants that are listed one by one. */
const MOST_LISTED = 5;

/** What is to be said of a record that was brought back and does not give the same result. */
export interface RestoredNote {
  readonly gravity: Caution['gravity'];
  readonly text: string;
  /** Changed constants, a phrase each. */
  readonly constants: readonly string[];
}

const TAMPERED: RestoredNote = { gravity: 'warning', text: words.tampered, constants: [] };

/** Compares a stored record with what the card computes now; a store may have handed over anything. */
export function noteOnRestored(stored: SoluteRecord, outcome: Outcome, numbers: Numbers): RestoredNote | undefined {
  try {
    const verification = verifyRecord(stored);
    return verification.verdict === 'tampered' ? TAMPERED : noteOf(stored, verification, outcome, numbers);
  } catch {
    return TAMPERED;
  }
}

function noteOf(stored: SoluteRecord, verification: Verification, outcome: Outcome, numbers: Numbers): RestoredNote | undefined {
  const figures = ({ pH, uncertainty, classification, decided }: Pick<Prediction, 'pH' | 'uncertainty' | 'classification' | 'decided'>) =>
    words.figures(numbers.pH(pH, uncertainty), numbers.uncertainty(uncertainty), classificationText({ classification, decided }));
  const before = figures(stored);
  if (outcome.state !== 'predicted') return { gravity: 'note', text: words.notComputable(before), constants: [] };
  const { prediction, record } = outcome;
  if (verification.verdict !== 'changed' && record.pH === stored.pH && record.uncertainty === stored.uncertainty) return undefined;
  const now = figures(prediction);
  return {
    gravity: 'note',
    text: before === now ? words.sameDigits(before) : words.changed(before, now),
    constants: verification.verdict === 'changed' ? changedConstants(stored, verification.constants, prediction, numbers) : [],
  };
}

function changedConstants(
  stored: SoluteRecord,
  changed: Extract<Verification, { verdict: 'changed' }>['constants'],
  { constants }: Prediction,
  numbers: Numbers,
): string[] {
  const value = (number: number | null) => (number === null ? words.absent : numbers.plain(number, 4));
  const listed = changed.slice(0, MOST_LISTED).map(({ id, stored: before, now }) => {
    const used = constants.find((constant) => constant.id === id);
    const quantity = used?.quantity ?? stored.constants.find((constant) => constant.id === id)?.quantity ?? '';
    return words.constant(`${quantity} ${used?.description ?? id}`.trim(), value(before), value(now));
  });
  const more = changed.length - listed.length;
  return more > 0 ? [...listed, words.more(numbers.fixed(more, 0))] : listed;
}

export function renderRestoredNote(note: RestoredNote | undefined): TemplateResult | typeof nothing {
  if (!note) return nothing;
  const { gravity, text, constants } = note;
  return html`
    <div class=${`caution restored ${gravity}`} part="restored">
      ${renderGravity(gravity)}
      <div>
        <p class="sentence">${gravity === 'note' ? nothing : html`<strong>${strings.cautions.gravity[gravity]}.</strong> `}${text}</p>
        ${constants.length === 0
          ? nothing
          : html`<p class="sentence origin">${words.constants}</p>
              <ul>${constants.map((constant) => html`<li class="sentence origin">${constant}</li>`)}</ul>`}
      </div>
    </div>
  `;
}
