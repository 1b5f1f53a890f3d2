import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Published values that stand beside the tests, each with its citation. */
export function readValues<Content>(name: string): Content {
  return JSON.parse(readFileSync(join(import.meta.dirname, 'values', `${name}.json`), 'utf8')) as Content;
}

/** Lines of a table with columns of equal width, for a test's report. */
export function tableLines(rows: readonly (readonly (string | number)[])[]): string[] {
  const texts = rows.map((row) => row.map(String));
  const widths = texts[0]!.map((_, column) => Math.max(...texts.map((row) => row[column]?.length ?? 0)));
  return texts.map((row) => row.map((text, column) => text.padEnd(widths[column]!)).join('  ').trimEnd());
}

/** A deviation in thousandths of a pH unit, with sign. */
export function thousandths(deviation: number): string {
  const rounded = Math.round(deviation * 1000);
  return rounded > 0 ? `+${rounded}` : String(rounded);
}

export function rootMeanSquare(deviations: readonly number[]): number {
  return Math.sqrt(deviations.reduce((sum, deviation) => sum + deviation * deviation, 0) / deviations.length);
}
