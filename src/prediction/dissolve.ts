import type { Decimal } from '../quantities/decimal.js';
import { readAmount } from '../quantities/amount.js';
import { litreOfSolution, type LitreOfSolution, type VolumeBasis } from '../quantities/solution-density.js';
import { problem, quote, SoluteError, type Problem } from '../quantities/solute-error.js';
import { parseUnit } from '../quantities/units.js';
import type { Water } from '../equilibrium/water.js';
import type { ReadSolute } from '../substances/solutes-text.js';
import type { Remark, UnderstoodSolute } from './prediction.js';
import { chemicalOf } from './chemicals.js';
import type { DissolvedParticle } from './solution-model.js';

/** All solutes as particles in one kilogram of water. */
export interface Dissolved {
  readonly solutes: readonly DissolvedSolute[];
  /** Every particle once, summed over the solutes. */
  readonly particles: readonly DissolvedParticle[];
  readonly understood: readonly UnderstoodSolute[];
}

export interface DissolvedSolute {
  readonly read: ReadSolute;
  /** mol/kg water. */
  readonly molality: number;
  /** Standard uncertainty of the molality from the digits typed: half of the last digit, rectangular. */
  readonly uncertainty: number;
  /** For an amount per litre: how the volume of the solute is known. */
  readonly volumeBasis?: VolumeBasis;
}

const LARGEST_MOLALITY = 60;
const SMALLEST_MOLALITY = 1e-12;
/** mol/L above which the volume of a solute matters to the molality. */
const NOTEWORTHY_MOLARITY = 0.02;

/**
 * Turns the amounts into molalities, and the substances into particles. Moles are exact decimals; where amounts are per
 * litre, the density model gives the water in that litre.
 * @throws SoluteError for an ion without a sound constant, an amount outside what water can hold, or a mass without volume.
 */
export function dissolve(solutes: readonly ReadSolute[], water: Water, volume: string | undefined): Dissolved {
  const litres = volume === undefined ? undefined : readVolume(volume);
  const perLitre = solutes.map((read) => molesPerLitre(read, litres));
  refuse(solutes, perLitre);
  const litre = litreOf(solutes, perLitre, water);
  const problems: Problem[] = [];
  const dissolved: DissolvedSolute[] = [];
  const understood: UnderstoodSolute[] = [];
  solutes.forEach((read, index) => {
    const inMolality = read.amount.kind === 'molality';
    const molality = inMolality ? read.amount.value.toNumber() : litre.molarities[index]! / litre.water;
    if (!(molality >= SMALLEST_MOLALITY && molality <= LARGEST_MOLALITY)) {
      problems.push(outOfRange(read, index, molality));
      return;
    }
    const relative = read.amount.relativeHalfDigit / Math.sqrt(3);
    const basis = inMolality ? undefined : litre.bases[index]!;
    dissolved.push({ read, molality, uncertainty: molality * relative, ...(basis === undefined ? {} : { volumeBasis: basis }) });
    understood.push(understand(read, litre.molarities[index]!, molality, basis));
  });
  if (problems.length > 0) throw new SoluteError(problems);
  return { solutes: dissolved, particles: sumParticles(dissolved), understood };
}

function refuse(solutes: readonly ReadSolute[], perLitre: readonly (Decimal | undefined)[]): void {
  const problems = solutes.flatMap((read, index) => {
    const where = { range: read.range, solute: index };
    const refused = read.substance.parts.flatMap(({ particle }) =>
      particle.refused === undefined
        ? []
        : [problem('ion-without-constant', `${quote(read.typed)} contains ${particle.names[0] ?? particle.formula}, for which no prediction is made: ${particle.refused}`, read.typed, where)],
    );
    if (perLitre[index] !== undefined) return refused;
    return [
      ...refused,
      problem('missing-amount', `${quote(read.typed)} states how much was taken, but not in which volume. State the final volume, or write the amount per litre.`, read.typed, {
        ...where,
        suggestions: [{ value: 'volume="1 L"', reason: 'final volume' }],
      }),
    ];
  });
  if (problems.length > 0) throw new SoluteError(problems);
}

/** Passes in which molarities that depend on the density, and the density, come to agree. */
const MOST_PASSES = 200;
const AGREED = 1e-13;

/** The litre that all solutes make; amounts per kilogram of water or of solution find their molarity in it. */
function litreOf(solutes: readonly ReadSolute[], perLitre: readonly (Decimal | undefined)[], water: Water): LitreOfSolution & { readonly molarities: readonly number[] } {
  const fixed = solutes.every(({ amount }) => amount.kind !== 'molality' && amount.kind !== 'mass-fraction');
  let litre: LitreOfSolution = { water: water.density / 1000, bases: [] };
  let mass = litre.water;
  let molarities: number[] = [];
  for (let pass = 0; pass < MOST_PASSES; pass++) {
    molarities = solutes.map(({ amount, substance }, index) => {
      if (amount.kind === 'molality') return amount.value.toNumber() * litre.water;
      if (amount.kind === 'mass-fraction') return (amount.value.toNumber() * mass * 1000) / substance.molarMass;
      return perLitre[index]!.toNumber();
    });
    const before = mass;
    litre = litreOfSolution(
      solutes.map(({ substance }, index) => ({ molarity: molarities[index]!, anhydrousMass: substance.anhydrousMass, particles: substance.parts.map(({ particle, count }) => ({ id: particle.id, count })) })),
      water.temperature,
      water.density,
    );
    mass = litre.water + solutes.reduce((sum, { substance }, index) => sum + (molarities[index]! * substance.anhydrousMass) / 1000, 0);
    if (fixed || Math.abs(mass - before) < AGREED * mass) break;
  }
  return { ...litre, molarities };
}

