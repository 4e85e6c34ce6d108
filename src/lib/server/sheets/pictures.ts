import { findPicture, readingStatesBesidePicture, type PictureRecord } from '@db';
import { can } from '@/lib/access';
import type { SignedInPerson } from '../people';
import { readKept } from '../pictures/store';
import { thumbnailOf } from '../pictures/thumbnail';
import { isSettled } from '../settled';
import { notFound } from '../refusal';

/** A picture this person may see; one that may not be seen is answered as one that is not there. */
async function pictureFor(actor: SignedInPerson, id: number): Promise<PictureRecord> {
  const picture = await findPicture(id);
  if (!picture) throw notFound('picture');
  if (can(actor, 'sheet.see')) return picture;
  const approved = (await readingStatesBesidePicture(id)).some(isSettled);
  if (!can(actor, 'sheet.see', { approved })) throw notFound('picture');
  return picture;
}

/** The bytes that are shown and measured, as PNG. */
export async function intakePng(actor: SignedInPerson, id: number): Promise<{ bytes: Buffer; picture: PictureRecord }> {
  const picture = await pictureFor(actor, id);
  return { bytes: await readKept(picture.pngSha256), picture };
}

/** The picture for lists, made when it is first asked for. */
export async function thumbnail(actor: SignedInPerson, id: number): Promise<{ make: () => Promise<Buffer>; picture: PictureRecord }> {
  const picture = await pictureFor(actor, id);
  return { picture, make: () => thumbnailOf(picture.pngSha256, () => readKept(picture.pngSha256)) };
}

/** The file as it was uploaded. */
export async function originalFile(actor: SignedInPerson, id: number): Promise<{ bytes: Buffer; picture: PictureRecord }> {
  const picture = await pictureFor(actor, id);
  return { bytes: await readKept(picture.fileSha256), picture };
}
