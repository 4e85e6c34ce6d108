import { colourDifference, labOf } from './colour';
import type { Paper } from './paper';
import type { Raster } from './types';

/** How a full stroke of one ink differs from the ground: ground minus ink, in bytes of red, green and blue. */
export type InkVector = readonly [number, number, number];

const ENOUGH_CONTRAST = 60;
const SAMPLES = 60_000;

interface Cluster {
  readonly ink: InkVector;
  readonly count: number;
}

const angleBetween = (a: InkVector, b: InkVector) =>
  Math.acos(Math.min(1, (a[0] * b[0] + a[1] * b[1] + a[2] * b[2]) / (Math.hypot(...a) * Math.hypot(...b))));

/** Whether two inks can be told apart in one pixel: neither is a tint of the other. */
export const areDistinct = (a: InkVector, b: InkVector): boolean => angleBetween(a, b) > 0.3;

const onWhite = ([r, g, b]: InkVector) => labOf(255 - r, 255 - g, 255 - b);

/** The commonest colours of a sample of pixels that differ from the ground, coarsely counted, commonest first. */
function commonInks({ width, height, rgb }: Raster, paper: Paper): Cluster[] {
  const stride = Math.max(1, Math.floor((width * height) / SAMPLES)) | 1;
  const bins = new Map<number, [number, number, number, number]>();
  const ground = new Float64Array(3);
  let seen = 0;
  for (let pixel = 0; pixel < width * height; pixel += stride) {
    const at = pixel * 3;
    const [r, g, b] = [rgb[at]!, rgb[at + 1]!, rgb[at + 2]!];
    if (Math.max(r, g, b) - Math.min(r, g, b) < 24) continue;
    paper.at(pixel % width, Math.floor(pixel / width), ground);
    const [dr, dg, db] = [ground[0]! - r, ground[1]! - g, ground[2]! - b];
    if (Math.hypot(dr, dg, db) < ENOUGH_CONTRAST) continue;
    const key = (Math.round(dr / 20) + 16) * 4096 + (Math.round(dg / 20) + 16) * 64 + Math.round(db / 20) + 16;
    const bin = bins.get(key) ?? [0, 0, 0, 0];
    bin[0] += dr;
    bin[1] += dg;
    bin[2] += db;
    bin[3]++;
    bins.set(key, bin);
    seen++;
  }
  return [...bins.values()]
    .filter((bin) => bin[3] >= Math.max(3, seen * 0.004))
    .map(([r, g, b, count]) => ({ ink: [r / count, g / count, b / count] as const, count }))
    .sort((one, other) => Math.hypot(...other.ink) * other.count - Math.hypot(...one.ink) * one.count);
}

/** The coloured inks of a picture, each once: tints of one another (edges of antialiased lines) and like colours are one ink. */
export function paletteOf(picture: Raster, paper: Paper): readonly InkVector[] {
  const kept: InkVector[] = [];
  for (const { ink } of commonInks(picture, paper)) {
    const isNew = kept.every((other) => areDistinct(ink, other) && colourDifference(onWhite(ink), onWhite(other)) > 8);
    if (isNew && kept.length < 8) kept.push(ink);
  }
  return kept;
}
