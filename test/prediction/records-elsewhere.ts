/**
 * Prints predictions to their last digit, and their records, as JSON. With the argument "perturbed" every function of Math whose last digits ECMAScript leaves to
 * the implementation is first replaced by one that is off in the fifteenth digit, as another engine's might be.
 */
const INEXACT = ['acos', 'acosh', 'asin', 'asinh', 'atan', 'atanh', 'cbrt', 'cos', 'cosh', 'exp', 'expm1', 'log', 'log10', 'log1p', 'log2', 'sin', 'sinh', 'tan', 'tanh'] as const;

if (process.argv[2] === 'perturbed') {
  const off = (value: number): number => (Number.isInteger(value) ? value : value * (1 + 4e-15));
  for (const name of INEXACT) {
    const exact = Math[name];
    Math[name] = (x: number) => off(exact(x));
  }
  const power = Math.pow;
  Math.pow = (x, y) => off(power(x, y));
  if (Math.exp(1) === Math.E) throw new Error('the functions were not replaced');
}

const { createRecord, predict } = await import('../../src/engine.js');
const results = [];
for (const solutes of [
  '0.1 mol/kg NH4Cl',
  '12.5 mmol/L Na2HPO4·12H2O; 3.7 g/L KH2PO4; 0.2 mol/L KCl',
  '1 nmol/kg NaCl',
  '0.05 mol/kg Al2(SO4)3; 0.02 mol/kg FeCl3; 0.01 mol/kg CuSO4·5H2O',
  '2.5 mol/kg Na2CO3',
  '40 mmol/L Tris; 25 mmol/L HCl; 1 mmol/L disodium edetate dihydrate; 5 mmol/L MgCl2·6H2O',
]) {
  for (const temperature of [3.3, 25, 57]) {
    for (const air of ['excluded', 'equilibrated'] as const) {
      const prediction = predict(solutes, { temperature, air });
      results.push({ prediction, record: createRecord(prediction) });
    }
  }
}
console.log(JSON.stringify(results));

export {};
