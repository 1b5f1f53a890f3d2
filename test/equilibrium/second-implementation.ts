/**
 * The same equilibrium as the package's solver, formulated differently and worked out at 50 digits: one Newton iteration
 * over the logarithms of all molalities at once, with a mass action law per formed species, a balance per component,
 * and electroneutrality over all ions, spectators included, where the package has the proton balance. Activity
 * coefficients and the activity of water are part of the equations. The start is found by bisection of pH.
 *
 * Only the statement of the system is shared with the package: constants, charges, stoichiometry and coefficients.
 */
import { Decimal as Base } from 'decimal.js';
import water from '../../data/water.json';
import type { ChemicalSystem, InteractionTable } from '../../src/equilibrium/chemical-system.js';

const Decimal = Base.clone({ precision: 50, maxE: 9e15, minE: -9e15 });
type Decimal = Base;

const decimal = (value: number | string | Decimal): Decimal => new Decimal(value);
const ZERO = decimal(0);
const ONE = decimal(1);
const LN10 = Decimal.ln(10);
const WATER = decimal(water.ionProduct.molarMass).div(1000);

export interface PreciseState {
  /** −log10 a(H⁺). */
  readonly pH: number;
  /** mol/kg water, in the order of the system's species. */
  readonly molality: readonly number[];
  /** Largest remaining error of an equation: of ln K, or relative of a balance. */
  readonly residual: number;
  readonly steps: number;
}

/** Roles of the species: bare ones stand for their component's activity. */
interface Layout {
  readonly system: ChemicalSystem;
  readonly table: InteractionTable;
  /** Species whose molality is unknown. */
  readonly free: readonly number[];
  readonly proton: number;
  /** Species of every component that is the component itself; its constant is 1 up to rounding, which is kept. */
  readonly bare: readonly number[];
}

function layoutOf(system: ChemicalSystem, table: InteractionTable): Layout {
  const free = system.species.flatMap(({ fixedMolality }, index) => (fixedMolality === undefined ? [index] : []));
  const proton = system.species.findIndex(({ protons, stoichiometry, fixedMolality }) => fixedMolality === undefined && protons === 1 && stoichiometry.length === 0);
  const bare = system.components.map((_, component) =>
    system.species.findIndex(({ protons, stoichiometry, lnBeta, fixedMolality }) => fixedMolality === undefined && protons === 0 && Math.abs(lnBeta) < 1e-9 && stoichiometry.length === 1 && stoichiometry[0]![0] === component && stoichiometry[0]![1] === 1),
  );
  if (proton < 0 || bare.includes(-1)) throw new Error('a component has no bare species');
  return { system, table, free, proton, bare };
}

/** Solves from scratch. @throws when the iteration does not end. */
export function solvePrecisely(system: ChemicalSystem, table: InteractionTable): PreciseState {
  const layout = layoutOf(system, table);
  const start = roughMolalities(layout);
  let logarithms = layout.free.map((index) => Decimal.ln(decimal(start[index]!)));
  let current = equationsAt(layout, logarithms);
  for (let step = 1; step <= MOST_STEPS; step++) {
    const change = solveLinear(current.jacobian(), current.residuals.map((residual) => residual.neg()));
    const longest = largest(change);
    let length = longest.gt(LONGEST_STEP) ? decimal(LONGEST_STEP).div(longest) : ONE;
    for (let halving = 0; ; halving++) {
      const trial = logarithms.map((value, place) => value.plus(length.times(change[place]!)));
      const next = equationsAt(layout, trial);
      if (next.size.lt(current.size) || halving === MOST_HALVINGS) {
        logarithms = trial;
        current = next;
        break;
      }
      length = length.div(2);
    }
    if (current.size.lt(ENOUGH)) {
      return { pH: current.lnProtonActivity.div(LN10).neg().toNumber(), molality: current.molality.map((value) => value.toNumber()), residual: current.size.toNumber(), steps: step };
    }
  }
  throw new Error(`no end after ${MOST_STEPS} steps, residual ${current.size.toExponential(2)}`);
}

