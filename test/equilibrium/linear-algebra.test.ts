import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { factorScaled, solveFactored, solveGeneral, solveScaled } from '../../src/equilibrium/linear-algebra.js';
import './support.js';

const size = fc.integer({ min: 1, max: 7 });
const entries = (count: number) => fc.array(fc.double({ min: -1, max: 1, noNaN: true, noDefaultInfinity: true }), { minLength: count, maxLength: count });

function product(a: readonly number[], x: Float64Array, n: number, columns = 1): number[] {
  return Array.from({ length: n * columns }, (_, index) => {
    const [row, column] = [Math.floor(index / columns), index % columns];
    let sum = 0;
    for (let k = 0; k < n; k++) sum += a[row * n + k]! * x[k * columns + column]!;
    return sum;
  });
}

function assertSolved(a: readonly number[], x: Float64Array, b: readonly number[], n: number, columns = 1): void {
  const size = Math.max(...x.map(Math.abs), 1);
  product(a, x, n, columns).forEach((value, index) => assert.ok(Math.abs(value - b[index]!) <= 1e-10 * size, `row ${index}: ${value} instead of ${b[index]}`));
}

describe('linear equations', () => {
  it('general elimination solves A x = b for several right sides', () => {
    const system = fc.tuple(size, fc.integer({ min: 1, max: 3 })).chain(([n, columns]) => fc.tuple(fc.constant(n), fc.constant(columns), entries(n * n), entries(n * columns)));
    fc.assert(
      fc.property(system, ([n, columns, matrix, right]) => {
        // A dominant diagonal in shuffled rows: regular, and in need of pivoting.
        const a = matrix.map((value, index) => value + ((Math.floor(index / n) + 1) % n === index % n ? 10 : 0));
        const x = Float64Array.from(right);
        assert.equal(solveGeneral(Float64Array.from(a), x, n, columns), true);
        assertSolved(a, x, right, n, columns);
      }),
    );
  });

  it('general elimination says when a matrix is singular', () => {
    assert.equal(solveGeneral(new Float64Array([1, 2, 2, 4]), new Float64Array([1, 1]), 2), false);
    assert.equal(solveGeneral(new Float64Array([0]), new Float64Array([1]), 1), false);
    assert.equal(solveGeneral(new Float64Array([NaN]), new Float64Array([1]), 1), false);
  });

  it('Cholesky factorisation solves positive definite systems over thirty orders of magnitude', () => {
    const system = size.chain((n) => fc.tuple(fc.constant(n), entries(n * n), entries(n), fc.array(fc.double({ min: -15, max: 15, noNaN: true }), { minLength: n, maxLength: n })));
    fc.assert(
      fc.property(system, ([n, root, right, orders]) => {
        const scale = orders.map((order) => Math.pow(10, order));
        const a = Array.from({ length: n * n }, (_, index) => {
          const [i, j] = [Math.floor(index / n), index % n];
          let sum = i === j ? 1 : 0;
          for (let k = 0; k < n; k++) sum += root[i * n + k]! * root[j * n + k]!;
          return sum;
        });
        const x = Float64Array.from(right, (value, i) => value * scale[i]!);
        solveScaled(Float64Array.from(a, (value, index) => value * scale[Math.floor(index / n)]! * scale[index % n]!), x, n, new Float64Array(n));
        assertSolved(a, x.map((value, i) => value * scale[i]!), right, n);
      }),
    );
  });

  it('a factor serves for further right sides', () => {
    const a = [4, 1, 1, 3];
    const [factor, scale] = [Float64Array.from(a), new Float64Array(2)];
    factorScaled(factor, 2, scale);
    for (const right of [[1, 2], [-3, 0.5]]) {
      const x = Float64Array.from(right);
      solveFactored(factor, x, 2, scale);
      assertSolved(a, x, right, 2);
    }
  });
});
