import { exp, log } from '../quantities/reproducible-math.js';
import type { ChemicalSystem, SolidDefinition } from './chemical-system.js';
import { ChangeOfBasis } from './change-of-basis.js';
import { solveScaled } from './linear-algebra.js';
import { SaturationConstraint } from './saturation.js';
import { sharedStructure, type Workspace } from './shared-structure.js';
import { boundMixedSpecies, meanProtonation, startingPoint, type BalanceArrays } from './starting-point.js';

/** Largest Newton step in a natural logarithm. */
const LARGEST_STEP = 6;
const MOST_STEPS = 200;
const GRADIENT_TOLERANCE = 1e-13;
const STEP_TOLERANCE = 1e-16;
const NO_COLUMNS = new Int32Array(0);

/**
 * All balances at fixed activity coefficients, as one convex problem. The arrays belong to the structure of the system: one
 * instance is to be done with before the next of the same structure is made.
 *
 * With ξ = (ln a of every component, ln a(H⁺)) and mj = exp(cj + nj·ξ), the balances Σ nj mj = t are the condition
 * ∇F = 0 of F(ξ) = Σ mj − t·ξ. F is convex (its Hessian is Σ mj nj njᵀ), strictly so because H⁺ and every bare
 * component are species, and it grows in every direction because OH⁻ has a negative proton number. Eliminating all but
 * the last unknown leaves a monotone function of pH, the charge balance.
 *
 * The proton numbers are taken relative to the mean protonation of each component at the estimated pH. That changes
 * nothing in exact arithmetic, and keeps the weak acid in a strong background from being lost to rounding.
 */
export class MassBalances {
  /** mol/kg, of the last point visited. */
  readonly molality: Float64Array;
  readonly #system: ChemicalSystem;
  readonly #free: readonly number[];
  readonly #size: number;
  /** Row-major species × unknowns; the last unknown is the proton. */
  readonly #numbers: Float64Array;
  /** The same with the unknowns that saturation determines taken out; the same array while there are no solids. */
  #active: Float64Array;
  #saturation: { readonly constraint: SaturationConstraint; readonly solids: readonly SolidDefinition[]; offsets: Float64Array } | undefined;
  readonly #protons: Float64Array;
  readonly #constants: Float64Array;
  readonly #totals: Float64Array;
  #activeTotals: Float64Array;
  readonly #work: Workspace;
  readonly #unknowns: Float64Array;
  readonly #shift: Float64Array;
  readonly #exponents: Float64Array;
  #lnWater = 0;
  readonly #lnTotals: Float64Array;
  readonly #arrays: BalanceArrays;
  readonly #basis = new ChangeOfBasis();
  /** Molality of the species that take part in no reaction, 0 for all others. */
  readonly #fixed: Float64Array;

