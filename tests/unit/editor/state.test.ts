import { describe, expect, test } from 'vitest';
import {
  apply,
  chartName,
  chartState,
  compareDocuments,
  emptyChart,
  emptyCurve,
  emptyDocument,
  frameOf,
  isFinished,
  placeOf,
  progressOf,
  unitsPerPixel,
  usualUnit,
  valueAt,
  type BenchChart,
  type Command,
} from '@/lib/editor';
import { rolesOf } from '@/lib/reading';
import { QUANTITIES } from '@/lib/units';
import { picture } from './arbitrary';

type OfChart<C> = C extends { readonly chart: string } ? Omit<C, 'chart'> : never;
const chart = (...commands: OfChart<Command>[]): BenchChart =>
  commands.reduce(
    (document, command) => apply(document, { ...command, chart: 'c1' } as Command),
    apply(emptyDocument(), { type: 'addChart', chart: emptyChart('c1', picture) }),
  ).charts[0]!;
const heat = [
  { type: 'setKind', kind: 'heat-deltaT' },
  { type: 'setSide', to: { celsius: 27 } },
] as const;
const framed = [
  ...heat,
  { type: 'addMark', mark: { id: 'm1', px: [60, 660], x: 0, y: 0 } },
  { type: 'addMark', mark: { id: 'm2', px: [960, 60], x: 90, y: 30 } },
] as const;
const curve = [
  { type: 'addCurve', curve: emptyCurve('k1', 1.4) },
  { type: 'addPoint', curve: 'k1', px: [160, 260] },
] as const;

describe('what a chart still misses', () => {
  test('a new chart misses everything, told station by station', () => {
    const state = chartState(chart());
    expect(state.chart).toHaveLength(4);
    expect(state.frame).toEqual(['Place a mark on a tick of the x axis and one on a tick of the y axis, and type what is printed there.']);
    expect(state.curves).toEqual(['Add a curve and place points on its line.']);
    expect(progressOf(chart())).toBe('not begun');
  });

  test('a chart with all three stations done misses nothing', () => {
    const done = chart(...framed, ...curve);
    expect(chartState(done)).toEqual({ chart: [], frame: [], curves: [] });
    expect([isFinished(done), progressOf(done), progressOf(chart(...framed))]).toEqual([true, '1\u00A0curve', 'frame only']);
  });

  test.each([
    ['the same side cannot vary', { axis: 'x', to: { quantity: 'Th', unit: 'C' } }, /keeps its hot side/],
    ['one is electrical', { axis: 'x', to: { quantity: 'P', unit: 'W' } }, /exactly one is a temperature/],
    ['none is shown twice', { axis: 'x', to: { quantity: 'Qc', unit: 'W' } }, /the same quantity/],
  ] as const)('of the quantities %s', (_name, change, sentence) => {
    expect(chartState(chart(...heat, { type: 'setAxis', ...change })).chart).toEqual([expect.stringMatching(sentence)]);
  });

  test('every triple of quantities at either side is taken or refused as the reading document takes or refuses it', () => {
    for (const x of QUANTITIES)
      for (const y of QUANTITIES)
        for (const family of QUANTITIES)
          for (const kind of ['hot', 'cold'] as const) {
            const roles = rolesOf({
              x: { quantity: x },
              y: { quantity: y },
              family: { quantity: family },
              [kind === 'hot' ? 'hotSideC' : 'coldSideC']: 27,
            });
            const set = (axis: 'x' | 'y', quantity: typeof x) =>
              ({ type: 'setAxis', axis, to: { quantity, unit: usualUnit(quantity) } }) as const;
            const told = chart(
              set('x', x),
              set('y', y),
              { type: 'setFamily', to: { quantity: family } },
              { type: 'setSide', to: { kind, celsius: 27 } },
            );
            expect([x, y, family, kind, chartState(told).chart.length === 0]).toEqual([x, y, family, kind, roles.ok]);
          }
  });

  test('voltage may answer a current and a current a voltage', () => {
    expect(chartState(chart({ type: 'setKind', kind: 'voltage-current' }, { type: 'setSide', to: { celsius: 27 } })).chart).toEqual([]);
  });

  test('a mark without a value is named by its number, and the frame of the others stays', () => {
    const third = chart(...framed, { type: 'addMark', mark: { id: 'm3', px: [500, 500], x: null, y: null } });
    expect(chartState(third).frame).toEqual(['Mark 3 has no value yet: type its x value, its y value or both.']);
    expect(frameOf(third).ok).toBe(true);
  });

  test('curves want a value of their own and a point that is used', () => {
    const sentences = (...more: OfChart<Command>[]) => chartState(chart(...framed, ...more)).curves;
    expect(sentences({ type: 'addCurve', curve: emptyCurve('k1') })).toEqual([
      'Type the value of curve 1: what is printed beside the line.',
    ]);
    expect(sentences({ type: 'addCurve', curve: emptyCurve('k1', 1.4) })).toEqual(['Place points on the 1.4\u00A0A curve.']);
    expect(sentences(...curve, { type: 'omitPoint', curve: 'k1', point: 0, omitted: true })).toEqual([
      'Every point of the 1.4\u00A0A curve is left out: use one again or remove the curve.',
    ]);
    expect(sentences(...curve, { type: 'addCurve', curve: emptyCurve('k2', 1.4) })).toEqual([
      'Two curves say 1.4\u00A0A: change one or remove it.',
    ]);
  });

  test('a chart is named by its title, else by what it shows and at which side', () => {
    expect([chartName(chart()), chartName(chart(...heat)), chartName(chart(...heat, { type: 'setTitle', title: 'Page 3' }))]).toEqual([
      'New chart',
      'Heat pumped, 27\u00A0°C',
      'Page 3',
    ]);
  });
});

