import type { APIResponse, Page } from 'playwright-core';
import { inject } from 'vitest';
import type { ModuleView, ReadingView, SheetBody, SheetView } from '@/lib/contracts';
import { emptyChart } from '@/lib/editor';
import { PASSWORD, PEOPLE, type Who } from './people';

const base = inject('baseUrl');

const sameSite = { Origin: base, 'Sec-Fetch-Site': 'same-origin' };

/** What a page of the site would send; the cookie that comes back is the window's own. */
const post = (page: Page, path: string, data: object): Promise<APIResponse> =>
  page.context().request.post(base + path, { data, headers: sameSite });
const get = async <T>(page: Page, path: string) => (await (await page.context().request.get(base + path)).json()) as T;

/** Signs a window in without its screen, for tests that are about something else. */
export async function enterAs(page: Page, who: Who): Promise<void> {
  const answer = await post(page, '/api/session', { email: PEOPLE[who], password: PASSWORD });
  if (!answer.ok()) throw new Error(`${who} could not sign in: ${answer.status()}`);
}

/** A sheet to begin from, added by whoever has entered. */
export async function addSheet(page: Page, sheet: Partial<SheetBody> & Pick<SheetBody, 'vendor'>): Promise<SheetView> {
  const answer = await post(page, '/api/sheets', sheet);
  if (!answer.ok()) throw new Error(`The sheet could not be added: ${await answer.text()}`);
  return (await answer.json()) as SheetView;
}

const NOT_STATED = {
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

/** A draft of a new module with one chart, which stands on the first page of the sheet. */
export async function readFirstPage(page: Page, sheetId: number, partNumber: string): Promise<void> {
  const sheet = await get<SheetView>(page, `/api/sheets/${sheetId}`);
  const module = (await (await post(page, '/api/modules', { ...NOT_STATED, vendor: sheet.vendor, partNumber })).json()) as ModuleView;
  const { id } = (await (await post(page, `/api/sheets/${sheetId}/readings`, { moduleId: module.id })).json()) as { id: number };
  const { document, version } = await get<ReadingView>(page, `/api/readings/${id}`);
  const charts = [emptyChart('c1', sheet.pages[0]!.picture)];
  const saved = await page.context().request.put(`${base}/api/readings/${id}`, {
    data: { document: { ...document, charts } },
    headers: { ...sameSite, 'If-Match': `"${version}"` },
  });
  if (!saved.ok()) throw new Error(`The draft could not be saved: ${await saved.text()}`);
}

/** Waits until a page listens: no island is left to wake. */
export const listens = (page: Page) => page.waitForFunction(() => !document.querySelector('astro-island[ssr]'));

/** Opens a page and waits until it listens. */
export async function open(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await listens(page);
}
