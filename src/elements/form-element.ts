import { property } from 'lit/decorators.js';
import type { Outcome } from './outcome.js';
import { SoluteElement } from './solute-element.js';
import { english as strings } from './strings/english.js';

/** An element whose result is the value of a form: the record as JSON. */
export class SoluteFormElement extends SoluteElement {
  static formAssociated = true;

  @property({ reflect: true, useDefault: true }) name = '';
  @property({ type: Boolean, reflect: true }) required = false;
  @property({ type: Boolean, reflect: true }) disabled = false;

  /** @internal */
  protected readonly internals = this.attachInternals();
  #formDisabled = false;

  get form(): HTMLFormElement | null {
    return this.internals.form;
  }
  get type(): string {
    return this.localName;
  }
  get validity(): ValidityState {
    return this.internals.validity;
  }
  get validationMessage(): string {
    return this.internals.validationMessage;
  }
  get willValidate(): boolean {
    return this.internals.willValidate;
  }
  checkValidity(): boolean {
    return this.internals.checkValidity();
  }
  reportValidity(): boolean {
    return this.internals.reportValidity();
  }

  /** @internal */
  formDisabledCallback(disabled: boolean): void {
    this.#formDisabled = disabled;
    this.requestUpdate();
  }

  /** Disabled by itself or by a fieldset around it. */
  protected get inactive(): boolean {
    return this.disabled || this.#formDisabled;
  }

  /** Gives the form what the element stands for and whether that is enough; undefined while it is not known. */
  protected setFormResult(outcome: Outcome | undefined, anchor: HTMLElement | undefined): void {
    const { internals } = this;
    // Only a named value is submitted. Nothing is left for the browser to keep of it: it would write the records of all
    // cards into the session history again and again.
    const value = this.name && outcome?.state === 'predicted' ? JSON.stringify(outcome.record) : null;
    internals.setFormValue(value, value === null ? null : '');
    if (outcome?.state === 'problem') {
      internals.setValidity({ customError: true }, outcome.problems.map(({ text }) => text).join(' '), anchor);
    } else if (this.required && outcome?.state !== 'predicted') {
      internals.setValidity({ valueMissing: true }, outcome ? strings.validity.missing : strings.validity.pending, anchor);
    } else if (!internals.validity.valid) {
      internals.setValidity({});
    }
  }

  protected setStates(...states: readonly string[]): void {
    const own = this.internals.states;
    own.clear();
    for (const state of states) own.add(state);
  }
}
