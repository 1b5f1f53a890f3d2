import { numberLength, percentLength, readAmount, type Amount, type AmountFailure } from '../quantities/amount.js';
import { problem, quote, SoluteError, type Problem, type ProblemCode, type Suggestion, type TextRange } from '../quantities/solute-error.js';
import { parseUnit } from '../quantities/units.js';
import { identifySubstance, type IdentifiedSubstance } from './identify.js';

/** One solute as an object, in JSON or as a property. */
export interface SoluteInput {
  readonly substance: string;
  readonly amount: string;
}

/** One solute, read: what, how much, and where it stands. */
export interface ReadSolute {
  readonly typed: string;
  readonly range?: TextRange;
  readonly substance: IdentifiedSubstance;
  readonly amount: Amount;
}

const LONGEST_TEXT = 100_000;
const MOST_SOLUTES = 60;
const LONGEST_PIECE = 400;
const SPACE = '[ \\t\\u00a0\\u2000-\\u200a\\u202f\\u205f\\u3000]';
const SPACES = new RegExp(`${SPACE}+`, 'g');
const EXAMPLE = '0.10 mol/L NH4Cl';

/**
 * Reads what is dissolved: a text of pieces split at ";" or a line break, the same as JSON, or an array.
 * All problems are found before any is thrown.
 * @throws SoluteError with a problem for every piece that can't be understood.
 */
