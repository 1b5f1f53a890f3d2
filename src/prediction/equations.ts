import conventions from '../../data/conventions.json';
import { exp10 } from '../quantities/reproducible-math.js';
import type { Water } from '../equilibrium/water.js';
import { compositionOf } from '../substances/formula.js';
import type { Complex } from '../substances/complex-library.js';
import { familyOf, metalOf, particleOf, type AcidBaseFamily, type FamilyState } from '../substances/ion-library.js';
import type { Dissolved } from './dissolve.js';
import type { Chemical, ConstantUsed, Equation, EquationTerm, Reason } from './prediction.js';
import type { SolvedSolution } from './solved-solution.js';
import { chemicalOf, HYDROXIDE, PROTON, WATER } from './chemicals.js';
import { waterBetween } from './model-builder.js';
import type { ComponentMeaning, SpeciesMeaning } from './meanings.js';
import type { DissolvedParticle } from './solution-model.js';
import { componentTotals } from './species-table.js';

const NEGLIGIBLE = conventions.negligibleShare;

/** How each solute falls apart: "NH₄Cl → NH₄⁺ + Cl⁻". Molecules that stay whole have no such equation. */
export function dissolutionEquations({ solutes }: Dissolved): Equation[] {
  return solutes.flatMap(({ read }) => {
    const { substance } = read;
    const { parts, formula } = substance;
    if (parts.length === 1 && parts[0]!.count === 1) return [];
    const written: Chemical = { id: formula, label: formula, charge: 0, name: substance.name ?? formula };
    // Oxygen counts the water: set free from a hydrate, or taken up by free protons and anhydrides.
    const products = parts.map(({ particle, count }) => ({ coefficient: count, chemical: particle.id === 'H+' ? PROTON : ionAsWritten(particle), oxygens: particle.id === 'H+' ? 1 : oxygen(particle.formula) }));
    const freed = (substance.composition.get('O') ?? 0) - products.reduce((sum, { coefficient, oxygens }) => sum + coefficient * oxygens, 0);
    return [
      {
        kind: 'dissolution',
        reactants: terms([1, written], [-freed, WATER]),
        products: terms(...products.map(({ coefficient, chemical }) => [coefficient, chemical] as const), [freed, WATER]),
        arrow: 'complete',
        of: substance.formula,
      } satisfies Equation,
    ];
  });
}

function ionAsWritten(particle: DissolvedParticle['particle']): Chemical {
  const chemical = chemicalOf(particle);
  return particle.gives?.metals && particle.charge > 0 ? { ...chemical, label: particle.formula } : chemical;
}

/** The reactions of every particle with water, in the order in which the solutes were written. */
export function hydrolysisEquations(dissolved: Dissolved, solved: SolvedSolution, water: Water, constants: readonly ConstantUsed[], reason: Reason): Equation[] {
  const writer = new EquationWriter(solved, water, constants);
  const equations = dissolved.particles.flatMap(({ particle }) => writer.equationsOf(particle));
  const kinds = reason.code === 'donor-decides' ? ['proton-donation', 'metal-hydrolysis'] : reason.code === 'acceptor-decides' ? ['proton-acceptance'] : [];
  const decisive = equations.findIndex(({ of, reactants, kind }) => kinds.includes(kind) && (of === reason.chemical?.id || reactants[0]!.chemical.id === reason.chemical?.id));
  equations.push(...writer.complexEquations());
  const written = equations.map((equation, index) => (index === decisive ? { ...equation, decides: true } : equation));
  return written.length > 0 ? written : [writer.waterEquation()];
}

class EquationWriter {
  readonly #solved: SolvedSolution;
  readonly #water: Water;
  readonly #constants: readonly ConstantUsed[];
  readonly #totals: Float64Array;
  readonly #written = new Set<string>();

  constructor(solved: SolvedSolution, water: Water, constants: readonly ConstantUsed[]) {
    this.#solved = solved;
    this.#water = water;
    this.#constants = constants;
    this.#totals = componentTotals(solved);
  }

