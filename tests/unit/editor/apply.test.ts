import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  apply,
  emptyChart,
  emptyCurve,
  emptyDocument,
  historyReducer,
  label,
  nextId,
  startHistory,
  benchDocument,
  insertionIndex,
  type BenchDocument,
} from '@/lib/editor';
import { command, deepFreeze, picture, px } from './arbitrary';

const seed = 20260413;
const withChart = apply(emptyDocument(), { type: 'addChart', chart: emptyChart('c1', picture) });
const withCurve = apply(withChart, { type: 'addCurve', chart: 'c1', curve: emptyCurve('k1', 1.4) });
const points = (document: BenchDocument) => document.charts[0]!.curves[0]!.points;
const withPoints = [
  [10, 10],
  [20, 30],
  [40, 50],
].reduce((document, at) => apply(document, { type: 'addPoint', chart: 'c1', curve: 'k1', px: at as [number, number] }), withCurve);

describe('apply, over seeded random lists of commands', () => {
  test(`never changes the document it is given (seed ${seed})`, () => {
    fc.assert(
      fc.property(fc.array(command, { maxLength: 40 }), (commands) => {
        commands.reduce((document, next) => deepFreeze(apply(document, next)), deepFreeze(emptyDocument()));
      }),
      { seed, numRuns: 400 },
    );
  });

  test(`gives back the same object exactly when nothing changes (seed ${seed})`, () => {
    fc.assert(
      fc.property(fc.array(command, { maxLength: 40 }), (commands) => {
        commands.reduce((document, next) => {
          const after = apply(document, next);
          expect(after === document).toBe(JSON.stringify(after) === JSON.stringify(document));
          return after;
        }, emptyDocument());
      }),
      { seed, numRuns: 400 },
    );
  });

  test(`what is undone comes back when it is done again, for real commands too (seed ${seed})`, () => {
    const reduce = historyReducer({ apply, label });
    fc.assert(
      fc.property(fc.array(command, { maxLength: 40 }), (commands) => {
        const end = commands.reduce((history, next) => reduce(history, { type: 'perform', command: next }), startHistory(emptyDocument()));
        const back = end.past.reduce((history) => reduce(history, { type: 'undo' }), end);
        expect(back.present).toEqual(emptyDocument());
        expect(end.past.reduce((history) => reduce(history, { type: 'redo' }), back).present).toBe(end.present);
      }),
      { seed, numRuns: 300 },
    );
  });

  test(`ids given out by nextId keep every document within its schema (seed ${seed})`, () => {
    fc.assert(
      fc.property(fc.array(command, { maxLength: 30 }), (commands) => {
        const document = commands.reduce((before, next) => {
          if (next.type === 'addChart') return apply(before, { ...next, chart: { ...next.chart, id: nextId(before, 'c') } });
          if (next.type === 'addMark') return apply(before, { ...next, mark: { ...next.mark, id: nextId(before, 'm') } });
          if (next.type === 'addCurve') return apply(before, { ...next, curve: { ...next.curve, id: nextId(before, 'k') } });
          return apply(before, next);
        }, emptyDocument());
        expect(benchDocument.safeParse(JSON.parse(JSON.stringify(document))).error).toBeUndefined();
      }),
      { seed, numRuns: 300 },
    );
  });
});

describe('points', () => {
  test('clicked in any order along a bent line come to stand in order along it', () => {
    const line = Array.from({ length: 9 }, (_, i): [number, number] => [100 * Math.cos(i / 3), 100 * Math.sin(i / 3)]);
    const shuffled = [4, 0, 8, 2, 6, 1, 7, 3, 5].map((i) => line[i]!);
    const ordered = shuffled.reduce<[number, number][]>((list, at) => list.toSpliced(insertionIndex(list, at), 0, at), []);
    expect([line, line.toReversed()]).toContainEqual(ordered);
  });

  test('that are left out keep being left out when others come before them or go', () => {
    const out = apply(withPoints, { type: 'omitPoint', chart: 'c1', curve: 'k1', point: 1, omitted: true });
    const more = apply(out, { type: 'addPoint', chart: 'c1', curve: 'k1', px: [0, 0], at: 0 });
    expect(more.charts[0]!.curves[0]!.omitted).toEqual([2]);
    expect(apply(more, { type: 'removePoint', chart: 'c1', curve: 'k1', point: 0 }).charts[0]!.curves[0]!.omitted).toEqual([1]);
    expect(apply(out, { type: 'removePoint', chart: 'c1', curve: 'k1', point: 1 }).charts[0]!.curves[0]!.omitted).toEqual([]);
  });

  test('are kept to a thousandth of a pixel', () => {
    const moved = apply(withPoints, { type: 'movePoint', chart: 'c1', curve: 'k1', point: 0, to: [1 / 3, -0.00001] });
    expect(points(moved)[0]).toEqual([0.333, 0]);
  });

  test(`a point put in changes no other (seed ${seed})`, () => {
    fc.assert(
      fc.property(px, fc.nat({ max: 9 }), (at, place) => {
        const after = points(apply(withPoints, { type: 'addPoint', chart: 'c1', curve: 'k1', px: at, at: place }));
        expect(after.toSpliced(Math.min(place, 3), 1)).toEqual(points(withPoints));
      }),
      { seed },
    );
  });
});

describe('charts', () => {
  test('a kind sets both axes and the family in their usual units and keeps the scales', () => {
    const log = apply(withChart, { type: 'setAxis', chart: 'c1', axis: 'y', to: { scale: 'log' } });
    const { x, y, family } = apply(log, { type: 'setKind', chart: 'c1', kind: 'cop-current' }).charts[0]!;
    expect([x, y, family]).toMatchObject([
      { quantity: 'I', unit: 'A', scale: 'linear' },
      { quantity: 'COP', unit: '1', scale: 'log' },
      { quantity: 'deltaT', unit: 'K' },
    ]);
  });

  test('another quantity on an axis is no longer normalised by the rating of the one before', () => {
    const share = apply(withChart, { type: 'setAxis', chart: 'c1', axis: 'x', to: { quantity: 'I', unit: '%', of: 'imaxA' } });
    expect(share.charts[0]!.x.of).toBe('imaxA');
    expect(apply(share, { type: 'setAxis', chart: 'c1', axis: 'x', to: { quantity: 'V', unit: 'V' } }).charts[0]!.x.of).toBeUndefined();
  });

  test('marks copied from another chart are new marks at the same places with the same values', () => {
    const marked = apply(withChart, { type: 'addMark', chart: 'c1', mark: { id: 'm1', px: [62, 661], x: 0, y: null } });
    const two = apply(marked, { type: 'addChart', chart: emptyChart('c2', picture) });
    expect(apply(two, { type: 'takeMarks', chart: 'c2', from: 'c1' }).charts[1]!.marks).toEqual([
      { id: 'm2', px: [62, 661], x: 0, y: null },
    ]);
  });

  test('every command has a label that reads on after "Undo"', () => {
    fc.assert(
      fc.property(command, (any) => {
        expect(label(any)).toMatch(/^[a-z]+ [a-z ]+$/);
      }),
      { seed },
    );
  });
});
