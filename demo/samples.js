// Where the pages keep things: one IndexedDB database, samples numbered by the database itself so that no reference
// is ever given twice, and the notebook page under its own name.
import { openDB } from '/vendor/idb.js';

let opening;

function database() {
  opening ??= openDB('tarnsound-solution-desk', 1, {
    upgrade(db) {
      db.createObjectStore('samples', { keyPath: 'number', autoIncrement: true });
      db.createObjectStore('pages', { keyPath: 'page' });
    },
  });
  // A refused opening must not stay refused for ever: the next call tries again.
  opening.catch(() => {
    opening = undefined;
  });
  return opening;
}

/** The reference people write on the bottle. */
export const referenceOf = (number) => `IN-${String(number).padStart(4, '0')}`;

/** Stores a sample and gives its number. The same sample with the same result is stored once. */
export async function addSample(entry) {
  const db = await database();
  const transaction = db.transaction('samples', 'readwrite');
  for await (const cursor of transaction.store) {
    const known = cursor.value;
    if (known.sample === entry.sample && known.record.digest === entry.record.digest) return { number: known.number, known: true };
  }
  const number = await transaction.store.add(entry);
  await transaction.done;
  return { number, known: false };
}

/** All samples, newest first. */
export async function listSamples() {
  const db = await database();
  return (await db.getAll('samples')).reverse();
}

export async function removeSample(number) {
  const db = await database();
  await db.delete('samples', number);
}

export async function keepPage(page) {
  const db = await database();
  await db.put('pages', page);
}

export async function keptPage(name) {
  const db = await database();
  return db.get('pages', name);
}
