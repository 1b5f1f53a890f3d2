import { quote, type ProblemCode, type Suggestion } from '../quantities/solute-error.js';
import { hasValidCheckDigit, readCasNumber } from './cas-number.js';
import { compositionKey, compositionOf, molarMass, parseFormula, plainFormula, type Composition, type Formula } from './formula.js';
import { nameOfParts, partsOfName } from './salt-names.js';
import { splitHydrateWord } from './names.js';
import { splitIntoIons, type Parts } from './split-into-ions.js';
import { comparableNames, hasHydrates, partsOf, substanceOfCas, substanceOfName, substancesOfFormula, type ListedSubstance } from './substance-library.js';
import { similarSubstances } from './similar-substances.js';

/** A substance that was recognised. */
export interface IdentifiedSubstance {
  /** Canonical formula with hydrate. */
  readonly formula: string;
  readonly name?: string;
  readonly cas?: string;
  readonly hydrateWater: number;
  readonly composition: Composition;
  /** g/mol, hydrate water included. */
  readonly molarMass: number;
  /** g/mol without water of crystallisation. */
  readonly anhydrousMass: number;
  readonly parts: Parts;
  /** Codes of what was taken for granted. */
  readonly assumed: readonly ('hydrate-anhydrous' | 'split-by-composition' | 'named-from-ions' | 'isomer')[];
  /** Names of other substances of the same formula. */
  readonly isomers?: readonly string[];
}

/** Why a text was not recognised; becomes a problem with a position. */
export interface NotIdentified {
  readonly code: ProblemCode;
  readonly text: string;
  readonly suggestions: readonly Suggestion[];
  /** Part of the text that is at fault; the whole when absent. */
  readonly range?: { readonly start: number; readonly end: number };
}

/**
 * Recognises a substance by CAS Registry Number, formula or name, in this order.
 * @param text as typed, without amount; at most a few hundred characters.
 */
export function identifySubstance(text: string): IdentifiedSubstance | NotIdentified {
  const known = KNOWN.get(text);
  if (known) return known;
  const identified = identify(text);
  if (KNOWN.size >= MOST_KNOWN) KNOWN.clear();
  KNOWN.set(text, identified);
  return identified;
}

/** Texts already read; a page writes the same few again and again. */
const KNOWN = new Map<string, IdentifiedSubstance | NotIdentified>();
const MOST_KNOWN = 512;

function identify(text: string): IdentifiedSubstance | NotIdentified {
  const cas = readCasNumber(text);
  if (cas !== undefined) return identifyCas(cas);
  const formula = parseFormula(text);
  const named = substanceOfName(text);
  // "BeS" is beryllium sulfide, not the buffer BES: a formula as typed yields only to a name in the same letters.
  if (named && ('failure' in formula || named.names.includes(text))) return fromList(named, true);
  if (!('failure' in formula)) return identifyFormula(text, formula);
  if (WATER_NAMES.has(text.toLowerCase())) return solvent(text);
  return identifyName(text) ?? notRecognised(text, formula);
}

const WATER_NAMES: ReadonlySet<string> = new Set(['water', 'oxidane', 'deionised water', 'deionized water', 'distilled water']);
const WATER_CAS = '7732-18-5';

function solvent(text: string): NotIdentified {
  return { code: 'not-aqueous', text: `${quote(text)} is the solvent. Leave it out, or name what is dissolved in it.`, suggestions: [] };
}

function identifyCas(cas: string): IdentifiedSubstance | NotIdentified {
  const substance = substanceOfCas(cas);
  if (substance) return fromList(substance);
  if (cas === WATER_CAS) return solvent(cas);
  if (!hasValidCheckDigit(cas)) {
    const near = similarSubstances.byCas(cas);
    return {
      code: 'cas-check-digit',
      text: `${quote(cas)} is not a CAS Registry Number: its last digit does not fit the others. Compare it with the label${near.length > 0 ? `; nearest known: ${near[0]!.value} (${near[0]!.reason})` : ''}.`,
      suggestions: near,
    };
  }
  return { code: 'cas-unknown', text: `The CAS Registry Number ${quote(cas)} is well formed but not in the list. Write the formula instead, for example NH4Cl.`, suggestions: [] };
}

