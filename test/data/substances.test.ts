import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { addTo, atomsOf, watersBetween } from './composition.js';
import { families, ions, repeated, substances } from './read.js';

interface Particle { charge: number; formula: string }
const particles = new Map<string, Particle>([
  ...ions.map((ion) => [ion.id, ion] as const),
  ...families.flatMap(({ states }) => states).filter(({ charge }) => charge === 0).map((state) => [state.id, state] as const),
]);
/** Waters by which the parts exceed the formula: substances that take up or lose water on dissolving. */
const TAKES_UP_WATER = new Map([['NH4OH', -1], ['CrO3', 1]]);

function partsOf(text: string): { particle: Particle; count: number }[] {
  return text.split(' + ').map((part) => {
    const [, count, id] = /^(?:(\d+) )?(\S+)$/.exec(part)!;
    const particle = particles.get(id!);
    assert.ok(particle, `${text}: ${id}`);
    return { particle, count: Number(count ?? 1) };
  });
}

function checkDigitHolds(cas: string): boolean {
  const digits = [...cas.replaceAll('-', '')].map(Number).reverse();
  const sum = digits.slice(1).reduce((total, digit, index) => total + digit * (index + 1), 0);
  return sum % 10 === digits[0];
}

describe('the substances', () => {
  const numbers = substances.flatMap(([, , cas]) => cas ?? []);

  it('are at least 300 with a CAS Registry Number', () => {
    assert.ok(numbers.length >= 300, String(numbers.length));
  });

  it('have unique CAS Registry Numbers with a valid check digit', () => {
    assert.deepEqual(repeated(numbers), []);
    assert.deepEqual(numbers.filter((cas) => !checkDigitHolds(cas)), []);
  });

  it('have names that belong to one substance each', () => {
    assert.deepEqual(repeated(substances.flatMap(([names]) => names).map((name) => name.toLowerCase())), []);
  });

  it('consist of parts without a net charge', () => {
    for (const [names, , , parts] of substances) {
      assert.equal(partsOf(parts).reduce((sum, { particle, count }) => sum + particle.charge * count, 0), 0, names[0]);
    }
  });

  it('consist of parts that make up the formula', () => {
    for (const [names, formula, , parts] of substances) {
      const atoms = new Map<string, number>();
      for (const { particle, count } of partsOf(parts)) addTo(atoms, atomsOf(particle.formula), count);
      const hydrate = /·([\d.]*)H2O$/.exec(formula);
      if (hydrate) addTo(atoms, atomsOf('H2O'), Number(hydrate[1] || 1));
      assert.equal(watersBetween(atoms, atomsOf(formula)), TAKES_UP_WATER.get(formula) ?? 0, `${names[0]}: ${formula}, ${parts}`);
    }
  });
});
