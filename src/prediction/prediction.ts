import type { TextRange } from '../quantities/solute-error.js';

/** Conditions that the page states once. */
export interface Conditions {
  /** Celsius, 0 to 60 for the stated accuracy, accepted from 0 to 100. */
  readonly temperature: number;
  /** Whether CO2 of the air is kept away or has come to equilibrium with the solution. */
  readonly air: 'excluded' | 'equilibrated';
  /** CO2 in dry room air, mol/mol. */
  readonly carbonDioxide: number;
  /** Whether solids may form and dissolve, or supersaturation is only reported. */
  readonly solids: 'watched' | 'equilibrated';
  /** Final volume, for amounts that are masses or moles: "500 mL". */
  readonly volume?: string;
}

/** A chemical formula as it is shown: the letters and digits, and the charge apart. */
export interface Chemical {
  readonly id: string;
  /** Formula without charge, plain digits ("HPO4"); digits after a letter or bracket are subscripts. */
  readonly label: string;
  readonly charge: number;
  /** Name in words, for reading aloud. */
  readonly name: string;
}

/** What was made of one piece of the input. */
export interface UnderstoodSolute {
  readonly typed: string;
  readonly range?: TextRange;
  /** Canonical formula with hydrate, plain text ("Na2HPO4·12H2O"). */
  readonly formula: string;
  readonly name?: string;
  readonly cas?: string;
  /** g/mol, of the formula as written, hydrate water included. */
  readonly molarMass: number;
  /** The amount as typed: number and unit. */
  readonly amount: string;
  /** mol/L of solution. */
  readonly molarity: number;
  /** mol/kg water. */
  readonly molality: number;
  /** The ions or molecules it brings, with their number per formula. */
  readonly ions: readonly { readonly chemical: Chemical; readonly count: number }[];
  /** Everything that was taken for granted, in plain sentences with a stable code. */
  readonly assumptions: readonly Remark[];
}

/** A sentence with a stable code. */
export interface Remark {
  readonly code: string;
  readonly text: string;
}

/** One dissolved species of the solved solution. */
export interface Species {
  readonly chemical: Chemical;
  /** mol/kg water. */
  readonly molality: number;
  /** Molality scale; 1 for neutral species. */
  readonly activityCoefficient: number;
  /** Share of the component (acid–base family or metal) in this species, 0 to 1; absent for H⁺, OH⁻ and spectators. */
  readonly share?: number;
  /** Key of the acid–base family or metal it belongs to. */
  readonly component?: string;
}

export interface EquationTerm {
  readonly coefficient: number;
  readonly chemical: Chemical;
}

/** A reaction as a chemist writes it, with its constant at the solution's temperature. */
export interface Equation {
  readonly kind: 'dissolution' | 'proton-donation' | 'proton-acceptance' | 'metal-hydrolysis' | 'complex-formation' | 'water';
  readonly reactants: readonly EquationTerm[];
  readonly products: readonly EquationTerm[];
  readonly arrow: 'complete' | 'equilibrium';
  /** Symbol of the constant: "Ka", "Kb", "*β" (hydrolysis), "β" (complexes), "Kw". Absent for dissolution. */
  readonly symbol?: string;
  /** Thermodynamic constant, molality scale. */
  readonly K?: number;
  readonly pK?: number;
  /** Share of the reactant, as it was put in, that has reacted in this way in this solution, 0 to 1. */
  readonly extent?: number;
  /** Id of the ion or molecule put in that this equation belongs to. */
  readonly of: string;
  /** True for the one reaction that decides the pH. */
  readonly decides?: boolean;
  /** Index into `Prediction.constants`. */
  readonly constant?: number;
}

/** A solid that the composition can form. */
export interface SolidStatus {
  readonly id: string;
  readonly formula: string;
  readonly name: string;
  /** log10 of ion product over solubility product: above 0 supersaturated, 0 when present. */
  readonly saturationIndex: number;
  /** Standard uncertainty of the solubility constant, log10. */
  readonly uncertainty: number;
  /** Whether a beaker gives it within hours, within weeks, or only on ageing or heating. */
  readonly forms: 'readily' | 'slowly' | 'only-aged';
  /** mol/kg water that lie as solid; only with solids equilibrated. */
  readonly amount?: number;
}

/** Why an ion takes no part. */
export interface Spectator {
  readonly chemical: Chemical;
  readonly reason: Remark;
}

/** A constant used, at its reference temperature, with where it comes from. */
export interface ConstantUsed {
  readonly id: string;
  /** What it belongs to, in words. */
  readonly description: string;
  readonly quantity: 'pKa' | 'log10 *β' | 'log10 β' | 'pKw';
  readonly value: number;
  /** Standard uncertainty of the value; null when the source gives none. */
  readonly uncertainty: number | null;
  /** Celsius and mol/kg at which the value holds. */
  readonly temperature: number;
  readonly ionicStrength: number;
  /** Value at the solution's temperature and zero ionic strength. */
  readonly valueHere: number;
  readonly source: string;
  readonly citation: string;
  readonly obtained: 'published' | 'memory';
}

/** One line of the uncertainty budget, largest share first. */
export interface UncertaintyContribution {
  readonly of: string;
  readonly kind: 'constant' | 'amount' | 'model';
  /** Contribution to the standard uncertainty of pH. */
  readonly contribution: number;
  /** Share of the variance, 0 to 1. */
  readonly share: number;
  /** Where the figure comes from. */
  readonly basis: 'stated' | 'graded' | 'digits' | 'model';
}

export interface Caution extends Remark {
  readonly gravity: 'danger' | 'warning' | 'note';
  /** Regulation, paper or "common practice, no source". */
  readonly basis: string;
}

/** What decides the pH, in one sentence. */
export interface Reason extends Remark {
  readonly code: 'donor-decides' | 'acceptor-decides' | 'buffer-pair' | 'strong-acid' | 'strong-base' | 'nothing-reacts' | 'balance';
  /** The chemical that decides; absent when nothing reacts. */
  readonly chemical?: Chemical;
  /** The one that comes second, on the other side. */
  readonly against?: Chemical;
}

export interface Prediction {
  /** −log10 of the activity of H⁺, molality scale. */
  readonly pH: number;
  /** Standard uncertainty of pH. */
  readonly uncertainty: number;
  readonly uncertaintyBudget: readonly UncertaintyContribution[];
  /** Half of pKw at this temperature. */
  readonly neutralPH: number;
  readonly classification: 'acidic' | 'neutral' | 'basic';
  /** False when the uncertainty reaches across the boundary of the class. */
  readonly decided: boolean;
  /** mol/kg. */
  readonly ionicStrength: number;
  readonly waterActivity: number;
  /** dC/dpH, mol/kg strong base per pH unit. */
  readonly bufferCapacity: number;
  /** pH in equilibrium with CO2 of room air, and without any air. One of them equals `pH`. */
  readonly inAir: number;
  readonly withoutAir: number;
  readonly conditions: Conditions;
  readonly understood: readonly UnderstoodSolute[];
  readonly dissociation: readonly Equation[];
  readonly hydrolysis: readonly Equation[];
  /** The most abundant species of every component and every spectator, most first. */
  readonly dominant: readonly Chemical[];
  readonly spectators: readonly Spectator[];
  readonly species: readonly Species[];
  readonly solids: readonly SolidStatus[];
  readonly reason: Reason;
  readonly cautions: readonly Caution[];
  readonly constants: readonly ConstantUsed[];
  /** Largest relative residual of a balance. */
  readonly residual: number;
}
