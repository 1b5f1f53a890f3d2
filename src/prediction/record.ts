import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import canonicalize from 'canonicalize';
import release from '../../data/release.json';
import { formatEquation } from './plain-text.js';
import type { Prediction } from './prediction.js';
import type { SoluteRecord } from './record-format.js';

/** What a record holds beside the prediction. */
export interface RecordOptions {
  readonly label?: string;
  /** The solutes as typed; by default the pieces that were understood, joined with semicolons. */
  readonly solutes?: string;
}

/** Decimals of pH and pK in a record: far below any uncertainty, far above the rounding of the solver. */
const PH_DECIMALS = 6;
const SIGNIFICANT_DIGITS = 9;

/**
 * The plain JSON to store. Numbers are rounded so that the same input gives the same bytes in every JavaScript engine;
 * `digest` is SHA-256 over the RFC 8785 form of all other members.
 */
export function createRecord(prediction: Prediction, options: RecordOptions = {}): SoluteRecord {
  const body: Omit<SoluteRecord, 'digest'> = {
    format: 'solute-record/1',
    ...(options.label === undefined || options.label === '' ? {} : { label: options.label }),
    solutes: options.solutes ?? prediction.understood.map(({ typed }) => typed).join('; '),
    understood: prediction.understood.map(({ typed, formula, name, cas, molarMass, molarity, molality, assumptions }) => ({
      typed,
      formula,
      ...(name === undefined ? {} : { name }),
      ...(cas === undefined ? {} : { cas }),
      molarMass: significant(molarMass),
      molarity: significant(molarity),
      molality: significant(molality),
      assumptions: assumptions.map(({ code }) => code),
    })),
    conditions: { ...prediction.conditions },
    pH: decimals(prediction.pH),
    uncertainty: decimals(prediction.uncertainty),
    neutralPH: decimals(prediction.neutralPH),
    classification: prediction.classification,
    decided: prediction.decided,
    ionicStrength: significant(prediction.ionicStrength),
    inAir: decimals(prediction.inAir),
    withoutAir: decimals(prediction.withoutAir),
    reason: prediction.reason.text,
    equations: [...prediction.dissociation, ...prediction.hydrolysis].map(formatEquation),
    cautions: prediction.cautions.map(({ code, text }) => ({ code, text })),
    constants: prediction.constants.map(({ id, quantity, value, uncertainty, source, obtained }) => ({ id, quantity, value: decimals(value), uncertainty, source, obtained })),
    engine: { version: release.engine },
    data: { version: release.data, digest: release.digest },
  };
  return { ...body, digest: digestOf(body) };
}

/** SHA-256 over the RFC 8785 form, hexadecimal. */
export function digestOf(body: Omit<SoluteRecord, 'digest'>): string {
  return bytesToHex(sha256(utf8ToBytes(canonicalize(body)!)));
}

function decimals(value: number): number {
  return Number(value.toFixed(PH_DECIMALS));
}

function significant(value: number): number {
  return Number(value.toPrecision(SIGNIFICANT_DIGITS));
}
