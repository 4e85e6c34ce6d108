const SIGNATURE = Buffer.from('\x89PNG\r\n\x1a\n', 'latin1');

export interface PngChunk {
  readonly type: string;
  readonly data: Buffer;
  /** Length, type, data and checksum as they stand in the file. */
  readonly whole: Buffer;
}

/** Chunks of a PNG in order, as far as they are whole. */
export function pngChunks(png: Uint8Array): PngChunk[] {
  const file = Buffer.from(png.buffer, png.byteOffset, png.byteLength);
  const chunks: PngChunk[] = [];
  let at = SIGNATURE.length;
  while (at + 12 <= file.length) {
    const end = at + 12 + file.readUInt32BE(at);
    if (end > file.length) break;
    chunks.push({ type: file.toString('latin1', at + 4, at + 8), data: file.subarray(at + 8, end - 4), whole: file.subarray(at, end) });
    at = end;
    if (chunks.at(-1)?.type === 'IEND') break;
  }
  return chunks;
}

const BARE = new Set(['IHDR', 'IDAT', 'IEND']);

/** The same PNG with nothing but header, pixels and end: no colour chunk can make a browser see other values than the file holds. */
export function barePng(png: Uint8Array): Buffer {
  const kept = pngChunks(png).filter(({ type }) => BARE.has(type));
  const header = kept[0]?.data;
  if (kept[0]?.type !== 'IHDR' || kept.at(-1)?.type !== 'IEND') throw new Error('A written PNG is not whole.');
  if (header?.[8] !== 8 || header[9] !== 2) throw new Error('A written PNG is not 8-bit RGB.');
  return Buffer.concat([SIGNATURE, ...kept.map(({ whole }) => whole)]);
}
