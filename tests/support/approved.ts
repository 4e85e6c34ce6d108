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

async function must<T>(answer: Response): Promise<T> {
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

/** A module of the sheet, read by the engineer and approved by the librarian over the API; answers the module's id. */
export async function approveModule(
  { engineer, librarian }: { readonly engineer: Client; readonly librarian: Client },
  { sheetId, picture }: Awaited<ReturnType<typeof sheetWithChart>>,
  stated: Partial<ModuleBody> & Pick<ModuleBody, 'vendor' | 'partNumber'>,
  constants?: Constants,
): Promise<number> {
  const module = await must<ModuleView>(await engineer.post('/api/modules', { ...NOT_STATED, ...stated }));
  const { id } = await must<{ id: number }>(await engineer.post(`/api/sheets/${sheetId}/readings`, { moduleId: module.id }));
  const path = `/api/readings/${id}`;
  const version = async () => ({ 'If-Match': `"${(await must<ReadingView>(await engineer.get(path))).version}"` });
  await must(await engineer.put(path, { document: draftOf(picture, constants) }, await version()));
  await must(await engineer.post(`${path}/hand-in`, { note: '' }, await version()));
  await must(await librarian.post(`${path}/approve`, {}, await version()));
  return module.id;
}
