import { formatEquation, type Prediction } from '../engine.js';
import { amountText } from './amount.js';
import { classificationText } from './announcements.js';
import { doubts } from './assumptions.js';
import type { StatedConditions } from './card-settings.js';
import { sorted } from './cautions.js';
import { chemicalMarkup, escapeMarkup, formulaMarkup } from './chemical.js';
import { constantText } from './equation.js';
import type { Numbers } from './numbers.js';
import type { Outcome } from './outcome.js';
import { otherAir } from './scale.js';
import { solidText } from './solids-table.js';
import { english as strings } from './strings/english.js';

/** Temperature, air and, when they may form, solids in words. */
export function conditionsText({ temperature, air, solids }: StatedConditions, numbers: Numbers): string {
  return [strings.temperature(numbers.plain(temperature)), strings.air[air], ...(solids === 'equilibrated' ? [strings.solidsFormed] : [])].join(', ');
}

/** pH under the other condition of air as a phrase, when it differs by more than the uncertainty. */
export function otherAirText(prediction: Prediction, numbers: Numbers): string | undefined {
  const other = otherAir(prediction);
  if (other === undefined) return undefined;
  const value = numbers.pH(other, Math.max(prediction.uncertainty, 0.02));
  return prediction.conditions.air === 'excluded' ? strings.inRoomAir(value) : strings.withoutAir(value);
}

function resultText(prediction: Prediction, numbers: Numbers): string {
  const { pH, uncertainty } = prediction;
  return strings.text.result(numbers.pH(pH, uncertainty), numbers.uncertainty(uncertainty), classificationText(prediction));
}

function soluteText(solute: Prediction['understood'][number], numbers: Numbers): string {
  const { formula, name, molarity } = solute;
  return `${name ? `${formula} (${name})` : formula} ${strings.molarity(amountText(molarity, numbers))}`;
}

/** The result as plain sentences, one a line. */
export function writeText(outcome: Outcome, label: string, numbers: Numbers): string {
  if (outcome.state === 'empty') return '';
  const heading = label ? [`${label}.`] : [];
  if (outcome.state === 'problem') {
    return [...heading, strings.text.noPrediction, ...outcome.problems.map(({ text }) => text)].join('\n');
  }
  const { prediction } = outcome;
  const other = otherAirText(prediction, numbers);
  return [
    ...heading,
    `${resultText(prediction, numbers)}, ${conditionsText(prediction.conditions, numbers)}.`,
    ...(other ? [`${other}.`] : []),
    `${prediction.understood.map((solute) => soluteText(solute, numbers)).join('; ')}.`,
    ...doubts(prediction).map((text) => `${strings.checkBottle} ${text}`),
    ...prediction.solids.filter(({ amount }) => amount !== undefined).map((solid) => `${solidText(solid, numbers)}.`),
    prediction.reason.text,
    ...prediction.hydrolysis.filter(({ decides }) => decides).map((equation) => `${formatEquation(equation)}.`),
    ...sorted(prediction.cautions).map(({ gravity, text }) => `${strings.cautions.gravity[gravity]}: ${text}`),
    strings.text.standard,
  ].join('\n');
}

/** The result as semantic HTML without styles, scripts or identifiers; everything from outside is escaped. */
export function writeMarkup(outcome: Outcome, label: string, numbers: Numbers): string {
  if (outcome.state === 'empty') return '';
  const heading = label ? `<p><strong>${escapeMarkup(label)}</strong></p>` : '';
  if (outcome.state === 'problem') {
    return `<section lang="${strings.language}">${heading}<p>${strings.text.noPrediction}</p>${list(outcome.problems.map(({ text }) => escapeMarkup(text)))}</section>`;
  }
  const { prediction } = outcome;
  const other = otherAirText(prediction, numbers);
  const equations = [...prediction.dissociation, ...prediction.hydrolysis].map((equation) => {
    const side = (terms: typeof equation.reactants) =>
      terms.map(({ coefficient, chemical }) => `${coefficient === 1 ? '' : `${coefficient} `}${chemicalMarkup(chemical)}`).join(' + ');
    const constant = constantText(equation, numbers);
    return `${side(equation.reactants)} ${equation.arrow === 'complete' ? '→' : '⇌'} ${side(equation.products)}${constant ? ` (${escapeMarkup(constant)})` : ''}${equation.decides ? `, ${strings.equations.decides}` : ''}`;
  });
  return [
    `<section lang="${strings.language}">`,
    heading,
    `<p><strong>${escapeMarkup(resultText(prediction, numbers))}</strong>, ${escapeMarkup(conditionsText(prediction.conditions, numbers))}. ${strings.text.standard}</p>`,
    other ? `<p>${escapeMarkup(other)}</p>` : '',
    list(prediction.understood.map((solute) => `${formulaMarkup(solute.formula)}${solute.name ? ` (${escapeMarkup(solute.name)})` : ''}: ${escapeMarkup(strings.molarity(amountText(solute.molarity, numbers)))}`)),
    ...doubts(prediction).map((text) => `<p><strong>${strings.checkBottle}</strong> ${escapeMarkup(text)}</p>`),
    ...prediction.solids.filter(({ amount }) => amount !== undefined).map((solid) => `<p>${escapeMarkup(solidText(solid, numbers))}</p>`),
    `<p>${escapeMarkup(prediction.reason.text)}</p>`,
    list(equations),
    list(sorted(prediction.cautions).map(({ gravity, text }) => `<strong>${strings.cautions.gravity[gravity]}.</strong> ${escapeMarkup(text)}`)),
    '</section>',
  ].join('');
}

function list(items: readonly string[]): string {
  return items.length === 0 ? '' : `<ul>${items.map((item) => `<li>${item}</li>`).join('')}</ul>`;
}
