/** Derivatives of pH against central differences of solved neighbours: mathematics, no outside source. */
import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import type { ChemicalSystem } from '../../src/equilibrium/chemical-system.js';
import { sensitivities } from '../../src/equilibrium/sensitivity.js';
import { solveEquilibrium } from '../../src/equilibrium/solver.js';
import { systemOf, tableOf } from './support.js';

const WITHIN = 1e-4;

/** Systems without water in their reactions, so that the held activity of water makes no difference. */
const SYSTEMS: Readonly<Record<string, ChemicalSystem>> = {
  'a weak acid half neutralised': systemOf([0.05], [-1], [{ components: { 0: 1 }, protons: 1, log10Beta: 4.7, charge: 0 }], 0.025),
  'a weak acid alone': systemOf([0.01], [-1], [{ components: { 0: 1 }, protons: 1, log10Beta: 4.7, charge: 0 }], 0.01),
  'two acids of several steps': systemOf(
    [0.02, 0.03],
    [-3, -2],
    [
      { components: { 0: 1 }, protons: 1, log10Beta: 12.3, charge: -2 },
      { components: { 0: 1 }, protons: 2, log10Beta: 19.5, charge: -1 },
      { components: { 0: 1 }, protons: 3, log10Beta: 21.6, charge: 0 },
      { components: { 1: 1 }, protons: 1, log10Beta: 5.4, charge: -1 },
      { components: { 1: 1 }, protons: 2, log10Beta: 8.3, charge: 0 },
    ],
    0.06,
  ),
  'a metal ion with polynuclear and mixed species': systemOf(
    [0.02, 0.01],
    [2, -1],
    [
      { components: { 0: 1 }, protons: -1, log10Beta: -7.5, charge: 1 },
      { components: { 0: 2 }, protons: -2, log10Beta: -10.5, charge: 2 },
      { components: { 0: 4 }, protons: -4, log10Beta: -20.5, charge: 4 },
      { components: { 1: 1 }, protons: 1, log10Beta: 6.2, charge: 0 },
      { components: { 0: 1, 1: 1 }, protons: 0, log10Beta: 2.1, charge: 1 },
    ],
    0.001,
  ),
};

/** Water's own reaction takes up one H2O; without it the activity of water leaves the equations. */
function dry(system: ChemicalSystem): ChemicalSystem {
  return { ...system, species: system.species.map((species) => ({ ...species, water: 0 })) };
}

/** Derivative of pH as one number of the system is moved by ± step, counter-ions held. */
function difference(system: ChemicalSystem, move: (by: number) => ChemicalSystem, step: number): number {
  const table = tableOf(system);
  return (solveEquilibrium(move(step), table).pH - solveEquilibrium(move(-step), table).pH) / (2 * step);
}

function assertClose(stated: number, measured: number, size: number, what: string): void {
  assert.ok(Math.abs(stated - measured) <= WITHIN * Math.max(Math.abs(measured), size), `${what}: ${stated}, by differences ${measured}`);
}

describe('sensitivities', () => {
  for (const [name, wet] of Object.entries(SYSTEMS)) {
    const system = dry(wet);
    const slopes = sensitivities(system, tableOf(system), solveEquilibrium(system, tableOf(system)))!;

    it(`${name}: to every constant`, () => {
      system.species.forEach((species, j) => {
        if (species.fixedMolality !== undefined) return;
        const move = (by: number): ChemicalSystem => ({ ...system, species: system.species.map((other, k) => (k === j ? { ...other, lnBeta: other.lnBeta + by } : other)) });
        assertClose(slopes.toLnBeta[j]!, difference(system, move, 1e-4), 1e-3, species.id);
        assert.equal(slopes.toLnGamma[j], -slopes.toLnBeta[j]!);
      });
    });

    it(`${name}: to every total and to the proton total`, () => {
      system.components.forEach(({ id, total }, index) => {
        const move = (by: number): ChemicalSystem => ({ ...system, components: system.components.map((component, k) => (k === index ? { ...component, total: component.total + by } : component)) });
        assertClose(slopes.toTotal[index]!, difference(system, move, total * 1e-4), 1e-3, id);
      });
      const scale = Math.abs(system.protonTotal) * 1e-5;
      assertClose(slopes.toProtonTotal, difference(system, (by) => ({ ...system, protonTotal: system.protonTotal + by }), scale), 1e-3, 'protons');
      assert.ok(slopes.toProtonTotal < 0);
    });
  }

  it('are zero for a component that is held from outside', () => {
    const closed = SYSTEMS['a weak acid half neutralised']!;
    const system: ChemicalSystem = { ...closed, components: [{ id: 'held', total: 0, lnActivity: Math.log(0.02) }] };
    const slopes = sensitivities(system, tableOf(system), solveEquilibrium(system, tableOf(system)))!;
    assert.deepEqual([...slopes.toTotal], [0]);
  });
});
