/**
 * Solves A x = b for a symmetric positive definite matrix after scaling its diagonal to one (Jacobi), by Cholesky
 * factorisation. `a` is row-major n×n and is overwritten with the factor; `b` is overwritten with x.
 * A pivot lost to rounding is replaced by one, which makes the step in that direction a gradient step.
 */
export function solveScaled(a: Float64Array, b: Float64Array, n: number, scale: Float64Array): void {
  factorScaled(a, n, scale);
  solveFactored(a, b, n, scale);
}

/** The factorisation of {@link solveScaled} alone; `scale` receives 1/√diagonal. */
export function factorScaled(a: Float64Array, n: number, scale: Float64Array): void {
  for (let i = 0; i < n; i++) scale[i] = 1 / Math.sqrt(a[i * n + i]!);
  for (let i = 0; i < n; i++) for (let j = 0; j <= i; j++) a[i * n + j] = a[i * n + j]! * scale[i]! * scale[j]!;
  for (let j = 0; j < n; j++) {
    let pivot = a[j * n + j]!;
    for (let k = 0; k < j; k++) pivot -= a[j * n + k]! * a[j * n + k]!;
    pivot = pivot > SMALLEST_PIVOT ? Math.sqrt(pivot) : 1;
    a[j * n + j] = pivot;
    for (let i = j + 1; i < n; i++) {
      let sum = a[i * n + j]!;
      for (let k = 0; k < j; k++) sum -= a[i * n + k]! * a[j * n + k]!;
      a[i * n + j] = sum / pivot;
    }
  }
}

/** Solves with the factor that {@link factorScaled} left; `b` is overwritten with x. */
export function solveFactored(a: Float64Array, b: Float64Array, n: number, scale: Float64Array): void {
  for (let i = 0; i < n; i++) {
    let sum = b[i]! * scale[i]!;
    for (let k = 0; k < i; k++) sum -= a[i * n + k]! * b[k]!;
    b[i] = sum / a[i * n + i]!;
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i]!;
    for (let k = i + 1; k < n; k++) sum -= a[k * n + i]! * b[k]!;
    b[i] = sum / a[i * n + i]!;
  }
  for (let i = 0; i < n; i++) b[i] = b[i]! * scale[i]!;
}

/** Relative to the unit diagonal. */
const SMALLEST_PIVOT = 1e-15;

/**
 * Solves A x = b by Gaussian elimination with partial pivoting; `a` (row-major n×n) and `b` are overwritten.
 * @returns false when A is singular to working precision.
 */
export function solveGeneral(a: Float64Array, b: Float64Array, n: number, columns = 1): boolean {
  for (let j = 0; j < n; j++) {
    let pivot = j;
    for (let i = j + 1; i < n; i++) if (Math.abs(a[i * n + j]!) > Math.abs(a[pivot * n + j]!)) pivot = i;
    const size = Math.abs(a[pivot * n + j]!);
    if (!(size > 0)) return false;
    if (pivot !== j) {
      for (let k = j; k < n; k++) [a[j * n + k], a[pivot * n + k]] = [a[pivot * n + k]!, a[j * n + k]!];
      for (let k = 0; k < columns; k++) [b[j * columns + k], b[pivot * columns + k]] = [b[pivot * columns + k]!, b[j * columns + k]!];
    }
    for (let i = j + 1; i < n; i++) {
      const factor = a[i * n + j]! / a[j * n + j]!;
      if (factor === 0) continue;
      for (let k = j + 1; k < n; k++) a[i * n + k] = a[i * n + k]! - factor * a[j * n + k]!;
      for (let k = 0; k < columns; k++) b[i * columns + k] = b[i * columns + k]! - factor * b[j * columns + k]!;
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let k = 0; k < columns; k++) {
      let sum = b[i * columns + k]!;
      for (let m = i + 1; m < n; m++) sum -= a[i * n + m]! * b[m * columns + k]!;
      b[i * columns + k] = sum / a[i * n + i]!;
    }
  }
  return true;
}
