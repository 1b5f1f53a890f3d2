import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict } from '../../src/engine.js';

describe('water in a litre of solution', () => {
  it('tends to that of pure water at infinite dilution', () => {
    // Kell, J. Chem. Eng. Data 20 (1975) 97: 0.99705 kg/L at 25 °C.
    const { molality, molarity } = predict('1 µmol/L KCl').understood[0]!;
    assert.ok(Math.abs(molarity / molality - 0.99705) < 1e-5, String(molarity / molality));
  });

  it('is used both ways: mol/kg to mol/L and back', () => {
    for (const amount of ['0.5 mol/kg', '2 mol/kg', '3.3 mmol/kg']) {
      const first = predict(`${amount} KCl`).understood[0]!;
      const second = predict(`${first.molarity} mol/L KCl`).understood[0]!;
      assert.ok(Math.abs(second.molality / first.molality - 1) < 1e-6, `${first.molality} ${second.molality}`);
    }
  });
});
