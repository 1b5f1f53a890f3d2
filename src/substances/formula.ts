import elements from '../../data/elements.json';

/** Atoms per formula. Half numbers occur in hydrates. */
export type Composition = ReadonlyMap<string, number>;

export interface Formula {
  readonly composition: Composition;
  /** Moles of water written apart ("·12H2O"). */
  readonly hydrateWater: number;
  /** Formula before the first hydrate dot, plain digits. */
  readonly anhydrous: string;
  /** The whole formula in canonical typing: plain digits, middle dots. */
  readonly canonical: string;
  /** Charge written at the end, 0 when none. */
  readonly charge: number;
}

export interface FormulaFailure {
  readonly failure: 'unreadable' | 'element-unknown';
  /** Position of the offending character in the text given. */
  readonly at: number;
  readonly length: number;
}

const WEIGHTS = new Map(Object.entries(elements.elements as unknown as Record<string, readonly [number, number]>));
const ADDITION_DOTS = '·⋅∙•*.';
const MOST_ATOMS = 10000;

/**
 * Reads a chemical formula with nested brackets, subscripts in any usual typing, addition dots and a charge at the end.
 * @returns the formula, or where it stops being one.
 */
export function parseFormula(text: string): Formula | FormulaFailure {
  const plain = plainFormula(text);
  const { body, charge } = splitCharge(plain);
  const composition = new Map<string, number>();
  const parts: string[] = [];
  let hydrateWater = 0;
  let offset = 0;
  for (const part of splitAtDots(body)) {
    const at = body.indexOf(part, offset);
    offset = at + part.length;
    const coefficient = /^\s*(\d+\/\d+|\d*[.,]?\d+|[½¼¾])?\s*/.exec(part)!;
    const factor = coefficient[1] === undefined ? 1 : fraction(coefficient[1]);
    const rest = part.slice(coefficient[0].length).trimEnd();
    if (rest === '' || (parts.length === 0 && coefficient[1] !== undefined)) return { failure: 'unreadable', at, length: Math.max(1, part.length) };
    const group = new GroupReader(rest).read();
    if ('failure' in group) return { ...group, at: group.at + at + coefficient[0].length };
    for (const [element, count] of group.composition) composition.set(element, (composition.get(element) ?? 0) + count * factor);
    if (parts.length > 0 && rest === 'H2O') hydrateWater += factor;
    parts.push(parts.length === 0 || coefficient[1] === undefined ? rest : `${decimalText(factor)}${rest}`);
  }
  return { composition, hydrateWater, anhydrous: parts[0]!, canonical: parts.join('·'), charge };
}

/** Parts between addition dots. A full stop after nothing but digits is the point of a number: "·0.5H2O". */
function splitAtDots(body: string): string[] {
  const parts = [''];
  for (const character of body) {
    const current = parts[parts.length - 1]!;
    const isDot = ADDITION_DOTS.includes(character) && !(character === '.' && parts.length > 1 && /^\s*\d*$/.test(current));
    if (isDot) parts.push('');
    else parts[parts.length - 1] = current + character;
  }
  return parts;
}

/** Molar mass, g/mol, with the abridged standard atomic weights of data/elements.json. */
export function molarMass(composition: Composition): number {
  let mass = 0;
  for (const [element, count] of composition) mass += WEIGHTS.get(element)![0] * count;
  // Atomic weights have at most six decimals; the sum's rounding noise beyond them is taken away.
  return Math.round(mass * 1e6) / 1e6;
}

/** Composition as one string, for comparing: elements in alphabetical order. */
export function compositionKey(composition: Composition): string {
  return [...composition]
    .filter(([, count]) => count !== 0)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([element, count]) => element + String(count))
    .join(' ');
}

/** A formula's composition where it is known to be well formed (the data files). */
export function compositionOf(formula: string): Composition {
  const parsed = parseFormula(formula);
  if ('failure' in parsed) throw new RangeError(`not a formula: ${formula}`);
  return parsed.composition;
}

/** Plain digits, ASCII brackets and signs. */
export function plainFormula(text: string): string {
  return text
    .replace(/[\u2080-\u2089]/g, (digit) => String(digit.charCodeAt(0) - 0x2080))
    .replace(/[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]/g, (digit) => `^${'⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit)}`)
    .replace(/[\u2212\u207b\u2010-\u2013]/g, '-')
    .replace(/⁺/g, '+')
    .replace(/\^{1,}/g, '^')
    .replace(/[\u00a0\u2009\u202f\u200b]/g, ' ')
    .trim();
}

