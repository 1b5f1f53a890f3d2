import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { CARBON_DIOXIDE_FAMILY, lnCarbonDioxideActivity, ROOM_AIR_CARBON_DIOXIDE } from '../../src/equilibrium/air.js';
import { kelvin, waterAt } from '../../src/equilibrium/water.js';
import { predict } from '../../src/engine.js';

// Plummer & Busenberg, Geochim. Cosmochim. Acta 46 (1982) 1011: log10 KH, mol/(kg atm).
function log10Solubility(celsius: number): number {
  const T = kelvin(celsius);
  return 108.3865 + 0.01985076 * T - 6919.53 / T - 40.45154 * Math.log10(T) + 669365 / (T * T);
}

describe('carbon dioxide of the air', () => {
  it('dissolves as Plummer and Busenberg have it, within 1.5 %, 0 to 45 °C', () => {
    for (let celsius = 0; celsius <= 45; celsius += 5) {
      // A. L. Buck, J. Appl. Meteorol. 20 (1981) 1527: vapour pressure of water, kPa.
      const vapour = 0.61121 * Math.exp((17.502 * celsius) / (240.97 + celsius));
      const expected = Math.pow(10, log10Solubility(celsius)) * ROOM_AIR_CARBON_DIOXIDE * (1 - vapour / 101.325);
      const ratio = Math.exp(lnCarbonDioxideActivity(waterAt(celsius), ROOM_AIR_CARBON_DIOXIDE)) / expected;
      assert.ok(Math.abs(ratio - 1) < 0.015, `${celsius} °C: ${ratio}`);
    }
  });

  it('is proportional to the share of the gas', () => {
    const difference = lnCarbonDioxideActivity(waterAt(25), 8e-4) - lnCarbonDioxideActivity(waterAt(25), 4e-4);
    assert.ok(Math.abs(difference - Math.log(2)) < 1e-12);
    assert.equal(CARBON_DIOXIDE_FAMILY, 'carbonic');
  });

  // Water in equilibrium with 400 ppm CO2 has pH 5.6: common practice, no source.
  it('brings pure water to about 5.6', () => {
    const { pH } = predict('1 nmol/kg NaCl', { air: 'equilibrated' });
    assert.ok(Math.abs(pH - 5.6) < 0.05, String(pH));
  });
});
