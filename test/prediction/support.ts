import fc from 'fast-check';
import { predict, SoluteError, type Prediction } from '../../src/engine.js';
import { addTo, atomsOf } from '../data/composition.js';
import { families, ions, metals, substances } from '../data/read.js';
import { complexes } from '../data/tables.js';

/** The same cases in every run; SEED=… in the environment looks elsewhere. */
fc.configureGlobal({ seed: Number(process.env['SEED'] ?? 1) });

/** Formula of every species by id, straight from the data and not through the package's own reading of it. */
export const FORMULAS: ReadonlyMap<string, string> = new Map([
  ...ions.map(({ id, formula }) => [id, formula] as const),
  ...families.flatMap(({ states }) => states.map(({ id, formula }) => [id, formula] as const)),
  ...metals.flatMap(({ ion, formula, hydrolysis }) => [[ion, formula] as const, ...hydrolysis.map((species) => [species.id, species.formula] as const)]),
  ...complexes.map(({ id, formula }) => [id, formula] as const),
  ['H3O+', 'H3O'] as const,
  ['OH-', 'OH'] as const,
  ['H2O', 'H2O'] as const,
]);

/** How a listed substance is addressed without ambiguity. */
export function addressOf([names, , cas]: (typeof substances)[number]): string {
  return cas ?? names[0]!;
}

export function predictOne(substance: string, amount: string, temperature = 25, air: 'excluded' | 'equilibrated' = 'excluded'): Prediction {
  return predict([{ substance, amount }], { temperature, air });
}

/** The prediction, or nothing where the engine refuses with a typed problem. */
export function predictionOrRefusal(make: () => Prediction): Prediction | undefined {
  try {
    return make();
  } catch (error) {
    if (error instanceof SoluteError) return undefined;
    throw error;
  }
}

/** Listed substances for which a prediction is made. */
export const predictable = substances.filter((row) => predictionOrRefusal(() => predictOne(addressOf(row), '0.01 mol/kg')) !== undefined);

/** One listed substance that can be predicted. */
export const anySubstance = fc.constantFrom(...predictable.map(addressOf));

/** A molality from 1 nmol/kg to 3 mol/kg, evenly spread over the orders of magnitude. */
export const anyMolality = fc.double({ min: -9, max: 0.47, noNaN: true }).map((exponent) => Number(Math.pow(10, exponent).toPrecision(4)));

export const anyTemperature = fc.integer({ min: 0, max: 60 });

/** The largest relative departure from electroneutrality and from the conservation of every element. */
export function imbalances(prediction: Prediction): Map<string, number> {
  const sums = new Map<string, number>();
  const sizes = new Map<string, number>();
  let charge = 0;
  let ions = 0;
  for (const { chemical, molality } of prediction.species) {
    charge += chemical.charge * molality;
    ions += Math.abs(chemical.charge) * molality;
    const atoms = atomsOf(FORMULAS.get(chemical.id)!);
    addTo(sums, atoms, molality);
    addTo(sizes, atoms, molality);
  }
  for (const { formula, amount = 0 } of prediction.solids) {
    addTo(sums, atomsOf(formula), amount);
    addTo(sizes, atomsOf(formula), amount);
  }
  for (const { formula, molality } of prediction.understood) {
    addTo(sums, atomsOf(formula), -molality);
    addTo(sizes, atomsOf(formula), molality);
  }
  // Hydrogen less twice oxygen does not change when water is taken up or set free.
  const protons = (sums.get('H') ?? 0) - 2 * (sums.get('O') ?? 0);
  const protonSize = (sizes.get('H') ?? 0) + 2 * (sizes.get('O') ?? 0);
  const relative = new Map([...sums].filter(([element]) => element !== 'H' && element !== 'O').map(([element, sum]) => [element, Math.abs(sum) / sizes.get(element)!]));
  return relative.set('charge', Math.abs(charge) / ions).set('H − 2 O', Math.abs(protons) / protonSize);
}

/** Paths of every number in a value that is not finite. */
export function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} = ${value}`];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => notFinite(inner, `${path}.${key}`));
}
