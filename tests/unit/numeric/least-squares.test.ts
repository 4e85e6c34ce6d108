import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveLeastSquares, type LeastSquaresProblem, type SolvedFit } from '@/lib/numeric';
import { normals } from '../../support/random';

function solve(problem: LeastSquaresProblem): SolvedFit {
  const fit = solveLeastSquares(problem);
  if (fit.status !== 'solved') throw new Error(fit.why);
  return fit;
}

const line = [0, 1, 2, 3].map((x) => [1, x]);

describe('solveLeastSquares', () => {
  it('gives back the parameters of exact observations, whatever the scale of the columns', () => {
    const numbers = fc.double({ min: -10, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.array(numbers, { minLength: 3, maxLength: 3 }), fc.integer({ min: -6, max: 6 }), (b, power) => {
        const rows = Array.from({ length: 9 }, (_, i) => [1, (i - 3) * 10 ** power, Math.sin(i)]);
        const y = rows.map((row) => row.reduce((sum, x, j) => sum + x * b[j]!, 0));
        const { parameters } = solve({ rows, y });
        // Rounding is a share of the largest term, so a parameter is good to that share over the size of its column.
        const size = (column: readonly number[]) => Math.max(...column.map(Math.abs));
        const largest = Math.max(...b.map((value, j) => Math.abs(value) * size(rows.map((row) => row[j]!))), 1e-290);
        parameters.forEach((value, j) => {
          expect(Math.abs(value - b[j]!) * size(rows.map((row) => row[j]!))).toBeLessThanOrEqual(1e-12 * largest);
        });
      }),
    );
  });

  it('fits a straight line as worked by hand', () => {
    // y = 1, 3, 4, 6 on x = 0, 1, 2, 3: slope 8/5, intercept 11/10, squares 0.2, s² = 0.1, u²(slope) = s²/5.
    const fit = solve({ rows: line, y: [1, 3, 4, 6] });
    expect(fit.parameters[0]).toBeCloseTo(1.1, 12);
    expect(fit.parameters[1]).toBeCloseTo(1.6, 12);
    expect(fit.residualSumOfSquares).toBeCloseTo(0.2, 12);
    expect(fit.covariance[1]![1]).toBeCloseTo(0.02, 12);
    expect(fit.residuals.map((r) => Number(r.toFixed(12)))).toEqual([-0.1, 0.3, -0.3, 0.1]);
    expect([fit.rank, fit.degreesOfFreedom]).toEqual([2, 2]);
  });

  it('takes weights as one over squared uncertainties and does not rescale their covariance', () => {
    // Mean of 1 and 4 with uncertainties 1 and 2: (1·1 + 4/4)/(1 + 1/4) = 1.6, variance 1/(1 + 1/4) = 0.8.
    const fit = solve({ rows: [[1], [1]], y: [1, 4], weights: [1, 0.25] });
    expect(fit.parameters[0]).toBeCloseTo(1.6, 12);
    expect(fit.covariance[0]![0]).toBeCloseTo(0.8, 12);
  });

  it('leaves out an observation of weight zero but still tells its residual', () => {
    const fit = solve({ rows: [...line, [1, 9]], y: [1, 3, 4, 6, 100], weights: [1, 1, 1, 1, 0] });
    expect(fit.parameters[1]).toBeCloseTo(1.6, 12);
    expect(fit.residuals[4]).toBeCloseTo(100 - 1.1 - 9 * 1.6, 10);
    expect(fit.degreesOfFreedom).toBe(2);
  });

  it('knows no covariance where nothing tells the scatter', () => {
    const fit = solve({ rows: line.slice(0, 2), y: [1, 3] });
    expect(fit.covariance[0]![0]).toBeNaN();
    expect(fit.residualStandardDeviation).toBeNull();
  });

  it('gives no numbers but names what cannot be told when columns depend on each other', () => {
    const rows = [0, 1, 2, 3].map((x) => [1, x, 2 * x + 3, x * x]);
    const fit = solveLeastSquares({ rows, y: [1, 2, 3, 4], names: ['offset', 'slope', 'copy', 'bend'] });
    expect(fit).toMatchObject({ status: 'rankDeficient', rank: 3, condition: Infinity });
    expect(fit.why).toBe('The observations cannot tell slope from copy.');
    expect('parameters' in fit).toBe(false);
  });

  it('returns the direction that the observations do not see', () => {
    const rows = [1, 2, 3].map((x) => [x, 10 * x]);
    const fit = solveLeastSquares({ rows, y: [1, 2, 3] });
    if (fit.status !== 'rankDeficient') throw new Error(fit.status);
    expect(fit.weakest![0]! / fit.weakest![1]!).toBeCloseTo(-10, 9);
  });

  it('counts a column of nothing as not seen', () => {
    expect(
      solveLeastSquares({
        rows: [
          [1, 0],
          [2, 0],
          [4, 0],
        ],
        y: [1, 2, 3],
      }),
    ).toMatchObject({ status: 'rankDeficient', rank: 1 });
  });

  it('says when there are fewer observations than unknowns', () => {
    expect(solveLeastSquares({ rows: [[1, 2]], y: [1] })).toMatchObject({
      status: 'tooFew',
      why: 'There are 2 unknowns and only 1 observations.',
    });
    expect(solveLeastSquares({ rows: [], y: [] }).status).toBe('tooFew');
  });

  it.each<[string, LeastSquaresProblem]>([
    ['4 rows but 3 observations', { rows: line, y: [1, 2, 3] }],
    ['1 weights but 4 observations', { rows: line, y: [1, 2, 3, 4], weights: [1] }],
    ['2 cluster labels but 4 observations', { rows: line, y: [1, 2, 3, 4], clusters: ['a', 'b'] }],
    ['rows differ in length', { rows: [[1, 2], [1]], y: [1, 2] }],
    ['rows and observations must be finite', { rows: line, y: [1, 2, NaN, 4] }],
    ['weights must be finite and not negative', { rows: line, y: [1, 2, 3, 4], weights: [1, 1, -1, 1] }],
  ])('refuses: %s', (message, problem) => expect(() => solveLeastSquares(problem)).toThrow(new RangeError(message)));
});

