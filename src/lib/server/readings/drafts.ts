import {
  addEditor,
  addTrail,
  createReading,
  findPictures,
  inTransaction,
  listReadings,
  saveDocument,
  sheetsOfVendor,
  decisionsOf,
  findReading,
  type ReadingRecord,
} from '@db';
import { can } from '@/lib/access';
import type { CurrentVersion, ReadingRow, ReadingView, SaveAnswer } from '@/lib/contracts';
import { emptyDocument, type BenchDocument } from '@/lib/editor';
import { moduleById, moduleName, toModuleView } from '../parts';
import { requireCan, type SignedInPerson } from '../people';
import { conflict, lostRace, wrongInput } from '../refusal';
import { sheetById, toPageView } from '../sheets';
import { accessOf, readingFor, readingTo } from './access';

const EDITABLE = new Set(['draft', 'returned']);

const documentOf = (reading: ReadingRecord) => JSON.parse(reading.document) as BenchDocument;

/** Starts a draft of a module from a sheet of the same vendor. */
export async function startReading(actor: SignedInPerson, sheetId: number, moduleId: number): Promise<number> {
  requireCan(actor, 'reading.start');
  return inTransaction(async () => {
    const [sheet, module] = await Promise.all([sheetById(sheetId), moduleById(moduleId)]);
    if (sheet.vendor.id !== module.vendor.id)
      throw wrongInput({
        moduleId: `The sheet is ${sheet.vendor.name}’s and the module ${module.vendor.name}’s: choose a module of the same vendor.`,
      });
    const id = await createReading({ moduleId, sheetId, ownerId: actor.id, document: JSON.stringify(emptyDocument()) });
    await addEditor(id, actor.id);
    await addTrail({ userId: actor.id, action: 'started reading', object: `reading/${id}` });
    return id;
  });
}

export const toReadingRow = (reading: ReadingRecord): ReadingRow => {
  const { charts } = documentOf(reading);
  return {
    id: reading.id,
    module: moduleName(reading.module),
    vendor: reading.module.vendor.name,
    moduleId: reading.module.id,
    state: reading.state,
    owner: reading.owner,
    savedAt: reading.savedAt.toISOString(),
    charts: charts.length,
    curves: charts.reduce((sum, chart) => sum + chart.curves.length, 0),
  };
};

export async function ownReadings(actor: SignedInPerson): Promise<ReadingRow[]> {
  return (await listReadings({ ownerId: actor.id })).map(toReadingRow);
}

/** A reading with all that the bench and the evidence page show beside it. */
export async function readingView(actor: SignedInPerson, id: number): Promise<ReadingView> {
  const reading = await readingFor(actor, id);
  const [sheets, decisions] = await Promise.all([sheetsOfVendor(reading.module.vendor.id), decisionsOf([id])]);
  const object = accessOf(reading);
  const used = new Set(documentOf(reading).charts.map((chart) => chart.pictureId));
  const shown = can(actor, 'sheet.see') ? sheets : sheets.filter((sheet) => sheet.pages.some((page) => used.has(page.picture.id)));
  return {
    id,
    version: reading.version,
    state: reading.state,
    owner: reading.owner,
    module: toModuleView(reading.module),
    sheets: shown
      .sort((a, b) => Number(b.id === reading.sheetId) - Number(a.id === reading.sheetId))
      .map((sheet) => ({
        id: sheet.id,
        title: sheet.title,
        number: sheet.number,
        revision: sheet.revision,
        pages: sheet.pages.map(toPageView),
      })),
    document: documentOf(reading),
    savedAt: reading.savedAt.toISOString(),
    savedBy: reading.savedBy,
    reason: reading.state === 'returned' ? (decisions.findLast((decision) => decision.what === 'returned')?.reason ?? '') : null,
    decisions: decisions.map((decision) => ({ ...decision, at: decision.at.toISOString() })),
    may: {
      edit: EDITABLE.has(reading.state) && can(actor, 'reading.edit', object),
      handIn: EDITABLE.has(reading.state) && can(actor, 'reading.handIn', object),
      takeBack: reading.state === 'handed-in' && can(actor, 'reading.takeBack', object),
      decide: reading.state === 'handed-in' && can(actor, 'reading.decide', object),
    },
  };
}

const current = (reading: ReadingRecord): CurrentVersion => ({
  version: reading.version,
  document: documentOf(reading),
  savedAt: reading.savedAt.toISOString(),
  savedBy: reading.savedBy,
});

const saved = (reading: ReadingRecord): SaveAnswer => ({ version: reading.version, savedAt: reading.savedAt.toISOString() });

/** Charts may stand only on pictures that are there, in the very pixels that were measured. */
async function requirePictures(document: BenchDocument): Promise<number[]> {
  const ids = [...new Set(document.charts.map((chart) => chart.pictureId))];
  const pictures = new Map((await findPictures(ids)).map((picture) => [picture.id, picture]));
  document.charts.forEach((chart, at) => {
    const picture = pictures.get(chart.pictureId);
    if (picture?.pixelsSha256 !== chart.pixelsSha256 || picture.width !== chart.width || picture.height !== chart.height)
      throw wrongInput({
        [`document.charts[${at}].pictureId`]: 'This chart names a picture that is not here: add the chart again from a page of the sheet.',
      });
  });
  return ids;
}

/**
 * Saves a draft over the named version. The very document that is stored already is answered with its version, so
 * that a save whose answer was lost can be sent again; any other race is refused with the version that won.
 */
export async function saveReading(actor: SignedInPerson, id: number, version: number, document: BenchDocument): Promise<SaveAnswer> {
  const text = JSON.stringify(document);
  return inTransaction(async () => {
    const reading = await readingTo('reading.edit', actor, id);
    if (!EDITABLE.has(reading.state))
      throw conflict('This reading was handed in, so it rests. Take it back to go on with it.', 'not-a-draft');
    if (reading.document === text) return saved(reading);
    if (reading.version !== version) throw lostRace(current(reading));
    const pictureIds = await requirePictures(document);
    const done = await saveDocument({ id, version, document: text, pictureIds, userId: actor.id, state: 'draft' });
    if (!done) throw lostRace(current(await readingFor(actor, id)));
    const after = await findReading(id);
    return saved(after ?? reading);
  });
}
