import conventions from '../../data/conventions.json';
import type { Prediction } from './prediction.js';

/** Distance from the neutral point, in pH, within which a solution counts as neutral. */
export const NEUTRAL_BAND = conventions.classification.neutralBand;

/**
 * Class of a pH against the neutral point of its temperature, and whether the uncertainty leaves it undecided.
 * @param uncertainty standard, pH units.
 */
export function classify(pH: number, neutralPH: number, uncertainty: number): Pick<Prediction, 'classification' | 'decided'> {
  const distance = pH - neutralPH;
  const classification = Math.abs(distance) <= NEUTRAL_BAND ? 'neutral' : distance < 0 ? 'acidic' : 'basic';
  return { classification, decided: Math.abs(Math.abs(distance) - NEUTRAL_BAND) > uncertainty };
}
