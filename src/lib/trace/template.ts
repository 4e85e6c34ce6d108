import type { InkReader } from './ink';
import type { Mode } from './types';

/** How a line's cover falls off across it: cover at offsets from the centre, averaged over sections that were wholly seen. */
export interface Template {
  readonly slope: number;
  readonly cover: Float64Array;
  /** Offsets reach from −reach to reach, px. */
  readonly reach: number;
}

/** A section that was wholly seen. */
interface Whole {
  readonly mode: Mode;
  readonly t: number;
  readonly v: number;
  readonly slope: number;
}

const BINS = 8;

/** The template of a line from whole sections in one mode. */
export function templateFrom(reader: InkReader, wholes: readonly Whole[], thickness: number): Template | null {
  if (wholes.length < 12) return null;
  const slope = wholes.reduce((sum, whole) => sum + whole.slope, 0) / wholes.length;
  const half = (thickness * Math.hypot(1, slope)) / 2;
  const reach = Math.ceil(half + Math.abs(slope) / 2 + 2);
  const size = 2 * reach * BINS + 1;
  const [sum, weight] = [new Float64Array(size), new Float64Array(size)];
  for (const { mode, t, v, slope: m } of wholes) {
    const start = Math.floor(v) - reach;
    const { cover, trust, length } = reader.read(mode, Math.floor(t), start, 2 * reach + 1, half, m);
    for (let k = 0; k < length; k++) {
      const place = (start + k + 0.5 - v + reach) * BINS;
      const bin = Math.floor(place);
      if (trust[k]! < 0.9 || bin < 0 || bin + 1 >= size) continue;
      const share = place - bin;
      sum[bin] = sum[bin]! + cover[k]! * (1 - share);
      weight[bin] = weight[bin]! + 1 - share;
      sum[bin + 1] = sum[bin + 1]! + cover[k]! * share;
      weight[bin + 1] = weight[bin + 1]! + share;
    }
  }
  return { slope, cover: evened(sum, weight), reach };
}

/** Means of the bins made even on both sides, over a short window so that no bin is empty. */
function evened(sum: Float64Array, weight: Float64Array): Float64Array {
  const size = sum.length;
  return Float64Array.from(sum, (_, bin) => {
    let [total, count] = [0, 0];
    for (let spread = 1; spread <= 4 && count < 1.5; spread++) {
      [total, count] = [0, 0];
      for (let k = -spread; k <= spread; k++) {
        for (const at of [bin + k, size - 1 - bin - k]) {
          if (at < 0 || at >= size) continue;
          const part = 1 - Math.abs(k) / (spread + 1);
          total += sum[at]! * part;
          count += weight[at]! * part;
        }
      }
    }
    return count > 0 ? total / count : 0;
  });
}

const coverAt = ({ cover, reach }: Template, offset: number): number => {
  const place = (offset + reach) * BINS;
  const bin = Math.floor(place);
  if (bin < 0 || bin + 1 >= cover.length) return 0;
  return cover[bin]! + (cover[bin + 1]! - cover[bin]!) * (place - bin);
};

const TOO_MUCH = 0.25;

/**
 * The place of a line in a section where something hides part of it: least squares of the template over the pixels that are understood, with truncated
 * residuals so that foreign ink does not pull. Null where what is seen does not hold the place. `mayBeCut`: much of the stroke may be missing, as where it ends at an edge.
 */
export function placeBy(
  reader: InkReader,
  template: Template,
  { mode, t, v: expected, slope }: Whole,
  thickness: number,
  tolerance: number,
  mayBeCut: boolean,
): number | null {
  const half = (thickness * Math.hypot(1, slope)) / 2;
  const reach = Math.ceil(template.reach + tolerance);
  const start = Math.floor(expected) - reach;
  const { cover, trust, length } = reader.read(mode, Math.floor(t), start, 2 * reach + 1, half, slope);
  const cost = (v: number): number => {
    let sum = 0;
    for (let k = 0; k < length; k++) {
      const rest = cover[k]! - coverAt(template, start + k + 0.5 - v);
      sum += trust[k]! * Math.min(rest * rest, TOO_MUCH * TOO_MUCH);
    }
    return sum;
  };
  const step = 0.125;
  let [best, least] = [expected, Infinity];
  for (let v = expected - tolerance; v <= expected + tolerance + 1e-9; v += step) {
    const here = cost(v) + 0.01 * (v - expected) ** 2;
    if (here < least) [best, least] = [v, here];
  }
  if (Math.abs(best - expected) > tolerance - step) return null;
  const [before, after] = [cost(best - step), cost(best + step)];
  const bend = before - 2 * cost(best) + after;
  if (!(bend > 0)) return null;
  const v = best + Math.max(-step, Math.min(step, ((before - after) / (2 * bend)) * step));
  return holds(template, cover, trust, start, length, v, mayBeCut) ? v : null;
}

/** Whether the pixels that agree with the template know enough of its place, and see its ink; not where the same ink lies on both sides, as in a marker. */
function holds(
  template: Template,
  cover: Float64Array,
  trust: Float64Array,
  start: number,
  length: number,
  v: number,
  mayBeCut: boolean,
): boolean {
  let [known, all, ink, wrong, full, over, under] = [0, 0, 0, 0, 0, 0, 0];
  for (let k = 0; k < length; k++) {
    const offset = start + k + 0.5 - v;
    const steepness = (coverAt(template, offset + 0.25) - coverAt(template, offset - 0.25)) ** 2;
    all += steepness;
    const there = coverAt(template, offset);
    const rest = cover[k]! - there;
    full += Math.max(0, there);
    if (Math.abs(rest) < 0.2) {
      known += trust[k]! * steepness;
      ink += trust[k]! * Math.max(0, there);
    } else if (rest > 0 && Math.abs(offset) < template.reach - 0.8) {
      if (offset < 0) over += trust[k]! * rest;
      else under += trust[k]! * rest;
    } else if (rest < 0) wrong += trust[k]! * -rest;
  }
  if (over > 0.3 && under > 0.3) return false;
  return known > 0.15 * all && ink > 0.3 && wrong < (mayBeCut && known > 0.35 * all ? 0.65 * full : 0.5);
}
