import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import type { InteractionTable } from '../../src/equilibrium/chemical-system.js';
import { interactingPairs, coefficientUncertainty, hasCoefficient, interactionTable, IONIC_STRENGTH_LIMIT } from '../../src/equilibrium/interaction-coefficients.js';
import { activityCoefficients, debyeHueckelDerivative, debyeHueckelTerm, ionicStrengthOf, lnWaterActivity } from '../../src/equilibrium/specific-interaction.js';
import { WATER_MOLAR_MASS, waterAt } from '../../src/equilibrium/water.js';
import { atZeroIonicStrength } from '../../src/equilibrium/zero-ionic-strength.js';
import { chargeShown, read } from '../data/read.js';

interface Electrolyte {
  readonly cation: string;
  readonly anion: string;
  readonly points: readonly (readonly [molality: number, coefficient: number])[];
}
const SLOPE = waterAt(25).debyeHueckelSlope;
const WITHIN = 0.05;
/** Molality at which the published coefficients end for these salts. */
const HIGHEST_MOLALITY = 3;

/**
 * Electrolytes that the model with its published coefficients misses by more than 5 %, with the largest relative
 * deviation measured, to which they are held within 0.005.
 */
const ASSOCIATES = 'the ions associate, and one coefficient without ion pairs cannot follow that';
const ABOVE_RANGE = 'at 2 mol/kg the ionic strength is 6 mol/kg, above the 3.5 mol/kg at which the coefficients end';
const HIGH_CHARGE = 'trivalent cation; the published coefficient fits the range as a whole';
const PUBLISHED_VALUE = 'the published coefficient itself does not fit this salt';
const MISSED: Readonly<Record<string, readonly [deviation: number, reason: string]>> = {
  'K+ NO3-': [0.096, ASSOCIATES],
  'Ag+ NO3-': [0.106, ASSOCIATES],
  'Pb+2 NO3-': [0.265, ASSOCIATES],
  'Na+ H2PO4-': [0.111, ASSOCIATES],
  'K+ H2PO4-': [0.076, ASSOCIATES],
  'Na+ SO4-2': [0.135, ASSOCIATES],
  'K+ SO4-2': [0.254, ASSOCIATES],
  'Mg+2 Cl-': [-0.107, ABOVE_RANGE],
  'Ca+2 Cl-': [-0.128, ABOVE_RANGE],
  'Al+3 Cl-': [-0.084, HIGH_CHARGE],
  'Cr+3 Cl-': [-0.074, HIGH_CHARGE],
  'H+ ClO4-': [0.061, PUBLISHED_VALUE],
  'Na+ F-': [0.143, PUBLISHED_VALUE],
  'Fe+2 Cl-': [0.076, PUBLISHED_VALUE],
};

/** Mean activity coefficient of a salt by the model, at a molality of the salt. */
function meanCoefficient(cation: string, anion: string, molality: number): number {
  const [plus, minus] = [chargeShown(cation), -chargeShown(anion)];
  const [cations, anions] = plus === minus ? [1, 1] : [minus, plus];
  const table = interactionTable([{ id: cation, charge: plus }, { id: anion, charge: -minus }], SLOPE);
  const lnGamma = new Float64Array(2);
  activityCoefficients(table, Float64Array.of(cations * molality, anions * molality), lnGamma);
  return Math.exp((cations * lnGamma[0]! + anions * lnGamma[1]!) / (cations + anions));
}

