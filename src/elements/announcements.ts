import type { Prediction } from '../engine.js';
import { sorted } from './cautions.js';
import type { Numbers } from './numbers.js';
import type { Outcome } from './outcome.js';
import { english as strings } from './strings/english.js';

/** What a screen reader hears when a new result stands. */
export function announcementOf(outcome: Outcome, label: string, numbers: Numbers): string {
  const named = label || strings.unnamed;
  if (outcome.state === 'empty') return strings.announcement.empty(named);
  if (outcome.state === 'problem') return strings.announcement.problem(named, outcome.problems.map(({ text }) => text).join(' '));
  const { pH, uncertainty, cautions } = outcome.prediction;
  const result = strings.announcement.result(named, numbers.pH(pH, uncertainty), numbers.uncertainty(uncertainty), classificationText(outcome.prediction));
  const dangers = sorted(cautions).filter(({ gravity }) => gravity === 'danger').map(({ text }) => strings.announcement.danger(text));
  return [result, ...dangers].join(' ');
}

/** The class in words, with the doubt when the uncertainty reaches across its boundary. */
export function classificationText({ classification, decided }: Pick<Prediction, 'classification' | 'decided'>): string {
  const word = strings.classification[classification];
  return decided ? word : `${word}, ${strings.undecided}`;
}
