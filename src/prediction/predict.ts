import { ROOM_AIR_CARBON_DIOXIDE } from '../equilibrium/air.js';
import { solveEquilibrium } from '../equilibrium/solver.js';
import { waterAt, type Water } from '../equilibrium/water.js';
import { readTemperature } from '../quantities/read-temperature.js';
import { problem, quote, SoluteError, textOf } from '../quantities/solute-error.js';
import { readSolutes, type SoluteInput } from '../substances/solutes-text.js';
import { dissolve, type Dissolved } from './dissolve.js';
import type { Conditions, Prediction } from './prediction.js';
import { formingSolids } from './solids.js';
import { solutionModel } from './solution-model.js';
import { solvedPrediction } from './solved-prediction.js';
import type { SolvedSolution } from './solved-solution.js';

export type { SoluteInput } from '../substances/solutes-text.js';

/** Conditions as a page states them; all may be left out. */
export interface PredictionInput extends Partial<Omit<Conditions, 'temperature'>> {
  /** Celsius, or a text such as "37 °C". Default 25. */
  readonly temperature?: number | string;
}

const DEFAULT_TEMPERATURE = 25;

/**
 * The pH to expect of an aqueous solution, with what it rests on.
 * @param solutes what is dissolved, as text ("0.10 mol/L NH4Cl; 2.5 g/L Na2HPO4·12H2O"), JSON or an array.
 * @throws SoluteError when anything of it can't be understood or computed; nothing else is thrown for any input.
 */
export function predict(solutes: string | readonly SoluteInput[], input: PredictionInput = {}): Prediction {
  const conditions = readConditions(input);
  const water = waterAt(conditions.temperature);
  const dissolved = dissolve(readSolutes(solutes), water, conditions.volume);
  const open = conditions.air === 'equilibrated';
  const solved = solve(dissolved, water, conditions, open);
  return solvedPrediction({
    conditions,
    water,
    dissolved,
    solved,
    other: () => solve(dissolved, water, conditions, !open),
    again: (changed) => solve(changed, water, conditions, open).state.pH,
  });
}

/** Solves what was dissolved. @throws SoluteError when it does not converge. */
export function solve(dissolved: Pick<Dissolved, 'solutes' | 'particles'>, water: Water, { solids, carbonDioxide }: Conditions, inAir: boolean, start?: SolvedSolution): SolvedSolution {
  const open = solutionModel(dissolved.particles, water, inAir ? carbonDioxide : undefined);
  const model = solids === 'equilibrated' ? { ...open, system: { ...open.system, solids: formingSolids(open.solids, dissolved).map(({ definition }) => definition) } } : open;
  const neighbour = start?.model.system.structure === model.system.structure ? start?.state : undefined;
  const state = solveEquilibrium(model.system, model.table, neighbour);
  if (!state.converged || !Number.isFinite(state.pH)) {
    throw new SoluteError([
      problem('not-converged', `The equilibrium of this mixture did not settle to the required accuracy (residual ${state.residual.toExponential(1)}). Check the amounts for a slip of a power of ten.`, ''),
    ]);
  }
  return { model, table: model.table, state };
}

const AIR: readonly Conditions['air'][] = ['excluded', 'equilibrated'];
const SOLIDS: readonly Conditions['solids'][] = ['watched', 'equilibrated'];

function oneOf<Value extends string>(given: unknown, values: readonly Value[], subject: string): Value {
  const value = values.find((known) => known === given);
  if (value !== undefined) return value;
  throw new SoluteError([
    problem('condition-unknown', `${subject} can be ${values.join(' or ')}; ${quote(textOf(given))} is neither.`, textOf(given), {
      suggestions: values.map((known) => ({ value: known, reason: 'known value' })),
    }),
  ]);
}

/** Reads the conditions from anything a page may have passed. */
export function readConditions(input: PredictionInput | null | undefined): Conditions {
  const given = typeof input === 'object' && input !== null ? input : {};
  const temperature = readTemperature(given.temperature ?? DEFAULT_TEMPERATURE);
  const air = oneOf(given.air ?? 'excluded', AIR, 'Air');
  const solids = oneOf(given.solids ?? 'watched', SOLIDS, 'Solids');
  const carbonDioxide = given.carbonDioxide ?? ROOM_AIR_CARBON_DIOXIDE;
  if (typeof carbonDioxide !== 'number' || !(carbonDioxide > 0 && carbonDioxide <= 1)) {
    throw new SoluteError([
      problem('condition-unknown', `The CO2 content of the air is a mole fraction above 0 and up to 1, such as ${ROOM_AIR_CARBON_DIOXIDE}; ${quote(textOf(carbonDioxide))} is not.`, textOf(carbonDioxide)),
    ]);
  }
  const volume = given.volume ?? undefined;
  return { temperature, air, carbonDioxide, solids, ...(volume === undefined || volume === '' ? {} : { volume: textOf(volume) }) };
}
