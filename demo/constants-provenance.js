/**
 * Source, unit and form of the tables that state them once for all their numbers. The build leaves out of the engine's
 * data modules what the engine does not read, and these are such; a test compares every entry with the data files.
 */
export const provenance = {
  activity: { source: 'nea-tdb', obtained: 'memory', unit: 'kg/mol' },
  physicalConstants: { source: 'codata-2018', obtained: 'memory' },
  waterDensity: { source: 'kell-1975', obtained: 'memory', unit: 'kg/m3' },
  permittivity: { source: 'iapws-r8-97', obtained: 'published' },
  ionProduct: { source: 'iapws-r11-07', obtained: 'published' },
  roomAir: { source: 'noaa-gml', obtained: 'memory', unit: 'mol/mol of dry air' },
  carbonDioxideSolubility: { source: 'weiss-1974', obtained: 'memory', form: 'ln K0 = a + b (100/T) + c ln(T/100), K0 in mol/(L atm)' },
  waterVapour: { source: 'alduchov-eskridge-1996', obtained: 'memory', form: 'p/kPa = a exp(b t/(t + c)), t in C' },
  apparentDensities: { source: 'laliberte-2009', obtained: 'published' },
  ionVolumes: { source: 'millero-1971', obtained: 'memory', form: 'partial molar volumes at infinite dilution and 25 C, cm3/mol, that of H+ taken as zero' },
  atomicWeights: { source: 'ciaaw-2021', obtained: 'memory', unit: 'g/mol' },
};
