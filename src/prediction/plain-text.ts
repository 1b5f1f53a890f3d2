import type { Chemical, Equation, EquationTerm } from './prediction.js';

const SUBSCRIPTS = '₀₁₂₃₄₅₆₇₈₉';
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A formula in Unicode: digits after a letter or bracket lowered, the charge raised. */
export function formatChemical(chemical: Pick<Chemical, 'label' | 'charge'>): string {
  const formula = chemical.label.replace(/(?<=[A-Za-z)\]}])\d+/g, (digits) => digits.replace(/\d/g, (digit) => SUBSCRIPTS[Number(digit)]!));
  return formula + formatCharge(chemical.charge);
}

function formatCharge(charge: number): string {
  if (charge === 0) return '';
  const size = Math.abs(charge);
  const number = size === 1 ? '' : String(size).replace(/\d/g, (digit) => SUPERSCRIPTS[Number(digit)]!);
  return number + (charge > 0 ? '⁺' : '⁻');
}

/** "NH₄⁺ + H₂O ⇌ NH₃ + H₃O⁺". */
export function formatEquation(equation: Pick<Equation, 'reactants' | 'products' | 'arrow'>): string {
  const side = (terms: readonly EquationTerm[]): string => terms.map(({ coefficient, chemical }) => (coefficient === 1 ? '' : `${coefficient} `) + formatChemical(chemical)).join(' + ');
  return `${side(equation.reactants)} ${equation.arrow === 'complete' ? '→' : '⇌'} ${side(equation.products)}`;
}
