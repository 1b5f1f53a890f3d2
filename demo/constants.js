// The table of all constants: filtered as is typed, sorted by the buttons of its head, the first matches first.
import { constants } from './constants-list.js';

const table = document.querySelector('#constants');
const body = table.tBodies[0];
const field = document.querySelector('#search');
const status = document.querySelector('#count');
const more = document.querySelector('#more');
/** Lines shown until all are asked for. */
const FIRST = 100;
const NOT_STATED = 'not stated';
/** Time without typing after which the count is announced. */
const PAUSE = 250;

const signed = (value) => String(value).replaceAll('-', '−');
const make = (tag, ...children) => {
  const element = document.createElement(tag);
  element.append(...children);
  return element;
};

function figures(value) {
  const node = make('span', [value].flat().map(signed).join('; '));
  node.className = 'figures';
  return node;
}

/** A formula with lowered digits and raised charge. */
function formulaNode({ formula, charge }) {
  const node = make('span');
  node.className = 'formula';
  for (const [run] of formula.matchAll(/(?<=[A-Za-z)\]])\d+|(?:(?<![A-Za-z)\]])\d|\D)+/g)) node.append(/^\d/.test(run) && node.hasChildNodes() ? make('sub', run) : run);
  if (charge !== 0) node.append(make('sup', `${Math.abs(charge) === 1 ? '' : Math.abs(charge)}${charge > 0 ? '+' : '−'}`));
  return node;
}

const plain = (part) => (typeof part === 'string' ? part : `${part.formula}${part.charge === 0 ? '' : `${Math.abs(part.charge) === 1 ? '' : Math.abs(part.charge)}${part.charge > 0 ? '+' : '-'}`}`);

/** The columns in the order of the head: what a cell shows, and what it sorts by. */
const COLUMNS = [
  { label: 'Belongs to', show: ({ kind, of }) => [make('small', kind), ' ', ...of.map((part) => (typeof part === 'string' ? part : formulaNode(part)))], by: ({ kind, of }) => `${kind} ${of.map(plain).join('')}` },
  { label: 'Quantity', show: ({ quantity }) => [quantity], by: ({ quantity }) => quantity },
  { label: 'Value', show: ({ value }) => [figures(value)], by: ({ value }) => (Array.isArray(value) ? value[0] : value) },
  { label: 'Unit', show: ({ unit }) => [unit], by: ({ unit }) => unit },
  {
    label: 'Uncertainty',
    show: ({ uncertainty, grade }) => [(uncertainty ?? null) === null ? `${NOT_STATED}${grade === undefined ? '' : ` (grade ${grade})`}` : figures(uncertainty)],
    by: ({ uncertainty }) => uncertainty ?? Infinity,
  },
  { label: 'Conditions', show: ({ conditions }) => (conditions.length === 0 ? ['none'] : conditions.map((line) => make('div', signed(line).replace(/(?<=[a-z])−(?=[a-z])/gi, '-')))), by: ({ conditions }) => conditions.join(' ') },
  { label: 'Source', show: ({ source }) => [source], by: ({ source }) => source },
  { label: 'Obtained', show: ({ obtained }) => [obtained], by: ({ obtained }) => obtained },
];

/** Letters of one case, one kind of minus, and no accents: what is typed and what is shown meet there. */
const searchable = (text) => text.normalize('NFKD').replace(/\p{M}/gu, '').replaceAll('−', '-').toLowerCase();

const rows = constants.map((constant) => {
  const element = make('tr');
  element.setAttribute('role', 'row');
  for (const { label, show } of COLUMNS) {
    const cell = make('td', ...show(constant));
    // Rows that are laid out as blocks would lose the roles of a table.
    cell.setAttribute('role', 'cell');
    cell.dataset.label = label;
    element.append(cell);
  }
  const keys = COLUMNS.map(({ by }) => by(constant));
  return { element, keys, text: searchable(`${keys[0]} ${constant.also ?? ''} ${element.textContent}`) };
});

const sorting = { column: undefined, descending: false };
let matches = rows;
let all = false;

function show() {
  const shown = all ? matches : matches.slice(0, FIRST);
  shown.forEach(({ element }, place) => element.setAttribute('aria-rowindex', String(place + 2)));
  body.replaceChildren(...shown.map(({ element }) => element));
  table.setAttribute('aria-rowcount', String(matches.length + 1));
  more.hidden = shown.length === matches.length;
  more.textContent = `Show all ${matches.length}`;
}

function announce() {
  const found = matches.length === rows.length ? `${rows.length} constants` : `${matches.length} of ${rows.length} constants match`;
  const part = !all && matches.length > FIRST ? `, the first ${FIRST} shown` : '';
  const order = sorting.column === undefined ? '' : ` Sorted by ${COLUMNS[sorting.column].label.toLowerCase()}, ${sorting.descending ? 'descending' : 'ascending'}.`;
  const text = `${found}${part}.${order}`;
  if (status.textContent !== text) status.textContent = text;
}

function filter() {
  const words = searchable(field.value).split(/\s+/).filter(Boolean);
  matches = rows.filter(({ text }) => words.every((word) => text.includes(word)));
  show();
}

const order = new Intl.Collator('en', { numeric: true }).compare;
const compare = (a, b) => (typeof a === 'number' && typeof b === 'number' ? (a === b ? 0 : a - b) : order(String(a), String(b)));

function sortBy(column) {
  Object.assign(sorting, { column, descending: sorting.column === column && !sorting.descending });
  rows.sort(({ keys: a }, { keys: b }) => compare(a[column], b[column]) * (sorting.descending ? -1 : 1));
  filter();
  table.querySelectorAll('thead th').forEach((head, place) => {
    if (place === column) head.setAttribute('aria-sort', sorting.descending ? 'descending' : 'ascending');
    else head.removeAttribute('aria-sort');
  });
  announce();
}

let pause;
field.addEventListener('input', () => {
  all = false;
  filter();
  clearTimeout(pause);
  pause = setTimeout(announce, PAUSE);
});
// The form is there for the keyboard's search key; nothing is sent.
field.form.addEventListener('submit', (event) => event.preventDefault());
more.addEventListener('click', () => {
  all = true;
  show();
  announce();
  // The button is gone, so that the keyboard goes on with the first line that it brought.
  const next = body.rows[FIRST];
  next.tabIndex = -1;
  next.focus();
});
table.querySelectorAll('thead button').forEach((button, column) => button.addEventListener('click', () => sortBy(column)));

filter();
announce();
