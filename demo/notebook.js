// The notebook page: shows each card's result in the table, keeps the records with the page, brings them back.
import { download } from './download.js';
import { keepPage, keptPage } from './samples.js';
import { failureText, momentText, pHText, say } from './wording.js';

const PAGE = 'page-118';

const cards = [...document.querySelectorAll('solute-card')];
const readings = document.querySelector('#readings');
const inputs = [...readings.querySelectorAll('input')];
const status = document.querySelector('#status');

function showExpected(card) {
  const cell = readings.querySelector(`[data-card="${card.id}"]`);
  cell.textContent = card.prediction ? pHText(card.prediction) : 'not predicted';
}

document.addEventListener('solute-prediction', ({ target }) => showExpected(target));
document.addEventListener('solute-problem', ({ target }) => showExpected(target));
document.addEventListener('solute-store', (event) => event.detail.waitUntil(save().then(() => 'page 118')));
readings.addEventListener('input', () => say(status, 'Readings not saved yet.'));

async function save() {
  const records = Object.fromEntries(cards.filter((card) => card.record).map((card) => [card.id, card.record]));
  const typed = Object.fromEntries(inputs.map((input) => [input.name, input.value]));
  try {
    await keepPage({ page: PAGE, savedAt: new Date().toISOString(), records, readings: typed });
  } catch (error) {
    say(status, `The page was not saved. ${failureText(error)}`, 'alarm');
    throw new Error(failureText(error));
  }
  const count = Object.keys(records).length;
  say(status, `Saved with ${count} ${count === 1 ? 'result' : 'results'}.`);
}

async function bringBack() {
  let kept;
  try {
    kept = await keptPage(PAGE);
  } catch (error) {
    say(status, `The saved page cannot be read. ${failureText(error)}`, 'alarm');
    return;
  }
  if (!kept) return;
  for (const input of inputs) input.value = kept.readings[input.name] ?? '';
  await Promise.all(cards.map((card) => card.predictionComplete));
  const changed = cards.filter((card) => {
    const record = kept.records[card.id];
    return record && card.record && pHText(record) !== pHText(card.record);
  });
  const saved = `As saved on ${momentText(kept.savedAt)}.`;
  if (changed.length === 0) say(status, saved);
  else say(status, `${saved} Computed differently now: ${changed.map((card) => `${card.label} (then pH ${pHText(kept.records[card.id])})`).join(', ')}.`, 'alarm');
}

/** The page as text that survives without any script: keep-text has written every result into it. */
function copy() {
  download('page-118.html', 'text/html', `<!doctype html>\n${document.documentElement.outerHTML}\n`);
  say(status, 'Downloaded; the results stand in it as text.');
}

// A refusal has been said on the page already.
document.querySelector('#save').addEventListener('click', () => save().catch(() => {}));
document.querySelector('#copy').addEventListener('click', copy);
document.querySelector('#print').addEventListener('click', () => print());

await customElements.whenDefined('solute-card');
await Promise.all(cards.map((card) => card.predictionComplete));
cards.forEach(showExpected);
await bringBack();
