import { describe, expect, test } from 'vitest';
import { axisLabel, CURVE_WIDTH, domainOf, layoutPlot, valueAt } from '@/components/plot/layout';
import { curveStyle } from '@/components/plot/curve-style';
import type { Pair, PlotAxis, PlotCurve, PlotData } from '@/components/plot/types';

const x: PlotAxis = { name: 'temperature difference', symbol: 'ΔT', unit: 'K' };
const y: PlotAxis = { name: 'heat pumped', symbol: 'Qc', unit: 'W' };
const LABEL_LINE = 15;

const straight = (label: string, from: Pair, to: Pair): PlotCurve => ({ label, points: [from, to] });
const heat: PlotData = { x, y, curves: [0.7, 1.4, 2.1].map((i) => straight(`${i} A`, [0, 12 * i], [25 * i, 0])) };
const voltage: PlotData = {
  x,
  y: { name: 'voltage', symbol: 'V', unit: 'V' },
  curves: [1, 1.02, 1.04].map((i) => straight(`${i} A`, [0, 4 * i], [60, 6 * i])),
};

describe('axes', () => {
  test('are labelled as quotients of quantity and unit', () => {
    expect(axisLabel(y)).toBe('heat pumped Qc / W');
    expect(axisLabel({ name: 'hot side', symbol: 'Th', unit: 'C' })).toBe('hot side Th / °C');
  });

  test('of a plain ratio have no unit, and a symbol that is the name is not said twice', () => {
    expect(axisLabel({ name: 'COP', symbol: 'COP', unit: '1' })).toBe('COP');
  });

  test('take a given domain as it is, reversed too', () => {
    expect(domainOf({ ...x, domain: [70, 0] }, [1, 2])).toEqual([70, 0]);
  });

  test('keep zero in sight unless told not to, and end on round values', () => {
    expect(domainOf(y, [3, 28.7])).toEqual([0, 30]);
    expect(domainOf({ ...y, zero: false }, [21, 28.7])).toEqual([21, 29]);
  });

  test('have room even where all values are equal or there are none', () => {
    const [from, to] = domainOf({ ...y, zero: false }, [5, 5]);
    expect(from < 5 && 5 < to).toBe(true);
    expect(domainOf(y, [])[1]).toBeGreaterThan(domainOf(y, [])[0]);
  });

  test('do not reach below zero for the sake of a band alone', () => {
    const banded = {
      ...heat,
      curves: heat.curves.map((curve) => ({ ...curve, band: curve.points.map(([at, v]) => [at, v - 2, v + 2] as const) })),
    };
    expect(layoutPlot(banded).y.domain()[0]).toBe(0);
  });

  test('do not reach below zero for the dust of rounding, but do for a curve that goes there', () => {
    expect(layoutPlot({ x, y, curves: [straight('a', [0, 20], [60, -1e-12])] }).y.domain()[0]).toBe(0);
    expect(layoutPlot({ x, y, curves: [straight('a', [0, 20], [60, -3])] }).y.domain()[0]).toBeLessThanOrEqual(-3);
  });

  test('write their numbers with the decimals of their steps', () => {
    const { yTicks } = layoutPlot({ x, y: { ...y, domain: [0, 1] }, curves: [] });
    expect(yTicks.map(({ text }) => text)).toEqual(['0.0', '0.2', '0.4', '0.6', '0.8', '1.0']);
  });
});

describe('curves', () => {
  test('are drawn from edge to edge of the stretched area', () => {
    const { paths } = layoutPlot(
      { x: { ...x, domain: [0, 60] }, y: { ...y, domain: [0, 6] }, curves: [straight('a', [0, 0], [60, 6])] },
      300,
    );
    expect(paths).toEqual([`M0,300L${CURVE_WIDTH},0`]);
  });

  test('of a falling family carry their labels at the start, those that fan out at the end', () => {
    expect(layoutPlot(heat).labelSide).toBe('left');
    expect(layoutPlot(voltage).labelSide).toBe('right');
  });

  test('have labels a line apart however close their ends are', () => {
    const crowd = { ...voltage, curves: Array.from({ length: 9 }, (_, k) => straight(`${k} A`, [0, 5], [60, 5 + k / 1000])) };
    const ys = layoutPlot(crowd, 320)
      .labels.map((label) => label!.y)
      .sort((a, b) => a - b);
    for (const [k, at] of ys.entries()) if (k > 0) expect(at - ys[k - 1]!).toBeGreaterThanOrEqual(LABEL_LINE - 1e-6);
  });

  test('without points have no label and no path', () => {
    const { labels, paths } = layoutPlot({ x, y, curves: [straight('a', [0, 1], [2, 3]), { label: 'none', points: [] }] });
    expect(labels[1]).toBeNull();
    expect(paths[1]).toBe('');
  });

  test('differ from their neighbours by colour, dash and marker at once', () => {
    for (let k = 0; k < 14; k++) {
      const [a, b] = [curveStyle(k), curveStyle(k + 1)];
      expect([a.color === b.color, a.dash === b.dash, a.marker === b.marker]).toEqual([false, false, false]);
    }
    expect(new Set(Array.from({ length: 15 }, (_, k) => JSON.stringify(curveStyle(k)))).size).toBe(15);
  });
});

describe('reading a curve off', () => {
  const points: Pair[] = [
    [0, 10],
    [4, 2],
    [10, 2],
  ];
  test('interpolates between its points', () => {
    expect(valueAt(points, 1)).toBe(8);
    expect(valueAt(points, 7)).toBe(2);
  });

  test('gives nothing beyond its ends', () => {
    expect(valueAt(points, -0.1)).toBeNull();
    expect(valueAt(points, 10.1)).toBeNull();
  });

  test('works for a curve that runs from right to left', () => {
    expect(valueAt([...points].reverse(), 1)).toBe(8);
  });
});
