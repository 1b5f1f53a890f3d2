/** Classes, events and types; registers nothing. */
export { SoluteCard, type CardState } from './elements/card.js';
export { SoluteConditions } from './elements/conditions.js';
export {
  SolutePredictionEvent, SoluteProblemEvent, SoluteStoreEvent,
  type PredictionDetail, type ProblemDetail, type Source, type StoreDetail,
} from './elements/events.js';
export type { Strings } from './elements/strings/english.js';
export type * from './engine.js';
