import type { Px } from '@/lib/geometry';
import { hiddenRuns, isBare, whyHidden, type Hidden } from './hidden';
import type { Seen } from './track';
import type { Doubt, Gap } from './types';

const pixelOf = ({ mode, t }: Seen, v: number): Px => (mode === 'columns' ? [t, v] : [v, t]);
const distance = ([a, b]: Px, [c, d]: Px) => Math.hypot(a - c, b - d);
const whole = (px: number) => Math.round(px).toString();

/** Longest stretch under something else, in steps, that still gets points: the ink is there and both sides hold it. */
const LONGEST_UNDER = 3;
const LONG_GAP = 20;
const LONG_TOUCH = 25;

/** What a curve is given as. */
export interface Pieces {
  readonly points: Px[];
  readonly gaps: Gap[];
  readonly doubts: Doubt[];
}

/** Dash gaps in one entry. */
function summed(gaps: readonly Gap[]): Gap[] {
  const dashes = gaps.filter(({ why }) => why === 'dash');
  if (dashes.length === 0) return [...gaps];
  const all: Gap = { from: dashes[0]!.from, to: dashes[dashes.length - 1]!.to, why: 'dash', count: dashes.length };
  return [...gaps.filter(({ why }) => why !== 'dash'), all];
}

function doubtOf({ from, to, why }: Gap): Doubt | null {
  const length = distance(from, to);
  const px: Px = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
  if (why === 'label' && length > LONG_GAP) {
    return {
      px,
      why: 'gap',
      text: `The line is hidden for ${whole(length)} pixels here and is taken to go on beyond: check that it is the same curve.`,
    };
  }
  if (why === 'crossing' && length > LONG_GAP / 2) {
    return {
      px,
      why: 'crossing',
      text: `Another line covers this one for ${whole(length)} pixels: check that the curve goes straight on.`,
    };
  }
  return null;
}

/** Where something touches the line for long: those places are known from one edge only. */
function touches(steps: readonly Seen[], px: (at: number) => Px): Doubt[] {
  const doubts: Doubt[] = [];
  for (let at = 0; at < steps.length; at++) {
    let to = at;
    while (to < steps.length && steps[to]!.mended) to++;
    if (to - at >= LONG_TOUCH) {
      const text = `Another line touches this one for ${whole(to - at)} pixels: its place is known from what shows beside.`;
      doubts.push({ px: px(Math.floor((at + to) / 2)), why: 'neighbour', text });
    }
    at = Math.max(at, to);
  }
  return doubts;
}

/** Points, gaps and doubts from steps and their final centres. */
export function piecesOf(steps: readonly Seen[], centres: readonly number[]): Pieces {
  const runs = hiddenRuns(steps);
  const px = (at: number) => pixelOf(steps[at]!, centres[at]!);
  const lost = new Set<number>();
  const gaps: Gap[] = [];
  const leave = (run: Hidden) => {
    for (let at = run.from; at <= run.to; at++) lost.add(at);
    const [from, to] = [px(run.from - 1), px(run.to + 1)];
    if (distance(from, to) > 2) gaps.push({ from, to, why: whyHidden(steps, run, runs) });
  };
  for (const run of runs) if (isBare(run) || run.to - run.from + 1 > LONGEST_UNDER) leave(run);
  const points = steps.flatMap((_, at) => (lost.has(at) ? [] : [px(at)]));
  const doubts = [...gaps.flatMap((gap) => doubtOf(gap) ?? []), ...touches(steps, px)];
  return { points, gaps: summed(gaps), doubts };
}
