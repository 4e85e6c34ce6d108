import { readFileSync } from 'node:fs';
import { beforeAll, expect, inject, test } from 'vitest';
import type { ReadingView, SheetView, UploadAnswer } from '@/lib/contracts';
import type { BenchChart, BenchDocument } from '@/lib/editor';
import { emptyChart } from '@/lib/editor';
import { clientOf, type Client } from '../support/api';

const base = inject('baseUrl');
// a picture that no other test has approved
const chartFile = readFileSync('tests/fixtures/charts/d09.png');
const identity = {
  variant: '',
  stages: null,
  couples: 127,
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

let engineer: Client, librarian: Client, designer: Client;
let sheetId: number, readingId: number, picture: UploadAnswer['page']['picture'];

beforeAll(async () => {
  [engineer, librarian, designer] = await Promise.all([
    clientOf(base, 'engineer'),
    clientOf(base, 'librarian'),
    clientOf(base, 'designer'),
  ]);
  const sheet = (await (await engineer.post('/api/sheets', { vendor: 'Draft Vendor', title: 'Drafts' })).json()) as SheetView;
  sheetId = sheet.id;
  picture = ((await (await engineer.upload(`/api/sheets/${sheetId}/pages`, chartFile, 'd09.png')).json()) as UploadAnswer).page.picture;
  const module = (await (await engineer.post('/api/modules', { ...identity, vendor: 'Draft Vendor', partNumber: 'Gannet' })).json()) as {
    id: number;
  };
  readingId = ((await (await engineer.post(`/api/sheets/${sheetId}/readings`, { moduleId: module.id })).json()) as { id: number }).id;
});

const read = async (client = engineer) => (await (await client.get(`/api/readings/${readingId}`)).json()) as ReadingView;
const save = (document: BenchDocument, version: number | null, client = engineer) =>
  client.put(`/api/readings/${readingId}`, { document }, version === null ? {} : { 'If-Match': `"${version}"` });
const withTitle = (document: BenchDocument, title: string): BenchDocument => {
  const chart: BenchChart = { ...emptyChart('c1', picture), title };
  return { ...document, charts: [chart] };
};

test('a save names its version, and answers the next one', async () => {
  const { document, version } = await read();
  const answer = await save(withTitle(document, 'first'), version);
  expect(answer.status).toBe(200);
  expect(answer.headers.get('etag')).toBe(`"${version + 1}"`);
  expect((await read()).document.charts[0]?.title).toBe('first');
});

test('a save without a version is refused', async () => {
  expect((await save((await read()).document, null)).status).toBe(428);
});

test('a lost race answers the version that won, and the identical body again is no race', async () => {
  const { document, version } = await read();
  const mine = withTitle(document, 'mine');
  expect((await save(mine, version)).status).toBe(200);
  const again = await save(mine, version);
  expect(again.status).toBe(200);
  expect(await again.json()).toMatchObject({ version: version + 1 });
  const lost = await save(withTitle(document, 'theirs'), version);
  expect(lost.status).toBe(412);
  expect(await lost.json()).toMatchObject({
    current: { version: version + 1, document: { charts: [{ title: 'mine' }] }, savedBy: { name: 'Ilse Marrow' } },
  });
});

test('of ten saves of one version at once, one wins and nine are told', async () => {
  const { document, version } = await read();
  const answers = await Promise.all(Array.from({ length: 10 }, (_, n) => save(withTitle(document, `parallel ${n}`), version)));
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, ...Array(9).fill(412)]);
});

test('another engineer or a librarian sees a draft but cannot save it; a designer does not even see it', async () => {
  const { document, version } = await read(librarian);
  expect((await save(document, version, librarian)).status).toBe(403);
  expect((await designer.get(`/api/readings/${readingId}`)).status).toBe(404);
  expect((await designer.get(`/api/pictures/${picture.id}`)).status).toBe(404);
  expect((await designer.get(`/api/sheets/${sheetId}`)).status).toBe(403);
});

test('a chart on a picture that is not here, or on other pixels, is refused', async () => {
  const { document, version } = await read();
  const stranger = { ...emptyChart('c1', { ...picture, id: 99999 }) };
  expect((await save({ ...document, charts: [stranger] }, version)).status).toBe(422);
  const altered = { ...emptyChart('c1', { ...picture, pixelsSha256: 'a'.repeat(64) }) };
  expect((await save({ ...document, charts: [altered] }, version)).status).toBe(422);
});

test('unknown keys and broken shapes are refused by name', async () => {
  const { document, version } = await read();
  const answer = await save({ ...document, colour: 'red' } as BenchDocument, version);
  expect(answer.status).toBe(422);
  expect((await save({ format: 'couplet.bench' } as BenchDocument, version)).status).toBe(422);
});

test('a page that a reading stands on stays', async () => {
  const { document, version } = await read();
  await save(withTitle(document, 'stands'), version);
  const sheet = (await (await engineer.get(`/api/sheets/${sheetId}`)).json()) as SheetView;
  const answer = await engineer.del(`/api/sheets/${sheetId}/pages/${sheet.pages[0]!.id}`);
  expect(answer.status).toBe(409);
});

test('the intake picture and the original come back, the original as an attachment', async () => {
  const shown = await engineer.get(`/api/pictures/${picture.id}`);
  expect(shown.headers.get('content-type')).toBe('image/png');
  expect((await engineer.get(`/api/pictures/${picture.id}`, { 'If-None-Match': shown.headers.get('etag')! })).status).toBe(304);
  const original = await engineer.get(`/api/pictures/${picture.id}/original`);
  expect(original.headers.get('content-disposition')).toMatch(/^attachment;.*d09\.png/);
  expect(Buffer.from(await original.arrayBuffer()).equals(chartFile)).toBe(true);
});
