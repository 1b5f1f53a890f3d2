/**
 * What the solver is given: components, the species they form, and amounts. Nothing here knows what a salt is.
 *
 * Every species is a product of component activities: activity = β · a(H⁺)^protons · a(H₂O)^water · Π a(component)^ν.
 * The proton is a component like the others; OH⁻ is a species with protons = −1 and β = Kw.
 */
export interface ChemicalSystem {
  readonly components: readonly Component[];
  readonly species: readonly SpeciesDefinition[];
  /** Total of the proton balance, mol/kg water: Σ protons·m over all species has to equal it. May be negative. */
  readonly protonTotal: number;
  /** The same object in all systems that differ in amounts only, so that what follows from the rest is worked out once. */
  readonly structure?: object;
  /** Solids that may be present; without them the solution may be supersaturated. */
  readonly solids?: readonly SolidDefinition[];
}

/** A solid by its dissolution: Π a(component)^ν · a(H⁺)^protons · a(H₂O)^water = K. */
export interface SolidDefinition {
  readonly id: string;
  readonly lnK: number;
  readonly protons: number;
  readonly water: number;
  readonly stoichiometry: readonly (readonly [component: number, number: number])[];
}

export interface Component {
  readonly id: string;
  /** Total molality, mol/kg water, > 0. Ignored when `lnActivity` is given. */
  readonly total: number;
  /** Given instead of a total when something outside holds the activity, such as CO2 of the air. */
  readonly lnActivity?: number;
}

export interface SpeciesDefinition {
  readonly id: string;
  readonly charge: number;
  /** Natural logarithm of the cumulative thermodynamic formation constant β, at the system's temperature. */
  readonly lnBeta: number;
  /** Protons bound per formula, relative to the components; negative for hydroxide. */
  readonly protons: number;
  /** Water molecules in the formation reaction: positive when the reaction consumes water. */
  readonly water: number;
  /** Stoichiometric numbers ≥ 0, as pairs of component index and number. */
  readonly stoichiometry: readonly (readonly [component: number, number: number])[];
  /** Molality, mol/kg, of a species that takes part in no reaction; its β and numbers are not used. */
  readonly fixedMolality?: number;
}

/** Charges and pairwise interaction coefficients of the species of a system, in its order. */
export interface InteractionTable {
  readonly charges: Float64Array;
  /** Specific interaction coefficients ε(j,k), kg/mol, row-major, symmetric; zero for like charges and neutrals. */
  readonly epsilon: Float64Array;
  /** The same as a list of the pairs that are not zero. */
  readonly pairs: { readonly cation: Int32Array; readonly anion: Int32Array; readonly value: Float64Array };
  /** Debye–Hückel slope A, (kg/mol)^½. */
  readonly slope: number;
  /** Denominator coefficient B·a of the Debye–Hückel term, (kg/mol)^½. */
  readonly denominator: number;
  /** Ionic strength above which the coefficients are held at their value there, mol/kg. */
  readonly ceiling: number;
}
