import { CARBON_DIOXIDE_FAMILY, lnCarbonDioxideActivity } from '../equilibrium/air.js';
import type { ChemicalSystem, InteractionTable } from '../equilibrium/chemical-system.js';
import { interactionTable } from '../equilibrium/interaction-coefficients.js';
import type { Water } from '../equilibrium/water.js';
import { complexesOf } from '../substances/complex-library.js';
import { familyOf, metalOf, particleOf, type Particle } from '../substances/ion-library.js';
import { solidsOf } from '../substances/solid-library.js';
import type { ComplexMeaning, ComponentMeaning, SolidMeaning, SpeciesMeaning } from './meanings.js';
import { ModelBuilder, type ModelTemplate } from './model-builder.js';

/** A particle put into the solution, from one or more solutes. */
export interface DissolvedParticle {
  readonly particle: Particle;
  /** mol/kg water. */
  readonly molality: number;
}

/** The solution as the solver sees it, with the way back to chemistry. */
export interface SolutionModel {
  readonly system: ChemicalSystem;
  readonly table: InteractionTable;
  readonly species: readonly SpeciesMeaning[];
  readonly components: readonly ComponentMeaning[];
  readonly complexes: readonly ComplexMeaning[];
  readonly solids: readonly SolidMeaning[];
  /** Species index of every ion that exchanges no proton. */
  readonly spectators: readonly number[];
}

/**
 * Adds up what all particles give and writes down every species that can form: the states of each acid–base family,
 * the hydrolysis species of each metal, complexes, the spectators, H⁺ and OH⁻. With the specific interaction model there are no
 * ion pairs of the alkali metals: their effect is in the coefficients.
 * @param carbonDioxide mol/mol in dry air, or undefined when air is kept away.
 */
export function solutionModel(particles: readonly DissolvedParticle[], water: Water, carbonDioxide: number | undefined): SolutionModel {
  const families = new Map<string, number>();
  const metals = new Map<string, number>();
  const spectators = new Map<string, number>();
  let protons = 0;
  for (const { particle, molality } of particles) {
    if (!particle.gives) {
      addTo(spectators, particle.id, molality);
      continue;
    }
    const gives = particle.gives;
    for (const key in gives.families) addTo(families, key, gives.families[key]! * molality);
    for (const key in gives.metals) addTo(metals, key, gives.metals[key]! * molality);
    for (const id in gives.ions) addTo(spectators, id, gives.ions[id]! * molality);
    protons += (gives.protons ?? 0) * molality;
  }
  if (carbonDioxide !== undefined && !families.has(CARBON_DIOXIDE_FAMILY)) families.set(CARBON_DIOXIDE_FAMILY, 0);
  const template = templateOf({ metals: [...metals.keys()].sort(), families: [...families.keys()].sort(), spectators: [...spectators.keys()].sort() }, water, carbonDioxide);
  const totals = template.components.map(({ id }) => metals.get(id) ?? families.get(id) ?? spectators.get(id)!);
  let protonTotal = protons;
  template.referenceProtons.forEach((reference, index) => (protonTotal -= reference * totals[index]!));
  const species = template.species.slice();
  for (const index of template.spectators) {
    const definition = species[index]!;
    if (definition.fixedMolality !== undefined) species[index] = { ...definition, fixedMolality: spectators.get(definition.id)! };
  }
  return {
    system: { structure: template, components: template.components.map((component, index) => ({ ...component, total: totals[index]! })), species, protonTotal },
    table: template.table,
    species: template.speciesMeanings,
    components: template.meanings,
    complexes: template.complexes,
    solids: template.solids,
    spectators: template.spectators,
  };
}

function addTo(totals: Map<string, number>, key: string, molality: number): void {
  totals.set(key, (totals.get(key) ?? 0) + molality);
}

interface Parts {
  readonly metals: readonly string[];
  readonly families: readonly string[];
  readonly spectators: readonly string[];
}

/** Templates already built; a page has few compositions, and sweeps have one. */
const TEMPLATES = new Map<string, ModelTemplate & { readonly table: InteractionTable }>();
const MOST_TEMPLATES = 256;

function templateOf({ metals, families, spectators }: Parts, water: Water, carbonDioxide: number | undefined): ModelTemplate & { readonly table: InteractionTable } {
  const key = `${water.temperature} ${carbonDioxide ?? ''} ${metals.join(' ')}|${families.join(' ')}|${spectators.join(' ')}`;
  const known = TEMPLATES.get(key);
  if (known) return known;
  const present = new Set([...metals.map((metal) => `metal ${metal}`), ...families.map((family) => `family ${family}`), ...spectators.map((id) => `ion ${id}`)]);
  const complexes = complexesOf(present);
  const solids = solidsOf(present);
  const binding = new Set([...complexes, ...solids].flatMap(({ gives }) => Object.keys(gives.ions ?? {})));
  const air = carbonDioxide === undefined ? undefined : lnCarbonDioxideActivity(water, carbonDioxide);
  const builder = new ModelBuilder(water);
  for (const metal of metals) builder.addMetal(metalOf(metal));
  for (const family of families) builder.addFamily(familyOf(family), family === CARBON_DIOXIDE_FAMILY ? air : undefined);
  for (const id of spectators) builder.addSpectator(particleOf(id)!, binding.has(id));
  for (const complex of complexes) builder.addComplex(complex);
  for (const solid of solids) builder.addSolid(solid);
  const built = builder.finish();
  const template = { ...built, table: interactionTable(built.species, water.debyeHueckelSlope) };
  if (TEMPLATES.size >= MOST_TEMPLATES) TEMPLATES.clear();
  TEMPLATES.set(key, template);
  return template;
}
