import type { ReactiveController, ReactiveControllerHost } from 'lit';
import type { SoluteRecord } from '../engine.js';
import { SoluteStoreEvent } from './events.js';

/** How far the keeping of the shown result has come. */
export type StoreState =
  | { readonly step: 'idle' }
  | { readonly step: 'storing' }
  | { readonly step: 'announced' }
  | { readonly step: 'stored'; readonly reference: string }
  | { readonly step: 'failed'; readonly reason: string };

/** Announces that a result is to be kept and follows what the page does about it. */
export class StoreProcess implements ReactiveController {
  state: StoreState = { step: 'idle' };
  readonly #host: ReactiveControllerHost & EventTarget;
  /** Goes up with every attempt and every new result: an answer to an older one is no longer shown. */
  #attempt = 0;

  constructor(host: ReactiveControllerHost & EventTarget) {
    this.#host = host;
    host.addController(this);
  }

  hostConnected(): void {}

  /** A new result stands: nothing of it is stored yet. */
  reset(): void {
    this.#attempt++;
    this.state = { step: 'idle' };
  }

  start(record: SoluteRecord): void {
    const attempt = ++this.#attempt;
    const pending: PromiseLike<unknown>[] = [];
    const waitUntil = (promise: PromiseLike<unknown>) => {
      pending.push(promise);
      this.#show(attempt, { step: 'storing' });
      void this.#follow(attempt, pending);
    };
    this.#show(attempt, { step: 'announced' });
    this.#host.dispatchEvent(new SoluteStoreEvent({ record, source: 'user', waitUntil }));
  }

  /** Waits for all promises there are; a later listener that adds one reports for all in its own turn. */
  async #follow(attempt: number, pending: readonly PromiseLike<unknown>[]): Promise<void> {
    const { length } = pending;
    try {
      const answers = await Promise.all(pending);
      if (length < pending.length) return;
      const reference = answers.find((answer): answer is string => typeof answer === 'string' && answer !== '') ?? '';
      this.#show(attempt, { step: 'stored', reference });
    } catch (error) {
      this.#show(attempt, { step: 'failed', reason: reasonOf(error) });
    }
  }

  #show(attempt: number, state: StoreState): void {
    if (attempt !== this.#attempt) return;
    this.state = state;
    this.#host.requestUpdate();
  }
}

function reasonOf(error: unknown): string {
  if (error instanceof Error) return error.message;
  return typeof error === 'string' ? error : '';
}
