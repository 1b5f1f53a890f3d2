import air from '../../data/air.json';
import { exp, log } from '../quantities/reproducible-math.js';
import { kelvin, type Water } from './water.js';

const KILOPASCAL_PER_ATMOSPHERE = 101.325;

/** CO2 of dry room air, mol/mol, unless the page states another. */
export const ROOM_AIR_CARBON_DIOXIDE = air.carbonDioxide.roomAir;
/** Key of the acid–base family that the gas feeds. */
export const CARBON_DIOXIDE_FAMILY = air.carbonDioxide.family;

/**
 * ln of the activity (molality scale) of CO2 dissolved in equilibrium with moist air at 101.325 kPa:
 * solubility of R. F. Weiss, Mar. Chem. 2 (1974) 203, eq. 12 at zero salinity; vapour pressure of water by the Magnus
 * form of Alduchov & Eskridge, J. Appl. Meteorol. 35 (1996) 601.
 * @param water at the temperature wanted.
 * @param moleFraction CO2 in dry air, mol/mol, > 0.
 */
export function lnCarbonDioxideActivity(water: Water, moleFraction: number): number {
  const { a, b, c } = air.carbonDioxide.solubility;
  const hundredths = kelvin(water.temperature) / 100;
  const lnSolubility = a + b / hundredths + c * log(hundredths);
  const vapour = air.waterVapour.a * exp((air.waterVapour.b * water.temperature) / (water.temperature + air.waterVapour.c));
  const partialPressure = (moleFraction * (air.pressure - vapour)) / KILOPASCAL_PER_ATMOSPHERE;
  return lnSolubility + log(partialPressure) - log(water.density / 1000);
}

