import { extent, ticks as roundTicks } from 'd3-array';
import { scaleLinear, type ScaleLinear } from 'd3-scale';
import { area, line } from 'd3-shape';
import { formatNumber, unitSymbol } from '@/lib/units';
import { displacement, spreadLabels } from './spread';
import { textWidth } from './text-width';
import type { Pair, PlotAxis, PlotCurve, PlotData } from './types';

/** Width of the coordinate system that curves are drawn in; it is stretched to the width of the page. */
export const CURVE_WIDTH = 1000;
const LABEL_FONT = 12;
const LABEL_LINE = 15;
/** Middle of a label above the start of its curve, px. */
const LABEL_LIFT = 9;

export interface Tick {
  readonly value: number;
  readonly text: string;
  /** Percent of the width for x, px from the top for y. */
  readonly at: number;
  /** Left away where there is little room. */
  readonly minor: boolean;
}

export interface EndLabel {
  readonly text: string;
  /** Percent of the width where the labelled end of the curve is. */
  readonly xPercent: number;
  readonly curveY: number;
  /** Middle of the label, px from the top. */
  readonly y: number;
}

export interface PlotLayout {
  readonly height: number;
  readonly x: ScaleLinear<number, number>;
  readonly y: ScaleLinear<number, number>;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  /** SVG path of each curve in CURVE_WIDTH × height. */
  readonly paths: readonly string[];
  readonly bands: readonly (string | null)[];
  readonly labels: readonly (EndLabel | null)[];
  readonly labelSide: 'left' | 'right';
  /** Px kept free for the numbers on the left and for the labels on the right. */
  readonly leftGutter: number;
  readonly rightGutter: number;
}

/** Axis label as a quotient (SI brochure 5.4.1): "heat pumped Qc / W"; a plain ratio has no unit. */
export function axisLabel({ name, symbol, unit }: PlotAxis): string {
  const quantity = symbol && symbol !== name ? `${name} ${symbol}` : name;
  return unitSymbol(unit) === '' ? quantity : `${quantity} / ${unitSymbol(unit)}`;
}

/** From and to of an axis: as given, else the data with a round end on both sides, zero in sight unless the axis says otherwise. */
export function domainOf(axis: PlotAxis, values: readonly number[]): Pair {
  if (axis.domain) return axis.domain;
  const finite = values.filter(Number.isFinite);
  const [low = 0, high = 1] = extent(axis.zero === false ? finite : [0, ...finite]);
  const [from = 0, to = 1] = scaleLinear()
    .domain(low === high ? [low - 0.5, high + 0.5] : [low, high])
    .nice(6)
    .domain();
  return [from, to];
}

/** Decimals that the steps between round values need. */
const decimalsOf = (values: readonly number[]): number => {
  const step = Math.abs((values[1] ?? 1) - (values[0] ?? 0));
  return Math.max(0, Math.min(9, -Math.floor(Math.log10(step || 1) + 1e-9)));
};

function ticksOf(domain: Pair, count: number, place: (value: number) => number): Tick[] {
  const values = roundTicks(Math.min(...domain), Math.max(...domain), count);
  const decimals = decimalsOf(values);
  return values.map((value, index) => ({ value, text: formatNumber(value, { decimals }), at: place(value), minor: index % 2 === 1 }));
}

/** Linear interpolation in a curve whose x runs one way; null outside its ends. */
export function valueAt(points: readonly Pair[], x: number): number | null {
  for (let k = 1; k < points.length; k++) {
    const [x0, y0] = points[k - 1]!;
    const [x1, y1] = points[k]!;
    if (x < Math.min(x0, x1) || x > Math.max(x0, x1)) continue;
    return x0 === x1 ? y1 : y0 + ((y1 - y0) * (x - x0)) / (x1 - x0);
  }
  return null;
}

