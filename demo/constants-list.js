// Every constant of the engine as one line of a table, read from the modules that the engine itself imports.
import activity from '/dist/lib/data/activity.js';
import air from '/dist/lib/data/air.js';
import complexData from '/dist/lib/data/complexes.js';
import densities from '/dist/lib/data/densities.js';
import elementData from '/dist/lib/data/elements.js';
import familyData from '/dist/lib/data/acid-base-families.js';
import gasData from '/dist/lib/data/gases.js';
import ionData from '/dist/lib/data/ions.js';
import metalData from '/dist/lib/data/metal-ions.js';
import solidData from '/dist/lib/data/solids.js';
import sourceData from '/dist/lib/data/sources.js';
import water from '/dist/lib/data/water.js';
import { provenance } from './constants-provenance.js';

const citationOf = (key) => sourceData.sources[key].citation;
/** Source and how it was read, of a table that states them once. */
const from = ({ source, obtained }) => ({ source: citationOf(source), obtained });
const { families } = familyData;
const { metals } = metalData;

/** Formula and charge of everything a constant can speak of, by id. */
const CHEMICALS = new Map([
  ...ionData.ions.map(({ id, formula, charge }) => [id, { formula, charge }]),
  ...families.flatMap(({ states }) => states.map(({ id, formula, charge }) => [id, { formula, charge }])),
  ...metals.flatMap(({ ion, formula, charge, hydrolysis }) => [[ion, { formula, charge }], ...hydrolysis.map((species) => [species.id, species])]),
  ...complexData.complexes.map(({ id, formula, charge }) => [id, { formula, charge }]),
]);
const PROTON = { formula: 'H', charge: 1 };
const WATER = { formula: 'H2O', charge: 0 };
const ARROW = ' ⇌ ';

/** A chemical of the data by id; an unknown id shows as it is written. */
const chemical = (id) => CHEMICALS.get(id) ?? { formula: id, charge: 0 };

/** "2 A + B" as a list of texts and chemicals. */
function sum(terms) {
  return terms.filter(([count]) => count !== 0).flatMap(([count, what], place) => [place === 0 ? '' : ' + ', count === 1 ? '' : `${count} `, what]);
}

/** What a complex or solid is made of: bare metals, deprotonated families, ions. */
function partsOf({ metals: metalParts = {}, families: familyParts = {}, ions: ionParts = {} }) {
  return [
    ...Object.entries(metalParts).map(([key, count]) => [count, chemical(metals.find((metal) => metal.key === key).ion)]),
    ...Object.entries(familyParts).map(([key, count]) => [count, chemical(families.find((family) => family.key === key).states.at(-1).id)]),
    ...Object.entries(ionParts).map(([id, count]) => [count, chemical(id)]),
  ];
}

/** Names by which a complex or solid is looked for, beside its own. */
function namesOf({ metals: metalParts = {}, families: familyParts = {} }) {
  return [
    ...Object.keys(metalParts).map((key) => metals.find((metal) => metal.key === key).name),
    ...Object.keys(familyParts).map((key) => families.find((family) => family.key === key)).flatMap(({ name, states }) => [name, states.at(-1).name]),
  ].join(' ');
}

function conditionsOf({ temperature, ionicStrength, enthalpy, enthalpyUncertainty, enthalpyTemperature, enthalpyIonicStrength, enthalpySource, enthalpyObtained, heatCapacity }) {
  const lines = [`${temperature} °C${ionicStrength === undefined ? '' : `, ionic strength ${ionicStrength} mol/kg`}`];
  if (enthalpy !== undefined) {
    const held = [
      ...(enthalpyTemperature === undefined ? [] : [`${enthalpyTemperature} °C`]),
      ...(enthalpyIonicStrength === undefined ? [] : [`${enthalpyIonicStrength} mol/kg`]),
      ...(enthalpySource === undefined ? [] : [citationOf(enthalpySource)]),
      ...(enthalpyObtained === undefined ? [] : [enthalpyObtained]),
    ];
    lines.push(`ΔH ${enthalpy}${enthalpyUncertainty === undefined ? '' : ` ± ${enthalpyUncertainty}`} kJ/mol${held.length > 0 ? ` (${held.join('; ')})` : ''}`);
  }
  if (heatCapacity !== undefined) lines.push(`ΔCp ${heatCapacity} J/(mol K)`);
  return lines;
}