describe('the covariance by clusters', () => {
  const clusters = Array.from({ length: 8 }, (_, g) => Array.from({ length: 20 }, () => g)).flat();
  const rows = clusters.map((g, i) => [1, g + (i % 20) / 20]);

  it('is about the scatter of many repetitions when each cluster has an error of its own', () => {
    const normal = normals(20240611);
    const [slopes, robust, pointwise]: [number[], number[], number[]] = [[], [], []];
    for (let trial = 0; trial < 300; trial += 1) {
      const offsets = Array.from({ length: 8 }, () => normal());
      const fit = solve({ rows, y: clusters.map((g) => offsets[g]! + 0.1 * normal()), clusters });
      slopes.push(fit.parameters[1]!);
      robust.push(fit.clusterCovariance![1]![1]!);
      pointwise.push(fit.covariance[1]![1]!);
    }
    const variance = slopes.reduce((sum, slope) => sum + slope ** 2, 0) / slopes.length;
    const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
    expect(mean(robust) / variance).toBeGreaterThan(0.9);
    expect(mean(robust) / variance).toBeLessThan(2);
    expect(mean(pointwise) / variance).toBeLessThan(0.15);
  });

  it('does not depend on the order of the observations', () => {
    const y = rows.map(([, x], i) => x! + Math.cos(3 * i));
    const order = rows.map((_, i) => (i * 37) % rows.length);
    const [one, other] = [
      solve({ rows, y, clusters }),
      solve({ rows: order.map((i) => rows[i]!), y: order.map((i) => y[i]!), clusters: order.map((i) => clusters[i]!) }),
    ];
    expect(one.clusterCovariance![1]![1]! / other.clusterCovariance![1]![1]!).toBeCloseTo(1, 9);
  });

  it('is not given for a single cluster or without clusters', () => {
    expect(solve({ rows: line, y: [1, 3, 4, 6], clusters: [7, 7, 7, 7] }).clusterCovariance).toBeNull();
    expect(solve({ rows: line, y: [1, 3, 4, 6] }).clusterCovariance).toBeNull();
  });

  it('stays finite where one cluster alone determines a parameter', () => {
    const fit = solve({
      rows: [
        [1, 0],
        [1, 0],
        [0, 1],
        [0, 1],
      ],
      y: [1, 2, 5, 7],
      clusters: ['a', 'a', 'b', 'b'],
    });
    expect(fit.clusterCovariance!.flat().every(Number.isFinite)).toBe(true);
  });
});
