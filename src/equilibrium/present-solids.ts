import type { SolidDefinition } from './chemical-system.js';
import type { MassBalances } from './mass-balances.js';

/** Supersaturation, in ln, below which a solid counts as saturated. */
const SATURATED = 1e-9;
const MOST_EXCHANGES = 200;

/**
 * Which solids are present: an active set on the convex problem whose conditions are n·ξ ≤ ln K. A solid of negative
 * amount dissolves; the most supersaturated one forms. Where the phase rule leaves no room, it takes the place of one
 * that it is made of.
 */
export class PresentSolids {
  readonly #balances: MassBalances;
  readonly #solids: readonly SolidDefinition[];
  #present: number[] = [];
  #exchanges = 0;
  /** Grows when a set comes back: two solids on the verge of the same composition, which rounding would exchange for ever. */
  #leniency = 1;
  readonly #visited = new Set<string>();

  constructor(balances: MassBalances, solids: readonly SolidDefinition[]) {
    this.#balances = balances;
    this.#solids = solids;
  }

  /** False when the exchanges did not come to an end. */
  get decided(): boolean {
    return this.#exchanges < MOST_EXCHANGES;
  }

  get any(): boolean {
    return this.#present.length > 0;
  }

  /** States the conditions of the solids present anew, after the balances have been rewritten. */
  restate(): void {
    this.#apply(this.#present);
  }

  /** Takes one step towards the stable set; false when it is reached. */
  exchange(): boolean {
    if (this.#solids.length === 0 || !this.decided) return false;
    this.#exchanges++;
    const key = [...this.#present].sort().join(' ');
    if (this.#visited.has(key)) this.#leniency *= 10;
    this.#visited.add(key);
    const amounts = this.#balances.solidAmounts();
    let least = -SMALLEST_AMOUNT * this.#leniency;
    let leaving = -1;
    amounts.forEach((amount, place) => {
      if (amount < least) {
        least = amount;
        leaving = place;
      }
    });
    if (leaving >= 0) {
      this.#present.splice(leaving, 1);
      this.#apply(this.#present);
      return true;
    }
    let entering = -1;
    let most = SATURATED * this.#leniency;
    this.#solids.forEach((solid, index) => {
      if (this.#present.includes(index)) return;
      const saturation = this.#balances.lnSaturation(solid) / this.#sizeOf(solid);
      if (saturation > most) {
        most = saturation;
        entering = index;
      }
    });
    if (entering < 0) return false;
    if (this.#apply([...this.#present, entering])) {
      this.#present.push(entering);
      return true;
    }
    for (let place = this.#present.length - 1; place >= 0; place--) {
      const exchanged = this.#present.map((index, at) => (at === place ? entering : index));
      if (!this.#apply(exchanged)) continue;
      this.#present = exchanged;
      return true;
    }
    return false;
  }

  /** mol/kg water of every solid of the system. */
  amounts(): Float64Array {
    const all = new Float64Array(this.#solids.length);
    this.#balances.solidAmounts().forEach((amount, place) => (all[this.#present[place]!] = Math.max(0, amount)));
    return all;
  }

  #apply(present: readonly number[]): boolean {
    return this.#balances.saturate(present.map((index) => this.#solids[index]!));
  }

  /** Ions per formula, so that solids of large and small formula are compared fairly. */
  #sizeOf(solid: SolidDefinition): number {
    return solid.stoichiometry.reduce((sum, [, number]) => sum + number, Math.abs(solid.protons));
  }
}

/** mol/kg below which a negative amount is rounding. */
const SMALLEST_AMOUNT = 1e-13;
