import { SoluteCard, SoluteConditions } from './index.js';

// Conditions first: cards that are upgraded find those above them.
SoluteConditions.define();
SoluteCard.define();

export * from './index.js';
