import substances from '../../data/substances.json';
import { particleOf } from './ion-library.js';
import { comparableName } from './names.js';
import type { Parts } from './split-into-ions.js';

/** A substance of the list, with the particles it brings. */
export interface ListedSubstance {
  readonly names: readonly string[];
  readonly formula: string;
  readonly cas: string | null;
  /** "2 Na+ + HPO4-2". */
  readonly parts: string;
}

type Row = readonly [names: string[], formula: string, cas: string | null, parts: string, obtained: string];

const LIST: readonly ListedSubstance[] = (substances.rows as unknown as Row[]).map(([names, formula, cas, parts]) => ({ names, formula, cas, parts }));
const BY_FORMULA = new Map<string, ListedSubstance[]>();
const BY_NAME = new Map<string, ListedSubstance>();
const BY_CAS = new Map<string, ListedSubstance>();
/** Formulas of which a hydrate is listed. */
const HYDRATED = new Set<string>();
for (const substance of LIST) {
  BY_FORMULA.set(substance.formula, [...(BY_FORMULA.get(substance.formula) ?? []), substance]);
  if (substance.formula.includes('·')) HYDRATED.add(substance.formula.split('·')[0]!);
  if (substance.cas !== null) BY_CAS.set(substance.cas, substance);
  for (const name of substance.names) {
    const key = comparableName(name);
    if (!BY_NAME.has(key)) BY_NAME.set(key, substance);
  }
}

/** All substances of the list. */
export function listedSubstances(): readonly ListedSubstance[] {
  return LIST;
}

/** Substances whose formula is written exactly so (plain digits, middle dot). */
export function substancesOfFormula(formula: string): readonly ListedSubstance[] {
  return BY_FORMULA.get(formula) ?? [];
}

export function substanceOfName(name: string): ListedSubstance | undefined {
  return BY_NAME.get(comparableName(name));
}

export function substanceOfCas(cas: string): ListedSubstance | undefined {
  return BY_CAS.get(cas);
}

/** True when the list holds a hydrate of this anhydrous formula. */
export function hasHydrates(formula: string): boolean {
  return HYDRATED.has(formula);
}

/** Every comparable name of the list, for suggestions. */
export function comparableNames(): ReadonlyMap<string, ListedSubstance> {
  return BY_NAME;
}

/** Reads the parts of a listed substance. @throws RangeError when the list names an unknown particle (data fault). */
export function partsOf(parts: string): Parts {
  return parts.split(' + ').map((part) => {
    const match = /^(?:(\d+) )?(\S+)$/.exec(part);
    const particle = match && particleOf(match[2]!);
    if (!particle) throw new RangeError(`unknown particle in the substance list: ${part}`);
    return { particle, count: Number(match[1] ?? 1) };
  });
}
