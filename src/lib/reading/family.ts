import { moduleOfFit, type ModuleFit } from '@/lib/fit';
import { toPixel, toValue, type Frame, type Px, type Scale } from '@/lib/geometry';
import type { ThermoelectricModule } from '@/lib/module';
import { findRoot } from '@/lib/numeric';
import { chartValues, modelAnswer, stateOf, type ChartValues } from './chart-values';
import type { ReadingChart, ReadingCurve, ReadingDocument } from './document';

/** A stretch of the fitted family over a chart's picture; a curve that leaves the chart and comes back has several. */
export interface FamilyCurve {
  readonly chart: number;
  readonly curve: number;
  readonly value: number;
  readonly points: readonly Px[];
}

type Range = readonly [number, number];

/** Places along the x axis at which a curve is evaluated, and along the y axis at which a root is looked for. */
const COLUMNS = 192;
const ROWS = 48;
/** Share of the y axis that a fitted curve may run beyond it. */
const OVERSHOOT = 0.02;

interface Drawn {
  readonly values: ChartValues;
  readonly frame: Frame;
  readonly curve: ReadingCurve;
  readonly module: ThermoelectricModule;
  readonly y: Range;
}

const between = ([from, to]: Range, share: number, scale: Scale) =>
  scale === 'log' ? from * (to / from) ** share : from + share * (to - from);

const shares = (count: number, beyond = 0) => Array.from({ length: count + 1 }, (_, at) => (at / count) * (1 + 2 * beyond) - beyond);

/** How far marks and points reach along an axis. */
function reach(chart: ReadingChart, frame: Frame, axis: 'x' | 'y'): Range {
  const marked = (chart.marks ?? []).flatMap((mark) => mark[axis] ?? []);
  const read = (chart.curves ?? []).flatMap(({ points = [] }) => points.map((px) => toValue(frame, px)[axis === 'x' ? 0 : 1]));
  return [...marked, ...read].reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  );
}

const gapAt = ({ values, curve, module }: Drawn, x: number, y: number): number => {
  const state = stateOf(values, { x, y, family: curve.value });
  return (modelAnswer(module, values.roles.answer.quantity, state) ?? NaN) - state.value;
};

/** Where y is the answer the model gives it; otherwise every y on the axis at which model and chart agree. */
function valuesOfY(drawn: Drawn, x: number): number[] {
  const { values, curve, module, frame, y } = drawn;
  const { quantity, place } = values.roles.answer;
  if (place === 'y') {
    const model = modelAnswer(module, quantity, stateOf(values, { x, y: 0, family: curve.value }));
    return model === null ? [] : [values.conversions.y.fromBase(model)];
  }
  const rows = shares(ROWS, OVERSHOOT).map((share) => between(y, share, frame.scales.y));
  return rows.slice(1).flatMap((high, at) => rootBetween((row) => gapAt(drawn, x, row), rows[at] ?? high, high));
}

function rootBetween(gap: (y: number) => number, low: number, high: number): number[] {
  const root = findRoot(gap, low, high);
  return root === null ? [] : [root];
}

/** Of several places the one nearest to what was read at that x. */
function nearestToRead(points: readonly Px[], places: readonly Px[]): Px | null {
  const [first] = places;
  if (!first || places.length === 1 || points.length === 0) return first ?? null;
  const least = (place: Px) => Math.min(...points.map(([x, y]) => Math.hypot(x - place[0], y - place[1])));
  return places.reduce((best, place) => (least(place) < least(best) ? place : best));
}

function isOnAxis(y: number, range: Range, scale: Scale): boolean {
  const [low, high] = [between(range, -OVERSHOOT, scale), between(range, 1 + OVERSHOOT, scale)];
  return y >= low && y <= high;
}

function stretchesOf(drawn: Drawn, x: Range): Px[][] {
  const { frame, y } = drawn;
  const stretches: Px[][] = [[]];
  for (const share of shares(COLUMNS)) {
    const at = between(x, share, frame.scales.x);
    const places = valuesOfY(drawn, at)
      .filter((value) => isOnAxis(value, y, frame.scales.y))
      .map((value) => toPixel(frame, [at, value]));
    const place = nearestToRead(drawn.curve.points ?? [], places);
    if (place) stretches.at(-1)?.push(place);
    else if (stretches.at(-1)?.length) stretches.push([]);
  }
  return stretches.filter(({ length }) => length > 1);
}

/**
 * The fitted model drawn back over the pictures: for every curve of every chart the line that the model gives for its value, as pixels in the order
 * of x, over the whole x axis as far as marks and points reach and the line stays on the y axis. `frames` are those of the charts in order.
 */
export function familyCurves(document: ReadingDocument, frames: readonly Frame[], fit: ModuleFit): FamilyCurve[] {
  const module = moduleOfFit(fit);
  return document.charts.flatMap((chart, number) => {
    const frame = frames[number];
    if (!frame) return [];
    const values = chartValues(chart, document.module);
    const [x, y] = [reach(chart, frame, 'x'), reach(chart, frame, 'y')];
    return (chart.curves ?? []).flatMap((curve, at) =>
      stretchesOf({ values, frame, curve, module, y }, x).map((points) => ({ chart: number, curve: at, value: curve.value, points })),
    );
  });
}
