import { addTo, atomsOf, type Atoms } from './composition.js';
import { families, ions, metals, read, type Gives } from './read.js';

export interface Complex {
  id: string; formula: string; label?: string; charge: number; name: string; gives: Gives;
  logBeta: number; uncertainty: number | null; reaction?: string; publishedLogK?: number; ionicStrength: number; grade: string;
}
export interface Solid {
  id: string; formula: string; name: string; gives: Gives; water: number; logK: number; forms: string;
  uncertainty: number | null; reaction?: string; publishedLogK?: number;
}
export interface Solubility { formula: string; gramsPer100gWater: number; temperature: number }
export interface Gas { id: string; species: string; henry: number; temperatureDependence?: number }
export interface DensitySolute {
  formula: string; parts: string; coefficients: [number, number, number, number, number];
  temperatureRange: [number, number]; massFractionLimit: number;
}

export const { complexes, choices } = read<{ complexes: Complex[]; choices: Record<string, string> }>('complexes.json');
export const { solids, solubilities } = read<{ solids: Solid[]; solubilities: Solubility[] }>('solids.json');
export const gases = read<{ gases: Gas[] }>('gases.json').gases;
export const densities = read<{ solutes: DensitySolute[]; volumes: { ion: string; volume: number }[] }>('densities.json');

export const familyByKey = new Map(families.map((family) => [family.key, family]));
export const metalByKey = new Map(metals.map((metal) => [metal.key, metal]));
export const ionById = new Map(ions.map((ion) => [ion.id, ion]));

/** Charge and atoms of all components and protons together; throws on a component that the data do not know. */
export function sumOf({ metals: centres = {}, families: units = {}, ions: free = {}, protons = 0 }: Gives): { charge: number; atoms: Atoms } {
  const atoms = new Map([['H', protons]]);
  let charge = protons;
  const pieces = [
    ...Object.entries(centres).map(([key, count]) => ({ key, count, piece: metalByKey.get(key) })),
    ...Object.entries(units).map(([key, count]) => ({ key, count, piece: familyByKey.get(key)?.states.at(-1) })),
    ...Object.entries(free).map(([key, count]) => ({ key, count, piece: ionById.get(key)?.spectator ? ionById.get(key) : undefined })),
  ];
  for (const { key, count, piece } of pieces) {
    if (!piece) throw new Error(`unknown component: ${key}`);
    charge += piece.charge * count;
    addTo(atoms, atomsOf(piece.formula), count);
  }
  return { charge, atoms };
}

/** The components without their numbers: what shares one set of constants. */
export function pairOf({ metals: centres = {}, families: units = {}, ions: free = {} }: Gives): string {
  return [...Object.keys(centres), ...Object.keys(units), ...Object.keys(free)].join(' ');
}

/** Particles of a text such as "2 Na+ + SO4-2". */
export function particlesOf(parts: string): { id: string; count: number }[] {
  return parts.split(' + ').map((part) => {
    const [, count, id] = /^(?:(\d+) )?(\S+)$/.exec(part)!;
    return { id: id!, count: Number(count ?? 1) };
  });
}
