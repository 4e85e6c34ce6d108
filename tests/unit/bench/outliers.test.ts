import { describe, expect, test } from 'vitest';
import { byCurve, outliersOf } from '@/components/islands/bench/model/outliers';
import type { ModelAnswer, Residual } from '@/lib/contracts';
import { emptyChart, emptyCurve, emptyDocument } from '@/lib/editor';

const chart = {
  ...emptyChart('c1', { id: 1, pixelsSha256: 'ab'.repeat(32), width: 1000, height: 700 }),
  family: { quantity: 'I', unit: 'A' } as const,
};
const document = { ...emptyDocument(), charts: [{ ...chart, curves: [emptyCurve('k1', 0.7), emptyCurve('k2', 1.4)] }] };

/** Residuals, in percent of the axis, along one curve. */
const along = (curve: number, percents: readonly number[], omitted: readonly number[] = []): Residual[] =>
  percents.map((percentOfRange, point) => ({
    chart: 0,
    curve,
    point,
    px: [100 * point, 300],
    residual: percentOfRange / 100,
    percentOfRange,
    standardized: percentOfRange,
    omitted: omitted.includes(point),
  }));
const answer = (residuals: Residual[]): ModelAnswer => ({ result: null, fit: null, residuals, curves: [], ratings: [], problems: [] });
const texts = (residuals: Residual[]) => outliersOf(answer(residuals), document).map(({ text }) => text);
const bend = [0, 1, 2, 3, 4, 5, 6, 7, 8].map((i) => 0.12 * (i - 4) ** 2 - 0.8);

describe('points that stand out', () => {
  test('a form that bends away evenly along a curve makes none', () => {
    expect(texts(along(0, bend))).toEqual([]);
  });

  test('a slip of the hand is the one that is named, not its neighbours', () => {
    expect(texts(along(1, bend.with(3, (bend[3] ?? 0) + 1.5)))).toEqual(['Point 4 of 1.4\u00A0A: 0.82\u00A0% of the axis']);
  });

  test('a slip at the end of a curve is named too', () => {
    expect(texts(along(0, bend.with(8, (bend[8] ?? 0) - 2)))).toEqual(['Point 9 of 0.7\u00A0A: −0.88\u00A0% of the axis']);
  });

  test('a point that is left out already is not named, and does not make its neighbours stand out', () => {
    expect(texts(along(0, bend.with(3, 9), [3]))).toEqual([]);
  });

  test('residuals are grouped by curve in the order of the draft', () => {
    const groups = byCurve([...along(1, [1, 2]), ...along(0, [3])]);
    expect(groups.map(({ curve, residuals }) => [curve, residuals.length])).toEqual([
      [0, 1],
      [1, 2],
    ]);
  });
});
