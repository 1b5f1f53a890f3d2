import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { chargeShown, ions, read, repeated } from './read.js';

interface Activity {
  coefficients: [cation: string, anion: string, value: number, uncertainty: number, note?: string][];
  estimates: Record<string, { value: number | null; spread: number | null; count: number; basis: string }>;
}
const { coefficients, estimates } = read<Activity>('activity.json');

describe('the interaction coefficients', () => {
  it('name known ions, the cation first, each pair once', () => {
    const known = new Set(ions.map(({ id }) => id));
    for (const [cation, anion] of coefficients) {
      assert.ok(known.has(cation) && known.has(anion), `${cation} ${anion}`);
      assert.ok(chargeShown(cation) > 0 && chargeShown(anion) < 0, `${cation} ${anion}`);
    }
    assert.deepEqual(repeated(coefficients.map(([cation, anion]) => `${cation} ${anion}`)), []);
  });

  it('come with estimates by charge type, computed from them where no rule is given', () => {
    for (const [type, estimate] of Object.entries(estimates)) {
      const values = coefficients.filter(([cation, anion]) => `${chargeShown(cation)}:${-chargeShown(anion)}` === type).map(([, , value]) => value);
      assert.equal(estimate.count, values.length, type);
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      const spread = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
      if (estimate.basis === 'mean') assert.ok(Math.abs(estimate.value! - mean) <= 0.0005001, type);
      if (estimate.basis === 'none') assert.equal(estimate.value, null, type);
      if (values.length > 1) assert.ok(Math.abs(estimate.spread! - spread) <= 0.0005001, type);
      else assert.equal(estimate.spread, null, type);
    }
  });
});