  constructor(system: ChemicalSystem) {
    this.#system = system;
    const shared = sharedStructure(system);
    const count = system.species.length;
    const size = shared.free.length + 1;
    this.#free = shared.free;
    this.#size = size;
    const work = shared.workspace;
    this.#work = work;
    this.#numbers = work.numbers;
    this.#numbers.set(shared.numbers);
    this.#active = this.#numbers;
    this.#protons = shared.protons;
    this.#constants = shared.constants;
    this.#fixed = work.fixed;
    for (const index of shared.fixed) this.#fixed[index] = system.species[index]!.fixedMolality!;
    this.#totals = work.totals;
    this.#activeTotals = this.#totals;
    this.#lnTotals = work.lnTotals;
    for (let i = 0; i < size - 1; i++) {
      const { total } = system.components[shared.free[i]!]!;
      this.#totals[i] = total;
      this.#lnTotals[i] = log(total);
    }
    this.#unknowns = work.unknowns;
    this.#shift = work.shift;
    this.#exponents = work.exponents;
    this.molality = new Float64Array(count);
    const { protons, only } = shared;
    this.#arrays = {
      size,
      protons,
      only,
      numbers: work.numbers,
      exponents: work.exponents,
      lnTotals: work.lnTotals,
      fixed: work.fixed,
      unknowns: work.unknowns,
      molality: this.molality,
      scratch: [work.gradient, work.magnitude, work.step],
    };
  }

  get lnProtonActivity(): number {
    return this.#unknowns[this.#size - 1]!;
  }

  /** ln a of every component of the system, those held from outside included. */
  componentActivities(): Float64Array {
    const unknowns = this.#basis.original(this.#unknowns);
    const activities = new Float64Array(this.#system.components.length);
    this.#system.components.forEach((component, index) => (activities[index] = component.lnActivity ?? 0));
    this.#free.forEach((component, i) => (activities[component] = unknowns[i]! - this.#shift[i]! * this.lnProtonActivity));
    return activities;
  }

  /**
   * Starting point: every component by itself, at the pH where the proton balance of that simpler mixture holds. Also
   * sets the reference protonation.
   */
  estimate(lnGamma: Float64Array): void {
    this.#setShift(null);
    this.#setExponents(lnGamma);
    const y = startingPoint(this.#arrays, this.#system.protonTotal);
    const mean = meanProtonation(this.#arrays);
    const last = this.#size - 1;
    for (let i = 0; i < last; i++) this.#unknowns[i] = this.#unknowns[i]! + mean[i]! * y;
    this.#unknowns[last] = y;
    this.#setShift(mean);
    this.#setExponents(lnGamma);
    boundMixedSpecies(this.#arrays);
    this.#evaluate(this.#unknowns);
  }

  /**
   * Newton's method on F from the present point, with the step cut so that F falls: a step is shortened while the
   * slope along it has turned to more than half its first value upwards, which for a convex function bounds F.
   * @param tolerance relative residual of the balances at which to stop, at least 1e-13.
   */
  minimise(lnGamma: Float64Array, tolerance: number): void {
    this.#setExponents(lnGamma);
    this.#descend(tolerance);
    if (this.#saturation) this.#saturation.constraint.complete(this.#unknowns, this.#saturation.offsets);
  }

  /**
   * The unknowns are counted from the present point, which is folded into the exponents: a strongly bound complex has
   * unknowns of a size whose last bit is larger than the free ligand that the balances leave.
   */
  #descend(tolerance: number): void {
    const { rows, columns, entries, gradient, hessian, step, trial, offset, scale, exponents, unknowns } = this.#work;
    const size = this.#size;
    const enough = Math.max(tolerance, GRADIENT_TOLERANCE);
    for (let j = 0; j < exponents.length; j++) {
      const end = rows[j + 1]!;
      for (let entry = rows[j]!; entry < end; entry++) exponents[j] = exponents[j]! + entries[entry]! * unknowns[columns[entry]!]!;
    }
    offset.fill(0);
    this.#evaluate(offset);
    for (let iteration = 0; iteration < MOST_STEPS; iteration++) {
      if (this.#largestGradient() < enough) break;
      this.#setHessian();
      for (let i = 0; i < size; i++) step[i] = -gradient[i]!;
      solveScaled(hessian, step, size, scale);
      let longest = 0;
      let slope = 0;
      for (let i = 0; i < size; i++) {
        longest = Math.max(longest, Math.abs(step[i]!));
        slope += step[i]! * gradient[i]!;
      }
      let length = longest > LARGEST_STEP ? LARGEST_STEP / longest : 1;
      for (let halving = 0; halving < 60; halving++) {
        for (let i = 0; i < size; i++) trial[i] = offset[i]! + length * step[i]!;
        this.#evaluate(trial);
        let slopeThere = 0;
        for (let i = 0; i < size; i++) slopeThere += step[i]! * gradient[i]!;
        if (slopeThere <= 0.5 * Math.abs(slope) || longest * length < STEP_TOLERANCE) break;
        length /= 2;
      }
      offset.set(trial);
      if (longest < STEP_TOLERANCE) break;
    }
    for (let i = 0; i < size; i++) unknowns[i] = unknowns[i]! + offset[i]!;
  }

  /** See {@link ChangeOfBasis}; the proton numbers are counted from the components again. */
  rebase(): void {
    const last = this.#size - 1;
    for (let i = 0; i < last; i++) this.#unknowns[i] = this.#unknowns[i]! - this.#shift[i]! * this.#unknowns[last]!;
    this.#setShift(null);
    this.#basis.apply({ size: this.#size, numbers: this.#numbers, totals: this.#totals, unknowns: this.#unknowns, molality: this.molality });
    this.#compress();
  }

  /**
   * Puts solids into equilibrium with the solution, or takes all away.
   * @returns false when the phase rule forbids the set; nothing has changed then.
   */
  saturate(solids: readonly SolidDefinition[]): boolean {
    if (solids.length === 0) {
      this.#saturation = undefined;
      this.#active = this.#numbers;
      this.#activeTotals = this.#totals;
      this.#compress();
      return true;
    }
    const constraint = SaturationConstraint.of(solids.map((solid) => this.#numbersOf(solid)), this.#size);
    if (!constraint) return false;
    this.#saturation = { constraint, solids, offsets: new Float64Array(solids.length) };
    return true;
  }

  /** ln of ion product over solubility product. */
  lnSaturation(solid: SolidDefinition): number {
    const numbers = this.#numbersOf(solid);
    let sum = solid.water * this.#lnWater - this.#lnSolubility(solid);
    for (let i = 0; i < this.#size; i++) sum += numbers[i]! * this.#unknowns[i]!;
    return sum;
  }

  /** mol/kg water of every solid given to {@link saturate}, in its order. */
  solidAmounts(): Float64Array {
    if (!this.#saturation) return new Float64Array(0);
    const size = this.#size;
    const lacking = this.#totals.slice();
    const magnitude = this.#totals.map(Math.abs);
    for (let j = 0; j < this.molality.length; j++) {
      if (this.#fixed[j]! > 0) continue;
      for (let i = 0; i < size; i++) {
        const term = this.#numbers[j * size + i]! * this.molality[j]!;
        lacking[i] = lacking[i]! - term;
        magnitude[i] = magnitude[i]! + Math.abs(term);
      }
    }
    return this.#saturation.constraint.amounts(lacking, magnitude);
  }

  #applySaturation(): void {
    const { constraint, solids } = this.#saturation!;
    const lnK = Float64Array.from(solids, (solid) => this.#lnSolubility(solid) - solid.water * this.#lnWater);
    const offsets = constraint.offsets(lnK);
    this.#saturation!.offsets = offsets;
    this.#active = this.#numbers.slice();
    this.#activeTotals = this.#totals.slice();
    for (let j = 0; j < this.molality.length; j++) this.#exponents[j] = this.#exponents[j]! + constraint.eliminate(this.#active, j * this.#size, offsets);
    constraint.eliminate(this.#activeTotals, 0, offsets);
    this.#compress();
    constraint.complete(this.#unknowns, offsets);
  }

  #numbersOf(solid: SolidDefinition): Float64Array {
    const numbers = new Float64Array(this.#size);
    let protons = solid.protons;
    for (const [component, number] of solid.stoichiometry) {
      const i = this.#free.indexOf(component);
      if (i < 0) continue;
      numbers[i] = number;
      protons -= number * this.#shift[i]!;
    }
    numbers[this.#size - 1] = protons;
    this.#basis.renumber(numbers);
    return numbers;
  }

  /** ln K with the components that are held from outside taken to the other side. */
  #lnSolubility(solid: SolidDefinition): number {
    let lnK = solid.lnK;
    for (const [component, number] of solid.stoichiometry) lnK -= number * (this.#system.components[component]!.lnActivity ?? 0);
    return lnK;
  }

  /** Largest relative residual over the balances as the system states them. */
  residual(): number {
    const { components, species, protonTotal } = this.#system;
    const sums = new Float64Array(components.length);
    const sizes = new Float64Array(components.length);
    let protons = -protonTotal;
    let protonSize = Math.abs(protonTotal);
    for (let j = 0; j < species.length; j++) {
      const m = this.molality[j]!;
      protons += species[j]!.protons * m;
      protonSize += Math.abs(species[j]!.protons) * m;
      for (const [component, number] of species[j]!.stoichiometry) {
        sums[component] = sums[component]! + number * m;
        sizes[component] = sizes[component]! + number * m;
      }
    }
    const amounts = this.solidAmounts();
    this.#saturation?.solids.forEach((solid, index) => {
      const amount = amounts[index]!;
      protons += solid.protons * amount;
      protonSize += Math.abs(solid.protons * amount);
      for (const [component, number] of solid.stoichiometry) {
        sums[component] = sums[component]! + number * amount;
        sizes[component] = sizes[component]! + number * Math.abs(amount);
      }
    });
    let worst = Math.abs(protons) / protonSize;
    for (const component of this.#free) {
      const total = components[component]!.total;
      worst = Math.max(worst, Math.abs(sums[component]! - total) / (sizes[component]! + total));
    }
    return worst;
  }

  #setShift(mean: Float64Array | null): void {
    const last = this.#size - 1;
    let total = this.#system.protonTotal;
    for (let i = 0; i < last; i++) {
      this.#shift[i] = mean ? mean[i]! : 0;
      total -= this.#shift[i]! * this.#system.components[this.#free[i]!]!.total;
    }
    for (let j = 0; j < this.molality.length; j++) {
      let number = this.#protons[j]!;
      for (let i = 0; i < last; i++) number -= this.#numbers[j * this.#size + i]! * this.#shift[i]!;
      this.#numbers[j * this.#size + last] = number;
    }
    this.#totals[last] = total;
    this.#compress();
  }

  #setExponents(lnGamma: Float64Array): void {
    const lnWater = lnGamma[this.molality.length]!;
    for (let j = 0; j < this.molality.length; j++) {
      this.#exponents[j] = this.#constants[j]! - lnGamma[j]! + this.#system.species[j]!.water * lnWater;
    }
    this.#lnWater = lnWater;
    if (this.#saturation) this.#applySaturation();
  }

  /** Lists the numbers that are not zero, species by species: most species hold two or three of the unknowns. */
  #compress(): void {
    const size = this.#size;
    const { rows, columns, entries } = this.#work;
    let entry = 0;
    for (let j = 0; j < this.molality.length; j++) {
      rows[j] = entry;
      if (this.#fixed[j]! > 0) continue;
      for (let i = 0; i < size; i++) {
        const number = this.#active[j * size + i]!;
        if (number === 0) continue;
        columns[entry] = i;
        entries[entry++] = number;
      }
    }
    rows[this.molality.length] = entry;
  }

  /** Molalities, gradient and sum of the terms' sizes at a point. */
  #evaluate(point: Float64Array): void {
    const size = this.#size;
    const count = this.molality.length;
    const { rows, columns, entries, gradient, magnitude } = this.#work;
    const [molality, exponents, fixed] = [this.molality, this.#exponents, this.#fixed];
    for (let i = 0; i < size; i++) {
      gradient[i] = -this.#activeTotals[i]!;
      magnitude[i] = Math.abs(this.#activeTotals[i]!);
    }
    for (let j = 0; j < count; j++) {
      if (fixed[j]! > 0) continue;
      const end = rows[j + 1]!;
      let exponent = exponents[j]!;
      for (let entry = rows[j]!; entry < end; entry++) exponent += entries[entry]! * point[columns[entry]!]!;
      const m = exp(exponent > 700 ? 700 : exponent);
      molality[j] = m;
      for (let entry = rows[j]!; entry < end; entry++) {
        const i = columns[entry]!;
        const term = entries[entry]! * m;
        gradient[i] = gradient[i]! + term;
        magnitude[i] = magnitude[i]! + Math.abs(term);
      }
    }
  }

  #largestGradient(): number {
    let largest = 0;
    const { gradient, magnitude } = this.#work;
    for (let i = 0; i < magnitude.length; i++) if (magnitude[i]! > 0) largest = Math.max(largest, Math.abs(gradient[i]!) / magnitude[i]!);
    return largest;
  }

  #setHessian(): void {
    const size = this.#size;
    const { rows, columns, entries, hessian } = this.#work;
    const { molality } = this;
    hessian.fill(0);
    for (let j = 0; j < molality.length; j++) {
      const end = rows[j + 1]!;
      const m = molality[j]!;
      for (let first = rows[j]!; first < end; first++) {
        const weight = m * entries[first]!;
        const row = columns[first]! * size;
        // Columns rise along a row, so that this is the lower triangle.
        for (let second = rows[j]!; second <= first; second++) {
          const at = row + columns[second]!;
          hessian[at] = hessian[at]! + weight * entries[second]!;
        }
      }
    }
    for (const column of this.#saturation?.constraint.dependent ?? NO_COLUMNS) hessian[column * size + column] = 1;
  }
}
