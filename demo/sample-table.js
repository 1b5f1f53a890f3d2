// The table of stored samples.
import { referenceOf } from './samples.js';
import { classText, conditionsText, momentText, pHText } from './wording.js';

const table = document.querySelector('#samples');
const row = document.querySelector('#row');
const none = document.querySelector('#none');
const exportAll = document.querySelector('#export-all');

/** Shows the entries; `actions` are called with the entry of the row. */
export function showSamples(entries, opened, actions) {
  none.hidden = entries.length > 0;
  table.hidden = exportAll.hidden = entries.length === 0;
  const focused = focusedAction();
  table.tBodies[0].replaceChildren(...entries.map((entry) => rowOf(entry, entry.number === opened, actions)));
  if (focused) table.querySelector(focused)?.focus();
}

function rowOf(entry, current, actions) {
  const filled = row.content.cloneNode(true).firstElementChild;
  const cell = (name) => filled.querySelector(`[data-cell="${name}"]`);
  const reference = referenceOf(entry.number);
  cell('reference').textContent = reference;
  cell('sample').textContent = entry.sample;
  cell('solutes').textContent = entry.solutes;
  cell('conditions').textContent = conditionsText(entry);
  cell('pH').textContent = pHText(entry.record);
  cell('class').textContent = classText(entry.record);
  cell('time').textContent = momentText(entry.storedAt);
  cell('time').dateTime = entry.storedAt;
  if (current) filled.setAttribute('aria-current', 'true');
  for (const button of filled.querySelectorAll('button')) {
    button.dataset.number = entry.number;
    button.setAttribute('aria-label', `${button.textContent} ${reference}`);
    button.addEventListener('click', () => actions[button.dataset.action](entry));
  }
  return filled;
}

/** The rows are made anew; the keyboard stays on the button it was on. */
function focusedAction() {
  const { action, number } = document.activeElement?.closest('#samples button')?.dataset ?? {};
  return action && `button[data-action="${action}"][data-number="${number}"]`;
}
