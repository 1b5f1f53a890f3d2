import solids from '../../data/solids.json';
import type { Contribution } from './ion-library.js';
import { PartIndex } from './part-index.js';

/** A solid that a solution can be saturated with. */
export interface Solid {
  readonly id: string;
  readonly formula: string;
  readonly name: string;
  /** What it is made of, relative to the bare metal ion and the fully deprotonated family. */
  readonly gives: Contribution;
  /** Water molecules set free when it dissolves into its parts. */
  readonly water: number;
  /** log10 of Π a(part)^n · a(H⁺)^protons · a(H₂O)^water at `temperature`. */
  readonly logK: number;
  readonly uncertainty: number | null;
  readonly enthalpy?: number;
  readonly temperature: number;
  readonly grade: 'A' | 'B' | 'C';
  readonly source: string;
  readonly obtained: 'published' | 'memory';
  /** Whether a beaker gives it within hours, within weeks, or only on ageing or heating. */
  readonly forms: 'readily' | 'slowly' | 'only-aged';
}

const SOLIDS = new PartIndex(solids.solids as unknown as Solid[]);

/** Every solid whose parts are all present. @param present part keys. */
export function solidsOf(present: ReadonlySet<string>): Solid[] {
  return SOLIDS.madeOf(present);
}
