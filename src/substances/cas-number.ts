const PATTERN = /^(?:cas(?:[\s-]*(?:rn|nr\.?|no\.?|number))?[\s:#]*)?(\d{2,7})[-\u2010-\u2013\u2212](\d{2})[-\u2010-\u2013\u2212](\d)$/i;

/** The CAS Registry Number in a text, with plain hyphens; undefined when the text is none. */
export function readCasNumber(text: string): string | undefined {
  const match = PATTERN.exec(text.trim());
  return match ? `${match[1]}-${match[2]}-${match[3]}` : undefined;
}

/** Last digit that a CAS Registry Number must have: the sum of digits weighted by their place from the right, modulo 10. */
export function casCheckDigit(cas: string): number {
  const digits = cas.replace(/-/g, '').slice(0, -1);
  let sum = 0;
  for (let place = 1; place <= digits.length; place++) sum += place * Number(digits[digits.length - place]);
  return sum % 10;
}

export function hasValidCheckDigit(cas: string): boolean {
  return casCheckDigit(cas) === Number(cas.at(-1));
}
