import { beforeAll, expect, inject, test } from 'vitest';
import type { EvidenceView, ModelAnswer, Problem, QueueItem, ReadingView, StateAnswer } from '@/lib/contracts';
import { clientOf, type Client } from '../support/api';
import { emptyReading, finishedReading, must, sheetWithChart, take, versionOf } from '../support/approved';
import { draftOf } from '../support/drafts';

const base = inject('baseUrl');
const VENDOR = 'Pratincole Cooling';
const REASON = 'The second curve was read along a grid line.';

let engineer: Client, librarian: Client, designer: Client, both: Client;
let sheet: Awaited<ReturnType<typeof sheetWithChart>>;
let parts = 0;

beforeAll(async () => {
  [engineer, librarian, designer, both] = await Promise.all([
    clientOf(base, 'engineer'),
    clientOf(base, 'librarian'),
    clientOf(base, 'designer'),
    clientOf(base, 'both'),
  ]);
  sheet = await sheetWithChart(engineer, VENDOR, 'PC-7');
});

const stated = () => ({ vendor: VENDOR, partNumber: `Stint ${++parts}` });
const state = async (answer: Response) => (await must<StateAnswer>(answer)).state;
const look = async (client: Client, id: number) => must<ReadingView>(await client.get(`/api/readings/${id}`));
const evidenceOf = async (client: Client, id: number) => must<EvidenceView>(await client.get(`/api/readings/${id}/evidence`));
const detail = async (answer: Response) => ((await answer.json()) as Problem).detail;

async function handedIn(by = engineer): Promise<number> {
  const { readingId } = await finishedReading(by, sheet, stated());
  await must(await take(by, readingId, 'hand-in', { note: 'Both charts.' }));
  return readingId;
}

test('a reading goes to and fro until it is approved, is withdrawn and comes back', async () => {
  const { readingId: id, moduleId } = await finishedReading(engineer, sheet, stated());
  const inCatalogue = async () => (await designer.get(`/api/modules/${moduleId}/model`)).status;
  expect(await state(await take(engineer, id, 'hand-in', { note: 'First try.' }))).toBe('handed-in');
  expect(await state(await take(engineer, id, 'take-back'))).toBe('draft');
  expect(await state(await take(engineer, id, 'hand-in', { note: 'Second try.' }))).toBe('handed-in');
  expect(await state(await take(librarian, id, 'return', { reason: REASON }))).toBe('returned');
  expect(await look(engineer, id)).toMatchObject({ reason: REASON, may: { edit: true, handIn: true } });
  expect(await state(await take(engineer, id, 'hand-in', { note: '' }))).toBe('handed-in');
  expect(await inCatalogue()).toBe(404);
  expect(await state(await take(librarian, id, 'approve'))).toBe('approved');
  expect(await inCatalogue()).toBe(200);
  expect(await state(await take(librarian, id, 'withdraw', { reason: REASON }))).toBe('withdrawn');
  expect(await inCatalogue()).toBe(404);
  expect(await state(await take(librarian, id, 'restore'))).toBe('approved');
  expect(await inCatalogue()).toBe(200);
  expect((await look(engineer, id)).decisions.map(({ what }) => what)).toEqual([
    'handed-in',
    'taken-back',
    'handed-in',
    'returned',
    'handed-in',
    'approved',
    'withdrawn',
    'restored',
  ]);
});

test('what waits stands in the queue with its note, and not among what one may decide when it is one’s own', async () => {
  const id = await handedIn(both);
  const row = async (client: Client) => (await must<QueueItem[]>(await client.get('/api/review'))).find((item) => item.id === id);
  expect(await row(librarian)).toMatchObject({ note: 'Both charts.', owner: { name: 'Petra Ames' }, charts: 2, mayDecide: true });
  expect(await row(both)).toMatchObject({ mayDecide: false });
  expect((await take(both, id, 'approve')).status).toBe(403);
  await must(await take(librarian, id, 'approve'));
  expect(await row(librarian)).toBeUndefined();
});

test('the evidence is what was handed in, with its hash, and says who may decide', async () => {
  const id = await handedIn();
  const seen = await evidenceOf(librarian, id);
  expect(seen).toMatchObject({ mayDecide: true, ownWork: false, approved: null, hash: expect.stringMatching(/^[0-9a-f]{64}$/) });
  expect(await evidenceOf(engineer, id)).toMatchObject({ mayDecide: false, ownWork: true, hash: seen.hash });
  // read without error off a module of α 0.05 V/K, R 2.2 Ω, K 0.4 W/K
  const { alpha, R, K } = seen.model.result!.model!;
  expect([alpha.value, R.value, K.value]).toEqual([expect.closeTo(0.05, 6), expect.closeTo(2.2, 4), expect.closeTo(0.4, 4)]);
  expect((await designer.get(`/api/readings/${id}/evidence`)).status).toBe(404);
});

test('a draft is fitted without being saved, and what is missing is said', async () => {
  const { readingId: id } = await emptyReading(engineer, sheet, stated());
  const before = await look(engineer, id);
  const fit = async (document: object) => must<ModelAnswer>(await engineer.post(`/api/readings/${id}/model`, { document }));
  const fitted = await fit(draftOf(sheet.picture));
  expect(fitted.result?.model?.alpha.value).toBeCloseTo(0.05, 6);
  expect(new Set(fitted.curves.map(({ chart }) => chart))).toEqual(new Set([0, 1]));
  const [heat] = draftOf(sheet.picture).charts;
  const unfinished = await fit({ ...draftOf(sheet.picture), charts: [{ ...heat!, marks: heat!.marks.slice(0, 1) }] });
  expect(unfinished).toMatchObject({ result: null, problems: [{ chart: 0, text: expect.stringMatching(/\.$/) }] });
  expect(await look(engineer, id)).toEqual(before);
});

test('a draft with nothing read cannot be handed in, and a short reason returns nothing', async () => {
  const { readingId } = await emptyReading(engineer, sheet, stated());
  const refused = await take(engineer, readingId, 'hand-in', { note: '' });
  expect([refused.status, ((await refused.json()) as Problem).fields]).toMatchObject([422, { document: expect.stringMatching(/\.$/) }]);
  const short = await take(librarian, await handedIn(), 'return', { reason: 'no' });
  expect([short.status, ((await short.json()) as Problem).fields]).toMatchObject([422, { reason: expect.stringMatching(/\.$/) }]);
});

test.each([
  ['take-back', () => engineer, {}],
  ['approve', () => librarian, {}],
  ['return', () => librarian, { reason: REASON }],
  ['withdraw', () => librarian, { reason: REASON }],
  ['restore', () => librarian, {}],
])('%s of a draft is refused with a sentence', async (step, who, body) => {
  const { readingId } = await finishedReading(engineer, sheet, stated());
  const answer = await take(who(), readingId, step, body);
  expect(answer.status).toBe(409);
  expect(await detail(answer)).toMatch(/\.$/);
});

test('a decision names the version it was made on: none is refused, an old one shows what is there now', async () => {
  const id = await handedIn();
  const old = await versionOf(librarian, id);
  expect((await librarian.post(`/api/readings/${id}/approve`, {})).status).toBe(428);
  await must(await take(engineer, id, 'take-back'));
  await must(await take(engineer, id, 'hand-in', { note: '' }));
  const lost = await librarian.post(`/api/readings/${id}/approve`, {}, old);
  expect(lost.status).toBe(412);
  expect(await look(engineer, id)).toMatchObject({ state: 'handed-in' });
});
