import conventions from '../../data/conventions.json';
import { exp10 } from '../quantities/reproducible-math.js';
import type { Water } from '../equilibrium/water.js';
import { compositionOf } from '../substances/formula.js';
import { familyOf, metalOf, type AcidBaseFamily } from '../substances/ion-library.js';
import type { Dissolved } from './dissolve.js';
import type { Chemical, ConstantUsed, Equation, EquationTerm, Reason } from './prediction.js';
import type { SolvedSolution } from './predict.js';
import { chemicalOf, HYDROXIDE, PROTON, waterBetween, WATER, type ComponentMeaning, type DissolvedParticle } from './solution-model.js';
import { componentTotals } from './species-table.js';

const NEGLIGIBLE = conventions.negligibleShare;

/** How each solute falls apart: "NH₄Cl → NH₄⁺ + Cl⁻". Molecules that stay whole have no such equation. */
export function dissolutionEquations({ solutes }: Dissolved): Equation[] {
  return solutes.flatMap(({ read }) => {
    const { parts, formula, name, hydrateWater } = read.substance;
    if (parts.length === 1 && parts[0]!.count === 1) return [];
    const substance: Chemical = { id: formula, label: formula, charge: 0, name: name ?? formula };
    const protons = parts.reduce((sum, { particle, count }) => sum + (particle.id === 'H+' ? count : 0), 0);
    const products = parts.map(({ particle, count }) => ({ coefficient: count, chemical: particle.id === 'H+' ? PROTON : ionAsWritten(particle) }));
    // Water of crystallisation is set free; each free proton takes up one water molecule.
    const freed = hydrateWater - protons;
    return [
      {
        kind: 'dissolution',
        reactants: terms([1, substance], [-freed, WATER]),
        products: terms(...products.map(({ coefficient, chemical }) => [coefficient, chemical] as const), [freed, WATER]),
        arrow: 'complete',
        of: formula,
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
  const kind = reason.code === 'donor-decides' ? ['proton-donation', 'metal-hydrolysis'] : reason.code === 'acceptor-decides' ? ['proton-acceptance'] : [];
  const decisive = equations.findIndex((equation) => equation.of === reason.chemical?.id && kind.includes(equation.kind));
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
    for (const [key, count] of families) {
      const family = familyOf(key);
      const protons = families.length === 1 && metals.length === 0 ? (particle.gives!.protons ?? 0) : 0;
      const last = family.states.length - 1;
      const index = last - protons / count;
      const isState = count === 1 && families.length === 1 && metals.length === 0 && family.states[index]?.id === particle.id;
      if (!isState && families.length === 1 && metals.length === 0) equations.push(...this.#conversion(particle, family, count, protons));
      const entered = isState ? [index] : [Math.floor(index), Math.ceil(index)].map((state) => Math.max(0, Math.min(last, state)));
      for (const state of new Set(entered)) equations.push(...this.#familyEquations(family, state, particle.id));
    }
    for (const [key] of metals) equations.push(...this.#metalEquations(key, particle));
    return equations;
  }

  /** A composite ion as it becomes members of its family: "HF₂⁻ → HF + F⁻". */
  #conversion(particle: DissolvedParticle['particle'], family: AcidBaseFamily, count: number, protons: number): Equation[] {
    const last = family.states.length - 1;
    const bound = Math.max(0, Math.min(count * last, protons));
    const low = Math.floor(bound / count);
    const higher = bound - low * count;
    const hydroxide = Math.max(0, -protons);
    const products: (readonly [number, Chemical])[] = [
      [higher, family.states[last - low - 1] ?? family.states[0]!],
      [count - higher, family.states[last - low]!],
      [hydroxide, HYDROXIDE],
    ];
    const oxygens = products.reduce((sum, [number, chemical]) => sum + number * oxygen(chemical.label === 'OH' ? 'OH' : (family.states.find((state) => state.id === chemical.id)?.formula ?? 'OH')), 0);
    const waters = oxygens - oxygen(particle.formula);
    return [
      { kind: 'dissolution', reactants: terms([1, chemicalOf(particle)], [waters, WATER]), products: terms(...products, [-waters, WATER]), arrow: 'complete', of: particle.id },
    ];
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

  #once(key: string, make: () => Equation): Equation[] {
    if (this.#written.has(key)) return [];
    this.#written.add(key);
    return [make()];
  }

  #share(species: number): number {
    const meaning = this.#solved.model.species[species]!;
    return (this.#solved.state.molality[species]! * meaning.units) / this.#totals[meaning.component]!;
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

type FamilyMeaning = Extract<ComponentMeaning, { kind: 'family' }>;

function oxygen(formula: string): number {
  return compositionOf(formula).get('O') ?? 0;
}

/** Terms with a positive coefficient. */
function terms(...pairs: readonly (readonly [number, Chemical])[]): EquationTerm[] {
  return pairs.filter(([coefficient]) => coefficient > 0).map(([coefficient, { id, label, charge, name }]) => ({ coefficient, chemical: { id, label, charge, name } }));
}
