import solidsData from '../../data/solids.json';
import { LN10 } from '../quantities/reproducible-math.js';
import type { SolidDefinition } from '../equilibrium/chemical-system.js';
import type { EquilibriumState } from '../equilibrium/solver.js';
import type { Dissolved } from './dissolve.js';
import type { SolidStatus } from './prediction.js';
import type { SolvedSolution } from './solved-solution.js';
import type { SolidMeaning } from './meanings.js';

/** Saturation index below which a solid is not worth naming. */
const LOWEST_INDEX = -3;

/** The solids that may form while a beaker is watched, and those that were put in. */
export function formingSolids(solids: readonly SolidMeaning[], { solutes }: Pick<Dissolved, 'solutes'>): SolidMeaning[] {
  const putIn = new Set(solutes.map(({ read }) => withoutWater(read.substance.formula)));
  return solids.filter(({ solid }) => solid.forms === 'readily' || putIn.has(withoutWater(solid.formula)));
}

/** Every solid that the composition can form, most supersaturated first. */
export function solidStatuses({ model, state }: SolvedSolution): SolidStatus[] {
  const formed = new Map((model.system.solids ?? []).map((definition, index) => [definition.id, state.solidAmounts[index]!]));
  return model.solids
    .map(({ solid, constant, definition }) => {
      const amount = formed.get(solid.id) ?? 0;
      return {
        id: solid.id,
        formula: solid.formula,
        name: solid.name,
        saturationIndex: amount > 0 ? 0 : saturationIndex(definition, state),
        uncertainty: constant.uncertainty,
        forms: solid.forms,
        ...(amount > 0 ? { amount } : {}),
      };
    })
    .filter(({ saturationIndex: index }) => index > LOWEST_INDEX)
    .sort((a, b) => (b.amount ?? 0) - (a.amount ?? 0) || b.saturationIndex - a.saturationIndex);
}

/** log10 of ion product over solubility product. */
function saturationIndex(definition: SolidDefinition, state: EquilibriumState): number {
  let sum = definition.protons * -state.pH * LN10 + definition.water * state.lnWaterActivity - definition.lnK;
  for (const [component, number] of definition.stoichiometry) sum += number * state.lnActivity[component]!;
  return sum / LN10;
}

/** g of anhydrous salt in 100 g of water at 20 °C, where a handbook states it. */
const SOLUBILITIES = new Map((solidsData.solubilities as readonly { formula: string; gramsPer100gWater: number; temperature: number }[]).map((row) => [withoutWater(row.formula), row]));

/** A solute of which more was put in than water holds. */
export interface OverSolubility {
  readonly formula: string;
  readonly putIn: number;
  readonly soluble: number;
  readonly temperature: number;
}

/** Solutes above the handbook solubility, as g per 100 g of water. */
export function overSolubility({ solutes }: Dissolved): OverSolubility[] {
  return solutes.flatMap(({ read, molality }) => {
    const row = SOLUBILITIES.get(withoutWater(read.substance.formula));
    const putIn = (molality * read.substance.anhydrousMass) / 10;
    return row && putIn > row.gramsPer100gWater ? [{ formula: read.substance.formula, putIn, soluble: row.gramsPer100gWater, temperature: row.temperature }] : [];
  });
}

function withoutWater(formula: string): string {
  return formula.split('·')[0]!;
}
