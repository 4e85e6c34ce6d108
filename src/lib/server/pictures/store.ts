import { createHash, randomBytes } from 'node:crypto';
import { mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import { config } from '../config';

/** Where a file lies: by the SHA-256 of its bytes, in two levels of folders. */
const placeOf = (sha256: string) => path.join(config().uploadsFolder, sha256.slice(0, 2), sha256.slice(2, 4), sha256);

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Makes a folder so that it stays: every folder that got a new entry is synced. */
async function makeFolder(folder: string): Promise<void> {
  const first = await mkdir(folder, { recursive: true });
  if (first === undefined) return;
  for (let made = folder; made.length >= first.length; made = path.dirname(made)) await syncFolder(path.dirname(made));
}

/**
 * Keeps bytes under their own SHA-256 and answers when they are on the disk: written beside their place, synced,
 * renamed, the folder synced. The same bytes again are only looked at. A row may name them after this, not before.
 */
export async function keepFile(bytes: Uint8Array, sha256: string): Promise<void> {
  const place = placeOf(sha256);
  const there = await stat(place).catch(() => null);
  if (there?.size === bytes.byteLength) return;
  const folder = path.dirname(place);
  await makeFolder(folder);
  const draft = `${place}.${randomBytes(6).toString('hex')}.part`;
  const handle = await open(draft, 'wx', 0o640);
  try {
    await handle.writeFile(bytes);
    await handle.sync();
    await handle.close();
    await rename(draft, place);
    await syncFolder(folder);
  } catch (error) {
    await handle.close().catch(() => undefined);
    await rm(draft, { force: true });
    throw error;
  }
}

/** The bytes kept under a SHA-256; throws when they are gone or are not what they were. */
export async function readKept(sha256: string): Promise<Buffer> {
  const bytes = await readFile(placeOf(sha256));
  if (createHash('sha256').update(bytes).digest('hex') !== sha256) throw new Error(`The kept file ${sha256} is damaged.`);
  return bytes;
}
