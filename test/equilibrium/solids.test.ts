/** Solids in equilibrium with the solution: the conditions of an optimum (Karush 1939; Kuhn & Tucker 1951). */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import type { ChemicalSystem, SolidDefinition } from '../../src/equilibrium/chemical-system.js';
import { SaturationConstraint } from '../../src/equilibrium/saturation.js';
import { solveEquilibrium, type EquilibriumState } from '../../src/equilibrium/solver.js';
import { anySystem, LN10, systemOf, tableOf } from './support.js';

/** ln of ion product over solubility product. */
function lnSaturation(solid: SolidDefinition, state: EquilibriumState): number {
  return solid.stoichiometry.reduce((sum, [component, number]) => sum + number * state.lnActivity[component]!, solid.protons * -state.pH * LN10 + solid.water * state.lnWaterActivity - solid.lnK);
}

function assertStable(system: ChemicalSystem): EquilibriumState {
  const state = solveEquilibrium(system, tableOf(system));
  assert.ok(state.converged, `residual ${state.residual}`);
  assert.ok(state.residual <= 1e-10);
  const dissolvedAndSolid = system.components.map(({ total }) => -total);
  let protons = -system.protonTotal;
  let size = Math.abs(system.protonTotal);
  const add = (stoichiometry: readonly (readonly [number, number])[], bound: number, amount: number): void => {
    for (const [component, number] of stoichiometry) dissolvedAndSolid[component] = dissolvedAndSolid[component]! + number * amount;
    protons += bound * amount;
    size += Math.abs(bound) * amount;
  };
  system.species.forEach((species, j) => add(species.stoichiometry, species.protons, state.molality[j]!));
  system.solids!.forEach((solid, s) => {
    const amount = state.solidAmounts[s]!;
    assert.ok(amount >= 0, `${solid.id}: ${amount}`);
    add(solid.stoichiometry, solid.protons, amount);
    const saturation = lnSaturation(solid, state);
    if (amount > 1e-12) assert.ok(Math.abs(saturation) <= 1e-7, `${solid.id} lies there at saturation ${saturation}`);
    else assert.ok(saturation <= 1e-7, `${solid.id} is missing at saturation ${saturation}`);
  });
  dissolvedAndSolid.forEach((difference, component) => assert.ok(Math.abs(difference) <= 1e-8 * system.components[component]!.total, `component ${component}: ${difference}`));
  assert.ok(Math.abs(protons) <= 1e-8 * size, `protons ${protons}`);
  return state;
}

/** A solid of one or two components that is sparingly or readily soluble. */
const anySolid = fc.record({ first: fc.nat(5), second: fc.nat(5), numbers: fc.tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 2 })), protons: fc.integer({ min: -3, max: 1 }), log10K: fc.double({ min: -12, max: 1, noNaN: true }) });

const anySystemWithSolids = fc.tuple(anySystem, fc.array(anySolid, { minLength: 1, maxLength: 5 })).map(([system, solids]): ChemicalSystem => {
  const count = system.components.length;
  return {
    ...system,
    solids: solids.map(({ first, second, numbers, protons, log10K }, index) => {
      const [a, b] = [first % count, second % count];
      // Protons set free by dissolving bring a factor of about 10⁻⁷ each.
      return { id: `solid ${index}`, lnK: (log10K - 7 * protons) * LN10, protons, water: 0, stoichiometry: a === b ? [[a, numbers[0]]] : [[a, numbers[0]], [b, numbers[1]]] };
    }),
  };
});

describe('solids', () => {
  it('are there exactly where the solution is saturated, in random systems', (t) => {
    let present = 0;
    let checked = 0;
    fc.assert(
      fc.property(anySystemWithSolids, (system) => {
        const state = assertStable(system);
        checked += system.solids!.length;
        present += state.solidAmounts.filter((amount) => amount > 0).length;
      }),
      { numRuns: 400 },
    );
    t.diagnostic(`${present} of ${checked} solids present`);
    assert.ok(present > 50 && present < checked);
  });

  it('hold the product of a salt of two ions at its solubility product', () => {
    const closed = systemOf([0.3, 0.3], [1, -1], [], 0);
    const lnK = Math.log(1e-5);
    const state = assertStable({ ...closed, solids: [{ id: 'salt', lnK, protons: 0, water: 0, stoichiometry: [[0, 1], [1, 1]] }] });
    assert.ok(Math.abs(state.lnActivity[0]! + state.lnActivity[1]! - lnK) < 1e-9);
    assert.ok(state.solidAmounts[0]! > 0.29 && state.solidAmounts[0]! < 0.3);
  });

  it('let the less soluble of two that are made of the same take the other’s place', () => {
    const closed = systemOf([0.1, 0.1], [1, -1], [], 0);
    const solid = (id: string, log10K: number): SolidDefinition => ({ id, lnK: log10K * LN10, protons: 0, water: 0, stoichiometry: [[0, 1], [1, 1]] });
    const state = assertStable({ ...closed, solids: [solid('metastable', -5), solid('stable', -6)] });
    assert.equal(state.solidAmounts[0], 0);
    assert.ok(state.solidAmounts[1]! > 0.09);
  });

  it('that depend on each other are no set that the phase rule allows', () => {
    assert.equal(SaturationConstraint.of([Float64Array.of(1, 1, 0), Float64Array.of(2, 2, 0)], 3), undefined);
    const constraint = SaturationConstraint.of([Float64Array.of(1, 1, 0), Float64Array.of(1, 0, -2)], 3)!;
    const unknowns = Float64Array.of(0, 0, -16);
    constraint.complete(unknowns, constraint.offsets(Float64Array.of(-10, 25)));
    assert.ok(Math.abs(unknowns[0]! + unknowns[1]! + 10) < 1e-12 && Math.abs(unknowns[0]! - 2 * unknowns[2]! - 25) < 1e-12);
  });
});
