/**
 * The solver against a second implementation (second-implementation.ts) that states the equations differently and
 * solves them at 50 digits, on random mixtures of listed substances.
 */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import { ROOM_AIR_CARBON_DIOXIDE } from '../../src/equilibrium/air.js';
import { solveEquilibrium } from '../../src/equilibrium/solver.js';
import { waterAt } from '../../src/equilibrium/water.js';
import { dissolve } from '../../src/prediction/dissolve.js';
import { solutionModel, type SolutionModel } from '../../src/prediction/solution-model.js';
import { readSolutes } from '../../src/substances/solutes-text.js';
import { addressOf, predictable } from '../prediction/support.js';
import { solvePrecisely } from './second-implementation.js';

const SYSTEMS = 200;
const MOST_SPECIES = 12;
const PH_TOLERANCE = 1e-8;
/** Relative, of every species that holds more than a billionth of the solutes. */
const MOLALITY_TOLERANCE = 1e-7;

interface Mixture {
  readonly parts: readonly { readonly substance: string; readonly molality: number }[];
  readonly temperature: number;
  readonly inAir: boolean;
}

/**
 * 1 µmol/kg to 1 mol/kg with twelve binary digits, so that all sums of amounts are exact: electroneutrality written
 * over all ions would otherwise take its rounding from the largest of them.
 */
const exactMolality = fc.record({ exponent: fc.integer({ min: -20, max: -1 }), digits: fc.integer({ min: 2048, max: 4095 }) }).map(({ exponent, digits }) => (digits / 4096) * Math.pow(2, exponent + 1));

const anyMixture: fc.Arbitrary<Mixture> = fc.record({
  parts: fc.array(fc.record({ substance: fc.constantFrom(...predictable.map(addressOf)), molality: exactMolality }), { minLength: 1, maxLength: 4 }),
  temperature: fc.integer({ min: 0, max: 60 }),
  inAir: fc.boolean(),
});

function modelOf({ parts, temperature, inAir }: Mixture): SolutionModel {
  const water = waterAt(temperature);
  const solutes = readSolutes(parts.map(({ substance, molality }) => ({ substance, amount: `${molality.toFixed(40)} mol/kg` })));
  return solutionModel(dissolve(solutes, water, undefined).particles, water, inAir ? ROOM_AIR_CARBON_DIOXIDE : undefined);
}

/** The first mixtures of the generator whose species are few enough for a solution at 50 digits to be quick. */
function* fewSpecies(): Generator<{ mixture: Mixture; model: SolutionModel }> {
  for (const mixture of fc.sample(anyMixture, { numRuns: 40 * SYSTEMS, seed: Number(process.env['SEED'] ?? 1) })) {
    const model = modelOf(mixture);
    if (model.system.species.length <= MOST_SPECIES) yield { mixture, model };
  }
}

describe('the solver and a second implementation at 50 digits', () => {
  it(`agree on ${SYSTEMS} random mixtures`, (t) => {
    let systems = 0;
    let [largestPH, largestMolality, largestResidual] = [0, 0, 0];
    let mostSpecies = 0;
    const sizes = new Map<number, number>();
    for (const { mixture, model } of fewSpecies()) {
      if (++systems > SYSTEMS) break;
      const described = JSON.stringify(mixture);
      const state = solveEquilibrium(model.system, model.table);
      const precise = solvePrecisely(model.system, model.table);
      assert.ok(state.converged, described);
      const deviation = Math.abs(state.pH - precise.pH);
      assert.ok(deviation <= PH_TOLERANCE, `${described}: ${state.pH} and ${precise.pH}`);
      const least = 1e-9 * Math.max(...precise.molality);
      precise.molality.forEach((molality, index) => {
        if (molality < least) return;
        const relative = Math.abs(state.molality[index]! / molality - 1);
        largestMolality = Math.max(largestMolality, relative);
        assert.ok(relative <= MOLALITY_TOLERANCE, `${described}: ${model.system.species[index]!.id} ${state.molality[index]} and ${molality}`);
      });
      largestPH = Math.max(largestPH, deviation);
      largestResidual = Math.max(largestResidual, precise.residual);
      mostSpecies = Math.max(mostSpecies, model.system.species.length);
      sizes.set(model.system.components.length, (sizes.get(model.system.components.length) ?? 0) + 1);
    }
    assert.ok(systems > SYSTEMS, `only ${systems} mixtures`);
    t.diagnostic(`${SYSTEMS} mixtures of up to ${mostSpecies} species: largest deviation of pH ${largestPH.toExponential(1)}, of a molality ${largestMolality.toExponential(1)} (relative); residual of the second ${largestResidual.toExponential(1)}`);
    t.diagnostic(`components: ${[...sizes].sort(([a], [b]) => a - b).map(([components, count]) => `${count} with ${components}`).join(', ')}`);
  });
});
