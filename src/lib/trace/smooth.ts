import { localFit } from './polynomial';
import type { Seen } from './track';

const WINDOWS = [1, 2, 4, 7, 11, 17, 26, 40] as const;
/** Intervals of neighbouring windows must overlap within this many standard deviations. */
const GAMMA = 1.6;

const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
};

/** The clean steps within `half` of a step, in its mode; the step itself may be left out. */
function around(steps: readonly Seen[], at: number, half: number, without = false): { t: number[]; v: number[] } {
  const { mode } = steps[at]!;
  const [t, v]: [number[], number[]] = [[], []];
  for (let k = Math.max(0, at - half); k <= Math.min(steps.length - 1, at + half); k++) {
    const step = steps[k]!;
    if (step.seen !== 'clean' || (without && k === at)) continue;
    t.push(step.mode === mode ? step.t : step.v);
    v.push(step.mode === mode ? step.v : step.t);
  }
  return { t, v };
}

/** Standard deviation of single measurements around their neighbours, px: 1.4826 times the median of the residuals' sizes (MAD), from parabolas left out of. */
export function scatterOf(steps: readonly Seen[]): number {
  const sizes: number[] = [];
  for (let at = 0; at < steps.length; at += 2) {
    if (steps[at]!.seen !== 'clean') continue;
    const { t, v } = around(steps, at, 5, true);
    if (t.length < 7) continue;
    const fit = localFit(t, v, null, steps[at]!.t, 2);
    if (fit) sizes.push(Math.abs(fit.value - steps[at]!.v) / Math.sqrt(1 + fit.variance));
  }
  return Math.max(0.004, 1.4826 * median(sizes));
}

/** Whether the line was drawn without antialiasing: its pixels are full or empty. */
const isHard = (steps: readonly Seen[]): boolean => {
  const clean = steps.filter(({ seen }) => seen === 'clean');
  return clean.reduce((sum, { soft }) => sum + soft, 0) < 0.08 * clean.length;
};

/**
 * The centre line without the scatter of single columns: at each step a local line or parabola over the widest window whose interval still
 * agrees with those of all narrower ones (intersection of confidence intervals: A. Goldenshluger, A. Nemirovski, Math. Methods Statist. 6 (1997) 135-170;
 * citation from memory). Where single columns are exact the window stays narrow and bends are kept. Steps that are not clean get the value of the fit around them.
 */
export function smoothed(steps: readonly Seen[]): { v: number[]; scatter: number } {
  const hard = isHard(steps);
  const scatter = hard ? Math.max(0.29, scatterOf(steps)) : scatterOf(steps);
  const v = steps.map((step, at) => {
    let [low, high, best] = [-Infinity, Infinity, step.v];
    const flat = hard ? Math.min(40, 2.5 / Math.max(0.03, Math.abs(step.slope - Math.round(step.slope)))) : 0;
    let found = false;
    for (const half of WINDOWS) {
      if (half < flat && half < 40) continue;
      const near = around(steps, at, half);
      const sides = near.t.some((t) => t <= step.t) && near.t.some((t) => t >= step.t);
      if (near.t.length < 2 || (!sides && half < 11)) continue;
      const fit = localFit(near.t, near.v, null, step.t, near.t.length >= 5 ? 2 : 1);
      if (!fit) continue;
      const u = scatter * Math.sqrt(fit.variance);
      const [from, to] = [fit.value - GAMMA * u, fit.value + GAMMA * u];
      if (found && (from > high || to < low)) break;
      [low, high, best, found] = [Math.max(low, from), Math.min(high, to), fit.value, true];
    }
    return best;
  });
  return { v, scatter };
}
