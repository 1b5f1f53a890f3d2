import { fixture, html } from '@open-wc/testing';
import '../../src/define.js';
import type { SoluteCard } from '../../src/index.js';

export const ACIDIC = '0.12 mol/L NH4Br';
export const BASIC = '30 mmol/L Na2CO3';
export const NEUTRAL = '0.05 mol/L NaNO3';
export const UNKNOWN = '0.1 mol/L NaCll';

/** A card with these attributes in the page, its first prediction made. */
export async function makeCard(attributes: Record<string, string | boolean> = {}): Promise<SoluteCard> {
  const parent = await fixture<HTMLElement>(html`<div></div>`);
  return addCard(parent, attributes);
}

export async function addCard(parent: Node, attributes: Record<string, string | boolean> = {}): Promise<SoluteCard> {
  const card = document.createElement('solute-card');
  for (const [name, value] of Object.entries(attributes)) {
    if (value !== false) card.setAttribute(name, value === true ? '' : value);
  }
  parent.appendChild(card);
  await card.predictionComplete;
  return card;
}

/** What the card shows, without what is only heard. */
export function shownText(card: SoluteCard): string {
  const content = document.createElement('div');
  content.append(...[...card.shadowRoot!.childNodes].map((node) => node.cloneNode(true)));
  for (const heard of content.querySelectorAll('.visually-hidden')) heard.remove();
  return content.textContent.replace(/\s+/g, ' ').trim();
}

export function part(card: Element, name: string): HTMLElement | null {
  return card.shadowRoot!.querySelector(`[part~="${name}"]`);
}

/** All events of the package that reach the document. */
export function listen(target: EventTarget = document): { readonly events: CustomEvent[]; stop(): void } {
  const events: CustomEvent[] = [];
  const types = ['solute-prediction', 'solute-problem', 'solute-store'];
  const record = (event: Event) => events.push(event as CustomEvent);
  for (const type of types) target.addEventListener(type, record);
  return {
    events,
    stop: () => {
      for (const type of types) target.removeEventListener(type, record);
    },
  };
}

export const isChromium = navigator.userAgent.includes('Chrome');
