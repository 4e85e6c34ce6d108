import { createHash } from 'node:crypto';
import { afterEach, describe, expect, test } from 'vitest';
import {
  addEditor,
  approvedReadingOf,
  counter,
  decisionsOf,
  findReading,
  inTransaction,
  latestModel,
  listMail,
  listTrail,
  type ReadingRecord,
} from '@db';
import type { ReadingState } from '@db';
import type { BenchDocument } from '@/lib/editor';
import { deliverMail } from '@/lib/server/mail';
import type { SignedInPerson } from '@/lib/server/people';
import { readingView, saveReading } from '@/lib/server/readings';
import { Refusal } from '@/lib/server/refusal';
import { approve, handIn, restore, returnToOwner, reviewCount, reviewQueue, takeBack, withdraw } from '@/lib/server/review';
import { connection } from '../../db/database';
import { module, person, reading, useDatabase } from '../support/database';

useDatabase();
afterEach(() => deliverMail());

const REASON = 'The 2.1 A curve was read along a grid line.';

interface Team {
  readonly engineer: SignedInPerson;
  readonly librarian: SignedInPerson;
}
const team = async (): Promise<Team> => ({
  engineer: await person(['engineer'], 'Ilse Marrow'),
  librarian: await person(['librarian'], 'Soren Quill'),
});

const now = async (id: number): Promise<ReadingRecord> => (await findReading(id))!;
const versionOf = async (id: number) => (await now(id)).version;

/** The same draft with its first point moved by a pixel. */
const edited = (before: ReadingRecord): BenchDocument => {
  const document = structuredClone(JSON.parse(before.document)) as { charts: { curves: { points: number[][] }[] }[] };
  document.charts[0]!.curves[0]!.points[0]![0]! += 1;
  return document as unknown as BenchDocument;
};

const ACTIONS = {
  save: async ({ engineer }: Team, id: number) => saveReading(engineer, id, await versionOf(id), edited(await now(id))),
  handIn: async ({ engineer }: Team, id: number) => handIn(engineer, id, await versionOf(id), 'Second page has the voltage.'),
  takeBack: async ({ engineer }: Team, id: number) => takeBack(engineer, id, await versionOf(id)),
  approve: async ({ librarian }: Team, id: number) => approve(librarian, id, await versionOf(id)),
  return: async ({ librarian }: Team, id: number) => returnToOwner(librarian, id, await versionOf(id), REASON),
  withdraw: async ({ librarian }: Team, id: number) => withdraw(librarian, id, await versionOf(id), REASON),
  restore: async ({ librarian }: Team, id: number) => restore(librarian, id, await versionOf(id)),
} as const;
type ActionName = keyof typeof ACTIONS;
const ALL_ACTIONS = Object.keys(ACTIONS) as ActionName[];

/** Everything that may happen to a reading in each state, and the state it is in then; whatever is not here is refused. */
const ALLOWED: Readonly<Record<ReadingState, Partial<Record<ActionName, ReadingState>>>> = {
  draft: { save: 'draft', handIn: 'handed-in' },
  'handed-in': { takeBack: 'draft', approve: 'approved', return: 'returned' },
  returned: { save: 'draft', handIn: 'handed-in' },
  approved: { withdraw: 'withdrawn' },
  superseded: {},
  withdrawn: { restore: 'approved' },
};
const STATES = Object.keys(ALLOWED) as ReadingState[];

/** How a reading comes into each state, from a draft. */
const WAY: Readonly<Record<ReadingState, readonly ActionName[]>> = {
  draft: [],
  'handed-in': ['handIn'],
  returned: ['handIn', 'return'],
  approved: ['handIn', 'approve'],
  superseded: ['handIn', 'approve'],
  withdrawn: ['handIn', 'approve', 'withdraw'],
};

async function go(people: Team, id: number, way: readonly ActionName[]): Promise<void> {
  for (const step of way) await ACTIONS[step](people, id);
}

async function readingIn(state: ReadingState, people: Team): Promise<number> {
  const { id, module: of } = await reading(people.engineer);
  await go(people, id, WAY[state]);
  if (state === 'superseded') await go(people, (await reading(people.engineer, { of })).id, ['handIn', 'approve']);
  await deliverMail();
  return id;
}

const TABLES = ['readings', 'reading_editors', 'reading_pictures', 'models', 'decisions', 'trail', 'mail_queue', 'counters'];
/** All that a transition may touch, to be compared as a whole. */
const everything = async () => Promise.all(TABLES.map((table) => connection().query(`SELECT * FROM ${table} ORDER BY 1, 2`)));

