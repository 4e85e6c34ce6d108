import { describe, expect, it } from 'vitest';
import { solveLeastSquares, type SolvedFit } from '@/lib/numeric';
import { rightDigits, strd } from './strd';

/*
 * NIST Statistical Reference Datasets, linear regression, doi 10.18434/M32189. Certified values of Norris, Longley and Filip
 * read in the published files; Pontius beyond six digits, Wampler and the residual deviations of Longley and Filip from memory.
 * Digits asked: 9 for lower difficulty, 7 for Longley, 6 for Filip (common practice for QR in double precision, from memory).
 */
function solve(rows: readonly (readonly number[])[], y: readonly number[]): SolvedFit {
  const fit = solveLeastSquares({ rows, y });
  if (fit.status !== 'solved') throw new Error(fit.why);
  return fit;
}

const powers = (x: number, degree: number) => Array.from({ length: degree + 1 }, (_, k) => x ** k);

function polynomial(name: string, degree: number): SolvedFit {
  const { x, y } = strd(name);
  return solve(
    x.map(([one]) => powers(one!, degree)),
    y,
  );
}

function expectDigits(got: readonly number[], certified: readonly number[], digits: number): void {
  certified.forEach((value, i) => expect(rightDigits(got[i]!, value), `value ${i}`).toBeGreaterThanOrEqual(digits));
}

const deviations = ({ covariance }: SolvedFit) => covariance.map((row, i) => Math.sqrt(row[i]!));

describe('NIST linear regression', () => {
  it('Norris: straight line, parameters, deviations and residual deviation', () => {
    const fit = polynomial('norris', 1);
    expectDigits(fit.parameters, [-0.262323073774029, 1.00211681802045], 9);
    expectDigits(deviations(fit), [0.232818234301152, 0.429796848199937e-3], 9);
    expectDigits([fit.residualStandardDeviation!, fit.residualSumOfSquares], [0.884796396144373, 26.6173985294224], 9);
    expect(fit.degreesOfFreedom).toBe(34);
  });

  it('Pontius: quadratic', () => {
    const fit = polynomial('pontius', 2);
    expectDigits(fit.parameters, [0.673565789473684e-3, 0.732059160401003e-6, -0.316081871345029e-14], 9);
    expectDigits([fit.residualStandardDeviation!], [0.205177424076185e-3], 9);
  });

  it('Longley: six predictors that nearly follow each other', () => {
    const { x, y } = strd('longley');
    const fit = solve(
      x.map((row) => [1, ...row]),
      y,
    );
    const certified = [
      -3482258.63459582, 15.0618722713733, -0.035819179292591, -2.02022980381683, -1.03322686717359, -0.0511041056535807, 1829.15146461355,
    ];
    expectDigits(fit.parameters, certified, 7);
    expectDigits(deviations(fit), [890420.383607373, 84.9149257747669, 0.0334910077722432, 0.488399681651699, 0.214274163161675], 7);
    expectDigits([fit.residualStandardDeviation!], [304.854073561965], 7);
  });

  it('Filip: polynomial of degree ten', () => {
    const fit = polynomial('filip', 10);
    const certified = [
      -1467.4896142298, -2772.17959193342, -2316.37108160893, -1127.97394098372, -354.478233703349, -75.1242017393757, -10.8753180355343,
      -1.06221498588947, -0.0670191154593408, -0.00246781078275479, -0.402962525080404e-4,
    ];
    expectDigits(fit.parameters, certified, 6);
    expectDigits(deviations(fit), [298.084530995537, 559.77986547495, 466.477572127796, 227.204274477751], 6);
    expectDigits([fit.residualStandardDeviation!], [0.334801051324544e-2], 6);
  });

  const x = Array.from({ length: 21 }, (_, i) => i);
  it.each([
    ['Wampler 1', [1, 1, 1, 1, 1, 1]],
    ['Wampler 2', [1, 0.1, 0.01, 1e-3, 1e-4, 1e-5]],
  ])('%s: exact polynomial of degree five', (_, certified) => {
    const rows = x.map((value) => powers(value, 5));
    const fit = solve(
      rows,
      rows.map((row) => row.reduce((sum, power, k) => sum + power * certified[k]!, 0)),
    );
    expectDigits(fit.parameters, certified, 7);
  });
});
