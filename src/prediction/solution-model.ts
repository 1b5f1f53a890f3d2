import { CARBON_DIOXIDE_FAMILY, lnCarbonDioxideActivity } from '../equilibrium/air.js';
import type { ChemicalSystem, Component, SolidDefinition, SpeciesDefinition } from '../equilibrium/chemical-system.js';
import type { Water } from '../equilibrium/water.js';
import { LN10 } from '../quantities/reproducible-math.js';
import { complexesOf, type Complex } from '../substances/complex-library.js';
import { compositionOf, type Composition } from '../substances/formula.js';
import { partsOfContribution } from '../substances/part-index.js';
import { solidsOf, type Solid } from '../substances/solid-library.js';
import { familyOf, metalOf, particleOf, type AcidBaseFamily, type MetalIon, type Particle } from '../substances/ion-library.js';
import type { Chemical } from './prediction.js';
import { acidConstants, complexConstant, hydrolysisConstants, solubilityConstant, type ConstantHere } from './thermodynamic-constants.js';

/** A particle put into the solution, from one or more solutes. */
export interface DissolvedParticle {
  readonly particle: Particle;
  /** mol/kg water. */
  readonly molality: number;
}

/** What a species of the solver is in chemistry. */
export interface SpeciesMeaning {
  readonly chemical: Chemical;
  /** Components it is made of, with their number; none for H⁺, OH⁻ and spectators. The metal of a complex comes first. */
  readonly parts: readonly (readonly [component: number, units: number])[];
  /** Protons relative to the fully deprotonated family and the bare metal ion, per species. */
  readonly protons: number;
}

/** A component and where its constants come from. */
export type ComponentMeaning =
  | { readonly kind: 'family'; readonly family: AcidBaseFamily; readonly constants: readonly ConstantHere[]; readonly firstSpecies: number }
  | { readonly kind: 'metal'; readonly metal: MetalIon; readonly constants: readonly ConstantHere[]; readonly firstSpecies: number }
  /** An ion that exchanges no proton but binds a metal. */
  | { readonly kind: 'ligand'; readonly particle: Particle; readonly constants: readonly ConstantHere[]; readonly firstSpecies: number };

/** A complex among the species. */
export interface ComplexMeaning {
  readonly complex: Complex;
  readonly constant: ConstantHere;
  /** Index of its species. */
  readonly species: number;
}

/** A solid that the composition can form, as the solver sees it. */
export interface SolidMeaning {
  readonly solid: Solid;
  readonly constant: ConstantHere;
  readonly definition: SolidDefinition;
}

/** The solution as the solver sees it, with the way back to chemistry. */
export interface SolutionModel {
  readonly system: ChemicalSystem;
  readonly species: readonly SpeciesMeaning[];
  readonly components: readonly ComponentMeaning[];
  readonly complexes: readonly ComplexMeaning[];
  readonly solids: readonly SolidMeaning[];
  /** Species index of every ion that exchanges no proton. */
  readonly spectators: readonly number[];
}

export const PROTON: Chemical = { id: 'H3O+', label: 'H3O', charge: 1, name: 'oxonium' };
export const HYDROXIDE: Chemical = { id: 'OH-', label: 'OH', charge: -1, name: 'hydroxide' };
export const WATER: Chemical = { id: 'H2O', label: 'H2O', charge: 0, name: 'water' };

/** The chemical to show for a particle. */
export function chemicalOf(particle: Particle): Chemical {
  return { id: particle.id, label: particle.label, charge: particle.charge, name: particle.names[0] ?? particle.formula };
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
  const addTo = (totals: Map<string, number>, entries: Readonly<Record<string, number>> | undefined, molality: number): void => {
    for (const key in entries) totals.set(key, (totals.get(key) ?? 0) + entries[key]! * molality);
  };
  for (const { particle, molality } of particles) {
    if (!particle.gives) {
      spectators.set(particle.id, (spectators.get(particle.id) ?? 0) + molality);
      continue;
    }
    addTo(families, particle.gives.families, molality);
    addTo(metals, particle.gives.metals, molality);
    addTo(spectators, particle.gives.ions, molality);
    protons += (particle.gives.protons ?? 0) * molality;
  }
  const air = carbonDioxide === undefined ? undefined : { lnActivity: lnCarbonDioxideActivity(water, carbonDioxide) };
  if (air && !families.has(CARBON_DIOXIDE_FAMILY)) families.set(CARBON_DIOXIDE_FAMILY, 0);
  const present = new Set<string>();
  for (const key of metals.keys()) present.add(`metal ${key}`);
  for (const key of families.keys()) present.add(`family ${key}`);
  for (const id of spectators.keys()) present.add(`ion ${id}`);
  const complexes = complexesOf(present);
  const solids = solidsOf(present);
  const binding = new Set([...complexes, ...solids].flatMap(({ gives }) => Object.keys(gives.ions ?? {})));
  const builder = new ModelBuilder(water, protons);
  for (const [key, total] of metals) builder.addMetal(metalOf(key), total);
  for (const [key, total] of families) builder.addFamily(familyOf(key), total, key === CARBON_DIOXIDE_FAMILY ? air : undefined);
  for (const [id, total] of spectators) builder.addSpectator(particleOf(id)!, total, binding.has(id));
  for (const complex of complexes) builder.addComplex(complex);
  for (const solid of solids) builder.addSolid(solid);
  return builder.finish();
}

