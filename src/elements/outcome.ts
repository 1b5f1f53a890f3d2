import { createRecord, predict, SoluteError, type Prediction, type Problem, type SoluteRecord } from '../engine.js';
import { isEmpty, solutesText, type SolutesGiven, type StatedConditions } from './card-settings.js';
import { english as strings } from './strings/english.js';

/** What the input of a card came to. */
export type Outcome =
  | { readonly state: 'empty' }
  | { readonly state: 'predicted'; readonly prediction: Prediction; readonly record: SoluteRecord }
  | { readonly state: 'problem'; readonly problems: readonly Problem[] };

export interface OutcomeInput {
  readonly solutes: SolutesGiven;
  readonly label: string;
  readonly volume: string;
  readonly conditions: StatedConditions;
}

/** Predicts; no exception leaves it. */
export function outcomeOf({ solutes, label, volume, conditions }: OutcomeInput): Outcome {
  if (isEmpty(solutes)) return { state: 'empty' };
  try {
    const prediction = predict(solutes, { ...conditions, ...(volume ? { volume } : {}) });
    const record = createRecord(prediction, { solutes: solutesText(solutes), ...(label ? { label } : {}) });
    return { state: 'predicted', prediction, record };
  } catch (error) {
    if (error instanceof SoluteError) return { state: 'problem', problems: error.problems };
    return { state: 'problem', problems: [{ code: 'not-converged', text: strings.problems.unexpected, piece: '', suggestions: [] }] };
  }
}

/** Two outcomes with the same identity are the same result, announced once. */
export function identityOf(outcome: Outcome): string {
  if (outcome.state === 'predicted') return outcome.record.digest;
  return outcome.state === 'problem' ? JSON.stringify(outcome.problems) : '';
}
