import { SoluteError } from '../quantities/solute-error.js';
import { predict } from './predict.js';
import { createRecord, digestOf } from './record.js';
import type { SoluteRecord } from './record-format.js';

/** What recomputing a stored record showed. */
export type Verification =
  | { readonly verdict: 'same' }
  /** The record is intact, but this version computes something else: the constants that differ, and by how much. */
  | { readonly verdict: 'changed'; readonly pH: { readonly stored: number; readonly now: number }; readonly constants: readonly ChangedConstant[] }
  /** The record is intact, but what was typed is no longer understood. */
  | { readonly verdict: 'not-computable'; readonly reason: string }
  /** The digest does not fit the content, or the record is not one. */
  | { readonly verdict: 'tampered' };

export interface ChangedConstant {
  readonly id: string;
  /** Null where the constant is in one of the two only. */
  readonly stored: number | null;
  readonly now: number | null;
}

/**
 * Checks a stored record: first that nothing in it was altered, then that the same input still gives the same numbers.
 * Never throws.
 */
export function verifyRecord(record: SoluteRecord): Verification {
  if (!isIntact(record)) return { verdict: 'tampered' };
  try {
    const now = createRecord(predict(record.solutes, record.conditions), {
      solutes: record.solutes,
      ...(record.label === undefined ? {} : { label: record.label }),
    });
    const constants = changedConstants(record, now);
    if (record.pH === now.pH && record.uncertainty === now.uncertainty && record.classification === now.classification && constants.length === 0) return { verdict: 'same' };
    return { verdict: 'changed', pH: { stored: record.pH, now: now.pH }, constants };
  } catch (error) {
    if (!(error instanceof SoluteError)) throw error;
    return { verdict: 'not-computable', reason: error.message };
  }
}

function isIntact(record: SoluteRecord): boolean {
  if (typeof record !== 'object' || record === null || record.format !== 'solute-record/1' || typeof record.solutes !== 'string') return false;
  const { digest, ...body } = record;
  try {
    return digest === digestOf(body);
  } catch {
    return false;
  }
}

function changedConstants(stored: SoluteRecord, now: SoluteRecord): ChangedConstant[] {
  const before = new Map(stored.constants.map(({ id, value }) => [id, value]));
  const after = new Map(now.constants.map(({ id, value }) => [id, value]));
  return [...new Set([...before.keys(), ...after.keys()])]
    .map((id) => ({ id, stored: before.get(id) ?? null, now: after.get(id) ?? null }))
    .filter((constant) => constant.stored !== constant.now);
}
