import type { Px } from '@/lib/geometry';
import type { InkVector } from './palette';
import type { Paper } from './paper';
import type { Raster } from './types';

/** Where following begins: a place on the line, its direction as a unit vector, its ink. */
export interface Seed {
  readonly at: Px;
  readonly along: Px;
  readonly ink: InkVector;
  /** How far its pixels stray from that colour, bytes. */
  readonly strayness: number;
}

const REACH = 6;
const LEAST_CONTRAST = 24;
const ANGLES = 48;

type Contrast = (column: number, row: number) => number;

function contrastIn({ width, height, rgb }: Raster, paper: Paper): Contrast {
  const ground = new Float64Array(3);
  return (column, row) => {
    if (column < 0 || row < 0 || column >= width || row >= height) return 0;
    paper.at(column, row, ground);
    const at = (row * width + column) * 3;
    return Math.hypot(ground[0]! - rgb[at]!, ground[1]! - rgb[at + 1]!, ground[2]! - rgb[at + 2]!);
  };
}

/** Places near the start that have ink, strongest and nearest first. */
function inkNear(contrast: Contrast, [x, y]: Px): { column: number; row: number; score: number }[] {
  const found: { column: number; row: number; score: number }[] = [];
  for (let row = Math.floor(y - REACH); row <= y + REACH; row++) {
    for (let column = Math.floor(x - REACH); column <= x + REACH; column++) {
      const away = Math.hypot(column + 0.5 - x, row + 0.5 - y);
      const strength = away <= REACH ? contrast(column, row) : 0;
      if (strength >= LEAST_CONTRAST) found.push({ column, row, score: Math.min(strength, 120) * Math.exp(-(away * away) / 6) });
    }
  }
  return found.sort((one, other) => other.score - one.score);
}

/** How much like a line along an angle it looks around a place: ink along the middle, less of it beside. */
function lineScore(contrast: Contrast, [x, y]: Px, [dx, dy]: Px): number {
  let [sum, beside] = [0, 0];
  for (let k = -12; k <= 12; k++) {
    const [cx, cy] = [x + k * dx, y + k * dy];
    const weight = k === 0 ? 1 : 1 - Math.abs(k) / 24;
    sum += weight * Math.min(120, contrast(Math.floor(cx), Math.floor(cy)));
    beside +=
      (weight * (contrast(Math.floor(cx - 4 * dy), Math.floor(cy + 4 * dx)) + contrast(Math.floor(cx + 4 * dy), Math.floor(cy - 4 * dx)))) /
      2;
  }
  return sum - 0.6 * beside;
}

/** The colour of full strokes along a line: of the strongest pixels across each step, a high one but not the highest. */
function inkAlong(picture: Raster, paper: Paper, contrast: Contrast, at: Px, along: Px): Pick<Seed, 'ink' | 'strayness'> {
  const [[x, y], [dx, dy]] = [at, along];
  const strongest: { value: number; column: number; row: number }[] = [];
  for (let k = -10; k <= 10; k++) {
    let best = { value: 0, column: 0, row: 0 };
    for (let across = -1.5; across <= 1.5; across += 0.5) {
      const [column, row] = [Math.floor(x + k * dx - across * dy), Math.floor(y + k * dy + across * dx)];
      const value = contrast(column, row);
      if (value > best.value) best = { value, column, row };
    }
    if (best.value >= LEAST_CONTRAST) strongest.push(best);
  }
  strongest.sort((one, other) => one.value - other.value);
  const upper = strongest.slice(Math.floor(strongest.length * 0.5), Math.max(1, Math.ceil(strongest.length * 0.85)));
  const ground = new Float64Array(3);
  const sum: [number, number, number] = [0, 0, 0];
  for (const { column, row } of upper) {
    paper.at(column, row, ground);
    for (let c = 0; c < 3; c++) sum[c] = sum[c]! + (ground[c]! - picture.rgb[(row * picture.width + column) * 3 + c]!) / upper.length;
  }
  return { ink: sum, strayness: straynessAlong(picture, paper, at, along, sum) };
}

/** How far the pixels on and beside a line stray from tints of its ink, bytes: four fifths stray less. Large where a JPEG smears colours. */
function straynessAlong({ width, height, rgb }: Raster, paper: Paper, [x, y]: Px, [dx, dy]: Px, ink: InkVector): number {
  const size = Math.hypot(...ink) || 1;
  const ground = new Float64Array(3);
  const strays: number[] = [];
  for (let k = -10; k <= 10; k++) {
    for (let across = -3; across <= 3; across++) {
      const [column, row] = [Math.floor(x + k * dx - across * dy), Math.floor(y + k * dy + across * dx)];
      if (column < 0 || row < 0 || column >= width || row >= height) continue;
      paper.at(column, row, ground);
      const at = (row * width + column) * 3;
      const [r, g, b] = [ground[0]! - rgb[at]!, ground[1]! - rgb[at + 1]!, ground[2]! - rgb[at + 2]!];
      const strength = Math.hypot(r, g, b);
      if (strength < 16) continue;
      const tint = (r * ink[0] + g * ink[1] + b * ink[2]) / size;
      strays.push(Math.sqrt(Math.max(0, strength * strength - tint * tint)));
    }
  }
  strays.sort((one, other) => one - other);
  return strays[Math.floor(strays.length * 0.8)] ?? 0;
}

/** The line nearest a start within 6 px: its place, direction and ink; null on blank paper. */
export function seedAt(picture: Raster, paper: Paper, start: Px): Seed | null {
  const contrast = contrastIn(picture, paper);
  let best: { score: number; at: Px; along: Px } | null = null;
  for (const { column, row, score } of inkNear(contrast, start).slice(0, 10)) {
    const at: Px = [column + 0.5, row + 0.5];
    for (let k = 0; k < ANGLES; k++) {
      const along: Px = [Math.cos((Math.PI * k) / ANGLES), Math.sin((Math.PI * k) / ANGLES)];
      const total = lineScore(contrast, at, along) * Math.sqrt(score);
      if (total > (best?.score ?? 0)) best = { score: total, at, along };
    }
  }
  if (!best) return null;
  return { at: best.at, along: best.along, ...inkAlong(picture, paper, contrast, best.at, best.along) };
}
