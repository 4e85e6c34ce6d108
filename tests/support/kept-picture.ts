import type { PictureRecord } from '@db';
import type { SignedInPerson } from '@/lib/server/people';
import { intake } from '@/lib/server/pictures/intake';
import { keepFile } from '@/lib/server/pictures/store';
import { picture } from './database';
import { writePng } from './png-writer';

const WIDTH = 800;
const HEIGHT = 600;
let shade = 0;

/** A blank page of a shade of its own, taken in and kept as an upload is. */
export async function keptPicture(by: SignedInPerson): Promise<PictureRecord> {
  shade += 1;
  const row = new Uint8Array(WIDTH * 3).fill(255 - shade);
  const bytes = writePng({ width: WIDTH, height: HEIGHT, type: 'rgb', bits: 8, rows: Array.from({ length: HEIGHT }, () => row) });
  const { fileSha256, pngSha256, pixelsSha256, png, width, height, mediaType } = await intake(bytes);
  await keepFile(bytes, fileSha256);
  await keepFile(png, pngSha256);
  return picture(by, { fileSha256, pngSha256, pixelsSha256, width, height, mediaType, bytes: bytes.byteLength });
}
