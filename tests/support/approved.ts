import { readFileSync } from 'node:fs';
import type { ModuleBody, ModuleView, ReadingView, SheetView, UploadAnswer } from '@/lib/contracts';
import type { Client } from './api';
import { draftOf, type Constants } from './drafts';

const CHART = 'tests/fixtures/charts/d01.png';

export const NOT_STATED: Omit<ModuleBody, 'vendor' | 'partNumber'> = {
  variant: '',
  stages: null,
  couples: null,
  coldPlateMm: null,
  hotPlateMm: null,
  heightMm: null,
  maxTemperatureC: null,
  leadsOhm: null,
  sealing: null,
  acResistanceOhm: null,
  acResistanceAtC: null,
  ratings: [],
};

/** What a call that has to succeed answered. */
export async function must<T>(answer: Response): Promise<T> {
  if (!answer.ok) throw new Error(`${answer.url} answered ${answer.status}: ${await answer.text()}`);
  return (await answer.json()) as T;
}

/** A sheet of a vendor with one chart picture on it. */
export async function sheetWithChart(engineer: Client, vendor: string, number: string) {
  const fields = { vendor, title: 'Coolers', number, revision: 'B', dated: '2026-03', obtainedFrom: '', obtainedOn: '' };
  const sheet = await must<SheetView>(await engineer.post('/api/sheets', fields));
  const { page } = await must<UploadAnswer>(await engineer.upload(`/api/sheets/${sheet.id}/pages`, readFileSync(CHART), 'd01.png'));
  return { sheetId: sheet.id, picture: page.picture };
}

type SheetWithChart = Awaited<ReturnType<typeof sheetWithChart>>;
type Stated = Partial<ModuleBody> & Pick<ModuleBody, 'vendor' | 'partNumber'>;

/** The header that names a reading's version of now. */
export const versionOf = async (client: Client, readingId: number) => ({
  'If-Match': `"${(await must<ReadingView>(await client.get(`/api/readings/${readingId}`))).version}"`,
});

/** A draft of a module of the sheet with nothing read yet. */
export async function emptyReading(engineer: Client, { sheetId }: SheetWithChart, stated: Stated) {
  const module = await must<ModuleView>(await engineer.post('/api/modules', { ...NOT_STATED, ...stated }));
  const { id } = await must<{ id: number }>(await engineer.post(`/api/sheets/${sheetId}/readings`, { moduleId: module.id }));
  return { moduleId: module.id, readingId: id };
}

/** A finished draft of a module of the sheet. */
export async function finishedReading(engineer: Client, sheet: SheetWithChart, stated: Stated, constants?: Constants) {
  const made = await emptyReading(engineer, sheet, stated);
  const document = draftOf(sheet.picture, constants);
  await must(await engineer.put(`/api/readings/${made.readingId}`, { document }, await versionOf(engineer, made.readingId)));
  return made;
}

/** Takes a reading of now one step on: `hand-in`, `approve` and so on. */
export const take = async (client: Client, readingId: number, step: string, body: object = {}): Promise<Response> =>
  client.post(`/api/readings/${readingId}/${step}`, body, await versionOf(client, readingId));

/** A module of the sheet, read by the engineer and approved by the librarian over the API; answers the module's id. */
export async function approveModule(
  { engineer, librarian }: { readonly engineer: Client; readonly librarian: Client },
  sheet: SheetWithChart,
  stated: Stated,
  constants?: Constants,
): Promise<number> {
  const { moduleId, readingId } = await finishedReading(engineer, sheet, stated, constants);
  await must(await take(engineer, readingId, 'hand-in', { note: '' }));
  await must(await take(librarian, readingId, 'approve'));
  return moduleId;
}
