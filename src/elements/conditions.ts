import { ContextConsumer, ContextProvider } from '@lit/context';
import { css, html, type TemplateResult } from 'lit';
import { property } from 'lit/decorators.js';
import { readConditions } from './card-settings.js';
import { conditionsContext, type ProvidedConditions } from './conditions-context.js';
import { renderNotes } from './prediction-view.js';
import { SoluteElement } from './solute-element.js';

/**
 * States the conditions for every card below it; an inner one overrides an outer one, a card's own attributes override both.
 *
 * @tag solute-conditions
 * @slot - The part of the page the conditions hold for.
 *
 * @attr {string} temperature - Celsius, or a quantity with unit.
 * @attr {'excluded' | 'equilibrated'} air - Whether CO2 of the air is kept away.
 * @attr {'watched' | 'equilibrated'} solids - Whether supersaturation is only reported, or solids may form.
 *
 * @csspart notes - Settings that were not understood.
 */
export class SoluteConditions extends SoluteElement {
  static override styles = [
    css`
      :host {
        display: contents;
      }
      :host([hidden]) {
        display: none;
      }
      .notes {
        margin: 0.5rem 0;
        padding: 0.5rem 0.75rem;
        border: 1px solid;
        font: 0.875rem/1.4 system-ui, sans-serif;
        list-style: none;
      }
    `,
  ];

  /** Registers the element under a tag. */
  static override define(tag = 'solute-conditions', registry: CustomElementRegistry = customElements): void {
    super.define(tag, registry);
  }

  @property() temperature: number | string | null = null;
  @property() air: string | null = null;
  @property() solids: string | null = null;

  readonly #provider = new ContextProvider(this, { context: conditionsContext, initialValue: {} });
  #outer: ProvidedConditions = {};
  #notes: readonly string[] = [];

  constructor() {
    super();
    new ContextConsumer(this, {
      context: conditionsContext,
      subscribe: true,
      callback: (outer) => {
        this.#outer = outer;
        this.#provide();
      },
    });
  }

  override connectedCallback(): void {
    this.#outer = {};
    super.connectedCallback();
    this.#provide();
  }

  override attributeChangedCallback(name: string, old: string | null, value: string | null): void {
    super.attributeChangedCallback(name, old, value);
    this.#provide();
  }

  protected override willUpdate(): void {
    this.#provide();
  }

  /** Cards that are connected in the same moment must find the value already. */
  #provide(): void {
    const { value, notes, problems = [] } = readConditions(this, this.#outer);
    this.#notes = [...problems.map(({ text }) => text), ...notes];
    const before = this.#provider.value;
    if (value.temperature !== before.temperature || value.air !== before.air || value.solids !== before.solids) this.#provider.setValue(value);
  }

  protected override render(): TemplateResult {
    return html`${renderNotes(this.#notes)}<slot></slot>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'solute-conditions': SoluteConditions;
  }
}
