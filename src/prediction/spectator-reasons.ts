import type { Particle, SpectatorReason } from '../substances/ion-library.js';
import { formatChemical } from './plain-text.js';
import type { Remark } from './prediction.js';

const SENTENCES: Readonly<Record<SpectatorReason, (ion: string) => string>> = {
  'strong-base-cation': (ion) => `No reaction: ${ion} is the cation of a strong base and holds its water too loosely to give up a proton.`,
  'quaternary-cation': (ion) => `No reaction: ${ion} has no proton to give up.`,
  'strong-acid-anion': (ion) => `No reaction: ${ion} is the anion of a strong acid and takes up no proton in water.`,
  'inert-complex': (ion) => `No reaction: ${ion} is an inert complex that keeps its ligands in water.`,
  'stable-anion': (ion) => `No reaction: ${ion} takes up no proton in water.`,
};

/** Why an ion takes no part. @param particle a spectator. */
export function spectatorRemark(particle: Particle): Remark {
  const code = particle.spectator!;
  return { code, text: SENTENCES[code](formatChemical(particle)) };
}