function outOfRange(read: ReadSolute, index: number, molality: number): Problem {
  const limit = molality > LARGEST_MOLALITY ? `more than ${LARGEST_MOLALITY} mol in a kilogram of water, which no salt reaches` : 'less than a picomole in a kilogram of water';
  return problem('amount-out-of-range', `${quote(`${read.amount.number} ${read.amount.unit}`)} of ${read.substance.formula} is ${limit}. Check the number and the unit.`, read.typed, { range: read.range, solute: index });
}

/** mol per litre of solution; undefined when the volume is missing. Amounts per mass of water or solution are not read from it. */
function molesPerLitre(read: ReadSolute, litres: Decimal | undefined): Decimal | undefined {
  const { kind, value } = read.amount;
  const moles = kind === 'mass' || kind === 'mass-concentration' ? value.div(read.substance.molarMass) : value;
  if (kind !== 'mass' && kind !== 'amount') return moles;
  return litres && moles.div(litres);
}

function readVolume(volume: string): Decimal {
  const match = /^\s*([\d.,eE+-]+)\s*(\S+)\s*$/.exec(volume);
  const unit = match && parseUnit(match[2]!);
  const number = match && readAmount(match[1]!, 'mol');
  if (!unit || !number || 'failure' in number || unit.dimension.length !== 3 || unit.dimension.amount !== 0 || unit.dimension.mass !== 0 || !number.value.gt(0)) {
    throw new SoluteError([
      problem('unit-unknown', `The volume ${quote(volume)} is not a number with a unit of volume. Write for example 500 mL or 1 L.`, volume, { suggestions: [{ value: '1 L', reason: 'volume' }] }),
    ]);
  }
  return number.value.times(unit.factor).times(1000);
}

/** The same solutes with other molalities, mol/kg water, in their order. */
export function withMolalities({ solutes }: Pick<Dissolved, 'solutes'>, molalities: readonly number[]): Pick<Dissolved, 'solutes' | 'particles'> {
  const changed = solutes.map((solute, index) => ({ ...solute, molality: molalities[index]! }));
  return { solutes: changed, particles: sumParticles(changed) };
}

function sumParticles(solutes: readonly DissolvedSolute[]): DissolvedParticle[] {
  const sums = new Map<string, DissolvedParticle>();
  for (const { read, molality } of solutes) {
    for (const { particle, count } of read.substance.parts) {
      const before = sums.get(particle.id)?.molality ?? 0;
      sums.set(particle.id, { particle, molality: before + count * molality });
    }
  }
  return [...sums.values()];
}

function understand(read: ReadSolute, molarity: number, molality: number, basis: VolumeBasis | undefined): UnderstoodSolute {
  const { substance, amount } = read;
  const assumptions: Remark[] = [];
  if (substance.assumed.includes('hydrate-anhydrous')) assumptions.push({ code: 'hydrate-anhydrous', text: `Taken as anhydrous; hydrates of ${substance.name ?? substance.formula} exist.` });
  if (substance.isomers) assumptions.push({ code: 'isomer', text: `Read as ${substance.name ?? substance.formula}; ${substance.isomers.join(', ')} has the same formula.` });
  if (amount.decimalComma) assumptions.push({ code: 'decimal-comma', text: `${amount.number} was read with a decimal comma.` });
  if (amount.kind === 'molality') assumptions.push({ code: 'per-kilogram-water', text: 'mol/kg is taken per kilogram of water.' });
  if (amount.kind === 'mass-fraction') assumptions.push({ code: 'per-mass-of-solution', text: 'Percent by mass is taken of the whole solution.' });
  if (basis === 'unknown' && molarity > NOTEWORTHY_MOLARITY) assumptions.push({ code: 'volume-unknown', text: 'The volume it takes up in solution is not known here and is left out.' });
  return {
    typed: read.typed,
    ...(read.range ? { range: read.range } : {}),
    formula: substance.formula,
    ...(substance.name === undefined ? {} : { name: substance.name }),
    ...(substance.cas === undefined ? {} : { cas: substance.cas }),
    molarMass: substance.molarMass,
    amount: `${amount.number} ${amount.unit}`,
    molarity,
    molality,
    ions: substance.parts.map(({ particle, count }) => ({ chemical: chemicalOf(particle), count })),
    assumptions,
  };
}

