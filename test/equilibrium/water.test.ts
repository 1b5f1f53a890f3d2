import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { debyeHueckelSlope, kelvin, waterAt, waterDensity, waterIonProduct, waterPermittivity } from '../../src/equilibrium/water.js';

function assertNear(value: number, expected: number, tolerance: number, what = ''): void {
  assert.ok(Math.abs(value - expected) <= tolerance, `${what} ${value}, expected ${expected} ± ${tolerance}`);
}

describe('ion product of water', () => {
  // IAPWS R11-07, Release on the Ionization Constant of H2O (2007), Table 3: T/K, density/(g/cm³), pKw.
  for (const [temperature, density, pKw] of [[300, 1, 13.906565], [600, 0.07, 21.048874], [600, 0.7, 11.203153], [800, 0.2, 15.089765], [800, 1.2, 6.43833]] as const) {
    it(`release check value at ${temperature} K and ${density} g/cm³`, () => assertNear(waterIonProduct(temperature, density), pKw, 5e-7));
  }

  // Harned & Robinson, Trans. Faraday Soc. 36 (1940) 973: cells without liquid junction, 1 atm.
  const CELLS = [[0, 14.9435], [5, 14.7338], [10, 14.5346], [15, 14.3463], [20, 14.1669], [25, 13.9965], [30, 13.833], [35, 13.6801], [40, 13.5348], [45, 13.396], [50, 13.2617], [55, 13.1369], [60, 13.0171]] as const;
  it('agrees within 0.004 with the emf measurements of Harned and Robinson, 0 to 60 °C', (t) => {
    t.diagnostic(CELLS.map(([celsius, pKw]) => `${celsius}:${((waterAt(celsius).pKw - pKw) * 1000).toFixed(1)}`).join(' ') + ' thousandths');
    for (const [celsius, pKw] of CELLS) assertNear(waterAt(celsius).pKw, pKw, 0.004, `${celsius} °C`);
  });
});

describe('permittivity of water', () => {
  // IAPWS R8-97, Release on the Static Dielectric Constant (1997), check table: T/K, density/(mol/dm³), permittivity.
  const MOLAR_MASS = 18.015268;
  for (const [temperature, density, permittivity] of [[273, 55.49919, 87.96386], [323, 54.84808, 69.96425], [373, 53.20248, 55.56519]] as const) {
    it(`release check value at ${temperature} K`, () => assertNear(waterPermittivity(temperature - 273.15, density * MOLAR_MASS), permittivity, 2e-5));
  }

  // The same formulation at 298.15 K and 999.242866 kg/m³, and as steam at 873.15 K and 26.0569558 kg/m³.
  it('two states of the IAPWS formulation', () => {
    assertNear(waterPermittivity(25, 999.242866), 78.590725, 1e-6);
    assertNear(waterPermittivity(600, 26.0569558), 1.1262097, 1e-7);
  });

  // Malmberg & Maryott, J. Res. NBS 56 (1956) 1: measured, 0 to 100 °C.
  it('agrees within 0.2 with the measurements of Malmberg and Maryott', () => {
    for (let t = 0; t <= 100; t += 5) assertNear(waterAt(t).permittivity, 87.74 - 0.40008 * t + 9.398e-4 * t * t - 1.41e-6 * t * t * t, 0.2, `${t} °C`);
  });
});

describe('density of water', () => {
  // IAPWS R6-95(2018), IAPWS-95 at 0.101325 MPa, kg/m³.
  const IAPWS_95 = [[0, 999.8431], [5, 999.9666], [10, 999.7025], [15, 999.1026], [20, 998.2072], [25, 997.0476], [30, 995.6495], [40, 992.2164], [50, 988.035], [60, 983.1958], [70, 977.7646], [80, 971.7904], [90, 965.3096], [95, 961.8879]] as const;
  it('agrees within 0.015 kg/m³ with IAPWS-95, 0 to 95 °C', () => {
    for (const [celsius, density] of IAPWS_95) assertNear(waterDensity(celsius), density, 0.0151, `${celsius} °C`);
  });

  // Tanaka et al., Metrologia 38 (2001) 301: recommended by the CIPM, 0 to 40 °C.
  it('agrees within 0.005 kg/m³ with the CIPM formula, 0 to 40 °C', () => {
    for (let t = 0; t <= 40; t += 4) {
      const distance = t - 3.983035;
      assertNear(waterDensity(t), 999.97495 * (1 - (distance * distance * (t + 301.797)) / (522528.9 * (t + 69.34881))), 0.005, `${t} °C`);
    }
  });
});

describe('Debye–Hückel slope', () => {
  // From IAPWS-95 density and IAPWS R8-97 permittivity with the CODATA 2018 constants.
  const SLOPES = [[0, 0.49043], [5, 0.49395], [10, 0.49763], [15, 0.50149], [20, 0.50553], [25, 0.50978], [30, 0.51422], [35, 0.51888], [40, 0.52375], [45, 0.52882], [50, 0.53411], [55, 0.53962], [60, 0.54533], [70, 0.55742], [80, 0.57038], [90, 0.58422], [100, 0.59897]] as const;
  it('agrees within 0.004 % with the IAPWS formulations, 0 to 100 °C, as far as the densities do', () => {
    for (const [celsius, slope] of SLOPES) assertNear(waterAt(celsius).debyeHueckelSlope / slope, 1, 4e-5, `${celsius} °C`);
  });

  // Manov, Bates, Hamer & Acree, J. Am. Chem. Soc. 65 (1943) 1765, molal scale: older permittivity, so 0.5 % is expected.
  const OLDER = [[0, 0.4883], [10, 0.496], [20, 0.5042], [25, 0.5085], [30, 0.513], [40, 0.5221], [50, 0.5319], [60, 0.5425]] as const;
  it('agrees within 0.6 % with the table of Manov and others', () => {
    for (const [celsius, slope] of OLDER) assertNear(waterAt(celsius).debyeHueckelSlope / slope, 1, 0.006, `${celsius} °C`);
  });

  it('grows with density as its square root', () => {
    assertNear(debyeHueckelSlope(25, 4000, 78) / debyeHueckelSlope(25, 1000, 78), 2, 1e-12);
    assert.equal(kelvin(25), 298.15);
  });
});
