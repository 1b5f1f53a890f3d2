/** Share of a balance's terms above which one species is said to hold it. */
const MOST_OF_A_BALANCE = 0.7;

/** A multiple of one balance taken off another. */
interface Step {
  readonly column: number;
  readonly other: number;
  readonly times: number;
}

/** The arrays that change; all belong to the balances. */
export interface ChangingArrays {
  /** Number of unknowns; the last is the proton. */
  readonly size: number;
  /** Row-major species × unknowns. */
  readonly numbers: Float64Array;
  readonly totals: Float64Array;
  readonly unknowns: Float64Array;
  readonly molality: Float64Array;
}

/**
 * Rewrites balances so that the species that holds most of a component stands in that balance alone: every other balance
 * in which it occurs has the right multiple of this one taken off. A balance then no longer is the small difference of
 * large terms, as free ligand beside a strongly bound complex otherwise is.
 */
export class ChangeOfBasis {
  readonly #steps: Step[] = [];

  /** Changes the arrays for the molalities as they are. */
  apply(arrays: ChangingArrays): void {
    const { size, numbers } = arrays;
    for (let column = 0; column < size - 1; column++) {
      const species = holderOf(arrays, column);
      if (species < 0) continue;
      const own = numbers[species * size + column]!;
      for (let other = 0; other < size; other++) {
        const times = numbers[species * size + other]! / own;
        if (other !== column && times !== 0 && Number.isInteger(2 * times)) this.#take(arrays, { column, other, times });
      }
    }
  }

  /** Numbers of something else, such as a solid, in the new basis; in place. */
  renumber(numbers: Float64Array): void {
    for (const { column, other, times } of this.#steps) numbers[other] = numbers[other]! - times * numbers[column]!;
  }

  /** The unknowns of the first basis. */
  original(unknowns: Float64Array): Float64Array {
    const first = unknowns.slice();
    for (let place = this.#steps.length - 1; place >= 0; place--) {
      const { column, other, times } = this.#steps[place]!;
      first[column] = first[column]! - times * first[other]!;
    }
    return first;
  }

  #take({ size, numbers, totals, unknowns, molality }: ChangingArrays, step: Step): void {
    const { column, other, times } = step;
    this.#steps.push(step);
    for (let j = 0; j < molality.length; j++) numbers[j * size + other] = numbers[j * size + other]! - times * numbers[j * size + column]!;
    totals[other] = totals[other]! - times * totals[column]!;
    unknowns[column] = unknowns[column]! + times * unknowns[other]!;
  }
}

/** The species that holds nearly all of a balance's terms; −1 for none. */
function holderOf({ size, numbers, molality }: ChangingArrays, column: number): number {
  let most = 0;
  let holder = -1;
  let sum = 0;
  for (let j = 0; j < molality.length; j++) {
    const term = Math.abs(numbers[j * size + column]!) * molality[j]!;
    sum += term;
    if (term <= most) continue;
    most = term;
    holder = j;
  }
  return most > MOST_OF_A_BALANCE * sum ? holder : -1;
}