/** How a complex finds one of its parts: the component, and the way from the part's own reference state to it. */
interface Part {
  readonly component: number;
  /** Charge of the bare metal, the deprotonated family or the ion. */
  readonly charge: number;
  readonly log10: number;
  readonly protons: number;
  readonly water: number;
}

class ModelBuilder {
  readonly #water: Water;
  #protonTotal: number;
  readonly #components: Component[] = [];
  readonly #meanings: ComponentMeaning[] = [];
  readonly #species: SpeciesDefinition[] = [];
  readonly #speciesMeanings: SpeciesMeaning[] = [];
  readonly #complexes: ComplexMeaning[] = [];
  readonly #solids: SolidMeaning[] = [];
  readonly #spectators: number[] = [];
  readonly #parts = new Map<string, Part>();

  constructor(water: Water, protonTotal: number) {
    this.#water = water;
    this.#protonTotal = protonTotal;
  }

  /**
   * The component is the fully deprotonated state; with its gas held by the air it is the dissolved gas, which is the
   * most protonated one.
   */
  addFamily(family: AcidBaseFamily, total: number, held: { lnActivity: number } | undefined): void {
    const last = family.states.length - 1;
    const constants = acidConstants(family, this.#water.temperature);
    const reference = held ? 0 : last;
    const component = this.#components.push({ id: family.key, total, ...(held ? { lnActivity: held.lnActivity } : {}) }) - 1;
    const toReference = held ? constants.reduce((sum, constant) => sum + constant.log10K, 0) : 0;
    this.#parts.set(`family ${family.key}`, { component, charge: family.states[last]!.charge, log10: toReference, protons: reference - last, water: waterBetween(family, reference, last) });
    this.#meanings.push({ kind: 'family', family, constants, firstSpecies: this.#species.length });
    this.#protonTotal -= total * (last - reference);
    let log10Beta = 0;
    for (let step = 0; step < reference; step++) log10Beta -= constants[step]!.log10K;
    family.states.forEach((state, index) => {
      const waters = waterBetween(family, reference, index);
      this.#add(
        { id: state.id, charge: state.charge, lnBeta: log10Beta * LN10, protons: reference - index, water: waters, stoichiometry: [[component, 1]] },
        { chemical: { id: state.id, label: state.label, charge: state.charge, name: state.name }, parts: [[component, 1]], protons: last - index },
      );
      if (index < last) log10Beta += constants[index]!.log10K;
    });
  }

