import { localFit } from './polynomial';
import { sectionAt } from './section';
import type { InkReader } from './ink';
import type { Seed } from './seed';
import type { Heading, Line, Seen } from './track';
import type { Bounds, Raster } from './types';

const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
};

/** The first steps of a line, around its seed, with its thickness; null where there is no line. */
export function begin(
  picture: Raster,
  reader: InkReader,
  { at, along }: Seed,
  bounds: Bounds,
): { line: Line; steps: Seen[]; heading: Heading } | null {
  const mode = Math.abs(along[0]) >= Math.abs(along[1]) ? 'columns' : 'rows';
  const [t0, v0] = mode === 'columns' ? at : [at[1], at[0]];
  const slope = mode === 'columns' ? along[1] / along[0] : along[0] / along[1];
  for (const span of [9, 22]) {
    const found: Seen[] = [];
    for (let k = -span; k <= span; k++) {
      const section = sectionAt(reader, mode, Math.floor(t0) + k, v0 + k * slope, slope, 2.5, 1.5 + 0.06 * Math.abs(k));
      if (!section || section.trust < 0.5 || section.edge > 0.2) continue;
      found.push({ mode, t: t0 + k, v: section.v, slope, seen: 'clean', mass: section.mass, soft: section.soft });
    }
    const steps = straightest(found);
    if (steps.length < (span === 9 ? 8 : 5)) continue;
    const thickness = median(steps.map(({ mass }) => mass)) / Math.hypot(1, slope);
    const full = steps.filter(
      ({ mass }) => mass > 0.6 * thickness * Math.hypot(1, slope) && mass < 1.4 * thickness * Math.hypot(1, slope) + 0.4,
    );
    return { line: { picture, reader, thickness, bounds }, steps: full, heading: { mode, sign: 1 } };
  }
  return null;
}

/** The steps that agree with a line through most of them. */
function straightest(found: readonly Seen[]): Seen[] {
  let kept: readonly Seen[] = found;
  for (const most of [2, 1, 0.8]) {
    const fit = localFit(
      kept.map(({ t }) => t),
      kept.map(({ v }) => v),
      null,
      0,
      1,
    );
    if (!fit) return [];
    const next = kept.filter(({ t, v }) => Math.abs(v - fit.value - fit.slope * t) < most);
    if (next.length >= 3) kept = next;
  }
  return [...kept];
}
