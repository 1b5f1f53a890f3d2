import water from '../../data/water.json';
import { log } from '../quantities/reproducible-math.js';
import { kelvin } from './water.js';

const R = water.constants.molarGasConstant;

/** A reaction's thermodynamic constant and what moves it to another temperature. */
export interface ReactionConstant {
  /** Natural logarithm of K at `temperature`. */
  readonly lnK: number;
  /** Celsius. */
  readonly temperature: number;
  /** Reaction enthalpy, kJ/mol; undefined when not known. */
  readonly enthalpy?: number | undefined;
  /** Reaction heat capacity at constant pressure, J/(mol K); undefined when not known. */
  readonly heatCapacity?: number | undefined;
}

/**
 * ln K at another temperature, with ΔrCp° taken as constant (Clarke & Glew, Trans. Faraday Soc. 62 (1966) 539, first
 * two terms):
 * ln K(T) = ln K(θ) + (ΔH/R)(1/θ − 1/T) + (ΔCp/R)(θ/T − 1 + ln(T/θ)).
 *
 * Where the enthalpy is unknown K is held; the caller has to say so.
 * @param celsius target temperature.
 */
export function atTemperature(constant: ReactionConstant, celsius: number): number {
  if (celsius === constant.temperature) return constant.lnK;
  const target = kelvin(celsius);
  const reference = kelvin(constant.temperature);
  let lnK = constant.lnK;
  if (constant.enthalpy !== undefined) lnK += ((constant.enthalpy * 1000) / R) * (1 / reference - 1 / target);
  if (constant.heatCapacity !== undefined) lnK += (constant.heatCapacity / R) * (reference / target - 1 + log(target / reference));
  return lnK;
}
