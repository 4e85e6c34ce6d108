import { localFit } from './polynomial';
import { sectionAt, type Section } from './section';
import { placeBy, templateFrom, type Template } from './template';
import type { InkReader } from './ink';
import type { Bounds, Mode, Raster, Step } from './types';

/** A step with what was seen there. */
export interface Seen extends Step {
  readonly mass: number;
  readonly soft: number;
  readonly slope: number;
  /** Placed by the template, for only part of it was seen. */
  readonly mended?: boolean;
  /** Where a step is not clean: the centroid of what is there instead, px from the line's place. */
  readonly beside?: number;
}

/** What is known of a line while it is followed. */
export interface Line {
  readonly picture: Raster;
  readonly reader: InkReader;
  /** Perpendicular, px. */
  readonly thickness: number;
  /** Where the curve may run. */
  readonly bounds: Bounds;
}

/** Which way a stretch runs: mode, and the sign of its steps. */
export interface Heading {
  readonly mode: Mode;
  readonly sign: 1 | -1;
}

interface Expected {
  readonly v: number;
  readonly slope: number;
}

/** Most columns or rows without a clean section that are bridged. */
const LONGEST_HIDDEN = 140;

const flipped = (mode: Mode): Mode => (mode === 'columns' ? 'rows' : 'columns');
const inMode = ({ mode, t, v }: Step, wanted: Mode): readonly [number, number] => (mode === wanted ? [t, v] : [v, t]);

/** Where the line should be at t, from its last clean steps. */
function expect(steps: readonly Seen[], mode: Mode, t: number, hidden: number): Expected | null {
  const most = hidden > 3 ? 48 : 14;
  const [ts, vs, ws]: [number[], number[], number[]] = [[], [], []];
  for (let k = steps.length - 1; k >= 0 && ts.length < most && steps.length - k < 400; k--) {
    const step = steps[k]!;
    if (step.seen !== 'clean') continue;
    const [at, v] = inMode(step, mode);
    ts.push(at);
    vs.push(v);
    ws.push((step.mended ? 0.25 : 1) / (1 + (ts.length / most) * 1.5));
  }
  if (ts.length < 2) return null;
  const fit = localFit(ts, vs, ws, t, ts.length >= (hidden > 3 ? 24 : 10) ? 2 : 1);
  return fit && { v: fit.value, slope: fit.slope };
}

/** Whether a section shows the whole line and nothing else. */
function isClean({ mass, trust, edge }: Section, expectedMass: number): boolean {
  return trust > 0.5 && edge < 0.2 && mass > 0.5 * expectedMass - 0.1 && mass < 1.25 * expectedMass + 0.3;
}

function isInside({ left, top, right, bottom }: Bounds, mode: Mode, t: number, v: number): boolean {
  const [x, y] = mode === 'columns' ? [t, v] : [v, t];
  return x >= left && y >= top && x <= right && y <= bottom;
}

/** One step: the section where the line is expected, and how it counts. */
function stepAt({ reader, thickness }: Line, mode: Mode, t: number, { v, slope }: Expected, tolerance: number): Seen {
  const section = sectionAt(reader, mode, Math.floor(t), v, slope, thickness, tolerance);
  if (!section) return { mode, t, v, slope, seen: 'none', mass: 0, soft: 0 };
  const full = thickness * Math.hypot(1, slope);
  const isNear = Math.abs(section.v - v) <= tolerance;
  if (isNear && isClean(section, full)) return { mode, t, v: section.v, slope, seen: 'clean', mass: section.mass, soft: section.soft };
  const seen = section.mass < 0.3 * full && section.trust > 0.5 ? 'none' : 'part';
  return { mode, t, v, slope, seen, mass: section.mass, soft: section.soft, ...(section.mass > 0 && { beside: section.v - v }) };
}

/** The newest template of a line while it is followed. */
interface Kept {
  template: Template | null;
  mode: Mode;
  until: number;
}

