import { Op } from 'sequelize';
import type { SheetBody } from '@/lib/contracts';
import { Module, Page, Picture, Reading, ReadingPicture, Sheet, User, Vendor, type ReadingState } from '../models';

export interface PictureRecord {
  readonly id: number;
  readonly fileSha256: string;
  readonly pngSha256: string;
  readonly pixelsSha256: string;
  readonly originalName: string;
  readonly mediaType: string;
  readonly bytes: number;
  readonly width: number;
  readonly height: number;
  readonly notes: readonly string[];
  readonly createdBy: string;
}

export interface PageRecord {
  readonly id: number;
  readonly label: string;
  readonly picture: PictureRecord;
}

export interface SheetRecord extends Omit<SheetBody, 'vendor'> {
  readonly id: number;
  readonly vendor: { readonly id: number; readonly name: string };
  readonly pages: readonly PageRecord[];
  readonly createdBy: string;
  readonly version: number;
  readonly createdAt: Date;
}

/** A sheet in a list: how many pages it has and what is read from it. */
export interface SheetSummary extends Omit<SheetRecord, 'pages'> {
  readonly pages: number;
  readonly readings: readonly { readonly module: string; readonly state: ReadingState }[];
}

export interface ReadingOfSheet {
  readonly id: number;
  readonly moduleId: number;
  readonly module: string;
  readonly state: ReadingState;
  readonly ownerId: string;
  readonly owner: string;
}

const toPicture = (row: Picture): PictureRecord => ({
  id: row.id,
  fileSha256: row.fileSha256,
  pngSha256: row.pngSha256,
  pixelsSha256: row.pixelsSha256,
  originalName: row.originalName,
  mediaType: row.mediaType,
  bytes: row.bytes,
  width: row.width,
  height: row.height,
  notes: JSON.parse(row.notes) as string[],
  createdBy: row.createdBy,
});

const toPage = (row: Page): PageRecord => ({ id: row.id, label: row.label, picture: toPicture(row.picture!) });

const toSheet = (row: Sheet): SheetRecord => ({
  id: row.id,
  vendor: { id: row.vendorId, name: row.vendor?.name ?? '' },
  title: row.title ?? '',
  number: row.number ?? '',
  revision: row.revision ?? '',
  dated: row.dated ?? '',
  obtainedFrom: row.obtainedFrom ?? '',
  obtainedOn: row.obtainedOn ?? '',
  pages: [...(row.pages ?? [])].sort((a, b) => a.position - b.position).map(toPage),
  createdBy: row.createdBy,
  version: row.version,
  createdAt: row.createdAt,
});

const whole = {
  include: [
    { model: Vendor, as: 'vendor' },
    { model: Page, as: 'pages', include: [{ model: Picture, as: 'picture' }] },
  ],
};

const partName = (module: Module | undefined) => [module?.partNumber, module?.variant].filter(Boolean).join(' ');

/** Sheets, newest first, without their pictures. */
export async function listSheets(where: { readonly vendorId?: number } = {}): Promise<SheetSummary[]> {
  const rows = await Sheet.findAll({
    where,
    include: [{ model: Vendor, as: 'vendor' }],
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
  });
  const among = { sheetId: { [Op.in]: rows.map((row) => row.id) } };
  const [pages, readings] = await Promise.all([
    Page.findAll({ where: among, attributes: ['sheetId'] }),
    Reading.findAll({ where: among, attributes: ['id', 'sheetId', 'state'], include: [{ model: Module, as: 'module' }] }),
  ]);
  return rows.map((row) => ({
    ...toSheet(row),
    pages: pages.filter((page) => page.sheetId === row.id).length,
    readings: readings.filter((reading) => reading.sheetId === row.id).map(({ module, state }) => ({ module: partName(module), state })),
  }));
}

export async function findSheet(id: number): Promise<SheetRecord | null> {
  const row = await Sheet.findByPk(id, whole);
  return row && toSheet(row);
}

export async function sheetsOfVendor(vendorId: number): Promise<SheetRecord[]> {
  return (await Sheet.findAll({ where: { vendorId }, ...whole, order: ['id'] })).map(toSheet);
}

