import { ContextConsumer } from '@lit/context';
import { html, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { property } from 'lit/decorators.js';
import type { Prediction, Problem, SoluteRecord } from '../engine.js';
import { announcementOf } from './announcements.js';
import { readConditions, readExpandedSetting, readSolutes, SECTIONS, solutesText, type Section, type SolutesGiven } from './card-settings.js';
import { cardStyles } from './card.styles.js';
import { renderSections, type SectionsView } from './card-sections.js';
import { conditionsContext, type ProvidedConditions } from './conditions-context.js';
import { SolutePredictionEvent, SoluteProblemEvent, type Source } from './events.js';
import { SoluteFormElement } from './form-element.js';
import { keepText } from './kept-text.js';
import { nearestLanguage, numbersFor, type Numbers } from './numbers.js';
import { identityOf, outcomeOf, type Outcome } from './outcome.js';
import { renderEmpty, renderNotes, renderPrediction } from './prediction-view.js';
import { unwatchPrint, watchPrint, type Printable } from './print-watch.js';
import { renderProblems } from './problems.js';
import { noteOnRestored, renderRestoredNote, type RestoredNote } from './restored-note.js';
import { schedule } from './scheduler.js';
import { renderStoreButton } from './store-button.js';
import { StoreProcess } from './store-process.js';
import { english as strings } from './strings/english.js';
import { writeMarkup, writeText } from './written-result.js';

export type CardState = 'empty' | 'predicting' | 'predicted' | 'problem';

/**
 * Predicts the pH of one aqueous solution and shows it with its class, reason, cautions, equations and sources.
 *
 * @tag solute-card
 * @slot - Shown only while the element is not defined; with `keep-text` it holds the result as text.
 *
 * @attr {string} solutes - What is dissolved: amounts and substances, separated by semicolons or line breaks; JSON is accepted.
 * @attr {string} label - Heading of the card.
 * @attr {string} volume - Final volume, when amounts are masses or aliquots: `500 mL`.
 * @attr {string} temperature - Celsius, or a quantity with unit; from `<solute-conditions>` when absent, else 25.
 * @attr {'excluded' | 'equilibrated'} air - Whether CO2 of the air is kept away; from `<solute-conditions>` when absent.
 * @attr {'watched' | 'equilibrated'} solids - Whether supersaturation is only reported, or solids may form and dissolve; from `<solute-conditions>` when absent.
 * @attr {string} expanded - Sections that start open: `equations composition constants`.
 * @attr {boolean} keep-text - Writes the result as text into the light DOM.
 * @attr {string} name - Name under which the record is submitted with a form.
 * @attr {boolean} required - The form needs a prediction here.
 * @attr {boolean} disabled - Nothing is submitted or stored.
 *
 * @fires {SolutePredictionEvent} solute-prediction - A new prediction stands.
 * @fires {SoluteProblemEvent} solute-problem - The input cannot be predicted.
 * @fires {SoluteStoreEvent} solute-store - The person asks to keep the result.
 *
 * @csspart card - The whole card.
 * @csspart label - The heading.
 * @csspart understood - List of what was understood.
 * @csspart solute - One dissolved substance.
 * @csspart assumption - What was taken for granted; where it may mean the wrong bottle also `assumption-doubt`.
 * @csspart value - The pH with its uncertainty.
 * @csspart ph - The number of the pH.
 * @csspart uncertainty - The uncertainty.
 * @csspart classification - The class in words with its shape.
 * @csspart scale - The pH scale.
 * @csspart conditions - Temperature, air, and solids that may form.
 * @csspart reason - What decides the pH, in a sentence.
 * @csspart other-air - The pH under the other condition of air.
 * @csspart cautions - List of cautions.
 * @csspart caution - One caution; also `caution-danger`, `caution-warning`, `caution-note`.
 * @csspart sections - The sections that open.
 * @csspart section - One of them; also `section-equations`, `section-composition`, `section-constants`, and `section-open` while it is open.
 * @csspart summary - Button that opens a section.
 * @csspart equation - One equation; the one that decides is also `equation-decides`.
 * @csspart spectators - What takes no part.
 * @csspart composition-table - Species of the solution.
 * @csspart solids-table - Solids that lie in the vessel or are near to forming.
 * @csspart constants-table - Constants used.
 * @csspart budget-table - What the uncertainty is made of.
 * @csspart store - The line with the store button.
 * @csspart store-button - The store button.
 * @csspart store-state - How far storing has come.
 * @csspart empty - What a card without input says.
 * @csspart problems - Why there is no prediction.
 * @csspart problem - One problem.
 * @csspart typed - The input as typed with the offending pieces marked.
 * @csspart suggestions - What would be valid instead.
 * @csspart restored - How a stored record differs from what is computed now.
 * @csspart notes - Settings that were not understood.
 *
 * @cssprop --solute-ink - Colour of text.
 * @cssprop --solute-muted - Colour of secondary text.
 * @cssprop --solute-surface - Background of the card.
 * @cssprop --solute-line - Colour of rules.
 * @cssprop --solute-acidic - Accent of acidic solutions.
 * @cssprop --solute-neutral - Accent of neutral solutions.
 * @cssprop --solute-basic - Accent of basic solutions.
 * @cssprop --solute-danger - Colour of dangers.
 * @cssprop --solute-warning - Colour of warnings and problems.
 * @cssprop --solute-focus - Colour of the focus ring.
 * @cssprop --solute-font - Font family.
 * @cssprop --solute-font-size - Size of text.
 * @cssprop --solute-space - Unit of spacing.
 * @cssprop --solute-radius - Radius of the corners.
 * @cssprop --solute-placeholder-size - Block size kept free for a result that is not rendered yet.
 *
 * @cssState acidic - The predicted solution is acidic.
 * @cssState neutral - The predicted solution is neutral.
 * @cssState basic - The predicted solution is basic.
 * @cssState empty - Nothing is stated.
 * @cssState predicting - A prediction is being made.
 * @cssState waiting - The first prediction is still to come; its place is kept free.
 * @cssState predicted - A prediction stands.
 * @cssState problem - The input cannot be predicted.
 */
export class SoluteCard extends SoluteFormElement implements Printable {
  static override styles = cardStyles;

  /** Registers the element under a tag. */
  static override define(tag = 'solute-card', registry: CustomElementRegistry = customElements): void {
    super.define(tag, registry);
  }

  @property() solutes: SolutesGiven = '';
  @property() label = '';
  @property() volume = '';
  @property() temperature: number | string | null = null;
  @property() air: string | null = null;
  @property() solids: string | null = null;
  @property() expanded = '';
  @property({ type: Boolean, attribute: 'keep-text' }) keepText = false;

  readonly #store = new StoreProcess(this);
  #provided: ProvidedConditions | undefined;
  #outcome: Outcome = { state: 'empty' };
  /** What the outcome was made from; compared to tell whether it still holds. */
  #predictedFrom: readonly unknown[] | undefined;
  #notes: readonly string[] = [];
  /** A record that was brought back and is to be compared with the next result. */
  #restored: { readonly record: SoluteRecord } | undefined;
  #restoredNote: RestoredNote | undefined;
  #source: Source = 'programmatic';
  #announced = '';
  #announcement = '';
  #open = new Set<Section>();
  #filled = new Set<Section>();
  #printing = false;
  #watched: Window | undefined;
  #storeAwaited = false;

  constructor() {
    super();
    new ContextConsumer(this, {
      context: conditionsContext,
      subscribe: true,
      callback: (provided) => {
        this.#provided = provided;
        this.requestUpdate();
      },
    });
  }

  /** The prediction that stands; absent while empty, predicting, or when there is a problem. */
  get prediction(): Prediction | undefined {
    return this.state === 'predicted' && this.#outcome.state === 'predicted' ? this.#outcome.prediction : undefined;
  }

  /** The record of the prediction that stands, ready to be stored. */
  get record(): SoluteRecord | undefined {
    return this.state === 'predicted' && this.#outcome.state === 'predicted' ? this.#outcome.record : undefined;
  }

  get problems(): readonly Problem[] {
    return this.state === 'problem' && this.#outcome.state === 'problem' ? this.#outcome.problems : [];
  }

  get state(): CardState {
    return this.isUpdatePending && this.#isStale() ? 'predicting' : this.#outcome.state;
  }

  /** Settles when the state is no longer `predicting`. */
  get predictionComplete(): Promise<void> {
    return this.#untilPredicted();
  }

  /** The record, so that `JSON.stringify` keeps it; null when none stands. */
  toJSON(): SoluteRecord | null {
    return this.record ?? null;
  }

  /** The result in plain sentences. */
  toText(): string {
    return writeText(this.#outcome, this.#heading, this.#numbers);
  }

  /** The result as semantic HTML, without style attributes, everything from outside escaped. */
  toHTML(): string {
    return writeMarkup(this.#outcome, this.#heading, this.#numbers);
  }

  /**
   * Shows the input of a stored record and predicts it anew; the event that follows says `restore`, and the card says
   * where the result is no longer the stored one.
   */
  restore(record: SoluteRecord): void {
    // A record comes back from a store, which may have handed over anything.
    const { solutes, label, conditions } = (record ?? {}) as Partial<SoluteRecord>;
    this.solutes = solutes ?? '';
    this.label = label ?? '';
    this.volume = conditions?.volume ?? '';
    this.temperature = conditions?.temperature ?? null;
    this.air = conditions?.air ?? null;
    this.solids = conditions?.solids ?? null;
    this.#source = 'restore';
    this.#restored = { record };
    this.#predictedFrom = undefined;
    this.requestUpdate();
  }

  override connectedCallback(): void {
    // A card that was moved out of its conditions must not keep them; those that hold here answer at once.
    this.#provided = undefined;
    super.connectedCallback();
    if (this.hasUpdated) this.requestUpdate();
    const view = this.ownerDocument.defaultView;
    if (!view) return;
    this.#watched = view;
    const printing = watchPrint(view, this);
    if (printing !== this.#printing) this.printChanged(printing);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    if (this.#watched) unwatchPrint(this.#watched, this);
    this.#watched = undefined;
  }

  printChanged(printing: boolean): void {
    this.#printing = printing;
    this.requestUpdate();
    this.performUpdate();
  }

  formResetCallback(): void {
    this.solutes = this.getAttribute('solutes') ?? '';
  }

  protected override async scheduleUpdate(): Promise<void> {
    if (this.#isStale()) {
      this.setStates('predicting', ...(this.hasUpdated ? [] : ['waiting']));
      if (this.hasUpdated) this.setFormResult(undefined, this.#anchor);
    }
    await schedule(() => super.scheduleUpdate());
  }

  protected override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('expanded')) this.#open = new Set(readExpandedSetting(this.expanded).value);
    if (this.#isStale()) this.#predict();
    const { note } = readExpandedSetting(this.expanded);
    this.#notes = [...readConditions(this, this.#provided).notes, ...(note === undefined ? [] : [note])];
    const shown = this.#printing ? SECTIONS : this.#open;
    for (const section of shown) this.#filled.add(section);
  }

  #predict(): void {
    const before = this.#outcome;
    this.#predictedFrom = this.#inputs();
    const { value: conditions, problems } = readConditions(this, this.#provided);
    this.#outcome = problems
      ? { state: 'problem', problems }
      : outcomeOf({ solutes: readSolutes(this.solutes), label: this.#heading, volume: this.volume ?? '', conditions });
    this.#restoredNote = this.#restored && noteOnRestored(this.#restored.record, this.#outcome, this.#numbers);
    this.#restored = undefined;
    const changed = identityOf(this.#outcome) !== identityOf(before) || this.#outcome.state !== before.state;
    if (changed) this.#store.reset();
    // The first result belongs to the page as it loads and interrupts nobody.
    if (!this.hasUpdated || !(changed || this.#restoredNote)) return;
    this.#announcement = [announcementOf(this.#outcome, this.#heading, this.#numbers), this.#restoredNote?.text].filter(Boolean).join(' ');
  }

  protected override render(): TemplateResult {
    const outcome = this.#outcome;
    const numbers = this.#numbers;
    const heading = this.#heading;
    const classification = outcome.state === 'predicted' ? outcome.prediction.classification : '';
    return html`
      <div class=${`card ${outcome.state} ${classification}`} part="card" role="group" tabindex="-1" lang=${strings.language}
        aria-labelledby=${heading ? 'label' : nothing} aria-label=${heading ? nothing : strings.unnamed}>
        ${heading ? html`<p class="label" id="label" part="label" lang=${nearestLanguage(this)} dir="auto">${heading}</p>` : nothing}
        ${renderNotes(this.#notes)}
        ${renderRestoredNote(this.#restoredNote)}
        ${outcome.state === 'empty' ? renderEmpty() : nothing}
        ${outcome.state === 'problem' ? renderProblems(outcome.problems, this.#typed, numbers) : nothing}
        ${outcome.state === 'predicted'
          ? html`${renderPrediction(outcome.prediction, numbers)}
            ${renderStoreButton(this.#store.state, this.inactive, this.#onStore)}
            ${renderSections(this.#sectionsView(outcome.prediction, numbers))}`
          : nothing}
        <p class="visually-hidden" role="status">${this.#announcement}</p>
      </div>
    `;
  }

  protected override updated(): void {
    const outcome = this.#outcome;
    this.setStates(outcome.state, ...(outcome.state === 'predicted' ? [outcome.prediction.classification] : []));
    this.setFormResult(outcome, this.#anchor);
    keepText(this, this.keepText ? this.toText() : '');
    const source = this.#source;
    this.#source = 'programmatic';
    this.#announceOnce(outcome, source);
  }

  #announceOnce(outcome: Outcome, source: Source): void {
    const identity = identityOf(outcome);
    if (outcome.state === 'empty' || identity === this.#announced) return;
    this.#announced = identity;
    this.dispatchEvent(
      outcome.state === 'predicted'
        ? new SolutePredictionEvent({ record: outcome.record, source })
        : new SoluteProblemEvent({ problems: outcome.problems, source }),
    );
  }

  get #heading(): string {
    return typeof this.label === 'string' ? this.label.trim() : '';
  }

  get #numbers(): Numbers {
    return numbersFor(nearestLanguage(this));
  }

  /** The input, when it was text, so that problems can be marked in it. */
  get #typed(): string {
    return solutesText(readSolutes(this.solutes));
  }

  get #anchor(): HTMLElement | undefined {
    return this.shadowRoot?.querySelector<HTMLElement>('.card') ?? undefined;
  }

  #inputs(): readonly unknown[] {
    return [this.solutes, this.label, this.volume, this.temperature, this.air, this.solids, ...Object.values(this.#provided ?? {})];
  }

  #isStale(): boolean {
    const { length } = this.#predictedFrom ?? [];
    const now = this.#inputs();
    return length !== now.length || now.some((value, index) => !Object.is(value, this.#predictedFrom![index]));
  }

  async #untilPredicted(): Promise<void> {
    do await this.updateComplete;
    while (this.state === 'predicting');
  }

  #sectionsView(prediction: Prediction, numbers: Numbers): SectionsView {
    return {
      prediction,
      numbers,
      isOpen: (section) => this.#printing || this.#open.has(section),
      hasContent: (section) => this.#filled.has(section),
      onToggle: (section) => {
        if (this.#printing) return;
        if (!this.#open.delete(section)) this.#open.add(section);
        this.requestUpdate();
      },
    };
  }

  /** Keeps the result that stands; while one is being made, that one. */
  readonly #onStore = (): void => {
    const { record } = this;
    if (record) this.#store.start(record);
    else if (this.state === 'predicting' && !this.#storeAwaited) void this.#storeNext();
  };

  async #storeNext(): Promise<void> {
    this.#storeAwaited = true;
    await this.predictionComplete;
    this.#storeAwaited = false;
    if (this.record && !this.inactive) this.#store.start(this.record);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'solute-card': SoluteCard;
  }
}
