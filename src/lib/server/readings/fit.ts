import pLimit from 'p-limit';
import { findPictures, type PictureRecord, type ReadingRecord } from '@db';
import { toReadingDocument, type BenchDocument, type Conversion } from '@/lib/editor';
import {
  parseReadingDocument,
  PictureRefused,
  readWithFit,
  ReadingRefused,
  type ReadingDocument,
  type ReadingModule,
  type ReadWithFit,
} from '@/lib/reading';
import type { ModuleRecord } from '@db';
import { wrongInput } from '../refusal';

/** Identity and ratings as the reading document writes them; what is not stated is left out. */
export function toReadingModule(module: ModuleRecord): ReadingModule {
  const stated = <T>(value: T | null | undefined) => value ?? undefined;
  return JSON.parse(
    JSON.stringify({
      vendor: module.vendor.name,
      partNumber: module.partNumber,
      variant: module.variant || undefined,
      stages: stated(module.stages),
      couples: stated(module.couples),
      coldPlateMm: stated(module.coldPlateMm),
      hotPlateMm: stated(module.hotPlateMm),
      heightMm: stated(module.heightMm),
      maxTemperatureC: stated(module.maxTemperatureC),
      leadsOhm: stated(module.leadsOhm),
      rated: module.ratings.map((rating) => Object.fromEntries(Object.entries(rating).filter(([, value]) => value !== null))),
      acResistanceOhm: stated(module.acResistanceOhm),
      acResistanceAtC: stated(module.acResistanceAtC),
    }),
  ) as ReadingModule;
}

/** File names for the pictures of a reading: their own, made distinct where two share one. */
export function imageNames(pictures: readonly PictureRecord[]): (id: number) => string {
  const taken = new Map<string, number>();
  for (const picture of [...pictures].sort((a, b) => a.id - b.id)) {
    const name = taken.has(picture.originalName) ? `${picture.id}-${picture.originalName}` : picture.originalName;
    taken.set(name, picture.id);
  }
  const names = new Map([...taken].map(([name, id]) => [id, name]));
  return (id) => names.get(id) ?? `picture-${id}`;
}

export interface FittedDraft {
  readonly conversion: Conversion;
  readonly document: ReadingDocument | null;
  readonly read: ReadWithFit | null;
  readonly pixelsSha256: readonly string[];
}

/** One fit at a time: each holds the process while it runs. */
const oneFit = pLimit(1);

/**
 * Reads and fits the finished charts of a draft, as the command would; saves nothing. What was handed in is fitted
 * again with the module as it was then: give it.
 */
export async function fitDraft(
  reading: ReadingRecord,
  draft: BenchDocument,
  module: ReadingModule = toReadingModule(reading.module),
): Promise<FittedDraft> {
  const pictures = await findPictures([...new Set(draft.charts.map((chart) => chart.pictureId))]);
  const nameOf = imageNames(pictures);
  const conversion = toReadingDocument(draft, module, nameOf);
  const { document } = conversion;
  if (!document) return { conversion, document, read: null, pixelsSha256: [] };
  const byName = new Map(pictures.map((picture) => [nameOf(picture.id), picture]));
  const parsed = parseReadingDocument(document);
  if (!parsed.ok) throw wrongInput({ [parsed.path]: parsed.message }, parsed.message);
  const read = await oneFit(() => readOrRefuse(parsed.document, byName));
  return { conversion, document, read, pixelsSha256: document.charts.map((chart) => byName.get(chart.image)?.pixelsSha256 ?? '') };
}

async function readOrRefuse(document: ReadingDocument, pictures: ReadonlyMap<string, PictureRecord>): Promise<ReadWithFit> {
  try {
    return await readWithFit(document, {
      picture: async (image) => {
        const picture = pictures.get(image);
        if (!picture) throw new PictureRefused('This picture is not here any more.');
        return picture;
      },
    });
  } catch (error) {
    if (error instanceof ReadingRefused) throw wrongInput({ [error.path]: error.message }, error.message);
    throw error;
  }
}
