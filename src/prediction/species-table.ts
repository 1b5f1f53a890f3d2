import { exp } from '../quantities/reproducible-math.js';
import type { Dissolved } from './dissolve.js';
import type { Chemical, Species, Spectator } from './prediction.js';
import type { SolvedSolution } from './solved-solution.js';
import { chemicalOf } from './chemicals.js';
import { spectatorRemark } from './spectator-reasons.js';

/** Every species of the solution, in the order of the model. */
export function speciesTable({ model, state }: SolvedSolution): Species[] {
  const totals = componentTotals({ model, state });
  return model.species.map((species, j) => {
    const molality = state.molality[j]!;
    const base = { chemical: species.chemical, molality, activityCoefficient: species.chemical.charge === 0 ? 1 : exp(state.lnGamma[j]!) };
    const [part] = species.parts;
    if (!part) return base;
    return { ...base, share: (molality * part[1]) / totals[part[0]]!, component: model.system.components[part[0]]!.id };
  });
}

/** Units of every component over all its species, mol/kg. */
export function componentTotals({ model, state }: Pick<SolvedSolution, 'model' | 'state'>): Float64Array {
  const totals = new Float64Array(model.components.length);
  model.species.forEach((species, j) => {
    for (const [component, units] of species.parts) totals[component] = totals[component]! + units * state.molality[j]!;
  });
  return totals;
}

/** The most abundant species of every component, and the spectators, most first. */
export function dominantChemicals({ model, state }: SolvedSolution): Chemical[] {
  const best = new Map<number | string, { chemical: Chemical; molality: number }>();
  model.species.forEach((species, j) => {
    if (species.chemical.id === 'H3O+' || species.chemical.id === 'OH-') return;
    const key = species.parts[0]?.[0] ?? species.chemical.id;
    const molality = state.molality[j]!;
    if (molality > (best.get(key)?.molality ?? 0)) best.set(key, { chemical: species.chemical, molality });
  });
  return [...best.values()].sort((a, b) => b.molality - a.molality).map(({ chemical }) => chemical);
}

/** The ions put in that take part in no proton transfer, with the reason. */
export function spectatorsOf({ particles }: Dissolved): Spectator[] {
  return particles
    .filter(({ particle }) => particle.spectator !== undefined)
    .map(({ particle }) => ({ chemical: chemicalOf(particle), reason: spectatorRemark(particle) }));
}
