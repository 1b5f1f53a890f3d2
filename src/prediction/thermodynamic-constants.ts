import conventions from '../../data/conventions.json';
import { atTemperature } from '../equilibrium/temperature.js';
import { waterAt } from '../equilibrium/water.js';
import { atZeroIonicStrength } from '../equilibrium/zero-ionic-strength.js';
import { LN10 } from '../quantities/reproducible-math.js';
import type { Complex } from '../substances/complex-library.js';
import type { Solid } from '../substances/solid-library.js';
import { familyOf, type AcidBaseFamily, type MetalIon } from '../substances/ion-library.js';

/** A constant brought to the solution's temperature and to zero ionic strength. */
export interface ConstantHere {
  /** log10 K of the reaction; pKa is its negative. */
  readonly log10K: number;
  /** Standard uncertainty of log10 K here. */
  readonly uncertainty: number;
  /** False when the source states no uncertainty and that of the grade is taken. */
  readonly stated: boolean;
  /** True when the temperature differs from that of the source and no enthalpy is known. */
  readonly enthalpyUnknown: boolean;
}

const GRADES = conventions.gradeUncertainty;
const PER_KELVIN = conventions.temperatureUncertainty.withoutEnthalpy;

/** Constants already brought to a temperature; a page uses few temperatures. */
const ACIDS = new WeakMap<AcidBaseFamily, Map<number, readonly ConstantHere[]>>();
const METALS = new WeakMap<MetalIon, Map<number, readonly ConstantHere[]>>();
const MOST_TEMPERATURES = 64;

/** log10 Ka of every step of a family, the most acid first. */
export function acidConstants(family: AcidBaseFamily, celsius: number): readonly ConstantHere[] {
  return remembered(ACIDS, family, celsius, () =>
    family.steps.map((step, index) => {
      const acid = family.states[index]!.charge;
      const base = family.states[index + 1]!.charge;
      const log10K = atZeroIonicStrength(-step.pKa, base * base + 1 - acid * acid, step.ionicStrength);
      return moved(log10K, step, celsius, GRADES[step.grade], 0);
    }),
  );
}

/**
 * log10 *β of every hydrolysis species of a metal ion. Where the enthalpy is unknown, binding of OH⁻ is taken as
 * athermal, so that *β moves with the ion product of water: known first steps have 43 to 70 kJ/mol, water has 56.
 */
export function hydrolysisConstants(metal: MetalIon, celsius: number): readonly ConstantHere[] {
  return remembered(METALS, metal, celsius, () =>
    metal.hydrolysis.map((species) => {
      const chargeSquares = species.charge * species.charge + species.hydroxide - species.metal * metal.charge * metal.charge;
      const log10K = atZeroIonicStrength(species.logK, chargeSquares, species.ionicStrength);
      const first = species.metal === 1 && species.hydroxide === 1;
      const athermal = -species.hydroxide * (waterAt(celsius).pKw - waterAt(species.temperature).pKw);
      return moved(log10K, species, celsius, first ? GRADES.firstHydrolysis : GRADES.furtherHydrolysis, athermal);
    }),
  );
}

/**
 * log10 β of a complex. Where the enthalpy is unknown, binding of the ligand in the state of protonation in which the
 * complex holds it is taken as athermal.
 * @param chargeSquares Σ z² of the complex minus Σ z² of its parts, free protons included.
 */
export function complexConstant(complex: Complex, chargeSquares: number, celsius: number): ConstantHere {
  const log10K = atZeroIonicStrength(complex.logBeta, chargeSquares, complex.ionicStrength);
  return moved(log10K, complex, celsius, GRADES[`complex${complex.grade}`], protonationShift(complex, celsius));
}

/** log10 K of dissolution of a solid. Where the enthalpy is unknown, K counted with OH⁻ instead of H⁺ is held. */
export function solubilityConstant(solid: Solid, celsius: number): ConstantHere {
  return moved(solid.logK, solid, celsius, GRADES[`solid${solid.grade}`], -protonationShift(solid, celsius));
}

/** Change of log10 K from the reference temperature that the protons of a complex alone bring. */
function protonationShift({ gives, temperature }: Pick<Complex, 'gives' | 'temperature'>, celsius: number): number {
  const protons = gives.protons ?? 0;
  if (protons <= 0 || !gives.families) return protons * (waterAt(celsius).pKw - waterAt(temperature).pKw);
  const [key, units] = Object.entries(gives.families)[0]!;
  const family = familyOf(key);
  const here = acidConstants(family, celsius);
  const there = acidConstants(family, temperature);
  let shift = 0;
  for (let proton = 0; proton < protons; proton++) {
    // Each unit takes its most basic site first.
    const step = family.steps.length - 1 - Math.floor(proton / units);
    if (step >= 0) shift += there[step]!.log10K - here[step]!.log10K;
  }
  return shift;
}

function remembered<Key extends object>(store: WeakMap<Key, Map<number, readonly ConstantHere[]>>, key: Key, celsius: number, compute: () => ConstantHere[]): readonly ConstantHere[] {
  let byTemperature = store.get(key);
  if (!byTemperature) {
    byTemperature = new Map();
    store.set(key, byTemperature);
  }
  const known = byTemperature.get(celsius);
  if (known) return known;
  if (byTemperature.size >= MOST_TEMPERATURES) byTemperature.clear();
  const constants = compute();
  byTemperature.set(celsius, constants);
  return constants;
}

interface Published {
  readonly temperature: number;
  readonly enthalpy?: number;
  readonly heatCapacity?: number;
  readonly uncertainty: number | null;
}

/** @param athermal change of log10 K to take where the enthalpy is unknown. */
function moved(log10K: number, published: Published, celsius: number, graded: number, athermal: number): ConstantHere {
  const { temperature, enthalpy, heatCapacity, uncertainty } = published;
  const held = enthalpy === undefined && celsius !== temperature;
  const here = held ? log10K + athermal : atTemperature({ lnK: log10K * LN10, temperature, enthalpy, heatCapacity }, celsius) / LN10;
  const own = uncertainty ?? graded;
  const drift = held ? PER_KELVIN * Math.abs(celsius - temperature) : 0;
  return { log10K: here, uncertainty: Math.sqrt(own * own + drift * drift), stated: uncertainty !== null, enthalpyUnknown: held };
}
