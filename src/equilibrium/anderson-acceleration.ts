import { solveGeneral } from './linear-algebra.js';

const DEPTH = 4;
/** Largest step of a combination, in the logarithm of an activity coefficient; plain steps are not bounded. */
const LARGEST_STEP = 5;
/** Growing residuals after which no more combinations are tried. */
const MOST_SETBACKS = 10;
const WEIGHTS = [0.5, 0.2, 0.05, 0.0125, 0.003] as const;
const STEPS_OF_A_WEIGHT = 90;

/**
 * Accelerates a fixed-point iteration x ← g(x) by combining the last few steps (D. G. Anderson, J. ACM 12 (1965) 547;
 * the least-squares form of Walker & Ni, SIAM J. Numer. Anal. 49 (2011) 1715, eq. 2.2).
 * When residuals keep growing it goes over to plain steps, of a length that is cut from time to time: a map that leads
 * away from here is followed with the longer ones, and an oscillating one, however steep, is damped by the shorter.
 */
export class AndersonAcceleration {
  readonly #size: number;
  readonly #points: Float64Array[] = [];
  readonly #residuals: Float64Array[] = [];
  #lastNorm = Infinity;
  #setbacks = 0;
  #plainSteps = 0;

  constructor(size: number) {
    this.#size = size;
  }

  /** Replaces `x` by the next point, given g(x). */
  advance(x: Float64Array, image: Float64Array): void {
    const residual = new Float64Array(this.#size);
    let norm = 0;
    for (let j = 0; j < this.#size; j++) {
      residual[j] = image[j]! - x[j]!;
      norm = Math.max(norm, Math.abs(residual[j]!));
    }
    if (norm > this.#lastNorm) this.#setbacks++;
    this.#lastNorm = norm;
    this.#points.push(x.slice());
    this.#residuals.push(residual);
    if (this.#points.length > DEPTH + 1) {
      this.#points.shift();
      this.#residuals.shift();
    }
    if (this.#setbacks < MOST_SETBACKS && this.#points.length > 1 && this.#combine(x)) return;
    const weight = this.#setbacks < MOST_SETBACKS ? 1 : WEIGHTS[Math.min(WEIGHTS.length - 1, Math.floor(this.#plainSteps++ / STEPS_OF_A_WEIGHT))]!;
    for (let j = 0; j < this.#size; j++) x[j] = x[j]! + weight * residual[j]!;
  }

  #combine(x: Float64Array): boolean {
    const last = this.#points.length - 1;
    const residual = this.#residuals[last]!;
    const matrix = new Float64Array(last * last);
    const right = new Float64Array(last);
    for (let a = 0; a < last; a++) {
      for (let b = 0; b <= a; b++) {
        let sum = 0;
        for (let j = 0; j < this.#size; j++) sum += (this.#residuals[a + 1]![j]! - this.#residuals[a]![j]!) * (this.#residuals[b + 1]![j]! - this.#residuals[b]![j]!);
        matrix[a * last + b] = sum;
        matrix[b * last + a] = sum;
      }
      let sum = 0;
      for (let j = 0; j < this.#size; j++) sum += (this.#residuals[a + 1]![j]! - this.#residuals[a]![j]!) * residual[j]!;
      right[a] = sum;
      matrix[a * last + a] = matrix[a * last + a]! * (1 + 1e-12);
    }
    if (!solveGeneral(matrix, right, last)) return false;
    const step = new Float64Array(this.#size);
    for (let j = 0; j < this.#size; j++) {
      let value = residual[j]!;
      for (let a = 0; a < last; a++) {
        value -= right[a]! * (this.#points[a + 1]![j]! - this.#points[a]![j]! + this.#residuals[a + 1]![j]! - this.#residuals[a]![j]!);
      }
      if (!Number.isFinite(value) || Math.abs(value) > LARGEST_STEP) return false;
      step[j] = value;
    }
    for (let j = 0; j < this.#size; j++) x[j] = x[j]! + step[j]!;
    return true;
  }
}
