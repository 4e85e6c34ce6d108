import { afterEach, expect, test } from 'vitest';
import { findModule, findReading, inTransaction, latestModel, updateModule } from '@db';
import type { BenchDocument } from '@/lib/editor';
import { deliverMail } from '@/lib/server/mail';
import type { SignedInPerson } from '@/lib/server/people';
import { saveReading } from '@/lib/server/readings';
import { Refusal } from '@/lib/server/refusal';
import { approve, evidence, handIn, reviewQueue, takeBack, withdraw } from '@/lib/server/review';
import { draftOf } from '../support/drafts';
import { module, person, picture, reading, useDatabase } from '../support/database';

useDatabase();
afterEach(() => deliverMail());

const versionOf = async (id: number) => (await findReading(id))!.version;
const hands = async (owner: SignedInPerson, id: number, note = '') => handIn(owner, id, await versionOf(id), note);
const approves = async (by: SignedInPerson, id: number) => approve(by, id, await versionOf(id));
const RATING = {
  hotSideC: 27,
  imaxA: 3.4,
  vmaxV: 15.4,
  qmaxW: 28.9,
  dTmaxK: 66,
  imaxMeans: 'largestDeltaT',
  basis: 'typical',
  atmosphere: 'notStated',
  tolerancePercent: 10,
} as const;

test('shows the model that was read, its residuals and the fitted family over every chart', async () => {
  const engineer = await person(['engineer']);
  const librarian = await person(['librarian']);
  const { id } = await reading(engineer, { of: await module({ ratings: [RATING] }) });
  await hands(engineer, id);
  const shown = await evidence(librarian, id);
  const fitted = shown.model.result!.model!;
  // the constants the draft was made with, in tests/support/drafts.ts
  expect(fitted.alpha.value).toBeCloseTo(0.05, 5);
  expect(fitted.R.value).toBeCloseTo(2.2, 3);
  expect(fitted.K.value).toBeCloseTo(0.4, 4);
  expect(Math.max(...shown.model.residuals.map(({ percentOfRange }) => Math.abs(percentOfRange)))).toBeLessThan(0.01);
  expect(new Set(shown.model.curves.map(({ chart, curve }) => `${chart}.${curve}`)).size).toBe(6);
  expect(shown.model.ratings.find(({ key }) => key === 'imaxA')).toMatchObject({ hotSideC: 27, printed: 3.4, unit: 'A' });
  expect(shown).toMatchObject({ mayDecide: true, ownWork: false, approved: null, moduleChanged: [], hash: (await latestModel(id))!.hash });
});

test('says whose work it is and who may decide', async () => {
  const both = await person(['engineer', 'librarian']);
  const { id } = await reading(both);
  await hands(both, id);
  expect(await evidence(both, id)).toMatchObject({ ownWork: true, mayDecide: false });
  expect(await evidence(await person(['engineer']), id)).toMatchObject({ ownWork: false, mayDecide: false });
  expect(await evidence(await person(['librarian']), id)).toMatchObject({ ownWork: false, mayDecide: true });
});

test('sets a newer reading against the model in the catalogue, figure by figure', async () => {
  const engineer = await person(['engineer']);
  const librarian = await person(['librarian']);
  const of = await module({ ratings: [RATING] });
  const first = await reading(engineer, { of });
  await hands(engineer, first.id);
  await approves(librarian, first.id);
  const page = await picture(engineer);
  const second = await reading(engineer, { of, page, document: draftOf(page, { alpha: 0.05, R: 2.4, K: 0.4 }) });
  await hands(engineer, second.id);
  const { approved } = await evidence(librarian, second.id);
  expect(approved?.readingId).toBe(first.id);
  const resistance = approved!.changes.find(({ what }) => what === 'Resistance R')!;
  expect(resistance.before).toBeCloseTo(2.2, 3);
  expect(resistance.after).toBeCloseTo(2.4, 3);
  expect(approved!.changes.map(({ what }) => what)).toContain('Qmax at 27\u00A0°C');
  await approves(librarian, second.id);
  expect((await evidence(librarian, second.id)).approved).toBeNull();
});

