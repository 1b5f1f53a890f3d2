/** Stable codes of everything that can be wrong with an input. Hosts may store and compare them. */
export type ProblemCode =
  | 'empty-input'
  | 'input-too-long'
  | 'too-many-solutes'
  | 'missing-amount'
  | 'missing-substance'
  | 'number-unreadable'
  | 'amount-out-of-range'
  | 'unit-unknown'
  | 'unit-ambiguous'
  | 'formula-unreadable'
  | 'element-unknown'
  | 'substance-unknown'
  | 'substance-ambiguous'
  | 'charge-unbalanced'
  | 'cas-check-digit'
  | 'cas-unknown'
  | 'ion-without-constant'
  | 'not-aqueous'
  | 'json-unreadable'
  | 'temperature-unreadable'
  | 'temperature-out-of-range'
  | 'condition-unknown'
  | 'not-converged';

/** Half-open range of UTF-16 code units in the text as typed. */
export interface TextRange {
  readonly start: number;
  readonly end: number;
}

/** A nearest valid thing; `value` can replace the offending piece as it stands. */
export interface Suggestion {
  readonly value: string;
  /** Why it is offered, a short phrase. */
  readonly reason: string;
}

/** One thing that is wrong, said in a plain sentence. */
export interface Problem {
  readonly code: ProblemCode;
  /** One or two plain sentences: the piece, the reason, what would be valid. Never markup. */
  readonly text: string;
  /** The offending piece exactly as typed, cut to 80 characters. */
  readonly piece: string;
  /** Where the piece stands; absent for arrays and conditions. */
  readonly range?: TextRange;
  /** Index of the solute it belongs to, counted from 0. */
  readonly solute?: number;
  readonly suggestions: readonly Suggestion[];
}

/**
 * The only exception that leaves the engine for bad input. `code`, `piece` and `suggestions` are those of the first
 * problem; `problems` holds all that were found.
 */
export class SoluteError extends Error {
  override readonly name = 'SoluteError';
  readonly problems: readonly Problem[];

  constructor(problems: readonly Problem[]) {
    super(problems.map((problem) => problem.text).join(' '));
    this.problems = problems;
  }

  get code(): ProblemCode {
    return this.problems[0]!.code;
  }
  get piece(): string {
    return this.problems[0]!.piece;
  }
  get suggestions(): readonly Suggestion[] {
    return this.problems[0]!.suggestions;
  }
}

const LONGEST_PIECE = 80;

/** Makes a problem; control and direction-changing characters of the piece are shown as their code point. */
export function problem(
  code: ProblemCode,
  text: string,
  piece: string,
  more: { range?: TextRange | undefined; solute?: number | undefined; suggestions?: readonly Suggestion[] } = {},
): Problem {
  return {
    code,
    text,
    piece: cutPiece(piece),
    ...(more.range ? { range: more.range } : {}),
    ...(more.solute === undefined ? {} : { solute: more.solute }),
    suggestions: more.suggestions ?? [],
  };
}

/** The piece as it may stand in a sentence: short, in quotation marks, nothing invisible. */
export function quote(piece: string): string {
  return `“${visible(cutPiece(piece))}”`;
}

/** Any value as text; a value that refuses to be text is shown by its type. */
export function textOf(value: unknown): string {
  if (typeof value === 'string') return value;
  if (typeof value === 'number' || typeof value === 'boolean' || typeof value === 'bigint') return String(value);
  return typeof value;
}

function cutPiece(piece: string): string {
  const characters = Array.from(piece);
  return characters.length > LONGEST_PIECE ? `${characters.slice(0, LONGEST_PIECE - 1).join('')}…` : piece;
}

function visible(text: string): string {
  return text.replace(/[\p{Cc}\p{Cf}\p{Co}\p{Cs}]/gu, (character) => `[U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}]`);
}
