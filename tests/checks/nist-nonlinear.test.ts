import { describe, expect, it } from 'vitest';
import { gaussNewton, type NonlinearFit, type Vector } from '@/lib/numeric';
import { rightDigits, strd } from './strd';

/*
 * NIST Statistical Reference Datasets, nonlinear regression, doi 10.18434/M32189. Certified values and starts read in the
 * published files, those of MGH17 recomputed and as remembered. Six digits asked (common practice, from memory).
 */
interface Curve {
  readonly value: number;
  readonly by: Vector;
}

function fit(name: string, curve: (b: Vector, x: number) => Curve, start: Vector): NonlinearFit {
  const { x, y } = strd(name);
  const model = (b: Vector) => {
    const points = x.map(([one]) => curve(b, one!));
    return { values: points.map(({ value }) => value), jacobian: points.map(({ by }) => by) };
  };
  return gaussNewton({ start, y, model, maxIterations: 500 });
}

const misra1a = ([b1, b2]: Vector, x: number): Curve => {
  const decay = Math.exp(-b2! * x);
  return { value: b1! * (1 - decay), by: [1 - decay, b1! * x * decay] };
};

const thurber = ([b1, b2, b3, b4, b5, b6, b7]: Vector, x: number): Curve => {
  const top = b1! + b2! * x + b3! * x ** 2 + b4! * x ** 3;
  const bottom = 1 + b5! * x + b6! * x ** 2 + b7! * x ** 3;
  const over = [1, x, x ** 2, x ** 3].map((power) => power / bottom);
  const under = [x, x ** 2, x ** 3].map((power) => (-top * power) / bottom ** 2);
  return { value: top / bottom, by: [...over, ...under] };
};

const mgh17 = ([b1, b2, b3, b4, b5]: Vector, x: number): Curve => {
  const [one, two] = [Math.exp(-x * b4!), Math.exp(-x * b5!)];
  return { value: b1! + b2! * one + b3! * two, by: [1, one, two, -x * b2! * one, -x * b3! * two] };
};

function expectCertified(found: NonlinearFit, certified: Vector, sumOfSquares: number, deviations: Vector = []): void {
  expect(found.status).toBe('converged');
  certified.forEach((value, i) => expect(rightDigits(found.parameters[i]!, value), `b${i + 1}`).toBeGreaterThanOrEqual(6));
  expect(rightDigits(found.residualSumOfSquares, sumOfSquares)).toBeGreaterThanOrEqual(6);
  if (found.linear?.status !== 'solved') throw new Error(found.linear?.why);
  const { covariance } = found.linear;
  deviations.forEach((value, i) => expect(rightDigits(Math.sqrt(covariance[i]![i]!), value)).toBeGreaterThanOrEqual(6));
}

describe('NIST nonlinear regression', () => {
  it.each([[[500, 1e-4]], [[250, 5e-4]]])('Misra1a from %j, with deviations', (start) => {
    const certified = [2.3894212918e2, 5.5015643181e-4];
    expectCertified(fit('misra1a', misra1a, start), certified, 1.2455138894e-1, [2.7070075241, 7.2668688436e-6]);
  });

  it.each([[[1000, 1000, 400, 40, 0.7, 0.3, 0.03]], [[1300, 1500, 500, 75, 1, 0.4, 0.05]]])('Thurber from %j', (start) => {
    const certified = [1.28813968e3, 1.4910792535e3, 5.8323836877e2, 7.5416644291e1, 9.6629502864e-1, 3.9797285797e-1, 4.9727297349e-2];
    expectCertified(fit('thurber', thurber, start), certified, 5.6427082397e3);
  });

  it('MGH17 from the nearer start', () => {
    const certified = [3.7541005211e-1, 1.9358469127, -1.4646871366, 1.286753464e-2, 2.2122699662e-2];
    expectCertified(fit('mgh17', mgh17, [0.5, 1.5, -1, 0.01, 0.02]), certified, 5.4648946975e-5);
  });

  it('MGH17 from the far start, which it does not solve, is not called converged', () => {
    expect(fit('mgh17', mgh17, [50, 150, -100, 1, 2]).status).not.toBe('converged');
  });
});
