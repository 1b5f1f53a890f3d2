import { problem, quote, SoluteError, textOf } from './solute-error.js';

const LOWEST = 0;
const HIGHEST = 100;
const TEXT = /^\s*([+\u2212-]?\d+(?:[.,]\d+)?)\s*(°?\s*C|Cel|K|°?\s*F|\[degF\])?\s*$/i;

/**
 * Celsius from a number or a text: "37", "37 °C", "310.15 K", "Cel" (UCUM). Fahrenheit is read too.
 * @throws SoluteError `temperature-unreadable`, `temperature-out-of-range` (0 to 100 °C, liquid water at 101 kPa).
 */
export function readTemperature(given: unknown): number {
  const typed = textOf(given);
  const match = TEXT.exec(typed.normalize('NFKC').replace('°c', '°C'));
  if (!match) {
    throw new SoluteError([
      problem('temperature-unreadable', `The temperature ${quote(typed)} is not a number of degrees Celsius. Write it as 25 or 25 °C.`, typed, {
        suggestions: [{ value: '25 °C', reason: 'usual room temperature' }],
      }),
    ]);
  }
  const number = Number(match[1]!.replace('\u2212', '-').replace(',', '.'));
  const unit = (match[2] ?? 'C').replace(/[°\s[\]]/g, '').toUpperCase();
  const celsius = unit === 'K' ? round(number - 273.15) : unit === 'F' || unit === 'DEGF' ? round(((number - 32) * 5) / 9) : number;
  if (!(celsius >= LOWEST && celsius <= HIGHEST)) {
    const nearest = celsius < LOWEST ? LOWEST : HIGHEST;
    throw new SoluteError([
      problem('temperature-out-of-range', `${quote(typed)} is outside 0 to 100 °C, where the solvent is liquid water. The nearest valid temperature is ${nearest} °C.`, typed, {
        suggestions: [{ value: `${nearest} °C`, reason: 'nearest valid temperature' }],
      }),
    ]);
  }
  return celsius;
}

/** Takes the rounding noise of the conversion away. */
function round(celsius: number): number {
  return Math.round(celsius * 1e9) / 1e9;
}
