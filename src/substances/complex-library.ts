import complexes from '../../data/complexes.json';
import type { Contribution } from './ion-library.js';
import { PartIndex } from './part-index.js';

/** A complex, an ion pair or a polynuclear species of one acid–base family, with its cumulative constant. */
export interface Complex {
  readonly id: string;
  readonly formula: string;
  readonly label: string;
  readonly charge: number;
  readonly name: string;
  /** What it is made of, relative to the bare metal ion and the fully deprotonated family; protons may be negative. */
  readonly gives: Contribution;
  /** log10 of the cumulative formation constant at `ionicStrength` and `temperature`. */
  readonly logBeta: number;
  readonly uncertainty: number | null;
  /** kJ/mol, of the same cumulative reaction. */
  readonly enthalpy?: number;
  readonly ionicStrength: number;
  readonly temperature: number;
  readonly grade: 'A' | 'B' | 'C';
  readonly source: string;
  readonly obtained: 'published' | 'memory';
}

type Row = Omit<Complex, 'label'> & { readonly label?: string };

const COMPLEXES = new PartIndex((complexes.complexes as unknown as Row[]).map((row): Complex => ({ ...row, label: row.label ?? row.formula })));

/** Every complex whose parts are all present. @param present part keys. */
export function complexesOf(present: ReadonlySet<string>): Complex[] {
  return COMPLEXES.madeOf(present);
}
