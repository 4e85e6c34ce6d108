import { describe, expect, test } from 'vitest';
import {
  apply,
  emptyChart,
  emptyCurve,
  emptyDocument,
  handleAt,
  moveCommand,
  nudgeOf,
  placeOfSelection,
  sessionReducer,
  settle,
  startSession,
  view,
  type BenchDocument,
  type Command,
  type SessionAction,
} from '@/lib/editor';
import { picture } from './arbitrary';

const build = (commands: readonly Command[], from: BenchDocument = emptyDocument()) => commands.reduce(apply, from);
const document = build([
  { type: 'addChart', chart: emptyChart('c1', picture) },
  { type: 'setKind', chart: 'c1', kind: 'heat-deltaT' },
  { type: 'addMark', chart: 'c1', mark: { id: 'm1', px: [62, 661], x: 0, y: 0 } },
  { type: 'addMark', chart: 'c1', mark: { id: 'm2', px: [976, 35], x: 70, y: 35 } },
  { type: 'addCurve', chart: 'c1', curve: emptyCurve('k1', 0.7) },
  { type: 'addCurve', chart: 'c1', curve: emptyCurve('k2', 1.4) },
  { type: 'addPoint', chart: 'c1', curve: 'k1', px: [100, 500] },
  { type: 'addPoint', chart: 'c1', curve: 'k1', px: [200, 550] },
  { type: 'addPoint', chart: 'c1', curve: 'k2', px: [100, 300] },
]);
const go = (...actions: SessionAction[]) =>
  actions.reduce((session, action) => sessionReducer(session, action, document), startSession(document));
const onPoint = (point: number) => ({ kind: 'point', curve: 'k1', point }) as const;

describe('a session', () => {
  test('begins at the chart station of the first chart and its first curve', () => {
    expect(startSession(document)).toEqual({ station: 'chart', chart: 'c1', curve: 'k1', selection: null, tool: 'select' });
  });

  test('is ready to place points at the curves station, and marks only while the frame is not there', () => {
    expect(go({ type: 'station', station: 'curves' }).tool).toBe('place');
    expect(go({ type: 'station', station: 'frame' }).tool).toBe('select');
    const one = build([{ type: 'removeMark', chart: 'c1', mark: 'm2' }], document);
    expect(sessionReducer(startSession(one), { type: 'station', station: 'frame' }, one).tool).toBe('place');
  });

  test('steps through the points of the curve in hand and stops at its ends', () => {
    const at = (by: 1 | -1, times: number) =>
      go({ type: 'station', station: 'curves' }, ...Array.from({ length: times }, () => ({ type: 'step', by }) as const)).selection;
    expect([at(1, 1), at(1, 2), at(1, 5), at(-1, 1)]).toEqual([onPoint(0), onPoint(1), onPoint(1), onPoint(1)]);
  });

  test('falls back to what is nearest when what it names is gone', () => {
    const session = go({ type: 'station', station: 'curves' }, { type: 'select', selection: onPoint(1) });
    const shorter = build([{ type: 'removePoint', chart: 'c1', curve: 'k1', point: 1 }], document);
    expect(settle(session, shorter).selection).toEqual(onPoint(0));
    expect(settle(session, build([{ type: 'removeCurve', chart: 'c1', curve: 'k1' }], document))).toMatchObject({
      curve: 'k2',
      selection: null,
    });
    expect(settle(session, emptyDocument())).toMatchObject({ chart: null, curve: null, selection: null });
    expect(settle(session, document)).toBe(session);
  });

  test('takes the curve of a point that is picked out, and drops the point when another curve is taken', () => {
    const session = go({ type: 'station', station: 'curves' }, { type: 'select', selection: { kind: 'point', curve: 'k2', point: 0 } });
    expect(session.curve).toBe('k2');
    expect(sessionReducer(session, { type: 'curve', curve: 'k1' }, document).selection).toBeNull();
  });

  test('cannot wait for a target when nothing is picked out', () => {
    expect(go({ type: 'station', station: 'curves' }, { type: 'tool', tool: 'target' }).tool).toBe('select');
  });
});

describe('what is drawn and what can be picked', () => {
  const curves = go({ type: 'station', station: 'curves' });

  test('the chart station draws no marks and no curves, the frame station numbers the marks', () => {
    expect(view(document, go())).toMatchObject({ marks: [], curves: [] });
    expect(view(document, go({ type: 'station', station: 'frame' })).marks.map(({ number, known }) => [number, known])).toEqual([
      [1, 'both'],
      [2, 'both'],
    ]);
  });

  test('only the curve in hand is active', () => {
    expect(view(document, curves).curves.map(({ active, style }) => [active, style])).toEqual([
      [true, 0],
      [false, 1],
    ]);
  });

  test('the nearest point within the radius is picked, none beyond it, and marks only at the frame station', () => {
    const chart = document.charts[0]!;
    expect(handleAt(chart, curves, [103, 503], 8)).toEqual(onPoint(0));
    expect(handleAt(chart, curves, [120, 500], 8)).toBeNull();
    expect(handleAt(chart, curves, [62, 661], 8)).toBeNull();
    expect(handleAt(chart, go({ type: 'station', station: 'frame' }), [62, 661], 8)).toEqual({ kind: 'mark', mark: 'm1' });
  });

  test('a point of the curve in hand wins over one of another that is only a little nearer', () => {
    const close = build([{ type: 'movePoint', chart: 'c1', curve: 'k2', point: 0, to: [104, 500] }], document);
    expect(handleAt(close.charts[0]!, curves, [102.5, 500], 9)).toEqual(onPoint(0));
    expect(handleAt(close.charts[0]!, curves, [104, 500], 9)).toEqual({ kind: 'point', curve: 'k2', point: 0 });
  });

  test('a selection knows its place and the command that moves it', () => {
    expect(placeOfSelection(document.charts[0]!, onPoint(1))).toEqual([200, 550]);
    expect(placeOfSelection(document.charts[0]!, { kind: 'mark', mark: 'm2' })).toEqual([976, 35]);
    const moved = build([moveCommand('c1', onPoint(1), [1, 2])], document);
    expect(placeOfSelection(moved.charts[0]!, onPoint(1))).toEqual([1, 2]);
  });

  test('an arrow key is one source pixel, with Shift ten, with Alt a tenth', () => {
    const held = (shift: boolean, alt: boolean) => nudgeOf('ArrowLeft', { shift, alt });
    expect([held(false, false), held(true, false), held(false, true)]).toEqual([
      [-1, 0],
      [-10, 0],
      [-0.1, 0],
    ]);
    expect(nudgeOf('a', { shift: false, alt: false })).toBeNull();
  });
});
