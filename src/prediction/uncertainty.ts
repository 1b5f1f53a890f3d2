import conventions from '../../data/conventions.json';
import { coefficientUncertainty } from '../equilibrium/interaction-coefficients.js';
import { sensitivities, type Sensitivities } from '../equilibrium/sensitivity.js';
import { LN10 } from '../quantities/reproducible-math.js';
import { withMolalities, type Dissolved, type DissolvedSolute } from './dissolve.js';
import { formatChemical } from './plain-text.js';
import type { UncertaintyContribution } from './prediction.js';
import type { ProtonAccounts } from './proton-accounts.js';
import { weakSpotsOf, type WeakSpot } from './weak-spots.js';
import type { SolvedSolution } from './solved-solution.js';
import type { Contribution } from '../substances/ion-library.js';
import type { ComponentMeaning } from './meanings.js';

export interface UncertaintyResult {
  /** Standard uncertainty of pH. */
  readonly standard: number;
  readonly budget: UncertaintyContribution[];
  /** mol/kg per pH unit. */
  readonly bufferCapacity: number;
  /** Gaps in the data that matter here. */
  readonly weakSpots: readonly WeakSpot[];
}

/** pH of the same solution with other amounts. */
export type SolveAgain = (changed: Pick<Dissolved, 'solutes' | 'particles'>) => number;

type Line = Omit<UncertaintyContribution, 'share'>;

/** Lines below this share of the variance are left out of the budget. */
const SMALLEST_SHARE = 1e-4;
const SCALE = conventions.scaleConvention;
const DENSITY = { none: 0, ...conventions.densityUncertainty.relativePerMolality };

/**
 * Combined standard uncertainty of pH after the Guide to the Expression of Uncertainty in Measurement (JCGM 100:2008,
 * eq. 10), with the exact sensitivities of the solved balances: constants, amounts as typed, interaction coefficients,
 * the convention of the pH scale, and the density taken for the solution.
 */
export function uncertaintyOf(solved: SolvedSolution, dissolved: Dissolved, accounts: ProtonAccounts, again: SolveAgain): UncertaintyResult {
  const slopes = sensitivities(solved.model.system, solved.table, solved.state);
  if (!slopes) return { standard: Infinity, budget: [], bufferCapacity: 0, weakSpots: [] };
  const bufferCapacity = -1 / slopes.toProtonTotal;
  const weakSpots = weakSpotsOf(solved, accounts, bufferCapacity);
  const lines: Line[] = [
    ...solved.model.components.flatMap((meaning) => constantLines(meaning, slopes)),
    ...complexLines(solved, slopes),
    ...solidLines(solved, slopes),
    ...dissolved.solutes.map((solute, index) => amountLine(dissolved, index, solved, slopes, again)),
    ...modelLines(solved, dissolved, slopes, again),
    ...weakSpots.map(({ reason, contribution }): Line => ({ of: `incomplete data: ${reason}`, kind: 'model', contribution, basis: 'model' })),
  ];
  const variance = lines.reduce((sum, line) => sum + line.contribution * line.contribution, 0);
  const budget = lines
    .map((line) => ({ ...line, share: variance > 0 ? (line.contribution * line.contribution) / variance : 0 }))
    .filter((line) => line.share >= SMALLEST_SHARE)
    .sort((a, b) => b.share - a.share);
  return { standard: Math.sqrt(variance), budget, bufferCapacity, weakSpots };
}

function constantLines(meaning: ComponentMeaning, slopes: Sensitivities): Line[] {
  if (meaning.kind === 'metal') {
    return meaning.constants.map((constant, index) => ({
      of: `log10 *β of ${formatChemical(meaning.metal.hydrolysis[index]!)}`,
      kind: 'constant',
      contribution: Math.abs(slopes.toLnBeta[meaning.firstSpecies + 1 + index]!) * LN10 * constant.uncertainty,
      basis: constant.stated ? 'stated' : 'graded',
    }));
  }
  if (meaning.kind === 'ligand') return [];
  // A change of one step shifts all states on its deprotonated side against the others.
  let deprotonated = 0;
  const lines: Line[] = [];
  for (let step = meaning.constants.length - 1; step >= 0; step--) {
    deprotonated += slopes.toLnBeta[meaning.firstSpecies + step + 1]!;
    const constant = meaning.constants[step]!;
    lines.push({
      of: `pKa of ${formatChemical(meaning.family.states[step]!)}`,
      kind: 'constant',
      contribution: Math.abs(deprotonated) * LN10 * constant.uncertainty,
      basis: constant.stated ? 'stated' : 'graded',
    });
  }
  return lines;
}

function complexLines({ model }: SolvedSolution, slopes: Sensitivities): Line[] {
  return model.complexes.map(({ complex, constant, species }) => ({
    of: `log10 β of ${formatChemical(complex)}`,
    kind: 'constant',
    contribution: Math.abs(slopes.toLnBeta[species]!) * LN10 * constant.uncertainty,
    basis: constant.stated ? 'stated' : 'graded',
  }));
}

