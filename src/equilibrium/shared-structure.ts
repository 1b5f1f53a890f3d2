import type { ChemicalSystem } from './chemical-system.js';
import { MIXED, NONE } from './starting-point.js';

/** What the arrays of the balances owe to the structure of a system alone. */
export interface SharedStructure {
  /** Components that have a total. */
  readonly free: readonly number[];
  readonly numbers: Float64Array;
  readonly protons: Float64Array;
  readonly constants: Float64Array;
  readonly only: Int32Array;
  /** Species of fixed molality. */
  readonly fixed: readonly number[];
  readonly workspace: Workspace;
}

/** Arrays that a solution fills anew; solutions of one structure are solved one after the other and use the same. */
export interface Workspace {
  readonly numbers: Float64Array;
  readonly fixed: Float64Array;
  readonly totals: Float64Array;
  readonly lnTotals: Float64Array;
  /** The active numbers without zeros: where each species starts, the unknown and the number of every entry. */
  readonly rows: Int32Array;
  readonly columns: Int32Array;
  readonly entries: Float64Array;
  readonly unknowns: Float64Array;
  readonly shift: Float64Array;
  readonly exponents: Float64Array;
  readonly gradient: Float64Array;
  readonly magnitude: Float64Array;
  readonly hessian: Float64Array;
  readonly step: Float64Array;
  readonly trial: Float64Array;
  readonly offset: Float64Array;
  readonly scale: Float64Array;
}

function workspaceOf(count: number, size: number): Workspace {
  const ofSpecies = (): Float64Array => new Float64Array(count);
  const ofUnknowns = (): Float64Array => new Float64Array(size);
  return {
    numbers: new Float64Array(count * size),
    fixed: ofSpecies(),
    totals: ofUnknowns(),
    lnTotals: ofUnknowns(),
    rows: new Int32Array(count + 1),
    columns: new Int32Array(count * size),
    entries: new Float64Array(count * size),
    unknowns: ofUnknowns(),
    shift: ofUnknowns(),
    exponents: ofSpecies(),
    gradient: ofUnknowns(),
    magnitude: ofUnknowns(),
    hessian: new Float64Array(size * size),
    step: ofUnknowns(),
    trial: ofUnknowns(),
    offset: ofUnknowns(),
    scale: ofUnknowns(),
  };
}

const SHARED = new WeakMap<object, SharedStructure>();

/** Works the structure out, or takes what was worked out for a system that differs in amounts only. */
export function sharedStructure(system: ChemicalSystem): SharedStructure {
  const known = system.structure && SHARED.get(system.structure);
  if (known) return known;
  const count = system.species.length;
  const free: number[] = [];
  const column = new Int32Array(system.components.length).fill(-1);
  system.components.forEach((component, index) => {
    if (component.lnActivity === undefined) column[index] = free.push(index) - 1;
  });
  const size = free.length + 1;
  const numbers = new Float64Array(count * size);
  const protons = new Float64Array(count);
  const constants = new Float64Array(count);
  const only = new Int32Array(count);
  const fixed: number[] = [];
  for (let j = 0; j < count; j++) {
    const species = system.species[j]!;
    only[j] = NONE;
    if (species.fixedMolality !== undefined) {
      fixed.push(j);
      continue;
    }
    let constant = species.lnBeta;
    let own = 0;
    for (const [component, number] of species.stoichiometry) {
      const i = column[component]!;
      if (i < 0) constant += number * system.components[component]!.lnActivity!;
      else {
        numbers[j * size + i] = number;
        only[j] = own++ === 0 ? i : MIXED;
      }
    }
    constants[j] = constant;
    protons[j] = species.protons;
  }
  const shared = { free, numbers, protons, constants, only, fixed, workspace: workspaceOf(count, size) };
  if (system.structure) SHARED.set(system.structure, shared);
  return shared;
}