/** Makes every later row of a table fail to be written, as a full disk would. */
const breakTable = (table: string) =>
  connection().query(`CREATE TRIGGER broken BEFORE INSERT ON ${table} BEGIN SELECT RAISE(ABORT, 'the disk is full'); END`);
const diskIsFull = { parent: expect.objectContaining({ message: expect.stringContaining('the disk is full') }) };

const refusalOf = async (work: Promise<unknown>): Promise<Refusal> => {
  const error = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof Refusal)) throw error ?? new Error('It was not refused.');
  return error;
};

describe.each(STATES)('a reading that is %s', (state) => {
  const allowed = Object.entries(ALLOWED[state]);
  test.runIf(allowed.length > 0).each(allowed)('goes by %s to %s', async (action, next) => {
    const people = await team();
    const id = await readingIn(state, people);
    await ACTIONS[action as ActionName](people, id);
    expect((await now(id)).state).toBe(next);
  });

  test('refuses everything else, says why, and stays as it was', async () => {
    const people = await team();
    const id = await readingIn(state, people);
    const before = await everything();
    for (const action of ALL_ACTIONS.filter((name) => !(name in ALLOWED[state]))) {
      const refusal = await refusalOf(ACTIONS[action](people, id));
      expect([action, refusal.status]).toEqual([action, 409]);
      expect(refusal.message).toMatch(/\.$/);
      expect(await everything()).toEqual(before);
    }
  });
});

describe('what a transition leaves behind', () => {
  const RECORDS: Readonly<
    Record<Exclude<ActionName, 'save'>, { from: ReadingState; what: string; reason: string; to: readonly string[] }>
  > = {
    handIn: { from: 'draft', what: 'handed-in', reason: 'Second page has the voltage.', to: ['soren.quill@kelda.example'] },
    takeBack: { from: 'handed-in', what: 'taken-back', reason: '', to: [] },
    approve: { from: 'handed-in', what: 'approved', reason: '', to: ['ilse.marrow@kelda.example'] },
    return: { from: 'handed-in', what: 'returned', reason: REASON, to: ['ilse.marrow@kelda.example'] },
    withdraw: { from: 'approved', what: 'withdrawn', reason: REASON, to: ['ilse.marrow@kelda.example'] },
    restore: { from: 'withdrawn', what: 'restored', reason: '', to: ['ilse.marrow@kelda.example'] },
  };

  test.each(Object.entries(RECORDS))('%s: a decision, a trail row and its letters', async (action, { from, what, reason, to }) => {
    const people = await team();
    const id = await readingIn(from, people);
    const letters = (await listMail(100)).length;
    await ACTIONS[action as ActionName](people, id);
    expect((await decisionsOf([id])).at(-1)).toMatchObject({ what, reason, readingId: id });
    expect((await listTrail(1))[0]).toMatchObject({ action: what, object: `reading/${id}` });
    const sent = (await listMail(100)).slice(0, -letters || undefined);
    expect(sent.map((mail) => mail.recipient)).toEqual(to);
    for (const mail of sent) if (reason) expect(mail.body).toContain(reason);
  });

  test.each(Object.entries(RECORDS))('%s: nothing of it happens when its last row cannot be written', async (action, { from, to }) => {
    const people = await team();
    const id = await readingIn(from, people);
    await breakTable(to.length > 0 ? 'mail_queue' : 'trail');
    const before = await everything();
    await expect(ACTIONS[action as ActionName](people, id)).rejects.toMatchObject(diskIsFull);
    expect(await everything()).toEqual(before);
    await connection().query('DROP TRIGGER broken');
    await ACTIONS[action as ActionName](people, id);
    expect(await everything()).not.toEqual(before);
  });

  test('a hand-in is told to the librarians who may decide, and to no others', async () => {
    const people = await team();
    await person(['designer'], 'Tamsin Vale');
    await person(['librarian', 'engineer'], 'Petra Ames');
    const owner = await person(['librarian', 'engineer'], 'Wren Hollis');
    const { id } = await reading(owner);
    await handIn(owner, id, await versionOf(id), '');
    const told = (await listMail(10)).map((mail) => mail.recipient).sort();
    expect(told).toEqual(['petra.ames@kelda.example', 'soren.quill@kelda.example']);
    expect(people.librarian.email).toBe('soren.quill@kelda.example');
  });
});

