import data from '../../data/cautions.json';
import gases from '../../data/gases.json';
import conventions from '../../data/conventions.json';
import { kelvin, waterAt } from '../equilibrium/water.js';
import { exp } from '../quantities/reproducible-math.js';
import { IONIC_STRENGTH_LIMIT } from '../equilibrium/interaction-coefficients.js';
import { citationOf } from './constants-used.js';
import type { Dissolved } from './dissolve.js';
import { formatChemical } from './plain-text.js';
import type { Caution, Conditions } from './prediction.js';
import type { SolvedSolution } from './solved-solution.js';
import type { WeakSpot } from './weak-spots.js';
import { overSolubility, solidStatuses } from './solids.js';
import type { Particle } from '../substances/ion-library.js';
import { chemicalOf } from './chemicals.js';
import type { ComponentMeaning } from './meanings.js';

/** What the cautions are read from. */
export interface CautionInput {
  readonly solved: SolvedSolution;
  readonly dissolved: Dissolved;
  readonly conditions: Conditions;
  readonly uncertainty: number;
  readonly bufferCapacity: number;
  readonly weakSpots: readonly WeakSpot[];
}

const LOCAL_RULES = 'Local rules and licensed practice decide.';
const COMMON_PRACTICE = data.basis;
const TEMPERATURE_RANGE = [0, 60] as const;
const GRAVITIES: readonly Caution['gravity'][] = ['danger', 'warning', 'note'];

/** All cautions of a prediction, gravest first. */
export function cautionsFor(input: CautionInput): Caution[] {
  const cautions = [...extremePH(input), ...toxicGases(input), ...ionRemarks(input), ...complexes(input), ...incompleteData(input), ...solids(input), ...validity(input), ...hardlyBuffered(input)];
  return cautions.sort((a, b) => GRAVITIES.indexOf(a.gravity) - GRAVITIES.indexOf(b.gravity));
}

interface Threshold {
  readonly code: string;
  readonly atMost?: number;
  readonly atLeast?: number;
  readonly gravity: string;
  readonly rule: string;
  readonly source: string;
}

function extremePH({ solved, uncertainty }: CautionInput): Caution[] {
  const pH = solved.state.pH;
  return (data.extremePH as readonly Threshold[]).flatMap((threshold) => {
    const limit = threshold.atMost ?? threshold.atLeast!;
    const distance = threshold.atMost === undefined ? pH - limit : limit - pH;
    if (distance < -uncertainty) return [];
    const reach = distance >= 0 ? `is ${threshold.atMost === undefined ? 'at or above' : 'at or below'} ${limit}` : `may reach ${limit} within its uncertainty`;
    return [
      {
        code: threshold.code,
        gravity: threshold.gravity as Caution['gravity'],
        text: `The expected pH ${reach}. ${threshold.gravity === 'danger' ? 'Wear eye protection and gloves. ' : 'As waste it may count as corrosive. '}${LOCAL_RULES}`,
        basis: `${threshold.rule}; ${citationOf(threshold.source)}`,
      },
    ];
  });
}

function toxicGases({ solved, dissolved, conditions }: CautionInput): Caution[] {
  const codes = new Set(dissolved.particles.flatMap(({ particle }) => particle.cautions));
  return data.toxicGases.flatMap(({ code, species, gas }): Caution[] => {
    const index = solved.model.species.findIndex(({ chemical }) => chemical.id === species);
    const meaning = solved.model.species[index];
    const total = solved.model.system.components[meaning?.parts[0]?.[0] ?? -1]?.total ?? 0;
    if (!meaning || total === 0) return [];
    const molality = solved.state.molality[index]!;
    const pressure = pressureOver(species, molality, conditions.temperature);
    const stands = `${scientific(molality)} mol/kg stands as ${formatChemical(meaning.chemical)}`;
    if (pressure !== undefined && pressure >= data.gasPressure.leastPascal) {
      const share = `${stands}, with about ${pressure.toPrecision(1)} Pa of it above the solution`;
      return [{ code, gravity: code.startsWith('toxic') ? 'danger' : 'warning', text: `${share}: ${gas} leaves an open vessel, and the pH drifts. Work in a fume hood. ${LOCAL_RULES}`, basis: 'Henry’s law; threshold by common practice, no source' }];
    }
    if (pressure === undefined && molality > conventions.negligibleShare * total) {
      return [{ code, gravity: 'danger', text: `${stands}, which can leave the solution as ${gas}. Work in a fume hood. ${LOCAL_RULES}`, basis: COMMON_PRACTICE }];
    }
    if (!codes.has(code)) return [];
    return [{ code, gravity: 'warning', text: `Acid sets free ${gas}. Keep acids away and work in a fume hood. ${LOCAL_RULES}`, basis: COMMON_PRACTICE }];
  });
}