/** A template fit for this mode and slope, from the last wholly seen steps. */
function templateOf({ reader, thickness }: Line, kept: Kept, steps: readonly Seen[], mode: Mode, slope: number): Template | null {
  const isFit = kept.template && kept.mode === mode && Math.abs(kept.template.slope - slope) < 0.2;
  if (isFit && steps.length < kept.until) return kept.template;
  const full = thickness * Math.hypot(1, slope);
  const wholes: Seen[] = [];
  for (let k = steps.length - 1; k >= 0 && wholes.length < 40 && steps.length - k < 300; k--) {
    const step = steps[k]!;
    const isWhole = step.seen === 'clean' && step.mode === mode && Math.abs(step.mass - full) < 0.15 * full + 0.2;
    if (isWhole && Math.abs(step.slope - slope) < 0.25) wholes.push(step);
  }
  const made = templateFrom(reader, wholes, thickness);
  if (made || !isFit) kept.template = made;
  kept.mode = mode;
  kept.until = steps.length + 60;
  return kept.template;
}

/** A step that is partly hidden, placed by the template where it can be. */
function mended(line: Line, kept: Kept, steps: readonly Seen[], step: Seen, expected: Expected, mayBeCut: boolean): Seen {
  const isShort = mayBeCut && step.seen === 'clean' && step.mass < 0.8 * line.thickness * Math.hypot(1, expected.slope);
  if (step.seen !== 'part' && !isShort) return step;
  const template = templateOf(line, kept, steps, step.mode, expected.slope);
  if (!template) return step;
  const v = placeBy(line.reader, template, { mode: step.mode, t: step.t, ...expected }, line.thickness, 0.9, mayBeCut);
  return v === null ? step : { ...step, v, seen: 'clean', mass: 0, mended: true };
}

/** Where the line should be from its very last steps: after a sudden bend the longer past misleads. */
function nearly(steps: readonly Seen[], mode: Mode, t: number): Expected | null {
  const last = steps.slice(-4).filter(({ seen, mended }) => seen === 'clean' && !mended);
  if (last.length < 4) return null;
  const places = last.map((step) => inMode(step, mode));
  const fit = localFit(
    places.map(([at]) => at),
    places.map(([, v]) => v),
    null,
    t,
    1,
  );
  return fit && { v: fit.value, slope: fit.slope };
}

/** The step after a sudden bend, where it joins the last one. */
function bent(line: Line, steps: readonly Seen[], { mode }: Heading, step: Seen): Seen {
  const near = nearly(steps, mode, step.t);
  if (!near) return step;
  const other = stepAt(line, mode, step.t, near, 1.3 + Math.abs(near.slope) / 2);
  return other.seen === 'clean' ? other : step;
}

/** The way on around a corner: across the old way, where the line is seen wholly for three steps from its last place. */
function cornered(line: Line, steps: readonly Seen[], { mode, sign }: Heading, before: number): { step: Seen; way: Heading } | null {
  const last = steps[steps.length - 1]!;
  const near = nearly(steps, mode, last.t);
  if (!near || Math.abs(near.slope) < 0.3 || Math.abs(near.slope - before) + Math.abs(near.slope) < 0.6) return null;
  const [at, v] = inMode(last, mode);
  const way: Heading = { mode: flipped(mode), sign: sign * near.slope > 0 ? 1 : -1 };
  const seen: Seen[] = [];
  let [from, slope, t] = [at, 0.5 * Math.sign(near.slope), Math.floor(v) + 0.5];
  for (let k = 0; k < 3; k++) {
    t += way.sign;
    const step = stepAt(line, way.mode, t, { v: from + slope * way.sign * (k === 0 ? Math.abs(t - v) : 1), slope }, 1.6);
    if (step.seen !== 'clean') return null;
    if (k > 0) slope = (step.v - from) * way.sign;
    from = step.v;
    seen.push(step);
  }
  return { step: seen[0]!, way };
}