export async function createSheet(vendorId: number, createdBy: string, body: Omit<SheetBody, 'vendor'>): Promise<number> {
  return (await Sheet.create({ ...body, vendorId, createdBy })).id;
}

export async function updateSheet(id: number, version: number, vendorId: number, body: Omit<SheetBody, 'vendor'>): Promise<boolean> {
  const [changed] = await Sheet.update({ ...body, vendorId, version: version + 1 }, { where: { id, version } });
  return changed === 1;
}

export async function readingsOfSheet(sheetId: number): Promise<ReadingOfSheet[]> {
  const rows = await Reading.findAll({
    where: { sheetId },
    attributes: ['id', 'moduleId', 'state', 'ownerId'],
    include: [
      { model: Module, as: 'module' },
      { model: User, as: 'owner' },
    ],
    order: ['id'],
  });
  return rows.map((row) => ({
    id: row.id,
    moduleId: row.moduleId,
    module: partName(row.module),
    state: row.state,
    ownerId: row.ownerId,
    owner: row.owner?.name ?? '',
  }));
}

export async function findPicture(id: number): Promise<PictureRecord | null> {
  const row = await Picture.findByPk(id);
  return row && toPicture(row);
}

export async function findPictures(ids: readonly number[]): Promise<PictureRecord[]> {
  return (await Picture.findAll({ where: { id: { [Op.in]: [...ids] } } })).map(toPicture);
}

/** Pictures by number, from the one after `id` on. */
export async function picturesAfter(id: number, limit: number): Promise<PictureRecord[]> {
  return (await Picture.findAll({ where: { id: { [Op.gt]: id } }, order: ['id'], limit })).map(toPicture);
}

export async function findPictureByFile(fileSha256: string): Promise<PictureRecord | null> {
  const row = await Picture.findOne({ where: { fileSha256 } });
  return row && toPicture(row);
}

export async function createPicture(picture: Omit<PictureRecord, 'id'>): Promise<number> {
  return (await Picture.create({ ...picture, notes: JSON.stringify(picture.notes) })).id;
}

export const countPicturesOf = (createdBy: string): Promise<number> => Picture.count({ where: { createdBy } });

/** Sheets that hold a picture. */
export async function sheetsWithPicture(pictureId: number): Promise<{ id: number; title: string; number: string }[]> {
  const pages = await Page.findAll({ where: { pictureId }, attributes: ['sheetId'] });
  const sheets = await Sheet.findAll({ where: { id: { [Op.in]: pages.map((page) => page.sheetId) } }, order: ['id'] });
  return sheets.map(({ id, title, number }) => ({ id, title: title ?? '', number: number ?? '' }));
}

export async function findPage(sheetId: number, id: number): Promise<PageRecord | null> {
  const row = await Page.findOne({ where: { id, sheetId }, include: [{ model: Picture, as: 'picture' }] });
  return row && toPage(row);
}

/** Adds a picture as the last page of a sheet; the page it already is, when it is one. */
export async function addPage(sheetId: number, pictureId: number, label: string): Promise<number> {
  const there = await Page.findOne({ where: { sheetId, pictureId } });
  if (there) return there.id;
  const last = ((await Page.max('position', { where: { sheetId } })) as number | null) ?? 0;
  return (await Page.create({ sheetId, pictureId, position: last + 1, label })).id;
}

export async function removePage(id: number): Promise<void> {
  await Page.destroy({ where: { id } });
}

/** States of the readings that stand on a picture, or on a sheet that holds it. */
export async function readingStatesBesidePicture(pictureId: number): Promise<ReadingState[]> {
  const pages = await Page.findAll({ where: { pictureId }, attributes: ['sheetId'] });
  const rows = await Reading.findAll({ where: { sheetId: { [Op.in]: pages.map((page) => page.sheetId) } }, attributes: ['state'] });
  return [...(await readingStatesWithPicture(pictureId)), ...rows.map((row) => row.state)];
}

/** States of the readings that stand on a picture. */
export async function readingStatesWithPicture(pictureId: number): Promise<ReadingState[]> {
  const links = await ReadingPicture.findAll({ where: { pictureId } });
  const rows = await Reading.findAll({ where: { id: { [Op.in]: links.map((link) => link.readingId) } }, attributes: ['state'] });
  return rows.map((row) => row.state);
}
