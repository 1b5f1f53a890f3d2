import { LitElement } from 'lit';
import type { CSSResult } from 'lit';
import { adoptDocumentStyles } from './document-styles.js';
import { version } from './version.js';
import { english as strings } from './strings/english.js';

const warned = new Set<string>();

/** What the package's elements have in common: styles that follow them into another document, and registration. */
export class SoluteElement extends LitElement {
  static override shadowRootOptions: ShadowRootInit = { mode: 'open', serializable: true };
  /** Version of the package this class comes from. */
  static readonly version: string = version;

  /** Registers the class; does nothing when the tag is registered already. */
  static define(tag: string, registry: CustomElementRegistry = customElements): void {
    const registered = registry.get(tag) as (CustomElementConstructor & { version?: string }) | undefined;
    if (registered) {
      warnOfOtherVersion(tag, registered.version ?? '?', this.version);
      return;
    }
    try {
      registry.define(tag, this);
    } catch (error) {
      if (!(error instanceof DOMException) || error.name !== 'NotSupportedError') throw error;
      // A class can carry one tag only; a second tag gets a class of its own.
      if (!registry.get(tag)) registry.define(tag, class extends this {});
    }
  }

  protected override createRenderRoot(): ShadowRoot {
    const { shadowRootOptions } = this.constructor as typeof SoluteElement;
    const root = this.shadowRoot ?? this.attachShadow(shadowRootOptions);
    // Markup that was serialized with its shadow content is rendered anew.
    root.replaceChildren();
    this.#adoptStyles(root);
    return root;
  }

  /** The element stands in another document now. */
  adoptedCallback(): void {
    if (this.shadowRoot) this.#adoptStyles(this.shadowRoot);
  }

  #adoptStyles(root: ShadowRoot): void {
    adoptDocumentStyles(root, (this.constructor as typeof SoluteElement).elementStyles as CSSResult[]);
  }
}

function warnOfOtherVersion(tag: string, registered: string, own: string): void {
  if (registered === own || warned.has(tag)) return;
  warned.add(tag);
  // eslint-disable-next-line no-console -- the page's author must learn that two versions meet, and nothing is broken
  console.warn(strings.otherVersion(tag, registered, own));
}
