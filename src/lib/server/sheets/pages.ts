import {
  addPage,
  addTrail,
  createPicture,
  findPage,
  findPictureByFile,
  inTransaction,
  readingStatesWithPicture,
  removePage,
  sheetsWithPicture,
  type PictureRecord,
} from '@db';
import pLimit from 'p-limit';
import type { UploadAnswer } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { intake, IntakeRefused, type IntakePicture } from '../pictures/intake';
import { keepFile } from '../pictures/store';
import type { UploadedFile } from '../http';
import { conflict, notFound, Refusal } from '../refusal';
import { sheetById } from './sheets';
import { sheetName, toPageView } from './views';

/** A decoded picture of 40 megapixels holds 160 MB: so many at once, and so many waiting. */
const PARALLEL_INTAKES = 2;
const LONGEST_QUEUE = 16;
const inTurn = pLimit(PARALLEL_INTAKES);

const busy = () =>
  new Refusal(503, 'busy', 'Many pictures are being taken in just now. Wait a moment and send this one again.', {
    headers: { 'Retry-After': '5' },
  });

async function takeIn(file: UploadedFile): Promise<IntakePicture> {
  if (inTurn.pendingCount >= LONGEST_QUEUE) throw busy();
  try {
    return await inTurn(() => intake(file.bytes));
  } catch (error) {
    if (error instanceof IntakeRefused) throw new Refusal(422, 'picture-refused', error.message);
    throw error;
  }
}

/** Both files are on the disk before a row names them; the same file twice is one picture. */
async function keepPicture(actor: SignedInPerson, file: UploadedFile): Promise<Omit<PictureRecord, 'id'>> {
  const picture = await takeIn(file);
  await keepFile(file.bytes, picture.fileSha256);
  await keepFile(picture.png, picture.pngSha256);
  return {
    fileSha256: picture.fileSha256,
    pngSha256: picture.pngSha256,
    pixelsSha256: picture.pixelsSha256,
    originalName: file.name,
    mediaType: picture.mediaType,
    bytes: file.bytes.byteLength,
    width: picture.width,
    height: picture.height,
    notes: picture.notes,
    createdBy: actor.id,
  };
}

const labelOf = (name: string) => name.replace(/\.[a-z0-9]{1,5}$/i, '');

const cancelled = () => new Refusal(400, 'cancelled', 'The upload was cancelled, and nothing of it was kept on the sheet.');

/**
 * Takes a picture in as the next page of a sheet; says which other sheets hold the very same file.
 * Whoever has gone away (`signal`) while the picture was taken in gets no page.
 */
export async function uploadPage(actor: SignedInPerson, sheetId: number, file: UploadedFile, signal?: AbortSignal): Promise<UploadAnswer> {
  requireCan(actor, 'sheet.upload');
  await sheetById(sheetId);
  const picture = await keepPicture(actor, file);
  if (signal?.aborted) throw cancelled();
  const { pageId, pictureId } = await inTransaction(async () => {
    const there = await findPictureByFile(picture.fileSha256);
    const pictureId = there?.id ?? (await createPicture(picture));
    const pageId = await addPage(sheetId, pictureId, labelOf(file.name));
    await addTrail({ userId: actor.id, action: 'uploaded page', object: `sheet/${sheetId}`, detail: { picture: picture.fileSha256 } });
    return { pageId, pictureId };
  });
  const page = await findPage(sheetId, pageId);
  if (!page) throw notFound('page');
  const others = (await sheetsWithPicture(pictureId)).filter((sheet) => sheet.id !== sheetId);
  return { page: toPageView(page), already: others.map((sheet) => ({ sheetId: sheet.id, sheet: sheetName(sheet) })) };
}

/** Takes a page off its sheet, unless a reading stands on it. The picture itself is kept. */
export async function takePageOff(actor: SignedInPerson, sheetId: number, pageId: number): Promise<void> {
  requireCan(actor, 'sheet.edit');
  await inTransaction(async () => {
    const page = await findPage(sheetId, pageId);
    if (!page) throw notFound('page');
    const readings = await readingStatesWithPicture(page.picture.id);
    if (readings.length > 0) throw conflict('A reading stands on this page, so it stays. Remove its charts from the reading first.');
    await removePage(pageId);
    await addTrail({ userId: actor.id, action: 'removed page', object: `sheet/${sheetId}`, detail: { picture: page.picture.fileSha256 } });
  });
}
