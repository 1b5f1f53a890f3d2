import { Decimal } from './decimal.js';

/** Exponents of amount of substance (mol), mass (g) and length (m). */
export interface Dimension {
  readonly amount: number;
  readonly mass: number;
  readonly length: number;
}

/** A unit as a factor to mol, g and m. */
export interface Unit {
  readonly factor: Decimal;
  readonly dimension: Dimension;
}

const PREFIXES: Readonly<Record<string, string>> = { n: '1e-9', u: '1e-6', m: '1e-3', c: '1e-2', d: '1e-1', k: '1e3' };
const ATOMS: Readonly<Record<string, Unit>> = {
  mol: atom('1', 1, 0, 0),
  g: atom('1', 0, 1, 0),
  L: atom('1e-3', 0, 0, 3),
  l: atom('1e-3', 0, 0, 3),
  m: atom('1', 0, 0, 1),
};
/** The laboratory's M: mol per litre of solution. */
const MOLAR = /^([num]?)M$/;

function atom(factor: string, amount: number, mass: number, length: number): Unit {
  return { factor: new Decimal(factor), dimension: { amount, mass, length } };
}

/**
 * Reads a unit: UCUM case-sensitive codes over mol, g, L, m with the prefixes n, u, m, c, d, k ("mol/L", "g/(100.mL)",
 * "umol.L-1"), and the laboratory's M, mM, uM, nM.
 * Micro signs, raised digits, middle dots and the minus sign are accepted for their plain forms.
 * @returns undefined when the text is no such unit.
 */
export function parseUnit(text: string): Unit | undefined {
  if (KNOWN.has(text)) return KNOWN.get(text);
  const unit = readUnit(plainUnit(text));
  if (KNOWN.size >= MOST_KNOWN) KNOWN.clear();
  KNOWN.set(text, unit);
  return unit;
}

/** Units already read; a page writes the same few again and again. */
const KNOWN = new Map<string, Unit | undefined>();
const MOST_KNOWN = 256;

function readUnit(plain: string): Unit | undefined {
  const molar = MOLAR.exec(plain);
  if (molar) {
    const prefix = molar[1] === '' ? '1' : PREFIXES[molar[1]!]!;
    return { factor: new Decimal(prefix).times(1000), dimension: { amount: 1, mass: 0, length: -3 } };
  }
  const reader = new UnitReader(plain);
  return reader.read();
}

/** The text in the characters of UCUM. */
export function plainUnit(text: string): string {
  return text
    .replace(/[\u00b5\u03bc]/g, 'u')
    .replace(/[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]/g, (digit) => String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit)))
    .replace(/[\u207b\u2212\u2010-\u2012]/g, '-')
    .replace(/[·⋅∙×*]/g, '.')
    .replace(/ℓ/g, 'L')
    .replace(/dm3/g, 'L')
    .replace(/\^/g, '');
}

class UnitReader {
  readonly #text: string;
  #at = 0;

  constructor(text: string) {
    this.#text = text;
  }

  read(): Unit | undefined {
    const unit = this.#product();
    return unit && this.#at === this.#text.length ? unit : undefined;
  }

  #product(): Unit | undefined {
    let result = this.#text[this.#at] === '/' ? { factor: new Decimal(1), dimension: { amount: 0, mass: 0, length: 0 } } : this.#term();
    while (result && (this.#text[this.#at] === '.' || this.#text[this.#at] === '/')) {
      const sign = this.#text[this.#at++] === '/' ? -1 : 1;
      const term = this.#term();
      if (!term) return undefined;
      result = combine(result, term, sign);
    }
    return result;
  }

  #term(): Unit | undefined {
    if (this.#text[this.#at] === '(') {
      this.#at++;
      const inner = this.#product();
      return inner && this.#text[this.#at++] === ')' ? inner : undefined;
    }
    const match = /^(?:(\d{1,6})|([A-Za-z]+)([+-]?\d)?)/.exec(this.#text.slice(this.#at));
    if (!match) return undefined;
    this.#at += match[0].length;
    if (match[1] !== undefined) return match[1].replace(/0/g, '') === '' ? undefined : { factor: new Decimal(match[1]), dimension: { amount: 0, mass: 0, length: 0 } };
    const base = prefixed(match[2]!);
    if (!base) return undefined;
    const exponent = match[3] === undefined ? 1 : Number(match[3]);
    if (exponent === 0) return undefined;
    return raise(base, exponent);
  }
}

function prefixed(name: string): Unit | undefined {
  if (Object.hasOwn(ATOMS, name)) return ATOMS[name];
  const prefix = name[0]!;
  const rest = name.slice(1);
  if (!Object.hasOwn(PREFIXES, prefix) || !Object.hasOwn(ATOMS, rest)) return undefined;
  const base = ATOMS[rest]!;
  return { factor: base.factor.times(PREFIXES[prefix]!), dimension: base.dimension };
}

function raise(unit: Unit, exponent: number): Unit {
  const { amount, mass, length } = unit.dimension;
  return { factor: unit.factor.pow(exponent), dimension: { amount: amount * exponent, mass: mass * exponent, length: length * exponent } };
}

function combine(a: Unit, b: Unit, sign: 1 | -1): Unit {
  return {
    factor: sign === 1 ? a.factor.times(b.factor) : a.factor.div(b.factor),
    dimension: {
      amount: a.dimension.amount + sign * b.dimension.amount,
      mass: a.dimension.mass + sign * b.dimension.mass,
      length: a.dimension.length + sign * b.dimension.length,
    },
  };
}
