import { LN10 } from '../quantities/reproducible-math.js';
import type { ChemicalSystem, InteractionTable } from './chemical-system.js';
import { solveGeneral } from './linear-algebra.js';
import type { EquilibriumState } from './solver.js';
import { debyeHueckelDerivative, ionicStrengthOf } from './specific-interaction.js';

/** First derivatives of pH at a solved state. */
export interface Sensitivities {
  /** ∂pH/∂(ln β) of every species. */
  readonly toLnBeta: Float64Array;
  /** ∂pH/∂(total) of every component, kg/mol; 0 for those held from outside. */
  readonly toTotal: Float64Array;
  /** ∂pH/∂(proton total), kg/mol: negative; its inverse with opposite sign is the buffer capacity. */
  readonly toProtonTotal: number;
  /** ∂pH/∂(ln γ) of every species from outside the model, as the model error of the coefficients acts. */
  readonly toLnGamma: Float64Array;
  /** ∂pH/∂(ln K) of every solid of the system; 0 for those not present. */
  readonly toLnSolubility: Float64Array;
}

/**
 * Implicit differentiation of the solved balances. With M = diag(m), N the stoichiometric numbers and G = ∂ln γ/∂m,
 * dm = (M⁻¹ + G)⁻¹ (N dξ + d ln β − d ln γ) and Nᵀ dm = dt, so that one symmetric system gives all derivatives of pH
 * (adjoint form). A solid that is present adds its condition n·dξ = d ln K and an unknown amount. The activity of water
 * is held.
 * @returns undefined when the system is singular to working precision.
 */
export function sensitivities(system: ChemicalSystem, table: InteractionTable, state: EquilibriumState): Sensitivities | undefined {
  const count = system.species.length;
  const free = system.components.map((component, index) => ({ component, index })).filter(({ component }) => component.lnActivity === undefined);
  const size = free.length + 1;
  const numbers = stoichiometricNumbers(system, free.map(({ index }) => index));
  const root = new Float64Array(count);
  // A species of fixed molality does not respond.
  for (let j = 0; j < count; j++) root[j] = system.species[j]!.fixedMolality === undefined ? Math.sqrt(state.molality[j]!) : 0;

  // √M (M⁻¹ + G) √M = 1 + √M G √M, well scaled whatever the molalities.
  const matrix = new Float64Array(count * count);
  const ionicStrength = ionicStrengthOf(state.molality, table.charges);
  const inside = ionicStrength <= table.ceiling && ionicStrength > 0;
  const slope = inside ? debyeHueckelDerivative(ionicStrength, table.slope, table.denominator) : 0;
  for (let j = 0; j < count; j++) {
    for (let k = 0; k < count; k++) {
      const zj = table.charges[j]!;
      const zk = table.charges[k]!;
      const g = inside ? LN10 * (table.epsilon[j * count + k]! - (zj * zj * zk * zk * slope) / 2) : 0;
      matrix[j * count + k] = (j === k ? 1 : 0) + root[j]! * g * root[k]!;
    }
  }
  const scaled = new Float64Array(count * size);
  for (let j = 0; j < count; j++) for (let i = 0; i < size; i++) scaled[j * size + i] = root[j]! * numbers[j * size + i]!;
  const response = scaled.slice();
  if (!solveGeneral(matrix, response, count, size)) return undefined;

  // Nᵀ W N with W = √M (1 + √M G √M)⁻¹ √M, bordered by the conditions of the solids present.
  const solids = (system.solids ?? []).map((solid, index) => ({ solid, index })).filter(({ index }) => state.solidAmounts[index]! > 0);
  const order = size + solids.length;
  const bordered = new Float64Array(order * order);
  for (let a = 0; a < size; a++) {
    for (let b = 0; b < size; b++) {
      let sum = 0;
      for (let j = 0; j < count; j++) sum += scaled[j * size + a]! * response[j * size + b]!;
      bordered[a * order + b] = sum;
    }
  }
  const column = new Map(free.map(({ index }, i) => [index, i]));
  solids.forEach(({ solid }, place) => {
    const row = size + place;
    const set = (i: number, number: number): void => {
      bordered[row * order + i] = number;
      bordered[i * order + row] = number;
    };
    set(size - 1, solid.protons);
    for (const [component, number] of solid.stoichiometry) if (column.has(component)) set(column.get(component)!, number);
  });
  const proton = new Float64Array(order);
  proton[size - 1] = 1;
  if (!solveGeneral(bordered, proton, order)) return undefined;

  // pH = −y/ln 10; dy = vᵀ (dt, d ln K) − (W N v)ᵀ (d ln β − d ln γ).
  const toTotal = new Float64Array(system.components.length);
  free.forEach(({ index }, i) => (toTotal[index] = -proton[i]! / LN10));
  const toLnBeta = new Float64Array(count);
  const toLnGamma = new Float64Array(count);
  for (let j = 0; j < count; j++) {
    let sum = 0;
    for (let i = 0; i < size; i++) sum += response[j * size + i]! * proton[i]!;
    toLnBeta[j] = (root[j]! * sum) / LN10;
    toLnGamma[j] = -toLnBeta[j]!;
  }
  const toLnSolubility = new Float64Array(system.solids?.length ?? 0);
  solids.forEach(({ index }, place) => (toLnSolubility[index] = -proton[size + place]! / LN10));
  return { toLnBeta, toLnSolubility, toTotal, toProtonTotal: -proton[size - 1]! / LN10, toLnGamma };
}

function stoichiometricNumbers(system: ChemicalSystem, free: readonly number[]): Float64Array {
  const size = free.length + 1;
  const column = new Map(free.map((index, i) => [index, i]));
  const numbers = new Float64Array(system.species.length * size);
  system.species.forEach((species, j) => {
    for (const [component, number] of species.stoichiometry) {
      const i = column.get(component);
      if (i !== undefined) numbers[j * size + i] = number;
    }
    numbers[j * size + size - 1] = species.protons;
  });
  return numbers;
}
