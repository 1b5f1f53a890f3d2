import { html, nothing, type TemplateResult } from 'lit';
import type { Chemical, EquationTerm } from '../engine.js';

/** A run of a formula that stands on one height. */
export interface FormulaRun {
  readonly text: string;
  readonly height: 'line' | 'subscript' | 'superscript';
}

const RUNS = /(?<=[\p{L})\]}])\d+(?:\.\d+)?|[^\d]+|\d+(?:\.\d+)?/gu;

/**
 * Splits a formula without charge: digits after a letter or a closing bracket are subscripts; leading digits and those
 * after the hydrate dot stay on the line.
 */
export function formulaRuns(formula: string): readonly FormulaRun[] {
  const runs: FormulaRun[] = [];
  for (const match of formula.matchAll(RUNS)) {
    const text = match[0];
    const before = formula[match.index - 1];
    const subscript = /^\d/.test(text) && before !== undefined && /[\p{L})\]}]/u.test(before);
    runs.push({ text, height: subscript ? 'subscript' : 'line' });
  }
  return runs;
}

/** Charge as it is written: "+", "2+", "3−"; empty for a neutral species. */
export function chargeText(charge: number): string {
  if (charge === 0) return '';
  const size = Math.abs(charge);
  return `${size === 1 ? '' : size}${charge > 0 ? '+' : '\u2212'}`;
}

function runsOf(chemical: Chemical): readonly FormulaRun[] {
  const charge = chargeText(chemical.charge);
  const runs = formulaRuns(chemical.label);
  return charge ? [...runs, { text: charge, height: 'superscript' }] : runs;
}

function renderRun({ text, height }: FormulaRun): TemplateResult | string {
  if (height === 'subscript') return html`<sub>${text}</sub>`;
  return height === 'superscript' ? html`<sup>${text}</sup>` : text;
}

/** The formula with real subscripts and superscripts, kept left to right in any text. */
export function renderFormula(formula: string): TemplateResult {
  return html`<bdi class="formula" dir="ltr">${formulaRuns(formula).map(renderRun)}</bdi>`;
}

export function renderChemical(chemical: Chemical): TemplateResult {
  return html`<bdi class="formula" dir="ltr">${runsOf(chemical).map(renderRun)}</bdi>`;
}

/** The formula for the eye and the name for the ear. */
export function renderNamedChemical(chemical: Chemical): TemplateResult {
  return renderNamed(renderChemical(chemical), chemical.name);
}

export function renderNamed(formula: TemplateResult, name: string): TemplateResult {
  return html`<span aria-hidden="true">${formula}</span><span class="visually-hidden">${name}</span>`;
}

export function renderTerm({ coefficient, chemical }: EquationTerm): TemplateResult {
  return html`<span class="term">${coefficient === 1 ? nothing : `${coefficient}\u2009`}${renderChemical(chemical)}</span>`;
}

/** The same as text of HTML, for a page that stores markup. */
export function chemicalMarkup(chemical: Chemical): string {
  return runsOf(chemical).map(runMarkup).join('');
}

export function formulaMarkup(formula: string): string {
  return formulaRuns(formula).map(runMarkup).join('');
}

function runMarkup({ text, height }: FormulaRun): string {
  const escaped = escapeMarkup(text);
  if (height === 'subscript') return `<sub>${escaped}</sub>`;
  return height === 'superscript' ? `<sup>${escaped}</sup>` : escaped;
}

const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** Text as it may stand between tags or in a quoted attribute. */
export function escapeMarkup(text: string): string {
  return text.replace(/[&<>"']/g, (character) => ENTITIES[character]!);
}
