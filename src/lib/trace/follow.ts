import type { Px } from '@/lib/geometry';
import { begin } from './begin';
import { inkReader } from './ink';
import { joined, passes } from './join';
import { paletteOf, type InkVector } from './palette';
import { paperOf, type Paper } from './paper';
import { piecesOf, type Pieces } from './pieces';
import { seedAt } from './seed';
import { smoothed } from './smooth';
import { track, type Seen } from './track';
import type { Bounds, Doubt, Followed, Raster } from './types';

interface Known {
  readonly paper: Paper;
  readonly palette: readonly InkVector[];
}

/** What is measured once for a picture, kept as long as its pixels are. */
const pictures = new WeakMap<Raster['rgb'], Known>();

function known(picture: Raster): Known {
  const before = pictures.get(picture.rgb);
  if (before) return before;
  const paper = paperOf(picture);
  const about = { paper, palette: paletteOf(picture, paper) };
  pictures.set(picture.rgb, about);
  return about;
}

/** Places the curve must pass, in any order, and where it may run. */
export interface FollowOptions {
  readonly through?: readonly Px[] | undefined;
  readonly bounds?: Bounds | undefined;
}

const FEWEST_STEPS = 4;
const FAINT = 45;

const pixelOf = ({ mode, t, v }: Seen): Px => (mode === 'columns' ? [t, v] : [v, t]);

/** The doubts about the line as a whole: how it ends, how faint it is. */
function wholeDoubts(ink: InkVector, ends: readonly { readonly at: Seen; readonly isUnder: boolean }[]): Doubt[] {
  const under = ends
    .filter(({ isUnder }) => isUnder)
    .map(({ at }) => ({
      px: pixelOf(at),
      why: 'end' as const,
      text: 'The line runs under something else here and does not come out again: check that it ends here.',
    }));
  const isFaint = Math.hypot(...ink) < FAINT;
  const text = 'This line is hardly darker than the paper: check that its points lie on it.';
  return isFaint ? [...under, { px: pixelOf(ends[0]!.at), why: 'faint', text }] : under;
}

/** The curve through one place, to both ends; null where there is no line. */
function fromOne(picture: Raster, start: Px, bounds: Bounds): Pieces | null {
  const { paper, palette } = known(picture);
  const seed = seedAt(picture, paper, start);
  if (!seed) return null;
  const reader = inkReader(picture, paper, palette, seed.ink, seed.strayness);
  const begun = begin(picture, reader, seed, bounds);
  if (!begun) return null;
  const { line, steps, heading } = begun;
  const ahead = track(line, steps, heading);
  const back = track(line, [...steps, ...ahead.steps].reverse(), { mode: heading.mode, sign: -1 });
  const all = [...back.steps.reverse(), ...steps, ...ahead.steps];
  if (all.length < FEWEST_STEPS) return null;
  const pieces = piecesOf(all, smoothed(all).v);
  const ends = [
    { at: all[0]!, isUnder: back.isUnder },
    { at: all[all.length - 1]!, isUnder: ahead.isUnder },
  ];
  return { ...pieces, doubts: [...pieces.doubts, ...wholeDoubts(seed.ink, ends)] };
}

const shown = ([x, y]: Px) => `${x.toFixed(1)}, ${y.toFixed(1)}`;
const blank = (at: Px): Followed => ({
  ok: false,
  message: `There is no line within 6 pixels of ${shown(at)}: give a pixel on the curve itself.`,
});

/**
 * Follows the line nearest `start` (within 6 px) to both of its ends on pixels alone. Points are centres of ink in px, in order from the left end
 * (or the top one of a steep line), at most 2 px apart along ink; where something hides the line there is a gap that says why.
 * Refuses a start, or a place it must pass, on blank paper.
 */
export function followLine(picture: Raster, start: Px, { through = [], bounds }: FollowOptions = {}): Followed {
  const within = bounds ?? { left: 0, top: 0, right: picture.width, bottom: picture.height };
  let pieces = fromOne(picture, start, within);
  if (!pieces) return blank(start);
  for (const place of through) {
    if (passes(pieces, place)) continue;
    const other = fromOne(picture, place, within);
    if (!other) return blank(place);
    pieces = passes(other, start) ? other : joined(pieces, other, start, place);
  }
  return { ok: true, ...pieces };
}