describe('one’s own work', () => {
  const both = () => person(['engineer', 'librarian'], 'Petra Ames');
  const decisions = [
    ['approve', 'handed-in', (by: SignedInPerson, id: number, version: number) => approve(by, id, version)],
    ['return', 'handed-in', (by: SignedInPerson, id: number, version: number) => returnToOwner(by, id, version, REASON)],
    ['withdraw', 'approved', (by: SignedInPerson, id: number, version: number) => withdraw(by, id, version, REASON)],
    ['restore', 'withdrawn', (by: SignedInPerson, id: number, version: number) => restore(by, id, version)],
  ] as const;

  test.each(decisions)('is never one’s own to %s', async (_name, state, decide) => {
    const owner = await both();
    const { librarian } = await team();
    const id = await readingIn(state, { engineer: owner, librarian });
    const before = await everything();
    expect(await refusalOf(decide(owner, id, await versionOf(id)))).toMatchObject({ status: 403 });
    expect(await everything()).toEqual(before);
  });

  test.each(decisions)('includes what one once edited: not to %s', async (_name, state, decide) => {
    const people = await team();
    const id = await readingIn(state, people);
    const helper = await both();
    await inTransaction(() => addEditor(id, helper.id));
    expect(await refusalOf(decide(helper, id, await versionOf(id)))).toMatchObject({ status: 403 });
  });

  test.each(decisions)('an engineer may not %s anybody’s', async (_name, state, decide) => {
    const people = await team();
    const id = await readingIn(state, people);
    const other = await person(['engineer']);
    expect(await refusalOf(decide(other, id, await versionOf(id)))).toMatchObject({ status: 403 });
  });

  test('is in one’s queue, marked, and is not counted as waiting for oneself', async () => {
    const owner = await both();
    const people = await team();
    await readingIn('handed-in', { ...people, engineer: owner });
    const other = await readingIn('handed-in', people);
    expect((await reviewQueue(owner)).map((item) => item.mayDecide)).toEqual([false, true]);
    expect((await reviewQueue(owner))[1]?.id).toBe(other);
    expect(await reviewCount(owner)).toBe(1);
    expect(await reviewCount(people.librarian)).toBe(2);
    expect(await reviewCount(people.engineer)).toBe(0);
  });

  test('only its owner hands in and takes back', async () => {
    const people = await team();
    const other = { ...people, engineer: await person(['engineer']) };
    const draft = await readingIn('draft', people);
    expect(await refusalOf(ACTIONS.handIn(other, draft))).toMatchObject({ status: 403 });
    const waiting = await readingIn('handed-in', people);
    expect(await refusalOf(ACTIONS.takeBack(other, waiting))).toMatchObject({ status: 403 });
  });

  test('a designer does not learn that a draft exists', async () => {
    const id = await readingIn('draft', await team());
    const designer = await person(['designer']);
    expect(await refusalOf(readingView(designer, id))).toMatchObject({ status: 404 });
  });
});

