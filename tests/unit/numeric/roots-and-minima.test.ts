import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findRoot, mean, median, minimise, quantile, rms } from '@/lib/numeric';

describe('findRoot', () => {
  it('finds the fixed point of the cosine', () => {
    // 0.739085133215161 is the Dottie number, value from memory.
    expect(findRoot((x) => Math.cos(x) - x, 0, 1)).toBeCloseTo(0.739085133215161, 11);
  });

  it('finds the root of any rising cubic in any bracket around it', () => {
    const number = fc.double({ min: -50, max: 50, noNaN: true });
    const width = fc.double({ min: 0.1, max: 100, noNaN: true });
    fc.assert(
      fc.property(number, width, width, fc.double({ min: 0.01, max: 10, noNaN: true }), (root, below, above, slope) => {
        const found = findRoot((x) => (x - root) ** 3 + slope * (x - root), root - below, root + above, { tolerance: 1e-10 });
        expect(Math.abs(found! - root)).toBeLessThan(1e-9);
      }),
    );
  });

  it('does not mind which end comes first or a root on an end', () => {
    expect(findRoot((x) => x - 2, 5, 0)).toBeCloseTo(2, 10);
    expect(findRoot((x) => x - 2, 2, 5)).toBe(2);
    expect(findRoot((x) => x - 2, 0, 2)).toBe(2);
  });

  it('copes with a flat root and with a step', () => {
    expect(Math.abs(findRoot((x) => x ** 9, -1, 2)!)).toBeLessThan(1e-9);
    expect(findRoot((x) => (x < 1.25 ? -1 : 1), 0, 3)).toBeCloseTo(1.25, 9);
  });

  it('has no root where the ends agree in sign or are not finite', () => {
    expect(findRoot((x) => x * x + 1, -1, 1)).toBeNull();
    expect(findRoot(() => NaN, -1, 1)).toBeNull();
  });
});

describe('minimise', () => {
  it('finds the bottom of a valley wherever it stands in the bracket', () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 5, noNaN: true }), (bottom) => {
        expect(minimise((x) => (x - bottom) ** 2 + 1, -3, 5).x).toBeCloseTo(bottom, 6);
      }),
    );
  });

  it('ends at the edge where the function only falls', () => {
    const { x, value } = minimise((t) => -t, 4, 0);
    expect(x).toBeCloseTo(4, 7);
    expect(value).toBeCloseTo(-4, 7);
  });
});

describe('statistics', () => {
  it('gives mean, median, root mean square and quantiles', () => {
    const values = [3, -1, 4, 2];
    expect([mean(values), median(values), rms(values)]).toEqual([2, 2.5, Math.sqrt(7.5)]);
    expect([quantile(values, 0), quantile(values, 1)]).toEqual([-1, 4]);
  });
});
