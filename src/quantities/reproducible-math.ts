/**
 * Exponential and logarithm from +, −, ×, ÷ alone.
 *
 * IEEE 754 fixes the result of those four to the last bit, but ECMAScript leaves Math.exp and Math.log to the
 * implementation. Records must be the same in every engine, so every layer below the elements uses these two.
 *
 * Method: argument reduction and minimax polynomials of the freely distributable math library (fdlibm, e_exp.c and
 * e_log.c, Sun Microsystems 1993); error below 1 unit in the last place.
 */

const LN2_HIGH = 6.93147180369123816490e-1;
const LN2_LOW = 1.90821492927058770002e-10;
const INVERSE_LN2 = 1.44269504088896338700;
const SMALLEST_EXPONENT = -1074;
const LARGEST_EXPONENT = 1023;

/** Natural logarithm of 10. */
export const LN10 = 2.302585092994046;

/** Every power of two that a double can hold; doubling and halving are exact. */
const POWERS_OF_TWO = (() => {
  const powers = new Float64Array(LARGEST_EXPONENT - SMALLEST_EXPONENT + 1);
  powers[-SMALLEST_EXPONENT] = 1;
  for (let k = 1; k <= LARGEST_EXPONENT; k++) powers[k - SMALLEST_EXPONENT] = powers[k - 1 - SMALLEST_EXPONENT]! * 2;
  for (let k = -1; k >= SMALLEST_EXPONENT; k--) powers[k - SMALLEST_EXPONENT] = powers[k + 1 - SMALLEST_EXPONENT]! / 2;
  return powers;
})();

const float = new Float64Array(1);
const words = new Uint32Array(float.buffer);
const HIGH_WORD = (() => {
  float[0] = 1;
  return words[1] === 0x3ff00000 ? 1 : 0;
})();

/**
 * e to the power x.
 * @param x any number; above 709.78 the result is Infinity, below −745.2 it is 0, NaN gives NaN.
 */
export function exp(x: number): number {
  if (!(x >= -745.2)) return x !== x ? x : 0;
  if (x > 709.782712893384) return Infinity;
  const k = Math.floor(x * INVERSE_LN2 + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c =
    r -
    t *
      (1.66666666666666019037e-1 +
        t * (-2.77777777770155933842e-3 + t * (6.61375632143793436117e-5 + t * (-1.65339022054652515390e-6 + t * 4.13813679705723846039e-8))));
  const y = 1 - (low - (r * c) / (2 - c) - high);
  // Two factors, since 2^k alone overflows for k = 1024 and y·2^k may be subnormal.
  const half = k >> 1;
  return y * POWERS_OF_TWO[half - SMALLEST_EXPONENT]! * POWERS_OF_TWO[k - half - SMALLEST_EXPONENT]!;
}

/**
 * Natural logarithm.
 * @param x 0 gives −Infinity, a negative number or NaN gives NaN.
 */
export function log(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  let k = 0;
  if (x < 2.2250738585072014e-308) {
    x *= 18014398509481984;
    k = -54;
  }
  float[0] = x;
  let high = words[HIGH_WORD]!;
  k += (high >>> 20) - 1023;
  high &= 0x000fffff;
  const shift = (high + 0x95f64) & 0x100000;
  words[HIGH_WORD] = high | (shift ^ 0x3ff00000);
  k += shift >>> 20;
  const f = float[0] - 1;
  if (f === 0) return k * LN2_HIGH + k * LN2_LOW;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const odd = w * (0.3999999999940941908 + w * (0.2222219843214978396 + w * 0.1531383769920937332));
  const even = z * (0.6666666666666735130 + w * (0.2857142874366239149 + w * (0.1818357216161805012 + w * 0.1479819860511658591)));
  const halfSquare = 0.5 * f * f;
  return k * LN2_HIGH - (halfSquare - (s * (halfSquare + odd + even) + k * LN2_LOW) - f);
}

/** Decadic logarithm; same limits as {@link log}. */
export function log10(x: number): number {
  return log(x) / LN10;
}

/** 10 to the power x; same limits as {@link exp} with x·ln 10. */
export function exp10(x: number): number {
  return exp(x * LN10);
}

/** x to the power y for positive x. */
export function power(x: number, y: number): number {
  return exp(y * log(x));
}
