/**
 * Exponential and logarithm against those of the JavaScript engine, in units of the last place. V8's come from the same
 * family of algorithms (fdlibm, Sun Microsystems 1993) and are within one unit of the exact value.
 */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { Decimal } from 'decimal.js';
import { exp, exp10, LN10, log, log10, power } from '../../src/quantities/reproducible-math.js';

const bits = new BigInt64Array(1);
const float = new Float64Array(bits.buffer);

/** Number of doubles between two of the same sign. */
function unitsBetween(a: number, b: number): number {
  if (Object.is(a, b)) return 0;
  float[0] = a;
  const first = bits[0]!;
  float[0] = b;
  return Number(first > bits[0]! ? first - bits[0]! : bits[0]! - first);
}

/** Evenly spread numbers with irregular last digits. */
function* spread(from: number, to: number, count: number): Generator<number> {
  for (let k = 0; k < count; k++) yield from + ((to - from) * (k + ((k * 0.618033988749895) % 1))) / count;
}

function largestDistance(numbers: Iterable<number>, ours: (x: number) => number, theirs: (x: number) => number): { distance: number; at: number } {
  let worst = { distance: 0, at: 0 };
  for (const x of numbers) {
    const distance = unitsBetween(ours(x), theirs(x));
    if (distance > worst.distance) worst = { distance, at: x };
  }
  return worst;
}

describe('exponential', () => {
  for (const [name, from, to] of [['over its whole range', -708, 709.78], ['near zero', -1e-3, 1e-3], ['between −1 and 1', -1, 1], ['where the result is subnormal', -745.1, -708]] as const) {
    it(`is within one unit of the last place ${name}`, (t) => {
      const { distance, at } = largestDistance(spread(from, to, 60_000), exp, Math.exp);
      t.diagnostic(`largest distance ${distance} at ${at}`);
      assert.ok(distance <= 1, `${distance} at ${at}`);
    });
  }

  it('is within one unit of the exact value', () => {
    const Exact = Decimal.clone({ precision: 40 });
    for (const irregular of spread(-700, 700, 400)) {
      // Ten binary places, so that the decimal text of x is exact.
      const x = Math.round(irregular * 1024) / 1024;
      const exact = new Exact(x).exp();
      const unit = Math.abs(exp(x)) * 2.220446049250313e-16;
      assert.ok(exact.minus(exp(x)).abs().lte(unit), String(x));
    }
  });

  it('has the limits of the standard function', () => {
    for (const x of [0, -0, 1, Infinity, -Infinity, NaN, 709.782712893384, 709.79, 1e308, -745.13, -745.2, -746, -1e308, 5e-324, -5e-324]) {
      assert.ok(unitsBetween(exp(x), Math.exp(x)) <= 1, String(x));
    }
    assert.equal(exp(0), 1);
    assert.equal(exp(710), Infinity);
    assert.equal(exp(-746), 0);
    assert.ok(Number.isNaN(exp(NaN)));
  });

  it('never falls', () => {
    let before = 0;
    for (const x of spread(-30, 30, 20_000)) {
      const now = exp(x);
      assert.ok(now >= before);
      before = now;
    }
  });
});

describe('logarithm', () => {
  const orders = function* (from: number, to: number): Generator<number> {
    for (const y of spread(from, to, 60_000)) yield Math.exp(y);
  };
  for (const [name, numbers] of [
    ['over its whole range', orders(-708, 709)],
    ['near one', spread(0.9, 1.1, 60_000)],
    ['very near one', spread(1 - 1e-9, 1 + 1e-9, 20_000)],
    ['of subnormal numbers', spread(5e-324, 2.2e-308, 20_000)],
  ] as const) {
    it(`is within one unit of the last place ${name}`, (t) => {
      const { distance, at } = largestDistance(numbers, log, Math.log);
      t.diagnostic(`largest distance ${distance} at ${at}`);
      assert.ok(distance <= 1, `${distance} at ${at}`);
    });
  }

  it('has the limits of the standard function', () => {
    for (const x of [0, -0, 1, 2, Infinity, NaN, 5e-324, 2.2250738585072014e-308, Number.MAX_VALUE, Math.SQRT2, Math.SQRT1_2, 0.5]) assert.ok(unitsBetween(log(x), Math.log(x)) <= 1, String(x));
    for (const x of [-1, -Infinity, -5e-324]) assert.ok(Number.isNaN(log(x)), String(x));
    assert.equal(log(1), 0);
  });
});

describe('decadic functions and powers', () => {
  it('agree with the standard functions to 1 in 10¹³', () => {
    assert.equal(LN10, Math.LN10);
    for (const x of spread(-30, 30, 5000)) {
      assert.ok(Math.abs(exp10(x) / Math.pow(10, x) - 1) < 1e-13, `10^${x}`);
      assert.ok(Math.abs(log10(Math.pow(10, x)) - x) < 1e-13 * Math.max(1, Math.abs(x)), `log10 of 10^${x}`);
      assert.ok(Math.abs(power(1.7, x) / Math.pow(1.7, x) - 1) < 1e-13, `1.7^${x}`);
    }
  });
});
