/** Units against ucum-lhc, the validator and converter of the UCUM code system of the US National Library of Medicine. */
import assert from 'node:assert/strict';
import { createRequire } from 'node:module';
import { describe, it } from 'node:test';
import { parseUnit, plainUnit } from '../../src/quantities/units.js';

interface Conversion {
  readonly status: string;
  readonly toVal: number | null;
}
interface Ucum {
  readonly UcumLhcUtils: { getInstance(): { convertUnitTo(from: string, value: number, to: string): Conversion } };
}
// The package has no type declarations.
const reference = (createRequire(import.meta.url)('@lhncbc/ucum-lhc') as Ucum).UcumLhcUtils.getInstance();

/** Units by the unit to which they are compared, with the exponents of amount, mass and length. */
const FAMILIES: readonly (readonly [base: string, dimension: readonly [number, number, number], units: readonly string[]])[] = [
  ['mol/L', [1, 0, -3], ['mol/L', 'mol/l', 'mmol/L', 'umol/L', 'nmol/L', 'cmol/L', 'dmol/L', 'kmol/m3', 'mol/m3', 'mol/dL', 'mmol/mL', 'nmol/mL', 'umol.L-1', 'mol.m-3', 'mol/(10.L)', 'mmol/(100.mL)', '10.mmol/L', 'mol/dm3', 'mol/cm3', '/L.mol', 'mol/uL']],
  ['g/L', [0, 1, -3], ['g/L', 'mg/mL', 'mg/L', 'ug/L', 'ug/mL', 'g/(100.mL)', 'g/dL', 'mg/dL', 'kg/m3', 'g.L-1', 'ng/mL', 'g/cm3', 'mg/(10.mL)', 'kg/L']],
  ['mol/kg', [1, -1, 0], ['mol/kg', 'mmol/kg', 'umol/kg', 'mol/g', 'mmol/g', 'mol.kg-1', 'cmol/kg', 'mmol/(100.g)']],
  ['mol', [1, 0, 0], ['mol', 'mmol', 'umol', 'nmol', 'kmol']],
  ['g', [0, 1, 0], ['g', 'mg', 'kg', 'ug', 'ng', 'dg', 'cg']],
  ['L', [0, 0, 3], ['L', 'l', 'mL', 'uL', 'dL', 'cL', 'm3', 'dm3', 'cm3', 'mm3']],
];

describe('units', () => {
  for (const [base, [amount, mass, length], units] of FAMILIES) {
    for (const unit of units) {
      it(`${unit} in ${base}`, () => {
        const { status, toVal } = reference.convertUnitTo(unit, 1, base);
        assert.equal(status, 'succeeded');
        const parsed = parseUnit(unit)!;
        assert.deepEqual(parsed.dimension, { amount, mass, length });
        const factor = parsed.factor.div(parseUnit(base)!.factor).toNumber();
        assert.ok(Math.abs(factor / toVal! - 1) < 1e-14, `${factor}, by the reference ${toVal}`);
      });
    }
  }

  it('takes the laboratory’s M for mol/L', () => {
    // M for mol/L: common practice, no source.
    for (const [short, long] of [['M', 'mol/L'], ['mM', 'mmol/L'], ['uM', 'umol/L'], ['µM', 'umol/L'], ['μM', 'umol/L'], ['nM', 'nmol/L']] as const) {
      assert.equal(parseUnit(short)!.factor.toString(), parseUnit(long)!.factor.toString());
      assert.deepEqual(parseUnit(short)!.dimension, parseUnit(long)!.dimension);
    }
  });

  it('reads the typings of the laboratory for their plain form', () => {
    for (const [typed, plain] of [['µmol/L', 'umol/L'], ['mol·L⁻¹', 'mol.L-1'], ['mol⋅L−1', 'mol.L-1'], ['mol*L^-1', 'mol.L-1'], ['g/ℓ', 'g/L'], ['mol·dm⁻³', undefined], ['kg·m⁻³', 'kg.m-3']] as const) {
      if (plain === undefined) assert.ok(parseUnit(typed) === undefined || parseUnit(typed)!.dimension.length === -3, typed);
      else assert.equal(plainUnit(typed), plain);
    }
  });

  it('refuses what is no such unit', () => {
    for (const unit of ['', ' ', 'furlong', 'mol/', '/', 'mol//L', 'mol/(L', 'mol/L)', 'mol L', 'MOL/L', 'Mol/L', 'mol/L0', 'L0', '0.mol', 'pol', 'xmol', 'mkg', 'mol-', '%', 'N', 's', 'mol/s', 'm4m', '__proto__', 'constructor', 'mol/constructor', '1e3.mol', '-1', 'mol/L!']) {
      assert.equal(parseUnit(unit), undefined, unit);
    }
  });

  it('is exact', () => {
    assert.equal(parseUnit('umol/L')!.factor.toString(), '0.001');
    assert.equal(parseUnit('g/(100.mL)')!.factor.toString(), '10000');
    assert.equal(parseUnit('nmol/L')!.factor.toString(), '0.000001');
  });
});