/** Places the last steps of a gap, where the stroke shows in part before it is whole again. */
function uncover(line: Line, kept: Kept, steps: Seen[], next: Seen, sign: 1 | -1): void {
  let after = next;
  for (let at = steps.length - 1; at >= steps.length - 3; at--) {
    const step = steps[at];
    if (step?.seen !== 'part' || step.mode !== next.mode) return;
    const placed = mended(line, kept, steps, step, { v: after.v - sign * next.slope, slope: next.slope }, true);
    if (placed.seen !== 'clean') return;
    steps[at] = placed;
    after = placed;
  }
}

const FEWEST_DASHES = 2;

/** How many steps beyond a gap are looked at: few where the line is dashed or the gap a mere scratch, many where it could as well have ended. */
function lookAhead({ thickness }: Line, steps: readonly Seen[], hidden: number): number {
  if (hidden <= Math.max(4, 1.5 * thickness)) return 4;
  const isLong = hidden > Math.max(8, 5 * thickness);
  let [dashes, run, longest] = [0, 0, 0];
  for (const { seen } of steps.slice(-150 - hidden, -hidden)) {
    if (seen === 'clean' && run >= 3) dashes++;
    if (seen === 'clean') longest = Math.max(longest, run);
    run = seen === 'clean' ? 0 : run + 1;
  }
  if (dashes >= FEWEST_DASHES && hidden <= 1.6 * longest + 2) return 4;
  return isLong ? 14 : 9;
}

/** Whether what comes after a gap is the line: it goes on in the old direction for a while. */
function goesOn(line: Line, kept: Kept, steps: readonly Seen[], { mode, sign }: Heading, t: number, hidden: number): boolean {
  const wanted = lookAhead(line, steps, hidden);
  const before = expect(steps, mode, t, hidden);
  if (!before) return false;
  const seen: Seen[] = [];
  for (let k = 0; k < wanted; k++) {
    const at = t + k * sign;
    const expected =
      seen.length >= 4 ? (expect(seen, mode, at, 0) ?? before) : { v: before.v + k * sign * before.slope, slope: before.slope };
    if (!isInside(line.bounds, mode, at, expected.v)) break;
    const step = mended(line, kept, steps, stepAt(line, mode, at, expected, toleranceAfter(hidden)), expected, false);
    if (step.seen === 'clean') seen.push(step);
    else if (wanted > 4 && k < 4 && k >= seen.length + 1) return false;
  }
  if (seen.length < Math.max(2, 0.55 * wanted)) return false;
  const fit = localFit(
    seen.map((s) => s.t),
    seen.map((s) => s.v),
    null,
    t,
    1,
  );
  if (!fit || seen.length < 5) return true;
  return Math.abs(Math.atan(fit.slope) - Math.atan(before.slope)) < 0.15 + 0.002 * hidden;
}

const toleranceAfter = (hidden: number) => Math.min(4, 1.3 + 0.05 * hidden);

/** The way on from the last steps: columns for shallow lines, rows for steep ones, with some reluctance to change. */
function turned({ mode, sign }: Heading, slope: number): Heading {
  if (Math.abs(slope) <= 1.25) return { mode, sign };
  return { mode: flipped(mode), sign: sign * slope > 0 ? 1 : -1 };
}

