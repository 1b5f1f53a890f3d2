import type { InteractionTable } from '../equilibrium/chemical-system.js';
import type { EquilibriumState } from '../equilibrium/solver.js';
import type { SolutionModel } from './solution-model.js';

/** A solved solution with all that was needed to solve it. */
export interface SolvedSolution {
  readonly model: SolutionModel;
  readonly table: InteractionTable;
  readonly state: EquilibriumState;
}
