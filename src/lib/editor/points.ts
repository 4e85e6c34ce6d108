import type { Px } from '@/lib/geometry';
import { changed } from './change';
import type { BenchCurve } from './document';
import { roundPx } from './document';

const distance = (a: Px, b: Px): number => Math.hypot(a[0] - b[0], a[1] - b[1]);

/** How much longer the line through the points becomes with `px` put before index `at`. */
const detour = (points: readonly Px[], px: Px, at: number): number => {
  const before = points[at - 1];
  const after = points[at];
  if (before && after) return distance(before, px) + distance(px, after) - distance(before, after);
  if (before) return distance(before, px);
  return after ? distance(px, after) : 0;
};

/**
 * Where a new point belongs in the order along a line: the place that lengthens the line least, so that points may be
 * clicked in any order on a curve of any shape. The later place wins a tie, so that the second point follows the first.
 */
export const insertionIndex = (points: readonly Px[], px: Px): number => {
  let best = 0;
  for (let at = 1; at <= points.length; at++) if (detour(points, px, at) <= detour(points, px, best)) best = at;
  return best;
};

/** The curve with a point put in, at `at` or where it belongs; left-out points keep being left out. */
export const insertPoint = (curve: BenchCurve, px: Px, at = insertionIndex(curve.points, px)): BenchCurve => {
  const place = Math.max(0, Math.min(at, curve.points.length));
  return {
    ...curve,
    points: [...curve.points.slice(0, place), roundPx(px), ...curve.points.slice(place)],
    omitted: curve.omitted.map((index) => (index >= place ? index + 1 : index)),
  };
};

/** The curve with point `index` moved; the same curve when it is there already or there is no such point. */
export const movePoint = (curve: BenchCurve, index: number, to: Px): BenchCurve => {
  const before = curve.points[index];
  const after = roundPx(to);
  if (!before || (before[0] === after[0] && before[1] === after[1])) return curve;
  return { ...curve, points: curve.points.map((px, i) => (i === index ? after : px)) };
};

/** The curve without point `index`. */
export const removePoint = (curve: BenchCurve, index: number): BenchCurve => {
  if (!curve.points[index]) return curve;
  return {
    ...curve,
    points: curve.points.filter((_, i) => i !== index),
    omitted: curve.omitted.filter((i) => i !== index).map((i) => (i > index ? i - 1 : i)),
  };
};

/** The curve with point `index` left out of the fit, or used again. */
export const omitPoint = (curve: BenchCurve, index: number, omitted: boolean): BenchCurve => {
  if (!curve.points[index]) return curve;
  const others = curve.omitted.filter((i) => i !== index);
  return changed(curve, { omitted: omitted ? [...others, index].sort((a, b) => a - b) : others });
};
