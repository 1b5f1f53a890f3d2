import { readFileSync } from 'node:fs';
import { join } from 'node:path';

const folder = join(import.meta.dirname, '..', '..', 'data');

export function read<Content = unknown>(name: string): Content {
  return JSON.parse(readFileSync(join(folder, name), 'utf8')) as Content;
}

export interface State { id: string; formula: string; charge: number; name: string; label?: string }
export interface Step { pKa: number; uncertainty: number | null; grade: string; ionicStrength: number; source: string; obtained: string }
export interface Family { key: string; name: string; states: State[]; steps: Step[] }
export interface Hydrolysis { metal: number; hydroxide: number; id: string; formula: string; charge: number; logK: number; source: string }
export interface Metal { key: string; ion: string; formula: string; charge: number; hydrolysis: Hydrolysis[] }
export interface Gives {
  families?: Record<string, number>; metals?: Record<string, number>; ions?: Record<string, number>; protons?: number;
}
export interface Ion {
  id: string; charge: number; formula: string; label?: string; names: string[]; written?: string[];
  gives?: Gives; spectator?: string; refused?: string;
}
export type Substance = [names: string[], formula: string, cas: string | null, parts: string, obtained: string];

export const families = read<{ families: Family[] }>('acid-base-families.json').families;
export const metals = read<{ metals: Metal[] }>('metal-ions.json').metals;
export const ions = read<{ ions: Ion[] }>('ions.json').ions;
export const substances = read<{ rows: Substance[] }>('substances.json').rows;
export const elements = read<{ elements: Record<string, [number, number | null]> }>('elements.json').elements;

/** Charge that an id shows ("HPO4-2", "C4H7O2-_iso", "NH3"). */
export function chargeShown(id: string): number {
  const [, sign, size] = /^[^+\-_]+(?:([+-])(\d*))?/.exec(id)!;
  return sign === undefined ? 0 : Number(sign + (size || '1'));
}

export function repeated(values: Iterable<string>): string[] {
  const seen = new Set<string>();
  return [...values].filter((value) => seen.size === seen.add(value).size);
}
