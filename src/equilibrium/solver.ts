import { exp, LN10, log } from '../quantities/reproducible-math.js';
import { AndersonAcceleration } from './anderson-acceleration.js';
import type { ChemicalSystem, InteractionTable } from './chemical-system.js';
import { MassBalances } from './mass-balances.js';
import { PresentSolids } from './present-solids.js';
import { activityCoefficients, lnWaterActivity } from './specific-interaction.js';

/** The solved composition. Arrays follow the order of the system's species. */
export interface EquilibriumState {
  /** False when a balance or an activity coefficient did not settle; the numbers are then not to be used. */
  readonly converged: boolean;
  /** −log10 a(H⁺). */
  readonly pH: number;
  /** mol/kg water. */
  readonly molality: Float64Array;
  readonly lnGamma: Float64Array;
  /** mol/kg water. */
  readonly ionicStrength: number;
  readonly lnWaterActivity: number;
  /** Natural logarithm of the activity of every component, in the order of the system. */
  readonly lnActivity: Float64Array;
  /** mol/kg water of every solid of the system, in its order; 0 for those not present. */
  readonly solidAmounts: Float64Array;
  /** Certificate: the largest residual of a mass balance or of the proton balance, relative to the sum of its terms. */
  readonly residual: number;
  readonly iterations: number;
}

/** Largest change of ln γ at which it counts as settled; pH is then known to about the same figure. */
const COEFFICIENT_TOLERANCE = 1e-10;
/** The balances are solved this much more closely than the coefficients are known. */
const BALANCE_TOLERANCE = 1e-7;
const MOST_ITERATIONS = 600;
/** Residual that rounding alone leaves in well-conditioned balances, with room. */
const REBASE_RESIDUAL = 1e-12;
/** Certificate demanded of a converged state. */
const RESIDUAL_TOLERANCE = 1e-10;

/**
 * Solves mass balances, proton balance (which is electroneutrality written without the spectators) and activity
 * coefficients together.
 *
 * At fixed activity coefficients all balances are the stationary point of one strictly convex function of the
 * logarithms of the component activities, pH included (see {@link MassBalances}), so the inner solution exists, is
 * unique and is always found. Coefficients are then brought to self-consistency by an accelerated fixed point.
 *
 * @param start a neighbouring solution of the same species list, to start from (sweeps).
 */
export function solveEquilibrium(system: ChemicalSystem, table: InteractionTable, start?: EquilibriumState): EquilibriumState {
  const count = system.species.length;
  const balances = new MassBalances(system);
  const coefficients = new Float64Array(count + 1);
  if (start) {
    coefficients.set(start.lnGamma);
    coefficients[count] = start.lnWaterActivity;
  }
  balances.estimate(coefficients);
  if (!start) activityCoefficients(table, balances.molality, coefficients);
  let round = settle(balances, table, coefficients);
  let iterations = round.iterations;
  if (balances.residual() > REBASE_RESIDUAL) {
    balances.rebase();
    round = settle(balances, table, coefficients);
    iterations += round.iterations;
  }
  const present = new PresentSolids(balances, system.solids ?? []);
  while (round.settled && present.exchange()) {
    round = settle(balances, table, coefficients);
    iterations += round.iterations;
  }
  balances.minimise(coefficients, 0);
  if (present.any && round.settled && balances.residual() > RESIDUAL_TOLERANCE) {
    balances.rebase();
    present.restate();
    round = settle(balances, table, coefficients);
    iterations += round.iterations;
    balances.minimise(coefficients, 0);
  }
  const residual = balances.residual();
  return {
    converged: round.settled && present.decided && residual <= RESIDUAL_TOLERANCE,
    pH: -balances.lnProtonActivity / LN10,
    molality: balances.molality,
    lnGamma: coefficients.slice(0, count),
    ionicStrength: round.ionicStrength,
    lnWaterActivity: coefficients[count]!,
    lnActivity: balances.componentActivities(),
    solidAmounts: present.amounts(),
    residual,
    iterations,
  };
}

/**
 * Composition at a pH that is held from outside, by whatever strong acid or base it takes; the ions of that acid or base
 * are not among the species. Solids are not formed.
 */
export function solveAtPH(system: ChemicalSystem, table: InteractionTable, pH: number, start?: EquilibriumState): EquilibriumState {
  const count = system.species.length;
  const balances = new MassBalances(system);
  const coefficients = new Float64Array(count + 1);
  if (start) coefficients.set(start.lnGamma);
  balances.estimate(coefficients);
  balances.saturate([{ id: 'held pH', lnK: -pH * LN10, protons: 1, water: 0, stoichiometry: [] }]);
  const round = settle(balances, table, coefficients);
  balances.minimise(coefficients, 0);
  return {
    converged: round.settled,
    pH,
    molality: balances.molality,
    lnGamma: coefficients.slice(0, count),
    ionicStrength: round.ionicStrength,
    lnWaterActivity: coefficients[count]!,
    lnActivity: balances.componentActivities(),
    solidAmounts: new Float64Array(system.solids?.length ?? 0),
    residual: balances.residual(),
    iterations: round.iterations,
  };
}

/** Brings activity coefficients and balances to agree, for the solids now present. */
function settle(balances: MassBalances, table: InteractionTable, coefficients: Float64Array): { settled: boolean; ionicStrength: number; iterations: number } {
  const last = coefficients.length - 1;
  const next = new Float64Array(last + 1);
  const acceleration = new AndersonAcceleration(last + 1);
  let change = 1;
  let ionicStrength = 0;
  for (let iterations = 1; iterations <= MOST_ITERATIONS; iterations++) {
    balances.minimise(coefficients, BALANCE_TOLERANCE * change);
    ionicStrength = activityCoefficients(table, balances.molality, next);
    next[last] = lnWaterActivity(table, balances.molality);
    change = 0;
    for (let j = 0; j <= last; j++) change = Math.max(change, Math.abs(next[j]! - coefficients[j]!));
    if (change < COEFFICIENT_TOLERANCE) return { settled: true, ionicStrength, iterations };
    acceleration.advance(coefficients, next);
  }
  return { settled: false, ionicStrength, iterations: MOST_ITERATIONS };
}

/** Activity of the solved water. */
export function waterActivityOf(state: EquilibriumState): number {
  return exp(state.lnWaterActivity);
}

/** log10 of a solved species' activity. */
export function log10Activity(state: EquilibriumState, species: number): number {
  return (log(state.molality[species]!) + state.lnGamma[species]!) / LN10;
}
