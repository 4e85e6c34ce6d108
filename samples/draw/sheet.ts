import type { ReadingDocument } from '@/lib/reading';
import { CLICK_PX, MARK_PX } from './clicks';
import { drawFront } from './front';
import { drawPicture } from './picture';
import type { Made, ModulePlan, SheetPlan } from './plan';
import { moduleBody, readingModule } from './printed';
import { makeTruth } from './truth';

export interface DrawnFile {
  readonly name: string;
  /** What a person would call the page. */
  readonly title: string;
  readonly bytes: Buffer;
}

/** A reading that a careful person would make of one module of a sheet. */
export interface DrawnReading {
  readonly name: string;
  readonly made: Made;
  readonly document: ReadingDocument;
}

export interface DrawnSheet {
  readonly plan: SheetPlan;
  readonly pictures: readonly DrawnFile[];
  readonly readings: readonly DrawnReading[];
}

export const slugOf = (...words: readonly (string | undefined)[]): string =>
  words
    .filter(Boolean)
    .join(' ')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-');

/** A module of the plan with its truth and its printed identity. */
export function makeModule(vendor: string, plan: ModulePlan): Made {
  const slug = slugOf(plan.partNumber, plan.variant);
  const { couples, legMm, plateMm, aimK, ratedAt } = plan;
  const truth = makeTruth({ seed: slug, couples, legMm, plateMm, aimK, aimAtC: ratedAt[0] ?? 27 });
  return { slug, plan, truth, body: moduleBody(vendor, plan, truth) };
}

const NOTE =
  `Simulated clicks with ${CLICK_PX} px of scatter on curves and ${MARK_PX} px on marks, seeded: the pixels follow from the drawing, ` +
  'so that this reading is like one that a careful person made by hand.';

async function drawModule(made: Made, sheet: SheetPlan) {
  const pictures = await Promise.all(made.plan.pictures(made).map((picture) => drawPicture(made, picture, sheet.style)));
  const document: ReadingDocument = {
    format: 'couplet.reading',
    version: 1,
    module: readingModule(made.body),
    charts: pictures.flatMap(({ charts }) => charts),
    model: { form: 'auto', use: ['curves'] },
    note: NOTE,
  };
  const files = pictures.map(({ file, title, bytes }) => ({ name: file, title, bytes }));
  return { files, reading: { name: `${made.slug}.reading.json`, made, document } };
}

/** Draws a whole sheet: its front page, every picture of its modules, and a reading of each module. */
export async function drawSheet(sheet: SheetPlan): Promise<DrawnSheet> {
  const modules = sheet.modules.map((plan) => makeModule(sheet.body.vendor, plan));
  const front = await drawFront(sheet, modules);
  const drawn = [];
  for (const made of modules) drawn.push(await drawModule(made, sheet));
  return {
    plan: sheet,
    pictures: [front, ...drawn.flatMap(({ files }) => files)],
    readings: drawn.map(({ reading }) => reading),
  };
}

/** JSON with one key a line but pairs of numbers kept together; the same document gives the same text. */
export const toJson = (value: unknown): string =>
  `${JSON.stringify(value, null, 1).replace(/\[\s+(-?[\d.e+-]+),\s+(-?[\d.e+-]+)\s+\]/g, '[$1, $2]')}\n`;
