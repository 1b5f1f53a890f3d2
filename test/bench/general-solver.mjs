import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

const BALANCE_TOLERANCE = 1e-13;
const COEFFICIENT_TOLERANCE = 1e-9;
const MOST_ROUNDS = 200;
/** In the natural logarithm of every unknown. */
const START_OFFSET = 0.5;

/**
 * The equations of a solution in a general-purpose least-squares solver: the balances as functions of the logarithms of
 * the component activities and of a(H⁺) with their derivatives, activity coefficients substituted until they agree. It
 * starts half a natural logarithm off the solution, which a user of such a solver would have to find first.
 * @returns undefined when the solver is not installed.
 */
export async function generalSolver(dist) {
  const load = (path) => import(pathToFileURL(join(dist, 'lib', path)).href);
  let levenbergMarquardt;
  try {
    ({ levenbergMarquardt } = await import('ml-levenberg-marquardt'));
  } catch {
    return undefined;
  }
  const [{ readSolutes }, { dissolve }, { solutionModel }, { waterAt }, { solveEquilibrium }, { activityCoefficients, lnWaterActivity }] = await Promise.all([
    load('substances/solutes-text.js'), load('prediction/dissolve.js'), load('prediction/solution-model.js'), load('equilibrium/water.js'), load('equilibrium/solver.js'), load('equilibrium/specific-interaction.js'),
  ]);

  const problem = (solutes) => {
    const water = waterAt(25);
    const { system, table } = solutionModel(dissolve(readSolutes(solutes), water, undefined).particles, water, undefined);
    const { pH, lnActivity } = solveEquilibrium(system, table);
    const start = [...lnActivity, -pH * Math.LN10].map((value) => value + START_OFFSET);
    return { system, table, pH, start };
  };

  const solve = ({ system: { species, components, protonTotal }, table, start }) => {
    const size = components.length + 1;
    const numbers = species.map(({ protons, stoichiometry }) => components.map((_, component) => stoichiometry.find(([part]) => part === component)?.[1] ?? 0).concat(protons));
    const totals = [...components.map(({ total }) => total), protonTotal];
    const lnGamma = new Float64Array(species.length);
    const molality = new Float64Array(species.length);
    let lnWater = 0;
    const setMolalities = (unknowns) => species.forEach(({ fixedMolality, lnBeta, water }, index) => {
      molality[index] = fixedMolality ?? Math.exp(numbers[index].reduce((sum, number, place) => sum + number * unknowns[place], lnBeta + water * lnWater - lnGamma[index]));
    });
    const scales = totals.map((total) => Math.abs(total) || 1);
    const residuals = (unknowns) => {
      setMolalities(unknowns);
      const values = totals.map((total, place) => (species.reduce((sum, { fixedMolality }, index) => (fixedMolality === undefined ? sum + numbers[index][place] * molality[index] : sum), 0) - total) / scales[place]);
      return (place) => values[place];
    };
    const jacobianFunction = (unknowns) => {
      setMolalities(unknowns);
      const rows = totals.map((_, row) => totals.map((_other, column) => species.reduce((sum, { fixedMolality }, index) => (fixedMolality === undefined ? sum + numbers[index][row] * numbers[index][column] * molality[index] : sum), 0) / scales[row]));
      return (place) => rows[place];
    };
    const data = { x: totals.map((_, place) => place), y: new Array(size).fill(0) };
    let unknowns = start;
    for (let round = 0; round < MOST_ROUNDS; round++) {
      ({ parameterValues: unknowns } = levenbergMarquardt(data, residuals, { initialValues: unknowns, jacobianFunction, damping: 1e-9, errorTolerance: BALANCE_TOLERANCE ** 2, maxIterations: 100 }));
      setMolalities(unknowns);
      const next = new Float64Array(species.length);
      activityCoefficients(table, molality, next);
      const change = next.reduce((most, value, index) => Math.max(most, Math.abs(value - lnGamma[index])), 0);
      lnGamma.set(next);
      lnWater = lnWaterActivity(table, molality);
      if (change < COEFFICIENT_TOLERANCE) break;
    }
    return { pH: -unknowns[size - 1] / Math.LN10 };
  };

  return { problem, solve, description: 'general-purpose solver: ml-levenberg-marquardt, the balances alone, started half a natural logarithm off the solution; predict includes reading the text.' };
}
