import type { ComponentMeaning, SpeciesMeaning } from './meanings.js';
import type { DissolvedParticle, SolutionModel } from './solution-model.js';
import type { SolvedSolution } from './solved-solution.js';

/** What one acid–base family or metal did with protons in the solution, compared with how it was put in. */
export interface ProtonAccount {
  readonly component: number;
  readonly meaning: ComponentMeaning;
  /** The particles that brought it. */
  readonly particles: readonly DissolvedParticle[];
  /** mol/kg water. */
  readonly total: number;
  /** Protons given away and taken up, mol/kg water. For a family put in as several states only the net is known. */
  readonly donated: number;
  readonly accepted: number;
  /** Its part of the buffer capacity, divided by ln 10: variance of its protonation, mol/kg. */
  readonly buffering: number;
  /** Mean protonation as put in, after strong acid and base have neutralised what they can; protons per unit. */
  readonly initialProtonation: number;
}

export interface ProtonAccounts {
  readonly components: readonly ProtonAccount[];
  /** Protons minus hydroxide from particles that belong to no family or metal (strong acids and bases), mol/kg. */
  readonly strong: number;
  /** What of it no family can take. */
  readonly unspent: number;
  readonly strongParticles: readonly DissolvedParticle[];
}

/** Compares the solved solution with what was put in, family by family. */
export function protonAccounts(particles: readonly DissolvedParticle[], { model, state }: SolvedSolution): ProtonAccounts {
  const strongParticles = particles.filter(({ particle }) => particle.gives !== undefined && !particle.gives.families && !particle.gives.metals && (particle.gives.protons ?? 0) !== 0);
  const strong = strongParticles.reduce((sum, { particle, molality }) => sum + particle.gives!.protons! * molality, 0);
  const { bound: neutralised, unspent } = neutralise(model, particles, strong);
  const components = model.components.map((meaning, component) => {
    const brought = particles.filter(({ particle }) => countOf(particle.gives, meaning) > 0);
    const total = brought.reduce((sum, { particle, molality }) => sum + countOf(particle.gives, meaning) * molality, 0);
    const initialProtonation = total > 0 ? nearlyWhole(neutralised[component]! / total) : 0;
    let donated = 0;
    let accepted = 0;
    let bound = 0;
    let square = 0;
    let units = 0;
    model.species.forEach((species, j) => {
      const part = species.parts.find(([index]) => index === component);
      if (!part) return;
      const molality = state.molality[j]!;
      const protons = protonsOf(species, meaning.kind);
      const change = protons - initialProtonation * part[1];
      if (change < 0) donated -= change * molality;
      else accepted += change * molality;
      bound += protons * molality;
      square += protons * protons * molality;
      units += molality;
    });
    if (!Number.isInteger(initialProtonation)) {
      const net = donated - accepted;
      donated = Math.max(0, net);
      accepted = Math.max(0, -net);
    }
    return { component, meaning, particles: brought, total, donated, accepted, buffering: units > 0 ? square - (bound * bound) / units : 0, initialProtonation };
  });
  return { components, strong, unspent, strongParticles };
}

/**
 * Lets strong base take protons from the most acid sites, or strong acid give them to the most basic ones, each to the
 * full: the stoichiometry of neutralisation, before any equilibrium.
 */
function neutralise(model: SolutionModel, particles: readonly DissolvedParticle[], strong: number): { bound: number[]; unspent: number } {
  const bound = model.components.map((meaning) =>
    particles.reduce((sum, { particle, molality }) => (countOf(particle.gives, meaning) > 0 ? sum + (particle.gives!.protons ?? 0) * molality : sum), 0),
  );
  let left = strong;
  for (let round = 0; round < MOST_SITES && left !== 0; round++) {
    const site = nextSite(model, bound, left > 0);
    if (!site) break;
    const moved = Math.min(Math.abs(left), site.room);
    bound[site.component] = bound[site.component]! + Math.sign(left) * moved;
    left -= Math.sign(left) * moved;
    if (Math.abs(left) < ROUNDING * Math.abs(strong)) left = 0;
  }
  return { bound, unspent: left };
}

const MOST_SITES = 200;
const ROUNDING = 1e-9;

/** The site that reacts next: its component and the protons, mol/kg, that it can take or give. */
function nextSite(model: SolutionModel, bound: readonly number[], protonate: boolean): { component: number; room: number } | undefined {
  let best: { component: number; room: number; pKa: number } | undefined;
  model.components.forEach((meaning, component) => {
    const { total } = model.system.components[component]!;
    if (meaning.kind !== 'family' || !(total > 0)) return;
    const last = meaning.family.states.length - 1;
    const mean = nearlyWhole(bound[component]! / total);
    // With `mean` protons on average, the next proton goes to or comes from this step.
    const whole = protonate ? Math.floor(mean) : Math.ceil(mean) - 1;
    if (whole < 0 || whole >= last) return;
    const pKa = -meaning.constants[last - 1 - whole]!.log10K;
    const room = total * (protonate ? whole + 1 - mean : mean - whole);
    if (best === undefined || (protonate ? pKa > best.pKa : pKa < best.pKa)) best = { component, room, pKa };
  });
  return best;
}

/** A mean protonation without the rounding noise of the amounts. */
function nearlyWhole(mean: number): number {
  return Math.abs(mean - Math.round(mean)) < ROUNDING ? Math.round(mean) : mean;
}

/** Protons of a species that belong to the component: in a complex the bound ones to the ligand, the hydroxide to the metal. */
function protonsOf(species: SpeciesMeaning, kind: ComponentMeaning['kind']): number {
  if (species.parts.length === 1) return species.protons;
  return kind === 'metal' ? Math.min(0, species.protons) : Math.max(0, species.protons);
}

function countOf(gives: DissolvedParticle['particle']['gives'], meaning: ComponentMeaning): number {
  if (meaning.kind === 'family') return gives?.families?.[meaning.family.key] ?? 0;
  return meaning.kind === 'metal' ? (gives?.metals?.[meaning.metal.key] ?? 0) : 0;
}