  addMetal(metal: MetalIon, total: number): void {
    const { hydrolysis } = metal;
    const constants = hydrolysisConstants(metal, this.#water.temperature);
    const component = this.#components.push({ id: metal.key, total }) - 1;
    this.#parts.set(`metal ${metal.key}`, { component, charge: metal.charge, log10: 0, protons: 0, water: 0 });
    this.#meanings.push({ kind: 'metal', metal, constants, firstSpecies: this.#species.length });
    this.#add(
      { id: metal.ion, charge: metal.charge, lnBeta: 0, protons: 0, water: 0, stoichiometry: [[component, 1]] },
      { chemical: { id: metal.ion, label: metal.formula, charge: metal.charge, name: metal.name }, parts: [[component, 1]], protons: 0 },
    );
    hydrolysis.forEach((species, index) => {
      this.#add(
        {
          id: species.id,
          charge: species.charge,
          lnBeta: constants[index]!.log10K * LN10,
          protons: -species.hydroxide,
          water: species.hydroxide,
          stoichiometry: [[component, species.metal]],
        },
        {
          chemical: { id: species.id, label: species.label, charge: species.charge, name: hydroxoName(metal, species.metal, species.hydroxide) },
          parts: [[component, species.metal]],
          protons: -species.hydroxide,
        },
      );
    });
  }

  /** @param binds whether some metal of the solution forms complexes with it. */
  addSpectator(particle: Particle, molality: number, binds: boolean): void {
    this.#spectators.push(this.#species.length);
    const meaning = { chemical: chemicalOf(particle), protons: 0 };
    const species = { id: particle.id, charge: particle.charge, lnBeta: 0, protons: 0, water: 0 };
    if (!binds) {
      this.#add({ ...species, stoichiometry: [], fixedMolality: molality }, { ...meaning, parts: [] });
      return;
    }
    const component = this.#components.push({ id: particle.id, total: molality }) - 1;
    this.#parts.set(`ion ${particle.id}`, { component, charge: particle.charge, log10: 0, protons: 0, water: 0 });
    this.#meanings.push({ kind: 'ligand', particle, constants: [], firstSpecies: this.#species.length });
    this.#add({ ...species, stoichiometry: [[component, 1]] }, { ...meaning, parts: [[component, 1]] });
  }

  /** Its constant counts from the bare metal and the deprotonated family; parts of another reference state carry the difference. */
  addComplex(complex: Complex): void {
    const parts = partsOfContribution(complex.gives).map(([key, units]) => [this.#parts.get(key)!, units] as const);
    const protons = complex.gives.protons ?? 0;
    const chargeSquares = complex.charge * complex.charge - protons - parts.reduce((sum, [part, units]) => sum + units * part.charge * part.charge, 0);
    const constant = complexConstant(complex, chargeSquares, this.#water.temperature);
    const shift = parts.reduce((sum, [part, units]) => sum + units * part.log10, 0);
    const oxygens = elementCount(complex.formula, 'O') - partsOfContribution(complex.gives).reduce((sum, [key, units]) => sum + units * this.#oxygens(key), 0);
    this.#complexes.push({ complex, constant, species: this.#species.length });
    this.#add(
      {
        id: complex.id,
        charge: complex.charge,
        lnBeta: (constant.log10K + shift) * LN10,
        protons: protons + parts.reduce((sum, [part, units]) => sum + units * part.protons, 0),
        water: oxygens + parts.reduce((sum, [part, units]) => sum + units * part.water, 0),
        stoichiometry: parts.map(([part, units]) => [part.component, units] as const),
      },
      {
        chemical: { id: complex.id, label: complex.label, charge: complex.charge, name: complex.name },
        parts: parts.map(([part, units]) => [part.component, units] as const),
        protons,
      },
    );
  }

  addSolid(solid: Solid): void {
    const parts = partsOfContribution(solid.gives).map(([key, units]) => [this.#parts.get(key)!, units] as const);
    const constant = solubilityConstant(solid, this.#water.temperature);
    this.#solids.push({
      solid,
      constant,
      definition: {
        id: solid.id,
        lnK: (constant.log10K - parts.reduce((sum, [part, units]) => sum + units * part.log10, 0)) * LN10,
        protons: (solid.gives.protons ?? 0) + parts.reduce((sum, [part, units]) => sum + units * part.protons, 0),
        water: solid.water + parts.reduce((sum, [part, units]) => sum + units * part.water, 0),
        stoichiometry: parts.map(([part, units]) => [part.component, units] as const),
      },
    });
  }

  #oxygens(key: string): number {
    const meaning = this.#meanings[this.#parts.get(key)!.component]!;
    if (meaning.kind === 'family') return elementCount(meaning.family.states.at(-1)!.formula, 'O');
    return elementCount(meaning.kind === 'metal' ? meaning.metal.formula : meaning.particle.formula, 'O');
  }

  finish(): SolutionModel {
    this.#add({ id: 'H+', charge: 1, lnBeta: 0, protons: 1, water: 0, stoichiometry: [] }, { chemical: PROTON, parts: [], protons: 1 });
    this.#add(
      { id: 'OH-', charge: -1, lnBeta: -this.#water.pKw * LN10, protons: -1, water: 1, stoichiometry: [] },
      { chemical: HYDROXIDE, parts: [], protons: -1 },
    );
    return {
      system: { components: this.#components, species: this.#species, protonTotal: this.#protonTotal },
      species: this.#speciesMeanings,
      components: this.#meanings,
      complexes: this.#complexes,
      solids: this.#solids,
      spectators: this.#spectators,
    };
  }

  #add(species: SpeciesDefinition, meaning: SpeciesMeaning): void {
    this.#species.push(species);
    this.#speciesMeanings.push(meaning);
  }
}

const COMPOSITIONS = new Map<string, Composition>();
function elementCount(formula: string, element: string): number {
  let composition = COMPOSITIONS.get(formula);
  if (!composition) {
    composition = compositionOf(formula);
    COMPOSITIONS.set(formula, composition);
  }
  return composition.get(element) ?? 0;
}

/** Water molecules taken up from one state of a family to another, from the oxygen in their formulas. */
export function waterBetween(family: AcidBaseFamily, from: number, to: number): number {
  return elementCount(family.states[to]!.formula, 'O') - elementCount(family.states[from]!.formula, 'O');
}

function hydroxoName(metal: MetalIon, metals: number, hydroxides: number): string {
  return `${numeral(hydroxides)}hydroxido${metals === 1 ? '' : numeral(metals)}${metal.name}`;
}

function numeral(count: number): string {
  const words = ['', '', 'di', 'tri', 'tetra', 'penta', 'hexa', 'hepta', 'octa', 'nona', 'deca'];
  return words[count] ?? `${count}-`;
}
