import { expect, test } from 'vitest';
import { findReading } from '@db';
import type { SignedInPerson } from '@/lib/server/people';
import { approve, handIn, restore, returnToOwner, withdraw } from '@/lib/server/review';
import { todayFor } from '@/lib/server/today';
import { person, reading, useDatabase } from '../support/database';

useDatabase();

const REASON = 'The 2.1 A curve was read along a grid line.';
const versionOf = async (id: number) => (await findReading(id))!.version;

const people = async () => ({
  engineer: await person(['engineer'], 'Ilse Marrow'),
  librarian: await person(['librarian'], 'Soren Quill'),
  designer: await person(['designer'], 'Tamsin Vale'),
});

async function handedIn(by: SignedInPerson): Promise<number> {
  const { id } = await reading(by);
  await handIn(by, id, await versionOf(id), '');
  return id;
}

async function approved(by: SignedInPerson, librarian: SignedInPerson): Promise<number> {
  const id = await handedIn(by);
  await approve(librarian, id, await versionOf(id));
  return id;
}

const ids = (rows: readonly { readonly id: number }[]) => rows.map(({ id }) => id);

test('what waits is sorted by state, with the reason of what was returned', async () => {
  const { engineer, librarian } = await people();
  const { id: draft } = await reading(engineer);
  const waiting = await handedIn(engineer);
  const returned = await handedIn(engineer);
  await returnToOwner(librarian, returned, await versionOf(returned), REASON);
  const own = await todayFor(engineer);
  expect([ids(own.drafts), ids(own.handedIn), ids(own.returned)]).toEqual([[draft], [waiting], [returned]]);
  expect(own.returned[0]!.reason).toBe(REASON);
  expect(own.toReview).toEqual([]);
  expect(ids((await todayFor(librarian)).toReview)).toEqual([waiting]);
});

test('a designer sees what was approved, newest first, and nothing that waits', async () => {
  const { engineer, librarian, designer } = await people();
  await handedIn(engineer);
  const first = await approved(engineer, librarian);
  const second = await approved(engineer, librarian);
  const { approvals, ...waits } = await todayFor(designer);
  expect(approvals.map((row) => row.readingId)).toEqual([second, first]);
  expect(approvals[0]).toMatchObject({ vendor: 'Ormsund Cold', by: 'Soren Quill' });
  expect(Object.values(waits).flat()).toEqual([]);
});

test('an approval is no news while it is withdrawn, and leaves its place to an older one', async () => {
  const { engineer, librarian, designer } = await people();
  const made: number[] = [];
  for (let n = 0; n < 9; n++) made.unshift(await approved(engineer, librarian));
  const seen = async () => (await todayFor(designer)).approvals.map((row) => row.readingId);
  const [newest] = made as [number];
  expect(await seen()).toEqual(made.slice(0, 8));
  await withdraw(librarian, newest, await versionOf(newest), REASON);
  expect(await seen()).toEqual(made.slice(1));
  await restore(librarian, newest, await versionOf(newest));
  expect(await seen()).toEqual(made.slice(0, 8));
});