const MOST_STEPS = 60;
const MOST_HALVINGS = 12;
/** In a natural logarithm. */
const LONGEST_STEP = 4;
const ENOUGH = decimal('1e-40');

interface Equations {
  readonly residuals: readonly Decimal[];
  readonly size: Decimal;
  readonly molality: readonly Decimal[];
  readonly lnProtonActivity: Decimal;
  readonly jacobian: () => Decimal[][];
}

function equationsAt({ system, table, free, proton, bare }: Layout, logarithms: readonly Decimal[]): Equations {
  const { species, components } = system;
  const molality = species.map(({ fixedMolality }) => decimal(fixedMolality ?? 0));
  const lnMolality: (Decimal | undefined)[] = species.map(() => undefined);
  free.forEach((index, place) => {
    lnMolality[index] = logarithms[place]!;
    molality[index] = logarithms[place]!.exp();
  });
  const medium = mediumAt(table, molality);
  const lnActivity = (index: number): Decimal => lnMolality[index]!.plus(medium.lnGamma[index]!);
  const formed = free.filter((index) => index !== proton && (!bare.includes(index) || components[bare.indexOf(index)]!.lnActivity !== undefined));
  const residuals: Decimal[] = [];
  for (const index of formed) {
    const component = bare.indexOf(index);
    let right = decimal(component >= 0 ? components[component]!.lnActivity! : species[index]!.lnBeta);
    if (component < 0) {
      right = right.plus(lnActivity(proton).times(species[index]!.protons)).plus(medium.lnWater.times(species[index]!.water));
      for (const [part, number] of species[index]!.stoichiometry) {
        const held = components[part]!.lnActivity;
        right = right.plus((held === undefined ? lnActivity(bare[part]!).minus(species[bare[part]!]!.lnBeta) : decimal(held)).times(number));
      }
    }
    residuals.push(lnActivity(index).minus(right));
  }
  const balanced = components.flatMap(({ lnActivity: held }, component) => (held === undefined ? [component] : []));
  const numberIn = (index: number, component: number): number => species[index]!.stoichiometry.find(([part]) => part === component)?.[1] ?? 0;
  for (const component of balanced) {
    let sum = ZERO;
    for (const index of free) sum = sum.plus(molality[index]!.times(numberIn(index, component)));
    residuals.push(sum.div(components[component]!.total).minus(1));
  }
  let charge = ZERO;
  let ions = ZERO;
  species.forEach(({ charge: z }, index) => {
    charge = charge.plus(molality[index]!.times(z));
    ions = ions.plus(molality[index]!.times(Math.abs(z)));
  });
  residuals.push(charge.div(ions));

  const jacobian = (): Decimal[][] => {
    const slopes = medium.slopes();
    // Change of ln a of a species, and of ln a of water, with ln m of another.
    const activitySlope = (index: number, other: number): Decimal => slopes.lnGamma(index, other).times(molality[other]!).plus(index === other ? 1 : 0);
    const rows = formed.map((index) =>
      free.map((other) => {
        let slope = activitySlope(index, other);
        if (bare.includes(index)) return slope;
        slope = slope.minus(activitySlope(proton, other).times(species[index]!.protons));
        slope = slope.minus(slopes.lnWater(other).times(molality[other]!).times(species[index]!.water));
        for (const [part, number] of species[index]!.stoichiometry) if (components[part]!.lnActivity === undefined) slope = slope.minus(activitySlope(bare[part]!, other).times(number));
        return slope;
      }),
    );
    for (const component of balanced) rows.push(free.map((other) => molality[other]!.times(numberIn(other, component)).div(components[component]!.total)));
    rows.push(free.map((other) => molality[other]!.times(species[other]!.charge).div(ions)));
    return rows;
  };
  return { residuals, size: largest(residuals), molality, lnProtonActivity: lnActivity(proton), jacobian };
}

