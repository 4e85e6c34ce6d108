import type { Frame, FrameOutcome, Mark, Px } from '@/lib/geometry';
import { fitFrame, toPixel, toValue } from '@/lib/geometry';
import type { BenchChart, BenchMark } from './document';

const fitted = new WeakMap<readonly BenchMark[], Map<string, FrameOutcome>>();

const asMark = ({ px, x, y }: BenchMark): Mark => ({ px, ...(x !== null && { x }), ...(y !== null && { y }) });

const fitAll = (chart: BenchChart, marks: readonly BenchMark[]): FrameOutcome =>
  fitFrame(marks.map(asMark), { x: chart.x.scale, y: chart.y.scale }, chart.frame ?? undefined);

/** A mark that has just been placed must not take away a frame that the others give; without one, the sentence is about all marks. */
const fit = (chart: BenchChart): FrameOutcome => {
  const known = chart.marks.filter((mark) => mark.x !== null || mark.y !== null);
  const outcome = fitAll(chart, known);
  return outcome.ok || known.length === chart.marks.length ? outcome : fitAll(chart, chart.marks);
};

/**
 * The frame that a chart's marks determine, or the sentence that says which mark is missing or wrong (`at` is its index in
 * `chart.marks`). A mark without a value is passed over where the others suffice. Remembered for as long as the marks stay the same.
 */
export const frameOf = (chart: BenchChart): FrameOutcome => {
  const known = fitted.get(chart.marks) ?? new Map<string, FrameOutcome>();
  fitted.set(chart.marks, known);
  const key = `${chart.x.scale} ${chart.y.scale} ${chart.frame}`;
  const outcome = known.get(key) ?? fit(chart);
  known.set(key, outcome);
  return outcome;
};

/** The frame, or null while there is none. */
export const readyFrame = (chart: BenchChart): Frame | null => {
  const outcome = frameOf(chart);
  return outcome.ok ? outcome.frame : null;
};

const finite = ([x, y]: readonly [number, number]): boolean => Number.isFinite(x) && Number.isFinite(y);

/** The values, in the units of the axes, at a place on the picture; null without a frame or where the frame has none. */
export const valueAt = (chart: BenchChart, px: Px): readonly [number, number] | null => {
  const frame = readyFrame(chart);
  const value = frame && toValue(frame, px);
  return value && finite(value) ? value : null;
};

/** The place on the picture of two values; null without a frame or where the values have no place (zero on a log axis). */
export const placeOf = (chart: BenchChart, value: readonly [number, number]): Px | null => {
  const frame = readyFrame(chart);
  const px = frame && toPixel(frame, value);
  return px && finite(px) ? px : null;
};

/**
 * Units per source pixel of each axis at a place, for choosing how many decimals to show; null without a frame.
 */
export const unitsPerPixel = (chart: BenchChart, px: Px): readonly [number, number] | null => {
  const here = valueAt(chart, px);
  const right = valueAt(chart, [px[0] + 1, px[1]]);
  const below = valueAt(chart, [px[0], px[1] + 1]);
  if (!here || !right || !below) return null;
  return [0, 1].map((i) => Math.hypot((right[i] ?? 0) - (here[i] ?? 0), (below[i] ?? 0) - (here[i] ?? 0))) as [number, number];
};
