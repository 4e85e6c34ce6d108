import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { largerCovariance, propagate, weakestCombination, type Rows } from '@/lib/numeric';

const quadratic = (C: Rows, g: readonly number[]) =>
  g.reduce((sum, a, i) => sum + g.reduce((inner, b, j) => inner + a * b * C[i]![j]!, 0), 0);

const anyCovariance: fc.Arbitrary<Rows> = fc
  .tuple(
    fc.double({ min: 0.1, max: 10, noNaN: true }),
    fc.double({ min: 0.1, max: 10, noNaN: true }),
    fc.double({ min: -0.95, max: 0.95, noNaN: true }),
  )
  .map(([a, b, r]) => [
    [a * a, r * a * b],
    [r * a * b, b * b],
  ]);

describe('propagate', () => {
  it('is exact for a linear function, correlation included', () => {
    // u² of 2a − b with u(a) = 0.3, u(b) = 0.4, r = 0.5: 4·0.09 + 0.16 − 2·2·0.06 = 0.28 (JCGM 100:2008, eq. 13).
    const found = propagate(
      ([a, b]) => [2 * a! - b!],
      [5, 7],
      [
        [0.09, 0.06],
        [0.06, 0.16],
      ],
    );
    expect(found.values).toEqual([3]);
    expect(found.u[0]).toBeCloseTo(Math.sqrt(0.28), 8);
  });

  it('follows the slope of a product and a quotient, and how they go together', () => {
    const found = propagate(
      ([a, b]) => [a! * b!, a! / b!],
      [3, 4],
      [
        [0.01, 0],
        [0, 0.04],
      ],
    );
    expect(found.u[0]).toBeCloseTo(Math.hypot(4 * 0.1, 3 * 0.2), 7);
    expect(found.u[1]).toBeCloseTo(Math.hypot(0.1 / 4, (3 * 0.2) / 16), 7);
    expect(found.covariance[0]![1]).toBeCloseTo(4 * 0.25 * 0.01 + 3 * (-3 / 16) * 0.04, 7);
  });

  it('works at a parameter of zero', () => {
    expect(propagate(([a]) => [3 * a!], [0], [[0.04]]).u[0]).toBeCloseTo(0.6, 8);
  });
});

describe('largerCovariance', () => {
  it('gives no combination less variance than either of the two', () => {
    const part = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(anyCovariance, anyCovariance, part, part, (one, other, g1, g2) => {
        const larger = largerCovariance(one, other);
        const either = Math.max(quadratic(one, [g1, g2]), quadratic(other, [g1, g2]));
        expect(quadratic(larger, [g1, g2])).toBeGreaterThanOrEqual(either * (1 - 1e-9));
      }),
    );
  });

  it('is one of the two where that is larger in every direction', () => {
    const base = [
      [4, 1],
      [1, 2],
    ];
    const twice = base.map((row) => row.map((value) => 2 * value));
    largerCovariance(base, twice).forEach((row, i) => row.forEach((value, j) => expect(value).toBeCloseTo(twice[i]![j]!, 10)));
    largerCovariance(twice, base).forEach((row, i) => row.forEach((value, j) => expect(value).toBeCloseTo(twice[i]![j]!, 10)));
  });

  it('is exactly symmetric', () => {
    const larger = largerCovariance(
      [
        [4, 1],
        [1, 2],
      ],
      [
        [1, 0.5],
        [0.5, 9],
      ],
    );
    expect(larger[0]![1]).toBe(larger[1]![0]);
  });
});

describe('weakestCombination', () => {
  it('measures each parameter in its own size', () => {
    const { direction, u } = weakestCombination(
      [100, 0.01],
      [
        [1, 0],
        [0, 1e-5],
      ],
    );
    expect(u).toBeCloseTo(Math.sqrt(1e-5) / 0.01, 9);
    expect(Math.abs(direction[1]!)).toBeCloseTo(1, 9);
  });

  it('finds the sum that two correlated parameters share', () => {
    const { direction } = weakestCombination(
      [1, 1],
      [
        [1, 0.9],
        [0.9, 1],
      ],
    );
    expect(direction[0]! / direction[1]!).toBeCloseTo(1, 9);
  });
});
