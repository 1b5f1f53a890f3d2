import type { Water } from '../equilibrium/water.js';
import { exp } from '../quantities/reproducible-math.js';
import { cautionsFor } from './cautions.js';
import { classify } from './classification.js';
import { constantsUsed } from './constants-used.js';
import type { Dissolved } from './dissolve.js';
import { dissolutionEquations, hydrolysisEquations } from './equations.js';
import type { Conditions, Prediction } from './prediction.js';
import { protonAccounts } from './proton-accounts.js';
import { reasonFor } from './reason.js';
import { solidStatuses } from './solids.js';
import type { SolvedSolution } from './solved-solution.js';
import { dominantChemicals, spectatorsOf, speciesTable } from './species-table.js';
import { uncertaintyOf, type SolveAgain } from './uncertainty.js';

/** What a prediction is read from. */
export interface PredictionBasis {
  readonly conditions: Conditions;
  readonly water: Water;
  readonly dissolved: Dissolved;
  readonly solved: SolvedSolution;
  /** Solves the same solution under the other condition of air. */
  readonly other: () => SolvedSolution;
  /** Solves it with other amounts, under the same conditions. */
  readonly again: SolveAgain;
}

/**
 * A prediction whose parts are worked out when they are first read: a sweep that wants pH alone does not pay for
 * equations. They are own, enumerable members, so that JSON, structured clones and spreading see them all.
 */
export function solvedPrediction({ conditions, water, dissolved, solved, other, again }: PredictionBasis): Prediction {
  const { pH, ionicStrength, lnWaterActivity, residual } = solved.state;
  const neutralPH = water.pKw / 2;
  const { classification } = classify(pH, neutralPH, 0);
  const accounts = once(() => protonAccounts(dissolved.particles, solved));
  const uncertainty = once(() => uncertaintyOf(solved, dissolved, accounts(), again));
  const otherPH = once(() => other().state.pH);
  const constants = once(() => constantsUsed(solved, water));
  const reason = once(() => reasonFor(classification, accounts(), solved, dissolved));
  const dissociation = once(() => dissolutionEquations(dissolved));
  const hydrolysis = once(() => hydrolysisEquations(dissolved, solved, water, constants(), reason()));
  const dominant = once(() => dominantChemicals(solved));
  const spectators = once(() => spectatorsOf(dissolved));
  const species = once(() => speciesTable(solved));
  const solids = once(() => solidStatuses(solved));
  const cautions = once(() => {
    const { standard, bufferCapacity, weakSpots } = uncertainty();
    return cautionsFor({ solved, dissolved, conditions, uncertainty: standard, bufferCapacity, weakSpots });
  });
  return {
    pH,
    get uncertainty() { return uncertainty().standard; },
    get uncertaintyBudget() { return uncertainty().budget; },
    neutralPH,
    classification,
    get decided() { return classify(pH, neutralPH, uncertainty().standard).decided; },
    ionicStrength,
    waterActivity: exp(lnWaterActivity),
    get bufferCapacity() { return uncertainty().bufferCapacity; },
    get inAir() { return conditions.air === 'equilibrated' ? pH : otherPH(); },
    get withoutAir() { return conditions.air === 'excluded' ? pH : otherPH(); },
    conditions,
    understood: dissolved.understood,
    get dissociation() { return dissociation(); },
    get hydrolysis() { return hydrolysis(); },
    get dominant() { return dominant(); },
    get spectators() { return spectators(); },
    get species() { return species(); },
    get solids() { return solids(); },
    get reason() { return reason(); },
    get cautions() { return cautions(); },
    get constants() { return constants(); },
    residual,
  };
}

/** A value that is computed at the first call and kept. */
function once<Value>(compute: () => Value): () => Value {
  let known: { readonly value: Value } | undefined;
  return () => (known ??= { value: compute() }).value;
}
