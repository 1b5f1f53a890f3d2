import { exp, LN10, log } from '../quantities/reproducible-math.js';

/** In place of a component's column: a species of none (H⁺, OH⁻, those held), and one of several. */
export const NONE = -2;
export const MIXED = -1;

/** The arrays of the balances that a starting point is made from and written to. */
export interface BalanceArrays {
  /** Number of unknowns; the last is the proton. */
  readonly size: number;
  /** Row-major species × unknowns. */
  readonly numbers: Float64Array;
  /** Protons of every species. */
  readonly protons: Float64Array;
  /** ln of molality at unit activities. */
  readonly exponents: Float64Array;
  /** Column of the only component in each species, or NONE, or MIXED. */
  readonly only: Int32Array;
  readonly lnTotals: Float64Array;
  /** Molality of the species that take part in no reaction, 0 for all others. */
  readonly fixed: Float64Array;
  /** Written: mol/kg. */
  readonly molality: Float64Array;
  /** Written: ln of the activities of the components. */
  readonly unknowns: Float64Array;
  /** Three arrays of the size of the unknowns, free to use. */
  readonly scratch: readonly [Float64Array, Float64Array, Float64Array];
}

/** Steps of the bisection that finds the starting pH, between the limits below. */
const STEPS = 10;
const LOWEST_PH = -3;
const HIGHEST_PH = 18;

/**
 * Takes every component by itself, at the pH where the proton balance of that simpler mixture holds.
 * @returns ln a(H⁺).
 */
export function startingPoint(arrays: BalanceArrays, protonTotal: number): number {
  let low = LOWEST_PH;
  let high = HIGHEST_PH;
  for (let step = 0; step < STEPS; step++) {
    const middle = (low + high) / 2;
    // More protons bound than there are: the real pH is higher.
    if (simpleProtonBalance(arrays, -middle * LN10) > protonTotal) low = middle;
    else high = middle;
  }
  const y = (-(low + high) / 2) * LN10;
  simpleProtonBalance(arrays, y);
  return y;
}

/** Mean protonation of every component over the species that hold it alone. */
export function meanProtonation({ size, numbers, protons, molality }: BalanceArrays): Float64Array {
  const mean = new Float64Array(size);
  for (let i = 0; i < size - 1; i++) {
    let bound = 0;
    let total = 0;
    for (let j = 0; j < molality.length; j++) {
      const number = numbers[j * size + i]!;
      if (number === 0) continue;
      bound += molality[j]! * protons[j]!;
      total += molality[j]! * number;
    }
    mean[i] = total > 0 ? bound / total : 0;
  }
  return mean;
}

/** Lowers the activities of the components of every complex that by itself would hold more of one than there is. */
export function boundMixedSpecies({ size, numbers, exponents, only, lnTotals, unknowns }: BalanceArrays): void {
  const last = size - 1;
  for (let j = 0; j < only.length; j++) {
    if (only[j] !== MIXED) continue;
    let exponent = exponents[j]!;
    let most = Infinity;
    let units = 0;
    for (let i = 0; i <= last; i++) {
      const number = numbers[j * size + i]!;
      exponent += number * unknowns[i]!;
      if (i === last || number === 0) continue;
      most = Math.min(most, lnTotals[i]! - log(number));
      units += number;
    }
    const excess = (exponent - most) / units;
    if (excess <= 0) continue;
    for (let i = 0; i < last; i++) if (numbers[j * size + i]! > 0) unknowns[i] = unknowns[i]! - excess;
  }
}

/**
 * Proton balance at one pH with every component by itself; leaves molalities and unknowns. Mononuclear species share a
 * component in closed form; a polynuclear one then bounds the activity so that it alone does not exceed the total.
 */
function simpleProtonBalance({ size, numbers, protons, exponents, only, lnTotals, fixed, molality, unknowns, scratch }: BalanceArrays, y: number): number {
  const last = size - 1;
  const count = molality.length;
  const [largest, bound, sums] = scratch;
  largest.fill(-Infinity);
  bound.fill(Infinity);
  sums.fill(0);
  for (let j = 0; j < count; j++) {
    const i = only[j]!;
    if (i < 0) continue;
    const number = numbers[j * size + i]!;
    const exponent = exponents[j]! + protons[j]! * y;
    if (number === 1) largest[i] = Math.max(largest[i]!, exponent);
    else bound[i] = Math.min(bound[i]!, (lnTotals[i]! - log(number) - exponent) / number);
  }
  for (let j = 0; j < count; j++) {
    const i = only[j]!;
    if (i >= 0 && numbers[j * size + i] === 1) sums[i] = sums[i]! + exp(exponents[j]! + protons[j]! * y - largest[i]!);
  }
  for (let i = 0; i < last; i++) unknowns[i] = Math.min(lnTotals[i]! - log(sums[i]!) - largest[i]!, bound[i]!);
  let balance = 0;
  for (let j = 0; j < count; j++) {
    const i = only[j]!;
    molality[j] = fixed[j]!;
    if (i === MIXED || fixed[j]! > 0) continue;
    const number = i >= 0 ? numbers[j * size + i]! : 0;
    molality[j] = exp(exponents[j]! + protons[j]! * y + (i >= 0 ? number * unknowns[i]! : 0));
    balance += protons[j]! * molality[j]!;
  }
  return balance;
}
