import { Decimal as Base } from 'decimal.js';

/** Decimal arithmetic of the package: 40 significant digits, its own constructor so that no page setting changes it. */
export const Decimal = Base.clone({ precision: 40, toExpNeg: -9, toExpPos: 21, rounding: 4, modulo: 1, maxE: 9e15, minE: -9e15, defaults: true });
export type Decimal = Base;
