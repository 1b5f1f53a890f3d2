import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict } from '../../src/engine.js';
import { atTemperature } from '../../src/equilibrium/temperature.js';
import { kelvin } from '../../src/equilibrium/water.js';

// CODATA 2018.
const GAS_CONSTANT = 8.314462618;

/** log10 K1 and log10 K2 of carbonic acid: Plummer & Busenberg, Geochim. Cosmochim. Acta 46 (1982) 1011, 0 to 90 °C. */
const CARBONIC = [
  (T: number) => -356.3094 - 0.06091964 * T + 21834.37 / T + 126.8339 * Math.log10(T) - 1684915 / (T * T),
  (T: number) => -107.8871 - 0.03252849 * T + 5151.79 / T + 38.92561 * Math.log10(T) - 563713.9 / (T * T),
] as const;

/** As a prediction uses it. */
function log10KOfCarbonic(index: number, celsius: number): number {
  return -predict('1 mmol/kg NaHCO3', { temperature: celsius }).constants.find(({ id }) => id === `carbonic ${index + 1}`)!.valueHere;
}

describe('constants at other temperatures', () => {
  for (const [index, published] of CARBONIC.entries()) {
    it(`step ${index + 1} of carbonic acid agrees within 0.02 with Plummer and Busenberg, 0 to 50 °C`, (t) => {
      const deviations = [0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50].map((celsius) => [celsius, log10KOfCarbonic(index, celsius) - published(kelvin(celsius))] as const);
      t.diagnostic(deviations.map(([celsius, deviation]) => `${celsius}:${(deviation * 1000).toFixed(0)}`).join(' ') + ' thousandths');
      for (const [celsius, deviation] of deviations) assert.ok(Math.abs(deviation) <= 0.02, `${celsius} °C: ${deviation}`);
    });
  }

  it('follows the van ’t Hoff equation, checked by its derivative d ln K/d(1/T) = −ΔH(T)/R', () => {
    const constant = { lnK: -20, temperature: 25, enthalpy: 31.5, heatCapacity: -180 };
    for (const celsius of [1, 12, 25, 40, 59]) {
      const step = 0.01;
      const slope = (atTemperature(constant, celsius + step) - atTemperature(constant, celsius - step)) / (1 / kelvin(celsius + step) - 1 / kelvin(celsius - step));
      const enthalpy = constant.enthalpy * 1000 + constant.heatCapacity * (celsius - 25);
      assert.ok(Math.abs(slope / (-enthalpy / GAS_CONSTANT) - 1) < 1e-6, `${celsius} °C`);
    }
  });

  it('holds a constant whose enthalpy is unknown, and is exact at the reference temperature', () => {
    assert.equal(atTemperature({ lnK: -7.25, temperature: 25 }, 50), -7.25);
    assert.equal(atTemperature({ lnK: -7.25, temperature: 20, enthalpy: 40, heatCapacity: 10 }, 20), -7.25);
  });
});