const HENRY = new Map((gases.gases as readonly { species: string; henry: number; temperatureDependence?: number; temperature: number }[]).map((gas) => [gas.species, gas]));

/**
 * Partial pressure, Pa, of a dissolved gas in equilibrium with the air above: Henry's law with the temperature
 * dependence H(T) = H(θ) exp(B (1/T − 1/θ)) of R. Sander, Atmos. Chem. Phys. 23 (2023) 10901.
 */
function pressureOver(species: string, molality: number, celsius: number): number | undefined {
  const gas = HENRY.get(species);
  if (!gas) return undefined;
  const henry = gas.henry * exp((gas.temperatureDependence ?? 0) * (1 / kelvin(celsius) - 1 / kelvin(gas.temperature)));
  return (molality * waterAt(celsius).density) / henry;
}

function ionRemarks({ dissolved }: CautionInput): Caution[] {
  const remarks = data.ionRemarks as Readonly<Record<string, string>>;
  return Object.entries(remarks).flatMap(([code, text]) => {
    const concerned = dissolved.particles.filter(({ particle }) => particle.cautions.includes(code));
    if (concerned.length === 0) return [];
    const ions = concerned.map(({ particle }) => formatChemical(chemicalOf(particle))).join(', ');
    const safety = code === 'toxic' || code === 'oxidiser';
    return [{ code, gravity: safety ? 'warning' : 'note', text: `${ions} ${text}${safety ? ` ${LOCAL_RULES}` : ''}`, basis: COMMON_PRACTICE }];
  });
}

/** Metal ions together with anything that may bind them, where no constant of the pair is known. */
function complexes({ solved, dissolved }: CautionInput): Caution[] {
  const { components, complexes: known, species } = solved.model;
  const bound = new Set(known.flatMap(({ species: index }) => pairsOf(species[index]!.parts.map(([component]) => nameOf(components[component]!)))));
  const missing = components.flatMap((meaning) => {
    if (meaning.kind !== 'metal' || data.complexes.hardCations.includes(meaning.metal.ion)) return [];
    const metal = { label: meaning.metal.formula, charge: meaning.metal.charge };
    return dissolved.particles
      .filter(({ particle }) => mayBind(particle, meaning.metal.ion) && !bound.has(`${meaning.metal.key} ${Object.keys(particle.gives?.families ?? {})[0] ?? particle.id}`))
      .map(({ particle }) => `${formatChemical(metal)} with ${formatChemical(chemicalOf(particle))}`);
  });
  if (missing.length === 0) return [];
  return [
    {
      code: 'complexes-not-included',
      gravity: 'warning',
      text: `No constants are known here for complexes of ${missing.join(', ')}; if they form, the real pH differs by more than the stated uncertainty.`,
      basis: 'Scope of the data',
    },
  ];
}

function mayBind(particle: Particle, cation: string): boolean {
  if (data.complexes.halides.includes(particle.id)) return data.complexes.cationsThatBindHalides.includes(cation);
  const proton = particle.id === 'OH-' || particle.id === 'H+' || particle.id === 'O-2';
  return particle.charge <= 0 && !proton && !particle.gives?.metals && !data.complexes.weakLigands.includes(particle.id);
}

function nameOf(meaning: ComponentMeaning): string {
  if (meaning.kind === 'family') return meaning.family.key;
  return meaning.kind === 'metal' ? meaning.metal.key : meaning.particle.id;
}

/** Every "first other" of a complex: its metal with each of its ligands. */
function pairsOf([metal, ...ligands]: readonly string[]): string[] {
  return ligands.map((ligand) => `${metal} ${ligand}`);
}

function incompleteData({ weakSpots }: CautionInput): Caution[] {
  return weakSpots.map(({ code, reason }) => ({
    code,
    gravity: 'warning',
    text: `The published data are incomplete: ${reason}. The uncertainty is widened.`,
    basis: 'Scope of the data',
  }));
}

