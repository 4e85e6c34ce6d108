import { toValue, type Frame, type Px } from '@/lib/geometry';
import type { Followed } from '@/lib/trace';
import type { Truth } from './charts';

/** How far a followed curve is from the drawn one, in % of the range of the y axis. */
export interface Score {
  readonly mean: number;
  readonly p95: number;
  readonly worst: number;
  /** Followed minus drawn. */
  readonly bias: number;
  /** Share of the drawn x range inside steps of at most 2 px, or declared gaps shorter than 3 % of the axis, in %. */
  readonly coverage: number;
  /** Followed points more than 1 % of the curve's length beyond its drawn ends. */
  readonly beyond: number;
}

/** The y of a drawn curve at x, null beyond its ends by more than a little. */
function drawnAt({ x, y }: Truth['curves'][number], at: number): number | null {
  const slack = 0.01 * (x[x.length - 1]! - x[0]!);
  if (at < x[0]! - slack || at > x[x.length - 1]! + slack) return null;
  let k = 1;
  while (k < x.length - 1 && x[k]! < at) k++;
  return y[k - 1]! + ((at - x[k - 1]!) / (x[k]! - x[k - 1]!)) * (y[k]! - y[k - 1]!);
}

/** Followed minus drawn y at the x of a followed point; null beyond the drawn ends. */
function errorAt(frame: Frame, curve: Truth['curves'][number], px: Px): number | null {
  const [x, y] = toValue(frame, px);
  const drawn = drawnAt(curve, x);
  return drawn === null ? null : y - drawn;
}

const quantile = (sorted: readonly number[], q: number) => sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))] ?? NaN;

function covered(frame: Frame, curve: Truth['curves'][number], followed: Extract<Followed, { ok: true }>, axis: number): number {
  const [first, last] = [curve.x[0]!, curve.x[curve.x.length - 1]!];
  const isDashed = followed.gaps.some(({ why }) => why === 'dash');
  let sum = 0;
  for (let k = 1; k < followed.points.length; k++) {
    const [a, b] = [followed.points[k - 1]!, followed.points[k]!];
    const [xa, xb] = [toValue(frame, a)[0], toValue(frame, b)[0]].sort((p, q) => p - q) as [number, number];
    const isStep = Math.hypot(a[0] - b[0], a[1] - b[1]) <= 2.0001;
    const isGap =
      xb - xa < 0.03 * axis &&
      (isDashed ||
        followed.gaps.some(
          ({ from, to }) => Math.hypot(from[0] - a[0], from[1] - a[1]) < 0.01 && Math.hypot(to[0] - b[0], to[1] - b[1]) < 0.01,
        ));
    if (isStep || isGap) sum += Math.max(0, Math.min(xb, last) - Math.max(xa, first));
  }
  return (100 * sum) / (last - first);
}

/** The axis range in x: from the leftmost to the rightmost mark. */
export function scoreCurve(
  frame: Frame,
  xRange: number,
  yRange: number,
  curve: Truth['curves'][number],
  followed: Extract<Followed, { ok: true }>,
): Score {
  const errors = followed.points
    .map((px) => errorAt(frame, curve, px))
    .filter((error) => error !== null)
    .map((error) => (100 * error) / yRange);
  const sizes = errors.map(Math.abs).sort((a, b) => a - b);
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  return {
    mean: mean(sizes),
    p95: quantile(sizes, 0.95),
    worst: sizes[sizes.length - 1] ?? NaN,
    bias: mean(errors),
    coverage: covered(frame, curve, followed, xRange),
    beyond: followed.points.length - errors.length,
  };
}
