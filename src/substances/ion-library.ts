import families from '../../data/acid-base-families.json';
import ions from '../../data/ions.json';
import metals from '../../data/metal-ions.json';
import { compositionKey, compositionOf, type Composition } from './formula.js';

/** Why an ion takes no part in any proton transfer. */
export type SpectatorReason = 'strong-base-cation' | 'quaternary-cation' | 'strong-acid-anion' | 'inert-complex' | 'stable-anion';

/** What an ion or molecule becomes when it is dissolved, before any equilibrium. */
export interface Contribution {
  /** Number of units of acid–base families, by key. */
  readonly families?: Readonly<Record<string, number>>;
  /** Number of metal ions, by key. */
  readonly metals?: Readonly<Record<string, number>>;
  /** Number of spectator ions, by id. */
  readonly ions?: Readonly<Record<string, number>>;
  /** Protons brought, relative to the fully deprotonated family and the bare metal ion; hydroxide counts −1. */
  readonly protons?: number;
}

/** An ion or molecule that a substance brings into solution. */
export interface Particle {
  readonly id: string;
  readonly charge: number;
  readonly formula: string;
  readonly label: string;
  readonly names: readonly string[];
  readonly composition: Composition;
  /** Fragments of formulas in which people write it, longest first. */
  readonly written: readonly string[];
  readonly gives?: Contribution;
  readonly spectator?: SpectatorReason;
  /** Why no prediction is made for it. */
  readonly refused?: string;
  /** Cations with which a composition is read as containing it; absent for any. */
  readonly onlyWith?: readonly string[];
  readonly cautions: readonly string[];
}

interface IonRow {
  readonly id: string;
  readonly charge: number;
  readonly formula: string;
  readonly label?: string;
  readonly names: readonly string[];
  readonly written?: readonly string[];
  readonly gives?: Contribution;
  readonly spectator?: SpectatorReason;
  readonly refused?: string;
  readonly onlyWith?: readonly string[];
  readonly caution?: readonly string[];
}

/** One protonation state of an acid–base family. */
export interface FamilyState {
  readonly id: string;
  readonly formula: string;
  readonly label: string;
  readonly charge: number;
  readonly name: string;
}

/** A published proton-transfer step, from the more to the less protonated state. */
export interface FamilyStep {
  readonly pKa: number;
  readonly uncertainty: number | null;
  readonly grade: 'A' | 'B' | 'C';
  /** kJ/mol. */
  readonly enthalpy?: number;
  /** J/(mol K). */
  readonly heatCapacity?: number;
  /** mol/kg at which the value holds. */
  readonly ionicStrength: number;
  /** Celsius at which the value holds. */
  readonly temperature: number;
  readonly source: string;
  readonly obtained: 'published' | 'memory';
}

export interface AcidBaseFamily {
  readonly key: string;
  readonly name: string;
  /** Most protonated first. */
  readonly states: readonly FamilyState[];
  readonly steps: readonly FamilyStep[];
}

/** A published hydrolysis constant *β of p M + q H2O ⇌ Mp(OH)q + q H⁺. */
export interface HydrolysisSpecies {
  readonly id: string;
  readonly formula: string;
  readonly label: string;
  readonly charge: number;
  readonly metal: number;
  readonly hydroxide: number;
  readonly logK: number;
  readonly uncertainty: number | null;
  readonly grade?: 'A' | 'B' | 'C';
  readonly enthalpy?: number;
  readonly temperature: number;
  readonly ionicStrength: number;
  readonly source: string;
  readonly obtained: 'published' | 'memory';
  /** "not with SIT": its effect is already in the interaction coefficients. */
  readonly use?: string;
}

export interface MetalIon {
  readonly key: string;
  readonly ion: string;
  readonly formula: string;
  readonly label: string;
  readonly charge: number;
  readonly name: string;
  readonly hydrolysis: readonly HydrolysisSpecies[];
}

interface Labelled {
  readonly formula: string;
  readonly label?: string;
}
function labelled<Row extends Labelled>(row: Row): Row & { readonly label: string } {
  return { ...row, label: row.label ?? row.formula };
}

/** Ion pairs whose effect the interaction coefficients of the activity model already contain are left out. */
function withInteractionModel(species: HydrolysisSpecies): boolean {
  return species.use === undefined;
}

const FAMILIES: ReadonlyMap<string, AcidBaseFamily> = new Map(
  (families.families as unknown as AcidBaseFamily[]).map((family) => [family.key, { ...family, states: family.states.map(labelled) }]),
);
const METALS: ReadonlyMap<string, MetalIon> = new Map(
  (metals.metals as unknown as MetalIon[]).map((metal) => [metal.key, { ...labelled(metal), hydrolysis: metal.hydrolysis.filter(withInteractionModel).map(labelled) }]),
);

const PARTICLES = new Map<string, Particle>();
const BY_COMPOSITION = new Map<string, Particle[]>();

function add(particle: Particle): void {
  PARTICLES.set(particle.id, particle);
  const key = compositionKey(particle.composition);
  BY_COMPOSITION.set(key, [...(BY_COMPOSITION.get(key) ?? []), particle]);
}

for (const row of ions.ions as unknown as IonRow[]) {
  add({
    ...labelled(row),
    composition: compositionOf(row.formula),
    written: [...new Set([...(row.written ?? []), row.formula, row.label ?? row.formula])].sort((a, b) => b.length - a.length),
    cautions: row.caution ?? [],
  });
}
for (const family of FAMILIES.values()) {
  family.states.forEach((state, index) => {
    if (state.charge !== 0 || PARTICLES.has(state.id)) return;
    const protons = family.states.length - 1 - index;
    add({
      ...state,
      names: [state.name],
      composition: compositionOf(state.formula),
      written: [state.label, state.formula],
      gives: { families: { [family.key]: 1 }, protons },
      cautions: [],
    });
  });
}

/** An acid–base family by key. */
export function familyOf(key: string): AcidBaseFamily {
  return FAMILIES.get(key)!;
}

export function metalOf(key: string): MetalIon {
  return METALS.get(key)!;
}

/** An ion, or a neutral member of an acid–base family, by id. */
export function particleOf(id: string): Particle | undefined {
  return PARTICLES.get(id);
}

export function particlesOfComposition(key: string): readonly Particle[] {
  return BY_COMPOSITION.get(key) ?? [];
}

/** Every ion and every neutral member of a family. */
export function allParticles(): Iterable<Particle> {
  return PARTICLES.values();
}
