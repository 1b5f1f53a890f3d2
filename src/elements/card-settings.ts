import type { Conditions, Problem, SoluteInput } from '../engine.js';
import { SoluteError } from '../engine.js';
import { readTemperature } from '../quantities/read-temperature.js';
import { english as strings } from './strings/english.js';

/** Sections of the card that can be opened. */
export type Section = 'equations' | 'composition' | 'constants';
export const SECTIONS: readonly Section[] = ['equations', 'composition', 'constants'];

/** Conditions that attributes state. */
export type StatedConditions = Pick<Conditions, 'temperature' | 'air' | 'solids'>;
const AIRS: readonly StatedConditions['air'][] = ['excluded', 'equilibrated'];
const SOLIDS: readonly StatedConditions['solids'][] = ['watched', 'equilibrated'];
const DEFAULTS: StatedConditions = { temperature: 25, air: 'excluded', solids: 'watched' };

/** Solutes as a page may give them. */
export type SolutesGiven = string | readonly SoluteInput[];

/** A setting that was read: always usable, with a note when it was not understood. */
export interface Reading<Value> {
  readonly value: Value;
  readonly note?: string;
  /** Understood, but impossible. */
  readonly problems?: readonly Problem[];
}

/** Frameworks hand over anything; what is neither text nor a list is taken as its JSON, so that its problem is shown. */
export function readSolutes(given: unknown): SolutesGiven {
  if (typeof given === 'string') return given;
  if (given === null || given === undefined) return '';
  if (Array.isArray(given)) return given as readonly SoluteInput[];
  if (typeof given === 'object') return serialized(given);
  return typeof given === 'number' || typeof given === 'boolean' || typeof given === 'bigint' ? String(given) : '';
}

/** The text of the solutes as the record keeps it. */
export function solutesText(solutes: SolutesGiven): string {
  return typeof solutes === 'string' ? solutes : serialized(solutes);
}

export function isEmpty(solutes: SolutesGiven): boolean {
  return typeof solutes === 'string' ? solutes.trim() === '' : solutes.length === 0;
}

function serialized(value: unknown): string {
  try {
    return JSON.stringify(value) ?? '';
  } catch {
    return '[object]';
  }
}

/** Celsius. What cannot be read falls back; what can be read but lies outside liquid water is a problem. */
function readTemperatureSetting(given: unknown, fallback: number): Reading<number> {
  if (given === null || given === undefined || given === '') return { value: fallback };
  try {
    return { value: readTemperature(typeof given === 'number' ? given : shown(given)) };
  } catch (error) {
    if (!(error instanceof SoluteError)) throw error;
    if (error.code === 'temperature-out-of-range') return { value: fallback, problems: error.problems };
    return { value: fallback, note: strings.notes.unreadableTemperature(shown(given), String(fallback)) };
  }
}

function readOneOf<Value extends string>(attribute: string, given: unknown, values: readonly Value[], fallback: Value): Reading<Value> {
  if (given === null || given === undefined || given === '') return { value: fallback };
  const known = values.find((value) => value === given);
  if (known) return { value: known };
  return { value: fallback, note: strings.notes.unknownValue(attribute, shown(given), values.join(', '), fallback) };
}

/** The conditions of an element: its own settings over those around it over the defaults. */
export function readConditions(given: Readonly<Record<keyof StatedConditions, unknown>>, around: Partial<StatedConditions> = {}): Omit<Reading<StatedConditions>, 'note'> & { readonly notes: readonly string[] } {
  const fallback = { ...DEFAULTS, ...around };
  const temperature = readTemperatureSetting(given.temperature, fallback.temperature);
  const air = readOneOf('air', given.air, AIRS, fallback.air);
  const solids = readOneOf('solids', given.solids, SOLIDS, fallback.solids);
  return {
    value: { temperature: temperature.value, air: air.value, solids: solids.value },
    notes: [temperature.note, air.note, solids.note].filter((note) => note !== undefined),
    ...(temperature.problems ? { problems: temperature.problems } : {}),
  };
}

export function readExpandedSetting(given: unknown): Reading<readonly Section[]> {
  const words = shown(given ?? '').split(/\s+/).filter(Boolean);
  const value = SECTIONS.filter((section) => words.includes(section));
  const unknown = words.filter((word) => !(SECTIONS as readonly string[]).includes(word));
  if (unknown.length === 0) return { value };
  const used = value.join(' ') || strings.notes.nothing;
  return { value, note: strings.notes.unknownValue('expanded', unknown.join(' '), SECTIONS.join(', '), used) };
}

const LONGEST_SHOWN = 60;

function shown(given: unknown): string {
  const text = typeof given === 'string' ? given : serialized(given);
  return text.length > LONGEST_SHOWN ? `${text.slice(0, LONGEST_SHOWN)}…` : text;
}