function solidLines({ model }: SolvedSolution, slopes: Sensitivities): Line[] {
  const constants = new Map(model.solids.map((meaning) => [meaning.solid.id, meaning]));
  return (model.system.solids ?? []).flatMap((definition, index): Line[] => {
    const { solid, constant } = constants.get(definition.id)!;
    const contribution = Math.abs(slopes.toLnSolubility[index]!) * LN10 * constant.uncertainty;
    return contribution === 0 ? [] : [{ of: `solubility constant of ${solid.name}`, kind: 'constant', contribution, basis: constant.stated ? 'stated' : 'graded' }];
  });
}

function amountLine(dissolved: Dissolved, index: number, solved: SolvedSolution, slopes: Sensitivities, again: SolveAgain): Line {
  const solute = dissolved.solutes[index]!;
  const changes = dissolved.solutes.map((_, place) => (place === index ? solute.uncertainty : 0));
  return { of: `amount of ${solute.read.substance.formula}`, kind: 'amount', contribution: ofAmounts(changes, dissolved, solved, slopes, again), basis: 'digits' };
}

/** Above this, in pH, the slope at the point no longer tells what the uncertainty of an amount does. */
const LINEAR_LIMIT = 0.1;

/**
 * What a change of the molalities together does to pH. Near an end point a slope means nothing over the width of the
 * uncertainty: there half of the difference between the solutions at both of its ends is taken (as the Guide's
 * Supplement 1, JCGM 101:2008, would find it).
 */
function ofAmounts(changes: readonly number[], dissolved: Dissolved, solved: SolvedSolution, slopes: Sensitivities, again: SolveAgain): number {
  const linear = Math.abs(dissolved.solutes.reduce((sum, solute, index) => (changes[index] === 0 ? sum : sum + amountSlope(solute, solved, slopes) * changes[index]!), 0));
  if (linear <= LINEAR_LIMIT) return linear;
  const [less, more] = [-1, 1].map((sign) => again(withMolalities(dissolved, dissolved.solutes.map(({ molality }, index) => molality + sign * changes[index]!))));
  return Math.abs(more! - less!) / 2;
}

/** ∂pH/∂(molality of one solute), kg/mol. */
function amountSlope(solute: DissolvedSolute, { model }: SolvedSolution, slopes: Sensitivities): number {
  let slope = 0;
  for (const { particle, count } of solute.read.substance.parts) {
    const gives = particle.gives ?? { ions: { [particle.id]: 1 } };
    slope += count * (gives.protons ?? 0) * slopes.toProtonTotal;
    model.components.forEach((meaning, component) => {
      const units = unitsIn(gives, meaning);
      if (units === 0) return;
      const held = model.system.components[component]!.lnActivity !== undefined;
      // A family held by the air is counted from its most protonated state.
      const reference = held && meaning.kind === 'family' ? -(meaning.family.states.length - 1) * slopes.toProtonTotal : slopes.toTotal[component]!;
      slope += count * units * reference;
    });
  }
  return slope;
}

function unitsIn(gives: Contribution, meaning: ComponentMeaning): number {
  if (meaning.kind === 'family') return gives.families?.[meaning.family.key] ?? 0;
  return (meaning.kind === 'metal' ? gives.metals?.[meaning.metal.key] : gives.ions?.[meaning.particle.id]) ?? 0;
}

function modelLines({ model, table, state }: SolvedSolution, dissolved: Dissolved, slopes: Sensitivities, again: SolveAgain): Line[] {
  const species = model.species.map(({ chemical }, index) => ({ id: model.system.species[index]!.id, charge: chemical.charge }));
  let pairs = 0;
  const inside = Math.min(1, table.ceiling / Math.max(state.ionicStrength, 1e-300));
  for (let a = 0; a < species.length; a++) {
    if (species[a]!.charge <= 0) continue;
    for (let b = 0; b < species.length; b++) {
      if (species[b]!.charge >= 0) continue;
      const slope = LN10 * inside * (slopes.toLnGamma[a]! * state.molality[b]! + slopes.toLnGamma[b]! * state.molality[a]!);
      if (Math.abs(slope) < 1e-7) continue;
      const line = slope * coefficientUncertainty(species[a]!, species[b]!);
      pairs += line * line;
    }
  }
  const total = dissolved.solutes.reduce((sum, { molality }) => sum + molality, 0);
  const scale = SCALE.uncertainty * Math.sqrt(state.ionicStrength / SCALE.ionicStrength);
  const density = ofAmounts(
    dissolved.solutes.map(({ molality, volumeBasis }) => (molality * DENSITY[volumeBasis ?? 'none'] * total) / Math.sqrt(3)),
    dissolved,
    { model, table, state },
    slopes,
    again,
  );
  return [
    { of: 'interaction coefficients', kind: 'model', contribution: Math.sqrt(pairs), basis: 'model' },
    { of: 'convention of the pH scale', kind: 'model', contribution: scale, basis: 'model' },
    { of: 'density of the solution', kind: 'model', contribution: density, basis: 'model' },
  ];
}
