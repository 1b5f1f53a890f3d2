/** A positive number as mantissa and power of ten. */
export interface PowerOfTen {
  readonly mantissa: string;
  readonly exponent: string;
}

const MINUS = '\u2212';

/** Decimals of a pH that its standard uncertainty supports: two digits of an uncertainty that begins with 1, else one. */
export function decimalsFor(uncertainty: number): number {
  if (uncertainty < 0.005) return 3;
  if (uncertainty < 0.195) return 2;
  return uncertainty < 1.95 ? 1 : 0;
}

/** Number formats of one language. Latin digits throughout, since they stand beside formulas. */
export class Numbers {
  readonly #language: string;
  readonly #formats = new Map<string, Intl.NumberFormat>();

  constructor(language: string) {
    this.#language = language;
  }

  #format(value: number, key: string, options: Intl.NumberFormatOptions): string {
    let format = this.#formats.get(key);
    if (!format) {
      format = new Intl.NumberFormat(this.#language, { numberingSystem: 'latn', useGrouping: false, ...options });
      this.#formats.set(key, format);
    }
    return format.format(value).replace('-', MINUS);
  }

  /** With exactly this many decimals. */
  fixed(value: number, decimals: number): string {
    // Adding zero turns −0 into 0.
    const rounded = Number(value.toFixed(decimals)) + 0;
    return this.#format(rounded, `f${decimals}`, { minimumFractionDigits: decimals, maximumFractionDigits: decimals });
  }

  /** With its sign, except zero. */
  signed(value: number, decimals: number): string {
    const fixed = this.fixed(value, decimals);
    return Number(value.toFixed(decimals)) > 0 ? `+${fixed}` : fixed;
  }

  /** As few digits as the number has, at most so many decimals. */
  plain(value: number, decimals = 6): string {
    return this.#format(value, `p${decimals}`, { maximumFractionDigits: decimals });
  }

  /** With exactly this many significant digits. */
  significant(value: number, digits: number): string {
    return this.#format(value, `s${digits}`, { minimumSignificantDigits: digits, maximumSignificantDigits: digits });
  }

  pH(value: number, uncertainty: number): string {
    return this.fixed(value, decimalsFor(uncertainty));
  }

  /** Never rounds down to nothing. */
  uncertainty(uncertainty: number): string {
    return this.fixed(Math.max(uncertainty, 0.001), decimalsFor(uncertainty));
  }

  powerOfTen(value: number, digits = 2): PowerOfTen {
    const [mantissa = '', exponent = '0'] = value.toExponential(digits - 1).split('e');
    return { mantissa: this.fixed(Number(mantissa), digits - 1), exponent: this.fixed(Number(exponent), 0) };
  }

  /** An amount: plain digits where they can be read at a glance, else undefined, to be written as a power of ten. */
  amount(value: number, digits = 3): string | undefined {
    if (value === 0) return this.fixed(0, 0);
    return Math.abs(value) >= 1e-4 && Math.abs(value) < 1e5 ? this.significant(value, digits) : undefined;
  }

  /** A share between 0 and 1 in percent: two digits when small, never rounded to 0 or 100. */
  percent(share: number): string {
    const percent = share * 100;
    if (percent <= 0) return this.#unit(this.fixed(0, 0));
    if (percent < 1e-4) return this.#unit(`< ${this.plain(0.0001)}`);
    if (percent > 99.9 && percent < 100) return this.#unit(`> ${this.plain(99.9)}`);
    if (percent >= 100) return this.#unit(this.fixed(100, 0));
    return this.#unit(percent < 10 ? this.significant(percent, 2) : this.fixed(percent, percent < 99 ? 0 : 1));
  }

  #unit(number: string): string {
    return `${number}\u00a0%`;
  }
}

const cache = new Map<string, Numbers>();

/** The formats of a language tag, English for a tag that is none. */
export function numbersFor(language: string): Numbers {
  let numbers = cache.get(language);
  if (!numbers) {
    numbers = new Numbers(isLanguage(language) ? language : 'en');
    cache.set(language, numbers);
  }
  return numbers;
}

function isLanguage(tag: string): boolean {
  try {
    return Intl.getCanonicalLocales(tag).length > 0;
  } catch {
    return false;
  }
}

/** The language stated nearest to the element, looked for through shadow roots. */
export function nearestLanguage(element: Element): string {
  let node: Element | null = element;
  while (node) {
    const stated: string | null | undefined = node.closest('[lang]')?.getAttribute('lang');
    if (stated) return stated;
    const root = node.getRootNode();
    node = 'host' in root ? (root as ShadowRoot).host : null;
  }
  return element.ownerDocument.documentElement?.lang || 'en';
}
