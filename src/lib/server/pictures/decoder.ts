import sharp, { type Metadata, type Sharp } from 'sharp';
import { IntakeRefused } from './refused';

/** 40 megapixels: an A3 page at 400 dpi has 31. */
export const MOST_PIXELS = 40_000_000;
const MOST_SECONDS = 20;

// Whatever reaches the decoder, only these five loaders exist in this process.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({
  operation: [
    'VipsForeignLoadPngBuffer',
    'VipsForeignLoadJpegBuffer',
    'VipsForeignLoadWebpBuffer',
    'VipsForeignLoadTiffBuffer',
    'VipsForeignLoadNsgifBuffer',
  ],
});

const open = (bytes: Uint8Array): Sharp =>
  sharp(bytes, { failOn: 'warning', limitInputPixels: MOST_PIXELS, sequentialRead: true, pages: 1 });

const TOO_MANY = `The picture has more than ${MOST_PIXELS / 1e6} megapixels. Cut the chart out or scan it with fewer dots per inch.`;

function refusalOf(error: unknown): unknown {
  if (!(error instanceof Error) || error instanceof IntakeRefused) return error;
  if (/pixel limit/i.test(error.message)) return new IntakeRefused('too-many-pixels', TOO_MANY);
  if (/timeout/i.test(error.message))
    return new IntakeRefused('too-slow', 'The picture took too long to open. Save it as a plain PNG and send that.');
  return new IntakeRefused('damaged', 'The picture is damaged or stops before its end. Save it again where it came from and send that.');
}

async function refusing<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    throw refusalOf(error);
  }
}

/** What the header says; throws IntakeRefused for a damaged header and for too many pixels. */
export async function headerOf(bytes: Uint8Array): Promise<Metadata> {
  const header = await refusing(open(bytes).metadata());
  if (header.width * header.height > MOST_PIXELS) throw new IntakeRefused('too-many-pixels', TOO_MANY);
  return header;
}

export interface Decoded {
  readonly width: number;
  readonly height: number;
  readonly channels: number;
  readonly samples: Uint8Array | Uint16Array;
}

/** Pixels as 8-bit sRGB, upright and with any profile converted; `deep` keeps the 16 bits of a file that has them. */
export async function decode(bytes: Uint8Array, { deep, alpha }: { readonly deep: boolean; readonly alpha: boolean }): Promise<Decoded> {
  const upright = open(bytes).timeout({ seconds: MOST_SECONDS }).autoOrient();
  const coloured = upright.toColourspace(deep ? 'rgb16' : 'srgb');
  const pipeline = alpha ? coloured.ensureAlpha() : coloured;
  const { data, info } = await refusing(pipeline.raw({ depth: deep ? 'ushort' : 'uchar' }).toBuffer({ resolveWithObject: true }));
  const samples = deep
    ? new Uint16Array(data.buffer.slice(data.byteOffset, data.byteOffset + data.byteLength))
    : new Uint8Array(data.buffer, data.byteOffset, data.byteLength);
  return { width: info.width, height: info.height, channels: info.channels, samples };
}

/** An 8-bit RGB picture as PNG, as the encoder writes it. */
export const encodePng = (rgb: Uint8Array, width: number, height: number): Promise<Buffer> =>
  sharp(rgb, { raw: { width, height, channels: 3 }, limitInputPixels: MOST_PIXELS })
    .png({ compressionLevel: 6, palette: false })
    .toBuffer();