describe('mean activity coefficients', () => {
  // Robinson & Stokes, Electrolyte Solutions, 2nd ed. (1959), Appendix 8.10.
  const { electrolytes } = JSON.parse(readFileSync(join(import.meta.dirname, 'values', 'mean-activity-coefficients.json'), 'utf8')) as { electrolytes: Electrolyte[] };
  const largest = new Map<string, number>();
  for (const { cation, anion, points } of electrolytes) {
    const name = `${cation} ${anion}`;
    const deviations = points.filter(([molality]) => molality <= HIGHEST_MOLALITY).map(([molality, published]) => [molality, meanCoefficient(cation, anion, molality) / published - 1] as const);
    const worst = deviations.reduce((most, [, deviation]) => (Math.abs(deviation) > Math.abs(most) ? deviation : most), 0);
    largest.set(name, worst);
    const missed = MISSED[name];
    it(`${name}${missed === undefined ? '' : ' (missed)'}`, () => {
      assert.ok(hasCoefficient(cation, anion));
      const report = deviations.map(([molality, deviation]) => `${molality} mol/kg: ${(deviation * 100).toFixed(1)} %`).join(', ');
      if (missed === undefined) assert.ok(Math.abs(worst) <= WITHIN, report);
      else assert.ok(Math.abs(worst - missed[0]) <= 0.005, `${report}; was ${(missed[0] * 100).toFixed(1)} %`);
    });
  }

  it('reports how many electrolytes are met', (t) => {
    const met = [...largest].filter(([, deviation]) => Math.abs(deviation) <= WITHIN);
    t.diagnostic(`${met.length} of ${largest.size} electrolytes within 5 % to ${HIGHEST_MOLALITY} mol/kg`);
    for (const [name, [, reason]] of Object.entries(MISSED)) t.diagnostic(`missed: ${name} ${(largest.get(name)! * 100).toFixed(1)} %: ${reason}`);
    assert.deepEqual(Object.keys(MISSED).filter((name) => !largest.has(name)), []);
  });
});

describe('activity of water', () => {
  /** Random tables of three to six ions with a fixed seed. */
  function example(seed: number): { table: InteractionTable; molality: Float64Array } {
    let state = seed;
    const random = (): number => (state = (state * 16807) % 2147483647) / 2147483647;
    const count = 3 + (seed % 4);
    const charges = Float64Array.from({ length: count }, (_, index) => (index % 2 === 0 ? 1 : -1) * (1 + (index % 3)));
    const epsilon = new Float64Array(count * count);
    for (let j = 0; j < count; j++) {
      for (let k = 0; k < j; k++) if (charges[j]! * charges[k]! < 0) epsilon[j * count + k] = epsilon[k * count + j] = random() - 0.5;
    }
    return { table: { charges, epsilon, pairs: interactingPairs(charges, epsilon), slope: SLOPE, denominator: 1.5, ceiling: 50 }, molality: Float64Array.from({ length: count }, () => 0.01 + random()) };
  }

  it('obeys the Gibbs–Duhem equation: d ln a(H2O) = −M Σ mⱼ d ln(mⱼ γⱼ), by finite differences', () => {
    for (let seed = 1; seed <= 20; seed++) {
      const { table, molality } = example(seed);
      for (let changed = 0; changed < molality.length; changed++) {
        const step = 1e-5 * molality[changed]!;
        const at = (sign: number): { water: number; lnGamma: Float64Array } => {
          const shifted = molality.slice();
          shifted[changed] = shifted[changed]! + sign * step;
          const lnGamma = new Float64Array(molality.length);
          activityCoefficients(table, shifted, lnGamma);
          return { water: lnWaterActivity(table, shifted), lnGamma };
        };
        const [before, after] = [at(-1), at(1)];
        let expected = -WATER_MOLAR_MASS;
        for (let j = 0; j < molality.length; j++) expected -= (WATER_MOLAR_MASS * molality[j]! * (after.lnGamma[j]! - before.lnGamma[j]!)) / (2 * step);
        const slope = (after.water - before.water) / (2 * step);
        assert.ok(Math.abs(slope - expected) <= 1e-7, `seed ${seed}, ion ${changed}: ${slope} ${expected}`);
      }
    }
  });

  it('is that of an ideal solution without charges, and 1 for pure water', () => {
    const table: InteractionTable = { charges: new Float64Array(2), epsilon: new Float64Array(4), pairs: interactingPairs(new Float64Array(2), new Float64Array(4)), slope: SLOPE, denominator: 1.5, ceiling: 6 };
    assert.ok(Math.abs(lnWaterActivity(table, Float64Array.of(0.3, 0.2)) + WATER_MOLAR_MASS * 0.5) < 1e-15);
    assert.equal(Math.abs(lnWaterActivity(table, new Float64Array(2))), 0);
  });

  // Robinson & Stokes, Electrolyte Solutions, 2nd ed. (1959), Appendix 8.10: osmotic coefficient of 1 mol/kg NaCl 0.936.
  it('gives the osmotic coefficient of 1 mol/kg NaCl within 2 %', () => {
    const table = interactionTable([{ id: 'Na+', charge: 1 }, { id: 'Cl-', charge: -1 }], SLOPE);
    const osmotic = -lnWaterActivity(table, Float64Array.of(1, 1)) / (2 * WATER_MOLAR_MASS);
    assert.ok(Math.abs(osmotic / 0.936 - 1) < 0.02, String(osmotic));
  });
});

