import { log, LN10 } from '../quantities/reproducible-math.js';
import type { InteractionTable } from './chemical-system.js';
import { WATER_MOLAR_MASS } from './water.js';

/**
 * Specific ion interaction theory (Brønsted–Guggenheim–Scatchard), as in the NEA-TDB guideline TDB-2, eq. B.4:
 * log10 γj = −zj² A√I/(1 + B√I) + Σk ε(j,k) mk.
 */
export function debyeHueckelTerm(ionicStrength: number, slope: number, denominator: number): number {
  const root = Math.sqrt(ionicStrength);
  return (slope * root) / (1 + denominator * root);
}

/** dD/dI of {@link debyeHueckelTerm}; infinite at I = 0, where it is never needed. */
export function debyeHueckelDerivative(ionicStrength: number, slope: number, denominator: number): number {
  const root = Math.sqrt(ionicStrength);
  const sum = 1 + denominator * root;
  return slope / (2 * root * sum * sum);
}

/** I = ½ Σ m z², mol/kg. */
export function ionicStrengthOf(molality: Float64Array, charges: Float64Array): number {
  let sum = 0;
  for (let j = 0; j < molality.length; j++) sum += molality[j]! * charges[j]! * charges[j]!;
  return sum / 2;
}

/** Ionic strength and what the charged pairs add up to, at the molalities scaled to the ceiling. */
interface Medium {
  /** mol/kg, not cut. */
  readonly ionicStrength: number;
  /** Factor on all molalities that brings the ionic strength down to the ceiling; 1 below it. */
  readonly scale: number;
}

function mediumOf({ charges, ceiling }: InteractionTable, molality: Float64Array): Medium {
  const ionicStrength = ionicStrengthOf(molality, charges);
  return { ionicStrength, scale: ionicStrength > ceiling ? ceiling / ionicStrength : 1 };
}

/**
 * Writes ln γ of every species. Above the ceiling of ionic strength the molalities are scaled down to it, so that a
 * concentration far outside the model gives bounded coefficients (the caller states that it is outside).
 * @returns ionic strength, mol/kg, not cut.
 */
export function activityCoefficients(table: InteractionTable, molality: Float64Array, lnGamma: Float64Array): number {
  const { charges, pairs, slope, denominator } = table;
  const { ionicStrength, scale } = mediumOf(table, molality);
  const term = debyeHueckelTerm(ionicStrength * scale, slope, denominator);
  for (let j = 0; j < molality.length; j++) lnGamma[j] = -LN10 * charges[j]! * charges[j]! * term;
  for (let pair = 0; pair < pairs.value.length; pair++) {
    const cation = pairs.cation[pair]!;
    const anion = pairs.anion[pair]!;
    const value = LN10 * scale * pairs.value[pair]!;
    lnGamma[cation] = lnGamma[cation]! + value * molality[anion]!;
    lnGamma[anion] = lnGamma[anion]! + value * molality[cation]!;
  }
  return ionicStrength;
}

/**
 * ln a(H2O) that belongs to these activity coefficients by the Gibbs–Duhem equation:
 * ln a = −M(H2O) φ Σm, (φ − 1)Σm = ln10 · (−2 I D(I) + 2 ∫₀ᴵ D dI + Σ ε m(cation) m(anion)).
 */
export function lnWaterActivity(table: InteractionTable, molality: Float64Array): number {
  const { pairs, slope, denominator: b } = table;
  const medium = mediumOf(table, molality);
  const ionicStrength = medium.ionicStrength * medium.scale;
  let sum = 0;
  for (let j = 0; j < molality.length; j++) sum += molality[j]!;
  let interactions = 0;
  for (let pair = 0; pair < pairs.value.length; pair++) interactions += pairs.value[pair]! * molality[pairs.cation[pair]!]! * molality[pairs.anion[pair]!]!;
  const root = Math.sqrt(ionicStrength);
  const integral = b > 0 ? 2 * slope * (ionicStrength / (2 * b) - root / (b * b) + log(1 + b * root) / (b * b * b)) : 0;
  const excess = LN10 * (2 * integral - 2 * ionicStrength * debyeHueckelTerm(ionicStrength, slope, b) + medium.scale * medium.scale * interactions);
  return -WATER_MOLAR_MASS * (sum + excess);
}
