import { html, type TemplateResult } from 'lit';
import { formatChemical, type Prediction } from '../engine.js';
import { renderFormula, renderNamed, renderNamedChemical } from './chemical.js';

/** Finds the formulas of a prediction in its sentences. */
interface FormulaFinder {
  readonly pattern: RegExp;
  readonly rendered: ReadonlyMap<string, TemplateResult>;
}

const finders = new WeakMap<Prediction, FormulaFinder>();
const PART_OF_FORMULA = '[\\p{L}\\p{N}()\\[\\]⁺⁻]';

function finderOf(prediction: Prediction): FormulaFinder {
  let finder = finders.get(prediction);
  if (!finder) {
    finder = makeFinder(prediction);
    finders.set(prediction, finder);
  }
  return finder;
}

function makeFinder({ understood, reason, species, spectators, solids }: Prediction): FormulaFinder {
  const rendered = new Map<string, TemplateResult>();
  for (const { formula, name } of [...solids, ...understood]) {
    const set = name ? renderNamed(renderFormula(formula), name) : renderFormula(formula);
    rendered.set(formula, set).set(formatChemical({ label: formula, charge: 0 }), set);
  }
  const chemicals = [reason.chemical, reason.against, ...species.map(({ chemical }) => chemical), ...spectators.map(({ chemical }) => chemical)];
  for (const chemical of chemicals) if (chemical) rendered.set(formatChemical(chemical), renderNamedChemical(chemical));
  const formulas = [...rendered.keys()].sort((one, other) => other.length - one.length).map((formula) => formula.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'));
  return { pattern: new RegExp(`(?<!${PART_OF_FORMULA})(${formulas.join('|')})(?!${PART_OF_FORMULA})`, 'u'), rendered };
}

/** A sentence of the engine with its formulas set for the eye and named for the ear. */
export function renderSentence(text: string, prediction: Prediction): TemplateResult {
  const { pattern, rendered } = finderOf(prediction);
  return html`${text.split(pattern).map((piece) => rendered.get(piece) ?? piece)}`;
}
