/** The DOM-free entry: `solute-card/engine`. Runs in Node, workers and browsers. */
export { predict, type PredictionInput, type SoluteInput } from './prediction/predict.js';
export { sweep, type Sweep, type SweepAlong, type SweepPoint } from './prediction/sweep.js';
export { createRecord, type RecordOptions } from './prediction/record.js';
export { verifyRecord, type Verification } from './prediction/verify-record.js';
export type * from './prediction/prediction.js';
export type { SoluteRecord } from './prediction/record-format.js';
export { SoluteError, type Problem, type ProblemCode, type Suggestion, type TextRange } from './quantities/solute-error.js';
export { formatEquation, formatChemical } from './prediction/plain-text.js';
