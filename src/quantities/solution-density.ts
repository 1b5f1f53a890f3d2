import densities from '../../data/densities.json';
import { exp } from './reproducible-math.js';

/** One solute of a litre of solution. */
export interface SoluteOfLitre {
  /** mol/L. */
  readonly molarity: number;
  /** g/mol without water of crystallisation. */
  readonly anhydrousMass: number;
  /** Ions or molecules with their number per formula, cations first. */
  readonly particles: readonly { readonly id: string; readonly count: number }[];
}

/** How the volume that a solute takes up is known. */
export type VolumeBasis = 'fitted' | 'ion-volumes' | 'unknown';

export interface LitreOfSolution {
  /** kg of water in one litre, water of crystallisation included. */
  readonly water: number;
  /** In the order of the solutes. */
  readonly bases: readonly VolumeBasis[];
}

type Coefficients = readonly [number, number, number, number, number];
interface FittedSolute {
  readonly coefficients: Coefficients;
  readonly temperatureRange: readonly [number, number];
  readonly massFractionLimit: number;
}

const FITTED = new Map(
  (densities.solutes as unknown as (FittedSolute & { parts: string })[]).map(({ parts, ...fit }) => [parts, fit]),
);
const VOLUMES = new Map((densities.volumes as readonly { ion: string; volume: number }[]).map(({ ion, volume }) => [ion, volume]));
const MOST_ROUNDS = 50;
const TOLERANCE = 1e-13;

/**
 * Water in one litre of solution: V = m(water)/ρ(water) + Σ m(i)/ρ(i), with the apparent density of every solute by
 * Laliberté & Cooper, J. Chem. Eng. Data 49 (2004) 1141, eq. 10 (coefficients of Laliberté, ibid. 54 (2009) 1725), and
 * where there are none by the partial molar volumes of its ions at infinite dilution and 25 °C. A solute of unknown
 * volume is taken to have none. Fits are evaluated at the nearest temperature and mass fraction of their range.
 * @param celsius temperature.
 * @param waterDensity kg/m³ of pure water there.
 */
export function litreOfSolution(solutes: readonly SoluteOfLitre[], celsius: number, waterDensity: number): LitreOfSolution {
  const known = solutes.map((solute) => ({ solute, mass: (solute.molarity * solute.anhydrousMass) / 1000, fit: FITTED.get(partsKey(solute)), volume: ionVolume(solute) }));
  const mass = known.reduce((sum, solute) => sum + solute.mass, 0);
  const density = waterDensity / 1000;
  let water = density;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const fraction = mass / (mass + water);
    const occupied = known.reduce((sum, { solute, mass: own, fit, volume }) => sum + (fit ? own / apparentDensity(fit, fraction, celsius) : (solute.molarity * (volume ?? 0)) / 1000), 0);
    const next = Math.max(SMALLEST_WATER, density * (1 - occupied));
    const change = Math.abs(next - water);
    water = next;
    if (change < TOLERANCE) break;
  }
  return { water, bases: known.map(({ fit, volume }) => (fit ? 'fitted' : volume === undefined ? 'unknown' : 'ion-volumes')) };
}

/** kg/L below which no litre of solution is taken to fall, so that an impossible amount stays finite. */
const SMALLEST_WATER = 0.05;

function partsKey({ particles }: SoluteOfLitre): string {
  return particles.map(({ id, count }) => (count === 1 ? id : `${count} ${id}`)).join(' + ');
}

/** cm³/mol of the ions together; undefined when one is missing. */
function ionVolume({ particles }: SoluteOfLitre): number | undefined {
  let sum = 0;
  for (const { id, count } of particles) {
    const volume = VOLUMES.get(id);
    if (volume === undefined) return undefined;
    sum += count * volume;
  }
  return sum;
}

/** Apparent density of a solute, kg/L. @param fraction mass fraction of all solutes. */
function apparentDensity({ coefficients: [c0, c1, c2, c3, c4], temperatureRange, massFractionLimit }: FittedSolute, fraction: number, celsius: number): number {
  const t = Math.max(temperatureRange[0], Math.min(temperatureRange[1], celsius));
  const w = Math.min(fraction, massFractionLimit);
  return (((c0 * w + c1) * exp(1e-6 * (t + c4) * (t + c4))) / (w + c2 + c3 * t)) / 1000;
}
