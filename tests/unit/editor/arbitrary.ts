import fc from 'fast-check';
import type { BenchChart, BenchDocument, Command } from '@/lib/editor';
import { CHART_KINDS, emptyChart, emptyCurve, emptyDocument, type BenchPicture } from '@/lib/editor';

export const picture: BenchPicture = { id: 7, pixelsSha256: '7c'.repeat(32), width: 1000, height: 700 };
const otherPicture: BenchPicture = { id: 8, pixelsSha256: '8d'.repeat(32), width: 640, height: 480 };

/** Few ids, so that commands often meet something that is there. */
const chartId = fc.constantFrom('c1', 'c2', 'c3');
const markId = fc.constantFrom('m1', 'm2', 'm3', 'm4');
const curveId = fc.constantFrom('k1', 'k2', 'k3');
const coordinate = fc.integer({ min: -50_000, max: 1_050_000 }).map((n) => n / 1000);
export const px = fc.tuple(coordinate, coordinate);
/** A place inside the picture. */
const placed = fc.tuple(...[1_000_000, 700_000].map((max) => fc.integer({ min: 0, max }).map((n) => n / 1000))) as unknown as typeof px;
const value = fc.option(fc.integer({ min: -400, max: 400 }).map((n) => n / 8));
const point = fc.nat({ max: 5 });

const of = <T extends Command['type']>(
  type: T,
  fields: { [K in Exclude<keyof Extract<Command, { type: T }>, 'type'>]: fc.Arbitrary<unknown> },
) => fc.record({ type: fc.constant(type), ...(fields as Record<string, fc.Arbitrary<unknown>>) }) as unknown as fc.Arbitrary<Command>;

/** Any command, many of which name things that are not there. */
export const command: fc.Arbitrary<Command> = fc.oneof(
  of('addChart', { chart: chartId.map((id) => emptyChart(id, picture)) }),
  of('removeChart', { chart: chartId }),
  of('setTitle', { chart: chartId, title: fc.constantFrom('', 'Heat, first page') }),
  of('setPicture', { chart: chartId, picture: fc.constantFrom(picture, otherPicture) }),
  of('setKind', { chart: chartId, kind: fc.constantFrom(...CHART_KINDS) }),
  of('setAxis', {
    chart: chartId,
    axis: fc.constantFrom('x', 'y'),
    to: fc.constantFrom({ scale: 'log' }, { scale: 'linear' }, { quantity: 'Tc', unit: 'C' }),
  }),
  of('setFamily', { chart: chartId, to: fc.constantFrom({ quantity: 'I', unit: 'mA' }, { unit: '%', of: 'imaxA' }) }),
  of('setSide', { chart: chartId, to: fc.constantFrom({ kind: 'cold' }, { celsius: 27 }, { celsius: null }) }),
  of('setFrameKind', { chart: chartId, kind: fc.constantFrom(null, 'turned') }),
  of('addMark', { chart: chartId, mark: fc.record({ id: markId, px, x: value, y: value }) }),
  of('moveMark', { chart: chartId, mark: markId, to: px }),
  of('setMark', { chart: chartId, mark: markId, to: fc.record({ x: value, y: value }, { requiredKeys: [] }) }),
  of('removeMark', { chart: chartId, mark: markId }),
  of('takeMarks', { chart: chartId, from: chartId }),
  of('addCurve', { chart: chartId, curve: fc.tuple(curveId, value).map(([id, v]) => emptyCurve(id, v)) }),
  of('setCurveValue', { chart: chartId, curve: curveId, value }),
  of('removeCurve', { chart: chartId, curve: curveId }),
  of('addPoint', { chart: chartId, curve: curveId, px, at: fc.option(point, { nil: undefined }) }),
  of('movePoint', { chart: chartId, curve: curveId, point, to: px }),
  of('removePoint', { chart: chartId, curve: curveId, point }),
  of('clearPoints', { chart: chartId, curve: curveId }),
  of('omitPoint', { chart: chartId, curve: curveId, point, omitted: fc.boolean() }),
  of('setNote', { note: fc.constantFrom('', 'read at 400 %') }),
);

/** A chart that is ready for the model, apart from its ids. */
const finishedChart = (index: number) =>
  fc
    .record({
      kind: fc.constantFrom('heat-deltaT', 'voltage-deltaT', 'cop-current'),
      title: fc.constantFrom('', 'Lower chart of page 3'),
      celsius: fc.constantFrom(27, 50, -4.5),
      side: fc.constantFrom('hot', 'cold'),
      frame: fc.constantFrom(null, 'upright'),
      values: fc.uniqueArray(fc.integer({ min: 1, max: 90 }), { minLength: 1, maxLength: 4 }),
      points: fc.array(placed, { minLength: 3, maxLength: 12 }),
      leftOut: fc.nat({ max: 2 }),
      origin: fc.constantFrom('hand', 'followed', 'path'),
    })
    .map(({ kind, title, celsius, side, frame, values, points, leftOut, origin }): BenchChart => {
      const quantities = {
        'heat-deltaT': ['deltaT', 'Qc', 'I'],
        'voltage-deltaT': ['deltaT', 'V', 'I'],
        'cop-current': ['I', 'COP', 'deltaT'],
      }[kind]!;
      const units = { deltaT: 'K', Qc: 'W', I: 'A', V: 'V', COP: '1' } as Record<string, string>;
      const axis = (at: number) => ({ quantity: quantities[at], unit: units[quantities[at]!], scale: 'linear' });
      const { scale: _, ...family } = axis(2);
      return {
        ...emptyChart(`c${index + 1}`, picture),
        title,
        x: axis(0) as BenchChart['x'],
        y: axis(1) as BenchChart['y'],
        family: family as BenchChart['family'],
        side: { kind: side, celsius } as BenchChart['side'],
        frame: frame as BenchChart['frame'],
        marks: [
          { id: `m${3 * index + 1}`, px: [62.5, 661.25], x: 0, y: 0 },
          { id: `m${3 * index + 2}`, px: [976.5, 661.25], x: 70, y: null },
          { id: `m${3 * index + 3}`, px: [62.5, 35.75], x: null, y: 35 },
        ],
        curves: values.map((v, at) => ({
          ...emptyCurve(`k${10 * index + at + 1}`, v / 10),
          by: origin as 'hand',
          points,
          omitted: Array.from({ length: leftOut }, (_unused, i) => points.length - leftOut + i),
        })),
      };
    });

/** A draft whose charts are all finished; left-out points stand at the end of each curve, where a reading document puts them. */
export const finishedDocument: fc.Arbitrary<BenchDocument> = fc
  .nat({ max: 2 })
  .chain((more) => fc.tuple(...Array.from({ length: more + 1 }, (_, index) => finishedChart(index))))
  .map((charts) => ({ ...emptyDocument(), charts }));

/** Makes every later write to a value or to anything in it throw. */
export const deepFreeze = <T>(thing: T): T => {
  if (typeof thing === 'object' && thing !== null && !Object.isFrozen(thing)) {
    Object.freeze(thing);
    Object.values(thing).forEach(deepFreeze);
  }
  return thing;
};
