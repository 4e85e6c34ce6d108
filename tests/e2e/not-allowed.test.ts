import { readFileSync } from 'node:fs';
import { beforeAll, describe, expect, inject, test } from 'vitest';
import type { SheetView, UploadAnswer } from '@/lib/contracts';
import { clientOf } from '../support/api';
import { useBrowser } from '../support/browser';
import { draftOf } from '../support/drafts';
import { signInAs, type Who } from '../support/people';

const { visit } = useBrowser();
const base = inject('baseUrl');

/** What the bar at the top offers each role, and pages it must not reach by typing their address. */
const ROLES: Record<'engineer' | 'librarian' | 'designer' | 'administrator', { offers: string[]; refused: string[] }> = {
  engineer: { offers: ['Today', 'Sheets', 'Catalogue', 'Duty'], refused: ['/review', '/admin/team', '/admin/outbox', '/admin/trail'] },
  librarian: { offers: ['Today', 'Sheets', 'Review', 'Catalogue', 'Duty'], refused: ['/admin/team', '/admin/trail'] },
  designer: { offers: ['Today', 'Catalogue', 'Duty'], refused: ['/sheets', '/sheets/new', '/review', '/bench/1', '/admin/outbox'] },
  administrator: { offers: ['Today', 'Catalogue', 'Team', 'Outbox', 'Trail'], refused: ['/sheets', '/review', '/duty', '/bench/1'] },
};

const firstWord = (text: string) => text.trim().split(/\s/)[0] ?? '';

test.each(Object.keys(ROLES) as (keyof typeof ROLES)[])(
  'the %s is offered only what the roles allow, and typed addresses are refused',
  async (who) => {
    const { page } = await visit();
    await signInAs(page, who);
    const offered = await page.getByRole('navigation').first().getByRole('link').allTextContents();
    expect(offered.map(firstWord).sort()).toEqual([...ROLES[who].offers].sort());
    for (const address of ROLES[who].refused) {
      await page.goto(address);
      await page.getByRole('heading', { name: 'Your roles do not allow this' }).waitFor();
    }
  },
);

describe('somebody else’s work', () => {
  let readingId: number;
  let sheetId: number;
  beforeAll(async () => {
    const petra = await clientOf(base, 'both');
    sheetId = ((await (await petra.post('/api/sheets', { vendor: 'Lintel Works', title: 'Own work' })).json()) as SheetView).id;
    const picture = readFileSync('tests/fixtures/charts/d01.png');
    const { page } = (await (await petra.upload(`/api/sheets/${sheetId}/pages`, picture, 'heat.png')).json()) as UploadAnswer;
    const identity = {
      partNumber: 'Corbel',
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
      vendor: 'Lintel Works',
    };
    const module = (await (await petra.post('/api/modules', identity)).json()) as { id: number };
    readingId = ((await (await petra.post(`/api/sheets/${sheetId}/readings`, { moduleId: module.id })).json()) as { id: number }).id;
    const saved = await petra.put(`/api/readings/${readingId}`, { document: draftOf(page.picture) }, { 'If-Match': '"1"' });
    const version = ((await saved.json()) as { version: number }).version;
    expect((await petra.post(`/api/readings/${readingId}/hand-in`, {}, { 'If-Match': `"${version}"` })).status).toBe(200);
  });

  test('a librarian does not decide on a reading of her own, and is told who does', async () => {
    const { page } = await visit();
    await signInAs(page, 'both');
    await page.goto(`/review/${readingId}`);
    await page
      .getByText(/another librarian/i)
      .first()
      .waitFor();
    expect(await page.getByRole('button', { name: 'Approve' }).count()).toBe(0);
    const petra = await clientOf(base, 'both');
    const answer = await petra.post(`/api/readings/${readingId}/approve`, {}, { 'If-Match': '"3"' });
    expect(answer.status).toBe(403);
  });

  test('another engineer sees it but can neither change it nor take it back', async () => {
    const { page } = await visit();
    await signInAs(page, 'engineer');
    await page.goto(`/bench/${readingId}`);
    await page.getByText('Petra Ames').first().waitFor();
    expect(await page.getByRole('button', { name: /take back/i }).count()).toBe(0);
    const ilse = await clientOf(base, 'engineer');
    expect((await ilse.post(`/api/readings/${readingId}/take-back`, {}, { 'If-Match': '"3"' })).status).toBe(403);
  });

  test.each(['designer', 'administrator'] as Who[])('to the %s, what is not approved is not there', async (who) => {
    const { page } = await visit();
    await signInAs(page, who);
    await page.goto(`/review/${readingId}`);
    expect(await page.getByText('Corbel').count()).toBe(0);
    const client = await clientOf(base, who);
    for (const address of [`/api/readings/${readingId}`, `/api/readings/${readingId}/evidence`])
      expect((await client.get(address)).status).toBe(404);
  });
});
