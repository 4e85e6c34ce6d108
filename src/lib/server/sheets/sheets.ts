import { addTrail, createSheet, findSheet, inTransaction, listSheets, readingsOfSheet, updateSheet, vendorNamed, type SheetRecord } from '@db';
import { can } from '@/lib/access';
import type { SheetBody, SheetRow, SheetView } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { lostRace, notFound } from '../refusal';
import { toSheetRow, toSheetView } from './views';

const SETTLED = new Set(['approved', 'superseded', 'withdrawn']);

export async function sheetById(id: number): Promise<SheetRecord> {
  const sheet = await findSheet(id);
  if (!sheet) throw notFound('sheet');
  return sheet;
}

export async function sheetList(actor: SignedInPerson): Promise<SheetRow[]> {
  requireCan(actor, 'sheet.see');
  return (await listSheets()).map(toSheetRow);
}

/** A sheet as this person may see it: without drafts for those who only see what is approved. */
export async function sheetFor(actor: SignedInPerson, id: number): Promise<SheetView> {
  const sheet = await sheetById(id);
  const readings = await readingsOfSheet(id);
  requireCan(actor, 'sheet.see', { approved: readings.some((reading) => SETTLED.has(reading.state)) });
  const seen = readings.filter((reading) => can(actor, 'reading.see', { approved: SETTLED.has(reading.state) }));
  return toSheetView(sheet, seen);
}

export async function addSheet(actor: SignedInPerson, body: SheetBody): Promise<SheetView> {
  requireCan(actor, 'sheet.upload');
  const id = await inTransaction(async () => {
    const { vendor: name, ...rest } = body;
    const vendor = await vendorNamed(name);
    const made = await createSheet(vendor.id, actor.id, rest);
    await addTrail({ userId: actor.id, action: 'added sheet', object: `sheet/${made}` });
    return made;
  });
  return sheetFor(actor, id);
}

/** Changes what a sheet is, over the named version only. */
export async function changeSheet(actor: SignedInPerson, id: number, version: number, body: SheetBody): Promise<SheetView> {
  requireCan(actor, 'sheet.edit');
  await inTransaction(async () => {
    const before = await sheetById(id);
    const { vendor: name, ...rest } = body;
    const vendor = await vendorNamed(name);
    if (!(await updateSheet(id, version, vendor.id, rest))) throw lostRace(toSheetView(before, []));
    await addTrail({ userId: actor.id, action: 'changed sheet', object: `sheet/${id}` });
  });
  return sheetFor(actor, id);
}
