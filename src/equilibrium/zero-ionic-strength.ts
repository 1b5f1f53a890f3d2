import activity from '../../data/activity.json';
import { debyeHueckelTerm } from './specific-interaction.js';
import { waterAt } from './water.js';

const REFERENCE = waterAt(activity.temperature);

/**
 * Moves a concentration constant that was measured at an ionic strength to zero ionic strength, with the Debye–Hückel
 * term of the activity model: log10 K° = log10 K − Δz² D(I) (Guggenheim & Turgeon, Trans. Faraday Soc. 51 (1955) 747).
 * The medium's interaction coefficients are not known for most of these constants and are left out.
 * @param log10K decadic logarithm of the constant of the reaction as written.
 * @param chargeSquares Σ z² of the products minus Σ z² of the reactants.
 * @param ionicStrength mol/kg at which the constant holds.
 */
export function atZeroIonicStrength(log10K: number, chargeSquares: number, ionicStrength: number): number {
  if (ionicStrength === 0) return log10K;
  return log10K - chargeSquares * debyeHueckelTerm(ionicStrength, REFERENCE.debyeHueckelSlope, activity.denominator);
}
