import { aTimeout, expect, waitUntil } from '@open-wc/testing';
import type { SoluteCard } from '../../src/index.js';

type StrictWindow = Window & { violations?: string[] };

describe('solute-card under a strict content security policy with Trusted Types', () => {
  it('renders in every state, styled, without a violation', async () => {
    const frame = document.createElement('iframe');
    frame.src = new URL('./strict-policy.html', import.meta.url).href;
    document.body.append(frame);
    await new Promise((resolve) => frame.addEventListener('load', resolve, { once: true }));
    const page = frame.contentDocument!;
    const view = frame.contentWindow as StrictWindow;
    await waitUntil(() => page.querySelector('solute-card')?.shadowRoot?.querySelector('[part~="store"]'), 'the card renders', { timeout: 8000 });
    const cards = [...page.querySelectorAll('solute-card')] as SoluteCard[];
    await Promise.all(cards.map((card) => card.predictionComplete));
    expect(cards.map(({ state }) => state)).to.deep.equal(['predicted', 'problem', 'empty']);
    cards[0]!.shadowRoot!.querySelector<HTMLElement>('[part~="summary"]')!.click();
    cards[0]!.shadowRoot!.querySelector('button')!.click();
    cards[2]!.solutes = '0.1 mol/L KCl';
    await cards[2]!.predictionComplete;
    await aTimeout(50);
    expect(view.violations).to.deep.equal([]);
    expect(view.getComputedStyle(cards[0]!.shadowRoot!.querySelector('[part~="card"]')!).display).to.equal('grid');
    const probe = page.createElement('p');
    let refused = false;
    try {
      probe.insertAdjacentHTML('beforeend', '<b>markup</b>');
    } catch {
      refused = true;
    }
    expect(refused || !('trustedTypes' in view), 'the policy is in force').to.equal(true);
    frame.remove();
  });
});
