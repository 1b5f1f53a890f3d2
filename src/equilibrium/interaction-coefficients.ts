import activity from '../../data/activity.json';
import conventions from '../../data/conventions.json';
import type { InteractionTable } from './chemical-system.js';

interface Estimate {
  readonly value: number | null;
  readonly spread: number | null;
}
interface Coefficient {
  readonly value: number;
  readonly uncertainty: number;
}
/** Charge at which the tabulated estimates end; larger charges take the last one. */
const LARGEST_CHARGE = 4;

const NUMBER_OF = new Map<string, number>();
const COEFFICIENTS = new Map<number, Coefficient>();
const STRIDE = 4096;
function numberOf(id: string): number {
  let number = NUMBER_OF.get(id);
  if (number === undefined) {
    number = NUMBER_OF.size;
    NUMBER_OF.set(id, number);
  }
  return number;
}
for (const [cation, anion, value, uncertainty] of activity.coefficients as unknown as (readonly [string, string, number, number])[]) {
  COEFFICIENTS.set(numberOf(cation) * STRIDE + numberOf(anion), { value, uncertainty });
}

const ESTIMATES: readonly (readonly Estimate[])[] = Array.from({ length: LARGEST_CHARGE + 1 }, (_, cation) =>
  Array.from({ length: LARGEST_CHARGE + 1 }, (_unused, anion) => {
    const table = activity.estimates as unknown as Record<string, Estimate>;
    return table[`${cation}:${anion}`] ?? { value: null, spread: null };
  }),
);

/** Ionic strength, mol/kg, to which the coefficients are published as holding. */
export const IONIC_STRENGTH_LIMIT = conventions.activityModel.validTo;

/**
 * Interaction coefficients of a list of species by id and charge. Pairs without a published coefficient take the
 * estimate of their charge type, or zero where there is none. Coefficients of 25 °C are used at all temperatures.
 * @param slope Debye–Hückel slope at the temperature.
 */
export function interactionTable(species: readonly { readonly id: string; readonly charge: number }[], slope: number): InteractionTable {
  const count = species.length;
  const charges = new Float64Array(count);
  const numbers = new Int32Array(count);
  species.forEach(({ id, charge }, index) => {
    charges[index] = charge;
    numbers[index] = NUMBER_OF.get(id) ?? -1;
  });
  const epsilon = new Float64Array(count * count);
  for (let cation = 0; cation < count; cation++) {
    if (!(charges[cation]! > 0)) continue;
    for (let anion = 0; anion < count; anion++) {
      if (!(charges[anion]! < 0)) continue;
      const value = coefficientOf(numbers[cation]!, numbers[anion]!)?.value ?? estimateOf(charges[cation]!, charges[anion]!).value ?? 0;
      epsilon[cation * count + anion] = value;
      epsilon[anion * count + cation] = value;
    }
  }
  return { charges, epsilon, pairs: interactingPairs(charges, epsilon), slope, denominator: activity.denominator, ceiling: conventions.activityModel.heldAbove };
}

/** The pairs of cation and anion whose coefficient is not zero. @param epsilon row-major, symmetric. */
export function interactingPairs(charges: Float64Array, epsilon: Float64Array): InteractionTable['pairs'] {
  const count = charges.length;
  const cations: number[] = [];
  const anions: number[] = [];
  const values: number[] = [];
  for (let cation = 0; cation < count; cation++) {
    for (let anion = 0; anion < count; anion++) {
      const value = epsilon[cation * count + anion]!;
      if (!(charges[cation]! > 0) || value === 0) continue;
      cations.push(cation);
      anions.push(anion);
      values.push(value);
    }
  }
  return { cation: Int32Array.from(cations), anion: Int32Array.from(anions), value: Float64Array.from(values) };
}

/** True when a published coefficient exists for the pair. */
export function hasCoefficient(cation: string, anion: string): boolean {
  return coefficientOf(NUMBER_OF.get(cation) ?? -1, NUMBER_OF.get(anion) ?? -1) !== undefined;
}

/** Standard uncertainty of the coefficient of a pair, kg/mol: published, or the spread of its charge type. */
export function coefficientUncertainty(cation: { id: string; charge: number }, anion: { id: string; charge: number }): number {
  const published = coefficientOf(NUMBER_OF.get(cation.id) ?? -1, NUMBER_OF.get(anion.id) ?? -1);
  return published?.uncertainty ?? estimateOf(cation.charge, anion.charge).spread ?? conventions.activityModel.fallbackSpread;
}

function coefficientOf(cation: number, anion: number): Coefficient | undefined {
  return cation < 0 || anion < 0 ? undefined : COEFFICIENTS.get(cation * STRIDE + anion);
}

function estimateOf(cation: number, anion: number): Estimate {
  return ESTIMATES[Math.min(cation, LARGEST_CHARGE)]![Math.min(-anion, LARGEST_CHARGE)]!;
}
