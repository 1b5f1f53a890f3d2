import fc from 'fast-check';
import type { ChemicalSystem, InteractionTable, SpeciesDefinition } from '../../src/equilibrium/chemical-system.js';
import { interactionTable } from '../../src/equilibrium/interaction-coefficients.js';
import { waterAt } from '../../src/equilibrium/water.js';

/** The same cases in every run; SEED=… in the environment looks elsewhere. */
fc.configureGlobal({ seed: Number(process.env['SEED'] ?? 1) });

export const LN10 = Math.log(10);
export const ROOM = waterAt(25);

/** A species formed from components and protons, with its decadic constant. */
export interface Formation {
  readonly components: Readonly<Record<number, number>>;
  readonly protons: number;
  readonly log10Beta: number;
  readonly charge: number;
}

/** A system with water's own ions and spectators that make it neutral. */
export function systemOf(totals: readonly number[], charges: readonly number[], formations: readonly Formation[], protonTotal: number): ChemicalSystem {
  const bare: SpeciesDefinition[] = charges.map((charge, component) => ({ id: `component ${component}`, charge, lnBeta: 0, protons: 0, water: 0, stoichiometry: [[component, 1]] }));
  const formed: SpeciesDefinition[] = formations.map(({ components, protons, log10Beta, charge }, index) => ({
    id: `species ${index}`,
    charge,
    lnBeta: log10Beta * LN10,
    protons,
    water: 0,
    stoichiometry: Object.entries(components).map(([component, number]) => [Number(component), number] as const),
  }));
  // What the components and protons bring is balanced by a cation or anion that takes part in nothing.
  const missing = -totals.reduce((sum, total, component) => sum + total * charges[component]!, protonTotal);
  const spectator: SpeciesDefinition[] =
    missing === 0 ? [] : [{ id: missing > 0 ? 'Na+' : 'Cl-', charge: Math.sign(missing), lnBeta: 0, protons: 0, water: 0, stoichiometry: [], fixedMolality: Math.abs(missing) }];
  return {
    components: totals.map((total, component) => ({ id: `component ${component}`, total })),
    species: [
      ...bare,
      ...formed,
      ...spectator,
      { id: 'H+', charge: 1, lnBeta: 0, protons: 1, water: 0, stoichiometry: [] },
      { id: 'OH-', charge: -1, lnBeta: -ROOM.pKw * LN10, protons: -1, water: 1, stoichiometry: [] },
    ],
    protonTotal,
  };
}

export function tableOf(system: ChemicalSystem): InteractionTable {
  return interactionTable(system.species, ROOM.debyeHueckelSlope);
}

const total = fc.double({ min: -9, max: Math.log10(5), noNaN: true }).map((exponent) => Math.pow(10, exponent));

/** An acid with one to four protons: pKa values in order, total, charge of the bare anion, protons put in. */
export const anyAcid = fc
  .record({ steps: fc.array(fc.double({ min: 0, max: 14, noNaN: true }), { minLength: 1, maxLength: 4 }), total, charge: fc.integer({ min: -4, max: 1 }), bound: fc.double({ min: -0.5, max: 1.5, noNaN: true }) })
  .map(({ steps, ...rest }) => ({ ...rest, steps: [...steps].sort((a, b) => b - a) }));

/** One to six acids side by side, each with all its states. */
export const anyAcidMixture = fc.array(anyAcid, { minLength: 1, maxLength: 6 }).map((acids) => {
  const formations = acids.flatMap(({ steps, charge }, component) => {
    let log10Beta = 0;
    return steps.map((pKa, index): Formation => {
      log10Beta += pKa;
      return { components: { [component]: 1 }, protons: index + 1, log10Beta, charge: charge + index + 1 };
    });
  });
  const protonTotal = acids.reduce((sum, acid) => sum + acid.total * acid.bound * acid.steps.length, 0);
  return systemOf(acids.map((acid) => acid.total), acids.map(({ charge }) => charge), formations, protonTotal);
});

/** Components with random mononuclear, polynuclear and mixed species. */
export const anySystem = fc
  .array(fc.record({ total, charge: fc.integer({ min: -3, max: 4 }) }), { minLength: 1, maxLength: 6 })
  .chain((components) => {
    const formation = fc.record({
      first: fc.integer({ min: 0, max: components.length - 1 }),
      firstNumber: fc.integer({ min: 1, max: 4 }),
      second: fc.integer({ min: 0, max: components.length - 1 }),
      secondNumber: fc.integer({ min: 0, max: 2 }),
      protons: fc.integer({ min: -5, max: 4 }),
      strength: fc.double({ min: -3, max: 6, noNaN: true }),
    });
    return fc.record({ formations: fc.array(formation, { minLength: 0, maxLength: 10 }), excess: fc.double({ min: -1, max: 1, noNaN: true }) }).map(({ formations, excess }) => {
      const species = formations.map(({ first, firstNumber, second, secondNumber, protons, strength }): Formation => {
        const numbers: Record<number, number> = { [first]: firstNumber };
        if (second !== first && secondNumber > 0) numbers[second] = secondNumber;
        const charge = Object.entries(numbers).reduce((sum, [component, number]) => sum + components[Number(component)]!.charge * number, protons);
        // Binding of 7 per proton centres the species around neutral.
        return { components: numbers, protons, log10Beta: 7 * protons + strength, charge: Math.max(-6, Math.min(6, charge)) };
      });
      const consistent = species.filter(({ components: numbers, protons, charge }) => charge === Object.entries(numbers).reduce((sum, [component, number]) => sum + components[Number(component)]!.charge * number, protons));
      const protonTotal = excess * components.reduce((sum, component) => sum + component.total, 0);
      return systemOf(components.map((component) => component.total), components.map(({ charge }) => charge), consistent, protonTotal);
    });
  });