/** Solids that lie in the vessel, that are to be expected, and solutes beyond what water holds. */
function solids({ solved, dissolved }: CautionInput): Caution[] {
  const cautions: Caution[] = overSolubility(dissolved).map(({ formula, putIn, soluble, temperature }) => ({
    code: 'over-solubility',
    gravity: 'warning',
    text: `${formatChemical({ label: formula, charge: 0 })}: ${putIn.toFixed(0)} g in 100 g of water is more than dissolves (${soluble} g at ${temperature} °C). The pH is that of a solution that cannot be made.`,
    basis: 'Handbook solubilities',
  }));
  const statuses = solidStatuses(solved);
  for (const { name, formula, amount } of statuses.filter((status) => status.amount !== undefined)) {
    cautions.push({ code: 'solid-present', gravity: 'note', text: `${scientific(amount!)} mol/kg lie as solid ${formatChemical({ label: formula, charge: 0 })}, ${name}.`, basis: 'Solubility product' });
  }
  const expected = statuses.filter(({ saturationIndex, uncertainty, forms, amount }) => amount === undefined && forms !== 'only-aged' && saturationIndex > uncertainty);
  const readily = expected.filter(({ forms }) => forms === 'readily');
  if (expected.length > 0) {
    const named = (readily.length > 0 ? readily : expected).slice(0, 3).map(({ name, saturationIndex }) => `${name} (saturation index ${saturationIndex.toFixed(1)})`);
    cautions.push({
      code: readily.length > 0 ? 'solid-expected' : 'solid-slow',
      gravity: readily.length > 0 ? 'warning' : 'note',
      text: `Supersaturated with ${named.join(', ')}: ${readily.length > 0 ? 'a solid is to be expected, and the pH moves when it forms' : 'a solid may form within weeks'}.`,
      basis: 'Solubility product',
    });
  }
  return cautions;
}

function validity({ solved, conditions }: CautionInput): Caution[] {
  const cautions: Caution[] = [];
  const { ionicStrength } = solved.state;
  if (ionicStrength > IONIC_STRENGTH_LIMIT) {
    cautions.push({
      code: 'ionic-strength-outside',
      gravity: 'warning',
      text: `The ionic strength of ${ionicStrength.toFixed(1)} mol/kg is above ${IONIC_STRENGTH_LIMIT} mol/kg, where the activity model ends. Take the pH as a rough figure.`,
      basis: 'Published range of the specific interaction coefficients',
    });
  }
  if (conditions.temperature < TEMPERATURE_RANGE[0] || conditions.temperature > TEMPERATURE_RANGE[1]) {
    cautions.push({
      code: 'temperature-outside',
      gravity: 'warning',
      text: `${conditions.temperature} °C is outside ${TEMPERATURE_RANGE[0]} to ${TEMPERATURE_RANGE[1]} °C, for which the enthalpies are known.`,
      basis: 'Range of the thermodynamic data',
    });
  }
  const held = solved.model.components.filter((meaning) => meaning.constants.some((constant) => constant.enthalpyUnknown));
  if (held.length > 0) {
    const names = held.map((meaning) => (meaning.kind === 'family' ? meaning.family.name : meaning.kind === 'metal' ? meaning.metal.name : ''));
    cautions.push({
      code: 'enthalpy-unknown',
      gravity: 'note',
      text: `The reaction enthalpy of some steps of ${names.join(', ')} is unknown; their constants at ${conditions.temperature} °C are estimated and the uncertainty is widened.`,
      basis: 'Data',
    });
  }
  return cautions;
}

function hardlyBuffered({ bufferCapacity }: CautionInput): Caution[] {
  const { bufferCapacity: limit, traceAcid } = conventions.hardlyBuffered;
  if (bufferCapacity >= limit) return [];
  const shift = traceAcid / bufferCapacity;
  return [
    {
      code: 'hardly-buffered',
      gravity: 'note',
      text: `This solution is hardly buffered: a micromole of acid or base per kilogram moves its pH by about ${shift >= 1 ? 'a whole unit' : shift.toFixed(1)}, so CO₂ of the air or a trace on the glass decides the reading.`,
      basis: COMMON_PRACTICE,
    },
  ];
}

const SUPERSCRIPT_MINUS = '⁻';

function scientific(value: number): string {
  const [mantissa, exponent] = value.toExponential(1).split('e') as [string, string];
  const raised = exponent.replace('+', '').replace('-', SUPERSCRIPT_MINUS).replace(/\d/g, (digit) => '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(digit)]!);
  return `${mantissa} × 10${raised}`;
}
