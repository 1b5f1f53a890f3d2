import type { Particle } from '../substances/ion-library.js';
import type { Chemical } from './prediction.js';

export const PROTON: Chemical = { id: 'H3O+', label: 'H3O', charge: 1, name: 'oxonium' };
export const HYDROXIDE: Chemical = { id: 'OH-', label: 'OH', charge: -1, name: 'hydroxide' };
export const WATER: Chemical = { id: 'H2O', label: 'H2O', charge: 0, name: 'water' };

/** The chemical to show for a particle. */
export function chemicalOf(particle: Particle): Chemical {
  return { id: particle.id, label: particle.label, charge: particle.charge, name: particle.names[0] ?? particle.formula };
}
