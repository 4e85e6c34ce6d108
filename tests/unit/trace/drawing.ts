import type { Px } from '@/lib/geometry';
import { normals } from '../../support/random';

/** A picture drawn in a test, with what it was drawn from known exactly. */
export interface Drawn {
  readonly width: number;
  readonly height: number;
  readonly rgb: Uint8Array;
}

type Colour = readonly [number, number, number];

/** A line to draw: the y of its centre at x, between two x, with a thickness across; `shows` says where along x there is ink. */
export interface Stroke {
  readonly y: (x: number) => number;
  readonly from: number;
  readonly to: number;
  readonly thickness: number;
  readonly colour: Colour;
  readonly shows?: (x: number) => boolean;
}

const SUBPIXELS = 8;

export const blank = (width: number, height: number, paper: Colour = [255, 255, 255]): Drawn => {
  const rgb = new Uint8Array(width * height * 3);
  for (let at = 0; at < rgb.length; at++) rgb[at] = paper[at % 3]!;
  return { width, height, rgb };
};

function lay({ width, rgb }: Drawn, column: number, row: number, cover: number, colour: Colour): void {
  const at = (row * width + column) * 3;
  for (let c = 0; c < 3; c++) rgb[at + c] = Math.round(rgb[at + c]! * (1 - cover) + colour[c]! * cover);
}

/** Lays a stroke over the picture with area antialiasing by 8 × 8 samples a pixel; a sample has ink when it is within half the thickness of the centre line. */
export function stroke(drawn: Drawn, { y, from, to, thickness, colour, shows = () => true }: Stroke): Drawn {
  for (let column = Math.max(0, Math.floor(from)); column < Math.min(drawn.width, Math.ceil(to)); column++) {
    const cover = new Float64Array(drawn.height);
    for (let k = 0; k < SUBPIXELS; k++) {
      const x = column + (k + 0.5) / SUBPIXELS;
      if (x < from || x > to || !shows(x)) continue;
      const slope = (y(x + 0.01) - y(x - 0.01)) / 0.02;
      const half = (thickness / 2) * Math.hypot(1, slope);
      const [top, bottom] = [y(x) - half, y(x) + half];
      for (let row = Math.max(0, Math.floor(top)); row <= Math.min(drawn.height - 1, Math.floor(bottom)); row++) {
        cover[row] = cover[row]! + Math.max(0, Math.min(bottom, row + 1) - Math.max(top, row)) / SUBPIXELS;
      }
    }
    for (let row = 0; row < drawn.height; row++) if (cover[row]! > 0) lay(drawn, column, row, Math.min(1, cover[row]!), colour);
  }
  return drawn;
}

/** Fills the pixels whose centres satisfy a condition. */
export function fill(drawn: Drawn, colour: Colour, isIn: (x: number, y: number) => boolean): Drawn {
  for (let row = 0; row < drawn.height; row++) {
    for (let column = 0; column < drawn.width; column++) if (isIn(column + 0.5, row + 0.5)) lay(drawn, column, row, 1, colour);
  }
  return drawn;
}

/** A grid of one-pixel lines. */
export const grid = (drawn: Drawn, spacing: number, colour: Colour) =>
  fill(drawn, colour, (x, y) => Math.floor(x) % spacing === 7 || Math.floor(y) % spacing === 7);

/** A quarter turn: what was at (x, y) is at (height − y, x). */
export function turned({ width, height, rgb }: Drawn): Drawn {
  const out = blank(height, width);
  for (let row = 0; row < height; row++) {
    for (let column = 0; column < width; column++) {
      const [from, to] = [(row * width + column) * 3, (column * height + (height - 1 - row)) * 3];
      for (let c = 0; c < 3; c++) out.rgb[to + c] = rgb[from + c]!;
    }
  }
  return out;
}

/** Every byte scattered by a seeded normal error. */
export function noisy({ width, height, rgb }: Drawn, deviation: number, seed: number): Drawn {
  const normal = normals(seed);
  return { width, height, rgb: rgb.map((byte) => Math.max(0, Math.min(255, Math.round(byte + deviation * normal())))) };
}

/** Black and white only. */
export const bilevel = ({ width, height, rgb }: Drawn): Drawn => ({ width, height, rgb: rgb.map((byte) => (byte < 128 ? 0 : 255)) });

/** Lit unevenly: darker towards the right. */
export const shaded = ({ width, height, rgb }: Drawn): Drawn => ({
  width,
  height,
  rgb: rgb.map((byte, at) => Math.round(byte * (1 - (0.35 * (Math.floor(at / 3) % width)) / width))),
});

export const errors = (points: readonly Px[], y: (x: number) => number): number[] =>
  points.map(([x, at]) => (at - y(x)) / Math.hypot(1, (y(x + 0.01) - y(x - 0.01)) / 0.02));
export const meanSize = (values: readonly number[]) => values.reduce((sum, value) => sum + Math.abs(value), 0) / values.length;
export const worst = (values: readonly number[]) => Math.max(...values.map(Math.abs));