describe('Debye–Hückel term', () => {
  it('has the derivative that is stated', () => {
    for (const ionicStrength of [1e-8, 1e-3, 0.1, 1, 5]) {
      const step = ionicStrength * 1e-5;
      const slope = (debyeHueckelTerm(ionicStrength + step, SLOPE, 1.5) - debyeHueckelTerm(ionicStrength - step, SLOPE, 1.5)) / (2 * step);
      assert.ok(Math.abs(slope / debyeHueckelDerivative(ionicStrength, SLOPE, 1.5) - 1) < 1e-6);
    }
  });

  it('tends to the limiting law', () => assert.ok(Math.abs(debyeHueckelTerm(1e-12, SLOPE, 1.5) / (SLOPE * 1e-6) - 1) < 1e-5));

  it('moves a constant to zero ionic strength and leaves one that holds there', () => {
    assert.equal(atZeroIonicStrength(-9.2, 2, 0), -9.2);
    assert.ok(Math.abs(atZeroIonicStrength(-9.2, 2, 0.1) - (-9.2 - 2 * debyeHueckelTerm(0.1, SLOPE, 1.5))) < 1e-12);
  });
});

describe('interaction coefficients', () => {
  const { coefficients } = read<{ coefficients: [cation: string, anion: string, value: number, uncertainty: number][] }>('activity.json');

  it('are those of the data, in both orders, and zero between like charges', () => {
    for (const [cation, anion, value, uncertainty] of coefficients) {
      const table = interactionTable([{ id: cation, charge: chargeShown(cation) }, { id: anion, charge: chargeShown(anion) }], SLOPE);
      assert.deepEqual([...table.epsilon], [0, value, value, 0], `${cation} ${anion}`);
      assert.equal(coefficientUncertainty({ id: cation, charge: chargeShown(cation) }, { id: anion, charge: chargeShown(anion) }), uncertainty);
    }
  });

  it('are estimated with a wider uncertainty for unknown pairs', () => {
    assert.equal(hasCoefficient('X+', 'Y-'), false);
    const unknown = coefficientUncertainty({ id: 'X+', charge: 1 }, { id: 'Y-', charge: -1 });
    assert.ok(unknown > coefficientUncertainty({ id: 'Na+', charge: 1 }, { id: 'Cl-', charge: -1 }));
    for (let plus = 1; plus <= 6; plus++) for (let minus = 1; minus <= 6; minus++) assert.ok(coefficientUncertainty({ id: 'X', charge: plus }, { id: 'Y', charge: -minus }) > 0);
    assert.ok(IONIC_STRENGTH_LIMIT >= 3);
  });

  it('stay bounded far above the range of the model', () => {
    const table = interactionTable([{ id: 'Na+', charge: 1 }, { id: 'Cl-', charge: -1 }], SLOPE);
    const [held, far] = [new Float64Array(2), new Float64Array(2)];
    activityCoefficients(table, Float64Array.of(table.ceiling, table.ceiling), held);
    activityCoefficients(table, Float64Array.of(1000, 1000), far);
    assert.ok(Math.abs(held[0]! - far[0]!) < 1e-12);
    assert.equal(ionicStrengthOf(Float64Array.of(1, 0.5), Float64Array.of(1, -2)), 1.5);
  });
});
