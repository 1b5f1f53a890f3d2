import type { Suggestion } from '../quantities/solute-error.js';
import { compositionKey } from './formula.js';
import { particlesOfComposition } from './ion-library.js';
import { comparableName } from './names.js';
import { nearest } from './similar-text.js';
import { listedSubstances, type ListedSubstance } from './substance-library.js';
import { compositionOf } from './formula.js';

const MOST_SUGGESTIONS = 3;
const LONGEST_COMPARED = 60;

/** The nearest known things to a text that was not recognised. */
export const similarSubstances = {
  byFormula(formula: string): Suggestion[] {
    if (formula.length > LONGEST_COMPARED) return [];
    const exceptCase = formula.toLowerCase();
    const list = listedSubstances();
    const found = list.filter((substance) => substance.formula.toLowerCase() === exceptCase).map((substance) => substance.formula);
    const values = found.length > 0 ? found : nearest(formula, new Set(list.map((substance) => substance.formula)), MOST_SUGGESTIONS);
    return [...new Set(values)].slice(0, MOST_SUGGESTIONS).map((value) => ({ value, reason: list.find((substance) => substance.formula === value)!.names[0]! }));
  },

  byName(name: string, names: ReadonlyMap<string, ListedSubstance>): Suggestion[] {
    const comparable = comparableName(name);
    if (comparable.length > LONGEST_COMPARED) return [];
    const formula = similarSubstances.byFormula(name).filter((suggestion) => suggestion.value.toLowerCase() === name.toLowerCase());
    const byName = nearest(comparable, names.keys(), MOST_SUGGESTIONS).map((key) => ({ value: names.get(key)!.names[0]!, reason: names.get(key)!.formula }));
    return [...formula, ...byName].filter((suggestion, index, all) => all.findIndex((other) => other.value === suggestion.value) === index).slice(0, MOST_SUGGESTIONS);
  },

  byCas(cas: string): Suggestion[] {
    const numbers = listedSubstances().filter((substance) => substance.cas !== null);
    return nearest(cas, numbers.map((substance) => substance.cas!), MOST_SUGGESTIONS).map((value) => ({ value, reason: numbers.find((substance) => substance.cas === value)!.names[0]! }));
  },

  /** Listed salts that contain a lone ion. */
  containing(ionComposition: string, charge: number): Suggestion[] {
    const ion = particlesOfComposition(ionComposition).find((particle) => particle.charge === charge);
    if (!ion) return [];
    return listedSubstances()
      .filter((substance) => substance.parts.split(' + ').some((part) => part.replace(/^\d+ /, '') === ion.id) && compositionKey(compositionOf(substance.formula)) !== ionComposition)
      .slice(0, MOST_SUGGESTIONS)
      .map((substance) => ({ value: substance.formula, reason: substance.names[0]! }));
  },
};