const shared = (constant) => ({
  uncertainty: constant.uncertainty,
  grade: constant.grade,
  conditions: conditionsOf(constant),
  source: citationOf(constant.source),
  obtained: constant.obtained,
});

const acidSteps = families.flatMap(({ name, states, steps }) => steps.map((step, index) => ({
  kind: 'Acid step',
  of: [`${name}: `, chemical(states[index].id), ARROW, chemical(states[index + 1].id), ' + ', PROTON],
  quantity: 'pKa', value: step.pKa, unit: 'dimensionless', ...shared(step),
})));

const hydrolysis = metals.flatMap(({ name, ion, hydrolysis: species }) => species.map((constant) => ({
  kind: 'Hydrolysis',
  of: [`${name}: `, ...sum([[constant.metal, chemical(ion)], [constant.hydroxide, WATER]]), ARROW, ...sum([[1, chemical(constant.id)], [constant.hydroxide, PROTON]])],
  quantity: 'log10 *β', value: constant.logK, unit: 'dimensionless', ...shared(constant),
})));

const complexes = complexData.complexes.map((constant) => {
  const protons = constant.gives.protons ?? 0;
  return {
    kind: 'Complex',
    of: [`${constant.name}: `, ...sum([...partsOf(constant.gives), [Math.max(protons, 0), PROTON]]), ARROW, ...sum([[1, chemical(constant.id)], [Math.max(-protons, 0), PROTON]])],
    also: namesOf(constant.gives), quantity: 'log10 β', value: constant.logBeta, unit: 'dimensionless', ...shared(constant),
  };
});

const solids = solidData.solids.map((constant) => {
  const protons = constant.gives.protons ?? 0;
  return {
    kind: 'Solid',
    of: [`${constant.name}: `, ...sum([[1, { formula: constant.formula, charge: 0 }], [Math.max(-protons, 0), PROTON], [Math.max(-constant.water, 0), WATER]]), ARROW,
      ...sum([...partsOf(constant.gives), [Math.max(protons, 0), PROTON], [Math.max(constant.water, 0), WATER]])],
    also: namesOf(constant.gives), quantity: 'log10 K of dissolution', value: constant.logK, unit: 'dimensionless', ...shared(constant),
  };
});

const solubilities = solidData.solubilities.map((constant) => ({
  kind: 'Solubility', of: [{ formula: constant.formula, charge: 0 }], quantity: 'solubility', value: constant.gramsPer100gWater, unit: 'g in 100 g of water', ...shared(constant),
}));

const ofActivity = { kind: 'Interaction coefficient', unit: provenance.activity.unit, ...from(provenance.activity) };
const interactions = [
  ...activity.coefficients.map(([cation, anion, value, uncertainty, note]) => ({
    ...ofActivity, of: [chemical(cation), ' with ', chemical(anion)], quantity: 'ε', value, uncertainty, conditions: [`${activity.temperature} °C`, ...(note === undefined ? [] : [note])],
  })),
  ...Object.entries(activity.estimates).filter(([, { value }]) => value !== null).map(([type, { value, spread, count, basis }]) => ({
    ...ofActivity, of: [`estimate for a pair of charges ${type}`], quantity: 'ε', value, uncertainty: spread,
    conditions: [`${activity.temperature} °C`, basis === 'mean' ? `mean of ${count} coefficients` : `rule, ${count} coefficients compared`],
  })),
  { ...ofActivity, of: ['denominator of the Debye–Hückel term'], quantity: 'B·a', value: activity.denominator, unit: '(kg/mol)^½', conditions: [`${activity.temperature} °C`] },
];

/** Numbers and lists of numbers of an object, one line each. */
const parameters = (kind, name, group, origin, units) => Object.entries(units).map(([key, unit]) => ({
  kind, of: [name], quantity: key, value: group[key], unit, conditions: [], ...from(origin),
}));