interface Medium {
  readonly lnGamma: readonly Decimal[];
  readonly lnWater: Decimal;
  /** Derivatives by the molality of a species. */
  readonly slopes: () => { readonly lnGamma: (index: number, other: number) => Decimal; readonly lnWater: (other: number) => Decimal };
}

/**
 * Specific ion interaction model, and the activity of water with the osmotic function σ(x) = x − 2 ln x − 1/x,
 * x = 1 + B√I: (1 − φ) Σm = ln10 · (2A/B³ σ − Σ ε m(cation) m(anion)).
 * Above the ceiling of ionic strength all molalities count in the proportion that brings them down to it.
 */
function mediumAt(table: InteractionTable, molality: readonly Decimal[]): Medium {
  const count = molality.length;
  const slope = decimal(table.slope);
  const b = decimal(table.denominator);
  const squares = Array.from(table.charges, (charge) => charge * charge);
  const epsilon = (j: number, k: number): number => table.epsilon[j * count + k]!;
  let ionicStrength = ZERO;
  molality.forEach((m, j) => (ionicStrength = ionicStrength.plus(m.times(squares[j]!).div(2))));
  const held = ionicStrength.gt(table.ceiling);
  const scale = held ? decimal(table.ceiling).div(ionicStrength) : ONE;
  const root = ionicStrength.times(scale).sqrt();
  const x = b.times(root).plus(1);
  const term = slope.times(root).div(x);
  const neighbours = molality.map((_, j) => {
    let sum = ZERO;
    for (let k = 0; k < count; k++) if (epsilon(j, k) !== 0) sum = sum.plus(molality[k]!.times(epsilon(j, k)));
    return sum;
  });
  const lnGamma = neighbours.map((sum, j) => LN10.times(sum.times(scale).minus(term.times(squares[j]!))));
  let sum = ZERO;
  let pairs = ZERO;
  molality.forEach((m, j) => {
    sum = sum.plus(m);
    pairs = pairs.plus(m.times(neighbours[j]!).div(2));
  });
  const sigma = x.minus(Decimal.ln(x).times(2)).minus(ONE.div(x));
  const osmotic = LN10.times(pairs.times(scale).times(scale).minus(slope.times(2).div(b.pow(3)).times(sigma)));
  const lnWater = WATER.times(sum.plus(osmotic)).neg();

  const slopes = (): ReturnType<Medium['slopes']> => {
    const termSlope = held ? ZERO : slope.div(root.times(2).times(x).times(x));
    const sigmaSlope = held ? ZERO : ONE.minus(ONE.div(x)).pow(2).times(b).div(root.times(2));
    const scaleSlope = (other: number): Decimal => (held ? scale.times(squares[other]!).div(ionicStrength.times(2)).neg() : ZERO);
    return {
      lnGamma: (index, other) =>
        LN10.times(scale.times(epsilon(index, other)).plus(scaleSlope(other).times(neighbours[index]!)).minus(termSlope.times(squares[index]! * squares[other]!).div(2))),
      lnWater: (other) => {
        const pairSlope = scale.times(scale).times(neighbours[other]!).plus(scale.times(2).times(scaleSlope(other)).times(pairs));
        const longRange = slope.times(2).div(b.pow(3)).times(sigmaSlope).times(squares[other]!).div(2);
        return WATER.times(ONE.plus(LN10.times(pairSlope.minus(longRange)))).neg();
      },
    };
  };
  return { lnGamma, lnWater, slopes };
}

function largest(values: readonly Decimal[]): Decimal {
  return values.reduce((most, value) => Decimal.max(most, value.abs()), ZERO);
}

