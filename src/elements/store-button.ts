import { html, nothing, type TemplateResult } from 'lit';
import type { StoreState } from './store-process.js';
import { english as strings } from './strings/english.js';

const words = strings.store;

/** The button that asks the page to keep the result, and how far that has come. */
export function renderStoreButton(state: StoreState, disabled: boolean, onStore: () => void): TemplateResult {
  const storing = state.step === 'storing';
  return html`
    <div class="store" part="store">
      <button type="button" part="store-button" ?disabled=${disabled} aria-disabled=${storing ? 'true' : nothing} @click=${storing ? nothing : onStore}>
        ${state.step === 'failed' ? words.retry : words.action}
      </button>
      <span class=${`store-state ${state.step}`} part="store-state" role="status">${storeText(state)}</span>
    </div>
  `;
}

function storeText(state: StoreState): string {
  switch (state.step) {
    case 'idle':
      return '';
    case 'storing':
      return words.storing;
    case 'announced':
      return words.announced;
    case 'stored':
      return state.reference ? words.storedAs(state.reference) : words.stored;
    case 'failed':
      return words.failed(state.reason);
  }
}
