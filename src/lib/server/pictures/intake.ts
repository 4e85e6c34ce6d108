import { createHash } from 'node:crypto';
import type { Metadata } from 'sharp';
import { decode, encodePng, headerOf, type Decoded } from './decoder';
import { kindOf, type MediaType } from './kind';
import { barePng, pngChunks } from './png-chunks';
import { pngColour, toSrgb, type PngColour } from './png-colour';

export { MOST_PIXELS } from './decoder';
export { IntakeRefused, type IntakeCode } from './refused';
export type { MediaType } from './kind';

/** The one picture of a file that is shown, measured and hashed. */
export interface IntakePicture {
  /** Opaque 8-bit sRGB without colour chunks. */
  readonly png: Buffer;
  readonly width: number;
  readonly height: number;
  /** Rows from the top, three bytes a pixel. */
  readonly rgb: Uint8Array;
  /** Of the file as it came. */
  readonly fileSha256: string;
  /** Of width and height (uint32 little-endian), then the RGB bytes. */
  readonly pixelsSha256: string;
  readonly pngSha256: string;
  /** Of the file as it came, by its content. */
  readonly mediaType: MediaType;
  /** What was done that a person may want to know, in sentences. */
  readonly notes: readonly string[];
}

const sha256 = (...parts: readonly Uint8Array[]) => parts.reduce((hash, part) => hash.update(part), createHash('sha256')).digest('hex');

/** SHA-256 of width and height as uint32 little-endian, then the RGB bytes: the identity of a picture whatever file it came in. */
export function pixelsSha256(width: number, height: number, rgb: Uint8Array): string {
  const size = Buffer.alloc(8);
  size.writeUInt32LE(width, 0);
  size.writeUInt32LE(height, 4);
  return sha256(size, rgb);
}

interface Laid {
  readonly rgb: Uint8Array;
  /** Whether any pixel let the ground through. */
  readonly transparent: boolean;
}

/** Four bytes a pixel on a white ground, to three. */
function onWhite(rgba: Uint8Array): Laid {
  const rgb = new Uint8Array((rgba.length / 4) * 3);
  let transparent = false;
  for (let from = 0, to = 0; from < rgba.length; from += 4, to += 3) {
    const alpha = rgba[from + 3]!;
    transparent ||= alpha < 255;
    for (let channel = 0; channel < 3; channel++) {
      const sample = rgba[from + channel]!;
      rgb[to + channel] = alpha === 255 ? sample : Math.round((sample * alpha + 255 * (255 - alpha)) / 255);
    }
  }
  return { rgb, transparent };
}

function rgbOf({ samples, channels }: Decoded, colour: PngColour | null): Laid {
  if (colour) return onWhite(toSrgb(samples, colour));
  if (samples instanceof Uint16Array) throw new Error('16-bit samples are decoded for their colour chunks only.');
  return channels === 4 ? onWhite(samples) : { rgb: samples, transparent: false };
}

function notesOf(bytes: Uint8Array, header: Metadata, kind: MediaType, done: { transparent: boolean; recoloured: boolean }): string[] {
  const pages = header.pages ?? 1;
  const animatedPng = kind === 'image/png' && pngChunks(bytes).some(({ type }) => type === 'acTL');
  const notes: [boolean, string][] = [
    [animatedPng || (pages > 1 && kind !== 'image/tiff'), 'The picture is animated: only its first frame was taken.'],
    [pages > 1 && kind === 'image/tiff', `The file has ${pages} pages: only the first was taken.`],
    [(header.orientation ?? 1) > 1, 'The picture was turned upright as its camera noted.'],
    [done.transparent, 'Transparent parts were laid on white.'],
    [header.hasProfile || header.space === 'cmyk' || done.recoloured, 'The colours were converted to sRGB.'],
  ];
  return notes.filter(([applies]) => applies).map(([, note]) => note);
}

/**
 * Turns the bytes of a PNG, JPEG, WebP, TIFF or GIF file into its intake picture: first frame, turned upright, profile and gamma converted, on white.
 * Throws {@link IntakeRefused} with a sentence for anything else, anything damaged and anything over 40 megapixels.
 */
export async function intake(bytes: Uint8Array): Promise<IntakePicture> {
  const mediaType = kindOf(bytes);
  const header = await headerOf(bytes);
  const colour = mediaType === 'image/png' ? pngColour(bytes) : null;
  const decoded = await decode(bytes, { deep: colour !== null && header.depth === 'ushort', alpha: colour !== null });
  const { width, height } = decoded;
  const { rgb, transparent } = rgbOf(decoded, colour);
  if (rgb.length !== width * height * 3) throw new Error(`Decoded ${rgb.length} bytes for ${width} × ${height} pixels.`);
  const png = barePng(await encodePng(rgb, width, height));
  return {
    png,
    width,
    height,
    rgb,
    fileSha256: sha256(bytes),
    pixelsSha256: pixelsSha256(width, height, rgb),
    pngSha256: sha256(png),
    mediaType,
    notes: notesOf(bytes, header, mediaType, { transparent, recoloured: colour !== null }),
  };
}
