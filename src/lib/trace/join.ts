import type { Px } from '@/lib/geometry';
import type { Pieces } from './pieces';
import type { Gap } from './types';

const NEAR = 3;

const distance = ([a, b]: Px, [c, d]: Px) => Math.hypot(a - c, b - d);

const nearest = (points: readonly Px[], place: Px): number => {
  let best = 0;
  for (let k = 1; k < points.length; k++) if (distance(points[k]!, place) < distance(points[best]!, place)) best = k;
  return best;
};

/** Whether a curve passes a place: a point of it, or a gap across it, lies within 3 px. */
export function passes({ points, gaps }: Pieces, place: Px): boolean {
  if (distance(points[nearest(points, place)]!, place) <= NEAR) return true;
  return gaps.some(({ from, to, why }) => {
    if (why === 'dash') return false;
    const [dx, dy] = [to[0] - from[0], to[1] - from[1]];
    const share = Math.min(1, Math.max(0, ((place[0] - from[0]) * dx + (place[1] - from[1]) * dy) / (dx * dx + dy * dy || 1)));
    return distance([from[0] + share * dx, from[1] + share * dy], place) <= NEAR;
  });
}

/** The shortest way from an arm of one curve to another curve that a person said it goes on as. */
function bridge(arm: readonly Px[], other: readonly Px[]): { leave: number; enter: number } {
  let [best, least] = [{ leave: 0, enter: 0 }, Infinity];
  for (let leave = 0; leave < arm.length; leave += 1 + Math.floor(arm.length / 400)) {
    const enter = nearest(other, arm[leave]!);
    const length = distance(arm[leave]!, other[enter]!);
    if (length < least) [best, least] = [{ leave, enter }, length];
  }
  return best;
}

const about = ({ from, to }: Pick<Gap, 'from' | 'to'>, points: readonly Px[]) =>
  [from, to].every((end) => points.some((point) => distance(point, end) < 0.01));

/** One curve of two: from `start` on the first along the arm towards `place`, then across and along the second past `place`. */
export function joined(first: Pieces, second: Pieces, start: Px, place: Px): Pieces {
  const at = nearest(first.points, start);
  const towardsEnd = distance(first.points[first.points.length - 1]!, place) < distance(first.points[0]!, place);
  const one = towardsEnd ? first.points : [...first.points].reverse();
  const from = towardsEnd ? at : one.length - 1 - at;
  const { leave, enter } = bridge(one.slice(from), second.points);
  const isAhead = nearest(second.points, place) >= enter;
  const rest = isAhead ? second.points.slice(enter) : second.points.slice(0, enter + 1).reverse();
  const kept = one.slice(0, from + leave + 1);
  const points = towardsEnd ? [...kept, ...rest] : [...kept, ...rest].reverse();
  const [a, b] = [kept[kept.length - 1]!, rest[0]!];
  const gap: Gap = { from: a, to: b, why: 'crossing' };
  const doubt = { px: a, why: 'gap' as const, text: 'The curve was led on from here by a place it must pass: check the stretch between.' };
  return {
    points,
    gaps: [...[...first.gaps, ...second.gaps].filter((old) => about(old, points)), ...(distance(a, b) > 2 ? [gap] : [])],
    doubts: [...[...first.doubts, ...second.doubts].filter(({ px }) => points.some((point) => distance(point, px) < 30)), doubt],
  };
}
