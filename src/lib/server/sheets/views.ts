import type { PageRecord, PictureRecord, ReadingOfSheet, SheetRecord, SheetSummary } from '@db';
import type { PageView, PictureView, SheetRow, SheetView } from '@/lib/contracts';

export const pictureUrl = (id: number) => `/api/pictures/${id}`;

export const toPictureView = (picture: PictureRecord): PictureView => ({
  id: picture.id,
  name: picture.originalName,
  mediaType: picture.mediaType,
  bytes: picture.bytes,
  width: picture.width,
  height: picture.height,
  fileSha256: picture.fileSha256,
  pixelsSha256: picture.pixelsSha256,
  notes: [...picture.notes],
  url: pictureUrl(picture.id),
});

export const toPageView = (page: PageRecord): PageView => ({ id: page.id, label: page.label, picture: toPictureView(page.picture) });

export const toSheetView = (sheet: SheetRecord, readings: readonly ReadingOfSheet[]): SheetView => ({
  id: sheet.id,
  vendor: sheet.vendor.name,
  vendorId: sheet.vendor.id,
  title: sheet.title,
  number: sheet.number,
  revision: sheet.revision,
  dated: sheet.dated,
  obtainedFrom: sheet.obtainedFrom,
  obtainedOn: sheet.obtainedOn,
  pages: sheet.pages.map(toPageView),
  readings: readings.map((reading) => ({ ...reading })),
  version: sheet.version,
  createdAt: sheet.createdAt.toISOString(),
});

export const toSheetRow = (sheet: SheetSummary): SheetRow => ({
  id: sheet.id,
  vendorId: sheet.vendor.id,
  vendor: sheet.vendor.name,
  title: sheet.title,
  number: sheet.number,
  revision: sheet.revision,
  dated: sheet.dated,
  pages: sheet.pages,
  readings: sheet.readings.length,
  modules: [...new Set(sheet.readings.map((reading) => reading.module))],
  createdAt: sheet.createdAt.toISOString(),
});

/** How a sheet is named where there is room for one line. */
export const sheetName = (sheet: { readonly title: string; readonly number: string; readonly revision?: string; readonly id: number }) => {
  const number = [sheet.number, sheet.revision && `rev. ${sheet.revision}`].filter(Boolean).join(', ');
  return [sheet.title, number].filter(Boolean).join(' · ') || `sheet ${sheet.id}`;
};