const waterConstants = [
  ...parameters('Water', 'physical constants', water.constants, provenance.physicalConstants, { elementaryCharge: 'C', avogadro: '1/mol', boltzmann: 'J/K', vacuumPermittivity: 'F/m', molarGasConstant: 'J/(mol K)' }),
  ...parameters('Water', `density, ${provenance.waterDensity.unit}`, water.density, provenance.waterDensity, { numerator: 'coefficients of powers of °C', denominator: '1/°C' }),
  ...parameters('Water', 'static permittivity', water.permittivity, provenance.permittivity, {
    N: 'dimensionless', i: 'dimensionless', j: 'dimensionless', N12: 'dimensionless', T12: 'K', criticalDensity: 'kg/m3', criticalTemperature: 'K', polarizability: 'C2/(J m2)', dipoleMoment: 'C m',
    boltzmann: 'J/K', avogadro: '1/mol', vacuumPermittivity: 'F/m', molarMass: 'kg/mol',
  }),
  ...parameters('Water', 'ion product, with density in g/cm3 and T in K', water.ionProduct, provenance.ionProduct, {
    alpha: 'as in the equation', beta: 'as in the equation', gamma: 'as in the equation', coordination: 'dimensionless', molarMass: 'g/mol',
  }),
];

const { carbonDioxide } = air;
const airConstants = [
  { kind: 'Air', of: ['carbon dioxide of room air'], quantity: 'mole fraction', value: carbonDioxide.roomAir, unit: provenance.roomAir.unit, conditions: [], ...from(provenance.roomAir) },
  ...parameters('Air', `solubility of carbon dioxide: ${provenance.carbonDioxideSolubility.form}`, carbonDioxide.solubility, provenance.carbonDioxideSolubility, { a: 'dimensionless', b: 'dimensionless', c: 'dimensionless' }),
  { kind: 'Air', of: ['one standard atmosphere'], quantity: 'pressure', value: air.pressure, unit: 'kPa', uncertainty: 0, conditions: [], source: 'exact by definition', obtained: 'definition' },
  ...parameters('Air', `vapour pressure of water: ${provenance.waterVapour.form}`, air.waterVapour, provenance.waterVapour, { a: 'kPa', b: 'dimensionless', c: '°C' }),
];

const gases = gasData.gases.map((constant) => ({
  kind: 'Gas', of: [`${constant.name}: `, chemical(constant.species)], quantity: 'Henry constant, dissolved over gas', value: constant.henry, unit: constant.unit, ...shared(constant),
  conditions: [...conditionsOf(constant), ...(constant.temperatureDependence === undefined ? [] : [`change with temperature ${constant.temperatureDependence} K`])],
}));

const densityConstants = [
  ...densities.solutes.map(({ formula, coefficients, temperatureRange, massFractionLimit }) => ({
    kind: 'Density', of: ['apparent density of ', { formula, charge: 0 }], quantity: 'c0 to c4', value: coefficients, unit: 'kg/m3, kg/m3, dimensionless, 1/°C, °C',
    conditions: [`${temperatureRange[0]} to ${temperatureRange[1]} °C`, `mass fraction up to ${massFractionLimit}`], ...from(provenance.apparentDensities),
  })),
  ...densities.volumes.map(({ ion, volume }) => ({
    kind: 'Density', of: ['volume of ', chemical(ion)], quantity: 'partial molar volume', value: volume, unit: 'cm3/mol', conditions: [provenance.ionVolumes.form], ...from(provenance.ionVolumes),
  })),
];

const atomicWeights = Object.entries(elementData.elements).map(([symbol, [value, uncertainty]]) => ({
  kind: 'Atomic weight', of: [symbol], quantity: 'standard atomic weight', value, unit: provenance.atomicWeights.unit, uncertainty, conditions: [], ...from(provenance.atomicWeights),
}));

export const constants = [
  ...acidSteps, ...hydrolysis, ...complexes, ...solids, ...solubilities, ...interactions, ...waterConstants, ...airConstants, ...gases, ...densityConstants, ...atomicWeights,
];
