import type { Px } from '@/lib/geometry';
import type { Seen } from './track';
import type { Doubt, Gap } from './types';

const pixelOf = ({ mode, t }: Seen, v: number): Px => (mode === 'columns' ? [t, v] : [v, t]);
const distance = ([a, b]: Px, [c, d]: Px) => Math.hypot(a - c, b - d);

/** Longest stretch under something else, in steps, that still gets points: the ink is there and both sides hold it. */
const LONGEST_UNDER = 3;

/** A run of steps without a clean section, between two clean ones. */
interface Hidden {
  readonly from: number;
  readonly to: number;
  readonly empty: number;
}

function hiddenRuns(steps: readonly Seen[]): Hidden[] {
  const runs: Hidden[] = [];
  for (let at = 0; at < steps.length; at++) {
    if (steps[at]!.seen === 'clean') continue;
    let to = at;
    while (to + 1 < steps.length && steps[to + 1]!.seen !== 'clean') to++;
    const empty = steps.slice(at, to + 1).filter(({ seen }) => seen === 'none').length;
    runs.push({ from: at, to, empty });
    at = to;
  }
  return runs;
}

/** Points, gaps and doubts from steps and their final centres. */
export function piecesOf(steps: readonly Seen[], centres: readonly number[]): { points: Px[]; gaps: Gap[]; doubts: Doubt[] } {
  const hidden = hiddenRuns(steps);
  const lost = new Set<number>();
  const gaps: Gap[] = [];
  const px = (at: number) => pixelOf(steps[at]!, centres[at]!);
  const bare = hidden.filter(({ from, to, empty }) => empty > (to - from + 1) / 2);
  const isDashed = bare.length >= 4;
  for (const { from, to, empty } of hidden) {
    const isBare = empty > 0 && empty >= (to - from + 1) / 2;
    if (!isBare && to - from + 1 <= LONGEST_UNDER) continue;
    for (let at = from; at <= to; at++) lost.add(at);
    const [before, after] = [px(from - 1), px(to + 1)];
    if (!isBare || distance(before, after) > 2) gaps.push({ from: before, to: after, why: isBare ? (isDashed ? 'dash' : 'label') : 'crossing' });
  }
  const points = steps.flatMap((_, at) => (lost.has(at) ? [] : [px(at)]));
  return { points, gaps: summed(gaps), doubts: [] };
}

/** Dash gaps in one entry. */
function summed(gaps: readonly Gap[]): Gap[] {
  const dashes = gaps.filter(({ why }) => why === 'dash');
  if (dashes.length === 0) return [...gaps];
  const all: Gap = { from: dashes[0]!.from, to: dashes[dashes.length - 1]!.to, why: 'dash', count: dashes.length };
  return [...gaps.filter(({ why }) => why !== 'dash'), all];
}
