import type { Seen } from './track';
import type { Gap } from './types';

/** A run of steps without a whole section, between two that have one. */
export interface Hidden {
  readonly from: number;
  readonly to: number;
  /** Steps of it without any ink. */
  readonly empty: number;
}

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

/** Steps that show only the slanted end of a stroke beside a gap belong to the gap. */
function withoutCaps(steps: readonly Seen[]): boolean[] {
  const clean = steps.map(({ seen }) => seen === 'clean');
  const full = median(steps.filter(({ seen, mass }) => seen === 'clean' && mass > 0).map(({ mass, slope }) => mass / Math.hypot(1, slope)));
  const isCap = ({ mass, slope, mended }: Seen) => !mended && mass < 0.8 * full * Math.hypot(1, slope);
  const shows = [...clean];
  for (let at = 1; at + 1 < steps.length; at++) {
    if (steps[at]!.seen !== 'none') continue;
    for (const side of [-1, 1]) {
      const isLong = [1, 2, 3, 4, 5].every((k) => clean[at + side * k] ?? false);
      if (isLong && isCap(steps[at + side]!)) shows[at + side] = false;
    }
  }
  return shows;
}

/** The runs of steps that get no section of their own. */
export function hiddenRuns(steps: readonly Seen[]): Hidden[] {
  const shows = withoutCaps(steps);
  const runs: Hidden[] = [];
  for (let from = 1; from < steps.length - 1; from++) {
    if (shows[from]) continue;
    let to = from;
    while (to + 2 < steps.length && !shows[to + 1]) to++;
    const empty = steps.slice(from, to + 1).filter(({ seen }) => seen !== 'part').length;
    runs.push({ from, to, empty });
    from = to;
  }
  return runs;
}

/** Whether the paper shows in a run, not another line over this one. */
export const isBare = ({ from, to, empty }: Hidden): boolean => empty > 0 && empty >= (to - from + 1) / 2;

const lengthOf = ({ from, to }: Hidden) => to - from + 1;

/** Runs of about the same length as this one. */
const alike = (run: Hidden, runs: readonly Hidden[]) =>
  runs.filter((other) => lengthOf(other) <= 1.6 * lengthOf(run) + 2 && lengthOf(other) >= lengthOf(run) / 1.6 - 2);

/** Whether what covers the line is a blob of its own ink, as a marker is: as high as it is long, and much heavier than two lines that cross. */
function isBlob(steps: readonly Seen[], { from, to }: Hidden): boolean {
  const over = steps.slice(from, to + 1).filter(({ seen, beside }) => seen === 'part' && beside !== undefined);
  if (over.length < 3) return false;
  const full = median(steps.filter(({ mass, seen }) => seen === 'clean' && mass > 0).map(({ mass }) => mass));
  const heavy = over.filter(({ mass }) => mass > 2.4 * full);
  const height = Math.max(...over.map(({ mass }) => mass));
  return heavy.length >= 0.4 * over.length && height < 1.8 * (to - from + 1) + 3;
}

/** Why a run has no points. Dashes come in numbers and alike; markers are blobs of which there are several; other bare runs are taken for labels, the rest for crossings. */
export function whyHidden(steps: readonly Seen[], run: Hidden, runs: readonly Hidden[]): Gap['why'] {
  const likes = alike(run, runs);
  if (isBare(run)) return likes.filter(isBare).length >= 4 && lengthOf(run) <= 60 ? 'dash' : 'label';
  return likes.length >= 2 && isBlob(steps, run) ? 'marker' : 'crossing';
}