function identifyFormula(text: string, formula: Formula): IdentifiedSubstance | NotIdentified {
  if (formula.charge !== 0) return loneIon(text, formula);
  if (compositionKey(formula.composition) === 'H2 O1') return solvent(text);
  const listed = substancesOfFormula(formula.canonical);
  if (listed.length === 1) return withIsomers(fromList(listed[0]!), formula);
  const readings = splitIntoIons(withoutWater(formula));
  const chosen = bestWritten(readings, formula);
  if (chosen.length === 1) return fromParts(chosen[0]!, formula);
  if (chosen.length > 1) {
    const suggestions = chosen.slice(0, 6).map((parts) => ({ value: nameOfParts(parts, formula.hydrateWater) ?? formula.canonical, reason: 'same formula' }));
    return { code: 'substance-ambiguous', text: `${quote(text)} fits more than one substance: ${suggestions.map((suggestion) => suggestion.value).join(', ')}. Write the name.`, suggestions };
  }
  const suggestions = similarSubstances.byFormula(formula.canonical);
  return {
    code: 'substance-unknown',
    text: `${quote(text)} is a readable formula, but it is not made of ions or molecules that are known here.${nearestSentence(suggestions)}`,
    suggestions,
  };
}

function fromParts(parts: Parts, formula: Formula): IdentifiedSubstance {
  const name = nameOfParts(parts, formula.hydrateWater);
  return {
    formula: formula.canonical,
    ...(name === undefined ? {} : { name }),
    hydrateWater: formula.hydrateWater,
    composition: formula.composition,
    molarMass: molarMass(formula.composition),
    anhydrousMass: molarMass(withoutWater(formula)),
    parts,
    assumed: ['split-by-composition'],
  };
}

const ISOMERS = new Map<string, readonly string[]>();

/** A listed substance with the names of others that have its very formula. */
function withIsomers(substance: IdentifiedSubstance, formula: Formula): IdentifiedSubstance {
  let isomers = ISOMERS.get(substance.formula);
  if (!isomers) {
    isomers = bestWritten(splitIntoIons(withoutWater(formula)), formula)
      .filter((parts) => !sameChemistry(parts, substance.parts))
      .flatMap((parts) => nameOfParts(parts, formula.hydrateWater) ?? []);
    ISOMERS.set(substance.formula, isomers);
  }
  return isomers.length === 0 ? substance : { ...substance, assumed: [...substance.assumed, 'isomer'], isomers };
}

/** The shortest fragment that tells an ion of several atoms. */
const TELLING_FRAGMENT = 3;

/**
 * Of several readings, those whose ions are written out in the formula as typed. Three kinds of ion are believed only
 * where each anion stands there as such.
 */
function bestWritten(readings: Parts[], { anhydrous, canonical }: Formula): Parts[] {
  const text = canonical.includes('·') ? canonical : anhydrous;
  const believable = readings.filter((parts) => parts.length < 3 || parts.every(({ particle }) => particle.charge >= 0 || particle.written.some((fragment) => text.includes(fragment))));
  if (believable.length <= 1) return believable;
  const scores = believable.map((parts) =>
    parts.reduce((sum, { particle }) => {
      const fragment = particle.written.find((written) => text.includes(written)) ?? '';
      return sum + (fragment.length >= TELLING_FRAGMENT ? fragment.length : 0);
    }, 0),
  );
  const best = Math.max(...scores);
  const chosen = believable.filter((_, index) => scores[index] === best);
  const whole = chosen.filter((parts) => parts.length === 1);
  const preferred = whole.length > 0 ? whole : chosen;
  return preferred.every((parts) => sameChemistry(parts, preferred[0]!)) ? [preferred[0]!] : preferred;
}

function sameChemistry(a: Parts, b: Parts): boolean {
  return contributionKey(a) === contributionKey(b);
}

function contributionKey(parts: Parts): string {
  const totals = new Map<string, number>();
  for (const { particle, count } of parts) {
    const gives = particle.gives ?? { ions: { [particle.id]: 1 } };
    const entries = [...Object.entries(gives.families ?? {}), ...Object.entries(gives.metals ?? {}), ...Object.entries(gives.ions ?? {}), ['protons', gives.protons ?? 0] as const];
    for (const [key, number] of entries) totals.set(key, (totals.get(key) ?? 0) + number * count);
  }
  return [...totals].filter(([, number]) => number !== 0).sort(([x], [y]) => (x < y ? -1 : 1)).join(';');
}

function withoutWater(formula: Formula): Composition {
  if (formula.hydrateWater === 0) return formula.composition;
  const rest = new Map(formula.composition);
  for (const [element, number] of [['H', 2], ['O', 1]] as const) {
    const left = rest.get(element)! - number * formula.hydrateWater;
    if (left > 1e-9) rest.set(element, left);
    else rest.delete(element);
  }
  return rest;
}

