/**
 * pH ranges that reagent and pharmacopoeia monographs state for solutions of a given strength (values/
 * specification-ranges.json names each). The ranges allow for trace acid, base and carbon dioxide, so the interval from
 * the pH in air to the pH without, widened by the uncertainty, has to meet them.
 */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict } from '../../src/engine.js';
import { readValues, tableLines } from './values.js';

interface Range {
  readonly solutes: string;
  readonly temperature: number;
  readonly low: number;
  /** Null for a lower bound alone. */
  readonly high: number | null;
  readonly source: string;
}

/** Ranges that are not met, each with the reason. */
const MISSED: Readonly<Record<string, string>> = {
  '50.0 g/L KAl(SO4)2·12H2O': 'no critical constant exists for mixed hydroxo-sulfato species of aluminium; 0.11 above the range beyond one standard uncertainty',
};

const checked = readValues<Range[]>('specification-ranges').map((range) => {
  const { inAir, withoutAir, uncertainty } = predict(range.solutes, { temperature: range.temperature });
  const from = Math.min(inAir, withoutAir) - uncertainty;
  const to = Math.max(inAir, withoutAir) + uncertainty;
  const upper = range.high ?? Infinity;
  return { range, inAir, withoutAir, uncertainty, met: from <= upper && to >= range.low, inside: from >= range.low && to <= upper };
});

describe('specification ranges', () => {
  for (const { range, inAir, withoutAir, met } of checked) {
    it(`${range.solutes}, ${range.temperature} °C: ${range.low} to ${range.high ?? '…'} (${range.source})`, () => {
      assert.equal(met, !(range.solutes in MISSED), `in air ${inAir.toFixed(2)}, without ${withoutAir.toFixed(2)}; ${MISSED[range.solutes] ?? ''}`);
    });
  }

  it('reports every range', (t) => {
    const rows = checked.map(({ range, inAir, withoutAir, uncertainty, met, inside }) => [
      range.solutes,
      `${range.temperature} °C`,
      `${range.low} to ${range.high ?? '…'}`,
      `${inAir.toFixed(2)} to ${withoutAir.toFixed(2)}`,
      uncertainty.toFixed(2),
      inside ? 'inside' : met ? 'met' : 'missed',
    ]);
    for (const line of tableLines([['solution', 't', 'range', 'in air to without', 'u', ''], ...rows])) t.diagnostic(line);
    for (const [solutes, reason] of Object.entries(MISSED)) t.diagnostic(`missed: ${solutes}: ${reason}`);
    t.diagnostic(`${checked.filter(({ met }) => met).length} of ${checked.length} met, ${checked.filter(({ inside }) => inside).length} wholly inside`);
    assert.ok(checked.length >= 30);
  });
});
