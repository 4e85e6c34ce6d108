import {
  addTrail,
  createSheet,
  findSheet,
  inTransaction,
  listSheets,
  readingsOfSheet,
  updateSheet,
  vendorNamed,
  type SheetRecord,
  raiseCounter,
} from '@db';
import { can } from '@/lib/access';
import type { SheetBody, SheetRow, SheetView } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from '../people';
import { lostRace, notFound, wrongInput } from '../refusal';
import { isSettled } from '../settled';
import { matchesWords } from './search';
import { toSheetRow, toSheetView } from './views';

export async function sheetById(id: number): Promise<SheetRecord> {
  const sheet = await findSheet(id);
  if (!sheet) throw notFound('sheet');
  return sheet;
}

/** Sheets that hold all the words, newest first; every sheet when there are none. */
export async function sheetList(actor: SignedInPerson, words = ''): Promise<SheetRow[]> {
  requireCan(actor, 'sheet.see');
  return (await listSheets()).map(toSheetRow).filter((row) => matchesWords(row, words));
}

/** The sheets of a vendor that this person may see. */
export async function sheetsSeen(actor: SignedInPerson, vendorId: number): Promise<SheetRow[]> {
  const sheets = await listSheets({ vendorId });
  const seen = sheets.filter((sheet) => can(actor, 'sheet.see', { approved: sheet.readings.some((reading) => isSettled(reading.state)) }));
  return seen.map((sheet) => {
    const readings = sheet.readings.filter((reading) => can(actor, 'reading.see', { approved: isSettled(reading.state) }));
    return toSheetRow({ ...sheet, readings });
  });
}

/** A sheet as this person may see it: without drafts for those who only see what is approved. */
export async function sheetFor(actor: SignedInPerson, id: number): Promise<SheetView> {
  const sheet = await sheetById(id);
  const readings = await readingsOfSheet(id);
  requireCan(actor, 'sheet.see', { approved: readings.some((reading) => isSettled(reading.state)) });
  const seen = readings.filter((reading) => can(actor, 'reading.see', { approved: isSettled(reading.state) }));
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

/** A reading's module and its sheet are of one vendor. */
async function requireNoReadings(sheet: SheetRecord): Promise<void> {
  if ((await readingsOfSheet(sheet.id)).length === 0) return;
  throw wrongInput({ vendor: `Modules of ${sheet.vendor.name} are being read from this sheet, so its vendor stays ${sheet.vendor.name}.` });
}

/** Whether a body says what is stored already. */
const isSame = (sheet: SheetRecord, { vendor, ...rest }: SheetBody) =>
  sheet.vendor.name === vendor && Object.entries(rest).every(([name, value]) => sheet[name as keyof typeof rest] === value);

/** Changes what a sheet is, over the named version only. */
export async function changeSheet(actor: SignedInPerson, id: number, version: number, body: SheetBody): Promise<SheetView> {
  requireCan(actor, 'sheet.edit');
  await inTransaction(async () => {
    const before = await sheetById(id);
    const { vendor: name, ...rest } = body;
    const vendor = await vendorNamed(name);
    if (vendor.id !== before.vendor.id) await requireNoReadings(before);
    if (isSame(before, body)) return; // a repeat whose answer was lost
    if (!(await updateSheet(id, version, vendor.id, rest))) throw lostRace(toSheetView(before, []));
    await raiseCounter('catalogue'); // its words are searched
    await addTrail({ userId: actor.id, action: 'changed sheet', object: `sheet/${id}` });
  });
  return sheetFor(actor, id);
}
