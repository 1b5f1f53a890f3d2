import { createContext } from '@lit/context';
import type { StatedConditions } from './card-settings.js';

/** Conditions that the page states once for all cards below; an absent one is left to the card. */
export type ProvidedConditions = Partial<StatedConditions>;

/** The key is registered by name, so that two copies of the package on a page share it. */
export const conditionsContext = createContext<ProvidedConditions>(Symbol.for('solute-card/conditions'));
