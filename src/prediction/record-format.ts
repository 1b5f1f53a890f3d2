import type { Caution, Conditions, ConstantUsed, Prediction } from './prediction.js';

/** The plain JSON that a host stores. Its schema is data/record.schema.json. */
export interface SoluteRecord {
  readonly format: 'solute-record/1';
  readonly label?: string;
  /** The solutes text as typed. */
  readonly solutes: string;
  readonly understood: readonly { typed: string; formula: string; name?: string; cas?: string; molarMass: number; molarity: number; molality: number; assumptions: readonly string[] }[];
  readonly conditions: Conditions;
  readonly pH: number;
  readonly uncertainty: number;
  readonly neutralPH: number;
  readonly classification: Prediction['classification'];
  readonly decided: boolean;
  readonly ionicStrength: number;
  readonly inAir: number;
  readonly withoutAir: number;
  readonly reason: string;
  /** Plain-text equations in the order shown. */
  readonly equations: readonly string[];
  readonly cautions: readonly Pick<Caution, 'code' | 'text'>[];
  readonly constants: readonly Pick<ConstantUsed, 'id' | 'quantity' | 'value' | 'uncertainty' | 'source' | 'obtained'>[];
  readonly engine: { readonly version: string };
  readonly data: { readonly version: string; readonly digest: string };
  /** SHA-256 over the RFC 8785 form of the record without this member, hexadecimal. */
  readonly digest: string;
}
