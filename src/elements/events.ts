import type { Problem, SoluteRecord } from '../engine.js';

/** Who brought the result about: a person, the page's script or markup, or a stored record. */
export type Source = 'user' | 'programmatic' | 'restore';

export interface PredictionDetail {
  readonly record: SoluteRecord;
  readonly source: Source;
}

export interface ProblemDetail {
  readonly problems: readonly Problem[];
  readonly source: Source;
}

export interface StoreDetail {
  readonly record: SoluteRecord;
  readonly source: Source;
  /**
   * Tells the card that the page is storing. The card shows so until the promise settles; a string it resolves to is
   * shown as the reference, a rejection as the reason of the failure.
   */
  readonly waitUntil: (promise: PromiseLike<unknown>) => void;
}

const everywhere = { bubbles: true, composed: true } as const;

/** A new prediction stands on the element. */
export class SolutePredictionEvent extends CustomEvent<PredictionDetail> {
  static readonly type = 'solute-prediction';
  constructor(detail: PredictionDetail) {
    super(SolutePredictionEvent.type, { ...everywhere, detail });
  }
}

/** The input cannot be predicted. */
export class SoluteProblemEvent extends CustomEvent<ProblemDetail> {
  static readonly type = 'solute-problem';
  constructor(detail: ProblemDetail) {
    super(SoluteProblemEvent.type, { ...everywhere, detail });
  }
}

/** A person asks to keep the result. */
export class SoluteStoreEvent extends CustomEvent<StoreDetail> {
  static readonly type = 'solute-store';
  constructor(detail: StoreDetail) {
    super(SoluteStoreEvent.type, { ...everywhere, detail });
  }
}

declare global {
  interface HTMLElementEventMap {
    'solute-prediction': SolutePredictionEvent;
    'solute-problem': SoluteProblemEvent;
    'solute-store': SoluteStoreEvent;
  }
}
