import type { SpeciesDefinition } from '../equilibrium/chemical-system.js';
import type { Water } from '../equilibrium/water.js';
import { LN10 } from '../quantities/reproducible-math.js';
import type { Complex } from '../substances/complex-library.js';
import { compositionOf, type Composition } from '../substances/formula.js';
import type { AcidBaseFamily, MetalIon, Particle } from '../substances/ion-library.js';
import { partsOfContribution } from '../substances/part-index.js';
import type { Solid } from '../substances/solid-library.js';
import { chemicalOf, HYDROXIDE, PROTON } from './chemicals.js';
import type { ComplexMeaning, ComponentMeaning, SolidMeaning, SpeciesMeaning } from './meanings.js';
import { acidConstants, complexConstant, hydrolysisConstants, solubilityConstant } from './thermodynamic-constants.js';

/** How a complex finds one of its parts: the component, and the way from the part's own reference state to it. */
interface Part {
  readonly component: number;
  /** Charge of the bare metal, the deprotonated family or the ion. */
  readonly charge: number;
  readonly log10: number;
  readonly protons: number;
  readonly water: number;
}

/** Everything about a solution that does not depend on the amounts. */
export interface ModelTemplate {
  readonly components: readonly { readonly id: string; readonly lnActivity?: number }[];
  /** Protons of the reference state of every component, beyond the fully deprotonated family. */
  readonly referenceProtons: readonly number[];
  readonly species: readonly SpeciesDefinition[];
  readonly meanings: readonly ComponentMeaning[];
  readonly speciesMeanings: readonly SpeciesMeaning[];
  readonly complexes: readonly ComplexMeaning[];
  readonly solids: readonly SolidMeaning[];
  readonly spectators: readonly number[];
}

/** Writes down every species and solid that the parts of a solution can form. */
export class ModelBuilder {
  readonly #water: Water;
  readonly #components: { readonly id: string; readonly lnActivity?: number }[] = [];
  readonly #referenceProtons: number[] = [];
  readonly #meanings: ComponentMeaning[] = [];
  readonly #species: SpeciesDefinition[] = [];
  readonly #speciesMeanings: SpeciesMeaning[] = [];
  readonly #complexes: ComplexMeaning[] = [];
  readonly #solids: SolidMeaning[] = [];
  readonly #spectators: number[] = [];
  readonly #parts = new Map<string, Part>();

  constructor(water: Water) {
    this.#water = water;
  }

  /**
   * The component is the fully deprotonated state; with its gas held by the air it is the dissolved gas, which is the
   * most protonated one.
   */
  addFamily(family: AcidBaseFamily, lnActivity: number | undefined): void {
    const last = family.states.length - 1;
    const constants = acidConstants(family, this.#water.temperature);
    const reference = lnActivity === undefined ? last : 0;
    const component = this.#addComponent({ id: family.key, ...(lnActivity === undefined ? {} : { lnActivity }) }, last - reference);
    const toReference = lnActivity === undefined ? 0 : constants.reduce((sum, constant) => sum + constant.log10K, 0);
    this.#parts.set(`family ${family.key}`, { component, charge: family.states[last]!.charge, log10: toReference, protons: reference - last, water: waterBetween(family, reference, last) });
    this.#meanings.push({ kind: 'family', family, constants, firstSpecies: this.#species.length });
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

  addMetal(metal: MetalIon): void {
    const { hydrolysis } = metal;
    const constants = hydrolysisConstants(metal, this.#water.temperature);
    const component = this.#addComponent({ id: metal.key }, 0);
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
  addSpectator(particle: Particle, binds: boolean): void {
    this.#spectators.push(this.#species.length);
    const meaning = { chemical: chemicalOf(particle), protons: 0 };
    const species = { id: particle.id, charge: particle.charge, lnBeta: 0, protons: 0, water: 0 };
    if (!binds) {
      this.#add({ ...species, stoichiometry: [], fixedMolality: 1 }, { ...meaning, parts: [] });
      return;
    }
    const component = this.#addComponent({ id: particle.id }, 0);
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

  finish(): ModelTemplate {
    this.#add({ id: 'H+', charge: 1, lnBeta: 0, protons: 1, water: 0, stoichiometry: [] }, { chemical: PROTON, parts: [], protons: 1 });
    this.#add(
      { id: 'OH-', charge: -1, lnBeta: -this.#water.pKw * LN10, protons: -1, water: 1, stoichiometry: [] },
      { chemical: HYDROXIDE, parts: [], protons: -1 },
    );
    return {
      components: this.#components,
      referenceProtons: this.#referenceProtons,
      species: this.#species,
      meanings: this.#meanings,
      speciesMeanings: this.#speciesMeanings,
      complexes: this.#complexes,
      solids: this.#solids,
      spectators: this.#spectators,
    };
  }

  #addComponent(component: { readonly id: string; readonly lnActivity?: number }, referenceProtons: number): number {
    this.#referenceProtons.push(referenceProtons);
    return this.#components.push(component) - 1;
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