describe('races', () => {
  test.each(ALL_ACTIONS.filter((action) => action !== 'save'))(
    '%s over an old version is refused with the reading as it is',
    async (action) => {
      const people = await team();
      const from = STATES.find((state) => action in ALLOWED[state])!;
      const id = await readingIn(from, people);
      const version = (await versionOf(id)) - 1;
      const { engineer, librarian } = people;
      const late = {
        handIn: () => handIn(engineer, id, version, ''),
        takeBack: () => takeBack(engineer, id, version),
        approve: () => approve(librarian, id, version),
        return: () => returnToOwner(librarian, id, version, REASON),
        withdraw: () => withdraw(librarian, id, version, REASON),
        restore: () => restore(librarian, id, version),
      }[action as Exclude<ActionName, 'save'>];
      const before = await everything();
      const refusal = await refusalOf(late());
      expect(refusal.status).toBe(412);
      expect(refusal.extra.current).toMatchObject({ id, version: version + 1, state: from });
      expect(await everything()).toEqual(before);
    },
  );

  test('of two librarians who decide at once exactly one does', async () => {
    const people = await team();
    const second = await person(['librarian']);
    const id = await readingIn('handed-in', people);
    const version = await versionOf(id);
    const outcomes = await Promise.allSettled([approve(people.librarian, id, version), returnToOwner(second, id, version, REASON)]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect((await decisionsOf([id])).map(({ what }) => what)).toHaveLength(2);
  });
});

describe('a returned reading', () => {
  test('shows its reason and becomes a draft at the first edit', async () => {
    const people = await team();
    const id = await readingIn('returned', people);
    expect(await readingView(people.engineer, id)).toMatchObject({ state: 'returned', reason: REASON });
    await ACTIONS.save(people, id);
    expect(await readingView(people.engineer, id)).toMatchObject({ state: 'draft', reason: null });
  });

  test('stays returned when the very document that is stored is sent again', async () => {
    const people = await team();
    const id = await readingIn('returned', people);
    const { document, version } = await now(id);
    await saveReading(people.engineer, id, version, JSON.parse(document) as BenchDocument);
    expect((await now(id)).state).toBe('returned');
  });
});

describe('one approved reading a module', () => {
  async function twoOfOneModule(people: Team) {
    const of = await module();
    const first = await reading(people.engineer, { of });
    const second = await reading(people.engineer, { of });
    await go(people, first.id, ['handIn', 'approve']);
    return { of, first: first.id, second: second.id };
  }

  test('approving a newer one supersedes the older and renews the catalogue', async () => {
    const people = await team();
    const { of, first, second } = await twoOfOneModule(people);
    const renewed = await counter('catalogue');
    await go(people, second, ['handIn', 'approve']);
    expect((await now(first)).state).toBe('superseded');
    expect((await approvedReadingOf(of.id))?.id).toBe(second);
    expect((await decisionsOf([first])).map(({ what }) => what)).toEqual(['handed-in', 'approved', 'superseded']);
    expect(await counter('catalogue')).toBeGreaterThan(renewed);
  });

  test('the older one stays approved when approving the newer one fails', async () => {
    const people = await team();
    const { of, first, second } = await twoOfOneModule(people);
    await ACTIONS.handIn(people, second);
    await breakTable('mail_queue');
    await expect(ACTIONS.approve(people, second)).rejects.toMatchObject(diskIsFull);
    expect((await approvedReadingOf(of.id))?.id).toBe(first);
    expect((await now(second)).state).toBe('handed-in');
  });

  test('a withdrawn one comes back approved, or superseded where a newer one stands', async () => {
    const people = await team();
    const { of, first, second } = await twoOfOneModule(people);
    await go(people, first, ['withdraw', 'restore']);
    expect((await now(first)).state).toBe('approved');
    await go(people, first, ['withdraw']);
    await go(people, second, ['handIn', 'approve']);
    await go(people, first, ['restore']);
    expect((await now(first)).state).toBe('superseded');
    expect((await approvedReadingOf(of.id))?.id).toBe(second);
  });

  test('the database itself refuses a second one', async () => {
    const people = await team();
    const { second } = await twoOfOneModule(people);
    await expect(connection().query(`UPDATE readings SET state = 'approved' WHERE id = ${second}`)).rejects.toThrow(/UNIQUE|Validation/i);
  });
});

describe('what is approved', () => {
  /** RFC 8785 for what occurs here: keys in order, numbers and strings as JSON.stringify writes them. */
  const canonical = (value: unknown): string => {
    if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
    if (value === null || typeof value !== 'object') return JSON.stringify(value);
    const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
    return `{${entries.map(([key, inner]) => `${JSON.stringify(key)}:${canonical(inner)}`).join(',')}}`;
  };

  test('has the SHA-256 of document, pixels, model and engine for its hash', async () => {
    const people = await team();
    const id = await readingIn('approved', people);
    const model = (await latestModel(id))!;
    const result = JSON.parse(model.result) as { model: unknown };
    const { charts } = JSON.parse((await now(id)).document) as BenchDocument;
    const material = {
      document: JSON.parse(model.document) as unknown,
      pixelsSha256: charts.map((chart) => chart.pixelsSha256),
      model: result.model,
      engine: model.engine,
    };
    expect(result.model).not.toBeNull();
    expect(model.hash).toBe(createHash('sha256').update(canonical(material)).digest('hex'));
  });

  test.each([
    ['document', `replace(document, '"value":1,', '"value":1.1,')`],
    ['result', `replace(result, '"alpha":{"value":0.05', '"alpha":{"value":0.06')`],
    ['engine', `'9.9.9'`],
  ])('cannot be a model whose %s was changed after the hand-in', async (column, change) => {
    const people = await team();
    const id = await readingIn('handed-in', people);
    const before = (await latestModel(id))!;
    await connection().query(`UPDATE models SET ${column} = ${change} WHERE reading_id = ${id}`);
    expect(await latestModel(id)).not.toEqual(before);
    expect(await refusalOf(ACTIONS.approve(people, id))).toMatchObject({ status: 409, kind: 'hash' });
    expect((await now(id)).state).toBe('handed-in');
  });

  test('needs a whole draft: one with an unfinished chart is not taken in, and the sentence says why', async () => {
    const people = await team();
    const { id, document } = await reading(people.engineer);
    const unfinished = JSON.parse(document) as { charts: { curves: { value: number | null }[] }[] };
    unfinished.charts[1]!.curves[0]!.value = null;
    await saveReading(people.engineer, id, await versionOf(id), unfinished as unknown as BenchDocument);
    const refusal = await refusalOf(ACTIONS.handIn(people, id));
    expect(refusal.status).toBe(422);
    expect(refusal.message).toContain('Type the value of curve 1');
    expect(await latestModel(id)).toBeNull();
  });
});
