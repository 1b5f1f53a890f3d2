import type { ComponentMeaning, DissolvedParticle, SpeciesMeaning } from './solution-model.js';
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
  /** Mean protonation as put in, protons per unit. */
  readonly initialProtonation: number;
}

export interface ProtonAccounts {
  readonly components: readonly ProtonAccount[];
  /** Protons minus hydroxide from particles that belong to no family or metal (strong acids and bases), mol/kg. */
  readonly strong: number;
  readonly strongParticles: readonly DissolvedParticle[];
}

/** Compares the solved solution with what was put in, family by family. */
export function protonAccounts(particles: readonly DissolvedParticle[], { model, state }: SolvedSolution): ProtonAccounts {
  const components = model.components.map((meaning, component) => {
    const brought = particles.filter(({ particle }) => countOf(particle.gives, meaning) > 0);
    const total = brought.reduce((sum, { particle, molality }) => sum + countOf(particle.gives, meaning) * molality, 0);
    const initial = brought.reduce((sum, { particle, molality }) => sum + (particle.gives!.protons ?? 0) * molality, 0);
    const initialProtonation = total > 0 ? initial / total : 0;
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
  const strongParticles = particles.filter(({ particle }) => particle.gives !== undefined && !particle.gives.families && !particle.gives.metals && (particle.gives.protons ?? 0) !== 0);
  const strong = strongParticles.reduce((sum, { particle, molality }) => sum + particle.gives!.protons! * molality, 0);
  return { components, strong, strongParticles };
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
