/** The solver against balances and an independent bisection: mathematics, no outside source. */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import fc from 'fast-check';
import type { ChemicalSystem } from '../../src/equilibrium/chemical-system.js';
import { log10Activity, solveEquilibrium, waterActivityOf, type EquilibriumState } from '../../src/equilibrium/solver.js';
import { anyAcidMixture, anySystem, LN10, systemOf, tableOf } from './support.js';

/** Largest residual of mass action, of every total, of the proton balance and of electroneutrality, each relative. */
function residuals(system: ChemicalSystem, state: EquilibriumState): Record<string, number> {
  let action = 0;
  let charge = 0;
  let charges = 0;
  let protons = -system.protonTotal;
  let protonSize = Math.abs(system.protonTotal);
  const totals = system.components.map(({ total }) => -total);
  system.species.forEach((species, j) => {
    const molality = state.molality[j]!;
    charge += species.charge * molality;
    charges += Math.abs(species.charge) * molality;
    protons += species.protons * molality;
    protonSize += Math.abs(species.protons) * molality;
    for (const [component, number] of species.stoichiometry) totals[component] = totals[component]! + number * molality;
    if (species.fixedMolality !== undefined || molality < 1e-250) return;
    const expected = species.stoichiometry.reduce((sum, [component, number]) => sum + number * state.lnActivity[component]!, species.lnBeta - species.protons * state.pH * LN10 + species.water * state.lnWaterActivity);
    action = Math.max(action, Math.abs(log10Activity(state, j) * LN10 - expected));
  });
  const mass = Math.max(0, ...totals.map((difference, component) => Math.abs(difference) / system.components[component]!.total));
  return { action, mass, protons: Math.abs(protons) / protonSize, charge: Math.abs(charge) / charges };
}

function assertSolved(system: ChemicalSystem): EquilibriumState {
  const state = solveEquilibrium(system, tableOf(system));
  assert.ok(state.converged, `residual ${state.residual} after ${state.iterations} iterations`);
  assert.ok(state.residual <= 1e-10);
  const { action, mass, protons, charge } = residuals(system, state);
  assert.ok(mass! <= 1e-9 && protons! <= 1e-9 && charge! <= 1e-9, JSON.stringify({ mass, protons, charge }));
  assert.ok(action! <= 1e-7, `mass action ${action}`);
  assert.ok(waterActivityOf(state) > 0);
  return state;
}

/** pH of a mixture of acids by bisection of the proton balance, the activity coefficients given. */
function pHByBisection(system: ChemicalSystem, state: EquilibriumState): number {
  const balance = (pH: number): number => {
    const weight = (j: number): number => Math.exp(system.species[j]!.lnBeta - system.species[j]!.protons * pH * LN10 - state.lnGamma[j]! + system.species[j]!.water * state.lnWaterActivity);
    let sum = -system.protonTotal;
    system.components.forEach(({ total }, component) => {
      const own = system.species.map((_, j) => j).filter((j) => system.species[j]!.stoichiometry[0]?.[0] === component);
      const all = own.reduce((size, j) => size + weight(j), 0);
      for (const j of own) sum += (system.species[j]!.protons * total * weight(j)) / all;
    });
    system.species.forEach((species, j) => {
      if (species.stoichiometry.length === 0 && species.fixedMolality === undefined) sum += species.protons * weight(j);
    });
    return sum;
  };
  let [low, high] = [-5, 20];
  for (let step = 0; step < 100; step++) {
    const middle = (low + high) / 2;
    if (balance(middle) > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

describe('solver', () => {
  it('solves mixtures of one to six acids, and finds the pH that bisection finds', () => {
    fc.assert(
      fc.property(anyAcidMixture, (system) => {
        const state = assertSolved(system);
        const expected = pHByBisection(system, state);
        assert.ok(Math.abs(state.pH - expected) <= 1e-6, `${state.pH}, by bisection ${expected}`);
      }),
      { numRuns: 400 },
    );
  });

  it('solves random systems with polynuclear and mixed species', () => {
    fc.assert(fc.property(anySystem, (system) => void assertSolved(system)), { numRuns: 400 });
  });

  it('solves systems that random search found hard', () => {
    const six = systemOf(
      [1, 1, 1, 1, 1, 1],
      [4, 1, 3, 0, 1, 2],
      [
        { components: { 3: 1, 4: 1 }, protons: -1, log10Beta: -7, charge: 0 },
        { components: { 0: 2, 3: 1 }, protons: -2, log10Beta: -14, charge: 6 },
      ],
      -3.4646236914358983,
    );
    assertSolved(six);
  });

  it('gives pure water half of pKw', () => {
    const system = systemOf([1e-9], [0], [], 0);
    const state = assertSolved(system);
    const { lnBeta } = system.species.at(-1)!;
    assert.ok(Math.abs(state.pH + lnBeta / (2 * LN10)) < 1e-6, String(state.pH));
  });

  it('finds the same state from a neighbouring solution as from nothing', () => {
    fc.assert(
      fc.property(anyAcidMixture, fc.double({ min: 0.5, max: 2, noNaN: true }), (system, factor) => {
        const neighbour: ChemicalSystem = { ...system, components: system.components.map((component) => ({ ...component, total: component.total * factor })) };
        const start = solveEquilibrium(neighbour, tableOf(system));
        assert.ok(Math.abs(solveEquilibrium(system, tableOf(system), start).pH - solveEquilibrium(system, tableOf(system)).pH) <= 1e-7);
      }),
      { numRuns: 100 },
    );
  });

  it('holds a component whose activity is given', () => {
    const open = systemOf([1], [0], [{ components: { 0: 1 }, protons: -1, log10Beta: -6.35, charge: -1 }], 0);
    const lnActivity = Math.log(1.4e-5);
    const system: ChemicalSystem = { ...open, components: [{ id: 'gas', total: 0, lnActivity }] };
    const state = solveEquilibrium(system, tableOf(system));
    assert.ok(state.converged);
    assert.ok(Math.abs(Math.log(state.molality[0]!) + state.lnGamma[0]! - lnActivity) < 1e-9);
    // Half of 6.35 and −log10 of 1.4e-5.
    assert.ok(Math.abs(state.pH - (6.35 - Math.log10(1.4e-5)) / 2) < 0.01, String(state.pH));
  });
});
