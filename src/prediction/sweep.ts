import { solveAtPH } from '../equilibrium/solver.js';
import { waterAt } from '../equilibrium/water.js';
import { particleOf } from '../substances/ion-library.js';
import { readSolutes, type SoluteInput } from '../substances/solutes-text.js';
import { dissolve, type Dissolved } from './dissolve.js';
import type { Chemical } from './prediction.js';
import { readConditions, solve, type PredictionInput } from './predict.js';
import type { DissolvedParticle } from './solution-model.js';
import type { SolvedSolution } from './solved-solution.js';
import { componentTotals } from './species-table.js';

/** What is varied, and its values. */
export type SweepAlong =
  /** Factors by which the solution is diluted with water, on the molality scale; 1 is the solution as it is. */
  | { readonly quantity: 'dilution'; readonly values: readonly number[] }
  /** Celsius. Molalities stay, as they do in a closed bottle. */
  | { readonly quantity: 'temperature'; readonly values: readonly number[] }
  /** mol/kg of strong base added; negative values are strong acid. */
  | { readonly quantity: 'strong-base'; readonly values: readonly number[] }
  /** pH held by strong acid or base, for the shares of species along it. */
  | { readonly quantity: 'pH'; readonly values: readonly number[] };

export interface SweepPoint {
  readonly at: number;
  readonly pH: number;
  /** Share of its acid–base family or metal of every species of `Sweep.species`, 0 to 1. */
  readonly shares: readonly number[];
}

export interface Sweep {
  readonly quantity: SweepAlong['quantity'];
  /** The species that belong to an acid–base family or a metal, the same at every point. */
  readonly species: readonly Chemical[];
  readonly points: readonly SweepPoint[];
}

const BASE = ['Na+', 'OH-'] as const;
const ACID = ['H+', 'ClO4-'] as const;

/**
 * Solves one solution at many values of one quantity, each point starting from the one before.
 * @throws SoluteError as {@link predict} does.
 */
export function sweep(solutes: string | readonly SoluteInput[], along: SweepAlong, input: PredictionInput = {}): Sweep {
  const conditions = readConditions(input);
  const water = waterAt(conditions.temperature);
  const dissolved = dissolve(readSolutes(solutes), water, conditions.volume);
  const open = conditions.air === 'equilibrated';
  let before: SolvedSolution | undefined;
  const solved = along.values.map((value): SolvedSolution => {
    if (along.quantity === 'temperature') before = solve(dissolved, waterAt(readConditions({ ...conditions, temperature: value }).temperature), conditions, open, before);
    else if (along.quantity === 'pH') before = atPH((before ??= solve(dissolved, water, conditions, open)), value);
    else before = solve(changed(dissolved, along.quantity, value), water, conditions, open, before);
    return before;
  });
  const reacting = solved[0]?.model.species.flatMap(({ parts }, index) => (parts.length > 0 ? [index] : [])) ?? [];
  return {
    quantity: along.quantity,
    species: reacting.map((index) => solved[0]!.model.species[index]!.chemical),
    points: solved.map((solution, place) => ({ at: along.values[place]!, pH: solution.state.pH, shares: sharesOf(solution, reacting) })),
  };
}

function atPH(solution: SolvedSolution, pH: number): SolvedSolution {
  return { ...solution, state: solveAtPH(solution.model.system, solution.table, pH, solution.state) };
}

function changed({ solutes, particles }: Dissolved, quantity: 'dilution' | 'strong-base', value: number): Pick<Dissolved, 'solutes' | 'particles'> {
  if (quantity === 'dilution') return { solutes, particles: particles.map(({ particle, molality }) => ({ particle, molality: molality / value })) };
  if (value === 0) return { solutes, particles };
  const added = (value > 0 ? BASE : ACID).map((id): DissolvedParticle => ({ particle: particleOf(id)!, molality: Math.abs(value) }));
  return { solutes, particles: [...particles, ...added] };
}

function sharesOf(solution: SolvedSolution, reacting: readonly number[]): number[] {
  const totals = componentTotals(solution);
  return reacting.map((index) => {
    const [component, units] = solution.model.species[index]!.parts[0]!;
    return (units * solution.state.molality[index]!) / totals[component]!;
  });
}
