import { readFileSync } from 'node:fs';

/** Keys that explain a constant to the reader of the data files; no code reads them. */
const DOCUMENTATION_KEYS = new Set(['note', 'choice', 'check']);

/** Shorter lists stay as they are: columns pay from a few rows on. */
const FEWEST_ROWS = 4;

/** The value of a data file without what only documents it. */
export function withoutDocumentation(text) {
  return JSON.parse(text, (key, value) => (DOCUMENTATION_KEYS.has(key) ? undefined : value));
}

/**
 * What a module needs to put lists of objects together again. Written by columns, a table is an eighth smaller after
 * compression than written by rows, because like stands beside like.
 *   rows: a list of objects from its columns; a hole is a key that the object lacks
 *   tuples: a list of lists from its columns
 *   groups: a list cut into lists of the given lengths; a hole is a list that its object lacks
 */
const HELPERS = {
  rows: 'const rows = (length, columns) => { const list = []; for (let row = 0; row < length; row++) { const made = list[row] = {}; for (const key in columns) if (row in columns[key]) made[key] = columns[key][row]; } return list; };',
  tuples: 'const tuples = (columns) => columns[0].map((_, row) => columns.map((column) => column[row]));',
  groups: 'const groups = (lengths, list) => { let end = 0; return lengths.map((length) => list.slice(end, (end += length))); };',
};

const isObject = (value) => value !== null && typeof value === 'object' && !Array.isArray(value);
const isTable = (value) => Array.isArray(value) && value.length > 0 && value.every(isObject);

/** A list with a hole wherever the value is absent. */
function list(values, write) {
  const written = values.map((value) => (value === undefined ? '' : write(value))).join(',');
  return `[${written}${values.at(-1) === undefined && values.length > 0 ? ',' : ''}]`;
}

function columnOf(values, expression) {
  const present = values.filter((value) => value !== undefined);
  if (!present.every(isTable)) return list(values, expression);
  return `/*@__PURE__*/groups(${list(values, (value) => String(value.length))},${expression(present.flat())})`;
}

function expression(value) {
  if (isTable(value) && value.length >= FEWEST_ROWS) {
    const keys = [...new Set(value.flatMap(Object.keys))];
    const columns = keys.map((key) => `${JSON.stringify(key)}:${columnOf(value.map((row) => row[key]), expression)}`);
    return `/*@__PURE__*/rows(${value.length},{${columns.join(',')}})`;
  }
  if (Array.isArray(value)) {
    const [first] = value;
    const uniform = value.length >= FEWEST_ROWS && value.every((row) => Array.isArray(row) && row.length > 0 && row.length === first.length);
    return uniform
      ? `/*@__PURE__*/tuples(${list(first.map((_, place) => value.map((row) => row[place])), (column) => list(column, expression))})`
      : list(value, expression);
  }
  if (isObject(value)) return `{${Object.entries(value).map(([key, inner]) => `${JSON.stringify(key)}:${expression(inner)}`).join(',')}}`;
  return JSON.stringify(value);
}

/** A data file as the source of a JavaScript module. */
export function dataModule(text) {
  const code = `export default ${expression(withoutDocumentation(text))};\n`;
  const helpers = Object.entries(HELPERS).filter(([name]) => code.includes(`/${name}(`)).map(([, helper]) => `${helper}\n`);
  return helpers.join('') + code;
}

/** Rollup plugin: data/*.json as modules. */
export function dataModules() {
  return {
    name: 'data-modules',
    load(id) {
      if (!id.endsWith('.json')) return null;
      this.addWatchFile(id);
      return { code: dataModule(readFileSync(id, 'utf8')), map: { mappings: '' }, moduleSideEffects: false };
    },
  };
}