export function readSolutes(input: string | readonly SoluteInput[]): ReadSolute[] {
  if (typeof input !== 'string') return readList(input);
  if (input.length > LONGEST_TEXT) {
    throw new SoluteError([problem('input-too-long', `The text has ${input.length} characters; at most ${LONGEST_TEXT} are read. Keep one solution per card.`, input.slice(0, 20))]);
  }
  const trimmed = input.trim();
  if (trimmed.startsWith('[') && /^\[\s*(?:\{|\])/.test(trimmed)) return readList(parseJson(trimmed));
  const pieces = splitPieces(input);
  if (pieces.length === 0) throw new SoluteError([problem('empty-input', `Nothing is dissolved yet. Write an amount and a substance, for example ${EXAMPLE}.`, '')]);
  refuseTooMany(pieces.length);
  return collect(pieces.map(({ text, start }, index) => () => readPiece(text, start, index)));
}

function collect(readers: readonly (() => ReadSolute)[]): ReadSolute[] {
  const problems: Problem[] = [];
  const solutes: ReadSolute[] = [];
  for (const read of readers) {
    try {
      solutes.push(read());
    } catch (error) {
      if (!(error instanceof SoluteError)) throw error;
      problems.push(...error.problems);
    }
  }
  if (problems.length > 0) throw new SoluteError(problems);
  return solutes;
}

function refuseTooMany(count: number): void {
  if (count > MOST_SOLUTES) {
    throw new SoluteError([problem('too-many-solutes', `${count} solutes are listed; at most ${MOST_SOLUTES} are computed together.`, String(count))]);
  }
}

function parseJson(text: string): readonly SoluteInput[] {
  try {
    return JSON.parse(text) as readonly SoluteInput[];
  } catch {
    throw new SoluteError([
      problem('json-unreadable', `The text starts like JSON but is not complete JSON. Write [{"substance":"NH4Cl","amount":"0.10 mol/L"}] or plain text such as ${EXAMPLE}.`, text),
    ]);
  }
}

function readList(list: readonly SoluteInput[]): ReadSolute[] {
  if (!Array.isArray(list) || list.length === 0) throw new SoluteError([problem('empty-input', `Nothing is dissolved yet. Write an amount and a substance, for example ${EXAMPLE}.`, '')]);
  refuseTooMany(list.length);
  return collect(
    // Array.from, since map would pass over the holes of a sparse list.
    Array.from(list as readonly unknown[], (item, index) => () => {
      const entry = (typeof item === 'object' && item !== null ? item : {}) as Record<string, unknown>;
      const text = (key: string): string => (Object.hasOwn(entry, key) && (typeof entry[key] === 'string' || typeof entry[key] === 'number') ? String(entry[key]) : '').slice(0, LONGEST_PIECE);
      const substance = text('substance').trim();
      const amount = text('amount').trim();
      const typed = `${amount} ${substance}`.trim();
      if (substance === '') throw failed('missing-substance', `Solute ${index + 1} has no substance. Write for example {"substance":"NH4Cl","amount":"0.10 mol/L"}.`, typed, index);
      if (amount === '') throw failed('missing-amount', `Solute ${index + 1}, ${quote(substance)}, has no amount. Write for example "amount":"0.10 mol/L".`, substance, index);
      return { typed, substance: identified(substance, undefined, index), amount: amountOf(amount, undefined, index) };
    }),
  );
}

function failed(code: ProblemCode, text: string, piece: string, solute: number, range?: TextRange, suggestions: readonly Suggestion[] = []): SoluteError {
  return new SoluteError([problem(code, text, piece, { range, solute, suggestions })]);
}

interface Piece {
  readonly text: string;
  readonly start: number;
}

function splitPieces(input: string): Piece[] {
  const pieces: Piece[] = [];
  let start = 0;
  for (const part of input.split(/[;\r\n\u2028\u2029]/)) {
    const lead = part.length - part.trimStart().length;
    const text = part.trim();
    if (text !== '') pieces.push({ text, start: start + lead });
    start += part.length + 1;
  }
  return pieces;
}

function readPiece(text: string, start: number, index: number): ReadSolute {
  const range = { start, end: start + text.length };
  if (text.length > LONGEST_PIECE) throw failed('input-too-long', `The piece ${quote(text)} is ${text.length} characters long; at most ${LONGEST_PIECE} are read.`, text, index, range);
  const split = splitAmount(text);
  if (split === undefined) throw withoutAmount(text, index, range);
  if (split.substance.text === '') throw failed('missing-substance', `${quote(text)} is an amount without a substance. Write for example ${EXAMPLE}.`, text, index, range);
  const problems: Problem[] = [];
  const attempt = <Result>(read: () => Result): Result | undefined => {
    try {
      return read();
    } catch (error) {
      if (!(error instanceof SoluteError)) throw error;
      problems.push(...error.problems);
      return undefined;
    }
  };
  const amount = attempt(() => amountOf(split.amount.text, { start: start + split.amount.start, end: start + split.amount.start + split.amount.text.length }, index));
  const substance = attempt(() => identified(split.substance.text, { start: start + split.substance.start, end: start + split.substance.start + split.substance.text.length }, index));
  if (!amount || !substance) throw new SoluteError(problems);
  return { typed: text, range, substance, amount };
}

/** Separates the amount, which stands before or after the substance. Undefined when no number with a unit stands there. */
function splitAmount(text: string): { amount: Piece; substance: Piece } | undefined {
  const before = amountAtStart(text);
  if (before !== undefined) {
    const rest = text.slice(before);
    const lead = rest.length - rest.replace(new RegExp(`^${SPACE}*(?:of${SPACE}+)?`), '').length;
    return { amount: { text: text.slice(0, before), start: 0 }, substance: { text: rest.slice(lead), start: before + lead } };
  }
  const after = amountAtEnd(text);
  if (after !== undefined) {
    const substance = text.slice(0, after).replace(new RegExp(`[,:=]?${SPACE}*$`), '');
    return { amount: { text: text.slice(after), start: after }, substance: { text: substance, start: 0 } };
  }
  return undefined;
}

/** Length of "number unit" at the start, the unit being the next word or glued to the number. */
function amountAtStart(text: string): number | undefined {
  const number = numberLength(text);
  if (number === 0) return undefined;
  const gap = new RegExp(`^${SPACE}*`).exec(text.slice(number))![0].length;
  const percent = percentLength(text.slice(number + gap));
  if (percent > 0) return number + gap + percent;
  const glued = /^[^\s;]*/u.exec(text.slice(number))![0];
  if (glued !== '') return isUnitLike(glued) ? number + glued.length : undefined;
  const spaces = new RegExp(`^${SPACE}+`).exec(text.slice(number))?.[0].length ?? 0;
  const word = /^\S*/u.exec(text.slice(number + spaces))![0];
  if (isUnitLike(word)) return number + spaces + word.length;
  // A bare number before a word: the number is meant as the amount, and the unit is missing or unknown.
  return word === '' ? text.length : undefined;
}

function amountAtEnd(text: string): number | undefined {
  const words = [...text.matchAll(/\S+/gu)];
  for (const back of [1, 2, 3]) {
    const word = words[words.length - back];
    if (!word || words.length - back < 1) return undefined;
    const candidate = text.slice(word.index);
    const length = amountAtStart(candidate);
    if (length === candidate.length) return word.index;
  }
  return undefined;
}

function isUnitLike(word: string): boolean {
  if (parseUnit(word) !== undefined) return true;
  const result = readAmount('1', word);
  return 'failure' in result ? result.failure === 'unit-ambiguous' || result.failure === 'unit-not-an-amount' : true;
}

function withoutAmount(text: string, index: number, range: TextRange): SoluteError {
  const number = numberLength(text);
  if (number > 0) {
    const rest = text.slice(number).trim();
    const word = /^\S+/u.exec(rest)?.[0] ?? '';
    if (identifyQuietly(rest)) {
      const suggestions = ['mol/L', 'mmol/L', 'g/L'].map((unit) => ({ value: `${text.slice(0, number)} ${unit} ${rest}`, reason: 'with a unit' }));
      return failed('unit-unknown', `${quote(text)} has a number but no unit. Write for example ${quote(suggestions[0]!.value)}.`, text.slice(0, number), index, range, suggestions);
    }
    if (/^[%A-Za-z\u00b5\u03bc/]/.test(word) && rest.length > word.length) {
      const suggestions = nearestUnits(word);
      return failed(
        'unit-unknown',
        `${quote(word)} is not a unit that is read here. Use mol/L, mmol/L, umol/L, M, mM, g/L, mg/mL, mg/L or mol/kg${suggestions.length > 0 ? `; nearest: ${suggestions[0]!.value}` : ''}.`,
        word,
        index,
        range,
        suggestions,
      );
    }
  }
  return failed('missing-amount', `${quote(text)} has no amount. Write the amount before or after it, for example ${EXAMPLE}.`, text, index, range, [
    { value: `0.10 mol/L ${text}`, reason: 'with an amount' },
  ]);
}

const COMMON_UNITS = ['mol/L', 'mmol/L', 'umol/L', 'M', 'mM', 'uM', 'g/L', 'mg/mL', 'mg/L', 'mol/kg', 'mmol/kg'];

function nearestUnits(word: string): Suggestion[] {
  const lower = word.toLowerCase();
  return COMMON_UNITS.filter((unit) => unit.toLowerCase() === lower || unit.toLowerCase().replace('/', '') === lower.replace(/[/. ]/g, '')).map((value) => ({ value, reason: 'unit code' }));
}

function identifyQuietly(text: string): boolean {
  return text !== '' && !('code' in identifySubstance(text.replace(SPACES, ' ')));
}

function identified(text: string, range: TextRange | undefined, solute: number): IdentifiedSubstance {
  const result = identifySubstance(text.replace(SPACES, ' '));
  if (!('code' in result)) return result;
  const inner = range && result.range ? { start: range.start + result.range.start, end: range.start + result.range.end } : range;
  throw failed(result.code, result.text, text, solute, inner, result.suggestions);
}

function amountOf(text: string, range: TextRange | undefined, solute: number): Amount {
  const length = numberLength(text);
  const number = text.slice(0, length);
  const unit = text.slice(length).trim();
  const result: Amount | AmountFailure = length === 0 ? { failure: 'not-a-number' } : readAmount(number, unit);
  if (!('failure' in result)) {
    if (result.value.isZero() || !result.value.isFinite()) throw failed('amount-out-of-range', `The amount ${quote(text)} is zero. Leave the solute out, or write how much there is.`, text, solute, range);
    return result;
  }
  const suggestions = (result.instead ?? nearestUnits(unit).map((suggestion) => suggestion.value)).map((value) => ({ value, reason: 'unit code' }));
  const sentences: Readonly<Record<AmountFailure['failure'], readonly [ProblemCode, string]>> = {
    'not-a-number': ['number-unreadable', `${quote(text)} is not a number with a unit. Write for example 0.10 mol/L.`],
    'grouped-number': ['number-unreadable', `${quote(number)} can be read in two ways, with a decimal comma or as thousands. Write it with a decimal point or without the comma.`],
    'unit-missing': ['unit-unknown', `${quote(text)} has no unit. Write for example ${number} mol/L.`],
    'unit-unknown': ['unit-unknown', `${quote(unit)} is not a unit that is read here. Use mol/L, mmol/L, umol/L, M, mM, g/L, mg/mL, mg/L or mol/kg.`],
    'unit-ambiguous': ['unit-ambiguous', `${quote(unit)} can mean different things. ${result.question ?? ''}`],
    'unit-not-an-amount': ['unit-unknown', `${quote(unit)} is a unit, but not of an amount of a solute. Use mol/L, g/L or mol/kg.`],
  };
  const [code, sentence] = sentences[result.failure];
  throw failed(code, sentence, result.failure.startsWith('unit') ? unit || text : number, solute, range, suggestions);
}
