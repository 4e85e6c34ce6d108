import type { Px } from '@/lib/geometry';
import { begin } from './begin';
import { inkReader } from './ink';
import { paletteOf, type InkVector } from './palette';
import { paperOf, type Paper } from './paper';
import { piecesOf } from './pieces';
import { seedAt } from './seed';
import { smoothed } from './smooth';
import { track, type Seen } from './track';
import type { Bounds, Followed, Raster } from './types';

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

export interface FollowOptions {
  readonly through?: readonly Px[] | undefined;
  readonly bounds?: Bounds | undefined;
}

export function stepsFrom(picture: Raster, start: Px): Seen[] | null {
  const { paper, palette } = known(picture);
  const seed = seedAt(picture, paper, start);
  if (!seed) return null;
  const reader = inkReader(picture, paper, palette, seed.ink, seed.strayness);
  const begun = begin(picture, reader, seed);
  if (!begun) return null;
  const { line, steps, heading } = begun;
  const ahead = track(line, steps, heading);
  const back = track(line, [...steps, ...ahead].reverse(), { mode: heading.mode, sign: -1 });
  return [...back.reverse(), ...steps, ...ahead];
}

export function followLine(picture: Raster, start: Px, _options: FollowOptions = {}): Followed {
  const steps = stepsFrom(picture, start);
  if (!steps || steps.length < 4) return { ok: false, message: 'There is no line within 6 pixels of this place: start on the line itself.' };
  const { v } = smoothed(steps);
  return { ok: true, ...piecesOf(steps, v) };
}
