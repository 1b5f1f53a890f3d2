import complexes from '../../data/complexes.json';
import type { Contribution } from './ion-library.js';

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

/** Complexes by the first of their parts, so that a solution is compared with few of them. */
const BY_FIRST_PART = new Map<string, { readonly complex: Complex; readonly others: readonly string[] }[]>();

for (const row of complexes.complexes as unknown as Row[]) {
  const [first, ...others] = partKeys(row.gives);
  BY_FIRST_PART.set(first!, [...(BY_FIRST_PART.get(first!) ?? []), { complex: { ...row, label: row.label ?? row.formula }, others }]);
}

/** Keys of metals, families and spectator ions of a contribution; metals first. */
function partKeys(gives: Contribution): string[] {
  return [...Object.keys(gives.metals ?? {}).map((key) => `metal ${key}`), ...Object.keys(gives.families ?? {}).map((key) => `family ${key}`), ...Object.keys(gives.ions ?? {}).map((key) => `ion ${key}`)];
}

/** Every complex whose parts are all present. */
export function complexesOf(metals: Iterable<string>, families: Iterable<string>, ions: Iterable<string>): Complex[] {
  const present = new Set<string>();
  for (const key of metals) present.add(`metal ${key}`);
  for (const key of families) present.add(`family ${key}`);
  for (const key of ions) present.add(`ion ${key}`);
  const found: Complex[] = [];
  for (const key of present) {
    for (const { complex, others } of BY_FIRST_PART.get(key) ?? []) if (others.every((other) => present.has(other))) found.push(complex);
  }
  return found;
}