/**
 * Takes the charge off the end: "^2-", "+3", "--", "-" as they stand. A digit before the sign with no caret is the
 * charge after a bracket ("[Fe(CN)6]4-"), after another digit ("SO42-") and after a lone metal ("Fe3+"), else a subscript.
 */
function splitCharge(plain: string): { body: string; charge: number } {
  const repeated = /([+-])\1{1,3}$/.exec(plain);
  if (repeated) return { body: plain.slice(0, repeated.index), charge: (repeated[1] === '+' ? 1 : -1) * repeated[0].length };
  const after = /([+-])(\d)$/.exec(plain);
  if (after && after.index > 0) return { body: plain.slice(0, after.index), charge: Number(after[1]! + after[2]!) };
  const before = /(\^?)(\d?)([+-])$/.exec(plain);
  if (!before || before.index === 0) return { body: plain, charge: 0 };
  const [, caret, digit, sign] = before as unknown as [string, string, string, string];
  const body = plain.slice(0, before.index);
  const isCharge = caret === '^' || digit === '' || /[\d)\]}]$/.test(body) || (/^[A-Z][a-z]?$/.test(body) && !/^(?:N|I|Br)$/.test(body));
  if (isCharge) return { body, charge: Number(`${sign}${digit === '' ? '1' : digit}`) };
  return { body: body + digit, charge: Number(`${sign}1`) };
}

function fraction(text: string): number {
  if (text === '½') return 0.5;
  if (text === '¼') return 0.25;
  if (text === '¾') return 0.75;
  const [top, bottom] = text.replace(',', '.').split('/');
  return bottom === undefined ? Number(top) : Number(top) / Number(bottom);
}

function decimalText(value: number): string {
  return value === 1 ? '' : String(value);
}

const CLOSING: Readonly<Record<string, string>> = { '(': ')', '[': ']', '{': '}' };

class GroupReader {
  readonly #text: string;
  #at = 0;

  constructor(text: string) {
    this.#text = text;
  }

  read(): { composition: Map<string, number> } | FormulaFailure {
    const result = this.#group(undefined, 0);
    if ('failure' in result) return result;
    return this.#at === this.#text.length ? result : this.#fail();
  }

  #fail(failure: FormulaFailure['failure'] = 'unreadable', length = 1): FormulaFailure {
    return { failure, at: this.#at, length };
  }

  #group(closing: string | undefined, depth: number): { composition: Map<string, number> } | FormulaFailure {
    const composition = new Map<string, number>();
    while (this.#at < this.#text.length) {
      const character = this.#text[this.#at]!;
      if (character === closing) return { composition };
      let inner: Map<string, number>;
      if (Object.hasOwn(CLOSING, character) && depth < 8) {
        this.#at++;
        const group = this.#group(CLOSING[character], depth + 1);
        if ('failure' in group) return group;
        if (this.#text[this.#at] !== CLOSING[character] || group.composition.size === 0) return this.#fail();
        this.#at++;
        inner = group.composition;
      } else {
        const symbol = /^[A-Z][a-z]?/.exec(this.#text.slice(this.#at, this.#at + 2))?.[0];
        if (symbol === undefined) return this.#fail();
        const known = WEIGHTS.has(symbol) ? symbol : WEIGHTS.has(symbol[0]!) ? undefined : null;
        if (known === undefined || known === null) return this.#fail('element-unknown', symbol.length);
        this.#at += symbol.length;
        inner = new Map([[symbol, 1]]);
      }
      const count = this.#count();
      if (count === 0 || count > MOST_ATOMS) return this.#fail();
      for (const [element, number] of inner) composition.set(element, (composition.get(element) ?? 0) + number * count);
    }
    return closing === undefined && composition.size > 0 ? { composition } : this.#fail();
  }

  #count(): number {
    const digits = /^\d{1,5}/.exec(this.#text.slice(this.#at))?.[0];
    if (digits === undefined) return 1;
    this.#at += digits.length;
    return Number(digits);
  }
}
