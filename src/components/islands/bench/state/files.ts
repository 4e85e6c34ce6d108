import { benchDocument, fromReadingDocument, toReadingDocument, type BenchDocument, type ChartProblem, type Imported } from '@/lib/editor';
import { parseReadingDocument, type ReadingModule } from '@/lib/reading';
import type { ModuleView, ReadingView } from '@/lib/contracts';
import type { BenchPage } from './tools';

/** Hands a file to the person, made in the browser. */
export function download(name: string, content: unknown): void {
  const url = URL.createObjectURL(new Blob([`${JSON.stringify(content, null, 1)}\n`], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

const stem = (module: ModuleView): string =>
  `${module.vendor.name} ${module.partNumber}`
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');

const stated = <T extends object>(fields: T): Partial<T> =>
  Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== null && value !== '')) as Partial<T>;

/** Identity and ratings as a reading document holds them: what is not stated is left out. */
const moduleOf = (module: ModuleView): ReadingModule => {
  const {
    partNumber,
    variant,
    stages,
    couples,
    coldPlateMm,
    hotPlateMm,
    heightMm,
    maxTemperatureC,
    leadsOhm,
    acResistanceOhm,
    acResistanceAtC,
  } = module;
  const identity = stated({
    variant,
    stages,
    couples,
    coldPlateMm,
    hotPlateMm,
    heightMm,
    maxTemperatureC,
    leadsOhm,
    acResistanceOhm,
    acResistanceAtC,
  });
  const rated = module.ratings.map((rating) => stated(rating));
  return { vendor: module.vendor.name, partNumber, ...identity, ...(rated.length > 0 && { rated }) } as ReadingModule;
};

/** The file names of the pages' pictures, made distinct where two share one, as the server makes them. */
function pictureNames(pages: readonly BenchPage[]): ReadonlyMap<string, BenchPage> {
  const named = new Map<string, BenchPage>();
  for (const page of pages.toSorted((a, b) => a.picture.id - b.picture.id)) {
    const { id, name } = page.picture;
    named.set(named.has(name) ? `${id}-${name}` : name, page);
  }
  return named;
}

/** The draft as it is, whatever is unfinished in it. */
export const downloadDraft = (reading: ReadingView, draft: BenchDocument): void => download(`${stem(reading.module)}.draft.json`, draft);

/** The finished charts as a reading document that the command line reads; gives back what keeps other charts out. */
export function downloadReading(reading: ReadingView, draft: BenchDocument, pages: readonly BenchPage[]): readonly ChartProblem[] {
  const names = new Map([...pictureNames(pages)].map(([name, { picture }]) => [picture.id, name]));
  const { document, problems } = toReadingDocument(draft, moduleOf(reading.module), (id) => names.get(id) ?? `picture-${id}`);
  if (document) download(`${stem(reading.module)}.reading.json`, document);
  return problems;
}

/** A draft from the text of a file: a reading document, or a draft that was downloaded here. */
export function readFile(text: string, pages: readonly BenchPage[]): Imported {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    return { ok: false, message: 'This file is not JSON: choose a reading or a draft that was downloaded from a bench.' };
  }
  if ((json as { format?: unknown } | null)?.format === 'couplet.bench') return readDraft(json, pages);
  const parsed = parseReadingDocument(json);
  if (!parsed.ok) return { ok: false, message: `${parsed.path ? `${parsed.path}: ` : ''}${parsed.message}` };
  const named = pictureNames(pages);
  return fromReadingDocument(parsed.document, (image) => named.get(image)?.picture ?? null);
}

function readDraft(json: unknown, pages: readonly BenchPage[]): Imported {
  const parsed = benchDocument.safeParse(json);
  if (!parsed.success) return { ok: false, message: 'This draft has been changed since it was downloaded and cannot be read any more.' };
  const known = parsed.data.charts.every((chart) => pages.some(({ picture }) => picture.id === chart.pictureId));
  return known
    ? { ok: true, document: parsed.data }
    : { ok: false, message: 'This draft was made on pictures that these sheets do not have: upload them first.' };
}