describe('places outside the picture', () => {
  test('are not taken: a place beyond an edge comes to lie on it', () => {
    const edge = chart(
      ...framed,
      ...curve,
      { type: 'movePoint', curve: 'k1', point: 0, to: [1200, -3] },
      { type: 'moveMark', mark: 'm1', to: [-5, 9999] },
    );
    expect([edge.curves[0]!.points[0], edge.marks[0]!.px]).toEqual([
      [1000, 0],
      [0, 700],
    ]);
  });

  test('are told when a smaller picture has taken the place of the one that was read', () => {
    const small = chart(...framed, ...curve, { type: 'setPicture', picture: { ...picture, width: 100 } });
    expect(chartState(small)).toMatchObject({
      frame: ['1 of 2 marks lie outside the picture: move or remove them.'],
      curves: ['1 of 1 points lie outside the picture: move or remove them.'],
    });
  });
});

describe('values by the frame of a chart', () => {
  const done = chart(...framed);

  test('a place has values and the values have the place', () => {
    expect(valueAt(done, [510, 360])!.map((v) => Number(v.toFixed(9)))).toEqual([45, 15]);
    expect(placeOf(done, [45, 15])!.map((v) => Number(v.toFixed(9)))).toEqual([510, 360]);
    expect(valueAt(chart(), [1, 1])).toBeNull();
  });

  test('one pixel is a tenth of a kelvin and a twentieth of a watt here', () => {
    expect(unitsPerPixel(done, [510, 360])!.map((v) => Number(v.toFixed(9)))).toEqual([0.1, 0.05]);
  });
});

describe('two versions side by side', () => {
  test('are compared chart by chart, with what each holds', () => {
    const mine = { ...emptyDocument(), charts: [chart(...framed, ...curve)] };
    const theirs = { ...emptyDocument(), charts: [chart(...framed), emptyChart('c2', picture)] };
    expect(compareDocuments(mine, theirs)).toEqual([
      { id: 'c1', mine: { marks: 2, curves: 1, points: 1 }, theirs: { marks: 2, curves: 0, points: 0 }, same: false },
      { id: 'c2', mine: null, theirs: { marks: 0, curves: 0, points: 0 }, same: false },
    ]);
    expect(compareDocuments(mine, structuredClone(mine)).every(({ same }) => same)).toBe(true);
  });
});
