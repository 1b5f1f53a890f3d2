import type { Caution, ConstantUsed, Prediction, SolidStatus, UncertaintyContribution } from '../../engine.js';

/** Every word the elements show or say. Numbers arrive formatted. */
export const english = {
  /** BCP 47 tag of the language the words are in. */
  language: 'en',

  unnamed: 'Solution',
  classification: { acidic: 'acidic', neutral: 'neutral', basic: 'basic' } satisfies Record<Prediction['classification'], string>,
  undecided: 'too close to neutral to decide',
  pH: 'pH',
  plusMinus: '±',
  resultSpoken: (value: string, uncertainty: string) => `p H ${value}, plus or minus ${uncertainty}`,
  uncertaintyKind: 'standard uncertainty',
  temperature: (celsius: string) => `${celsius} °C`,
  solidsFormed: 'solids let form',
  air: { excluded: 'air kept out', equilibrated: 'in equilibrium with room air' },
  neutralAt: (value: string) => `neutral at ${value}`,
  inRoomAir: (value: string) => `In equilibrium with room air: ${value}`,
  withoutAir: (value: string) => `With air kept out: ${value}`,

  scale: {
    neutral: 'neutral',
    described: (lowest: string, highest: string, value: string, uncertainty: string, neutral: string, distance: string, side: 'below' | 'above' | 'at') =>
      `Scale from ${lowest} to ${highest}. Prediction at ${value}, plus or minus ${uncertainty}, ${side === 'at' ? 'at' : `${distance} ${side}`} the neutral point ${neutral}.`,
    otherAir: (value: string) => `Second mark at ${value}: the other condition of air.`,
  },

  understood: 'Understood as',
  checkBottle: 'Check the bottle.',
  molarMass: (value: string) => `${value} g/mol`,
  molarity: (value: string) => `${value} mol/L`,
  molality: (value: string) => `${value} mol/kg`,
  cas: (number: string) => `CAS ${number}`,

  sections: { equations: 'Equations', composition: 'Composition', constants: 'Constants and uncertainty' },
  counts: {
    equations: (count: string) => count,
    species: (count: string) => `${count} species`,
    speciesAndSolids: (species: string, solids: string, one: boolean) => `${species} species, ${solids} ${one ? 'solid' : 'solids'}`,
    constants: (count: string) => `${count} used`,
  },

  equations: {
    dissolution: 'On dissolving',
    hydrolysis: 'With water',
    complexes: 'Complexes',
    spectators: 'Taking no part',
    decides: 'decides the pH',
    reacted: (percent: string) => `${percent} reacted`,
    plus: 'plus',
    complete: 'turns completely into',
    equilibrium: 'is in equilibrium with',
    negativeLogarithm: (symbol: string) => `p${symbol}`,
    logarithm: (symbol: string) => `log10 ${symbol}`,
    spokenConstant: (symbol: string, value: string) => `${symbol} is ${value}`,
    spokenSign: (value: string) => value.replace('−', 'minus '),
    none: 'Nothing dissolved reacts with water.',
  },

  composition: {
    caption: 'Species in the solved solution, most abundant first',
    species: 'Species',
    molality: 'mol/kg',
    molalityLong: 'Molality, moles per kilogram of water',
    activityCoefficient: 'γ',
    activityCoefficientLong: 'Activity coefficient, molality scale',
    share: 'Share',
    shareLong: 'Share of its acid–base family or metal',
    ionicStrength: 'Ionic strength',
    bufferCapacity: 'Buffer capacity',
    bufferCapacityUnit: 'mol/kg per pH',
    waterActivity: 'Activity of water',
    neutralPoint: 'Neutral point',
    residual: 'Largest balance residual',
  },

  solids: {
    caption: 'Solids this solution can form. Above 0 it holds more than the solid leaves dissolved.',
    solid: 'Solid',
    saturationIndex: 'Saturation index',
    forms: { readily: 'forms readily', slowly: 'forms slowly', 'only-aged': 'forms only on ageing' } satisfies Record<SolidStatus['forms'], string>,
    lies: 'lies as solid:',
    liesAs: (formula: string, name: string, amount: string) => `${formula} (${name}) lies as solid: ${amount} mol/kg`,
  },

  constants: {
    caption: 'Constants used, at 25 °C unless stated, with where they come from',
    constant: 'Constant',
    value: 'Value',
    here: 'Here',
    hereLong: 'Value at the temperature of this solution, ionic strength zero',
    at: (celsius: string, ionicStrength: string | undefined) =>
      ionicStrength === undefined ? `at ${celsius} °C` : `at ${celsius} °C, ${ionicStrength} mol/kg`,
    uncertaintyUnknown: 'uncertainty not stated',
    obtained: { published: 'read from the source', memory: 'quoted from memory' } satisfies Record<ConstantUsed['obtained'], string>,
    budgetCaption: 'What the standard uncertainty of the pH is made of',
    contribution: 'From',
    pHUnits: 'pH',
    share: 'Share',
    basis: {
      stated: 'stated by the source',
      graded: 'from the grade of the value',
      digits: 'from the digits written',
      model: 'of the model',
    } satisfies Record<UncertaintyContribution['basis'], string>,
    smaller: (count: string) => `${count} smaller contributions not listed`,
  },

  cautions: {
    heading: 'Cautions',
    gravity: { danger: 'Danger', warning: 'Warning', note: 'Note' } satisfies Record<Caution['gravity'], string>,
    basis: (text: string) => `Basis: ${text}`,
  },

  empty: {
    title: 'Nothing to predict yet',
    instruction: 'State what is dissolved: an amount and a substance. Separate several with semicolons.',
    example: (example: string) => `For example: ${example}`,
    exampleSolutes: '20 mmol/L NaHCO3; 5 g/L MgSO4·7H2O',
  },
  problems: {
    title: 'No prediction',
    titleSeveral: (count: string) => `No prediction: ${count} problems`,
    typed: 'As typed',
    here: 'problem here:',
    suggestions: 'Possible instead',
    unexpected: 'The calculation failed for a reason the card does not know. Nothing is predicted.',
  },
  notes: {
    heading: 'Setting not understood',
    unknownValue: (attribute: string, value: string, known: string, used: string) =>
      `${attribute} “${value}” is not known. Used instead: ${used}. Known: ${known}.`,
    unreadableTemperature: (value: string, used: string) =>
      `temperature “${value}” could not be read. Used instead: ${used} °C. Write a number in Celsius, for example 37 or 37 °C.`,
    nothing: 'none',
  },

  store: {
    action: 'Store result',
    retry: 'Try again',
    storing: 'Storing…',
    stored: 'Stored',
    storedAs: (reference: string) => `Stored as ${reference}`,
    failed: (reason: string) => (reason ? `Not stored: ${reason}` : 'Not stored.'),
    announced: 'Handed to the page, which has not confirmed it',
  },

  restored: {
    figures: (value: string, uncertainty: string, classification: string) => `pH ${value} ± ${uncertainty}, ${classification}`,
    changed: (stored: string, now: string) => `Stored as ${stored}. Computed now: ${now}.`,
    sameDigits: (stored: string) => `Stored as ${stored}. Computed now, it is the same to the digits shown.`,
    notComputable: (stored: string) => `Stored as ${stored}. What was typed is no longer understood.`,
    constants: 'Constants that changed since:',
    constant: (name: string, stored: string, now: string) => `${name}: ${stored}, now ${now}`,
    absent: 'not used',
    more: (count: string) => `${count} more`,
    tampered: 'This is not what was stored: the record was altered, or is none. The result here is computed anew from what it says was dissolved.',
  },

  announcement: {
    result: (label: string, value: string, uncertainty: string, classification: string) =>
      `${label}: p H ${value}, plus or minus ${uncertainty}, ${classification}.`,
    problem: (label: string, text: string) => `${label}: no prediction. ${text}`,
    empty: (label: string) => `${label}: nothing to predict.`,
    danger: (text: string) => `Danger: ${text}`,
  },

  validity: {
    missing: 'A predicted solution is required here.',
    pending: 'The prediction is not ready yet.',
  },

  text: {
    result: (value: string, uncertainty: string, classification: string) => `pH ${value} ± ${uncertainty} (${classification})`,
    standard: 'The number after ± is the standard uncertainty.',
    noPrediction: 'No prediction.',
  },

  otherVersion: (tag: string, registered: string, own: string) =>
    `<${tag}> is registered already from version ${registered}; version ${own} stays unused on this page.`,
};

/** A dictionary in another language has the same members. */
export type Strings = typeof english;
