import { html, type TemplateResult } from 'lit';
import type { Numbers } from './numbers.js';

/** A quantity as plain text. */
export function amountText(value: number, numbers: Numbers): string {
  return numbers.amount(value) ?? value.toExponential(2);
}

/** A quantity in plain digits, or as a power of ten where plain digits could not be read at a glance. */
export function renderAmount(value: number, numbers: Numbers, digits = 3): TemplateResult | string {
  const plain = numbers.amount(value, digits);
  if (plain !== undefined) return plain;
  const { mantissa, exponent } = numbers.powerOfTen(value, Math.min(digits, 2));
  return html`<bdi dir="ltr">${mantissa} × 10<sup>${exponent}</sup></bdi>`;
}
