import type { SolidDefinition } from '../equilibrium/chemical-system.js';
import type { Complex } from '../substances/complex-library.js';
import type { AcidBaseFamily, MetalIon, Particle } from '../substances/ion-library.js';
import type { Solid } from '../substances/solid-library.js';
import type { Chemical } from './prediction.js';
import type { ConstantHere } from './thermodynamic-constants.js';

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
