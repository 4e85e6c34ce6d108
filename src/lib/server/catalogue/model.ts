import {
  approvedReadingOf,
  decisionsOf,
  findPictures,
  latestModel,
  listReadings,
  sheetsOfVendor,
  type DecisionRecord,
  type ReadingRecord,
  type SheetRecord,
} from '@db';
import { can } from '@/lib/access';
import type { DecisionView, ModuleModel } from '@/lib/contracts';
import { evenCurrents } from '@/lib/duty';
import type { BenchDocument } from '@/lib/editor';
import type { ReadingDocument, ReadingResult } from '@/lib/reading';
import { moduleById, toModuleView } from '../parts';
import { requireCan, type SignedInPerson } from '../people';
import { toPictureView } from '../sheets';
import { accessOf } from '../readings';
import { notFound } from '../refusal';
import { approvedAt, drawnCurrents, drawnHotSides, toCandidateModel } from './entries';

/** What everybody may know of a reading's way; the rest is between those who read and those who check. */
const OPEN_DECISIONS = new Set(['approved', 'superseded', 'withdrawn', 'restored']);
const MOST_CURVES = 8;

const toView = (decision: DecisionRecord): DecisionView => ({ ...decision, at: decision.at.toISOString() });

/** What happened to a module's readings, newest first, as far as this person may know it. */
export async function moduleHistory(actor: SignedInPerson, moduleId: number): Promise<DecisionView[]> {
  requireCan(actor, 'catalogue.see');
  const readings = (await listReadings({ moduleId })).filter((reading) => can(actor, 'reading.see', accessOf(reading)));
  const decisions = await decisionsOf(readings.map(({ id }) => id));
  const seesAll = can(actor, 'reading.see');
  return decisions
    .filter(({ what }) => seesAll || OPEN_DECISIONS.has(what))
    .map(toView)
    .reverse();
}

async function evidencePictures(reading: ReadingRecord, sheets: readonly SheetRecord[]): Promise<ModuleModel['pictures']> {
  const { charts } = JSON.parse(reading.document) as BenchDocument;
  const used = [...new Set(charts.map(({ pictureId }) => pictureId))];
  const pictures = new Map((await findPictures(used)).map((picture) => [picture.id, picture]));
  return used.flatMap((id) => {
    const picture = pictures.get(id);
    const sheet = sheets.find(({ pages }) => pages.some((page) => page.picture.id === id));
    const label = sheet?.pages.find((page) => page.picture.id === id)?.label ?? '';
    return picture ? [{ ...toPictureView(picture), sheetId: sheet?.id ?? null, label }] : [];
  });
}

const toSheet = ({ id, title, number, revision, dated, obtainedFrom, obtainedOn }: SheetRecord): ModuleModel['sheets'][number] => ({
  id,
  title,
  number,
  revision,
  dated,
  obtainedFrom,
  obtainedOn,
});

/** The approved model of a module with what it stands on; null while nothing of it is approved. */
export async function approvedModelOf(actor: SignedInPerson, moduleId: number): Promise<ModuleModel | null> {
  requireCan(actor, 'catalogue.see');
  const module = await moduleById(moduleId);
  const reading = await approvedReadingOf(moduleId);
  const record = reading && (await latestModel(reading.id));
  const { model } = record ? (JSON.parse(record.result) as ReadingResult) : { model: null };
  if (!reading || !record || !model) return null;
  const [vendorSheets, decisions, history] = await Promise.all([
    sheetsOfVendor(module.vendor.id),
    decisionsOf([reading.id]),
    moduleHistory(actor, moduleId),
  ]);
  const pictures = await evidencePictures(reading, vendorSheets);
  const document = JSON.parse(record.document) as ReadingDocument;
  const drawn = drawnCurrents(document);
  return {
    module: toModuleView(module),
    readingId: reading.id,
    model,
    currents: drawn.length > 0 && drawn.length <= MOST_CURVES ? drawn : evenCurrents(model.validity.I[1]),
    hotSides: drawnHotSides(document),
    engine: record.engine,
    hash: record.hash,
    readBy: reading.owner.name,
    approvedBy: decisions.findLast(({ what }) => what === 'approved')?.by.name ?? '',
    approvedAt: approvedAt(reading.id, decisions),
    sheets: vendorSheets.filter(({ id }) => id === reading.sheetId || pictures.some((picture) => picture.sheetId === id)).map(toSheet),
    pictures,
    history,
  };
}

/** A module's page: identity always, the rest as far as a reading is approved. */
export async function moduleShown(actor: SignedInPerson, id: string) {
  if (!/^\d{1,12}$/.test(id)) throw notFound('module');
  const module = toModuleView(await moduleById(Number(id)));
  const approved = await approvedModelOf(actor, module.id);
  return {
    module,
    approved,
    candidate: approved && toCandidateModel(approved.model),
    history: approved?.history ?? (await moduleHistory(actor, module.id)),
  };
}
