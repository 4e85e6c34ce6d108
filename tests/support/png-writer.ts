import { crc32, deflateSync } from 'node:zlib';

/** Sample layout of a PNG: the colour type of its header. */
export const COLOUR_TYPE = { grey: 0, rgb: 2, palette: 3, greyAlpha: 4, rgba: 6 } as const;

export interface PngPlan {
  readonly width: number;
  readonly height: number;
  readonly type: keyof typeof COLOUR_TYPE;
  readonly bits: 1 | 2 | 4 | 8 | 16;
  /** Packed samples of each row, without filter bytes. */
  readonly rows: readonly Uint8Array[];
  /** Chunks between header and pixels, [type, data]. */
  readonly before?: readonly (readonly [string, Uint8Array])[];
}

export function pngChunk(type: string, data: Uint8Array): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const [length, sum] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(data.length);
  sum.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, sum]);
}

export function pngHeader(width: number, height: number, bits: number, type: keyof typeof COLOUR_TYPE): Buffer {
  const data = Buffer.alloc(13);
  data.writeUInt32BE(width, 0);
  data.writeUInt32BE(height, 4);
  data[8] = bits;
  data[9] = COLOUR_TYPE[type];
  return pngChunk('IHDR', data);
}

export const PNG_SIGNATURE = Buffer.from('\x89PNG\r\n\x1a\n', 'latin1');

/** Writes a PNG with no filter, so that odd sample layouts and chunks can be tried. */
export function writePng({ width, height, type, bits, rows, before = [] }: PngPlan): Buffer {
  const scan = Buffer.concat(rows.flatMap((row) => [Buffer.of(0), row]));
  return Buffer.concat([
    PNG_SIGNATURE,
    pngHeader(width, height, bits, type),
    ...before.map(([name, data]) => pngChunk(name, data)),
    pngChunk('IDAT', deflateSync(scan)),
    pngChunk('IEND', Buffer.alloc(0)),
  ]);
}

/** 32-bit big-endian numbers, as gAMA and cHRM hold them. */
export function uint32s(...values: readonly number[]): Buffer {
  const data = Buffer.alloc(4 * values.length);
  values.forEach((value, at) => data.writeUInt32BE(value, 4 * at));
  return data;
}