/** Which end of the curves carries the labels: where they have to move least to stand clear of each other; the right where it makes no odds. */
export function arrangeLabels(curves: readonly PlotCurve[], x: (v: number) => number, y: (v: number) => number, height: number) {
  const arrange = (side: 'left' | 'right') => {
    const ends = curves.map(({ points }) => endOf(points, side, x));
    const wishes = ends.map((end) => ({ at: end ? y(end[1]) - (side === 'left' ? LABEL_LIFT : 0) : -1e4, size: LABEL_LINE }));
    const present = wishes.filter((_, k) => ends[k]);
    const places = spreadLabels(present, { min: -LABEL_LINE / 2, max: height + LABEL_LINE / 2 });
    let next = 0;
    const labels = ends.map((end, k): EndLabel | null =>
      end ? { text: curves[k]!.label, xPercent: x(end[0]), curveY: y(end[1]), y: places[next++]! } : null,
    );
    const inside = side === 'right' ? labels.reduce((sum, label) => sum + (label && label.xPercent < 97 ? LABEL_LINE : 0), 0) : 0;
    return { side, labels, price: displacement(present, places) + inside };
  };
  const right = arrange('right');
  const left = arrange('left');
  return left.price < right.price ? left : right;
}

const endOf = (points: readonly Pair[], side: 'left' | 'right', x: (v: number) => number): Pair | null =>
  points.reduce<Pair | null>(
    (best, point) => (best === null || (side === 'left' ? x(point[0]) < x(best[0]) : x(point[0]) > x(best[0])) ? point : best),
    null,
  );

/** Dust below zero, as a share of the values, that is no reason to show negative values. */
const DUST = 1e-6;

/** The values that set the vertical range: a curve that ends on zero gets no room below it for its band or for rounding. */
function aboveZero(values: readonly number[], limits: readonly number[]): readonly number[] {
  const all = [...values, ...limits];
  const largest = Math.max(0, ...all.map(Math.abs));
  return values.some((value) => value < -DUST * largest) ? all : all.map((value) => Math.max(0, value));
}

/** Everything about a plot that does not depend on how wide the page is. */
export function layoutPlot(data: PlotData, height = 320): PlotLayout {
  const points = [...data.curves, ...(data.dots ?? [])].flatMap((series) => series.points);
  const bands = data.curves.flatMap((curve) => curve.band ?? []);
  const xs = [...points.map(([x]) => x), ...(data.duty ? [data.duty.x] : [])];
  const read = [...points.map(([, y]) => y), ...(data.duty ? [data.duty.y] : [])];
  const ys = aboveZero(
    read,
    bands.flatMap(([, low, high]) => [low, high]),
  );
  const x = scaleLinear().domain(domainOf(data.x, xs)).range([0, 100]);
  const y = scaleLinear().domain(domainOf(data.y, ys)).range([height, 0]);
  const across = (value: number) => (x(value) / 100) * CURVE_WIDTH;
  const path = line<Pair>(
    ([vx]) => across(vx),
    ([, vy]) => y(vy),
  ).digits(1);
  const tint = area<readonly [number, number, number]>(
    ([vx]) => across(vx),
    ([, low]) => y(low),
    ([, , high]) => y(high),
  ).digits(1);
  const { side, labels } = arrangeLabels(data.curves, x, y, height);
  const yTicks = ticksOf(y.domain() as unknown as Pair, Math.max(3, Math.round(height / 50)), y);
  const outside = side === 'right' ? labels.filter((label) => label !== null && label.xPercent > 80) : [];
  return {
    height,
    x,
    y,
    xTicks: ticksOf(x.domain() as unknown as Pair, 8, x),
    yTicks,
    paths: data.curves.map((curve) => path(curve.points) ?? ''),
    bands: data.curves.map((curve) => (curve.band ? tint(curve.band) : null)),
    labels,
    labelSide: side,
    leftGutter: Math.ceil(Math.max(16, ...yTicks.map(({ text }) => textWidth(text, 11))) + 10),
    rightGutter: Math.ceil(Math.max(12, ...outside.map((label) => textWidth(label!.text, LABEL_FONT) + 14))),
  };
}
