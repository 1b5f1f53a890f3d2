/**
 * Whether the stated uncertainties are the right size: how many of the published pH values, each cited beside its own
 * test, lie within one and within two standard uncertainties of the prediction. A normal error gives 68 % and 95 %.
 */
import assert from 'node:assert/strict';
import { it } from 'node:test';
import { predict } from '../../src/engine.js';
import { readValues, tableLines } from './values.js';

interface Value {
  readonly solutes: string;
  readonly temperature: number;
  readonly pH: number;
}
interface Mixture {
  readonly fixed: string;
  readonly added: string;
  readonly addedMolarity: number;
  readonly points: readonly (readonly [millilitres: number, pH: number])[];
}

const standards = readValues<{ solutes: string; points: [celsius: number, pH: number][] }[]>('ph-standards').flatMap(({ solutes, points }) =>
  points.filter(([celsius]) => celsius <= 50).map(([temperature, pH]): Value => ({ solutes, temperature, pH })),
);
const mixtures = readValues<Mixture[]>('nbs-buffers').flatMap(({ fixed, added, addedMolarity, points }) =>
  points.map(([millilitres, pH]): Value => ({ solutes: `${fixed}; ${((addedMolarity * millilitres) / 100).toPrecision(6)} mol/L ${added}`, temperature: 25, pH })),
);
const handbook = readValues<{ solutes: string; pH: number }[]>('approximate-values').map(({ solutes, pH }): Value => ({ solutes, temperature: 25, pH }));
const reagents = readValues<Value[]>('reagent-solutions');

/** Standard uncertainty taken for a published value itself, from how it is rounded and how it was made: common practice, no source. */
const SETS: readonly (readonly [name: string, values: readonly Value[], ownUncertainty: number])[] = [
  ['reference buffer solutions', standards, 0.003],
  ['buffer mixtures', mixtures, 0.02],
  ['handbook values', handbook, 0.1],
  ['solutions of reagents', reagents, 0.1],
];

/** Amounts of these recipes are exact, so the digits in which they are written do not count. */
function modelUncertainty({ uncertaintyBudget }: ReturnType<typeof predict>): number {
  return Math.sqrt(uncertaintyBudget.filter(({ kind }) => kind !== 'amount').reduce((sum, { contribution }) => sum + contribution * contribution, 0));
}

it('published values lie within the stated uncertainty as often as they should', (t) => {
  const rows = SETS.map(([name, values, own]) => {
    const distances = values.map(({ solutes, temperature, pH }) => {
      const prediction = predict(solutes, { temperature });
      return Math.abs(prediction.pH - pH) / Math.sqrt(modelUncertainty(prediction) ** 2 + own * own);
    });
    return { name, count: distances.length, one: distances.filter((distance) => distance <= 1).length, two: distances.filter((distance) => distance <= 2).length, largest: Math.max(...distances) };
  });
  const share = (part: number, whole: number): string => `${((100 * part) / whole).toFixed(0)} %`;
  const lines = rows.map(({ name, count, one, two, largest }) => [name, count, share(one, count), share(two, count), largest.toFixed(1)]);
  for (const line of tableLines([['', 'values', 'within 1 u', 'within 2 u', 'largest, u'], ...lines])) t.diagnostic(line);
  const [count, two] = [rows.reduce((sum, row) => sum + row.count, 0), rows.reduce((sum, row) => sum + row.two, 0)];
  t.diagnostic(`all: ${share(rows.reduce((sum, row) => sum + row.one, 0), count)} within 1 u, ${share(two, count)} within 2 u of ${count} values`);
  assert.ok(two / count >= 0.85, share(two, count));
});
