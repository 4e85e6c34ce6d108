import type { InkReader } from './ink';
import type { Mode } from './types';

/** What a cross-section shows near the place where the line is expected. */
export interface Section {
  /** Centre across, px: the centroid of the line's own ink. */
  readonly v: number;
  /** Ink across, px: thickness times √(1 + slope²). */
  readonly mass: number;
  /** Least trust of its pixels. */
  readonly trust: number;
  /** The larger cover at the two edges: above 0 where something of the same ink touches. */
  readonly edge: number;
  /** Share of the ink's pixels that are neither full nor empty. */
  readonly soft: number;
  /** Highest cover. */
  readonly peak: number;
}

const FLOOR = 0.05;

/** The peak nearest the expected place that is about as high as any within the tolerance. */
function peakNear(cover: Float64Array, first: number, length: number, expected: number, tolerance: number): number {
  let [best, score] = [-1, 0.25];
  for (let k = 0; k < length; k++) {
    const away = Math.abs(first + k + 0.5 - expected);
    if (away > tolerance + 0.5) continue;
    const here = cover[k]! - 0.12 * away;
    if (here > score) [best, score] = [k, here];
  }
  return best;
}

/** From the peak outwards while there is ink and it does not rise again. */
function edgeFrom(cover: Float64Array, length: number, peak: number, step: 1 | -1): number {
  let at = peak;
  let least = cover[peak]!;
  while (at + step >= 0 && at + step < length) {
    const next = cover[at + step]!;
    if (next < FLOOR) break;
    if (next > least + 0.12 && least < 0.6) break;
    at += step;
    least = Math.min(least, next);
  }
  return at;
}

/** Nothing of the line can be seen, for the ground is as dark as its ink or another ink lies over it. */
const VEILED: Section = { v: NaN, mass: 0, trust: 0, edge: 1, soft: 0, peak: 0 };

function isVeiled(trust: Float64Array, first: number, length: number, expected: number, half: number): boolean {
  let [sum, count] = [0, 0];
  for (let k = 0; k < length; k++) {
    if (Math.abs(first + k + 0.5 - expected) > Math.max(0.6, half)) continue;
    sum += trust[k]!;
    count++;
  }
  return sum < 0.8 * count;
}

/** Measures the line in one column or row; null where there is no ink within the tolerance. */
export function sectionAt(
  reader: InkReader,
  mode: Mode,
  line: number,
  expected: number,
  slope: number,
  thickness: number,
  tolerance: number,
): Section | null {
  const half = (thickness * Math.hypot(1, slope)) / 2;
  const reach = Math.ceil(half + tolerance + 3);
  const start = Math.floor(expected) - reach;
  const { cover, trust, first, length } = reader.read(mode, line, start, 2 * reach + 1, half, slope);
  const peak = peakNear(cover, first, length, expected, tolerance);
  if (peak < 0) return isVeiled(trust, first, length, expected, half) ? VEILED : null;
  const [from, to] = [edgeFrom(cover, length, peak, -1), edgeFrom(cover, length, peak, 1)];
  let [mass, moment, least, soft] = [0, 0, 1, 0];
  for (let k = Math.max(0, from - 1); k <= Math.min(length - 1, to + 1); k++) {
    const isEdge = k < from || k > to;
    least = Math.min(least, trust[k]!);
    if (isEdge) continue;
    const a = Math.max(0, cover[k]!);
    mass += a;
    moment += a * (first + k + 0.5);
    if (a > 0.12 && a < 0.85) soft++;
  }
  const beyond = (k: number) => (k >= 0 && k < length ? Math.max(0, cover[k]!) : 0);
  const touch = (k: number, outer: number) => (beyond(outer) >= FLOOR ? Math.min(cover[k]!, beyond(outer)) : 0);
  return {
    v: moment / mass,
    mass,
    trust: least,
    edge: Math.max(touch(from, from - 1), touch(to, to + 1)),
    soft: soft / (to - from + 1),
    peak: cover[peak]!,
  };
}
