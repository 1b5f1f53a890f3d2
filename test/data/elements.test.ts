import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { elements as independent } from 'chemical-elements';
import { elements } from './read.js';

/** The isotopic composition of selenium has been revised by this much since the masses were computed. */
const REVISION = 2e-4;

describe('the atomic weights', () => {
  it('agree within their uncertainty with masses computed from the isotopes', () => {
    for (const [symbol, [weight, uncertainty]] of Object.entries(elements)) {
      if (uncertainty === null) continue;
      const mass = independent.find((element) => element.symbol === symbol)?.mass;
      assert.ok(typeof mass === 'number' && Math.abs(mass - weight) <= Math.max(uncertainty, REVISION * weight), `${symbol}: ${weight}, ${mass}`);
    }
  });

  it('state an uncertainty for every element with a standard atomic weight', () => {
    assert.deepEqual(Object.entries(elements).filter(([, [, uncertainty]]) => uncertainty === null).map(([symbol]) => symbol), ['Tc', 'Ra']);
  });
});
