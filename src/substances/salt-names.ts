import { allParticles, type Particle } from './ion-library.js';
import { comparableName } from './names.js';
import type { Parts } from './split-into-ions.js';

const CATION_NAMES = new Map<string, Particle>();
const ANION_NAMES = new Map<string, Particle>();
for (const particle of allParticles()) {
  const names = particle.charge > 0 ? CATION_NAMES : particle.charge < 0 ? ANION_NAMES : undefined;
  for (const name of particle.names) {
    const key = comparableName(name);
    if (names && !names.has(key)) names.set(key, particle);
  }
}

/** Words for the number of anions or cations, which a name may carry and the charges decide anyway. */
const MULTIPLIER = /^(?:mono|di|tri|tetra|penta|hexa|bis|tris)/;

/**
 * Reads the name of a salt as cation and anion: "ammonium chloride", "iron(III) nitrate", "disodium hydrogenphosphate".
 * The numbers of ions follow from the charges; a multiplier in the name that contradicts them makes it unreadable.
 */
export function partsOfName(name: string): { parts: Parts; formula: string } | undefined {
  const comparable = comparableName(name);
  for (let at = comparable.indexOf(' '); at > 0; at = comparable.indexOf(' ', at + 1)) {
    const anion = ANION_NAMES.get(comparable.slice(at + 1));
    const first = comparable.slice(0, at);
    const cation = CATION_NAMES.get(first);
    if (anion && cation) return combine(cation, anion);
    const multiplied = anion && CATION_NAMES.get(first.replace(MULTIPLIER, ''));
    if (anion && multiplied) {
      const salt = combine(multiplied, anion);
      if (countWord(salt.parts[0]!.count).includes(MULTIPLIER.exec(first)![0])) return salt;
    }
  }
  return undefined;
}

function countWord(count: number): readonly string[] {
  return [['mono'], ['di', 'bis'], ['tri', 'tris'], ['tetra'], ['penta'], ['hexa']][count - 1] ?? [];
}

function combine(cation: Particle, anion: Particle): { parts: Parts; formula: string } {
  const divisor = greatestCommonDivisor(cation.charge, -anion.charge);
  const parts = [
    { particle: cation, count: -anion.charge / divisor },
    { particle: anion, count: cation.charge / divisor },
  ];
  return { parts, formula: formulaOfParts(parts) };
}

/** A formula put together from its ions: cations first, groups in brackets where they stand more than once. */
export function formulaOfParts(parts: Parts): string {
  return parts.map(({ particle, count }) => (count === 1 ? particle.formula : isSingleAtom(particle.formula) ? `${particle.formula}${count}` : `(${particle.formula})${count}`)).join('');
}

function isSingleAtom(formula: string): boolean {
  return /^[A-Z][a-z]?$/.test(formula);
}

/** Systematic name of a salt from its ions; the single name of a molecule. */
export function nameOfParts(parts: Parts, hydrateWater: number): string | undefined {
  const names = parts.map(({ particle }) => particle.names[0]);
  if (names.some((name) => name === undefined)) return undefined;
  return `${names.join(' ')}${hydrateWater === 0 ? '' : ` ${hydrateWord(hydrateWater)}`}`;
}

function hydrateWord(water: number): string {
  const words: Readonly<Record<string, string>> = { '0.5': 'hemi', '1': 'mono', '1.5': 'sesqui', '2': 'di', '3': 'tri', '4': 'tetra', '5': 'penta', '6': 'hexa', '7': 'hepta', '8': 'octa', '9': 'nona', '10': 'deca', '12': 'dodeca' };
  return `${words[String(water)] ?? `${water}-`}hydrate`;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
