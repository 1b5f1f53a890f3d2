import sources from '../../data/sources.json';
import water from '../../data/water.json';
import type { Water } from '../equilibrium/water.js';
import { formatChemical } from './plain-text.js';
import type { ConstantUsed } from './prediction.js';
import type { SolvedSolution } from './solved-solution.js';

const CITATIONS = sources.sources as unknown as Readonly<Record<string, { citation: string }>>;

/** The full citation of a source key. */
export function citationOf(source: string): string {
  return CITATIONS[source]!.citation;
}

/** Every constant that entered the calculation, water first. */
export function constantsUsed({ model }: SolvedSolution, { pKw, temperature }: Water): ConstantUsed[] {
  const used: ConstantUsed[] = [
    {
      id: 'water',
      description: 'ion product of water',
      quantity: 'pKw',
      value: pKw,
      uncertainty: water.ionProduct.uncertainty,
      temperature,
      ionicStrength: 0,
      valueHere: pKw,
      source: water.ionProduct.source,
      citation: citationOf(water.ionProduct.source),
      obtained: water.ionProduct.obtained as 'published',
    },
  ];
  for (const meaning of model.components) {
    if (meaning.kind === 'family') {
      meaning.family.steps.forEach((step, index) => {
        used.push({
          id: `${meaning.family.key} ${index + 1}`,
          description: `${formatChemical(meaning.family.states[index]!)} / ${formatChemical(meaning.family.states[index + 1]!)}`,
          quantity: 'pKa',
          value: step.pKa,
          uncertainty: step.uncertainty,
          temperature: step.temperature,
          ionicStrength: step.ionicStrength,
          valueHere: -meaning.constants[index]!.log10K,
          source: step.source,
          citation: citationOf(step.source),
          obtained: step.obtained,
        });
      });
    } else if (meaning.kind === 'metal') {
      meaning.metal.hydrolysis.forEach((species, index) => {
        used.push({
          id: `${meaning.metal.key} ${species.id}`,
          description: formatChemical(species),
          quantity: 'log10 *β',
          value: species.logK,
          uncertainty: species.uncertainty,
          temperature: species.temperature,
          ionicStrength: species.ionicStrength,
          valueHere: meaning.constants[index]!.log10K,
          source: species.source,
          citation: citationOf(species.source),
          obtained: species.obtained,
        });
      });
    }
  }
  for (const { complex, constant } of model.complexes) {
    used.push({
      id: `complex ${complex.id}`,
      description: formatChemical(complex),
      quantity: 'log10 β',
      value: complex.logBeta,
      uncertainty: complex.uncertainty,
      temperature: complex.temperature,
      ionicStrength: complex.ionicStrength,
      valueHere: constant.log10K,
      source: complex.source,
      citation: citationOf(complex.source),
      obtained: complex.obtained,
    });
  }
  return used;
}
