import data from '../../data/weak-spots.json';
import { LN10 } from '../quantities/reproducible-math.js';
import type { ProtonAccounts } from './proton-accounts.js';
import type { SolvedSolution } from './solved-solution.js';
import type { ComponentMeaning } from './meanings.js';

/** A composition for which the published constants are known to be incomplete. */
export interface WeakSpot {
  readonly code: string;
  /** Completes the sentence "The data are incomplete: …". */
  readonly reason: string;
  /** Standard uncertainty of pH that the gap brings where the incomplete part decides the pH. */
  readonly uncertainty: number;
  /** Contribution here: less where something else holds the pH. */
  readonly contribution: number;
}

interface Row {
  readonly code: string;
  readonly metal?: string;
  readonly families?: readonly string[];
  readonly ions?: readonly string[];
  readonly uncertainty: number;
  readonly leastMolality: number;
  readonly leastPH?: number;
  readonly mostPH?: number;
  readonly reason: string;
}

/** A gap that contributes less than this is not worth a sentence. */
const SMALLEST_CONTRIBUTION = 0.02;

/** The gaps that matter for a solution, with their weight: twice the part of the buffering that hangs on them, at most one. */
export function weakSpotsOf(solved: SolvedSolution, accounts: ProtonAccounts, bufferCapacity: number): WeakSpot[] {
  const { model, state } = solved;
  const present = new Map<string, number>();
  model.components.forEach((meaning, index) => present.set(keyOf(meaning), model.system.components[index]!.total));
  for (const index of model.spectators) present.set(`ion ${model.species[index]!.chemical.id}`, state.molality[index]!);
  const buffering = bufferCapacity / LN10;
  return (data.weakSpots as readonly Row[]).flatMap((row) => {
    const keys = [...(row.metal === undefined ? [] : [`metal ${row.metal}`]), ...(row.families ?? []).map((key) => `family ${key}`), ...(row.ions ?? []).map((id) => `ion ${id}`)];
    if (keys.some((key) => !((present.get(key) ?? 0) > row.leastMolality))) return [];
    if (state.pH < (row.leastPH ?? -Infinity) || state.pH > (row.mostPH ?? Infinity)) return [];
    const account = accounts.components.find(({ meaning }) => keyOf(meaning) === keys[0]);
    const contribution = row.uncertainty * Math.min(1, (2 * (account?.buffering ?? 0)) / buffering);
    return contribution < SMALLEST_CONTRIBUTION ? [] : [{ code: row.code, reason: row.reason, uncertainty: row.uncertainty, contribution }];
  });
}

function keyOf(meaning: ComponentMeaning): string {
  if (meaning.kind === 'family') return `family ${meaning.family.key}`;
  return meaning.kind === 'metal' ? `metal ${meaning.metal.key}` : `ion ${meaning.particle.id}`;
}
