import { expect, test } from 'vitest';
import { chartEvidence, residualDots } from '@/components/review/charts';
import { overlayLabels, pathOfDots, pathThrough, percentOf } from '@/components/review/overlay';
import type { Residual } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import { draftOf } from '../../support/drafts';

const PAGE = { id: 1, pixelsSha256: 'a'.repeat(64), width: 800, height: 600 };
const document = draftOf(PAGE);
const EMPTY = { residuals: [], curves: [], problems: [] };

const residual = (of: Partial<Residual>): Residual => ({
  chart: 0,
  curve: 0,
  point: 0,
  px: [80, 560],
  residual: 0,
  percentOfRange: 0,
  standardized: 0,
  omitted: false,
  ...of,
});

const withChart = (change: Partial<BenchDocument['charts'][number]>): BenchDocument => ({
  ...document,
  charts: document.charts.map((chart, at) => (at === 0 ? { ...chart, ...change } : chart)),
});

test('the root mean square of a curve counts its fitted points and no others', () => {
  const residuals = [
    residual({ residual: 3, percentOfRange: 6 }),
    residual({ point: 1, residual: -4, percentOfRange: -8 }),
    residual({ point: 2, residual: 100, percentOfRange: 100, omitted: true }),
    residual({ curve: 1, residual: 50, percentOfRange: 50 }),
    residual({ chart: 1, residual: 70, percentOfRange: 70 }),
  ];
  const [chart] = chartEvidence(document, { ...EMPTY, residuals });
  expect(chart!.curves[0]).toMatchObject({ name: '1\u00a0A', rms: Math.sqrt(12.5), rmsPercent: Math.sqrt(50) });
  expect(chart!.curves[1]!.rms).toBe(50);
  expect(chart!.curves[2]).toMatchObject({ rms: null, rmsPercent: null });
});

test('the points farthest from the model are numbered from the farthest on, left-out ones apart', () => {
  const residuals = [1, -9, 4, 7, -2].map((percentOfRange, point) =>
    residual({ point, percentOfRange, residual: percentOfRange, px: document.charts[0]!.curves[0]!.points[point] as [number, number] }),
  );
  const leftOut = residual({ point: 5, percentOfRange: 50, omitted: true });
  const [chart] = chartEvidence(document, { ...EMPTY, residuals: [...residuals, leftOut] });
  expect(chart!.worst.map(({ number, percentOfRange }) => [number, percentOfRange])).toEqual([
    [1, -9],
    [2, 7],
    [3, 4],
  ]);
  expect(chart!.worst[0]!.at).toBeCloseTo(5, 6); // the second of twelve points over 60 K
});

test('residuals are told in the unit of the chart, and in the base unit where the axis is a share of a rating', () => {
  const residuals = [residual({ residual: 0.25 })];
  const milli = chartEvidence(withChart({ y: { quantity: 'Qc', unit: 'mW', scale: 'linear' } }), { ...EMPTY, residuals })[0]!;
  expect([milli.answer.unit, milli.curves[0]!.rms]).toEqual(['mW', 250]);
  const share = chartEvidence(withChart({ y: { quantity: 'Qc', unit: '%', scale: 'linear', of: 'qmaxW' } }), { ...EMPTY, residuals })[0]!;
  expect([share.answer.unit, share.curves[0]!.rms]).toEqual(['W', 0.25]);
});

test('residuals run along the axis that is not the answer', () => {
  const [x, y] = [document.charts[0]!.y, document.charts[0]!.x];
  const turned = withChart({ x, y, marks: document.charts[0]!.marks.map((mark) => ({ ...mark, x: mark.y, y: mark.x })) });
  const px: [number, number] = [300, 300];
  expect(chartEvidence(document, EMPTY)[0]!.along).toMatchObject({ axis: 'x', quantity: 'deltaT' });
  const [chart] = chartEvidence(turned, { ...EMPTY, residuals: [residual({ px, residual: 2 })] });
  expect(chart!.along).toMatchObject({ axis: 'y', quantity: 'deltaT', unit: 'K' });
  expect(residualDots(chart!)[0]!.points).toEqual([[expect.any(Number), 2]]);
});

test('marks lie on their own values in an exact frame, and a mark that was moved shows by how much', () => {
  const [exact] = chartEvidence(document, EMPTY);
  for (const mark of exact!.marks) for (const off of [mark.offX, mark.offY]) expect(Math.abs(off!)).toBeLessThan(1e-6);
  const moved = document.charts[0]!.marks.map((mark, at) => (at === 1 ? { ...mark, px: [mark.px[0], mark.px[1] + 6] as const } : mark));
  const offs = chartEvidence(withChart({ marks: moved }), EMPTY)[0]!.marks.map(({ offY }) => Math.abs(offY!));
  expect(Math.max(...offs)).toBeGreaterThan(2);
});

test('a chart that is not finished shows what it misses and no residuals', () => {
  const unfinished = withChart({ curves: [], side: { kind: 'hot', celsius: null } });
  const [chart] = chartEvidence(unfinished, {
    ...EMPTY,
    problems: [
      { chart: 0, text: 'Add a curve.' },
      { chart: 1, text: 'Other.' },
    ],
  });
  expect(chart).toMatchObject({ curves: [], worst: [], problems: ['Add a curve.'] });
});

test('paths keep hundredths of a pixel, and dots are strokes without length', () => {
  expect(
    pathThrough([
      [1, 2],
      [3.14159, 4],
    ]),
  ).toBe('M1 2L3.14 4');
  expect(
    pathOfDots([
      [1, 2],
      [3, 4],
    ]),
  ).toBe('M1 2h0M3 4h0');
  expect(percentOf([200, 150], 800, 600)).toEqual({ x: '25%', y: '25%' });
});

test('labels of curves that end in one place stand clear of each other', () => {
  const chart = chartEvidence(document, EMPTY)[0]!;
  const [first] = chart.curves;
  const same = [0, 1, 2, 3].map((style) => ({ ...first!, style, name: `${style} A` }));
  const places = overlayLabels(same, 800, 600).map((label) => Number.parseFloat(label.y));
  const gaps = [...places].sort((a, b) => a - b).flatMap((y, at, all) => (at === 0 ? [] : [y - all[at - 1]!]));
  expect(Math.min(...gaps)).toBeGreaterThan(4); // percent of the height: 15 of 320 px
});
