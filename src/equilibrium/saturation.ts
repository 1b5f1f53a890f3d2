import { solveGeneral } from './linear-algebra.js';

/** A relative pivot below this means that the solids' compositions depend on each other. */
const SMALLEST_PIVOT = 1e-9;
const REFINEMENTS = 3;

/**
 * The condition that some solids are in equilibrium with the solution: for each, n·ξ = ln K. Gaussian elimination
 * expresses as many unknowns by the others; what is left is the same convex problem in fewer unknowns.
 */
export class SaturationConstraint {
  /** Unknown that each condition determines. */
  readonly dependent: Int32Array;
  /** Row-major solids × unknowns after elimination: the dependent columns form a unit matrix. */
  readonly #reduced: Float64Array;
  /** Row operations, row-major solids × solids: reduced = operations · numbers. */
  readonly #operations: Float64Array;
  readonly #numbers: readonly Float64Array[];
  readonly #size: number;

  private constructor(numbers: readonly Float64Array[], size: number, dependent: Int32Array, reduced: Float64Array, operations: Float64Array) {
    this.#numbers = numbers;
    this.#size = size;
    this.dependent = dependent;
    this.#reduced = reduced;
    this.#operations = operations;
  }

  /**
   * @param numbers stoichiometric numbers of every solid over the unknowns.
   * @returns undefined when the phase rule allows no such set: one solid is made of the others.
   */
  static of(numbers: readonly Float64Array[], size: number): SaturationConstraint | undefined {
    const count = numbers.length;
    const reduced = new Float64Array(count * size);
    const operations = new Float64Array(count * count);
    numbers.forEach((row, s) => {
      reduced.set(row, s * size);
      operations[s * count + s] = 1;
    });
    const dependent = new Int32Array(count).fill(-1);
    for (let s = 0; s < count; s++) {
      let pivot = -1;
      let largest = SMALLEST_PIVOT;
      // The proton is the last unknown and is kept free as long as a component can be taken.
      for (let i = 0; i < size; i++) {
        const value = Math.abs(reduced[s * size + i]!) * (i === size - 1 ? 1e-6 : 1);
        if (value > largest) {
          largest = value;
          pivot = i;
        }
      }
      if (pivot < 0) return undefined;
      dependent[s] = pivot;
      const factor = reduced[s * size + pivot]!;
      for (let i = 0; i < size; i++) reduced[s * size + i] = reduced[s * size + i]! / factor;
      for (let i = 0; i < count; i++) operations[s * count + i] = operations[s * count + i]! / factor;
      for (let other = 0; other < count; other++) {
        const times = other === s ? 0 : reduced[other * size + pivot]!;
        if (times === 0) continue;
        for (let i = 0; i < size; i++) reduced[other * size + i] = reduced[other * size + i]! - times * reduced[s * size + i]!;
        for (let i = 0; i < count; i++) operations[other * count + i] = operations[other * count + i]! - times * operations[s * count + i]!;
      }
    }
    return new SaturationConstraint(numbers, size, dependent, reduced, operations);
  }

  /** Value that the dependent unknown of each condition has when all free unknowns are zero. */
  offsets(lnK: Float64Array): Float64Array {
    const count = this.dependent.length;
    const offsets = new Float64Array(count);
    for (let s = 0; s < count; s++) for (let k = 0; k < count; k++) offsets[s] = offsets[s]! + this.#operations[s * count + k]! * lnK[k]!;
    return offsets;
  }

  /** Takes the dependent unknowns out of a row of numbers in place; returns what their offsets add to the exponent. */
  eliminate(row: Float64Array, start: number, offsets: Float64Array): number {
    let constant = 0;
    for (let s = 0; s < this.dependent.length; s++) {
      const column = this.dependent[s]!;
      const number = row[start + column]!;
      if (number === 0) continue;
      constant += number * offsets[s]!;
      for (let i = 0; i < this.#size; i++) row[start + i] = row[start + i]! - number * this.#reduced[s * this.#size + i]!;
      row[start + column] = 0;
    }
    return constant;
  }

  /** Sets the dependent unknowns from the free ones. */
  complete(unknowns: Float64Array, offsets: Float64Array): void {
    for (let s = 0; s < this.dependent.length; s++) {
      const column = this.dependent[s]!;
      let value = offsets[s]!;
      for (let i = 0; i < this.#size; i++) if (i !== column && !this.dependent.includes(i)) value -= this.#reduced[s * this.#size + i]! * unknowns[i]!;
      unknowns[column] = value;
    }
  }

  /**
   * Amounts of the solids, mol/kg water, that make up what the solution lacks of every balance: least squares relative
   * to the size of each balance, since the small ones know a small amount best.
   */
  amounts(lacking: Float64Array, magnitude: Float64Array): Float64Array {
    const count = this.dependent.length;
    const amounts = new Float64Array(count);
    const left = lacking.slice();
    // The balances differ in size by up to ten powers of ten; what one solution of the normal equations leaves, the next takes up.
    for (let round = 0; round < REFINEMENTS; round++) {
      const matrix = new Float64Array(count * count);
      const correction = new Float64Array(count);
      for (let i = 0; i < this.#size; i++) {
        if (magnitude[i] === 0) continue;
        const weight = 1 / (magnitude[i]! * magnitude[i]!);
        for (let a = 0; a < count; a++) {
          const weighted = weight * this.#numbers[a]![i]!;
          if (weighted === 0) continue;
          correction[a] = correction[a]! + weighted * left[i]!;
          for (let b = 0; b < count; b++) matrix[a * count + b] = matrix[a * count + b]! + weighted * this.#numbers[b]![i]!;
        }
      }
      if (!solveGeneral(matrix, correction, count)) return amounts;
      for (let s = 0; s < count; s++) {
        amounts[s] = amounts[s]! + correction[s]!;
        for (let i = 0; i < this.#size; i++) left[i] = left[i]! - this.#numbers[s]![i]! * correction[s]!;
      }
    }
    return amounts;
  }
}
