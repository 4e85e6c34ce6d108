import { z } from 'zod';
import { idParams, instant, isoDate, line, printedDate, readingState, rowId, sha256 } from './common';

const between = (what: string, unit: string, min: number, max: number) => {
  const sentence = `${what} must be between ${min} and ${max}\u00A0${unit}.`;
  return z.number(`${what} must be a number, like 2.5.`).min(min, sentence).max(max, sentence);
};

export const IMAX_MEANINGS = ['largestDeltaT', 'mostHeat', 'allowed', 'notStated'] as const;
export const BASES = ['typical', 'minimum', 'calculated', 'measured', 'notStated'] as const;
export const ATMOSPHERES = ['vacuum', 'dryNitrogen', 'air', 'notStated'] as const;

/** Ratings as printed for one hot side; null is "not stated". */
export const rating = z.strictObject({
  hotSideC: between('The hot side', '°C', -100, 400),
  imaxA: between('Imax', 'A', 0.001, 1000).nullable(),
  vmaxV: between('Vmax', 'V', 0.001, 1000).nullable(),
  qmaxW: between('Qmax', 'W', 0.0001, 10000).nullable(),
  dTmaxK: between('ΔTmax', 'K', 1, 250).nullable(),
  imaxMeans: z.enum(IMAX_MEANINGS).default('notStated'),
  basis: z.enum(BASES).default('notStated'),
  atmosphere: z.enum(ATMOSPHERES).default('notStated'),
  tolerancePercent: between('The tolerance', '%', 0, 100).nullable(),
});
export type Rating = z.infer<typeof rating>;

const plate = z.tuple([between('The plate width', 'mm', 0.5, 500), between('The plate depth', 'mm', 0.5, 500)]).nullable();

/** What a module is, apart from who makes it; null is "not stated". */
export const moduleIdentity = z.strictObject({
  partNumber: line(80).min(1, 'Enter the part number as printed.'),
  variant: line(80).default(''),
  stages: z
    .int('Stages must be a whole number, like 1.')
    .min(1, 'A module has at least one stage.')
    .max(8, 'A module has at most eight stages here.')
    .nullable(),
  couples: z
    .int('Couples must be a whole number, like 127.')
    .min(1, 'A module has at least one couple.')
    .max(5000, 'Couples must be at most 5000.')
    .nullable(),
  coldPlateMm: plate,
  hotPlateMm: plate,
  heightMm: between('The height', 'mm', 0.1, 200).nullable(),
  maxTemperatureC: between('The highest temperature', '°C', 0, 500).nullable(),
  leadsOhm: between('The lead resistance', 'Ω', 0, 10).nullable(),
  sealing: line(80).nullable(),
  acResistanceOhm: between('The AC resistance', 'Ω', 0.0001, 10000).nullable(),
  acResistanceAtC: between('The temperature of the AC resistance', '°C', -100, 400).nullable(),
});
export type ModuleIdentity = z.infer<typeof moduleIdentity>;

const ratings = z
  .array(rating)
  .max(12, 'Keep at most twelve hot sides.')
  .refine((rows) => new Set(rows.map((row) => row.hotSideC)).size === rows.length, 'Two rows name the same hot side: keep one.');

export const moduleBody = moduleIdentity.extend({ vendor: line(120).min(1, 'Enter the vendor as printed.'), ratings });
export type ModuleBody = z.infer<typeof moduleBody>;

export const vendorView = z.strictObject({ id: rowId, name: z.string(), modules: z.int() });
export type VendorView = z.infer<typeof vendorView>;

export const moduleView = moduleIdentity.extend({
  id: rowId,
  vendor: z.strictObject({ id: rowId, name: z.string() }),
  ratings: z.array(rating),
  version: z.int(),
});
export type ModuleView = z.infer<typeof moduleView>;

export const pictureView = z.strictObject({
  id: rowId,
  name: z.string().describe('file name as uploaded'),
  mediaType: z.string(),
  bytes: z.int(),
  width: z.int(),
  height: z.int(),
  fileSha256: sha256,
  pixelsSha256: sha256,
  notes: z.array(z.string()).describe('what intake changed, in sentences'),
  url: z.string(),
});
export type PictureView = z.infer<typeof pictureView>;

export const pageView = z.strictObject({ id: rowId, label: z.string(), picture: pictureView });
export type PageView = z.infer<typeof pageView>;

export const sheetBody = z.strictObject({
  vendor: line(120).min(1, 'Enter the vendor as printed.'),
  title: line(160).default(''),
  number: line(80).default(''),
  revision: line(40).default(''),
  dated: printedDate.default(''),
  obtainedFrom: line(300).default(''),
  obtainedOn: isoDate.default(''),
});
export type SheetBody = z.infer<typeof sheetBody>;

export const sheetView = sheetBody.extend({
  id: rowId,
  vendorId: rowId,
  pages: z.array(pageView),
  readings: z.array(
    z.strictObject({ id: rowId, moduleId: rowId, module: z.string(), state: readingState, ownerId: z.string(), owner: z.string() }),
  ),
  version: z.int(),
  createdAt: instant,
});
export type SheetView = z.infer<typeof sheetView>;

export const sheetRow = z.strictObject({
  id: rowId,
  vendorId: rowId,
  vendor: z.string(),
  title: z.string(),
  number: z.string(),
  revision: z.string(),
  dated: z.string(),
  pages: z.int(),
  readings: z.int(),
  modules: z.array(z.string()).describe('modules that are read from it'),
  createdAt: instant,
});
export type SheetRow = z.infer<typeof sheetRow>;

export const sheetsQuery = z.strictObject({
  q: line(200).default('').describe('words that must all occur in vendor, title, number, revision, date or a module read from it'),
});

/** A vendor's module with what may be done with it. */
export const vendorModule = moduleView.extend({
  approved: z.boolean().describe('has an approved model in the catalogue'),
  mayEdit: z.boolean(),
});
export type VendorModule = z.infer<typeof vendorModule>;

export const vendorDetail = z.strictObject({
  id: rowId,
  name: z.string(),
  modules: z.array(vendorModule),
  sheets: z.array(sheetRow).describe('those that may be seen'),
});
export type VendorDetail = z.infer<typeof vendorDetail>;

export const pageParams = idParams.extend({ page: rowId });

export const uploadAnswer = z.strictObject({
  page: pageView,
  already: z.array(z.strictObject({ sheetId: rowId, sheet: z.string() })).describe('other sheets that already hold this very file'),
});
export type UploadAnswer = z.infer<typeof uploadAnswer>;

export const startReadingBody = z.strictObject({ moduleId: rowId });