function identifyName(text: string): IdentifiedSubstance | NotIdentified | undefined {
  const { base, water } = splitHydrateWord(text);
  const listed = water === undefined ? undefined : substanceOfName(base);
  const reading = listed ? { parts: partsOf(listed.parts), formula: listed.formula.split('·')[0]! } : partsOfName(base);
  if (!reading) return undefined;
  const hydrateWater = water ?? 0;
  const formula = hydrateWater === 0 ? reading.formula : `${reading.formula}·${hydrateWater === 1 ? '' : hydrateWater}H2O`;
  const same = substancesOfFormula(formula).filter((substance) => sameChemistry(partsOf(substance.parts), reading.parts));
  if (same.length === 1) return fromList(same[0]!, water === undefined);
  const composition = compositionOf(formula);
  const name = nameOfParts(reading.parts, hydrateWater);
  return {
    formula,
    ...(name === undefined ? {} : { name }),
    hydrateWater,
    composition,
    molarMass: molarMass(composition),
    anhydrousMass: molarMass(compositionOf(reading.formula)),
    parts: reading.parts,
    assumed: water === undefined && hasHydrates(reading.formula) ? ['named-from-ions', 'hydrate-anhydrous'] : ['named-from-ions'],
  };
}

const IDENTIFIED = new Map<ListedSubstance, IdentifiedSubstance>();

/** @param unhydratedName the text was a name in which nothing says whether water of crystallisation belongs to it. */
function fromList(substance: ListedSubstance, unhydratedName = false): IdentifiedSubstance {
  let identified = IDENTIFIED.get(substance);
  if (!identified) {
    const formula = parseFormula(substance.formula) as Formula;
    identified = {
      formula: substance.formula,
      name: substance.names[0]!,
      ...(substance.cas === null ? {} : { cas: substance.cas }),
      hydrateWater: formula.hydrateWater,
      composition: formula.composition,
      molarMass: molarMass(formula.composition),
      anhydrousMass: molarMass(withoutWater(formula)),
      parts: partsOf(substance.parts),
      assumed: [],
    };
    IDENTIFIED.set(substance, identified);
  }
  return unhydratedName && identified.hydrateWater === 0 && hasHydrates(substance.formula) ? { ...identified, assumed: ['hydrate-anhydrous'] } : identified;
}

function loneIon(text: string, formula: Formula): NotIdentified {
  const suggestions = similarSubstances.containing(compositionKey(formula.composition), formula.charge);
  return {
    code: 'charge-unbalanced',
    text: `${quote(text)} has a charge, so it is not a substance that can be weighed. Write it with its counter-ion${suggestions.length > 0 ? `, for example ${suggestions[0]!.value}` : ''}.`,
    suggestions,
  };
}

function notRecognised(text: string, failure: { failure: 'unreadable' | 'element-unknown'; at: number; length: number }): NotIdentified {
  const looksLikeFormula = /^[A-Z0-9([{][A-Za-z0-9()[\]{}·.*+\-\u2080-\u2089]*$/.test(text) && /\d|[A-Z].*[A-Z]/.test(text);
  const suggestions = looksLikeFormula ? similarSubstances.byFormula(plainFormula(text)) : similarSubstances.byName(text, comparableNames());
  if (looksLikeFormula && failure.failure === 'element-unknown') {
    const symbol = plainFormula(text).slice(failure.at, failure.at + failure.length);
    return {
      code: 'element-unknown',
      text: `${quote(symbol)} in ${quote(text)} is not the symbol of an element.${nearestSentence(suggestions)}`,
      suggestions,
      range: { start: failure.at, end: failure.at + failure.length },
    };
  }
  if (looksLikeFormula && /\d/.test(text)) {
    return { code: 'formula-unreadable', text: `${quote(text)} is not a complete formula.${nearestSentence(suggestions)}`, suggestions };
  }
  return { code: 'substance-unknown', text: `${quote(text)} is not known as a name, a formula or a CAS Registry Number.${nearestSentence(suggestions)}`, suggestions };
}

function nearestSentence(suggestions: readonly Suggestion[]): string {
  return suggestions.length > 0 ? ` Nearest known: ${suggestions.map((suggestion) => suggestion.value).join(', ')}.` : ' Write the formula, for example NH4Cl.';
}
