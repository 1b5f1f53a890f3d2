import type { Water } from '../equilibrium/water.js';
import { exp } from '../quantities/reproducible-math.js';
import { cautionsFor } from './cautions.js';
import { classify } from './classification.js';
import { constantsUsed } from './constants-used.js';
import type { Dissolved } from './dissolve.js';
import { dissolutionEquations, hydrolysisEquations } from './equations.js';
import type { Conditions, Prediction } from './prediction.js';
import { protonAccounts, type ProtonAccounts } from './proton-accounts.js';
import { reasonFor } from './reason.js';
import { solidStatuses } from './solids.js';
import type { SolvedSolution } from './solved-solution.js';
import { dominantChemicals, spectatorsOf, speciesTable } from './species-table.js';
import { uncertaintyOf, type SolveAgain, type UncertaintyResult } from './uncertainty.js';

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
export function solvedPrediction(basis: PredictionBasis): Prediction {
  const { conditions, water, dissolved, solved } = basis;
  const { pH, ionicStrength, lnWaterActivity, residual } = solved.state;
  const neutralPH = water.pKw / 2;
  const { classification } = classify(pH, neutralPH, 0);
  const accounts = once(() => protonAccounts(dissolved.particles, solved));
  const uncertainty = once(() => uncertaintyOf(solved, dissolved, accounts(), basis.again));
  const otherPH = once(() => basis.other().state.pH);
  const explained = once(() => explain(basis, classification, accounts(), uncertainty()));
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
    get dissociation() { return explained().dissociation; },
    get hydrolysis() { return explained().hydrolysis; },
    get dominant() { return explained().dominant; },
    get spectators() { return explained().spectators; },
    get species() { return explained().species; },
    get solids() { return explained().solids; },
    get reason() { return explained().reason; },
    get cautions() { return explained().cautions; },
    get constants() { return explained().constants; },
    residual,
  };
}

type Explanation = Pick<Prediction, 'dissociation' | 'hydrolysis' | 'dominant' | 'spectators' | 'species' | 'solids' | 'reason' | 'cautions' | 'constants'>;

/** Everything that is said about the number. */
function explain({ conditions, water, dissolved, solved }: PredictionBasis, classification: Prediction['classification'], accounts: ProtonAccounts, uncertainty: UncertaintyResult): Explanation {
  const { standard, bufferCapacity, weakSpots } = uncertainty;
  const constants = constantsUsed(solved, water);
  const reason = reasonFor(classification, accounts, solved, dissolved);
  return {
    dissociation: dissolutionEquations(dissolved),
    hydrolysis: hydrolysisEquations(dissolved, solved, water, constants, reason),
    dominant: dominantChemicals(solved),
    spectators: spectatorsOf(dissolved),
    species: speciesTable(solved),
    solids: solidStatuses(solved),
    reason,
    cautions: cautionsFor({ solved, dissolved, conditions, uncertainty: standard, bufferCapacity, weakSpots }),
    constants,
  };
}

/** A value that is computed at the first call and kept. */
function once<Value>(compute: () => Value): () => Value {
  let known: { readonly value: Value } | undefined;
  return () => (known ??= { value: compute() }).value;
}
