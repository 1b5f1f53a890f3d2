import conventions from '../../data/conventions.json';
import { atTemperature } from '../equilibrium/temperature.js';
import { atZeroIonicStrength } from '../equilibrium/zero-ionic-strength.js';
import { LN10 } from '../quantities/reproducible-math.js';
import type { AcidBaseFamily, MetalIon } from '../substances/ion-library.js';

/** A constant brought to the solution's temperature and to zero ionic strength. */
export interface ConstantHere {
  /** log10 K of the reaction; pKa is its negative. */
  readonly log10K: number;
  /** Standard uncertainty of log10 K here. */
  readonly uncertainty: number;
  /** False when the source states no uncertainty and that of the grade is taken. */
  readonly stated: boolean;
  /** True when the temperature differs from that of the source and no enthalpy is known. */
  readonly heldAtTemperature: boolean;
}

const GRADES = conventions.gradeUncertainty;
const PER_KELVIN = conventions.temperatureUncertainty.withoutEnthalpy;

/** Constants of one family or metal at one temperature, the last asked for. */
const ACIDS = new WeakMap<AcidBaseFamily, Remembered>();
const METALS = new WeakMap<MetalIon, Remembered>();
interface Remembered {
  readonly celsius: number;
  readonly constants: readonly ConstantHere[];
}

/** log10 Ka of every step of a family, the most acid first. */
export function acidConstants(family: AcidBaseFamily, celsius: number): readonly ConstantHere[] {
  return remembered(ACIDS, family, celsius, () =>
    family.steps.map((step, index) => {
      const acid = family.states[index]!.charge;
      const base = family.states[index + 1]!.charge;
      const log10K = atZeroIonicStrength(-step.pKa, base * base + 1 - acid * acid, step.ionicStrength);
      return moved(log10K, step.temperature, step.enthalpy, step.heatCapacity, celsius, step.uncertainty, GRADES[step.grade]);
    }),
  );
}

/** log10 *β of every hydrolysis species of a metal ion. */
export function hydrolysisConstants(metal: MetalIon, celsius: number): readonly ConstantHere[] {
  return remembered(METALS, metal, celsius, () =>
    metal.hydrolysis.map((species) => {
      const chargeSquares = species.charge * species.charge + species.hydroxide - species.metal * metal.charge * metal.charge;
      const log10K = atZeroIonicStrength(species.logK, chargeSquares, species.ionicStrength);
      const first = species.metal === 1 && species.hydroxide === 1;
      return moved(log10K, species.temperature, species.enthalpy, undefined, celsius, species.uncertainty, first ? GRADES.firstHydrolysis : GRADES.furtherHydrolysis);
    }),
  );
}

function remembered<Key extends object>(store: WeakMap<Key, Remembered>, key: Key, celsius: number, compute: () => ConstantHere[]): readonly ConstantHere[] {
  const known = store.get(key);
  if (known?.celsius === celsius) return known.constants;
  const constants = compute();
  store.set(key, { celsius, constants });
  return constants;
}

function moved(
  log10K: number,
  reference: number,
  enthalpy: number | undefined,
  heatCapacity: number | undefined,
  celsius: number,
  uncertainty: number | null,
  graded: number,
): ConstantHere {
  const lnK = atTemperature({ lnK: log10K * LN10, temperature: reference, enthalpy, heatCapacity }, celsius);
  const held = enthalpy === undefined && celsius !== reference;
  const own = uncertainty ?? graded;
  const drift = held ? PER_KELVIN * Math.abs(celsius - reference) : 0;
  return { log10K: lnK / LN10, uncertainty: Math.sqrt(own * own + drift * drift), stated: uncertainty !== null, heldAtTemperature: held };
}
