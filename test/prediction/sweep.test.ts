import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { predict, sweep } from '../../src/engine.js';

const SOLUTES = '0.05 mol/kg Na2HPO4; 0.02 mol/kg NH4Cl';
const even = (from: number, to: number, count: number): number[] => Array.from({ length: count }, (_, place) => from + ((to - from) * place) / (count - 1));

describe('sweeps', () => {
  it('pass through the prediction of the solution as it is', () => {
    const { pH } = predict(SOLUTES);
    for (const along of [{ quantity: 'dilution', values: [1, 2] }, { quantity: 'temperature', values: [25, 26] }, { quantity: 'strong-base', values: [0, 0.001] }] as const) {
      assert.ok(Math.abs(sweep(SOLUTES, along).points[0]!.pH - pH) < 1e-8, along.quantity);
    }
  });

  it('give at every point what a prediction of that point gives', () => {
    const warm = sweep(SOLUTES, { quantity: 'temperature', values: even(0, 60, 7) });
    for (const { at, pH } of warm.points) assert.ok(Math.abs(predict(SOLUTES, { temperature: at }).pH - pH) < 1e-8, `${at} °C`);
    const thin = sweep('0.1 mol/kg AlCl3', { quantity: 'dilution', values: [1, 10, 100] });
    for (const { at, pH } of thin.points) assert.ok(Math.abs(predict(`${0.1 / at} mol/kg AlCl3`).pH - pH) < 1e-8, `1:${at}`);
    const based = sweep(SOLUTES, { quantity: 'strong-base', values: [0.01, 0.03] });
    for (const { at, pH } of based.points) assert.ok(Math.abs(predict(`${SOLUTES}; ${at} mol/kg NaOH`).pH - pH) < 1e-8, `${at} mol/kg`);
  });

  it('rise with added base', () => {
    const { points } = sweep(SOLUTES, { quantity: 'strong-base', values: even(-0.12, 0.12, 60) });
    points.forEach(({ pH }, place) => assert.ok(place === 0 || pH > points[place - 1]!.pH));
  });

  it('share out every family at a held pH, and cross at the pKa', () => {
    // Half of a weak acid is dissociated where pH is pKa + log γ(base)/γ(acid): the definition of the constant.
    const { species, points } = sweep('0.001 mol/kg CH3COOH', { quantity: 'pH', values: even(0, 14, 57) });
    for (const { shares } of points) assert.ok(Math.abs(shares.reduce((sum, share) => sum + share, 0) - 1) < 1e-9);
    const acid = species.findIndex(({ charge }) => charge === 0);
    const [pKa] = predict('0.001 mol/kg CH3COOH').constants.filter(({ quantity }) => quantity === 'pKa').map(({ valueHere }) => valueHere);
    const crossing = points.find(({ shares }) => shares[acid]! < 0.5)!;
    assert.ok(Math.abs(crossing.at - pKa!) < 0.3, `${crossing.at} ${pKa}`);
  });

  it('agree with the solution’s own species at its own pH', () => {
    const prediction = predict(SOLUTES);
    const { shares } = sweep(SOLUTES, { quantity: 'pH', values: [prediction.pH] }).points[0]!;
    prediction.species.flatMap(({ share }) => share ?? []).forEach((share, place) => assert.ok(Math.abs(share - shares[place]!) < 1e-6));
  });
});