  waterEquation(): Equation {
    return this.#equilibrium('water', [[2, WATER]], [[1, PROTON], [1, HYDROXIDE]], -this.#water.pKw, 'Kw', WATER.id, 'water', undefined);
  }

  equationsOf(particle: DissolvedParticle['particle']): Equation[] {
    const families = Object.entries(particle.gives?.families ?? {});
    const metals = Object.entries(particle.gives?.metals ?? {});
    const equations: Equation[] = [];
    const entered = families.map(([key, count]) => this.#statesEntered(key, count, families.length + metals.length === 1 ? (particle.gives!.protons ?? 0) : 0));
    const isState = metals.length === 0 && entered.length === 1 && entered[0]!.length === 1 && entered[0]![0]!.state.id === particle.id;
    const isMetal = families.length === 0 && metals.length === 1 && metalOf(metals[0]![0]).ion === particle.id;
    if (families.length + metals.length > 0 && !isState && !isMetal) equations.push(this.#conversion(particle, entered.flat()));
    entered.forEach((states, index) => {
      for (const { position } of states) equations.push(...this.#familyEquations(familyOf(families[index]![0]), position, particle.id));
    });
    for (const [key] of metals) equations.push(...this.#metalEquations(key, particle));
    return equations;
  }

  /** The two neighbouring states (or the one) in which units of a family with so many protons in all arrive. */
  #statesEntered(key: string, count: number, protons: number): EnteredState[] {
    const { states } = familyOf(key);
    const last = states.length - 1;
    const bound = Math.max(0, Math.min(count * last, protons));
    const low = Math.floor(bound / count);
    const higher = bound - low * count;
    return [
      { position: last - low - 1, number: higher },
      { position: last - low, number: count - higher },
    ]
      .filter(({ number }) => number > 0)
      .map(({ position, number }) => ({ position, number, state: states[position]! }));
  }

  /** A composite ion as it becomes what the solver knows: "HF₂⁻ → HF + F⁻", "Sb³⁺ + 4 H₂O → Sb(OH)₂⁺ + 2 H₃O⁺". */
  #conversion(particle: DissolvedParticle['particle'], entered: readonly EnteredState[]): Equation {
    const metals = Object.entries(particle.gives!.metals ?? {}).map(([key, count]) => ({ metal: metalOf(key), count }));
    const hydroxides = metals.length === 1 ? -(particle.gives!.protons ?? 0) / metals[0]!.count : 0;
    const products: { number: number; chemical: Chemical; formula: string }[] = [
      ...entered.map(({ state, number }) => ({ number, chemical: state, formula: state.formula })),
      ...metals.map(({ metal, count }) => {
        const species = metal.hydrolysis.find((step) => step.metal === 1 && step.hydroxide === hydroxides);
        const shown = species ?? { id: metal.ion, label: metal.formula, charge: metal.charge, formula: metal.formula };
        return { number: count, chemical: { id: shown.id, label: shown.label, charge: shown.charge, name: metal.name }, formula: shown.formula };
      }),
      ...Object.entries(particle.gives!.ions ?? {}).map(([id, number]) => ({ number, chemical: chemicalOf(particleOf(id)!), formula: particleOf(id)!.formula })),
    ];
    const charge = particle.charge - products.reduce((sum, { number, chemical }) => sum + number * chemical.charge, 0);
    if (charge !== 0) products.push({ number: Math.abs(charge), chemical: charge > 0 ? PROTON : HYDROXIDE, formula: 'OH' });
    const freed = oxygen(particle.formula) - products.reduce((sum, { number, formula }) => sum + number * oxygen(formula), 0);
    return {
      kind: 'dissolution',
      reactants: terms([1, ionAsWritten(particle)], [-freed, WATER]),
      products: terms(...products.map(({ number, chemical }) => [number, chemical] as const), [freed, WATER]),
      arrow: 'complete',
      of: particle.id,
    };
  }

  #familyEquations(family: AcidBaseFamily, state: number, of: string): Equation[] {
    const meaning = this.#meaningOf(family.key);
    if (!meaning || meaning.kind !== 'family') return [];
    const equations: Equation[] = [];
    const share = (index: number): number => this.#share(meaning.firstSpecies + index);
    const below = family.states.reduce((sum, _state, index) => sum + (index > state ? share(index) : 0), 0);
    const above = family.states.reduce((sum, _state, index) => sum + (index < state ? share(index) : 0), 0);
    const last = family.states.length - 1;
    if (state < last) equations.push(...this.#donation(family, meaning, state, of, below));
    if (state > 0) equations.push(...this.#acceptance(family, meaning, state, of, above));
    for (let next = state + 1; next < last; next++) {
      const further = family.states.reduce((sum, _state, index) => sum + (index > next ? share(index) : 0), 0);
      if (further > NEGLIGIBLE) equations.push(...this.#donation(family, meaning, next, of, further));
    }
    for (let next = state - 1; next > 0; next--) {
      const further = family.states.reduce((sum, _state, index) => sum + (index < next ? share(index) : 0), 0);
      if (further > NEGLIGIBLE) equations.push(...this.#acceptance(family, meaning, next, of, further));
    }
    return equations;
  }

  #donation(family: AcidBaseFamily, meaning: FamilyMeaning, state: number, of: string, extent: number): Equation[] {
    const waters = 1 + waterBetween(family, state, state + 1);
    return this.#once(`${family.key} ${state} donates`, () =>
      this.#equilibrium(
        'proton-donation',
        [[1, family.states[state]!], [waters, WATER]],
        [[1, family.states[state + 1]!], [-waters, WATER], [1, PROTON]],
        meaning.constants[state]!.log10K,
        'Ka',
        of,
        `${family.key} ${state + 1}`,
        extent,
      ),
    );
  }

  #acceptance(family: AcidBaseFamily, meaning: FamilyMeaning, state: number, of: string, extent: number): Equation[] {
    const waters = 1 + waterBetween(family, state, state - 1);
    return this.#once(`${family.key} ${state} accepts`, () =>
      this.#equilibrium(
        'proton-acceptance',
        [[1, family.states[state]!], [waters, WATER]],
        [[1, family.states[state - 1]!], [-waters, WATER], [1, HYDROXIDE]],
        -this.#water.pKw - meaning.constants[state - 1]!.log10K,
        'Kb',
        of,
        `${family.key} ${state}`,
        extent,
      ),
    );
  }

  #metalEquations(key: string, particle: DissolvedParticle['particle']): Equation[] {
    const meaning = this.#meaningOf(key);
    if (!meaning || meaning.kind !== 'metal') return [];
    const metal = metalOf(key);
    const bare: Chemical = { id: metal.ion, label: metal.formula, charge: metal.charge, name: metal.name };
    const steps = meaning.metal.hydrolysis.map((species, index) => ({ species, index, share: this.#share(meaning.firstSpecies + 1 + index) }));
    const first = steps.find(({ species }) => species.metal === 1 && species.hydroxide === 1) ?? steps[0];
    return steps
      .filter((step) => step === first || step.share > NEGLIGIBLE)
      .sort((a, b) => (a === first ? -1 : b === first ? 1 : b.share - a.share))
      .flatMap(({ species, index, share }) =>
        this.#once(`${key} ${species.id}`, () => {
          const chemical: Chemical = this.#solved.model.species[meaning.firstSpecies + 1 + index]!.chemical;
          const waters = oxygen(species.formula) + species.hydroxide - species.metal * oxygen(metal.formula);
          return this.#equilibrium(
            'metal-hydrolysis',
            [[species.metal, bare], [waters, WATER]],
            [[1, chemical], [species.hydroxide, PROTON]],
            meaning.constants[index]!.log10K,
            '*β',
            particle.id,
            `${key} ${species.id}`,
            share,
          );
        }),
      );
  }

  /** Complexes that hold more than a negligible share of their metal or ligand, most first. */
  complexEquations(): Equation[] {
    const { model, state } = this.#solved;
    return model.complexes
      .map((meaning) => {
        const species = model.species[meaning.species]!;
        const share = Math.max(...species.parts.map(([component, units]) => (units * state.molality[meaning.species]!) / this.#totals[component]!));
        return { ...meaning, species, share };
      })
      .filter(({ share }) => share > NEGLIGIBLE)
      .sort((a, b) => b.share - a.share)
      .map(({ complex, constant, species, share }) => this.#complexEquation(complex, constant.log10K, species, share));
  }

  #complexEquation(complex: Complex, log10K: number, species: SpeciesMeaning, share: number): Equation {
    const { model } = this.#solved;
    const parts = species.parts.map(([component, units]) => ({ units, ...this.#reference(model.components[component]!) }));
    const protons = species.protons;
    const freed = parts.reduce((sum, { units, formula }) => sum + units * oxygen(formula), 0) + protons - oxygen(complex.formula);
    return this.#equilibrium(
      'complex-formation',
      [...parts.map(({ units, chemical }) => [units, chemical] as const), [protons, PROTON], [-freed, WATER]],
      [[1, species.chemical], [-protons, PROTON], [freed, WATER]],
      log10K,
      'β',
      parts[0]!.chemical.id,
      `complex ${complex.id}`,
      share,
    );
  }

  /** The form in which a component stands in a formation constant. */
  #reference(meaning: ComponentMeaning): { chemical: Chemical; formula: string } {
    if (meaning.kind === 'family') {
      const state = meaning.family.states.at(-1)!;
      return { chemical: state, formula: state.formula };
    }
    if (meaning.kind === 'ligand') return { chemical: chemicalOf(meaning.particle), formula: meaning.particle.formula };
    const { ion, formula, charge, name } = meaning.metal;
    return { chemical: { id: ion, label: formula, charge, name }, formula };
  }

  #once(key: string, make: () => Equation): Equation[] {
    if (this.#written.has(key)) return [];
    this.#written.add(key);
    return [make()];
  }

  #share(species: number): number {
    const [component, units] = this.#solved.model.species[species]!.parts[0]!;
    return (this.#solved.state.molality[species]! * units) / this.#totals[component]!;
  }

  #meaningOf(id: string): ComponentMeaning | undefined {
    return this.#solved.model.components[this.#solved.model.system.components.findIndex((component) => component.id === id)];
  }

  #equilibrium(
    kind: Equation['kind'],
    left: readonly (readonly [number, Chemical])[],
    right: readonly (readonly [number, Chemical])[],
    log10K: number,
    symbol: string,
    of: string,
    constantId: string,
    extent: number | undefined,
  ): Equation {
    const constant = this.#constants.findIndex(({ id }) => id === constantId);
    return {
      kind,
      reactants: terms(...left),
      products: terms(...right),
      arrow: 'equilibrium',
      symbol,
      K: exp10(log10K),
      pK: -log10K,
      ...(extent === undefined ? {} : { extent }),
      of,
      ...(constant < 0 ? {} : { constant }),
    };
  }
}

interface EnteredState {
  readonly position: number;
  readonly number: number;
  readonly state: FamilyState;
}
type FamilyMeaning = Extract<ComponentMeaning, { kind: 'family' }>;

const OXYGENS = new Map<string, number>();

/** Oxygen atoms of a formula of the data files. */
function oxygen(formula: string): number {
  let count = OXYGENS.get(formula);
  if (count === undefined) {
    count = compositionOf(formula).get('O') ?? 0;
    OXYGENS.set(formula, count);
  }
  return count;
}

/** Terms with a positive coefficient. */
function terms(...pairs: readonly (readonly [number, Chemical])[]): EquationTerm[] {
  return pairs.filter(([coefficient]) => coefficient > 0).map(([coefficient, { id, label, charge, name }]) => ({ coefficient, chemical: { id, label, charge, name } }));
}
