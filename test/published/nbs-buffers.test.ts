/**
 * Buffer mixtures measured on the conventional scale: Bower & Bates, J. Res. NBS 55 (1955) 197; Bates & Bower, Anal.
 * Chem. 28 (1956) 1322. Every mixture is made up to 100 mL.
 */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict } from '../../src/engine.js';
import { readValues, rootMeanSquare, tableLines, thousandths } from './values.js';

interface Mixture {
  readonly key: string;
  readonly recipe: string;
  readonly fixed: string;
  readonly added: string;
  readonly addedMolarity: number;
  readonly points: readonly (readonly [millilitres: number, pH: number])[];
}

/** The mixtures are to lie within AIMED_AT, and may not leave TOLERANCE. */
const AIMED_AT = 0.03;
const TOLERANCE = 0.05;
/** Borax with much sodium hydroxide is hardly buffered: a trace of carbonate moves it, and the table is good to 0.1 to 0.15 there. */
const ALKALINE_BORAX = 0.15;
const ALKALINE_FROM = 10;
const hardlyBuffered = (key: string, pH: number): boolean => key === 'borax_naoh' && pH >= ALKALINE_FROM;

const measured = readValues<Mixture[]>('nbs-buffers').map((mixture) => ({
  ...mixture,
  deviations: mixture.points.map(([millilitres, pH]) => {
    const molarity = ((mixture.addedMolarity * millilitres) / 100).toPrecision(6);
    return { millilitres, pH, deviation: predict(`${mixture.fixed}; ${molarity} mol/L ${mixture.added}`).pH - pH };
  }),
}));

describe('buffer mixtures of Bower and Bates at 25 °C', () => {
  for (const { key, recipe, deviations } of measured) {
    it(`${key}: ${recipe}`, () => {
      for (const { millilitres, pH, deviation } of deviations) {
        const tolerance = hardlyBuffered(key, pH) ? ALKALINE_BORAX : TOLERANCE;
        assert.ok(Math.abs(deviation) <= tolerance, `${millilitres} mL, pH ${pH}: ${thousandths(deviation)} thousandths`);
      }
    });
  }

  it('reports every mixture', (t) => {
    const rows = measured.map(({ key, deviations }) => [
      key,
      thousandths(rootMeanSquare(deviations.map(({ deviation }) => deviation))),
      deviations.map(({ pH, deviation }) => `${pH.toFixed(2)}:${thousandths(deviation)}`).join(' '),
    ]);
    for (const line of tableLines([['mixture', 'rms', 'pH:deviation, thousandths'], ...rows])) t.diagnostic(line);
    const points = measured.flatMap(({ key, deviations }) => deviations.map((point) => ({ key, ...point })));
    const summary = (label: string, chosen: typeof points): string => {
      const largest = chosen.reduce((worst, point) => (Math.abs(point.deviation) > Math.abs(worst.deviation) ? point : worst));
      const beyond = chosen.filter(({ deviation }) => Math.abs(deviation) > AIMED_AT).length;
      return `${label}: ${chosen.length} mixtures, rms ${rootMeanSquare(chosen.map(({ deviation }) => deviation)).toFixed(4)}, largest ${largest.deviation.toFixed(4)} (${largest.key}, pH ${largest.pH.toFixed(2)}), ${beyond} beyond ${AIMED_AT}`;
    };
    t.diagnostic(summary('all', points));
    t.diagnostic(summary('without alkaline borax', points.filter(({ key, pH }) => !hardlyBuffered(key, pH))));
    assert.equal(measured.reduce((sum, { points }) => sum + points.length, 0), 46);
  });
});
