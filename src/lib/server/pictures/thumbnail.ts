import pLimit from 'p-limit';
import sharp from 'sharp';
import { MOST_PIXELS } from './decoder';

/** Twice the size at which lists show it, for fine screens. */
const WIDTH = 480;
const HEIGHT = 360;
const QUALITY = 82;
/** A whole picture is decoded for each that is made; some tens of kilobytes are kept of each. */
const PARALLEL = 2;
const KEPT = 200;

const inTurn = pLimit(PARALLEL);
const kept = new Map<string, Promise<Buffer>>();

const shrink = (png: Uint8Array) =>
  sharp(png, { limitInputPixels: MOST_PIXELS, sequentialRead: true })
    .resize(WIDTH, HEIGHT, { fit: 'inside', withoutEnlargement: true })
    .webp({ quality: QUALITY })
    .toBuffer();

/** A small WebP of an intake picture, by the hash of its PNG; for looking at only, never measured. */
export function thumbnailOf(pngSha256: string, readPng: () => Promise<Uint8Array>): Promise<Buffer> {
  const there = kept.get(pngSha256);
  if (there) return there;
  const made = inTurn(async () => shrink(await readPng()));
  kept.set(pngSha256, made);
  made.catch(() => kept.delete(pngSha256));
  const oldest = kept.keys().next();
  if (kept.size > KEPT && !oldest.done) kept.delete(oldest.value);
  return made;
}
