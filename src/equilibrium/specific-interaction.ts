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

/**
 * Writes ln γ of every species. Above the ceiling of ionic strength the molalities are scaled down to it, so that a
 * concentration far outside the model gives bounded coefficients (the caller states that it is outside).
 * @returns ionic strength, mol/kg, not cut.
 */
export function activityCoefficients(table: InteractionTable, molality: Float64Array, lnGamma: Float64Array): number {
  const { charges, epsilon, slope, denominator, ceiling } = table;
  const count = molality.length;
  const ionicStrength = ionicStrengthOf(molality, charges);
  const scale = ionicStrength > ceiling ? ceiling / ionicStrength : 1;
  const term = debyeHueckelTerm(ionicStrength * scale, slope, denominator);
  for (let j = 0; j < count; j++) {
    let sum = 0;
    if (charges[j] !== 0) {
      const row = j * count;
      for (let k = 0; k < count; k++) sum += epsilon[row + k]! * molality[k]!;
    }
    lnGamma[j] = LN10 * (scale * sum - charges[j]! * charges[j]! * term);
  }
  return ionicStrength;
}

/**
 * ln a(H2O) that belongs to these activity coefficients by the Gibbs–Duhem equation:
 * ln a = −M(H2O) φ Σm, (φ − 1)Σm = ln10 · (−2 I D(I) + 2 ∫₀ᴵ D dI + ½ ΣΣ ε m m).
 */
export function lnWaterActivity(table: InteractionTable, molality: Float64Array): number {
  const { charges, epsilon, slope, denominator: b, ceiling } = table;
  const count = molality.length;
  const full = ionicStrengthOf(molality, charges);
  const scale = full > ceiling ? ceiling / full : 1;
  const ionicStrength = full * scale;
  let sum = 0;
  let pairs = 0;
  for (let j = 0; j < count; j++) {
    sum += molality[j]!;
    const row = j * count;
    let interactions = 0;
    for (let k = 0; k < count; k++) interactions += epsilon[row + k]! * molality[k]!;
    pairs += interactions * molality[j]!;
  }
  const root = Math.sqrt(ionicStrength);
  const integral = b > 0 ? 2 * slope * (ionicStrength / (2 * b) - root / (b * b) + log(1 + b * root) / (b * b * b)) : 0;
  const excess = LN10 * (2 * integral - 2 * ionicStrength * debyeHueckelTerm(ionicStrength, slope, b) + (scale * scale * pairs) / 2);
  return -WATER_MOLAR_MASS * (sum + excess);
}
