import { Decimal } from './decimal.js';

/** What the density of a solution depends on. */
export interface DissolvedAmounts {
  /** Celsius. */
  readonly temperature: number;
  /** kg/m³ of pure water at that temperature. */
  readonly waterDensity: number;
}

/** Kilograms of water in one litre of solution. */
export type WaterContent = (dissolved: DissolvedAmounts) => Decimal;

/**
 * Takes one litre of solution to hold as much water as one litre of water: exact at infinite dilution, and low in
 * molality by the volume of the solutes, about 2 % for 1 mol/L NaCl.
 */
export const dilutedWaterContent: WaterContent = ({ waterDensity }) => new Decimal(waterDensity).div(1000);