/** Follows a line from known steps in one direction to its end; the steps come in order, the last one clean. `isUnder`: it ends where it runs under something. */
export function track(line: Line, known: readonly Seen[], heading: Heading): { steps: Seen[]; isUnder: boolean } {
  const steps = [...known];
  const longestGap = Math.min(90, Math.max(28, 0.06 * Math.max(line.picture.width, line.picture.height)));
  let way = heading;
  const kept: Kept = { template: null, mode: heading.mode, until: 0 };
  let [hidden, empty] = [0, 0];
  let t = inMode(known[known.length - 1]!, way.mode)[0];
  for (let guard = 0; guard < 4 * (line.picture.width + line.picture.height); guard++) {
    const here = expect(steps, way.mode, t, hidden);
    if (!here) break;
    const next = hidden === 0 ? turned(way, here.slope) : way;
    if (next.mode !== way.mode) {
      t = Math.floor(here.v) + 0.5;
      way = next;
    }
    t += way.sign;
    const expected = expect(steps, way.mode, t, hidden);
    if (!expected || !isInside(line.bounds, way.mode, t, expected.v)) break;
    let step = stepAt(line, way.mode, t, expected, toleranceAfter(hidden));
    const isAfterGap = hidden > 2 && empty > 0;
    if (isAfterGap) step = mended(line, kept, steps, step, expected, false);
    if (step.seen === 'clean' && hidden > 2 && !goesOn(line, kept, steps, way, t, hidden)) step = { ...step, v: expected.v, seen: 'part' };
    if (hidden === 0 && step.seen !== 'clean') step = bent(line, steps, way, step);
    const corner = hidden === 0 && step.seen !== 'clean' ? cornered(line, steps, way, here.slope) : null;
    if (corner) [step, way, t] = [corner.step, corner.way, corner.step.t];
    if (hidden <= 60 && !isAfterGap && empty <= 1) step = mended(line, kept, steps, step, expected, hidden === 0);
    if (step.seen === 'clean' && isAfterGap) uncover(line, kept, steps, step, way.sign);
    steps.push(step);
    hidden = step.seen === 'clean' ? 0 : hidden + 1;
    empty = step.seen === 'clean' ? 0 : empty + (step.seen === 'none' || empty > 0 ? 1 : 0);
    if (empty > longestGap || hidden > LONGEST_HIDDEN) break;
  }
  const seen = steps.findLastIndex((step) => step.seen === 'clean');
  const after = steps.slice(seen + 1, seen + 7);
  const isUnder = after.length > 0 && after.filter((step) => step.seen === 'part').length > after.length / 2;
  return { steps: ended(line, steps, known.length).slice(known.length), isUnder };
}

const dropHidden = (steps: Seen[], least: number): void => {
  while (steps.length > least && steps[steps.length - 1]!.seen !== 'clean') steps.pop();
};

const SHORTEST_ISLAND = 8;

/** Drops a few last steps beyond a gap: unless the line is dashed, they are more likely a speck or a letter. */
function dropIsland(line: Line, steps: Seen[], least: number): void {
  const gapEnd = steps.findLastIndex(({ seen }) => seen !== 'clean');
  const gapStart = steps.findLastIndex(({ seen }, at) => at < gapEnd && seen === 'clean');
  if (gapStart < least || steps.length - 1 - gapEnd >= SHORTEST_ISLAND) return;
  const hidden = gapEnd - gapStart;
  if (hidden >= 4 && lookAhead(line, steps.slice(0, gapEnd + 1), hidden) > 4) steps.length = gapStart + 1;
}

/** Without what does not belong to the end of the line: hidden steps, the slanted cap of the stroke, ink of an axis that the line ends on. */
function ended(line: Line, steps: Seen[], least: number): Seen[] {
  dropHidden(steps, least);
  dropIsland(line, steps, least);
  for (let k = 0; k < 5 && steps.length > Math.max(least, 30); k++) {
    const last = steps[steps.length - 1]!;
    const earlier = steps.slice(0, -1 - Math.min(3, k));
    const before = expect(earlier, last.mode, last.t, 4);
    const full = line.thickness * Math.hypot(1, last.slope);
    const isCap = last.mass > 0 && last.mass < 0.8 * full;
    const isOff = before !== null && Math.abs(before.v - last.v) > 0.3 + 0.1 * line.thickness;
    if (!isCap && !isOff) break;
    steps.pop();
    dropHidden(steps, least);
  }
  return steps;
}
