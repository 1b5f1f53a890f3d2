// The intake form: what is typed goes to the card, what the card hands over goes to the store.
import { downloadJson } from './download.js';
import { addSample, listSamples, referenceOf, removeSample } from './samples.js';
import { failureText, pHText, say } from './wording.js';
import { showSamples } from './sample-table.js';

const TYPING_PAUSE = 200;

const form = document.querySelector('#intake');
const { sample, solutes, volume, temperature, air, solids } = form.elements;
const card = document.querySelector('solute-card');
const status = document.querySelector('#status');
const sampleError = document.querySelector('#sample-error');
const confirmation = document.querySelector('#confirm');

/** The stored sample that the form shows. */
let opened;
let pause;

function tellCard() {
  clearTimeout(pause);
  card.label = sample.value.trim();
  card.solutes = solutes.value;
  card.volume = volume.value.trim();
  card.temperature = temperature.value.trim();
  card.air = air.value;
  card.solids = solids.value;
}

function showSampleError(wrong) {
  sampleError.hidden = !wrong;
  sample.setAttribute('aria-invalid', String(wrong));
}

form.addEventListener('input', (event) => {
  if (event.target === sample && sample.value.trim()) showSampleError(false);
  say(status, '');
  clearTimeout(pause);
  pause = setTimeout(tellCard, TYPING_PAUSE);
});
form.addEventListener('change', tellCard);
form.addEventListener('submit', (event) => event.preventDefault());
form.addEventListener('reset', () => {
  // The fields are emptied after this event.
  setTimeout(() => {
    opened = undefined;
    showSampleError(false);
    say(status, '');
    tellCard();
    refresh();
    sample.focus();
  });
});

form.querySelector('.examples').addEventListener('click', ({ target }) => {
  const example = target.closest('button');
  if (!example) return;
  solutes.value = example.dataset.solutes;
  volume.value = example.dataset.volume ?? '';
  tellCard();
});

card.addEventListener('solute-store', (event) => event.detail.waitUntil(store(event.detail.record)));

async function store(record) {
  const number = sample.value.trim();
  if (!number) {
    showSampleError(true);
    sample.focus();
    throw new Error('The sample has no number yet.');
  }
  let added;
  try {
    added = await addSample({
      sample: number,
      solutes: record.solutes,
      storedAt: new Date().toISOString(),
      record,
    });
  } catch (error) {
    say(status, `${number} was not stored. ${failureText(error)}`, 'alarm');
    throw new Error(failureText(error));
  }
  const reference = referenceOf(added.number);
  opened = { number: added.number, record };
  say(status, added.known ? `${number} with this result is already stored as ${reference}.` : `${number} stored as ${reference}.`);
  await refresh();
  return reference;
}

function open(entry) {
  clearTimeout(pause);
  opened = entry;
  sample.value = entry.sample;
  solutes.value = entry.solutes;
  const { conditions } = entry.record;
  volume.value = conditions.volume ?? '';
  temperature.value = conditions.temperature;
  air.value = conditions.air;
  solids.value = conditions.solids;
  showSampleError(false);
  say(status, `${referenceOf(entry.number)} opened.`);
  card.restore(entry.record);
  refresh();
  sample.focus();
  form.scrollIntoView({ block: 'nearest' });
}

async function remove(entry) {
  confirmation.querySelector('#confirm-text').textContent = `${referenceOf(entry.number)}, sample ${entry.sample}, pH ${pHText(entry.record)}. This cannot be undone.`;
  confirmation.returnValue = 'keep';
  confirmation.showModal();
  await new Promise((resolve) => confirmation.addEventListener('close', resolve, { once: true }));
  if (confirmation.returnValue !== 'delete') return;
  try {
    await removeSample(entry.number);
  } catch (error) {
    say(status, `${referenceOf(entry.number)} was not deleted. ${failureText(error)}`, 'alarm');
    return;
  }
  if (opened?.number === entry.number) opened = undefined;
  say(status, `${referenceOf(entry.number)} deleted.`);
  await refresh();
  document.querySelector('#stored-title').focus();
}

const exportOne = (entry) => downloadJson(`${referenceOf(entry.number)}.json`, { reference: referenceOf(entry.number), ...entry });

async function refresh() {
  try {
    const entries = await listSamples();
    showSamples(entries, opened?.number, { open, export: exportOne, delete: remove });
  } catch (error) {
    say(status, `The stored samples cannot be read. ${failureText(error)}`, 'alarm');
  }
}

document.querySelector('#export-all').addEventListener('click', async () => {
  const entries = await listSamples();
  downloadJson('stored-samples.json', entries.map((entry) => ({ reference: referenceOf(entry.number), ...entry })));
  say(status, `${entries.length} ${entries.length === 1 ? 'sample' : 'samples'} exported.`);
});

// Browsers put back what was typed when a page is reloaded or gone back to, without an input event.
addEventListener('pageshow', tellCard);
tellCard();
refresh();