/** Gaussian elimination with row scaling and partial pivoting. */
function solveLinear(matrix: Decimal[][], right: Decimal[]): Decimal[] {
  const size = right.length;
  const rows = matrix.map((row, place) => {
    const scale = largest(row);
    return [...row, right[place]!].map((value) => value.div(scale));
  });
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++) if (rows[row]![column]!.abs().gt(rows[pivot]![column]!.abs())) pivot = row;
    [rows[column], rows[pivot]] = [rows[pivot]!, rows[column]!];
    const leading = rows[column]!;
    for (let row = column + 1; row < size; row++) {
      if (rows[row]![column]!.isZero()) continue;
      const factor = rows[row]![column]!.div(leading[column]!);
      for (let place = column; place <= size; place++) rows[row]![place] = rows[row]![place]!.minus(factor.times(leading[place]!));
    }
  }
  const solution: Decimal[] = Array.from({ length: size }, () => ZERO);
  for (let row = size - 1; row >= 0; row--) {
    let sum = rows[row]![size]!;
    for (let place = row + 1; place < size; place++) sum = sum.minus(rows[row]![place]!.times(solution[place]!));
    solution[row] = sum.div(rows[row]![row]!);
  }
  return solution;
}

const LOWEST_PH = -3;
const HIGHEST_PH = 18;
const BISECTIONS = 40;
const ROUNDS = 60;
const CYCLES = 300;
/** In ln γ: near enough for Newton's method. */
const CLOSE = 1e-3;
const DAMPING = 0.5;

/**
 * A first guess in ordinary numbers: pH bisected on electroneutrality, every component's activity corrected in turn by
 * the ratio of its total to what there would be of it, and activity coefficients substituted with damping.
 */
function roughMolalities({ system, table }: Layout): number[] {
  const { species, components } = system;
  const lnGamma = species.map(() => 0);
  let lnWater = 0;
  const lnActivity = components.map(({ total, lnActivity: held }) => held ?? Math.log(total));
  let molality: number[] = [];
  const molalitiesAt = (lnProton: number): number[] =>
    species.map(({ fixedMolality, lnBeta, protons, water: waters, stoichiometry }, index) => {
      if (fixedMolality !== undefined) return fixedMolality;
      const exponent = stoichiometry.reduce((sum, [part, number]) => sum + number * lnActivity[part]!, lnBeta + protons * lnProton + waters * lnWater - lnGamma[index]!);
      return Math.exp(Math.min(exponent, 300));
    });
  const balance = (lnProton: number): number => {
    for (let cycle = 0; cycle < CYCLES; cycle++) {
      let worst = 0;
      components.forEach(({ total, lnActivity: held }, component) => {
        if (held !== undefined) return;
        molality = molalitiesAt(lnProton);
        let sum = 0;
        let most = 1;
        species.forEach(({ stoichiometry }, index) => {
          const number = stoichiometry.find(([part]) => part === component)?.[1] ?? 0;
          sum += number * molality[index]!;
          if (number * molality[index]! > 1e-6 * total) most = Math.max(most, number);
        });
        const correction = Math.log(total / sum) / most;
        lnActivity[component] = lnActivity[component]! + correction;
        worst = Math.max(worst, Math.abs(correction));
      });
      if (worst < 1e-7) break;
    }
    molality = molalitiesAt(lnProton);
    return species.reduce((sum, { charge }, index) => sum + charge * molality[index]!, 0);
  };
  for (let round = 0; round < ROUNDS; round++) {
    let [low, high] = [LOWEST_PH, HIGHEST_PH];
    for (let step = 0; step < BISECTIONS; step++) {
      const middle = (low + high) / 2;
      if (balance(-middle * Math.LN10) > 0) low = middle;
      else high = middle;
    }
    balance((-(low + high) / 2) * Math.LN10);
    const medium = mediumAt(table, molality.map(decimal));
    let change = 0;
    medium.lnGamma.forEach((value, index) => {
      const step = value.toNumber() - lnGamma[index]!;
      change = Math.max(change, Math.abs(step));
      lnGamma[index] = lnGamma[index]! + DAMPING * step;
    });
    lnWater += DAMPING * (medium.lnWater.toNumber() - lnWater);
    if (change < CLOSE) break;
  }
  return molality.map((value) => Math.max(value, Number.MIN_VALUE));
}
