import { Decimal } from './decimal.js';
import { exp10 } from './reproducible-math.js';
import { parseUnit, plainUnit, type Unit } from './units.js';

/** What kind of statement an amount is, and so what it needs to become mol per kilogram of water. */
export type AmountKind = 'amount-concentration' | 'mass-concentration' | 'mass-fraction' | 'molality' | 'amount' | 'mass';

/** An amount as typed, exact. */
export interface Amount {
  readonly kind: AmountKind;
  /** mol/L, g/L, g/g, mol/kg, mol or g, by kind. */
  readonly value: Decimal;
  /** Half of the last digit typed, relative to the value. */
  readonly relativeHalfDigit: number;
  readonly number: string;
  readonly unit: string;
  /** True when a decimal comma was read. */
  readonly decimalComma: boolean;
}

/** Why a text is not an amount. */
export interface AmountFailure {
  readonly failure: 'not-a-number' | 'grouped-number' | 'unit-missing' | 'unit-unknown' | 'unit-ambiguous' | 'unit-not-an-amount';
  /** For an ambiguous unit: the question that settles it, and what to write instead. */
  readonly question?: string;
  readonly instead?: readonly string[];
}

const NUMBER = /^[+]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d{1,4}|[ \u00a0\u2009\u202f]?[x×·*][ \u00a0\u2009\u202f]?10(?:\^?[+-]?\d{1,3}))?/;
const UNIT_KINDS: readonly (readonly [AmountKind, number, number, number, string])[] = [
  ['amount-concentration', 1, 0, -3, '1e-3'],
  ['mass-concentration', 0, 1, -3, '1e-3'],
  ['molality', 1, -1, 0, '1e3'],
  ['amount', 1, 0, 0, '1'],
  ['mass', 0, 1, 0, '1'],
];

/** Units that mean two things in a laboratory; each with the question that settles it. */
const AMBIGUOUS: Readonly<Record<string, readonly [question: string, ...instead: string[]]>> = {
  '%': ['Percent of what: mass in volume (% w/v, g in 100 mL of solution) or mass in mass (% w/w, g in 100 g of solution)?', '% w/v', '% w/w'],
  N: ['Normality depends on the reaction: how many equivalents per mole? Write mol/L.', 'mol/L'],
  m: ['Molal is written mol/kg here, since m is the metre.', 'mol/kg'],
  ppm: ['Parts per million by mass or by volume? Write mg/L or mg/kg as mol/L.', 'mg/L'],
  ppb: ['Parts per billion by mass or by volume? Write ug/L.', 'ug/L'],
  eq: ['Equivalents depend on the reaction. Write mol.', 'mol/L'],
  'eq/L': ['Equivalents depend on the reaction. Write mol/L.', 'mol/L'],
  'meq/L': ['Equivalents depend on the reaction. Write mmol/L.', 'mmol/L'],
};

/** Length of the number at the start of a text, 0 when there is none. */
export function numberLength(text: string): number {
  return NUMBER.exec(plainNumber(text))?.[0].length ?? 0;
}

/**
 * Reads a number and a unit.
 * @param number as typed: decimal point or comma, exponent as 1e-3 or 1×10^-3, raised digits, Unicode minus.
 * @param unit as typed.
 */
export function readAmount(number: string, unit: string): Amount | AmountFailure {
  const plain = plainNumber(number);
  if (NUMBER.exec(plain)?.[0].length !== plain.length) return { failure: 'not-a-number' };
  const comma = plain.includes(',');
  if (/^\+?[1-9]\d{0,2},\d{3}$/.test(plain)) return { failure: 'grouped-number' };
  const [mantissa, exponent] = plain.replace(',', '.').replace(/[ \u00a0\u2009\u202f]/g, '').split(/[eE]|[x×·*]10\^?/) as [string, string?];
  const code = plainUnit(unit);
  if (code === '') return { failure: 'unit-missing' };
  if (Object.hasOwn(AMBIGUOUS, code)) {
    const [question, ...instead] = AMBIGUOUS[code]!;
    return { failure: 'unit-ambiguous', question, instead };
  }
  const percent = PERCENT.exec(unit) ?? (WEIGHT_PERCENT.test(unit) ? ['', 'w/w'] : null);
  if (percent) return percentAmount(percent[1], { number, unit, mantissa, exponent, comma });
  const parsed = parseUnit(unit);
  if (!parsed) return { failure: 'unit-unknown' };
  const kind = UNIT_KINDS.find(([, amount, mass, length]) => sameDimension(parsed, amount, mass, length));
  if (!kind) return { failure: 'unit-not-an-amount' };
  return {
    kind: kind[0],
    value: factorOf(parsed, kind[4]).times(`${mantissa.replace(/\.$/, '')}e${exponent ?? 0}`),
    relativeHalfDigit: relativeHalfDigit(mantissa),
    number,
    unit,
    decimalComma: comma,
  };
}

/** The laboratory's percentages: mass in volume and mass in mass, with or without brackets. */
const PERCENT = /^%\s*\(?\s*([wm]\/[vw]|m\/m|wt)\s*\)?$/i;
const WEIGHT_PERCENT = /^wt\.?\s*-?%$/i;

interface PercentParts {
  readonly number: string;
  readonly unit: string;
  readonly mantissa: string;
  readonly exponent: string | undefined;
  readonly comma: boolean;
}

/** "% w/v" is g in 100 mL of solution, "% w/w" g in 100 g of solution. */
function percentAmount(of: string, { number, unit, mantissa, exponent, comma }: PercentParts): Amount {
  const inVolume = /\/v$/i.test(of);
  return {
    kind: inVolume ? 'mass-concentration' : 'mass-fraction',
    value: new Decimal(`${mantissa.replace(/\.$/, '')}e${exponent ?? 0}`).times(inVolume ? 10 : '0.01'),
    relativeHalfDigit: relativeHalfDigit(mantissa),
    number,
    unit,
    decimalComma: comma,
  };
}

/** Half of the last digit typed, relative to the number. */
function relativeHalfDigit(mantissa: string): number {
  const point = mantissa.indexOf('.');
  return (0.5 * exp10(point < 0 ? 0 : point + 1 - mantissa.length)) / Number(mantissa);
}

/** Length of a percentage at the start of a text, 0 when there is none. */
export function percentLength(text: string): number {
  return /^(?:%[ \u00a0\u2009\u202f]?\(?(?:[wm]\/[vw]|m\/m|wt)\)?|wt\.?-?%)(?=[\s;,]|$)/i.exec(text)?.[0].length ?? 0;
}

const FACTORS = new WeakMap<Unit, Decimal>();

/** Factor of a unit to the unit of its kind. */
function factorOf(unit: Unit, toKind: string): Decimal {
  let factor = FACTORS.get(unit);
  if (!factor) {
    factor = unit.factor.times(toKind);
    FACTORS.set(unit, factor);
  }
  return factor;
}

function sameDimension(unit: Unit, amount: number, mass: number, length: number): boolean {
  return unit.dimension.amount === amount && unit.dimension.mass === mass && unit.dimension.length === length;
}

function plainNumber(text: string): string {
  return text
    .replace(/[\u2212\u207b\u2010-\u2012]/g, '-')
    .replace(/⁺/g, '+')
    .replace(/[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]/g, (digit) => String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit)));
}
