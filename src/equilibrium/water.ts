import water from '../../data/water.json';
import { exp, log, log10, LN10 } from '../quantities/reproducible-math.js';

/** Properties of pure liquid water at one temperature and 101.325 kPa. */
export interface Water {
  /** Celsius. */
  readonly temperature: number;
  /** Density, kg/m³. */
  readonly density: number;
  /** Static relative permittivity, dimensionless. */
  readonly permittivity: number;
  /** −log10 of the ion product on the molality scale. */
  readonly pKw: number;
  /** Debye–Hückel slope A for decadic logarithms, (kg/mol)^½. */
  readonly debyeHueckelSlope: number;
}

const ZERO_CELSIUS = 273.15;

/** Kelvin from Celsius. */
export function kelvin(celsius: number): number {
  return celsius + ZERO_CELSIUS;
}

/**
 * Density of air-free water, kg/m³: G. S. Kell, J. Chem. Eng. Data 20 (1975) 97, eq. 16, 0–100 °C at 101.325 kPa.
 * @param celsius temperature, 0 to 100.
 */
export function waterDensity(celsius: number): number {
  const { numerator, denominator } = water.density;
  let sum = 0;
  for (let power = numerator.length - 1; power >= 0; power--) sum = sum * celsius + numerator[power]!;
  return sum / (1 + denominator * celsius);
}

/**
 * Static relative permittivity of water: IAPWS R8-97 (Fernández et al., J. Phys. Chem. Ref. Data 26 (1997) 1125).
 * @param celsius temperature.
 * @param density kg/m³.
 */
export function waterPermittivity(celsius: number, density: number): number {
  const p = water.permittivity;
  const temperature = kelvin(celsius);
  const reducedDensity = density / p.criticalDensity;
  const inverseTemperature = p.criticalTemperature / temperature;
  const lnDensity = log(reducedDensity);
  const lnInverse = log(inverseTemperature);
  let g = 1;
  for (let k = 0; k < p.N.length; k++) g += p.N[k]! * exp(p.i[k]! * lnDensity + p.j[k]! * lnInverse);
  g += p.N12 * reducedDensity * exp(-1.2 * log(temperature / p.T12 - 1));
  const molarDensity = density / p.molarMass;
  const a = (p.avogadro * p.dipoleMoment * p.dipoleMoment * molarDensity * g) / (p.vacuumPermittivity * p.boltzmann * temperature);
  const b = (p.avogadro * p.polarizability * molarDensity) / (3 * p.vacuumPermittivity);
  return (1 + a + 5 * b + Math.sqrt(9 + 2 * a + 18 * b + a * a + 10 * a * b + 9 * b * b)) / (4 - 4 * b);
}

/**
 * −log10 Kw, molality scale: IAPWS R11-07 (Bandura & Lvov, J. Phys. Chem. Ref. Data 35 (2006) 15, eq. 4–8).
 * @param temperature kelvin, 273.15 to 1073.15.
 * @param density g/cm³.
 */
export function waterIonProduct(temperature: number, density: number): number {
  const c = water.ionProduct;
  const z = density * exp(c.alpha[0]! + c.alpha[1]! / temperature + (c.alpha[2]! / (temperature * temperature)) * exp((2 / 3) * log(density)));
  const liquid = log10(1 + z) - (z / (z + 1)) * density * (c.beta[0]! + c.beta[1]! / temperature + c.beta[2]! * density);
  const [g0, g1, g2, g3] = c.gamma as [number, number, number, number];
  const gas = g0 + (g1 + (g2 + g3 / temperature) / temperature) / temperature;
  return -2 * c.coordination * liquid + gas + 2 * log10(c.molarMass / 1000);
}

/**
 * Debye–Hückel slope for decadic logarithms on the molality scale, (kg/mol)^½:
 * A = e³ √(2 N_A ρ) / (8π (ε₀ ε k T)^1.5 ln 10).
 */
export function debyeHueckelSlope(celsius: number, density: number, permittivity: number): number {
  const { elementaryCharge: e, avogadro, boltzmann, vacuumPermittivity } = water.constants;
  const s = vacuumPermittivity * permittivity * boltzmann * kelvin(celsius);
  return (e * e * e * Math.sqrt(2 * avogadro * density)) / (8 * Math.PI * s * Math.sqrt(s) * LN10);
}

/** Properties already computed, so that a page of cards at one temperature computes them once. */
const KNOWN = new Map<number, Water>();
const MOST_KNOWN = 256;

/** All properties at one temperature. @param celsius 0 to 100; outside the fits of the sources are extrapolated. */
export function waterAt(celsius: number): Water {
  const known = KNOWN.get(celsius);
  if (known) return known;
  const density = waterDensity(celsius);
  const permittivity = waterPermittivity(celsius, density);
  const water: Water = {
    temperature: celsius,
    density,
    permittivity,
    pKw: waterIonProduct(kelvin(celsius), density / 1000),
    debyeHueckelSlope: debyeHueckelSlope(celsius, density, permittivity),
  };
  if (KNOWN.size >= MOST_KNOWN) KNOWN.clear();
  KNOWN.set(celsius, water);
  return water;
}

/** Molar mass of water, kg/mol. */
export const WATER_MOLAR_MASS = water.ionProduct.molarMass / 1000;
