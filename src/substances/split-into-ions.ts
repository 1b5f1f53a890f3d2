import { compositionKey, type Composition } from './formula.js';
import { allParticles, particlesOfComposition, type Particle } from './ion-library.js';

/** A substance as particles and their number per formula. */
export type Parts = readonly { readonly particle: Particle; readonly count: number }[];

const CATIONS: readonly Particle[] = [...allParticles()].filter((particle) => particle.charge > 0);
const MOST_OF_ONE = 24;
const PROTON = 'H+';

/** Atoms above which only one cation with one anion is looked for. */
const MOST_ATOMS = 250;

/**
 * All ways to read a composition: as a molecule, as one cation and one anion, else as three kinds of ion, charge zero.
 * Readings that need a free proton are hidden by others.
 */
export function splitIntoIons(composition: Composition): Parts[] {
  const whole: Parts[] = particlesOfComposition(compositionKey(composition))
    .filter((particle) => particle.charge === 0)
    .map((particle) => [{ particle, count: 1 }]);
  const simple = preferWithoutProton([...whole, ...saltsOf(composition, 0, [])].filter(isUsual));
  if (simple.length > 0) return simple;
  let atoms = 0;
  for (const count of composition.values()) atoms += count;
  if (atoms > MOST_ATOMS) return [];
  const double: Parts[] = [];
  const seen = new Set<string>();
  for (const { particle, count, rest } of takeCations(composition)) {
    for (const parts of saltsOf(rest, particle.charge * count, [particle.id])) {
      const all = [{ particle, count }, ...parts];
      const key = all.map((part) => `${part.particle.id}×${part.count}`).sort().join(' ');
      if (!seen.has(key)) double.push(all);
      seen.add(key);
    }
  }
  const usual = preferWithoutProton(double.filter(isUsual));
  return usual.length > 0 ? usual : twoAnions(composition).filter(isUsual);
}

/** False for an anion that exists with some cations only, beside another. */
function isUsual(parts: Parts): boolean {
  return parts.every(({ particle }) => particle.onlyWith === undefined || parts.every((other) => other.particle.charge <= 0 || particle.onlyWith!.includes(other.particle.id)));
}

function preferWithoutProton(readings: Parts[]): Parts[] {
  const without = readings.filter((parts) => parts.every(({ particle }) => particle.id !== PROTON));
  return without.length > 0 ? without : readings;
}

/** One more cation and one anion that use up the composition and bring the charge to zero. */
function saltsOf(composition: Composition, charge: number, excluded: readonly string[]): Parts[] {
  const found: Parts[] = [];
  for (const { particle, count, rest } of takeCations(composition)) {
    if (excluded.includes(particle.id)) continue;
    const positive = charge + particle.charge * count;
    for (const anion of anionsOf(rest, positive)) found.push([{ particle, count }, anion]);
  }
  return found;
}

function twoAnions(composition: Composition): Parts[] {
  const found: Parts[] = [];
  for (const { particle, count, rest } of takeCations(composition)) {
    const charge = particle.charge * count;
    for (const first of ANIONS) {
      for (let number = 1; number * -first.charge < charge; number++) {
        const remaining = subtract(rest, first.composition, number);
        if (!remaining) break;
        for (const second of anionsOf(remaining, charge + first.charge * number)) {
          if (second.particle.id > first.id) found.push([{ particle, count }, { particle: first, count: number }, second]);
        }
      }
    }
  }
  return preferWithoutProton(found);
}

const ANIONS: readonly Particle[] = [...allParticles()].filter((particle) => particle.charge < 0);

function anionsOf(composition: Composition, charge: number): { particle: Particle; count: number }[] {
  const found: { particle: Particle; count: number }[] = [];
  if (charge <= 0 || composition.size === 0) return found;
  for (let count = 1; count <= charge; count++) {
    if (charge % count !== 0) continue;
    const unit = divide(composition, count);
    if (!unit) continue;
    for (const particle of particlesOfComposition(compositionKey(unit))) {
      if (particle.charge * count === -charge) found.push({ particle, count });
    }
  }
  return found;
}

function* takeCations(composition: Composition): Generator<{ particle: Particle; count: number; rest: Composition }> {
  for (const particle of CATIONS) {
    for (let count = 1; count <= MOST_OF_ONE; count++) {
      const rest = subtract(composition, particle.composition, count);
      if (!rest) break;
      yield { particle, count, rest };
    }
  }
}

function subtract(from: Composition, part: Composition, count: number): Composition | undefined {
  for (const [element, number] of part) if ((from.get(element) ?? 0) < number * count) return undefined;
  const rest = new Map<string, number>();
  for (const [element, number] of from) {
    const left = number - (part.get(element) ?? 0) * count;
    if (left > 0) rest.set(element, left);
  }
  return rest;
}

function divide(composition: Composition, by: number): Composition | undefined {
  if (by === 1) return composition;
  const unit = new Map<string, number>();
  for (const [element, number] of composition) {
    if (number % by !== 0) return undefined;
    unit.set(element, number / by);
  }
  return unit;
}
