import { createHash } from 'node:crypto';
import { copyFileSync, existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach } from 'vitest';
import {
  addPage,
  closeDatabase,
  createModule,
  createPerson,
  createPicture,
  createReading,
  createSheet,
  findModule,
  findPicture,
  findReading,
  inTransaction,
  migrate,
  openDatabase,
  saveDocument,
  vendorNamed,
  type ModuleRecord,
  type PictureRecord,
  type ReadingRecord,
} from '@db';
import type { Role } from '@/lib/access';
import type { ModuleBody } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import type { SignedInPerson } from '@/lib/server/people';
import { draftOf } from './drafts';

const inData = (name: string) => path.join(process.env.COUPLET_DATA ?? '', name);

/** Migrated once a process; copying is quicker than migrating and cannot forget to clean up. */
async function template(): Promise<string> {
  const file = inData('template.sqlite');
  if (existsSync(file)) return file;
  await openDatabase(file);
  await migrate();
  await closeDatabase();
  return file;
}

/** A fresh migrated database for every test of the file that calls this. */
export function useDatabase(): void {
  const file = inData('couplet.sqlite');
  beforeEach(async () => {
    copyFileSync(await template(), file);
    await openDatabase(file);
  });
  afterEach(async () => {
    await closeDatabase();
    rmSync(file, { force: true });
  });
}

const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');
let count = 0;
const next = () => ++count;

/** Somebody with these roles, as a use case gets them. */
export async function person(roles: readonly Role[], name = `Person ${next()}`): Promise<SignedInPerson> {
  const id = sha256(`${name}${next()}`).slice(0, 16);
  const email = `${name.toLowerCase().replace(/\W+/g, '.')}@kelda.example`;
  await createPerson({ id, name, email, roles, passwordHash: 'no password signs in with this' });
  return { id, name, email, roles };
}

/** A picture row. Its files are not there unless `stored` names kept ones. */
export async function picture(by: SignedInPerson, stored: Partial<PictureRecord> = {}): Promise<PictureRecord> {
  const seed = String(next());
  const id = await createPicture({
    fileSha256: sha256(`file ${seed}`),
    pngSha256: sha256(`png ${seed}`),
    pixelsSha256: sha256(`pixels ${seed}`),
    originalName: `page-${seed}.png`,
    mediaType: 'image/png',
    bytes: 1000,
    width: 800,
    height: 600,
    notes: [],
    createdBy: by.id,
    ...stored,
  });
  return (await findPicture(id))!;
}

/** A sheet with this picture as its only page. */
export async function sheet(by: SignedInPerson, page: PictureRecord, vendor = 'Ormsund Cold'): Promise<number> {
  return inTransaction(async () => {
    const { id: vendorId } = await vendorNamed(vendor);
    const title = `Sheet ${next()}`;
    const made = await createSheet(vendorId, by.id, {
      title,
      number: 'OC-118',
      revision: 'B',
      dated: '2026-03',
      obtainedFrom: '',
      obtainedOn: '',
    });
    await addPage(made, page.id, 'page 1');
    return made;
  });
}

const NOT_STATED: Omit<ModuleBody, 'vendor' | 'partNumber'> = {
  variant: '',
  stages: 1,
  couples: 127,
  coldPlateMm: null,
  hotPlateMm: null,
  heightMm: null,
  maxTemperatureC: null,
  leadsOhm: null,
  sealing: null,
  acResistanceOhm: null,
  acResistanceAtC: null,
  ratings: [],
};

/** A module of the vendor, with what is given of it stated. */
export async function module(stated: Partial<ModuleBody> = {}): Promise<ModuleRecord> {
  return inTransaction(async () => {
    const body: ModuleBody = { ...NOT_STATED, vendor: 'Ormsund Cold', partNumber: `Brimstead ${next()}`, ...stated };
    const { id: vendorId } = await vendorNamed(body.vendor);
    return (await findModule(await createModule(vendorId, body)))!;
  });
}

/** A draft with two finished charts, whose points were saved by its owner. */
export async function reading(
  owner: SignedInPerson,
  given: { readonly of?: ModuleRecord; readonly page?: PictureRecord; readonly document?: BenchDocument } = {},
): Promise<ReadingRecord> {
  const page = given.page ?? (await picture(owner));
  const of = given.of ?? (await module());
  const sheetId = await sheet(owner, page, of.vendor.name);
  const document = JSON.stringify(given.document ?? draftOf(page));
  return inTransaction(async () => {
    const id = await createReading({ moduleId: of.id, sheetId, ownerId: owner.id, document: '{}' });
    await saveDocument({ id, version: 1, document, pictureIds: [page.id], userId: owner.id, state: 'draft' });
    return (await findReading(id))!;
  });
}