test('a draft is shown as it stands, without the hash of an earlier hand-in', async () => {
  const engineer = await person(['engineer']);
  const { id, document } = await reading(engineer);
  await hands(engineer, id);
  await takeBack(engineer, id, await versionOf(id));
  const draft = JSON.parse(document) as BenchDocument;
  await saveReading(engineer, id, await versionOf(id), { ...draft, charts: draft.charts.slice(0, 1) });
  const shown = await evidence(engineer, id);
  expect(shown.hash).toBeNull();
  expect(shown.model.result!.charts).toHaveLength(1);
});

test('a draft that cannot be read shows why instead of a model', async () => {
  const engineer = await person(['engineer']);
  const { id, document } = await reading(engineer);
  const draft = JSON.parse(document) as BenchDocument;
  const [first, ...rest] = draft.charts;
  const share = { ...first!, y: { quantity: 'Qc', unit: '%', scale: 'linear', of: 'qmaxW' } as const };
  await saveReading(engineer, id, await versionOf(id), { ...draft, charts: [share, ...rest] });
  const shown = await evidence(engineer, id);
  expect(shown.model.result).toBeNull();
  expect(shown.model.problems).toEqual([{ chart: null, text: expect.stringMatching(/^[A-Z].+\.$/) }]);
});

test('names what of the module was changed after the hand-in, and keeps the model as it was handed in', async () => {
  const engineer = await person(['engineer']);
  const librarian = await person(['librarian']);
  const of = await module({ ratings: [RATING] });
  const { id } = await reading(engineer, { of });
  await hands(engineer, id);
  const before = await evidence(librarian, id);
  const { vendor, id: moduleId, version, ...identity } = (await findModule(of.id))!;
  const body = { ...identity, vendor: vendor.name, heightMm: 3.6, ratings: [{ ...RATING, qmaxW: 30 }] };
  await inTransaction(() => updateModule(moduleId, version, vendor.id, body));
  const after = await evidence(librarian, id);
  expect(after.moduleChanged).toEqual(['height', 'ratings']);
  expect(after.model.result).toEqual(before.model.result);
  expect(after.hash).toBe(before.hash);
});

test('a designer sees what is approved or withdrawn, and learns nothing of what is not', async () => {
  const engineer = await person(['engineer']);
  const librarian = await person(['librarian']);
  const designer = await person(['designer']);
  const { id } = await reading(engineer);
  for (const step of [() => Promise.resolve(), () => hands(engineer, id)]) {
    await step();
    await expect(evidence(designer, id)).rejects.toMatchObject({ status: 404 });
  }
  await approves(librarian, id);
  expect(await evidence(designer, id)).toMatchObject({ mayDecide: false, reading: { state: 'approved' } });
  await withdraw(librarian, id, await versionOf(id), 'The vendor has recalled this sheet.');
  expect(await evidence(designer, id)).toMatchObject({ reading: { state: 'withdrawn' } });
  await expect(reviewQueue(designer)).rejects.toBeInstanceOf(Refusal);
});

test('the queue has the longest waiting first, by its last hand-in', async () => {
  const engineer = await person(['engineer']);
  const librarian = await person(['librarian']);
  const [first, second] = [await reading(engineer), await reading(engineer)];
  await hands(engineer, first.id, 'First try.');
  await hands(engineer, second.id);
  await takeBack(engineer, first.id, await versionOf(first.id));
  await hands(engineer, first.id, 'Second try.');
  const queue = await reviewQueue(librarian);
  expect(queue.map(({ id }) => id)).toEqual([second.id, first.id]);
  expect(queue[1]).toMatchObject({ note: 'Second try.', charts: 2, curves: 6, mayDecide: true });
});
